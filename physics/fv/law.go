package fv

import (
	"fmt"
	"math"
	"sort"

	"brinefront/physics/numeric"
)

// Function is a flux function. The fractional flows of fracflow are such functions.
type Function interface {
	// At returns f and df/ds; at a knot df/ds is one-sided from the right.
	At(s float64) (f, dfds float64)
	// Knots returns, in rising order, the states at which the slope or the second
	// derivative jumps; nil for a smooth function.
	Knots() []float64
}

// Law is the conservation law dS/dQ + df/dx = 0 made ready for stepping: the flux
// function on a range of states, with its interior extrema and its fastest slopes.
// It may serve many runs at once.
type Law struct {
	lo, hi  float64
	fill    func(f, s []float64)              // f at each s
	at      func(s float64) (f, dfds float64) // as fn, perhaps from a table
	fn      Function
	table   *table // of f; nil: f itself is asked
	extrema []point
	slopes  []point   // |df/ds| at samples, the peaks between them included
	bends   []float64 // where |df/ds| peaks: inflections, most of them, and corners
	rising  bool      // f never falls: every face takes its value from the left

	phases   Phases  // faces take each phase from where it comes; nil: Godunov's flux
	gravity  float64 // of phases
	swiftest float64 // exchange of phases
	chained  int     // the number of cells that have laws of their own; 0: all have this one
}

type point struct{ s, y float64 }

// NewLaw examines fn between a and b, in either order. It is sampled in every piece
// between knots, closer towards the ends of each, so that extrema of f and of its slope
// are found, to the last digits, unless two lie between neighbouring samples.
//
// a and b must be finite and differ, and fn and its slope must be finite between them;
// otherwise the error says where not.
func NewLaw(fn Function, a, b float64) (*Law, error) {
	lo, hi := math.Min(a, b), math.Max(a, b)
	if !(hi-lo > 0) || math.IsInf(hi-lo, 0) {
		return nil, fmt.Errorf("fv: a law between the states %.6g and %.6g; allowed: two different finite states", a, b)
	}
	law := &Law{lo: lo, hi: hi, at: fn.At, fn: fn, rising: true}
	law.fill = func(f, s []float64) {
		for i, x := range s {
			f[i], _ = fn.At(x)
		}
	}
	cuts := []float64{lo}
	for _, k := range fn.Knots() {
		if k > lo && k < hi {
			cuts = append(cuts, k)
		}
	}
	cuts = append(cuts, hi)
	inside := max(8, 400/(len(cuts)-1))
	heading := 0.0 // the last slope that was not zero
	for i := 1; i < len(cuts); i++ {
		var err error
		if heading, err = law.examine(cuts[i-1], cuts[i], heading, inside); err != nil {
			return nil, err
		}
	}
	sort.Slice(law.slopes, func(i, j int) bool { return law.slopes[i].s < law.slopes[j].s })
	return law, nil
}

// examine adds what is found in one smooth piece. heading is the last slope below it that
// was not zero; it returns that at its upper end.
func (l *Law) examine(from, to, heading float64, inside int) (float64, error) {
	s := crowded(from, to, inside)
	n := len(s)
	v := make([]float64, n)
	for i, x := range s {
		f, slope := l.fn.At(x)
		if v[i] = slope; i == n-1 {
			v[i] = l.slope(math.Nextafter(to, from)) // of this piece, not of the next
		}
		if bad(f) || bad(v[i]) {
			return 0, fmt.Errorf("fv: the flux or its slope is not finite at state %.6g; both phases stand still there or a slope is infinite", x)
		}
		l.slopes = append(l.slopes, point{x, math.Abs(v[i])})
	}
	for i := range s {
		l.rising = l.rising && v[i] >= 0
		if heading*v[i] < 0 {
			switch {
			case i == 0: // a corner
				l.turn(from)
			case v[i-1] == 0: // the end of a level stretch
				l.turn(s[i-1])
			default:
				l.turn(numeric.Zero(l.slope, s[i-1], s[i], v[i-1], v[i]))
			}
		}
		if v[i] != 0 {
			heading = v[i]
		}
		if i > 0 && i < n-1 && math.Abs(v[i]) >= math.Abs(v[i-1]) && math.Abs(v[i]) >= math.Abs(v[i+1]) {
			top := l.peak(s[i-1], s[i+1])
			l.slopes, l.bends = append(l.slopes, top), append(l.bends, top.s)
		}
	}
	return heading, nil
}

func bad(x float64) bool { return math.IsNaN(x) || math.IsInf(x, 0) }

func (l *Law) slope(s float64) float64 { _, v := l.fn.At(s); return v }

func (l *Law) turn(s float64) {
	f, _ := l.fn.At(s)
	l.extrema = append(l.extrema, point{s, f})
}

// peak is the largest |df/ds| between a and b, by golden section: the slope there is
// good to its last digits when the place is good to half of them.
func (l *Law) peak(a, b float64) point {
	const golden = 0.6180339887498949
	height := func(s float64) float64 { return math.Abs(l.slope(s)) }
	c, d := b-golden*(b-a), a+golden*(b-a)
	hc, hd := height(c), height(d)
	for range 45 {
		if hc > hd {
			b, d, hd = d, c, hc
			c = b - golden*(b-a)
			hc = height(c)
		} else {
			a, c, hc = c, d, hd
			d = a + golden*(b-a)
			hd = height(d)
		}
	}
	if hc > hd {
		return point{c, hc}
	}
	return point{d, hd}
}

// Ends returns the range of states of the law.
func (l *Law) Ends() (lo, hi float64) { return l.lo, l.hi }

// Fastest is the largest |df/ds| between two states of the range, or at the samples
// next to them outside.
func (l *Law) Fastest(a, b float64) float64 {
	lo, hi := math.Min(a, b), math.Max(a, b)
	from := sort.Search(len(l.slopes), func(i int) bool { return l.slopes[i].s > lo })
	most := l.swiftest
	for i := max(0, from-1); i < len(l.slopes); i++ {
		most = math.Max(most, l.slopes[i].y)
		if l.slopes[i].s >= hi {
			break
		}
	}
	return most
}

// godunov is the flux through a face between the states a on the left and b on the
// right: the least f between them when a <= b, else the largest. For f that rises it
// is f(a), for f that falls f(b): single-point upstream.
//
// Sources: Godunov (1959); Osher (1984).
func (l *Law) godunov(a, b, fa, fb float64) float64 {
	if a <= b {
		f := math.Min(fa, fb)
		for _, e := range l.extrema {
			if e.s > a && e.s < b && e.y < f {
				f = e.y
			}
		}
		return f
	}
	f := math.Max(fa, fb)
	for _, e := range l.extrema {
		if e.s > b && e.s < a && e.y > f {
			f = e.y
		}
	}
	return f
}
