package sheet

import (
	"strings"
	"testing"

	"brinefront/app/state"
	"brinefront/app/widget"
	"brinefront/physics/report"
	"brinefront/physics/study"
)

// compared is the demonstration with three cases: one changes an input and a
// choice, one is half typed, one changes nothing.
func compared(sheet string) state.Model {
	return on(sheet, after(
		state.CaseAdded{Name: "Thick oil"}, state.CaseInputSet{Index: 0, Path: "fluids.oilViscosity", Text: "12.5", Unit: "cp"}, state.CaseChosen{Index: 0, Path: "rock.curve", Value: "let"},
		state.CaseAdded{}, state.CaseInputSet{Index: 1, Path: "field.length", Text: "far", Unit: "ft"}, state.CaseInputSet{Index: 1, Path: "front.initialWater", Text: "", Unit: "%"},
		state.CaseAdded{Name: "As it is"},
	))
}

func TestCompareSaysWhatToDoWithoutCases(t *testing.T) {
	p := rendered(t, on("compare", after()))
	if text := p.text(t, "no-cases"); !strings.Contains(text, "No cases yet") || !strings.Contains(text, "Add one") {
		t.Errorf("the sheet says %q", text)
	}
	if p.byID["case-add"] == nil {
		t.Error("no case can be added")
	}
	if text := textOf(p.byID["tab-compare"]); !strings.Contains(text, "no cases yet") {
		t.Errorf("the rail says %q", text)
	}
}

func TestCompareShowsTheCases(t *testing.T) {
	m := compared("compare")
	p := rendered(t, m)
	part := m.Result.Parts[study.SheetCompare]
	if said := p.text(t, "answer-compare"); !strings.Contains(said, "“Thick oil” brings water") {
		t.Errorf("the sentence is %q", said)
	}
	if p.byID["no-cases"] != nil {
		t.Error("the sheet says that there are no cases")
	}
	for _, g := range part.Tables {
		if p.byID["grid-"+g.ID] == nil {
			t.Errorf("the table %s is not on the page", g.ID)
		}
	}
	for _, c := range part.Charts {
		if p.byID["pic-"+c.ID] == nil {
			t.Errorf("the picture %s has no holder", c.ID)
		}
	}
	for id, want := range map[string]string{
		"case-0-name": "Thick oil", "case-0-input-fluids-oilViscosity": "12.5", "case-1-name": "Case 2", "case-1-input-field-length": "far", "case-1-input-front-initialWater": "", "case-2-name": "As it is",
	} {
		n := p.byID[id]
		if n == nil {
			t.Errorf("no element %s", id)
			continue
		}
		if got, _ := attribute(n, "value"); got != want {
			t.Errorf("%s holds %q, want %q", id, got, want)
		}
	}
	if text := p.text(t, "msg-cases-1-field-length"); !strings.Contains(text, "far") || !strings.Contains(text, "allowed") {
		t.Errorf("the message beside a bad text is %q", text)
	}
	for _, id := range []string{"case-0-remove", "case-0-more", "case-0-back-fluids-oilViscosity", "case-0-input-rock-curve", "case-add"} {
		if p.byID[id] == nil {
			t.Errorf("no element %s", id)
		}
	}
	if text := textOf(p.byID["case-0-back-fluids-oilViscosity"].Parent); !strings.Contains(text, study.BaseCase+": 8.3 cp") {
		t.Errorf("beside the case's viscosity stands %q, want the base's", text)
	}
}

// A further input is offered once, and only when the case rests on it.
func TestCaseOffersWhatItRestsOn(t *testing.T) {
	offered := func(id string) string {
		var values []string
		for _, n := range rendered(t, compared("compare")).all("option") {
			if of, _ := attribute(n.Parent, "id"); of == id {
				value, _ := attribute(n, "value")
				values = append(values, value)
			}
		}
		return " " + strings.Join(values, " ") + " "
	}
	thick, same := offered("case-0-more"), offered("case-2-more")
	for _, path := range []string{"rock.let.lw", "field.rate", "field.limit"} {
		if !strings.Contains(thick, " "+path+" ") {
			t.Errorf("%s is not offered in %q", path, thick)
		}
	}
	for _, path := range []string{"fluids.oilViscosity", "rock.curve", "system", "rock.corey.nw", "field.pressure"} {
		if strings.Contains(thick, " "+path+" ") {
			t.Errorf("%s is offered in %q", path, thick)
		}
	}
	if strings.Contains(same, " rock.let.lw ") || !strings.Contains(same, " fluids.oilViscosity ") {
		t.Errorf("the case that changes nothing offers %q", same)
	}
}

// Every field that a note or a working of the comparison names has its element.
func TestPathsOfCasesLeadToFields(t *testing.T) {
	m := compared("compare")
	p := rendered(t, m)
	for _, path := range []string{"cases.0.fluids.oilViscosity", "cases.0.rock.curve", "cases.2.name"} {
		if sheetOf(path) != "compare" || p.byID[widget.FieldID(path)] == nil {
			t.Errorf("%s leads to %s, %q", path, sheetOf(path), widget.FieldID(path))
		}
		if report.Label(&m.Study, path) == path {
			t.Errorf("%s has no label", path)
		}
	}
}
