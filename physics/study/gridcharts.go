package study

import (
	"math"
	"slices"

	"brinefront/physics/gridding"
	"brinefront/physics/units"
)

// shownRuns are grids to be drawn beside the exact solution, few enough to be told apart: the coarsest,
// one between, the finest or the one advised, and the person's own.
func (g *grid) shownRuns() []gridding.Measured {
	var list []gridding.Measured
	add := func(m gridding.Measured) {
		if !slices.ContainsFunc(list, func(k gridding.Measured) bool { return k.Cells == m.Cells }) {
			list = append(list, m)
		}
	}
	if len(g.runs) > 0 {
		byCells := slices.Clone(g.runs)
		slices.SortFunc(byCells, func(a, b gridding.Measured) int { return a.Cells - b.Cells })
		last := byCells[len(byCells)-1]
		if g.advice.Cells > 0 {
			last = g.advice.Measured
		}
		add(byCells[0])
		for _, m := range byCells { // nearest the geometric mean of the two
			if m.Cells*m.Cells >= byCells[0].Cells*last.Cells {
				add(m)
				break
			}
		}
		add(last)
	}
	if g.own != nil {
		add(*g.own)
	}
	slices.SortFunc(list, func(a, b gridding.Measured) int { return a.Cells - b.Cells })
	return list
}

func cellsLabel(n int) string { return units.Format(float64(n), 6) + " cells" }

// role is the colour of the k-th grid.
func role(k int) string { return "time" + string(rune('1'+k)) }

func (g *grid) charts(s *sheet) {
	s.part.Charts = append(s.part.Charts, g.profileChart(), g.errorChart())
	for _, c := range []struct {
		id, title, label, symbol, summary string
		exact                             func(q float64) float64
		pick                              func(gridding.Sample) float64
	}{
		{"grid.waterCut", "Water cut on grids", "Water cut, reservoir", "fw", "the grids bring water early and let the cut rise as a ramp where the exact one jumps",
			func(q float64) float64 { _, f := g.flood.Exact.Outlet(q); return f }, func(m gridding.Sample) float64 { return m.Cut }},
		{"grid.recoveries", "Recovery on grids", "Recovery, of the pore volume", "R", "the grids part from the exact line when they bring water",
			g.flood.Exact.Recovery, func(m gridding.Sample) float64 { return m.Recovery }},
	} {
		s.part.Charts = append(s.part.Charts, g.history(c.id, c.title, c.label, c.symbol, c.summary, c.exact, c.pick))
	}
	if g.pseudo != nil {
		s.part.Charts = append(s.part.Charts, g.pseudoChart())
	}
}

// profileChart is saturation along the rock on grids and exactly, half-way to breakthrough.
func (g *grid) profileChart() Chart {
	d, q := g.flood.Exact, g.flood.HalfWay()
	exact := Line{ID: "exact", Label: "exact", Role: "water", Kind: "line"}
	for _, n := range d.Path() {
		if x := n.Xi * q; x <= 1 {
			exact.X, exact.Y = append(exact.X, x), append(exact.Y, n.S)
		}
	}
	exact.X, exact.Y = append(exact.X, 1), append(exact.Y, d.Initial())
	lines := []Line{exact}
	for k, m := range g.shownRuns() {
		l := Line{ID: "n" + units.Exact(float64(m.Cells)), Label: cellsLabel(m.Cells), Role: role(k), Kind: "line"}
		if m.Cells <= 40 {
			l.Kind = "points"
		}
		for i, sw := range m.Profile {
			l.X, l.Y = append(l.X, (float64(i)+0.5)/float64(m.Cells)), append(l.Y, sw)
		}
		lines = append(lines, l)
	}
	return Chart{ID: "grid.profiles", Title: "Profile when half of what brings breakthrough is injected", X: axis("Distance from the injector, part of the length", "x/L", units.Number).from(0, 1), Y: saturationAxis, Lines: lines, Marks: []Mark{},
		Summary: "Water saturation between the wells: the exact front is a step, which a grid smears over the more of the length the fewer cells it has."}
}

// errorChart is how the errors fall with the number of cells.
func (g *grid) errorChart() Chart {
	runs := slices.Clone(g.runs)
	slices.SortFunc(runs, func(a, b gridding.Measured) int { return a.Cells - b.Cells })
	cells := make([]int, len(runs))
	arrival, recovery, profile := make([]float64, len(runs)), make([]float64, len(runs)), make([]float64, len(runs))
	for i, m := range runs {
		cells[i], arrival[i], recovery[i], profile[i] = m.Cells, m.ArrivalError, m.RecoveryError, m.L1
	}
	return errorsOn("grid.errors", "Error against the number of cells", "Cells between the wells", cells,
		"On logarithmic axes the errors of arrival, of recovery and of the profile fall along nearly straight lines with the number of cells; where they pass the tolerance is the number advised.",
		measuredError{"arrival", "arrival", "water", arrival, g.tolerance.Arrival}, measuredError{"recovery", "recovery", "oil", recovery, g.tolerance.Recovery}, measuredError{"profile", "profile, mean", "total", profile, 0})
}

