package fv

import "math"

// EndKind says what an end of an implicit run lets through.
type EndKind string

const (
	// Closed lets nothing through.
	Closed EndKind = "closed"
	// Fed is an inlet through which the displacing phase enters at Share of the total flux,
	// whatever the state there: 1 when it alone is injected, above 1 when the other phase
	// leaves through the inlet.
	Fed EndKind = "fed"
	// Held keeps the face at State: a reservoir of one phase in touch with the rock.
	Held EndKind = "held"
	// Open lets out what flows past, v f(S), without capillarity.
	Open EndKind = "open"
	// Threshold is an outlet outside of which capillary pressure is zero: the displacing phase
	// does not leave until the state at the face has risen to State, the zero of capillary
	// pressure, and keeps it from then on. The capillary end effect.
	Threshold EndKind = "threshold"
)

// End is an end of an implicit run.
type End struct {
	Kind  EndKind
	State float64
	Share float64
}

// face is a flux with its slopes against the states on its left and right.
type face struct{ q, left, right float64 }

// between is the flux through a face between two cells, h apart,
//
//	q = v [(1-w) G(a,b) + w (f(a)+f(b))/2] - (K(b) - K(a))/h
//
// G is Godunov's flux and w the weight of the centred one.
func (r *Implicit) between(a, b node, h, w float64) face {
	var q face
	if r.through != 0 {
		g := r.law.upwind(a, b)
		q = face{
			r.through * ((1-w)*g.q + w*(a.f+b.f)/2),
			r.through * ((1-w)*g.left + w*a.v/2),
			r.through * ((1-w)*g.right + w*b.v/2),
		}
	}
	if r.medium.Potential != nil {
		q.q -= (b.k - a.k) / h
		q.left += a.d / h
		q.right -= b.d / h
	}
	return q
}

// upwind is Godunov's flux with its slopes.
func (l *Law) upwind(a, b node) face {
	if l.rising {
		return face{a.f, a.v, 0}
	}
	switch g := l.godunov(a.s, b.s, a.f, b.f); g {
	case a.f:
		return face{g, a.v, 0}
	case b.f:
		return face{g, 0, b.v}
	default: // an extremum between the two
		return face{q: g}
	}
}

// through the inlet; only the slope to the right counts.
func (r *Implicit) enter(first node) face {
	switch r.inlet.Kind {
	case Fed:
		return face{q: r.through * r.inlet.Share}
	case Held:
		return r.between(r.atInlet, first, r.width[0]/2, r.weight[0])
	}
	return face{}
}

// through the outlet; only the slope to the left counts.
func (r *Implicit) leave(last node) face {
	n := r.cells
	switch r.outlet.Kind {
	case Held, Threshold:
		q := r.between(last, r.atOutlet, r.width[n-1]/2, r.weight[n])
		if r.outlet.Kind == Threshold && q.q <= 0 {
			return face{}
		}
		return q
	case Open:
		return face{r.through * last.f, r.through * last.v, 0}
	}
	return face{}
}

// centred is the part of the centred flux that leaves the scheme free of wiggles,
//
//	w = 1 - coth(P) + 1/P,  P = v h (f(b)-f(a)) / (2 (K(b)-K(a)))
//
// all upstream where convection rules the face (P large) and centred, of second order, where
// diffusion smooths what it resolves. Scharfetter & Gummel (1969).
func centred(a, b node, v, h float64) float64 {
	df, dk := b.f-a.f, b.k-a.k
	if dk == 0 {
		df, dk = a.v, a.d
	}
	p := v * h * math.Abs(df) / (2 * math.Abs(dk))
	switch {
	case !(p < 1e3): // and where nothing diffuses
		return 0
	case p < 1e-3:
		return 1 - p/3
	}
	return 1 - 1/math.Tanh(p) + 1/p
}
