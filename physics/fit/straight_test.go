package fit

import (
	"math"
	"math/rand/v2"
	"testing"
)

// Five points by hand: x 1..5, y 2, 4, 5, 4, 5 give slope 0.6, intercept 2.2, s² = 0.8 and
// t(3) = 3.182446305 (two-sided 95 %; Abramowitz & Stegun 1964, table 26.10, from memory),
// so that the slope is within 0.6 ± 3.182446 sqrt(0.08).
func TestStraightByHand(t *testing.T) {
	s, ok := NewStraight([]float64{1, 2, 3, 4, 5}, []float64{2, 4, 5, 4, 5}, 0.95)
	half := 3.182446305 * math.Sqrt(0.08)
	for name, pair := range map[string][2]float64{
		"slope": {s.Slope, 0.6}, "intercept": {s.Intercept, 2.2}, "low": {s.SlopeLow, 0.6 - half}, "high": {s.SlopeHigh, 0.6 + half}, "R²": {s.Explained, 0.6},
	} {
		if !ok || math.Abs(pair[0]-pair[1]) > 1e-8 {
			t.Errorf("%s is %.10g, want %.10g", name, pair[0], pair[1])
		}
	}
	// Fieller's ends by their meaning: there the band of the line just reaches y.
	steep, _ := NewStraight([]float64{1, 2, 3, 4, 5}, []float64{1, 5, 5, 9, 9.5}, 0.95)
	_, low, high, ok := steep.Where(14)
	for _, x := range []float64{low, high} {
		band := 3.182446305 * steep.spread * math.Sqrt(1.0/5+(x-3)*(x-3)/10)
		if off := math.Abs(steep.Intercept + steep.Slope*x - 14); !ok || math.Abs(off-band) > 1e-7 {
			t.Errorf("at %g the line is %.9g off, its band is %.9g wide", x, off, band)
		}
	}
	if _, _, _, ok := s.Where(6); ok {
		t.Error("a slope that may be either has an interval")
	}
	if _, ok := NewStraight([]float64{1, 1, 1}, []float64{1, 2, 3}, 0.95); ok {
		t.Error("a line through one x")
	}
	if _, ok := NewStraight([]float64{1, 2}, []float64{1, 2}, 0.95); ok {
		t.Error("an interval from two points")
	}
}

// Intervals hold the true slope and the true place as often as they say.
func TestStraightCoverage(t *testing.T) {
	r := rand.New(rand.NewPCG(17, 4))
	const trials = 4000
	slope, place := 0, 0
	for range trials {
		var x, y []float64
		for i := range 9 {
			x, y = append(x, float64(i)), append(y, 3+0.7*float64(i)+0.4*r.NormFloat64())
		}
		s, _ := NewStraight(x, y, 0.9)
		if s.SlopeLow <= 0.7 && 0.7 <= s.SlopeHigh {
			slope++
		}
		if _, low, high, ok := s.Where(3 + 0.7*14); ok && low <= 14 && 14 <= high {
			place++
		}
	}
	for name, n := range map[string]int{"slope": slope, "place": place} { // five standard errors
		if share := float64(n) / trials; math.Abs(share-0.9) > 5*math.Sqrt(0.09/trials) {
			t.Errorf("the %s is held in %.3f of trials, want 0.9", name, share)
		}
	}
}
