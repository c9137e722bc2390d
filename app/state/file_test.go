package state

import (
	"maps"
	"reflect"
	"strings"
	"testing"

	"brinefront/physics/study"
)

// mine is a study of one's own, as a file.
func mine() string {
	st := study.Empty()
	st.Title = "Mine"
	st.Fluids.OilViscosity = &study.Input{Value: 3, Unit: "cp"}
	return study.Write(st)
}

func TestFileOpens(t *testing.T) {
	before := after(New(), Edited{oil, "thick", "cp"})
	m, effects := play(before, FileChosen{"mine.json", mine()})
	if study.Write(m.Study) != mine() || len(m.Drafts) > 0 || len(m.Rows(tablePath)) > 0 {
		t.Errorf("open is %q with drafts %v", m.Study.Title, m.Drafts)
	}
	if len(of[Run](effects)) != 1 || len(of[Keep](effects)) != 1 {
		t.Errorf("opening asks for %v", effects)
	}
	holds(t, "notice", lastNotice(m), "mine.json", "Undo")
	if m = after(m, Undone{}); study.Write(m.Study) != study.Write(before.Study) || m.Drafts[oil].Text != "thick" {
		t.Error("one undo does not bring back the study before")
	}
}

func TestFileRefused(t *testing.T) {
	good := mine()
	newer := strings.Replace(good, `"version": 1`, `"version": 99`, 1)
	for name, file := range map[string]struct{ text, said string }{
		"cut in half":   {good[:len(good)/2], "cannot be opened"},
		"newer":         {newer, "version 99"},
		"unknown field": {strings.Replace(good, `"title"`, `"colour": "red", "title"`, 1), "colour"},
		"no study":      {`{"a": 1}`, "study"},
		"out of range":  {strings.Replace(good, `"value": 3`, `"value": -3`, 1), "fluids.oilViscosity"},
	} {
		t.Run(name, func(t *testing.T) {
			before := after(New(), Edited{oil, "thick", "cp"})
			m, effects := Update(before, FileChosen{"x.json", file.text})
			if !m.page().same(before.page()) || m.Revision != before.Revision || len(effects) > 0 {
				t.Error("a refused file changed something")
			}
			holds(t, "notice", lastNotice(m), "x.json", file.said)
		})
	}
	m := after(New(), FileRefused{"big.json", "The file is too large."})
	holds(t, "notice", lastNotice(m), "too large")
}

func TestScriptTagsAreText(t *testing.T) {
	st := study.Empty()
	st.Title = "<script>alert(1)</script>"
	m := after(New(), FileChosen{"x.json", study.Write(st)})
	if m.Study.Title != st.Title {
		t.Errorf("title is %q, want it as it was written", m.Study.Title)
	}
}

func TestNewAndDemo(t *testing.T) {
	m, effects := play(New(), Chosen{"system", "metric"}, StartedEmpty{})
	want := study.Empty()
	want.System = "metric"
	if study.Write(m.Study) != study.Write(want) || len(m.Rows(tablePath)) > 0 {
		t.Error("a new study is not empty, or not in the units in use")
	}
	if len(of[Run](effects)) != 2 {
		t.Errorf("asked for %v", effects)
	}
	m = after(m, DemoOpened{})
	want = study.Demo()
	want.System = "metric"
	if study.Write(m.Study) != study.Write(want) {
		t.Error("the demonstration study is another")
	}
	if m = after(m, Undone{}, Undone{}); study.Write(m.Study) != study.Write(want) {
		t.Error("two undos do not lead back to the start")
	}
	if n := after(empty(), StartedEmpty{}); n.CanUndo || len(n.Notices) > 0 {
		t.Error("starting empty from an empty study is a step")
	}
}

func TestSaveAndOpen(t *testing.T) {
	m, effects := play(New(), Written{"title", "Größe / Block 7: ../x"}, SaveAsked{})
	files := of[Download](effects)
	if len(files) != 1 || files[0].Name != "größe-block-7-x.json" {
		t.Fatalf("saved are %v", files)
	}
	if n := after(empty(), FileChosen{files[0].Name, files[0].Data}); study.Write(n.Study) != study.Write(m.Study) {
		t.Error("a saved study opens as another")
	}
	if _, effects := play(empty(), SaveAsked{}); of[Download](effects)[0].Name != "study.json" {
		t.Error("a study without a title has no name")
	}
	m = after(m, Edited{oil, "thick", "cp"}, SaveAsked{})
	holds(t, "notice", lastNotice(m), "last good values")
}

func TestRestored(t *testing.T) {
	m, effects := play(New(), Restored{mine()})
	if study.Write(m.Study) != mine() || m.CanUndo || !m.Saved.Done || !m.Computing {
		t.Errorf("restored is %q; undo %t, saved %t", m.Study.Title, m.CanUndo, m.Saved.Done)
	}
	if runs := of[Run](effects); len(effects) != 1 || len(runs) != 1 || runs[0].Revision != m.Revision {
		t.Errorf("restoring asks for %v, want one run", effects)
	}
	for name, text := range map[string]string{"first visit": "", "the demonstration": study.Write(study.Demo())} {
		m, effects := play(New(), Restored{text})
		if study.Write(m.Study) != study.Write(study.Demo()) || len(of[Run](effects)) != 1 || len(effects) != 1 || m.Damaged != "" {
			t.Errorf("%s: asks for %v", name, effects)
		}
	}
}

