package fracflow

import (
	"math"
	"testing"

	"brinefront/physics/relperm"
)

// quadratic is krw = S^2, kro = (1-S)^2 with viscosity ratio m = muo/muw.
func quadratic(m float64) Flow {
	return Flow{Curves: relperm.Corey{Krw0: 1, Kro0: 1, Nw: 2, No: 2}, MuW: 1e-3, MuO: m * 1e-3}
}

// Exact result for quadratic curves: S* = 1/sqrt(1+M), speed (1+sqrt(1+M))/2. The
// tolerance is the rounding of f' = 0 found to the last digits.
func TestQuadraticClosedForm(t *testing.T) {
	for _, m := range []float64{1e-6, 1e-3, 0.5, 1, 2, 5, 10, 1e3, 1e6} {
		waves, err := Solve(quadratic(m), 1, 0)
		if err != nil {
			t.Fatal(err)
		}
		root := math.Sqrt(1 + m)
		if len(waves) != 2 || waves[0].Kind != Fan || waves[1].Kind != Shock {
			t.Fatalf("M = %g: waves %+v, want a fan and a shock", m, waves)
		}
		w := waves[1]
		if d := math.Abs(w.Behind*root - 1); d > 1e-13 {
			t.Errorf("M = %g: S* %.17g is off by %.2g", m, w.Behind, d)
		}
		if d := math.Abs(w.SpeedAhead/((1+root)/2) - 1); d > 1e-14 {
			t.Errorf("M = %g: speed off by %.2g", m, d)
		}
	}
}

// Exact results for straight curves, krw = S and kro = 1-S: f = M S/(1+(M-1)S), concave
// for M > 1 (all fan, from speed 1/M to M), convex for M < 1 (one shock) and a contact at
// M = 1, both at speed 1.
func TestStraightCurves(t *testing.T) {
	for _, m := range []float64{1e-6, 0.2, 0.999, 1, 1.001, 3, 1e6} {
		flow := Flow{Curves: relperm.Corey{Krw0: 1, Kro0: 1, Nw: 1, No: 1}, MuW: 1e-3, MuO: m * 1e-3}
		waves, err := Solve(flow, 1, 0)
		if err != nil {
			t.Fatal(err)
		}
		if len(waves) != 1 || waves[0].Behind != 1 || waves[0].Ahead != 0 {
			t.Fatalf("M = %g: waves %+v, want one from 1 to 0", m, waves)
		}
		kind, slow, fast := Shock, 1.0, 1.0
		if m > 1 {
			kind, slow, fast = Fan, 1/m, m
		}
		w := waves[0]
		if w.Kind != kind {
			t.Errorf("M = %g: %s, want %s", m, w.Kind, kind)
		}
		near(t, "speed behind", w.SpeedBehind, slow, 1e-14*slow)
		near(t, "speed ahead", w.SpeedAhead, fast, 1e-14*fast)
	}
}

// A straight-line table with equal viscosities and krw + kro = 1 has f = krw, a polygon:
// its envelope is found by hand. Concave corners give constant states, convex stretches
// one shock.
func TestPolygon(t *testing.T) {
	sw := []float64{0.1, 0.3, 0.5, 0.7, 0.9}
	f := []float64{0, 0.1, 0.6, 0.9, 1}
	kro := make([]float64, len(f))
	for i := range f {
		kro[i] = 1 - f[i]
	}
	table, err := relperm.NewTable(sw, f, kro, relperm.StraightLine)
	if err != nil {
		t.Fatal(err)
	}
	flow := Flow{Curves: table, MuW: 1e-3, MuO: 1e-3}
	check := func(injected, initial float64, want ...Wave) {
		t.Helper()
		got, err := Solve(flow, injected, initial)
		if err != nil || len(got) != len(want) {
			t.Fatalf("waves %+v, %v, want %+v", got, err, want)
		}
		for i, w := range want {
			g := got[i]
			if g.Kind != w.Kind || g.Behind != w.Behind || g.Ahead != w.Ahead {
				t.Errorf("wave %+v, want %+v", g, w)
			}
			near(t, "speed", g.SpeedBehind, w.SpeedBehind, 1e-14*w.SpeedBehind)
		}
	}
	check(0.9, 0.1, Wave{Shock, 0.9, 0.7, 0.5, 0.5}, Wave{Shock, 0.7, 0.1, 1.5, 1.5})
	check(0.1, 0.9, Wave{Shock, 0.1, 0.3, 0.5, 0.5}, Wave{Shock, 0.3, 0.9, 1.5, 1.5})
}

func TestEqualStates(t *testing.T) {
	if waves, err := Solve(quadratic(2), 0.4, 0.4); err != nil || len(waves) != 0 {
		t.Errorf("waves %+v, %v between equal states", waves, err)
	}
}

func TestRefusals(t *testing.T) {
	dead := Flow{Curves: relperm.Corey{Krw0: 0, Kro0: 1, Nw: 2, No: 2}, MuW: 1e-3, MuO: 1e-3}
	for name, solve := range map[string]func() ([]Wave, error){
		"injected outside": func() ([]Wave, error) { return Solve(quadratic(2), 1.1, 0) },
		"initial outside":  func() ([]Wave, error) { return Solve(quadratic(2), 1, -0.1) },
		"not a number":     func() ([]Wave, error) { return Solve(quadratic(2), math.NaN(), 0) },
		"nothing flows":    func() ([]Wave, error) { return Solve(dead, 1, 0) },
		"no viscosity":     func() ([]Wave, error) { return Solve(Flow{Curves: quadratic(2).Curves}, 1, 0) },
	} {
		if waves, err := solve(); err == nil {
			t.Errorf("%s: accepted, %+v", name, waves)
		}
	}
}
