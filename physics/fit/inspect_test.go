package fit

import (
	"math"
	"slices"
	"strings"
	"testing"
)

// sound are invented points without a fault.
func sound() Points {
	return Points{
		Sw:  []float64{0.2, 0.3, 0.4, 0.5, 0.6, 0.7},
		Krw: []float64{0, 0.01, 0.05, 0.11, 0.2, 0.3},
		Kro: []float64{0.8, 0.55, 0.33, 0.15, 0.04, 0},
	}
}

func scaled(values []float64, by float64) []float64 {
	out := slices.Clone(values)
	for i := range out {
		out[i] *= by
	}
	return out
}

func TestInspect(t *testing.T) {
	nan, inf := math.NaN(), math.Inf(1)
	tests := []struct {
		name   string
		change func(*Points)
		id     string
		rows   []int
		read   string
		refuse bool
	}{
		{"no rows", func(p *Points) { *p = Points{} }, "missing", nil, "0 rows", true},
		{"not a number", func(p *Points) { p.Krw[2] = nan }, "missing", []int{2}, "krw in row 3", true},
		{"infinite", func(p *Points) { p.Sw[5] = inf }, "missing", []int{5}, "Sw in row 6", true},
		{"saturation in percent", func(p *Points) { p.Sw = scaled(p.Sw, 100) }, "percent", []int{0, 1, 2, 3, 4, 5}, "Sw up to 70", true},
		{"krw in percent", func(p *Points) { p.Krw = scaled(p.Krw, 100) }, "percent", []int{2, 3, 4, 5}, "krw up to 30", true},
		{"negative", func(p *Points) { p.Kro[5] = -0.01 }, "outside", []int{5}, "kro = -0.01", true},
		{"saturation above one", func(p *Points) { p.Sw[5] = 1.2 }, "outside", []int{5}, "Sw = 1.2", true},
		{"kr far above one", func(p *Points) { p.Kro[0] = 55 }, "outside", []int{0}, "kro = 55", true},
		{"two rows", func(p *Points) { p.Sw, p.Krw, p.Kro = p.Sw[:2], p.Krw[:2], []float64{0.8, 0} }, "few", nil, "2 rows", true},
		{"one row", func(p *Points) { p.Sw, p.Krw, p.Kro = p.Sw[:1], []float64{0}, []float64{0} }, "few", nil, "1 row", true},
		{"three rows", func(p *Points) { p.Sw, p.Krw, p.Kro = p.Sw[:3], p.Krw[:3], []float64{0.8, 0.1, 0} }, "few", nil, "3 rows", false},
		{"swapped", func(p *Points) { p.Krw, p.Kro = p.Kro, p.Krw }, "swapped", nil, "krw falls and kro rises", true},
		{"nothing moves", func(p *Points) { p.Sw = []float64{0.4, 0.4, 0.4, 0.4, 0.4, 0.4} }, "range", nil, "Sw from 0.4 to 0.4", true},
		{"little moves", func(p *Points) { p.Sw = []float64{0.4, 0.41, 0.42, 0.43, 0.44, 0.45} }, "narrow", nil, "Sw from 0.4 to 0.45", false},
		{"no water", func(p *Points) { p.Krw = make([]float64, 6) }, "flat", nil, "krw = 0 in every row", true},
		{"out of order", func(p *Points) {
			p.Sw[2], p.Sw[3], p.Krw[2], p.Krw[3], p.Kro[2], p.Kro[3] = p.Sw[3], p.Sw[2], p.Krw[3], p.Krw[2], p.Kro[3], p.Kro[2]
		}, "order", []int{3}, "Sw = 0.4", false},
		{"twice", func(p *Points) { p.Sw[3] = 0.4 }, "duplicate", []int{3}, "Sw = 0.4", false},
		{"krw falls", func(p *Points) { p.Krw[3] = 0.04 }, "krw-falls", []int{3}, "krw = 0.04", false},
		{"kro rises", func(p *Points) { p.Kro[4] = 0.2 }, "kro-rises", []int{4}, "kro = 0.2", false},
		{"water flows at once", func(p *Points) { p.Krw[0] = 0.011 }, "krw-end", []int{0}, "krw = 0.011 at Sw = 0.2", false},
		{"oil still flows", func(p *Points) { p.Kro[5] = 0.02 }, "kro-end", []int{5}, "kro = 0.02 at Sw = 0.7", false},
		{"above one", func(p *Points) { p.Kro[0] = 1.1 }, "above-one", []int{0}, "kro = 1.1", false},
		{"relative to oil", func(p *Points) { p.Kro[0] = 1 }, "reference", []int{0}, "kro = 1 at Sw = 0.2", false},
		{"no longer full", func(p *Points) { p.Kro[0], p.FilledByOil = 1, true }, "reference", []int{0}, "kro = 1 at Sw = 0.2", false},
		{"oil beside connate water", func(p *Points) { p.Sw[0], p.Kro[0] = 0, 1 }, "reference", []int{0}, "kro = 1 at Sw = 0", false},
		{"not relative to oil", func(p *Points) { p.RelativeToOil = true }, "reference", []int{0}, "kro = 0.8", false},
	}
	for _, test := range tests {
		t.Run(test.name, func(t *testing.T) {
			p := sound()
			test.change(&p)
			found := Inspect(p)
			i := slices.IndexFunc(found, func(f Finding) bool { return f.ID == test.id })
			if i < 0 {
				t.Fatalf("found %+v, want %s", found, test.id)
			}
			f := found[i]
			if !slices.Equal(f.Rows, test.rows) || !strings.Contains(f.Read, test.read) || f.Refuse != test.refuse || f.Text == "" || f.Do == "" || (f.Allowed != "") != f.Refuse {
				t.Errorf("found %+v", f)
			}
			for _, fit := range []func(Points, Options) (Fit, error){Corey, LET} {
				if _, err := fit(p, Options{}); f.Refuse != (err != nil && strings.HasPrefix(err.Error(), "No curve can be drawn")) {
					t.Errorf("a finding that refuses (%v) and a fit with error %v", f.Refuse, err)
				}
			}
		})
	}
	relative := sound()
	relative.Kro[0], relative.RelativeToOil = 1, true
	// One phase alone in the rock flows as absolute permeability says.
	full := sound()
	full.Sw[0], full.Kro[0], full.FilledByOil = 0, 1, true
	for _, p := range []Points{sound(), relative, full} {
		if found := Inspect(p); found != nil {
			t.Errorf("found %+v in sound points", found)
		}
	}
}

