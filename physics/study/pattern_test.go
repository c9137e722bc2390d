package study

import (
	"math"
	"slices"
	"testing"

	"brinefront/physics/pattern"
)

// arranged is the demonstration with its wells in a pattern.
func arranged(kind string) Study {
	st := Demo()
	st.Field.Pattern.Kind = kind
	return st
}

func figured(t *testing.T, p Part, id string) float64 {
	t.Helper()
	f, ok := p.Figure(id)
	if !ok {
		t.Fatalf("there is no %s", id)
	}
	return f.Value
}

// Every pattern is answered, with sound figures, pictures and notes; a map and a sweep
// curve where there are streamlines to see. A pattern gives no more oil for as much
// injected than the even block, and brings water sooner, in proportion to its areal sweep.
func TestPatternsAreAnswered(t *testing.T) {
	var memory Memory
	block := memory.Run(arranged("block")).Parts[SheetField]
	later := figured(t, block, "field.injectedAtBreakthrough")
	for _, k := range Patterns[1:] {
		st := arranged(k.Value)
		r := memory.Run(st)
		for _, fault := range faults(r) {
			t.Errorf("%s: %s", k.Value, fault)
		}
		p := r.Parts[SheetField]
		if p.Status != Ready {
			t.Fatalf("%s: %s %v", k.Value, p.Status, p.Problems)
		}
		bt := figured(t, p, "field.injectedAtBreakthrough")
		if kind, _ := patternKind(&st); kind == pattern.Radial {
			if math.Abs(bt/later-1) > 1e-3 {
				t.Errorf("a radial flood brings water after %g PV, a block after %g", bt, later)
			}
			continue
		}
		sweep := figured(t, p, "field.sweep")
		if math.Abs(bt/(later*sweep)-1) > 2e-3 {
			t.Errorf("%s: %g PV when water arrives, sweep %g of %g", k.Value, bt, sweep, later)
		}
		for _, id := range []string{"field.map", "field.sweep"} {
			if !slices.ContainsFunc(p.Charts, func(c Chart) bool { return c.ID == id }) {
				t.Errorf("%s: no %s", k.Value, id)
			}
		}
		if at := figured(t, p, "field.recoveryAtLimit"); at > figured(t, block, "field.recoveryAtLimit") {
			t.Errorf("%s: recovery at the limit %g", k.Value, at)
		}
	}
}

// The resistance of a five-spot by hand: 2 (ln(d/rw) - 0.6174) (Muskat
// 1937; the constant of Peaceman 1978, from memory).
func TestFiveSpotByHand(t *testing.T) {
	st := arranged("five-spot")
	p := Run(st).Parts[SheetField]
	const foot = 0.3048
	drop := 2 * (math.Log(890*foot/0.1) - 0.61738575)
	if got := figured(t, p, "field.patternDrop"); math.Abs(got-drop) > 1e-6 {
		t.Errorf("D = %.9g, want %.9g", got, drop)
	}
	if got, want := figured(t, p, "field.patternArea"), 2*890*890*foot*foot; math.Abs(got/want-1) > 1e-12 {
		t.Errorf("area %g, want %g", got, want)
	}
	if got := figured(t, p, "field.unitSweep"); math.Abs(got-0.71777001) > 1e-8 {
		t.Errorf("unit mobility sweep %.9g", got)
	}
}

// Layers of one rock in a pattern are the pattern; layers that differ bring water sooner.
func TestLayersInAPattern(t *testing.T) {
	one := arranged("five-spot")
	same := arranged("five-spot")
	same.Field.Layers.Table = "ft md fraction\n20 391 0.213\n21 391 0.213"
	mixed := arranged("five-spot")
	mixed.Field.Layers.Table = "ft md fraction\n20 700 0.213\n21 97 0.213"
	at := func(st Study, id string) float64 { return figured(t, Run(st).Parts[SheetField], id) }
	for _, id := range []string{"field.breakthrough", "field.recoveryAtLimit", "field.limitTime", "field.highestDrop"} {
		if a, b := at(one, id), at(same, id); math.Abs(a/b-1) > 1e-6 {
			t.Errorf("%s: %.9g of one layer, %.9g of two alike", id, a, b)
		}
	}
	if a, b := at(one, "field.breakthrough"), at(mixed, "field.breakthrough"); b > 0.8*a {
		t.Errorf("water after %g, with contrast after %g", a, b)
	}
}

// What a pattern cannot be made of is refused beside its field.
func TestPatternRefusals(t *testing.T) {
	for name, c := range map[string]struct {
		spoil func(*Study)
		path  string
	}{
		"rows too far":    {func(st *Study) { st.Field.Pattern.Row = &Input{Value: 80, Unit: "ft"} }, "field.pattern.row"},
		"wells too thick": {func(st *Study) { st.Field.Wells.InjectorSkin = &Input{Value: -6.9} }, "field.pattern.spacing"},
	} {
		st := arranged("direct")
		c.spoil(&st)
		p := Run(st).Parts[SheetField]
		if p.Status != Refused || !slices.ContainsFunc(p.Problems, func(p Problem) bool { return p.Path == c.path }) {
			t.Errorf("%s: %s, %v", name, p.Status, p.Problems)
		}
	}
	st := arranged("direct")
	st.Field.Pattern.Row = nil
	if p := Run(st).Parts[SheetField]; p.Status != Waiting || !slices.Contains(p.Missing, "field.pattern.row") {
		t.Errorf("without the distance in a row: %s, %v", p.Status, p.Missing)
	}
}

// A memory of patterns changes no answer.
func TestRememberedPatterns(t *testing.T) {
	var memory Memory
	memory.Run(arranged("staggered"))
	a, b := memory.Run(arranged("staggered")).Parts[SheetField], Run(arranged("staggered")).Parts[SheetField]
	for i, f := range a.Figures {
		if b.Figures[i].Value != f.Value {
			t.Errorf("%s: %g remembered, %g anew", f.ID, f.Value, b.Figures[i].Value)
		}
	}
}
