package study

import (
	"math"
	"testing"
)

// Two layers alike but for k1 = 3 k2, by hand. When the fast one is flooded through, a t is
// (1 + 1/M)/2 for it and a third of that for the other, whose front X solves
// X - (1 - 1/M) X²/2 = a t (Dykstra & Parsons 1950); by Stiles (1949) it stands at 1/3.
func TestPistonLimits(t *testing.T) {
	st := typed([6]float64{0.2, 0.3, 0.3, 0.9, 2, 2}, 0.5e-3, 2e-3)
	put(&st, "field.length", 300, "m")
	put(&st, "field.width", 200, "m")
	put(&st, "field.rate", 90, "m3/d")
	put(&st, "field.waterCut", 0.97, "fraction")
	st.Field.Layers.Table = "m md fraction\n4\t300\t0.2\n4\t100\t0.2"
	const m = (0.3 / 0.5) / (0.9 / 2)
	const at, bend = (1 + 1/m) / 6, 1 - 1/m
	x := (1 - math.Sqrt(1-2*bend*at)) / bend
	slow := 1 / (1 - bend*x) // rate over k2 and the mobility of oil
	for _, g := range Run(st).Parts[SheetField].Tables {
		if g.ID != "field.pistons" {
			continue
		}
		for i, want := range []float64{(1 + x) / 2, 3 * m / (3*m + slow), (1 + 1.0/3) / 2, 3 * m / (3*m + 1)} {
			near(t, g.Columns[i+1].Label, g.Columns[i+1].Values[0], want, 1e-9)
			near(t, g.Columns[i+1].Label+", in the end", g.Columns[i+1].Values[1], 1, 1e-9)
		}
		return
	}
	t.Error("the limits are not told")
}
