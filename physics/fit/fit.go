// Package fit draws parametric relative permeability curves through laboratory
// points and says how well the points determine them.
//
// The curve is the one that makes the weighted sum of squares smallest,
//
//	SS = Σ [(krw(Swi) - krwi)/σwi]² + Σ [(kro(Swi) - kroi)/σoi]²
//
// within bounds on every parameter. With relative weights σ = max(kr, floor): a
// point counts by its error in percent, and points below the floor, the smallest
// kr that the measurement resolves, by their error in percent of the floor. Hence a
// kr of zero does no harm. With absolute weights σ = 1.
//
// Connate water and residual oil are states of the core that the laboratory
// measures by balance, not shape parameters: they are held at the first and last
// saturation of the points unless Options.FreeSaturations is set. End points and
// exponents are fitted. A point at which a curve is zero whatever its parameters,
// krw at Swc and kro at 1-Sor, carries no information: it is left out of the sum
// and of the degrees of freedom.
//
// Minimiser: lm.go. Confidence: confidence.go. Plain words: verdict.go. What is
// wrong with the points themselves: inspect.go.
package fit

import (
	"fmt"
	"strings"

	"brinefront/physics/relperm"
)

// Points are laboratory points, one a row, as fractions.
type Points struct {
	Sw, Krw, Kro []float64

	// RelativeToOil: the study says that kr refers to the oil permeability at
	// initial water. Default: it refers to absolute permeability. Inspect uses it.
	RelativeToOil bool

	// FilledByOil: where there is no water there is nothing but "oil" in the pores,
	// as with brine before gas enters: its kr is then 1 of absolute permeability.
	FilledByOil bool
}

// Weighting is how much a point counts.
type Weighting int

const (
	Relative Weighting = iota // by its error in percent: small values count as much as large ones
	Absolute                  // by its error in kr: large values dominate; intervals hold only where small kr scatter as widely
)

// Options say how to fit; the zero value is the default.
type Options struct {
	// Weights: see the package comment. Default: Relative.
	Weights Weighting
	// Floor is the smallest kr that the measurement resolves; relative weights
	// count smaller values as this one. Greater than 0, up to 1; default 0.01
	// (common practice, no source).
	Floor float64
	// FreeSaturations fits Swc between 0 and the smallest saturation of the points
	// and Sor between 0 and 1 minus the largest. Default: held at these.
	FreeSaturations bool
	// HoldEnds holds krw0 and kro0 at the points' values at the last and first
	// saturation. Default: fitted.
	HoldEnds bool
	// Hold holds parameters, by symbol, at values within their bounds. Default: none.
	Hold map[string]float64
	// Iterations limits the work of the minimiser for each start. Default 500.
	Iterations int
}

// Status says how the minimiser ended.
type Status int

const (
	Converged Status = iota
	IterationLimit
)

// String returns the status in words.
func (s Status) String() string {
	if s == Converged {
		return "converged"
	}
	return "iteration limit reached"
}

// Parameter is a fitted or held parameter.
type Parameter struct {
	Symbol, Label string
	Value         float64
	StdErr        float64 // standard error; 0 when held or at its bound
	Low, High     float64 // 95 % confidence interval by Student's t, cut at the bounds; both Value when held or at its bound
	Min, Max      float64 // bounds
	AtBound       bool    // the sum of squares would fall further beyond the bound
	Held          bool    // not fitted
	Determined    bool    // the points determine it; see Verdict for the reason when they do not
}

// Fit is a pair of curves through points, and how far they can be trusted.
type Fit struct {
	Curves     relperm.Curves // relperm.Corey or relperm.LET
	Parameters []Parameter

	// Covariance and Correlation of the parameters, in their order. Rows of held
	// parameters and of those at a bound are zero, with 1 on the diagonal of the
	// correlation.
	Covariance, Correlation [][]float64

	RMSKrw, RMSKro   float64 // root mean square of curve minus point, all rows, unweighted
	DegreesOfFreedom int     // points used minus parameters fitted
	Status           Status
	Iterations       int      // of the starts that were kept
	Verdict          []string // plain sentences

	state confidence
}

// RefusedError says why no curve can be drawn.
type RefusedError struct {
	Reason   string
	Findings []Finding // those of the points that refuse; nil when the options are at fault
}

// Error implements error.
func (e *RefusedError) Error() string {
	if len(e.Findings) == 0 {
		return e.Reason
	}
	texts := make([]string, len(e.Findings))
	for i, f := range e.Findings {
		texts[i] = f.Text
	}
	return e.Reason + ": " + strings.Join(texts, " ")
}

// Corey fits the power form
//
//	krw = krw0 s^nw, kro = kro0 (1-s)^no, s = (Sw-Swc)/(1-Swc-Sor)
//
// with 1e-6 <= krw0, kro0 <= 2 and 1 <= nw, no <= 15.
//
// Errors: *RefusedError when Inspect refuses the points, an option is out of range,
// or fewer points than parameters are left. It panics when the slices of p differ
// in length. Source of the form: Corey (1954), free exponents are common practice.
func Corey(p Points, o Options) (Fit, error) { return run(coreyFamily, p, o) }

// LET fits the three-parameter form
//
//	krw = krw0 s^Lw/[s^Lw + Ew (1-s)^Tw], kro = kro0 (1-s)^Lo/[(1-s)^Lo + Eo s^To]
//
// with 1e-6 <= krw0, kro0 <= 2, 1 <= L <= 20, 1e-3 <= E <= 1e4, 0.5 <= T <= 20.
// E is fitted by its logarithm, so its interval is Value exp(±t StdErr/Value).
// Several starts, always the same, guard against local minima.
//
// Errors as Corey. Source of the form: Lomeland, Ebeltoft & Thomas (2005).
func LET(p Points, o Options) (Fit, error) { return run(letFamily, p, o) }

func run(f family, p Points, o Options) (Fit, error) {
	p.mustMatch()
	var refusing []Finding
	for _, finding := range Inspect(p) {
		if finding.Refuse {
			refusing = append(refusing, finding)
		}
	}
	if len(refusing) > 0 {
		return Fit{}, &RefusedError{Reason: "No curve can be drawn through these points", Findings: refusing}
	}
	t, err := newTask(f, p, o)
	if err != nil {
		return Fit{}, err
	}
	t.solve()
	return t.conclude(), nil
}

func (p Points) mustMatch() {
	if len(p.Krw) != len(p.Sw) || len(p.Kro) != len(p.Sw) {
		panic(fmt.Sprintf("fit: %d saturations, %d krw, %d kro", len(p.Sw), len(p.Krw), len(p.Kro)))
	}
}
