package reservoir

import (
	"math"
	"math/rand/v2"
	"testing"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/pattern"
	"brinefront/physics/relperm"
)

// pistonFlow has straight curves, piston-like up to a mobility ratio of 1.
func pistonFlow(m float64) fracflow.Flow {
	return fracflow.Flow{Curves: relperm.Corey{Krw0: 1, Kro0: 1, Nw: 1, No: 1}, MuW: 1e-3, MuO: m * 1e-3}
}

func tubes(t testing.TB, shape pattern.Shape, n int, flow fracflow.Flow, bores pattern.Bores, tolerance float64) Streamtubes {
	t.Helper()
	g, err := pattern.New(shape, n)
	if err != nil {
		t.Fatal(err)
	}
	lo, hi := flow.Ends()
	d, err := displace.New(flow, hi, lo)
	if err != nil {
		t.Fatal(err)
	}
	return NewStreamtubes(g, bores, NewFlood(flow, d), tolerance)
}

var fiveSpot = pattern.Shape{Kind: pattern.FiveSpot}

// A piston-like front at unit mobility meets the resistance of the pattern, whatever has
// been injected, and sweeps what potential theory says, to the width of a tube.
func TestStreamtubesAtUnitMobility(t *testing.T) {
	bores := pattern.Bores{Radius: 5e-4, Injector: 1.1, Producer: -0.7}
	for _, shape := range []pattern.Shape{fiveSpot, {Kind: pattern.SevenSpot}, {Kind: pattern.Direct, Ratio: 1}, {Kind: pattern.Staggered, Ratio: 1}, {Kind: pattern.NineSpot, Ratio: 0.6}} {
		s := tubes(t, shape, 40, pistonFlow(1), bores, 1e-6)
		g := s.Geometry
		for _, q := range []float64{0.1, 0.6, 0.9, 1.3, 2} {
			x := Clock(s, q, 0)
			rate := s.At(x).Rate * g.Area
			near(t, "rate", rate, 1e3*2*math.Pi/g.Drop(bores), 2e-5*rate)
			sweep, cut := g.UnitSweep(q)
			near(t, "sweep", s.Swept(x), sweep, 5e-3) // the last of 40 tubes is swept as a whole
			near(t, "cut", s.At(x).Cut(), cut, 1.0/20)
			near(t, "oil", s.At(x).Oil, s.Swept(x), 2e-5)
		}
		near(t, "breakthrough", s.At(s.Breakthrough()).Injected, g.Breakthrough(), 2e-3)
	}
}

// Oil against volume injected is concave along each tube, so that tubes which take unequal
// shares never give more than an even body: at any mobility, in any pattern. Water in is
// oil and water out, sweep rises, and the rate at the start is that of oil alone but for
// the circle around the injector, which has been filled.
func TestStreamtubesGiveLessThanEven(t *testing.T) {
	r := rand.New(rand.NewPCG(3, 14))
	kinds := []pattern.Kind{pattern.FiveSpot, pattern.Direct, pattern.Staggered, pattern.SevenSpot, pattern.NineSpot, pattern.Radial}
	for range 12 {
		flow := fracflow.Flow{
			Curves: relperm.Corey{Swc: 0.2, Sor: 0.25, Krw0: 0.1 + 0.9*r.Float64(), Kro0: 0.3 + 0.7*r.Float64(), Nw: 1.2 + 3*r.Float64(), No: 1.2 + 3*r.Float64()},
			MuW:    1e-3, MuO: 1e-3 * math.Exp(4*r.Float64()-1),
		}
		shape := pattern.Shape{Kind: kinds[r.IntN(len(kinds))], Ratio: 0.5 + 3*r.Float64()}
		bores := pattern.Bores{Radius: 1e-4 + 1e-3*r.Float64(), Injector: 3 * r.Float64(), Producer: -r.Float64()}
		s := tubes(t, shape, 10, flow, bores, 1e-5)
		ahead, _ := flow.Mobility(0.2)
		face, _ := flow.Mobility(0.75)
		start := 0.0
		for _, tube := range s.Geometry.Tubes {
			e := s.Geometry.Ends(tube, bores)
			start += 1 / (e.Impedance * (e.In/face + (1+e.Out)/ahead))
		}
		near(t, "rate at the start", s.At(0).Rate*s.Geometry.Area, start, 1e-4*start)
		swept := 0.0
		for _, q := range []float64{0.05, 0.2, 0.4, 0.8, 2, 7} {
			x := Clock(s, q, 0)
			o := s.At(x)
			even := s.Flood.Displacement.After(q)
			if o.Oil > even.Oil+2e-5 {
				t.Errorf("%v, Q %g: %.6g of oil, an even body gives %.6g", shape, q, o.Oil, even.Oil)
			}
			if e := s.Swept(x); !(e >= swept-1e-12 && e <= 1+1e-12) {
				t.Errorf("%v, Q %g: swept %g after %g", shape, q, e, swept)
			} else {
				swept = e
			}
			if q < s.At(s.Breakthrough()).Injected {
				near(t, "oil before breakthrough", o.Oil, q, 1e-4)
				near(t, "swept before breakthrough", swept, q*s.Flood.Displacement.FrontSpeed(), 2e-4)
			}
		}
	}
}

