// Package numeric holds the few numerical methods that the standard library and
// gonum lack: monotone interpolation with slopes, and bracketed roots to the last
// digit. It knows nothing of rocks and fluids.
package numeric

import "math"

// Interpolant is a function through given points.
type Interpolant interface {
	// At returns value and slope. Outside the nodes the end values hold and the
	// slope is zero. At a node the slope is that of the cell to its right, at the
	// last node that of the last cell.
	At(x float64) (value, slope float64)
	// Nodes returns the rising abscissae. They are not to be changed.
	Nodes() []float64
	// Cells returns the intervals between the nodes. They are not to be changed.
	Cells() []Cell
}

// table is what all interpolants of this package are made of.
type table struct {
	nodes []float64
	cells []Cell
}

// Nodes implements Interpolant.
func (t table) Nodes() []float64 { return t.nodes }

// Cells implements Interpolant.
func (t table) Cells() []Cell { return t.cells }

// at evaluates with the given cell function, constant outside the nodes.
func (t table) at(x float64, in func(Cell, float64) (float64, float64)) (value, slope float64) {
	last := len(t.nodes) - 1
	switch {
	case x < t.nodes[0]:
		return t.cells[0].Y0, 0
	case x > t.nodes[last]:
		return t.cells[last-1].Y1, 0
	}
	return in(t.cells[Locate(t.nodes, x)], x)
}

// newTable copies the points; slopes are those of the straight lines until
// somebody knows better.
func newTable(x, y []float64) table {
	checkNodes(x, y)
	t := table{nodes: append([]float64(nil), x...), cells: make([]Cell, len(x)-1)}
	for i := range t.cells {
		chord := (y[i+1] - y[i]) / (x[i+1] - x[i])
		t.cells[i] = Cell{X0: x[i], X1: x[i+1], Y0: y[i], Y1: y[i+1], D0: chord, D1: chord}
	}
	return t
}

// Linear joins points by straight lines.
type Linear struct{ table }

var _ Interpolant = Linear{}

// NewLinear joins the points (x, y) by straight lines. It panics unless x rises
// strictly and both hold the same number, at least two, of values.
func NewLinear(x, y []float64) Linear { return Linear{newTable(x, y)} }

// At implements Interpolant.
func (l Linear) At(x float64) (value, slope float64) { return l.at(x, Cell.Line) }

// MonotoneCubic joins points by cubics with a continuous slope that rise where
// the data rise, fall where they fall, and are level where they are level.
//
// The rule, to be done again: with h the width and d the chord's slope of a cell,
//
//	inner node  m = (h₊ d₋ + h₋ d₊)/(h₋ + h₊), 0 where d₋ d₊ <= 0
//	end node    m = ((2h + h₂) d - h d₂)/(h + h₂), 0 where its sign is not that of d
//
// which are the slopes of the parabola through three neighbouring points. Then cell
// by cell, in rising x: both slopes are 0 where d = 0, and with alpha and beta the
// slopes at its two ends over d, both are scaled by 3/sqrt(alpha² + beta²) where that
// is below 1.
//
// Source: Fritsch & Carlson (1980) for the monotone region; the three-point slopes
// are one of the starts that it leaves open.
type MonotoneCubic struct{ table }

var _ Interpolant = MonotoneCubic{}

// NewMonotoneCubic joins the points (x, y). It panics unless x rises strictly and
// both hold the same number, at least two, of values. Two points give a line.
func NewMonotoneCubic(x, y []float64) MonotoneCubic {
	m := MonotoneCubic{newTable(x, y)}
	for i, d := range monotoneSlopes(m.cells) {
		if i < len(m.cells) {
			m.cells[i].D0 = d
		}
		if i > 0 {
			m.cells[i-1].D1 = d
		}
	}
	return m
}

// At implements Interpolant.
func (m MonotoneCubic) At(x float64) (value, slope float64) { return m.at(x, Cell.Cubic) }

// monotoneSlopes returns the slope at every node of cells that carry the slopes
// of their chords.
func monotoneSlopes(cells []Cell) []float64 {
	last := len(cells)
	slopes := make([]float64, last+1)
	slopes[0], slopes[last] = cells[0].D0, cells[last-1].D0
	if last > 1 {
		a, b := cells[0], cells[last-1]
		slopes[0] = endSlope(a, cells[1], a.X1-a.X0)
		slopes[last] = endSlope(b, cells[last-2], b.X1-b.X0)
	}
	for i := 1; i < last; i++ {
		left, right := cells[i-1], cells[i]
		if left.D0*right.D0 > 0 {
			hl, hr := left.X1-left.X0, right.X1-right.X0
			slopes[i] = (hr*left.D0 + hl*right.D0) / (hl + hr)
		}
	}
	for i, c := range cells {
		if c.D0 == 0 {
			slopes[i], slopes[i+1] = 0, 0
			continue
		}
		if r := math.Hypot(slopes[i]/c.D0, slopes[i+1]/c.D0); r > 3 {
			slopes[i] *= 3 / r
			slopes[i+1] *= 3 / r
		}
	}
	return slopes
}

// endSlope is the slope, at the outer end of a cell of width h, of the parabola
// through it and its neighbour; zero where that would turn against the data.
func endSlope(outer, inner Cell, h float64) float64 {
	next := inner.X1 - inner.X0
	slope := ((2*h+next)*outer.D0 - h*inner.D0) / (h + next)
	if slope*outer.D0 <= 0 {
		return 0
	}
	return slope
}
