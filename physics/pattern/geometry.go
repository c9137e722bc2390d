package pattern

import (
	"math"
	"math/cmplx"
	"slices"
)

// Tube is a streamtube of the pattern, from an injector to a producer.
type Tube struct {
	Flow float64 // its share of the flow through the pattern at unit mobility
	Area float64 // its share of the pattern's area
	// V and G are shares, rising from 0 to 1, of the tube's area and of its resistance
	// passed between small circles around the two wells.
	V, G []float64
	// Line is its middle streamline at the same stations, seen from the hub.
	Line []complex128

	core     float64 // fall of potential between the circles
	out      float64 // rate of the outlet over that of the hub
	tangents []complex128
}

// Geometry is a pattern cut into streamtubes. It is not changed once it is made.
type Geometry struct {
	Shape
	// Reversed says that the hub produces. Flow and arrival at unit mobility are the same
	// either way; a displacement is not.
	Reversed bool
	Area     float64 // of the pattern, in units of d²
	Tubes    []Tube
	Outline  []complex128 // corners of the part of the pattern that the tubes fill; its mirror images make the whole
	Wells    []complex128 // those of its corners, the hub first

	near    float64
	element *element // nil for a radial flow
}

// The numbers of tubes that a pattern is cut into.
const (
	LeastTubes = 4
	MostTubes  = 100
)

// span is how far levels of the potential lie apart at most, in units in which it falls
// by one as the distance from a well grows e-fold.
const span = 0.3

// New cuts a pattern into n streamtubes of equal flow, or nearly so where it parts between
// two kinds of wells: each part then has tubes of its own. Errors are *InputError.
//
// The area of a tube between two potentials is integrated across it as well as along it,
// so that the areas of all add up to the pattern's. Where a tube runs along a place at which
// the flow stands still the area per stream function grows without bound like a logarithm;
// there the stream function is taken as a cube.
func New(shape Shape, n int) (*Geometry, error) {
	if !(n >= LeastTubes && n <= MostTubes) {
		return nil, &InputError{"the number of streamtubes", float64(n), "between 4 and 100"}
	}
	if shape.Kind == Radial {
		return radial(shape), nil
	}
	e, err := shape.element()
	if err != nil {
		return nil, err
	}
	g := &Geometry{Shape: shape, Area: e.area, Outline: e.outline, Wells: []complex128{0}, near: e.near, element: &e}
	for i, s := range e.sectors {
		g.Wells = append(g.Wells, e.wells[s.outlet].at)
		part := (s.to - s.from) / e.angle()
		count := int(math.Max(1, math.Round(part*float64(n))))
		if last := n - len(g.Tubes); i == len(e.sectors)-1 && last > 0 {
			count = last
		}
		levels := e.levels(s, span)
		for k := range count {
			width := (s.to - s.from) / float64(count)
			g.Tubes = append(g.Tubes, e.tube(s, levels, s.from+float64(k)*width, width))
		}
	}
	return g, nil
}

// angle is how much of the hub's flow starts into the element.
func (e *element) angle() float64 { return e.sectors[len(e.sectors)-1].to - e.sectors[0].from }

// tube is the one between two streamlines of a sector.
func (e *element) tube(s sector, levels []float64, from, width float64) Tube {
	n := len(levels) - 1
	line, middle := make([]station, n+1), make([]station, n+1)
	area := make([]float64, n+1)
	whole := 0.0
	add := func(psi, weight float64, line []station) {
		whole += weight * e.trace(s, psi, levels, line)
		for k, st := range line {
			area[k] += weight * st.area
		}
	}
	if s.edge(from, width) == inside { // the three-point rule, with the middle streamline
		add(from+width/2, 4.0/9, middle)
		for _, x := range [2]float64{-math.Sqrt(0.6), math.Sqrt(0.6)} {
			add(from+width*(1+x)/2, 5.0/18, line)
		}
	} else {
		for i, x := range gaussX {
			psi, weight := s.across(from, width, (1+x)/2)
			add(psi, gaussW[i]/2*weight, line)
		}
		e.trace(s, from+width/2, levels, middle)
	}
	t := Tube{
		Flow: width / e.angle(), Area: whole * width / e.angle() * 2 * math.Pi / e.area,
		core: levels[n] - levels[0], out: -e.wells[s.outlet].rate,
	}
	for k, st := range middle {
		t.V, t.G = append(t.V, area[k]/whole), append(t.G, float64(k)/float64(n))
		t.Line = append(t.Line, st.at)
		t.tangents = append(t.tangents, complex(t.core, 0)/e.velocity(st.at))
	}
	t.V[0], t.V[n] = 0, 1 // the circles hold a millionth of it
	return t
}

