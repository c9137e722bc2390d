package fit

import (
	"math"
	"slices"

	"gonum.org/v1/gonum/mathext"

	"brinefront/physics/relperm"
)

const (
	level         = 0.95
	singular      = 1e-13 // of the largest eigenvalue of the scaled curvature
	participates  = 0.1   // component of a direction that the points do not see
	vague         = 0.25  // standard error over size from which a parameter is not determined
	entangled     = 0.98  // correlation from which two parameters cannot be told apart ...
	entangledFrom = 0.1   // ... when the standard error is more than this of the value
	offChance     = 0.01  // chance that any sound point of a phase is called off its curve
	offAtLeast    = 0.1   // deviation that is never off, as a share of the floor
)

// confidence is what the linearised fit knows of its own error (Seber & Wild 1989,
// ch. 5): with s² = SS/(degrees of freedom), the covariance of the fitted
// parameters is s² (JᵀJ)⁻¹. Where the phases are fitted apart each has its own s²
// and degrees of freedom, for krw and kro seldom scatter alike; a free saturation
// couples them to one s². The intervals suppose that the scatter is σ times one
// number: in percent alike for relative weights, in kr alike for absolute ones.
type confidence struct {
	family     family
	values     []float64
	active     []int     // parameters fitted and not at a bound
	covariance symmetric // of the active ones, as the minimiser moves them
	blind      []bool    // active ones in a direction that the points do not see
	scatter    [2]scatter
}

// scatter is how widely the points of a phase lie about its curve.
type scatter struct {
	variance float64 // s²
	freedom  int     // degrees of freedom of s²
	student  float64 // two-sided quantile of Student's t for an interval
	borrowed bool    // the phase has no degree of freedom left; s² is that of both phases
}

// conclude reports the fit.
func (t *task) conclude() Fit {
	c := confidence{family: t.family, values: t.values}
	for _, j := range t.free() {
		if !t.atBound[j] {
			c.active = append(c.active, j)
		}
	}
	f := Fit{Curves: t.family.curves(t.values), Status: t.status, Iterations: t.iterations,
		DegreesOfFreedom: t.used([]int{0, 1}) - len(c.active)}
	rows := t.linearise(f.Curves, c.active)
	normal := newSymmetric(len(c.active))
	var sum, squares [2]float64
	for _, row := range rows {
		squares[row.phase] += row.deviation * row.deviation
		if row.sigma > 0 {
			sum[row.phase] += row.deviation * row.deviation / (row.sigma * row.sigma)
			for p, a := range row.slopes {
				for q := p; q < len(row.slopes); q++ {
					normal.set(p, q, normal.at(p, q)+a*row.slopes[q])
				}
			}
		}
	}
	n := float64(len(t.points.Sw))
	f.RMSKrw, f.RMSKro = math.Sqrt(squares[0]/n), math.Sqrt(squares[1]/n)
	c.scatter = t.scatters(sum, c.active)
	c.covariance, c.blind = invert(normal)
	for p, j := range c.active {
		for q, k := range c.active[:p+1] {
			c.covariance.set(p, q, c.covariance.at(p, q)*math.Sqrt(c.of(j).variance*c.of(k).variance))
		}
	}
	f.state = c
	f.Covariance, f.Correlation = c.matrices(len(t.values))
	f.Parameters = c.parameters(t, f.Correlation)
	f.Verdict = t.verdict(f, c.off(rows, t.options.Floor))
	return f
}

// scatters finds s² of each block that is fitted by itself, from the phases' sums of
// squares. A block with as many points as parameters leaves no deviation to judge
// by: it takes s² of both phases together.
func (t *task) scatters(sum [2]float64, active []int) (list [2]scatter) {
	pooled := newScatter(sum[0]+sum[1], t.used([]int{0, 1})-len(active))
	for _, b := range t.blocks() {
		squares, freedom := 0.0, t.used(b.phases)
		for _, k := range b.phases {
			squares += sum[k]
		}
		for _, j := range b.free {
			if slices.Contains(active, j) {
				freedom--
			}
		}
		s := pooled
		s.borrowed = freedom == 0
		if freedom > 0 {
			s = newScatter(squares, freedom)
		}
		for _, k := range b.phases {
			list[k] = s
		}
	}
	return list
}

func newScatter(squares float64, freedom int) scatter {
	nu := float64(freedom)
	return scatter{variance: squares / nu, freedom: freedom, student: student(nu, 1-level)}
}

