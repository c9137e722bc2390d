package fv

import "math"

// euler solves S + (dt/dx) (q_right - q_left) = base for the cells, starting from what they are, and
// leaves the fluxes that go with the answer; false when it does not converge.
func (r *Implicit) euler(base []float64, dt float64) bool {
	if r.medium.Potential == nil && r.law.rising {
		r.sweep(base, dt)
		return true
	}
	for range rounds {
		r.fluxes()
		most := 0.0
		for i := range r.s {
			c, q := dt/r.width[i], r.flux[i:i+2]
			r.right[i] = base[i] - r.s[i] - c*(q[1].q-q[0].q)
			most = math.Max(most, math.Abs(r.right[i]))
			r.lower[i], r.diag[i], r.upper[i] = -c*q[0].left, 1+c*(q[1].left-q[0].right), c*q[1].right
		}
		if most <= arrived*(r.hi-r.lo) { // which the fluxes will change the states by
			return true
		}
		r.eliminate()
		r.move()
	}
	return false
}

// fluxes are those of the states as they are.
func (r *Implicit) fluxes() {
	n := r.cells
	r.work += n
	for i, s := range r.s {
		r.nodes[i] = r.at(s)
	}
	r.flux[0], r.flux[n] = r.enter(r.nodes[0]), r.leave(r.nodes[n-1])
	for i := 1; i < n; i++ {
		r.flux[i] = r.between(r.nodes[i-1], r.nodes[i], r.gap[i], r.weight[i])
	}
}

// eliminate solves the tridiagonal system for the change of the states, into right. Each
// column's diagonal outweighs the rest of it, since what leaves a cell enters the next, so that no
// pivoting is called for.
func (r *Implicit) eliminate() {
	n := r.cells
	for i := 1; i < n; i++ {
		m := r.lower[i] / r.diag[i-1]
		r.diag[i] -= m * r.upper[i-1]
		r.right[i] -= m * r.right[i-1]
	}
	r.right[n-1] /= r.diag[n-1]
	for i := n - 2; i >= 0; i-- {
		r.right[i] = (r.right[i] - r.upper[i]*r.right[i+1]) / r.diag[i]
	}
}

// move changes the states by right, each within the range of the medium and no further than
// the next inflection of f: there the straight line that Newton's method follows turns to
// the other side of f, and beyond it the method may go round for ever. Jenny, Tchelepi & Lee (2009).
func (r *Implicit) move() {
	for i, d := range r.right {
		from := r.s[i]
		to := math.Max(r.lo, math.Min(r.hi, from+d))
		if r.through > 0 {
			for _, b := range r.law.bends {
				if (from-b)*(to-b) < 0 {
					to = b
				}
			}
		}
		r.s[i] = to
	}
}

// sweep solves the cells one after another where everything comes from the left: S + (dt/dx) v f(S)
// rises with S, so that Newton's method kept between bounds finds its one root.
func (r *Implicit) sweep(base []float64, dt float64) {
	n := r.cells
	r.flux[0] = r.enter(r.at(r.s[0]))
	q := r.flux[0].q
	for i := range r.s {
		c := dt / r.width[i]
		want := base[i] + c*q
		if i == n-1 && r.outlet.Kind != Open && r.outlet.Kind != Held {
			q, r.s[i] = 0, want
		} else {
			var slope float64
			q, slope, r.s[i] = r.root(want, c*r.through, math.Max(r.lo, math.Min(r.hi, r.s[i])))
			if q *= r.through; c*r.through*slope > 1 { // what is over, which rounding harms less
				q = (want - r.s[i]) / c
			}
		}
		r.flux[i+1] = face{q: q}
	}
}

// root solves s + c f(s) = want from a first guess and returns f and its slope there as well.
func (r *Implicit) root(want, c, s float64) (f, slope, root float64) {
	low, high := r.lo, r.hi
	for {
		r.work++
		f, v := r.law.at(s)
		miss := want - s - c*f
		if miss > 0 {
			low = s
		} else {
			high = s
		}
		next := s + miss/(1+c*v)
		if !(next > low && next < high) {
			next = low + (high-low)/2
		}
		if step := math.Abs(next - s); step <= smallest*(r.hi-r.lo) || next == low || next == high {
			return f, v, s
		}
		s = next
	}
}
