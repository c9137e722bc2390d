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
	width := 1 - c.Swc - c.Sor
	s := (sw - c.Swc) / width
	switch {
	case s <= 0:
		p := Point{Kro: c.Kro0}
		if s == 0 {
			p.DKrw = c.Krw0 * powerSlope(0, c.Nw) / width
			p.DKro = -c.Kro0 * powerSlope(1, c.No) / width
		}
		return p
	case s >= 1:
		p := Point{Krw: c.Krw0}
		if s == 1 {
			p.DKrw = c.Krw0 * powerSlope(1, c.Nw) / width
			p.DKro = -c.Kro0 * powerSlope(0, c.No) / width
		}
		return p
	}
	return Point{
		Krw: c.Krw0 * math.Pow(s, c.Nw), Kro: c.Kro0 * math.Pow(1-s, c.No),
		DKrw: c.Krw0 * powerSlope(s, c.Nw) / width, DKro: -c.Kro0 * powerSlope(1-s, c.No) / width,
	}
}

// Ends implements Curves.
func (c Corey) Ends() (swc, swmax float64) { return c.Swc, 1 - c.Sor }

// Knots implements Curves: the model is smooth.
func (c Corey) Knots() []float64 { return nil }

// powerSlope is d(s^n)/ds, exact at s = 0 for n = 1.
func powerSlope(s, n float64) float64 {
	if n == 1 {
		return 1
	}
	return n * math.Pow(s, n-1)
}
