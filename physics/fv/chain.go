package fv

import (
	"fmt"
	"math"
)

// Chain returns a law for cells that each have a law of their own, as with pseudo-functions: what
// leaves a cell follows from its state by its own f, none of which may fall. inlet is the law of
// what is injected. It serves runs of first order with that number of cells and no others.
func Chain(inlet *Law, cells []*Law) (*Law, error) {
	all := append([]*Law{inlet}, cells...)
	c := &Law{lo: inlet.lo, hi: inlet.hi, rising: true, chained: len(cells)}
	for i, l := range all {
		if !l.rising || l.lo != c.lo || l.hi != c.hi {
			return nil, fmt.Errorf("fv: the law of cell %d falls somewhere or has another range; allowed: laws that never fall, of one range (cell 0 is the inlet)", i)
		}
		c.slopes = append(c.slopes, point{s: c.lo, y: l.Fastest(l.lo, l.hi)})
	}
	most := 0.0
	for _, p := range c.slopes {
		most = math.Max(most, p.y)
	}
	c.slopes = []point{{c.lo, most}, {c.hi, most}}
	c.fill = func(f, s []float64) {
		for i, l := range all {
			l.fill(f[i:i+1], s[i:i+1])
		}
	}
	return c, nil
}
