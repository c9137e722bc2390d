package fit

import (
	_ "embed"
	"encoding/json"
	"errors"
	"math"
	"math/rand/v2"
	"strings"
	"testing"

	"brinefront/physics/relperm"
)

//go:embed testdata/dake-10.1.json
var dakeJSON []byte

func dake(t testing.TB) Points {
	var p Points
	if err := json.Unmarshal(dakeJSON, &p); err != nil || len(p.Sw) != 13 {
		t.Fatalf("%d rows, %v", len(p.Sw), err)
	}
	return p
}

// Invented curves whose parameters a fit must find again.
var (
	trueCorey = relperm.Corey{Swc: 0.21, Sor: 0.27, Krw0: 0.34, Kro0: 0.83, Nw: 3.1, No: 2.3}
	trueLET   = relperm.LET{Swc: 0.18, Sor: 0.22, Krw0: 0.41, Kro0: 0.9, Lw: 2.4, Ew: 3.7, Tw: 1.3, Lo: 2.9, Eo: 1.6, To: 1.2}
)

// sample takes n rows of curves between two saturations, both included.
func sample(c relperm.Curves, low, high float64, n int) Points {
	var p Points
	for i := range n {
		sw := low + (high-low)*float64(i)/float64(n-1)
		if i == n-1 {
			sw = high
		}
		at := c.At(sw)
		p.Sw, p.Krw, p.Kro = append(p.Sw, sw), append(p.Krw, at.Krw), append(p.Kro, at.Kro)
	}
	return p
}

func table(c relperm.Curves, n int) Points {
	low, high := c.Ends()
	return sample(c, low, high, n)
}

func coreyValues(c relperm.Corey) []float64 {
	return []float64{c.Swc, c.Sor, c.Krw0, c.Kro0, c.Nw, c.No}
}

func letValues(c relperm.LET) []float64 {
	return []float64{c.Swc, c.Sor, c.Krw0, c.Kro0, c.Lw, c.Ew, c.Tw, c.Lo, c.Eo, c.To}
}

func within(t *testing.T, f Fit, want []float64, relative float64) {
	t.Helper()
	for j, p := range f.Parameters {
		if !near(p.Value, want[j], relative) {
			t.Errorf("%s = %.12g, want %.12g", p.Symbol, p.Value, want[j])
		}
	}
	if f.Status != Converged {
		t.Errorf("status %v", f.Status)
	}
}

// TestExact: rows without error give the parameters back, with either weight, from
// few rows and many, in order or not.
func TestExact(t *testing.T) {
	for _, weights := range []Weighting{Relative, Absolute} {
		for _, n := range []int{7, 13, 500} {
			f, err := Corey(table(trueCorey, n), Options{Weights: weights})
			if err != nil {
				t.Fatal(err)
			}
			within(t, f, coreyValues(trueCorey), 1e-8)
			if f, err = LET(table(trueLET, n), Options{Weights: weights}); err != nil {
				t.Fatal(err)
			}
			within(t, f, letValues(trueLET), 1e-8)
		}
	}
	p := table(trueCorey, 11)
	for i, j := range rand.New(rand.NewPCG(1, 2)).Perm(11) {
		p.Sw[i], p.Sw[j], p.Krw[i], p.Krw[j], p.Kro[i], p.Kro[j] = p.Sw[j], p.Sw[i], p.Krw[j], p.Krw[i], p.Kro[j], p.Kro[i]
	}
	f, err := Corey(p, Options{})
	if err != nil {
		t.Fatal(err)
	}
	within(t, f, coreyValues(trueCorey), 1e-8)
}

// TestLETHoldsCorey: LET with E t^T = 1 - s^L is no Corey, but a Corey curve of
// exponent 1 is LET with L = E = T = 1, since s/(s + 1 - s) = s.
func TestLETHoldsCorey(t *testing.T) {
	straight := relperm.Corey{Swc: 0.2, Sor: 0.2, Krw0: 0.4, Kro0: 0.8, Nw: 1, No: 1}
	f, err := LET(table(straight, 11), Options{})
	if err != nil {
		t.Fatal(err)
	}
	within(t, f, []float64{0.2, 0.2, 0.4, 0.8, 1, 1, 1, 1, 1, 1}, 1e-8)
}

// TestFreeSaturations: rows that stop short of both ends still tell Swc and Sor,
// when nothing else is in error.
func TestFreeSaturations(t *testing.T) {
	c := trueCorey
	f, err := Corey(sample(c, c.Swc+0.04, 1-c.Sor-0.05, 12), Options{FreeSaturations: true})
	if err != nil {
		t.Fatal(err)
	}
	within(t, f, coreyValues(c), 1e-8)
	if f.Parameters[iSwc].Held || !f.Parameters[iSwc].Determined {
		t.Errorf("Swc %+v", f.Parameters[iSwc])
	}
}

