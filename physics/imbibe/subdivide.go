package imbibe

import "math"

// Subdivided is a block of one axis as a simulator holds it: a number of cells of one length.
type Subdivided struct {
	Recovery
	Cells int
}

// Subdivide fills an axis on equal cells from its open face inwards, the way to the face being half
// a cell,
//
//	v_i phi dS_i/dt = T_i (Phi_(i-1) - Phi_i) - T_(i+1) (Phi_i - Phi_(i+1))
//
// with two points a flux and Phi the Kirchhoff potential; one cell is the matrix of a dual-porosity model
// with 1/Lc² as shape factor (Kazemi et al. 1976) and the flux over half the reach. Steps are those of
// the fine answer, third order with their error held, so that what is off is off by the cells. It
// runs until half of what can be soaked up is in, and at least to the time given, s. err says when
// steps had to be made too small, or half took a thousand times that time.
func (m *Matrix) Subdivide(axis Axis, cells int, until float64) (Subdivided, error) {
	r := newAxisRun(m, Axis{1, axis.Spread}, cells, usual.tolerance, 0)
	b := Subdivided{Cells: cells}
	scale := m.porosity * axis.Reach * axis.Reach
	for b.last < 0.5 || r.time*scale < until {
		if err := r.advance(math.Inf(1), true); err != nil {
			return b, err
		}
		if r.time*scale > lateSpan*until {
			return b, errStalled
		}
		b.add(r.time*scale, r.mean()/m.width, r.rate/(m.width*scale))
	}
	return b, nil
}
