package fracflow

import (
	"math"
	"sort"

	"brinefront/physics/numeric"
)

const (
	ulp   = 0x1p-52
	alike = 1e-12 // relative difference below which two slopes are one: rounding of f'
	kink  = 1e-9  // relative drop of slope that cuts a fan: above what rounding makes of a smooth knot
)

// node is a sample of the turned function, y = sign s and g = sign f.
type node struct {
	y, g        float64
	left, right float64 // slopes on either side
}

// hull is the upper concave envelope of g on the nodes, in rising y.
type hull struct {
	fn    Function
	sign  float64
	nodes []node
}

func newHull(fn Function, injected, initial float64) hull {
	h := hull{fn: fn, sign: 1}
	if injected < initial {
		h.sign = -1
	}
	// Ten points in each piece of a short table, fewer in each of a long one.
	pieces := len(fn.Knots()) + 1
	samples := Samples(fn, initial, injected, max(64, min(10*pieces, 2000)))
	h.nodes = make([]node, len(samples))
	for i, p := range samples {
		n := node{h.sign * p.S, h.sign * p.F, p.Below, p.Above}
		if h.sign < 0 {
			n.left, n.right = n.right, n.left
		}
		h.nodes[i] = n
	}
	return h
}

func (h *hull) at(y float64) node {
	f, d := h.fn.At(h.sign * y)
	return node{y, h.sign * f, d, d}
}

// concave tells whether the slope falls, or stays, across the cell from node i to the next.
func (h *hull) concave(i int) bool {
	return !rises(h.nodes[i].right, h.nodes[i+1].left, 1e-13)
}

func rises(from, to, tolerance float64) bool {
	return to-from > tolerance*math.Max(math.Abs(from), math.Abs(to))
}

// vertices is the discrete envelope (Andrew's monotone chain). A vertex inside a
// concave arc is kept on the word of the slopes, which are good to their last
// digits where f itself has rounded to 1.
func (h *hull) vertices() []int {
	n := h.nodes
	kept := make([]int, 0, len(n))
	for c := range n {
		for len(kept) >= 2 {
			a, b := kept[len(kept)-2], kept[len(kept)-1]
			arc := b-a == 1 && c-b == 1 && h.concave(a) && h.concave(b) && !rises(n[b].left, n[b].right, alike)
			if arc || h.rise(a, b) > h.rise(b, c) {
				break
			}
			kept = kept[:len(kept)-1]
		}
		kept = append(kept, c)
	}
	return kept
}

// rise is the mean slope of g between two nodes; across a cell so narrow that rounding of
// g blurs it more than the slope changes, it is that of the two end slopes.
func (h *hull) rise(i, j int) float64 {
	a, b := h.nodes[i], h.nodes[j]
	blur := 4 * ulp * math.Max(math.Abs(a.g), math.Abs(b.g))
	if j == i+1 && blur > math.Abs(b.left-a.right)*(b.y-a.y) {
		return (a.right + b.left) / 2
	}
	return slope(a, b)
}

// touch is one end of a chord: the place, and the node it is at or beside.
type touch struct {
	node
	k      int
	inside bool // between nodes, at a true tangent
}

type chord struct {
	left, right touch
}

func (c chord) slope() float64 { return slope(c.left.node, c.right.node) }

func slope(a, b node) float64 { return (b.g - a.g) / (b.y - a.y) }

// envelope finds the vertices and the straight pieces. An arc that rises above a piece
// only between two samples is given a sample at its summit, and all is done again.
func (h *hull) envelope() ([]int, []chord) {
	for pass := 0; ; pass++ {
		vertices := h.vertices()
		chords := h.chords(vertices)
		summits := h.summits(chords)
		if len(summits) == 0 || pass == 50 { // each pass lifts the envelope; a handful is the rule
			return vertices, chords
		}
		h.nodes = append(h.nodes, summits...)
		sort.Slice(h.nodes, func(i, j int) bool { return h.nodes[i].y < h.nodes[j].y })
	}
}

