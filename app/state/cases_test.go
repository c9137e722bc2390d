package state

import (
	"reflect"
	"testing"

	"brinefront/physics/study"
)

// caseOil is the oil viscosity of the first case.
var caseOil = study.CasePath(0, oil)

func TestCasesAreAddedAndRemoved(t *testing.T) {
	m, effects := play(New(), CaseAdded{}, CaseAdded{"  Thick oil "}, CaseAdded{})
	var names []string
	for _, c := range m.Study.Cases {
		names = append(names, c.Name)
	}
	if want := []string{"Case 1", "Thick oil", "Case 3"}; !reflect.DeepEqual(names, want) {
		t.Errorf("the cases are %q, want %q", names, want)
	}
	if runs := of[Run](effects); len(runs) != 3 || len(runs[2].Study.Cases) != 3 {
		t.Errorf("%d runs were asked for, want one a case", len(runs))
	}
	m = after(m, CaseAdded{"thick OIL"})
	if len(m.Study.Cases) != 3 {
		t.Error("a second case of the same name was added")
	}
	holds(t, "the notice", m.Notices[len(m.Notices)-1].Text, "No case was added", `"thick OIL"`, "nothing else")
	m = after(m, CaseAdded{}, CaseAdded{}, CaseAdded{})
	if len(m.Study.Cases) != study.MaxCases {
		t.Errorf("%d cases, want at most %d", len(m.Study.Cases), study.MaxCases)
	}
	holds(t, "the notice", m.Notices[len(m.Notices)-1].Text, "There are 5 cases", "Remove one")
	for range study.MaxCases {
		m = after(m, CaseRemoved{0})
	}
	if m.Study.Cases != nil {
		t.Errorf("all cases are removed, and %v is left", m.Study.Cases)
	}
	if left := after(m, CaseRemoved{0}, CaseRemoved{-1}); left.Revision != m.Revision {
		t.Error("a case that is not there was removed")
	}
}

// What is typed for a case goes the way of any input: number and unit, bad text
// kept with what stays in use, one undo step a field.
func TestCaseInputsAreTyped(t *testing.T) {
	m := after(New(), CaseAdded{"Thick oil"})
	m = after(m, typed(caseOil, "cp", "12.5")...)
	if got := m.Study.Cases[0].Set[oil]; got != (study.Input{Value: 12.5, Unit: "cp"}) {
		t.Errorf("the case sets %+v", got)
	}
	if given(t, m, oil) != "8.3 cp" {
		t.Errorf("the base is changed to %s", given(t, m, oil))
	}
	if back := after(m, Undone{}); len(back.Study.Cases) != 1 || back.Study.Cases[0].Set != nil {
		t.Errorf("one undo leads to %+v", back.Study.Cases)
	}
	bad := after(m, Left{}, CaseInputSet{0, oil, "thick", "cp"})
	if bad.Drafts[caseOil] != (Draft{"thick", "cp"}) || bad.Study.Cases[0].Set[oil].Value != 12.5 {
		t.Errorf("a bad text: draft %+v, in use %+v", bad.Drafts[caseOil], bad.Study.Cases[0].Set[oil])
	}
	holds(t, "the message", bad.Messages[caseOil], "thick", "allowed: a number", "In use: 12.5 cp")
	low := after(m, Left{}, Edited{caseOil, "-1", "cp"})
	holds(t, "the message", low.Messages[caseOil], "Read -1 cp", "allowed: from")
	pascal := after(m, CaseInputSet{0, oil, "0.02", "Pa.s"})
	if got := pascal.Study.Cases[0].Set[oil]; got != (study.Input{Value: 0.02, Unit: "Pa.s"}) {
		t.Errorf("in another unit: %+v", got)
	}
	sourced := after(m, Sourced{caseOil, "analogue"}, Ranged{caseOil, "10", "15"})
	if in := sourced.Study.Cases[0].Set[oil]; in.Source != "analogue" || *in.Low != 10 || *in.High != 15 {
		t.Errorf("source and range: %+v", in)
	}
	if m.Study.Cases[0].Set[oil].Source != "" {
		t.Error("the model before was written to")
	}
}

