package regime

import (
	"math"
	"testing"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
	"brinefront/physics/units"
)

func si(t *testing.T, q units.Quantity, symbol string, x float64) float64 {
	t.Helper()
	u, ok := units.Find(q, symbol)
	if !ok {
		t.Fatalf("no unit %q", symbol)
	}
	return u.ToSI(x)
}

// exercise is Dake (1978), exercise 10.3, from memory. Water of specific gravity 1 weighs
// 62.37 lb/ft3 (McCain's 62.368 at 60 F).
func exercise(t *testing.T) (d Dip, area float64) {
	p := readPublished(t).Dietz
	return Dip{
		Permeability:      si(t, units.Permeability, "md", p.KMd),
		Kr:                p.KrwEnd,
		Viscosity:         si(t, units.Viscosity, "cp", p.MuWCp),
		DensityDifference: si(t, units.Density, "lb/ft3", 62.37*p.SpecificGravityDifference),
		Angle:             si(t, units.Angle, "deg", p.DipDeg),
		Mobility:          p.M,
	}, si(t, units.Area, "ft2", p.AreaFt2)
}

// TestDakeExercise: the critical rate within the rounding of the printed constant (4.9e-4
// for 4.886e-4, 0.3 %) and of the third figure; angle and volumes as printed.
func TestDakeExercise(t *testing.T) {
	p := readPublished(t).Dietz
	d, area := exercise(t)
	u, v := d.Critical()
	complete(t, v)
	if v.Class != StableBelow {
		t.Errorf("%+v", v)
	}
	barrelPerDay := si(t, units.Rate, "bbl/d", 1)
	near(t, "critical rate, rb/d", u*area/barrelPerDay, p.CriticalRbD, 0.003*p.CriticalRbD+0.5)
	beta, ok := d.Interface(0.9 * u)
	if !ok {
		t.Fatal("no interface below the critical rate")
	}
	near(t, "angle, degrees", beta/si(t, units.Angle, "deg", 1), p.AngleDegAt0p9Critical, 0.05)

	level, err := NewSegregated(p.M, 0)
	if err != nil {
		t.Fatal(err)
	}
	near(t, "breakthrough, PV", level.Breakthrough()*p.MovablePV, p.HorizontalBreakthroughPV, 0.005)
	near(t, "complete, PV", level.Complete()*p.MovablePV, p.HorizontalCompletePV, 0.005)
	pv := si(t, units.Length, "ft", p.LengthFt) * si(t, units.Length, "ft", p.WidthFt) * si(t, units.Length, "ft", p.HeightFt) * p.Porosity
	years := level.Breakthrough() * p.MovablePV * pv / (p.RateRbD * barrelPerDay) / si(t, units.Duration, "yr", 1)
	near(t, "breakthrough, years", years, p.BreakthroughYr, 0.005)
}

