package main

import (
	"strings"
	"testing"

	"brinefront/physics/study"
)

// TestCapillaryPressure pastes a table of capillary pressure, looks at how it was read,
// draws a form through it, and finds the figures that the engine computes natively.
func TestCapillaryPressure(t *testing.T) {
	const table = "Sw\tPc (kPa)\n0.24\t90\n0.27\t38\n0.3\t20\n0.4\t6\n0.5\t1\n0.55\t-2\n0.6\t-6\n0.66\t-17\n0.7\t-80\n"
	st := study.Demo()
	st.Rock.Capillary.Curve, st.Rock.Capillary.Unit = "skjaeveland-fit", "kPa"
	st.Rock.Capillary.Table = &study.PcTable{
		Sw: []float64{0.24, 0.27, 0.3, 0.4, 0.5, 0.55, 0.6, 0.66, 0.7},
		Pc: []float64{90, 38, 20, 6, 1, -2, -6, -17, -80},
	}
	want := study.Run(st).Parts[study.SheetRock]

	p := OpenFile(t, At("#/rock"))
	p.WaitIdle()
	p.pick("#in-rock-capillary-curve", "table")
	p.WaitIdle()
	const preview, accept = "#paste-preview-rock-capillary-table", "#paste-accept-rock-capillary-table"
	p.Focus("#paste-box-rock-capillary-table")
	p.Paste(table)
	p.WaitFor(`!document.querySelector("` + preview + `").hidden`)
	if !p.Has(accept) || p.Has("#paste-accept") {
		t.Error("the preview is not that of the capillary pressure table")
	}
	p.Click(accept)
	p.WaitIdle()
	p.pick("#in-rock-capillary-curve", "skjaeveland-fit")
	p.WaitIdle()
	p.compare(want)
	if said := p.Screen(); !strings.Contains(said, "rock soaks up water by itself") {
		t.Errorf("the sheet does not tell where soaking ends:\n%s", said)
	}
	p.NoTrouble()
}
