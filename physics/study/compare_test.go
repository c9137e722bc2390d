package study

import (
	"fmt"
	"math"
	"slices"
	"strings"
	"testing"

	"brinefront/physics/units"
)

// comparedRow is a row of a table of the comparison, by the symbols of its columns.
func comparedRow(t *testing.T, p Part, grid, name string) map[string]float64 {
	t.Helper()
	row := map[string]float64{}
	for _, g := range p.Tables {
		if g.ID != grid {
			continue
		}
		at := slices.Index(g.Columns[0].Words, name)
		if at < 0 {
			t.Fatalf("%s has no row %q: %v", grid, name, g.Columns[0].Words)
		}
		for _, c := range g.Columns[1:] {
			row[c.Symbol] = c.Values[at]
		}
		return row
	}
	t.Fatalf("no table %s", grid)
	return nil
}

// Exact: for krw = S², kro = (1-S)² and M = µo/µw water arrives after
// 2/(1+√(1+M)) PV, and as much is recovered by then. The base has M = 2 (LeVeque
// 2002, section 16.1, from memory); the cases reach their M by either viscosity,
// in several units.
func TestCasesOfQuadraticCurvesGiveTheClosedForm(t *testing.T) {
	arrival := func(m float64) float64 { return 2 / (1 + math.Sqrt(1+m)) }
	st := typed([6]float64{0, 0, 1, 1, 2, 2}, 1e-3, 2e-3)
	st.Cases = []Case{
		{Name: "thick oil", Set: map[string]Input{"fluids.oilViscosity": {Value: 24, Unit: "cp"}}},
		{Name: "thin water", Set: map[string]Input{"fluids.waterViscosity": {Value: 0.25, Unit: "cp"}}},
		{Name: "both", Set: map[string]Input{"fluids.oilViscosity": {Value: 1, Unit: "cp"}, "fluids.waterViscosity": {Value: 0.002, Unit: "Pa.s"}}},
	}
	p := withoutGrid(st).Parts[SheetCompare]
	if p.Status != Ready {
		t.Fatalf("%s: %v %v", p.Status, p.Missing, p.Notes)
	}
	base := arrival(2)
	for i, m := range []float64{24, 8, 0.5} {
		name, want := st.Cases[i].Name, arrival(m)
		row := comparedRow(t, p, "compare.figures", name)
		near(t, name+", breakthrough", row["Qbt"], want, 1e-12)
		near(t, name+", recovery at breakthrough", row["Rbt"], want, 1e-12)
		near(t, name+", difference", row["ΔQbt"], want-base, 1e-12)
		id := fmt.Sprintf("compare.case%d.breakthrough", i+1)
		f, ok := p.Figure(id)
		if !ok {
			t.Fatalf("no figure %s", id)
		}
		near(t, f.Label, f.Value, math.Abs(want-base), 1e-12)
		word := "earlier"
		if want > base {
			word = "later"
		}
		if !strings.Contains(f.Label, name) || !strings.HasSuffix(f.Label, word) {
			t.Errorf("%s: the label is %q, want %q in it", name, f.Label, word)
		}
		line := must(t, p, "compare.recovery", fmt.Sprintf("case%d", i+1))
		near(t, name+", recovery in the picture", interpolate(line.X, line.Y, want), want, 1e-9)
	}
	near(t, "the base itself", comparedRow(t, p, "compare.figures", BaseCase)["Qbt"], base, 1e-12)
}

// There is no second computation: whatever a case changes, its figures and curves
// are those of a study with the same changes.
func TestEveryCaseIsAStudyOfItsOwn(t *testing.T) {
	base := Demo()
	base.Field.Limit = "oilRate"
	for _, spec := range Specs() {
		if in := spec.Get(&base); in != nil {
			base.Cases = []Case{{Name: spec.Path, Set: map[string]Input{spec.Path: {Value: in.Value * 1.07, Unit: in.Unit}}}}
			sameAsStudy(t, base)
		}
	}
	for _, path := range CaseChoices() {
		for _, c := range Choices(path) {
			base.Cases = []Case{{Name: path + " " + c.Value, Choose: map[string]string{path: c.Value}}}
			sameAsStudy(t, base)
		}
	}
}

