package state

import (
	"strings"
	"testing"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

const oil = "fluids.oilViscosity"

func TestEdited(t *testing.T) {
	tests := []struct {
		name    string
		msgs    []Msg
		path    string
		given   string
		draft   string // "" for none
		message []string
	}{
		{"a number", []Msg{Edited{oil, "5", "cp"}}, oil, "5 cp", "", nil},
		{"as typed", []Msg{Edited{oil, "5.0", "cp"}}, oil, "5 cp", "5.0", nil},
		{"decimal comma", []Msg{Edited{oil, "2,5", "cp"}}, oil, "2.5 cp", "2,5", nil},
		{"unit typed along", []Msg{Edited{"field.uptime", "0.93 fraction", "%"}}, "field.uptime", "0.93 fraction", "0.93 fraction", nil},
		{"percent typed along", []Msg{Edited{"field.porosity", "21 %", "fraction"}}, "field.porosity", "21 %", "21 %", nil},
		{"unit corrected", []Msg{Edited{oil, "5", "cp"}, Edited{oil, "5", "Pa.s"}}, oil, "5 Pa.s", "", nil},
		{"unknown unit falls back", []Msg{Edited{oil, "5", "furlong"}}, oil, "5 cp", "", nil},
		{"letters", []Msg{Edited{oil, "5", "cp"}, Left{}, Edited{oil, "thick", "cp"}}, oil, "5 cp", "thick", []string{"thick", "allowed", "In use: 5 cp."}},
		{"negative", []Msg{Edited{oil, "5", "cp"}, Left{}, Edited{oil, "-5", "cp"}}, oil, "5 cp", "-5", []string{"-5 cp", "allowed", "In use: 5 cp."}},
		{"1e999", []Msg{Edited{oil, "1e999", "cp"}}, oil, "", "1e999", []string{"1e999", "allowed"}},
		{"nothing in use", []Msg{Edited{oil, "x", "cp"}}, oil, "", "x", []string{"x"}},
		{"percent as fraction", []Msg{Edited{"field.porosity", "21", "fraction"}}, "field.porosity", "", "21", []string{"21"}},
		{"bad unit", []Msg{Edited{oil, "5 stone", "cp"}}, oil, "", "5 stone", []string{"stone", "allowed"}},
		{"mended", []Msg{Edited{oil, "x", "cp"}, Edited{oil, "6", "cp"}}, oil, "6 cp", "", nil},
		{"emptied", []Msg{Edited{oil, "6", "cp"}, Edited{oil, "  ", "cp"}}, oil, "", "", nil},
		{"no such input", []Msg{Edited{"fluids.gasViscosity", "5", "cp"}}, oil, "", "", nil},
	}
	for _, test := range tests {
		t.Run(test.name, func(t *testing.T) {
			m := after(empty(), test.msgs...)
			if got := given(t, m, test.path); got != test.given {
				t.Errorf("in use is %q, want %q", got, test.given)
			}
			if got := m.Drafts[test.path].Text; got != test.draft {
				t.Errorf("draft is %q, want %q", got, test.draft)
			}
			if (m.Messages[test.path] != "") != (test.message != nil) {
				t.Errorf("message is %q, want one: %t", m.Messages[test.path], test.message != nil)
			}
			holds(t, "message", m.Messages[test.path], test.message...)
		})
	}
}

func TestEmptiedKeepsItsUnitAndSource(t *testing.T) {
	m := after(empty(), Edited{oil, "5", "Pa.s"}, Sourced{oil, "report 12"}, Ranged{oil, "4", "6"},
		Edited{oil, "", "Pa.s"})
	if got := m.Drafts[oil].Unit; got != "Pa.s" {
		t.Errorf("an emptied field is in %q, want Pa.s, as before", got)
	}
	m = after(m, Edited{oil, "5.5", "Pa.s"})
	in := m.Study.Fluids.OilViscosity
	if in.Source != "report 12" || in.Low == nil || *in.Low != 4 || in.High == nil || *in.High != 6 {
		t.Errorf("a number typed over another is %+v, want its source and range kept", in)
	}
}

func TestEditedAsksToComputeAndKeep(t *testing.T) {
	m := empty()
	n, effects := Update(m, Edited{oil, "5", "cp"})
	n = after(n, Left{})
	if n.Revision != m.Revision+1 || !n.Computing {
		t.Errorf("revision %d after %d, computing %t; want the next one, computing", n.Revision, m.Revision, n.Computing)
	}
	runs, keeps := of[Run](effects), of[Keep](effects)
	if len(runs) != 1 || runs[0].Revision != n.Revision || len(keeps) != 1 {
		t.Fatalf("effects %v, want one run of revision %d and one keep", effects, n.Revision)
	}
	if study.Write(keeps[0].Study) != study.Write(n.Study) {
		t.Error("another study is kept than is shown")
	}
	for _, msg := range []Msg{Edited{oil, "5.", "cp"}, Edited{oil, "5.0", "cp"}, Edited{oil, "five", "cp"}} {
		later, effects := Update(n, msg)
		if later.Revision != n.Revision || len(effects) > 0 {
			t.Errorf("%v changes no value but asks for %v", msg, effects)
		}
	}
}

func TestUpdateLeavesTheModelBeforeAlone(t *testing.T) {
	m := after(New(), Edited{oil, "bad", "cp"})
	before, drafts := study.Write(m.Study), len(m.Drafts)
	after(m, Edited{oil, "7", "cp"}, Edited{"rock.table.0.sw", "0.1", ""}, Ranged{oil, "1", "9"}, Sourced{oil, "x"},
		Written{"title", "y"}, Chosen{"rock.curve", "let"}, RowRemoved{tablePath, 2}, Undone{}, Edited{oil, "8", "cp"})
	if study.Write(m.Study) != before || len(m.Drafts) != drafts || m.Rows(tablePath)[0].Text[0] != "0.227" {
		t.Error("a message changed the model it was given")
	}
}

func TestRanged(t *testing.T) {
	base := after(empty(), Edited{oil, "5", "cp"})
	tests := []struct {
		name      string
		msgs      []Msg
		low, high string // "" for none
		message   string // path of the message
		said      string
	}{
		{"both", []Msg{Ranged{oil, "4", "6"}}, "4", "6", "", ""},
		{"one", []Msg{Ranged{oil, "", "6"}}, "", "6", "", ""},
		{"touching", []Msg{Ranged{oil, "5", "5"}}, "5", "5", "", ""},
		{"low above the value", []Msg{Ranged{oil, "5.5", "6"}}, "", "6", oil + ".low", "at most the value, 5 cp"},
		{"high below the value", []Msg{Ranged{oil, "4", "4.5"}}, "4", "", oil + ".high", "at least the value, 5 cp"},
		{"letters", []Msg{Ranged{oil, "few", "6"}}, "", "6", oil + ".low", "few"},
		{"beyond what is allowed", []Msg{Ranged{oil, "-1", "6"}}, "", "6", oil + ".low", "-1"},
		{"in another unit", []Msg{Ranged{oil, "0.004 Pa.s", "6"}}, "", "6", oil + ".low", "in the unit of the value, cp"},
		{"value moved out", []Msg{Ranged{oil, "4", "6"}, Edited{oil, "3", "cp"}}, "", "6", oil + ".low", "at most the value, 3 cp"},
		{"value moved out and in", []Msg{Ranged{oil, "4", "6"}, Edited{oil, "3", "cp"}, Edited{oil, "4.5", "cp"}}, "4", "6", "", ""},
	}
	for _, test := range tests {
		t.Run(test.name, func(t *testing.T) {
			m := after(base, test.msgs...)
			in := m.Study.Fluids.OilViscosity
			if got := end(in.Low) + "…" + end(in.High); got != test.low+"…"+test.high {
				t.Errorf("range is %s, want %s…%s", got, test.low, test.high)
			}
			for _, path := range []string{oil + ".low", oil + ".high"} {
				if (m.Messages[path] != "") != (path == test.message) {
					t.Errorf("message at %s is %q", path, m.Messages[path])
				}
			}
			holds(t, "message", m.Messages[test.message], test.said)
			if test.message != "" && m.Drafts[test.message].Text == "" {
				t.Error("the text that cannot be used is lost")
			}
		})
	}
}

func end(v *float64) string {
	if v == nil {
		return ""
	}
	return units.Exact(*v)
}

func TestSourcedAndWritten(t *testing.T) {
	m := after(New(), Sourced{oil, "PVT report, page 9"}, Sourced{"rock.table", "plug 7"}, Written{"title", "North block"},
		Written{"author", "A. Reader"}, Written{"note", "first try"}, Written{"field.start", " 2028-02-29 "})
	for _, row := range [][2]string{
		{m.Study.Fluids.OilViscosity.Source, "PVT report, page 9"}, {m.Study.Rock.Table.Source, "plug 7"}, {m.Study.Title, "North block"},
		{m.Study.Author, "A. Reader"}, {m.Study.Note, "first try"}, {m.Study.Field.Start, "2028-02-29"},
	} {
		if row[0] != row[1] {
			t.Errorf("the study holds %q, want %q", row[0], row[1])
		}
	}
	if n := after(empty(), Sourced{oil, "x"}, Sourced{"rock.table", "x"}); n.CanUndo {
		t.Error("a source was taken for an input that is not given")
	}
}

func TestWrittenBad(t *testing.T) {
	long := strings.Repeat("ä", study.MaxText+1)
	tests := []struct{ name, path, text, said string }{
		{"no day of the calendar", "field.start", "2027-02-29", "2027-02-29"},
		{"another order", "field.start", "01.03.2027", "year-month-day"},
		{"title too long", "title", long, "1001 characters"},
	}
	for _, test := range tests {
		t.Run(test.name, func(t *testing.T) {
			before := New()
			m := after(before, Written{test.path, test.text})
			holds(t, "message", m.Messages[test.path], test.said)
			if m.Drafts[test.path].Text != test.text || m.Revision != before.Revision {
				t.Error("a bad text is lost, or was used")
			}
		})
	}
	m := after(New(), Sourced{oil, long})
	holds(t, "message", m.Messages[oil+".source"], "1001 characters")
	if m = after(m, Written{"field.start", "soon"}); !strings.Contains(m.Messages["field.start"], "In use: 2027-03-01.") {
		t.Errorf("message is %q, want the day in use", m.Messages["field.start"])
	}
}

func TestSwitchingUnitsChangesNoValue(t *testing.T) {
	m := after(New(), Edited{oil, "bad", "cp"}, Edited{"rock.table.3.krw", "x", ""}, Edited{"field.length", "600", "m"})
	before := m.Study
	for _, system := range []string{"metric", "lab", "field"} {
		m = after(m, Chosen{"system", system})
		if string(m.System) != system || m.Study.System != system {
			t.Errorf("shown in %s and %s, want %s", m.System, m.Study.System, system)
		}
		same := m.Study
		same.System = before.System
		if study.Write(same) != study.Write(before) {
			t.Errorf("switching to %s changed the study", system)
		}
		if m.Drafts[oil].Text != "bad" || m.Rows(tablePath)[3].Text[1] != "x" {
			t.Errorf("switching to %s lost what was typed", system)
		}
	}
}

func TestChosen(t *testing.T) {
	m := after(New(), Chosen{"rock.curve", "let-fit"}, Chosen{"field.drive", "pressure"})
	if m.Study.Rock.Curve != "let-fit" || m.Study.Field.Drive != "pressure" {
		t.Errorf("chosen are %q and %q", m.Study.Rock.Curve, m.Study.Field.Drive)
	}
	if n := after(m, Chosen{"rock.curve", "freehand"}, Chosen{"rock.colour", "red"}); n.Revision != m.Revision {
		t.Error("a choice that does not exist was taken")
	}
}

// TestFirstLettersOfABadText: 1e999 begins with 1 and 1e99, which are numbers. What
// stays in use is what was there before the field was typed in.
func TestFirstLettersOfABadText(t *testing.T) {
	m := after(New(), Edited{oil, "4", "cp"}, Left{})
	for _, text := range []string{"1", "1e", "1e9", "1e99", "1e999"} {
		m = after(m, Edited{oil, text, "cp"})
	}
	if in := m.Study.Fluids.OilViscosity; in == nil || in.Value != 4 || m.Drafts[oil].Text != "1e999" {
		t.Errorf("in use is %+v, shown is %+v", in, m.Drafts[oil])
	}
	holds(t, "message", m.Messages[oil], "1e999", "In use: 4")
	if m = after(m, Undone{}); m.Messages[oil] != "" || m.Study.Fluids.OilViscosity.Value != 4 {
		t.Errorf("one undo leads to %+v, message %q", m.Study.Fluids.OilViscosity, m.Messages[oil])
	}
}

// TestRefusedTextChangesNothingElse: the unit inside a text that is refused is not
// chosen, and what the letters before it spelled is not in use, nor its range moved.
func TestRefusedTextChangesNothingElse(t *testing.T) {
	const porosity = "field.porosity"
	base := after(empty(), Edited{porosity, "0.213", "fraction"}, Ranged{porosity, "0.2", "0.25"}, Left{})
	for _, text := range []string{"120 %", "0.3 %%", "0 md", "21 % of it"} {
		m := base
		for i := range text { // key by key, in the unit that the field shows
			_, unit := m.Shown(spec(t, porosity))
			m = after(m, Edited{porosity, text[:i+1], unit})
		}
		if m.Drafts[porosity] != (Draft{text, "fraction"}) || m.Messages[porosity] == "" {
			t.Errorf("%q leaves %+v, message %q", text, m.Drafts[porosity], m.Messages[porosity])
		}
		if !sameStudy(m.Study, base.Study) || m.Messages[porosity+".low"]+m.Messages[porosity+".high"] != "" {
			t.Errorf("%q leaves %s in use, and says %v", text, given(t, m, porosity), m.Messages)
		}
		_, unit := m.Shown(spec(t, porosity))
		if m = after(m, Edited{porosity, "0.25", unit}); given(t, m, porosity) != "0.25 fraction" {
			t.Errorf("after %q, 0.25 is read as %s", text, given(t, m, porosity))
		}
	}
	m := after(empty(), Edited{porosity, "0.2", "fraction"}, Edited{porosity, "0.2x", "fraction"})
	if given(t, m, porosity) != "" {
		t.Errorf("in an empty field the first letters of a bad text leave %s in use", given(t, m, porosity))
	}
}

func spec(t *testing.T, path string) study.Spec {
	t.Helper()
	s, ok := study.Find(path)
	if !ok {
		t.Fatalf("the study has no input %s", path)
	}
	return s
}
