package capillary

import "math"

// Skjaeveland is the sum of a water branch and an oil branch, for rock of any
// wettability.
//
//	Pc = Cw/((sw - swr)/(1 - swr))^Aw + Co/((1 - sw - sor)/(1 - sor))^Ao
//
// Valid for 0 <= Swr, 0 <= Sor, Swr + Sor < 1, Cw >= 0 and Co <= 0 (Pa, not both 0), Aw > 0,
// Ao > 0. With both branches Pc goes from +infinity at Swr to -infinity at 1-Sor and
// crosses zero once: rock of mixed wettability. Co = 0 leaves water-wet rock, with a
// finite upper end; Cw = 0 oil-wet rock, with a finite lower one. Each branch is a
// Brooks-Corey form with exponent 1/lambda. Source: Skjaeveland, Siqveland, Kjosavik,
// Hammervold Thomas & Virnovsky (2000).
type Skjaeveland struct {
	Swr, Sor float64
	Cw, Aw   float64
	Co, Ao   float64
}

var _ Curve = Skjaeveland{}

// At implements Curve.
func (c Skjaeveland) At(sw float64) (pc, slope float64) {
	low, high := c.Ends()
	within := min(max(sw, low), high)
	if c.Cw != 0 {
		y, d := decay((within-low)/(1-c.Swr), c.Aw)
		pc, slope = c.Cw*y, c.Cw*d/(1-c.Swr)
	}
	if c.Co != 0 {
		y, d := decay((high-within)/(1-c.Sor), c.Ao)
		pc, slope = pc+c.Co*y, slope-c.Co*d/(1-c.Sor)
	}
	if within != sw && !math.IsInf(pc, 0) && !math.IsNaN(sw) {
		slope = 0
	}
	return pc, slope
}

// Ends implements Curve.
func (c Skjaeveland) Ends() (low, high float64) { return c.Swr, 1 - c.Sor }

// Knots implements Curve: the model is smooth.
func (c Skjaeveland) Knots() []float64 { return nil }
