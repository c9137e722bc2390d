package capillary

import "math"

// normal is a water saturation between the ends of a parametric model.
//
//	s = (sw - swr)/width, t = (swmax - sw)/width = 1 - s, width = swmax - swr
//
// Each is taken from its own end: s = (sw - swr)/(1 - swr - snr) alone would carry the
// rounding of the whole width into the last digits before full saturation, where
// 1 - s is all that is left. Outside the ends s and t keep the end values.
type normal struct {
	s, t, width float64
	outside     bool
}

func normalise(sw, swr, snr float64) normal {
	swmax := 1 - snr
	n := normal{width: swmax - swr}
	switch {
	case sw < swr:
		n.t, n.outside = 1, true
	case sw > swmax:
		n.s, n.outside = 1, true
	default:
		n.s, n.t = (sw-swr)/n.width, (swmax-sw)/n.width
	}
	return n
}

// logS is ln s, exact to rounding at both ends.
func (n normal) logS() float64 {
	if n.t < 0.5 {
		return math.Log1p(-n.t)
	}
	return math.Log(n.s)
}

// decay is y = x^-a and dy/dx for 0 <= x, a > 0: both infinite at x = 0.
func decay(x, a float64) (y, dydx float64) {
	if x == 0 {
		return math.Inf(1), math.Inf(-1)
	}
	y = math.Pow(x, -a)
	return y, -a * y / x
}
