package sheet

import (
	"strings"
	"testing"

	"brinefront/app/state"
	"brinefront/physics/study"
)

// contradicted is a study whose end points meet, after one in which they do not.
func contradicted(sheet string) state.Model {
	typed := func(path, text string) state.Msg {
		return state.Edited{Path: "rock.corey." + path, Text: text, Unit: "fraction"}
	}
	m := after(state.Chosen{Path: "rock.curve", Value: "corey"}, typed("swc", "0.3"), typed("sor", "0.2"), state.Left{})
	for _, msg := range []state.Msg{typed("swc", "0.8"), state.Left{}, typed("sor", "0.3")} {
		m, _ = state.Update(m, msg)
	}
	m, _ = state.Update(m, state.Answered{Revision: m.Revision, Parts: study.Run(m.Study).Parts})
	return on(sheet, m)
}

func TestContradictingInputsKeepTheLastAnswerMarked(t *testing.T) {
	p := rendered(t, contradicted("rock"))
	page := textOf(p.byID["main"])
	problem, mark := strings.Index(page, "No answer"), strings.Index(page, "Answer to the inputs before")
	if problem < 0 || mark < problem {
		t.Errorf("the problem stands at %d, the mark at %d", problem, mark)
	}
	shown, stale := false, false
	for _, n := range p.nodes {
		if value, _ := attribute(n, "data-figure"); value == "rock.swc" {
			value, _ := attribute(n, "data-value")
			shown = value == "0.3"
		}
		_, marked := attribute(n, "data-stale")
		stale = stale || marked
	}
	if !shown || !stale {
		t.Errorf("the last Swc is shown: %t, marked: %t", shown, stale)
	}
	for _, id := range []string{"in-rock-corey-swc", "in-rock-corey-sor"} {
		if _, bad := attribute(p.byID[id], "aria-invalid"); !bad {
			t.Errorf("%s is not marked as refused", id)
		}
		if said := p.text(t, strings.Replace(id, "in-", "msg-", 1)); !strings.Contains(said, "below 1") {
			t.Errorf("beside %s stands %q", id, said)
		}
	}
	for _, n := range rendered(t, on("rock", after())).nodes {
		if _, marked := attribute(n, "data-stale"); marked {
			t.Error("a good answer is marked as one to the inputs before")
		}
	}
}

func TestRailTellsARefusedText(t *testing.T) {
	for name, test := range map[string]struct {
		tab string
		msg state.Msg
	}{
		"a number":          {"tab-front", state.Edited{Path: "fluids.oilViscosity", Text: "-2", Unit: "cp"}},
		"an end of a range": {"tab-front", state.Ranged{Path: "fluids.oilViscosity", Low: "few"}},
		"a cell":            {"tab-rock", state.Edited{Path: "rock.table.2.krw", Text: "half"}},
		"a day":             {"tab-field", state.Written{Path: "field.start", Text: "soon"}},
	} {
		p := rendered(t, on("evidence", after(test.msg)))
		for _, tab := range []string{"tab-rock", "tab-front", "tab-field"} {
			if refused := strings.Contains(p.text(t, tab), "✕ input refused"); refused != (tab == test.tab) {
				t.Errorf("%s: %s says %q", name, tab, p.text(t, tab))
			}
		}
	}
	if said := rendered(t, on("rock", after(state.RowAdded{Table: "rock.table", After: 1}, state.Edited{Path: "rock.table.2.krw", Text: "0.1"}))).text(t, "tab-rock"); strings.Contains(said, "refused") {
		t.Errorf("of a row that is not filled yet the rail says %q", said)
	}
}

func TestFormerStudyIsOffered(t *testing.T) {
	p := rendered(t, on("front", after(state.Written{Path: "title", Text: "North block"}, state.StartedEmpty{})))
	if said := p.text(t, "do-bring-back"); said != "Bring back “North block”" {
		t.Errorf("the link reads %q", said)
	}
	if p := rendered(t, on("front", after(state.StartedEmpty{}))); p.byID["do-bring-back"] != nil {
		t.Error("the untouched demonstration is offered")
	}
}
