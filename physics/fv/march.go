package fv

import "math"

// gridded is the size of a grid, a power of two: an index that is cut to it needs no check.
const gridded = 16384

// grid is a table of which every piece is cut finer, each with t from -1/2 to 1/2. One of constant f at
// either end, the lower at -1 around the corner, serves the end itself, exactly, and states that
// rounding has put a digit beyond.
type grid struct {
	middle, scale float64 // of the first piece; pieces to the unit of s
	pieces        [gridded]cubic
}

// newGrid returns nil where there are too many pieces.
func newGrid(t *table) *grid {
	n := len(t.pieces) * finer
	if n > gridded-2 {
		return nil
	}
	g := &grid{scale: t.scale * finer}
	g.middle = math.Nextafter(t.lo+0.5/g.scale, math.Inf(1)) // so that lo itself is below the first piece
	for k := range t.pieces {
		p := &t.pieces[k]
		for i := range finer {
			fine := &g.pieces[k*finer+i]
			if *fine = p.about((float64(i)+0.5)/finer, 1.0/finer); p.cut != nil {
				*fine = p.cut.pieces[i].about(0.5, 1)
			}
		}
	}
	g.pieces[gridded-1].c0, g.pieces[n].c0 = t.flux(t.lo), t.flux(t.lo+float64(n)/g.scale)
	return g
}

// about is the same cubic with its t counted from t in units of h.
func (c *cubic) about(t, h float64) cubic {
	return cubic{c.at(t), h * (c.c1 + t*(2*c.c2+t*3*c.c3)), h * h * (c.c2 + 3*t*c.c3), h * h * h * c.c3}
}

// flux is f at u, counted in pieces from the middle of the first; not a number where the cubic will not
// do. Added to a number whose last digit is worth 1, u becomes that of the nearest piece
// without a conversion, which costs much in WebAssembly.
func (g *grid) flux(u float64) float64 {
	const ones = 3 << 51
	k := u + ones
	return g.pieces[math.Float64bits(k)%gridded].at(u - (k - ones))
}

// march takes one explicit step of first order, S_i -= ratio (f(S_i) - f(S_(i-1))), where f rises, in
// one pass and in place. in is what enters the first cell; it returns what leaves the last. Each flux
// leaves one cell and enters the next as the same number, so that nothing is lost. It takes
// four cells at a time: WebAssembly pays for every turn of a loop.
func (t *table) march(cells []float64, ratio, in float64) (out float64) {
	g := t.grid()
	from, scale := g.middle, g.scale
	for ; len(cells) >= 4; cells = cells[4:] {
		s := (*[4]float64)(cells)
		a, b, c, d := g.flux((s[0]-from)*scale), g.flux((s[1]-from)*scale), g.flux((s[2]-from)*scale), g.flux((s[3]-from)*scale)
		if all := a + b + c + d; all != all {
			a, b, c, d = t.flux(s[0]), t.flux(s[1]), t.flux(s[2]), t.flux(s[3])
		}
		s[0] -= ratio * (a - in)
		s[1] -= ratio * (b - a)
		s[2] -= ratio * (c - b)
		s[3] -= ratio * (d - c)
		in = d
	}
	for i, x := range cells {
		f := t.flux(x)
		cells[i] = x - ratio*(f-in)
		in = f
	}
	return in
}
