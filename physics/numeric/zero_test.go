package numeric

import (
	"math"
	"testing"
)

// TestZero: roots known in closed form or to sixteen figures.
func TestZero(t *testing.T) {
	for _, c := range []struct {
		name string
		f    func(float64) float64
		a, b float64
		want float64
		most int // calls; bisection needs 53 or so from a bracket as wide as its root
	}{
		{"cubic of Wallis (1685), from memory", func(x float64) float64 { return x*x*x - 2*x - 5 }, 2, 3, 2.0945514815423265, 12},
		{"fixed point of the cosine, from memory", func(x float64) float64 { return math.Cos(x) - x }, 0, 1, 0.7390851332151607, 12},
		{"square root of two, bracket turned round", func(x float64) float64 { return 2 - x*x }, 2, 1, math.Sqrt2, 12},
		{"ninth power", func(x float64) float64 { return math.Pow(x-0.3, 9) }, 0, 1, 0.3, 110},
		{"a step", func(x float64) float64 { return math.Copysign(1, x-0.7) }, 0, 1, 0.7, 110},
		{"a wall", func(x float64) float64 { return math.Exp(500*(x-0.9)) - 1e-100 }, 0, 1, 0.9 - 100*math.Ln10/500, 110},
		{"at the left end", func(x float64) float64 { return x - 1 }, 1, 5, 1, 0},
		{"at the right end", func(x float64) float64 { return x - 5 }, 1, 5, 5, 0},
		{"far from one", func(x float64) float64 { return math.Log(x) - math.Log(1e-12) }, 1e-15, 1, 1e-12, 110},
	} {
		calls := 0
		counted := func(x float64) float64 { calls++; return c.f(x) }
		got := Zero(counted, c.a, c.b, c.f(c.a), c.f(c.b))
		if !(math.Abs(got-c.want) <= 8*ulp*c.want) {
			t.Errorf("%s: %.17g, want %.17g", c.name, got, c.want)
		}
		if calls > c.most {
			t.Errorf("%s: %d calls, want %d at most", c.name, calls, c.most)
		}
	}
}

// TestZeroEnds: a function that is no number must not keep the program for ever.
func TestZeroEnds(t *testing.T) {
	calls := 0
	Zero(func(float64) float64 { calls++; return math.NaN() }, 0, 1, -1, 1)
	if calls > 200 {
		t.Errorf("%d calls", calls)
	}
}
