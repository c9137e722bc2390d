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
	GasVolume       Quantity = "gasVolume" // of gas at standard conditions
	Pressure        Quantity = "pressure"
	Rate            Quantity = "rate"          // volume per time
	GasRate         Quantity = "gasRate"       // of gas at standard conditions
	GasOilRatio     Quantity = "gasOilRatio"   // gas at standard conditions over liquid at surface
	WaterGasRatio   Quantity = "waterGasRatio" // liquid at surface over gas at standard conditions
	Velocity        Quantity = "velocity"
	Duration        Quantity = "duration"
	Density         Quantity = "density"
	Angle           Quantity = "angle"

	Temperature        Quantity = "temperature"        // a level, never a difference
	Salinity           Quantity = "salinity"           // mass of salt in the mass of brine
	InterfacialTension Quantity = "interfacialTension" // force per length between two phases
	HeatCapacity       Quantity = "heatCapacity"       // heat per volume and degree of temperature
	Sorptivity         Quantity = "sorptivity"         // length over the root of time
	RootDuration       Quantity = "rootDuration"       // root of time
	Diffusivity        Quantity = "diffusivity"        // area over time

	PressureGradient Quantity = "pressureGradient" // pressure over depth
	Price            Quantity = "price"            // money, of any one currency, per volume
	CostRate         Quantity = "costRate"         // money per time
)

// Unit is one way to write a quantity: SI = (number + Zero) Factor.
type Unit struct {
	Symbol   string // as written in a study and on screen, e.g. "md", "m3/d"
	Quantity Quantity
	Factor   float64 // SI value of one of this unit
	Zero     float64 // where the scale's zero lies above the SI one, in this unit; 0 but for temperatures
}

// ToSI converts a number written in this unit.
func (u Unit) ToSI(number float64) float64 { return (number + u.Zero) * u.Factor }

// FromSI converts an SI value to a number in this unit.
func (u Unit) FromSI(si float64) float64 { return si/u.Factor - u.Zero }

// Exact definitions: foot and pound, NIST SP 811 app. B; barrel, 42 US gallons of
// 231 in3; millidarcy, from the darcy's own definition (1 cp cm2/(s atm)); the zeros of the
// Celsius and Fahrenheit scales and the British thermal unit, NIST SP 811 app. B.
const (
	foot              = 0.3048
	inch              = 0.0254
	pound             = 0.45359237
	gravSI            = 9.80665
	barrel            = 42 * 231 * inch * inch * inch
	psi               = pound * gravSI / (inch * inch)
	darcy             = 1e-3 * 1e-4 / 101325
	day               = 86400.0
	rootDay, rootHour = 293.9387691339814, 60.0
	year              = 365.25 * day
	acre              = 43560 * foot * foot
	btu               = 1055.05585262 // International Table
	degree            = 3.14159265358979323846264338327950288 / 180
)

// StandardGravity is the conventional g, m/s2.
const StandardGravity = gravSI

