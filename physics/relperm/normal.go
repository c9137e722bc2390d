package relperm

import "math"

// normal is a water saturation between the ends of a parametric model.
//
//	s = (sw - swc)/(swmax - swc), t = (swmax - sw)/(swmax - swc) = 1 - s
//
// Each is taken from its own end, so that neither loses digits close to it and
// both are exactly 0 or 1 at the ends. Outside the ends s and t keep the end
// values and ds, which is ds/dsw, is zero.
type normal struct{ s, t, ds float64 }

func normalise(sw, swc, sor float64) normal {
	swmax := 1 - sor
	width := swmax - swc
	switch {
	case sw < swc:
		return normal{s: 0, t: 1}
	case sw > swmax:
		return normal{s: 1, t: 0}
	}
	return normal{s: (sw - swc) / width, t: (swmax - sw) / width, ds: 1 / width}
}

// nextToEnd is how close to an end the leading power alone is the curve, and where
// a slope that is infinite at the end itself is evaluated: less than the spacing of
// floating point numbers just below 1.
const nextToEnd = 0x1p-60

// powerSlope is d(x^n)/dx for 0 <= x <= 1, exact at x = 0 for n >= 1. For n < 1
// the slope is infinite at 0; the one at nextToEnd is returned, so that products
// with a vanishing mobility stay zero instead of becoming undefined.
func powerSlope(x, n float64) float64 {
	if n == 1 {
		return 1
	}
	if n < 1 {
		x = max(x, nextToEnd)
	}
	return n * math.Pow(x, n-1)
}
