package reservoir

import (
	"math"

	"brinefront/physics/pattern"
)

// Streamtubes is a well pattern under a flood: one tube beside the other at a common
// pressure difference, each with the exact linear displacement and the resistance that
// follows from it.
//
// It is worked out for unit k, phi, h and d. In a layer its pore volume is
// Area phi h d^2, with d the distance between the wells, and its clock is
//
//	k/(phi d^2) int dp dt,
//
// which makes it a Member of pace k/(phi d^2), whatever its size: layers of the same
// curves share it. The rate is PoreVolume Pace Rate dp, as of any member.
//
// The tubes are those of unit mobility; see package pattern.
//
// Source: Higgins & Leighton (1962).
type Streamtubes struct {
	Geometry *pattern.Geometry
	Flood    *Flood
	Tubes    Bundle // one member a tube, in their order
	Whole    *Table
}

var _ Body = Streamtubes{}

// NewStreamtubes floods a pattern between given wells. Tables of the tubes, and of all
// together, meet the exact solution within tolerance, in pore volumes.
func NewStreamtubes(g *pattern.Geometry, bores pattern.Bores, flood *Flood, tolerance float64) Streamtubes {
	s := Streamtubes{Geometry: g, Flood: flood}
	quick := flood.Tabulated(tolerance / 10)
	far := 0.0
	for _, t := range g.Tubes {
		ends := g.Ends(t, bores)
		shape, left := relieved(Shape{V: t.V, G: t.G, In: ends.In, Out: ends.Out})
		p := Path{PoreVolume: g.Area * t.Area, Impedance: ends.Impedance * left, Flood: quick, Shape: shape}
		m := Member{Body: p.Tabulate(tolerance), PoreVolume: p.PoreVolume, Pace: 1 / (p.PoreVolume * p.Impedance)}
		s.Tubes = append(s.Tubes, m)
		far = math.Max(far, p.Clock(furthest)/m.Pace)
	}
	s.Whole = s.Tubes.Tabulate(tolerance, far)
	return s
}

// relieved takes negative resistances of the ends out of the body: a well whose effective radius
// lies beyond its circle frees the rock inside that radius of resistance, and that rock holds what
// the front has made of it, not what is injected. left is what then counts as the whole resistance.
func relieved(s Shape) (r Shape, left float64) {
	from, to := math.Max(0, -s.In), 1-math.Max(0, -s.Out)
	left = to - from
	if left == 1 {
		return s, 1
	}
	r = Shape{In: math.Max(0, s.In) / left, Out: math.Max(0, s.Out) / left}
	put := func(v, g float64) {
		if n := len(r.V); n == 0 || v > r.V[n-1] {
			r.V, r.G = append(r.V, v), append(r.G, math.Max(0, math.Min(1, (g-from)/left)))
		}
	}
	for k, g := range s.G {
		for _, at := range [2]float64{from, to} {
			if k > 0 && at > s.G[k-1] && at < g {
				put(s.V[k-1]+(s.V[k]-s.V[k-1])*(at-s.G[k-1])/(g-s.G[k-1]), at)
			}
		}
		put(s.V[k], g)
	}
	return r, left
}

// At implements Body.
func (s Streamtubes) At(clock float64) Outflow { return s.Whole.At(clock) }

// Breakthrough implements Body.
func (s Streamtubes) Breakthrough() float64 { return s.Whole.Breakthrough() }

// Front is the share of tube i that the foremost wave has passed; 0 when nothing moves.
func (s Streamtubes) Front(i int, clock float64) float64 {
	m := s.Tubes[i]
	return math.Min(1, m.Body.At(clock*m.Pace).Injected*s.Flood.Displacement.FrontSpeed())
}

// Swept is the areal sweep: the part of the pattern's area that the foremost wave has passed.
func (s Streamtubes) Swept(clock float64) float64 {
	swept, whole := 0.0, 0.0
	for i, t := range s.Geometry.Tubes {
		swept += t.Area * s.Front(i, clock)
		whole += t.Area
	}
	return swept / whole
}
