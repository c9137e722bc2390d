package reservoir

import "math"

// Piston is a body flooded by a sharp front that leaves nothing movable behind:
//
//	R(Q) = 1/lo + Q (1/lw - 1/lo)/dS for Q < dS, 1/lw from there,
//
// with mobilities per unit permeability (1/(Pa s)) of water behind and oil ahead, and dS
// the change of saturation. With X = Q/dS and M = lw/lo this is the front of Dykstra and
// Parsons, X - (1 - 1/M) X^2/2 = a t, solved by the root that has no cancellation on either
// side of M = 1, where the printed formula is 0/0.
//
// Source: Dykstra & Parsons (1950).
type Piston struct{ Water, Oil, Change float64 } // lw, lo, dS; all > 0

var _ Body = Piston{}

// At implements Body.
func (p Piston) At(clock float64) Outflow {
	if arrival := p.Breakthrough(); clock >= arrival {
		return Outflow{Injected: p.Change + (clock-arrival)*p.Water, Oil: p.Change, Rate: p.Water}
	}
	slope, bend := 1/p.Oil, (1/p.Water-1/p.Oil)/p.Change
	clock = math.Max(0, clock)
	end := math.Sqrt(slope*slope + 2*bend*clock) // R at the clock
	q := 2 * clock / (slope + end)
	return Outflow{Injected: q, Oil: q, Rate: 1 / end, OilRate: 1 / end}
}

// Breakthrough implements Body.
func (p Piston) Breakthrough() float64 { return p.Change * (1/p.Water + 1/p.Oil) / 2 }
