package ride

import (
	"fmt"
	"math"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
)

// Zone tells which fluid a state or a wave belongs to.
type Zone string

const (
	Behind Zone = "behind" // the injected fluid
	Ahead  Zone = "ahead"  // the fluid in place, or what has lost its passenger
	Front  Zone = "front"  // the change from the one to the other
)

// index is the place of a zone's curve in a Flood.
func (z Zone) index() int {
	if z == Behind {
		return 0
	}
	return 1
}

// Wave is one wave of the flood. That of zone Front is the front of what rides along; it is
// a jump whose two saturations are equal for a tracer.
type Wave struct {
	fracflow.Wave
	Zone Zone
}

// Node is a point on the way from the inlet face to the initial state.
type Node struct {
	S, Xi, F float64 // saturation, speed, fractional flow of the fluid there
	Zone     Zone    // Behind or Ahead
}

// Flood is the solution for one injected and one initial state, continuous injection.
// As in displace, Q is pore volumes injected, xi = x/(L Q), and the outlet is at xi = 1/Q.
type Flood struct {
	pivot             Pivot
	injected, initial float64
	fn                [2]fracflow.Function // behind, ahead; of one range
	back, fore        *displace.Displacement
	speed             float64
	left, right       spot // states beside the front
	face              Node
	nodes             []Node
	waves             []Wave
}

// New solves the flood of a rock that holds the fluid ahead at the initial saturation
// by the fluid behind at the injected one. See the package comment for the method.
//
// Errors tell of a state outside the range of its curve, a pivot that is not allowed, a
// fractional flow that is not finite, and a front that does not enter because nothing
// flows in at the injected state.
func New(ahead, behind fracflow.Function, pivot Pivot, injected, initial float64) (*Flood, error) {
	injected, err := within(behind, "injected", injected)
	if err != nil {
		return nil, err
	}
	if initial, err = within(ahead, "initial", initial); err != nil {
		return nil, err
	}
	ahead, behind = levelled(ahead, behind)
	lo, hi := behind.Ends()
	if err := pivot.check(lo); err != nil {
		return nil, err
	}
	f := &Flood{pivot: pivot, injected: injected, initial: initial, fn: [2]fracflow.Function{behind, ahead}}
	inner, err := newRays(behind, pivot)
	if err != nil {
		return nil, err
	}
	outer, err := newRays(ahead, pivot)
	if err != nil {
		return nil, err
	}
	f.speed = math.Min(inner.feeds(injected).speed, outer.takes(initial).speed)
	if !(f.speed > 0) {
		return nil, fmt.Errorf("ride: at the injected saturation %.6g no water flows in to carry a front; inject at a higher one, up to %.6g", injected, hi)
	}
	f.left, f.right = inner.behind(injected, f.speed), outer.ahead(initial, f.speed)
	if f.back, err = displace.New(behind, injected, f.left.s); err != nil {
		return nil, err
	}
	if f.fore, err = displace.New(ahead, f.right.s, initial); err != nil {
		return nil, err
	}
	// A first wave ahead as fast as the front leaves no room for a bank: one jump.
	if w := f.fore.Waves(); len(w) > 0 && w[0].Kind == fracflow.Shock && w[0].SpeedBehind-f.speed <= alike*f.speed {
		f.right = outer.at(w[0].Ahead)
		if f.fore, err = displace.New(ahead, f.right.s, initial); err != nil {
			return nil, err
		}
	}
	f.lay()
	return f, nil
}

// within checks a state against the range of fn and clears it of rounding.
func within(fn fracflow.Function, name string, s float64) (float64, error) {
	lo, hi := fn.Ends()
	const slack = 1e-12
	if !(s >= lo-slack && s <= hi+slack) {
		return s, fmt.Errorf("ride: %s saturation is %.6g; it must lie between %.6g and %.6g", name, s, lo, hi)
	}
	return math.Max(lo, math.Min(hi, s)), nil
}

// lay puts waves and nodes of both sides in a row, the front between them. What rounding
// makes of speeds beside the front is set right.
func (f *Flood) lay() {
	v := f.speed
	for _, w := range f.back.Waves() {
		w.SpeedBehind, w.SpeedAhead = math.Min(w.SpeedBehind, v), math.Min(w.SpeedAhead, v)
		f.waves = append(f.waves, Wave{w, Behind})
	}
	f.waves = append(f.waves, Wave{fracflow.Wave{Kind: fracflow.Shock, Behind: f.left.s, Ahead: f.right.s, SpeedBehind: v, SpeedAhead: v}, Front})
	for _, w := range f.fore.Waves() {
		w.SpeedBehind, w.SpeedAhead = math.Max(w.SpeedBehind, v), math.Max(w.SpeedAhead, v)
		f.waves = append(f.waves, Wave{w, Ahead})
	}
	for _, n := range f.back.Path() {
		f.nodes = append(f.nodes, Node{n.S, math.Min(n.Xi, v), n.F, Behind})
	}
	f.nodes = append(f.nodes, Node{f.left.s, v, f.left.f, Behind}, Node{f.right.s, v, f.right.f, Ahead})
	for _, n := range f.fore.Path() {
		f.nodes = append(f.nodes, Node{n.S, math.Max(n.Xi, v), n.F, Ahead})
	}
	f.face = Node{f.nodes[0].S, 0, f.nodes[0].F, Behind}
}

// Waves returns all waves from the inlet outwards, speeds rising; those of speed <= 0
// never enter. One is the Front. Not to be written to.
func (f *Flood) Waves() []Wave { return f.waves }

// Path returns the states between the inlet face and the initial state, Xi rising. Two
// nodes of one Xi bound a jump, two of one S a constant state; between any other two
// of one zone Xi is monotone in S. Not to be written to.
func (f *Flood) Path() []Node { return f.nodes }

// Pivot, Injected and Initial return what was given.
func (f *Flood) Pivot() Pivot      { return f.pivot }
func (f *Flood) Injected() float64 { return f.injected }
func (f *Flood) Initial() float64  { return f.initial }

// InletFace returns the state at the inlet face, where f exceeds 1 when oil leaves there.
func (f *Flood) InletFace() Node { return f.face }

// Front returns the speed of the front of what rides along, and the states on both sides.
func (f *Flood) Front() (speed float64, behind, ahead Node) {
	return f.speed, Node{f.left.s, f.speed, f.left.f, Behind}, Node{f.right.s, f.speed, f.right.f, Ahead}
}

// Arrival is the PVI at which the front of what rides along reaches the outlet.
func (f *Flood) Arrival() float64 { return 1 / f.speed }

// Bank returns the constant state between the front and the first wave ahead of it, and
// the speed of that wave, its leading edge. ok is false when there is none: the front
// meets the initial state, or one jump does for both, or a fan begins right at the front.
func (f *Flood) Bank() (bank Node, edge float64, ok bool) {
	w := f.fore.Waves()
	if len(w) == 0 || w[0].SpeedBehind-f.speed <= alike*f.speed {
		return Node{}, 0, false
	}
	return Node{f.right.s, f.speed, f.right.f, Ahead}, w[0].SpeedBehind, true
}

// Breakthrough is the PVI at which the foremost wave reaches the outlet.
func (f *Flood) Breakthrough() float64 { return 1 / f.nodes[len(f.nodes)-1].Xi }
