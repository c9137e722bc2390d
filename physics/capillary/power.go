package capillary

import "math"

// Power is a dimensionless curve of the kind fitted to Leverett's J-function.
//
//	Se = (sw - swr)/(1 - swr - snr), J = A (Se^-B - C)
//
// Valid for 0 <= Swr, 0 <= Snr, Swr + Snr < 1, A > 0, B > 0, any C. J is infinite at Swr and
// A (1 - C) at 1-Snr: C < 1 leaves an entry pressure, C > 1 makes the curve cross zero.
// Scaled by System.Scale it is a capillary pressure. The J-function is Leverett's
// (1941); the power form is common practice, no source.
type Power struct {
	Swr, Snr float64
	A, B, C  float64
}

var _ Curve = Power{}

// At implements Curve. The value is A [(e^x - 1) + (1 - C)] with x = -B ln Se, good to the
// last digit at full saturation also where C = 1.
func (c Power) At(sw float64) (j, slope float64) {
	n := normalise(sw, c.Swr, c.Snr)
	switch {
	case n.s == 0:
		return math.Inf(1), math.Inf(-1)
	case n.outside:
		return c.A * (1 - c.C), 0
	}
	x := -c.B * n.logS()
	return c.A * (math.Expm1(x) + (1 - c.C)), -c.A * c.B * math.Exp(x) / (n.s * n.width)
}

// Ends implements Curve.
func (c Power) Ends() (low, high float64) { return c.Swr, 1 - c.Snr }

// Knots implements Curve: the model is smooth.
func (c Power) Knots() []float64 { return nil }