// An emptied field stays on the form, and the case is as the base meanwhile.
func TestEmptiedCaseInputStays(t *testing.T) {
	m := after(New(), CaseAdded{"x"}, CaseInputSet{0, oil, "5", "cp"}, Left{}, CaseInputSet{0, oil, "", "cp"})
	if m.Study.Cases[0].Set != nil {
		t.Errorf("an empty field sets %v", m.Study.Cases[0].Set)
	}
	if got := m.CaseInputs(0); !reflect.DeepEqual(got, []string{oil}) {
		t.Errorf("the form shows %v", got)
	}
	m = after(m, CaseInputRemoved{0, oil})
	if got := m.CaseInputs(0); got != nil {
		t.Errorf("the form shows %v after the input is removed", got)
	}
	if back := after(m, Undone{}); len(back.CaseInputs(0)) != 1 {
		t.Error("undo does not bring the field back")
	}
}

func TestCaseChoices(t *testing.T) {
	m := after(New(), CaseAdded{"x"}, CaseChosen{0, "rock.curve", "let"})
	if m.Study.Cases[0].Choose["rock.curve"] != "let" || m.Study.Rock.Curve == "let" {
		t.Errorf("case %v, base %q", m.Study.Cases[0].Choose, m.Study.Rock.Curve)
	}
	for _, bad := range []Msg{
		CaseChosen{0, "rock.curve", "hope"}, CaseChosen{0, "rock.curve", ""}, CaseChosen{0, "system", "lab"}, CaseChosen{1, "rock.curve", "let"}, CaseChosen{-1, "rock.curve", "let"},
		CaseInputSet{1, oil, "3", "cp"}, CaseInputSet{0, "no.such", "3", "cp"}, CaseNamed{1, "y"}, CaseInputRemoved{0, oil}, CaseInputRemoved{7, "rock.curve"},
		Edited{study.CasePath(3, oil), "3", "cp"}, Sourced{study.CasePath(3, oil), "x"},
	} {
		if n := after(m, bad); n.Revision != m.Revision || len(n.Drafts) != len(m.Drafts) {
			t.Errorf("%#v changes something", bad)
		}
	}
	if n := after(m, CaseInputRemoved{0, "rock.curve"}); n.Study.Cases[0].Choose != nil {
		t.Errorf("the choice is left: %v", n.Study.Cases[0].Choose)
	}
}

func TestCaseNames(t *testing.T) {
	m := after(New(), CaseAdded{"a"}, CaseAdded{"b"}, CaseNamed{1, "Mobile"}, CaseNamed{1, "Mobile water"})
	if m.Study.Cases[1].Name != "Mobile water" {
		t.Errorf("the name is %q", m.Study.Cases[1].Name)
	}
	if back := after(m, Undone{}); back.Study.Cases[1].Name != "b" {
		t.Errorf("one undo leads to the name %q", back.Study.Cases[1].Name)
	}
	for text, why := range map[string]string{"": "no name", " A ": "nothing else", study.BaseCase: "nothing else"} {
		n := after(m, CaseNamed{1, text})
		path := study.CasePath(1, "name")
		if n.Study.Cases[1].Name != "Mobile water" || n.Drafts[path].Text != text {
			t.Errorf("%q: the name is %q, the field holds %q", text, n.Study.Cases[1].Name, n.Drafts[path].Text)
		}
		holds(t, "the message", n.Messages[path], why, "In use: Mobile water")
	}
}

// What is typed into the forms of other cases moves with them.
func TestRemovingACaseLosesNothingTypedElsewhere(t *testing.T) {
	m := after(New(), CaseAdded{"a"}, CaseAdded{"b"}, CaseAdded{"c"},
		CaseInputSet{0, oil, "one", "cp"}, CaseInputSet{1, oil, "two", "cp"}, CaseInputSet{2, oil, "three", "cp"}, Edited{oil, "base", "cp"},
		CaseRemoved{1})
	for path, want := range map[string]string{study.CasePath(0, oil): "one", study.CasePath(1, oil): "three", study.CasePath(2, oil): "", oil: "base"} {
		if m.Drafts[path].Text != want || (m.Messages[path] != "") != (want != "") {
			t.Errorf("%s holds %q, want %q (%s)", path, m.Drafts[path].Text, want, m.Messages[path])
		}
	}
}
