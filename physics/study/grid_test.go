package study

import (
	"math"
	"slices"
	"strings"
	"testing"
)

// withoutGrid is a study taken through every sheet but Grid: for tests that go through a great
// many studies and are about something else.
func withoutGrid(st Study) Result {
	parts := map[Sheet]Part{}
	for p := range skippingGrid((*Memory)(nil).Begin(st)).Pieces("") {
		parts[p.Sheet] = p.Part
	}
	return Whole(parts)
}

func skippingGrid(e *Evaluation) *Evaluation {
	e.jobs = slices.DeleteFunc(e.jobs, func(j job) bool { return j.sheet == SheetGrid })
	return e
}

// gridPart is the Grid sheet of a study alone, and how often it was shown before it was whole.
func gridPart(t *testing.T, st Study) (part Part, grown int) {
	t.Helper()
	for p := range (*Memory)(nil).Begin(st).Pieces(SheetGrid) {
		if p.Part.Left == 0 {
			return p.Part, grown
		}
		grown++
	}
	t.Fatal("no Grid sheet came")
	return part, 0
}

// withGrid is a whole result with that Grid sheet.
func withGrid(st Study, part Part) Result {
	parts := withoutGrid(st).Parts
	parts[SheetGrid] = part
	return Whole(parts)
}

// Of every kind of study some: a result is sound, is the same twice, and is whole with nothing
// of what came before it missing.
func TestGridIsSound(t *testing.T) {
	all := variants()
	add := func(name string, change func(*Study)) {
		st := Demo()
		change(&st)
		all["grid "+name] = st
	}
	for _, scheme := range Schemes {
		add(scheme.Value, func(st *Study) { st.Grid.Scheme = scheme.Value; put(st, "grid.cells", 37, "") })
	}
	add("fine", func(st *Study) { put(st, "grid.arrivalWithin", 0.2, "%") })
	add("dear", func(st *Study) { put(st, "grid.cfl", 0.02, ""); put(st, "grid.recoveryAt", 10, "") })
	add("own too fine", func(st *Study) { put(st, "grid.cfl", 0.02, ""); put(st, "grid.cells", 1000, "") })
	add("late arrival", func(st *Study) { put(st, "grid.arrivalCut", 0.9, "fraction") })
	names, ready := []string{}, 0
	for name := range all {
		names = append(names, name)
	}
	slices.Sort(names)
	for i, name := range names {
		if i%23 != 0 && !strings.HasPrefix(name, "grid") && !strings.HasPrefix(name, "dip") || strings.HasPrefix(name, "dip") && i%7 != 0 {
			continue
		}
		part, _ := gridPart(t, all[name])
		if part.Status == Ready {
			ready++
		}
		for _, fault := range faults(withGrid(all[name], part)) {
			t.Errorf("%s: %s", name, fault)
		}
	}
	if ready < 10 {
		t.Errorf("only %d kinds of study are answered", ready)
	}
}

// The sheet is shown while it grows, every piece sound by itself, and goes no further when nobody waits.
func TestGridGrows(t *testing.T) {
	st := Demo()
	put(&st, "grid.arrivalWithin", 0.5, "%")
	e := (*Memory)(nil).Begin(st)
	grown, figures := 0, 0
	for p := range e.Pieces(SheetGrid) {
		if p.Sheet != SheetGrid {
			break
		}
		for _, fault := range faults(withGrid(st, p.Part)) {
			if p.Part.Left == 0 || !strings.Contains(fault, "the strip of") { // which fills as it grows
				t.Errorf("piece %d: %s", grown, fault)
			}
		}
		if n := len(p.Part.Figures); n < figures {
			t.Errorf("piece %d has %d figures, the one before it %d", grown, n, figures)
		} else {
			figures = n
		}
		grown++
	}
	if grown < 4 {
		t.Errorf("it came in %d pieces", grown)
	}
	e = (*Memory)(nil).Begin(st)
	for range e.Pieces(SheetGrid) {
		break
	}
	if _, done := e.parts[SheetGrid]; done {
		t.Error("broken off, it went on to its end")
	}
}