func sameAsStudy(t *testing.T, st Study) {
	t.Helper()
	c := st.Cases[0]
	got, want := withoutGrid(st).Parts[SheetCompare], withoutGrid(c.On(st))
	if want.Parts[SheetFront].Status != Ready {
		if len(got.Notes) == 0 {
			t.Errorf("%s has no answer and does not say why", c.Name)
		}
		return
	}
	row := comparedRow(t, got, "compare.figures", c.Name)
	if want.Parts[SheetField].Status == Ready {
		for symbol, v := range comparedRow(t, got, "compare.limit", c.Name) {
			row[symbol] = v
		}
	}
	found := 0
	for _, list := range [][]comparison{comparedInFront, comparedInField} {
		for _, of := range list {
			for _, p := range want.Parts {
				if f, ok := p.Figure(of.id); ok && row[f.Symbol] != f.Value {
					t.Errorf("%s: %s is %g in the table and %g in a study of its own", c.Name, of.id, row[f.Symbol], f.Value)
				} else if ok {
					found++
				}
			}
		}
	}
	if found < 3 {
		t.Errorf("%s: only %d figures are compared", c.Name, found)
	}
	own, over := must(t, want.Parts[SheetFront], "front.fractionalFlow", "reservoir"), must(t, got, "compare.fractionalFlow", "case1")
	if !slices.Equal(own.X, over.X) || !slices.Equal(own.Y, over.Y) {
		t.Errorf("%s: the fractional flow is another one", c.Name)
	}
}

// A case that cannot answer says why and names the field; the others are shown.
func TestCasesThatCannotAnswerSayWhy(t *testing.T) {
	st := Demo()
	st.Rock.LET.Lo = nil
	st.Cases = []Case{
		{Name: "no room", Choose: map[string]string{"rock.curve": "corey"}, Set: map[string]Input{"rock.corey.sor": {Value: 90, Unit: "%"}}},
		{Name: "not given", Choose: map[string]string{"rock.curve": "let"}},
		{Name: "other limit", Choose: map[string]string{"field.limit": "oilRate"}},
		{Name: "the same"},
	}
	r := withoutGrid(st)
	p := r.Parts[SheetCompare]
	if len(r.Problems) > 0 || r.Parts[SheetField].Status != Ready {
		t.Errorf("a case keeps the base from answering: %v", r.Problems)
	}
	for _, want := range []struct{ id, text, path string }{
		{"compare.case1.unanswered", "Residual oil cannot be used: read 90 % beside Swc = 0.227; allowed: Swc + Sor below 1", "cases.0.rock.corey.sor"},
		{"compare.case2.unanswered", "Oil, lower part is not given", "rock.let.lo"},
		{"compare.case4.unchanged", "nothing is changed yet", "cases.3.name"},
	} {
		i := slices.IndexFunc(p.Notes, func(n Note) bool { return n.ID == want.id })
		if i < 0 {
			t.Errorf("no note %s in %v", want.id, p.Notes)
			continue
		}
		if n := p.Notes[i]; !strings.Contains(n.Text, want.text) || !slices.Contains(n.Paths, want.path) {
			t.Errorf("%s says %q about %v", want.id, n.Text, n.Paths)
		}
	}
	if words := p.Tables[0].Columns[0].Words; !slices.Equal(words, []string{BaseCase, "other limit", "the same"}) {
		t.Errorf("the table has the rows %v", words)
	}
	if f, ok := p.Figure("compare.case4.breakthrough"); !ok || f.Value != 0 {
		t.Errorf("the same study differs from itself by %v", f.Value)
	}
}

// What the base lacks, the comparison waits for.
func TestCompareWaitsForTheBase(t *testing.T) {
	st := Demo()
	st.Fluids.OilViscosity = nil
	st.Cases = []Case{{Name: "x", Set: map[string]Input{"fluids.oilViscosity": {Value: 3, Unit: "cp"}}}}
	if p := withoutGrid(st).Parts[SheetCompare]; p.Status != Waiting || !slices.Equal(p.Missing, []string{"fluids.oilViscosity"}) {
		t.Errorf("%s, missing %v", p.Status, p.Missing)
	}
	if _, ok := withoutGrid(Demo()).Parts[SheetCompare]; ok {
		t.Error("a study without cases is compared")
	}
}

// The sentence says which way each case goes, and by how much of the base.
func TestCompareAnswer(t *testing.T) {
	st := withCases()
	var b strings.Builder
	p := withoutGrid(st).Parts[SheetCompare]
	for _, phrase := range p.Answer {
		b.WriteString(phrase.Text)
		if f, ok := p.Figure(phrase.Figure); ok {
			b.WriteString(units.Format(f.Value, 3))
		}
	}
	for _, want := range []string{"Against the base case, “Thick oil” brings water 0.", " earlier and reaches the limit ", "of the pore volume produced; “LET, typed”", "."} {
		if !strings.Contains(b.String(), want) {
			t.Errorf("the answer is %q, want %q in it", b.String(), want)
		}
	}
	if strings.Contains(b.String(), "As it is") {
		t.Errorf("the answer speaks of a case that changes nothing: %q", b.String())
	}
}

