package fracflow

import (
	"math"
	"sort"
)

// Sample is a function at one saturation, with its slopes just below and just
// above it; they differ only at a knot.
type Sample struct {
	S, F, Below, Above float64
}

func at(fn Function, s float64) Sample {
	f, d := fn.At(s)
	return Sample{s, f, d, d}
}

// atKnot asks for the slope below a knot one step of the last place below it.
func atKnot(fn Function, s float64) Sample {
	p := at(fn, s)
	_, p.Below = fn.At(math.Nextafter(s, math.Inf(-1)))
	return p
}

// spacing is the step of the grading of n points in ln(u/(1-u)), u the place inside a
// piece. Power laws of mobility make f a smooth function of that variable, however
// extreme the mobility ratio: its features are never much narrower than 1/exponent. Many
// points reach down to 1e-12 of a piece from either end; few, as the short pieces of a
// table get, stay closer together in its middle.
func spacing(n int) float64 { return 0.43 * (1 + math.Min(1, float64(n)/64)) }

// boxing is how often a cell that seems to hold an inflection is halved: afterwards
// the slope is monotone in every cell but for 1/4^boxing or so of its change.
const boxing = 24

// Samples returns the function at points between a and b (a first, b last, either
// may be the larger): at every knot, graded towards the ends of every smooth
// piece between knots, and added to until no step in f exceeds a small part of
// its range, every inflection is boxed in and pairs of them between two points are
// looked for. budget is the number of points
// wanted at the start; every piece gets at least one inside.
func Samples(fn Function, a, b float64, budget int) []Sample {
	lo, hi := math.Min(a, b), math.Max(a, b)
	knots := fn.Knots()
	knots = knots[sort.SearchFloat64s(knots, lo):sort.Search(len(knots), func(i int) bool { return knots[i] > hi })]
	inner := knots
	if len(inner) > 0 && inner[0] == lo {
		inner = inner[1:]
	}
	ends := inner
	if len(ends) > 0 && ends[len(ends)-1] == hi {
		ends = ends[:len(ends)-1]
	}
	pieces := len(ends) + 1
	inside := max(1, budget/pieces)
	step := spacing(inside)
	coarse := make([]Sample, 1, (inside+3)*pieces+1)
	coarse[0] = at(fn, lo)
	from := lo
	// Next to a knot the second derivative may have another sign than a little further
	// on. A guard on either side, as near as the rounding of f allows a slope to be told
	// from a chord, shows it.
	guard := 1e-6 * (hi - lo)
	for i := 0; i <= len(ends); i++ {
		to := hi
		if i < len(ends) {
			to = ends[i]
		}
		add := func(s float64) {
			if s > coarse[len(coarse)-1].S && s < to {
				coarse = append(coarse, at(fn, s))
			}
		}
		// Not where the grading itself goes nearer, which it does at lo and hi alone.
		nearest := (to - from) / (1 + math.Exp(float64(inside-1)/2*step))
		guarded := to-from > 8*guard
		if guarded && (from != lo || nearest > guard) {
			add(from + guard)
		}
		for j := 1; j <= inside; j++ {
			t := (float64(j) - float64(inside+1)/2) * step
			offset := (to - from) / (1 + math.Exp(math.Abs(t)))
			if t < 0 && (from == lo || offset > guard) {
				add(from + offset)
			}
			if t >= 0 && (to == hi || offset > guard) {
				add(to - offset)
			}
		}
		if guarded && (to != hi || nearest > guard) {
			add(to - guard)
		}
		if i < len(inner) {
			coarse = append(coarse, atKnot(fn, to))
		} else {
			coarse = append(coarse, at(fn, to))
		}
		from = to
	}
	low, high := math.Inf(1), math.Inf(-1)
	for _, p := range coarse {
		low, high = math.Min(low, p.F), math.Max(high, p.F)
	}
	g := grid{fn: fn, step: (high - low) / float64(max(4, min(32, budget/2))), thin: math.Max(1e-13*(hi-lo), 4*ulp*math.Max(math.Abs(lo), math.Abs(hi))), most: 4000 + 40*len(coarse), out: make([]Sample, 0, 2*len(coarse))}
	g.out = append(g.out, coarse[0])
	for i := 1; i < len(coarse); i++ {
		g.split(coarse[i-1], coarse[i], boxing)
		g.out = append(g.out, coarse[i])
	}
	g.dips()
	g.box()
	if a > b {
		for i, j := 0, len(g.out)-1; i < j; i, j = i+1, j-1 {
			g.out[i], g.out[j] = g.out[j], g.out[i]
		}
	}
	return g.out
}

type grid struct {
	fn         Function
	step, thin float64 // the largest rise of f in a cell; the narrowest cell worth cutting
	most       int     // samples, should rounding look like inflections without end
	out        []Sample
}

