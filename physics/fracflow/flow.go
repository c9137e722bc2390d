// Package fracflow holds the fractional flow of two phases and the exact wave
// structure that it gives a displacement.
package fracflow

import "brinefront/physics/relperm"

// Function is a flux function f(s) on a range of saturation.
type Function interface {
	// At returns f and df/ds; at a knot df/ds is one-sided from the right.
	At(s float64) (f, dfds float64)
	// Ends returns the range of s.
	Ends() (lo, hi float64)
	// Knots returns, in rising order, the saturations strictly between the ends
	// at which the slope or the second derivative jumps; nil for a smooth function.
	Knots() []float64
}

// Flow is the fractional flow of water.
//
//	f = lw/(lw + lo) (1 - N lo),  lw = krw/muw,  lo = kro/muo
//
// with mobilities per unit permeability (1/(Pa s)) and the gravity number
// N = k (rhow - rhoo) g sin(theta)/ut (Pa s), theta the dip angle of the flow
// direction, positive for water moving up-dip, ut the total flux. f may leave
// [0, 1]: that is counter-current flow. It is NaN where both mobilities vanish.
//
// Valid for MuW > 0 and MuO > 0 (Pa s), any finite Gravity.
// Source: Buckley & Leverett (1942); Dake (1978), ch. 10, fractional flow with dip.
type Flow struct {
	Curves   relperm.Curves
	MuW, MuO float64 // viscosities, Pa s
	Gravity  float64 // N, Pa s; 0 in a horizontal layer
}

var _ Function = Flow{}

// At implements Function.
func (w Flow) At(sw float64) (f, dfds float64) {
	f, dfds, _, _ = w.Full(sw)
	return f, dfds
}

// Full returns f, its slope, the total mobility and its slope together.
func (w Flow) Full(sw float64) (f, dfds, lambdaT, dLambdaT float64) {
	p := w.Curves.At(sw)
	lw, lo := p.Krw/w.MuW, p.Kro/w.MuO
	dlw, dlo := p.DKrw/w.MuW, p.DKro/w.MuO
	lt, dlt := lw+lo, dlw+dlo
	fw := lw / lt
	dfw := dlw/lt*(lo/lt) - fw*(dlo/lt)
	if w.Gravity == 0 {
		return fw, dfw, lt, dlt
	}
	back := 1 - w.Gravity*lo
	return fw * back, dfw*back - fw*w.Gravity*dlo, lt, dlt
}

// Ends implements Function.
func (w Flow) Ends() (lo, hi float64) { return w.Curves.Ends() }

// Knots implements Function.
func (w Flow) Knots() []float64 { return w.Curves.Knots() }

// Mobility returns the total mobility per unit permeability,
// krw/muw + kro/muo in 1/(Pa s), and its slope.
func (w Flow) Mobility(sw float64) (lambdaT, dLambdaT float64) {
	_, _, lambdaT, dLambdaT = w.Full(sw)
	return lambdaT, dLambdaT
}

// EndPointMobilityRatio is lw at the upper end of the curves over lo at their lower
// end, krw(1-Sor)/muw over kro(Swc)/muo: each phase where it alone can move. It is a
// number of rock and fluids; the states of a displacement play no part in it. +Inf when
// oil does not move at the lower end.
//
// Source: Dake (1978), ch. 10, end-point mobility ratio.
func (w Flow) EndPointMobilityRatio() float64 {
	lo, hi := w.Ends()
	return w.Curves.At(hi).Krw / w.MuW / (w.Curves.At(lo).Kro / w.MuO)
}

// FrontMobilityRatio is the shock-front mobility ratio lt(behind)/lt(ahead): the
// total mobility just behind the front over that just ahead of it. Where the
// water ahead does not move the latter is the oil mobility. The front is stable
// in a horizontal layer when it is below 1.
//
// Source: Dake (1978), ch. 10, shock-front mobility ratio (Ms); Craig (1971) averages the water
// behind instead.
func (w Flow) FrontMobilityRatio(behind, ahead float64) float64 {
	b, _ := w.Mobility(behind)
	a, _ := w.Mobility(ahead)
	return b / a
}
