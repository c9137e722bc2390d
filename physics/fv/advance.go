package fv

import "math"

// Advance steps on until T is to, which must be finite. With an Error the steps are as long as it
// allows; otherwise equal, as few as Step allows. After each step, where each is not nil, it is
// called, and ends the advance there by returning false. False: the run has stalled.
func (r *Implicit) Advance(to float64, each func(*Implicit) bool) bool {
	begun := r.t
	equal := 1.0
	if r.longest > 0 {
		equal = math.Max(1, math.Ceil((to-begun)/r.longest-1e-9))
	}
	for r.t < to && !r.stalled {
		left := to - r.t
		dt := math.Min(left, (to-begun)/equal)
		if r.allowed > 0 {
			if r.next == 0 {
				r.next = 1e-9 * left
			}
			if dt = math.Min(dt, r.next); dt > 0.6*left && dt < left {
				dt = left / 2 // two steps rather than a long one and a crumb
			}
		}
		if r.t += r.attempt(dt); r.stalled {
			break
		}
		if to-r.t <= 1e-12*(to-begun) { // rounding
			r.t = to
		}
		if each != nil && !each(r) {
			break
		}
	}
	return !r.stalled
}

// attempt takes one step, of dt or, where that will not do, less: halved when Newton's method
// does not converge, shortened when the error is too large, and halved towards the moment at
// which the outlet opens. It returns the step taken.
func (r *Implicit) attempt(dt float64) float64 {
	copy(r.start, r.s)
	halvings := 0
	for ; ; r.cuts++ {
		if halvings > deepCut {
			r.stalled = true
			copy(r.s, r.start)
			return 0
		}
		if !r.solve(dt) {
			dt, halvings = dt/2, halvings+1
			continue
		}
		if r.outlet.Kind == Threshold && math.IsNaN(r.opened) && r.leaving > 0 {
			if dt > opening*(r.t+dt) && halvings < deepCut {
				dt, halvings = dt/2, halvings+1
				continue
			}
			r.opened = r.t + dt
		}
		if r.allowed == 0 {
			break
		}
		e := r.estimate(dt)
		order := 2.0
		if r.second {
			order = 3
		}
		if factor := 0.85 * math.Pow(r.allowed/e, 1/order); e <= r.allowed || halvings >= deepCut {
			r.next = dt * math.Min(3, math.Max(0.3, factor))
			break
		} else {
			dt, halvings = dt*math.Max(0.1, factor), halvings+1
		}
	}
	r.steps++
	r.in.add(dt * r.entering)
	r.out.add(dt * r.leaving)
	for i := range r.s {
		r.rate[i], r.earlier[i] = (r.s[i]-r.start[i])/dt, r.rate[i]
	}
	r.lastStep, r.stepBefore = dt, r.lastStep
	return dt
}

// alexander is the diagonal of the two-stage method of second order that is L-stable.
// Alexander (1977), theorem 3.
const alexander = 1 - math.Sqrt2/2

// solve takes a step of dt from start to s; false when Newton's method does not converge.
func (r *Implicit) solve(dt float64) bool {
	copy(r.s, r.start)
	if !r.second {
		if !r.euler(r.start, dt) {
			return false
		}
		r.entering, r.leaving = r.flux[0].q, r.flux[r.cells].q
		r.change(r.start, dt)
		return true
	}
	r.blend()
	if !r.euler(r.start, alexander*dt) {
		return false
	}
	for i, q := range r.flux {
		r.stage[i] = q.q
	}
	rest := (1 - alexander) * dt
	for i := range r.base {
		r.base[i] = r.start[i] - rest/r.width[i]*(r.stage[i+1]-r.stage[i])
	}
	if !r.euler(r.base, alexander*dt) {
		return false
	}
	r.entering = (1-alexander)*r.stage[0] + alexander*r.flux[0].q
	r.leaving = (1-alexander)*r.stage[r.cells] + alexander*r.flux[r.cells].q
	r.change(r.base, alexander*dt)
	return true
}

// change sets s to what the fluxes make of base in dt.
func (r *Implicit) change(base []float64, dt float64) {
	for i := range r.s {
		r.s[i] = base[i] - dt/r.width[i]*(r.flux[i+1].q-r.flux[i].q)
	}
}

// blend chooses the weights of the centred fluxes, for a whole step, from the states at its start.
func (r *Implicit) blend() {
	if r.through == 0 {
		return
	}
	n := r.cells
	for i, s := range r.start {
		r.nodes[i] = r.at(s)
	}
	for i := 1; i < n; i++ {
		r.weight[i] = centred(r.nodes[i-1], r.nodes[i], r.through, r.gap[i])
	}
	r.weight[0] = centred(r.atInlet, r.nodes[0], r.through, r.width[0]/2)
	r.weight[n] = centred(r.nodes[n-1], r.atOutlet, r.through, r.width[n-1]/2)
}

// estimate is the root mean square, over the length, of the error of the step just taken, from
// divided differences of the rates of this step and those before: dt² S”/2 at first order, some 0.04 dt³ S”'
// at second. It is 0 until there are enough of them.
func (r *Implicit) estimate(dt float64) float64 {
	if r.lastStep == 0 || r.second && r.stepBefore == 0 {
		return 0
	}
	const alexanderError = 0.0404
	near, far := (dt+r.lastStep)/2, (r.lastStep+r.stepBefore)/2
	sum := 0.0
	for i := range r.s {
		bend := ((r.s[i]-r.start[i])/dt - r.rate[i]) / near
		e := dt * dt * bend / 2
		if r.second {
			e = alexanderError * dt * dt * dt * 2 * (bend - (r.rate[i]-r.earlier[i])/far) / (near + far)
		}
		sum += e * e * r.width[i]
	}
	return math.Sqrt(sum)
}
