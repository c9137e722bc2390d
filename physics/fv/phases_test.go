package fv

import (
	"math"
	"math/rand/v2"
	"slices"
	"testing"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

func phasesOf(flow fracflow.Flow) Phases {
	return func(s float64) (w, dw, o, do float64) {
		p := flow.Curves.At(s)
		return p.Krw / flow.MuW, p.DKrw / flow.MuW, p.Kro / flow.MuO, p.DKro / flow.MuO
	}
}

func byPhase(t testing.TB, flow fracflow.Flow) *Law {
	t.Helper()
	lo, hi := flow.Ends()
	law, err := newLaw(t, flow, lo, hi).ByPhase(phasesOf(flow), flow.Gravity)
	if err != nil {
		t.Fatal(err)
	}
	return law
}

// Water up-dip and down-dip so slowly that the phases flow against each other: upwinding by phase comes to
// the exact solution as Godunov's flux does, from further off.
func TestByPhaseConverges(t *testing.T) {
	kr := relperm.Corey{Swc: 0.17, Sor: 0.21, Krw0: 0.4, Kro0: 0.8, Nw: 2.3, No: 1.9}
	for _, gravity := range []float64{4e-3, -4e-3} {
		flow := fracflow.Flow{Curves: kr, MuW: 5e-4, MuO: 1e-3, Gravity: gravity}
		lo, hi := flow.Ends()
		d, err := displace.New(flow, hi, lo)
		if err != nil {
			t.Fatal(err)
		}
		q := 0.5 / d.FrontSpeed()
		godunov, phase := newLaw(t, flow, lo, hi), byPhase(t, flow)
		var before [2]float64
		for i, n := range []int{100, 200, 400} {
			for k, law := range []*Law{godunov, phase} {
				run := newRun(t, law, Settings{Cells: n, Injected: hi, Initial: lo})
				run.Advance(q, nil)
				l1, _, _ := Norms(run.Cells(), averages(d, q, n))
				t.Logf("N %g, %d cells, law %d: L1 %.3g", gravity, n, k, l1)
				if i > 0 && !(l1 < 0.75*before[k]) {
					t.Errorf("N %g, %d cells, law %d: L1 %g after %g", gravity, n, k, l1, before[k])
				}
				before[k] = l1
				if b := run.Balance(); math.Abs(b.Error) > 1e-13 {
					t.Errorf("balance %+v", b)
				}
			}
		}
	}
}

// At the largest CFL number allowed no state leaves the range of its neighbours.
func TestByPhaseMakesNoExtrema(t *testing.T) {
	r := rand.New(rand.NewPCG(1991, 8))
	for trial := range 60 {
		kr := relperm.Corey{Krw0: 1, Kro0: 1, Nw: 1 + 3*r.Float64(), No: 1 + 3*r.Float64()}
		law := byPhase(t, fracflow.Flow{Curves: kr, MuW: 1, MuO: 0.2 + 5*r.Float64(), Gravity: 20 * r.NormFloat64()})
		const n = 40
		profile := make([]float64, n)
		for i := range profile {
			profile[i] = r.Float64()
		}
		run := newRun(t, law, Settings{Cells: n, CFL: 1, Injected: 1, Profile: profile})
		before := slices.Clone(run.u)
		run.Advance(0.5, func(run *Run) bool {
			for i := 1; i <= n; i++ {
				low, high := slices.Min(before[i-1:i+2]), slices.Max(before[i-1:i+2])
				if s := run.u[i]; s < low-1e-14 || s > high+1e-14 {
					t.Fatalf("trial %d, step %d: cell %d is %.17g, its neighbours were %.17g to %.17g", trial, run.Steps(), i, s, low, high)
				}
			}
			copy(before, run.u)
			return run.Steps() < 200
		})
	}
}

func TestByPhaseRefusesAnotherLaw(t *testing.T) {
	flow := fracflow.Flow{Curves: relperm.Corey{Krw0: 1, Kro0: 1, Nw: 2, No: 2}, MuW: 1, MuO: 2}
	if _, err := newLaw(t, polynomial{0, 1}, 0, 1).ByPhase(phasesOf(flow), 0); err == nil {
		t.Error("phases of another law")
	}
}

// Cells that all have one law are a run with that law; a number of cells that has no laws is refused,
// and so is a law that falls.
func TestChain(t *testing.T) {
	c := readReference(t)
	law := tabulated(t, c.law(t))
	settings := Settings{Cells: 30, Injected: c.Inputs.Injected, Initial: c.Inputs.Initial}
	chain, err := Chain(law, slices.Repeat([]*Law{law}, 30))
	if err != nil {
		t.Fatal(err)
	}
	one, other := newRun(t, law, settings), newRun(t, chain, settings)
	one.Advance(0.4, nil)
	other.Advance(0.4, nil)
	for i, s := range one.Cells() {
		near(t, "cell", other.Cells()[i], s, 1e-12)
	}
	settings.Cells = 31
	if _, err := New(chain, settings); err == nil {
		t.Error("31 cells with laws for 30")
	}
	if _, err := Chain(newLaw(t, polynomial{0, 1, -1}, 0, 1), nil); err == nil {
		t.Error("a law that falls")
	}
}

// A law of points is the straight lines between them: beside one that was examined.
func TestPoints(t *testing.T) {
	s, f := []float64{0.2, 0.3, 0.5, 0.8}, []float64{0, 0, 0.7, 1}
	law, err := Points(s, f, 0.2, 0.8)
	if err != nil {
		t.Fatal(err)
	}
	near(t, "fastest", law.Fastest(0.2, 0.8), 3.5, 1e-15)
	near(t, "fastest of the upper part", law.Fastest(0.6, 0.8), 1, 1e-15)
	got := make([]float64, 3)
	law.fill(got, []float64{0.25, 0.4, 0.9})
	for i, want := range []float64{0, 0.35, 1} {
		near(t, "f", got[i], want, 1e-15)
	}
	for _, c := range [][2][]float64{{{0}, {0}}, {{0, 1}, {0}}, {{0, 0}, {0, 1}}, {{0, 1}, {1, 0}}, {{0, math.NaN()}, {0, 1}}} {
		if _, err := Points(c[0], c[1], 0, 1); err == nil {
			t.Errorf("points %v", c)
		}
	}
}
