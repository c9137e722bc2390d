package fit

import (
	"fmt"
	"math"
	"slices"
	"sort"

	"brinefront/physics/relperm"
)

const (
	defaultFloor      = 0.01
	defaultIterations = 500
	thinnedRows       = 64    // a longer table is thinned to this while starts are tried
	atEnd             = 1e-12 // saturations closer than this are the same
)

// task is one fit under way.
type task struct {
	family  family
	points  Points
	options Options

	values     []float64 // of every parameter
	low, high  []float64
	held       []bool
	atBound    []bool
	sigma      [2][]float64 // of krw and kro in every row; 0 where the row carries no information
	status     Status
	iterations int
}

// newTask checks the options and sets bounds, weights and what is held.
func newTask(f family, p Points, o Options) (*task, error) {
	if o.Floor == 0 {
		o.Floor = defaultFloor
	}
	if o.Iterations <= 0 {
		o.Iterations = defaultIterations
	}
	if !(o.Floor > 0 && o.Floor <= 1) {
		return nil, &RefusedError{Reason: fmt.Sprintf("The smallest kr that counts reads %g; allowed: above 0, up to 1", o.Floor)}
	}
	n := len(f.specs)
	t := &task{family: f, points: p, options: o, values: make([]float64, n), low: make([]float64, n), high: make([]float64, n),
		held: make([]bool, n), atBound: make([]bool, n)}
	for j, s := range f.specs {
		t.low[j], t.high[j] = s.low, s.high
	}
	first, last := ends(p.Sw)
	t.high[iSwc], t.high[iSor] = p.Sw[first], tidy(1-p.Sw[last])
	t.values[iSwc], t.values[iSor] = t.high[iSwc], t.high[iSor]
	t.held[iSwc], t.held[iSor] = !o.FreeSaturations, !o.FreeSaturations
	t.values[iKrw0], t.values[iKro0] = t.inside(iKrw0, p.Krw[last]), t.inside(iKro0, p.Kro[first])
	t.held[iKrw0], t.held[iKro0] = o.HoldEnds, o.HoldEnds
	if err := t.hold(o.Hold); err != nil {
		return nil, err
	}
	for j := range t.held {
		t.held[j] = t.held[j] || t.low[j] == t.high[j]
	}
	t.weigh()
	return t, t.enough()
}

func (t *task) inside(j int, v float64) float64 { return min(max(v, t.low[j]), t.high[j]) }

// hold takes over the values the caller wants held.
func (t *task) hold(values map[string]float64) error {
	symbols := make([]string, 0, len(values))
	for symbol := range values {
		symbols = append(symbols, symbol)
	}
	sort.Strings(symbols)
	for _, symbol := range symbols {
		v := values[symbol]
		j := slices.IndexFunc(t.family.specs, func(s spec) bool { return s.symbol == symbol })
		if j < 0 {
			return &RefusedError{Reason: "There is no parameter " + symbol + " to hold"}
		}
		if !(v >= t.low[j] && v <= t.high[j]) {
			return &RefusedError{Reason: fmt.Sprintf("%s is to be held at %g; allowed: %g to %g", symbol, v, t.low[j], t.high[j])}
		}
		t.values[j], t.held[j] = v, true
	}
	return nil
}

// weigh sets the weights. A row at a held end, where the curve is zero whatever its
// parameters, gets none.
func (t *task) weigh() {
	for k, kr := range [2][]float64{t.points.Krw, t.points.Kro} {
		t.sigma[k] = make([]float64, len(kr))
		for i, sw := range t.points.Sw {
			switch {
			case k == 0 && t.held[iSwc] && sw <= t.values[iSwc]+atEnd, k == 1 && t.held[iSor] && sw >= 1-t.values[iSor]-atEnd:
			case t.options.Weights == Absolute:
				t.sigma[k][i] = 1
			default:
				t.sigma[k][i] = max(kr[i], t.options.Floor)
			}
		}
	}
}

// enough checks that there are more points than parameters, for each phase by
// itself where they are fitted apart.
func (t *task) enough() error {
	for _, b := range t.blocks() {
		if got, need := t.used(b.phases), len(b.free); got < need {
			return &RefusedError{Reason: fmt.Sprintf("The points give %d values of %s that a curve can be fitted to; allowed: at least %d, one for each parameter", got, b.name, need)}
		}
	}
	if got, need := t.used([]int{0, 1}), len(t.free())+1; got < need {
		return &RefusedError{Reason: fmt.Sprintf("The points give %d values that curves can be fitted to; allowed: at least %d, one more than there are parameters", got, need)}
	}
	return nil
}

func (t *task) used(phases []int) int {
	n := 0
	for _, k := range phases {
		for _, s := range t.sigma[k] {
			if s > 0 {
				n++
			}
		}
	}
	return n
}

// free lists the parameters that are fitted.
func (t *task) free() []int {
	var list []int
	for j, held := range t.held {
		if !held {
			list = append(list, j)
		}
	}
	return list
}

