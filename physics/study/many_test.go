package study

import (
	"encoding/json"
	"fmt"
	"math"
	"os"
	"slices"
	"strings"
	"testing"
)

// layeredCase is case lbl-01 as a study: independent SciPy computation, two methods.
func layeredCase(t *testing.T) (st Study, times, recovery, cut []float64) {
	t.Helper()
	var file struct {
		Cases []struct {
			ID     string
			Inputs struct {
				K, H, Phi         []float64
				Length, Width, DP float64
			}
			Outputs struct {
				Time     []float64 `json:"time_s"`
				Recovery []float64 `json:"recovery_pv"`
				Fw       []float64
			}
		}
	}
	text, err := os.ReadFile("../../testdata/independent/layers.json")
	if err == nil {
		err = json.Unmarshal(text, &file)
	}
	if err != nil {
		t.Fatal(err)
	}
	for _, c := range file.Cases {
		if c.ID != "lbl-01" {
			continue
		}
		st = typed([6]float64{0.213, 0.237, 0.327, 0.861, 2.7, 2.15}, 0.00047, 0.00593)
		table := "m um2 fraction"
		for i := range c.Inputs.K {
			table += fmt.Sprintf("\n%v\t%v\t%v", c.Inputs.H[i], c.Inputs.K[i]*1e12, c.Inputs.Phi[i])
		}
		st.Field.Layers.Table, st.Field.Drive = table, "pressure"
		put(&st, "field.length", c.Inputs.Length, "m")
		put(&st, "field.width", c.Inputs.Width, "m")
		put(&st, "field.pressure", c.Inputs.DP, "Pa")
		put(&st, "field.waterCut", 0.96, "fraction")
		return st, c.Outputs.Time, c.Outputs.Recovery, c.Outputs.Fw
	}
	t.Fatal("case lbl-01 is gone")
	return
}

// The forecast at the reference's times is drawn through its values. Tolerances are those
// of the tabulated layers, and for the cut of its slopes.
func TestLayersAgainstIndependentValues(t *testing.T) {
	st, times, recovery, cut := layeredCase(t)
	for i, time := range times {
		put(&st, "field.horizon", time, "s")
		part := Run(st).Parts[SheetField]
		r, w := must(t, part, "field.recovery", "pore"), must(t, part, "field.waterCut", "surface")
		last := len(r.X) - 1
		near(t, "time", r.X[last], time, 1e-3)
		near(t, "recovery", r.Y[last], recovery[i], 2e-8)
		near(t, "cut", w.Y[last], cut[i], 1e-4)
	}
	expect(t, Run(st), 1e-9, map[string]float64{"field.breakthrough": 17966800.249410212})
}

// One row is the even block of the same rock, and neither lumping into one nor a schedule
// of one step makes a difference.
func TestOneLayerIsTheBlock(t *testing.T) {
	for _, drive := range []string{"rate", "pressure"} {
		for _, limit := range []string{"waterCut", "oilRate"} {
			plain := Demo()
			plain.Field.Drive, plain.Field.Limit = drive, limit
			one := plain
			one.Field.Layers.Table = "ft; md; fraction\n41; 391; 0.213"
			stepped := plain
			stepped.Field.Wells.Schedule = map[string]string{"rate": "d bbl/d\n0 960", "pressure": "d bbl/d psi\n0 - 1340"}[drive]
			halves := one
			halves.Field.Layers.Table += "\n" + "20; 391; 0.213\n"
			halves.Field.Layers.Table = strings.Replace(halves.Field.Layers.Table, "41;", "21;", 1)
			put(&halves, "field.layers.groups", 1, "")
			want := map[string]float64{}
			for _, f := range Run(plain).Parts[SheetField].Figures {
				if slices.Contains([]string{"field.poreVolume", "field.oilInPlace", "field.breakthrough", "field.recoveryAtBreakthrough", "field.limitTime", "field.recoveryAtLimit", "field.oilAtLimit", "field.startOilRate"}, f.ID) {
					want[f.ID] = f.Value
				}
			}
			if len(want) != 8 {
				t.Fatalf("figures of the block: %v", want)
			}
			for _, st := range []Study{one, stepped, halves} {
				expect(t, Run(st), 1e-10, want) // figures of an arrival are read 1e-11 of the time before it
			}
		}
	}
}

// Contrast brings water sooner; crossflow helps the favourable flood and harms the other.
func TestLayersMatter(t *testing.T) {
	value := func(st Study, id string) float64 {
		f, ok := Run(st).Parts[SheetField].Figure(id)
		if !ok {
			t.Fatalf("no %s", id)
		}
		return f.Value
	}
	st, _, _, _ := layeredCase(t)
	even := st
	even.Field.Layers.Table = "m um2 fraction\n14.2 0.14 0.2"
	if value(st, "field.breakthrough") >= value(even, "field.breakthrough") || value(st, "field.recoveryAtLimit") >= value(even, "field.recoveryAtLimit") {
		t.Error("layers do no harm")
	}
	put(&st, "fluids.oilViscosity", 0.1, "cp")
	if value(st, "field.recoveryFull") <= value(st, "field.recoveryApart") {
		t.Error("crossflow does not help where water is the slower")
	}
}

