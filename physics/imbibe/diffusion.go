package imbibe

import (
	"fmt"
	"math"
	"slices"
)

// Names of inputs in an InputError that a caller may know as fields of its own.
const (
	BadInitial = "initial water saturation"
	BadInlet   = "water saturation at the open face"
	BadRatio   = "ratio of total to imbibed flow"
)

// InputError is an input that cannot be used.
type InputError struct {
	Name    string
	Value   float64
	Allowed string
}

// Error implements error.
func (e *InputError) Error() string {
	return fmt.Sprintf("imbibe: %s is %.6g; it must be %s", e.Name, e.Value, e.Allowed)
}

// Diffusion is the capillary diffusion Dc (m2/s) at sw, inside the range that both
// curves share.
//
//	Dc = k lw lo/(lw + lo) |dPc/dSw|,  lw = krw/muw, lo = kro/muo
//
// It carries no porosity. Towards an end it may vanish or grow without bound; at such an
// end itself it may be NaN: see Span for values that hold up to both ends.
// Source: McWhorter & Sunada (1990), eq. 10, from memory.
func (r Rock) Diffusion(sw float64) float64 {
	d, _, _ := r.state(sw)
	return d
}

// FractionalFlow is f = lw/(lw + lo) at sw, without gravity, and its slope.
func (r Rock) FractionalFlow(sw float64) (f, dfds float64) {
	_, f, dfds = r.state(sw)
	return f, dfds
}

func (r Rock) state(sw float64) (d, f, dfds float64) {
	p := r.Kr.At(sw)
	_, slope := r.Pc.At(sw)
	lw, lo := p.Krw/r.WaterViscosity, p.Kro/r.OilViscosity
	lt := lw + lo
	f = lw / lt
	dfds = p.DKrw/r.WaterViscosity/lt*(lo/lt) - f*(p.DKro/r.OilViscosity/lt)
	if lw == 0 || lo == 0 { // also where the slope of Pc is infinite: nothing flows
		return 0, f, dfds
	}
	return r.Permeability * (f * lo * -slope), f, dfds
}

// Ends is the range of saturations that the curves of both kinds share.
func (r Rock) Ends() (low, high float64) {
	low, high = r.Kr.Ends()
	pcLow, pcHigh := r.Pc.Ends()
	return max(low, pcLow), min(high, pcHigh)
}

// Inlet is the saturation at which rock that touches water stops soaking: where Pc
// falls to zero, or the upper end of the range when it stays positive.
func (r Rock) Inlet() float64 {
	low, high := r.Ends()
	if pc, _ := r.Pc.At(high); pc >= 0 {
		return high
	}
	for {
		middle := low + (high-low)/2
		if middle <= low || middle >= high {
			return high
		}
		if pc, _ := r.Pc.At(middle); pc > 0 {
			low = middle
		} else {
			high = middle
		}
	}
}

// Span is a rock between the water that it holds at the start, Initial, and that at its
// open face, Inlet; where Dc vanishes in a whole stretch below the latter, Inlet is the foot of
// that stretch, see spreads. It evaluates by the distance from either end, without the digits
// that S - Initial loses there, and knows how Dc behaves at both:
//
//	Dc -> c (S - Initial)^LowPower,  Dc -> c (Inlet - S)^HighPower
//
// A power is 0 where Dc is finite and not zero, positive where it vanishes, negative where
// it is singular, and +Inf where nothing flows in a whole neighbourhood of the end.
type Span struct {
	Rock
	Initial, Inlet      float64
	LowPower, HighPower float64
	low, high           edge
	start, startSlope   float64 // f and its slope at Initial
}

// edge is the distance from an end inside which the power law stands for Dc, and Dc there.
type edge struct{ at, value float64 }

// edgeShare is the distance, as a share of the span, at which the power laws take over.
// Curves of the trade differ from their leading power by about that share; nearer, too few
// floating point numbers are left between S and its end.
const edgeShare = 0x1p-40

// leastWidth is the narrowest span of saturations that can be told from none.
const leastWidth = 1e-9

