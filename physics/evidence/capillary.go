package evidence

import (
	"brinefront/physics/capillary"
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// system is a capillary system in the units of the trade: dyn/cm, degrees, md.
func system(tension, angle, permeability, porosity float64) capillary.System {
	return capillary.System{Tension: si(units.InterfacialTension, tension, "dyn/cm"), Angle: si(units.Angle, angle, "deg"),
		Permeability: si(units.Permeability, permeability, "md"), Porosity: porosity}
}

// fieldJ is J of 1 psi at 1 dyn/cm in rock of 1 md and porosity 1.
func fieldJ() float64 { return si(units.Pressure, 1, "psi") / system(1, 0, 1, 1).Scale() }

// ahmedShort is how far the printed constant of the source lies below what the units give.
func ahmedShort() float64 { return 0.21645 / fieldJ() }

var capillaryChecks = []Check{
	{ID: "j-constant", Topic: "Capillary pressure", Title: "Constant of the J-function in field units", Source: ref.Leverett1941, Place: "J = 0.21660 Pc √(k/φ)/(σ cos θ) in psi, md, dyn/cm, from the definitions of the units; books print 0.21645", Provenance: Exact,
		Inputs: "1 psi, 1 md, 1 dyn/cm, porosity 1", How: "J = Pc/(σ cos θ √(φ/k)) in SI",
		Items: items(0.5e-5, lastDigit, "constant", 0.21660), compute: value(fieldJ)},
	{ID: "j-ahmed", Topic: "Capillary pressure", Title: "J-function of laboratory data, carried to the reservoir", Source: ref.Ahmed2001, Place: "Example 4-7", Provenance: Read,
		Inputs: "laboratory 80 md, φ 0.16; reservoir 120 md, φ 0.19; 50 dyn/cm", How: "J by the constant that the source prints, 0.21645; pressures in psi from the rounded J",
		Items: append(items(0.5e-3, lastDigit, "J at 0.5 psi", 0.048, "J at 0.6 psi", 0.058, "J at 0.75 psi", 0.073, "J at 1.05 psi", 0.102, "J at 1.75 psi", 0.169),
			items(0.6e-3, "half a unit in the last printed digit, and the factor printed with four digits", "reservoir Pc of J 0.048", 0.441, "of J 0.058", 0.533, "of J 0.073", 0.671, "of J 0.102", 0.938, "of J 0.169", 1.553)...),
		compute: func() ([]float64, error) {
			var values []float64
			lab, reservoir, short := system(50, 0, 80, 0.16), system(50, 0, 120, 0.19), ahmedShort()
			for _, pc := range []float64{0.5, 0.6, 0.75, 1.05, 1.75} {
				values = append(values, short*si(units.Pressure, pc, "psi")/lab.Scale())
			}
			for _, j := range []float64{0.048, 0.058, 0.073, 0.102, 0.169} {
				values = append(values, j*reservoir.Scale()/short/si(units.Pressure, 1, "psi"))
			}
			return values, nil
		}},
	{ID: "adhesion-pairs", Topic: "Capillary pressure", Title: "σ cos θ of usual pairs of fluids", Source: ref.ArcherWall1986, Place: "Table of laboratory and reservoir systems", Provenance: Memory,
		Inputs: "oil and brine 48 dyn/cm at 30°, air and mercury 480 at 140°, reservoir oil and water 30 at 30°", How: "σ cos θ; for mercury, which does not wet, the angle's supplement",
		Items: items(1, "printed in whole dyn/cm, cut rather than rounded", "oil and brine", 42.0, "air and mercury", 367.0, "reservoir oil and water", 26.0),
		compute: func() ([]float64, error) {
			var values []float64
			for _, s := range []capillary.System{system(48, 30, 1, 1), system(480, 40, 1, 1), system(30, 30, 1, 1)} {
				values = append(values, s.Adhesion()/si(units.InterfacialTension, 1, "dyn/cm"))
			}
			return values, nil
		}},
	{ID: "independent-mixed-wet", Topic: "Capillary pressure", Title: "Two-branch curve of mixed-wet rock", Place: "Invented rock, case kr-01", Provenance: Independent,
		Inputs: "Swr 0.137, Sor 0.193, cw 3100 Pa, aw 0.72, co -5700 Pa, ao 0.61", How: "the form of Skjaeveland et al. (2000) and its zero",
		Items: []Item{
			{"Pc at Sw = 0.2107, Pa", 11371.480959977864, 5.5e-7, independentError},
			{"Pc at Sw = 0.6127, Pa", -8826.211678747666, 5.5e-7, independentError},
			{"slope at Sw = 0.2107, Pa", -185077.64635534538, 2.1e-3, independentError},
			{"slope at Sw = 0.6127, Pa", -49858.24800368752, 2.1e-3, independentError},
			{"Sw of Pc = 0", 0.36106907616357764, 1e-11, independentError},
		},
		compute: func() ([]float64, error) {
			c := capillary.Skjaeveland{Swr: 0.137, Sor: 0.193, Cw: 3100, Aw: 0.72, Co: -5700, Ao: 0.61}
			return append(valuesAndSlopes(c, 0.2107, 0.6127), capillary.Spontaneous(c).Sw), nil
		}},
	{ID: "independent-s-shaped", Topic: "Capillary pressure", Title: "S-shaped curve of water-wet rock", Place: "Invented rock, case kr-02", Provenance: Independent,
		Inputs: "Swr 0.193, trapped 0.247, P0 21.3 kPa, n 2.9, m = 1 - 1/n", How: "the form of van Genuchten (1980)",
		Items: []Item{
			{"Pc at Sw = 0.2546, Pa", 67245.57433216994, 1.1e-6, independentError},
			{"Pc at Sw = 0.74796, Pa", 4875.088714668754, 1.1e-6, independentError},
			{"slope at Sw = 0.2546, Pa", -595035.6330965714, 1.2e-4, independentError},
			{"slope at Sw = 0.74796, Pa", -337374.00490270444, 1.2e-4, independentError},
		},
		compute: func() ([]float64, error) {
			return valuesAndSlopes(capillary.VanGenuchten{Swr: 0.193, Snr: 0.247, P0: 21300, N: 2.9, M: capillary.Mualem(2.9)}, 0.2546, 0.74796), nil
		}},
}

func valuesAndSlopes(c capillary.Curve, sw ...float64) []float64 {
	var values, slopes []float64
	for _, s := range sw {
		pc, slope := c.At(s)
		values, slopes = append(values, pc), append(slopes, slope)
	}
	return append(values, slopes...)
}
