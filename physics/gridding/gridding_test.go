package gridding

import (
	"math"
	"math/rand/v2"
	"testing"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/fv"
	"brinefront/physics/relperm"
)

func near(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance) {
		t.Errorf("%s = %.15g, want %.15g: off by %.2g, allowed %.2g", what, got, want, got-want, tolerance)
	}
}

// waterflood is the rock of case fv-01, an independent SciPy computation.
func waterflood() fracflow.Flow {
	return fracflow.Flow{Curves: relperm.Corey{Swc: 0.213, Sor: 0.237, Krw0: 0.327, Kro0: 0.861, Nw: 2.7, No: 2.15}, MuW: 0.00047, MuO: 0.00593}
}

// straight flow: f = S, a jump that travels at speed 1.
func straightFlow() fracflow.Flow {
	return fracflow.Flow{Curves: relperm.Corey{Krw0: 1, Kro0: 1, Nw: 1, No: 1}, MuW: 1, MuO: 1}
}

func newFlood(t testing.TB, flow fracflow.Flow, level float64) *Flood {
	t.Helper()
	lo, hi := flow.Ends()
	f, err := newOn(flow, hi, lo, level)
	if err != nil {
		t.Fatal(err)
	}
	return f
}

func newOn(flow fracflow.Flow, injected, initial, level float64) (*Flood, error) {
	d, err := displace.New(flow, injected, initial)
	if err != nil {
		return nil, err
	}
	return New(d, flow, level)
}

func runOn(t testing.TB, f *Flood, s Scheme, n int, q float64) Measured {
	t.Helper()
	m, err := f.Run(s, n, q)
	if err != nil {
		t.Fatal(err)
	}
	return m
}

var schemes = []Scheme{{}, {CFL: 0.9}, {Limiter: fv.Minmod}, {Limiter: fv.VanLeer}, {Implicit: true, CFL: 1}, {Implicit: true, CFL: 20}}

// Across a shock the error in L1 falls with the order 0.5 to 1 of first-order schemes and no more
// than some 1 with a limiter; nothing is lost, and the errors of arrival and recovery fall too.
func TestErrorsFall(t *testing.T) {
	f := newFlood(t, waterflood(), 0.01)
	near(t, "arrival", f.Arrival(), f.Exact.Breakthrough(), 1e-12)
	for _, s := range schemes {
		var before Measured
		for _, n := range []int{80, 160, 320} {
			m := runOn(t, f, s, n, 1)
			if math.Abs(m.Balance.Error) > 1e-13 {
				t.Errorf("%+v, %d cells: balance %+v", s, n, m.Balance)
			}
			if before.Cells > 0 {
				order := math.Log2(before.L1 / m.L1)
				t.Logf("%+v, %d cells: L1 %.3g, order %.2f, arrival %.2g, recovery %.2g", s, n, m.L1, order, m.ArrivalError, m.RecoveryError)
				if order < 0.5 || order > 1.3 || math.Abs(m.ArrivalError) >= math.Abs(before.ArrivalError) || math.Abs(m.RecoveryError) >= math.Abs(before.RecoveryError) {
					t.Errorf("%+v, %d cells: order %.3f, arrival %g after %g, recovery %g after %g", s, n, order, m.ArrivalError, before.ArrivalError, m.RecoveryError, before.RecoveryError)
				}
			}
			if before = m; m.ArrivalError >= 0 {
				t.Errorf("%+v, %d cells: smearing brings water late: %g", s, n, m.ArrivalError)
			}
		}
	}
}

// Closed form: a jump carried at speed 1 is smeared to an error function whose variance at
// the outlet is dx (1 - CFL), or dx (1 + CFL) implicitly: a hundredth of it arrives early by
// 2.3263 standard deviations (the 1 % quantile of the normal distribution).
func TestArrivalIsThatOfDiffusion(t *testing.T) {
	f := newFlood(t, straightFlow(), 0.01)
	for _, c := range []struct {
		s      Scheme
		spread float64
	}{{Scheme{CFL: 0.5}, 0.5}, {Scheme{CFL: 0.1}, 0.9}, {Scheme{Implicit: true, CFL: 1}, 2}, {Scheme{Implicit: true, CFL: 4}, 5}} {
		const n = 1000
		m := runOn(t, f, c.s, n, 0.5)
		near(t, "early", -m.ArrivalError, 2.3263*math.Sqrt(c.spread/n), 0.06*2.3263*math.Sqrt(c.spread/n))
	}
}

