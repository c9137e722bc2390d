package numeric

import "math"

// Zero finds a root of f between a and b when no derivative is at hand. fa and fb
// are f(a) and f(b); they must not have the same sign.
//
// It is Chandrupatla's method: inverse quadratic interpolation where the three
// last points allow it, bisection where they do not, so that the number of calls
// never exceeds about twice that of bisection. It stops at an exact zero or when
// the bracket is two units of the last place wide, and returns the end with the
// smaller |f|.
//
// Source: Chandrupatla (1997), Adv. Eng. Software 28(3), 145-149.
func Zero(f func(float64) float64, a, b, fa, fb float64) float64 {
	if fa == 0 {
		return a
	}
	if fb == 0 {
		return b
	}
	t := 0.5
	for {
		x := a + t*(b-a)
		fx := f(x)
		c, fc := a, fa
		if (fx > 0) != (fa > 0) {
			c, fc = b, fb
			b, fb = a, fa
		}
		a, fa = x, fx
		best, fbest := b, fb
		if math.Abs(fa) < math.Abs(fb) {
			best, fbest = a, fa
		}
		least := math.Max(2*ulp*math.Abs(best), math.SmallestNonzeroFloat64) / math.Abs(b-a)
		if fbest == 0 || !(least <= 0.5) {
			return best
		}
		xi, phi := (a-b)/(c-b), (fa-fb)/(fc-fb)
		t = 0.5
		if phi*phi < xi && (1-phi)*(1-phi) < 1-xi {
			t = fa/(fb-fa)*fc/(fb-fc) + (c-a)/(b-a)*fa/(fc-fa)*fb/(fc-fb)
		}
		t = math.Min(1-least, math.Max(least, t))
	}
}

const ulp = 0x1p-52
