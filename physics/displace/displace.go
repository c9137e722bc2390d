// Package displace turns the waves of a displacement into what is asked of it: the
// profile, the break-through, what leaves at the outlet, and the recovery.
//
// Everything is dimensionless. Q is the volume of total fluid injected in pore
// volumes, xi = x/(L Q) the place divided by Q: a state that travels at speed v is at
// xi = v. The outlet is at xi = 1/Q.
package displace

import (
	"math"
	"sort"

	"brinefront/physics/fracflow"
	"brinefront/physics/numeric"
)

// Node is a point on the way from the inlet face to the initial state.
type Node struct {
	S, Xi, F float64 // saturation, speed, fractional flow
}

// Displacement is the solution for one injected and one initial state.
//
// Waves of speed <= 0 never enter: the inlet face then holds the state of largest f
// (least, when saturation rises outwards), where f may exceed 1, which is oil leaving
// at the inlet.
//
// Sources: Buckley & Leverett (1942); Welge (1952); fracflow.Solve.
type Displacement struct {
	fn                fracflow.Function
	injected, initial float64
	waves             []fracflow.Wave
	nodes             []Node // from the inlet face outwards, Xi rising; empty when nothing moves
	face, ahead       Node   // the inlet face (Xi 0) and the initial state
}

// New solves the displacement of the initial state by the injected one. Errors are
// those of fracflow.Solve.
func New(fn fracflow.Function, injected, initial float64) (*Displacement, error) {
	waves, err := fracflow.Solve(fn, injected, initial)
	if err != nil {
		return nil, err
	}
	lo, hi := fn.Ends()
	d := &Displacement{fn: fn, waves: waves}
	d.injected = math.Max(lo, math.Min(hi, injected))
	d.initial = math.Max(lo, math.Min(hi, initial))
	d.ahead = d.state(d.initial)
	d.face = d.ahead
	d.trace()
	if len(d.nodes) > 0 {
		d.face = Node{S: d.nodes[0].S, F: d.nodes[0].F}
	}
	return d, nil
}

func (d *Displacement) state(s float64) Node {
	f, _ := d.fn.At(s)
	return Node{S: s, F: f}
}

// trace lays nodes along the waves that enter: both ends of each, and samples inside
// fans between which df/ds is monotone.
func (d *Displacement) trace() {
	fans := 0
	for _, w := range d.waves {
		if w.Kind == fracflow.Fan && w.SpeedAhead > 0 {
			fans++
		}
	}
	for _, w := range d.waves {
		switch {
		case w.SpeedAhead <= 0:
		case w.Kind == fracflow.Shock:
			d.push(w.Behind, w.SpeedBehind)
			d.push(w.Ahead, w.SpeedAhead)
		default:
			d.traceFan(w, 64/fans)
		}
	}
}

func (d *Displacement) push(s, xi float64) {
	n := d.state(s)
	n.Xi = xi
	d.nodes = append(d.nodes, n)
}

func (d *Displacement) traceFan(w fracflow.Wave, budget int) {
	from := w.Behind
	if w.SpeedBehind < 0 {
		from = d.solve(0, w.Behind, w.Ahead, w.SpeedBehind, w.SpeedAhead)
	}
	xi := math.Max(0, w.SpeedBehind)
	d.push(from, xi)
	samples := fracflow.Samples(d.fn, from, w.Ahead, budget)
	for _, p := range samples[1 : len(samples)-1] {
		if p.Above < xi { // rounding of df/ds
			continue
		}
		xi = math.Min(p.Above, w.SpeedAhead)
		d.nodes = append(d.nodes, Node{S: p.S, Xi: xi, F: p.F})
	}
	d.push(w.Ahead, w.SpeedAhead)
}

// solve finds the state of speed xi between a and b, whose speeds va and vb hold xi between them.
func (d *Displacement) solve(xi, a, b, va, vb float64) float64 {
	return numeric.Zero(func(s float64) float64 {
		_, v := d.fn.At(s)
		return v - xi
	}, a, b, va-xi, vb-xi)
}

// Waves returns all waves, from the inlet outwards, those that never enter included.
func (d *Displacement) Waves() []fracflow.Wave { return d.waves }

// Path returns the states between the inlet face and the initial state, Xi rising.
// Two nodes of one Xi bound a shock, two of one S a constant state; between any other
// two Xi is monotone in S. Empty when nothing moves. Not to be written to.
func (d *Displacement) Path() []Node { return d.nodes }

// InletFace returns saturation and fractional flow at the inlet face.
func (d *Displacement) InletFace() (s, f float64) { return d.face.S, d.face.F }

// Injected and Initial return the two states.
func (d *Displacement) Injected() float64 { return d.injected }
func (d *Displacement) Initial() float64  { return d.initial }

// FrontSpeed is the speed of the foremost wave; 0 when nothing moves.
func (d *Displacement) FrontSpeed() float64 {
	if len(d.nodes) == 0 {
		return 0
	}
	return d.nodes[len(d.nodes)-1].Xi
}

