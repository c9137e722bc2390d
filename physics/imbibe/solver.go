package imbibe

import (
	"math"
	"slices"
)

// solver holds the unknowns. Saturation is u, from 0 at Initial to 1 at Inlet; sources are
// Dc du/deta over their largest value, scale.
type solver struct {
	span    *Span
	ratio   float64 // R
	least   float64 // F - R f at the open face
	total   float64 // the rise of F, 1 - R f(Si)
	scale   float64 // m2/s
	k       float64 // phi width² scale/(2 A²)
	panels  []panel
	answers []response
	history []Iteration
}

// uptake is A of the present K.
func (s *solver) uptake() float64 {
	return s.span.Width() * math.Sqrt(s.span.Porosity*s.scale/(2*s.k))
}

// reach is how far eta goes: to where what lies beyond is a last digit of the uptake and, at
// the dry end, of F' too where that has an end. Farther than 600 a power would underflow;
// Dc ~ (S - Si)^0.06 gets that far.
func (s *solver) reach() (low, high float64) {
	const digits = 36.0 // e^-36 is less than a rounding error
	m, q := s.span.LowPower, s.span.HighPower
	low, high = digits, digits
	if m < 0 {
		low = digits / (1 + m/2)
	} else if m > 0 {
		low = digits / min(1, m)
	}
	if !math.IsInf(q, 1) {
		high = digits / (1 + q) // where F' ~ (S0 - S)^(1+q) ends
	}
	return -min(low, 600), min(high, 600)
}

// mesh lays the first panels, longer towards the ends where little happens, cut at knots. It
// reports whether anything can flow.
func (s *solver) mesh() bool {
	low, high := s.reach()
	edges := []float64{low, 0, high}
	for _, side := range []struct{ sign, end, longest float64 }{
		{-1, -low, 5},       // Q falls by five powers of e
		{1, high, high / 6}, // and F' by six: what eight points can follow
	} {
		for eta, step := 0.0, 1.5; eta < side.end; step *= 1.3 {
			eta += min(step, side.longest)
			edges = append(edges, side.sign*eta)
		}
	}
	for _, knots := range [][]float64{s.span.Kr.Knots(), s.span.Pc.Knots()} {
		for _, sw := range knots {
			if sw > s.span.Initial && sw < s.span.Inlet {
				edges = append(edges, math.Log((sw-s.span.Initial)/(s.span.Inlet-sw)))
			}
		}
	}
	slices.Sort(edges)
	edges = slices.DeleteFunc(edges, func(e float64) bool { return e < low || e > high })
	edges = slices.CompactFunc(edges, func(a, b float64) bool { return math.Abs(b-a) < 1e-9 })
	s.scale = 1
	for i := 1; i < len(edges); i++ {
		s.panels = append(s.panels, s.panel(edges[i-1], edges[i]))
	}
	largest := 0.0
	for i := range s.panels {
		largest = max(largest, slices.Max(s.panels[i].source[:]))
	}
	s.scale = largest
	for i := range s.panels {
		for j := range s.panels[i].source {
			s.panels[i].source[j] /= largest
		}
	}
	return largest > 0
}

// look evaluates the rock at eta.
func (s *solver) look(eta float64) (u, source, rise float64) {
	u, rest := coordinates(eta)
	if eta < 0 {
		source, rise = s.span.FromInitial(u * s.span.Width())
	} else {
		source, rise = s.span.FromInlet(rest * s.span.Width())
	}
	return u, source * u * rest / s.scale, rise
}

func (s *solver) panel(low, high float64) panel {
	p := panel{low: low, high: high}
	for j, x := range gauss.x {
		p.u[j], p.source[j], p.rise[j] = s.look(p.place(x))
	}
	return p
}

// integrate gives every panel P at its right edge and Q at its left.
func (s *solver) integrate() {
	var prime, q float64
	for i := range s.panels {
		s.panels[i].left = q
		_, more := s.panels[i].sum()
		q += more
	}
	for i := len(s.panels) - 1; i >= 0; i-- {
		s.panels[i].right = prime
		more, _ := s.panels[i].sum()
		prime += more
	}
}

// guess takes F - R f = u into the equation once and keeps the gap positive.
func (s *solver) guess() {
	rise := 0.0
	for i := range s.panels {
		p := &s.panels[i]
		for j := range p.w {
			p.w[j] = p.source[j] / p.u[j]
		}
		_, more := p.sum()
		rise += more
	}
	s.k = s.total / rise
	for i := range s.panels {
		for j := range s.panels[i].w {
			s.panels[i].w[j] *= s.k
		}
	}
	s.integrate()
	for i := range s.panels {
		p := &s.panels[i]
		for j := range p.gap {
			prime, q := p.state(&gauss.left[j])
			f := p.u[j]*prime + q
			p.gap[j] = max(f-s.ratio*p.rise[j], f/10)
		}
	}
}

