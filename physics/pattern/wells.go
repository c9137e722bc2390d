package pattern

import "math"

// Bores are the wells of a pattern: their radius in units of d, and the skin of each kind.
type Bores struct {
	Radius             float64
	Injector, Producer float64 // skin, dimensionless
}

// Ends says what a tube takes from well to well.
//
//	Impedance   int dl/(k A) between the circles, in units of 1/(k h)
//	In, Out     what is left at the two ends, and skin, in units of Impedance
//
// Near a well the potential is that of radial flow, so that the ends are ln(r/rw) + skin
// with r the radius of the circle; both may be negative. Where the producers of a pattern
// differ they are held at the pressures that give their rates at unit mobility; Impedance
// then refers to the pressure difference of the first tube.
type Ends struct{ Impedance, In, Out float64 }

// Drop is the pressure difference from well to well at unit mobility, in units of
// q mu/(2 pi k h) with q the rate of the hub, along the first tube:
//
//	Drop = ln(d/rw) + hub skin + Q [ln(d/rw) + rim skin] + B
//
// with Q the rate of the well at its end over the hub's, and B fixed by the pattern.
//
// Sources: Muskat (1937), ch. IX; Deppe (1961).
func (g *Geometry) Drop(b Bores) float64 { return g.drop(g.Tubes[0], b) }

func (g *Geometry) drop(t Tube, b Bores) float64 {
	hub, rim := g.ends(t, b)
	return t.core + hub + rim
}

func (g *Geometry) ends(t Tube, b Bores) (hub, rim float64) {
	atHub, atRim := b.Injector, b.Producer
	if g.Reversed {
		atHub, atRim = atRim, atHub
	}
	open := math.Log(g.near / b.Radius)
	return open + atHub, t.out * (open + atRim)
}

// Offset is B of Drop for the well at the end of a tube.
func (g *Geometry) Offset(t Tube) float64 { return t.core + (1+t.out)*math.Log(g.near) }

// Rim is Q of Drop, the rate of the well at the end of a tube over that of the hub.
func (g *Geometry) Rim(t Tube) float64 { return t.out }

// Ends returns what tube t takes between wells b.
func (g *Geometry) Ends(t Tube, b Bores) Ends {
	in, out := g.ends(t, b)
	if g.Reversed {
		in, out = out, in
	}
	return Ends{
		Impedance: t.core / (2 * math.Pi * t.Flow) * g.Drop(b) / g.drop(t, b),
		In:        in / t.core, Out: out / t.core,
	}
}

// MostRadius is the largest effective radius rw exp(-skin), in units of d, for which the
// flow around a well is still radial to about a part in a hundred.
const MostRadius = 0.1

// Effective is the largest effective radius of the wells.
func (b Bores) Effective() float64 { return b.Radius * math.Exp(-math.Min(b.Injector, b.Producer)) }