// edge says on which side of a tube the flow stands still somewhere.
func (s sector) edge(from, width float64) side {
	const close = 1e-9
	for _, p := range s.stops {
		switch {
		case math.Abs(p.psi-from) < close*width:
			return first
		case math.Abs(p.psi-from-width) < close*width:
			return last
		}
	}
	return inside
}

type side int

const (
	inside side = iota
	first
	last
)

// across is the stream function at the share u of the width of a tube at an edge, and its
// weight there.
func (s sector) across(from, width, u float64) (psi, weight float64) {
	if s.edge(from, width) == first {
		return from + width*u*u*u, 3 * u * u
	}
	u = 1 - u
	return from + width*(1-u*u*u), 3 * u * u
}

// radial is flow from a well to a circle: V = r²/re² and G = ln r.
func radial(shape Shape) *Geometry {
	const near = 1e-3
	t := Tube{Flow: 1, Area: 1, core: -math.Log(near)}
	n := int(math.Ceil(t.core / span))
	for k := range n + 1 {
		share := float64(k) / float64(n)
		r := complex(math.Pow(near, 1-share), 0)
		t.V, t.G = append(t.V, real(r)*real(r)), append(t.G, share)
		t.Line, t.tangents = append(t.Line, r), append(t.tangents, complex(t.core, 0)*r)
	}
	t.V[0] = 0
	return &Geometry{Shape: shape, Area: math.Pi, Tubes: []Tube{t}, Wells: []complex128{0}, near: near}
}

// Reverse is the pattern whose hub produces.
func (g *Geometry) Reverse() *Geometry {
	turned := *g
	turned.Reversed = !g.Reversed
	turned.Tubes = slices.Clone(g.Tubes)
	for i := range turned.Tubes {
		t := &turned.Tubes[i]
		t.V, t.G = mirrored(t.V), mirrored(t.G)
	}
	return &turned
}

// mirrored counts shares from the other end.
func mirrored(shares []float64) []float64 {
	list := make([]float64, len(shares))
	for i, v := range shares {
		list[len(shares)-1-i] = 1 - v
	}
	return list
}

// Front is the place on a tube's middle streamline up to which the share v of its area,
// counted from the injector, is swept.
func (g *Geometry) Front(t Tube, v float64) complex128 {
	v = math.Max(0, math.Min(1, v))
	k := slices.IndexFunc(t.V[1:], func(x float64) bool { return x >= v })
	u := (v - t.V[k]) / (t.V[k+1] - t.V[k])
	if g.Reversed {
		k, u = len(t.V)-2-k, 1-u
	}
	// The cubic through both stations along both tangents.
	h := complex(1/float64(len(t.V)-1), 0)
	a, b := t.Line[k], t.Line[k+1]
	p, q := complex(u, 0), complex(1-u, 0)
	return q*q*(a*(1+2*p)+within(h*t.tangents[k], b-a)*p) + p*p*(b*(1+2*q)-within(h*t.tangents[k+1], b-a)*q)
}

// within shortens a tangent to so many chords that its cubic does not overshoot: where the
// flow nearly stands still it would (Fritsch & Carlson 1980, a sufficient bound).
func within(tangent, chord complex128) complex128 {
	const most = 3
	if long := cmplx.Abs(tangent) / cmplx.Abs(chord); long > most {
		return tangent * complex(most/long, 0)
	}
	return tangent
}