// TestOneFaultOneFinding: a fault does not set off the looks that it makes
// meaningless.
func TestOneFaultOneFinding(t *testing.T) {
	p := sound()
	p.Sw = scaled(p.Sw, 100)
	if found := Inspect(p); len(found) != 1 {
		t.Errorf("percent gives %+v", found)
	}
	p = sound()
	p.Kro[2] = math.NaN()
	if found := Inspect(p); len(found) != 1 {
		t.Errorf("a missing value gives %+v", found)
	}
}

func TestLongLists(t *testing.T) {
	p := Points{Sw: make([]float64, 40), Krw: make([]float64, 40), Kro: make([]float64, 40)}
	for i := range p.Sw {
		p.Sw[i], p.Krw[i], p.Kro[i] = -1, 0.1, 0.1
	}
	if text := Inspect(p)[0].Text; !strings.Contains(text, "rows 1, 2, 3, 4, 5, 6, and 34 more") {
		t.Errorf("text %q", text)
	}
}

// FuzzFit: whatever the numbers, there is a fit or a reason, and no panic; a fit
// holds finite parameters within their bounds.
func FuzzFit(f *testing.F) {
	f.Add(0.2, 0.0, 0.8, 0.35, 0.05, 0.4, 0.5, 0.1, 0.2, 0.6, 0.2, 0.1, 0.7, 0.3, 0.0, byte(0))
	f.Add(0.0, 0.5, 0.5, 0.2, 0.5, 0.5, 0.4, 0.5, 0.5, 0.6, 0.5, 0.5, 1.0, 0.5, 0.5, byte(7))
	f.Add(0.2, 1e-300, 2.0, 0.2, 0.0, 0.0, 0.2, 0.0, 0.0, 0.3, 0.0, 1e-300, 0.3, 2.0, 0.0, byte(2))
	f.Fuzz(func(t *testing.T, a1, a2, a3, b1, b2, b3, c1, c2, c3, d1, d2, d3, e1, e2, e3 float64, options byte) {
		p := Points{Sw: []float64{a1, b1, c1, d1, e1}, Krw: []float64{a2, b2, c2, d2, e2}, Kro: []float64{a3, b3, c3, d3, e3}}
		o := Options{Weights: Weighting(options & 1), FreeSaturations: options&2 > 0, HoldEnds: options&4 > 0, Iterations: 50}
		for _, fit := range []func(Points, Options) (Fit, error){Corey, LET} {
			r, err := fit(p, o)
			if err != nil {
				continue
			}
			for _, q := range r.Parameters {
				if !(q.Min <= q.Value && q.Value <= q.Max && q.Min <= q.Low && q.Low <= q.High && q.High <= q.Max) || math.IsNaN(q.StdErr) {
					t.Fatalf("%+v of %+v", q, p)
				}
			}
			checkBand(t, r)
		}
	})
}
