package fit

import "math"

// Straight is the straight line y = Intercept + Slope x through points, by least squares
// with even weights.
type Straight struct {
	Slope, Intercept    float64
	SlopeLow, SlopeHigh float64 // interval of the slope
	Explained           float64 // part of the variance of y that the line explains, R²
	Points              int

	mean, reach  float64 // of x: mean and sum of squares about it
	spread, wide float64 // standard deviation about the line; Student's quantile of the interval
}

// NewStraight fits a line and gives intervals of the level (such as 0.95), as if the points
// scattered about it independently and evenly. False for fewer than three points or
// points of one x.
//
// Source: Seber & Wild (1989), of which this is the linear case.
func NewStraight(x, y []float64, level float64) (Straight, bool) {
	n := float64(len(x))
	if len(x) < 3 {
		return Straight{}, false
	}
	var mx, my, sxx, sxy, syy float64
	for i := range x {
		mx, my = mx+x[i]/n, my+y[i]/n
	}
	for i := range x {
		dx, dy := x[i]-mx, y[i]-my
		sxx, sxy, syy = sxx+dx*dx, sxy+dx*dy, syy+dy*dy
	}
	if !(sxx > 0) {
		return Straight{}, false
	}
	s := Straight{Slope: sxy / sxx, Points: len(x), mean: mx, reach: sxx, wide: student(n-2, 1-level)}
	s.Intercept = my - s.Slope*mx
	left := math.Max(0, syy-s.Slope*sxy)
	s.spread = math.Sqrt(left / (n - 2))
	if syy > 0 {
		s.Explained = 1 - left/syy
	}
	half := s.wide * s.spread / math.Sqrt(sxx)
	s.SlopeLow, s.SlopeHigh = s.Slope-half, s.Slope+half
	return s, true
}

// Where is the x at which the line comes to y, with its interval; false where the slope may
// be of either sign, so that the interval has no end.
//
// The interval is Fieller's (1954): the x at which y lies within the band of the line.
func (s Straight) Where(y float64) (x, low, high float64, ok bool) {
	if s.SlopeLow*s.SlopeHigh <= 0 {
		return 0, 0, 0, false
	}
	x = (y - s.Intercept) / s.Slope
	g := s.wide * s.wide * s.spread * s.spread / (s.Slope * s.Slope * s.reach)
	d := x - s.mean
	half := s.wide * s.spread / math.Abs(s.Slope) * math.Sqrt((1-g)/float64(s.Points)+d*d/s.reach)
	return x, s.mean + (d-half)/(1-g), s.mean + (d+half)/(1-g), true
}
