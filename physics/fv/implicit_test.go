package fv

import (
	"math"
	"math/rand/v2"
	"slices"
	"strings"
	"testing"
)

func newPotential(t testing.TB, d func(float64) float64, a, b float64) *Potential {
	t.Helper()
	p, err := NewPotential(d, a, b, nil)
	if err != nil {
		t.Fatal(err)
	}
	return p
}

// Closed form: the integral of s^p, also where D has no bound at the end or vanishes steeply.
func TestPotential(t *testing.T) {
	for _, p := range []float64{-0.5, 0, 0.3, 1, 2.7, 8} {
		k := newPotential(t, func(s float64) float64 { return math.Pow(s, p) }, 0, 1)
		for i := range 1001 {
			s := math.Pow(float64(i)/1000, 2)
			want := math.Pow(s, p+1) / (p + 1)
			got, d := k.At(s)
			allowed := 1e-6*want + 1e-12
			if p < 0 {
				allowed = 1e-7 // of a whole of 2: what the piece at the end itself lacks
			}
			near(t, "K", got, want, allowed)
			if s > 1e-6 && s < 0.999 {
				near(t, "D", d, math.Pow(s, p), 1e-4*math.Pow(s, p))
			}
		}
	}
	for _, d := range []float64{-1, math.NaN(), math.Inf(1)} {
		if _, err := NewPotential(func(float64) float64 { return d }, 0, 1, nil); err == nil {
			t.Errorf("a diffusion coefficient of %g", d)
		}
	}
}

// Closed form: one step of backward Euler carries a unit step at speed 1 and CFL number c to the
// cells as (c/(1+c))^i, at any c.
func TestImplicitStepIsGeometric(t *testing.T) {
	law := newLaw(t, polynomial{0, 1}, 0, 1)
	for _, c := range []float64{0.1, 1, 50, 1e5} {
		run := newImplicit(t, Medium{Law: law}, ImplicitSettings{Cells: 20, Through: 1, Inlet: End{Kind: Fed, Share: 1}, Outlet: End{Kind: Open}})
		run.Advance(c/20, nil)
		for i, s := range run.Cells() {
			near(t, "cell", s, math.Pow(c/(1+c), float64(i+1)), 2e-12+3e-16*c) // rounding of c S
		}
		near(t, "out", run.Balance().Out, c/20*math.Pow(c/(1+c), 20), 1e-11*c)
	}
}

// Philip (1960): D = (n/2) S^n [1 - S^n/(1+n)] soaks up n/(n+1) sqrt(T) from a face held at 1, and
// S = (1 - x/sqrt(T))^(1/n) behind a sharp front.
func TestPhilip(t *testing.T) {
	for _, n := range []float64{1, 2.5, 4} {
		k := newPotential(t, func(s float64) float64 { return n / 2 * math.Pow(s, n) * (1 - math.Pow(s, n)/(1+n)) }, 0, 1)
		var before float64
		for i, cells := range []int{50, 100, 200} {
			run := newImplicit(t, Medium{Potential: k}, ImplicitSettings{Cells: cells, Inlet: End{Kind: Held, State: 1}, Error: 1e-6, SecondOrder: true})
			const until = 0.64
			if !run.Advance(until, nil) {
				t.Fatalf("n %g: stalled at %g", n, run.T())
			}
			uptake := n / (n + 1) * math.Sqrt(until)
			e := math.Abs(run.Average()/uptake - 1)
			exact := between(cells, func(x float64) float64 {
				u := math.Min(1, x/math.Sqrt(until))
				return uptake * (1 - math.Pow(1-u, 1+1/n))
			})
			l1, _, _ := Norms(run.Cells(), exact)
			t.Logf("n %g, %d cells: uptake off by %.2g, L1 %.2g, %d steps", n, cells, e, l1, run.Steps())
			// The front is a root of x: of no more than first order in L1 near it.
			if i > 0 && !(l1 < 0.6*before) || e > 1e-3 {
				t.Errorf("n %g, %d cells: L1 %g after %g, uptake off by %g", n, cells, l1, before, e)
			}
			before = l1
		}
	}
}

