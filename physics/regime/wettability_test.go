package regime

import (
	"math"
	"strings"
	"testing"
)

// TestCraigSigns: each side of each rule of thumb of Craig (1971), one sign at a time.
func TestCraigSigns(t *testing.T) {
	p := readPublished(t).Craig
	unknown := math.NaN()
	check := func(signs CraigSigns, sign int, want Class) {
		t.Helper()
		all := signs.Judge()
		for _, v := range all {
			complete(t, v)
		}
		complete(t, signs.Summary())
		if all[sign].Class != want {
			t.Errorf("%+v: sign %d is %s, want %s", signs, sign, all[sign].Class, want)
		}
		if got := signs.Summary().Class; got != want {
			t.Errorf("%+v: %s on one sign alone, want %s", signs, got, want)
		}
	}
	for sign, c := range []struct {
		with                  func(x float64) CraigSigns
		low, high             float64
		below, between, above Class
	}{
		{func(x float64) CraigSigns { return CraigSigns{x, unknown, unknown} }, p.WaterWet.KrwEndBelow, p.OilWet.KrwEndAbove, WaterWet, Undecided, OilWet},
		{func(x float64) CraigSigns { return CraigSigns{unknown, x, unknown} }, p.OilWet.CrossoverBelow, p.WaterWet.CrossoverAbove, OilWet, Undecided, WaterWet},
		{func(x float64) CraigSigns { return CraigSigns{unknown, unknown, x} }, p.OilWet.SwcBelow, p.WaterWet.SwcAbove, OilWet, Undecided, WaterWet},
	} {
		below, _ := around(c.low)
		_, above := around(c.high)
		check(c.with(below), sign, c.below)
		check(c.with((c.low+c.high)/2), sign, c.between)
		check(c.with(above), sign, c.above)
		check(c.with(unknown), sign, Undecided)
	}
}

// TestCraigSummary: invented curves of each kind.
func TestCraigSummary(t *testing.T) {
	for _, c := range []struct {
		signs CraigSigns
		want  Class
		text  string
	}{
		{CraigSigns{0.15, 0.62, 0.28}, WaterWet, "Of 3 signs, 3 point to water-wet and 0 to oil-wet rock: the curves look water-wet."},
		{CraigSigns{0.85, 0.38, 0.12}, OilWet, "Of 3 signs, 0 point to water-wet and 3 to oil-wet rock: the curves look oil-wet."},
		{CraigSigns{0.4, 0.55, 0.2}, WaterWet, "Of 3 signs, 1 point to water-wet and 0 to oil-wet rock: the curves look water-wet."},
		{CraigSigns{0.7, 0.55, 0.3}, Contradictory, "Of 3 signs, 2 point to water-wet and 1 to oil-wet rock: they contradict each other, as in rock of mixed wettability or with curves from altered rock."},
		{CraigSigns{0.4, math.NaN(), 0.2}, Undecided, "Of 2 signs, 0 point to water-wet and 0 to oil-wet rock: the curves do not tell."},
	} {
		if v := c.signs.Summary(); v.Class != c.want || v.Text != c.text {
			t.Errorf("%+v: %s: %s", c.signs, v.Class, v.Text)
		}
	}
}

// TestCoreyExponents: the published ranges by wettability, at their middles and outside.
func TestCoreyExponents(t *testing.T) {
	p := readPublished(t).Corey
	if len(p.Classes) == 0 {
		t.Fatal("no values")
	}
	for i, class := range p.Classes {
		nw, no := (p.Nw[i][0]+p.Nw[i][1])/2, (p.No[i][0]+p.No[i][1])/2
		v := CoreyExponents(nw, no)
		complete(t, v)
		if v.Class != class {
			t.Errorf("nw = %g, no = %g: %+v, want %s", nw, no, v, class)
		}
		if !strings.Contains(v.Range, "from memory") {
			t.Errorf("%q does not say that the ranges are from memory", v.Range)
		}
	}
	for _, c := range []struct{ nw, no float64 }{
		{5, 3.5},          // the overlap of water-wet and intermediate
		{2, 2},            // the exponents point different ways
		{20, 3},           // outside every range
		{math.NaN(), 3.5}, // not known
	} {
		v := CoreyExponents(c.nw, c.no)
		complete(t, v)
		if v.Class != Undecided {
			t.Errorf("nw = %g, no = %g: %+v", c.nw, c.no, v)
		}
	}
}
