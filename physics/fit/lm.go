package fit

import (
	"math"
	"slices"
)

// Bounded least squares by Levenberg (1944) and Marquardt (1963).
//
// For residuals r(x) with Jacobian J, the sum ½ rᵀr has the gradient g = Jᵀr and,
// near a good fit, the curvature A = JᵀJ. A step solves
//
//	(A + µ D²) h = -g
//
// where D holds the largest lengths of J's columns seen so far (Moré 1978), which
// makes the path independent of the parameters' units. The damping µ follows the
// ratio of the actual to the predicted fall of the sum (Nielsen 1999).
//
// Bounds are kept as Bertsekas (1982) does: a parameter that lies at a bound and
// whose gradient points outward is held for this step; the others move, and what
// would leave the box is cut back to it. The predicted fall is computed for the
// step that is really taken. As µ grows the step turns into a short scaled gradient
// step, for which the cut-back step still descends.
//
// Close to the minimum the fall of the sum drowns in its rounding. There a step is
// kept when it leaves less of the slope, and the search ends when it does not.
//
// It ends as well when the residuals stand at right angles to every free column of J, to
// within gradientTolerance (the cosine; an error of the parameters of about that
// many standard errors), when a step no longer changes the parameters, or when the
// residuals are rounding errors.
const (
	gradientTolerance = 1e-13
	stepTolerance     = 1e-15
	tellable          = 1e-9  // fall over sum below which rounding may hide the fall
	zeroResidual      = 1e-30 // of the sum of squares a residual, weighted: rounding only
	firstDamping      = 1e-3
	lessSlope         = 0.95 // what a step must leave of the slope, at most, where the fall cannot be told
	largestDamping    = 1e30
)

// residuals fills r, and the row-major Jacobian unless it is nil, at x.
type residuals func(x, r, jacobian []float64)

// minimum is where the minimiser ended.
type minimum struct {
	x          []float64
	atBound    []bool // at a bound and pushing outward
	sum        float64
	normal     symmetric // JᵀJ
	iterations int
	converged  bool
}

// minimise starts at x, which it first clips to the bounds, with m residuals.
func minimise(eval residuals, m int, x, low, high []float64, limit int) minimum {
	n := len(x)
	s := search{n: n, r: make([]float64, m), jacobian: make([]float64, m*n), gradient: make([]float64, n),
		scale: make([]float64, n), step: make([]float64, n), rhs: make([]float64, n), damped: newSymmetric(n), low: low, high: high,
		minimum: minimum{x: make([]float64, n), atBound: make([]bool, n), normal: newSymmetric(n)}}
	x = slices.Clone(x)
	for j := range x {
		x[j] = min(max(x[j], low[j]), high[j])
	}
	trial, trialR, back := make([]float64, n), make([]float64, m), make([]float64, n)
	s.move(eval, x)

	damping, growth := firstDamping, 2.0
	for s.iterations < limit {
		if s.stationary() {
			s.converged = true
			break
		}
		s.iterations++
		fall, moved := 0.0, false
		if s.solve(damping) {
			fall = s.predict(trial, &moved)
			if !moved {
				s.converged = true
				break
			}
		}
		switch {
		case fall > tellable*s.sum:
			eval(trial, trialR, nil)
			sum := dot(trialR, trialR)
			if gain := (s.sum - sum) / 2 / fall; gain > 0 {
				s.move(eval, trial)
				damping *= max(1.0/3, 1-math.Pow(2*gain-1, 3))
				growth = 2
				continue
			}
		case fall > 0:
			before := s.slope()
			copy(back, s.x)
			s.move(eval, trial)
			if s.slope() < lessSlope*before {
				damping /= 3
				continue
			}
			s.move(eval, back)
			s.converged = true
			return s.minimum
		}
		damping *= growth
		growth *= 2
		if damping > largestDamping {
			s.converged = true // no shorter step is a step
			break
		}
	}
	return s.minimum
}

// search is the minimiser's workspace.
type search struct {
	minimum
	n                     int
	r, jacobian, gradient []float64
	scale, step, rhs      []float64
	low, high             []float64
	free                  []int     // what the step moves
	damped                symmetric // the damped curvature of these
}

// linearise forms gradient, curvature, scale and the held set at x.
func (s *search) linearise() {
	n := s.n
	normal := s.normal.v
	clear(normal)
	clear(s.gradient)
	for i, r := range s.r {
		row := s.jacobian[i*n : i*n+n]
		for j, a := range row {
			s.gradient[j] += a * r
			for k := j; k < n; k++ {
				normal[j*n+k] += a * row[k]
			}
		}
	}
	for j := range s.x {
		for k := range j {
			normal[j*n+k] = normal[k*n+j]
		}
		s.scale[j] = max(s.scale[j], math.Sqrt(normal[j*n+j]))
		s.atBound[j] = s.x[j] <= s.low[j] && s.gradient[j] > 0 || s.x[j] >= s.high[j] && s.gradient[j] < 0
	}
}

// move goes to x and linearises there.
func (s *search) move(eval residuals, x []float64) {
	copy(s.x, x)
	eval(s.x, s.r, s.jacobian)
	s.sum = dot(s.r, s.r)
	s.linearise()
}

// stationary reports whether the residuals are at right angles to what may move.
func (s *search) stationary() bool {
	return s.sum <= zeroResidual*float64(len(s.r)) || s.slope() <= gradientTolerance*math.Sqrt(s.sum)
}

// slope is the largest component of the residuals along a column that may move.
func (s *search) slope() float64 {
	largest := 0.0
	for j, g := range s.gradient {
		if length := math.Sqrt(s.normal.at(j, j)); !s.atBound[j] && length > 0 {
			largest = max(largest, math.Abs(g)/length)
		}
	}
	return largest
}

// solve finds the damped step of the parameters that are not held; it fails when
// the damped curvature is not positive definite to rounding.
func (s *search) solve(damping float64) bool {
	s.free = s.free[:0]
	for j := range s.x {
		s.step[j] = 0
		if !s.atBound[j] && s.scale[j] > 0 {
			s.free = append(s.free, j)
		}
	}
	n := len(s.free)
	a, b := symmetric{n, s.damped.v[:n*n]}, s.rhs[:n]
	for p, j := range s.free {
		b[p] = -s.gradient[j] / s.scale[j]
		for q, k := range s.free[:p+1] {
			a.set(p, q, s.normal.at(j, k)/(s.scale[j]*s.scale[k]))
		}
		a.set(p, p, a.at(p, p)+damping)
	}
	if !a.solve(b) {
		return false
	}
	for p, j := range s.free {
		s.step[j] = b[p] / s.scale[j]
	}
	return true
}

// predict cuts the step to the bounds, fills the trial point and returns the fall
// of half the sum that the linear model promises.
func (s *search) predict(trial []float64, moved *bool) float64 {
	for j := range s.x {
		trial[j] = min(max(s.x[j]+s.step[j], s.low[j]), s.high[j])
		s.step[j] = trial[j] - s.x[j]
		if math.Abs(s.step[j]) > stepTolerance*math.Abs(s.x[j]) {
			*moved = true
		}
	}
	fall := 0.0
	for j, h := range s.step {
		fall -= s.gradient[j] * h
		for k, hk := range s.step {
			fall -= h * s.normal.at(j, k) * hk / 2
		}
	}
	return fall
}

func dot(a, b []float64) float64 {
	sum := 0.0
	for i := range a {
		sum += a[i] * b[i]
	}
	return sum
}
