package fv

import (
	"fmt"
	"math"
	"slices"
)

// Settings of a run. The zero value of Cells, CFL and Limiter is the default.
type Settings struct {
	Cells    int       // N, equal cells on the unit length; default 100, 1 to 1000000 allowed
	CFL      float64   // max|df/ds| dQ/dx; default 0.5, allowed up to 1, up to 0.5 with a limiter
	Limiter  Limiter   // default None: first order
	Adaptive bool      // widen the steps as fast states leave; default: steps of one size
	Injected float64   // state at x = 0
	Initial  float64   // state of every cell and beyond x = 1
	Profile  []float64 // instead of Initial: the mean state of each of the N cells; beyond x = 1 the last
}

// look is the number of steps between two looks at the states present when steps are
// adaptive. States never leave the range they are in, so that a look may come late.
const look = 16

// Run is a displacement under way.
type Run struct {
	law               *Law
	cells             int
	cfl, q            float64
	steps             int
	adaptive          bool
	limit             func(a, b float64) float64 // nil: first order
	u                 []float64                  // the injected state, the cells, the state beyond
	fu                []float64                  // f of u
	old               []float64                  // the cells at the start of a step
	left, right       []float64                  // states on either side of the faces 0..N
	fl, fr, flux      []float64                  // f of them, and the flux through the faces
	marches           bool                       // in one pass, from the inflow on
	inflow            float64
	in, out           sum
	stored            float64 // mean state at the start
	entering, leaving float64 // flux through the ends in the last step
}

// New starts a run at Q = 0. The error says which setting was read and what is allowed.
func New(law *Law, s Settings) (*Run, error) {
	if s.Cells == 0 {
		s.Cells = 100
	}
	if s.CFL == 0 {
		s.CFL = 0.5
	}
	limit, known := limiters[s.Limiter]
	most := 1.0
	if known {
		most = 0.5
	}
	switch {
	case s.Limiter != None && !known:
		return nil, fmt.Errorf("fv: the limiter is %q; allowed: none, %q, %q, %q", s.Limiter, Minmod, VanLeer, Superbee)
	case s.Cells < 1 || s.Cells > 1e6:
		return nil, fmt.Errorf("fv: %d cells; allowed: 1 to 1000000", s.Cells)
	case !(s.CFL > 0 && s.CFL <= most):
		return nil, fmt.Errorf("fv: the CFL number is %g; allowed: above 0 up to %g with this scheme", s.CFL, most)
	case law.chained != 0 && (law.chained != s.Cells || s.Limiter != None):
		return nil, fmt.Errorf("fv: %d cells, limiter %q, with laws for %d cells; allowed: that number, at first order", s.Cells, s.Limiter, law.chained)
	case s.Profile != nil && len(s.Profile) != s.Cells:
		return nil, fmt.Errorf("fv: an initial profile of %d values; allowed: %d, one to each cell", len(s.Profile), s.Cells)
	}
	n := s.Cells
	r := &Run{law: law, cells: n, cfl: s.CFL, adaptive: s.Adaptive, limit: limit, u: make([]float64, n+2), fu: make([]float64, n+2), flux: make([]float64, n+1)}
	for i := range r.u {
		r.u[i] = s.Initial
		if s.Profile != nil {
			r.u[i] = s.Profile[min(max(i-1, 0), n-1)]
		}
	}
	r.u[0] = s.Injected
	slack := 1e-12 * (law.hi - law.lo) // rounding
	for i, u := range r.u {
		if !(u >= law.lo-slack && u <= law.hi+slack) {
			return nil, fmt.Errorf("fv: the state of cell %d is %.6g; allowed: %.6g to %.6g, the range of the law (cell 0 is the inlet)", i, u, law.lo, law.hi)
		}
		r.u[i] = math.Max(law.lo, math.Min(law.hi, u))
	}
	if limit != nil {
		r.old = make([]float64, n)
		r.left, r.right = make([]float64, n+1), make([]float64, n+1)
		r.fl, r.fr = make([]float64, n+1), make([]float64, n+1)
	}
	if t := law.table; limit == nil && law.rising && t != nil && t.grid() != nil {
		r.marches, r.inflow = true, t.flux(r.u[0])
	}
	r.stored = mean(r.Cells())
	return r, nil
}

// Cells returns the mean state of each cell, from the inlet outwards. The slice changes
// with every step and is not to be written to.
func (r *Run) Cells() []float64 { return r.u[1 : r.cells+1] }

