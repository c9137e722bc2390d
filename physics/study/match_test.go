package study

import (
	"fmt"
	"math"
	"math/rand/v2"
	"strings"
	"testing"

	"brinefront/physics/units"
)

// ranged gives inputs of a study a range, and has the match move them.
func ranged(st *Study, paths map[string][2]float64) {
	slots := []*string{&st.Match.First, &st.Match.Second, &st.Match.Third, &st.Match.Fourth}
	for _, c := range Matchable { // in a fixed order
		if span, ok := paths[c.Value]; ok {
			spec, _ := Find(c.Value)
			in := *spec.Get(st)
			in.Low, in.High = &span[0], &span[1]
			spec.Set(st, &in)
			*slots[0] = c.Value
			slots = slots[1:]
		}
	}
	st.Match.Run = matchOn
}

// madeUp is a history made by the product's own forecast of a study, a row a quarter
// for eight years, averages over the quarters with even scatter of a share of each
// phase's mean: matching it proves that the search finds its way back, not that the
// forecast is right.
func madeUp(st Study, scatter float64, seed uint64) string {
	st.Field.History.Table = "d m3/d m3/d\n1 1 1"
	e := (*Memory)(nil).Begin(st)
	e.through(SheetFront)
	m, _ := laid(e.st, nil, e.parts[SheetFront], e.front)
	const rows, quarter = 32, 91.25
	oil, water := make([]float64, rows), make([]float64, rows)
	before := m.at(m.run, 0)
	for i := range rows {
		after := m.at(m.run, quarter*86400*float64(i+1))
		oil[i], water[i] = (after.oil-before.oil)/quarter, (after.water-before.water)/quarter
		before = after
	}
	r := rand.New(rand.NewPCG(seed, 5))
	var b strings.Builder
	b.WriteString("d m3/d m3/d")
	for i := range rows {
		fmt.Fprintf(&b, "\n%v %v %v", quarter*(float64(i)+0.5), math.Max(0, oil[i]+scatter*mean(oil)*r.NormFloat64()), math.Max(0, water[i]+scatter*mean(water)*r.NormFloat64()))
	}
	return b.String()
}

// flooded is a study of the field whose forecast is to be matched.
func flooded() Study {
	st := typed([6]float64{0.2, 0.25, 0.35, 0.9, 2.5, 2}, 0.0005, 0.004)
	st.Field.Drive = "pressure"
	put(&st, "field.length", 400, "m")
	put(&st, "field.width", 150, "m")
	put(&st, "field.thickness", 10, "m")
	put(&st, "field.porosity", 0.2, "fraction")
	put(&st, "field.permeability", 300, "md")
	put(&st, "field.pressure", 40, "bar")
	put(&st, "field.waterCut", 0.95, "fraction")
	return st
}

func matched(t *testing.T, st Study) Part {
	t.Helper()
	part, asked := Run(st).Parts[SheetMatch]
	if !asked || part.Status != Ready {
		t.Fatalf("match: %v %q, problems %v, missing %v, notes %v", asked, part.Status, part.Problems, part.Missing, part.Notes)
	}
	return part
}

// row is a row of the table of what was moved, SI.
func row(t *testing.T, part Part, path string, name string) float64 {
	t.Helper()
	spec, _ := Find(path)
	for i, word := range part.Tables[0].Columns[0].Words {
		for _, c := range part.Tables[0].Columns[1:] {
			if word == name && c.Symbol == spec.Symbol {
				return c.Values[i]
			}
		}
	}
	t.Fatalf("no %q of %s", name, path)
	return 0
}

