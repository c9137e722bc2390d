package numeric

import "math"

// Erfcx is the scaled complementary error function
//
//	erfcx(x) = exp(x²) erfc(x)
//
// which stays of order 1/x where erfc itself has long been lost below the smallest
// number. Its error is a few units of the last place for x >= 0.
//
// Up to x = 2 it is the product, with what x² loses to rounding put back; beyond, it is
// Laplace's continued fraction
//
//	sqrt(pi) erfcx(x) = 1/(x + (1/2)/(x + 1/(x + (3/2)/(x + ...))))
//
// cut off where more terms change nothing. For x < 0 it is 2 exp(x²) - erfcx(-x).
//
// Special cases are:
//
//	Erfcx(+Inf) = 0
//	Erfcx(x) = +Inf for x < -26.64, where exp(x²) is out of range
//	Erfcx(NaN) = NaN
//
// Source: Abramowitz & Stegun (1964), eq. 7.1.14.
func Erfcx(x float64) float64 {
	switch {
	case x < 0:
		return 2*expSquare(x) - Erfcx(-x)
	case x < 2:
		return expSquare(x) * math.Erfc(x)
	case math.IsNaN(x) || math.IsInf(x, 1):
		return 1 / x
	}
	// Counted against 3,000 terms, 126/x are needed up to x = 10 and 4 at x = 100.
	n := 3 + int(150/x)
	tail := x
	for k := n; k > 0; k-- {
		tail = x + float64(k)/2/tail
	}
	return 1 / (math.Sqrt(math.Pi) * tail)
}

// expSquare is exp(x²) to the last digits.
func expSquare(x float64) float64 {
	square := x * x
	if math.IsInf(square, 1) {
		return square
	}
	lost := math.FMA(x, x, -square)
	return math.Exp(square) * (1 + lost)
}
