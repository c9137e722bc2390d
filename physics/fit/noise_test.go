package fit

import (
	"fmt"
	"math"
	"math/rand/v2"
	"strings"
	"testing"

	"gonum.org/v1/gonum/stat"

	"brinefront/physics/relperm"
)

// noisy adds seeded normal errors with the standard deviation that relative weights
// assume, share times the larger of kr and the floor. The rows at the ends keep
// their zeros.
func noisy(p Points, share float64, seed uint64) Points {
	return noisyAbove(p, [2]float64{share, share}, defaultFloor, seed)
}

// noisyAbove takes the shares of krw and kro apart.
func noisyAbove(p Points, shares [2]float64, floor float64, seed uint64) Points {
	random := rand.New(rand.NewPCG(seed, 7))
	q := Points{Sw: p.Sw, Krw: append([]float64(nil), p.Krw...), Kro: append([]float64(nil), p.Kro...)}
	for k, kr := range [][]float64{q.Krw, q.Kro} {
		for i, v := range kr {
			if v > 0 {
				kr[i] = max(v+shares[k]*max(v, floor)*random.NormFloat64(), 0)
			}
		}
	}
	return q
}

// TestCoverage: over 400 seeded tables the 95 % intervals hold the true parameters,
// and the 95 % bands the true curves, about 95 % of the times. 90 to 99 % is more
// than four standard deviations of such a count to either side, curvature included.
// krw and kro seldom scatter alike, and then each phase must be judged by its own.
func TestCoverage(t *testing.T) {
	const times = 400
	for _, test := range []struct {
		name  string
		fit   func(Points, Options) (Fit, error)
		c     relperm.Curves
		want  []float64
		share [2]float64
	}{
		{"Corey", Corey, trueCorey, coreyValues(trueCorey), [2]float64{0.03, 0.03}},
		{"Corey, krw better", Corey, trueCorey, coreyValues(trueCorey), [2]float64{0.01, 0.05}},
		{"Corey, kro better", Corey, trueCorey, coreyValues(trueCorey), [2]float64{0.05, 0.01}},
		{"LET", LET, trueLET, letValues(trueLET), [2]float64{0.01, 0.01}},
	} {
		exact := table(test.c, 13)
		inside := map[string]int{}
		for seed := range uint64(times) {
			f, err := test.fit(noisyAbove(exact, test.share, defaultFloor, seed), Options{})
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

// TestOff: sound points are called off in about offChance of the tables a phase, so in
// 2 % of 400, give or take 4 standard deviations; a point far off among points of the
// better phase is found, though it would hide in the scatter of the other.
func TestOff(t *testing.T) {
	const times = 400
	exact := table(trueCorey, 13)
	alarms, found := 0, 0
	for seed := range uint64(times) {
		p := noisyAbove(exact, [2]float64{0.01, 0.05}, defaultFloor, seed)
		f, err := Corey(p, Options{})
		if err != nil {
			t.Fatal(err)
		}
		said := func() bool { return strings.Contains(strings.Join(f.Verdict, " "), "than chance allows") }
		if said() {
			alarms++
		}
		p.Krw[8] *= 1.12 // 12 times the scatter of krw, hardly 2 times that of kro
		if f, err = Corey(p, Options{}); err != nil {
			t.Fatal(err)
		}
		if said() {
			found++
		}
	}
	if alarms > 20 || alarms == 0 {
		t.Errorf("%d of %d sound tables have a point off, want about 8", alarms, times)
	}
	if found < times*95/100 {
		t.Errorf("a point 12 standard deviations off is found in %d tables of %d", found, times)
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
		p := noisyAbove(exact, [2]float64{share, share}, 0, 11)
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
