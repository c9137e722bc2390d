package fit

import (
	"fmt"
	"math"
	"math/rand/v2"
	"testing"

	"gonum.org/v1/gonum/stat"

	"brinefront/physics/relperm"
)

// noisy adds seeded normal errors with the standard deviation that relative weights
// assume, share times the larger of kr and the floor. The rows at the ends keep
// their zeros.
func noisy(p Points, share float64, seed uint64) Points {
	return noisyAbove(p, share, defaultFloor, seed)
}

func noisyAbove(p Points, share, floor float64, seed uint64) Points {
	random := rand.New(rand.NewPCG(seed, 7))
	q := Points{Sw: p.Sw, Krw: append([]float64(nil), p.Krw...), Kro: append([]float64(nil), p.Kro...)}
	for _, kr := range [][]float64{q.Krw, q.Kro} {
		for i, v := range kr {
			if v > 0 {
				kr[i] = max(v+share*max(v, floor)*random.NormFloat64(), 0)
			}
		}
	}
	return q
}

// TestCoverage: over 400 seeded tables the 95 % intervals hold the true parameters,
// and the 95 % bands the true curves, about 95 % of the times. 90 to 99 % is more
// than four standard deviations of such a count to either side, curvature included.
func TestCoverage(t *testing.T) {
	const times = 400
	for _, test := range []struct {
		name  string
		fit   func(Points, Options) (Fit, error)
		c     relperm.Curves
		want  []float64
		share float64
	}{{"Corey", Corey, trueCorey, coreyValues(trueCorey), 0.03}, {"LET", LET, trueLET, letValues(trueLET), 0.01}} {
		exact := table(test.c, 13)
		inside := map[string]int{}
		for seed := range uint64(times) {
			f, err := test.fit(noisy(exact, test.share, seed), Options{})
			if err != nil {
				t.Fatal(err)
			}
			for j, p := range f.Parameters {
				if !p.Held && p.Low <= test.want[j] && test.want[j] <= p.High {
					inside[p.Symbol]++
				}
			}
			for _, sw := range []float64{0.35, 0.5, 0.65} {
				krwLow, krwHigh, kroLow, kroHigh := f.Band(sw)
				at := test.c.At(sw)
				if krwLow <= at.Krw && at.Krw <= krwHigh {
					inside[fmt.Sprintf("krw at %g", sw)]++
				}
				if kroLow <= at.Kro && at.Kro <= kroHigh {
					inside[fmt.Sprintf("kro at %g", sw)]++
				}
			}
		}
		if len(inside) != len(test.want)-2+6 {
			t.Errorf("%s: counted %v", test.name, inside)
		}
		for what, n := range inside {
			if n < times*90/100 || n > times*99/100 {
				t.Errorf("%s: %s is inside %d times of %d", test.name, what, n, times)
			}
		}
	}
}

// TestLogLinear: with the end point held and errors growing small, relative least
// squares tends to the straight line through the origin of ln(kr/kr0) against ln s,
// whose slope gonum's stat.LinearRegression gives independently. The two differ by
// the square of the errors: a tenth of the errors, a hundredth of the difference.
func TestLogLinear(t *testing.T) {
	exact := table(trueCorey, 13)
	hold := map[string]float64{"krw0": trueCorey.Krw0, "kro0": trueCorey.Kro0}
	var difference [2][2]float64
	for k, share := range []float64{1e-3, 1e-4} {
		p := noisyAbove(exact, share, 0, 11)
		f, err := Corey(p, Options{Hold: hold, Floor: 1e-9})
		if err != nil {
			t.Fatal(err)
		}
		for j, kr := range [][]float64{p.Krw, p.Kro} {
			var x, y []float64
			for i, sw := range p.Sw[1:12] {
				s := (sw - trueCorey.Swc) / (1 - trueCorey.Swc - trueCorey.Sor)
				if j == 1 {
					s = 1 - s
				}
				x, y = append(x, math.Log(s)), append(y, math.Log(kr[i+1]/[]float64{trueCorey.Krw0, trueCorey.Kro0}[j]))
			}
			_, slope := stat.LinearRegression(x, y, nil, true)
			difference[k][j] = math.Abs(f.Parameters[iShape+j].Value - slope)
			if difference[k][j] > 10*share*share {
				t.Errorf("errors of %g: %s = %.10g, regression %.10g", share, f.Parameters[iShape+j].Symbol, f.Parameters[iShape+j].Value, slope)
			}
		}
	}
	for j := range 2 {
		if ratio := difference[0][j] / difference[1][j]; ratio < 30 || ratio > 300 {
			t.Errorf("a tenth of the errors makes the difference %.3g times smaller, want about 100", ratio)
		}
	}
}
