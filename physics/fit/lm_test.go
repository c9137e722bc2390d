package fit

import (
	_ "embed"
	"encoding/json"
	"math"
	"testing"
)

//go:embed testdata/nist-strd.json
var nistJSON []byte

type nistSet struct {
	Name, Model    string
	Starts         [][]float64
	X, Y           []float64
	Certified      []float64
	StandardErrors []float64
	SumOfSquares   float64
}

// nistModels are the models of the reference data: value and slopes.
var nistModels = map[string]func(x float64, b, slopes []float64) float64{
	"b1 (1 - exp(-b2 x))": func(x float64, b, d []float64) float64 {
		e := math.Exp(-b[1] * x)
		d[0], d[1] = 1-e, b[0]*x*e
		return b[0] * (1 - e)
	},
	"b1 x^b2": func(x float64, b, d []float64) float64 {
		p := math.Pow(x, b[1])
		d[0], d[1] = p, b[0]*p*math.Log(x)
		return b[0] * p
	},
	"b1/(1 + exp(b2 - b3 x))": func(x float64, b, d []float64) float64 {
		e := math.Exp(b[1] - b[2]*x)
		q := 1 / (1 + e)
		d[0], d[1], d[2] = q, -b[0]*q*q*e, b[0]*q*q*e*x
		return b[0] * q
	},
	"b1 (x^2 + b2 x)/(x^2 + b3 x + b4)": func(x float64, b, d []float64) float64 {
		up, down := x*x+b[1]*x, x*x+b[2]*x+b[3]
		d[0], d[1], d[2], d[3] = up/down, b[0]*x/down, -b[0]*up*x/(down*down), -b[0]*up/(down*down)
		return b[0] * up / down
	},
}

func nistResiduals(s nistSet) residuals {
	model, n := nistModels[s.Model], len(s.Certified)
	slopes := make([]float64, n)
	return func(b, r, jacobian []float64) {
		for i, x := range s.X {
			r[i] = model(x, b, slopes) - s.Y[i]
			if jacobian != nil {
				copy(jacobian[i*n:], slopes)
			}
		}
	}
}

// TestCertified: parameters, standard errors and residual sums of squares of NIST
// StRD, from memory, data confirmed by the certified residual. Eleven digits are
// certified; the tolerance leaves one for the last printed digit and, for standard
// errors, the digits that inverting JᵀJ costs.
func TestCertified(t *testing.T) {
	var file struct{ Sets []nistSet }
	if err := json.Unmarshal(nistJSON, &file); err != nil || len(file.Sets) < 3 {
		t.Fatalf("%d sets, %v", len(file.Sets), err)
	}
	for _, s := range file.Sets {
		n, m := len(s.Certified), len(s.X)
		eval := nistResiduals(s)
		r := make([]float64, m)
		eval(s.Certified, r, nil)
		if got := dot(r, r); !near(got, s.SumOfSquares, 1e-10) {
			t.Fatalf("%s: the certified parameters leave a sum of squares of %.11g, certified %.11g: the data are not those", s.Name, got, s.SumOfSquares)
		}
		low, high := make([]float64, n), make([]float64, n)
		for j := range low {
			low[j], high[j] = math.Inf(-1), math.Inf(1)
		}
		for _, start := range s.Starts {
			got := minimise(eval, m, start, low, high, 500)
			if !got.converged {
				t.Errorf("%s from %v: not converged", s.Name, start)
			}
			if !near(got.sum, s.SumOfSquares, 1e-10) {
				t.Errorf("%s from %v: sum of squares %.11g, certified %.11g", s.Name, start, got.sum, s.SumOfSquares)
			}
			inverse, blind := invert(got.normal)
			for j := range got.x {
				if !near(got.x[j], s.Certified[j], 1e-9) {
					t.Errorf("%s from %v: b%d = %.11g, certified %.11g", s.Name, start, j+1, got.x[j], s.Certified[j])
				}
				if stdErr := math.Sqrt(got.sum / float64(m-n) * inverse.at(j, j)); !near(stdErr, s.StandardErrors[j], 1e-8) || blind[j] {
					t.Errorf("%s from %v: standard error of b%d = %.11g, certified %.11g", s.Name, start, j+1, stdErr, s.StandardErrors[j])
				}
			}
		}
	}
}