// split appends what is missing strictly between a and b, in order. box is how
// often a cell that holds an inflection may still be halved.
func (g *grid) split(a, b Sample, box int) {
	rise, width := b.F-a.F, b.S-a.S
	if width <= g.thin || len(g.out) >= g.most {
		return
	}
	steep := math.Abs(rise) > g.step
	if !steep {
		// The cubic with the slopes and the mean slope of the cell has an inflection when
		// the mean lies outside the middle third between the slopes. Rounding of f blurs
		// the mean.
		off := math.Abs(rise/width - (a.Above+b.Below)/2)
		blur := 8 * ulp * math.Max(math.Abs(a.F), math.Abs(b.F)) / width
		bent := off > math.Abs(b.Below-a.Above)/6+blur
		if !bent || box == 0 {
			return
		}
		box--
	}
	s := a.S + width/2
	m := at(g.fn, s)
	g.split(a, m, box)
	g.out = append(g.out, m)
	g.split(m, b, box)
}

// box closes in on inflections that lie beside a sample: where the slope turns from
// rising to falling, or back, between two cells, both are halved again and again.
func (g *grid) box() {
	var added []Sample
	n := g.out
	for i := 1; i+1 < len(n); i++ {
		a, m, b := n[i-1], n[i], n[i+1]
		for range boxing {
			if !turns(a, m, b) || b.S-a.S <= g.thin {
				break
			}
			left, right := at(g.fn, a.S+(m.S-a.S)/2), at(g.fn, m.S+(b.S-m.S)/2)
			added = append(added, left, right)
			switch {
			case turns(a, left, m):
				b, m = m, left
			case turns(m, right, b):
				a, m = m, right
			default:
				a, b = left, right
			}
		}
	}
	if len(added) > 0 {
		g.merge(added)
	}
}

// turns tells whether the slope has an extremum near the middle one of three samples,
// which is not a kink.
func turns(a, m, b Sample) bool {
	falls := func(from, to float64) bool { return rises(to, from, alike) }
	if rises(m.Below, m.Above, kink) || rises(m.Above, m.Below, kink) {
		return false
	}
	return rises(a.Above, m.Below, alike) && falls(m.Above, b.Below) ||
		falls(a.Above, m.Below) && rises(m.Above, b.Below, alike)
}

// dips looks for two inflections between neighbouring samples: where the second derivative
// comes near zero and turns back, cells are halved until it is seen to cross zero, for
// box to close in on, or to stay clear of it.
func (g *grid) dips() {
	var added []Sample
	n := g.out
	for i := 3; i < len(n); i++ {
		row := [4]Sample(n[i-3 : i+1])
		for range boxing / 3 {
			if !nearlyLevel(row) || row[3].S-row[0].S <= 8*g.thin {
				break
			}
			var halved [7]Sample
			for k := range 3 {
				a, b := row[k], row[k+1]
				halved[2*k], halved[2*k+1], halved[2*k+2] = a, at(g.fn, a.S+(b.S-a.S)/2), b
				added = append(added, halved[2*k+1])
			}
			best := 1
			for k := 2; k <= 4; k++ {
				if math.Abs(bend(halved[k], halved[k+1])) < math.Abs(bend(halved[best], halved[best+1])) {
					best = k
				}
			}
			row = [4]Sample(halved[best-1 : best+3])
		}
	}
	if len(added) > 0 {
		g.merge(added)
	}
}

func (g *grid) merge(added []Sample) {
	g.out = append(g.out, added...)
	sort.Slice(g.out, func(i, j int) bool { return g.out[i].S < g.out[j].S })
}

// bend is the mean second derivative between two samples.
func bend(a, b Sample) float64 { return (b.Below - a.Above) / (b.S - a.S) }

// nearlyLevel tells whether the second derivative has one sign and a least size in the
// middle one of three cells, where that of the quartic with the slopes at their four ends
// comes below a tenth of the lesser of the means in the outer two.
func nearlyLevel(n [4]Sample) bool {
	for _, inner := range n[1:3] {
		if inner.Below != inner.Above {
			return false // a knot: the second derivative jumps
		}
	}
	d0, d1, d2 := bend(n[0], n[1]), bend(n[1], n[2]), bend(n[2], n[3])
	if d1 < 0 {
		d0, d1, d2 = -d0, -d1, -d2
	}
	if !(d1 < d0 && d1 < d2) || math.Abs(n[2].Below-n[1].Above) <= alike*math.Abs(n[1].Above) {
		return false
	}
	// Divided differences of the slope; the second derivative is least at x.
	e0, e1 := (d1-d0)/(n[2].S-n[0].S), (d2-d1)/(n[3].S-n[1].S)
	c := (e1 - e0) / (n[3].S - n[0].S)
	w0, w2 := n[1].S-n[0].S, n[2].S-n[1].S
	x := (w2 - w0 - e0/c) / 3 // from the second sample
	least := d0 + e0*(2*x+w0) + c*(x*(x+w0)+(x-w2)*(2*x+w0))
	return least < 0.1*math.Min(d0, d2)
}
