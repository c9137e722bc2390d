package capillary

import "math"

// System is what a capillary pressure depends on besides the shape of the pores: two
// fluids with their contact angle, and the rock they are in. SI throughout.
type System struct {
	Tension      float64 // interfacial tension sigma, N/m, above 0
	Angle        float64 // contact angle through the water, rad; its cosine above 0
	Permeability float64 // m2, above 0
	Porosity     float64 // fraction, above 0
}

// Adhesion is sigma cos(theta), N/m. In one and the same rock the capillary pressures
// of two pairs of fluids are in proportion to it: common practice, after Leverett (1941).
func (s System) Adhesion() float64 { return s.Tension * math.Cos(s.Angle) }

// Scale is the capillary pressure (Pa) at which J = 1.
//
//	J = Pc sqrt(k/phi)/(sigma cos(theta)), hence Scale = sigma cos(theta) sqrt(phi/k)
//
// J tells one curve for all rocks of one pore shape: Leverett (1941). Infinite or not a
// number outside the ranges of the fields; an angle of 90 degrees has no J.
func (s System) Scale() float64 { return s.Adhesion() * math.Sqrt(s.Porosity/s.Permeability) }

// Scaled is a curve times a number: a J-function made a capillary pressure (Factor =
// Scale), or a curve carried from one system to another (Factor = the ratio of their
// Scales, or of their Adhesions in one and the same rock). Factor > 0 and finite: a
// negative one, from water-wet to oil-wet rock, would turn the curve around, and no
// scaling says how.
type Scaled struct {
	Curve
	Factor float64
}

var _ Curve = Scaled{}

// At implements Curve.
func (s Scaled) At(sw float64) (pc, slope float64) {
	pc, slope = s.Curve.At(sw)
	return s.Factor * pc, s.Factor * slope
}
