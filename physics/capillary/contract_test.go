package capillary

import (
	"math"
	"math/rand/v2"
	"slices"
	"testing"
)

// model is one entry of the contract suite.
type model struct {
	name  string
	curve Curve
}

// models lists every model and its special cases. All parameters are invented.
func models(t testing.TB) []model {
	table := func(sw, pc []float64, kind Kind) Curve {
		c, err := NewTable(sw, pc, kind)
		if err != nil {
			t.Fatal(err)
		}
		return c
	}
	sw := []float64{0.2, 0.25, 0.31, 0.42, 0.55, 0.6, 0.71, 0.78}
	pc := []float64{91e3, 30e3, 12e3, 3e3, 3e3, 0, -4e3, -52e3}
	mixed := Skjaeveland{Swr: 0.11, Sor: 0.18, Cw: 3100, Aw: 0.72, Co: -5700, Ao: 0.61}
	return []model{
		{"brooks-corey", BrooksCorey{0.19, 0.23, 5200, 1.7}},
		{"brooks-corey pores of one size", BrooksCorey{0, 0, 5200, 40}},
		{"brooks-corey pores of many sizes", BrooksCorey{0.05, 0, 5200, 0.1}},
		{"van genuchten mualem", VanGenuchten{0.193, 0.247, 21300, 2.9, Mualem(2.9)}},
		{"van genuchten burdine", VanGenuchten{0.193, 0, 21300, 2.9, Burdine(2.9)}},
		{"van genuchten free", VanGenuchten{0, 0, 21300, 1.3, 4}},
		{"van genuchten narrow", VanGenuchten{0.4999, 0.4999, 900, 6, 0.05}},
		{"skjaeveland mixed-wet", mixed},
		{"skjaeveland water-wet", Skjaeveland{Swr: 0.11, Sor: 0.18, Cw: 3100, Aw: 0.72}},
		{"skjaeveland oil-wet", Skjaeveland{Swr: 0.11, Sor: 0.18, Co: -3100, Ao: 1.4}},
		{"power with entry", Power{0.15, 0.2, 0.31, 0.8, 0}},
		{"power to zero", Power{0.15, 0.2, 0.31, 0.8, 1}},
		{"power across zero", Power{0.15, 0.2, 0.31, 0.8, 1.6}},
		{"table cubic", table(sw, pc, MonotoneCubic)},
		{"table lines", table(sw, pc, StraightLine)},
		{"table of two rows", table([]float64{0, 1}, []float64{1, -1}, MonotoneCubic)},
		{"scaled infinite ends", Scaled{mixed, 0.63}},
		{"scaled power", Scaled{Power{0.15, 0.2, 0.31, 0.8, 1.6}, System{0.03, 0.5, 1e-13, 0.2}.Scale()}},
		{"scaled table", Scaled{table(sw, pc, MonotoneCubic), 17}},
	}
}

// TestContract runs every promise of Curve over every model.
func TestContract(t *testing.T) {
	list := models(t)
	if len(list) == 0 {
		t.Fatal("no model is registered")
	}
	for _, m := range list {
		t.Run(m.name, func(t *testing.T) {
			endsOrdered(t, m.curve)
			falls(t, m.curve)
			outside(t, m.curve)
			slopesAgree(t, m.curve)
			anyNumber(t, m.curve)
		})
	}
}

func endsOrdered(t *testing.T, c Curve) {
	low, high := c.Ends()
	if !(0 <= low && low < high && high <= 1) {
		t.Fatalf("ends %g, %g are not ordered within 0 to 1", low, high)
	}
	before := low
	for _, k := range c.Knots() {
		if !(k > before && k < high) {
			t.Errorf("knot %g is not between %g and %g", k, before, high)
		}
		before = k
	}
}

// saturations returns points over the whole range, crowded towards both ends.
func saturations(c Curve) []float64 {
	low, high := c.Ends()
	var list []float64
	for e := -15.0; e < -2; e += 0.25 {
		list = append(list, low+(high-low)*math.Pow(10, e), high-(high-low)*math.Pow(10, e))
	}
	for i := 1; i < 2000; i++ {
		list = append(list, low+(high-low)*float64(i)/2000)
	}
	slices.Sort(list)
	return list
}