// Q is the volume injected so far, and Steps the number of steps taken.
func (r *Run) Q() float64 { return r.q }
func (r *Run) Steps() int { return r.steps }

// Inflow and Outflow are the fluxes through the two ends in the last step.
func (r *Run) Inflow() float64  { return r.entering }
func (r *Run) Outflow() float64 { return r.leaving }

// Advance steps on until Q is to, which must be finite. The steps are equal and as few as
// the CFL number allows,
//
//	n = ceil((to - Q) N max|df/ds|/CFL - 1e-9)
//
// with the largest slope over the range of the states present at the start; with Adaptive
// the steps that are left are counted anew every 16 steps. After each step, where each is
// not nil, it is called, and ends the advance there by returning false. Nothing is
// allocated.
func (r *Run) Advance(to float64, each func(*Run) bool) {
	for r.q < to {
		start := r.q
		present := r.u
		if r.law.rising {
			present = r.u[:r.cells+1] // nothing comes in from beyond
		}
		fastest := r.law.Fastest(slices.Min(present), slices.Max(present))
		wanted := (to - start) * float64(r.cells) * fastest / r.cfl
		n := max(1, int(math.Ceil(wanted-1e-9)))
		now := n
		if r.adaptive {
			now = min(n, look)
		}
		for k := 1; k <= now; k++ {
			r.step((to - start) / float64(n))
			if r.q = start + (to-start)*(float64(k)/float64(n)); k == n {
				r.q = to
			}
			if each != nil && !each(r) {
				return
			}
		}
	}
}

// step moves on by dq: forward Euler, or with a limiter the two-stage Runge-Kutta method
// of second order that is a mean of Euler steps, so that what those never do (new
// extrema) it never does either. Shu & Osher (1988).
func (r *Run) step(dq float64) {
	r.steps++
	ratio := dq * float64(r.cells)
	if r.limit == nil {
		r.entering, r.leaving = r.euler(ratio)
	} else {
		cells := r.Cells()
		copy(r.old, cells)
		in1, out1 := r.euler(ratio)
		in2, out2 := r.euler(ratio)
		for i, old := range r.old {
			cells[i] = (old + cells[i]) / 2
		}
		r.entering, r.leaving = (in1+in2)/2, (out1+out2)/2
	}
	r.in.add(dq * r.entering)
	r.out.add(dq * r.leaving)
}

// euler takes S_i -= (dQ/dx) (F_right - F_left) and returns the fluxes at the ends.
func (r *Run) euler(ratio float64) (in, out float64) {
	if r.marches {
		return r.inflow, r.law.table.march(r.Cells(), ratio, r.inflow)
	}
	flux := r.faces()
	cells := r.Cells()
	flux = flux[:len(cells)+1]
	from := flux[0]
	for i := range cells {
		to := flux[i+1]
		cells[i] -= ratio * (to - from)
		from = to
	}
	return flux[0], flux[r.cells]
}

// faces returns the flux through the faces 0 to N. What is beyond an end counts as a cell:
// the injected state, and the initial one, which lets out whatever waves arrive.
func (r *Run) faces() []float64 {
	n := r.cells
	left, right, fl, fr := r.u[:n+1], r.u[1:], r.fu[:n+1], r.fu[1:]
	if r.limit == nil {
		r.law.fill(r.fu, r.u)
	} else {
		r.reconstruct()
		left, right, fl, fr = r.left, r.right, r.fl, r.fr
		r.law.fill(fl, left)
		if !r.law.rising {
			r.law.fill(fr, right)
		}
	}
	if r.law.rising {
		return fl
	}
	if r.law.phases != nil {
		r.law.byPhase(r.flux, left, right)
		return r.flux
	}
	for i := range r.flux {
		r.flux[i] = r.law.godunov(left[i], right[i], fl[i], fr[i])
	}
	return r.flux
}

// reconstruct finds the states on both sides of each face from a straight line in each
// cell. In the last cell the change to the state beyond only limits: that state may be
// far away in saturation without a slope in the rock.
//
// Source: van Leer (1979).
func (r *Run) reconstruct() {
	n := r.cells
	r.left[0], r.right[n] = r.u[0], r.u[n+1]
	a := r.u[1] - r.u[0]
	for i := 1; i <= n; i++ {
		b := r.u[i+1] - r.u[i]
		half := 0.0
		if i < n {
			half = r.limit(a, b) / 2
		} else {
			half = minmod(a, b) / 2
		}
		r.right[i-1], r.left[i] = r.u[i]-half, r.u[i]+half
		a = b
	}
}
