package main

import (
	"strings"
	"testing"
)

// TestGridAnswersForOnesOwnGrid: the sheet advises a number of cells, and when a number is typed
// says how wrong that is and in which direction; every picture of it is drawn.
func TestGridAnswersForOnesOwnGrid(t *testing.T) {
	const said = `document.querySelector(".sentence")?.innerText ?? document.querySelector(".told").innerText`
	p := OpenFile(t, At("#/grid"), Sized(1440, 900))
	p.WaitIdle()
	if text := Eval[string](p, said); !strings.Contains(text, "are within the tolerance") {
		t.Errorf("no number of cells is advised: %s", text)
	}
	p.Retype("#in-grid-cells", "12")
	p.WaitIdle()
	if text := Eval[string](p, said); !strings.Contains(text, "On your 12 cells water arrives") || !strings.Contains(text, "early") {
		t.Errorf("nothing is said of one's own 12 cells: %s", text)
	}
	p.WaitFor(pictured + ` >= 5 && ` + bare + ` === 0`)
	p.NoTrouble()
}
