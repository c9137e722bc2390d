package imbibe

import (
	"math"
	"testing"
)

// bessel is the share of water behind rock that takes it up exponentially,
//
//	S = 1 - e^-b int_0^a e^-u I0(2 sqrt(b u)) du = sum_n e^-b b^n/n! sum_(k<=n) e^-a a^k/k!
//
// with a = lambda Vm/q and b = lambda T: the solution of Schumann (1929) and of Goldstein
// (1953) for exchange along a stream, summed here as a series.
func bessel(a, b float64) float64 {
	term, below, weight, sum := math.Exp(-a), math.Exp(-a), math.Exp(-b), 0.0
	for n := 0.0; n < 900; n++ {
		sum += weight * below
		weight *= b / (n + 1)
		term *= a / (n + 1)
		below += term
	}
	return sum
}

func TestFractureWithExponentialExchange(t *testing.T) {
	for _, a := range []float64{0.2, 1, 3, 8, 30, 90} {
		f := FractureFlood{Own: 0.4, Rock: a}
		s, err := f.Run(Exponential{1}, 0.4+3*a+2)
		must(t, err)
		worst := 0.0
		for i, time := range s.Times {
			worst = math.Max(worst, math.Abs(s.Cut[i]-bessel(a, time-0.4)))
		}
		t.Logf("a = %g: off by up to %.1e", a, worst)
		// Where rock is far quicker than injection the front is steep, and drawn wider.
		within(t, "cut, the largest error", worst, 0, map[bool]float64{true: 3e-3, false: 0.03}[a <= 8])
	}
}

// TestFractureWithRootExchange: G = c sqrt(t) has the Laplace transform that makes
// S = erfc(c Vm sqrt(pi)/(4 q sqrt(T))), the solution for a plane source in an
// endless matrix (Carslaw & Jaeger 1959, sec. 12.4, for heat; here derived).
func TestFractureWithRootExchange(t *testing.T) {
	const c = 0.3
	f := FractureFlood{Rock: 2}
	s, err := f.Run(RootExponential{Early: c, Turn: 1e9}, 10)
	must(t, err)
	exact := func(time float64) float64 { return math.Erfc(c * 2 * math.Sqrt(math.Pi) / (4 * math.Sqrt(time))) }
	out := 0.0
	for i := 1; i < len(s.Times); i++ {
		time, before := s.Times[i], s.Times[i-1]
		if i >= 5 { // the first steps have to follow the steepest rise
			within(t, "cut", s.Cut[i], exact(time), 3e-3)
		}
		out += (time - before) / 6 * (exact(math.Max(before, 1e-9)) + 4*exact((before+time)/2) + exact(time))
		within(t, "taken up", s.Taken[i]*f.Rock, time-out, 3e-3*time+2e-3)
	}
}

// TestFractureBalance: rock holds no more than if all of it had touched water from the
// start, the cut rises, and what a cell's stream loses is what its rock holds.
func TestFractureBalance(t *testing.T) {
	m := matrixOf(t, law(early))
	b, err := m.Soak(Sphere(2))
	must(t, err)
	mixed := Mixed{b, []Fraction{{0.2, 0.3}, {0.5, 1}, {0.3, 2}}}
	f := FractureFlood{Own: 0.1, Rock: b.TimeAt(0.5)}
	s, err := f.Run(mixed, 30*f.Rock)
	must(t, err)
	for i, time := range s.Times {
		most, _ := mixed.At(time - f.Own)
		if s.Taken[i] > most+1e-9 || (i > 0 && (s.Cut[i] < s.Cut[i-1] || s.Taken[i] < s.Taken[i-1])) {
			t.Fatalf("after %g: cut %g, taken %g of at most %g", time, s.Cut[i], s.Taken[i], most)
		}
		within(t, "kept", s.Kept[i]*time, s.Taken[i]*f.Rock+f.Own, 1e-12*time)
	}
	last := len(s.Times) - 1
	most, _ := mixed.At(s.Times[last])
	within(t, "at last it is as if all had touched water", s.Taken[last], most, 0.02)
	// The sums of the scheme hold exactly: what a cascade keeps is what its rock holds.
	const step, steps = 0.05, 200
	out := FractureFlood{Rock: 1}.cascade(b, step, 1, steps)
	start, _ := b.At(step * steps)
	kept, held := 0.0, out[0]*start
	for k := 1; k <= steps; k++ {
		kept += step * (1 - out[k])
		held += (out[k] - out[k-1]) * meanUptake(b, step*float64(steps-k), step*float64(steps-k+1))
	}
	within(t, "held by one cell", held, kept, 1e-12)
	for _, bad := range []FractureFlood{{-1, 1}, {0, 0}, {2, 1}, {0, math.NaN()}} {
		if _, err := bad.Run(b, 2); err == nil {
			t.Errorf("%+v was taken", bad)
		}
	}
}

// TestMixedBlocks: a share of half the size soaks four times as fast.
func TestMixedBlocks(t *testing.T) {
	mixed := Mixed{Exponential{1}, []Fraction{{0.25, 1}, {0.75, 0.5}}}
	share, _ := mixed.At(1)
	within(t, "share", share, 0.25*(1-math.Exp(-1))+0.75*(1-math.Exp(-4)), 1e-15)
}
