package reservoir

import (
	"math"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
)

// Flood is a displacement together with the resistance it meets. It is dimensionless
// and is shared by all bodies of rock that have its curves, fluids and states.
type Flood struct {
	Flow         fracflow.Flow
	Displacement *displace.Displacement
	resistance   resistance
	quick        *Table // see Tabulated
}

// NewFlood precomputes. The displacement must have been made of the same flow.
func NewFlood(flow fracflow.Flow, d *displace.Displacement) *Flood {
	return &Flood{Flow: flow, Displacement: d, resistance: newResistance(flow, d)}
}

// Tabulated is the same flood answering by cubics that meet the exact solution within
// tolerance; see Path.Tabulate. For the many pieces of many tubes.
func (f *Flood) Tabulated(tolerance float64) *Flood {
	quick := *f
	quick.quick = f.table(tolerance)
	return &quick
}

// at returns R, T, what has left and what leaves of oil, in pore volumes, for an even body.
func (f *Flood) at(q float64) (r, t, oil, share float64) {
	if f.quick != nil {
		o := f.quick.At(q)
		return o.Rate * f.resistance.ahead, o.Injected * f.resistance.ahead, o.Oil, o.OilRate
	}
	r, t = f.resistance.at(q)
	s := f.Displacement.After(q)
	return r, t, s.Oil, 1 - s.Cut
}

// Shape says how the geometric resistance of a body, int dx/(k A) along the flow, is spread
// over its pore volume, and what converging flow and skin add at its ends.
//
// V and G are shares of pore volume and of resistance passed on the way from the injector,
// both rising from 0 to 1, joined by straight lines. In and Out are resistances of no
// volume at the two ends, in units of the whole of the body: skin, or what lies within the
// first and last node of a grid. Both may be negative as long as the sum stays positive.
type Shape struct {
	V, G    []float64
	In, Out float64
}

// Even is the shape of a linear body.
var Even = Shape{V: []float64{0, 1}, G: []float64{0, 1}}

// Path is a body of rock through which fluid flows from an injector to a producer: a
// layer, a streamtube, or a streamtube of a layer.
//
// With v the share of pore volume from the injector and g = dG/dv, the pressure
// difference at the rate q is q Impedance R(Q),
//
//	R(Q) = int_0^1 g(v)/lt(S(v/Q)) dv + In/lt(face) + Out/lt(S(1/Q)),   T(Q) = int_0^Q R dQ,
//
// and Q follows from T(Q) = clock, the integral of the pressure difference over time
// divided by PoreVolume Impedance. Where g is constant R and T are those of a linear body
// whose length is the share v, v R1(Q/v) and v^2 T1(Q/v), so that for a shape of straight
// pieces both are finite sums, without a step in time or place.
//
// Source: Dykstra & Parsons (1950) for piston-like fronts at a common pressure difference;
// Higgins & Leighton (1962) for streamtubes; here with the exact profile of Welge (1952).
type Path struct {
	PoreVolume float64 // m3, > 0
	Impedance  float64 // int dx/(k A), 1/m3, > 0
	Shape      Shape
	Flood      *Flood
}

// Outflow is what has passed a body, in pore volumes, and how fast, per unit of its clock.
type Outflow struct {
	Injected, Oil, Held        float64 // cumulative: total fluid in, oil out, what stayed in gas-filled space
	Rate, OilRate, HoldingRate float64 // their slopes in the clock, 1/(Pa s); Rate is 1/R
}

// Cut is the water cut at reservoir conditions; 0 while nothing flows out.
func (o Outflow) Cut() float64 {
	if out := o.Rate - o.HoldingRate; out > 0 {
		return 1 - o.OilRate/out
	}
	return 0
}

// Filling is a body part of whose pore volume, Gas < the volume at which its foremost
// front arrives, holds gas at the start. Until as much is injected the oil displaced
// refills that space and nothing flows out; from then on the body is as it would be
// without gas. The gas has no resistance and none is produced.
//
// Source: Craig (1971), fill-up of the gas space before a flood responds.
type Filling struct {
	Body Body
	Gas  float64 // pore volumes
}

var _ Body = Filling{}

// At implements Body.
func (f Filling) At(clock float64) Outflow {
	o := f.Body.At(clock)
	if o.Injected < f.Gas {
		return Outflow{Injected: o.Injected, Rate: o.Rate, Held: o.Injected, HoldingRate: o.Rate}
	}
	o.Oil, o.Held = o.Oil-f.Gas, f.Gas
	return o
}

// Breakthrough implements Body.
func (f Filling) Breakthrough() float64 { return f.Body.Breakthrough() }

// Body answers with what has passed it when its clock (Pa s) stands at a value.
type Body interface {
	At(clock float64) Outflow
	// Breakthrough is the clock at which the foremost wave arrives, +Inf when nothing moves.
	Breakthrough() float64
}

var _ Body = Path{}

// reached is the exact state after q pore volumes.
type reached struct {
	r, t float64
	Outflow
}

func (p Path) after(q float64) reached {
	f := p.Flood
	whole, spent, oil, share := f.at(q)
	n := len(p.Shape.V)
	var s reached
	switch {
	case n == 2:
		s.r, s.t = whole, spent
	case q <= 0:
		s.r = f.resistance.ahead
	default:
		for i, v := range p.Shape.V[1:] {
			now, so := whole, spent
			if i+2 < n {
				now, so, _, _ = f.at(q / v)
			}
			bend := p.density(i) - p.density(i+1)
			s.r += bend * v * now
			s.t += bend * v * v * so
		}
	}
	if p.Shape.In != 0 || p.Shape.Out != 0 {
		out, _ := f.Displacement.Outlet(q)
		s.r += p.Shape.In*f.resistance.face + p.Shape.Out*f.resistance.drag(out)
		// int dQ/lt(S(1/Q)) is 2 T1 - Q R1, by parts.
		s.t += p.Shape.In*f.resistance.face*q + p.Shape.Out*(2*spent-q*whole)
	}
	s.Outflow = Outflow{Injected: q, Oil: oil, Rate: 1 / s.r, OilRate: share / s.r}
	return s
}

// density is g in piece i of the shape; 0 beyond the last.
func (p Path) density(i int) float64 {
	if i+1 >= len(p.Shape.V) {
		return 0
	}
	return (p.Shape.G[i+1] - p.Shape.G[i]) / (p.Shape.V[i+1] - p.Shape.V[i])
}

// Clock is T(Q), the clock when q pore volumes have been injected.
func (p Path) Clock(q float64) float64 { return p.after(q).t }

// Resistance is R(Q).
func (p Path) Resistance(q float64) float64 { return p.after(q).r }

// Injected is the inverse of Clock.
func (p Path) Injected(clock float64) float64 {
	if !(clock > 0) {
		return 0
	}
	if len(p.Shape.V) == 2 && p.Shape.In == 0 && p.Shape.Out == 0 {
		return p.Flood.resistance.pvi(clock)
	}
	high := clock / p.Resistance(0)
	for p.Clock(high) < clock {
		high *= 2
	}
	return rising(clock, high, high, func(q float64) (value, slope float64) {
		s := p.after(q)
		return s.t, s.r
	})
}

// At implements Body.
func (p Path) At(clock float64) Outflow { return p.after(p.Injected(clock)).Outflow }

// Breakthrough implements Body.
func (p Path) Breakthrough() float64 {
	q := p.Flood.Displacement.Breakthrough()
	if math.IsInf(q, 1) {
		return q
	}
	return p.Clock(q)
}
