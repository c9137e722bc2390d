package study

import (
	"math"

	"brinefront/physics/fv"
	"brinefront/physics/gridding"
	"brinefront/physics/units"
)

// grid is the flood on grids, as far as it has been run.
type grid struct {
	rock      *rock
	front     *front
	flood     *gridding.Flood
	scheme    gridding.Scheme
	tolerance gridding.Tolerance
	level     float64 // water cut at which water has arrived

	advice  gridding.Advice
	runs    []gridding.Measured // on the way to the advice, as they came
	own     *gridding.Measured  // the person's own grid
	steps   []gridding.Measured // one grid with several steps
	pseudo  *gridding.Pseudos
	without error        // why there are no pseudo-functions
	section *section     // nil without layers
	matrix  *subdivision // nil without a block
}

// How much is computed: cell steps of the longest run that advice rests on, of the person's own
// grid, of each run with another step, and of the fine run that pseudo-functions come from.
const (
	affordable  = 3e5
	mostSteps   = 1e7
	stepsSteps  = 2e6
	fineCells   = 240
	shownCells  = 100 // on which the effect of the step is measured, at most
	pseudoSteps = 2e6
)

// runGrid answers the Grid sheet.
func runGrid(e *Evaluation, grow growing) Part {
	st, frontPart, front := e.st, e.parts[SheetFront], e.front
	s := newSheet(st, e.parts[SheetField], frontPart)
	s.await(frontPart)
	g := &grid{rock: e.rock, front: front}
	g.read(s)
	standing := s.standing()
	if frontPart.Status == Refused {
		standing = Refused
	}
	if standing != Ready || front == nil {
		if standing == Ready {
			standing = frontPart.Status
		}
		return s.close(standing)
	}
	flood, err := gridding.New(front.displacement, front.flow, g.level)
	if err != nil {
		s.note(Note{ID: "grid.numerics", Level: "caution", Text: "The flood cannot be put on a grid: " + err.Error() + ".",
			Cause: "Water never counts as arrived, or a slope of the fractional flow has no bound.", Do: "Look at the cut of arrival and at the curves.", Paths: []string{"grid.arrivalCut", "rock.curve"}})
		return s.close(Stopped)
	}
	g.flood = flood
	others := s.others
	told := func(left float64) Part {
		t := newSheet(st, others...)
		g.tell(t)
		status := frontPart.Status
		if how := g.advice.How; how == gridding.TooDear || how == gridding.Beyond {
			status = Stopped
		}
		p := t.close(status)
		p.Left = left
		return p
	}
	// What is to come is guessed: most of it is the search.
	more := func(left float64) bool { return grow(told(left)) }
	if g.compute(s, more) != nil {
		return s.close(Stopped)
	}
	if layered(st) && more(0.1) {
		m, _ := laid(st, e.memory, frontPart, front)
		g.section = g.sectioned(m)
	}
	if withBlock(st) && more(0.05) {
		e.through(SheetSoak)
		g.matrix = g.subdivided(e.block)
	}
	return told(0)
}

// read reads the inputs.
func (g *grid) read(s *sheet) {
	or := func(path string, otherwise float64) float64 {
		if v, given := s.input(path); given {
			return v
		}
		return otherwise
	}
	g.tolerance = gridding.Tolerance{
		Arrival: or("grid.arrivalWithin", usualArrivalWithin), Recovery: or("grid.recoveryWithin", usualRecoveryWithin), At: or("grid.recoveryAt", usualRecoveryAt),
	}
	g.level = or("grid.arrivalCut", usualArrivalCut)
	if g.front != nil {
		g.level += g.front.cutAhead()
	}
	most := 0.5
	switch s.st.Grid.Scheme {
	case implicit:
		g.scheme, most = gridding.Scheme{Implicit: true, CFL: 1}, math.Inf(1)
	case "minmod":
		g.scheme.Limiter = fv.Minmod
	case "vanLeer":
		g.scheme.Limiter = fv.VanLeer
	case "superbee":
		g.scheme.Limiter = fv.Superbee
	default:
		most = 1
	}
	if !g.scheme.Implicit {
		g.scheme.CFL = 0.5
	}
	if cfl, given := s.input("grid.cfl"); given {
		if g.scheme.CFL = cfl; cfl > most {
			s.problem("grid.cfl", s.typed("grid.cfl"), "up to "+units.Exact(most)+", above which this scheme is not stable; the implicit one is at any")
		}
	}
	for _, path := range []string{"grid.cells", "grid.blocks"} {
		if n, given := s.input(path); given && n != math.Round(n) {
			s.problem(path, s.typed(path), "a whole number")
		}
	}
}

// compute makes the runs, the longest search first, and shows what is there after each piece.
// It ends early when nobody waits any more.
func (g *grid) compute(s *sheet, grow func(left float64) bool) error {
	wanted, shown := true, 0
	var err error
	g.advice, err = g.flood.Advise(g.scheme, g.tolerance, affordable, func(m gridding.Measured) bool {
		g.runs = append(g.runs, m)
		// A picture of every grid would cost more than the grids themselves.
		if m.CellSteps > affordable/20 && m.Cells >= 2*shown {
			shown = m.Cells
			wanted = grow(0.8)
		}
		return wanted
	})
	if n, given := s.input("grid.cells"); given && err == nil && wanted {
		var own gridding.Measured
		if g.flood.Cost(g.scheme, int(n), g.tolerance.At) <= mostSteps {
			if own, err = g.flood.Run(g.scheme, int(n), g.tolerance.At); err == nil {
				g.own = &own
			}
		}
	}
	if err != nil || !wanted || !grow(0.4) {
		return err
	}
	n := min(max(g.shownOn(), 10), shownCells)
	for _, step := range []gridding.Scheme{{CFL: 0.1}, {CFL: 0.25}, {CFL: 0.5}, {CFL: 1}, {Implicit: true, CFL: 1}, {Implicit: true, CFL: 5}, {Implicit: true, CFL: 25}} {
		if g.flood.Cost(step, n, g.tolerance.At) > stepsSteps {
			continue
		}
		m, failed := g.flood.Run(step, n, g.tolerance.At)
		if failed != nil {
			continue // Newton's method gave up: the row is left out
		}
		g.steps = append(g.steps, m)
	}
	if !grow(0.2) {
		return nil
	}
	g.coarse(s)
	return nil
}

// shownOn is the grid that is spoken about: the person's own, or the one advised.
func (g *grid) shownOn() int {
	if g.own != nil {
		return g.own.Cells
	}
	return g.advice.Measured.Cells
}

// coarse makes pseudo-functions and tests them.
func (g *grid) coarse(s *sheet) {
	blocks := usualBlocks
	if n, given := s.input("grid.blocks"); given {
		blocks = int(n)
	}
	perBlock := max(4, fineCells/blocks)
	for perBlock > 4 && g.flood.Cost(gridding.Scheme{}, blocks*perBlock, g.tolerance.At) > pseudoSteps {
		perBlock = perBlock * 3 / 4
	}
	if g.flood.Cost(gridding.Scheme{}, blocks*perBlock, g.tolerance.At) > mostSteps || g.flood.Cost(g.scheme, blocks, g.tolerance.At) > mostSteps {
		return
	}
	p, err := g.flood.Pseudos(g.scheme, blocks, perBlock, g.tolerance.At)
	if g.without = err; err == nil {
		g.pseudo = &p
	}
}
