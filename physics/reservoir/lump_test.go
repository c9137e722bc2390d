package reservoir

import (
	"math"
	"math/rand/v2"
	"testing"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
)

// Of any section lumping keeps thickness, flow capacity and pore volume, gives as many layers as
// are asked for, and on more of them the fastest is never slower; on all of them nothing is changed.
func TestLumped(t *testing.T) {
	rng := rand.New(rand.NewPCG(7, 11))
	for range 200 {
		var samples []Sample
		for range 1 + rng.IntN(40) {
			samples = append(samples, Sample{Thickness: 0.1 + rng.Float64(), Permeability: math.Exp(2 * rng.NormFloat64()), Porosity: 0.05 + 0.3*rng.Float64(), Swi: 0.3 * rng.Float64(), Sor: 0.213})
		}
		sums := func(list []Sample) (h, kh, ph, water, fastest float64) {
			for _, s := range list {
				h, kh, ph = h+s.Thickness, kh+s.Thickness*s.Permeability, ph+s.Thickness*s.Porosity
				water += s.Thickness * s.Porosity * s.Swi
				fastest = math.Max(fastest, s.Permeability/s.Porosity)
			}
			return
		}
		h, kh, ph, water, _ := sums(samples)
		before := 0.0
		for n := 1; n <= len(samples); n++ {
			list := Lumped(samples, n)
			if len(list) != n {
				t.Fatalf("%d layers, asked for %d", len(list), n)
			}
			lh, lkh, lph, lwater, fastest := sums(list)
			near(t, "thickness", lh, h, 1e-12*h)
			near(t, "flow capacity", lkh, kh, 1e-12*kh)
			near(t, "initial water", lwater, water, 1e-12*ph)
			near(t, "residual", list[0].Sor, 0.213, 0)
			near(t, "pore volume", lph, ph, 1e-12*ph)
			if fastest < before*(1-1e-12) {
				t.Fatalf("the fastest of %d layers is slower than of %d", n, n-1)
			}
			before = fastest
			if n == len(samples) {
				for i := range list {
					if list[i] != samples[i] {
						t.Fatalf("layer %d is %v, was %v", i, list[i], samples[i])
					}
				}
			}
		}
	}
	// Two pairs of like neighbours, by hand: (1+1.2)/2 and (9+10)/2 in their order.
	two := Lumped(evenly(9, 10, 1, 1.2), 2)
	near(t, "upper", two[0].Permeability, 9.5, 1e-14)
	near(t, "lower", two[1].Permeability, 1.1, 1e-14)
}

// Piston-like layers at equal mobilities, by hand: their rates are as their paces, so that the cut jumps
// by the share of the flow of each layer when it is swept, at one over its pace.
func TestArrival(t *testing.T) {
	layer := func(pace float64) Member { return Member{Piston{Water: 1, Oil: 1, Change: 0.5}, 1, pace} }
	b := Bundle{layer(2), layer(5), layer(3)}
	for _, c := range []struct{ level, clock float64 }{{0.01, 0.5 / 5}, {0.49, 0.5 / 5}, {0.51, 0.5 / 3}, {0.79, 0.5 / 3}, {0.81, 0.5 / 2}} {
		clock, ok := b.Arrival(c.level, 10)
		if !ok {
			t.Fatalf("a cut of %g is not reached", c.level)
		}
		near(t, "arrival", clock, c.clock, 1e-12)
	}
	if _, ok := b.Arrival(0.9, 0.2); ok {
		t.Error("reached before the time")
	}
	// With fans behind the fronts too: below the level until then, at it or above from then on, over random layers.
	flow := fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: 2.1e-3}
	d, err := displace.New(flow, 0.763, 0.213)
	if err != nil {
		t.Fatal(err)
	}
	rng := rand.New(rand.NewPCG(5, 3))
	between := 0
	for range 60 {
		b := randomBundle(rng, Path{PoreVolume: 1, Impedance: 1, Shape: Even, Flood: NewFlood(flow, d)}.Tabulate(1e-8), 1+rng.IntN(20), rng.Float64())
		level := 0.01 + 0.94*rng.Float64()
		clock, ok := b.Arrival(level, Clock(b, 50, 0))
		if !ok {
			t.Fatalf("a cut of %g is not reached", level)
		}
		if math.Abs(b.At(clock).Cut()-level) < 1e-9 {
			between++
		}
		if cut := b.At(clock * (1 + 1e-6)).Cut(); cut < level {
			t.Errorf("a cut of %g after that of %g came", cut, level)
		}
		for k := range 50 {
			if cut := b.At(clock * (1 - 1e-6) * float64(k+1) / 50).Cut(); cut > level {
				t.Errorf("a cut of %g before that of %g came", cut, level)
			}
		}
	}
	if between < 10 {
		t.Errorf("only %d arrivals between breakthroughs", between)
	}
}
