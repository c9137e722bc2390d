package imbibe

import (
	"math"
	"testing"

	"brinefront/physics/relperm"
)

// diffusing is a capillary curve whose slope gives its rock a wanted Dc(S), for
// problems of known answer. Only the slope is meant; Pc itself just falls.
type diffusing struct {
	rock *Rock
	dc   func(sw float64) float64
}

func (c diffusing) Ends() (low, high float64) { return c.rock.Kr.Ends() }
func (c diffusing) Knots() []float64          { return nil }
func (c diffusing) At(sw float64) (pc, slope float64) {
	p := c.rock.Kr.At(sw)
	lw, lo := p.Krw/c.rock.WaterViscosity, p.Kro/c.rock.OilViscosity
	return 1 - sw, -c.dc(sw) * (lw + lo) / (lw * lo * c.rock.Permeability)
}

// withDiffusion is rock with straight curves from 0 to 1, fluids of one viscosity, so that
// f = S, and the wanted Dc.
func withDiffusion(t *testing.T, porosity, initial float64, dc func(sw float64) float64) *Span {
	t.Helper()
	rock := Rock{Permeability: 1e-13, Porosity: porosity, WaterViscosity: 1e-3, OilViscosity: 1e-3,
		Kr: relperm.Corey{Krw0: 1, Kro0: 1, Nw: 1, No: 1}}
	rock.Pc = diffusing{&rock, dc}
	span, err := NewSpan(rock, initial, 1)
	must(t, err)
	return span
}

func solved(t *testing.T, span *Span, ratio float64) *Solution {
	t.Helper()
	s, err := Solve(span, ratio)
	must(t, err)
	if s.Status != Converged {
		t.Fatalf("R = %v: %s, residual %g", ratio, s.Status, s.Residual)
	}
	return s
}

// near fails unless got is want within a relative tolerance.
func near(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	within(t, what, got, want, tolerance*math.Abs(want))
}

// TestConstantDiffusion: with Dc = D the equation is that of heat,
// S = Si + (S0 - Si) erfc(x/(2 sqrt(D t/phi))), A = (S0 - Si) sqrt(phi D/pi): exact, by hand.
func TestConstantDiffusion(t *testing.T) {
	const d, porosity, time = 3.7e-8, 0.23, 5e4
	for _, initial := range []float64{0, 0.17} {
		span := withDiffusion(t, porosity, initial, func(float64) float64 { return d })
		s := solved(t, span, 0)
		near(t, "A", s.A, (1-initial)*math.Sqrt(porosity*d/math.Pi), 1e-12)
		for _, share := range []float64{1e-6, 1e-3, 0.1, 0.3, 0.5, 0.8, 0.99, 0.9999} {
			sw := initial + (1-initial)*share
			want := 2 * math.Sqrt(d*time/porosity) * math.Erfcinv((sw-initial)/(1-initial))
			near(t, "x", s.At(sw, time), want, 1e-8)
			y := math.Erfcinv((sw - initial) / (1 - initial))
			f, _ := s.Flow(sw)
			near(t, "F", f, math.Exp(-y*y), 1e-8)
		}
		if !math.IsInf(s.Front(time), 1) || s.Arrival(initial, 1) != 0 {
			t.Errorf("front %v, validity %v s for a tail without end", s.Front(time), s.Arrival(initial, 1))
		}
	}
}

// TestPhilipsFamily: D = (n/2) S^n [1 - S^n/(1+n)] has x = (1 - S^n) sqrt(t) and the
// sorptivity n/(n+1). Source: Philip (1960), from memory; derived again by hand.
func TestPhilipsFamily(t *testing.T) {
	for _, n := range []float64{0.2, 0.5, 1, 2, 3.3, 7} {
		span := withDiffusion(t, 1, 0, func(s float64) float64 {
			power := math.Pow(s, n)
			return n / 2 * power * (1 - power/(1+n))
		})
		s := solved(t, span, 0)
		near(t, "sorptivity", 2*s.A, n/(n+1), 1e-10)
		// The power of D is measured at 2^-40, which D leaves as S^n: the front of n = 0.2 is
		// good to the square of 2^-8.
		near(t, "front after 1 s", s.Front(1), 1, max(1e-8, math.Pow(2, -80*n)))
		near(t, "arrival at 2 m", s.Arrival(0.5, 2), 4/math.Pow(1-math.Pow(0.5, n), 2), 1e-8)
		for _, sw := range []float64{1e-6, 0.01, 0.2, 0.5, 0.8, 0.99} {
			within(t, "x after 1 s", s.At(sw, 1), 1-math.Pow(sw, n), 1e-8)
		}
	}
}

// TestMadeSolutions takes F = 1 - (1-S)^p, which meets both ends, and gives the rock the Dc that
// the equation wants for it, (F - R S) p (p-1) (1-S)^(p-2) 2 A²/phi. Exact, by hand.
func TestMadeSolutions(t *testing.T) {
	const a, porosity = 3.1e-5, 0.19
	for _, p := range []float64{2, 2.5, 4} {
		for _, ratio := range []float64{0, 0.31, 0.9, 0.999} {
			span := withDiffusion(t, porosity, 0, func(s float64) float64 {
				gap := -math.Expm1(p*math.Log1p(-s)) - ratio*s
				return gap * p * (p - 1) * math.Pow(1-s, p-2) * 2 * a * a / porosity
			})
			s := solved(t, span, ratio)
			near(t, "A", s.A, a, 1e-9)
			near(t, "front", s.Front(1e4), 2*a/porosity*p*100, 1e-8)
			for _, sw := range []float64{0.001, 0.1, 0.4, 0.7, 0.95} {
				f, prime := s.Flow(sw)
				near(t, "F", f, 1-math.Pow(1-sw, p), 1e-8)
				near(t, "F'", prime, p*math.Pow(1-sw, p-1), 1e-8)
			}
		}
	}
}

// TestFarFront: where Dc ~ S^m with a small m, F' still rises when S has no digits left. On
// its way F'² nears its end as S^m (see solver.toe), which two states far down confirm.
func TestFarFront(t *testing.T) {
	const m = 0.02
	s := solved(t, withDiffusion(t, 1, 0, func(sw float64) float64 { return math.Pow(sw, m) }), 0)
	square := func(eta float64) float64 { _, prime := s.Flow(math.Exp(eta)); return prime * prime }
	a, b := math.Exp(-300*m), math.Exp(-500*m)
	end := (a*square(-500) - b*square(-300)) / (a - b)
	_, prime := s.Flow(0)
	near(t, "F' at the front", prime, math.Sqrt(end), 1e-6)
	if lost := 1 - square(-599)/end; lost < 1e-6 {
		t.Errorf("only %g of the square lies beyond the last panel: the test says nothing", lost)
	}
}
