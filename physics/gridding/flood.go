// Package gridding says how coarse a simulation grid may be: it runs a displacement on N
// cells, sets it beside the exact solution, and finds the N that keeps the error within what
// may be.
//
// Everything is dimensionless: the length between injector and producer is 1, volumes are
// pore volumes.
package gridding

import (
	"fmt"
	"math"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/fv"
)

// Flood is a displacement with its exact solution, ready to be run on grids.
type Flood struct {
	Exact *displace.Displacement

	law     *fv.Law
	fn      fracflow.Function
	level   float64 // of the water cut at which arrival is counted
	arrival float64 // the exact one
}

// Scheme is how a grid is stepped.
type Scheme struct {
	Limiter  fv.Limiter // None: single-point upstream
	Implicit bool       // backward Euler, upstream; then CFL may be any number above 0
	CFL      float64    // fastest wave times step over cell; 0: 0.5
}

// Sample is the state of a run at the outlet when Q has been injected.
type Sample struct{ Q, Cut, Recovery float64 }

// Measured is a run on a grid, beside the exact solution.
type Measured struct {
	Scheme    Scheme
	Cells     int
	Steps     int
	CellSteps float64 // evaluations of a cell: the cost
	Until     float64 // what was injected

	Arrival      float64 // Q at which the cut at the outlet reaches the level; +Inf: not by Until
	ArrivalError float64 // of the exact one, as a part of it: negative is early
	Recovery     float64 // pore volumes at Until
	RecoveryError,
	CutError float64 // against the exact ones at Until
	L1        float64   // mean |error| of the cell averages at ProfileAt
	ProfileAt float64   // Q after the first step past half the exact breakthrough
	Profile   []float64 // there
	History   []Sample
	Balance   fv.Balance
}

// samples of a run that are kept, nearly even in Q where the steps are short enough.
const samples = 120

// New makes a displacement of fn ready for grids. level is the water cut at the outlet (reservoir
// conditions) at which water counts as having arrived: the first passing of it, from below.
// Errors are those of fv.NewLaw, or that the level is never reached.
func New(exact *displace.Displacement, fn fracflow.Function, level float64) (*Flood, error) {
	law, err := fv.NewLaw(fn, exact.Injected(), exact.Initial())
	if err != nil {
		return nil, err
	}
	if law, err = law.Tabulated(512); err != nil {
		return nil, err
	}
	f := &Flood{Exact: exact, law: law, fn: fn, level: level}
	q, ok := exact.PVIAtCut(level)
	if !ok || !(q > 0) {
		return nil, fmt.Errorf("gridding: the cut at the outlet never passes %.6g; allowed: a level between what flows there at first and what is injected", level)
	}
	f.arrival = q
	return f, nil
}

// Cost is how many evaluations of a cell a run takes, nearly: up to q or to the arrival.
func (f *Flood) Cost(s Scheme, n int, q float64) float64 {
	perStep := float64(n)
	switch {
	case s.Implicit:
		perStep *= 6 // rounds of Newton's method, on long steps
	case s.Limiter != fv.None:
		perStep *= 2 // stages
	}
	return perStep * math.Ceil(math.Max(q, f.arrival)/f.Step(s, n))
}

// Step is the step in Q that the scheme takes on n cells.
func (f *Flood) Step(s Scheme, n int) float64 {
	if s.CFL == 0 {
		s.CFL = 0.5
	}
	return s.CFL / (float64(n) * f.Fastest())
}

// Fastest is the largest slope of f between the injected and the initial state: the speed that
// CFL counts with.
func (f *Flood) Fastest() float64 { return f.law.Fastest(f.Exact.Injected(), f.Exact.Initial()) }

// Arrival is the exact Q at which the level is reached.
func (f *Flood) Arrival() float64 { return f.arrival }

// HalfWay is the Q at which profiles are compared: half the exact breakthrough.
func (f *Flood) HalfWay() float64 { return f.Exact.Breakthrough() / 2 }

// stepper is a run of either kind.
type stepper interface {
	Cells() []float64
	Outflow() float64
	Steps() int
	Balance() fv.Balance
}

