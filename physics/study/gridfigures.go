package study

import (
	"math"

	"brinefront/physics/gridding"
	"brinefront/physics/ref"
	"brinefront/physics/reservoir"
	"brinefront/physics/units"
)

// tell says what is known so far.
func (g *grid) tell(s *sheet) {
	g.figures(s)
	g.charts(s)
	g.tables(s)
	g.notes(s)
	if g.section != nil {
		g.section.tell(s, g)
	}
	if g.matrix != nil {
		g.matrix.tell(s, g)
	}
	g.sentence(s)
}

// method says how a scheme steps.
func (g *grid) method() (string, []ref.ID) {
	switch {
	case g.scheme.Implicit:
		return "backward Euler, single-point upstream, each step solved by Newton's method from cell to cell or, against gravity, on a tridiagonal system", []ref.ID{ref.Godunov1959, ref.Jenny2009}
	case g.scheme.Limiter != "":
		return "explicit, a limited straight line in each cell (" + string(g.scheme.Limiter) + "), two stages a step", []ref.ID{ref.VanLeer1979, ref.Sweby1984, ref.ShuOsher1988}
	}
	return "explicit, single-point upstream", []ref.ID{ref.Godunov1959}
}

// toleranceInputs are the inputs that an advice rests on.
var toleranceInputs = []string{"grid.arrivalWithin", "grid.recoveryWithin", "grid.recoveryAt", "grid.arrivalCut", "grid.cfl"}

// typedOf are those of some inputs that are typed.
func typedOf(st *Study, paths ...string) []string {
	var list []string
	for _, path := range paths {
		if given(st, path) {
			list = append(list, path)
		}
	}
	return list
}

func (g *grid) figures(s *sheet) {
	s.figure(Figure{ID: "grid.arrival", Label: "Exact arrival of water", Symbol: "Qa", Value: g.flood.Arrival(), Quantity: units.PoreVolumes, Strip: g.advice.How != gridding.Verified},
		s.by("", "When the water cut at the producer, reservoir conditions, first passes "+units.Format(100*g.level, 3)+" %, in the exact solution.", ref.BuckleyLeverett1942, ref.Welge1952).
			rests(typedOf(s.st, "grid.arrivalCut")...).on("front.breakthrough"))
	s.figure(Figure{ID: "grid.recovery", Label: "Exact recovery, of the pore volume", Symbol: "R", Value: g.flood.Exact.Recovery(g.tolerance.At), Quantity: units.Share, Strip: g.advice.How != gridding.Verified},
		s.by("", "After "+units.Format(g.tolerance.At, 4)+" PV, in the exact solution.", ref.Welge1952).rests(typedOf(s.st, "grid.recoveryAt")...).on("front.breakthrough"))
	if g.advice.Cells > 0 {
		g.adviceFigures(s)
	}
	g.smearing(s)
	if g.pseudo != nil {
		g.pseudoFigures(s)
	}
	if g.own != nil {
		g.errorFigures(s, "grid.own", "Your grid: ", *g.own)
	}
}

