package fit

import (
	"fmt"
	"math"
	"strings"
	"testing"
)

// TestAtBound: points more bent than any lawful exponent push no to its bound 1.
func TestAtBound(t *testing.T) {
	p := table(trueCorey, 13)
	for i, sw := range p.Sw {
		p.Kro[i] = 0.83 * math.Sqrt(max(1-trueCorey.Sor-sw, 0)/(1-trueCorey.Swc-trueCorey.Sor))
	}
	f, err := Corey(p, Options{})
	if err != nil {
		t.Fatal(err)
	}
	no := f.Parameters[5]
	if no.Value != 1 || !no.AtBound || no.StdErr != 0 || no.Low != 1 || no.High != 1 || no.Determined {
		t.Errorf("no %+v", no)
	}
	says(t, f, "no lies at its bound 1")
	checkMatrices(t, f)
	checkBand(t, f)
	// krw was exact and is fitted apart, so it is found again.
	if !near(f.Parameters[4].Value, trueCorey.Nw, 1e-8) || f.DegreesOfFreedom != 24-3 {
		t.Errorf("nw %+v, %d degrees of freedom", f.Parameters[4], f.DegreesOfFreedom)
	}
}

func says(t *testing.T, f Fit, want string) {
	t.Helper()
	if !strings.Contains(strings.Join(f.Verdict, "\n"), want) {
		t.Errorf("verdict %q does not say %q", f.Verdict, want)
	}
}

func TestVerdict(t *testing.T) {
	p := table(trueCorey, 13)
	f, err := Corey(p, Options{})
	if err != nil {
		t.Fatal(err)
	}
	says(t, f, "The points determine every fitted parameter.")

	p = noisy(p, 0.005, 4)
	p.Krw[8] *= 1.3
	if f, err = Corey(p, Options{}); err != nil {
		t.Fatal(err)
	}
	says(t, f, fmt.Sprintf("lies krw at Sw = %.4g.", p.Sw[8]))

	// Few and scattered rows leave the shape of LET open.
	if f, err = LET(noisy(table(trueLET, 7), 0.1, 2), Options{}); err != nil {
		t.Fatal(err)
	}
	says(t, f, "is not determined by these points")

	// Rows next to one end only: krw is a multiple of krw0 s^nw over a narrow s.
	near := sample(trueCorey, trueCorey.Swc, trueCorey.Swc+0.05, 9)
	if f, err = Corey(noisy(near, 0.2, 9), Options{FreeSaturations: true}); err != nil {
		t.Fatal(err)
	}
	says(t, f, "is not determined by these points")
	for _, sentence := range f.Verdict {
		if strings.Contains(sentence, "NaN") || strings.Contains(sentence, "Inf") {
			t.Errorf("verdict %q", sentence)
		}
	}

	// What the intervals suppose: one size of scatter in kr, or for two values of krw
	// beside two parameters the scatter of the other phase.
	if f, err = Corey(noisy(table(trueCorey, 13), 0.02, 5), Options{Weights: Absolute}); err != nil {
		t.Fatal(err)
	}
	says(t, f, "hold only if the scatter is as large at small kr as at large")
	short := noisy(table(trueCorey, 3), 0.02, 5)
	if f, err = Corey(short, Options{Hold: map[string]float64{"kro0": trueCorey.Kro0}}); err != nil {
		t.Fatal(err)
	}
	says(t, f, "krw has as many points as parameters: its intervals borrow the scatter of kro.")
	checkBand(t, f)

	// The printed table of Dake is not a Corey curve up to its oil end.
	if f, err = Corey(dake(t), Options{}); err != nil {
		t.Fatal(err)
	}
	says(t, f, "where the points have 0.8 at Sw = 0.2")

	if f, err = LET(dake(t), Options{Iterations: 2}); err != nil || f.Status != IterationLimit {
		t.Fatalf("status %v, %v", f.Status, err)
	}
	says(t, f, "iteration limit")
}