// A case whose field alone differs shares the front: water after the same volume.
func TestCaseOfAnotherRate(t *testing.T) {
	st := Demo()
	st.Cases = []Case{{Name: "twice as fast", Set: map[string]Input{"field.rate": {Value: 1920, Unit: "bbl/d"}}}}
	p := withoutGrid(st).Parts[SheetCompare]
	row, base := comparedRow(t, p, "compare.limit", "twice as fast"), comparedRow(t, p, "compare.limit", BaseCase)
	near(t, "limit at twice the rate", row["tlim"], base["tlim"]/2, 1e-9*base["tlim"])
	near(t, "breakthrough at twice the rate", row["tbt"], base["tbt"]/2, 1e-9*base["tbt"])
	if f, _ := p.Figure("compare.case1.breakthrough"); f.Value != 0 || !strings.HasSuffix(f.Label, "as in the base case") {
		t.Errorf("volume at breakthrough: %+v", f)
	}
}

// Polymer beside water: recovery counts it, and what does not says so.
func TestCaseOfPolymer(t *testing.T) {
	st := Demo()
	st.Cases = []Case{{Name: "polymer", Choose: map[string]string{"front.rider.kind": "polymer"}, Set: map[string]Input{"front.rider.viscosity": {Value: 9, Unit: "cp"}}}}
	r := withoutGrid(st)
	p, alone := r.Parts[SheetCompare], r.Parts[SheetFront]
	with := withoutGrid(st.Cases[0].On(st)).Parts[SheetFront]
	polymer, ok := with.Figure("front.ride.recoveryAtOne")
	water, _ := alone.Figure("front.recoveryAtOne")
	if !ok || polymer.Value <= water.Value {
		t.Fatalf("polymer of 9 cp recovers %v, water %v", polymer.Value, water.Value)
	}
	row := comparedRow(t, p, "compare.figures", "polymer")
	near(t, "recovery after 1 PV", row["R1"], polymer.Value, 0)
	near(t, "what the polymer adds", row["ΔR1"], polymer.Value-water.Value, 0)
	first, _ := with.Figure("front.ride.breakthrough")
	near(t, "arrival of water ahead of the polymer", row["Qbt"], first.Value, 0)
	line := must(t, p, "compare.recovery", "case1")
	near(t, "recovery in the picture", interpolate(line.X, line.Y, 1), polymer.Value, 1e-9)
	if !slices.ContainsFunc(p.Notes, func(n Note) bool { return n.ID == "compare.ride" }) {
		t.Error("nothing says what is told of water alone")
	}
	var said string
	for _, phrase := range p.Answer {
		said += phrase.Text
	}
	if !strings.Contains(said, "more of the pore volume produced after 1 PV") {
		t.Errorf("the answer is %q", said)
	}
}

// Names are the person's: where another pair changes the words for water and oil,
// it leaves them alone.
func TestNamesOfCasesAreKept(t *testing.T) {
	const name = "More viscous oil, less water"
	for _, pair := range Pairs {
		st := Demo()
		st.Fluids.Pair = pair.Value
		st.Cases = []Case{{Name: name, Set: map[string]Input{"fluids.oilViscosity": {Value: 24, Unit: "cp"}}}}
		p := withoutGrid(st).Parts[SheetCompare]
		if p.Status != Ready {
			t.Errorf("%s: %s", pair.Value, p.Status)
			continue
		}
		if got := p.Tables[0].Columns[0].Words[1]; got != name {
			t.Errorf("%s: the table says %q", pair.Value, got)
		}
		if got := must(t, p, "compare.recovery", "case1").Label; got != name {
			t.Errorf("%s: the line says %q", pair.Value, got)
		}
		if f := p.Figures[0]; !strings.Contains(f.Label, "“"+name+"”") || !strings.Contains(p.Answer[0].Text, name) {
			t.Errorf("%s: the figure says %q, the answer %q", pair.Value, f.Label, p.Answer[0].Text)
		}
		if label := p.Figures[0].Label; pair.Value == "gas-oil" && !strings.Contains(label, "gas arrives") {
			t.Errorf("%s: the figure says %q, not in the words of the pair", pair.Value, label)
		}
	}
}

func BenchmarkRunFiveCases(b *testing.B) {
	st := Demo()
	for i := range MaxCases {
		st.Cases = append(st.Cases, Case{Name: string(rune('a' + i)), Set: map[string]Input{"fluids.oilViscosity": {Value: float64(2 + i), Unit: "cp"}}})
	}
	for b.Loop() {
		withoutGrid(st)
	}
}
