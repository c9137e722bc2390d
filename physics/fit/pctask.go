package fit

import (
	"fmt"
	"math"

	"brinefront/physics/capillary"
)

const (
	pcFloor = 0.01 // of the largest |Pc|: smaller ones count as this
	pcRoom  = 1e-4 // of the points' range: how near to them an end with infinite Pc may come
	pcTries = 30   // iterations after which starts are compared
	pcRange = 1e6  // of the largest |Pc|: how large a parameter that Pc is proportional to may be
)

// pcTask is one fit of capillary pressure under way.
type pcTask struct {
	family     pcFamily
	points     PcPoints // those that the form can be held against
	given      int      // rows of all points
	options    PcOptions
	values     []float64
	low, high  []float64
	held       []bool
	atBound    []bool
	free       []int
	sigma      []float64
	floor      float64
	status     Status
	iterations int
}

// newPcTask sets bounds, weights and what is held.
func newPcTask(f pcFamily, p PcPoints, o PcOptions) *pcTask {
	if o.Iterations <= 0 {
		o.Iterations = defaultIterations
	}
	n := len(f.specs)
	t := &pcTask{family: f, given: len(p.Sw), options: o, values: make([]float64, n), low: make([]float64, n), high: make([]float64, n), held: make([]bool, n), atBound: make([]bool, n)}
	largest := 0.0
	for i, sw := range p.Sw {
		if (f.signed || p.Pc[i] > 0) && sw > 0 && (sw < 1 || f.closed) {
			t.points.Sw, t.points.Pc = append(t.points.Sw, sw), append(t.points.Pc, p.Pc[i])
			largest = max(largest, math.Abs(p.Pc[i]))
		}
	}
	for j, s := range f.specs {
		t.low[j], t.high[j] = s.low, s.high
	}
	for _, j := range f.linear {
		t.high[j] = pcRange * largest
		if f.specs[j].symbol == "co" {
			t.low[j], t.high[j] = -t.high[j], 0
		} else if !f.signed {
			t.low[j] = largest / pcRange
		}
	}
	if len(t.points.Sw) > 0 {
		first, last := ends(t.points.Sw)
		room := pcRoom * (t.points.Sw[last] - t.points.Sw[first])
		t.high[0], t.high[1] = max(t.points.Sw[first]-room, 0), max(tidy(1-t.points.Sw[last]), 0)
		if !f.closed {
			t.high[1] = max(1-t.points.Sw[last]-room, 0)
		}
	}
	if o.Ends != nil {
		for j, v := range o.Ends {
			if v >= 0 && v <= t.high[j] {
				t.values[j], t.held[j] = v, true
			}
		}
	}
	for j := range n {
		if t.low[j] == t.high[j] {
			t.values[j], t.held[j] = t.low[j], true
		}
		if !t.held[j] {
			t.free = append(t.free, j)
		}
	}
	t.floor = pcFloor * largest
	t.sigma = make([]float64, len(t.points.Sw))
	for i, pc := range t.points.Pc {
		t.sigma[i] = max(math.Abs(pc), t.floor)
		if o.Weights == Absolute {
			t.sigma[i] = 1
		}
	}
	return t
}

// solve tries every start for a few iterations, on a thinned table, and fits the best to
// all rows.
func (t *pcTask) solve() {
	all, few := thinned(len(t.points.Sw))
	var best minimum
	for k, x := range t.starts(few) {
		if m := t.minimise(few, x, min(pcTries, t.options.Iterations)); k == 0 || m.sum < best.sum {
			best = m
		}
	}
	if len(few) < len(all) || !best.converged {
		best = t.minimise(all, best.x, t.options.Iterations)
	}
	t.take(best.x)
	for p, j := range t.free {
		t.atBound[j] = best.atBound[p]
	}
	t.iterations = best.iterations
	if !best.converged {
		t.status = IterationLimit
	}
}

// starts are every shape of the family, with free ends near the points and well away
// from them; what Pc is proportional to follows from the rest by linear least squares.
func (t *pcTask) starts(rows []int) [][]float64 {
	var list [][]float64
	for _, shape := range t.family.starts {
		for _, share := range []float64{0.98, 0.7} {
			k := 0
			for j := range t.values {
				switch {
				case j < 2 && !t.held[j]:
					t.values[j] = share * t.high[j]
				case j >= 2 && t.family.specs[j].log:
					t.values[j] = shape[k]
					k++
				case j >= 2:
					t.values[j] = 1
				}
			}
			t.proportion(rows)
			x := make([]float64, len(t.free))
			for p, j := range t.free {
				x[p] = t.family.specs[j].inner(t.values[j])
			}
			list = append(list, x)
		}
	}
	return list
}

