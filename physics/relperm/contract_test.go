package relperm

import (
	"math"
	"math/rand/v2"
	"slices"
	"testing"
)

// model is one entry of the contract suite.
type model struct {
	name   string
	curves Curves
	// finer divides the step of the finite differences for curves that bend
	// within less than a hundredth of their range; 0 means 1.
	finer float64
}

// models lists every model and its special cases. All parameters are invented.
func models(t testing.TB) []model {
	sw := []float64{0.2, 0.25, 0.31, 0.42, 0.55, 0.6, 0.71, 0.78}
	krw := []float64{0, 0.002, 0.011, 0.05, 0.05, 0.14, 0.27, 0.38}
	kro := []float64{0.91, 0.7, 0.52, 0.2, 0.07, 0.041, 0.003, 0}
	table := func(sw, krw, kro []float64, kind Kind) Curves {
		c, err := NewTable(sw, krw, kro, kind)
		if err != nil {
			t.Fatal(err)
		}
		return c
	}
	corey := Corey{Swc: 0.19, Sor: 0.23, Krw0: 0.31, Kro0: 0.87, Nw: 2.7, No: 3.1}
	let := LET{Swc: 0.13, Sor: 0.21, Krw0: 0.42, Kro0: 0.9, Lw: 2.3, Ew: 3.7, Tw: 1.2, Lo: 3.1, Eo: 2.4, To: 1.1}
	return []model{
		{"corey", corey, 0},
		{"corey straight", Corey{Krw0: 1, Kro0: 1, Nw: 1, No: 1}, 0},
		{"corey high exponents", Corey{Swc: 0.1, Sor: 0.3, Krw0: 0.2, Kro0: 1, Nw: 15, No: 15}, 0},
		{"corey narrow", Corey{Swc: 0.4999, Sor: 0.4999, Krw0: 0.2, Kro0: 1, Nw: 2, No: 2}, 0},
		{"let", let, 0},
		{"let straight lower part", LET{Krw0: 1, Kro0: 1, Lw: 1, Ew: 1, Tw: 1, Lo: 1, Eo: 1, To: 1}, 0},
		{"let steep top", LET{Swc: 0.137, Sor: 0.193, Krw0: 0.417, Kro0: 0.883, Lw: 2.31, Ew: 3.7, Tw: 0.5, Lo: 3.13, Eo: 2.41, To: 0.89}, 0},
		{"let high exponents", LET{Swc: 0.05, Sor: 0.1, Krw0: 0.6, Kro0: 1, Lw: 20, Ew: 1e4, Tw: 20, Lo: 20, Eo: 1e-3, To: 20}, 0},
		{"let exponents past any number", LET{Krw0: 1, Kro0: 1, Lw: 4000, Ew: 1, Tw: 4000, Lo: 4000, Eo: 1, To: 4000}, 256},
		{"table cubic", table(sw, krw, kro, MonotoneCubic), 0},
		{"table lines", table(sw, krw, kro, StraightLine), 0},
		{"table of two rows", table([]float64{0, 1}, []float64{0, 1}, []float64{1, 0}, MonotoneCubic), 0},
		{"table with level stretch", table([]float64{0, 0.3, 0.4, 1}, []float64{0, 0, 0.1, 0.1}, []float64{1, 1, 0, 0}, MonotoneCubic), 0},
		{"scaled corey", Scaled{corey, 0.63}, 0},
		{"scaled table", Scaled{table(sw, krw, kro, MonotoneCubic), 1 / 0.91}, 0},
		{"stretched corey", Stretched{corey, 0.71}, 0},
		{"stretched table", Stretched{table(sw, krw, kro, MonotoneCubic), 0.86}, 0},
	}
}

// TestContract runs every promise of Curves over every model.
func TestContract(t *testing.T) {
	list := models(t)
	if len(list) == 0 {
		t.Fatal("no model is registered")
	}
	for _, m := range list {
		t.Run(m.name, func(t *testing.T) {
			ends(t, m.curves)
			rises(t, m.curves)
			constantOutside(t, m.curves)
			knotsInside(t, m.curves)
			slopesAgree(t, m)
			anyNumber(t, m.curves)
		})
	}
}

func ends(t *testing.T, c Curves) {
	lo, hi := c.Ends()
	if !(0 <= lo && lo < hi && hi <= 1) {
		t.Fatalf("ends %g, %g are not ordered within 0 to 1", lo, hi)
	}
	first, last := c.At(lo), c.At(hi)
	if first.Krw != 0 {
		t.Errorf("krw(swc) = %g, want 0", first.Krw)
	}
	if last.Kro != 0 {
		t.Errorf("kro(swmax) = %g, want 0", last.Kro)
	}
	// The end value inside and outside is one and the same number.
	if out := c.At(lo - 0.01); out.Kro != first.Kro {
		t.Errorf("kro steps from %v to %v at swc", out.Kro, first.Kro)
	}
	if out := c.At(hi + 0.01); out.Krw != last.Krw {
		t.Errorf("krw steps from %v to %v at swmax", last.Krw, out.Krw)
	}
}

// saturations returns points over the whole range, crowded towards both ends.
func saturations(c Curves) []float64 {
	lo, hi := c.Ends()
	var list []float64
	for e := -15.0; e < -2; e += 0.25 {
		list = append(list, lo+(hi-lo)*math.Pow(10, e))
	}
	for i := 1; i < 2000; i++ {
		list = append(list, lo+(hi-lo)*float64(i)/2000)
	}
	for e := -2.0; e >= -15; e -= 0.25 {
		list = append(list, hi-(hi-lo)*math.Pow(10, e))
	}
	slices.Sort(list)
	return list
}

