package pattern

import (
	"math"

	"brinefront/physics/numeric"
)

// Arrival is the volume injected, in pore volumes of the pattern, when what departed from
// the injector along one streamline arrives, at unit mobility and piston-like displacement.
// psi is the angle at the hub, from the first of the element's edges: in a line drive from
// the row. +Inf along a streamline on which the flow stands still.
func (g *Geometry) Arrival(psi float64) float64 {
	e := g.element
	if e == nil {
		return 1
	}
	for _, s := range e.sectors {
		if psi <= s.to {
			return e.arrival(s, psi)
		}
	}
	return math.Inf(1)
}

func (e *element) arrival(s sector, psi float64) float64 {
	for _, p := range s.stops {
		if psi == p.psi {
			return math.Inf(1)
		}
	}
	return e.trace(s, psi, e.levels(s, span), nil) * 2 * math.Pi / e.area
}

// fastest is the streamline of a sector that arrives first. Arrival has one minimum in
// each: it is infinite or stationary at the edges.
func (e *element) fastest(s sector) (psi, arrival float64) {
	// The golden section leaves an error of the square root of rounding in psi, of rounding in arrival.
	const golden = 0.6180339887498949
	a, b := s.from, s.to
	at := func(share float64) (float64, float64) {
		x := a + share*(b-a)
		return x, e.arrival(s, x)
	}
	p, fp := at(1 - golden)
	q, fq := at(golden)
	for b-a > 1e-7*(s.to-s.from) {
		if fp < fq {
			b, q, fq = q, p, fp
			p, fp = at(1 - golden)
		} else {
			a, p, fp = p, q, fq
			q, fq = at(golden)
		}
	}
	for _, x := range []float64{s.from, s.to} {
		if f := e.arrival(s, x); f < fp {
			p, fp = x, f
		}
	}
	return p, fp
}

// Breakthrough is the areal sweep, and the pore volumes injected, when a piston-like front
// of unit mobility first arrives.
func (g *Geometry) Breakthrough() float64 {
	first := 1.0
	if g.element != nil {
		for _, s := range g.element.sectors {
			_, f := g.element.fastest(s)
			first = math.Min(first, f)
		}
	}
	return first
}

// UnitSweep is the areal sweep and the share of water in what is produced after pvi pore
// volumes of piston-like displacement at unit mobility, without cutting the pattern into
// tubes:
//
//	sweep = int min(Arrival, pvi) dpsi,   cut = the part of psi with Arrival < pvi
func (g *Geometry) UnitSweep(pvi float64) (sweep, cut float64) {
	e := g.element
	if e == nil {
		return math.Min(1, pvi), map[bool]float64{true: 1}[pvi > 1]
	}
	for _, s := range e.sectors {
		psi, least := e.fastest(s)
		if pvi <= least {
			sweep += pvi * (s.to - s.from)
			continue
		}
		low, high := e.reached(s, psi, s.from, pvi), e.reached(s, psi, s.to, pvi)
		cut += high - low
		sweep += pvi*(s.to-s.from-(high-low)) + e.swept(s, low, psi) + e.swept(s, psi, high)
	}
	return sweep / e.angle(), cut / e.angle()
}

// reached is how far from the fastest streamline, towards an edge, fluid has arrived.
func (e *element) reached(s sector, psi, edge, pvi float64) float64 {
	late := e.arrival(s, edge)
	if late <= pvi {
		return edge
	}
	// Towards a place of rest arrival grows like the logarithm of the distance.
	inner := psi
	for range 60 {
		x := edge + (inner-edge)/4
		if f := e.arrival(s, x); f > pvi {
			edge, late = x, f
			break
		}
		inner = x
	}
	if math.IsInf(late, 1) {
		return edge
	}
	return numeric.Zero(func(x float64) float64 { return e.arrival(s, x) - pvi }, inner, edge, e.arrival(s, inner)-pvi, late-pvi)
}

// swept is int Arrival dpsi, with panels graded towards both ends of the sector.
func (e *element) swept(s sector, from, to float64) float64 {
	sum := 0.0
	for from < to {
		// No panel is longer than its distance from a place where the flow stands still.
		end := to
		for _, p := range s.stops {
			switch {
			case p.psi <= from:
				end = math.Min(end, from+(from-p.psi))
			case end > p.psi-(p.psi-from)/2 && to < p.psi:
				end = math.Min(end, from+(p.psi-from)/2)
			}
		}
		if end-from < 1e-12 || to-end < 1e-12 {
			end = to
		}
		half, middle := (end-from)/2, (end+from)/2
		for i, x := range gaussX {
			sum += gaussW[i] * half * e.arrival(s, middle+half*x)
		}
		from = end
	}
	return sum
}
