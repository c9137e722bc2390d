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
	if got := b.asked(); len(got) != before+1 || got[before].Study.Title != "ab" {
		t.Fatalf("asked are %d runs, want one of the newest study", len(got)-before)
	}
	old := b.last()
	b.act(title("abc"))
	b.wait(runWait)
	b.act(title("abcd"))
	b.wait(runWait)
	if len(b.asked()) != before+1 {
		t.Fatal("the engine is asked while it computes")
	}
	b.answer(wire.Reply{ID: old.ID, Kind: old.Kind, Result: &study.Result{}})
	if count[state.Answered](b) != 0 {
		t.Error("the answer to an earlier study is delivered")
	}
	if got := b.asked(); len(got) != before+2 || got[before+1].Study.Title != "abcd" {
		t.Fatalf("then asked are %d runs, want one of the newest study", len(got)-before)
	}
	b.reply()
	if count[state.Answered](b) != 1 || b.model.Computing {
		t.Error("the newest answer is not delivered")
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
	first.Reply(`{"id": 3, "kind": "run", "failure": "from the grave"}`)
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
		"no JSON":   "hello",
		"no answer": `{"id": 2, "kind": "run"}`,
		"a bug":     `{"id": 2, "kind": "run", "failure": "a bug"}`,
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
	b.answer(wire.Reply{ID: 77, Kind: wire.Run})
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
