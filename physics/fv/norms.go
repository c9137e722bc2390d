package fv

import "math"

// Norms measures how far cells are from the exact cell averages:
// l1 = mean |e|, l2 = sqrt(mean e²), linf = max |e|. Both hold the same number of values.
func Norms(cells, exact []float64) (l1, l2, linf float64) {
	if len(cells) != len(exact) {
		panic(badLength)
	}
	for i, c := range cells {
		e := math.Abs(c - exact[i])
		l1, l2, linf = l1+e, l2+e*e, math.Max(linf, e)
	}
	n := float64(len(cells))
	return l1 / n, math.Sqrt(l2 / n), linf
}

// FrontWidth is the distance over which a front is smeared: from where the state is 90% to
// where it is 10% of the way from ahead to behind, on straight lines between cell centres,
// each the crossing nearest the outlet. ok is false when a level is not crossed.
func FrontWidth(cells []float64, behind, ahead float64) (width float64, ok bool) {
	x10, ok10 := crossing(cells, ahead+0.1*(behind-ahead))
	x90, ok90 := crossing(cells, ahead+0.9*(behind-ahead))
	return x10 - x90, ok10 && ok90
}

func crossing(cells []float64, level float64) (x float64, ok bool) {
	n := float64(len(cells))
	for i := len(cells) - 1; i > 0; i-- {
		a, b := cells[i-1], cells[i]
		if a != b && math.Min(a, b) <= level && level <= math.Max(a, b) {
			return (float64(i) - 0.5 + (level-a)/(b-a)) / n, true
		}
	}
	return 0, false
}

const badLength = "fv: cells and exact averages differ in number"