// units lists every unit, by quantity, the most used first.
var catalogue = []Unit{
	{"", Number, 1, 0},
	{"fraction", Fraction, 1, 0}, {"%", Fraction, 0.01, 0},
	{"%", Share, 0.01, 0}, {"fraction", Share, 1, 0},
	{"PV", PoreVolumes, 1, 0}, {"%PV", PoreVolumes, 0.01, 0},
	{"", MobilityRatio, 1, 0},
	{"rb/stb", FormationFactor, 1, 0}, {"m3/m3", FormationFactor, 1, 0}, {"rb/Mscf", FormationFactor, barrel / (1e3 * foot * foot * foot), 0}, {"ft3/scf", FormationFactor, 1, 0},
	{"Mscf", GasVolume, 1e3 * foot * foot * foot, 0}, {"MMscf", GasVolume, 1e6 * foot * foot * foot, 0}, {"m3", GasVolume, 1, 0},
	{"Mscf/d", GasRate, 1e3 * foot * foot * foot / day, 0}, {"m3/d", GasRate, 1 / day, 0},
	{"scf/bbl", GasOilRatio, foot * foot * foot / barrel, 0}, {"m3/m3", GasOilRatio, 1, 0},
	{"bbl/MMscf", WaterGasRatio, barrel / (1e6 * foot * foot * foot), 0}, {"m3/m3", WaterGasRatio, 1, 0},
	{"bbl/bbl", WaterOilRatio, 1, 0}, {"m3/m3", WaterOilRatio, 1, 0},
	{"cp", Viscosity, 1e-3, 0}, {"mPa.s", Viscosity, 1e-3, 0}, {"Pa.s", Viscosity, 1, 0},
	{"md", Permeability, darcy / 1000, 0}, {"D", Permeability, darcy, 0}, {"um2", Permeability, 1e-12, 0}, {"m2", Permeability, 1, 0},
	{"ft", Length, foot, 0}, {"m", Length, 1, 0}, {"cm", Length, 0.01, 0}, {"mm", Length, 0.001, 0}, {"in", Length, inch, 0}, {"km", Length, 1000, 0},
	{"ft2", Area, foot * foot, 0}, {"acre", Area, acre, 0}, {"m2", Area, 1, 0}, {"ha", Area, 1e4, 0}, {"cm2", Area, 1e-4, 0},
	{"bbl", Volume, barrel, 0}, {"Mbbl", Volume, 1e3 * barrel, 0}, {"ft3", Volume, foot * foot * foot, 0}, {"m3", Volume, 1, 0}, {"cm3", Volume, 1e-6, 0},
	{"psi", Pressure, psi, 0}, {"kPa", Pressure, 1e3, 0}, {"bar", Pressure, 1e5, 0}, {"MPa", Pressure, 1e6, 0}, {"atm", Pressure, 101325, 0}, {"Pa", Pressure, 1, 0},
	{"bbl/d", Rate, barrel / day, 0}, {"m3/d", Rate, 1 / day, 0}, {"cm3/min", Rate, 1e-6 / 60, 0}, {"cm3/h", Rate, 1e-6 / 3600, 0}, {"ft3/d", Rate, foot * foot * foot / day, 0}, {"m3/s", Rate, 1, 0},
	{"ft/d", Velocity, foot / day, 0}, {"m/d", Velocity, 1 / day, 0}, {"cm/min", Velocity, 0.01 / 60, 0}, {"cm/h", Velocity, 0.01 / 3600, 0}, {"m/s", Velocity, 1, 0},
	{"d", Duration, day, 0}, {"yr", Duration, year, 0}, {"h", Duration, 3600, 0}, {"min", Duration, 60, 0}, {"s", Duration, 1, 0},
	{"lb/ft3", Density, pound / (foot * foot * foot), 0}, {"kg/m3", Density, 1, 0}, {"g/cm3", Density, 1000, 0},
	{"deg", Angle, degree, 0}, {"rad", Angle, 1, 0},
	{"degC", Temperature, 1, 273.15}, {"degF", Temperature, 5.0 / 9, 459.67}, {"K", Temperature, 1, 0},
	{"wt%", Salinity, 0.01, 0}, {"g/kg", Salinity, 1e-3, 0}, {"ppm", Salinity, 1e-6, 0},
	{"mN/m", InterfacialTension, 1e-3, 0}, {"dyn/cm", InterfacialTension, 1e-3, 0}, {"N/m", InterfacialTension, 1, 0},
	{"m/√d", Sorptivity, 1 / rootDay, 0}, {"ft/√d", Sorptivity, foot / rootDay, 0}, {"cm/√h", Sorptivity, 0.01 / rootHour, 0}, {"m/√s", Sorptivity, 1, 0},
	{"√d", RootDuration, rootDay, 0}, {"√h", RootDuration, rootHour, 0}, {"√s", RootDuration, 1, 0},
	{"m2/s", Diffusivity, 1, 0}, {"m2/d", Diffusivity, 1 / day, 0}, {"ft2/d", Diffusivity, foot * foot / day, 0}, {"cm2/h", Diffusivity, 1e-4 / 3600, 0},
	{"psi/ft", PressureGradient, psi / foot, 0}, {"kPa/m", PressureGradient, 1e3, 0}, {"bar/m", PressureGradient, 1e5, 0},
	{"per bbl", Price, 1 / barrel, 0}, {"per m3", Price, 1, 0},
	{"per d", CostRate, 1 / day, 0}, {"per yr", CostRate, 1 / year, 0},
	{"MJ/(m3.K)", HeatCapacity, 1e6, 0}, {"kJ/(m3.K)", HeatCapacity, 1e3, 0}, {"J/(m3.K)", HeatCapacity, 1, 0}, {"Btu/(ft3.degF)", HeatCapacity, btu * 1.8 / (foot * foot * foot), 0},
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
