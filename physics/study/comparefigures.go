package study

import (
	"math"
	"slices"
	"strconv"
	"strings"

	"brinefront/physics/units"
)

// comparison is a figure that is set side by side, and how a smaller and a larger
// one are told.
type comparison struct {
	id         string // of the figure on its own sheet
	name       string // of the difference, under "compare.case1."
	label      string // with {first} for what arrives first
	less, more string
}

var (
	comparedInFront = []comparison{
		{"front.breakthrough", "breakthrough", "{first} arrives", "earlier", "later"},
		{"front.recoveryAtBreakthrough", "recoveryAtBreakthrough", "recovery at breakthrough", "less", "more"},
		{"front.recoveryAtOne", "recoveryAtOne", "recovery after 1 PV", "less", "more"},
	}
	comparedInField = []comparison{
		{"field.breakthrough", "breakthroughTime", "{first} arrives in time", "earlier", "later"},
		{"field.limitTime", "limitTime", "the limit comes", "earlier", "later"},
		{"field.recoveryAtLimit", "recoveryAtLimit", "recovery at the limit", "less", "more"},
	}
)

// alike is the relative difference below which two computed figures are one.
const alike = 1e-9

// difference is how a figure of a case differs from that of the base; Value is
// its size, and word says which way.
func (c comparison) difference(base, o outcome) (f Figure, of [2]Figure, word string, ok bool) {
	was, known := base.figure(c.id)
	is, answered := o.figure(c.id)
	if !known || !answered {
		return Figure{}, of, "", false
	}
	f = Figure{ID: "compare." + o.id + "." + c.name, Quantity: is.Quantity, Symbol: "Δ" + was.Symbol + "," + strconv.Itoa(o.index+1)}
	switch d := is.Value - was.Value; {
	case math.Abs(d) <= alike*math.Max(math.Abs(is.Value), math.Abs(was.Value)):
		word = "as in the base case"
	case d < 0:
		word, f.Value = c.less, -d
	default:
		word, f.Value = c.more, d
	}
	f.Label = "“" + o.name + "”: " + strings.ReplaceAll(c.label, "{first}", o.first(base)) + " " + word
	return f, [2]Figure{was, is}, word, true
}

// compareFigures are the differences of every case from the base. On the strip
// stand the arrival of water and what is recovered in the end, where they differ.
func compareFigures(s *sheet, all []outcome) {
	base := all[0]
	for _, o := range all[1:] {
		limited := o.limited(base)
		for _, c := range slices.Concat(comparedInFront, comparedInField) {
			f, of, word, ok := c.difference(base, o)
			if !ok {
				continue
			}
			told := c.name == "breakthrough" || c.name == "recoveryAtLimit" && limited || c.name == "recoveryAtOne" && !limited
			f.Strip = told && f.Value != 0
			was, is := of[0], of[1]
			symbol := is.Symbol + "," + strconv.Itoa(o.index+1)
			formula := "{" + f.Symbol + "} = {" + symbol + "} - {" + was.Symbol + "}"
			if word == c.less {
				formula = "{" + f.Symbol + "} = {" + was.Symbol + "} - {" + symbol + "}"
			}
			s.figure(f, s.by(formula, "The case is computed as a study of its own; what it does not change it shares with the base case.", slices.Concat(was.Working.Sources, is.Working.Sources)...).
				value(was.Symbol, BaseCase+": "+was.Label, was.Value, was.Quantity).value(symbol, "“"+o.name+"”: "+is.Label, is.Value, is.Quantity).
				rests(was.Working.Inputs...).rests(o.places(is.Working.Inputs)...))
		}
	}
}

// first is what arrives first in both: water, or the front where water flows before it.
func (o outcome) first(base outcome) string {
	if o.front.waterMoves() || base.front.waterMoves() {
		return "the front"
	}
	return "water"
}

// fate is what becomes of the oil displaced in both.
func (o outcome) fate(base outcome) string {
	if fate := base.front.fate(); fate != "produced" {
		return fate
	}
	return o.front.fate()
}

// limited reports whether the outcome is judged at the economic limit: when it and
// the base have one, and nothing rides along, which the limit does not know of.
func (o outcome) limited(base outcome) bool {
	_, was := base.figure("field.recoveryAtLimit")
	_, is := o.figure("field.recoveryAtLimit")
	return was && is && !o.rides() && !base.rides()
}

// compareTables set the figures side by side: those of the front for all, those
// of the field for all that have them.
func compareTables(s *sheet, all []outcome) {
	for _, t := range []struct {
		id, title string
		list      []comparison
	}{
		{"compare.figures", "Breakthrough and recovery; differences are from the base case", comparedInFront},
		{"compare.limit", "In time and at the economic limit; differences are from the base case", comparedInField},
	} {
		if g, ok := compareTable(t.list, all); ok {
			g.ID, g.Title = t.id, t.title
			s.part.Tables = append(s.part.Tables, g)
		}
	}
}

func compareTable(list []comparison, all []outcome) (Grid, bool) {
	columns := []Column{{Label: "Case", Quantity: units.Number}}
	for _, c := range list {
		was, ok := all[0].figure(c.id)
		if !ok {
			return Grid{}, false
		}
		columns = append(columns, Column{Label: was.Label, Symbol: was.Symbol, Quantity: was.Quantity}, Column{Label: "Difference", Symbol: "Δ" + was.Symbol, Quantity: was.Quantity})
	}
	for _, o := range all {
		if slices.ContainsFunc(list, func(c comparison) bool { _, ok := o.figure(c.id); return !ok }) {
			continue
		}
		columns[0].Words = append(columns[0].Words, o.name)
		for i, c := range list {
			was, _ := all[0].figure(c.id)
			is, _ := o.figure(c.id)
			columns[1+2*i].Values = append(columns[1+2*i].Values, is.Value)
			columns[2+2*i].Values = append(columns[2+2*i].Values, is.Value-was.Value)
		}
	}
	return Grid{Columns: columns}, true
}

// compareAnswer says what each case changes about the arrival of water and about
// what is recovered in the end.
func compareAnswer(s *sheet, all []outcome) {
	lead := "Against the base case, "
	for _, o := range all[1:] {
		if len(o.changed) == 0 {
			continue
		}
		s.tell(lead + "“" + o.name + "” ")
		lead = "; "
		s.told(all[0], o, comparedInFront[0], "brings "+o.first(all[0])+" ", "", "after the same volume injected")
		if o.limited(all[0]) {
			s.told(all[0], o, comparedInField[1], " and reaches the limit ", "", "at the same time")
			s.told(all[0], o, comparedInField[2], " with ", " of the pore volume "+o.fate(all[0]), "the same recovery")
		} else {
			s.told(all[0], o, comparedInFront[2], " and has ", " of the pore volume "+o.fate(all[0])+" after 1 PV", "the same recovery after 1 PV")
		}
	}
	if len(s.part.Answer) == 0 {
		s.tell("No case differs from the base case yet")
	}
	s.tell(".")
}

// told adds one difference to the answer.
func (s *sheet) told(base, o outcome, c comparison, before, after, same string) {
	f, _, word, ok := c.difference(base, o)
	switch {
	case !ok:
	case f.Value == 0:
		s.tell(before + same)
	default:
		s.tell(before)
		s.part.Answer = append(s.part.Answer, Phrase{Figure: f.ID})
		s.tell(" " + word + after)
	}
}

// tell adds words to the answer as they are: names are the person's.
func (s *sheet) tell(text string) { s.part.Answer = append(s.part.Answer, Phrase{Text: text}) }