// Closed form: diffusion of a wave of cosine between closed ends, order 2 in cells and, at first
// order in time, 1 in steps.
func TestImplicitOrders(t *testing.T) {
	k := newPotential(t, func(float64) float64 { return 1 }, -1, 1)
	wave := func(n int, height float64) []float64 {
		return between(n, func(x float64) float64 { return height * math.Sin(math.Pi*x) / math.Pi })
	}
	const until = 0.1
	decay := math.Exp(-math.Pi * math.Pi * until)
	errorOf := func(cells, steps int, second bool) float64 {
		run := newImplicit(t, Medium{Potential: k}, ImplicitSettings{Profile: wave(cells, 1), Cells: cells, Step: until / float64(steps), SecondOrder: second})
		run.Advance(until, nil)
		if run.Steps() != steps {
			t.Fatalf("%d steps, want %d", run.Steps(), steps)
		}
		l1, _, _ := Norms(run.Cells(), wave(cells, decay))
		return l1
	}
	for what, c := range map[string]struct{ coarse, fine, low, high float64 }{
		"time, first":  {errorOf(800, 10, false), errorOf(800, 20, false), 0.9, 1.1},
		"time, second": {errorOf(800, 5, true), errorOf(800, 10, true), 1.8, 2.3},
		"cells":        {errorOf(20, 400, true), errorOf(40, 400, true), 1.9, 2.1},
	} {
		if rate := math.Log2(c.coarse / c.fine); rate < c.low || rate > c.high {
			t.Errorf("%s: order %.3f, want %g to %g", what, rate, c.low, c.high)
		}
	}
}

// Whatever the flux, with and without diffusion, at steps up to thousands of times what an explicit
// scheme allows: Newton's method arrives, no state leaves the range of cells and ends, total
// variation does not grow, and nothing is lost or made.
func TestImplicitIsMonotone(t *testing.T) {
	r := rand.New(rand.NewPCG(2009, 6))
	const n = 40
	for trial := range 300 {
		law := newLaw(t, random(r), 0, 1)
		m := Medium{Law: law}
		if trial%3 > 0 {
			a, p := math.Pow(10, -4+4*r.Float64()), 3*r.Float64()
			m.Potential = newPotential(t, func(s float64) float64 { return a * math.Pow(s*(1-s), p) }, 0, 1)
		}
		profile := make([]float64, n)
		for i := range profile {
			if profile[i] = r.Float64(); i > 0 && trial%2 == 0 {
				profile[i] = profile[i-1]
				if r.IntN(8) == 0 {
					profile[i] = float64(r.IntN(3)) / 2
				}
			}
		}
		held := r.Float64()
		cfl := math.Pow(10, -1+5*r.Float64())
		run := newImplicit(t, m, ImplicitSettings{Cells: n, Profile: profile, Through: 1, Inlet: End{Kind: Held, State: held}, Outlet: End{Kind: Open}, Step: cfl / n / law.Fastest(0, 1)})
		before := append([]float64{held}, profile...)
		if !run.Advance(10*cfl/n/law.Fastest(0, 1), func(run *Implicit) bool {
			now := append([]float64{held}, run.Cells()...)
			if slices.Min(now) < slices.Min(before)-1e-7 || slices.Max(now) > slices.Max(before)+1e-7 {
				t.Fatalf("trial %d: %g to %g after %g to %g", trial, slices.Min(now), slices.Max(now), slices.Min(before), slices.Max(before))
			}
			if v, was := variation(now), variation(before); v > was+1e-7 {
				t.Fatalf("trial %d: variation %.12g after %.12g", trial, v, was)
			}
			before = now
			return true
		}) {
			t.Errorf("trial %d: stalled at %g, CFL %g", trial, run.T(), cfl)
		}
		if b := run.Balance(); !(math.Abs(b.In-b.Out-b.Stored) <= 1e-13*max(1, math.Abs(b.In))) {
			t.Errorf("trial %d: balance %+v", trial, b)
		}
	}
}

