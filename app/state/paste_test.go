package state

import (
	"fmt"
	"strings"
	"testing"

	"brinefront/physics/paste"
	"brinefront/physics/study"
)

const pastedTable = "Sw\tkrw\tkro\n0,2\t0\t0,9\n0,5\t0,1\t0,3\n0,7\t0,3\t0\n"

func TestPaste(t *testing.T) {
	before := after(New(), Sourced{"rock.table", "report 7, page 12"}, Edited{"rock.table.0.sw", "bad", ""}, Edited{oil, "thick", "cp"})
	m, effects := play(before, Pasted{tablePath, pastedTable})
	if m.Paste == nil || m.Paste.Text != pastedTable || m.Revision != before.Revision || len(effects) > 0 {
		t.Fatalf("a paste shows %+v and asks for %v; want a preview and nothing more", m.Paste, effects)
	}
	m, effects = play(m, PasteAccepted{})
	if got, want := table(m), "[0.2 0.5 0.7] [0 0.1 0.3] [0.9 0.3 0]"; got != want {
		t.Errorf("the table is %s, want %s", got, want)
	}
	if m.Paste != nil || len(m.Rows(tablePath)) != 3 || m.Rows(tablePath)[1].Text != [3]string{"0.5", "0.1", "0.3"} || m.Messages["rock.table"] != "" {
		t.Errorf("after accepting: preview %v, rows %v, message %q", m.Paste, m.Rows(tablePath), m.Messages["rock.table"])
	}
	if m.Study.Rock.Table.Source != "report 7, page 12" || m.Drafts[oil].Text != "thick" {
		t.Error("accepting lost the source or what was typed elsewhere")
	}
	if len(of[Run](effects)) != 1 {
		t.Errorf("accepting asks for %v", effects)
	}
	m = after(m, Undone{})
	if table(m) != table(before) || m.Rows(tablePath)[0].Text[0] != "bad" {
		t.Errorf("one undo leads to %s, first cell %q", table(m), m.Rows(tablePath)[0].Text[0])
	}
}

// TestPastePressure: a table pasted for capillary pressure becomes that one, in the unit
// of its heading, and leaves the other alone.
func TestPastePressure(t *testing.T) {
	const path = "rock.capillary.table"
	before := after(New(), Chosen{"rock.capillary.curve", "table"})
	m := after(before, Pasted{path, "Sw\tPc, kPa\n0,7\t-3,5\n0,5\t1\n0,2\t9\n"}, PasteAccepted{})
	got := m.Study.Rock.Capillary
	if got.Unit != "kPa" || got.Table == nil || fmt.Sprint(got.Table.Sw, got.Table.Pc) != "[0.2 0.5 0.7] [9 1 -3.5]" || table(m) != table(before) {
		t.Errorf("the table is %+v in %q, the other %s", got.Table, got.Unit, table(m))
	}
	m = after(m, RowAdded{path, 2}, Edited{path + ".3.sw", "0.8", ""})
	if said := m.Messages[path]; !strings.Contains(said, "Row 4 is left out") || len(m.Rows(path)) != 4 {
		t.Errorf("an unfinished row: %q", said)
	}
	m = after(m, Edited{path + ".3.pc", "-1e12", ""})
	if m.Messages[path+".3.pc"] == "" || len(m.Study.Rock.Capillary.Table.Sw) != 3 {
		t.Errorf("a pressure of no rock: %v", m.Messages)
	}
	if m = after(m, Edited{path + ".3.pc", "-8", ""}); fmt.Sprint(m.Study.Rock.Capillary.Table.Pc) != "[9 1 -3.5 -8]" {
		t.Errorf("the finished row: %+v", m.Study.Rock.Capillary.Table)
	}
	for m.CanUndo {
		m = after(m, Undone{})
	}
	if m.Study.Rock.Capillary.Table != nil || len(m.Rows(path)) != 0 {
		t.Errorf("undone to the start: %+v", m.Study.Rock.Capillary)
	}
}

func TestPasteMapped(t *testing.T) {
	m := after(empty(), Pasted{tablePath, "0.2 0 0.9\n0.5 0.1 0.3\n0.7 0.3 0\n"}, PasteMapped{1, paste.Kro}, PasteMapped{2, paste.Krw}, PasteAccepted{})
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
			m := after(before, Pasted{tablePath, text}, PasteAccepted{})
			if m.Revision != before.Revision || m.Paste == nil || len(m.Paste.Reading.Problems) == 0 {
				t.Errorf("a text that is no table was used, or nothing is said about it")
			}
			if m = after(m, PasteDropped{}); m.Paste != nil {
				t.Error("the preview cannot be dropped")
			}
		})
	}
	if m := after(New(), Pasted{tablePath, "x"}, Pasted{tablePath, " \n"}); m.Paste != nil {
		t.Error("the preview of an emptied text stays")
	}
	if m := after(New(), PasteAccepted{}, PasteMapped{0, paste.Sw}, PasteDropped{}); m.Paste != nil || m.CanUndo {
		t.Error("without a paste something is accepted")
	}
}

// TestInventedSourceGoesWithTheNumber: what the demonstration says of its own
// numbers is not said of a number that the person typed or pasted.
func TestInventedSourceGoesWithTheNumber(t *testing.T) {
	m := after(New(), Pasted{tablePath, pastedTable}, PasteAccepted{}, Edited{oil, "4.1", "cp"})
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