const (
	exact      = 1e-11 // defect at which the unknowns of a mesh are settled
	mostSteps  = 40    // of Newton on one mesh; R = 1 - 1e-6 takes some thirty in all
	mostPanels = 600
	uptakePart = 1e-10 // what a panel may miss of F's rise before it is halved
	primePart  = 1e-9  // and of F' there
)

// converge settles the unknowns of the present mesh and reports whether it could.
func (s *solver) converge() bool {
	s.answers = slices.Grow(s.answers[:0], len(s.panels))
	// F - R f is a difference of numbers near 1.
	enough := max(exact, 1e-15/s.least)
	for range mostSteps {
		defect := s.defect()
		s.history = append(s.history, Iteration{s.uptake(), defect, len(s.panels)})
		if defect < enough {
			return true
		}
		if !(defect < math.Inf(1)) {
			return false
		}
		s.newton()
	}
	return false
}

// defect is what the unknowns miss of both equations, summed as a share of F's rise and,
// so that a thin tail counts too, of F' there.
func (s *solver) defect() float64 {
	rise, prime := 0.0, 0.0
	steep := s.steep()
	for i := range s.panels {
		p := &s.panels[i]
		own := 0.0
		for j, w := range p.w {
			missed := math.Abs(w-s.k*p.source[j]/p.gap[j]) + w*math.Abs(s.miss(p, j))/p.gap[j]
			own += p.half() * gauss.weight[j] * missed
			rise += p.half() * gauss.weight[j] * missed * p.u[j]
		}
		prime += own / max(p.right, steep)
	}
	return rise/s.total + prime
}

// steep is an F' so much less than that at the dry end that nobody asks for its digits.
func (s *solver) steep() float64 { return 1e-3 * s.panels[0].right }

// residual looks between the points of collocation. It returns what is missed as a share
// of F's rise, and the finer mesh that it takes to miss less; nil when this one will do. Unknowns that
// have not settled lack points somewhere: then every panel is halved.
func (s *solver) residual(settled bool) (share float64, finer []panel) {
	steep := s.steep()
	var halved []int
	for i := range s.panels {
		p := &s.panels[i]
		var missedF, missedPrime float64
		for n, x := range check.x {
			u, source, rise := s.look(p.place(x))
			prime, q := p.state(&check.left[n])
			w := -s.k * source / (u*prime + q - s.ratio*rise)
			for j, value := range check.value[n] {
				w += value * p.w[j]
			}
			missed := p.half() * check.weight[n] * math.Abs(w)
			missedPrime += missed
			missedF += missed * u
		}
		share += missedF / s.total
		prime, _ := p.sum()
		if !settled || missedF > uptakePart*s.total || missedPrime > primePart*max(prime+p.right, steep) {
			halved = append(halved, i)
		}
	}
	if halved == nil {
		return share, nil
	}
	for i := range s.panels {
		if len(halved) > 0 && halved[0] == i {
			halved = halved[1:]
			finer = s.halve(&s.panels[i], finer)
		} else {
			finer = append(finer, s.panels[i])
		}
	}
	return share, finer
}

// halve appends the two halves of a panel with its unknowns, which stay positive.
func (s *solver) halve(p *panel, list []panel) []panel {
	middle := p.place(0)
	for side, half := range []panel{s.panel(p.low, middle), s.panel(middle, p.high)} {
		for j, x := range gauss.x {
			value, _ := basis(gauss, (x-1)/2+float64(side))
			for n := range value {
				half.w[j] += value[n] * p.w[n]
				half.gap[j] += value[n] * p.gap[n]
			}
			half.gap[j] = max(half.gap[j], slices.Min(p.gap[:])/2)
			if half.w[j] = max(half.w[j], slices.Min(p.w[:])/2); half.source[j] == 0 {
				half.w[j] = 0
			}
		}
		list = append(list, half)
	}
	return list
}

// overtaken reports whether F falls below R f anywhere. The equation forbids it wherever Dc is
// above zero, and says nothing where it is zero.
func (s *solver) overtaken() bool {
	for i := range s.panels {
		p := &s.panels[i]
		for j, source := range p.source {
			if source == 0 && p.gap[j]+s.miss(p, j) < -1e-9 {
				return true
			}
		}
	}
	return false
}

// toe is F' by u at Initial. Beyond the last panel the gap is u g with g = F' - R f' nearly
// constant where Dc ~ u^m, so that g g' = -K Dc/u and g² rises by 2 K Dc/m to its end.
func (s *solver) toe() float64 {
	m := s.span.LowPower
	if !(m > 0) {
		return math.Inf(1)
	}
	first := &s.panels[0]
	prime, _ := first.sum()
	prime += first.right
	u, source, _ := s.look(first.low)
	slope := s.ratio * s.span.startSlope * s.span.Width()
	g := prime - slope
	return slope + math.Sqrt(g*g+2*s.k*source/u/m)
}
