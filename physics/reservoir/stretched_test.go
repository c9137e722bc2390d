package reservoir

import (
	"math"
	"math/rand/v2"
	"testing"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

// A stretched body is the flood of curves whose ends were moved, solved for itself. Corey
// curves are normalised by their ends, so that moved ends are typed.
func TestStretchedIsTheFloodOfMovedEnds(t *testing.T) {
	rng := rand.New(rand.NewPCG(17, 4))
	for range 60 {
		curve := relperm.Corey{Swc: 0.3 * rng.Float64(), Sor: 0.3 * rng.Float64(), Krw0: 0.1 + 0.5*rng.Float64(), Kro0: 0.5 + 0.5*rng.Float64(), Nw: 1.2 + 3*rng.Float64(), No: 1.2 + 3*rng.Float64()}
		moved := curve
		moved.Swc, moved.Sor = 0.35*rng.Float64(), 0.35*rng.Float64()
		start := math.Max(0, rng.Float64()-0.5) // of the way between the ends
		mu := math.Exp(2*rng.NormFloat64() - 5)
		body := func(c relperm.Corey) Path {
			lo, hi := c.Ends()
			flow := fracflow.Flow{Curves: c, MuW: 0.0005, MuO: mu}
			d, err := displace.New(flow, hi, lo+start*(hi-lo))
			if err != nil {
				t.Fatal(err)
			}
			return Path{PoreVolume: 1, Impedance: 1, Shape: Shape{V: Even.V, G: Even.G, In: rng.Float64(), Out: rng.Float64()}, Flood: NewFlood(flow, d)}
		}
		from, exact := body(curve), body(moved)
		exact.Shape = from.Shape
		s := Stretched{Body: from, By: (1 - moved.Swc - moved.Sor) / (1 - curve.Swc - curve.Sor)}
		near(t, "arrival", s.Breakthrough()/exact.Breakthrough(), 1, 1e-9)
		for _, q := range []float64{0, 0.1, 0.3, 0.7, 2, 40} {
			clock := exact.Clock(q)
			got, want := s.At(clock), exact.At(clock)
			near(t, "injected", got.Injected, want.Injected, 1e-9*(1+q))
			near(t, "oil", got.Oil, want.Oil, 1e-9)
			near(t, "rate", got.Rate/want.Rate, 1, 1e-7)
		}
	}
}

// Lumping keeps the volume at each saturation, and equal ones to the last bit.
func TestLumpingKeepsSaturations(t *testing.T) {
	rng := rand.New(rand.NewPCG(3, 9))
	volumes := func(list []Sample) (sum [3]float64) {
		for _, s := range list {
			for i, v := range []float64{s.Swc, s.Swi, s.Sor} {
				sum[i] += s.Thickness * s.Porosity * v
			}
		}
		return sum
	}
	for range 100 {
		list := make([]Sample, 1+rng.IntN(40))
		for i := range list {
			list[i] = Sample{Thickness: rng.Float64() + 0.1, Permeability: math.Exp(rng.NormFloat64()), Porosity: 0.05 + 0.3*rng.Float64(), Swc: 0.3 * rng.Float64(), Swi: 0.3 + 0.1*rng.Float64(), Sor: 0.213}
		}
		lumped := Grouped(list, 1+rng.IntN(8))
		before, after := volumes(list), volumes(lumped)
		for i := range before {
			near(t, "volume", after[i]/before[i], 1, 1e-12)
		}
		for _, l := range lumped {
			near(t, "residual", l.Sor, 0.213, 0)
		}
	}
}
