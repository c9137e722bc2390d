package study

import (
	"math"
	"slices"

	"brinefront/physics/gridding"
	"brinefront/physics/units"
)

// measuredTable lists runs, with what tells them apart in the first columns.
func (g *grid) measuredTable(id, title string, runs []gridding.Measured, first ...Column) Grid {
	cells := Column{Label: "Cells", Symbol: "N", Quantity: units.Number}
	steps := Column{Label: "Steps", Quantity: units.Number}
	cost := Column{Label: "Cell evaluations", Quantity: units.Number}
	arrival := Column{Label: "Arrival", Symbol: "Qa", Quantity: units.PoreVolumes}
	early := Column{Label: "Arrival, error", Quantity: units.Share}
	recovery := Column{Label: "Recovery, error, of the pore volume", Quantity: units.Share}
	cut := Column{Label: "Water cut, error", Quantity: units.Share}
	profile := Column{Label: "Profile, mean error", Quantity: units.Fraction}
	balance := Column{Label: "Mass balance, error", Quantity: units.Number}
	for _, m := range runs {
		cells.Values, steps.Values, cost.Values = append(cells.Values, float64(m.Cells)), append(steps.Values, float64(m.Steps)), append(cost.Values, m.CellSteps)
		word := ""
		if math.IsInf(m.Arrival, 0) {
			word, m.Arrival, m.ArrivalError = "not by twice the exact one", 0, 0
		}
		arrival.Values, arrival.Words = append(arrival.Values, m.Arrival), append(arrival.Words, word)
		early.Values, early.Words = append(early.Values, m.ArrivalError), append(early.Words, word)
		recovery.Values, cut.Values = append(recovery.Values, m.RecoveryError), append(cut.Values, m.CutError)
		profile.Values, balance.Values = append(profile.Values, m.L1), append(balance.Values, m.Balance.Error)
	}
	return Grid{ID: id, Title: title, Columns: append(first, cells, steps, cost, arrival, early, recovery, cut, profile, balance)}
}

func (g *grid) tables(s *sheet) {
	if len(g.runs) > 0 {
		runs := slices.Clone(g.runs)
		if g.own != nil {
			runs = append(runs, *g.own)
		}
		slices.SortFunc(runs, func(a, b gridding.Measured) int { return a.Cells - b.Cells })
		runs = slices.CompactFunc(runs, func(a, b gridding.Measured) bool { return a.Cells == b.Cells })
		s.part.Tables = append(s.part.Tables, g.measuredTable("grid.runs", "Grids that were run, beside the exact solution", runs))
	}
	if len(g.steps) > 0 {
		kind := Column{Label: "Upstream scheme", Quantity: units.Number}
		cfl := Column{Label: "CFL number", Quantity: units.Number}
		for _, m := range g.steps {
			word := "explicit"
			if m.Scheme.Implicit {
				word = "implicit"
			}
			kind.Words, cfl.Values = append(kind.Words, word), append(cfl.Values, m.Scheme.CFL)
		}
		s.part.Tables = append(s.part.Tables, g.measuredTable("grid.steps", "The same grid with other steps", g.steps, kind, cfl))
	}
	if p := g.pseudo; p != nil {
		what := Column{Label: "Curves", Quantity: units.Number, Words: []string{"of the rock, fine grid", "of the rock", "a pseudo-function for each block", "that of the last block in all"}}
		s.part.Tables = append(s.part.Tables, g.measuredTable("grid.coarse", "The coarse grid with and without pseudo-functions", []gridding.Measured{p.Fine, p.Before, p.After, p.Single}, what), g.pseudoTable())
	}
}

// pseudoTable holds the curves to be carried into a simulator: relative permeabilities whose
// mobilities are those of the blocks.
func (g *grid) pseudoTable() Grid {
	block := Column{Label: "Block, from the injector", Quantity: units.Number}
	sw := Column{Label: "Sw, mean of the block", Symbol: "Sw", Quantity: units.Fraction}
	fw := Column{Label: "Water cut leaving it", Symbol: "fw", Quantity: units.Share}
	krw := Column{Label: "krw", Symbol: "krw", Quantity: units.Fraction}
	kro := Column{Label: "kro", Symbol: "kro", Quantity: units.Fraction}
	for b, c := range g.pseudo.Blocks {
		// Enough of the points for a simulator to read by straight lines: where f turns, all of them.
		kept := ruled(c.S, c.F)
		for _, i := range kept {
			block.Values, sw.Values, fw.Values = append(block.Values, float64(b+1)), append(sw.Values, c.S[i]), append(fw.Values, c.F[i])
			krw.Values, kro.Values = append(krw.Values, c.Krw[i]*g.front.flow.MuW), append(kro.Values, c.Kro[i]*g.front.flow.MuO)
		}
	}
	return Grid{ID: "grid.pseudoFunctions", Title: "Pseudo-functions, block by block", Columns: []Column{block, sw, fw, krw, kro}}
}

// ruled picks points of a curve from which straight lines miss it by no more than a
// thousandth of its reach, as a ruler laid along it would: the ends and, between two that are
// kept, the point farthest off, over and over. Ramer (1972).
func ruled(x, y []float64) []int {
	const off = 1e-3
	kept := []int{0}
	var part func(a, b int)
	part = func(a, b int) {
		worst, at := off, -1
		for i := a + 1; i < b; i++ {
			if e := math.Abs(y[a] + (y[b]-y[a])*(x[i]-x[a])/(x[b]-x[a]) - y[i]); e > worst {
				worst, at = e, i
			}
		}
		if at > 0 {
			part(a, at)
			part(at, b)
			return
		}
		kept = append(kept, b)
	}
	part(0, len(x)-1)
	return kept
}
