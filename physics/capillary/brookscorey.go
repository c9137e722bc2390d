package capillary

// BrooksCorey is the power form of drainage with an entry pressure.
//
//	Se = (sw - swr)/(1 - swr - snr), Pc = Entry Se^(-1/Lambda)
//
// Valid for 0 <= Swr, 0 <= Snr, Swr + Snr < 1, Entry > 0 (Pa), Lambda > 0. Pc is infinite
// at Swr and Entry at 1-Snr: it never comes to zero, so rock of this form soaks up water
// until only the trapped oil is left. Lambda is large for pores of one size (2 is
// Corey's curve). Source: Brooks & Corey (1964); Snr = 0 there, a trapped saturation in
// the width is common practice.
type BrooksCorey struct {
	Swr, Snr      float64
	Entry, Lambda float64
}

var _ Curve = BrooksCorey{}

// At implements Curve.
func (c BrooksCorey) At(sw float64) (pc, slope float64) {
	n := normalise(sw, c.Swr, c.Snr)
	if n.s == 1 && n.outside {
		return c.Entry, 0
	}
	y, d := decay(n.s, 1/c.Lambda)
	return c.Entry * y, c.Entry * d / n.width
}

// Ends implements Curve.
func (c BrooksCorey) Ends() (low, high float64) { return c.Swr, 1 - c.Snr }

// Knots implements Curve: the model is smooth.
func (c BrooksCorey) Knots() []float64 { return nil }
