//go:build !js

package browser

import (
	"errors"
	"strings"
	"testing"
)

func TestPretendKeepsTexts(t *testing.T) {
	defer Pretend.Reset()
	if _, ok, err := Load("study"); ok || err != nil {
		t.Fatalf("a new browser holds something: ok %v, err %v", ok, err)
	}
	must(t, Save("study", "first"))
	if text, ok, err := Load("study"); text != "first" || !ok || err != nil {
		t.Fatalf("Load = %q, %v, %v", text, ok, err)
	}
	full := errors.New("the quota has been exceeded")
	Pretend.BreakStore(full)
	if err := Save("study", "second"); !errors.Is(err, full) {
		t.Fatalf("Save to a broken store = %v", err)
	}
	Pretend.BreakStore(nil)
	if text, _, _ := Load("study"); text != "first" {
		t.Fatalf("a refused save changed the store to %q", text)
	}
}

func TestPretendRefusesLargeFiles(t *testing.T) {
	defer Pretend.Reset()
	var got []error
	OnDropFile(4, func(_, _ string, err error) { got = append(got, err) })
	Pretend.Drop("a", "1234")
	Pretend.Drop("b", "12345")
	if len(got) != 2 || got[0] != nil || got[1] == nil {
		t.Fatalf("4 bytes, then 5 bytes at a limit of 4: %v", got)
	}
}

func TestPretendTellsOnlyOurMoves(t *testing.T) {
	defer Pretend.Reset()
	var moves []string
	OnFragment(func(f string) { moves = append(moves, f) })
	SetFragment("/rock")
	Pretend.Go("/rock")
	Pretend.Go("main") // a link within the page
	Pretend.Go("/front")
	Pretend.Go("")
	if strings.Join(moves, " ") != "/front " {
		t.Fatalf("told %q", moves)
	}
}

func TestAStoppedEngineIsSilent(t *testing.T) {
	defer Pretend.Reset()
	var replies []string
	e := StartEngine(func(text string) { replies = append(replies, text) }, func(string) { t.Error("died") })
	e.Post("one")
	Pretend.Engines()[0].Reply("1")
	e.Stop()
	e.Post("two")
	e.Reply("2")
	e.Die("late")
	if len(replies) != 1 || len(e.Posted()) != 1 {
		t.Fatalf("replies %q, posted %q", replies, e.Posted())
	}
}
