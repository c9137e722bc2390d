package fracflow

import (
	"fmt"
	"math"
)

// How a displacement is solved.
//
// The states between the injected and the initial saturation obey a conservation
// law, ds/dQ + df/dx = 0, whose only physical solution (Oleinik 1957) is read off
// the envelope of f between the two: the upper concave envelope when saturation
// falls from the inlet outwards, the lower convex one when it rises. Where the
// envelope lies on f a fan runs, every state at its own speed df/ds; where it
// bridges f a shock runs at the slope of the bridge. Welge's (1952) tangent is the
// case of one bridge that starts at the initial state.
//
// Here saturation and f are both mirrored in the second case, so that there is one
// envelope to find. It is found in three steps.
//
//  1. Sampling (sample.go). Between knots f is smooth. It is sampled on a grid that is
//     graded geometrically towards both ends of every smooth piece, and cells are
//     halved where f climbs by more than a small part of its range, where the mean
//     slope betrays an inflection, or where the second derivative comes so near to zero
//     that two inflections may lie between neighbours.
//  2. The discrete envelope of the samples (hull.go). It is linear in their number, so
//     a table of ten thousand rows stays cheap. Near an end f may round to 1 over a
//     whole range while its slope still falls smoothly; there the slopes decide, so
//     that rounding makes no chords.
//  3. Refinement (hull.go). Each end of each bridge is moved to where the bridge is
//     tangent to the true f. An end stays at a knot whose two slopes straddle that of
//     the bridge, or at an end state; otherwise the tangent is bracketed by samples and
//     found to the last digits. With two free ends the slope of the bridge is stationary
//     in each, so taking turns converges quadratically.
//
// What lies between bridges are fans. A fan is cut where the slope of f drops at a knot:
// the wave behind then ends slower than the next begins, which is a constant state. A
// straight-line table thus gives many small shocks where f is convex and constant states
// where it is concave; that is its exact solution, not an artefact.

// Solve returns the waves of the displacement of the initial state by the injected
// one, from the inlet outwards, so that speeds rise. It is empty when the two states
// are the same. Speeds may be negative (counter-current flow): such waves never enter
// from an inlet at x = 0.
//
// Both saturations must lie in the range of fn, to within rounding, where fn must be
// finite; otherwise the error says what was given and what is allowed.
//
// Speeds within a fan rise and shocks lie above f to 1e-10 of the fastest speed and 1e-13
// of the reach of f. Where f is within 1e-6 of 1 its rounding may leave waves narrower
// than 1e-6 of saturation out by a few times that: one in 280,000 random flows, by 2e-10.
//
// Sources: Buckley & Leverett (1942); Welge (1952); Oleinik (1957).
func Solve(fn Function, injected, initial float64) ([]Wave, error) {
	injected, err := within(fn, "injected", injected)
	if err != nil {
		return nil, err
	}
	if initial, err = within(fn, "initial", initial); err != nil {
		return nil, err
	}
	if injected == initial {
		return nil, nil
	}
	h := newHull(fn, injected, initial)
	for _, n := range h.nodes {
		if bad(n.g) || bad(n.left) || bad(n.right) {
			return nil, fmt.Errorf("fracflow: fractional flow is not finite at saturation %.6g; both phases stand still there or a slope is infinite", h.sign*n.y)
		}
	}
	return h.waves(), nil
}

func bad(x float64) bool { return math.IsNaN(x) || math.IsInf(x, 0) }

// within checks a state against the range of fn and clears it of rounding.
func within(fn Function, name string, s float64) (float64, error) {
	lo, hi := fn.Ends()
	const slack = 1e-12
	if !(s >= lo-slack && s <= hi+slack) {
		return s, fmt.Errorf("fracflow: %s saturation is %.6g; it must lie between %.6g and %.6g", name, s, lo, hi)
	}
	return math.Max(lo, math.Min(hi, s)), nil
}

// waves reads the waves off the envelope, from the inlet (the largest y) outwards.
func (h *hull) waves() []Wave {
	vertices, chords := h.envelope()
	var out path
	top := touch{node: h.nodes[len(h.nodes)-1]}
	speed := top.left
	v := len(vertices) - 1
	// fan adds the arc from top down to bottom, cut at concave knots.
	fan := func(bottom touch, end float64) {
		for ; v >= 0 && h.nodes[vertices[v]].y > bottom.y; v-- {
			if n := h.nodes[vertices[v]]; n.y < top.y && rises(n.right, n.left, kink) {
				out.add(Fan, top.node, n, speed, n.right)
				top, speed = touch{node: n}, n.left
			}
		}
		out.add(Fan, top.node, bottom.node, speed, end)
	}
	for i := len(chords) - 1; i >= 0; i-- {
		c := chords[i]
		m := c.slope()
		// Beside a bridge the fan is never on the wrong side of its speed, and at a true
		// tangent it has just that speed.
		end, next := math.Min(c.right.right, m), math.Max(c.left.left, m)
		if c.right.inside {
			end = m
		}
		if c.left.inside {
			next = m
		}
		fan(c.right, end)
		out.add(Shock, c.right.node, c.left.node, m, m)
		top, speed = c.left, next
	}
	bottom := touch{node: h.nodes[0]}
	fan(bottom, bottom.right)
	for i := range out.waves {
		w := &out.waves[i]
		w.Behind, w.Ahead = h.sign*w.Behind+0, h.sign*w.Ahead+0
	}
	return out.waves
}
