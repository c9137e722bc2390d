package numeric

import (
	"math"
	"math/rand/v2"
	"testing"
)

// TestIntegral compares with closed integrals: powers with a root at either end,
// and a pole just outside.
func TestIntegral(t *testing.T) {
	random := rand.New(rand.NewPCG(7, 8))
	for range 200 {
		a, width, p := 2*random.Float64()-1, 0.01+random.Float64(), 0.05+4*random.Float64()
		b := a + width
		w := b - a
		near := func(name string, got, want float64) {
			if math.Abs(got-want) > 1e-13*math.Abs(want) {
				t.Errorf("%s, power %v from %v to %v: %v, want %v", name, p, a, b, got, want)
			}
		}
		near("root at the right", Integral(func(x float64) float64 { return math.Pow((b-x)/w, p) }, a, b), w/(p+1))
		near("root at the left", Integral(func(x float64) float64 { return math.Pow((x-a)/w, p) }, a, b), w/(p+1))
		near("pole outside", Integral(func(x float64) float64 { return 1 / (x + 1e-3*w) }, 0, w), math.Log(1001))
	}
	if got := Integral(math.Sqrt, 1, 1); got != 0 {
		t.Errorf("nothing between equal ends: %v", got)
	}
}
