package fracflow

import (
	"math"
	"testing"

	"brinefront/physics/relperm"
)

// quadratic is krw = S^2, kro = (1-S)^2 with viscosity ratio m = muo/muw.
func quadratic(m float64) Flow {
	return Flow{Curves: relperm.Corey{Krw0: 1, Kro0: 1, Nw: 2, No: 2}, MuW: 1e-3, MuO: m * 1e-3}
}

// Exact result for quadratic curves: S* = 1/sqrt(1+M), speed (1+sqrt(1+M))/2. The
// tolerance is the rounding of f' = 0 found to the last digits.
func TestQuadraticClosedForm(t *testing.T) {
	for _, m := range []float64{1e-6, 1e-3, 0.5, 1, 2, 5, 10, 1e3, 1e6} {
		waves, err := Solve(quadratic(m), 1, 0)
		if err != nil {
			t.Fatal(err)
		}
		root := math.Sqrt(1 + m)
		if len(waves) != 2 || waves[0].Kind != Fan || waves[1].Kind != Shock {
			t.Fatalf("M = %g: waves %+v, want a fan and a shock", m, waves)
		}
		w := waves[1]
		if d := math.Abs(w.Behind*root - 1); d > 1e-13 {
			t.Errorf("M = %g: S* %.17g is off by %.2g", m, w.Behind, d)
		}
		if d := math.Abs(w.SpeedAhead/((1+root)/2) - 1); d > 1e-14 {
			t.Errorf("M = %g: speed off by %.2g", m, d)
		}
	}
}
func BenchmarkSolve(b *testing.B) {
	for b.Loop() {
		Solve(quadratic(5), 1, 0)
	}
}
