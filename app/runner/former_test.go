//go:build !js

package runner

import (
	"errors"
	"slices"
	"strings"
	"testing"
	"time"

	"brinefront/app/browser"
	"brinefront/app/state"
	"brinefront/physics/study"
)

func TestFormerStudyOutlastsAReload(t *testing.T) {
	b := started(t)
	b.act(title("North block"))
	mine := study.Write(b.model.Study)
	b.act(state.StartedEmpty{})
	b.act(title("South block"))
	b.wait(time.Second)
	b.open()
	b.runner.Start()
	if name, ok := b.model.CanBringBack(); !ok || name != "North block" || b.model.Study.Title != "South block" {
		t.Fatalf("after a reload %q is open and %q can be brought back", b.model.Study.Title, name)
	}
	b.act(state.BroughtBack{})
	if study.Write(b.model.Study) != mine || !strings.Contains(kept(t, formerKey), "South block") {
		t.Errorf("brought back is %q; kept beside it is %q", b.model.Study.Title, kept(t, formerKey))
	}
	b.act(state.Undone{})
	b.act(state.Undone{}) // nothing is left to undo: the visit began with the reload
	if b.model.Study.Title != "South block" || kept(t, formerKey) != mine {
		t.Errorf("undo leads to %q, kept beside it is %q", b.model.Study.Title, kept(t, formerKey))
	}
}

func TestFormerStudyIsForgotten(t *testing.T) {
	b := started(t)
	b.act(title("North block"))
	b.act(state.StartedEmpty{})
	b.act(state.BroughtBack{})
	if text := kept(t, formerKey); text != "" {
		t.Errorf("after it is brought back, kept is %q", text)
	}
	b.wait(time.Second)
	b.open()
	b.runner.Start()
	if name, ok := b.model.CanBringBack(); ok {
		t.Errorf("after a reload %q can be brought back", name)
	}
	browser.Pretend.BreakStore(errors.New("the disk is full"))
	b.act(state.DemoOpened{})
	if b.model.Study.Title == "North block" || !slices.ContainsFunc(b.model.Notices, func(n state.Notice) bool {
		return n.Level == "refused" && strings.Contains(n.Text, "not kept for the next visit")
	}) {
		t.Errorf("a former study that cannot be kept is answered by %v", b.model.Notices)
	}
}
