package fv

import (
	"fmt"
	"math"
)

// Medium is what an implicit run moves through: functions of the state, whatever they are made of.
//
//	dS/dT + dq/dx = 0,  q = v f(S) - dK(S)/dx,  0 < x < 1
//
// v is the total flux, K Kirchhoff's potential of the capillary diffusion. For a rock of length L
// (m) and porosity phi with v the Darcy velocity (m/s) and D = k lw lo/(lw+lo) |dPc/dS| (m²/s),
// K is the integral of D/L and T = t/(phi L); with D/(v L) instead and v = 1, T is pore volumes.
type Medium struct {
	Law       *Law       // f; nil where nothing flows through
	Potential *Potential // K; nil without capillarity
}

// ImplicitSettings of a run. At least the ends and the initial state have to be given.
type ImplicitSettings struct {
	Cells       int       // N; default 100, 1 to 100000 allowed
	Faces       []float64 // instead of Cells: N+1 places that rise from 0 to 1
	Initial     float64
	Profile     []float64 // instead of Initial: the mean state of each cell
	Inlet       End       // default Closed
	Outlet      End       // default Closed
	Through     float64   // v, not negative; 0: nothing flows through, as in soaking
	Step        float64   // longest step; default: no limit
	Error       float64   // root mean square of the error a step may make in S; default: none is held and every step is Step
	SecondOrder bool      // in time, and with capillarity in space; default: first order, monotone at any step
}

const (
	smallest = 1e-12 // of the range of states: where a root has arrived
	arrived  = 1e-9  // of the range: what Newton's method may leave in a cell
	rounds   = 40    // of Newton's method before a step is cut
	deepCut  = 40    // how often over a step may be halved
	opening  = 1e-7  // of T: how close the moment is met at which the outlet opens
)

// node is a state with what it gives.
type node struct{ s, f, v, k, d float64 }

// Implicit is a run under way whose steps may be of any length.
//
// First order: backward Euler and single-point upstream, whose solution exists and is monotone
// at any step. Its truncation acts like the diffusion (f' dx/2)(1 + CFL).
// Second order: the two-stage method of Alexander (1977), which damps what it does not resolve, and
// centred fluxes where diffusion allows.
//
// Each step is solved by Newton's method on the bidiagonal or tridiagonal system. Where f rises
// and nothing diffuses the cells are solved one after another between bounds, which cannot fail.
// Otherwise no cell may cross an inflection of f in one round, Jenny, Tchelepi & Lee (2009), and
// a step that has not converged in 40 rounds is cut in half. The fluxes of the last round make the
// step, so that nothing is lost or made however far Newton's method got.
type Implicit struct {
	medium            Medium
	law               *Law
	cells             int
	width, gap        []float64 // of the cells; between centres, by face 1..N-1
	through           float64
	inlet, outlet     End
	atInlet, atOutlet node
	lo, hi            float64
	longest, allowed  float64
	second            bool

	t, next                   float64 // T; the step to try
	steps, work, cuts         int
	stalled                   bool
	opened                    float64 // when the outlet opened; NaN: not yet
	s, start, base            []float64
	rate, earlier             []float64 // dS/dT of the last step and the step before
	lastStep, stepBefore      float64
	nodes                     []node
	flux                      []face
	weight                    []float64 // of the centred flux, by face
	stage                     []float64 // flux of the first stage
	lower, diag, upper, right []float64
	in, out                   sum
	stored                    float64
	entering, leaving         float64
}

