package state

import (
	"fmt"
	"math/rand/v2"
	"testing"

	"brinefront/app/wire"
	"brinefront/physics/study"
)

// random draws a message that a person, the engine or the browser may send.
func random(r *rand.Rand, m Model) Msg {
	specs := study.Specs()
	path := specs[r.IntN(len(specs))].Path
	if r.IntN(20) == 0 {
		path = "no.such.path"
	}
	texts := []string{"", " ", "5", "0.2", "0.95", "20 %", "-1", "1e999", "abc", "2,5", "1,234", "NaN", "100", "3 cp", "\xff", "<b>", "1e-320"}
	text := texts[r.IntN(len(texts))]
	symbols := []string{"", "cp", "Pa.s", "fraction", "%", "ft", "m", "md", "stone"}
	tables := study.LabTables()
	tabled := tables[r.IntN(len(tables))].Path
	row := r.IntN(len(m.Rows(tabled))+3) - 1
	switch r.IntN(27) {
	case 0, 1, 2, 3:
		return Edited{path, text, symbols[r.IntN(len(symbols))]}
	case 4, 5, 6:
		return Edited{fmt.Sprintf("%s.%d.%s", tabled, row, []string{"sw", "krw", "kro", "pc", "sg"}[r.IntN(5)]), text, ""}
	case 7:
		return Ranged{path, text, texts[r.IntN(len(texts))]}
	case 8:
		return Sourced{[]string{path, tabled}[r.IntN(2)], text}
	case 9:
		return Written{[]string{"title", "author", "note", "field.start", "colour"}[r.IntN(5)], []string{text, "2027-01-31"}[r.IntN(2)]}
	case 10, 11:
		field := []string{"system", "rock.reference", "rock.curve", "rock.weights", "rock.capillary.curve", "rock.capillary.unit", "field.drive", "field.limit", "colour"}[r.IntN(9)]
		if list := study.Choices(field); list != nil && r.IntN(5) > 0 {
			return Chosen{field, list[r.IntN(len(list))].Value}
		}
		return Chosen{field, text}
	case 12:
		return RowAdded{tabled, row}
	case 13:
		return RowRemoved{tabled, row}
	case 14:
		return Pasted{tabled, []string{text, pastedTable, "0.2 0 0.9\n0.5 x 0.3\n0.7 0.3 0\n", "Sw Pc,kPa\n0.2 9\n0.4 1\n0.7 -3\n"}[r.IntN(4)]}
	case 15:
		return []Msg{PasteAccepted{}, PasteDropped{}, PasteMapped{r.IntN(5) - 1, []string{"sw", "krw", "kro", "pc", "so", "", "?"}[r.IntN(7)]}}[r.IntN(3)]
	case 16, 17:
		return Undone{}
	case 18:
		return Redone{}
	case 19:
		return []Msg{StartedEmpty{}, DemoOpened{}, FileChosen{"x", mine()}, FileChosen{"x", text}, FileRefused{"x", text}, Restored{text}, BroughtBack{}, FormerFound{mine()}, FormerFound{text}}[r.IntN(9)]
	case 20:
		return []Msg{OpenAsked{}, SaveAsked{}, ShareAsked{}, PrintAsked{}, ExportAsked{"report-text"}, ExportAsked{"damaged"}}[r.IntN(6)]
	case 21:
		return []Msg{Routed{"/rock"}, Routed{"/front?embed"}, Routed{"/field?study=" + text}, Kept{}, NotKept{text}}[r.IntN(5)]
	case 22:
		return []Msg{Answered{Revision: m.Revision - r.IntN(2), Parts: map[study.Sheet]study.Part{study.Sheets()[r.IntN(3)]: {Left: float64(r.IntN(2)) / 2}}, More: r.IntN(2) == 0}, EngineFailed{m.Revision, text}, EngineFailed{0, text}}[r.IntN(3)]
	case 23, 24:
		return []Msg{CaseAdded{}, CaseAdded{text}, CaseRemoved{r.IntN(7) - 1}, CaseNamed{r.IntN(3), text}, CaseInputRemoved{r.IntN(3), path}}[r.IntN(5)]
	case 25:
		return Edited{study.CasePath(r.IntN(4), path), text, symbols[r.IntN(len(symbols))]}
	case 26:
		return []Msg{CaseInputSet{r.IntN(7) - 1, path, text, symbols[r.IntN(len(symbols))]}, CaseChosen{r.IntN(7) - 1, "rock.curve", []string{"let", "corey", text}[r.IntN(3)]}}[r.IntN(2)]
	}
	return []Msg{EvidenceAsked{}, EvidenceListed{[]wire.Evidence{{ID: "a"}}}, EvidenceDone{wire.Evidence{ID: "a"}}, Told{"done", text}, Dismissed{r.IntN(5)}}[r.IntN(5)]
}

