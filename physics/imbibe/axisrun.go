package imbibe

import (
	"errors"
	"math"
)

// axisRun fills one axis of a block of the given rock, in cells from the open face inwards, by finite
// volumes:
//
//	v_i dS_i/dtheta = T_i (Phi_(i-1) - Phi_i) - T_(i+1) (Phi_i - Phi_(i+1)),  theta = t/phi
//
// with Phi the Kirchhoff potential, v the volume of a cell over that of the block and T the
// area of a face over the distance of the centres beside it, or from the open face to the
// first. The flux is a difference of potentials, so that it stays right where Dc vanishes.
// Cells grow mildly inwards, the distance from the face being reach sinh(2.5 u)/sinh 2.5;
// that is smooth in u, and the scheme is of second order in the number of cells.
//
// Time: the singly diagonally implicit Runge-Kutta method of third order of Alexander
// (1977), L-stable, whose last stage is the step. Newton's method solves each stage, a
// tridiagonal system at a time. The size of a step follows from the difference to a
// second-order formula on the same stages, damped by one more solve as stiff methods need
// (Hairer and Wanner 1996, sec. IV.8).
type axisRun struct {
	m             *Matrix
	volume, faces []float64 // faces[i] is T before cell i; nothing flows behind the last
	u             []float64 // S - Si in each cell
	centres       []float64 // their distance from the open face over the reach
	time, step    float64   // theta, and the next step of it
	inflow        float64   // through the open face since the start, pore volumes
	rate          float64   // of the mean saturation against theta, at the end of the last step
	steps         int
	tolerance     float64 // error of a step, over what has soaked in

	panel                       []int
	potential, slope            []float64
	base, next, residual, upper []float64
	change                      [stages][]float64 // v dS/dtheta of each stage
	entering                    [stages]float64   // its sum: what passes the open face
}

// gamma is the middle root of 1/6 - 3/2 g + 3 g² - g³ = 0.
const (
	stages = 3
	gamma  = 0.43586652150845900
	// The second-order formula weighs the first two stages 1-second and second.
	second = (1 - 2*gamma) / (1 - gamma)
)

var stageWeights = [stages][stages]float64{
	{gamma},
	{(1 - gamma) / 2, gamma},
	{(-6*gamma*gamma + 16*gamma - 1) / 4, (6*gamma*gamma - 20*gamma + 5) / 4, gamma},
}

// deepest is how far below Si, over the width, a sharp front may make a cell dip in a step.
const deepest = 5e-4

var errStalled = errors.New("imbibe: the steps of a block became too small to go on")

// grading is that of the cells of the fine answers; 0 is for equal cells.
const grading = 2.5

func newAxisRun(m *Matrix, axis Axis, cells int, tolerance, grading float64) *axisRun {
	r := &axisRun{m: m, tolerance: tolerance, panel: make([]int, cells)}
	lists := []*[]float64{&r.volume, &r.faces, &r.u, &r.centres, &r.potential, &r.slope, &r.base, &r.next, &r.residual, &r.upper, &r.change[0], &r.change[1], &r.change[2]}
	for i, room := 0, make([]float64, cells*len(lists)); i < len(lists); i++ {
		*lists[i] = room[i*cells : (i+1)*cells : (i+1)*cells]
	}
	power := float64(axis.Spread)
	place := func(i int) float64 { // distance from the middle over reach
		u := float64(i) / float64(cells)
		if grading == 0 {
			return 1 - u
		}
		return 1 - math.Sinh(grading*u)/math.Sinh(grading)
	}
	centre := 1.0
	for i := range r.volume {
		outer, inner := place(i), math.Max(0, place(i+1))
		before := centre
		centre = (outer + inner) / 2
		r.volume[i] = math.Pow(outer, power+1) - math.Pow(inner, power+1)
		r.faces[i] = (power + 1) * math.Pow(outer, power) / ((before - centre) * axis.Reach * axis.Reach)
		r.centres[i] = 1 - centre
	}
	r.step = 0.1 * r.volume[0] * m.width / (r.faces[0] * m.opened) // fills a tenth of the first cell
	return r
}

// mean is the recovery so far, in pore volumes: the mean of S - Si.
func (r *axisRun) mean() (sum float64) {
	for i, v := range r.volume {
		sum += v * r.u[i]
	}
	return sum
}