func (g *grid) adviceFigures(s *sheet) {
	a := g.advice
	how, sources := g.method()
	within := "within " + units.Format(100*g.tolerance.Arrival, 3) + " % of the exact arrival and " + units.Format(100*g.tolerance.Recovery, 3) + " % of the pore volume in recovery after " + units.Format(g.tolerance.At, 4) + " PV"
	method := "Grids were run (" + how + ") and set beside the exact solution, twice as many cells each time, then between the last two: this is the least number found " + within + "; the run on it shows that."
	if a.Worse.Cells > 0 && a.How == gridding.Verified {
		method += " With " + units.Format(float64(a.Worse.Cells), 6) + " cells it was outside."
	}
	switch a.How {
	case gridding.Extrapolated:
		method = "Grids of up to " + units.Format(float64(a.Measured.Cells), 6) + " cells were run (" + how + ") and set beside the exact solution; from the order " + units.Format(a.Order, 2) + " at which the error fell on the last two, the number " + within + ". It is extrapolated, not run: that would take too long here."
	case gridding.Beyond:
		method = "The finest grid that was run (" + how + "). The error did not fall with more cells, so that no number is advised."
	}
	if a.How != gridding.Beyond {
		s.figure(Figure{ID: "grid.cells", Label: "Cells between the wells", Symbol: "N", Value: float64(a.Cells), Quantity: units.Number, Strip: true},
			s.by("", method, sources...).rests(typedOf(s.st, toleranceInputs...)...).rests("grid.scheme").on("front.breakthrough"))
		if given(s.st, "field.length") {
			s.figure(Figure{ID: "grid.cellSize", Label: "Length of a cell", Symbol: "Δx", Value: s.needed("field.length") / float64(a.Cells), Quantity: units.Length, Strip: true},
				s.by("{Δx} = {L} / {N}", "").input("field.length").term("grid.cells"))
		}
		step := g.flood.Step(g.scheme, a.Cells)
		s.figure(Figure{ID: "grid.step", Label: "Step in volume injected", Symbol: "ΔQ", Value: step, Quantity: units.PoreVolumes},
			s.by("{ΔQ} = {CFL} / ({N} {v})", "v is the fastest wave between the injected and the initial state, the largest slope dfw/dSw.", ref.LeVeque2002).
				value("CFL", "CFL number", g.scheme.CFL, units.Number).rests(typedOf(s.st, "grid.cfl")...).term("grid.cells").value("v", "largest slope dfw/dSw", g.flood.Fastest(), units.Number))
		if g.rateHeld() {
			s.figure(Figure{ID: "grid.timeStep", Label: "Step in time", Symbol: "Δt", Value: step * s.number("field.timePerPoreVolume"), Quantity: units.Duration, Strip: true},
				s.by("{Δt} = {ΔQ} {tPV}", "At the constant rate; "+calendar).term("grid.step").term("field.timePerPoreVolume"))
		}
		s.figure(Figure{ID: "grid.cost", Label: "Cost, cell evaluations", Symbol: "C", Value: a.CellSteps, Quantity: units.Number, Strip: g.own == nil},
			s.by("", "Cells times steps up to "+units.Format(g.tolerance.At, 4)+" PV, times the stages or rounds of a step, as counted"+map[bool]string{true: " on the run and carried on in proportion to N²"}[a.How == gridding.Extrapolated]+". How long that takes is the machine's: no time is told.").on("grid.cells"))
	}
	if a.How == gridding.Verified {
		g.errorFigures(s, "grid", "Advised grid: ", a.Measured)
	}
	if !math.IsNaN(a.Order) && !math.IsInf(a.Order, 0) && len(a.Ladder) > 1 {
		s.figure(Figure{ID: "grid.order", Label: "Order at which the error fell", Symbol: "p", Value: a.Order, Quantity: units.Number},
			s.by("", "ln(e1/e2)/ln(N2/N1) of the "+a.Binding+" error, the one that asks for most cells, on the two finest grids of the doubling. Across a front a first-order scheme has order 0.5 to 1.", ref.Kuznetsov1976).on("grid.cells"))
	}
}

// pseudoFigures are how far the coarse grid is from the fine one, without and with pseudo-functions.
func (g *grid) pseudoFigures(s *sheet) {
	p := g.pseudo
	coarse := units.Format(float64(p.Before.Cells), 6) + " blocks, beside the fine grid of " + units.Format(float64(p.Fine.Cells), 6) + " cells that the curves were made from."
	add := func(id, label, symbol string, m gridding.Measured, method string) {
		s.figure(Figure{ID: id, Label: label, Symbol: symbol, Value: math.Abs(m.Arrival/p.Fine.Arrival - 1), Quantity: units.Share},
			s.by("", method+coarse, ref.KyteBerry1975, ref.Stone1991).rests(typedOf(s.st, "grid.blocks", "grid.recoveryAt", "grid.arrivalCut")...).on("grid.arrival"))
	}
	add("grid.coarseError", "Coarse grid with the rock's curves, arrival off by", "e0", p.Before, "The rock's own curves on ")
	add("grid.pseudoError", "Coarse grid with pseudo-functions, arrival off by", "e1", p.After, "Of the fine run, block by block, the water cut through the outlet face was noted against the mean saturation, and the harmonic mean of the total mobility; these curves, each in its place, on ")
}

