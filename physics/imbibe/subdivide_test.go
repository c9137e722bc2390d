package imbibe

import (
	"math"
	"testing"
)

// At a constant diffusivity one cell of a slab fills as 1 - exp(-2 t), t over the square of the reach:
// by hand, from one flux over half the reach. On more cells the share nears Crank's (1975) series,
// see linear, at second order and from below, since every first cell is slow.
func TestEqualCells(t *testing.T) {
	m := matrixOf(t, law(constant))
	const reach = 3.0
	share := func(spread, cells int, tau float64) float64 {
		b, err := m.Subdivide(Axis{reach, spread}, cells, tau*reach*reach)
		must(t, err)
		s, _ := b.At(tau * reach * reach)
		return s
	}
	for _, tau := range []float64{0.05, 0.2, 0.7} {
		within(t, "one cell", share(0, 1, tau), -math.Expm1(-2*tau), 3e-4)
	}
	// Two equal cells by hand: w' = A w with A = (-12, 4; 4, -4) for what is left in each, whose modes are
	// (4, l + 12) at l = -8 +- sqrt(32).
	left := 0.0
	for _, l := range []float64{-8 + math.Sqrt(32), -8 - math.Sqrt(32)} {
		a, b := 4.0, l+12
		left += (a + b) * (a + b) / (a*a + b*b) / 2 * math.Exp(l*0.2)
	}
	within(t, "two cells", share(0, 2, 0.2), 1-left, 3e-4)
	one, err := m.Subdivide(Axis{reach, 0}, 1, 1)
	must(t, err)
	within(t, "half time of one cell", one.TimeAt(0.5), reach*reach*math.Ln2/2, 3e-4)
	for spread, tau := range []float64{0.197, 0.063, 0.0305} { // about the half times
		before := math.Inf(1)
		for n := 2; n <= 32; n *= 2 {
			e := linear(spread, tau) - share(spread, n, tau)
			if !(e > 0 && e < before) {
				t.Errorf("spread %d: %g off on %d cells, %g on half as many", spread, e, n, before)
			}
			if n == 16 {
				within(t, "order", math.Log2(before/e), 2, 0.15)
			}
			before = e
		}
	}
}

// On more and more equal cells a block of the independent cases comes to its fine answer.
func TestEqualCellsNearTheFineAnswer(t *testing.T) {
	for _, c := range blockCases(t) {
		m, shape := c.matrix(t), c.shape(t)
		if len(shape) > 1 {
			continue
		}
		fine, err := m.Soak(shape)
		must(t, err)
		half := fine.TimeAt(0.5)
		before := math.Inf(1)
		for _, n := range []int{1, 4, 16, 64} {
			b, err := m.Subdivide(shape[0], n, half)
			must(t, err)
			e := math.Abs(b.TimeAt(0.5)/half - 1)
			if !(e < before) {
				t.Errorf("%g off on %d cells, %g on fewer", e, n, before)
			}
			before = e
		}
		if before > 0.01 {
			t.Errorf("%g off on 64 cells", before)
		}
	}
}
