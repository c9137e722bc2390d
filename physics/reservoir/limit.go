package reservoir

import (
	"math"

	"brinefront/physics/fracflow"
	"brinefront/physics/numeric"
)

// Outcome says how a limit was met, or why not.
type Outcome string

const (
	Reached      Outcome = "reached"
	FromTheStart Outcome = "from the start" // beyond the limit before anything was injected, and for good
	Never        Outcome = "never"          // Final says what the quantity tends to instead
)

// Limit is the time at which a flood stops paying. Time and PVI are +Inf when never.
type Limit struct {
	Outcome   Outcome
	Time, PVI float64
	Final     float64 // what the limited quantity tends to
}

func (l *Linear) limit(q, final float64) Limit {
	if q == 0 {
		return Limit{FromTheStart, 0, 0, final}
	}
	return Limit{Reached, l.TimeAt(q), q, final}
}

func never(final float64) Limit { return Limit{Never, math.Inf(1), math.Inf(1), final} }

// AtWaterCut is the first time at which the water cut at surface is at least cut
// (0 < cut < 1). A cut inside the jump of a front is reached when the front arrives.
func (l *Linear) AtWaterCut(cut float64) Limit {
	_, f := l.Displacement.InletFace()
	final := fracflow.SurfaceCut(f, l.Bw, l.Bo)
	q, ok := l.Displacement.PVIAtCut(fracflow.ReservoirCut(cut, l.Bw, l.Bo))
	if !ok {
		return never(final)
	}
	return l.limit(q, final)
}

// AtOilRate is the time from which the oil rate at surface (calendar, m3/s) stays below
// rate. At constant pressure difference the rate of a viscous oil rises until
// break-through, so that a flood may begin below the limit and cross it twice: the
// last crossing counts.
//
// The rate is looked at from late times to early ones at the nodes of the displacement's
// path, between which it is monotone or nearly so, and the crossing is then found exactly.
func (l *Linear) AtOilRate(rate float64) Limit {
	nodes := l.Displacement.Path()
	_, face := l.Displacement.InletFace()
	final := l.oilRate(math.Inf(1), face)
	if final >= rate {
		return never(final)
	}
	excess := func(xi float64) float64 { // in terms of xi = 1/Q, finite at both ends
		if xi == 0 {
			return final - rate
		}
		_, f := l.Displacement.Outlet(1 / xi)
		return l.oilRate(1/xi, f) - rate
	}
	late := 0.0 // below the limit here
	for _, n := range nodes {
		if n.Xi > 0 && l.oilRate(1/n.Xi, n.F) >= rate {
			if n.Xi == late { // the jump of a shock
				return l.limit(1/n.Xi, final)
			}
			return l.limit(1/numeric.Zero(excess, late, n.Xi, excess(late), l.oilRate(1/n.Xi, n.F)-rate), final)
		}
		late = n.Xi
	}
	// Before break-through the cut is constant and the rate monotone.
	_, f := l.Displacement.Outlet(0)
	first := l.oilRate(0, f) - rate
	if first < 0 || len(nodes) == 0 {
		return l.limit(0, final)
	}
	q := numeric.Zero(func(q float64) float64 { return l.oilRate(q, f) - rate }, 0, 1/late, first, l.oilRate(1/late, f)-rate)
	return l.limit(q, final)
}

// oilRate is the calendar oil rate at surface when the outlet's water cut is f.
func (l *Linear) oilRate(q, f float64) float64 {
	return l.onRate(l.Resistance(q)) * l.Uptime * (1 - f) / l.Bo
}
