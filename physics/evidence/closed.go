package evidence

import (
	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/ref"
	"brinefront/physics/relperm"
)

// quadratic is krw = S², kro = (1-S)² with viscosity ratio m = mu_o/mu_w.
func quadratic(m float64) fracflow.Flow {
	return fracflow.Flow{Curves: relperm.Corey{Krw0: 1, Kro0: 1, Nw: 2, No: 2}, MuW: 1e-3, MuO: m * 1e-3}
}

// fronts returns the shock saturation and speed of the quadratic curves, for
// each viscosity ratio in turn.
func fronts(ratios ...float64) func() ([]float64, error) {
	return func() ([]float64, error) {
		var values []float64
		for _, m := range ratios {
			d, err := displace.New(quadratic(m), 1, 0)
			if err != nil {
				return nil, err
			}
			waves := d.Waves()
			front := waves[len(waves)-1]
			values = append(values, front.Behind, front.SpeedAhead)
		}
		return values, nil
	}
}

var closedForms = []Check{
	{ID: "quadratic-front", Topic: "Front", Title: "Front of quadratic curves, closed form", Source: ref.Welge1952, Place: "S = 1/√(1+M), speed (1+√(1+M))/2, from the tangent condition", Provenance: Exact,
		Inputs: "krw = S², kro = (1−S)², M = µo/µw = 0.5, 1, 2, 5, 10", How: "the envelope solution",
		Items: items(1e-7, "the closed form printed with seven decimals",
			"S at M = 0.5", 0.8164966, "speed at M = 0.5", 1.1123724, "S at M = 1", 0.7071068, "speed at M = 1", 1.2071068,
			"S at M = 2", 0.5773503, "speed at M = 2", 1.3660254, "S at M = 5", 0.4082483, "speed at M = 5", 1.7247449,
			"S at M = 10", 0.3015113, "speed at M = 10", 2.1583124),
		compute: fronts(0.5, 1, 2, 5, 10)},
	{ID: "leveque-front", Topic: "Front", Title: "Front of quadratic curves, water twice as mobile", Source: ref.LeVeque2002, Place: "Sec. 16.1, a = 1/2", Provenance: Memory,
		Inputs: "krw = S², kro = (1−S)², µo/µw = 2", How: "the envelope solution",
		Items: items(0.5e-5, lastDigit, "S at the front", 0.57735),
		compute: func() ([]float64, error) {
			values, err := fronts(2)()
			if err != nil {
				return nil, err
			}
			return values[:1], nil
		}},
}