// block is a part of the fit that can be minimised by itself.
type block struct {
	name   string
	phases []int // 0 krw, 1 kro
	free   []int // parameters
}

// blocks: with both saturations held, each phase has its own parameters.
func (t *task) blocks() []block {
	if !t.held[iSwc] || !t.held[iSor] {
		return []block{{"krw and kro", []int{0, 1}, t.free()}}
	}
	list := []block{{name: "krw", phases: []int{0}}, {name: "kro", phases: []int{1}}}
	for _, j := range t.free() {
		b := &list[t.family.specs[j].phase-water]
		b.free = append(b.free, j)
	}
	return list
}

// solve fits block after block. Starts are tried on a thinned table; the best is
// then fitted to all rows.
func (t *task) solve() {
	all, few := thinned(len(t.points.Sw))
	for _, b := range t.blocks() {
		if len(b.free) == 0 {
			continue
		}
		var best minimum
		for k, x := range t.starts(b) {
			if m := t.minimise(b, few, x); k == 0 || m.sum < best.sum {
				best = m
			}
		}
		if len(few) < len(all) {
			best = t.minimise(b, all, best.x)
		}
		t.take(b, best.x)
		for p, j := range b.free {
			t.atBound[j] = best.atBound[p]
		}
		t.iterations += best.iterations
		if !best.converged {
			t.status = IterationLimit
		}
	}
}

// thinned lists all rows of a table, and those few of them that starts are tried on.
func thinned(rows int) (all, few []int) {
	all = make([]int, rows)
	for i := range all {
		all[i] = i
	}
	if rows <= thinnedRows {
		return all, all
	}
	few = make([]int, thinnedRows)
	for i := range few {
		few[i] = i * (rows - 1) / (thinnedRows - 1)
	}
	return all, few
}

// starts are the vectors that a block starts from: every shape of the family, and
// with free saturations each from their bound and from well inside. These reach the
// least sum of squares of noisy invented tables when the saturations are held; when
// they are free, LET may stop at a neighbouring minimum whose sum is larger by a
// percent or two, far less than its error.
func (t *task) starts(b block) [][]float64 {
	shares := []float64{1}
	if len(b.phases) > 1 {
		shares = []float64{1, 0.7}
	}
	var list [][]float64
	for _, shape := range t.family.starts {
		for _, share := range shares {
			x := make([]float64, len(b.free))
			for p, j := range b.free {
				switch {
				case j < iKrw0:
					x[p] = share * t.high[j]
				case j < iShape:
					x[p] = t.values[j]
				default:
					x[p] = shape[(j-iShape)%t.family.shapes]
				}
			}
			list = append(list, x)
		}
	}
	return list
}

// take sets the parameters of a block from what the minimiser moves.
func (t *task) take(b block, x []float64) {
	for p, j := range b.free {
		t.values[j] = t.inside(j, t.family.specs[j].outer(x[p]))
	}
}

// minimise runs the minimiser on some rows of a block.
func (t *task) minimise(b block, rows []int, x []float64) minimum {
	low, high := make([]float64, len(x)), make([]float64, len(x))
	for p, j := range b.free {
		low[p], high[p] = t.family.specs[j].inner(t.low[j]), t.family.specs[j].inner(t.high[j])
	}
	slopes := [2][]float64{make([]float64, len(t.values)), make([]float64, len(t.values))}
	eval := func(x, r, jacobian []float64) {
		t.take(b, x)
		curves := t.family.curves(t.values)
		m := 0
		for _, i := range rows {
			at := curves.At(t.points.Sw[i])
			if jacobian != nil {
				t.family.slopes(t.values, t.points.Sw[i], at, slopes[0], slopes[1])
			}
			for _, k := range b.phases {
				sigma := t.sigma[k][i]
				if sigma == 0 {
					continue
				}
				r[m] = t.deviation(k, i, at) / sigma
				if jacobian != nil {
					for p, j := range b.free {
						jacobian[m*len(b.free)+p] = slopes[k][j] / sigma
					}
				}
				m++
			}
		}
	}
	m := 0
	for _, i := range rows {
		for _, k := range b.phases {
			if t.sigma[k][i] > 0 {
				m++
			}
		}
	}
	return minimise(eval, m, x, low, high, t.options.Iterations)
}

// deviation is curve minus point.
func (t *task) deviation(k, i int, at relperm.Point) float64 {
	if k == 0 {
		return at.Krw - t.points.Krw[i]
	}
	return at.Kro - t.points.Kro[i]
}

// ends returns the rows of the smallest and the largest saturation.
func ends(sw []float64) (first, last int) {
	for i, s := range sw {
		if s < sw[first] {
			first = i
		}
		if s > sw[last] {
			last = i
		}
	}
	return first, last
}

// tidy drops the rounding that 1-0.8 has, so that it reads 0.2.
func tidy(v float64) float64 { return math.Round(v*1e12) / 1e12 }
