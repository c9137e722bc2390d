package report

import (
	"strings"
	"testing"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

// compared is the demonstration with two cases.
func compared() study.Study {
	st := study.Demo()
	st.Cases = []study.Case{
		{Name: "Thick {oil}", Set: map[string]study.Input{"fluids.oilViscosity": {Value: 12, Unit: "cp", Source: "analogue, p. 4"}, "front.initialWater": {Value: 30, Unit: "%"}}},
		{Name: "LET", Choose: map[string]string{"rock.curve": "let"}},
		{Name: "As it is"},
	}
	return st
}

// TestCasesAreReported: what each case changes stands beside what the study has,
// and the comparison has its place among the answers, tables and pictures.
func TestCasesAreReported(t *testing.T) {
	st := compared()
	r := study.Run(st)
	d := Build(st, r, units.Field)
	text := Text(d)
	for _, want := range [][]string{
		{"Thick {oil}", "Oil viscosity", "8.3 cp", "12 cp", "analogue, p. 4"},
		{"Thick {oil}", "Initial water saturation", "Swc of the curve", "30 %", "not given"},
		{"LET", "Curve used", "Corey, fitted to the points", "LET, typed"},
		{"As it is", "nothing is changed"},
	} {
		found := false
		for _, line := range strings.Split(text, "\n") {
			all := true
			for _, piece := range want {
				all = all && strings.Contains(line, piece)
			}
			found = found || all
		}
		if !found {
			t.Errorf("no line of the report holds all of %q", want)
		}
	}
	part := r.Parts[study.SheetCompare]
	if part.Status != study.Ready {
		t.Fatalf("the comparison is %s", part.Status)
	}
	for _, want := range []string{"Against the base case, “Thick {oil}” brings the front ", part.Tables[0].Title, part.Charts[0].Summary, "Case 1, Oil viscosity"} {
		if !strings.Contains(text, want) {
			t.Errorf("the report does not hold %q", want)
		}
	}
	for _, f := range part.Figures {
		if !strings.Contains(text, f.Label+", "+f.Symbol+" = "+Value(f, units.Field)) {
			t.Errorf("the working of %s is missing", f.ID)
		}
	}
	plain := Text(Build(study.Demo(), study.Run(study.Demo()), units.Field))
	if strings.Contains(plain, study.BaseCase) || strings.Contains(plain, "Cases") {
		t.Error("a study without cases is reported as compared")
	}
}

func TestLabelsOfCases(t *testing.T) {
	st := study.Empty()
	for path, want := range map[string]string{
		"cases.1.fluids.oilViscosity": "Case 2, Oil viscosity", "cases.0.rock.curve": "Case 1, Curve used", "cases.4.name": "Case 5, name",
	} {
		if got := Label(&st, path); got != want {
			t.Errorf("%s is called %q, want %q", path, got, want)
		}
	}
}

// TestLabelsFollowThePair: what is called oil viscosity is that of the phase that is there.
func TestLabelsFollowThePair(t *testing.T) {
	st := study.Empty()
	st.Fluids.Pair = "co2-brine"
	if got := Label(&st, "fluids.oilViscosity"); got == "Oil viscosity" || !strings.Contains(strings.ToLower(got), "brine") {
		t.Errorf("the viscosity of brine before CO2 is called %q", got)
	}
}