func TestTablesOfText(t *testing.T) {
	st := Demo()
	for text, read := range map[string]string{
		"":                            "",
		"ft md fraction\n3 100 0.2":   "",
		"h (m);k, md;phi [%]\n3;1;20": "",
		"3 100 0.2":                   "in line 1",
		"ft md fraction":              "no rows",
		"ft md fraction\n3 100":       "in line 2, no porosity",
		"ft md fraction\n3 100 20":    "in line 2, 20",
		"ft md fraction\n3 -4 0.2":    "in line 2, -4",
		"ft md fraction\n3 4 0.2 7":   "in line 2, 4 cells",
	} {
		p := CheckText(&st, "field.layers.table", text)
		if (p == nil) != (read == "") || p != nil && (!strings.Contains(p.Read, read) || p.Allowed == "") {
			t.Errorf("%q: %+v", text, p)
		}
	}
	columns, _ := layerTable.rows("ft md frac\n3 m\t1 D\t20%\n\n", "")
	near(t, "thickness", columns[0][0], 3, 0)
	near(t, "permeability", columns[1][0], 9.869233e-13, 1e-19)
	near(t, "porosity", columns[2][0], 0.2, 0)
	for text, fine := range map[string]bool{
		"d bbl/d\n0 500\n30 0":                             true,
		"date bbl/d psi\n2027-03-01 500 -\n2027-04-01 - 9": true,
		"d bbl/d\n5 500":                                   false,
		"date bbl/d\n2027-03-01 5\n2027-02-01 6":           false,
		"d bbl/d\n0 500\n0 600":                            false,
	} {
		if p := CheckText(&st, "field.wells.schedule", text); (p == nil) != fine {
			t.Errorf("%q: %+v", text, p)
		}
	}
	for _, text := range []string{"5 500", "date bbl/d\n2027-01-01 3"} {
		st.Field.Wells.Schedule = text
		if _, err := Read(Write(st)); err == nil {
			t.Errorf("a file with the schedule %q is opened", text)
		}
	}
}

// Cash, discounting and a price that pays nothing, by hand: at a constant rate before water
// comes, cash is the same every second.
func TestMoney(t *testing.T) {
	st := Demo()
	put(&st, "field.money.oil", 61, "per bbl")
	put(&st, "field.money.injection", 0.4, "per bbl")
	put(&st, "field.money.fixed", 1000, "per d")
	put(&st, "field.horizon", 200, "d")
	days := 200.0
	want := days * (960*0.93*(61/1.27-0.4) - 1000)
	expect(t, Run(st), 1e-6, map[string]float64{"field.cash": want, "field.worth": want})
	put(&st, "field.money.discount", 10, "%")
	worth, _ := Run(st).Parts[SheetField].Figure("field.worth")
	rate := math.Log(1.1) / 365.25
	near(t, "worth", worth.Value, want/days*(1-math.Exp(-rate*days))/rate, 1e-4*want) // paid evenly
	st.Field.Limit = "cash"
	put(&st, "field.horizon", 60, "yr")
	r := Run(st)
	limit, ok := r.Parts[SheetField].Figure("field.limitTime")
	oil := must(t, r.Parts[SheetField], "field.rates", "oil")
	if !ok || math.Abs(interpolate(oil.X, oil.Y, limit.Value)*86400/0.158987294928*61-960*0.93*0.4-1000) > 5 {
		t.Errorf("the cash limit: %v %v", ok, limit.Value)
	}
}

// A history that the forecast itself made lies on it, and its late line is found again.
func TestHistory(t *testing.T) {
	st := Demo()
	table := "d bbl/d bbl/d"
	for year := 1; year <= 12; year++ {
		// Invented: 900 bbl/d of liquid, whose water-oil ratio is e^(year/3).
		oil := 900.0 / (1 + math.Exp(float64(year)/3))
		table += fmt.Sprintf("\n%d %.6f %.6f", 365*year, oil, 900-oil)
	}
	st.Field.History.Table = table
	put(&st, "field.history.from", 2, "bbl/bbl")
	part := Run(st).Parts[SheetField]
	measured := must(t, part, "field.rates", "measured.oil")
	near(t, "rate", measured.Y[3], 900/(1+math.Exp(4.0/3))*0.158987294928/86400, 1e-12)
	rows, _ := part.Figure("field.trendRows")
	near(t, "rows", rows.Value, 10, 0) // from the third year on the ratio e^(year/3) is above 2
	low, _ := part.Figure("field.trendLow")
	x, ok := part.Figure("field.trendOil")
	high, _ := part.Figure("field.trendHigh")
	if !ok || !(low.Value < x.Value && x.Value < high.Value) {
		t.Errorf("oil at the limit is %g, from %g to %g", x.Value, low.Value, high.Value)
	}
	// The forecast as its own history.
	plain := Demo()
	put(&plain, "field.horizon", 9, "yr")
	plain.Field.Wells.Schedule = "d bbl/d\n0 960"
	forecast := Run(plain).Parts[SheetField].Tables[0]
	table = "s m3/s m3/s"
	for i, time := range forecast.Columns[1].Values {
		table += fmt.Sprintf("\n%v %v %v", time, forecast.Columns[4].Values[i], forecast.Columns[5].Values[i])
	}
	plain.Field.History.Table = table
	part = Run(plain).Parts[SheetField]
	oil, points := must(t, part, "field.rates", "oil"), must(t, part, "field.rates", "measured.oil")
	for i := range points.X {
		if points.Y[i] > 0 {
			near(t, "the forecast as history", interpolate(oil.X, oil.Y, points.X[i]), points.Y[i], 3e-3*points.Y[0])
		}
	}
}

// A skin below zero in a block is an estimate, and says so; one above is not.
func TestNegativeSkinIsDoubted(t *testing.T) {
	for skin, doubted := range map[float64]bool{-0.4: true, 2: false} {
		st := Demo()
		put(&st, "field.wells.injectorSkin", skin, "")
		part := Run(st).Parts[SheetField]
		if _, is := noteOf(part, "field.skinNegative"); is != doubted || part.Status != Ready {
			t.Errorf("a skin of %g is doubted: %v; the sheet is %s", skin, is, part.Status)
		}
	}
}
