package fv

import (
	"fmt"
	"math"

	"brinefront/physics/numeric"
)

// Points returns the law whose f is straight between points, s rising strictly and f never
// falling: a pseudo-function, or a table as simulators read it. Beyond the first and the last
// point f is level; the range of states is lo to hi.
func Points(s, f []float64, lo, hi float64) (*Law, error) {
	if len(s) < 2 || len(s) != len(f) || !(hi > lo) {
		return nil, fmt.Errorf("fv: a law of %d states and %d fluxes between %.6g and %.6g; allowed: as many of both, two at least", len(s), len(f), lo, hi)
	}
	for i := 1; i < len(s); i++ {
		if !(s[i] > s[i-1]) || !(f[i] >= f[i-1]) || bad(s[i]-s[0]) || bad(f[i]-f[0]) {
			return nil, fmt.Errorf("fv: point %d is (%.6g, %.6g) after (%.6g, %.6g); allowed: states that rise and fluxes that do not fall", i, s[i], f[i], s[i-1], f[i-1])
		}
	}
	line := numeric.NewLinear(s, f)
	l := &Law{lo: lo, hi: hi, fn: straight{line}, at: line.At, rising: true}
	l.fill = func(f, s []float64) {
		for i, x := range s {
			f[i], _ = line.At(x)
		}
	}
	l.slopes = append(l.slopes, point{s: math.Min(lo, s[0])})
	for _, c := range line.Cells() {
		_, v := c.Line(c.X0)
		l.slopes = append(l.slopes, point{c.X0, v}, point{c.X1, v})
	}
	l.slopes = append(l.slopes, point{s: math.Max(hi, s[len(s)-1])})
	return l, nil
}

type straight struct{ numeric.Linear }

func (f straight) Knots() []float64 { return f.Nodes() }
