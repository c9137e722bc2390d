package capillary

import "math"

// VanGenuchten is the S-shaped form.
//
//	Se = (sw - swr)/(1 - swr - snr), Pc = P0 (Se^(-1/M) - 1)^(1/N)
//
// Valid for 0 <= Swr, 0 <= Snr, Swr + Snr < 1, P0 > 0 (Pa), N > 1, M > 0. M is free, or tied
// to N by Mualem or Burdine. Pc is infinite at Swr and zero at 1-Snr, where its slope
// is infinite: there is no entry pressure. With x = -ln(Se)/M
//
//	Pc = P0 (e^x - 1)^(1/N), dPc/dSe = -Pc/(N M Se (1 - e^-x))
//
// lose no digits at either end. Source: van Genuchten (1980), eq. 3 with alpha = 1/P0;
// Snr = 0 there, a trapped saturation in the width is common practice.
type VanGenuchten struct {
	Swr, Snr float64
	P0, N, M float64
}

var _ Curve = VanGenuchten{}

// Mualem is the M that goes with Mualem's conductivity model, 1 - 1/n, for n > 1:
// van Genuchten (1980).
func Mualem(n float64) float64 { return 1 - 1/n }

// Burdine is the M that goes with Burdine's conductivity model, 1 - 2/n, for n > 2:
// van Genuchten (1980).
func Burdine(n float64) float64 { return 1 - 2/n }

// At implements Curve.
func (c VanGenuchten) At(sw float64) (pc, slope float64) {
	n := normalise(sw, c.Swr, c.Snr)
	switch {
	case n.s == 0:
		return math.Inf(1), math.Inf(-1)
	case n.outside:
		return 0, 0
	case n.t == 0:
		return 0, math.Inf(-1)
	}
	x := -n.logS() / c.M
	logGrown := x // ln(e^x - 1), which is x itself once e^-x is below rounding
	if x < 40 {
		logGrown = math.Log(math.Expm1(x))
	}
	pc = c.P0 * math.Exp(logGrown/c.N)
	return pc, pc / (c.N * c.M * n.s * math.Expm1(-x) * n.width)
}

// Ends implements Curve.
func (c VanGenuchten) Ends() (low, high float64) { return c.Swr, 1 - c.Snr }

// Knots implements Curve: the model is smooth.
func (c VanGenuchten) Knots() []float64 { return nil }