func near(got, want, relative float64) bool { return math.Abs(got-want) <= relative*math.Abs(want) }

// TestBounds: of (x-2)² + (y-1)² + (x+y-4)² the unbounded minimum is at (7/3, 4/3);
// with x <= 1 it is at x = 1, y = 2, where the slope in y, 2(y-1) + 2(y-3), is zero.
func TestBounds(t *testing.T) {
	eval := func(x, r, jacobian []float64) {
		r[0], r[1], r[2] = x[0]-2, x[1]-1, x[0]+x[1]-4
		if jacobian != nil {
			copy(jacobian, []float64{1, 0, 0, 1, 1, 1})
		}
	}
	inf := math.Inf(1)
	tests := []struct {
		low, high, want []float64
		atBound         []bool
	}{
		{[]float64{-inf, -inf}, []float64{inf, inf}, []float64{7.0 / 3, 4.0 / 3}, []bool{false, false}},
		{[]float64{-inf, -inf}, []float64{1, inf}, []float64{1, 2}, []bool{true, false}},
		{[]float64{3, -inf}, []float64{inf, inf}, []float64{3, 1}, []bool{true, false}},
		{[]float64{0, 0}, []float64{1, 1}, []float64{1, 1}, []bool{true, true}},
		{[]float64{0, 0}, []float64{5, 5}, []float64{7.0 / 3, 4.0 / 3}, []bool{false, false}},
	}
	for _, test := range tests {
		for _, start := range [][]float64{{0, 0}, {100, -100}, {3, 3}} {
			got := minimise(eval, 3, start, test.low, test.high, 100)
			for j := range got.x {
				if math.Abs(got.x[j]-test.want[j]) > 1e-12 || got.atBound[j] != test.atBound[j] || !got.converged {
					t.Errorf("within %v to %v from %v: %v, at bound %v, converged %v; want %v, %v", test.low, test.high, start, got.x, got.atBound, got.converged, test.want, test.atBound)
				}
			}
		}
	}
}

// TestIterationLimit: stopping short is said.
func TestIterationLimit(t *testing.T) {
	eval := func(x, r, jacobian []float64) {
		r[0], r[1] = 10*(x[1]-x[0]*x[0]), 1-x[0]
		if jacobian != nil {
			copy(jacobian, []float64{-20 * x[0], 10, -1, 0})
		}
	}
	inf := math.Inf(1)
	low, high := []float64{-inf, -inf}, []float64{inf, inf}
	if got := minimise(eval, 2, []float64{-1.2, 1}, low, high, 3); got.converged || got.iterations != 3 {
		t.Errorf("converged %v after %d iterations", got.converged, got.iterations)
	}
	// The minimum of this valley, Rosenbrock (1960), is at (1, 1).
	if got := minimise(eval, 2, []float64{-1.2, 1}, low, high, 100); !got.converged || math.Hypot(got.x[0]-1, got.x[1]-1) > 1e-12 {
		t.Errorf("%v, converged %v", got.x, got.converged)
	}
}

// TestInvert: against a matrix with a known inverse, and one without.
func TestInvert(t *testing.T) {
	inverse, blind := invert(symmetric{2, []float64{2e6, 1, 1, 1e-6}})
	want := []float64{1e-6, -1, -1, 2e6} // the determinant is 1
	for i, w := range want {
		if !near(inverse.at(i/2, i%2), w, 1e-12) || blind[0] || blind[1] {
			t.Errorf("inverse %v, blind %v", inverse.v, blind)
		}
	}
	if _, blind = invert(symmetric{3, []float64{1, 1, 0, 1, 1, 0, 0, 0, 1}}); !blind[0] || !blind[1] || blind[2] {
		t.Errorf("blind %v, want the first two", blind)
	}
}
