//go:build !js

package runner

import (
	"testing"
	"time"

	"brinefront/app/browser"
	"brinefront/app/state"
	"brinefront/app/wire"
	"brinefront/physics/study"
)

func TestRunsTheNewest(t *testing.T) {
	b := started(t)
	before := len(b.asked())
	b.act(title("a"))
	b.act(title("ab"))
	b.wait(runWait)
	if got := b.asked(); len(got) != before+1 || got[before].Study.Title != "ab" || got[before].First != study.SheetFront {
		t.Fatalf("asked are %d runs, want one of the newest study, the sheet looked at first", len(got)-before)
	}
	old := b.last()
	b.act(title("abc"))
	b.wait(runWait)
	if got := b.asked(); len(got) != before+2 || got[before+1].Study.Title != "abc" {
		t.Fatalf("then asked are %d runs, want the newer study at once", len(got)-before)
	}
	b.answer(wire.Reply{ID: old.ID, Kind: old.Kind, Pieces: whole(study.Empty()), More: true})
	if count[state.Answered](b) != 0 || !b.model.Computing {
		t.Error("the answer to an earlier study is delivered")
	}
	b.reply()
	b.wait(time.Second)
	if count[state.Answered](b) != 1 || b.model.Computing || !b.runner.Idle() {
		t.Error("the newest answer is not delivered")
	}
}

// Pieces are told as they come, and there is rest only after the last. A part that the
// engine leaves out is as it last sent it, be it with the answer to another study.
func TestPieces(t *testing.T) {
	b := started(t)
	was := b.model.Result.Parts[study.SheetRock]
	b.act(title("One"))
	b.wait(runWait)
	one := b.last()
	b.act(state.Edited{Path: "field.porosity", Text: "0.2", Unit: "fraction"})
	b.wait(runWait)
	two := b.last()
	changed := study.Part{Status: study.Stopped}
	b.answer(wire.Reply{ID: one.ID, Kind: wire.Pieces, More: true, Pieces: []wire.Piece{{Sheet: study.SheetField, Part: &changed}}})
	b.answer(wire.Reply{ID: two.ID, Kind: wire.Pieces, More: true, Pieces: []wire.Piece{{Sheet: study.SheetRock}}})
	if b.runner.Idle() || !b.model.Computing || b.model.Updating(study.SheetRock) || !b.model.Updating(study.SheetFront) {
		t.Error("after the first piece the others are not awaited")
	}
	b.answer(wire.Reply{ID: two.ID, Kind: wire.Pieces, Pieces: []wire.Piece{{Sheet: study.SheetFront}, {Sheet: study.SheetField}}})
	b.wait(time.Second)
	if !b.runner.Idle() || b.model.Computing {
		t.Error("after the last piece something is awaited")
	}
	if got := b.model.Result.Parts; len(got[study.SheetRock].Figures) != len(was.Figures) || len(was.Figures) == 0 || got[study.SheetField].Status != study.Stopped {
		t.Errorf("the parts left out are %d figures of rock and a field that is %s", len(got[study.SheetRock].Figures), got[study.SheetField].Status)
	}
}

// Another sheet looked at meanwhile is asked for without the study, and the pieces of
// the request before still count.
func TestAnotherSheetMeanwhile(t *testing.T) {
	b := started(t)
	b.act(title("One"))
	b.wait(runWait)
	one := b.last()
	b.act(state.Routed{Fragment: "/field"})
	b.wait(runWait)
	two := b.last()
	if two.ID == one.ID || two.Study != nil || two.First != study.SheetField || two.Kind != wire.Pieces {
		t.Fatalf("asked is %+v", two)
	}
	b.answer(wire.Reply{ID: one.ID, Kind: wire.Pieces, More: true, Pieces: []wire.Piece{{Sheet: study.SheetFront}}})
	b.answer(wire.Reply{ID: two.ID, Kind: wire.Pieces, Pieces: []wire.Piece{{Sheet: study.SheetField}, {Sheet: study.SheetRock}}})
	b.wait(time.Second)
	if b.model.Computing || !b.runner.Idle() || len(b.model.Result.Parts) != 3 {
		t.Errorf("computing %t, idle %t, %d parts", b.model.Computing, b.runner.Idle(), len(b.model.Result.Parts))
	}
	b.act(state.Routed{Fragment: "/rock"})
	b.wait(runWait)
	if b.last().ID != two.ID {
		t.Error("a sheet that is answered is asked for again")
	}
}

