package evidence

import (
	"math"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/fv"
)

// coarse floods the rock of case fv-01 with N cells: the mean state, the error in L1 beside the
// exact displacement, the width of the front, and the states of some cells of fifty.
func coarse() ([]float64, error) {
	const injected, initial, volume = 0.763, 0.213, 0.2
	flow := fracflow.Flow{Curves: waterWet, MuW: 0.00047, MuO: 0.00593}
	d, err := displace.New(flow, injected, initial)
	if err != nil {
		return nil, err
	}
	law, err := fv.NewLaw(flow, initial, injected)
	if err == nil {
		law, err = law.Tabulated(1024)
	}
	if err != nil {
		return nil, err
	}
	var states, errors, widths []float64
	for _, n := range []int{50, 400} {
		run, err := fv.New(law, fv.Settings{Cells: n, Injected: injected, Initial: initial})
		if err != nil {
			return nil, err
		}
		run.Advance(volume, nil)
		exact, before := make([]float64, n), 0.0
		for i := range exact {
			x := float64(i+1) / float64(n)
			up := x * d.Average(volume/x)
			exact[i], before = (up-before)*float64(n), up
		}
		l1, _, _ := fv.Norms(run.Cells(), exact)
		behind, ahead, _ := d.Front()
		width, _ := fv.FrontWidth(run.Cells(), behind, ahead)
		errors, widths = append(errors, l1), append(widths, width)
		if n == 50 {
			for _, i := range []int{0, 10, 20, 28} {
				states = append(states, run.Cells()[i])
			}
		}
	}
	return append(append(states, errors...), widths...), nil
}

var gridChecks = []Check{
	{ID: "independent-grid", Topic: "Grid", Title: "Explicit single-point upstream, 50 and 400 cells", Place: "Invented rock, case fv-01", Provenance: Independent,
		Inputs: "Corey nw 2.7, no 2.15, 0.2 PV injected, CFL number 0.5", How: "finite volumes; the error beside the exact displacement",
		Items: append(items(1e-11, independentError, "state of cell 1 of 50", 0.6918242955831475, "of cell 11", 0.5710847620664813, "of cell 21", 0.5203057997299287, "of cell 29", 0.42680992761165853),
			items(5e-9, independentError, "error in L1, 50 cells", 0.01092086147729761, "400 cells", 0.0022152534453576405,
				"width of the front, 50 cells", 0.05374425057073784, "400 cells", 0.007437581247206171)...),
		compute: coarse},
	{ID: "implicit-step", Topic: "Grid", Title: "One implicit step of any length", Place: "Backward Euler of dS/dQ + dS/dx = 0: S = (c/(1 + c))^i in cell i, c the CFL number, by hand", Provenance: Exact,
		Inputs: "a unit step enters 20 cells, c = 0.5, 1, 50", How: "implicit finite volumes",
		Items: items(1e-10, "what is left to rounding and to Newton's method", "cell 3, c = 0.5", math.Pow(0.5/1.5, 3), "cell 3, c = 1", 0.125, "cell 20, c = 50", math.Pow(50.0/51, 20)),
		compute: func() ([]float64, error) {
			law, err := fv.NewLaw(carried{}, 0, 1)
			if err != nil {
				return nil, err
			}
			var values []float64
			for _, at := range []struct {
				c    float64
				cell int
			}{{0.5, 3}, {1, 3}, {50, 20}} {
				run, err := fv.NewImplicit(fv.Medium{Law: law}, fv.ImplicitSettings{Cells: 20, Through: 1, Inlet: fv.End{Kind: fv.Fed, Share: 1}, Outlet: fv.End{Kind: fv.Open}})
				if err != nil {
					return nil, err
				}
				run.Advance(at.c/20, nil)
				values = append(values, run.Cells()[at.cell-1])
			}
			return values, nil
		}},
}

// carried is f = S: what enters is carried along at speed 1.
type carried struct{}

func (carried) At(s float64) (f, slope float64) { return s, 1 }
func (carried) Knots() []float64                { return nil }
