package state

import (
	"fmt"
	"testing"

	"brinefront/physics/study"
)

func TestKeystrokesAreOneStep(t *testing.T) {
	m := after(empty(), typed(oil, "cp", "12.5")...)
	m = after(m, typed("field.length", "ft", "1900")...)
	if m = after(m, Undone{}); given(t, m, oil) != "12.5 cp" || given(t, m, "field.length") != "" {
		t.Errorf("after one undo: %q and %q", given(t, m, oil), given(t, m, "field.length"))
	}
	if m = after(m, Undone{}); given(t, m, oil) != "" || m.CanUndo {
		t.Errorf("after two: %q, more to undo: %t", given(t, m, oil), m.CanUndo)
	}
	if m = after(m, Redone{}, Redone{}); given(t, m, oil) != "12.5 cp" || given(t, m, "field.length") != "1900 ft" || m.CanRedo {
		t.Errorf("after redo: %q and %q", given(t, m, oil), given(t, m, "field.length"))
	}
	if m = after(m, Undone{}, Edited{oil, "3", "cp"}); m.CanRedo {
		t.Error("an edit after undo leaves something to redo")
	}
}

func TestUndoBringsBackWhatWasTyped(t *testing.T) {
	m := after(empty(), Edited{oil, "5", "cp"}, Edited{"field.length", "long", "ft"}, StartedEmpty{})
	if len(m.Drafts) > 0 || len(m.Messages) > 0 {
		t.Errorf("a new study shows what was typed for another: %v", m.Drafts)
	}
	m = after(m, Undone{})
	if m.Drafts["field.length"].Text != "long" || m.Messages["field.length"] == "" || given(t, m, oil) != "5 cp" {
		t.Errorf("undo brings back %v", m.Drafts)
	}
	if m = after(m, Undone{}); m.Drafts["field.length"].Text != "" || given(t, m, oil) != "5 cp" {
		t.Errorf("a bad text is no step of its own: %v", m.Drafts)
	}
}

func TestUndoComputesAndKeeps(t *testing.T) {
	m := after(empty(), Edited{oil, "5", "cp"})
	n, effects := Update(m, Undone{})
	if n.Revision != m.Revision+1 || len(of[Run](effects)) != 1 || len(of[Keep](effects)) != 1 {
		t.Errorf("undo asks for %v at revision %d", effects, n.Revision)
	}
	if _, effects := Update(after(n, Undone{}), Undone{}); len(effects) > 0 {
		t.Errorf("with nothing left to undo: %v", effects)
	}
	if _, effects := Update(m, Redone{}); len(effects) > 0 {
		t.Errorf("with nothing to redo: %v", effects)
	}
}

func TestManySteps(t *testing.T) {
	const edits = 700 // more than are remembered
	m := empty()
	texts := []string{study.Write(m.Study)}
	for i := range edits {
		m = after(m, Edited{[]string{oil, "fluids.waterViscosity"}[i%2], fmt.Sprint(i + 1), "cp"})
		texts = append(texts, study.Write(m.Study))
	}
	undone := 0
	for m.CanUndo {
		m = after(m, Undone{})
		undone++
		if study.Write(m.Study) != texts[edits-undone] {
			t.Fatalf("undo %d brings back another study", undone)
		}
	}
	if undone < 200 {
		t.Errorf("%d steps can be undone, want at least 200", undone)
	}
	for m.CanRedo {
		m = after(m, Redone{})
	}
	if study.Write(m.Study) != texts[edits] {
		t.Error("redo does not lead back to the last study")
	}
}

// TestAUnitTypedAlongIsNoStepOfItsOwn: "0.22 frac" is a number with its unit, and so
// is "0.22 fraction"; undo leads to before the field was typed in.
func TestAUnitTypedAlongIsNoStepOfItsOwn(t *testing.T) {
	const porosity = "field.porosity"
	base := after(empty(), Edited{porosity, "21", "%"}, Left{})
	m := base
	text := "0.22 fraction"
	for i := range text {
		_, unit := m.Shown(spec(t, porosity))
		m = after(m, Edited{porosity, text[:i+1], unit})
	}
	if m = after(m, Left{}); given(t, m, porosity) != "0.22 fraction" {
		t.Fatalf("in use is %s", given(t, m, porosity))
	}
	if m = after(m, Undone{}); !m.page().same(base.page()) {
		t.Errorf("undo leads to %q, draft %+v", given(t, m, porosity), m.Drafts[porosity])
	}
}

func TestAUnitChosenIsAStepOfItsOwn(t *testing.T) {
	m := after(empty(), Edited{oil, "5", "cp"}, Edited{oil, "5", "Pa.s"}, Edited{oil, "56", "Pa.s"})
	for _, want := range []string{"5 Pa.s", "5 cp", ""} {
		if m = after(m, Undone{}); given(t, m, oil) != want {
			t.Errorf("undo leads to %q, want %q", given(t, m, oil), want)
		}
	}
}
