package imbibe

import "math"

// Self-similar imbibition.
//
// A long piece of rock at Initial touches water at x = 0, where its saturation is kept at
// Inlet. With q_w the water flux, q_w0 that at the face, and q_t = R q_w0 the total flux,
//
//	q_w0 = A t^-1/2,  F(S) = q_w/q_w0,  f = lw/(lw + lo)
//	(F - R f) F" = -phi Dc/(2 A²),  F(S0) = 1,  F'(S0) = 0,  F(Si) = R f(Si)
//	x(S, t) = (2 A/phi) F'(S) sqrt(t)
//
// R = 0 is counter-current (all oil leaves where the water enters), R = 1 co-current (none
// does). Source: McWhorter & Sunada (1990), eqs. 14-27, from memory; the form with R of 0 to
// 1 as Schmid & Geiger (2012) use it, from memory.
//
// The literature turns this into an integral equation and puts F into the right-hand side
// over and over, which slows as R nears 1 and then fails, since F - R f passes through
// nothing. Here w = -F" and F - R f are kept as two sets of positive unknowns of
//
//	w (F - R f) = K Dc,  K = phi/(2 A²)
//
// and solved by Newton's method, steps being cut so that both stay positive. That is a
// primal-dual interior-point iteration for the concave envelope of R f, with the capillary
// diffusion as its barrier: as K falls to 0, A grows and F becomes the envelope of
// Buckley & Leverett. It needs no damping to be tuned and no starting guess worth the name
// (ours is F - R f = u). Source of the iteration: Wright (1997); cutting is our own.
//
// Both ends may be singular: Dc vanishes or grows as a power, and F' may too. In
// eta = ln((S - Si)/(S0 - S)) powers are exponentials and both ends lie at infinity; there
// Gauss collocation of eight points on panels settles to rounding. Knots of tables are edges of
// panels, and a panel that misses the equation between its points is halved.

// Status says how a solution ended.
type Status string

const (
	Converged Status = "converged"
	Stopped   Status = "stopped before the equation was met" // Residual says how closely it was
	// Overtaken: where Pc is level nothing but the total flux moves water, and at this ratio it
	// runs ahead of the profile, which then has a corner that this solution leaves out.
	Overtaken Status = "overtaken by the total flux where the capillary pressure is level"
)

// Iteration is one step of the solver.
type Iteration struct {
	A      float64 // uptake coefficient, m/s^1/2
	Defect float64 // what the unknowns miss of the equations, as a share of the whole uptake
	Panels int
}

// Solution is the self-similar solution for one rock, two saturations and one ratio R. It
// holds until the water has met the far boundary.
type Solution struct {
	*Span
	Ratio  float64 // R
	A      float64 // m/s^1/2; cumulative water through the face, per area, is 2 A sqrt(t)
	Status Status
	// Residual is the integral over saturation of what F misses of its equation between the
	// points of collocation, as a share of F's whole rise. A is closer by far: the errors
	// change sign from point to point.
	Residual float64
	History  []Iteration

	panels []panel
	toe    float64 // F' by u at Initial; +Inf where the tail has no end
}

