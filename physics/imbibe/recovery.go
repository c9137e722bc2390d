package imbibe

import (
	"math"

	"brinefront/physics/numeric"
)

// Recovery is the share of what can be soaked up, S0 - Si, against time: a Hermite cubic in
// sqrt(t), in which soaking starts as a straight line, through its nodes and the origin. After
// the last node it nears 1 exponentially, at the last rate.
type Recovery struct {
	times, roots []float64 // s, and 0 followed by their square roots
	cells        []numeric.Cell
	late, last   float64 // rate of the tail, 1/s, and the share where it begins
}

// add appends a node: a time above the last, share and rate of share, 1/s.
func (r *Recovery) add(time, share, rate float64) {
	root := math.Sqrt(time)
	slope := 2 * root * rate
	if len(r.times) == 0 {
		r.roots = append(r.roots, 0)
		r.cells = append(r.cells, numeric.Cell{X1: root, Y1: share, D0: slope, D1: slope})
	} else {
		before := r.cells[len(r.cells)-1]
		r.cells = append(r.cells, numeric.Cell{X0: before.X1, X1: root, Y0: before.Y1, Y1: share, D0: before.D1, D1: slope})
	}
	r.times, r.roots = append(r.times, time), append(r.roots, root)
	r.last, r.late = share, rate/(1-share)
}

// Early is the share over sqrt(t) at the start, s^-1/2.
func (r *Recovery) Early() float64 { return r.cells[0].D0 }

// stretched is the same recovery with every time a factor longer.
func (r *Recovery) stretched(factor float64) Recovery {
	root := math.Sqrt(factor)
	out := Recovery{late: r.late / factor, last: r.last, roots: []float64{0},
		times: make([]float64, len(r.times)), cells: make([]numeric.Cell, len(r.cells))}
	for i, c := range r.cells {
		out.times[i] = r.times[i] * factor
		out.roots = append(out.roots, c.X1*root)
		out.cells[i] = numeric.Cell{X0: c.X0 * root, X1: c.X1 * root, Y0: c.Y0, Y1: c.Y1, D0: c.D0 / root, D1: c.D1 / root}
	}
	return out
}

// At returns the share soaked up at a time from 0 on, and its rate, 1/s: +Inf at 0.
func (r *Recovery) At(t float64) (share, rate float64) {
	root := math.Sqrt(t)
	if end := r.times[len(r.times)-1]; t >= end {
		left := (1 - r.last) * math.Exp(-r.late*(t-end))
		return 1 - left, r.late * left
	}
	share, slope := r.cells[numeric.Locate(r.roots, root)].Cubic(root)
	return share, slope / (2 * root)
}

// Times are the nodes, s.
func (r *Recovery) Times() []float64 { return r.times }

// TimeAt is when a share from 0 to below 1 has been soaked up, s.
func (r *Recovery) TimeAt(share float64) float64 {
	switch {
	case share <= 0:
		return 0
	case share >= r.last:
		return r.times[len(r.times)-1] + math.Log((1-r.last)/(1-share))/r.late
	}
	miss := func(root float64) float64 { s, _ := r.At(root * root); return s - share }
	end := r.roots[len(r.roots)-1]
	root := numeric.Zero(miss, 0, end, -share, miss(end))
	return root * root
}