// of is the scatter that a parameter's error follows from; where a parameter shapes
// both curves they share one.
func (c confidence) of(j int) scatter {
	if c.family.specs[j].phase == oil {
		return c.scatter[1]
	}
	return c.scatter[0]
}

// student is the two-sided quantile t of Student's distribution with ν degrees of
// freedom, exceeded by the given chance: with x = ν/(ν + t²), the regularised
// incomplete beta function I_x(ν/2, 1/2) is that chance (Abramowitz & Stegun 1964,
// 26.7.1).
func student(nu, chance float64) float64 {
	x := mathext.InvRegIncBeta(nu/2, 0.5, chance)
	return math.Sqrt(nu * (1 - x) / x)
}

// row is a point beside its curve.
type row struct {
	phase            int
	sw               float64
	deviation, sigma float64
	slopes           []float64 // of deviation/sigma, with respect to the active parameters
}

// linearise sets every point beside the final curves.
func (t *task) linearise(curves relperm.Curves, active []int) []row {
	rows := make([]row, 0, 2*len(t.points.Sw))
	slopes := [2][]float64{make([]float64, len(t.values)), make([]float64, len(t.values))}
	store := make([]float64, 2*len(t.points.Sw)*len(active))
	for i, sw := range t.points.Sw {
		at := curves.At(sw)
		t.family.slopes(t.values, sw, at, slopes[0], slopes[1])
		for k := range slopes {
			r := row{phase: k, sw: sw, deviation: t.deviation(k, i, at), sigma: t.sigma[k][i]}
			if r.sigma > 0 {
				r.slopes, store = store[:len(active)], store[len(active):]
				for p, j := range active {
					r.slopes[p] = slopes[k][j] / r.sigma
				}
			}
			rows = append(rows, r)
		}
	}
	return rows
}

// invert returns the inverse of a curvature matrix through the eigenvalues of the
// matrix scaled to a unit diagonal. An eigenvalue that is zero to rounding marks a
// direction in which the points do not tell the parameters; it is raised to the
// threshold, so that the covariance there is large but finite, and the parameters
// that take part are blind.
func invert(normal symmetric) (inverse symmetric, blind []bool) {
	n := normal.n
	scale := make([]float64, n)
	for j := range scale {
		scale[j] = math.Sqrt(normal.at(j, j))
		if scale[j] == 0 {
			scale[j] = 1
		}
	}
	scaled := newSymmetric(n)
	for j := range n {
		for k := range j + 1 {
			scaled.set(j, k, normal.at(j, k)/(scale[j]*scale[k]))
		}
	}
	inverse, blind = newSymmetric(n), make([]bool, n)
	values, vectors, ok := scaled.eigen()
	if !ok {
		for j := range blind {
			blind[j] = true
		}
		return inverse, blind
	}
	largest := 1.0
	for _, value := range values {
		largest = max(largest, value)
	}
	threshold := singular * largest
	for e, value := range values {
		for j := range n {
			if value < threshold && math.Abs(vectors[j][e]) > participates {
				blind[j] = true
			}
			for k := range j + 1 {
				part := vectors[j][e] * vectors[k][e] / max(value, threshold)
				inverse.set(j, k, inverse.at(j, k)+part/(scale[j]*scale[k]))
			}
		}
	}
	return inverse, blind
}

// outward is d(parameter)/d(what the minimiser moves).
func (c confidence) outward(j int) float64 {
	if c.family.specs[j].log {
		return c.values[j]
	}
	return 1
}

// matrices spreads the covariance over all n parameters.
func (c confidence) matrices(n int) (covariance, correlation [][]float64) {
	covariance, correlation = square(n), square(n)
	for j := range n {
		correlation[j][j] = 1
	}
	for p, j := range c.active {
		for q, k := range c.active {
			v := c.covariance.at(p, q)
			covariance[j][k] = v * (c.outward(j) * c.outward(k)) // the same both ways round
			if scale := math.Sqrt(c.covariance.at(p, p) * c.covariance.at(q, q)); p != q && scale > 0 {
				correlation[j][k] = min(max(v/scale, -1), 1)
			}
		}
	}
	return covariance, correlation
}

func square(n int) [][]float64 {
	rows := make([][]float64, n)
	for i := range rows {
		rows[i] = make([]float64, n)
	}
	return rows
}