// TestSlopes: the analytic slopes of the models with respect to what the minimiser
// moves agree with central differences of the curves.
func TestSlopes(t *testing.T) {
	for _, test := range []struct {
		family family
		values []float64
	}{{coreyFamily, coreyValues(trueCorey)}, {letFamily, letValues(trueLET)}} {
		n := len(test.values)
		krw, kro := make([]float64, n), make([]float64, n)
		for _, sw := range []float64{0.215, 0.24, 0.3, 0.45, 0.6, 0.7, 0.725} {
			test.family.slopes(test.values, sw, test.family.curves(test.values).At(sw), krw, kro)
			for j, s := range test.family.specs {
				const h = 1e-6
				moved := append([]float64(nil), test.values...)
				moved[j] = s.outer(s.inner(test.values[j]) + h)
				up := test.family.curves(moved).At(sw)
				moved[j] = s.outer(s.inner(test.values[j]) - h)
				down := test.family.curves(moved).At(sw)
				for _, slope := range []struct{ got, want float64 }{{krw[j], (up.Krw - down.Krw) / (2 * h)}, {kro[j], (up.Kro - down.Kro) / (2 * h)}} {
					if math.Abs(slope.got-slope.want) > 1e-8*(1+math.Abs(slope.want)) {
						t.Errorf("slope at Sw = %g with respect to %s is %.10g, difference %.10g", sw, s.symbol, slope.got, slope.want)
					}
				}
			}
		}
	}
}

// TestDake fits the table of Dake (1978), exercise 10.1.
func TestDake(t *testing.T) {
	p := dake(t)
	for _, finding := range Inspect(p) {
		t.Errorf("finding %+v in a sound table", finding)
	}
	for _, o := range []Options{{}, {Weights: Absolute}, {HoldEnds: true}, {FreeSaturations: true}} {
		for name, fit := range map[string]func(Points, Options) (Fit, error){"Corey": Corey, "LET": LET} {
			f, err := fit(p, o)
			if err != nil {
				t.Fatal(err)
			}
			if f.Status != Converged || f.DegreesOfFreedom != 24-fitted(f)+extra(o) {
				t.Errorf("%s %+v: %v, %d degrees of freedom", name, o, f.Status, f.DegreesOfFreedom)
			}
			checkMatrices(t, f)
			checkBand(t, f)
			if name == "LET" && (f.RMSKrw > 0.003 || f.RMSKro > 0.003) {
				t.Errorf("LET %+v leaves %.4f and %.4f; the table is printed to 0.001 to 0.005", o, f.RMSKrw, f.RMSKro)
			}
		}
	}
	// The best sum of squares does not depend on where the search starts.
	for _, family := range []family{coreyFamily, letFamily} {
		reference, err := run(family, p, Options{})
		if err != nil {
			t.Fatal(err)
		}
		for _, start := range [][]float64{{1.5, 0.5, 0.8}, {5, 2, 3}, {2.5, -1, 2}} {
			family.starts = [][]float64{start[:family.shapes]}
			again, err := run(family, p, Options{})
			if err != nil {
				t.Fatal(err)
			}
			for j, q := range again.Parameters {
				if !near(q.Value, reference.Parameters[j].Value, 1e-6) {
					t.Errorf("from %v: %s = %.9g, else %.9g", start, q.Symbol, q.Value, reference.Parameters[j].Value)
				}
			}
		}
	}
}

func fitted(f Fit) int {
	n := 0
	for _, p := range f.Parameters {
		if !p.Held && !p.AtBound {
			n++
		}
	}
	return n
}

// extra: with free saturations the two end rows carry information too.
func extra(o Options) int {
	if o.FreeSaturations {
		return 2
	}
	return 0
}

func checkMatrices(t *testing.T, f Fit) {
	t.Helper()
	for i, p := range f.Parameters {
		if !near(f.Covariance[i][i], p.StdErr*p.StdErr, 1e-12) {
			t.Errorf("variance of %s %g, standard error %g", p.Symbol, f.Covariance[i][i], p.StdErr)
		}
		if f.Correlation[i][i] != 1 {
			t.Errorf("%s has correlation %g with itself", p.Symbol, f.Correlation[i][i])
		}
		if !(p.Low <= p.Value && p.Value <= p.High && p.Min <= p.Low && p.High <= p.Max) {
			t.Errorf("%+v is not in order", p)
		}
		for j := range f.Parameters {
			if f.Correlation[i][j] != f.Correlation[j][i] || f.Covariance[i][j] != f.Covariance[j][i] || math.Abs(f.Correlation[i][j]) > 1 {
				t.Errorf("covariance and correlation of %d and %d: %g and %g", i, j, f.Covariance[i][j], f.Correlation[i][j])
			}
		}
	}
}

