package evidence

import (
	"math"

	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// si is the SI value of a number of units. It panics on a unit that does not
// exist: the list below is ours.
func si(q units.Quantity, number float64, symbol string) float64 {
	u, ok := units.Find(q, symbol)
	if !ok {
		panic("evidence: no unit " + symbol)
	}
	return u.ToSI(number)
}

func value(f func() float64) func() ([]float64, error) {
	return func() ([]float64, error) { return []float64{f()}, nil }
}

// darcyField is k A dp/(mu L) in bbl/d for 1 md, 1 ft2, 1 psi/ft, 1 cp.
func darcyField() float64 {
	flux := si(units.Permeability, 1, "md") * si(units.Area, 1, "ft2") * si(units.Pressure, 1, "psi") /
		(si(units.Viscosity, 1, "cp") * si(units.Length, 1, "ft"))
	return flux / si(units.Rate, 1, "bbl/d")
}

// waterGradient is the pressure gradient of water of the given density, psi/ft.
func waterGradient(density float64) float64 {
	return density * units.StandardGravity * si(units.Length, 1, "ft") / si(units.Pressure, 1, "psi")
}

var unitChecks = []Check{
	{ID: "unit-darcy", Topic: "Units", Title: "One darcy", Source: ref.Chaudhry2004, Place: "Table A-1", Provenance: Read,
		Inputs: "1 D", How: "from the darcy's definition, 1 cp cm²/(s atm)",
		Items:   items(0.5e-19, lastDigit, "1 D in m²", 9.869233e-13),
		compute: value(func() float64 { return si(units.Permeability, 1, "D") })},
	{ID: "unit-darcy-field", Topic: "Units", Title: "Darcy's law in field units", Source: ref.Chaudhry2004, Place: "Table A-4", Provenance: Read,
		Inputs: "1 md, 1 ft², 1 psi/ft, 1 cp", How: "Darcy's law in SI, converted",
		Items: items(0.5e-8, lastDigit, "rate in bbl/d", 0.00112712), compute: value(darcyField)},
	{ID: "unit-barrel", Topic: "Units", Title: "One barrel", Source: ref.NISTSP811, Place: "App. B", Provenance: Memory,
		Inputs: "1 bbl", How: "42 US gallons of 231 in³",
		Items:   items(0.5e-7, lastDigit, "1 bbl in m³", 0.1589873),
		compute: value(func() float64 { return si(units.Volume, 1, "bbl") })},
	{ID: "unit-barrel-ft3", Topic: "Units", Title: "Cubic feet in a barrel", Place: "common field constant, no source", Provenance: Memory,
		Inputs: "1 bbl", How: "the barrel over the cubic foot",
		Items:   items(0.5e-3, lastDigit, "1 bbl in ft³", 5.615),
		compute: value(func() float64 { return si(units.Volume, 1, "bbl") / si(units.Volume, 1, "ft3") })},
	{ID: "unit-acre-foot", Topic: "Units", Title: "Barrels in an acre-foot", Place: "common field constant, no source", Provenance: Memory,
		Inputs: "1 acre of 1 ft", How: "the acre times the foot over the barrel",
		Items: items(0.5, lastDigit, "1 acre ft in bbl", 7758.0),
		compute: value(func() float64 {
			return si(units.Area, 1, "acre") * si(units.Length, 1, "ft") / si(units.Volume, 1, "bbl")
		})},
	{ID: "unit-barrel-day", Topic: "Units", Title: "One barrel a day", Source: ref.Chaudhry2004, Place: "Table A-5", Provenance: Read,
		Inputs: "1 bbl/d", How: "the barrel over 86 400 s",
		Items:   items(0.5e-12, lastDigit, "1 bbl/d in m³/s", 1.840131e-6),
		compute: value(func() float64 { return si(units.Rate, 1, "bbl/d") })},
	{ID: "unit-psi", Topic: "Units", Title: "One pound-force a square inch", Source: ref.NISTSP811, Place: "App. B", Provenance: Memory,
		Inputs: "1 psi", How: "0.45359237 kg × 9.80665 m/s² over (0.0254 m)²",
		Items:   items(0.5e-3, lastDigit, "1 psi in Pa", 6894.757),
		compute: value(func() float64 { return si(units.Pressure, 1, "psi") })},
	{ID: "unit-density", Topic: "Units", Title: "One pound a cubic foot", Source: ref.Chaudhry2004, Place: "Table A-5", Provenance: Read,
		Inputs: "1 lb/ft³", How: "0.45359237 kg over (0.3048 m)³",
		Items:   items(0.5e-5, lastDigit, "1 lb/ft³ in kg/m³", 16.01846),
		compute: value(func() float64 { return si(units.Density, 1, "lb/ft3") })},
	{ID: "unit-radial", Topic: "Units", Title: "Radial Darcy flow in field units", Place: "common field constants, no source", Provenance: Memory,
		Inputs: "1 md, 1 ft, 1 psi, 1 cp", How: "2π times Darcy's law in field units, and one over it",
		Items: []Item{
			{"2π k h Δp/µ in bbl/d", 0.00708, 0.5e-5, lastDigit},
			{"its reciprocal", 141.2, 0.05, lastDigit},
		},
		compute: func() ([]float64, error) {
			radial := 2 * math.Pi * darcyField()
			return []float64{radial, 1 / radial}, nil
		}},
	{ID: "unit-gradient", Topic: "Units", Title: "Fresh-water pressure gradient", Place: "common field constants, no source", Provenance: Memory,
		Inputs: "62.4 lb/ft³; 1 g/cm³", How: "density times standard gravity",
		Items: []Item{
			{"62.4 lb/ft³ in psi/ft", 0.433, 0.5e-3, lastDigit},
			{"1 g/cm³ in psi/ft", 0.4335, 0.5e-4, lastDigit},
		},
		compute: func() ([]float64, error) {
			return []float64{waterGradient(si(units.Density, 62.4, "lb/ft3")), waterGradient(1000)}, nil
		}},
	{ID: "unit-gravity", Topic: "Units", Title: "Gravity term in field units", Source: ref.Dake1978, Place: "Ch. 10 prints 4.9e-4; Ahmed (2001) ch. 14 multiplies 0.001127 by 0.433", Provenance: Memory,
		Inputs: "bbl/d, md, ft², cp, difference of specific gravity", How: "Darcy's law in field units times the gradient of fresh water",
		Items: []Item{
			{"Dake's constant", 4.9e-4, 0.5e-5, lastDigit},
			{"Ahmed's constant", 0.001127 * 0.433, 0.5e-6, "both factors rounded to three and four digits"},
		},
		compute: func() ([]float64, error) {
			constant := darcyField() * waterGradient(si(units.Density, 62.4, "lb/ft3"))
			return []float64{constant, constant}, nil
		}},
}
