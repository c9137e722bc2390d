package imbibe

import (
	"math"

	"brinefront/physics/numeric"
)

// Recovery is the share of what can be soaked up, S0 - Si, against time. Between its nodes
// it is a Hermite cubic in sqrt(t), in which soaking starts as a straight line; before the
// first it is that line; after the last it nears 1 exponentially, at the last rate.
type Recovery struct {
	times, roots []float64 // s, and their square roots
	cells        []numeric.Cell
	early, late  float64 // share over sqrt(t), and rate of the tail, 1/s
	last, slope  float64 // share at the last node and its slope against sqrt(t)
}

// add appends a node: a time above the last, share and rate of share, 1/s.
func (r *Recovery) add(time, share, rate float64) {
	root := math.Sqrt(time)
	slope := 2 * root * rate
	if n := len(r.times); n == 0 {
		r.early = share / root
	} else {
		r.cells = append(r.cells, numeric.Cell{X0: r.roots[n-1], X1: root, Y0: r.last, Y1: share, D0: r.slope, D1: slope})
	}
	r.times, r.roots = append(r.times, time), append(r.roots, root)
	r.last, r.slope = share, slope
	r.late = rate / (1 - share)
}

// stretched is the same recovery with every time a factor longer.
func (r *Recovery) stretched(factor float64) Recovery {
	root := math.Sqrt(factor)
	out := Recovery{early: r.early / root, late: r.late / factor, last: r.last, slope: r.slope / root,
		times: make([]float64, len(r.times)), roots: make([]float64, len(r.roots)), cells: make([]numeric.Cell, len(r.cells))}
	for i := range r.times {
		out.times[i], out.roots[i] = r.times[i]*factor, r.roots[i]*root
	}
	for i, c := range r.cells {
		out.cells[i] = numeric.Cell{X0: out.roots[i], X1: out.roots[i+1], Y0: c.Y0, Y1: c.Y1, D0: c.D0 / root, D1: c.D1 / root}
	}
	return out
}

// At returns the share soaked up at a time from 0 on, and its rate, 1/s.
func (r *Recovery) At(t float64) (share, rate float64) {
	n := len(r.times)
	root := math.Sqrt(t)
	switch {
	case t <= r.times[0]:
		return r.early * root, r.early / (2 * root)
	case t >= r.times[n-1]:
		left := (1 - r.last) * math.Exp(-r.late*(t-r.times[n-1]))
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
