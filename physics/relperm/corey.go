package relperm

import "math"

// Corey is the power form with free exponents.
//
//	s   = (sw - swc)/(1 - swc - sor)
//	krw = krw0 s^nw
//	kro = kro0 (1-s)^no
//
// Valid for 0 <= swc, 0 <= sor, swc + sor < 1, krw0 > 0, kro0 > 0, nw >= 1, no >= 1.
// Source: Corey (1954), whose exponents are 4 and 2; free exponents are common practice.
type Corey struct {
	Swc, Sor   float64 // connate water and residual oil saturation
	Krw0, Kro0 float64 // end points: krw at 1-sor, kro at swc
	Nw, No     float64 // exponents
}

var _ Curves = Corey{}

// At implements Curves.
func (c Corey) At(sw float64) Point {
	n := normalise(sw, c.Swc, c.Sor)
	return Point{
		Krw: c.Krw0 * math.Pow(n.s, c.Nw), DKrw: c.Krw0 * powerSlope(n.s, c.Nw) * n.ds,
		Kro: c.Kro0 * math.Pow(n.t, c.No), DKro: -c.Kro0 * powerSlope(n.t, c.No) * n.ds,
	}
}

// Ends implements Curves.
func (c Corey) Ends() (swc, swmax float64) { return c.Swc, 1 - c.Sor }

// Knots implements Curves: the model is smooth.
func (c Corey) Knots() []float64 { return nil }