// What the advice says holds when the person runs that very grid.
func TestAdvisedGridIsAsSaid(t *testing.T) {
	st := Demo()
	part, _ := gridPart(t, st)
	n := value(t, part, "grid.cells")
	put(&st, "grid.cells", n, "")
	own, _ := gridPart(t, st)
	for _, what := range []string{"arrivalError", "recoveryError", "cutError"} {
		if got, want := value(t, own, "grid.own."+what), value(t, part, "grid."+what); got != want {
			t.Errorf("%s: %g on one's own grid of as many cells, %g as advised", what, got, want)
		}
	}
	if e := value(t, part, "grid.arrivalError"); !(e > 0.03 && e <= usualArrivalWithin) {
		t.Errorf("advised with an error of %g, want just within %g", e, usualArrivalWithin)
	}
	if got, want := value(t, part, "grid.cellSize")*n, 1910*0.3048; math.Abs(got-want) > 1e-9 {
		t.Errorf("%g cells are %g m together, want %g", n, got, want)
	}
	put(&st, "grid.cells", n/2-math.Mod(n/2, 1), "")
	half, _ := gridPart(t, st)
	if e := value(t, half, "grid.own.arrivalError"); e <= usualArrivalWithin {
		t.Errorf("half as many cells are within too: %g", e)
	}
	if text := sentenceOf(half); !strings.Contains(text, "early") || !strings.Contains(text, "too low") {
		t.Errorf("the direction is not told: %s", text)
	}
}

// Inputs that cannot be are refused beside their field: parts of cells, steps that are not stable.
func TestGridRefuses(t *testing.T) {
	for _, c := range []struct {
		path   string
		value  float64
		scheme string
	}{{"grid.cells", 20.5, upstream}, {"grid.blocks", 3.1, upstream}, {"grid.cfl", 1.1, upstream}, {"grid.cfl", 0.6, "vanLeer"}, {"grid.cells", 1, upstream}} {
		st := Demo()
		st.Grid.Scheme = c.scheme
		put(&st, c.path, c.value, "")
		part, _ := gridPart(t, st)
		if part.Status != Refused || len(part.Problems) != 1 || part.Problems[0].Path != c.path {
			t.Errorf("%s = %g: %s, %+v", c.path, c.value, part.Status, part.Problems)
		}
	}
	st := Demo()
	st.Grid.Scheme = implicit
	put(&st, "grid.cfl", 30, "")
	if part, _ := gridPart(t, st); part.Status != Ready {
		t.Errorf("implicit at CFL 30: %s", part.Status)
	}
}

// A picture or table of pseudo-functions is there where the flow allows it, and the reason where not.
func TestGridPseudoFunctions(t *testing.T) {
	part, _ := gridPart(t, Demo())
	if before, after := value(t, part, "grid.coarseError"), value(t, part, "grid.pseudoError"); !(after < before/10) {
		t.Errorf("arrival off by %g with pseudo-functions, %g without", after, before)
	}
	chartOf(t, part, "grid.pseudo")
	st := Demo()
	dips(&st, -50)
	put(&st, "field.rate", 50, "bbl/d")
	part, _ = gridPart(t, st)
	if _, told := noteOf(part, "grid.noPseudo"); !told {
		t.Error("counter-current flow has pseudo-functions, or no word why not")
	}
}

// Where the rock has a capillary pressure, the grid that smears as it does has cells in inverse
// proportion to the permeability, as the diffusion is in proportion to it; without, nothing is told.
func TestGridSmearsAsCapillarity(t *testing.T) {
	st := soaking()
	put(&st, "front.velocity", 0.4, "ft/d")
	cells := func(permeability float64) float64 {
		put(&st, "field.permeability", permeability, "md")
		part, _ := gridPart(t, st)
		return value(t, part, "grid.sameSmearing")
	}
	if one, two := cells(100), cells(200); !(math.Abs(one/two-2) < 1e-9) {
		t.Errorf("%g cells at one permeability, %g at twice it", one, two)
	}
	part, _ := gridPart(t, Demo())
	if _, told := part.Figure("grid.sameSmearing"); told {
		t.Error("told without a capillary pressure")
	}
}
