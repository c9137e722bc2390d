package fv

import (
	"fmt"
	"math"
)

// tableError is how far, in parts of the reach of f, a tabulated law may be off.
const tableError = 1e-13

// Tabulated returns the law with f read from n equal pieces, a Hermite cubic in each,
// which is many times faster than powers and logarithms. A piece in which the cubic misses
// f by more than 1e-13 of its reach at any of seven places (a knot, or a power law at its
// end) asks f itself; exact is the share of pieces that do. n must be from 1 to 1e6;
// 4096 suits smooth curves.
func (l *Law) Tabulated(n int) (law *Law, exact float64, err error) {
	if n < 1 || n > 1e6 {
		return nil, 0, fmt.Errorf("fv: a table of %d pieces; allowed: 1 to 1000000", n)
	}
	width := (l.hi - l.lo) / float64(n)
	place := func(k int, t float64) float64 { return math.Min(l.hi, l.lo+(float64(k)+t)*width) }
	type piece struct{ c0, c1, c2, c3 float64 }
	pieces := make([]piece, n)
	low, high := math.Inf(1), math.Inf(-1)
	for k := range pieces {
		f0, v0 := l.fn.At(place(k, 0))
		f1, _ := l.fn.At(place(k, 1))
		_, v1 := l.fn.At(math.Nextafter(place(k, 1), l.lo))
		v0, v1 = v0*width, v1*width
		pieces[k] = piece{f0, v0, 3*(f1-f0) - 2*v0 - v1, 2*(f0-f1) + v0 + v1}
		low, high = math.Min(low, math.Min(f0, f1)), math.Max(high, math.Max(f0, f1))
	}
	asked := 0
	for k := range pieces {
		c := pieces[k]
		for i := 1; i < 8; i++ {
			t := float64(i) / 8
			f, _ := l.fn.At(place(k, t))
			if !(math.Abs(c.c0+t*(c.c1+t*(c.c2+t*c.c3))-f) <= tableError*(high-low)) {
				pieces[k].c0 = math.NaN() // the mark of a piece that asks f itself
				asked++
				break
			}
		}
	}
	copied := *l
	scale, lo, fn := 1/width, l.lo, l.fn
	copied.fill = func(f, s []float64) {
		f = f[:len(s)]
		for i, x := range s {
			t := (x - lo) * scale
			k := min(max(int(t), 0), len(pieces)-1)
			t -= float64(k)
			c := &pieces[k]
			y := c.c0 + t*(c.c1+t*(c.c2+t*c.c3))
			if y != y {
				y, _ = fn.At(x)
			}
			f[i] = y
		}
	}
	return &copied, float64(asked) / float64(n), nil
}