func rises(t *testing.T, c Curves) {
	lo, hi := c.Ends()
	top := Point{Krw: c.At(hi).Krw, Kro: c.At(lo).Kro}
	const rounding = 1e-15 // a few units in the last place of the end point
	before := c.At(lo)
	for _, sw := range append(saturations(c), hi) {
		p := c.At(sw)
		if p.Krw < 0 || p.Krw > top.Krw || p.Kro < 0 || p.Kro > top.Kro {
			t.Fatalf("at %v: krw %v outside 0 to %v, or kro %v outside 0 to %v", sw, p.Krw, top.Krw, p.Kro, top.Kro)
		}
		if p.Krw < before.Krw-rounding*top.Krw || p.Kro > before.Kro+rounding*top.Kro {
			t.Fatalf("at %v: krw falls from %v to %v, or kro rises from %v to %v", sw, before.Krw, p.Krw, before.Kro, p.Kro)
		}
		if p.DKrw < -1e-12 || p.DKro > 1e-12 {
			t.Fatalf("at %v: slopes %v, %v have the wrong sign", sw, p.DKrw, p.DKro)
		}
		before = p
	}
}

func constantOutside(t *testing.T, c Curves) {
	lo, hi := c.Ends()
	first, last := c.At(lo), c.At(hi)
	for _, away := range []float64{math.Nextafter(0, 1), 1e-300, 1e-17, 1e-9, 0.5, 1, 1e9, math.Inf(1)} {
		below, above := lo-away, hi+away
		if below < lo {
			if p := c.At(below); p != (Point{Krw: first.Krw, Kro: first.Kro}) {
				t.Errorf("at %g below swc: %+v", away, p)
			}
		}
		if above > hi {
			if p := c.At(above); p != (Point{Krw: last.Krw, Kro: last.Kro}) {
				t.Errorf("at %g above swmax: %+v", away, p)
			}
		}
	}
}

func knotsInside(t *testing.T, c Curves) {
	lo, hi := c.Ends()
	before := lo
	for _, k := range c.Knots() {
		if !(k > before && k < hi) {
			t.Errorf("knot %g is not between %g and %g", k, before, hi)
		}
		before = k
	}
}

// slopesAgree compares analytic slopes with differences of fourth order, five
// points a step apart, keeping clear of knots and ends.
func slopesAgree(t *testing.T, m model) {
	lo, hi := m.curves.Ends()
	corners := append([]float64{lo, hi}, m.curves.Knots()...)
	compared := 0
	for _, sw := range saturations(m.curves) {
		room := 1.0
		for _, k := range corners {
			room = min(room, math.Abs(sw-k))
		}
		step := room / (2048 * max(1, m.finer))
		if step < 1e-12 {
			continue // rounding of sw itself is no longer small beside the step
		}
		difference := func(f func(Point) float64) float64 {
			at := func(i float64) float64 { return f(m.curves.At(sw + i*step)) }
			// the step as it is after rounding
			wide := (sw + step) - (sw - step)
			return (8*(at(1)-at(-1)) - (at(2) - at(-2))) / (6 * wide)
		}
		p := m.curves.At(sw)
		scaleW, scaleO := m.curves.At(hi).Krw/(hi-lo), m.curves.At(lo).Kro/(hi-lo)
		// Rounding of kr and of sw, over the step, and the order of the difference.
		tolerance := func(slope, scale float64) float64 {
			return 1e-6*math.Abs(slope) + scale*(1e-8+4e-16/step) + 4e-16/step*math.Abs(slope)
		}
		if d := difference(func(p Point) float64 { return p.Krw }); math.Abs(d-p.DKrw) > tolerance(p.DKrw, scaleW) {
			t.Errorf("at %v: dkrw/dsw %v, by differences %v", sw, p.DKrw, d)
		}
		if d := difference(func(p Point) float64 { return p.Kro }); math.Abs(d-p.DKro) > tolerance(p.DKro, scaleO) {
			t.Errorf("at %v: dkro/dsw %v, by differences %v", sw, p.DKro, d)
		}
		compared++
	}
	if compared < 1000 {
		t.Errorf("only %d slopes compared", compared)
	}
}

// anyNumber feeds every kind of float: what is a number gives finite numbers, what
// is not gives none.
func anyNumber(t *testing.T, c Curves) {
	finite := func(sw float64) {
		p := c.At(sw)
		for _, v := range []float64{p.Krw, p.Kro, p.DKrw, p.DKro} {
			if math.IsNaN(v) || math.IsInf(v, 0) {
				t.Fatalf("At(%v) = %+v", sw, p)
			}
		}
	}
	lo, hi := c.Ends()
	for _, sw := range []float64{0, math.Copysign(0, -1), 1, lo, hi, math.Inf(1), math.Inf(-1), math.MaxFloat64,
		math.SmallestNonzeroFloat64, 1e-310, 1e-100, math.Nextafter(lo, 1), math.Nextafter(hi, 0), math.Nextafter(lo, -1), math.Nextafter(hi, 2)} {
		finite(sw)
	}
	random := rand.New(rand.NewPCG(1, 2))
	for range 2000 {
		if sw := math.Float64frombits(random.Uint64()); !math.IsNaN(sw) {
			finite(sw)
		}
		finite(lo + (hi-lo)*random.Float64())
	}
	if p := c.At(math.NaN()); !math.IsNaN(p.Krw) || !math.IsNaN(p.Kro) {
		t.Errorf("At(NaN) = %+v makes up a value", p)
	}
}