// Self-consistency: what the product's own forecast made is found again from elsewhere.
// Without scatter to the width of a difference's step; with scatter the truth lies in the
// 95 % interval about as often as it says: of 24 intervals, all but 4 (binomial, chance
// of fewer below 1 %: 1 - B(4; 24, 0.05) = 0.006).
func TestMatchFindsItsWayBack(t *testing.T) {
	spans := map[string][2]float64{"field.width": {80, 300}, "field.permeability": {100, 900}, "rock.corey.no": {1.5, 4}}
	away := map[string]float64{"field.width": 230, "field.permeability": 180, "rock.corey.no": 3}
	truth := map[string]float64{}
	for path := range spans {
		spec, _ := Find(path)
		st := flooded()
		in := spec.Get(&st)
		unit, _ := units.Find(spec.Quantity, in.Unit)
		truth[path] = unit.ToSI(in.Value)
	}
	try := func(scatter float64, seed uint64) Part {
		st := flooded()
		st.Field.History.Table = madeUp(st, scatter, seed)
		for path, value := range away {
			spec, _ := Find(path)
			put(&st, path, value, spec.Get(&st).Unit)
		}
		ranged(&st, spans)
		return matched(t, st)
	}
	part := try(0, 1)
	for path, want := range truth {
		f, _ := part.Figure("match." + path)
		near(t, path, f.Value, want, 1e-5*want)
	}
	outside := 0
	for seed := range uint64(8) {
		part := try(0.03, seed)
		for path, want := range truth {
			low, high := row(t, part, path, "95 % interval from"), row(t, part, path, "to")
			t.Log(path, low, high, want)
			if want < low || want > high {
				outside++
			}
		}
	}
	if outside > 4 {
		t.Errorf("%d of 24 intervals miss the truth", outside)
	}
}

// missed is a study whose inputs stand away from what made its history.
func missed() Study {
	st := flooded()
	st.Field.History.Table = madeUp(st, 0.03, 1)
	put(&st, "field.width", 230, "m")
	put(&st, "field.permeability", 180, "md")
	ranged(&st, map[string][2]float64{"field.width": {80, 300}, "field.permeability": {100, 900}})
	return st
}

// What is taken over makes the forecast that the match told of, and a second match from
// there finds nothing better.
func TestMatchTakenOver(t *testing.T) {
	st := missed()
	part := matched(t, st)
	misfit, _ := part.Figure("match.misfit")
	before, _ := part.Figure("match.before")
	if !(misfit.Value < before.Value) || misfit.Value > 0.04 {
		t.Errorf("the misfit is %g, before %g", misfit.Value, before.Value)
	}
	for _, path := range st.Match.Moved() {
		spec, _ := Find(path)
		in := *spec.Get(&st)
		unit, _ := units.Find(spec.Quantity, in.Unit)
		f, _ := part.Figure("match." + path)
		in.Value = unit.FromSI(f.Value)
		spec.Set(&st, &in)
	}
	again := matched(t, st)
	first, _ := again.Figure("match.before")
	last, _ := again.Figure("match.misfit")
	near(t, "misfit taken over", first.Value, misfit.Value, 1e-9)
	near(t, "misfit matched again", last.Value, misfit.Value, 1e-6)
}

// A match grows, comes nearer to its end with each piece, and is left at once when nobody
// waits; nothing else is changed by it.
func TestMatchGrowsAndIsLeft(t *testing.T) {
	left, pieces := 1.0, 0
	e := (*Memory)(nil).Begin(missed())
	for piece := range e.Pieces(SheetMatch) {
		if piece.Sheet != SheetMatch || piece.Part.Left == 0 {
			break
		}
		if pieces++; piece.Part.Left > left {
			t.Errorf("%g is left after %g", piece.Part.Left, left)
		}
		left = piece.Part.Left
	}
	if pieces < 5 || left == 1 {
		t.Errorf("%d pieces, %g left", pieces, left)
	}
	e, pieces = (*Memory)(nil).Begin(missed()), 0
	for range e.Pieces(SheetMatch) {
		if pieces++; pieces == 3 {
			break
		}
	}
	if _, done := e.parts[SheetMatch]; done || pieces != 3 {
		t.Errorf("a match that is left after %d pieces came to its end", pieces)
	}
	e = (*Memory)(nil).Begin(missed())
	e.through(SheetField)
	k := &match{e: e}
	k.read(newSheet(e.st))
	if wanted, _ := k.search(func(Part) bool { return k.calls < 3 }); wanted || k.calls != 3 {
		t.Errorf("a match that nobody waits for after 3 forecasts made %d", k.calls)
	}
	off := missed()
	off.Match.Run = "off"
	if _, asked := Run(off).Parts[SheetMatch]; asked {
		t.Error("a match that is not asked for was computed")
	}
}

