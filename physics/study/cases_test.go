package study

import (
	"errors"
	"reflect"
	"strings"
	"testing"
)

// withCases is the demonstration with cases of every kind: an input, a choice
// with an input, an input that the base does not give, and nothing at all.
func withCases() Study {
	st := Demo()
	low, high := 30.0, 50.0
	st.Cases = []Case{
		{Name: "Thick oil", Set: map[string]Input{"fluids.oilViscosity": {Value: 41.7, Unit: "cp", Source: "analogue", Low: &low, High: &high}}},
		{Name: "LET, typed", Choose: map[string]string{"rock.curve": "let"}, Set: map[string]Input{"rock.let.lw": {Value: 2.2}}},
		{Name: "Mobile water", Set: map[string]Input{"front.initialWater": {Value: 37, Unit: "%"}}},
		{Name: "As it is"},
	}
	return st
}

func TestReadRefusesCases(t *testing.T) {
	written := Write(withCases())
	for _, c := range []struct{ name, old, new, path, reason string }{
		{"an unknown input", `"fluids.oilViscosity"`, `"fluids.oilVicsosity"`, "cases.0.set.fluids.oilVicsosity", "no such input"},
		{"out of range", `"value": 41.7`, `"value": -2`, "cases.0.set.fluids.oilViscosity", "read -2 cp, allowed: from"},
		{"a unit of another kind", "\"value\": 37,\n          \"unit\": \"%\"", `"value": 37, "unit": "md"`, "cases.2.set.front.initialWater", `"md", allowed: one of the units`},
		{"a range upside down", `"low": 30`, `"low": 60`, "cases.0.set.fluids.oilViscosity", "from 60 to 50"},
		{"an unknown choice", `"rock.curve": "let"`, `"rock.curl": "let"`, "cases.1.choose.rock.curl", "no such choice"},
		{"a choice that no answer rests on", `"rock.curve": "let"`, `"system": "lab"`, "cases.1.choose.system", "no such choice"},
		{"a value that cannot be chosen", `"rock.curve": "let"`, `"rock.curve": "hope"`, "cases.1.choose.rock.curve", `"hope", allowed: one of "table"`},
		{"text for an input", `"rock.let.lw": {`, `"rock.let.ew": "2", "rock.let.lw": {`, "cases.1.set.rock.let.ew", "read a text, allowed: an object"},
		{"number for a choice", `"rock.curve": "let"`, `"rock.curve": 7`, "cases.1.choose.rock.curve", "read a number, allowed: a text"},
		{"a list of changes", `"choose": {`, `"choose": [], "set": {`, "cases.1.set", "twice"},
		{"changes that are no object", "\"choose\": {\n        \"rock.curve\": \"let\"\n      }", `"choose": []`, "cases.1.choose", "read a list, allowed: an object"},
		{"no name", `"name": "Thick oil"`, `"name": " "`, "cases.0.name", "read no name"},
		{"a name twice", `"name": "Thick oil"`, `"name": "As it is"`, "cases.0.name", `"As it is", allowed: a name that nothing else`},
		{"the name of the base", `"name": "Thick oil"`, `"name": "base CASE"`, "cases.0.name", "nothing else"},
		{"a long name", `"name": "Thick oil"`, `"name": "` + strings.Repeat("x", MaxCaseName+1) + `"`, "cases.0.name", "longer than 60"},
		{"a missing name", `"name": "As it is"`, ``, "cases.3.name", "missing"},
		{"an unknown member", `"name": "As it is"`, `"name": "As it is", "colour": "red"`, "cases.3.colour", "no such name"},
		{"too many", `"cases": [`, `"cases": [{"name": "a"}, {"name": "b"},`, "cases", "read 6 cases, allowed: up to 5"},
	} {
		text := strings.Replace(written, c.old, c.new, 1)
		if text == written {
			t.Fatalf("%s: the study does not hold %q", c.name, c.old)
		}
		_, err := Read(text)
		var file *FileError
		if !errors.As(err, &file) {
			t.Errorf("%s: got %v, want a refusal", c.name, err)
		} else if file.Path != c.path || !strings.Contains(file.Reason, c.reason) {
			t.Errorf("%s: refused at %q because %q, want at %q because %q", c.name, file.Path, file.Reason, c.path, c.reason)
		}
	}
}

// No cases, an empty list of them and empty lists of changes are one study each.
func TestEmptyListsOfCasesAreNone(t *testing.T) {
	demo := Write(Demo())
	if strings.Contains(demo, "cases") {
		t.Error("a study without cases writes some")
	}
	for changes, want := range map[string][]Case{
		`"cases": [], `: nil,
		`"cases": [{"name": "x", "set": {}, "choose": {}}], `: {{Name: "x"}},
	} {
		st, err := Read(strings.Replace(demo, `"title"`, changes+`"title"`, 1))
		if err != nil || !reflect.DeepEqual(st.Cases, want) {
			t.Errorf("%s: %+v (%v)", changes, st.Cases, err)
		}
	}
}

func TestWriteOfCasesIsStable(t *testing.T) {
	first := Write(withCases())
	for range 20 {
		if Write(withCases()) != first {
			t.Fatal("the same study is written differently")
		}
	}
}

func TestCloneSharesNoCase(t *testing.T) {
	original, touched := withCases(), withCases()
	c := touched.Clone()
	if !reflect.DeepEqual(c, touched) {
		t.Fatal("a clone differs from its original")
	}
	*c.Cases[0].Set["fluids.oilViscosity"].Low = -1
	c.Cases[1].Choose["rock.curve"] = "corey"
	c.Cases[2].Set["front.initialWater"] = Input{}
	c.Cases[3].Name = "changed"
	if !reflect.DeepEqual(original, touched) {
		t.Error("changing a clone changed its original")
	}
}

func TestCaseOnLeavesTheBaseAlone(t *testing.T) {
	base := withCases()
	st := base.Cases[1].On(base)
	if st.Rock.Curve != "let" || st.Rock.LET.Lw.Value != 2.2 || st.Cases != nil || st.Fluids.OilViscosity.Value != 8.3 {
		t.Errorf("the case is %+v", st)
	}
	if !reflect.DeepEqual(base, withCases()) {
		t.Error("making a case changed the base")
	}
	if got := base.Cases[1].Changes(); !reflect.DeepEqual(got, []string{"rock.curve", "rock.let.lw"}) {
		t.Errorf("the case changes %v", got)
	}
}

func TestCasePaths(t *testing.T) {
	for path, want := range map[string]struct {
		i     int
		inner string
		ok    bool
	}{
		CasePath(2, "fluids.oilViscosity"): {2, "fluids.oilViscosity", true},
		"cases.0.name":                     {0, "name", true},
		"cases.x.name":                     {},
		"cases.-1.name":                    {},
		"cases.3":                          {},
		"cases":                            {},
		"fluids.oilViscosity":              {},
	} {
		i, inner, ok := AtCase(path)
		if ok != want.ok || ok && (i != want.i || inner != want.inner) {
			t.Errorf("%s: %d %q %v", path, i, inner, ok)
		}
	}
}