// Rows far apart flood like a linear body of the same resistance: within what converging
// flow near the wells leaves, which is a/d of the way at most.
func TestFarRowsFloodLikeABlock(t *testing.T) {
	flow := fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: 5.93e-3}
	loss := func(ratio float64) float64 {
		s := tubes(t, pattern.Shape{Kind: pattern.Direct, Ratio: ratio}, 10, flow, pattern.Bores{Radius: 1e-2 / ratio}, 1e-5)
		q := s.Flood.Displacement.Breakthrough()
		return 1 - s.At(Clock(s, q, 0)).Oil/s.Flood.Displacement.After(q).Oil
	}
	five, ten := loss(5), loss(10)
	if !(five > 0 && ten > 0 && ten < 0.6*five && ten < 0.05) {
		t.Errorf("oil lost against a block: %.3g at d/a 5, %.3g at 10", five, ten)
	}
}

// Turned round, a pattern of unequal wells floods otherwise, except where all mobilities
// are one.
func TestTurnedPatterns(t *testing.T) {
	bores := pattern.Bores{Radius: 5e-4}
	for _, same := range []bool{true, false} {
		flow := pistonFlow(1)
		if !same {
			flow = fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: 5.93e-3}
		}
		s := tubes(t, pattern.Shape{Kind: pattern.SevenSpot}, 12, flow, bores, 1e-5)
		back := NewStreamtubes(s.Geometry.Reverse(), bores, s.Flood, 1e-5)
		x := Clock(s, 0.3, 0)
		difference := math.Abs(back.At(x).Injected/0.3 - 1)
		if same != (difference < 1e-4) {
			t.Errorf("unit mobility %v: turned round, %.2g more or less is injected", same, difference)
		}
	}
}

// Half the stations of each tube change the clock by 4e-3 and oil by 3e-4 at most; the error
// falls with the square of their distance, so that all of them leave a third of that.
func TestStationsSuffice(t *testing.T) {
	flow := fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: 5.93e-3}
	bores := pattern.Bores{Radius: 5e-4}
	all := tubes(t, fiveSpot, 8, flow, bores, 1e-6)
	g, err := pattern.New(fiveSpot, 8)
	if err != nil {
		t.Fatal(err)
	}
	for i := range g.Tubes {
		tube := &g.Tubes[i]
		var v, w []float64
		for k := 0; k < len(tube.V); k += 2 {
			v, w = append(v, tube.V[k]), append(w, tube.G[k])
		}
		tube.V, tube.G = v, w
	}
	half := NewStreamtubes(g, bores, all.Flood, 1e-6)
	for _, q := range []float64{0.2, 0.5, 1, 3} {
		x, y := Clock(all, q, 0), Clock(half, q, 0)
		near(t, "clock", y/x, 1, 5e-3)
		near(t, "oil", half.At(y).Oil, all.At(x).Oil, 4e-4)
	}
}

func BenchmarkStreamtubes(b *testing.B) {
	g, err := pattern.New(fiveSpot, 40)
	if err != nil {
		b.Fatal(err)
	}
	flow := fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: 5.93e-3}
	lo, hi := flow.Ends()
	d, err := displace.New(flow, hi, lo)
	if err != nil {
		b.Fatal(err)
	}
	for b.Loop() {
		NewStreamtubes(g, pattern.Bores{Radius: 5e-4}, NewFlood(flow, d), 1e-3)
	}
}

// Wells whose effective radius lies beyond the circles around them free rock of resistance, with the
// oil in it: at the start the rate is that of the pattern full of oil, by hand, and as water of a
// twentieth of its mobility comes in the rate falls, never below that of the pattern full of water.
func TestWideWellsTakeNoResistanceBelowZero(t *testing.T) {
	const m = 0.05
	bores := pattern.Bores{Radius: 2.3e-3, Injector: -2.4, Producer: -1.1}
	for _, shape := range []pattern.Shape{fiveSpot, {Kind: pattern.SevenSpot}, {Kind: pattern.Direct, Ratio: 1}, {Kind: pattern.NineSpot, Ratio: 2}} {
		s := tubes(t, shape, 12, pistonFlow(m), bores, 1e-6)
		oil := 2 * math.Pi / (m * 1e-3) / s.Geometry.Drop(bores)
		near(t, "rate at the start", s.At(0).Rate*s.Geometry.Area, oil, 2e-5*oil) // as at unit mobility above
		former := math.Inf(1)
		for q := 0.02; q < 3; q *= 1.3 {
			rate := s.At(Clock(s, q, 0)).Rate * s.Geometry.Area
			if rate > former*(1+1e-6) || rate < m*oil*(1-1e-6) {
				t.Errorf("%s: rate %g after %g PV, %g before, oil %g", shape.Kind, rate, q, former, oil)
			}
			former = rate
		}
	}
}