// Whatever happens in whatever order: the study in use is lawful and opens again;
// what is wrong is said where it was typed; an undo leads back to the very page
// before the step, and redo to the one after.
func TestAnySequence(t *testing.T) {
	for seed := range uint64(40) {
		r := rand.New(rand.NewPCG(seed, 1))
		m := New()
		for i := range 150 {
			msg := random(r, m)
			before := m
			m = after(m, msg)
			at := fmt.Sprintf("seed %d, message %d, %#v", seed, i, msg)
			if m.Revision != before.Revision {
				if _, err := study.Read(study.Write(m.Study)); err != nil {
					t.Fatalf("%s: the study in use does not open: %v", at, err)
				}
			}
			if sameStudy(m.Study, before.Study) != (m.Revision == before.Revision) {
				t.Fatalf("%s: the revision went from %d to %d", at, before.Revision, m.Revision)
			}
			for path := range m.Messages {
				_, ofTable := study.FindTable(path)
				draft, kept := m.Drafts[path]
				_, inner, _ := study.AtCase(path) // an empty name is as wrong as any
				if !ofTable && (!kept || draft.Text == "" && inner != caseName) {
					t.Fatalf("%s: %s says %q about a text that is lost", at, path, m.Messages[path])
				}
			}
			undoLeadsBack(t, at, msg, before, m)
		}
	}
}

func undoLeadsBack(t *testing.T, at string, msg Msg, before, m Model) {
	t.Helper()
	switch msg.(type) {
	case Undone, Redone:
		return
	}
	if n := len(m.history.past); n == len(before.history.past) || before.page().same(m.page()) {
		return // it is no step, or joins the one before
	}
	back := after(m, Undone{})
	if !back.page().same(before.page()) {
		t.Fatalf("%s: undo does not lead back", at)
	}
	if again := after(back, Redone{}); !again.page().same(m.page()) {
		t.Fatalf("%s: redo does not lead forth again", at)
	}
}

// A text that cannot be used stays where it was typed, whatever is done elsewhere.
func TestBadTextIsNeverLost(t *testing.T) {
	bad := []Msg{Edited{oil, "thick", "Pa.s"}, Edited{"rock.table.4.krw", "half", ""}, Written{"field.start", "soon"}, Ranged{"field.length", "", "far"}}
	held := func(m Model) bool {
		return m.Drafts[oil] == Draft{"thick", "Pa.s"} && m.Messages[oil] != "" && m.Rows(tablePath)[4].Text[1] == "half" &&
			m.Drafts["field.start"].Text == "soon" && m.Drafts["field.length.high"].Text == "far"
	}
	elsewhere := func(msg Msg) bool {
		switch msg := msg.(type) {
		case Edited:
			_, cell := study.FindTable(msg.Path)
			return !cell && msg.Path != oil && msg.Path != "field.length"
		case Written:
			return msg.Path != "field.start"
		case Ranged:
			return msg.Path != "field.length"
		case Undone, Redone, RowAdded, RowRemoved, PasteAccepted, StartedEmpty, DemoOpened, FileChosen, Restored, BroughtBack:
			return false
		}
		return true
	}
	for seed := range uint64(40) {
		r := rand.New(rand.NewPCG(seed, 2))
		m := after(New(), bad...)
		for i := range 200 {
			msg := random(r, m)
			if !elsewhere(msg) {
				continue
			}
			if m = after(m, msg); !held(m) {
				t.Fatalf("seed %d, message %d, %#v: a text that was typed elsewhere is lost", seed, i, msg)
			}
		}
	}
}