// checkBand: the band holds the curve and is not negative.
func checkBand(t *testing.T, f Fit) {
	t.Helper()
	for i := range 101 {
		sw := float64(i) / 100
		krwLow, krwHigh, kroLow, kroHigh := f.Band(sw)
		at := f.Curves.At(sw)
		if !(0 <= krwLow && krwLow <= at.Krw && at.Krw <= krwHigh && 0 <= kroLow && kroLow <= at.Kro && at.Kro <= kroHigh) {
			t.Errorf("band at %g: %g %g %g beside %g and %g %g %g", sw, krwLow, at.Krw, krwHigh, at.Kro, kroLow, at.Kro, kroHigh)
		}
	}
}

// TestBandAtEnd: where a curve is its end point alone, the band is that parameter's
// interval.
func TestBandAtEnd(t *testing.T) {
	f, err := Corey(noisy(table(trueCorey, 13), 0.03, 5), Options{})
	if err != nil {
		t.Fatal(err)
	}
	_, krwHigh, _, _ := f.Band(1)
	_, _, kroLow, _ := f.Band(0)
	if !near(krwHigh, f.Parameters[iKrw0].High, 1e-12) || !near(kroLow, f.Parameters[iKro0].Low, 1e-12) {
		t.Errorf("krw up to %g, krw0 up to %g; kro from %g, kro0 from %g", krwHigh, f.Parameters[iKrw0].High, kroLow, f.Parameters[iKro0].Low)
	}
}

// TestStudent: the quantile behind the intervals, from the usual table of Student's
// t, two-sided 95 %: 2.228 for 10, 2.086 for 20 degrees of freedom (from memory).
func TestStudent(t *testing.T) {
	for n, want := range map[int]float64{12: 2.228, 22: 2.086} {
		f, err := Corey(noisy(table(trueCorey, n+1), 0.03, 3), Options{})
		if err != nil {
			t.Fatal(err)
		}
		for _, s := range f.state.scatter {
			if s.freedom != n-2 || math.Abs(s.student-want) > 5e-4 {
				t.Errorf("%d degrees of freedom: t = %.4f, want %g", s.freedom, s.student, want)
			}
		}
	}
}

// TestHold: what is held stays and has no error.
func TestHold(t *testing.T) {
	f, err := Corey(table(trueCorey, 13), Options{Hold: map[string]float64{"nw": 4, "krw0": 0.3, "kro0": 0.8, "no": 2}})
	if err != nil {
		t.Fatal(err)
	}
	if c := f.Curves.(relperm.Corey); c.Nw != 4 || c.Krw0 != 0.3 || c.Kro0 != 0.8 || c.No != 2 || f.DegreesOfFreedom != 24 {
		t.Errorf("%+v with %d degrees of freedom", c, f.DegreesOfFreedom)
	}
	checkMatrices(t, f)
	low, high, _, _ := f.Band(0.5)
	if at := f.Curves.At(0.5).Krw; low != at || high != at {
		t.Errorf("band %g to %g of a held curve %g", low, high, at)
	}
	if f, err = Corey(dake(t), Options{HoldEnds: true}); err != nil || f.Parameters[iKro0].Value != 0.8 || f.Parameters[iKrw0].Value != 0.3 {
		t.Errorf("held ends %+v %v", f.Parameters, err)
	}
}

func TestRefused(t *testing.T) {
	good := table(trueCorey, 13)
	for _, test := range []struct {
		p    Points
		o    Options
		want string
	}{
		{Points{}, Options{}, "There are no points"},
		{Points{Sw: good.Sw, Krw: good.Kro, Kro: good.Krw}, Options{}, "swapped"},
		{good, Options{Hold: map[string]float64{"nq": 2}}, "no parameter nq"},
		{good, Options{Hold: map[string]float64{"nw": 0.5}}, "nw is to be held at 0.5; allowed: 1 to 15"},
		{good, Options{Hold: map[string]float64{"nw": math.NaN()}}, "allowed: 1 to 15"},
		{good, Options{Floor: -1}, "allowed: above 0, up to 1"},
		{good, Options{Floor: math.NaN()}, "allowed: above 0, up to 1"},
	} {
		_, err := Corey(test.p, test.o)
		var refused *RefusedError
		if !errors.As(err, &refused) || !strings.Contains(err.Error(), test.want) {
			t.Errorf("error %v, want %q", err, test.want)
		}
	}
	// Three rows give two values a phase: enough for two parameters, but not for a
	// judgement; four rows give three, one less than LET has.
	for _, test := range []struct {
		fit  func(Points, Options) (Fit, error)
		n    int
		want string
	}{{Corey, 3, "4 values that curves can be fitted to; allowed: at least 5"}, {LET, 4, "3 values of krw"}} {
		if _, err := test.fit(table(trueCorey, test.n), Options{}); err == nil || !strings.Contains(err.Error(), test.want) {
			t.Errorf("error %v, want %q", err, test.want)
		}
	}
}
