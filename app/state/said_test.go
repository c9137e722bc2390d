package state

import (
	"slices"
	"testing"

	"brinefront/physics/study"
)

// contradicted are answered inputs of which two contradict each other, typed key by
// key and answered at each, after answers to lawful ones.
func contradicted() (before, m Model) {
	before = answer(after(answer(New()), Chosen{"rock.curve", "corey"}, Edited{"rock.corey.swc", "0.8", "fraction"}, Edited{"rock.corey.sor", "0.1", "fraction"}, Left{}))
	m = before
	for _, text := range []string{"0", "0.", "0.0", "0.3"} {
		m = answer(after(m, Edited{"rock.corey.sor", text, "fraction"}))
	}
	return before, m
}

func TestLastGoodAnswer(t *testing.T) {
	before, m := contradicted()
	if m.Result.Parts[study.SheetRock].Status != study.Refused {
		t.Fatal("the inputs do not contradict each other")
	}
	want := before.Result.Parts[study.SheetRock]
	if now, stale := m.Part(study.SheetRock); !stale || len(now.Figures) == 0 || !slices.EqualFunc(now.Figures, want.Figures, func(a, b study.Figure) bool { return a.Value == b.Value }) {
		t.Errorf("stale %t, figures %v", stale, now.Figures)
	}
	if part, stale := before.Part(study.SheetRock); stale || part.Status != study.Ready {
		t.Error("a good answer is called stale")
	}
	m = answer(after(m, Left{}, Edited{"rock.corey.sor", "0.05", "fraction"}))
	if part, stale := m.Part(study.SheetRock); stale || part.Figures[0].Value != m.Result.Parts[study.SheetRock].Figures[0].Value {
		t.Error("the last good answer outlives the next one")
	}
	if part, stale := answer(after(before, Edited{"rock.corey.sor", "", "fraction"})).Part(study.SheetRock); stale || part.Status != study.Waiting {
		t.Error("a sheet that waits for an input shows an answer")
	}
}

func TestLastGoodAnswerIsOfTheSameStudy(t *testing.T) {
	_, bad := contradicted()
	m := answer(after(answer(New()), FileChosen{"bad.json", study.Write(bad.Study)}))
	if part, stale := m.Part(study.SheetRock); stale || part.Status != study.Refused {
		t.Error("a study that is opened shows the answers to another")
	}
}

func TestEngineProblemsAreSaidAtEveryField(t *testing.T) {
	_, m := contradicted()
	holds(t, "at Swc", m.Said("rock.corey.swc"), "0.8 beside Sor = 0.3", "allowed")
	holds(t, "at Sor", m.Said("rock.corey.sor"), "0.3 beside Swc = 0.8", "allowed")
	if said := m.Said("rock.corey.nw"); said != "" {
		t.Errorf("at a good field: %q", said)
	}
	m = after(m, Edited{"rock.corey.sor", "some", "fraction"})
	if said := m.Said("rock.corey.sor"); said != m.Messages["rock.corey.sor"] {
		t.Errorf("at a text that cannot be read: %q", said)
	}
}

// TestProblemsOfCellsAreSaidWhereTheyStand: rows that are left out of the study stand
// in the form all the same.
func TestProblemsOfCellsAreSaidWhereTheyStand(t *testing.T) {
	m := answer(after(New(), Chosen{"rock.curve", "table"}, RowAdded{tablePath, -1}, Edited{"rock.table.6.krw", "0.001", ""}))
	holds(t, "at the cell", m.Said("rock.table.6.krw"), "0.001")
	for _, path := range []string{"rock.table.5.krw", "rock.table.7.krw", "rock.table.6.sw"} {
		if said := m.Said(path); said != "" {
			t.Errorf("at %s: %q", path, said)
		}
	}
	m = after(m, Edited{"rock.table.1.sw", "bad", ""})
	if said := m.Said("rock.table.6.krw"); said != "" {
		t.Errorf("while an earlier table is in use: %q", said)
	}
}
