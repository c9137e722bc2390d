package fracflow

import (
	"math"
	"math/rand/v2"
	"testing"
)

// Draws of TestRandomFlows' kind that once were wrong, by seed and number: fans in which the
// speed fell back by up to 1e-5 of the fastest, since two inflections lay between neighbouring
// samples (tables, and one LET curve); a bridge over a corner so slight that its two ends closed
// up, with f above it; and one beside it whose ends met in one point, with a speed
// that was not a number.
func TestHardDraws(t *testing.T) {
	for _, c := range []struct {
		seed, stream uint64
		number       int
	}{{2, 1, 6976}, {2, 2, 909}, {2, 4, 6090}, {2, 5, 8626}, {2, 5, 36919}, {1942, 2, 31170}} {
		r := rand.New(rand.NewPCG(c.seed, c.stream))
		for range c.number {
			draw(r)
		}
		flow, injected, initial, what := draw(r)
		waves, err := Solve(flow, injected, initial)
		if err == nil {
			err = checkWaves(flow, injected, initial, waves)
		}
		if err != nil {
			t.Errorf("%+v: %v\n%.300s", c, err, what)
		}
	}
}

// bump is a concave function but for a stretch of half width e about c, where it is convex:
// with x = s - c, f = s - x⁴/12 + e²x²/2, so that f" = e² - x². By symmetry one line touches
// it on both sides, at x = ±e√3, with slope 1.
type bump struct{ c, e float64 }

func (b bump) At(s float64) (f, dfds float64) {
	x := s - b.c
	return s - x*x*x*x/12 + b.e*b.e*x*x/2, 1 - x*x*x/3 + b.e*b.e*x
}
func (bump) Ends() (lo, hi float64) { return 0, 1 }
func (bump) Knots() []float64       { return nil }

// Closed form: the shock across the convex stretch, however narrow, as long as the rise of
// the slope in it, 4e³/3, is above its rounding. Samples are 0.01 to 0.1 apart here. The
// place of a tangent is good to the root of the rounding of f over the bend there, 2e².
func TestNarrowInflections(t *testing.T) {
	r := rand.New(rand.NewPCG(1957, 3))
	for _, e := range []float64{0.1, 0.03, 0.01, 0.003, 0.001, 0.0005} {
		for range 40 {
			fn := bump{0.2 + 0.6*r.Float64(), e}
			waves, err := Solve(fn, 1, 0)
			if err != nil {
				t.Fatal(err)
			}
			if len(waves) != 3 || waves[1].Kind != Shock {
				t.Fatalf("%+v: %+v, want a fan, a shock and a fan", fn, waves)
			}
			reach := e * math.Sqrt(3)
			place := 3e-16/(e*e*e) + 1e-15 // rounding of the slope of the bridge, over the bend
			near(t, "behind", waves[1].Behind, fn.c+reach, place)
			near(t, "ahead", waves[1].Ahead, fn.c-reach, place)
			near(t, "speed", waves[1].SpeedAhead, 1, 3e-16/e)
		}
	}
}
