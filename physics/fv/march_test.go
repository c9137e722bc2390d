package fv

import (
	"math"
	"math/rand/v2"
	"testing"

	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

// Marching is the same step as by the fluxes of all faces first: whatever the states, those at the
// ends of the law and beside them too, powers of no whole number and knots included, and any number of cells.
func TestMarch(t *testing.T) {
	table, err := relperm.NewTable([]float64{0.2, 0.31, 0.55, 0.77}, []float64{0, 0.01, 0.13, 0.33}, []float64{0.85, 0.5, 0.08, 0}, relperm.MonotoneCubic)
	if err != nil {
		t.Fatal(err)
	}
	r := rand.New(rand.NewPCG(2048, 3))
	c := readReference(t)
	for name, fn := range map[string]fracflow.Function{"Corey": c.flow(), "cubic": fracflow.Flow{Curves: table, MuW: 1e-3, MuO: 2e-3}} {
		lo, hi := fn.Ends()
		law := newLaw(t, fn, lo, hi)
		for _, pieces := range []int{1, 512, 1024, 2048} {
			table, err := law.Tabulated(pieces)
			if err != nil {
				t.Fatal(err)
			}
			for n := 1; n < 300; n = 2*n + 1 {
				profile := make([]float64, n)
				for i := range profile {
					u := r.Float64()
					switch r.IntN(6) {
					case 0:
						u = 0
					case 1:
						u = 1
					case 2:
						u = math.Pow(u, 12)
					case 3:
						u = 1 - math.Pow(u, 12)
					}
					profile[i] = math.Min(hi, lo+(hi-lo)*u)
				}
				var runs [2]*Run
				for i := range runs {
					runs[i] = newRun(t, table, Settings{Cells: n, CFL: 1, Injected: hi, Profile: profile})
				}
				if runs[1].marches != (pieces < 2048) {
					t.Fatalf("%s, %d pieces: marches %v", name, pieces, runs[1].marches)
				}
				runs[0].marches = false
				for _, run := range runs {
					run.step(0.2 / float64(n))
				}
				for i, s := range runs[1].Cells() {
					near(t, name, s, runs[0].Cells()[i], 4*tableError)
				}
				near(t, name+" out", runs[1].Outflow(), runs[0].Outflow(), 2*tableError)
				near(t, name+" in", runs[1].Inflow(), runs[0].Inflow(), 0)
			}
		}
	}
}

// What has not been reached lets out exactly what it let out before, nothing as a rule, and stays as it is.
func TestMarchKeepsEnds(t *testing.T) {
	c := readReference(t)
	laws := []*Law{c.law(t)}
	r := rand.New(rand.NewPCG(2049, 3))
	for range 50 {
		lo := r.NormFloat64()
		laws = append(laws, newLaw(t, polynomial{r.Float64(), 7, 1, 0.3}, lo, lo+r.Float64()))
	}
	for _, law := range laws {
		law = tabulated(t, law)
		want := law.table.flux(law.lo)
		run := newRun(t, law, Settings{Cells: 32, Injected: law.lo, Initial: law.lo})
		run.Advance(0.1, nil)
		if !run.marches || run.Outflow() != want {
			t.Errorf("from %g: %.17g leaves, want %.17g", law.lo, run.Outflow(), want)
		}
		for _, s := range run.Cells() {
			near(t, "state", s, law.lo, 0)
		}
	}
}
