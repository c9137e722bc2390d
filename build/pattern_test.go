package main

import (
	"strings"
	"testing"

	"github.com/chromedp/chromedp/kb"

	"brinefront/physics/study"
)

// Wells are arranged in a five-spot: what is on screen is what a native run of the same
// study gives; the map is drawn to scale and its front moves with the slider.
func TestPatternsInTheBrowser(t *testing.T) {
	p := OpenFile(t, At("#/field"))
	p.WaitIdle()
	p.pick("#in-field-pattern-kind", "five-spot")
	p.WaitIdle()
	st := study.Demo()
	st.Field.Pattern.Kind = "five-spot"
	p.compare(study.Run(st).Parts[study.SheetField])
	if p.Has("#in-field-length") || !p.Has("#in-field-pattern-spacing") {
		t.Error("the form still asks for a block")
	}
	p.Focus("#pic-field\\.map-slider")
	if now := p.Text("#pic-field\\.map-slider-at"); !strings.Contains(now, "breakthrough") {
		t.Errorf("the slider stands at %q", now)
	}
	front := func() string {
		return Eval[string](p, `[...document.getElementById("pic-field.map").querySelectorAll("svg path")].map((e) => e.getAttribute("d")).join()`)
	}
	before := front()
	p.Type(kb.ArrowRight)
	p.Type(kb.ArrowRight)
	p.WaitIdle()
	if front() == before {
		t.Error("the front does not move with the slider")
	}
	p.NoTrouble()
}
