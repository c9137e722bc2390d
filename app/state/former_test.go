package state

import (
	"testing"

	"brinefront/physics/study"
)

// worked is a study that somebody has worked on.
func worked() Model { return after(New(), Written{"title", "North block"}) }

func TestFormerStudy(t *testing.T) {
	link, err := writeLink(study.Demo())
	if err != nil {
		t.Fatal(err)
	}
	for name, msg := range map[string]Msg{"new": StartedEmpty{}, "demo": DemoOpened{}, "file": FileChosen{"mine.json", mine()}} {
		t.Run(name, func(t *testing.T) {
			before := worked()
			m, effects := Update(before, msg)
			kept := of[KeepFormer](effects)
			if len(kept) != 1 || study.Write(*kept[0].Study) != study.Write(before.Study) || effects[len(effects)-1] == Effect(kept[0]) {
				t.Fatalf("asked for %v; want the former study kept, before the present one", effects)
			}
			if title, ok := m.CanBringBack(); !ok || title != "North block" {
				t.Errorf("to bring back is %q, %t", title, ok)
			}
			n, effects := Update(m, BroughtBack{})
			if study.Write(n.Study) != study.Write(before.Study) || len(of[KeepFormer](effects)) != 1 {
				t.Errorf("brought back is %q, asked for %v", n.Study.Title, effects)
			}
			if _, ok := n.CanBringBack(); ok != (name == "file") {
				t.Errorf("after it is brought back, the one that was open can be: %t", ok)
			}
			if back := after(n, Undone{}); !back.page().same(m.page()) {
				t.Error("one undo does not lead to before it was brought back")
			}
			back, effects := Update(m, Undone{})
			if kept := of[KeepFormer](effects); len(kept) != 1 || kept[0].Study != nil || back.Former != nil {
				t.Errorf("after undo asked for %v", effects)
			}
		})
	}
	m, effects := Update(worked(), Routed{"/front?study=" + link})
	if len(of[KeepFormer](effects)) > 0 {
		t.Error("opening a link replaces what the browser keeps")
	}
	if title, ok := m.CanBringBack(); !ok || title != "North block" {
		t.Errorf("after a link, to bring back is %q, %t", title, ok)
	}
	m, effects = Update(m, Edited{oil, "4", "cp"})
	if kept := of[KeepFormer](effects); len(kept) != 1 || kept[0].Study.Title != "North block" {
		t.Errorf("a link that is edited asks for %v", effects)
	}
	if _, effects = Update(m, Edited{oil, "5", "cp"}); len(of[KeepFormer](effects)) > 0 {
		t.Error("the former study is kept again at every edit")
	}
}

// TestNobodysWorkIsNoFormerStudy: neither the demonstration, in whichever units, nor
// an empty study, nor one that its link holds, displaces somebody's work.
func TestNobodysWorkIsNoFormerStudy(t *testing.T) {
	m, effects := play(New(), Chosen{"system", "metric"}, StartedEmpty{}, DemoOpened{}, FileChosen{"mine.json", mine()})
	if m.Former != nil || len(of[KeepFormer](effects)) > 0 {
		t.Errorf("former is %v", m.Former)
	}
	st := study.Demo()
	st.Title = "Somebody else's"
	link, err := writeLink(st)
	if err != nil {
		t.Fatal(err)
	}
	m = after(worked(), DemoOpened{}, StartedEmpty{}, Routed{"/front?study=" + link}, DemoOpened{})
	if title, _ := m.CanBringBack(); title != "North block" {
		t.Errorf("former is %q", title)
	}
	if _, effects := Update(after(New(), Routed{"/front?embed"}), FileChosen{"mine.json", mine()}); len(of[KeepFormer](effects)) > 0 {
		t.Error("a page within another page keeps something")
	}
}

func TestFormerStudyFound(t *testing.T) {
	m, effects := play(New(), Restored{study.Write(worked().Study)}, FormerFound{mine()})
	if title, ok := m.CanBringBack(); !ok || title != "Mine" || len(of[KeepFormer](effects)) > 0 {
		t.Errorf("after a reload, to bring back is %q; asked for %v", title, effects)
	}
	if n := after(m, FormerFound{mine()[:50]}); n.Former != m.Former || lastNotice(n) == lastNotice(m) {
		t.Error("nothing is said of a former study that cannot be opened")
	}
	m, effects = Update(m, BroughtBack{})
	if kept := of[KeepFormer](effects); m.Study.Title != "Mine" || len(kept) != 1 || kept[0].Study.Title != "North block" {
		t.Errorf("brought back is %q, asked for %v", m.Study.Title, effects)
	}
	if n, effects := Update(New(), BroughtBack{}); n.CanUndo || len(effects) > 0 {
		t.Error("something is brought back where nothing was")
	}
}
