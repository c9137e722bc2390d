package ride

import (
	"fmt"
	"math"
	"sort"

	"brinefront/physics/fracflow"
	"brinefront/physics/numeric"
)

// spot is a state of one curve with the speed of the line from the pivot to it.
type spot struct{ s, f, speed float64 }

// rays is a curve seen from a pivot: samples between which the speed of the line is
// monotone, the places where it is extreme among them.
type rays struct {
	fn    fracflow.Function
	pivot Pivot
	spots []spot
}

// spotBudget is the number of samples asked of a smooth curve; it is added to where the
// curve is steep or bends.
const spotBudget = 64

func newRays(fn fracflow.Function, pivot Pivot) (rays, error) {
	r := rays{fn: fn, pivot: pivot}
	lo, hi := fn.Ends()
	samples := fracflow.Samples(fn, lo, hi, spotBudget)
	r.spots = make([]spot, 0, len(samples)+4)
	for i, p := range samples {
		if bad(p.F) || bad(p.Above) || bad(p.Below) {
			return r, fmt.Errorf("ride: fractional flow is not finite at saturation %.6g; both phases stand still there or a slope is infinite", p.S)
		}
		if i > 0 {
			before := samples[i-1]
			a, b := r.opens(before.S, before.F, before.Above), r.opens(p.S, p.F, p.Below)
			if a > 0 && b < 0 || a < 0 && b > 0 {
				s := numeric.Zero(func(s float64) float64 {
					f, d := fn.At(s)
					return r.opens(s, f, d)
				}, before.S, p.S, a, b)
				if s > before.S && s < p.S {
					r.spots = append(r.spots, r.at(s))
				}
			}
		}
		r.spots = append(r.spots, spot{p.S, p.F, pivot.speed(p.S, p.F, p.Above)})
	}
	return r, nil
}

func bad(x float64) bool { return math.IsNaN(x) || math.IsInf(x, 0) }

// opens has the sign of the slope of speed against saturation.
func (r rays) opens(s, f, slope float64) float64 {
	return slope*(s+r.pivot.B) - (f + r.pivot.A)
}

func (r rays) at(s float64) spot {
	f, d := r.fn.At(s)
	return spot{s, f, r.pivot.speed(s, f, d)}
}

// steepest is the spot of the fastest line between two saturations; of equals the one
// nearest to start.
func (r rays) steepest(start, end float64) spot {
	best := r.at(start)
	lo, hi := math.Min(start, end), math.Max(start, end)
	from := sort.Search(len(r.spots), func(i int) bool { return r.spots[i].s >= lo })
	to := sort.Search(len(r.spots), func(i int) bool { return r.spots[i].s > hi })
	for i := range r.spots[from:to] {
		p := r.spots[from+i]
		if end < start {
			p = r.spots[to-1-i]
		}
		if p.speed > best.speed {
			best = p
		}
	}
	return best
}

// meet is the first spot of speed v on the way from start: upwards or downwards. When
// rounding hides it beyond the last spot, that one is returned.
func (r rays) meet(start, v float64, upwards bool) spot {
	last := r.at(start)
	off := func(p spot) float64 { return p.f + r.pivot.A - v*(p.s+r.pivot.B) }
	step, i, end := 1, sort.Search(len(r.spots), func(i int) bool { return r.spots[i].s > start }), len(r.spots)
	if !upwards {
		step, i, end = -1, sort.Search(len(r.spots), func(i int) bool { return r.spots[i].s >= start })-1, -1
	}
	before := off(last)
	if math.Abs(last.speed-v) <= alike*v {
		return last
	}
	for ; i != end; i += step {
		next := r.spots[i]
		if math.Abs(next.speed-v) <= alike*v { // perhaps a tangent, which touches and does not cross
			return next
		}
		if after := off(next); (after > 0) != (before > 0) {
			return r.at(numeric.Zero(func(s float64) float64 { return off(r.at(s)) }, last.s, next.s, before, after))
		}
		last = next
	}
	return last
}

// feeds is the fastest line that a curve allows a front with its state on the inlet side.
func (r rays) feeds(injected float64) spot { return r.steepest(injected, r.spots[0].s) }

// takes is the same with its state on the outlet side.
func (r rays) takes(initial float64) spot { return r.steepest(initial, r.spots[len(r.spots)-1].s) }

// behind is the state on the inlet side of a front of speed v, for the injected state:
// its waves are slower than the front.
func (r rays) behind(injected, v float64) spot {
	if top := r.feeds(injected); top.speed-v <= alike*v {
		return top
	}
	return r.meet(injected, v, r.at(injected).speed > v)
}

// ahead is the state on the outlet side of a front of speed v, for the initial state:
// its waves are faster than the front.
func (r rays) ahead(initial, v float64) spot {
	if top := r.takes(initial); top.speed-v <= alike*v {
		return top
	}
	return r.meet(initial, v, r.at(initial).speed < v)
}

// alike is the relative difference below which two speeds are one: rounding of f.
const alike = 1e-12
