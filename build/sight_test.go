package main

import "testing"

// neverIdle is a browser that always has something else to do.
const neverIdle = `self.requestIdleCallback = () => 1`

// bare counts the pictures of the sheet, and those of them without a drawing or words.
const (
	pictured = `document.querySelectorAll(".picture").length`
	bare     = `[...document.querySelectorAll(".picture")].filter(e => !e.querySelector(".plot-canvas svg path")).length`
	unsaid   = `[...document.querySelectorAll(".picture")].filter(e => !e.querySelector("[role=img]")?.ariaLabel || !e.querySelector(".plot-line")).length`
)

// TestPicturesOutOfSightAreDrawnWhenTheyComeIntoSight: until then they have their
// words and their buttons.
func TestPicturesOutOfSightAreDrawnWhenTheyComeIntoSight(t *testing.T) {
	p := OpenFile(t, At("#/field"), Sized(1024, 700), Before(neverIdle))
	p.WaitIdle()
	all, waiting := Eval[int](p, pictured), Eval[int](p, bare)
	if waiting == 0 {
		t.Fatalf("none of %d pictures waits out of sight", all)
	}
	if silent := Eval[int](p, unsaid); silent > 0 {
		t.Errorf("%d of %d pictures have no words or no buttons", silent, all)
	}
	Eval[bool](p, `(() => { [...document.querySelectorAll(".picture")].at(-1).scrollIntoView(); return true; })()`)
	p.WaitIdle()
	if Eval[bool](p, `![...document.querySelectorAll(".picture")].at(-1).querySelector(".plot-canvas svg path")`) {
		t.Error("a picture is in sight and not drawn, and nothing is said to be pending")
	}
	p.NoTrouble()
}

// TestPaperHasAllPictures: what waits out of sight is drawn before it is printed.
func TestPaperHasAllPictures(t *testing.T) {
	for _, sheet := range []string{"front", "report"} {
		p := OpenFile(t, At("#/"+sheet), Sized(1024, 700), Before(neverIdle))
		p.WaitIdle()
		if Eval[int](p, bare) == 0 {
			t.Fatalf("no picture of the sheet %s waits out of sight", sheet)
		}
		p.PDF()
		if waiting, all := Eval[int](p, bare), Eval[int](p, pictured); waiting > 0 {
			t.Errorf("%d of %d pictures of the sheet %s are not on paper", waiting, all, sheet)
		}
		p.NoTrouble()
	}
}

// TestAllPicturesAreDrawnInTheEnd: nobody has to scroll.
func TestAllPicturesAreDrawnInTheEnd(t *testing.T) {
	p := OpenFile(t, At("#/front"), Sized(1024, 700))
	p.WaitIdle()
	p.WaitFor(pictured + ` > 0 && ` + bare + ` === 0`)
	p.NoTrouble()
}