// Where the smearing of the grid is that of capillarity by the formula, water arrives as early in the one
// as in the other: a fine run with the capillary diffusion beside a coarse run without.
func TestSameSmearing(t *testing.T) {
	const spread = 0.002
	f := newFlood(t, straightFlow(), 0.01)
	n := int(math.Round(SameSmearing(1, spread, 0.5)))
	if n != 125 {
		t.Fatalf("%d cells, want (1 - 0.5)/(2 0.002) = 125", n)
	}
	coarse := runOn(t, f, Scheme{}, n, 0.5)
	k, err := fv.NewPotential(func(float64) float64 { return spread }, 0, 1, nil)
	if err != nil {
		t.Fatal(err)
	}
	fine, err := fv.NewImplicit(fv.Medium{Law: f.law, Potential: k}, fv.ImplicitSettings{Cells: 500, Through: 1, Inlet: fv.End{Kind: fv.Fed, Share: 1}, Outlet: fv.End{Kind: fv.Open}, Error: 1e-5, SecondOrder: true})
	if err != nil {
		t.Fatal(err)
	}
	arrived := 0.0
	fine.Advance(1, func(r *fv.Implicit) bool { arrived = r.T(); return r.Outflow() < 0.01 })
	t.Logf("grid %.4g, capillarity %.4g", coarse.Arrival, arrived)
	near(t, "arrival", coarse.Arrival, arrived, 0.02)
}

// What is advised was run and is within; what was found too coarse is outside and next to it.
func TestAdvice(t *testing.T) {
	r := rand.New(rand.NewPCG(6, 2026))
	for trial := range 25 {
		kr := relperm.Corey{Swc: 0.3 * r.Float64(), Sor: 0.3 * r.Float64(), Krw0: 0.2 + 0.8*r.Float64(), Kro0: 1, Nw: 1.3 + 3*r.Float64(), No: 1.3 + 3*r.Float64()}
		f := newFlood(t, fracflow.Flow{Curves: kr, MuW: 1, MuO: math.Pow(10, 2*r.Float64())}, 0.01)
		tolerance := Tolerance{Arrival: 0.03 + 0.1*r.Float64(), Recovery: 0.003 + 0.02*r.Float64(), At: 0.3 + r.Float64()}
		runs := 0
		a, err := f.Advise(schemes[trial%4], tolerance, 1e6, func(Measured) bool { runs++; return true })
		if err != nil {
			t.Fatal(err)
		}
		m := a.Measured
		// Past At a run goes on in tenths of the arrival until water is there, each of them rounding its steps up.
		pieces := 0.0
		if late := f.Arrival() - tolerance.At; late > 0 {
			pieces = math.Ceil(10*late/f.Arrival()) * f.Cost(m.Scheme, m.Cells, 0) / math.Ceil(f.Arrival()/f.Step(m.Scheme, m.Cells))
		}
		if cost := f.Cost(m.Scheme, m.Cells, tolerance.At); math.Abs(cost-m.CellSteps) > 0.05*m.CellSteps+pieces && !m.Scheme.Implicit {
			t.Errorf("trial %d: a run of %g cell steps, expected %g", trial, m.CellSteps, cost)
		}
		within := func(m Measured) bool {
			return math.Abs(m.ArrivalError) <= tolerance.Arrival && math.Abs(m.RecoveryError) <= tolerance.Recovery
		}
		if a.How != Verified || m.Cells != a.Cells || !within(m) || runs != len(a.Ladder) {
			t.Errorf("trial %d: %s, %d cells, run on %d: %g of %g, %g of %g", trial, a.How, a.Cells, m.Cells, m.ArrivalError, tolerance.Arrival, m.RecoveryError, tolerance.Recovery)
		}
		if w := a.Worse; w.Cells > 0 && (within(w) || w.Cells >= a.Cells || float64(a.Cells) > 1.03*float64(w.Cells) && a.Cells > w.Cells+1) {
			t.Errorf("trial %d: %d cells are said to be too few for %d", trial, w.Cells, a.Cells)
		}
	}
}

