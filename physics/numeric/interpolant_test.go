package numeric

import (
	"math"
	"math/rand/v2"
	"testing"
)

// rpn is the data set "RPN 14" of Fritsch & Carlson (1980), from memory:
// radiochemical counts whose ordinary spline overshoots.
var rpn = struct{ x, y []float64 }{
	[]float64{7.99, 8.09, 8.19, 8.7, 9.2, 10, 12, 15, 20},
	[]float64{0, 2.76429e-5, 4.37498e-2, 0.169183, 0.469428, 0.943740, 0.998636, 0.999919, 0.999994},
}

func TestMonotoneCubicOnPublishedData(t *testing.T) {
	m := NewMonotoneCubic(rpn.x, rpn.y)
	monotone(t, m, rpn.x, rpn.y)
	// Parabola slopes alone would leave the monotone region in these data: the
	// circle must have been used.
	onCircle := 0
	for _, c := range m.Cells() {
		chord := (c.Y1 - c.Y0) / (c.X1 - c.X0)
		if r := math.Hypot(c.D0/chord, c.D1/chord); math.Abs(r-3) < 1e-12 {
			onCircle++
		} else if r > 3 {
			t.Errorf("cell from %g: slopes %g times outside the circle", c.X0, r/3)
		}
	}
	if onCircle == 0 {
		t.Error("no slope was limited")
	}
}

// monotone checks that m meets its points, has one slope at every node, and rises
// in every cell without leaving it.
func monotone(t *testing.T, m MonotoneCubic, x, y []float64) {
	t.Helper()
	for i, c := range m.Cells() {
		if i > 0 && m.Cells()[i-1].D1 != c.D0 {
			t.Fatalf("two slopes at %g", c.X0)
		}
		before := y[i]
		for k := 0; k <= 200; k++ {
			at := x[i] + (x[i+1]-x[i])*float64(k)/200
			if k == 200 {
				at = x[i+1]
			}
			value, slope := c.Cubic(at)
			scale := y[i+1] - y[i]
			if value < before-1e-15*(math.Abs(y[i])+scale) || value < y[i] || value > y[i+1] {
				t.Fatalf("at %g: %v after %v in [%v, %v]", at, value, before, y[i], y[i+1])
			}
			if slope < -1e-14*scale/(x[i+1]-x[i]) {
				t.Fatalf("at %g: slope %v falls", at, slope)
			}
			before = value
		}
		for _, end := range []struct{ x, y, d float64 }{{x[i], y[i], c.D0}, {x[i+1], y[i+1], c.D1}} {
			if v, d := c.Cubic(end.x); v != end.y || math.Abs(d-end.d) > 1e-14*math.Abs(d) {
				t.Fatalf("cell ends at %g with %v slope %v, want %v slope %v", end.x, v, d, end.y, end.d)
			}
		}
	}
}

func TestMonotoneCubicOnRandomData(t *testing.T) {
	random := rand.New(rand.NewPCG(3, 4))
	for range 300 {
		n := 2 + random.IntN(12)
		x, y := make([]float64, n), make([]float64, n)
		for i := 1; i < n; i++ {
			x[i] = x[i-1] + math.Exp(4*random.NormFloat64())
			y[i] = y[i-1]
			if random.IntN(4) > 0 {
				y[i] += math.Exp(4 * random.NormFloat64())
			}
		}
		monotone(t, NewMonotoneCubic(x, y), x, y)
	}
}

// TestMonotoneCubicParabola: slopes of parabolas are exact for a parabola, also at
// the two ends, so a rising branch comes back whole.
func TestMonotoneCubicParabola(t *testing.T) {
	x := []float64{0, 0.07, 0.3, 0.45, 0.8, 1}
	y := make([]float64, len(x))
	for i := range x {
		y[i] = x[i] * x[i]
	}
	m := NewMonotoneCubic(x, y)
	for at := 0.0; at <= 1; at += 1.0 / 256 {
		if v, d := m.At(at); math.Abs(v-at*at) > 1e-15 || math.Abs(d-2*at) > 1e-14 {
			t.Errorf("at %g: %v slope %v", at, v, d)
		}
	}
}

