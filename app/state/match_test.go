package state

import (
	"fmt"
	"math"
	"strings"
	"testing"

	"brinefront/physics/study"
)

// asked is a demonstration of which a width away from what made its history is to be
// matched.
func asked() Model {
	st := study.Demo()
	st.Field.Wells.Schedule = "d bbl/d\n0 960"
	forecast := study.Run(st).Parts[study.SheetField].Tables[0]
	table := "s m3/s m3/s"
	for i, time := range forecast.Columns[1].Values {
		if i > 0 {
			table += fmt.Sprintf("\n%v %v %v", time, forecast.Columns[4].Values[i], forecast.Columns[5].Values[i])
		}
	}
	spec, _ := study.Find("field.width")
	in := *spec.Get(&st)
	low, high := 0.5*in.Value, 2*in.Value
	in.Low, in.High, in.Value = &low, &high, 1.4*in.Value
	spec.Set(&st, &in)
	st.Match.First = "field.width"
	return after(New(), Restored{study.Write(st)}, Written{"field.history.table", table}, Chosen{"match.run", "on"})
}

// What the match found is taken over in one step, with where it comes from, and the match
// ends; undo leads back.
func TestMatchIsTakenOver(t *testing.T) {
	demo := study.Demo()
	m := asked()
	if m.Matched() || !sameStudy(after(m, MatchTaken{}).Study, m.Study) {
		t.Error("a match that is not there can be taken over")
	}
	typed := *m.Study.Field.Width
	m = answer(m)
	taken := after(m, MatchTaken{})
	width := taken.Study.Field.Width
	if math.Abs(width.Value/demo.Field.Width.Value-1) > 0.03 || !strings.Contains(width.Source, "history") || width.Low == nil || taken.Study.Match.Asked() {
		t.Errorf("taken over: %+v, asked %t", *width, taken.Study.Match.Asked())
	}
	if text := fmt.Sprint(width.Value); len(text) > 8 {
		t.Errorf("more figures than a match tells: %s", text)
	}
	back := after(taken, Undone{})
	if *back.Study.Field.Width != typed || !back.Study.Match.Asked() {
		t.Errorf("undo leads to %+v", *back.Study.Field.Width)
	}
	edited := after(m, Edited{"field.porosity", "0.3", "fraction"})
	if edited.Matched() {
		t.Error("a match of other inputs can be taken over")
	}
	growing := m.Result.Parts[study.SheetMatch]
	growing.Left = 0.5
	if part := after(edited, Answered{Revision: edited.Revision, Parts: map[study.Sheet]study.Part{study.SheetMatch: growing}, More: true}); part.Matched() {
		t.Error("a match under way can be taken over")
	}
}
