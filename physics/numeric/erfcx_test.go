package numeric

import (
	"math"
	"testing"
)

// Independent computation in decimal arithmetic of 80 digits: the series of Abramowitz &
// Stegun (1964), eq. 7.1.6, below 6 and the continued fraction with 4,000 terms above;
// both agree to 20 digits where they meet at 2.0625.
func TestErfcxValues(t *testing.T) {
	for _, c := range [][2]float64{
		{0, 1},
		{0.125, 8.73221845082150809604e-1},
		{0.5, 6.15690344192925874871e-1},
		{1, 4.27583576155807004411e-1},
		{1.5, 3.21585416454317502354e-1},
		{1.9375, 2.62237606550381438823e-1},
		{2, 2.55395676310505743865e-1},
		{2.0625, 2.48880496184162361228e-1},
		{2.5, 2.10806364061143580647e-1},
		{3, 1.79001151181389950419e-1},
		{4, 1.36999457625061389889e-1},
		{5, 1.10704637733068626370e-1},
		{8, 6.99851662008809277228e-2},
		{10, 5.61409927438225858575e-2},
		{26, 2.16835848505629066162e-2},
		{100, 5.64161378298943290356e-3},
		{1e4, 5.64189580726808411524e-5},
		{1e8, 5.64189583547756258739e-9},
	} {
		if got := Erfcx(c[0]); !(math.Abs(got-c[1]) <= 1e-15*c[1]) {
			t.Errorf("Erfcx(%g) = %.17g, want %.17g", c[0], got, c[1])
		}
	}
}

// Cengel, Heat Transfer, table 4-4: erfc to the printed digits.
func TestErfcxAgainstPrintedTable(t *testing.T) {
	for _, c := range []struct{ x, erfc, printed float64 }{
		{0.1, 0.8875, 5e-5}, {0.5, 0.4795, 5e-5}, {1, 0.1573, 5e-5}, {1.5, 0.0339, 5e-5}, {2, 0.00468, 5e-6},
	} {
		if got := math.Exp(-c.x*c.x) * Erfcx(c.x); !(math.Abs(got-c.erfc) <= c.printed) {
			t.Errorf("exp(-x²) Erfcx(x) at %g = %.8g, printed %g", c.x, got, c.erfc)
		}
	}
}

// Both sides of every change of method and every number of terms: erfc is the product,
// the function falls, lies between its bounds 1/(x+sqrt(x²+2)) and 1/(x+sqrt(x²+4/pi))
// times 2/sqrt(pi) (Abramowitz & Stegun (1964), eq. 7.1.13), and has the slope
// 2 x erfcx - 2/sqrt(pi).
func TestErfcxIdentities(t *testing.T) {
	last := math.Inf(1)
	for i := range 6000 {
		x := -5 + 0.005*float64(i)
		y := Erfcx(x)
		if !(y < last) {
			t.Fatalf("Erfcx(%g) = %g does not fall", x, y)
		}
		last = y
		if x < 5 {
			if e := math.Exp(-x*x)*y/math.Erfc(x) - 1; !(math.Abs(e) <= 2e-14) { // exp(-25) carries 25 roundings
				t.Errorf("Erfcx(%g) misses erfc by %.2g of it", x, e)
			}
		}
		if x >= 0 {
			scale := 2 / math.Sqrt(math.Pi)
			low, high := scale/(x+math.Sqrt(x*x+2)), scale/(x+math.Sqrt(x*x+4/math.Pi))
			if !(y > low*(1-1e-15) && y <= high*(1+1e-15)) {
				t.Errorf("Erfcx(%g) = %.17g is outside %.17g to %.17g", x, y, low, high)
			}
		}
		const h = 1e-4
		slope := (Erfcx(x+h) - Erfcx(x-h)) / (2 * h)
		want := 2*x*y - 2/math.Sqrt(math.Pi)
		if !(math.Abs(slope-want) <= 1e-5*math.Abs(want)+1e-10) {
			t.Errorf("the slope of Erfcx at %g is %g, want %g", x, slope, want)
		}
	}
}

func TestErfcxSpecialCases(t *testing.T) {
	if got := Erfcx(math.Inf(1)); got != 0 {
		t.Errorf("Erfcx(+Inf) = %g", got)
	}
	for _, x := range []float64{-26.65, -1e200, math.Inf(-1)} {
		if got := Erfcx(x); !math.IsInf(got, 1) {
			t.Errorf("Erfcx(%g) = %g", x, got)
		}
	}
	if got := Erfcx(-26.6); math.IsInf(got, 0) {
		t.Errorf("Erfcx(-26.6) = %g", got)
	}
	if got := Erfcx(math.NaN()); !math.IsNaN(got) {
		t.Errorf("Erfcx(NaN) = %g", got)
	}
	if got, want := Erfcx(1e300)*1e300*math.Sqrt(math.Pi), 1.0; !(math.Abs(got-want) <= 1e-15) {
		t.Errorf("x sqrt(pi) Erfcx(x) at 1e300 = %.17g", got)
	}
}
