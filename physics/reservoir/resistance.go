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
	for i, b := range nodes {
		r.least = math.Min(r.least, r.drag(b.S))
		if i == 0 {
			r.j[0] = b.Xi * r.face
			continue
		}
		r.j[i] = r.j[i-1] + r.placePanel(nodes[i-1], b)
	}
	r.least /= 2 // between nodes lt may be a little larger than at them
	for i := n - 1; i >= 0; i-- {
		q := 1 / nodes[i].Xi
		if i == n-1 {
			r.k[i] = q * r.ahead
		} else {
			r.k[i] = r.k[i+1] + r.volumePanel(nodes[i+1], nodes[i], nodes[i].S)
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

// placePanel is int dxi/lt from node a outwards to b.
func (r *resistance) placePanel(a, b displace.Node) float64 {
	switch {
	case a.Xi == b.Xi:
		return 0
	case a.S == b.S:
		return (b.Xi - a.Xi) * r.drag(a.S)
	}
	return b.Xi*r.drag(b.S) - a.Xi*r.drag(a.S) + r.gauss(a.S, b.S, func(v float64) float64 { return v })
}

// volumePanel is int dQ/lt from node b inwards to a. Towards an inlet face of speed 0
// the integrand grows like a power of the distance from the saturation at end, so the
// panel is halved in that distance.
func (r *resistance) volumePanel(b, a displace.Node, end float64) float64 {
	switch {
	case a.Xi == b.Xi:
		return 0
	case a.Xi == 0:
		return math.Inf(1)
	case a.S == b.S:
		return (1/a.Xi - 1/b.Xi) * r.drag(a.S)
	}
	sum := r.drag(a.S)/a.Xi - r.drag(b.S)/b.Xi
	from, to := b.S-end, a.S-end
	for ; to != 0 && from/to > 2; from /= 2 {
		sum += r.gauss(end+from, end+from/2, func(v float64) float64 { return 1 / v })
	}
	return sum + r.gauss(end+from, a.S, func(v float64) float64 { return 1 / v })
}

// gauss is int weight(f') lt'/lt^2 dS by the eight-point Gauss-Legendre rule.
func (r *resistance) gauss(a, b float64, weight func(v float64) float64) float64 {
	half, mid := (b-a)/2, (a+b)/2
	var sum float64
	for i, x := range gaussX {
		for _, s := range [2]float64{mid - half*x, mid + half*x} {
			_, v, lt, slope := r.flow.Full(s)
			sum += gaussW[i] * weight(v) * slope / (lt * lt)
		}
	}
	return sum * half
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
	j := r.j[i-1] + r.placePanel(a, here)
	k := r.k[i] + r.volumePanel(b, here, a.S)
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
