package fv

import (
	"math"
	"math/rand/v2"
	"strings"
	"testing"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

// polynomial is c0 + c1 s + ... as a flux.
type polynomial []float64

func (p polynomial) At(s float64) (f, dfds float64) {
	for i := len(p) - 1; i >= 0; i-- {
		f, dfds = f*s+p[i], dfds*s+f
	}
	return f, dfds
}

func (polynomial) Knots() []float64 { return nil }

var every = []Limiter{None, Minmod, VanLeer, Superbee}

func maxCFL(l Limiter) float64 {
	if l == None {
		return 1
	}
	return 0.5
}

// Closed form: a unit step carried at speed 1 is, after n first-order steps of CFL c, at cell
// i the chance that of n trials of chance c more than i succeed. At CFL 1 it is exact.
func TestStepIsBinomial(t *testing.T) {
	const cells, steps = 60, 40
	law := newLaw(t, polynomial{0, 1}, 0, 1)
	for _, cfl := range []float64{0.25, 0.5, 0.75, 1} {
		run := newRun(t, law, Settings{Cells: cells, CFL: cfl, Injected: 1})
		run.Advance(cfl*steps/cells, nil)
		if run.Steps() != steps {
			t.Fatalf("CFL %g: %d steps, want %d", cfl, run.Steps(), steps)
		}
		for i, got := range run.Cells() {
			want := 0.0
			for k := i + 1; k <= steps; k++ {
				a, _ := math.Lgamma(steps + 1)
				b, _ := math.Lgamma(float64(k + 1))
				c, _ := math.Lgamma(float64(steps - k + 1))
				p := math.Exp(a - b - c + float64(k)*math.Log(cfl))
				if k < steps {
					p *= math.Pow(1-cfl, float64(steps-k))
				}
				want += p
			}
			near(t, "cell", got, want, 1e-13)
		}
	}
}

// hill is a smooth state that rises and falls, carried at speed 1: mean over cells.
func hill(n int, shift float64) []float64 {
	// The integral of sin^4 over half a wave from 0.1 to 0.6, level outside.
	integral := func(x float64) float64 {
		u := math.Pi * math.Max(0, math.Min(1, (x-shift-0.1)/0.5))
		return 0.5 / math.Pi * (3*u/8 - math.Sin(2*u)/4 + math.Sin(4*u)/32)
	}
	return between(n, integral)
}

// ramp is a smooth state that only falls, as half a wave of cosine.
func ramp(n int, shift float64) []float64 {
	integral := func(x float64) float64 {
		u := math.Max(0, math.Min(1, (x-shift-0.1)/0.5))
		return math.Min(x-shift-0.1, 0) + 0.25*(u+math.Sin(math.Pi*u)/math.Pi)
	}
	return between(n, integral)
}

func between(n int, integral func(float64) float64) []float64 {
	out := make([]float64, n)
	for i := range out {
		out[i] = (integral(float64(i+1)/float64(n)) - integral(float64(i)/float64(n))) * float64(n)
	}
	return out
}

// orders of convergence in L1 between N and 2N of a carried state.
func order(t *testing.T, limiter Limiter, injected float64, state func(int, float64) []float64, n int) (rate, finest float64) {
	law := newLaw(t, polynomial{0, 1}, 0, 1)
	var l1 [2]float64
	for i := range l1 {
		cells := n << i
		run := newRun(t, law, Settings{Cells: cells, CFL: 0.4, Limiter: limiter, Injected: injected, Profile: state(cells, 0)})
		run.Advance(0.3, nil)
		l1[i], _, _ = Norms(run.Cells(), state(cells, 0.3))
	}
	return math.Log2(l1[0] / l1[1]), l1[1]
}

// Order 1 of upstream and 2 of MUSCL on smooth states; minmod and superbee lose a little
// where the second derivative jumps and at the top of the hill.
func TestOrders(t *testing.T) {
	for _, c := range []struct {
		limiter   Limiter
		low, high float64
	}{{None, 0.95, 1.05}, {Minmod, 1.8, 2.2}, {VanLeer, 1.9, 2.2}, {Superbee, 1.8, 2.2}} {
		falls, e := order(t, c.limiter, 1, ramp, 400)
		humps, eh := order(t, c.limiter, 0, hill, 400)
		t.Logf("%q: falling %.3f (%.2g), hill %.3f (%.2g)", c.limiter, falls, e, humps, eh)
		for _, rate := range []float64{falls, humps} {
			if rate < c.low || rate > c.high {
				t.Errorf("%q: order %.3f, want %g to %g", c.limiter, rate, c.low, c.high)
			}
		}
	}
}

// A rarefaction through the sonic point of Burgers' equation, f = s²/2: between -1 and 1 the
// exact state is (x - 1/2)/Q. A scheme without Godunov's extremum keeps a jump there, and an
// error of order 1 in L-infinity that no N makes smaller. The corners of the fan keep the
// order in L1 near 1; superbee bends them, and is only held to be nearer than first order.
func TestTransonicFan(t *testing.T) {
	law := newLaw(t, polynomial{0, 0, 0.5}, -1, 1)
	const q = 0.3
	exact := func(n int) []float64 {
		return between(n, func(x float64) float64 {
			x = math.Abs(x - 0.5)
			if x > q {
				return x - q/2
			}
			return x * x / (2 * q)
		})
	}
	var first float64
	for _, limiter := range every {
		var l1, linf [2]float64
		for i := range l1 {
			n := 200 << i
			start := make([]float64, n)
			for k := range start {
				start[k] = math.Copysign(1, float64(k)-float64(n)/2+0.5)
			}
			run := newRun(t, law, Settings{Cells: n, Limiter: limiter, Injected: -1, Profile: start})
			run.Advance(q, nil)
			l1[i], _, linf[i] = Norms(run.Cells(), exact(n))
		}
		rate := math.Log2(l1[0] / l1[1])
		t.Logf("%q: order %.3f, L1 %.2g, Linf %.2g", limiter, rate, l1[1], linf[1])
		if !(linf[1] < 0.05) {
			t.Errorf("%q: Linf %v: there is a jump", limiter, linf)
		}
		switch {
		case limiter == None:
			first = l1[1]
			if rate < 0.7 || rate > 1 {
				t.Errorf("first order: %.3f", rate)
			}
		case l1[1] > first/3 || limiter != Superbee && rate < 0.9:
			t.Errorf("%q: order %.3f, L1 %g beside %g at first order", limiter, rate, l1[1], first)
		}
	}
}

// The flux through a face against its definition, the least f between the states when
// they rise and the largest when they fall, by sampling. Random polynomials.
func TestFaceFlux(t *testing.T) {
	r := rand.New(rand.NewPCG(1959, 1))
	for range 300 {
		f := random(r)
		law := newLaw(t, f, 0, 1)
		for range 10 {
			a, b := r.Float64(), r.Float64()
			fa, _ := f.At(a)
			fb, _ := f.At(b)
			got := law.godunov(a, b, fa, fb)
			sign := 1.0
			if a > b {
				sign = -1
			}
			want := math.Inf(1)
			const n = 2000
			for i := range n + 1 {
				y, _ := f.At(a + (b-a)*float64(i)/n)
				want = math.Min(want, sign*y)
			}
			// Sampling falls short by the bend of f over half a step.
			if short := want - sign*got; short < -1e-14 || short > 60*math.Pow((b-a)/n, 2) {
				t.Fatalf("%v from %g to %g: %g, by sampling %g", f, a, b, got, sign*want)
			}
		}
	}
}

// random is a polynomial of degree 5, most of them with turning points and inflections.
func random(r *rand.Rand) polynomial {
	p := make(polynomial, 6)
	for i := range p {
		p[i] = r.NormFloat64()
	}
	return p
}

// Whatever the flux, at the largest CFL number allowed: no state leaves the range of
// its neighbours, total variation never grows, and nothing is lost or made.
func TestNoNewExtremaAndBalance(t *testing.T) {
	r := rand.New(rand.NewPCG(1984, 2))
	const n = 40
	for trial := range 120 {
		law := newLaw(t, random(r), 0, 1)
		if trial%3 == 0 {
			law = tabulated(t, law)
		}
		profile := make([]float64, n)
		for i := range profile {
			profile[i] = r.Float64()
			if trial%2 == 0 && i > 0 { // blocks
				profile[i] = profile[i-1]
				if r.IntN(8) == 0 {
					profile[i] = float64(r.IntN(3)) / 2
				}
			}
		}
		for _, limiter := range every {
			run := newRun(t, law, Settings{Cells: n, CFL: maxCFL(limiter), Limiter: limiter, Injected: r.Float64(), Profile: profile, Adaptive: trial%5 == 0})
			reach := 1
			if limiter != None {
				reach = 4 // two stages, each with slopes from one cell further
			}
			before := append([]float64(nil), run.u...)
			run.Advance(1, func(run *Run) bool {
				for i := 1; i <= n; i++ {
					low, high := math.Inf(1), math.Inf(-1)
					for _, s := range before[max(0, i-reach):min(n+2, i+reach+1)] {
						low, high = math.Min(low, s), math.Max(high, s)
					}
					if s := run.u[i]; s < low-4e-16 || s > high+4e-16 {
						t.Fatalf("trial %d, %q, step %d: cell %d is %.17g, its neighbours were %.17g to %.17g", trial, limiter, run.Steps(), i, s, low, high)
					}
				}
				if now, was := variation(run.u), variation(before); now > was+1e-13 {
					t.Fatalf("trial %d, %q, step %d: variation %.15g after %.15g", trial, limiter, run.Steps(), now, was)
				}
				copy(before, run.u)
				return true
			})
			// In may cancel to nearly nothing here: states of order 1 lose this much at most.
			if b := run.Balance(); !(math.Abs(b.In-b.Out-b.Stored) <= 1e-13) {
				t.Errorf("trial %d, %q: balance %+v", trial, limiter, b)
			}
		}
	}
}

func variation(u []float64) float64 {
	sum := 0.0
	for i := 1; i < len(u); i++ {
		sum += math.Abs(u[i] - u[i-1])
	}
	return sum
}

// A long flood: many thousand steps leave the balance at rounding.
func TestLongBalance(t *testing.T) {
	c := readReference(t)
	law := tabulated(t, c.law(t))
	for _, limiter := range every {
		run := newRun(t, law, Settings{Cells: 300, Limiter: limiter, Injected: c.Inputs.Injected, Initial: c.Inputs.Initial})
		run.Advance(3, nil)
		b := run.Balance()
		t.Logf("%q: %d steps, error %.2g", limiter, run.Steps(), b.Error)
		if !(math.Abs(b.Error) <= 1e-13) {
			t.Errorf("%q: balance %+v after %d steps", limiter, b, run.Steps())
		}
		near(t, "in", b.In, 3, 1e-14*3) // f is 1 at the inlet
	}
}

// Second order against the exact displacement: at least twice as near as first order. Only
// superbee is not: it makes stairs of the fan.
func TestSecondOrderFlood(t *testing.T) {
	c := readReference(t)
	d, err := displace.New(c.flow(), c.Inputs.Injected, c.Inputs.Initial)
	if err != nil {
		t.Fatal(err)
	}
	law := tabulated(t, c.law(t))
	var first float64
	for _, limiter := range every {
		var l1 [3]float64
		for i := range l1 {
			n := 100 << i
			run := newRun(t, law, Settings{Cells: n, Limiter: limiter, Injected: c.Inputs.Injected, Initial: c.Inputs.Initial})
			run.Advance(c.Inputs.PVI, nil)
			l1[i], _, _ = Norms(run.Cells(), averages(d, c.Inputs.PVI, n))
		}
		t.Logf("%q: L1 %.3g, orders %.3f %.3f", limiter, l1, math.Log2(l1[0]/l1[1]), math.Log2(l1[1]/l1[2]))
		if limiter == None {
			first = l1[2]
		} else if l1[2] > first || limiter != Superbee && l1[2] > first/2 || !(l1[2] < l1[1] && l1[1] < l1[0]) {
			t.Errorf("%q: L1 %v, first order %g", limiter, l1, first)
		}
	}
}

// Adaptive steps are less than half as many two pore volumes on, since the steep front has
// left, and the answer is as near.
func TestAdaptiveSteps(t *testing.T) {
	c := readReference(t)
	law := tabulated(t, c.law(t))
	d, err := displace.New(c.flow(), c.Inputs.Injected, c.Inputs.Initial)
	if err != nil {
		t.Fatal(err)
	}
	var steps [2]int
	var l1 [2]float64
	for i, adaptive := range []bool{false, true} {
		run := newRun(t, law, Settings{Cells: 200, Adaptive: adaptive, Injected: c.Inputs.Injected, Initial: c.Inputs.Initial})
		run.Advance(2, nil)
		steps[i] = run.Steps()
		l1[i], _, _ = Norms(run.Cells(), averages(d, 2, 200))
	}
	t.Logf("steps %v, L1 %.3g", steps, l1)
	if steps[1] > steps[0]/2 || l1[1] > 1.2*l1[0] {
		t.Errorf("steps %v, L1 %v", steps, l1)
	}
}

// The picture may follow every step, and stop.
func TestStream(t *testing.T) {
	law := newLaw(t, polynomial{0, 0, 0.5}, 0, 1)
	run := newRun(t, law, Settings{Cells: 50, Injected: 1})
	q, calls := 0.0, 0
	run.Advance(0.5, func(r *Run) bool {
		calls++
		if !(r.Q() > q) || r.Steps() != calls {
			t.Fatalf("Q %g after %g in step %d, call %d", r.Q(), q, r.Steps(), calls)
		}
		q = r.Q()
		return calls < 7
	})
	if calls != 7 {
		t.Fatalf("%d calls, want 7: it did not stop", calls)
	}
	run.Advance(0.5, nil)
	if run.Q() != 0.5 || run.Inflow() != 0.5 || run.Outflow() != 0 {
		t.Errorf("Q %.17g, flux in %g, out %g, want 0.5, 0.5, 0", run.Q(), run.Inflow(), run.Outflow())
	}
	run.Advance(0.5, func(*Run) bool { t.Error("a step without a way to go"); return false })
}

func TestStepAllocatesNothing(t *testing.T) {
	for _, f := range []polynomial{{0, 0, 1}, {0, 1, -1}} {
		for _, limiter := range every {
			run := newRun(t, newLaw(t, f, 0, 1), Settings{Limiter: limiter, Injected: 1, Adaptive: true})
			q := 0.0
			if n := testing.AllocsPerRun(20, func() { q += 0.01; run.Advance(q, nil) }); n != 0 {
				t.Errorf("%v, %q: %g allocations a step", f, limiter, n)
			}
		}
	}
}

// Closed forms: s - s² turns at 1/2; s³/3 - s²/2 + s/8 at 1/2 ± sqrt(1/8), its slope at 1/2;
// a corner of a table turns where it is.
func TestExamine(t *testing.T) {
	law := newLaw(t, polynomial{0, 1, -1}, 1, 0)
	if len(law.extrema) != 1 || law.rising {
		t.Fatalf("extrema %+v", law.extrema)
	}
	near(t, "turn", law.extrema[0].s, 0.5, 1e-15)
	near(t, "fastest", law.Fastest(0, 1), 1, 0)
	law = newLaw(t, polynomial{0, 0.125, -0.5, 1.0 / 3}, 0, 1)
	if len(law.extrema) != 2 {
		t.Fatalf("extrema %+v", law.extrema)
	}
	near(t, "lower turn", law.extrema[0].s, 0.5-math.Sqrt(0.125), 1e-15)
	near(t, "upper turn", law.extrema[1].s, 0.5+math.Sqrt(0.125), 1e-15)
	near(t, "fastest inside", law.Fastest(0.3, 0.7), 0.125, 1e-4)
	near(t, "fastest in all", law.Fastest(0, 1), 0.125, 1e-15)

	table, err := relperm.NewTable([]float64{0, 0.4, 1}, []float64{0, 0.9, 1}, []float64{1, 0.4, 0}, relperm.StraightLine)
	if err != nil {
		t.Fatal(err)
	}
	flow := fracflow.Flow{Curves: table, MuW: 1, MuO: 1, Gravity: -2}
	law = newLaw(t, flow, 0, 1)
	if len(law.extrema) != 1 || law.extrema[0].s != 0.4 {
		t.Errorf("extrema %+v, want the corner at 0.4", law.extrema)
	}
}

// A table is f to 1e-13 of its reach everywhere, next to the ends and the knots too.
func TestTabulated(t *testing.T) {
	c := readReference(t)
	flow := c.flow()
	flow.Gravity = -4 * flow.MuO
	cubic, err := relperm.NewTable([]float64{0.2, 0.31, 0.55, 0.77}, []float64{0, 0.01, 0.13, 0.33}, []float64{0.85, 0.5, 0.08, 0}, relperm.MonotoneCubic)
	if err != nil {
		t.Fatal(err)
	}
	for name, fn := range map[string]fracflow.Function{"Corey": c.flow(), "gravity": flow, "cubic": fracflow.Flow{Curves: cubic, MuW: 1e-3, MuO: 2e-3}} {
		lo, hi := fn.Ends()
		law := newLaw(t, fn, lo, hi)
		table := tabulated(t, law)
		s, exact, got := make([]float64, 50001), make([]float64, 50001), make([]float64, 50001)
		low, high := math.Inf(1), math.Inf(-1)
		for i := range s {
			u := float64(i) / 50000
			switch i % 3 { // even, and crowded at either end
			case 1:
				u = math.Pow(u, 12)
			case 2:
				u = 1 - math.Pow(u, 12)
			}
			s[i] = lo + (hi-lo)*u
		}
		law.fill(exact, s)
		table.fill(got, s)
		for _, f := range exact {
			low, high = math.Min(low, f), math.Max(high, f)
		}
		for i := range s {
			near(t, name, got[i], exact[i], 2*tableError*(high-low))
		}
	}
}

func TestRefusals(t *testing.T) {
	law := newLaw(t, polynomial{0, 1}, 0, 1)
	for says, s := range map[string]Settings{
		"-3 cells":             {Cells: -3},
		"CFL number is 1.2":    {CFL: 1.2},
		"CFL number is -1":     {CFL: -1},
		"up to 0.5 with":       {CFL: 0.6, Limiter: Minmod},
		"CFL number is NaN":    {CFL: math.NaN()},
		`limiter is "fastest"`: {Limiter: "fastest"},
		"cell 0 is 1.1":        {Injected: 1.1},
		"cell 1 is NaN":        {Initial: math.NaN()},
		"cell 2 is -0.5":       {Cells: 3, Profile: []float64{0, -0.5, 0}},
		"profile of 2 values":  {Cells: 3, Profile: []float64{0, 0}},
	} {
		if _, err := New(law, s); err == nil || !strings.Contains(err.Error(), says) {
			t.Errorf("%q: %v", says, err)
		}
	}
	for _, ends := range [][2]float64{{0.3, 0.3}, {0, math.NaN()}, {0, math.Inf(1)}} {
		if _, err := NewLaw(polynomial{0, 1}, ends[0], ends[1]); err == nil {
			t.Errorf("a law between %v", ends)
		}
	}
	dead := fracflow.Flow{Curves: relperm.Corey{Kro0: 1, Nw: 2, No: 2}, MuW: 1, MuO: 1}
	if _, err := NewLaw(dead, 0, 1); err == nil {
		t.Error("a law that is not finite")
	}
	if _, err := law.Tabulated(0); err == nil {
		t.Error("a table of no pieces")
	}
}

// counted is 1 - 1e-5 s by way of powers that lose its last digits, and how often it was asked.
type counted struct{ asked *int }

func (c counted) At(s float64) (f, dfds float64) {
	*c.asked++
	return 1 - 1e-5*math.Pow(s, 1.3) + 4e-16*math.Sin(1e9*s), -1.3e-5 * math.Pow(s, 0.3)
}

func (counted) Knots() []float64 { return nil }

// An f that hardly changes is made of rounding at 1e-13 of its reach: cutting pieces finer finds
// no end there, and the table asks f itself.
func TestTabulatedEnds(t *testing.T) {
	asked := 0
	law := newLaw(t, counted{&asked}, 0.3, 0.6)
	table := tabulated(t, law)
	if asked > 3_000_000 {
		t.Errorf("f was asked %d times", asked)
	}
	for _, s := range []float64{0.3, 0.301, 0.45, 0.6} {
		want, _ := law.at(s)
		got, _ := table.at(s)
		near(t, "nearly level", got, want, 1e-15)
	}
}
