package main

import (
	"slices"
	"strings"
	"testing"

	"brinefront/physics/study"
)

// TestNoteOpensAClosedGroup: the link of a note leads to its input though the group
// that holds it is folded away, on the sheet looked at and from another.
func TestNoteOpensAClosedGroup(t *testing.T) {
	st := study.Demo()
	for path, in := range map[string]study.Input{
		"front.dip": {Value: 12, Unit: "deg"}, "fluids.waterDensity": {Value: 1031, Unit: "kg/m3"}, "fluids.oilDensity": {Value: 797, Unit: "kg/m3"},
	} {
		spec, ok := study.Find(path)
		if !ok {
			t.Fatalf("no input at %s", path)
		}
		spec.Set(&st, &in)
	}
	front := study.Run(st).Parts[study.SheetFront]
	if !slices.ContainsFunc(front.Notes, func(n study.Note) bool { return slices.Contains(n.Paths, "front.dip") }) {
		t.Fatalf("no note is about the dip; the sheet is %s", front.Status)
	}
	p := OpenFile(t, At("#/front"))
	p.WaitIdle()
	p.choose([]byte(study.Write(st)))
	p.WaitIdle()
	const group, closed = "#fold-dip", `!document.querySelector("#fold-dip").open`
	if !Eval[bool](p, `!(`+closed+`)`) {
		t.Error("a group in which something is given is closed")
	}
	p.Click(group + " > summary")
	p.WaitFor(closed)
	p.Click(`[data-note] [data-find="front.dip"]`)
	p.WaitFor(`!(` + closed + `)`)
	p.WaitIdle()
	if at := p.Focused(); !strings.HasPrefix(at, "input"+field("front.dip")) {
		t.Errorf("the link of the note leads to %s", at)
	}
	p.NoTrouble()
}