// NewImplicit starts a run at T = 0. The error says which setting was read and what is allowed.
func NewImplicit(m Medium, s ImplicitSettings) (*Implicit, error) {
	faces := s.Faces
	if faces == nil {
		if s.Cells == 0 {
			s.Cells = 100
		}
		if s.Cells < 1 || s.Cells > 1e5 {
			return nil, fmt.Errorf("fv: %d cells; allowed: 1 to 100000", s.Cells)
		}
		faces = make([]float64, s.Cells+1)
		for i := range faces {
			faces[i] = float64(i) / float64(s.Cells)
		}
	}
	n := len(faces) - 1
	r := &Implicit{medium: m, law: m.Law, cells: n, through: s.Through, inlet: s.Inlet, outlet: s.Outlet, longest: s.Step, allowed: s.Error, second: s.SecondOrder, opened: math.NaN()}
	switch {
	case n < 1 || faces[0] != 0 || faces[n] != 1:
		return nil, fmt.Errorf("fv: faces %v; allowed: two or more places from 0 to 1", faces)
	case s.Profile != nil && len(s.Profile) != n:
		return nil, fmt.Errorf("fv: an initial profile of %d values; allowed: %d, one to each cell", len(s.Profile), n)
	case m.Law == nil && m.Potential == nil:
		return nil, fmt.Errorf("fv: a medium without flow and without capillarity")
	case m.Law != nil && m.Law.chained > 0:
		return nil, fmt.Errorf("fv: an implicit run with a law of its own for each cell; allowed: one law")
	case !(s.Through >= 0) || math.IsInf(s.Through, 0) || s.Through > 0 && m.Law == nil:
		return nil, fmt.Errorf("fv: a total flux of %g; allowed: 0 or above, and above 0 only with a law", s.Through)
	case !(s.Step >= 0) || !(s.Error >= 0):
		return nil, fmt.Errorf("fv: a step of %g with an error of %g; allowed: 0, which sets none, or above", s.Step, s.Error)
	case s.SecondOrder && m.Potential == nil:
		return nil, fmt.Errorf("fv: second order without capillarity; allowed: first order, or a Run with a limiter")
	}
	for _, e := range []struct {
		name  string
		end   End
		kinds [4]EndKind
	}{{"inlet", s.Inlet, [4]EndKind{"", Closed, Fed, Held}}, {"outlet", s.Outlet, [4]EndKind{"", Closed, Open, Held}}} {
		known := e.name == "outlet" && e.end.Kind == Threshold
		for _, k := range e.kinds {
			known = known || k == e.end.Kind
		}
		if !known {
			return nil, fmt.Errorf("fv: the %s is %q, which is none of its kinds", e.name, e.end.Kind)
		}
	}
	if m.Law != nil {
		r.lo, r.hi = m.Law.Ends()
	} else {
		r.lo, r.hi = m.Potential.nodes[0], m.Potential.nodes[len(m.Potential.nodes)-1]
	}
	list := func(n int) []float64 { return make([]float64, n) }
	r.width, r.gap, r.weight, r.stage = list(n), list(n), list(n+1), list(n+1)
	r.s, r.start, r.base, r.rate, r.earlier = list(n), list(n), list(n), list(n), list(n)
	r.lower, r.diag, r.upper, r.right = list(n), list(n), list(n), list(n)
	r.nodes, r.flux = make([]node, n), make([]face, n+1)
	for i := range r.width {
		if r.width[i] = faces[i+1] - faces[i]; !(r.width[i] > 0) {
			return nil, fmt.Errorf("fv: face %d is at %g and face %d at %g; allowed: places that rise", i, faces[i], i+1, faces[i+1])
		}
		if i > 0 {
			r.gap[i] = (faces[i+1] - faces[i-1]) / 2
		}
		r.s[i] = s.Initial
		if s.Profile != nil {
			r.s[i] = s.Profile[i]
		}
	}
	if s.Inlet.Kind == Fed && m.Law != nil && m.Law.rising {
		low, _ := m.Law.at(r.lo)
		high, _ := m.Law.at(r.hi)
		if !(s.Inlet.Share >= low && s.Inlet.Share <= high) {
			return nil, fmt.Errorf("fv: the inlet lets in %g of the flux; allowed: %.6g to %.6g, the range of f", s.Inlet.Share, low, high)
		}
	}
	slack := smallest * (r.hi - r.lo)
	for i, u := range append([]float64{s.Inlet.State, s.Outlet.State}, r.s...) {
		if i == 0 && s.Inlet.Kind != Held || i == 1 && s.Outlet.Kind != Held && s.Outlet.Kind != Threshold {
			continue
		}
		if !(u >= r.lo-slack && u <= r.hi+slack) {
			return nil, fmt.Errorf("fv: the state %.6g of a cell or an end; allowed: %.6g to %.6g, the range of the medium", u, r.lo, r.hi)
		}
	}
	r.atInlet, r.atOutlet = r.at(s.Inlet.State), r.at(s.Outlet.State)
	r.stored = r.average()
	return r, nil
}

// at is a state with what it gives.
func (r *Implicit) at(s float64) node {
	x := node{s: s}
	if r.through > 0 {
		x.f, x.v = r.law.at(s)
	}
	if r.medium.Potential != nil {
		x.k, x.d = r.medium.Potential.At(s)
	}
	return x
}

// Cells returns the mean state of each cell, from the inlet outwards: not to be written to.
func (r *Implicit) Cells() []float64 { return r.s }

// T is the time so far, Steps the number of steps taken, Work how often a cell was evaluated for
// them and Cuts how often a step was tried again with a shorter one.
func (r *Implicit) T() float64 { return r.t }
func (r *Implicit) Steps() int { return r.steps }
func (r *Implicit) Work() int  { return r.work }
func (r *Implicit) Cuts() int  { return r.cuts }

// Stalled reports whether Newton's method failed on the shortest step allowed: the run
// has then stopped at T.
func (r *Implicit) Stalled() bool { return r.stalled }

// Opened is T when something first left through a Threshold; NaN before.
func (r *Implicit) Opened() float64 { return r.opened }

// Inflow and Outflow are the fluxes through the two ends, means over the last step.
func (r *Implicit) Inflow() float64  { return r.entering }
func (r *Implicit) Outflow() float64 { return r.leaving }

// Average is the mean state.
func (r *Implicit) Average() float64 { return r.average() }

func (r *Implicit) average() float64 {
	var s sum
	for i, u := range r.s {
		s.add(u * r.width[i])
	}
	return s.value()
}

// Balance of the run so far.
func (r *Implicit) Balance() Balance {
	return balance(r.in.value(), r.out.value(), r.average()-r.stored)
}

// Flow changes the total flux from here on, as a rate step does: v not negative, and 0 without
// a law.
func (r *Implicit) Flow(v float64) {
	if !(v >= 0) || math.IsInf(v, 0) || v > 0 && r.law == nil {
		panic(badFlux)
	}
	r.through, r.next, r.lastStep, r.stepBefore = v, 0, 0, 0
	r.atInlet, r.atOutlet = r.at(r.atInlet.s), r.at(r.atOutlet.s)
}

const badFlux = "fv: a total flux that the medium cannot carry"
