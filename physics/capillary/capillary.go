// Package capillary holds capillary pressure models and tables of a two-phase
// system, Pc = Po - Pw in Pa against water saturation: water (w) is the displacing
// phase, oil (o) the resident one.
//
// Every model answers the same questions (Curve) and passes the same contract
// suite: Pc never rises with water saturation, its slope agrees with finite
// differences, and a saturation that is not a number gives values that are not numbers.
package capillary

// Curve is capillary pressure against water saturation.
type Curve interface {
	// At returns Pc (Pa) and its slope dPc/dSw (Pa) at sw; one-sided from the right
	// at a knot. Towards an end Pc and slope may grow without bound; at and beyond such
	// an end they are infinite, beyond a finite end the end value holds with slope 0. A
	// finite end may be met with an infinite slope (van Genuchten at full saturation).
	At(sw float64) (pc, slope float64)
	// Ends returns the range of saturations on which the curve is defined.
	Ends() (low, high float64)
	// Knots returns, in rising order, the saturations strictly between the ends at
	// which a slope or a second derivative jumps; nil for a smooth model.
	Knots() []float64
}
