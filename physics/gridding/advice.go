package gridding

import (
	"math"
	"slices"
)

// Tolerance is how wrong a grid may be. A limit of 0 is none.
type Tolerance struct {
	Arrival  float64 // part of the exact arrival
	Recovery float64 // pore volumes
	At       float64 // the Q at which recovery counts
}

// How says what an advice rests on.
type How string

const (
	// Verified: the grid advised was run and is within the tolerance.
	Verified How = "verified"
	// Extrapolated: no grid that could be afforded is within; the number follows from how the
	// error fell from the last grid but one to the last.
	Extrapolated How = "extrapolated"
	// TooDear: not even the coarsest grid can be afforded; nothing was run.
	TooDear How = "too dear"
	// Beyond: the error did not fall on the grids that could be afforded.
	Beyond How = "beyond"
)

// Advice is the number of cells to take.
type Advice struct {
	How       How
	Cells     int
	Measured  Measured // the run with it; when extrapolated the finest that was made
	Worse     Measured // the finest grid known to be outside; Cells 0 when none is
	Binding   string   // "arrival" or "recovery": which limit asks for the most cells
	Order     float64  // at which the error of that one fell with N, between the last two of the ladder
	Steps     float64  // of the advised grid
	CellSteps float64  // of the advised grid
	Ladder    []Measured
}

// coarsest is the first grid of the ladder.
const coarsest = 5

// excess is the larger of the errors over their limits, and which it is: a grid will do up to 1.
func (t Tolerance) excess(m Measured) (float64, string) {
	a, r := 0.0, 0.0
	if t.Arrival > 0 {
		a = math.Abs(m.ArrivalError) / t.Arrival
	}
	if t.Recovery > 0 {
		r = math.Abs(m.RecoveryError) / t.Recovery
	}
	if r > a {
		return r, "recovery"
	}
	return a, "arrival"
}

// Advise finds the least N whose run is within the tolerance: by doubling N from 5 until one is, and
// then between that and the one before by where the error, as a power of N, should meet the limit, until
// the two are within 3 %. Errors fall with N but for small jumps as a front crosses a
// face, so that a coarser grid may happen to do as well; the N found is one after which they are
// within on all finer grids that were run.
//
// affordable is the number of cell steps that the largest run may take. Where that does not reach, the order
// at which the error fell last gives N with a margin of 1 %, which is then run if ten times
// affordable is enough, up to three times. each,
// where it is not nil, gets every run as it is made and ends the search by returning false.
// Errors are those of Run.
func (f *Flood) Advise(s Scheme, t Tolerance, affordable float64, each func(Measured) bool) (Advice, error) {
	a := Advice{How: TooDear}
	if f.Cost(s, coarsest, t.At) > affordable {
		return a, nil
	}
	run := func(n int) (Measured, bool, error) {
		m, err := f.Run(s, n, t.At)
		if err != nil {
			return m, false, err
		}
		a.Ladder = append(a.Ladder, m)
		return m, each == nil || each(m), nil
	}
	var within Measured
	for n := coarsest; ; n *= 2 {
		m, more, err := run(n)
		if err != nil {
			return a, err
		}
		x, _ := t.excess(m)
		if within = (Measured{}); x <= 1 {
			within = m
		} else {
			a.Worse = m
		}
		// One more grid when the first that is within comes at once: it may be by chance.
		if x <= 1 && len(a.Ladder) > 1 || !more || 4*f.Cost(s, n, t.At) > affordable {
			break
		}
	}
	a.falling(t)
	if within.Cells == 0 {
		return f.extrapolate(a, s, t, affordable, run)
	}
	for a.Worse.Cells > 0 && float64(within.Cells) > 1.03*float64(a.Worse.Cells) && within.Cells > a.Worse.Cells+1 {
		high, _ := t.excess(within)
		low, _ := t.excess(a.Worse)
		share := 0.5
		if low > high && high > 0 {
			share = math.Log(low) / math.Log(low/high)
		}
		// A little to the safe side, and never close to an end, where little would be learned.
		share = math.Max(0.1, math.Min(0.9, share+0.05))
		n := int(math.Ceil(float64(a.Worse.Cells) * math.Pow(float64(within.Cells)/float64(a.Worse.Cells), share)))
		m, more, err := run(min(max(n, a.Worse.Cells+1), within.Cells-1))
		if err != nil {
			return a, err
		}
		if x, _ := t.excess(m); x <= 1 {
			within = m
		} else {
			a.Worse = m
		}
		if !more {
			break
		}
	}
	a.settle(Verified, within)
	return a, nil
}

func (a *Advice) settle(how How, m Measured) {
	a.How, a.Measured, a.Cells, a.Steps, a.CellSteps = how, m, m.Cells, float64(m.Steps), m.CellSteps
	slices.SortFunc(a.Ladder, func(x, y Measured) int { return x.Cells - y.Cells })
}

// falling notes which limit binds on the finest grid, and the order at which its error fell.
func (a *Advice) falling(t Tolerance) {
	last := a.Ladder[len(a.Ladder)-1]
	_, a.Binding = t.excess(last)
	if len(a.Ladder) < 2 {
		return
	}
	before := a.Ladder[len(a.Ladder)-2]
	pick := func(m Measured) float64 { return math.Abs(m.ArrivalError) }
	if a.Binding == "recovery" {
		pick = func(m Measured) float64 { return math.Abs(m.RecoveryError) }
	}
	a.Order = math.Log(pick(before)/pick(last)) / math.Log(float64(last.Cells)/float64(before.Cells))
}

func (f *Flood) extrapolate(a Advice, s Scheme, t Tolerance, affordable float64, run func(int) (Measured, bool, error)) (Advice, error) {
	last := a.Ladder[len(a.Ladder)-1]
	x, _ := t.excess(last)
	const slow = 0.1 // an order below which the error cannot be said to fall
	if !(a.Order > slow) {
		a.settle(Beyond, last)
		return a, nil
	}
	n := 0.0
	for range 3 {
		n = math.Ceil(float64(last.Cells) * math.Pow(x, 1/a.Order) * 1.01)
		if grow := n / float64(last.Cells); last.CellSteps*grow*grow > 10*affordable {
			break
		}
		m, more, err := run(int(n))
		if err != nil {
			return a, err
		}
		if x, _ = t.excess(m); x <= 1 {
			a.settle(Verified, m)
			return a, nil
		}
		a.Worse, last = m, m
		a.falling(t)
		if !(a.Order > slow) || !more {
			a.settle(Beyond, m)
			return a, nil
		}
		n = math.Ceil(float64(m.Cells) * math.Pow(x, 1/a.Order) * 1.01)
	}
	a.settle(Extrapolated, last)
	grow := n / float64(last.Cells)
	a.Cells = int(math.Min(n, 1e9))
	a.Steps, a.CellSteps = a.Steps*grow, a.CellSteps*grow*grow
	return a, nil
}

// SameSmearing is the number of cells on which the grid smears a front as much as capillarity does: where the
// mean over the front's states of the truncation's diffusion, (v dx/2)(1 - CFL), equals that of
// the capillary one. The mean slope of f over a jump is its speed v; spread is the mean of D(S)/(u L), in
// pore volumes and lengths. At CFL 1 a linear wave would not be smeared at all, and the number is 0.
// Backward Euler smears as with -CFL.
//
// Source: LeVeque (2002), sec. 8.6.
func SameSmearing(v, spread, cfl float64) float64 { return v * (1 - cfl) / (2 * spread) }
