package imbibe

import (
	"fmt"
	"math"
	"slices"

	"brinefront/physics/numeric"
)

// Matrix is rock ready to soak in blocks:
//
//	phi dS/dt = div(Dc(S) grad S),  S = S0 at open faces, Si everywhere at first
//
// It remembers what it has computed: ask one Matrix for all blocks of a rock. It is not
// for use by several goroutines at once.
type Matrix struct {
	porosity, initial, width float64 // width is S0 - Si
	nodes                    []float64
	cells                    []numeric.Cell // the potential against u = S - Si, with Dc as its slope
	opened                   float64        // int_Si^S0 Dc dS: the potential is -opened at Si, 0 at S0
	early                    float64        // share over sqrt(t), s^-1/2, of a half space for each 1/m of open area
	axes                     [maxSpread + 1]*axisBlock
	blocks                   []*Block
}

// diffusivity is Dc by the distance from either end, as in Span.
type diffusivity interface {
	FromInitial(u float64) (d, rise float64)
	FromInlet(t float64) (d, rise float64)
}

// NewMatrix makes a rock ready to soak from Initial to Inlet. err says why nothing would
// soak in: Dc vanishes all the way.
func NewMatrix(s *Span) (*Matrix, error) {
	var knots []float64
	for _, sw := range append(append(knots, s.Kr.Knots()...), s.Pc.Knots()...) {
		knots = append(knots, sw-s.Initial)
	}
	return newMatrix(s.Porosity, s.Initial, s.Width(), s, knots)
}

// newMatrix tabulates the Kirchhoff potential
//
//	Phi(S) = -int_S^S0 Dc dS
//
// on panels that grow finer towards both ends, where Dc may vanish or grow without bound,
// three points of Gauss and Legendre a panel. Between nodes it is the Hermite cubic of slope
// Dc, kept monotone (Fritsch and Carlson 1980).
func newMatrix(porosity, initial, width float64, d diffusivity, knots []float64) (*Matrix, error) {
	const far = 0.3872983346207417 // sqrt(3/5)/2
	m := &Matrix{porosity: porosity, initial: initial, width: width, nodes: panelNodes(width, knots)}
	for i := 1; i < len(m.nodes); i++ {
		from := m.nodes[i-1]
		w := m.nodes[i] - from
		dc := func(x float64) float64 {
			u := from + x*w
			v, _ := d.FromInitial(u)
			if u > width/2 {
				v, _ = d.FromInlet(width - u)
			}
			return v
		}
		chord := (5*dc(0.5-far) + 8*dc(0.5) + 5*dc(0.5+far)) / 18
		d0, d1 := dc(1e-4), dc(1-1e-4) // one-sided, away from knots and poles
		if r := math.Hypot(d0, d1); r > 3*chord {
			d0, d1 = d0*3*chord/r, d1*3*chord/r
		}
		m.cells = append(m.cells, numeric.Cell{X0: from, X1: m.nodes[i], Y1: chord * w, D0: d0, D1: d1})
	}
	for i := len(m.cells) - 1; i >= 0; i-- { // from S0, where blocks end up
		c := &m.cells[i]
		c.Y0, c.Y1 = -m.opened-c.Y1, -m.opened
		m.opened = -c.Y0
	}
	if !(m.opened > 0) || math.IsInf(m.opened, 1) {
		return nil, fmt.Errorf("imbibe: no block can be computed: the integral of capillary diffusion over saturation is %.6g m2/s; it must be above 0", m.opened)
	}
	return m, nil
}

// panelNodes are even in ln(u/(width-u)), with the knots put in.
func panelNodes(width float64, knots []float64) []float64 {
	const count, reach = 480, 23.0
	nodes := []float64{0}
	for i := 1; i < count; i++ {
		nodes = append(nodes, width/(1+math.Exp(reach*(1-2*float64(i)/count))))
	}
	nodes = append(nodes, width)
	for _, k := range knots {
		if k > 0 && k < width {
			nodes = append(nodes, k)
		}
	}
	slices.Sort(nodes)
	return slices.CompactFunc(nodes, func(a, b float64) bool { return math.Abs(a-b) < 1e-13*width })
}

// at returns the potential and Dc at u = S - Si; guess is the panel to look in first, and
// the panel where it was found is returned. Beyond the ends the potential goes on straight.
func (m *Matrix) at(u float64, guess int) (potential, dc float64, panel int) {
	if c := &m.cells[guess]; u < c.X0 || u > c.X1 {
		guess = numeric.Locate(m.nodes, u)
	}
	c := &m.cells[guess]
	switch {
	case u < c.X0:
		return c.Y0 + c.D0*(u-c.X0), c.D0, guess
	case u > c.X1:
		return c.Y1 + c.D1*(u-c.X1), c.D1, guess
	}
	w := c.X1 - c.X0
	t := (u - c.X0) / w
	rise := (c.Y1 - c.Y0) / w
	quad, cube := 3*rise-2*c.D0-c.D1, c.D0+c.D1-2*rise
	return c.Y0 + w*t*(c.D0+t*(quad+t*cube)), c.D0 + t*(2*quad+3*t*cube), guess
}

// Capacity is what the rock can take up by soaking, in pore volumes: S0 - Si.
func (m *Matrix) Capacity() float64 { return m.width }

// MeanDiffusion is the mean of Dc over saturation between Si and S0, m2/s.
func (m *Matrix) MeanDiffusion() float64 { return m.opened / m.width }