// measuredError is an error on each grid, and what it may be; within 0 it is not asked about.
type measuredError struct {
	id, label, role string
	on              []float64
	within          float64
}

// errorsOn is how errors fall with the number of cells.
func errorsOn(id, title, label string, cells []int, summary string, errors ...measuredError) Chart {
	c := Chart{ID: id, Title: title, X: Axis{Label: label, Symbol: "N", Quantity: units.Number, Log: true, CanLog: true},
		Y: Axis{Label: "Error", Symbol: "e", Quantity: units.Share, Log: true, CanLog: true}, Marks: []Mark{}, Lines: []Line{}, Summary: summary}
	last := 0.0
	for _, k := range errors {
		l := Line{ID: k.id, Label: k.label, Role: k.role, Kind: "line"}
		for i, n := range cells {
			if e := math.Abs(k.on[i]); e > 1e-9 && !math.IsInf(e, 0) && !math.IsNaN(e) {
				l.X, l.Y = append(l.X, float64(n)), append(l.Y, e)
				last = math.Max(last, float64(n))
			}
		}
		if len(l.X) > 0 {
			c.Lines = append(c.Lines, l)
		}
	}
	for _, k := range errors {
		if k.within > 0 && len(cells) > 0 && last > float64(cells[0]) {
			c.Lines = append(c.Lines, Line{ID: k.id + "Within", Label: k.label + " within", Role: "aid", Kind: "dashed", X: []float64{float64(cells[0]), last}, Y: []float64{k.within, k.within}})
		}
	}
	return c
}

// history is one quantity of the stream against volume injected.
func (g *grid) history(id, title, label, symbol, summary string, exact func(float64) float64, pick func(gridding.Sample) float64) Chart {
	line := Line{ID: "exact", Label: "exact", Role: "water", Kind: "line"}
	for _, q := range injections(g.flood.Exact, g.tolerance.At) {
		if q > 0 {
			line.X, line.Y = append(line.X, q), append(line.Y, exact(q))
		}
	}
	lines := []Line{line}
	for k, m := range g.shownRuns() {
		l := Line{ID: "n" + units.Exact(float64(m.Cells)), Label: cellsLabel(m.Cells), Role: role(k), Kind: "line"}
		for _, h := range m.History {
			l.X, l.Y = append(l.X, h.Q), append(l.Y, pick(h))
		}
		lines = append(lines, l)
	}
	y := axis(label, symbol, units.Share).from(0, 1)
	return Chart{ID: id, Title: title, X: axis("Injected", "Q", units.PoreVolumes), Y: y.holding(lines), Lines: lines, Marks: []Mark{},
		Summary: label + " against volume injected, exactly and on grids: " + summary + "."}
}

// pseudoChart is the pseudo-functions of three blocks beside the rock's own fractional flow.
func (g *grid) pseudoChart() Chart {
	d := g.flood.Exact
	low, high := g.front.flow.Ends()
	own := Line{ID: "rock", Label: "rock", Role: "water", Kind: "dashed"}
	for _, sw := range saturations(math.Max(low, d.Initial()), math.Min(high, d.Injected()), nil) {
		f, _ := g.front.flow.At(sw)
		own.X, own.Y = append(own.X, sw), append(own.Y, f)
	}
	lines := []Line{own}
	last := len(g.pseudo.Blocks) - 1
	for k, b := range slices.Compact([]int{0, last / 2, last}) {
		c := g.pseudo.Blocks[b]
		lines = append(lines, Line{ID: "block" + units.Exact(float64(b+1)), Label: "block " + units.Exact(float64(b+1)), Role: role(k), Kind: "line", X: c.S, Y: c.F})
	}
	return Chart{ID: "grid.pseudo", Title: "Pseudo-functions of the coarse grid", X: saturationAxis, Y: axis("Water cut leaving the block", "fw", units.Share).from(0, 1), Lines: lines, Marks: []Mark{},
		Summary: "What leaves a block against its mean saturation, for the first, a middle and the last block: nothing until the front has crossed the block, then a steep rise; the rock's own curve lets water through from the start."}
}