// Solve computes the solution for 0 <= ratio <= 1. Errors are *InputError: a ratio outside
// its range, or one so near 1 that no finite A exists (an open face where oil does not
// flow, from which none can leave either); rock in which nothing moves; a singular Dc that
// would take up water without bound.
func Solve(span *Span, ratio float64) (*Solution, error) {
	if !(ratio >= 0 && ratio <= 1) {
		return nil, &InputError{BadRatio, ratio, "0, counter-current, to 1, co-current"}
	}
	atFace, _ := span.FractionalFlow(span.Inlet)
	least := 1 - ratio*atFace
	if !(least >= leastGap) {
		return nil, &InputError{BadRatio, ratio, "below 1 - 1e-6 where the open face is held at residual oil: no oil has to leave there, and nothing limits the rate"}
	}
	if !(span.LowPower > -2) {
		return nil, &InputError{"power with which Dc grows towards the initial water", span.LowPower, "above -2: the rock would soak up water without bound"}
	}
	if !(span.HighPower > -1) {
		return nil, &InputError{"power with which Dc grows towards the open face", span.HighPower, "above -1: the rock would soak up water without bound"}
	}
	s := &solver{span: span, ratio: ratio, least: least, total: 1 - ratio*span.start}
	if !s.mesh() {
		return nil, &InputError{"largest capillary diffusion between the two saturations, m²/s,", 0, "above 0: neither fluid may be at rest throughout"}
	}
	s.guess()
	solution := &Solution{Span: span, Ratio: ratio, Status: Stopped}
	for len(s.panels) <= mostPanels {
		settled := s.converge()
		residual, finer := s.residual(settled)
		solution.Residual = residual
		if finer == nil {
			solution.Status = Converged
			if s.overtaken() {
				solution.Status = Overtaken
			}
			break
		}
		s.panels = finer
		s.integrate()
	}
	solution.A, solution.History, solution.panels = s.uptake(), s.history, s.panels
	solution.toe = s.toe()
	return solution, nil
}

// leastGap is the least share of the water entering that oil has to make up by leaving.
const leastGap = 1e-6

// Flow returns F and F' (by water saturation) at sw between Initial and Inlet.
func (s *Solution) Flow(sw float64) (f, prime float64) {
	width := s.Width()
	if sw <= s.Initial {
		return s.Ratio * s.start, s.toe / width
	}
	if sw >= s.Inlet {
		return 1, 0
	}
	eta := math.Log((sw - s.Initial) / (s.Inlet - sw))
	i, end := 0, len(s.panels)-1
	for i < end && s.panels[i].high < eta {
		i++
	}
	p := &s.panels[i]
	x := min(1, max(-1, (eta-p.low)/p.half()-1))
	_, left := basis(gauss, x)
	prime, q := p.state(&left)
	return (sw-s.Initial)/width*prime + q + s.Ratio*s.start, prime / width
}

// Uptake is the cumulative volume of water through the open face per area, m, after t seconds:
// 2 A sqrt(t).
func (s *Solution) Uptake(t float64) float64 { return 2 * s.A * math.Sqrt(t) }

// Gained is the water that stays in the rock, m: Uptake less what flows on ahead of the
// front where water is mobile from the start, R f(Si) of it.
func (s *Solution) Gained(t float64) float64 { return s.Uptake(t) * (1 - s.Ratio*s.start) }

// At is the distance, m, from the open face at which saturation sw stands after t seconds:
// (2 A/phi) F'(sw) sqrt(t).
func (s *Solution) At(sw, t float64) float64 {
	_, prime := s.Flow(sw)
	return 2 * s.A / s.Porosity * prime * math.Sqrt(t)
}

// Front is the distance that the water has reached after t seconds; +Inf where it has no
// front (Span.FiniteFront).
func (s *Solution) Front(t float64) float64 { return s.At(s.Initial, t) }

// Arrival is when saturation sw reaches the distance length: until the front, or a rise that
// one cares about, meets the far boundary, the solution holds. sw = Initial is the front; 0
// where it has none.
func (s *Solution) Arrival(sw, length float64) float64 {
	root := length / s.At(sw, 1)
	return root * root
}

// Sample is F and F' (by water saturation) at one saturation.
type Sample struct{ Sw, F, Prime float64 }

// Samples returns the solution at every point of collocation that is at least a share step
// of the width from the one before it, in rising saturation; both ends are included.
func (s *Solution) Samples(step float64) []Sample {
	width := s.Width()
	first, start := s.Flow(s.Initial)
	list := []Sample{{s.Initial, first, start}}
	last := 0.0
	for i := range s.panels {
		p := &s.panels[i]
		for j, u := range p.u {
			if u-last < step || 1-u < step/2 {
				continue
			}
			prime, q := p.state(&gauss.left[j])
			list = append(list, Sample{s.Initial + u*width, u*prime + q + s.Ratio*s.start, prime / width})
			last = u
		}
	}
	return append(list, Sample{s.Inlet, 1, 0})
}
