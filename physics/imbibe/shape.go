package imbibe

import "math"

// Axis is one direction in which a block soaks: from an open face inwards to where
// nothing flows any more, a closed face or the middle between two open ones.
type Axis struct {
	Reach  float64 // m, from the open face to where nothing flows; above 0
	Spread int     // how the flow converges: 0 between parallel faces, 1 to a line, 2 to a point
}

// Shape is a block and the faces that are open to water: the product of its axes, each
// of which the block is cut square to. A slab or a box has up to three axes of Spread 0, a
// cylinder one of Spread 1 and, when its ends are open, one of Spread 0, a sphere one of
// Spread 2. It has at least one axis; faces that belong to none are closed.
type Shape []Axis

// Slab soaks between parallel faces, one or two of which are open, a thickness apart.
func Slab(thickness float64, open int) Shape { return Shape{{Reach: thickness / float64(open)}} }

// Cylinder soaks through its side and through none, one or both of its ends. The side
// or an end must be open.
func Cylinder(diameter, length float64, side bool, ends int) Shape {
	var s Shape
	if side {
		s = Shape{{Reach: diameter / 2, Spread: 1}}
	}
	if ends > 0 {
		s = append(s, Slab(length, ends)...)
	}
	return s
}

// Sphere soaks through all of its surface.
func Sphere(diameter float64) Shape { return Shape{{Reach: diameter / 2, Spread: 2}} }

// Box has edges and, along each, none, one or both of its faces open; at least one in all.
func Box(edges [3]float64, open [3]int) Shape {
	var s Shape
	for i, edge := range edges {
		if open[i] > 0 {
			s = append(s, Slab(edge, open[i])...)
		}
	}
	return s
}

// Scaled is the same shape, every length times a factor.
func (s Shape) Scaled(factor float64) Shape {
	out := make(Shape, len(s))
	for i, a := range s {
		out[i] = Axis{a.Reach * factor, a.Spread}
	}
	return out
}

// over is sum of (n+1)/reach^p over the axes, n their spread.
func (s Shape) over(p float64) (sum float64) {
	for _, a := range s {
		sum += float64(a.Spread+1) / math.Pow(a.Reach, p)
	}
	return sum
}

// CharacteristicLength (m) is that of Ma, Morrow and Zhang (1997),
//
//	Lc = sqrt(V / sum(Ai/li))
//
// V the volume, Ai the area of each open face and li its distance to where nothing flows.
// Each axis adds (n+1)/reach² to 1/Lc².
func (s Shape) CharacteristicLength() float64 { return 1 / math.Sqrt(s.over(2)) }

// OpenArea is the area of the open faces over the volume, 1/m: what early soaking is
// in proportion to, q = A OpenArea t^-1/2 for each volume of block.
func (s Shape) OpenArea() float64 { return s.over(1) }

// The shape factors of the literature, 1/m², for an exchange
//
//	dS/dt = factor D (S0 - S)/phi
//
// They differ by what their authors took for the gradient, not by the block: with two open
// faces L apart along each of three axes they are 12, 29.6 and 60 over L².

// Kazemi is the shape factor of Kazemi et al. (1976), 4 sum(1/L²) for a box open on all
// sides; for any other shape the form of Kazemi, Gilman and Elsharkawy (1992),
//
//	factor = (1/V) sum(Ai/li) = 1/Lc²
//
// which takes the gradient as a straight line from the face to the middle. It is exact
// for no time: the mean lies not at the middle.
func (s Shape) Kazemi() float64 { return s.over(2) }

// LimAziz is the shape factor of Lim and Aziz (1995): the slowest mode of diffusion at a
// constant diffusivity, exact for its late tail,
//
//	factor = sum(e²/reach²),  e = pi/2, 2.40483, pi for spread 0, 1, 2
//
// A cube of edge L open on all sides has 3 pi²/L² = 29.6/L². (2.40483 is the first zero
// of the Bessel function J0.)
func (s Shape) LimAziz() (factor float64) {
	modes := [...]float64{math.Pi / 2, 2.404825557695773, math.Pi}
	for _, a := range s {
		e := modes[a.Spread] / a.Reach
		factor += e * e
	}
	return factor
}

// WarrenRoot is the shape factor of Warren and Root (1963) for N sets of parallel
// fractures,
//
//	factor = 4 N (N+2)/l²,  l = N / sum(1/L)
//
// which is 12, 32 and 60 over L² for equal spacings L: a flow that has become steady with
// a uniform source in the block, whose mean then lies well above the middle. ok is false
// for cylinders and spheres, and for faces closed opposite an open one it holds for the
// block and its mirror image.
func (s Shape) WarrenRoot() (factor float64, ok bool) {
	n, inverse := float64(len(s)), 0.0
	for _, a := range s {
		if a.Spread > 0 {
			return 0, false
		}
		inverse += 1 / (2 * a.Reach)
	}
	return 4 * (n + 2) * inverse * inverse / n, true
}
