package reservoir

import (
	"math"
	"math/rand/v2"
	"testing"

	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

// Extreme mobility ratios and exponents next to 1, where a fan runs through all its speeds
// within the last digits of saturation: every answer stays a number, time rises with PVI
// and comes back from it.
func TestExtremeFloods(t *testing.T) {
	r := rand.New(rand.NewPCG(6, 6))
	for i := range 400 {
		wide := func(lo, hi float64) float64 { return lo * math.Pow(hi/lo, r.Float64()) }
		flow := fracflow.Flow{
			Curves: relperm.Corey{Swc: 0.2, Sor: 0.25, Krw0: wide(1e-6, 1), Kro0: wide(0.1, 1), Nw: 1 + wide(0.01, 6), No: 1 + wide(0.01, 6)},
			MuW:    1e-3, MuO: 1e-3 * wide(1e-6, 1e6),
		}
		l := build(t, rock(ConstantPressure{1e6}), flow, 0.75, 0.2)
		before := 0.0
		for _, q := range []float64{1e-9, 0.01, 0.3, 0.55, 1, 3, 20} {
			s := l.AtPVI(q)
			for _, x := range []float64{s.Time, s.InjectionRate, s.OilRate, s.WaterRate, s.WaterCut, s.CumOil, s.CumWater, s.Recovery, s.PressureDrop} {
				if math.IsNaN(x) || math.IsInf(x, 0) {
					t.Fatalf("draw %d, Q %g: %+v\n%+v", i, q, s, flow)
				}
			}
			if !(s.Time > before) || s.Recovery > 0.55+1e-12 {
				t.Fatalf("draw %d, Q %g: time %g after %g, recovery %g", i, q, s.Time, before, s.Recovery)
			}
			before = s.Time
			if back := l.PVIAt(s.Time); math.Abs(back/q-1) > 1e-9 {
				t.Fatalf("draw %d: Q %g comes back as %g\n%+v", i, q, back, flow)
			}
		}
	}
}
