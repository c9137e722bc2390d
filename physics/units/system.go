package units

// System is a set of default units. Switching it changes how values are shown,
// never the values.
type System string

const (
	Field  System = "field"
	Metric System = "metric"
	Lab    System = "lab"
)

// Systems lists the three systems in the order they are offered.
var Systems = []System{Field, Metric, Lab}

var defaults = map[System]map[Quantity]string{
	Field: {
		FormationFactor: "rb/stb", WaterOilRatio: "bbl/bbl", Viscosity: "cp", Permeability: "md", Length: "ft", Area: "acre",
		Volume: "bbl", Pressure: "psi", Rate: "bbl/d", Velocity: "ft/d", Duration: "d", Density: "lb/ft3",
		GasVolume: "Mscf", GasRate: "Mscf/d", GasOilRatio: "scf/bbl", WaterGasRatio: "bbl/MMscf",
		Temperature: "degF", InterfacialTension: "dyn/cm", HeatCapacity: "Btu/(ft3.degF)", Sorptivity: "ft/√d", Diffusivity: "ft2/d",
	},
	Metric: {
		FormationFactor: "m3/m3", WaterOilRatio: "m3/m3", Viscosity: "mPa.s", Permeability: "md", Length: "m", Area: "ha",
		Volume: "m3", Pressure: "bar", Rate: "m3/d", Velocity: "m/d", Duration: "d", Density: "kg/m3", PressureGradient: "bar/m", Price: "per m3",
		GasVolume: "m3", GasRate: "m3/d", GasOilRatio: "m3/m3", WaterGasRatio: "m3/m3", Diffusivity: "m2/d",
	},
	Lab: {
		FormationFactor: "m3/m3", WaterOilRatio: "m3/m3", Viscosity: "mPa.s", Permeability: "md", Length: "cm", Area: "cm2",
		Volume: "cm3", Pressure: "kPa", Rate: "cm3/min", Velocity: "cm/h", Duration: "h", Density: "g/cm3", PressureGradient: "kPa/m", Price: "per m3",
		GasVolume: "m3", GasRate: "m3/d", GasOilRatio: "m3/m3", WaterGasRatio: "m3/m3",
		Sorptivity: "cm/√h", RootDuration: "√h", Diffusivity: "cm2/h",
	},
}

// Unit returns the system's unit for a quantity. Quantities that no system
// distinguishes (fractions, angles, ratios, salinity) have the same unit in all three.
func (s System) Unit(q Quantity) Unit {
	symbol, ok := defaults[s][q]
	if !ok {
		symbol = Of(q)[0].Symbol
	}
	u, ok := Find(q, symbol)
	if !ok {
		panic("units: system " + string(s) + " names no unit of " + string(q))
	}
	return u
}

// Valid reports whether s is one of Systems.
func (s System) Valid() bool { return s == Field || s == Metric || s == Lab }
