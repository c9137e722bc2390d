package ride

import (
	"math"
	"slices"

	"brinefront/physics/numeric"
)

// At returns the state at xi = x/Q: the inlet face for xi <= 0, and at a jump the state
// behind it.
func (f *Flood) At(xi float64) Node {
	zone, side := Behind, f.back
	if xi > f.speed {
		zone, side = Ahead, f.fore
	}
	s := side.Saturation(xi)
	if xi == f.speed {
		s = f.left.s
	}
	return f.node(zone, s, xi)
}

func (f *Flood) node(zone Zone, s, xi float64) Node {
	flow, _ := f.fn[zone.index()].At(s)
	return Node{s, xi, flow, zone}
}

// State is the flood after Q pore volumes, all in pore volumes at reservoir conditions.
type State struct {
	Sw, Cut    float64 // at the outlet
	Zone       Zone    // of the fluid at the outlet
	Average    float64 // mean saturation
	Recovery   float64 // savg - Si: the oil displaced, negative where water is
	Oil, Water float64 // cumulative outflow
	Carried    Balance // what rides along
}

// Balance is where what rides along has gone, in pore volumes of injected water: for a
// solute the unit is what one pore volume of it holds, for heat the same of C_w - C_o
// above the initial temperature.
type Balance struct {
	Injected, Stored, Produced float64 // Stored: in water, oil and rock
}

// After returns the state when q pore volumes have been injected:
//
//	savg = S_out + Q (f_inlet - f_out),  water = Q f_inlet - (savg - Si),  oil = Q - water
//
// with the f of the fluid at the outlet, and for what rides along
//
//	injected = Q (f_inlet + a),  produced = Q (f_out + a) - (S_out + b)
//
// the latter once the front has arrived.
//
// Source: Welge (1952), average saturation; the same integral of the second balance.
func (f *Flood) After(q float64) State {
	if !(q > 0) {
		return State{Sw: f.initial, Cut: f.node(Ahead, f.initial, 0).F, Zone: Ahead, Average: f.initial}
	}
	n := f.At(1 / q)
	gain := n.S - f.initial + q*(f.face.F-n.F)
	s := State{
		Sw: n.S, Cut: n.F, Zone: n.Zone, Average: f.initial + gain, Recovery: gain,
		Water: q*f.face.F - gain, Oil: gain + q*(1-f.face.F),
		Carried: Balance{Injected: q * (f.face.F + f.pivot.A)},
	}
	if n.Zone == Behind {
		s.Carried.Produced = math.Max(0, q*(n.F+f.pivot.A)-(n.S+f.pivot.B))
	}
	s.Carried.Stored = s.Carried.Injected - s.Carried.Produced
	return s
}

// PVIAtCut is the Q from which on the water cut at the outlet (reservoir conditions) is
// at least cut for good; a bank of oil may have put it below before. A cut inside a jump
// is reached when the jump arrives. ok is false when the injected stream itself is below.
func (f *Flood) PVIAtCut(cut float64) (q float64, ok bool) {
	n := f.nodes
	k := slices.IndexFunc(n, func(n Node) bool { return !(n.F >= cut) })
	switch {
	case k == 0:
		return 0, false
	case k < 0:
		return 0, true
	}
	a, b := n[k-1], n[k]
	if a.Xi == b.Xi || a.F == cut {
		return 1 / a.Xi, a.Xi > 0
	}
	fn := f.fn[a.Zone.index()]
	s := numeric.Zero(func(s float64) float64 {
		flow, _ := fn.At(s)
		return flow - cut
	}, a.S, b.S, a.F-cut, b.F-cut)
	_, xi := fn.At(s)
	xi = math.Max(a.Xi, math.Min(b.Xi, xi))
	return 1 / xi, xi > 0
}
