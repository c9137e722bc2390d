package fv

import (
	"fmt"
	"math"
)

// Phases gives, at a state, the mobility of the displacing and of the resident phase with their
// slopes: the first rises with the state and the second falls.
type Phases func(s float64) (w, dw, o, do float64)

// ByPhase returns the law of two phases with gravity,
//
//	f = w (1 - N o)/(w + o)
//
// with the flux through a face made of each phase's mobility on the side that the phase comes
// from, by its own potential: the phases flow against each other where N o > 1 or N w < -1.
// The flux is monotone and agrees with f, so that it converges to the same solution as Godunov's;
// through a counter-current face it smears more. First order and limiters as with any law.
//
// N is the gravity number in the unit of 1/mobility. The law must be that of these phases; the
// error says where it is not. The fastest exchange between two states, which the CFL number then counts
// with, is the largest of 128 x 128 pairs and f's own slopes.
//
// Source: Brenier & Jaffré (1991).
func (l *Law) ByPhase(p Phases, gravity float64) (*Law, error) {
	const pairs = 128
	copied := *l
	copied.phases, copied.gravity = p, gravity
	type mobility struct{ w, dw, o, do float64 }
	at := make([]mobility, pairs)
	for i := range at {
		s := l.lo + (l.hi-l.lo)*float64(i)/(pairs-1)
		m := &at[i]
		m.w, m.dw, m.o, m.do = p(s)
		f, _ := l.fn.At(s)
		if mine := copied.exchange(m.w, m.o, m.w, m.o); !(math.Abs(f-mine) <= 1e-9*(1+math.Abs(f))) {
			return nil, fmt.Errorf("fv: at state %.6g the law is %g and that of the phases %g; allowed: the same", s, f, mine)
		}
	}
	for _, a := range at {
		for _, b := range at {
			w, o, slopeW, slopeO := a.w, a.o, 0.0, 0.0
			switch {
			case gravity > 0 && 1-gravity*a.o < 0: // w comes from the right
				w, slopeW, slopeO = b.w, b.dw, -a.do
			case gravity < 0 && 1+gravity*a.w < 0: // o comes from the right
				o, slopeW, slopeO = b.o, a.dw, -b.do
			}
			if t := (w + o) * (w + o); t > 0 {
				copied.swiftest = math.Max(copied.swiftest, (math.Abs(o*(1-gravity*o))*slopeW+math.Abs(w*(1+gravity*w))*slopeO)/t)
			}
		}
	}
	copied.rising = false
	return &copied, nil
}

// exchange is the flux through a face with mobilities wa, oa on its left and wb, ob on its right.
// The heavier of the phases, where w is it and flows up (N > 0), may fall back; the lighter may rise.
func (l *Law) exchange(wa, oa, wb, ob float64) float64 {
	w, o := wa, oa
	switch {
	case l.gravity > 0 && 1-l.gravity*oa < 0:
		w = wb
	case l.gravity < 0 && 1+l.gravity*wa < 0:
		o = ob
	}
	return w * (1 - l.gravity*o) / (w + o)
}

// byPhase fills the fluxes of a run's faces.
func (l *Law) byPhase(flux, left, right []float64) {
	for i := range flux {
		wa, _, oa, _ := l.phases(left[i])
		wb, _, ob, _ := l.phases(right[i])
		flux[i] = l.exchange(wa, oa, wb, ob)
	}
}