// TestCriticalIsTheEdge: Critical, Judge and Interface are one condition, for gravity
// with and against the flow and mobility ratios on both sides of 1.
func TestCriticalIsTheEdge(t *testing.T) {
	base, _ := exercise(t)
	for _, c := range []struct {
		drho, angle, m float64
		want           Class
	}{
		{230, 0.4, 3.75, StableBelow},
		{-600, -0.4, 20, StableBelow}, // gas down-dip
		{230, 0.4, 1, StableAtAnyRate},
		{230, 0.4, 0.3, StableAtAnyRate},
		{230, -0.4, 0.3, StableAbove},
		{230, -0.4, 1, UnstableAtAnyRate},
		{230, -0.4, 3, UnstableAtAnyRate},
		{230, 0, 3, UnstableAtAnyRate},
		{230, 0, 0.3, StableAbove},
		{230, 0.4, math.NaN(), Undecided},
		{230, -0.4, math.NaN(), Undecided},
		{math.NaN(), 0.4, 3, Undecided},
	} {
		d := base
		d.DensityDifference, d.Angle, d.Mobility = c.drho, c.angle, c.m
		u, v := d.Critical()
		complete(t, v)
		if v.Class != c.want {
			t.Errorf("%+v: %+v, want %s", c, v, c.want)
		}
		stable := func(u float64) Class { v := d.Judge(u); complete(t, v); return v.Class }
		slow, fast := u*(1-1e-9), u*(1+1e-9)
		if u == 0 || math.IsInf(u, 1) {
			slow, fast = 1e-12, 1
		}
		want := map[Class][2]Class{
			StableBelow: {Stable, Unstable}, StableAbove: {Unstable, Stable},
			StableAtAnyRate: {Stable, Stable}, UnstableAtAnyRate: {Unstable, Unstable}, Undecided: {Undecided, Undecided},
		}[c.want]
		if c.want == StableAbove && u == 0 {
			want = [2]Class{Stable, Stable}
		}
		if got := [2]Class{stable(slow), stable(fast)}; got != want {
			t.Errorf("%+v: below and above %g %v, want %v", c, u, got, want)
		}
		for _, u := range []float64{slow, fast} {
			beta, ok := d.Interface(u)
			if held := stable(u) == Stable && d.Gravity(u) > 0; ok != held || ok && !(beta > 0 && beta < math.Pi/2) {
				t.Errorf("%+v: interface at %g: %v %v", c, u, beta, ok)
			}
		}
	}
}

// TestInterfaceLimits: level at rest, flat on the layer at the critical rate, parallel to
// level at M = 1.
func TestInterfaceLimits(t *testing.T) {
	d, _ := exercise(t)
	u, _ := d.Critical()
	for _, c := range []struct {
		name       string
		u, m, want float64
	}{
		{"at rest", u * 1e-12, d.Mobility, d.Angle},
		{"critical", u * (1 - 1e-12), d.Mobility, 0},
		{"M = 1", u, 1, d.Angle},
	} {
		d.Mobility = c.m
		beta, ok := d.Interface(c.u)
		if !ok {
			t.Fatal(c.name)
		}
		near(t, c.name, beta, c.want, 1e-11)
	}
}

// TestSegregatedIsAFlood: vertical equilibrium of two phases apart is a flood with straight
// relative permeabilities, so that the exact wave solver, which knows nothing of the closed
// form, must give the same recovery.
func TestSegregatedIsAFlood(t *testing.T) {
	for _, c := range []struct{ m, g float64 }{{3.75, 0}, {3.75, 1.1}, {12, -0.6}, {1, -0.3}, {1 + 1e-9, -0.4}, {0.6, -0.9}} {
		s, err := NewSegregated(c.m, c.g)
		if err != nil {
			t.Fatal(err)
		}
		// N lo = G/M with lo = 1: N = G/M, muo = 1 Pa s, muw = 1/M.
		flow := fracflow.Flow{Curves: relperm.Corey{Krw0: 1, Kro0: 1, Nw: 1, No: 1}, MuW: 1 / c.m, MuO: 1, Gravity: c.g / c.m}
		d, err := displace.New(flow, 1, 0)
		if err != nil {
			t.Fatal(err)
		}
		near(t, "breakthrough", d.Breakthrough(), s.Breakthrough(), 1e-9)
		for w := 0.05; w < 1.2*s.Complete(); w *= 1.3 {
			near(t, "recovery", s.Recovery(w), d.Recovery(w), 1e-9)
		}
	}
}

func TestSegregatedRefuses(t *testing.T) {
	for _, c := range [][2]float64{{0, -0.5}, {-1, 0}, {1, 0}, {3, 2}, {3, 2.5}, {3, -1}, {math.NaN(), 0}, {3, math.NaN()}, {math.Inf(1), 0}} {
		if s, err := NewSegregated(c[0], c[1]); err == nil {
			t.Errorf("M = %g, G = %g: %+v without an error", c[0], c[1], s)
		}
	}
}
