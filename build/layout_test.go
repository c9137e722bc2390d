package main

import (
	"fmt"
	"strings"
	"testing"

	"github.com/chromedp/chromedp/kb"
)

// TestNothingRunsPastTheEdge: no sheet is wider than its window.
func TestNothingRunsPastTheEdge(t *testing.T) {
	for _, width := range []int64{390, 1024, 1440} {
		p := OpenFile(t, Sized(width, 900))
		p.WaitIdle()
		for _, sheet := range sheets(p) {
			p.sheet(sheet)
			if wide := Eval[int64](p, `document.documentElement.scrollWidth`); wide > width {
				t.Errorf("at %d px the sheet %s is %d px wide", width, sheet, wide)
			}
		}
		p.NoTrouble()
	}
}

// sheets lists the rail.
func sheets(p *Page) []string {
	return strings.Fields(Eval[string](p, `[...document.querySelectorAll("[id^=tab-]")].map(e => e.id.slice(4)).join(" ")`))
}

// TestKeyboardReachesEverything: Tab visits every control that can be seen, shows
// where it is, and leaves the page again.
func TestKeyboardReachesEverything(t *testing.T) {
	p := OpenFile(t)
	p.WaitIdle()
	for _, sheet := range sheets(p) {
		p.sheet(sheet)
		controls := Eval[int](p, `(() => {
			self.controls = [...document.querySelectorAll("a[href], button, input, select, textarea, summary, [tabindex='0']")]
				.filter(e => !e.disabled && e.checkVisibility({visibilityProperty: true}) && (e.type !== "radio" || e.checked));
			self.seen = new Set(); self.unmarked = new Set();
			self.addEventListener("focusin", e => {
				self.seen.add(e.target);
				const look = getComputedStyle(e.target);
				if (look.outlineStyle === "none" && look.boxShadow === "none") self.unmarked.add(e.target.id || e.target.outerHTML.slice(0, 80));
			});
			document.activeElement.blur();
			return self.controls.length;
		})()`)
		for range controls + 40 {
			p.Type(kb.Tab)
		}
		missed := Eval[[]string](p, `self.controls.filter(e => !self.seen.has(e) && e.isConnected).map(e => e.id || e.outerHTML.slice(0, 80))`)
		unmarked := Eval[[]string](p, `[...self.unmarked]`)
		if controls < 5 || len(missed) > 0 || len(unmarked) > 0 {
			t.Errorf("%s: of %d controls Tab does not reach %v; %v do not show that they have the keyboard", sheet, controls, missed, unmarked)
		}
	}
	p.NoTrouble()
}

// TestDarkAndLightDiffer: the page follows the wish for dark colours.
func TestDarkAndLightDiffer(t *testing.T) {
	paper := func(p *Page) string {
		p.WaitIdle()
		return Eval[string](p, `getComputedStyle(document.body).backgroundColor`)
	}
	if light, dark := paper(OpenFile(t)), paper(OpenFile(t, Dark())); light == dark {
		t.Error(fmt.Sprint("both are ", light))
	}
}
