package ride

import (
	"math"

	"brinefront/physics/numeric"
)

// Tracer is the front of something that rides along in a uniform stream and is spread
// by dispersion, injected at concentration 1 from Q = 0 into a medium without end.
//
//	C(x, Q) = 1/2 [erfc((x - v Q)/w) + exp(x Pe) erfc((x + v Q)/w)],  w = 2 sqrt(v Q/Pe)
//
// with x the place as a fraction of the length L, Q pore volumes injected, v the
// speed of the undispersed front (Flood.Front; 1/(1 + D) where water alone flows) and
// Pe = u L/K the Peclet number over the length L, u and K the interstitial velocity and the
// coefficient of longitudinal dispersion; a dispersivity alpha gives Pe = L/alpha.
// The second term is evaluated as exp(-((x - v Q)/w)²) erfcx((x + v Q)/w), so that no Pe overflows.
//
// C is the concentration in a stream held at 1 at the inlet; it is also that of the flow
// past x when the inlet takes in the solute with the flow (Kreft & Zuber 1978), in which
// sense no solute is gained or lost: the mean time of arrival at x is x/v exactly.
//
// In two-phase flow it holds where the tracer rides in a constant state, and is an
// estimate where the saturation varies behind it.
//
// Valid for Speed > 0 and Peclet > 0; Peclet +Inf is the sharp front.
// Sources: Ogata & Banks (1961); Kreft & Zuber (1978); both from memory.
type Tracer struct {
	Speed  float64 // v, pore lengths per pore volume
	Peclet float64
}

// Concentration is C at the place x >= 0 after q pore volumes; 1 at the inlet, 0 before injection.
func (t Tracer) Concentration(x, q float64) float64 {
	gone := t.Speed * q
	switch {
	case !(q > 0):
		return 0
	case x <= 0:
		return 1
	}
	width := 2 * math.Sqrt(gone/t.Peclet)
	if width == 0 {
		if x > gone {
			return 0
		}
		return 1
	}
	z := (x - gone) / width
	return (math.Erfc(z) + math.Exp(-z*z)*numeric.Erfcx((x+gone)/width)) / 2
}

// Pulse is the concentration at the place x after q pore volumes when only the first
// size pore volumes carried the tracer: C(x, Q) - C(x, Q - size).
func (t Tracer) Pulse(x, q, size float64) float64 {
	return t.Concentration(x, q) - t.Concentration(x, q-size)
}

// Arrival is the PVI at which the concentration at the place x > 0 reaches c: 0 for
// c <= 0, +Inf for c >= 1.
func (t Tracer) Arrival(x, c float64) float64 {
	switch {
	case c <= 0:
		return 0
	case c >= 1:
		return math.Inf(1)
	case math.IsInf(t.Peclet, 1):
		return x / t.Speed
	}
	excess := func(q float64) float64 { return t.Concentration(x, q) - c }
	lo, hi := x/t.Speed, x/t.Speed
	for excess(lo) > 0 {
		lo /= 2
	}
	for excess(hi) < 0 {
		hi *= 2
	}
	if lo == hi {
		return lo
	}
	return numeric.Zero(excess, lo, hi, excess(lo), excess(hi))
}

// Peak is the largest concentration that a pulse of the given size still has at the place
// x > 0, and the PVI at which it passes.
//
// The concentration has one maximum there, where the rises of its two fronts are equal;
// each rise is x/sqrt(4 pi v Q³/Pe) exp(-((x - v Q)/w)²), the density of the times of arrival.
func (t Tracer) Peak(x, size float64) (q, c float64) {
	if math.IsInf(t.Peclet, 1) {
		return x / t.Speed, 1
	}
	// In logarithms, so that neither rise is lost below the smallest number.
	rise := func(q float64) float64 {
		d := x - t.Speed*q
		return -1.5*math.Log(q) - d*d*t.Peclet/(4*t.Speed*q)
	}
	excess := func(q float64) float64 { return rise(q) - rise(q-size) }
	// The density has its own maximum at top; the fronts balance on both sides of it.
	p := 3 / (t.Peclet * x)
	top := x / t.Speed / (math.Hypot(p, 1) + p)
	lo, hi := math.Max(top, size), top+size
	if q = hi; lo < hi {
		at := math.Nextafter(math.Max(lo, size*(1+0x1p-50)), hi)
		q = numeric.Zero(excess, at, hi, excess(at), excess(hi))
	}
	return q, t.Pulse(x, q, size)
}

// MixingZone is the distance between C = 0.9 and 0.1 after q pore volumes, as a fraction
// of L, where the inlet no longer matters (v Q Pe well above 1):
//
//	4 erfinv(0.8) sqrt(v Q/Pe) = 3.625 sqrt(v Q/Pe)
//
// Source: Lake (1989), ch. 5, from memory.
func (t Tracer) MixingZone(q float64) float64 {
	return 4 * math.Erfinv(0.8) * math.Sqrt(t.Speed*q/t.Peclet)
}