// parameters reports each parameter with its interval.
func (c confidence) parameters(t *task, correlation [][]float64) []Parameter {
	list := make([]Parameter, len(c.values))
	for j, s := range c.family.specs {
		v := c.values[j]
		list[j] = Parameter{Symbol: s.symbol, Label: s.label, Value: v, Low: v, High: v, Min: t.low[j], Max: t.high[j],
			AtBound: t.atBound[j], Held: t.held[j], Determined: !t.atBound[j]}
	}
	for p, j := range c.active {
		q, s := &list[j], c.family.specs[j]
		stdErr := math.Sqrt(c.covariance.at(p, p))
		q.StdErr = stdErr * c.outward(j)
		if c.blind[p] {
			q.Low, q.High, q.Determined = q.Min, q.Max, false
			continue
		}
		q.Low = max(s.outer(s.inner(q.Value)-c.of(j).student*stdErr), q.Min)
		q.High = min(s.outer(s.inner(q.Value)+c.of(j).student*stdErr), q.Max)
		relative := q.StdErr / c.size(j)
		_, r := strongest(correlation, j)
		q.Determined = relative <= vague && (math.Abs(r) <= entangled || relative <= entangledFrom)
	}
	return list
}

// size is what a parameter's standard error is judged against: its value, or, for
// the end saturations, the movable range.
func (c confidence) size(j int) float64 {
	if c.family.specs[j].saturation {
		return 1 - c.values[iSwc] - c.values[iSor]
	}
	return math.Abs(c.values[j])
}

// strongest returns the parameter that j is most correlated with.
func strongest(correlation [][]float64, j int) (other int, r float64) {
	for k, v := range correlation[j] {
		if k != j && math.Abs(v) > math.Abs(r) {
			other, r = k, v
		}
	}
	return other, r
}

// off returns the rows whose deviation is too large to be chance: with r the
// deviation over σ, h the row's leverage and ν the degrees of freedom,
//
//	r² / (1-h) > t² (ν s² - r²/(1-h)) / (ν-1)
//
// The right side is s² without the row itself, which would hide among few others; t
// is Student's quantile at the chance offChance shared out over the phase's rows.
// Source: Cook & Weisberg (1982), the outlier test.
func (c confidence) off(rows []row, floor float64) []row {
	var count [2]int
	for _, r := range rows {
		if r.sigma > 0 {
			count[r.phase]++
		}
	}
	var t [2]float64
	for k, s := range c.scatter {
		if s.freedom >= 2 && count[k] > 0 {
			t[k] = student(float64(s.freedom-1), offChance/float64(count[k]))
		}
	}
	var list []row
	for _, r := range rows {
		s := c.scatter[r.phase]
		if r.sigma == 0 || math.Abs(r.deviation) < offAtLeast*floor || s.freedom < 2 {
			continue
		}
		left := s.variance - c.spread(r.slopes) // s² (1-h)
		if left <= 0 {
			continue
		}
		nu, own := float64(s.freedom), s.variance/left*math.Pow(r.deviation/r.sigma, 2)
		if own > t[r.phase]*t[r.phase]*max(nu*s.variance-own, 0)/(nu-1) {
			list = append(list, r)
		}
	}
	return list
}

// spread is the variance gᵀ C g of what has slopes g.
func (c confidence) spread(g []float64) float64 {
	sum := 0.0
	for p, a := range g {
		for q, b := range g {
			sum += a * b * c.covariance.at(p, q)
		}
	}
	return max(sum, 0)
}

// Band returns the 95 % confidence band of the curves at sw, by the delta method:
// kr ± t sqrt(gᵀ C g) with g the slopes of kr with respect to the fitted
// parameters, C their covariance and t Student's quantile. It is the band of the
// curve, not of a further measurement; it is cut at 0. Where every parameter is
// held or at a bound it is the curve itself. Outside the curves' ends the end
// values hold. Source: Seber & Wild (1989), sec. 5.1.
func (f Fit) Band(sw float64) (krwLow, krwHigh, kroLow, kroHigh float64) {
	c := f.state
	at := f.Curves.At(sw)
	n := len(c.values)
	room := make([]float64, 2*n+len(c.active)) // one for all: a picture asks hundreds of times
	slopes, g := [2][]float64{room[:n], room[n : 2*n]}, room[2*n:]
	c.family.slopes(c.values, sw, at, slopes[0], slopes[1])
	var half [2]float64
	for k := range slopes {
		for p, j := range c.active {
			g[p] = slopes[k][j]
		}
		half[k] = c.scatter[k].student * math.Sqrt(c.spread(g))
	}
	return max(at.Krw-half[0], 0), at.Krw + half[0], max(at.Kro-half[1], 0), at.Kro + half[1]
}
