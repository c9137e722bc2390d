// Package units holds the only conversion factors of the program: quantities,
// their units, the three unit systems, and the reading and printing of numbers.
// All physics is SI; a value meets a unit only here.
package units

// Quantity is a kind of measurable thing. Two quantities that share a dimension
// but are read differently by an engineer (a saturation, a pore-volume count)
// are two quantities.
type Quantity string

const (
	Number          Quantity = "number"          // a bare number: exponents, counts
	Fraction        Quantity = "fraction"        // saturation, porosity, relative permeability
	Share           Quantity = "share"           // a fraction told in percent: recovery, water cut, uptime
	PoreVolumes     Quantity = "poreVolumes"     // volume over pore volume
	MobilityRatio   Quantity = "mobilityRatio"   // mobility over mobility
	FormationFactor Quantity = "formationFactor" // reservoir volume over surface volume
	WaterOilRatio   Quantity = "waterOilRatio"   // surface volume over surface volume
	Viscosity       Quantity = "viscosity"
	Permeability    Quantity = "permeability"
	Length          Quantity = "length"
	Area            Quantity = "area"
	Volume          Quantity = "volume"
	Pressure        Quantity = "pressure"
	Rate            Quantity = "rate" // volume per time
	Velocity        Quantity = "velocity"
	Duration        Quantity = "duration"
	Density         Quantity = "density"
	Angle           Quantity = "angle"
)

// Unit is one way to write a quantity: SI = number * Factor.
type Unit struct {
	Symbol   string // as written in a study and on screen, e.g. "md", "m3/d"
	Quantity Quantity
	Factor   float64 // SI value of one of this unit
}

// ToSI converts a number written in this unit.
func (u Unit) ToSI(number float64) float64 { return number * u.Factor }

// FromSI converts an SI value to a number in this unit.
func (u Unit) FromSI(si float64) float64 { return si / u.Factor }

// Exact definitions: foot and pound, NIST SP 811 app. B; barrel, 42 US gallons of
// 231 in3; millidarcy, from the darcy's own definition (1 cp cm2/(s atm)).
const (
	foot   = 0.3048
	inch   = 0.0254
	pound  = 0.45359237
	gravSI = 9.80665
	barrel = 42 * 231 * inch * inch * inch
	psi    = pound * gravSI / (inch * inch)
	darcy  = 1e-3 * 1e-4 / 101325
	day    = 86400.0
	year   = 365.25 * day
	acre   = 43560 * foot * foot
	degree = 3.14159265358979323846264338327950288 / 180
)

// StandardGravity is the conventional g, m/s2.
const StandardGravity = gravSI

// units lists every unit, by quantity, the most used first.
var catalogue = []Unit{
	{"", Number, 1},
	{"fraction", Fraction, 1}, {"%", Fraction, 0.01},
	{"%", Share, 0.01}, {"fraction", Share, 1},
	{"PV", PoreVolumes, 1}, {"%PV", PoreVolumes, 0.01},
	{"", MobilityRatio, 1},
	{"rb/stb", FormationFactor, 1}, {"m3/m3", FormationFactor, 1},
	{"bbl/bbl", WaterOilRatio, 1}, {"m3/m3", WaterOilRatio, 1},
	{"cp", Viscosity, 1e-3}, {"mPa.s", Viscosity, 1e-3}, {"Pa.s", Viscosity, 1},
	{"md", Permeability, darcy / 1000}, {"D", Permeability, darcy}, {"um2", Permeability, 1e-12}, {"m2", Permeability, 1},
	{"ft", Length, foot}, {"m", Length, 1}, {"cm", Length, 0.01}, {"mm", Length, 0.001}, {"in", Length, inch}, {"km", Length, 1000},
	{"ft2", Area, foot * foot}, {"acre", Area, acre}, {"m2", Area, 1}, {"ha", Area, 1e4}, {"cm2", Area, 1e-4},
	{"bbl", Volume, barrel}, {"Mbbl", Volume, 1e3 * barrel}, {"ft3", Volume, foot * foot * foot}, {"m3", Volume, 1}, {"cm3", Volume, 1e-6},
	{"psi", Pressure, psi}, {"kPa", Pressure, 1e3}, {"bar", Pressure, 1e5}, {"MPa", Pressure, 1e6}, {"atm", Pressure, 101325}, {"Pa", Pressure, 1},
	{"bbl/d", Rate, barrel / day}, {"m3/d", Rate, 1 / day}, {"cm3/min", Rate, 1e-6 / 60}, {"cm3/h", Rate, 1e-6 / 3600}, {"ft3/d", Rate, foot * foot * foot / day}, {"m3/s", Rate, 1},
	{"ft/d", Velocity, foot / day}, {"m/d", Velocity, 1 / day}, {"cm/min", Velocity, 0.01 / 60}, {"cm/h", Velocity, 0.01 / 3600}, {"m/s", Velocity, 1},
	{"d", Duration, day}, {"yr", Duration, year}, {"h", Duration, 3600}, {"min", Duration, 60}, {"s", Duration, 1},
	{"lb/ft3", Density, pound / (foot * foot * foot)}, {"kg/m3", Density, 1}, {"g/cm3", Density, 1000},
	{"deg", Angle, degree}, {"rad", Angle, 1},
}

// Of lists the units a quantity may be written in, the most used first.
func Of(q Quantity) []Unit {
	var list []Unit
	for _, u := range catalogue {
		if u.Quantity == q {
			list = append(list, u)
		}
	}
	return list
}

// Find returns the unit of a quantity with the given symbol.
func Find(q Quantity, symbol string) (Unit, bool) {
	for _, u := range catalogue {
		if u.Quantity == q && u.Symbol == symbol {
			return u, true
		}
	}
	return Unit{}, false
}
