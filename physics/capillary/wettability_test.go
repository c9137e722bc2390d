package capillary

import (
	"math"
	"math/rand/v2"
	"testing"
)

// TestZeroOfLevelTable: a table that is level at zero stops soaking where the level begins.
func TestZeroOfLevelTable(t *testing.T) {
	for _, kind := range []Kind{MonotoneCubic, StraightLine} {
		c, err := NewTable([]float64{0.1, 0.3, 0.5, 0.7}, []float64{500, 0, 0, -90}, kind)
		if err != nil {
			t.Fatal(err)
		}
		if got := Spontaneous(c); got != (Imbibed{0.3, true}) {
			t.Errorf("zero at %+v, want 0.3", got)
		}
	}
}

// TestReaches inverts every model at random saturations, and says where it cannot.
func TestReaches(t *testing.T) {
	random := rand.New(rand.NewPCG(3, 4))
	for _, m := range models(t) {
		low, high := m.curve.Ends()
		for range 50 {
			sw := low + (high-low)*random.Float64()
			pc, slope := m.curve.At(sw)
			got := Reaches(m.curve, pc)
			back, _ := m.curve.At(got.Sw)
			if !got.Within || got.Sw > sw+1e-12 || math.Abs(back-pc) > 1e-12*math.Abs(pc)+4e-16*math.Abs(slope) {
				t.Errorf("%s: pc %v of %v found at %+v", m.name, pc, sw, got)
			}
		}
		if top, _ := m.curve.At(low); !math.IsInf(top, 0) {
			if got := Reaches(m.curve, top+math.Abs(top)+1); got != (Imbibed{low, false}) {
				t.Errorf("%s: above all found at %+v", m.name, got)
			}
		}
		if bottom, _ := m.curve.At(high); !math.IsInf(bottom, 0) {
			if got := Reaches(m.curve, bottom-math.Abs(bottom)-1); got != (Imbibed{high, false}) {
				t.Errorf("%s: below all found at %+v", m.name, got)
			}
		}
	}
}

// TestAreas compares with the closed integral of the two-branch form, term by term.
func TestAreas(t *testing.T) {
	random := rand.New(rand.NewPCG(5, 6))
	for range 100 {
		c := Skjaeveland{Swr: 0.3 * random.Float64(), Sor: 0.3 * random.Float64(),
			Cw: 5e3 * random.Float64(), Aw: 0.1 + 3*random.Float64(), Co: -5e3 * random.Float64(), Ao: 0.1 + 3*random.Float64()}
		const limit = 7e4
		integral := func(sw float64) float64 {
			s, u := (sw-c.Swr)/(1-c.Swr), (1-c.Sor-sw)/(1-c.Sor)
			return c.Cw*(1-c.Swr)*math.Pow(s, 1-c.Aw)/(1-c.Aw) - c.Co*(1-c.Sor)*math.Pow(u, 1-c.Ao)/(1-c.Ao)
		}
		positive, negative := Areas(c, limit)
		if positive.High != negative.Low || !(positive.Low < positive.High && negative.Low < negative.High) {
			t.Fatalf("areas %+v, %+v do not share the zero", positive, negative)
		}
		near := func(name string, a Area, want float64) {
			// Two large powers cancel in the closed form, and an end is a rounded saturation.
			if math.Abs(a.Value-want) > 1e-9*a.Value+4e-16*limit {
				t.Errorf("%s %+v of %+v: closed form %v", name, a, c, want)
			}
		}
		near("positive", positive, integral(positive.High)-integral(positive.Low))
		near("negative", negative, integral(negative.Low)-integral(negative.High))
	}
	// A table of straight lines: triangles, by hand.
	c, err := NewTable([]float64{0.1, 0.3, 0.5, 0.8}, []float64{500, 100, -100, -700}, StraightLine)
	if err != nil {
		t.Fatal(err)
	}
	positive, negative := Areas(c, 1e6)
	if math.Abs(positive.Value-65) > 1e-10 || math.Abs(negative.Value-125) > 1e-10 {
		t.Errorf("areas %v and %v, by hand 65 and 125", positive.Value, negative.Value)
	}
	if got := USBM(positive.Value, negative.Value); math.Abs(got-math.Log10(0.52)) > 1e-12 {
		t.Errorf("index %v", got)
	}
}

// TestAreasOfOneSign: rock that never crosses zero has one area.
func TestAreasOfOneSign(t *testing.T) {
	wet, other := Areas(BrooksCorey{0.1, 0.2, 1000, 2}, 1e5)
	if !(wet.Value > 0) || other.Value != 0 || !math.IsInf(USBM(wet.Value, other.Value), 1) {
		t.Errorf("water-wet: %+v, %+v", wet, other)
	}
	other, wet = Areas(Skjaeveland{Swr: 0.1, Sor: 0.2, Co: -1000, Ao: 0.5}, 1e5)
	if !(wet.Value > 0) || other.Value != 0 || !math.IsInf(USBM(other.Value, wet.Value), -1) {
		t.Errorf("oil-wet: %+v, %+v", other, wet)
	}
}

// TestAmott: definitions of Amott (1959) by hand, and states that cannot be.
func TestAmott(t *testing.T) {
	a := Amott{Initial: 0.2, WaterSoaked: 0.35, WaterDriven: 0.7, OilSoaked: 0.6, OilDriven: 0.2}
	for _, c := range []struct {
		name      string
		got, want float64
	}{{"Iw", a.Water(), 0.3}, {"Io", a.Oil(), 0.2}, {"Amott-Harvey", a.Harvey(), 0.1}} {
		if math.Abs(c.got-c.want) > 1e-15 {
			t.Errorf("%s = %v, want %v", c.name, c.got, c.want)
		}
	}
	for _, bad := range []Amott{
		{0.2, 0.75, 0.7, 0.6, 0.2}, {0.2, 0.1, 0.7, 0.6, 0.2}, {0.7, 0.7, 0.7, 0.6, 0.2}, {0.2, math.NaN(), 0.7, 0.6, 0.2},
	} {
		if !math.IsNaN(bad.Water()) || !math.IsNaN(bad.Harvey()) {
			t.Errorf("%+v: %v, %v", bad, bad.Water(), bad.Harvey())
		}
	}
}