// Front returns the jump at the head of the displacement: the states behind and ahead
// of the foremost wave when that is a shock; ok is false when a fan leads or nothing moves.
func (d *Displacement) Front() (behind, ahead float64, ok bool) {
	if len(d.nodes) == 0 {
		return 0, 0, false
	}
	w := d.waves[len(d.waves)-1]
	return w.Behind, w.Ahead, w.Kind == fracflow.Shock
}

// Breakthrough is the PVI at which the foremost wave reaches the outlet; +Inf when
// nothing moves.
func (d *Displacement) Breakthrough() float64 { return 1 / d.FrontSpeed() }

// Saturation is the state at xi = x/(L Q): the inlet face for xi <= 0, the initial state
// ahead of the foremost wave, and at a shock the state behind it.
func (d *Displacement) Saturation(xi float64) float64 { return d.at(xi).S }

// at returns the state at xi together with its fractional flow.
func (d *Displacement) at(xi float64) Node {
	k := sort.Search(len(d.nodes), func(i int) bool { return d.nodes[i].Xi >= xi })
	switch {
	case k == len(d.nodes):
		return Node{d.ahead.S, xi, d.ahead.F}
	case k == 0 || d.nodes[k].Xi == xi:
		return Node{d.nodes[k].S, xi, d.nodes[k].F}
	}
	a, b := d.nodes[k-1], d.nodes[k]
	if a.S == b.S {
		return Node{a.S, xi, a.F}
	}
	n := d.state(d.solve(xi, a.S, b.S, a.Xi, b.Xi))
	n.Xi = xi
	return n
}

// Outlet returns saturation and water cut (reservoir conditions) at the outlet when Q
// pore volumes have been injected: the state behind a shock that just arrives. The cut
// leaves [0, 1] where flow is counter-current.
func (d *Displacement) Outlet(q float64) (sw, f float64) {
	s := d.After(q)
	return s.Sw, s.Cut
}

// State is the displacement after Q pore volumes, all in pore volumes at reservoir
// conditions.
type State struct {
	Sw, Cut    float64 // at the outlet
	Average    float64 // mean saturation
	Recovery   float64 // savg - Si: the oil displaced, negative where water is
	Oil, Water float64 // cumulative outflow
}

// After returns the state when q pore volumes have been injected:
//
//	savg  = S_out + Q (f_inlet - f_out)
//	water = Q f_inlet - (savg - Si),  oil = Q - water
//
// which is Welge's tangent for any number of waves. Before break-through the recovery
// is Q (f_inlet - f(Si)). Oil produced differs from recovery where the injected stream
// holds oil, or where oil leaves at the inlet.
//
// Source: Welge (1952), average saturation, with the fractional flow of the inlet face for 1.
func (d *Displacement) After(q float64) State {
	if !(q > 0) {
		return State{Sw: d.initial, Cut: d.ahead.F, Average: d.initial}
	}
	n := d.at(1 / q)
	gain := (n.S - d.initial) + q*(d.face.F-n.F)
	if q <= d.Breakthrough() {
		gain = q * (d.face.F - d.ahead.F) // the same without cancellation: no trace of water before there is any
	}
	return State{
		Sw: n.S, Cut: n.F, Average: d.initial + gain, Recovery: gain,
		Oil: gain + q*(1-d.face.F), Water: q*d.face.F - gain,
	}
}

// Average is the mean saturation; see After.
func (d *Displacement) Average(q float64) float64 { return d.After(q).Average }

// Recovery is savg - Si in pore volumes; see After.
func (d *Displacement) Recovery(q float64) float64 { return d.After(q).Recovery }

// OfOilInPlace turns a recovery in pore volumes into a fraction of the oil in place, 1 - Si.
func (d *Displacement) OfOilInPlace(recovery float64) float64 { return recovery / (1 - d.initial) }

// OfMovableOil turns a recovery in pore volumes into a fraction of the movable oil, what
// endless injection displaces: the change from the initial saturation to that of the
// inlet face.
func (d *Displacement) OfMovableOil(recovery float64) float64 {
	return recovery / (d.face.S - d.initial)
}

// PVIAtCut is the first Q at which the water cut at the outlet (reservoir conditions)
// is at least f. A cut inside the jump of a shock is reached when that shock arrives.
// ok is false when it is never reached.
func (d *Displacement) PVIAtCut(f float64) (q float64, ok bool) {
	if d.ahead.F >= f {
		return 0, true
	}
	// From the outlet inwards f rises along the waves when water displaces, else it falls.
	n := d.nodes
	k := sort.Search(len(n), func(i int) bool { return !(n[i].F >= f) })
	if k == 0 {
		return 0, false
	}
	if k == len(n) || n[k-1].Xi == n[k].Xi || n[k-1].F == f {
		return 1 / n[k-1].Xi, n[k-1].Xi > 0
	}
	a, b := n[k-1], n[k]
	s := numeric.Zero(func(s float64) float64 {
		g, _ := d.fn.At(s)
		return g - f
	}, a.S, b.S, a.F-f, b.F-f)
	_, v := d.fn.At(s)
	v = math.Max(a.Xi, math.Min(b.Xi, v))
	return 1 / v, v > 0
}
