package relperm

import "math"

// LET has three parameters a phase: L shapes the lower part of the curve, T the
// top part, and E how high the bend between them lies.
//
//	s   = (sw - swc)/(1 - swc - sor)
//	krw = krw0 s^Lw/(s^Lw + Ew (1-s)^Tw)
//	kro = kro0 (1-s)^Lo/((1-s)^Lo + Eo s^To)
//
// Valid for 0 <= swc, 0 <= sor, swc + sor < 1, krw0 > 0, kro0 > 0, L >= 1, E > 0, T > 0.
// With T < 1 the slope at that phase's upper end is infinite; a large finite one is
// returned there (see powerSlope). L = T and E = 1 give half the end point at s = 1/2.
// Source: Lomeland, Ebeltoft & Thomas (2005).
type LET struct {
	Swc, Sor   float64 // connate water and residual oil saturation
	Krw0, Kro0 float64 // end points: krw at 1-sor, kro at swc
	Lw, Ew, Tw float64 // water
	Lo, Eo, To float64 // oil
}

var _ Curves = LET{}

// At implements Curves.
func (c LET) At(sw float64) Point {
	n := normalise(sw, c.Swc, c.Sor)
	logS, logT := math.Log(n.s), math.Log(n.t)
	krw, dkrw := let(n.s, n.t, logS, logT, c.Lw, c.Ew, c.Tw)
	kro, dkro := let(n.t, n.s, logT, logS, c.Lo, c.Eo, c.To)
	return Point{
		Krw: c.Krw0 * krw, DKrw: c.Krw0 * dkrw * n.ds,
		Kro: c.Kro0 * kro, DKro: -c.Kro0 * dkro * n.ds,
	}
}

// let is y = s^L/(s^L + E t^T) with t = 1-s, and dy/ds. It is evaluated through the
// ratio of the two terms of the denominator, r = E t^T/s^L:
//
//	y = 1/(1+r), dy/ds = r/(1+r)² (L/s + T/t)
//
// so that powers too small for a number do not end in 0/0. Next to either end the
// leading term of each is used.
func let(s, t, logS, logT, l, e, top float64) (y, dyds float64) {
	switch {
	case s < nextToEnd:
		return math.Pow(s, l) / e, powerSlope(s, l) / e
	case t < nextToEnd:
		return 1 / (1 + e*math.Pow(t, top)), e * powerSlope(t, top)
	}
	r := e * math.Exp(top*logT-l*logS)
	y = 1 / (1 + r)
	if r > 1 {
		r = 1 / r // r/(1+r)² is the same for r and 1/r, and 1/r cannot overflow
	}
	return y, r / ((1 + r) * (1 + r)) * (l/s + top/t)
}

// Ends implements Curves.
func (c LET) Ends() (swc, swmax float64) { return c.Swc, 1 - c.Sor }

// Knots implements Curves: the model is smooth.
func (c LET) Knots() []float64 { return nil }