// proportion sets the linear parameters to their least squares.
func (t *pcTask) proportion(rows []int) {
	n := len(t.family.linear)
	normal, right := newSymmetric(n), make([]float64, n)
	slopes := make([]float64, len(t.values))
	for _, i := range rows {
		t.family.slopes(t.values, t.points.Sw[i], slopes)
		for p, j := range t.family.linear {
			a := slopes[j] / t.sigma[i]
			right[p] += a * t.points.Pc[i] / t.sigma[i]
			for q, k := range t.family.linear[:p+1] {
				normal.set(p, q, normal.at(p, q)+a*slopes[k]/t.sigma[i])
			}
		}
	}
	if !normal.solve(right) {
		clear(right)
	}
	for p, j := range t.family.linear {
		t.values[j] = min(max(right[p], t.low[j]), t.high[j])
	}
}

func (t *pcTask) take(x []float64) {
	for p, j := range t.free {
		t.values[j] = min(max(t.family.specs[j].outer(x[p]), t.low[j]), t.high[j])
	}
}

// minimise runs the minimiser on some rows.
func (t *pcTask) minimise(rows []int, x []float64, limit int) minimum {
	low, high := make([]float64, len(x)), make([]float64, len(x))
	for p, j := range t.free {
		low[p], high[p] = t.family.specs[j].inner(t.low[j]), t.family.specs[j].inner(t.high[j])
	}
	slopes := make([]float64, len(t.values))
	eval := func(x, r, jacobian []float64) {
		t.take(x)
		curve := t.family.curve(t.values)
		for m, i := range rows {
			r[m] = t.deviation(curve, i) / t.sigma[i]
			if jacobian == nil {
				continue
			}
			t.slopes(i, slopes)
			for p, j := range t.free {
				jacobian[m*len(x)+p] = slopes[j] / t.sigma[i]
			}
		}
	}
	return minimise(eval, len(rows), x, low, high, limit)
}

// deviation is curve minus point.
func (t *pcTask) deviation(c capillary.Curve, i int) float64 {
	pc, _ := c.At(t.points.Sw[i])
	return pc - t.points.Pc[i]
}

// slopes are those of row i with respect to what the minimiser moves.
func (t *pcTask) slopes(i int, slopes []float64) {
	t.family.slopes(t.values, t.points.Sw[i], slopes)
	for j, s := range t.family.specs {
		if s.log {
			slopes[j] *= t.values[j]
		}
	}
}

// conclude reports the fit.
func (t *pcTask) conclude() PcFit {
	c := confidence{family: family{specs: t.family.specs}, values: t.values}
	for _, j := range t.free {
		if !t.atBound[j] {
			c.active = append(c.active, j)
		}
	}
	n := len(t.points.Sw)
	f := PcFit{Curve: t.family.curve(t.values), Status: t.status, Iterations: t.iterations, Used: n, DegreesOfFreedom: n - len(c.active), family: t.family}
	slopes, normal, sum := make([]float64, len(t.values)), newSymmetric(len(c.active)), 0.0
	rows := make([]row, n)
	for i := range rows {
		t.slopes(i, slopes)
		r := row{sw: t.points.Sw[i], deviation: t.deviation(f.Curve, i), sigma: t.sigma[i], slopes: make([]float64, len(c.active))}
		sum += r.deviation / r.sigma * (r.deviation / r.sigma)
		for p, j := range c.active {
			r.slopes[p] = slopes[j] / r.sigma
			for q := range p + 1 {
				normal.set(p, q, normal.at(p, q)+r.slopes[p]*r.slopes[q])
			}
		}
		rows[i] = r
	}
	f.RMS = math.Sqrt(sum / float64(n))
	c.scatter[0] = newScatter(sum, f.DegreesOfFreedom)
	c.covariance, c.blind = invert(normal)
	for k := range c.covariance.v {
		c.covariance.v[k] *= c.scatter[0].variance
	}
	f.state = c
	f.Covariance, f.Correlation = c.matrices(len(t.values))
	f.Parameters = c.parameters(&task{low: t.low, high: t.high, atBound: t.atBound, held: t.held}, f.Correlation)
	f.Verdict = t.verdict(f, c.off(rows, t.floor))
	return f
}

// verdict says in plain sentences what to make of a fit.
func (t *pcTask) verdict(f PcFit, off []row) []string {
	said := []string{}
	if t.options.Weights == Relative {
		said = append(said, fmt.Sprintf("The fit follows Pc within %.2g %% (root mean square; values below 1 %% of the largest count as that).", 100*f.RMS))
	}
	if left := t.given - f.Used; left > 0 {
		said = append(said, fmt.Sprintf("%d %s left out: %s has no finite Pc there, or none at or below 0.", left, plural(left, "row is", "rows are"), t.family.name))
	}
	if f.Status == IterationLimit {
		said = append(said, "The fit stopped at its iteration limit; the curve is the best found so far.")
	}
	said = append(said, f.state.judged(f.Parameters, f.Correlation, voice{"the points ask", "these points", "the curve stays the same at the points", "The points determine every fitted parameter."})...)
	if len(off) > 0 {
		said = append(said, listOff(off, [2]string{"Pc"}))
	}
	return said
}