func TestDamagedAutosave(t *testing.T) {
	damaged := mine()[:100]
	m, effects := play(New(), Restored{damaged})
	if m.Damaged != damaged || study.Write(m.Study) != study.Write(study.Demo()) {
		t.Error("a damaged autosave is lost, or the demonstration is not open")
	}
	if aside := of[SetAside](effects); len(aside) != 1 || aside[0].Text != damaged || effects[0] != Effect(aside[0]) {
		t.Errorf("asked for %v; want it set aside before all else", effects)
	}
	if len(of[Keep](effects)) > 0 || len(of[Run](effects)) != 1 {
		t.Errorf("asked for %v; want a run and nothing kept", effects)
	}
	holds(t, "notice", lastNotice(m), "set aside")
	_, effects = Update(m, ExportAsked{"damaged"})
	if files := of[Download](effects); len(files) != 1 || files[0].Data != damaged {
		t.Errorf("downloaded are %v", files)
	}
	if _, effects := Update(New(), ExportAsked{"damaged"}); len(effects) > 0 {
		t.Error("a file is handed over where none was set aside")
	}
}

func TestSaving(t *testing.T) {
	m := after(New(), Kept{})
	if !m.Saved.Done {
		t.Error("kept is not shown")
	}
	if m = after(m, Written{"title", "x"}); m.Saved.Done {
		t.Error("a change not yet kept is shown as kept")
	}
	if m = after(m, NotKept{"the disk is full"}); m.Saved.Reason != "the disk is full" {
		t.Error("why it is not kept is not shown")
	}
	if m = after(m, Kept{}); m.Saved.Reason != "" {
		t.Error("the reason outlives its cause")
	}
}

func TestNotices(t *testing.T) {
	m := after(New(), Told{"done", "one"}, Told{"refused", "two"}, Told{"done", "one"})
	if len(m.Notices) != 2 || lastNotice(m) != "one" {
		t.Errorf("notices are %v", m.Notices)
	}
	m = after(m, Dismissed{m.Notices[0].ID})
	if len(m.Notices) != 1 || lastNotice(m) != "one" {
		t.Errorf("notices are %v after one was dismissed", m.Notices)
	}
	for i := range 20 {
		m = after(m, Told{"done", strings.Repeat("x", i)}, Told{"refused", strings.Repeat("y", i)})
	}
	if len(m.Notices) != 2*notices || lastNotice(m) != strings.Repeat("y", 19) {
		t.Errorf("notices are %v", m.Notices)
	}
	if n := after(m, Edited{oil, "thick", "cp"}); len(n.Notices) != 2*notices {
		t.Error("a text that changes nothing takes notices away")
	}
	m = after(m, Edited{oil, "4", "cp"})
	for _, n := range m.Notices {
		if n.Level == "done" {
			t.Errorf("%q stands after the next change of the study", n.Text)
		}
	}
	if len(m.Notices) != notices {
		t.Errorf("refusals left are %v, want %d", m.Notices, notices)
	}
}

func TestAsked(t *testing.T) {
	if _, effects := Update(New(), OpenAsked{}); len(of[PickFile](effects)) != 1 {
		t.Errorf("open asks for %v", effects)
	}
	if _, effects := Update(New(), PrintAsked{}); len(of[Print](effects)) != 1 {
		t.Errorf("print asks for %v", effects)
	}
}

// answer is a computed model.
func answer(m Model) Model {
	return after(m, Answered{Revision: m.Revision, Parts: study.Run(m.Study).Parts})
}

// A sheet shows what it showed until its own part comes; only the whole is printed.
func TestAnsweredInPieces(t *testing.T) {
	m := answer(New())
	before := m.Result
	m = after(m, Edited{"field.porosity", "0.3", "fraction"}, Routed{"/rock"})
	parts := study.Run(m.Study).Parts
	only := func(sheet study.Sheet) map[study.Sheet]study.Part {
		return map[study.Sheet]study.Part{sheet: parts[sheet]}
	}
	m = after(m, Answered{Revision: m.Revision, Parts: only(study.SheetField), More: true})
	if !m.Computing || m.Updating(study.SheetField) || !m.Updating(study.SheetFront) {
		t.Error("after the first piece the others are not awaited")
	}
	if got := m.Result.Parts[study.SheetField]; !reflect.DeepEqual(got, parts[study.SheetField]) || reflect.DeepEqual(got, before.Parts[study.SheetField]) {
		t.Error("the piece that came is not shown")
	}
	if !reflect.DeepEqual(m.Result.Parts[study.SheetFront], before.Parts[study.SheetFront]) || !reflect.DeepEqual(m.Whole, before) {
		t.Error("what has not come yet is no longer as it was")
	}
	_, asked := Update(m, Routed{"/front"})
	if runs := of[Run](asked); len(runs) != 1 || runs[0].First != study.SheetFront || runs[0].Revision != m.Revision {
		t.Errorf("another sheet that is still to come asks for %v", runs)
	}
	for _, answered := range []string{"/field", "/report"} {
		if _, asked := Update(m, Routed{answered}); len(asked) > 0 {
			t.Errorf("%s asks for %v", answered, asked)
		}
	}
	grows := parts[study.SheetFront]
	grows.Left = 0.4
	m = after(m, Answered{Revision: m.Revision, Parts: map[study.Sheet]study.Part{study.SheetFront: grows}, More: true})
	if !m.Updating(study.SheetFront) || m.Result.Parts[study.SheetFront].Left != 0.4 {
		t.Error("a part that grows is not shown, or taken for whole")
	}
	m = after(m, Answered{Revision: m.Revision, Parts: only(study.SheetFront), More: true})
	rest := maps.Clone(parts)
	delete(rest, study.SheetField)
	delete(rest, study.SheetFront)
	m = after(m, Answered{Revision: m.Revision, Parts: rest})
	if m.Computing || !reflect.DeepEqual(m.Whole, study.Run(m.Study)) || !reflect.DeepEqual(m.Whole, m.Result) {
		t.Error("the pieces together are not the whole")
	}
}

