// Package relperm holds relative permeability models and tables of a two-phase
// system: the displacing phase is called water (w), the resident phase oil (o).
//
// Every model answers the same questions (Curves) and passes the same contract
// suite: krw rises and kro falls from the connate water saturation swc to the
// largest water saturation swmax = 1 - sor, outside that range both are constant
// with zero slope, slopes are finite and agree with finite differences, and a
// saturation that is not a number gives values that are not numbers.
package relperm

// Point is the value of both curves and of their slopes at one water saturation.
type Point struct {
	Krw, Kro   float64
	DKrw, DKro float64 // d kr / d sw; one-sided from the right at a knot
}

// Curves is a pair of relative permeability curves.
type Curves interface {
	// At evaluates at water saturation sw. Outside [swc, swmax] the end values
	// hold and slopes are zero.
	At(sw float64) Point
	// Ends returns the connate water saturation and the largest water saturation.
	Ends() (swc, swmax float64)
	// Knots returns, in rising order, the saturations strictly between the ends
	// at which a slope or a second derivative jumps; nil for a smooth model.
	Knots() []float64
}