// summits are the points of largest g above a chord inside concave cells beneath it.
func (h *hull) summits(chords []chord) []node {
	var out []node
	for _, c := range chords {
		m := c.slope()
		over := func(n node) float64 { return n.g - c.left.g - m*(n.y-c.left.y) }
		for i := c.left.k; i < c.right.k; i++ {
			a, b := h.nodes[i], h.nodes[i+1]
			up, down := a.right-m, b.left-m
			if a.y <= c.left.y || b.y >= c.right.y || up <= 0 || down >= 0 {
				continue
			}
			// Where the tangents at both ends of the cell meet bounds its summit.
			ea, eb := over(a), over(b)
			if ea+up*(eb-ea-down*(b.y-a.y))/(up-down) <= 0 {
				continue
			}
			n := h.at(numeric.Zero(func(y float64) float64 { return h.at(y).right - m }, a.y, b.y, up, down))
			if n.y > a.y && n.y < b.y && over(n) > 4*ulp*math.Abs(n.g) {
				out = append(out, n)
			}
		}
	}
	return out
}

// chords are the straight pieces of the envelope, refined on the true function.
func (h *hull) chords(vertices []int) []chord {
	var out []chord
	for v := 1; v < len(vertices); v++ {
		i, j := vertices[v-1], vertices[v]
		if j == i+1 && h.concave(i) {
			continue
		}
		c := h.refine(chord{touch{node: h.nodes[i], k: i}, touch{node: h.nodes[j], k: j}})
		// Two tangents that the samples could not tell apart may cross: then one
		// chord bridges both.
		for len(out) > 0 {
			last := out[len(out)-1]
			apart := last.right.y < c.left.y
			if apart || last.right.y == c.left.y && last.slope() > c.slope() {
				break
			}
			out = out[:len(out)-1]
			c = h.refine(chord{last.left, c.right})
		}
		out = append(out, c)
	}
	return out
}

// refine moves both ends of a chord to where it is tangent. With the other end held
// the slope of the chord is stationary in each end, so that the two equations are
// uncoupled at the solution and taking turns converges quadratically. A chord so short or
// so shallow that rounding of g hides its slope can close up, its ends in one place or in
// neighbouring nodes with g above it; then it stays as it was.
func (h *hull) refine(c chord) chord {
	given := c
	for range 20 {
		right := h.tangent(c.right, c.left.node, c.left.k+1, len(h.nodes)-1)
		left := h.tangent(c.left, right.node, 0, right.k-1)
		moved := math.Abs(left.y - c.left.y)
		c = chord{left, right}
		if !(right.y > left.y) {
			return given
		}
		if moved <= 4*ulp*math.Abs(left.y) {
			break
		}
	}
	bare := !c.left.inside && !c.right.inside && c.right.k == c.left.k+1
	if m := c.slope(); bare && c.left.right > m && c.right.left < m {
		return given
	}
	return c
}

// tangent finds, near t, the place where the line from the pivot touches g: where
// the slope of g less that of the line goes from positive to negative in rising y.
// It walks from node to node within [first, last] until a node or a cell holds the change.
func (h *hull) tangent(t touch, pivot node, first, last int) touch {
	k, heading := t.k, 0
	for {
		n := h.nodes[k]
		m := slope(n, pivot)
		switch {
		case n.left < m && k > first && heading <= 0:
			heading = -1
			a := h.nodes[k-1]
			if a.right > slope(a, pivot) {
				return h.cross(k-1, pivot)
			}
			k--
		case n.right > m && k < last && heading >= 0:
			heading = 1
			b := h.nodes[k+1]
			if b.left < slope(b, pivot) {
				return h.cross(k, pivot)
			}
			k++
		default:
			return touch{node: n, k: k}
		}
	}
}

// cross finds the tangent inside the cell from node i to the next.
func (h *hull) cross(i int, pivot node) touch {
	a, b := h.nodes[i], h.nodes[i+1]
	y := numeric.Zero(func(y float64) float64 {
		n := h.at(y)
		return n.right - slope(n, pivot)
	}, a.y, b.y, a.right-slope(a, pivot), b.left-slope(b, pivot))
	switch y {
	case a.y:
		return touch{node: a, k: i}
	case b.y:
		return touch{node: b, k: i + 1}
	}
	k := i // the node away from the pivot, so that the two ends keep apart
	if pivot.y < y {
		k = i + 1
	}
	return touch{node: h.at(y), k: k, inside: true}
}
