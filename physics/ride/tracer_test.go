package ride

import (
	"math"
	"testing"
)

// The equation dC/dQ + v dC/dx = (v/Pe) d²C/dx² by central differences, whose error falls at
// second order with the step.
func TestTracerSolvesItsEquation(t *testing.T) {
	for _, pe := range []float64{0.5, 10, 200} {
		tracer := Tracer{Speed: 1.7, Peclet: pe}
		for _, x := range []float64{0.2, 0.7, 1.3} {
			for _, q := range []float64{0.3, 0.45, 0.8} {
				var errors []float64
				for _, h := range []float64{2e-3, 1e-3} {
					c := func(dx, dq float64) float64 { return tracer.Concentration(x+dx*h, q+dq*h) }
					rate := (c(0, 1) - c(0, -1)) / (2 * h)
					slope := (c(1, 0) - c(-1, 0)) / (2 * h)
					bend := (c(1, 0) - 2*c(0, 0) + c(-1, 0)) / (h * h)
					errors = append(errors, math.Abs(rate+tracer.Speed*slope-tracer.Speed/pe*bend))
				}
				if errors[0] > 1e-6 && !(errors[0] > 3.5*errors[1]) {
					t.Errorf("Pe %g at %g, %g: residuals %.3g do not fall by four", pe, x, q, errors)
				}
				if !(errors[1] < 0.05) {
					t.Errorf("Pe %g at %g, %g: residual %.3g", pe, x, q, errors[1])
				}
			}
		}
	}
}

// Nothing is lost on the way to x: the times of arrival have the mean x/v, and the variance
// of their inverse Gaussian law, 2 x/(v² Pe). Sums by the midpoint rule in ln Q.
func TestTracerArrivals(t *testing.T) {
	for _, pe := range []float64{1, 30, 1000} {
		for _, x := range []float64{0.4, 1} {
			tracer := Tracer{Speed: 0.8, Peclet: pe}
			mean, square := 0.0, 0.0
			const n = 20000
			for i := range n {
				u := -8 + 14*(float64(i)+0.5)/n
				q := math.Exp(u)
				late := (1 - tracer.Concentration(x, q)) * q * 14 / n
				mean += late
				square += 2 * late * q
			}
			mean += math.Exp(-8) // before, nothing has arrived
			near(t, "mean arrival", mean, x/0.8, 1e-9)
			near(t, "variance of arrivals", square-mean*mean, 2*x/(0.64*pe), 1e-6)
		}
	}
}

// No Peclet number overflows, none leaves [0, 1], and the front sharpens to a step.
func TestTracerAnyPeclet(t *testing.T) {
	for _, pe := range []float64{1e-12, 1e-3, 1, 700, 1e3, 1e6, 1e12, 1e300, math.Inf(1)} {
		tracer := Tracer{Speed: 1.2, Peclet: pe}
		last := 0.0
		for i := range 400 {
			q := 0.005 * float64(i)
			c := tracer.Concentration(1, q)
			if !(c >= last-1e-15 && c <= 1+1e-15) {
				t.Fatalf("Pe %g: C = %g after %g at %g", pe, c, last, q)
			}
			last = c
		}
		if pe >= 1e6 {
			near(t, "C before the front", tracer.Concentration(1, 0.82), 0, 1e-12)
			near(t, "C after the front", tracer.Concentration(1, 0.85), 1, 1e-12)
		}
		// On the front itself both terms are known: 1/2 [1 + erfcx(sqrt(Pe))], Pe at x = 1.
		if pe >= 1e6 && pe < 1e300 {
			near(t, "C on the front", (Tracer{1, pe}).Concentration(1, 1), 0.5+0.5/math.Sqrt(math.Pi*pe), 1e-9)
		}
	}
	if got := (Tracer{1, 50}).Concentration(0, 0.1); got != 1 {
		t.Errorf("C at the inlet is %g", got)
	}
	if got := (Tracer{1, 50}).Concentration(0, 0); got != 0 {
		t.Errorf("C before injection is %g", got)
	}
}

func TestTracerArrival(t *testing.T) {
	for _, pe := range []float64{0.1, 20, 5e4} {
		tracer := Tracer{Speed: 0.9, Peclet: pe}
		for _, c := range []float64{1e-9, 0.1, 0.5, 0.9} {
			near(t, "C at its arrival", tracer.Concentration(0.8, tracer.Arrival(0.8, c)), c, 1e-11*c*math.Max(1, math.Sqrt(pe)))
		}
	}
	if got := (Tracer{0.5, math.Inf(1)}).Arrival(1, 0.3); got != 2 {
		t.Errorf("a sharp front arrives at %g", got)
	}
	if got := (Tracer{1, 10}).Arrival(1, 1); !math.IsInf(got, 1) {
		t.Errorf("C = 1 arrives at %g", got)
	}
	if got := (Tracer{1, 10}).Arrival(1, 0); got != 0 {
		t.Errorf("C = 0 arrives at %g", got)
	}
}

// The peak is above its neighbours and everything on a fine grid; a long slug keeps 1.
func TestTracerPeak(t *testing.T) {
	for _, pe := range []float64{1, 20, 400, 1e5} {
		for _, size := range []float64{1e-3, 0.05, 0.3, 2} {
			tracer := Tracer{Speed: 1.1, Peclet: pe}
			q, peak := tracer.Peak(1, size)
			if !(peak > 0 && peak <= 1) {
				t.Fatalf("Pe %g, size %g: peak %g at %g", pe, size, peak, q)
			}
			for i := range 3000 {
				at := 0.002 * float64(i+1)
				if c := tracer.Pulse(1, at, size); c > peak+1e-12 {
					t.Fatalf("Pe %g, size %g: %g at %g is above the peak %g at %g", pe, size, c, at, peak, q)
				}
			}
		}
	}
	if _, c := (Tracer{1, 1e5}).Peak(1, 0.5); !(math.Abs(c-1) < 1e-12) {
		t.Errorf("a slug far longer than its mixing zones peaks at %g", c)
	}
	if q, c := (Tracer{2, math.Inf(1)}).Peak(1, 0.1); q != 0.5 || c != 1 {
		t.Errorf("a sharp slug peaks at %g with %g", q, c)
	}
}

// The printed factor 3.625, and the distance between the two concentrations themselves.
func TestTracerMixingZone(t *testing.T) {
	near(t, "3.625", (Tracer{1, 1}).MixingZone(1), 3.625, 0.0005)
	tracer := Tracer{Speed: 1, Peclet: 4e6}
	place := func(c float64) float64 { // by halving
		lo, hi := 0.4, 0.6
		for range 60 {
			if mid := (lo + hi) / 2; tracer.Concentration(mid, 0.5) > c {
				lo = mid
			} else {
				hi = mid
			}
		}
		return lo
	}
	got := place(0.1) - place(0.9)
	near(t, "mixing zone", tracer.MixingZone(0.5), got, 1e-3*got)
}
