package study

import (
	"math"
	"strconv"

	"brinefront/physics/gridding"
	"brinefront/physics/units"
)

func (g *grid) notes(s *sheet) {
	s.note(Note{ID: "grid.line", Level: "remark", Text: "The advice is for cells in line with the flow, between one injector and one producer, all of one length.",
		Cause: "A grid at an angle to the flow, unequal cells and cells above one another err in other ways; wells need finer cells than the rock between them.", Do: "Take the number as the least along each path from injector to producer."})
	if g.scheme.Implicit {
		s.note(Note{ID: "grid.stability", Level: "remark", Text: "The implicit scheme is stable at any step, and the longer the step, the more it smears: as the diffusion (v Δx/2)(1 + CFL).", Cause: "LeVeque (2002), sec. 8.6, with the step backward.", Do: "Shorten the step as well as the cells."})
	} else {
		s.note(Note{ID: "grid.stability", Level: "remark", Text: "Stable up to a CFL number of " + map[bool]string{true: "1", false: "0.5"}[g.scheme.Limiter == ""] + "; no cell then leaves the range of its neighbours. At first order the grid smears as the diffusion (v Δx/2)(1 − CFL) would.", Cause: "Crandall & Majda (1980); Perthame & Shu (1996); LeVeque (2002), sec. 8.6.", Do: "Longer steps are refused."})
	}
	worst := 0.0
	for _, m := range g.all() {
		worst = math.Max(worst, math.Abs(m.Balance.Error))
	}
	if len(g.runs) > 0 {
		s.note(Note{ID: "grid.balance", Level: "remark", Text: "What went in, came out and stayed agrees to " + units.Format(worst, 2) + " of the largest of them on all " + strconv.Itoa(len(g.all())) + " runs.", Cause: "What leaves a cell enters the next; the rest is rounding.", Do: "Take the errors in the tables as those of the grid: no volume is lost."})
	}
	switch g.advice.How {
	case gridding.Extrapolated:
		s.note(Note{ID: "grid.extrapolated", Level: "caution", Text: "The number of cells is extrapolated from the order at which the error fell; no run on it was made.",
			Cause: "So fine a grid takes too long to be run here.", Do: "Take it as a guide within some 10 %, or ask for less.", Paths: []string{"grid.arrivalWithin", "grid.recoveryWithin"}})
	case gridding.TooDear:
		s.note(Note{ID: "grid.tooDear", Level: "caution", Text: "No grid was run for advice: the fastest wave crosses the rock " + units.Format(g.flood.Fastest(), 3) + " times a pore volume, and steps short enough for it are too many.",
			Cause: "An explicit scheme may not step further than its fastest wave crosses a cell.", Do: "Choose the implicit scheme and a larger CFL number.", Paths: []string{"grid.scheme", "grid.cfl"}})
	case gridding.Beyond:
		s.note(Note{ID: "grid.beyond", Level: "caution", Text: "The error did not fall on the last grids that were run: no number of cells is advised.",
			Cause: "Two errors may cancel on a coarse grid, or the scheme settles slowly on this curve.", Do: "Look at the errors in the picture, or choose another scheme.", Paths: []string{"grid.scheme", "grid.arrivalWithin"}})
	}
	if n, given := s.input("grid.cells"); given && g.advice.Cells > 0 && g.own == nil {
		s.note(Note{ID: "grid.ownTooFine", Level: "caution", Text: "Your grid of " + units.Format(n, 6) + " cells was not run: it would take too long at this CFL number.",
			Cause: "The cost grows with the square of the number of cells.", Do: "Raise the CFL number, or look at the picture of the errors.", Paths: []string{"grid.cells", "grid.cfl"}})
	}
	switch {
	case g.pseudo != nil:
		s.note(Note{ID: "grid.pseudoLimits", Level: "remark", Text: "The pseudo-functions hold for this displacement only: these states, this ratio of viscosities, this number of blocks, each curve in its own place.",
			Cause: "They carry the arrival of this very front in their shape. One curve for all blocks does less well, as the table shows.", Do: "Make them anew when the rate, the wells, the grid or the fluids change; check them where the flow turns.", Paths: []string{"grid.blocks"}})
	case g.without != nil:
		s.note(Note{ID: "grid.noPseudo", Level: "remark", Text: "There are no pseudo-functions for this displacement: the water cut falls with saturation somewhere.",
			Cause: "A phase flows back there, so that what leaves a block does not follow from the block alone.", Do: "Use a finer grid.", Paths: []string{"front.dip"}})
	}
}

// all are the runs that have been made.
func (g *grid) all() []gridding.Measured {
	list := append([]gridding.Measured{}, g.runs...)
	if g.own != nil {
		list = append(list, *g.own)
	}
	list = append(list, g.steps...)
	if g.pseudo != nil {
		list = append(list, g.pseudo.Fine, g.pseudo.Before, g.pseudo.After, g.pseudo.Single)
	}
	return list
}