// Run takes the flood through n cells until q has been injected and, in any case, water has
// arrived or twice the exact arrival has passed. Errors are those of fv: a scheme that cannot be.
func (f *Flood) Run(s Scheme, n int, q float64) (Measured, error) {
	if s.CFL == 0 {
		s.CFL = 0.5
	}
	if s.Implicit {
		return f.implicit(s, n, q)
	}
	run, err := fv.New(f.law, fv.Settings{Cells: n, CFL: s.CFL, Limiter: s.Limiter, Injected: f.Exact.Injected(), Initial: f.Exact.Initial()})
	if err != nil {
		return Measured{}, err
	}
	m := f.measure(run, s, n, q, func(to float64, each func(float64)) {
		run.Advance(to, func(r *fv.Run) bool { each(r.Q()); return true })
	})
	m.CellSteps = float64(m.Steps) * float64(n)
	if s.Limiter != fv.None {
		m.CellSteps *= 2 // two stages
	}
	return m, nil
}

func (f *Flood) implicit(s Scheme, n int, q float64) (Measured, error) {
	inlet, open := f.Exact.InletFace()
	run, err := fv.NewImplicit(fv.Medium{Law: f.law}, fv.ImplicitSettings{
		Cells: n, Initial: f.Exact.Initial(), Through: 1, Inlet: fv.End{Kind: fv.Fed, State: inlet, Share: open}, Outlet: fv.End{Kind: fv.Open},
		Step: f.Step(s, n),
	})
	if err != nil {
		return Measured{}, err
	}
	m := f.measure(run, s, n, q, func(to float64, each func(float64)) {
		run.Advance(to, func(r *fv.Implicit) bool { each(r.T()); return true })
	})
	if run.Stalled() {
		return m, fmt.Errorf("gridding: Newton's method failed at %.6g pore volumes", run.T())
	}
	m.CellSteps = float64(run.Work())
	return m, nil
}

// measure runs and sets beside. What is kept is kept after the step that passes it: the steps
// are the scheme's own.
func (f *Flood) measure(run stepper, s Scheme, n int, q float64, advance func(to float64, each func(float64))) Measured {
	m := Measured{Scheme: s, Cells: n, Until: q, Arrival: math.Inf(1)}
	last := Sample{Cut: f.ahead()}
	m.History = append(m.History, last)
	profile := func(at float64) {
		if m.Profile == nil && at >= f.HalfWay() {
			m.ProfileAt = at
			m.Profile = append(m.Profile, run.Cells()...)
		}
	}
	arrive := func(at float64) {
		cut := run.Outflow()
		if math.IsInf(m.Arrival, 1) && cut >= f.level {
			m.Arrival = last.Q + (at-last.Q)*(f.level-last.Cut)/(cut-last.Cut)
		}
		last.Q, last.Cut = at, cut
		profile(at)
	}
	advance(q, func(at float64) {
		arrive(at)
		if k := len(m.History); at >= q || at >= float64(k)*q/samples {
			m.History = append(m.History, Sample{at, last.Cut, mean(run.Cells()) - f.Exact.Initial()})
		}
	})
	end := m.History[len(m.History)-1]
	m.Recovery, m.RecoveryError = end.Recovery, end.Recovery-f.Exact.Recovery(q)
	_, exact := f.Exact.Outlet(q)
	m.CutError = end.Cut - exact
	for to := q; to < 2*f.arrival && (math.IsInf(m.Arrival, 1) || m.Profile == nil); {
		to = math.Min(2*f.arrival, to+f.arrival/10)
		advance(to, arrive)
	}
	m.ArrivalError = m.Arrival/f.arrival - 1
	if m.Profile != nil {
		m.L1, _, _ = fv.Norms(m.Profile, f.Averages(m.ProfileAt, n))
	}
	m.Steps, m.Balance = run.Steps(), run.Balance()
	return m
}

func (f *Flood) ahead() float64 {
	cut, _ := f.fn.At(f.Exact.Initial())
	return cut
}

// Averages are the exact mean states of n cells when q has been injected: a flood up to a
// face is that of a shorter rock.
func (f *Flood) Averages(q float64, n int) []float64 {
	out := make([]float64, n)
	before := 0.0
	for i := range out {
		x := float64(i+1) / float64(n)
		upTo := x * f.Exact.Average(q/x)
		out[i] = (upTo - before) * float64(n)
		before = upTo
	}
	return out
}

func mean(list []float64) float64 {
	sum := 0.0
	for _, v := range list {
		sum += v
	}
	return sum / float64(len(list))
}
