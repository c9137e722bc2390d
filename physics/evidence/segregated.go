package evidence

import (
	"brinefront/physics/displace"
	"brinefront/physics/ref"
	"brinefront/physics/regime"
	"brinefront/physics/relperm"
	"brinefront/physics/units"
)

// dakeDip is the layer of Dake (1978), exercise 10.3.
func dakeDip() regime.Dip {
	return regime.Dip{
		Permeability: si(units.Permeability, 2000, "md"), Kr: 0.3, Viscosity: si(units.Viscosity, 0.5, "cp"),
		DensityDifference: si(units.Density, 0.23, "g/cm3"), Angle: si(units.Angle, 25, "deg"), Mobility: 3.75,
	}
}

// dippingQuadratic is the front of quadratic curves at viscosity ratio 1 with gravity
// term n, times 1/µo: its saturation and speed.
func dippingQuadratic(terms ...float64) func() ([]float64, error) {
	return func() ([]float64, error) {
		var values []float64
		for _, n := range terms {
			flow := quadratic(1)
			flow.Gravity = n * flow.MuO
			d, err := displace.New(flow, 1, 0)
			if err != nil {
				return nil, err
			}
			behind, _, _ := d.Front()
			values = append(values, behind, d.FrontSpeed())
		}
		return values, nil
	}
}

const tangentWithGravity = "S of (1−n) + 4nS + (an−a−7n)S² + 4nS³ − anS⁴ = 0, a = 1+M, from the tangent condition; exact fractions"

var segregatedFlow = []Check{
	{ID: "quadratic-front-dip", Topic: "Front", Title: "Front of quadratic curves in a dipping layer, closed form", Source: ref.Welge1952, Place: tangentWithGravity, Provenance: Exact,
		Inputs: "krw = S², kro = (1−S)², µo = µw; gravity term over µo n = 16/31 (up-dip), −9/19 and −4 (down-dip)", How: "the envelope solution with gravity",
		Items: items(1e-12, "exact but for rounding and the tangent's last digits",
			"S at n = 16/31", 3.0/4, "speed at n = 16/31", 36.0/31, "S at n = −9/19", 2.0/3, "speed at n = −9/19", 24.0/19, "S at n = −4", 1.0/2, "speed at n = −4", 2.0),
		compute: dippingQuadratic(16.0/31, -9.0/19, -4)},
	{ID: "dake-10.3-critical", Topic: "Front", Title: "Critical rate in a dipping layer", Source: ref.Dake1978, Place: "Exercise 10.3", Provenance: Memory,
		Inputs: "2000 md, krw 0.3, 25 000 ft², specific gravities 0.23 apart, dip 25°, µw 0.5 cp, M = 3.75", How: "Dietz's criterion, and the slope of the interface at nine tenths of that rate",
		Items: []Item{
			{"critical rate, rb/d", 519, 2.6, "computed in the source with the constant 4.9e-4, two figures for 4.88e-4: half a percent"},
			{"angle of the interface at 0.9 of it, degrees", 2.7, 0.05, lastDigit},
		},
		compute: func() ([]float64, error) {
			layer := dakeDip()
			critical, _ := layer.Critical()
			beta, _ := layer.Interface(0.9 * critical)
			return []float64{critical * si(units.Area, 25000, "ft2") / si(units.Rate, 1, "bbl/d"), beta / si(units.Angle, 1, "deg")}, nil
		}},
	{ID: "dake-10.3-segregated", Topic: "Front", Title: "Segregated flow in a level layer", Source: ref.Dake1978, Place: "Exercise 10.3", Provenance: Memory,
		Inputs: "M = 3.75, movable oil 0.6 PV; 1000 rb/d into 2000 ft by 625 ft by 40 ft of porosity 0.18", How: "displacement in vertical equilibrium",
		Items: []Item{
			{"recovery at breakthrough, PV", 0.16, 0.005, lastDigit},
			{"injected when all movable oil is out, PV", 2.25, 0.005, lastDigit},
			{"years to breakthrough", 0.7, 0.05, lastDigit},
		},
		compute: func() ([]float64, error) {
			const movable = 0.6
			flow, err := regime.NewSegregated(3.75, 0)
			if err != nil {
				return nil, err
			}
			volume := si(units.Length, 2000, "ft") * si(units.Length, 625, "ft") * si(units.Length, 40, "ft") * 0.18
			years := volume / si(units.Rate, 1000, "bbl/d") / si(units.Duration, 1, "yr")
			return []float64{movable * flow.Breakthrough(), movable * flow.Complete(), movable * flow.Breakthrough() * years}, nil
		}},
	{ID: "land-trapping", Topic: "Curves", Title: "Trapped gas by Land's law", Source: ref.Land1968, Place: "1/Sgr* − 1/Sgi* = C; the numbers are ours, from the formula", Provenance: Memory,
		Inputs: "C = 1, 1.27 (Berea), 2, 3; all gas at first, and half", How: "Land's law, saturations over 1 − Swc",
		Items: items(0.5e-4, lastDigit,
			"C = 1, Sgi = 1", 0.5, "C = 1, Sgi = 0.5", 0.3333, "C = 1.27, Sgi = 1", 0.4405, "C = 1.27, Sgi = 0.5", 0.3058,
			"C = 2, Sgi = 1", 0.3333, "C = 2, Sgi = 0.5", 0.25, "C = 3, Sgi = 1", 0.25, "C = 3, Sgi = 0.5", 0.2),
		compute: func() ([]float64, error) {
			var values []float64
			for _, c := range []float64{1, 1.27, 2, 3} {
				law := relperm.Land{C: c}
				values = append(values, law.Trapped(1), law.Trapped(0.5))
			}
			return values, nil
		}},
}