// The S-shaped flow of case fv-01 at every step from a tenth of the explicit limit to a million times
// it: a step never fails, and a flood in one step ends where mass balance says.
func TestImplicitAtAnyStep(t *testing.T) {
	c := readReference(t)
	law := tabulated(t, c.law(t))
	small := newPotential(t, func(s float64) float64 { return 1e-4 * (s - c.Inputs.Initial) * (c.Inputs.Injected - s) }, c.Inputs.Initial, c.Inputs.Injected)
	for _, m := range []Medium{{Law: law}, {law, small}} {
		for _, dq := range []float64{2e-4, 2e-3, 0.02, 0.2, 2, 20, 2000} {
			run := newImplicit(t, m, ImplicitSettings{Cells: 100, Initial: c.Inputs.Initial, Through: 1, Inlet: End{Kind: Fed, Share: 1}, Outlet: End{Kind: Open}, Step: dq})
			if !run.Advance(dq*5, nil) || run.Steps() != 5 && m.Potential == nil {
				t.Errorf("step %g: T %g, %d steps", dq, run.T(), run.Steps())
			}
			b := run.Balance()
			t.Logf("step %g: %d steps, %d cuts, work a cell and step %.1f, balance %.2g", dq, run.Steps(), run.Cuts(), float64(run.Work())/float64(run.Steps())/100, b.Error)
			if !(math.Abs(b.Error) <= 1e-13) {
				t.Errorf("step %g: balance %+v", dq, b)
			}
		}
	}
}

// A rate step: what is fed follows the flux, and a run that soaks goes on from there.
func TestFlowChanges(t *testing.T) {
	law := newLaw(t, polynomial{0, 0, 3, -2}, 0, 1)
	k := newPotential(t, func(s float64) float64 { return s * (1 - s) }, 0, 1)
	run := newImplicit(t, Medium{law, k}, ImplicitSettings{Cells: 30, Through: 0.1, Inlet: End{Kind: Fed, Share: 1}, Outlet: End{Kind: Threshold, State: 0.4}, Error: 1e-4, SecondOrder: true})
	run.Advance(1, nil)
	near(t, "fed", run.Balance().In, 0.1, 1e-15)
	run.Flow(0.5)
	run.Advance(1.5, nil)
	near(t, "fed", run.Balance().In, 0.35, 1e-14)
	run.Flow(0)
	run.Advance(4, nil)
	near(t, "fed", run.Balance().In, 0.35, 1e-14)
	if b := run.Balance(); math.Abs(b.Error) > 1e-13 {
		t.Errorf("balance %+v", b)
	}
}

func TestImplicitRefusals(t *testing.T) {
	law := newLaw(t, polynomial{0, 1}, 0, 1)
	m := Medium{Law: law}
	for says, s := range map[string]ImplicitSettings{
		"-3 cells":               {Cells: -3},
		"places from 0 to 1":     {Faces: []float64{0, 0.5}},
		"places that rise":       {Faces: []float64{0, 0.7, 0.6, 1}},
		"profile of 2 values":    {Cells: 3, Profile: []float64{0, 0}},
		"total flux of -1":       {Through: -1},
		"a step of -1":           {Step: -1},
		"second order without":   {SecondOrder: true},
		`the inlet is "open"`:    {Inlet: End{Kind: Open}},
		`the outlet is "fed"`:    {Outlet: End{Kind: Fed}},
		"the state 1.5 of":       {Initial: 1.5},
		"the state -1 of a cell": {Inlet: End{Kind: Held, State: -1}},
		"lets in 1.5":            {Inlet: End{Kind: Fed, Share: 1.5}, Through: 1},
	} {
		if _, err := NewImplicit(m, s); err == nil || !strings.Contains(err.Error(), says) {
			t.Errorf("%q: %v", says, err)
		}
	}
	if _, err := NewImplicit(Medium{}, ImplicitSettings{}); err == nil {
		t.Error("a medium of nothing")
	}
	if _, err := NewImplicit(Medium{Potential: newPotential(t, func(float64) float64 { return 1 }, 0, 1)}, ImplicitSettings{Through: 1}); err == nil {
		t.Error("flow without a law")
	}
}
