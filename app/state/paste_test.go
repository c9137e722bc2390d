package state

import (
	"strings"
	"testing"

	"brinefront/physics/paste"
	"brinefront/physics/study"
)

const pastedTable = "Sw\tkrw\tkro\n0,2\t0\t0,9\n0,5\t0,1\t0,3\n0,7\t0,3\t0\n"

func TestPaste(t *testing.T) {
	before := after(New(), Sourced{"rock.table", "report 7, page 12"}, Edited{"rock.table.0.sw", "bad", ""}, Edited{oil, "thick", "cp"})
	m, effects := play(before, Pasted{pastedTable})
	if m.Paste == nil || m.Paste.Text != pastedTable || m.Revision != before.Revision || len(effects) > 0 {
		t.Fatalf("a paste shows %+v and asks for %v; want a preview and nothing more", m.Paste, effects)
	}
	m, effects = play(m, PasteAccepted{})
	if got, want := table(m), "[0.2 0.5 0.7] [0 0.1 0.3] [0.9 0.3 0]"; got != want {
		t.Errorf("the table is %s, want %s", got, want)
	}
	if m.Paste != nil || len(m.Rows) != 3 || m.Rows[1].Text != [3]string{"0.5", "0.1", "0.3"} || m.Messages["rock.table"] != "" {
		t.Errorf("after accepting: preview %v, rows %v, message %q", m.Paste, m.Rows, m.Messages["rock.table"])
	}
	if m.Study.Rock.Table.Source != "report 7, page 12" || m.Drafts[oil].Text != "thick" {
		t.Error("accepting lost the source or what was typed elsewhere")
	}
	if len(of[Run](effects)) != 1 {
		t.Errorf("accepting asks for %v", effects)
	}
	m = after(m, Undone{})
	if table(m) != table(before) || m.Rows[0].Text[0] != "bad" {
		t.Errorf("one undo leads to %s, first cell %q", table(m), m.Rows[0].Text[0])
	}
}

func TestPasteMapped(t *testing.T) {
	m := after(empty(), Pasted{"0.2 0 0.9\n0.5 0.1 0.3\n0.7 0.3 0\n"}, PasteMapped{1, paste.Kro}, PasteMapped{2, paste.Krw}, PasteAccepted{})
	if got, want := table(m), "[0.2 0.5 0.7] [0.9 0.3 0] [0 0.1 0.3]"; got != want {
		t.Errorf("the table is %s, want %s, as the person mapped it", got, want)
	}
}

func TestPasteRefused(t *testing.T) {
	for name, text := range map[string]string{
		"letters":  "Sw krw kro\n0.2 a 0.9\n0.5 b 0.3\n0.7 c 0\n",
		"too long": strings.Repeat("0.2 0 0.9\n", 600_000),
		"a word":   "hello",
	} {
		t.Run(name, func(t *testing.T) {
			before := New()
			m := after(before, Pasted{text}, PasteAccepted{})
			if m.Revision != before.Revision || m.Paste == nil || len(m.Paste.Reading.Problems) == 0 {
				t.Errorf("a text that is no table was used, or nothing is said about it")
			}
			if m = after(m, PasteDropped{}); m.Paste != nil {
				t.Error("the preview cannot be dropped")
			}
		})
	}
	if m := after(New(), Pasted{"x"}, Pasted{" \n"}); m.Paste != nil {
		t.Error("the preview of an emptied text stays")
	}
	if m := after(New(), PasteAccepted{}, PasteMapped{0, paste.Sw}, PasteDropped{}); m.Paste != nil || m.CanUndo {
		t.Error("without a paste something is accepted")
	}
}

// TestInventedSourceGoesWithTheNumber: what the demonstration says of its own
// numbers is not said of a number that the person typed or pasted.
func TestInventedSourceGoesWithTheNumber(t *testing.T) {
	m := after(New(), Pasted{pastedTable}, PasteAccepted{}, Edited{oil, "4.1", "cp"})
	if source := m.Study.Rock.Table.Source; source != "" {
		t.Errorf("the pasted table's source is %q", source)
	}
	if in := m.Study.Fluids.OilViscosity; in.Value != 4.1 || in.Source != "" {
		t.Errorf("the typed viscosity is %+v", in)
	}
	if in := m.Study.Fluids.WaterViscosity; in.Source != study.Invented {
		t.Errorf("the untouched viscosity's source is %q", in.Source)
	}
}