// NewSpan checks the rock and the two saturations. An Inlet of NaN stands for Rock.Inlet.
// Errors are *InputError.
func NewSpan(rock Rock, initial, inlet float64) (*Span, error) {
	for _, v := range []struct {
		name  string
		value float64
		most  float64
	}{
		{"permeability", rock.Permeability, math.MaxFloat64}, {"porosity", rock.Porosity, 1},
		{"water viscosity", rock.WaterViscosity, math.MaxFloat64}, {"oil viscosity", rock.OilViscosity, math.MaxFloat64},
	} {
		if !(v.value > 0 && v.value <= v.most) {
			return nil, &InputError{v.name, v.value, "above 0, and a porosity at most 1"}
		}
	}
	low, high := rock.Ends()
	stop := rock.Inlet()
	if math.IsNaN(inlet) {
		inlet = stop
	}
	if !(initial >= low && initial < high) {
		return nil, &InputError{BadInitial, initial, fmt.Sprintf("from %.6g, where the curves begin, to below %.6g", low, high)}
	}
	if initial >= stop-leastWidth {
		return nil, &InputError{BadInitial, initial, fmt.Sprintf("below %.6g, where the capillary pressure is zero: above it the rock does not soak", stop)}
	}
	if !(inlet-initial > leastWidth && inlet <= high) {
		return nil, &InputError{BadInlet, inlet, fmt.Sprintf("above the initial %.6g, at most %.6g", initial, high)}
	}
	s := &Span{Rock: rock, Initial: initial, Inlet: rock.spreads(initial, inlet)}
	inlet = s.Inlet
	s.start, s.startSlope = rock.FractionalFlow(initial)
	near := max(edgeShare*(inlet-initial), 0x1p-48) // some floating point numbers away at least
	s.low, s.LowPower = power(near, func(u float64) (float64, float64) { sw := initial + u; return rock.Diffusion(sw), sw - initial })
	s.high, s.HighPower = power(near, func(t float64) (float64, float64) { sw := inlet - t; return rock.Diffusion(sw), inlet - sw })
	if d := rock.Diffusion(initial); d > 0 && !math.IsInf(d, 1) {
		s.LowPower = 0
	}
	return s, nil
}

// spreads is the top of the states below inlet in which the water spreads: next to the face Dc may
// vanish in a whole stretch, of a table whose Pc is level or whose oil no longer flows. The saturation
// then jumps at the face itself, and inwards all is as if the face were held at the foot of that
// stretch. It is inlet where Dc vanishes all the way.
func (r Rock) spreads(initial, inlet float64) float64 {
	edges := []float64{initial}
	for _, k := range slices.Concat(r.Kr.Knots(), r.Pc.Knots()) {
		if k > initial && k < inlet {
			edges = append(edges, k)
		}
	}
	slices.Sort(edges)
	top := inlet
	for i := len(edges) - 1; i >= 0; i-- {
		if r.Diffusion(edges[i]+(top-edges[i])/2) > 0 {
			return top
		}
		top = edges[i]
	}
	return inlet
}

// power measures the leading power of a function at distance 0 from its values at near, 16
// near and 256 near, of which the function also returns where it really looked. What the
// local power owes to the distance is taken to grow with it.
func power(near float64, at func(float64) (value, distance float64)) (edge, float64) {
	v0, d0 := at(near)
	v1, d1 := at(16 * near)
	v2, d2 := at(256 * near)
	if v0 == 0 || v1 == 0 || v2 == 0 {
		return edge{near, 0}, math.Inf(1)
	}
	p := math.Log(v1/v0) / math.Log(d1/d0)
	p -= (math.Log(v2/v1)/math.Log(d2/d1) - p) / 15
	if math.Abs(p) < 1e-6 {
		p = 0
	}
	return edge{d0, v0}, p
}

// Width is Inlet - Initial.
func (s *Span) Width() float64 { return s.Inlet - s.Initial }

// FiniteFront reports whether the water advances with a front: where Dc vanishes at
// Initial. Otherwise its tail thins out without end.
func (s *Span) FiniteFront() bool { return s.LowPower > 0 }

// FromInitial is Dc at Initial + u, 0 < u <= Width, and how far f has risen from its value at
// Initial.
func (s *Span) FromInitial(u float64) (d, rise float64) {
	if u < s.low.at {
		if s.start == 0 { // f begins as a power of its own, at least the first
			_, rise = s.FromInitial(s.low.at)
			return s.low.extend(u, s.LowPower), rise * u / s.low.at
		}
		return s.low.extend(u, s.LowPower), s.startSlope * u
	}
	sw := s.Initial + u
	d, f, _ := s.state(sw)
	rise = f - s.start
	if s.start > 0 && u < 0x1p-26*s.Width() { // the difference has fewer digits than the slope
		rise = s.startSlope * u
	}
	return correct(d, u, sw-s.Initial, s.LowPower), rise
}

// FromInlet is Dc at Inlet - t, 0 < t <= Width, and how far f has risen from its value at
// Initial.
func (s *Span) FromInlet(t float64) (d, rise float64) {
	sw := s.Inlet - t
	if t < s.high.at {
		f, _ := s.FractionalFlow(sw)
		return s.high.extend(t, s.HighPower), f - s.start
	}
	d, f, _ := s.state(sw)
	return correct(d, t, s.Inlet-sw, s.HighPower), f - s.start
}

// extend is the power law at a distance inside the edge.
func (e edge) extend(distance, power float64) float64 {
	if e.value == 0 {
		return 0
	}
	return e.value * math.Pow(distance/e.at, power)
}

// correct carries a value seen at one distance to a neighbouring one by its power, to
// first order; they differ by the rounding of S.
func correct(value, wanted, seen, power float64) float64 {
	if math.IsInf(power, 1) {
		return value
	}
	return value * (1 + power*(wanted/seen-1))
}