// A sheet that is no longer asked of the study is gone with the last piece.
func TestCasesGone(t *testing.T) {
	m := answer(after(New(), CaseAdded{}))
	if _, there := m.Result.Parts[study.SheetCompare]; !there {
		t.Fatal("the cases are not compared")
	}
	m = answer(after(m, CaseRemoved{}))
	if _, there := m.Result.Parts[study.SheetCompare]; there {
		t.Error("cases that are gone are compared")
	}
}

func TestAnswered(t *testing.T) {
	m := after(New(), Edited{oil, "4", "cp"})
	old := after(m, Answered{Revision: m.Revision - 1})
	if !old.Computing || old.ResultRevision != 0 {
		t.Error("the answer to an earlier study was taken")
	}
	n := answer(m)
	if n.Computing || n.ResultRevision != m.Revision || n.Result.Parts[study.SheetFront].Status != study.Ready {
		t.Errorf("after the answer: computing %t, revision %d", n.Computing, n.ResultRevision)
	}
	bad := after(n, Left{}, Edited{oil, "thick", "cp"})
	if bad.Computing || bad.ResultRevision != bad.Revision {
		t.Error("a bad text takes the answers away")
	}
}

func TestEngineFailed(t *testing.T) {
	m := after(New(), Edited{oil, "4", "cp"})
	m = after(m, EngineFailed{m.Revision - 1, "old"})
	if m.Failure != "" || !m.Computing {
		t.Error("the failure of an earlier evaluation is shown")
	}
	m = after(m, EngineFailed{m.Revision, "a bug"})
	if m.Failure != "a bug" || m.Computing {
		t.Errorf("failure is %q, computing %t", m.Failure, m.Computing)
	}
	m, effects := play(m, ExportAsked{"report-text"})
	if len(effects) > 0 {
		t.Error("answers are written that there are not")
	}
	holds(t, "notice", lastNotice(m), "no answers")
	if m = answer(after(m, Edited{oil, "5", "cp"})); m.Failure != "" {
		t.Error("the failure outlives the next answer")
	}
}

func TestExports(t *testing.T) {
	m := answer(New())
	chart, figure := m.Result.Parts[study.SheetFront].Charts[0], m.Result.Parts[study.SheetField].Figures[0]
	grid := m.Result.Parts[study.SheetFront].Tables[0]
	for what, want := range map[string]struct {
		ending string
		pieces []string
	}{
		"report-text": {"-report.txt", []string{m.Study.Title, figure.Label}},
		"charts-csv":  {"-curves.csv", []string{chart.Title, chart.Lines[0].Label}},
		"tables-csv":  {"-tables.csv", []string{grid.Title, grid.Columns[0].Label}},
	} {
		_, effects := Update(m, ExportAsked{what})
		files := of[Download](effects)
		if len(files) != 1 || !strings.HasSuffix(files[0].Name, want.ending) || !strings.HasPrefix(files[0].Name, "demonstration") {
			t.Fatalf("%s: handed over are %v", what, effects)
		}
		holds(t, what, files[0].Data, want.pieces...)
	}
	if _, effects := Update(m, ExportAsked{"gold"}); len(effects) > 0 {
		t.Errorf("an unknown export hands over %v", effects)
	}
}

func TestExportWaitsForItsAnswers(t *testing.T) {
	m, effects := play(answer(New()), Edited{oil, "4", "cp"}, ExportAsked{"report-text"})
	if len(of[Download](effects)) > 0 {
		t.Fatal("answers to an earlier study are handed over with this one")
	}
	m, effects = Update(m, Answered{Revision: m.Revision, Parts: study.Run(m.Study).Parts})
	if len(of[Download](effects)) != 1 {
		t.Errorf("the export that is owed is not handed over: %v", effects)
	}
	if _, effects = Update(m, Answered{Revision: m.Revision, Parts: m.Result.Parts}); len(effects) > 0 {
		t.Errorf("it is handed over twice: %v", effects)
	}
}
