package fv

import (
	"fmt"
	"math"
	"sync"
)

const (
	tableError = 1e-13 // how far a tabulated law may be off, in parts of the reach of f
	finer      = 8     // pieces that a piece is cut into where that is not met
	deepest    = 8     // how often over
	mostCuts   = 8     // pieces that may be cut for each of the first ones
)

// Tabulated returns the law with f read from n equal pieces, a Hermite cubic in each,
// which is many times faster than powers and logarithms. A piece in which the cubic misses
// f by more than 1e-13 of its reach at any of seven places (a power law at its end, or a
// knot) is cut into 8, up to eight times over; what is still amiss then asks f itself, and so
// does what there are too many of: an f that hardly changes is nothing but its own rounding.
// n must be from 1 to 1e6; 1024 suits smooth curves. First-order runs of an f that never falls are
// fastest, in one pass a step, with 2047 pieces at most.
func (l *Law) Tabulated(n int) (*Law, error) {
	if n < 1 || n > 1e6 {
		return nil, fmt.Errorf("fv: a table of %d pieces; allowed: 1 to 1000000", n)
	}
	low, high := math.Inf(1), math.Inf(-1)
	for i := range n + 1 {
		f, _ := l.fn.At(l.lo + (l.hi-l.lo)*(float64(i)/float64(n)))
		low, high = math.Min(low, f), math.Max(high, f)
	}
	copied := *l
	allowed := math.Max(tableError*(high-low), 0x1p-51*math.Max(math.Abs(low), math.Abs(high)))
	cuts := mostCuts * n
	t := newTable(l.fn, l.lo, l.hi, allowed, n, 0, &cuts)
	t.grid = sync.OnceValue(func() *grid { return newGrid(t) })
	copied.fill, copied.at, copied.table = t.fill, t.value, t
	return &copied, nil
}

type table struct {
	fn        Function
	lo, scale float64
	pieces    []piece
	grid      func() *grid // for marching; nil in the pieces of a piece
}

// piece is c0 + c1 t + c2 t² + c3 t³, t from 0 to 1, unless it is cut finer or, with c0
// not a number, has to ask f.
type piece struct {
	cubic
	cut *table
}

type cubic struct{ c0, c1, c2, c3 float64 }

func newTable(fn Function, lo, hi, allowed float64, n, depth int, cuts *int) *table {
	t := &table{fn: fn, lo: lo, scale: float64(n) / (hi - lo), pieces: make([]piece, n)}
	place := func(k int, u float64) float64 { return math.Min(hi, lo+(hi-lo)*((float64(k)+u)/float64(n))) }
	for k := range t.pieces {
		a, b := place(k, 0), place(k, 1)
		if !(b > a) { // too narrow for the digits of s
			t.pieces[k].c0 = math.NaN()
			continue
		}
		f0, v0 := fn.At(a)
		f1, _ := fn.At(b)
		_, v1 := fn.At(math.Nextafter(b, a)) // of this piece, should there be a knot
		v0, v1 = v0*(b-a), v1*(b-a)
		p := piece{cubic: cubic{f0, v0, 3*(f1-f0) - 2*v0 - v1, 2*(f0-f1) + v0 + v1}}
		for i := 1; i < 8; i++ {
			u := float64(i) / 8
			if f, _ := fn.At(place(k, u)); !(math.Abs(p.at(u)-f) <= allowed) {
				if p.c0 = math.NaN(); depth < deepest && *cuts > 0 {
					*cuts--
					p.cut = newTable(fn, a, b, allowed, finer, depth+1, cuts)
				}
				break
			}
		}
		t.pieces[k] = p
	}
	return t
}

func (c *cubic) at(t float64) float64 { return c.c0 + t*(c.c1+t*(c.c2+t*c.c3)) }

// value is f and its slope at x: in the finest piece that holds, else by asking f itself.
func (t *table) value(x float64) (f, dfds float64) {
	u := (x - t.lo) * t.scale
	k := min(max(int(u), 0), len(t.pieces)-1)
	p := &t.pieces[k]
	switch v := u - float64(k); {
	case p.c0 == p.c0:
		return p.at(v), (p.c1 + v*(2*p.c2+v*3*p.c3)) * t.scale
	case p.cut != nil:
		return p.cut.value(x)
	}
	return t.fn.At(x)
}

func (t *table) fill(f, s []float64) {
	f = f[:len(s)]
	for i, x := range s {
		f[i] = t.flux(x)
	}
}

// flux is f at x: value without the slope.
func (t *table) flux(x float64) float64 {
	for {
		u := (x - t.lo) * t.scale
		k := min(max(int(u), 0), len(t.pieces)-1)
		p := &t.pieces[k]
		if y := p.at(u - float64(k)); y == y {
			return y
		}
		if p.cut == nil {
			y, _ := t.fn.At(x)
			return y
		}
		t = p.cut
	}
}