// advance steps on until theta is to, or for one step.
func (r *axisRun) advance(to float64, once bool) error {
	for r.time < to {
		h, left := r.step, to-r.time
		lands := h >= left*(1-1e-9)
		if lands {
			h = left
		}
		e, solved := r.try(h)
		grow := 0.25
		if solved {
			grow = math.Min(3, 0.9/math.Cbrt(e))
		}
		if !solved || e > 1 {
			r.step = h * math.Min(0.7, grow)
			if !(r.time+r.step > r.time) {
				return errStalled
			}
			continue
		}
		r.steps++
		r.u, r.next = r.next, r.u
		for k, b := range stageWeights[stages-1] {
			r.inflow += h * b * r.entering[k]
		}
		r.rate = r.entering[stages-1]
		if r.time += h; lands {
			r.time = to
			grow = math.Max(grow, r.step/h) // cut short, not refused
		}
		if r.step = h * grow; once {
			break
		}
	}
	return nil
}

// try takes a step of h into next and returns its error over what is allowed; solved
// is false when Newton's method did not settle.
func (r *axisRun) try(h float64) (e float64, solved bool) {
	copy(r.next, r.u)
	for k := range stages {
		for i, v := range r.volume {
			r.base[i] = v * r.u[i]
			for j := range k {
				r.base[i] += h * stageWeights[k][j] * r.change[j][i]
			}
		}
		if !r.solve(h*gamma, k) {
			return 0, false
		}
	}
	// next - (second-order formula), through one more solve with the last system.
	b := stageWeights[stages-1]
	for i := range r.residual {
		r.residual[i] = -h * ((b[0]-1+second)*r.change[0][i] + (b[1]-second)*r.change[1][i] + b[2]*r.change[2][i])
	}
	r.tridiagonal(h * gamma)
	soaked, dip := 0.0, 0.0
	for i, v := range r.volume {
		e += v * math.Abs(r.residual[i])
		soaked += v * math.Abs(r.next[i])
		dip = math.Min(dip, r.next[i])
	}
	return math.Max(e/(r.tolerance*soaked), -dip/(deepest*r.m.width)), true
}

// solve finds next with v next = base + h v dS/dtheta(next), and leaves the last term
// without h in change[stage].
func (r *axisRun) solve(h float64, stage int) bool {
	const rounds, settled = 25, 1e-11
	for range rounds {
		r.fluxes(stage)
		for i, v := range r.volume {
			r.residual[i] = v*r.next[i] - r.base[i] - h*r.change[stage][i]
		}
		r.tridiagonal(h)
		moved := 0.0
		for i, v := range r.volume {
			r.next[i] -= r.residual[i]
			moved += v * math.Abs(r.residual[i])
		}
		if moved <= settled*r.m.width {
			r.fluxes(stage)
			return true
		}
		if !(moved < 10*r.m.width) {
			return false
		}
	}
	return false
}

// fluxes evaluates the potentials of next, and from them change[stage].
func (r *axisRun) fluxes(stage int) {
	change := r.change[stage]
	for i, s := range r.next {
		r.potential[i], r.slope[i], r.panel[i] = r.m.at(s, r.panel[i])
	}
	flux := -r.faces[0] * r.potential[0] // of the open face the potential is 0
	r.entering[stage] = flux
	for i := range change {
		change[i] = flux
		if flux = 0; i+1 < len(change) {
			flux = r.faces[i+1] * (r.potential[i] - r.potential[i+1])
		}
		change[i] -= flux
	}
}

// tridiagonal replaces residual by the solution of (V - h J) x = residual, J the matrix of
// d(v dS/dtheta)/dS at the potentials last evaluated: columns dominate, no pivoting.
func (r *axisRun) tridiagonal(h float64) {
	x, last := r.residual, len(r.residual)-1
	before := 0.0 // upper entry of the row above, eliminated
	for i := range x {
		out := 0.0
		if i < last {
			out = r.faces[i+1]
		}
		diagonal := r.volume[i] + h*r.slope[i]*(r.faces[i]+out)
		if i > 0 {
			lower := -h * r.faces[i] * r.slope[i-1]
			diagonal -= lower * before
			x[i] -= lower * x[i-1]
		}
		x[i] /= diagonal
		if i < last {
			before = -h * out * r.slope[i+1] / diagonal
			r.upper[i] = before
		}
	}
	for i := last - 1; i >= 0; i-- {
		x[i] -= r.upper[i] * x[i+1]
	}
}

// profile is the saturation at the open face and at the centres of the cells.
func (r *axisRun) profile() Profile {
	p := Profile{Time: r.time * r.m.porosity, Share: r.mean() / r.m.width, Distance: []float64{0}, Sw: []float64{r.m.initial + r.m.width}}
	p.Distance = append(p.Distance, r.centres...)
	for _, u := range r.u {
		p.Sw = append(p.Sw, r.m.initial+u)
	}
	return p
}