func falls(t *testing.T, c Curve) {
	low, high := c.Ends()
	before, _ := c.At(low)
	for _, sw := range append(saturations(c), high) {
		pc, slope := c.At(sw)
		// a few units in the last place of what the branches add up from
		if pc > before+1e-14*max(math.Abs(pc), 1) {
			t.Fatalf("at %v: pc rises from %v to %v", sw, before, pc)
		}
		if slope > 0 {
			t.Fatalf("at %v: slope %v rises", sw, slope)
		}
		before = pc
	}
}

// outside: beyond an unbounded end all is infinite, beyond a finite one the end holds.
func outside(t *testing.T, c Curve) {
	low, high := c.Ends()
	for _, away := range []float64{math.Nextafter(0, 1), 1e-300, 1e-17, 1e-9, 0.5, 1, 1e9, math.Inf(1)} {
		for _, side := range []struct{ end, beyond float64 }{{low, low - away}, {high, high + away}} {
			if side.beyond == side.end {
				continue
			}
			endValue, endSlope := c.At(side.end)
			pc, slope := c.At(side.beyond)
			if pc != endValue {
				t.Errorf("at %v: %v, not the end value %v", side.beyond, pc, endValue)
			}
			if want := 0.0; math.IsInf(endValue, 0) {
				if !math.IsInf(slope, -1) || !math.IsInf(endSlope, -1) {
					t.Errorf("at the unbounded end %v: slopes %v and beyond %v", side.end, endSlope, slope)
				}
			} else if slope != want {
				t.Errorf("at %v, beyond a finite end: slope %v", side.beyond, slope)
			}
		}
	}
}

// slopesAgree compares analytic slopes with differences of fourth order, five
// points a step apart, keeping clear of knots and ends.
func slopesAgree(t *testing.T, c Curve) {
	low, high := c.Ends()
	corners := append([]float64{low, high}, c.Knots()...)
	compared := 0
	for _, sw := range saturations(c) {
		room := 1.0
		for _, k := range corners {
			room = min(room, math.Abs(sw-k))
		}
		step := room / 2048
		if step < 1e-12 {
			continue // rounding of sw itself is no longer small beside the step
		}
		at := func(i float64) float64 { pc, _ := c.At(sw + i*step); return pc }
		wide := (sw + step) - (sw - step) // the step as it is after rounding
		difference := (8*(at(1)-at(-1)) - (at(2) - at(-2))) / (6 * wide)
		pc, slope := c.At(sw)
		// Rounding of pc, of its parts and of sw, over the step, and the order of the difference.
		size := math.Abs(pc) + math.Abs(slope)*room
		tolerance := 1e-6*math.Abs(slope) + 1e-15/step*(size+math.Abs(slope))
		if math.Abs(difference-slope) > tolerance {
			t.Errorf("at %v: slope %v, by differences %v", sw, slope, difference)
		}
		compared++
	}
	if compared < 1000 {
		t.Errorf("only %d slopes compared", compared)
	}
}

// anyNumber feeds every kind of float: what is a number gives numbers, finite ones
// between the ends, what is not gives none.
func anyNumber(t *testing.T, c Curve) {
	low, high := c.Ends()
	number := func(sw float64) {
		pc, slope := c.At(sw)
		if math.IsNaN(pc) || math.IsNaN(slope) {
			t.Fatalf("At(%v) = %v, %v", sw, pc, slope)
		}
	}
	for _, sw := range []float64{0, math.Copysign(0, -1), 1, low, high, math.Inf(1), math.Inf(-1), math.MaxFloat64,
		math.SmallestNonzeroFloat64, 1e-310, 1e-100, math.Nextafter(low, 1), math.Nextafter(high, 0), math.Nextafter(low, -1), math.Nextafter(high, 2)} {
		number(sw)
	}
	random := rand.New(rand.NewPCG(1, 2))
	for range 2000 {
		if sw := math.Float64frombits(random.Uint64()); !math.IsNaN(sw) {
			number(sw)
		}
		sw := low + (high-low)*(0.001+0.998*random.Float64())
		if pc, slope := c.At(sw); math.IsNaN(pc) || math.IsInf(pc, 0) || math.IsNaN(slope) || math.IsInf(slope, 0) {
			t.Fatalf("At(%v) = %v, %v between the ends", sw, pc, slope)
		}
	}
	if pc, slope := c.At(math.NaN()); !math.IsNaN(pc) || !math.IsNaN(slope) {
		t.Errorf("At(NaN) = %v, %v makes up a value", pc, slope)
	}
}