// What cannot be afforded is extrapolated, and a run on the number found is within a tenth of the limit.
func TestExtrapolatedAdvice(t *testing.T) {
	f := newFlood(t, waterflood(), 0.01)
	a, err := f.Advise(Scheme{}, Tolerance{Arrival: 0.006, At: 0.5}, 1e4, nil)
	if err != nil {
		t.Fatal(err)
	}
	if a.How != Extrapolated {
		t.Fatalf("%s with %d cells", a.How, a.Cells)
	}
	m := runOn(t, f, Scheme{}, a.Cells, 0.5)
	t.Logf("%d cells from %d at order %.2f: %g", a.Cells, a.Measured.Cells, a.Order, m.ArrivalError)
	near(t, "error", math.Abs(m.ArrivalError), 0.006, 0.0006)
	near(t, "cost", a.CellSteps, m.CellSteps, 0.02*m.CellSteps)
}

// Where not even five cells can be afforded nothing is run, and that is said.
func TestTooDear(t *testing.T) {
	f := newFlood(t, waterflood(), 0.01)
	a, err := f.Advise(Scheme{}, Tolerance{Arrival: 0.05, At: 1}, 100, nil)
	if err != nil || a.How != TooDear || a.Cells != 0 || len(a.Ladder) != 0 {
		t.Errorf("%+v, %v", a, err)
	}
}

// The search ends when it is told to.
func TestAdviceStops(t *testing.T) {
	f := newFlood(t, waterflood(), 0.01)
	a, err := f.Advise(Scheme{}, Tolerance{Arrival: 1e-3, At: 0.5}, 1e6, func(m Measured) bool { return m.Cells < 20 })
	if err != nil || len(a.Ladder) != 3 || a.How == Verified {
		t.Errorf("%d runs, %s, %v", len(a.Ladder), a.How, err)
	}
}

// A coarse grid with pseudo-functions says what the fine run they were made from says; with the rock's own
// curves it is far off. Curves rise, and so do the mobilities they part into.
func TestPseudos(t *testing.T) {
	f := newFlood(t, waterflood(), 0.01)
	for _, blocks := range []int{3, 8, 20} {
		p, err := f.Pseudos(Scheme{}, blocks, 400/blocks, 1)
		if err != nil {
			t.Fatal(err)
		}
		for _, m := range []Measured{p.Before, p.After, p.Single} {
			t.Logf("%d blocks: arrival %.3g beside %.3g, recovery %.4g beside %.4g", blocks, m.Arrival, p.Fine.Arrival, m.Recovery, p.Fine.Recovery)
			if math.Abs(m.Balance.Error) > 1e-13 {
				t.Errorf("balance %+v", m.Balance)
			}
		}
		off := func(m Measured) (float64, float64) {
			return math.Abs(m.Arrival/p.Fine.Arrival - 1), math.Abs(m.Recovery - p.Fine.Recovery)
		}
		before, missed := off(p.Before)
		after, left := off(p.After)
		if after > before/10 || left > missed/10 {
			t.Errorf("%d blocks: arrival off by %g after %g, recovery by %g after %g", blocks, after, before, left, missed)
		}
		for b, c := range p.Blocks {
			for i := range c.S {
				near(t, "f from the mobilities", c.Krw[i]/(c.Krw[i]+c.Kro[i]), c.F[i], 1e-12)
				if i > 0 && (c.S[i] <= c.S[i-1] || c.F[i] < c.F[i-1]) {
					t.Fatalf("block %d: (%g, %g) after (%g, %g)", b, c.S[i], c.F[i], c.S[i-1], c.F[i-1])
				}
			}
		}
	}
}

func TestRefusals(t *testing.T) {
	flow := waterflood()
	for _, c := range [][3]float64{{0.213, 0.7, 0.5}, {0.763, 0.213, 1.5}, {0.763, 0.213, -1}, {0.5, 0.5, 0.01}} {
		if _, err := newOn(flow, c[0], c[1], c[2]); err == nil {
			t.Errorf("injected %g, initial %g, level %g", c[0], c[1], c[2])
		}
	}
	f := newFlood(t, flow, 0.01)
	if _, err := f.Run(Scheme{CFL: 1.5}, 10, 1); err == nil {
		t.Error("CFL 1.5")
	}
	if _, err := f.Run(Scheme{}, -1, 1); err == nil {
		t.Error("-1 cells")
	}
}
