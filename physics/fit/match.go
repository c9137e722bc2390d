package fit

import (
	"errors"
	"fmt"
	"math"
	"slices"
)

// Free is a quantity that a match may move, from Value on, between Min and Max.
type Free struct {
	Symbol, Label   string
	Value, Min, Max float64
}

// Deviations fills r with what a model gives less what was measured, each over the
// scatter it is expected to have, at values of what is free; false where there is no
// answer.
type Deviations func(values, r []float64) bool

// Matching is a model held against measured values, and how far it can be trusted.
type Matching struct {
	Parameters  []Parameter // in the order of what was free
	Correlation [][]float64 // as in Fit

	Before, RMS      float64 // root mean square of the deviations at the start and now; RMS <= Before
	DegreesOfFreedom int
	Status           Status
	Iterations       int
	Verdict          []string // plain sentences
}

// secant is the step of a slope, as a share of the distance of the bounds: wide enough to
// pass over the kinks of a model that is itself found by iteration.
const secant = 1e-4

// ErrUnanswered says that the model has no answer where a match is to begin.
var ErrUnanswered = errors.New("there is no answer at the values to begin with")

// Match moves what is free, within its bounds, to where the sum of squares of rows
// deviations is least near the start, by the bounded Levenberg-Marquardt search of this
// package with slopes by differences. It does not go where the model has no answer, and may
// stand still before it; a model that stops answering for good ends the search within a few calls. Intervals are 95 % by
// Student's t on the linearised model, as if deviations were independent and of one size
// throughout; the search is local, so that another start may end elsewhere.
//
// Errors: *RefusedError when nothing is free or rows are no more than what is free;
// ErrUnanswered. Sources: Levenberg (1944), Marquardt (1963), Seber & Wild (1989) ch. 5.
func Match(free []Free, rows int, deviations Deviations, iterations int) (Matching, error) {
	n := len(free)
	if n == 0 || rows <= n {
		return Matching{}, &RefusedError{Reason: fmt.Sprintf("There are %d values to match %d inputs to; allowed: at least one input, and more values than inputs", rows, n)}
	}
	t := &task{family: family{specs: make([]spec, n)}, values: make([]float64, n), low: make([]float64, n), high: make([]float64, n), held: make([]bool, n)}
	for j, f := range free {
		t.family.specs[j] = spec{symbol: f.Symbol, label: f.Label, low: f.Min, high: f.Max}
		t.low[j], t.high[j], t.held[j] = f.Min, f.Max, !(f.Min < f.Max)
		t.values[j] = t.inside(j, f.Value)
	}
	start, r := slices.Clone(t.values), make([]float64, rows)
	if !deviations(start, r) {
		return Matching{}, ErrUnanswered
	}
	first := dot(r, r)
	least := minimise(differences(deviations, t.low, t.high), rows, start, t.low, t.high, iterations)
	if !(least.sum <= first) { // by rounding
		least.x, least.sum = start, first
	}
	t.values, t.atBound, t.iterations = least.x, least.atBound, least.iterations
	if !least.converged {
		t.status = IterationLimit
	}
	m := Matching{Before: math.Sqrt(first / float64(rows)), RMS: math.Sqrt(least.sum / float64(rows)), Status: t.status, Iterations: t.iterations}
	c := confidence{family: t.family, values: t.values}
	for _, j := range t.free() {
		if !t.atBound[j] {
			c.active = append(c.active, j)
		}
	}
	m.DegreesOfFreedom = rows - len(c.active)
	normal := newSymmetric(len(c.active))
	for p, j := range c.active {
		for q, k := range c.active[:p+1] {
			normal.set(p, q, least.normal.at(j, k))
		}
	}
	c.scatter[0] = newScatter(least.sum, m.DegreesOfFreedom)
	c.covariance, c.blind = invert(normal)
	for k := range c.covariance.v {
		c.covariance.v[k] *= c.scatter[0].variance
	}
	_, m.Correlation = c.matrices(n)
	m.Parameters = c.parameters(t, m.Correlation)
	if m.Status == IterationLimit {
		m.Verdict = append(m.Verdict, "The match stopped at its limit of steps; this is the best found so far.")
	}
	m.Verdict = append(m.Verdict, c.judged(m.Parameters, m.Correlation, voice{"the history asks", "this history", "the forecast stays the same", "The history determines every input that was free."})...)
	return m, nil
}

// differences are residuals with slopes by differences towards the middle of the bounds,
// or away from it where there is no answer. Without an answer a residual is infinite, so
// and steep, so that no step is taken there.
func differences(deviations Deviations, low, high []float64) residuals {
	return func(x, r, jacobian []float64) {
		if !deviations(x, r) {
			for i := range r {
				r[i] = math.Inf(1)
			}
			for i := range jacobian {
				jacobian[i] = 1
			}
			return
		}
		if jacobian == nil {
			return
		}
		n := len(x)
		clear(jacobian)
		at, beside := slices.Clone(x), make([]float64, len(r))
		for j := range x {
			step := secant * (high[j] - low[j])
			if x[j] > (low[j]+high[j])/2 {
				step = -step
			}
			for _, h := range [2]float64{step, -step} {
				at[j] = x[j] + h
				if h == 0 || at[j] < low[j] || at[j] > high[j] || !deviations(at, beside) {
					continue
				}
				for i := range r {
					jacobian[i*n+j] = (beside[i] - r[i]) / (at[j] - x[j])
				}
				break
			}
			at[j] = x[j]
		}
	}
}