// A match is remembered until something it rests on changes; one that was left is not.
func TestMatchIsRemembered(t *testing.T) {
	memory := &Memory{}
	search := func(st Study, until int) *match {
		e := memory.Begin(st)
		e.through(SheetField)
		k := &match{e: e}
		k.read(newSheet(e.st))
		if _, err := k.search(func(Part) bool { return k.calls < until }); err != nil {
			t.Fatal(err)
		}
		return k
	}
	st := missed()
	search(st, 5)
	first := search(st, 1000)
	if first.calls < 10 {
		t.Errorf("a match that was left is taken for a whole one: %d forecasts", first.calls)
	}
	beside := st
	beside.Title, beside.Field.Limit = "other words", "oilRate"
	put(&beside, "field.oilRate", 1, "m3/d")
	if k := search(beside, 1000); k.calls > 0 || k.RMS != first.RMS {
		t.Errorf("the match was made again, in %d forecasts", k.calls)
	}
	put(&beside, "field.length", 410, "m")
	if k := search(beside, 1000); k.calls == 0 || k.RMS == first.RMS {
		t.Error("the match of another field is that of the first")
	}
}

// Layers, patterns and wells that are off at times are matched by the same way.
func TestMatchOfLayersAndPatterns(t *testing.T) {
	layers := flooded()
	layers.Field.Layers.Table = "m md fraction\n4 120 0.2\n3 400 0.2\n3 900 0.22"
	spot := flooded()
	spot.Field.Pattern.Kind = "five-spot"
	put(&spot, "field.pattern.spacing", 170, "m")
	for name, c := range map[string]struct {
		st    Study
		path  string
		value float64
		span  [2]float64
	}{"layers": {layers, "field.width", 210, [2]float64{100, 250}}, "pattern": {spot, "field.pattern.spacing", 210, [2]float64{100, 250}}, "uptime": {spot, "field.uptime", 0.6, [2]float64{0.3, 1}}} {
		spec, _ := Find(c.path)
		truth, unit := 1.0, "fraction"
		if in := spec.Get(&c.st); in != nil {
			truth, unit = in.Value, in.Unit
		}
		c.st.Field.History.Table = madeUp(c.st, 0, 1)
		put(&c.st, c.path, c.value, unit)
		ranged(&c.st, map[string][2]float64{c.path: c.span})
		f, _ := matched(t, c.st).Figure("match." + c.path)
		near(t, name, f.Value, truth, 1e-5*truth)
	}
}

func TestMatchRefuses(t *testing.T) {
	for name, c := range map[string]struct {
		change func(*Study)
		says   string
	}{
		"no history": {func(st *Study) { st.Field.History.Table = "" }, "field.history.table"},
		"nothing":    {func(st *Study) { st.Match = Match{Run: matchOn} }, "match.first"},
		"no range":   {func(st *Study) { put(st, "field.width", 230, "m") }, "without a range"},
		"not used":   {func(st *Study) { st.Field.Drive = "rate"; st.Match.Third = "field.pressure" }, "does not use"},
		"one row":    {func(st *Study) { st.Field.History.Table = "d m3/d m3/d\n1 2 3" }, "one row"},
		"all zero":   {func(st *Study) { st.Field.History.Table = "d m3/d m3/d\n1 0 0\n2 0 0" }, "no oil and no water"},
		"day or month": {func(st *Study) {
			st.Field.Start = "2020-01-01"
			st.Field.History.Table = "date m3/d m3/d\n03/04/2020 1 1"
		}, "2027-03-01"},
		"no forecast": {func(st *Study) { st.Field.Length = nil }, "field.length"},
	} {
		st := missed()
		c.change(&st)
		part := Run(st).Parts[SheetMatch]
		said := fmt.Sprint(part.Problems, part.Missing, Run(st).Problems)
		if part.Status == Ready || !strings.Contains(said, c.says) || len(part.Figures) > 0 {
			t.Errorf("%s: %s %s", name, part.Status, said)
		}
	}
}
