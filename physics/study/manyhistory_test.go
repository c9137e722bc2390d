package study

import (
	"fmt"
	"math"
	"testing"
)

// A history whose water-oil ratio is exp(a + b Np) to the last bit of the trapezes that
// add its oil up: the line's oil at the limit is (ln(f/(1-f)) - a)/b in closed form, with an
// interval that closes on it.
func TestLateLineAgainstItsClosedForm(t *testing.T) {
	const a, b, liquid, step = 0.2, 3e-6, 150.0, 2e4 // -, 1/m3, m3/d, m3
	st := Demo()
	table := "d m3/d m3/d"
	oilAt := func(np float64) float64 { return liquid / (1 + math.Exp(a+b*np)) }
	time := 10.0
	for i := range 30 {
		np := step * float64(i)
		if i > 0 {
			time += step / ((oilAt(np) + oilAt(np-step)) / 2)
		}
		table += fmt.Sprintf("\n%.14g %.16g %.16g", time, oilAt(np), liquid-oilAt(np))
	}
	st.Field.History.Table = table
	put(&st, "field.waterCut", 0.95, "fraction")
	part := Run(st).Parts[SheetField]
	want := (math.Log(0.95/0.05) - a) / b
	for _, id := range []string{"field.trendOil", "field.trendLow", "field.trendHigh"} {
		f, ok := part.Figure(id)
		if !ok || math.Abs(f.Value-want) > 1e-6*want { // time is read to 14 digits
			t.Errorf("%s is %.12g, want %.12g", id, f.Value, want)
		}
	}
}
