package main

import (
	"strings"
	"testing"

	"brinefront/physics/study"
)

// Layers are pasted, a schedule and a price are typed; what is on screen is what a native
// run of the same study gives, and a table that cannot be read is refused beside its field.
func TestLayersInTheBrowser(t *testing.T) {
	const table = "ft;md;fraction\n7;137;0.21\n13;63;0.19\n5;412;0.247\n10;22;0.163\n9;231;0.228"
	p := OpenFile(t, At("#/field"))
	p.WaitIdle()
	p.write("#in-field-layers-table", table)
	p.WaitIdle()
	st := study.Demo()
	st.Field.Layers.Table = table
	p.compare(study.Run(st).Parts[study.SheetField])
	if said := p.Text("#answer-field"); !strings.Contains(said, "with full crossflow") {
		t.Errorf("the answer is %q", said)
	}
	p.write("#in-field-layers-table", table+"\n3;much;0.2")
	p.WaitIdle()
	if said := p.Text("#msg-field-layers-table"); !strings.Contains(said, "much") || !strings.Contains(said, "last good") {
		t.Errorf("beside a bad table stands %q", said)
	}
	p.compare(study.Run(st).Parts[study.SheetField])
	p.write("#in-field-layers-table", table)
	p.write("#in-field-wells-schedule", "d bbl/d psi\n0 700 2500\n900 1400 3000")
	p.pick("#in-field-layers-crossflow", "viscous")
	p.WaitIdle()
	st.Field.Wells.Schedule = "d bbl/d psi\n0 700 2500\n900 1400 3000"
	st.Field.Layers.Crossflow = "viscous"
	p.compare(study.Run(st).Parts[study.SheetField])
	p.NoTrouble()
}

// write puts a text of several lines into a field, as pasting it does.
func (p *Page) write(selector, text string) {
	p.t.Helper()
	Eval[bool](p, `(field => { field.focus(); field.value = `+quote(text)+`; return field.dispatchEvent(new Event("input", { bubbles: true })); })(document.querySelector(`+quote(selector)+`))`)
}
