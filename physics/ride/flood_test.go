package ride

import (
	"math"
	"strings"
	"testing"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

// A passenger that changes nothing leaves the displacement as it is, wherever its front is.
func TestTracerChangesNothing(t *testing.T) {
	c := named(t, "tracer")
	for _, b := range []float64{-0.15, 0, 0.1, 0.6, 5} {
		for _, initial := range []float64{0.2, 0.3, 0.7} {
			f := flood(t, c.ahead, c.behind, Pivot{B: b}, c.injected, initial)
			d, err := displace.New(c.ahead, c.injected, initial)
			if err != nil {
				t.Fatal(err)
			}
			for _, q := range []float64{0.1, 0.4, 1, 3, 10} {
				got, want := f.After(q), d.After(q)
				near(t, "outlet", got.Sw, want.Sw, 1e-12)
				near(t, "recovery", got.Recovery, want.Recovery, 1e-12)
			}
			// The tracer is where as much of its water has come in as lies behind it and was held up.
			v, behind, _ := f.Front()
			sw, cut := d.Outlet(1 / v)
			near(t, "front's state", behind.S, sw, 1e-7) // a tangent fixes a speed, its place by the root of that
			near(t, "water behind the tracer", 1/v*cut-sw, b, 1e-12*(1+b/v))
		}
	}
}

// Swc = 0 and nothing held back: front and water front are one, and there is no bank. Water
// at rest, as little as it may be, is pushed ahead as one (Pope (1980), from memory).
func TestBankOfWaterAtRest(t *testing.T) {
	curves := relperm.Corey{Krw0: 0.4, Kro0: 0.9, Nw: 2.5, No: 2}
	for _, swc := range []float64{0, 1e-6, 0.01, 0.2} {
		curves.Swc = swc
		brine := fracflow.Flow{Curves: curves, MuW: 0.5e-3, MuO: 10e-3}
		polymer := brine
		polymer.MuW = 5e-3
		f := flood(t, brine, polymer, Pivot{}, 1, swc)
		v, _, _ := f.Front()
		bank, edge, ok := f.Bank()
		if ok != (swc > 0) {
			t.Fatalf("swc %g: a bank is %v", swc, ok)
		}
		if !ok {
			near(t, "one front", f.Breakthrough(), 1/v, 1e-12)
			continue
		}
		// All water ahead of the front was in place, up to the bank's edge.
		near(t, "water of the bank", bank.S*(edge-v), swc*edge, 1e-12*edge)
		if !(edge > v) {
			t.Errorf("swc %g: the bank's edge at %g is not ahead of the front at %g", swc, edge, v)
		}
	}
}

// A bank of oil: after a long flood with brine, polymer pushes the water cut down before it
// comes itself, and the cut is at the limit for good only after.
func TestBankOfOil(t *testing.T) {
	c := named(t, "polymer after water")
	f := c.flood(t)
	bank, edge, ok := f.Bank()
	if !ok || !(bank.S < f.Initial()) {
		t.Fatalf("no bank of oil: %+v, %v", bank, ok)
	}
	before, during := f.After(0.9/edge).Cut, f.After(0.5*(f.Breakthrough()+f.Arrival())).Cut
	if !(during < before-0.05) {
		t.Errorf("the cut goes from %g to %g in the bank", before, during)
	}
	near(t, "cut in the bank", during, bank.F, 1e-12)
	limit := before - 0.001
	if q, ok := f.PVIAtCut(limit); !ok || q < f.Arrival()*(1-1e-12) {
		t.Errorf("the cut is at %g for good from %g on, before the polymer at %g", limit, q, f.Arrival())
	}
	if q, ok := f.PVIAtCut(bank.F); !ok || q != 0 {
		t.Errorf("a cut that is never left is reached at %g", q)
	}
	if _, ok := f.PVIAtCut(1.1); ok {
		t.Error("a cut above that of the injected stream is reached")
	}
}

// Nothing is injected yet, and the inlet itself.
func TestFloodAtItsEnds(t *testing.T) {
	for _, c := range families(t) {
		f := c.flood(t)
		s := f.After(0)
		cut, _ := c.ahead.At(c.initial)
		if want := (State{Sw: c.initial, Cut: cut, Zone: Ahead, Average: c.initial}); s != want {
			t.Errorf("%s: before injection %+v, want %+v", c.name, s, want)
		}
		if n := f.At(0); n.Zone != Behind || n.S != f.InletFace().S {
			t.Errorf("%s: inlet %+v, face %+v", c.name, n, f.InletFace())
		}
		v, behind, ahead := f.Front()
		if n := f.At(v); n != behind {
			t.Errorf("%s: at the front %+v, want what is behind it, %+v", c.name, n, behind)
		}
		if n := f.At(v * (1 + 1e-12)); n.Zone != Ahead || math.Abs(n.S-ahead.S) > 1e-6 {
			t.Errorf("%s: beyond the front %+v, want %+v", c.name, n, ahead)
		}
		if n := f.At(1e9); n.S != c.initial {
			t.Errorf("%s: far ahead %+v", c.name, n)
		}
	}
}

func TestRefusals(t *testing.T) {
	c := named(t, "polymer")
	still := c.ahead
	still.MuO = math.Inf(1)
	for _, r := range []struct {
		ahead             fracflow.Flow
		pivot             Pivot
		injected, initial float64
		says              string
	}{
		{c.ahead, c.pivot, 0.8, 0.2, "injected saturation is 0.8; it must lie between 0.2 and 0.77"},
		{c.ahead, c.pivot, 0.77, 0.1, "initial saturation is 0.1; it must lie between 0.2 and 0.77"},
		{c.ahead, c.pivot, math.NaN(), 0.2, "injected"},
		{c.ahead, Pivot{A: -0.1}, 0.77, 0.2, "not negative"},
		{c.ahead, Pivot{A: math.NaN()}, 0.77, 0.2, "not negative"},
		{c.ahead, Pivot{B: math.Inf(1)}, 0.77, 0.2, "finite"},
		{c.ahead, Pivot{B: -0.21}, 0.77, 0.2, "at least -0.2"},
		{c.ahead, Pivot{A: 0.5, B: 0.4}, 0.77, 0.2, "at least the part carried by the oil, 0.5"},
		{c.ahead, c.pivot, 0.2, 0.2, "no water flows in"},
		{still, c.pivot, 0.77, 0.2, "not finite"},
	} {
		_, err := New(r.ahead, c.behind, r.pivot, r.injected, r.initial)
		if err == nil || !strings.Contains(err.Error(), r.says) {
			t.Errorf("%+v from %g to %g: %v does not say %q", r.pivot, r.injected, r.initial, err, r.says)
		}
	}
	for _, r := range []struct {
		heat Heat
		says string
	}{
		{Heat{0, 2e6, 4e6, 2e6}, "porosity is 0"},
		{Heat{1, 2e6, 4e6, 2e6}, "between 0 and 1"},
		{Heat{0.2, -1, 4e6, 2e6}, "grains and oil"},
		{Heat{0.2, 2e6, 4e6, math.NaN()}, "grains and oil"},
		{Heat{0.2, 2e6, 2e6, 2e6}, "above that of oil"},
	} {
		if _, err := r.heat.Pivot(); err == nil || !strings.Contains(err.Error(), r.says) {
			t.Errorf("%+v: %v does not say %q", r.heat, err, r.says)
		}
	}
}

// What the rock keeps, worked by hand.
func TestRetention(t *testing.T) {
	// 1 m³ of rock of porosity 0.2 holds 0.8 * 2650 = 2120 kg of grains, which keep 20 mg/kg:
	// 42.4 g, what 0.0424 m³ of a solution of 1 kg/m³ carries, that is 0.212 pore volumes.
	near(t, "adsorbed", Adsorbed(0.2, 2650, 20e-6, 1), 0.212, 1e-15)
	r := Retention{Reversible: 0.05, Irreversible: 0.1, Inaccessible: 0.2}
	near(t, "front", r.Front().B, -0.05, 1e-16)
	near(t, "rear", r.Rear().B, -0.15, 1e-16)
	if r.Front().A != 0 || r.Rear().A != 0 {
		t.Error("oil carries a solute")
	}
}
