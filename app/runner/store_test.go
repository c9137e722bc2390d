//go:build !js

package runner

import (
	"errors"
	"strings"
	"testing"
	"time"

	"brinefront/app/browser"
	"brinefront/app/state"
	"brinefront/physics/study"
)

func TestKeeps(t *testing.T) {
	b := started(t)
	b.act(title("One"))
	b.wait(keepWait / 2)
	b.act(title("Two"))
	if kept(t, studyKey) != "" || b.model.Saved.Done {
		t.Error("kept at once")
	}
	b.wait(keepWait)
	if kept(t, studyKey) != study.Write(b.model.Study) || !b.model.Saved.Done || count[state.Kept](b) != 1 {
		t.Error("not kept in time, or kept twice")
	}
	browser.Pretend.BreakStore(errors.New("the disk is full"))
	b.act(title("Three"))
	b.wait(keepWait)
	if !strings.Contains(b.model.Saved.Reason, "the disk is full") {
		t.Errorf("the reason it is not kept is %q", b.model.Saved.Reason)
	}
	b.reply() // to the study before
	b.reply()
	if !b.runner.Idle() {
		t.Error("a failure to keep leaves something pending")
	}
}

func TestDamagedIsSetAside(t *testing.T) {
	const damaged = `{"type": "brinefront/study", "ver`
	b := newBench(t)
	for key, text := range map[string]string{studyKey: damaged, asideKey + "1": "an older one"} {
		if err := browser.Save(key, text); err != nil {
			t.Fatal(err)
		}
	}
	b.runner.Start()
	if kept(t, asideKey+"2") != damaged || kept(t, asideKey+"1") != "an older one" || b.model.Damaged != damaged {
		t.Error("the damaged study is not set aside, or over another")
	}
	b.runner.Do([]state.Effect{state.SetAside{Text: damaged}})
	if kept(t, asideKey+"3") != "" {
		t.Error("it is set aside twice")
	}
	b.act(title("Mine"))
	b.wait(keepWait)
	if !strings.Contains(kept(t, studyKey), "Mine") {
		t.Error("the next study is not kept")
	}
}

func TestDamagedIsNotOverwritten(t *testing.T) {
	b := newBench(t)
	const damaged = "damaged"
	if err := browser.Save(studyKey, damaged); err != nil {
		t.Fatal(err)
	}
	browser.Pretend.BreakStore(errors.New("forbidden"))
	b.runner.Do([]state.Effect{state.SetAside{Text: damaged}})
	browser.Pretend.BreakStore(nil)
	b.act(title("Mine"))
	b.wait(keepWait)
	if kept(t, studyKey) != damaged || !strings.Contains(b.model.Saved.Reason, "could not be set aside") {
		t.Errorf("kept is %q, reason %q", kept(t, studyKey), b.model.Saved.Reason)
	}
}

func TestNoRoomAside(t *testing.T) {
	b := newBench(t)
	for n := range mostAside {
		b.runner.Do([]state.Effect{state.SetAside{Text: strings.Repeat("x", n+1)}})
	}
	if len(b.came) > 0 {
		t.Fatalf("came %v while there was room", b.came)
	}
	b.runner.Do([]state.Effect{state.SetAside{Text: "one more"}})
	if !strings.Contains(b.model.Saved.Reason, "already holds 20") {
		t.Errorf("reason is %q", b.model.Saved.Reason)
	}
}

func TestStoreForbidden(t *testing.T) {
	b := newBench(t)
	browser.Pretend.BreakStore(errors.New("forbidden"))
	b.runner.Start()
	b.wait(time.Second)
	b.reply()
	if !strings.Contains(b.model.Saved.Reason, "forbidden") || b.model.ResultRevision != b.model.Revision {
		t.Errorf("without storage: reason %q, answered %d of %d", b.model.Saved.Reason, b.model.ResultRevision, b.model.Revision)
	}
}
