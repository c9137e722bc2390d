package ride

import (
	"math"

	"brinefront/physics/fracflow"
)

// level carries a flux function on beyond its ends at the values it has there, over the
// range from lo to hi that two curves share.
type level struct {
	fn               fracflow.Function
	from, to, lo, hi float64
	knots            []float64
}

var _ fracflow.Function = level{}

// levelled gives both functions the range that either has.
func levelled(a, b fracflow.Function) (fracflow.Function, fracflow.Function) {
	alo, ahi := a.Ends()
	blo, bhi := b.Ends()
	lo, hi := math.Min(alo, blo), math.Max(ahi, bhi)
	return levelTo(a, lo, hi), levelTo(b, lo, hi)
}

func levelTo(fn fracflow.Function, lo, hi float64) fracflow.Function {
	from, to := fn.Ends()
	if from == lo && to == hi {
		return fn
	}
	l := level{fn: fn, from: from, to: to, lo: lo, hi: hi}
	if from > lo {
		l.knots = append(l.knots, from)
	}
	l.knots = append(l.knots, fn.Knots()...)
	if to < hi {
		l.knots = append(l.knots, to)
	}
	return l
}

// At implements fracflow.Function.
func (l level) At(s float64) (f, dfds float64) {
	switch {
	case s < l.from:
		f, _ = l.fn.At(l.from)
		return f, 0
	case s >= l.to && l.to < l.hi:
		f, _ = l.fn.At(l.to)
		return f, 0
	}
	return l.fn.At(s)
}

// Ends implements fracflow.Function.
func (l level) Ends() (lo, hi float64) { return l.lo, l.hi }

// Knots implements fracflow.Function.
func (l level) Knots() []float64 { return l.knots }