// rateHeld reports whether time follows from volume at one rate.
func (g *grid) rateHeld() bool {
	if g.front.linear == nil {
		return false
	}
	_, held := g.front.linear.Drive.(reservoir.ConstantRate)
	return held
}

// needed is an input that is known to be given.
func (s *sheet) needed(path string) float64 {
	si, _ := s.input(path)
	return si
}

// wrong is an error as a magnitude with its direction.
func wrong(e float64, more, less string) (float64, string) {
	if e < 0 {
		return -e, less
	}
	return e, more
}

// errorFigures are how wrong a grid is, and in which direction.
func (g *grid) errorFigures(s *sheet, id, whose string, m gridding.Measured) {
	how, sources := g.method()
	n := units.Format(float64(m.Cells), 6)
	add := func(what, label, symbol string, value float64, method string) {
		s.figure(Figure{ID: id + "." + what, Label: whose + label, Symbol: symbol, Value: value, Quantity: units.Share, Strip: what != "cutError"},
			s.by("", method+" on "+n+" cells ("+how+"), beside the exact solution.", sources...).
				rests(typedOf(s.st, append(toleranceInputs, "grid.cells")...)...).on("grid.arrival"))
	}
	if !math.IsInf(m.Arrival, 0) {
		early, which := wrong(m.ArrivalError, "late", "early")
		add("arrivalError", "water arrives "+which+" by", "ea", early, "Of the exact arrival,")
	}
	low, which := wrong(m.RecoveryError, "high", "low")
	add("recoveryError", "recovery too "+which+" by", "er", low, "Of the pore volume, after "+units.Format(g.tolerance.At, 4)+" PV,")
	cut, which := wrong(m.CutError, "high", "low")
	add("cutError", "water cut too "+which+" by", "ec", cut, "Of the stream at reservoir conditions, after "+units.Format(g.tolerance.At, 4)+" PV,")
}

// sentence is the answer in words.
func (g *grid) sentence(s *sheet) {
	direction := func(e float64, more, less string) string { _, which := wrong(e, more, less); return which }
	if g.own != nil {
		m := *g.own
		s.answer("On your "+units.Format(float64(m.Cells), 6)+" cells water arrives {grid.own.arrivalError} "+direction(m.ArrivalError, "late", "early"), " and recovery after "+units.Format(g.tolerance.At, 4)+" PV is {grid.own.recoveryError} of the pore volume too "+direction(m.RecoveryError, "high", "low")+". ")
	}
	switch g.advice.How {
	case "":
		s.answer("Grids are being run: the exact arrival is {grid.arrival}.")
	case gridding.Beyond, gridding.TooDear:
		s.answer("No number of cells can be advised: see the cautions.")
	case gridding.Extrapolated:
		s.answer("Some {grid.cells} cells between the wells", ", of {grid.cellSize} each,", " would be within the tolerance, by extrapolation.")
	default:
		m := g.advice.Measured
		s.answer("{grid.cells} cells between the wells", ", of {grid.cellSize} each,", " are within the tolerance: water arrives {grid.arrivalError} "+direction(m.ArrivalError, "late", "early")+", recovery after "+units.Format(g.tolerance.At, 4)+" PV is {grid.recoveryError} of the pore volume too "+direction(m.RecoveryError, "high", "low")+".")
	}
}
