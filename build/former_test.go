package main

import "testing"

// TestFormerStudyOutlastsAReload: a study that another took the place of is a click
// away, in the session and after the page is opened again.
func TestFormerStudyOutlastsAReload(t *testing.T) {
	p := OpenFile(t, At("#/front"))
	p.WaitIdle()
	p.Retype("#in-title", "North block")
	p.WaitIdle()
	p.Click("#do-new")
	p.WaitIdle()
	if said := p.Text("#do-bring-back"); said != "Bring back “North block”" {
		t.Errorf("the link reads %q", said)
	}
	p.Reload()
	p.WaitIdle()
	p.Click("#do-bring-back")
	p.WaitIdle()
	if title := Eval[string](p, `document.querySelector("#in-title").value`); title != "North block" || len(p.figures()) == 0 {
		t.Errorf("brought back is %q with %d figures", title, len(p.figures()))
	}
	if visible := Eval[bool](p, `document.querySelector("#former").checkVisibility()`); visible {
		t.Error("it can be brought back once more")
	}
	p.NoTrouble()
}
