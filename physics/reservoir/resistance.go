package reservoir

import (
	"math"
	"sort"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/numeric"
)

// How the changing resistance is integrated.
//
// With J(xi) = int_0^xi dxi/lt(S(xi)), the resistance after Q pore volumes is
// R(Q) = Q J(1/Q), and by parts
//
//	T(Q) = int_0^Q R dQ = Q^2 J(1/Q)/2 + K(Q)/2,   K(Q) = int_0^Q dQ/lt(S_out(Q)),
//
// because d(Q^2 J/2)/dQ = R - 1/(2 lt(S_out)). Where the state is constant both J and K
// are straight lines. In a fan xi = f'(S) and Q = 1/f'(S), and by parts again
//
//	int dxi/lt = [xi/lt] + int f' lt'/lt^2 dS,   int dQ/lt = [Q/lt] + int (1/f') lt'/lt^2 dS,
//
// so that no second derivative of f is ever needed. The panels are the cells of the
// displacement's path, graded to the ends of each fan, each with one Gauss-Legendre
// rule; J is summed from the inlet outwards and K from the outlet inwards, once. A
// query looks up its cell and adds one short panel.
//
// Nothing is lost at the inlet, where Q is infinite: the cell there is only ever
// entered from its outer side.

// resistance holds J, K and T at the nodes of the path.
type resistance struct {
	flow    fracflow.Flow
	d       *displace.Displacement
	nodes   []displace.Node
	j, k, t []float64
	ahead   float64 // 1/lt of the initial state
	face    float64 // 1/lt of the inlet face: R at Q = infinity
	least   float64 // a lower bound of R
}

func newResistance(flow fracflow.Flow, d *displace.Displacement) resistance {
	nodes := d.Path()
	n := len(nodes)
	r := resistance{flow: flow, d: d, nodes: nodes, j: make([]float64, n), k: make([]float64, n), t: make([]float64, n)}
	s, _ := d.InletFace()
	r.ahead, r.face = r.drag(d.Initial()), r.drag(s)
	r.least = math.Min(r.ahead, r.face)
	volumes := make([]float64, n) // int dQ/lt over the cell that ends at the node
	for i, b := range nodes {
		r.least = math.Min(r.least, r.drag(b.S))
		if i == 0 {
			r.j[0] = b.Xi * r.face
			continue
		}
		a := nodes[i-1]
		place, volume := r.panel(a, b)
		r.j[i], volumes[i] = r.j[i-1]+place, volume
	}
	r.least /= 2 // between nodes lt may be a little larger than at them
	for i := n - 1; i >= 0; i-- {
		q := 1 / nodes[i].Xi
		if i == n-1 {
			r.k[i] = q * r.ahead
		} else {
			r.k[i] = r.k[i+1] + volumes[i+1]
		}
		r.t[i] = math.Inf(1)
		if !math.IsInf(q, 1) {
			r.t[i] = (q*q*r.j[i] + r.k[i]) / 2
		}
	}
	return r
}

// drag is 1/lt.
func (r *resistance) drag(s float64) float64 {
	lt, _ := r.flow.Mobility(s)
	return 1 / lt
}

// panel is int dxi/lt from node a outwards to b, and int dQ/lt from b inwards to a,
// which is infinite when Q is at a.
func (r *resistance) panel(a, b displace.Node) (place, volume float64) {
	da, db := r.drag(a.S), r.drag(b.S)
	switch {
	case a.Xi == b.Xi:
		return 0, 0
	case a.S == b.S:
		return (b.Xi - a.Xi) * da, (1/a.Xi - 1/b.Xi) * da
	}
	place, volume = r.gauss(a.S, b.S)
	place += b.Xi*db - a.Xi*da
	if a.Xi == 0 {
		return place, math.Inf(1)
	}
	return place, da/a.Xi - db/b.Xi - volume
}

// outer is int dQ/lt from node b inwards to a state within its cell. Towards an inlet
// face of speed 0, where saturation is end, the integrand grows like a power of the
// distance from it, so the panel is cut where that distance halves.
func (r *resistance) outer(b, state displace.Node, end float64) float64 {
	sum := 0.0
	for math.Abs(b.S-end) > 2*math.Abs(state.S-end) {
		half := displace.Node{S: end + (b.S-end)/2}
		if half.S == end || half.S == b.S {
			// Saturation is too coarse to tell the states that are left apart.
			return sum + (1/state.Xi-1/b.Xi)*r.drag(end)
		}
		_, half.Xi = r.flow.At(half.S)
		_, volume := r.panel(half, b)
		sum += volume
		b = half
	}
	_, volume := r.panel(state, b)
	return sum + volume
}

