package ride

import (
	"math"

	"brinefront/physics/fracflow"
	"brinefront/physics/numeric"
)

// launch is where a state of the chase water left the rear of the slug (the inlet, for
// states that never were beside it; where it first did so while the rear crossed a
// constant state): PVI, place, and water that has passed it so far less water that lies
// between it and the inlet,
//
//	psi = integral of f dQ - S dx = Q (f2 - xi S2)
func (s *Slug) launch(sw float64) (q, x, psi float64) {
	v := s.chase.at(sw).speed * (1 - alike) // rounding must not hide a constant state
	n := s.along(func(n Node) float64 { return s.speed(n) - v })
	q, x = s.when(n)
	return q, x, q * (n.F - n.Xi*n.S)
}

// behindRear returns the state of the chase water at the place x after q pore volumes,
// and psi there. Each state keeps to a straight line of the speed df/ds from where it
// left the rear; low is the state beside the rear now.
func (s *Slug) behindRear(x, q float64, low spot) (n spot, psi float64) {
	short := func(sw float64) float64 { // how far the state still is from x
		from, place, _ := s.launch(sw)
		_, slope := s.chase.fn.At(sw)
		return x - place - slope*(q-from)
	}
	sw := s.top
	if far := short(s.top); far > 0 && low.s < s.top {
		if near := short(low.s); near < 0 {
			sw = numeric.Zero(short, low.s, s.top, near, far)
		} else {
			sw = low.s
		}
	}
	n = s.chase.at(sw)
	from, place, psi := s.launch(sw)
	return n, psi + n.f*(q-from) - n.s*(x-place)
}

// beside is the chase water's state next to the slug's state n at the rear.
func (s *Slug) beside(n Node) spot { return s.chase.behind(s.from, s.speed(n)) }

// At returns the state at the place x after q pore volumes, Xi = x/q. ok is false once the
// slug is spent, and in chase water whose states would overtake each other.
func (s *Slug) At(x, q float64) (n Node, ok bool) {
	rear, ok := s.Rear(q)
	switch {
	case !ok:
		return Node{}, false
	case q <= s.size || x >= rear:
		return s.flood.At(x / q), true
	case !s.clear:
		return Node{}, false
	}
	slug, _ := s.at(q)
	x = math.Max(0, x)
	p, _ := s.behindRear(x, q, s.beside(slug))
	return Node{p.s, x / q, p.f, Chase}, true
}

// chaseBudget is the number of samples asked of the chase water's states in Path.
const chaseBudget = 32

// Path returns the states after q pore volumes from the inlet face to the initial state,
// as Flood.Path does; that is quicker than At place by place. ok as for At.
func (s *Slug) Path(q float64) (nodes []Node, ok bool) {
	rear, ok := s.Rear(q)
	switch {
	case !ok || q > s.size && !s.clear:
		return nil, false
	case q <= s.size:
		return s.flood.Path(), true
	}
	slug, _ := s.at(q)
	low := s.beside(slug)
	face, _ := s.behindRear(0, q, low)
	nodes = []Node{{face.s, 0, face.f, Chase}}
	add := func(sw, f, x float64) {
		if x > 0 && x < rear*(1-alike) { // the state at the rear itself follows
			nodes = append(nodes, Node{sw, math.Max(nodes[len(nodes)-1].Xi, x/q), f, Chase})
		}
	}
	for _, p := range fracflow.Samples(s.chase.fn, s.top, low.s, chaseBudget) {
		from, place, _ := s.launch(p.S)
		add(p.S, p.F, place+p.Above*(q-from))
		if p.Below != p.Above {
			add(p.S, p.F, place+p.Below*(q-from))
		}
	}
	nodes = append(nodes, Node{low.s, slug.Xi, low.f, Chase}, Node{slug.S, slug.Xi, slug.F, Behind})
	for _, n := range s.flood.nodes {
		if n.Xi > slug.Xi {
			nodes = append(nodes, n)
		}
	}
	return nodes, true
}

// After returns the state when q pore volumes have been injected, slug and chase water
// together; ok as for At. With psi of the inlet and of the outlet,
//
//	water injected = psi(0, Q),  water produced = psi(1, Q) + Si,  savg = Si + injected - produced
//
// where psi of the outlet is that of continuous injection until the rear arrives: till
// then no state of the chase water need be known, unless oil leaves at the inlet.
func (s *Slug) After(q float64) (State, bool) {
	if q <= s.size {
		return s.flood.After(q), true
	}
	slug, rear := s.at(q)
	if spent, _ := s.Spent(); q > spent || !s.clear && (rear > 1 || !s.steady) {
		return State{}, false
	}
	low := s.beside(slug)
	water := s.size*s.flood.face.F + (q-s.size)*s.chase.at(s.from).f
	if !s.steady {
		_, water = s.behindRear(0, q, low)
	}
	state := s.flood.After(q)
	if rear > 1 {
		n, psi := s.behindRear(1, q, low)
		state = State{Sw: n.s, Cut: n.f, Zone: Chase, Water: psi + s.flood.initial}
		state.Carried.Produced = s.phi - (s.flood.pivot.B - s.rear.B) // the rest is kept for good
	}
	state.Oil = q - state.Water
	state.Recovery = water - state.Water
	state.Average = s.flood.initial + state.Recovery
	state.Carried.Injected = s.phi
	state.Carried.Stored = s.phi - state.Carried.Produced
	return state, true
}
