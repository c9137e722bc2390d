package main

import (
	"fmt"
	"math"
	"strconv"
	"strings"
	"testing"

	"brinefront/physics/study"
)

// A history is pasted and drawn over the forecast; a match of it shows how far it has come,
// can be stopped, finds what a native run finds, and is taken over in one step.
func TestMatchInTheBrowser(t *testing.T) {
	st := study.Demo()
	st.Field.Drive = "pressure"
	st.Field.Wells.Schedule = "d bbl/d psi\n0 - 1340"
	forecast := study.Run(st).Parts[study.SheetField].Tables[0]
	table := "s m3/s m3/s"
	for i, time := range forecast.Columns[1].Values {
		if i > 0 {
			table += fmt.Sprintf("\n%v %v %v", time, forecast.Columns[4].Values[i], forecast.Columns[5].Values[i])
		}
	}
	moved := []string{"field.width", "field.permeability", "fluids.oilViscosity"}
	for i, path := range moved {
		spec, _ := study.Find(path)
		in := *spec.Get(&st)
		low, high := 0.4*in.Value, 2.5*in.Value
		in.Low, in.High, in.Value = &low, &high, []float64{1.4, 0.7, 1.2}[i]*in.Value
		spec.Set(&st, &in)
	}
	p := OpenFile(t, At("#/field"))
	p.WaitIdle()
	p.choose([]byte(study.Write(st)))
	p.WaitFor(`document.querySelector("#notices").textContent.includes("is open")`)
	p.WaitIdle()
	p.write("#in-field-history-table", table)
	p.WaitIdle()
	st.Field.History.Table = table
	p.compare(study.Run(st).Parts[study.SheetField])
	if said := p.Text(".pictures"); !strings.Contains(said, "Points are measured") {
		t.Error("the history is not drawn over the forecast")
	}

	p.Go("#/match")
	p.WaitIdle()
	if said := p.Text("#tab-match"); !strings.Contains(said, "not asked for") {
		t.Errorf("the rail says %q", said)
	}
	for i, slot := range []string{"first", "second", "third"} {
		p.pick("#in-match-"+slot, moved[i])
	}
	p.WaitIdle()
	p.Click("#do-match")
	p.WaitFor(`!document.querySelector("#do-match-stop").disabled`)
	p.Click("#do-match-stop")
	p.WaitIdle()
	if said := p.Text("#tab-match"); !strings.Contains(said, "not asked for") || len(p.figures()) > 0 {
		t.Errorf("after it is stopped the rail says %q, and the sheet %v", said, p.figures())
	}

	Eval[bool](p, `(() => { self.grown = false; const look = () => { self.grown ||= /Matching: the misfit/.test(document.querySelector("#main").textContent); };
		new MutationObserver(look).observe(document.body, { subtree: true, childList: true, characterData: true }); return true; })()`)
	p.Click("#do-match")
	p.WaitFor(`!document.querySelector("#do-match-take").disabled`)
	p.WaitIdle()
	if !Eval[bool](p, `self.grown`) {
		t.Error("the match did not show how far it had come")
	}
	st.Match = study.Match{Run: "on", First: moved[0], Second: moved[1], Third: moved[2]}
	native := study.Run(st).Parts[study.SheetMatch]
	shown := p.figures()
	for _, f := range native.Figures {
		got, err := strconv.ParseFloat(shown[f.ID], 64)
		if err != nil || math.Abs(got-f.Value) > 1e-6*math.Abs(f.Value) { // exponentials differ in their last digit, and the search takes them up
			t.Errorf("%s: the page shows %q, native is %v", f.ID, shown[f.ID], f.Value)
		}
	}
	typed := Eval[string](p, `document.querySelector("#in-field-width").value`)
	p.Click("#do-match-take")
	p.WaitIdle()
	width, err := strconv.ParseFloat(Eval[string](p, `document.querySelector("#in-field-width").value`), 64)
	f, _ := native.Figure("match.field.width")
	if spec, _ := study.Find("field.width"); err != nil || math.Abs(width*0.3048/f.Value-1) > 1e-5 || spec.Get(&st).Unit != "ft" {
		t.Errorf("taken over: %v ft of %v m", width, f.Value)
	}
	p.Click("#do-undo")
	p.WaitIdle()
	if back := Eval[string](p, `document.querySelector("#in-field-width").value`); back != typed {
		t.Errorf("undo leads to %s, typed was %s", back, typed)
	}
	p.NoTrouble()
}