// After a failure the engine has let go of the study, and another engine never had it.
func TestTheStudyIsSentAgain(t *testing.T) {
	for name, fail := range map[string]func(*bench){
		"a bug":   func(b *bench) { b.answer(wire.Reply{ID: b.last().ID, Kind: wire.Pieces, Failure: "a bug"}) },
		"a death": func(b *bench) { b.engine().Die("gone") },
	} {
		b := started(t)
		b.act(title("One"))
		b.wait(runWait)
		fail(b)
		revision := b.model.Revision
		b.runner.Do([]state.Effect{state.Run{Revision: revision, Study: b.model.Study}})
		b.wait(runWait)
		if b.last().Study == nil {
			t.Errorf("after %s the study is not sent", name)
		}
	}
}

func TestEngineDies(t *testing.T) {
	b := started(t)
	first := b.engine()
	b.act(title("One"))
	b.wait(time.Second)
	b.engine().Die("out of memory")
	if b.model.Failure != "out of memory" || b.model.Computing || !b.runner.Idle() || len(browser.Pretend.Engines()) != 1 {
		t.Fatalf("failure %q, computing %t, %d engines", b.model.Failure, b.model.Computing, len(browser.Pretend.Engines()))
	}
	b.act(title("Two"))
	b.wait(time.Second)
	if len(browser.Pretend.Engines()) != 2 {
		t.Fatal("the next run starts no other engine")
	}
	first.Die("again")
	first.Reply(`{"id": 3, "kind": "pieces", "failure": "from the grave"}`)
	b.reply()
	if b.model.Failure != "" || b.model.ResultRevision != b.model.Revision {
		t.Errorf("after the restart: failure %q", b.model.Failure)
	}
}

func TestEngineDiesWithARunWaiting(t *testing.T) {
	b := started(t)
	b.act(title("One"))
	b.wait(time.Second)
	b.act(title("Two"))
	b.wait(time.Second)
	b.engine().Die("out of memory")
	if n := len(browser.Pretend.Engines()); n != 2 || b.last().Study.Title != "Two" {
		t.Fatalf("%d engines; the run that waited is lost", n)
	}
	b.engine().Die("again")
	if n := len(browser.Pretend.Engines()); n != 2 || b.model.Failure != "again" || !b.runner.Idle() {
		t.Errorf("%d engines, failure %q", n, b.model.Failure)
	}
}

func TestEngineSpeaksNonsense(t *testing.T) {
	for name, reply := range map[string]string{
		"no JSON":    "hello",
		"no answer":  `{"id": 2, "kind": "run"}`,
		"a bug":      `{"id": 2, "kind": "pieces", "failure": "a bug"}`,
		"no numbers": `{"id": 2, "kind": "pieces", "pieces": [{"sheet": "rock", "part": {}, "numbers": {"bytes": "AAAA"}}]}`,
		"no part":    `{"id": 2, "kind": "pieces", "pieces": [{"sheet": "attic"}]}`,
	} {
		t.Run(name, func(t *testing.T) {
			b := started(t)
			b.act(title("One"))
			b.wait(time.Second)
			b.engine().Reply(reply)
			if b.model.Failure == "" || b.model.Computing || !b.runner.Idle() {
				t.Errorf("failure %q, computing %t, idle %t", b.model.Failure, b.model.Computing, b.runner.Idle())
			}
			b.act(title("Two"))
			b.wait(time.Second)
			if b.reply(); b.model.Failure != "" {
				t.Error("the next run does not mend it")
			}
		})
	}
	b := started(t)
	b.answer(wire.Reply{ID: 77, Kind: wire.Pieces})
	if len(b.came) > 0 || !b.runner.Idle() {
		t.Error("an answer to nothing is delivered")
	}
}

func TestEvidence(t *testing.T) {
	b := started(t)
	b.act(state.EvidenceAsked{})
	if asked := b.last(); asked.Kind != wire.Checks {
		t.Fatalf("asked for %q", asked.Kind)
	}
	b.answer(wire.Reply{ID: b.last().ID, Kind: wire.Checks, Checks: []wire.Evidence{{ID: "a"}, {ID: "b"}}})
	if asked := b.last(); asked.Kind != wire.Check || asked.CheckID != "a" {
		t.Fatalf("asked for %q %q", asked.Kind, asked.CheckID)
	}
	b.answer(wire.Reply{ID: b.last().ID, Kind: wire.Check, Failure: "a bug"})
	if asked := b.last(); asked.CheckID != "b" {
		t.Fatalf("asked for %q", asked.CheckID)
	}
	b.answer(wire.Reply{ID: b.last().ID, Kind: wire.Check, Checks: []wire.Evidence{{ID: "b", Title: "B", Done: true}}})
	if e := b.model.Evidence; b.model.Checking || e[0].Failure != "a bug" || e[1].Title != "B" || !b.runner.Idle() {
		t.Errorf("evidence is %+v", e)
	}
	b.act(state.EvidenceAsked{})
	b.engine().Die("gone")
	if b.model.Checking || b.model.Failure != "gone" {
		t.Error("the checks go on without an engine")
	}
}
