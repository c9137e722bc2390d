package ride

import (
	"fmt"
	"math"
	"sort"

	"brinefront/physics/fracflow"
	"brinefront/physics/numeric"
)

// Chase is the zone of the water that drives a slug.
const Chase Zone = "chase"

// Slug is a flood whose injected fluid is followed by chase water after Size pore
// volumes. It holds until the slug is spent; see the package comment for the method.
type Slug struct {
	flood  *Flood
	rear   Pivot
	size   float64
	phi    float64 // what the slug brought in
	chase  rays
	from   float64 // injected saturation of the chase water
	top    float64 // the largest saturation of the chase water inside the rock
	clear  bool    // its characteristics do not cross
	steady bool    // its inlet stays at the injected state
}

// NewSlug follows the first size pore volumes of a flood by chase water, its own fractional
// flow and injected saturation given. rear is the pivot that the rear feels: that
// of the flood when everything the rock took up is given back (heat, reversible
// adsorption), with a smaller B when not.
//
// Errors tell of a size that is not positive, a saturation outside the range, a rear pivot
// that is not allowed or is held up more than the front, and chase water that
// moves less easily than the slug, so that its front would send waves through the slug; so
// would the rear of a slug that is injected with so much oil that water crowds it.
func NewSlug(flood *Flood, chase fracflow.Function, injected float64, rear Pivot, size float64) (*Slug, error) {
	if !(size > 0) || math.IsInf(size, 0) {
		return nil, fmt.Errorf("ride: the slug is %.6g pore volumes; it must be above 0 and finite", size)
	}
	if rear.A != flood.pivot.A || !(rear.B <= flood.pivot.B) {
		return nil, fmt.Errorf("ride: the rear of the slug has the pivot (%.6g, %.6g); oil must carry %.6g, as at its front, and the retardation be at most that of the front, %.6g", rear.A, rear.B, flood.pivot.A, flood.pivot.B)
	}
	injected, err := within(chase, "injected chase", injected)
	if err != nil {
		return nil, err
	}
	chase, _ = levelled(chase, flood.fn[0])
	lo, _ := chase.Ends()
	if err := rear.check(lo); err != nil {
		return nil, err
	}
	s := &Slug{flood: flood, rear: rear, size: size, phi: size * (flood.face.F + rear.A), from: injected}
	if s.chase, err = newRays(chase, rear); err != nil {
		return nil, err
	}
	fastest := s.speed(Node{S: flood.left.s, F: flood.left.f})
	if best := s.chase.feeds(injected).speed; best < fastest*(1-alike) {
		return nil, fmt.Errorf("ride: the chase water can drive the rear of the slug at a speed of %.6g at most, the slug lets it run at %.6g; water that moves less easily than the slug is not followed", best, fastest)
	}
	slug, err := newRays(flood.fn[0], rear)
	if err != nil {
		return nil, err
	}
	if own := s.speed(flood.face); flood.left.s > flood.face.S || slug.takes(flood.face.S).speed > own*(1+alike) {
		_, hi := flood.fn[0].Ends()
		return nil, fmt.Errorf("ride: the slug enters at the saturation %.6g, at which its rear would send waves through it; slugs injected at a higher one, up to %.6g, are followed", flood.face.S, hi)
	}
	s.prepare(fastest)
	return s, nil
}

// prepare finds the range of saturation of the chase water between its inlet and the state
// beside the rear when that is nearest to the front, and whether speeds fall towards the
// inlet all the way.
func (s *Slug) prepare(fastest float64) {
	start, end := s.chase.behind(s.from, s.speed(s.flood.face)), s.chase.behind(s.from, fastest)
	s.top = math.Max(s.from, start.s)
	injected := s.chase.at(s.from)
	s.steady = true
	s.clear = s.from >= start.s || injected.f == start.f // else a wave runs after the rear
	last := math.Inf(1)
	for _, p := range s.chase.spots {
		if p.s < end.s || p.s > s.top {
			continue
		}
		_, slope := s.chase.fn.At(p.s)
		s.steady = s.steady && p.f <= injected.f
		s.clear = s.clear && slope <= last+bend*math.Abs(last)
		last = slope
	}
}

// bend is the relative rise of slope that is rounding, not a convex curve.
const bend = 1e-9

