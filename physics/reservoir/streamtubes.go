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
		p := Path{PoreVolume: g.Area * t.Area, Impedance: ends.Impedance, Flood: quick,
			Shape: Shape{V: t.V, G: t.G, In: ends.In, Out: ends.Out}}
		m := Member{Body: p.Tabulate(tolerance), PoreVolume: p.PoreVolume, Pace: 1 / (p.PoreVolume * p.Impedance)}
		s.Tubes = append(s.Tubes, m)
		far = math.Max(far, p.Clock(furthest)/m.Pace)
	}
	s.Whole = s.Tubes.Tabulate(tolerance, far)
	return s
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
