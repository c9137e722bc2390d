package reservoir

import (
	"math"

	"brinefront/physics/numeric"
)

// Member is a body of a bundle. Bodies of one kind may share a Body: only its size and its
// pace differ.
type Member struct {
	Body       Body
	PoreVolume float64 // m3, > 0
	Pace       float64 // 1/(PoreVolume Impedance): clock of the body over that of the bundle; >= 0
}

// Bundle is a number of bodies between the same wells without crossflow: the pressure
// difference is common, and each goes at its own pace. Its clock tau is the integral of
// the pressure difference over time (Pa s), which is all that its state depends on:
// whatever the history of rates was, a total rate or a total volume is one equation in tau.
//
// Source: Dykstra & Parsons (1950), generalised to any displacement in each layer.
type Bundle []Member

var _ Body = Bundle{}

// PoreVolume is that of all members together.
func (b Bundle) PoreVolume() float64 {
	sum := 0.0
	for _, m := range b {
		sum += m.PoreVolume
	}
	return sum
}

// At implements Body, in pore volumes of the whole bundle.
func (b Bundle) At(tau float64) Outflow {
	var o Outflow
	pv := b.PoreVolume()
	for _, m := range b {
		s := m.Body.At(tau * m.Pace)
		volume, rate := m.PoreVolume/pv, m.PoreVolume/pv*m.Pace
		o.Injected += volume * s.Injected
		o.Oil += volume * s.Oil
		o.Held += volume * s.Held
		o.Rate += rate * s.Rate
		o.OilRate += rate * s.OilRate
		o.HoldingRate += rate * s.HoldingRate
	}
	return o
}

// Breakthrough implements Body.
func (b Bundle) Breakthrough() float64 {
	first := math.Inf(1)
	for _, m := range b {
		if m.Pace > 0 {
			first = math.Min(first, m.Body.Breakthrough()/m.Pace)
		}
	}
	return first
}

// Clock is the clock at which a body has taken in q pore volumes; near is where to look
// first, any number from 0. +Inf for a q beyond what the body ever takes.
func Clock(b Body, q, near float64) float64 {
	if !(q > 0) {
		return 0
	}
	if !(near > 0) {
		near = q / b.At(0).Rate
	}
	return rising(q, near, math.Inf(1), func(x float64) (value, slope float64) {
		o := b.At(x)
		return o.Injected, o.Rate
	})
}

// rising is where a function that rises from 0 at 0 reaches y > 0, between 0 and high, which may be
// +Inf: by Newton's steps from x, kept inside the bracket, halving it (or doubling x) otherwise.
func rising(y, x, high float64, at func(x float64) (value, slope float64)) float64 {
	low := 0.0
	for range 200 {
		value, slope := at(x)
		if value > y {
			high = x
		} else {
			low = x
		}
		next := x - (value-y)/slope
		if math.Abs(next-x) <= 1e-8*x {
			return next // Newton's step doubles the digits
		}
		if !(next > low && next < high) {
			if next = low + (high-low)/2; math.IsInf(high, 1) {
				next = 2 * x
			}
		}
		if next == low || next == high || math.IsInf(next, 1) {
			return next
		}
		x = next
	}
	return x
}

// crossing is the clock between low and high at which a quantity of a body, less a limit,
// changes sign.
func crossing(b Body, low, high float64, excess func(Outflow) float64) float64 {
	f := func(x float64) float64 { return excess(b.At(x)) }
	return numeric.Zero(f, low, high, f(low), f(high))
}