// TestMonotoneCubicOrder: slopes of second order make an interpolant of third.
func TestMonotoneCubicOrder(t *testing.T) {
	largest := func(n int) float64 {
		x, y := make([]float64, n+1), make([]float64, n+1)
		for i := range x {
			x[i] = 1.5 * float64(i) / float64(n)
			y[i] = math.Exp(x[i])
		}
		m, worst := NewMonotoneCubic(x, y), 0.0
		for k := range 5000 {
			at := 1.5 * float64(k) / 5000
			v, _ := m.At(at)
			worst = max(worst, math.Abs(v-math.Exp(at)))
		}
		return worst
	}
	if order := math.Log2(largest(40) / largest(80)); order < 2.8 || order > 3.3 {
		t.Errorf("measured order %g, want 3", order)
	}
}

// TestMonotoneCubicTurns: where the data turn the slope is zero and nothing overshoots.
func TestMonotoneCubicTurns(t *testing.T) {
	m := NewMonotoneCubic([]float64{0, 1, 2, 3, 4}, []float64{0, 2, 2, -1, 5})
	for i, want := range []float64{0, 0, 0} {
		if d := m.Cells()[i+1].D0; d != want {
			t.Errorf("slope %g at node %d", d, i+1)
		}
	}
	for at := 0.0; at <= 4; at += 0.01 {
		i := Locate(m.Nodes(), at)
		c := m.Cells()[i]
		if v, _ := m.At(at); v < min(c.Y0, c.Y1) || v > max(c.Y0, c.Y1) {
			t.Errorf("at %g: %g leaves [%g, %g]", at, v, c.Y0, c.Y1)
		}
	}
}

func TestOutsideAndNodes(t *testing.T) {
	x, y := []float64{1, 2, 4}, []float64{3, 5, 6}
	for name, f := range map[string]Interpolant{"linear": NewLinear(x, y), "cubic": NewMonotoneCubic(x, y)} {
		for _, c := range []struct{ x, y float64 }{{math.Inf(-1), 3}, {0.5, 3}, {4.5, 6}, {math.Inf(1), 6}} {
			if v, d := f.At(c.x); v != c.y || d != 0 {
				t.Errorf("%s at %g: %g slope %g", name, c.x, v, d)
			}
		}
		for i := range x {
			if v, _ := f.At(x[i]); v != y[i] {
				t.Errorf("%s at node %g: %g", name, x[i], v)
			}
		}
		if v, d := f.At(math.NaN()); !math.IsNaN(v) || name == "cubic" && !math.IsNaN(d) {
			t.Errorf("%s at NaN: %g slope %g", name, v, d)
		}
	}
	if v, d := NewLinear(x, y).At(2); v != 5 || d != 0.5 {
		t.Errorf("a node has slope %g, want that of its right cell, 0.5", d)
	}
	if _, d := NewLinear(x, y).At(4); d != 0.5 {
		t.Errorf("the last node has slope %g, want that of its left cell, 0.5", d)
	}
}

func TestLocate(t *testing.T) {
	nodes := []float64{0, 1, 3, 7, 8}
	for x, want := range map[float64]int{-1: 0, 0: 0, 0.5: 0, 1: 1, 2.9: 1, 3: 2, 6: 2, 7: 3, 7.5: 3, 8: 3, 99: 3} {
		if got := Locate(nodes, x); got != want {
			t.Errorf("Locate(%g) = %d, want %d", x, got, want)
		}
	}
}

func TestBadNodesPanic(t *testing.T) {
	for name, c := range map[string]struct {
		x, y []float64
		want string
	}{
		"one node": {[]float64{1}, []float64{1}, badLength},
		"ragged":   {[]float64{1, 2}, []float64{1}, badLength},
		"double":   {[]float64{1, 1}, []float64{1, 2}, badOrder},
		"falling":  {[]float64{1, 0}, []float64{1, 2}, badOrder},
		"NaN":      {[]float64{1, math.NaN()}, []float64{1, 2}, badOrder},
	} {
		func() {
			defer func() {
				if got := recover(); got != c.want {
					t.Errorf("%s: %v, want %q", name, got, c.want)
				}
			}()
			NewMonotoneCubic(c.x, c.y)
		}()
	}
}