// speed is that of the rear with the slug's state n ahead of it.
func (s *Slug) speed(n Node) float64 { return (n.F + s.rear.A) / (n.S + s.rear.B) }

// left is what the slug still holds of each pore volume injected: phi/Q where the
// rear is at the state n.
func (s *Slug) left(n Node) float64 { return n.F + s.rear.A - n.Xi*(n.S+s.rear.B) }

// when and where the rear is at the state n of the slug.
func (s *Slug) when(n Node) (q, x float64) {
	q = s.phi / s.left(n)
	return q, n.Xi * q
}

// along finds the state of the slug, from the inlet face to the front, at which excess,
// which rises with Xi, passes zero.
func (s *Slug) along(excess func(Node) float64) Node {
	f := s.flood
	front := sort.Search(len(f.nodes), func(i int) bool { return f.nodes[i].Zone == Ahead })
	k := sort.Search(front, func(i int) bool { return excess(f.nodes[i]) >= 0 })
	if k == front {
		return f.nodes[front-1]
	}
	a, b := f.face, f.nodes[k]
	if k > 0 {
		a = f.nodes[k-1]
	}
	ea, eb := excess(a), excess(b)
	switch {
	case ea >= 0:
		return a
	case a.Xi == b.Xi:
		return b
	case a.S == b.S:
		at := func(xi float64) Node { return Node{a.S, xi, a.F, Behind} }
		return at(numeric.Zero(func(xi float64) float64 { return excess(at(xi)) }, a.Xi, b.Xi, ea, eb))
	}
	at := func(sw float64) Node {
		flow, xi := f.fn[0].At(sw)
		return Node{sw, math.Max(a.Xi, math.Min(b.Xi, xi)), flow, Behind}
	}
	return at(numeric.Zero(func(sw float64) float64 { return excess(at(sw)) }, a.S, b.S, ea, eb))
}

// Spent returns the PVI and the place, as a fraction of the length and perhaps beyond the
// outlet, at which the rear catches up with the front; both +Inf when all is given back.
//
//	x = size (f_inlet + a)/(b - b_rear),  Q = x/v
func (s *Slug) Spent() (q, x float64) {
	x = s.phi / (s.flood.pivot.B - s.rear.B)
	return x / s.flood.speed, x
}

// Rear returns the place of the rear after q pore volumes: 0 until the slug is in; ok is
// false once the slug is spent.
func (s *Slug) Rear(q float64) (x float64, ok bool) {
	if q <= s.size {
		return 0, true
	}
	if spent, _ := s.Spent(); q > spent {
		return 0, false
	}
	_, x = s.at(q)
	return x, true
}

// at returns the slug's state beside the rear, and its place, after q pore volumes.
func (s *Slug) at(q float64) (Node, float64) {
	n := s.along(func(n Node) float64 { return s.phi - q*s.left(n) })
	return n, n.Xi * q
}

// RearArrival is the PVI at which the rear reaches the outlet; ok is false when the slug
// is spent before.
func (s *Slug) RearArrival() (q float64, ok bool) {
	if _, x := s.Spent(); x < 1 {
		return 0, false
	}
	q, _ = s.when(s.along(func(n Node) float64 { return n.Xi*s.phi - s.left(n) }))
	return q, true
}

// LeastSlug is the smallest slug, in pore volumes, that is not spent before the distance
// x (1 is the outlet): what the rock keeps for good,
//
//	size = x (b - b_rear)/(f_inlet + a)
func (f *Flood) LeastSlug(rear Pivot, x float64) float64 {
	return x * (f.pivot.B - rear.B) / (f.face.F + f.pivot.A)
}

// LastingSlug is the slug, in pore volumes, whose rear reaches the outlet when q have
// been injected:
//
//	size = [Q (f_out + a) - (S_out + b_rear)]/(f_inlet + a)
//
// with the outlet state of continuous injection. Before the front itself has arrived it is
// the slug that is spent at the outlet.
func (f *Flood) LastingSlug(rear Pivot, q float64) float64 {
	if q <= f.Arrival() {
		return f.LeastSlug(rear, 1)
	}
	n := f.At(1 / q)
	return (q*(n.F+f.pivot.A) - (n.S + rear.B)) / (f.face.F + f.pivot.A)
}