// gauss is int v lt'/lt^2 dS and int (1/v) lt'/lt^2 dS with v = f', by the eight-point
// Gauss-Legendre rule.
func (r *resistance) gauss(a, b float64) (speed, slowness float64) {
	half, mid := (b-a)/2, (a+b)/2
	for i, x := range gaussX {
		for _, s := range [2]float64{mid - half*x, mid + half*x} {
			_, v, lt, slope := r.flow.Full(s)
			part := gaussW[i] * half * slope / (lt * lt)
			speed += v * part
			if v > 0 { // not where rounding puts the abscissa on an inlet face of speed 0
				slowness += part / v
			}
		}
	}
	return speed, slowness
}

// Abscissae and weights of the eight-point Gauss-Legendre rule: Abramowitz & Stegun
// (1964), table 25.4.
var (
	gaussX = [4]float64{0.183434642495649805, 0.525532409916328986, 0.796666477413626740, 0.960289856497536232}
	gaussW = [4]float64{0.362683783378361983, 0.313706645877887287, 0.222381034453374471, 0.101228536290376259}
)

// cell returns the index of the first node at xi or beyond.
func (r *resistance) cell(xi float64) int {
	return sort.Search(len(r.nodes), func(i int) bool { return r.nodes[i].Xi >= xi })
}

// at returns R and T after q pore volumes.
func (r *resistance) at(q float64) (now, spent float64) {
	if q <= 0 {
		return r.ahead, 0
	}
	if math.IsInf(q, 1) {
		return r.face, q
	}
	xi := 1 / q
	i := r.cell(xi)
	if i < len(r.nodes) && r.nodes[i].Xi == xi {
		return q * r.j[i], r.t[i]
	}
	if line, ok := r.line(i); ok {
		return line.bend*q + line.slope, (line.bend*q/2+line.slope)*q + line.offset
	}
	a, b := r.nodes[i-1], r.nodes[i]
	here := displace.Node{S: r.d.Saturation(xi), Xi: xi}
	place, _ := r.panel(a, here)
	j := r.j[i-1] + place
	k := r.k[i] + r.outer(b, here, a.S)
	return q * j, (q*q*j + k) / 2
}

// line is T(Q) = bend Q^2/2 + slope Q + offset, where a constant state is at the outlet.
type line struct{ bend, slope, offset float64 }

// line describes T while the cell that ends at node i is at the outlet; ok is false in a fan.
func (r *resistance) line(i int) (line, bool) {
	n := len(r.nodes)
	switch {
	case n == 0:
		return line{0, r.ahead, 0}, true
	case i == n:
		last := r.nodes[n-1]
		return line{r.j[n-1] - last.Xi*r.ahead, r.ahead, 0}, true
	case i == 0:
		first := r.nodes[0]
		return line{0, r.face, (r.k[0] - r.face/first.Xi) / 2}, true
	case r.nodes[i-1].S != r.nodes[i].S:
		return line{}, false
	}
	a, b := r.nodes[i-1], r.nodes[i]
	drag := r.drag(a.S)
	return line{r.j[i-1] - a.Xi*drag, drag, (r.k[i] - drag/b.Xi) / 2}, true
}

// pvi is the inverse of T.
func (r *resistance) pvi(spent float64) float64 {
	// T falls along the nodes; i is the first whose T is below, or equal.
	i := sort.Search(len(r.nodes), func(i int) bool { return r.t[i] <= spent })
	if i < len(r.nodes) && r.t[i] == spent {
		return 1 / r.nodes[i].Xi
	}
	if line, ok := r.line(i); ok {
		// The root of bend Q^2/2 + slope Q = T that has no cancellation for bend of either sign.
		left := spent - line.offset
		return 2 * left / (line.slope + math.Sqrt(math.Max(0, line.slope*line.slope+2*line.bend*left)))
	}
	low := 1 / r.nodes[i].Xi
	high := 1 / r.nodes[i-1].Xi
	if math.IsInf(high, 1) {
		high = low + (spent-r.t[i])/r.least
	}
	excess := func(q float64) float64 {
		_, t := r.at(q)
		return t - spent
	}
	return numeric.Zero(excess, low, high, excess(low), excess(high))
}
