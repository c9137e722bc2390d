package imbibe

import "math"

// Exponential is the exchange function of Aronofsky, Masse and Natanson (1958),
//
//	R = 1 - exp(-lambda t)
type Exponential struct{ Rate float64 } // lambda, 1/s

// At implements Uptake.
func (e Exponential) At(t float64) (share, rate float64) {
	left := math.Exp(-e.Rate * t)
	return 1 - left, e.Rate * left
}

// RootExponential starts as soaking does and ends as an exchange does; our own:
//
//	R = c sqrt(t)                                       t <= t1
//	R = 1 - (1 - c sqrt(t1)) exp(-lambda (t - t1))      t > t1
type RootExponential struct {
	Early float64 // c, s^-1/2
	Turn  float64 // t1, s, at most 1/c²
	Rate  float64 // lambda, 1/s
}

// At implements Uptake.
func (e RootExponential) At(t float64) (share, rate float64) {
	if t <= e.Turn {
		root := math.Sqrt(t)
		return e.Early * root, e.Early / (2 * root)
	}
	left := (1 - e.Early*math.Sqrt(e.Turn)) * math.Exp(-e.Rate*(t-e.Turn))
	return 1 - left, e.Rate * left
}

// FitExponential is the exponential nearest to the recovery in least squares over the
// times, each weighing the same.
func (r *Recovery) FitExponential(times []float64) Exponential {
	return Exponential{r.fitRate(times, func(rate float64) Uptake { return Exponential{rate} })}
}

// FitRootExponential is the like with the recovery's own early slope: t1 and lambda are
// fitted.
func (r *Recovery) FitRootExponential(times []float64) RootExponential {
	best, least := RootExponential{}, math.Inf(1)
	for k := range 24 {
		root := (0.02 + 0.9*float64(k)/23) / r.Early()
		e := RootExponential{Early: r.Early(), Turn: root * root}
		e.Rate = r.fitRate(times, func(rate float64) Uptake { e.Rate = rate; return e })
		if m := Compare(e, r, times); m.RMS < least {
			best, least = e, m.RMS
		}
	}
	return best
}

// fitRate finds the rate that fits best, by golden section in its logarithm.
func (r *Recovery) fitRate(times []float64, with func(rate float64) Uptake) float64 {
	const golden = 0.6180339887498949
	middle := -math.Log(r.TimeAt(0.5))
	miss := func(x float64) float64 { return Compare(with(math.Exp(x)), r, times).RMS }
	a, b := middle-5, middle+5
	c, d := b-golden*(b-a), a+golden*(b-a)
	mc, md := miss(c), miss(d)
	for b-a > 1e-5 {
		if mc < md {
			b, d, md = d, c, mc
			c = b - golden*(b-a)
			mc = miss(c)
		} else {
			a, c, mc = c, d, md
			d = a + golden*(b-a)
			md = miss(d)
		}
	}
	return math.Exp((a + b) / 2)
}

// Equivalent is the constant diffusion, in the sense of Dc, m2/s, that would start the block
// the same:
//
//	D = pi phi c²/(4 a²)
//
// from A = (S0-Si) sqrt(D phi/pi), with c the share over sqrt(t) at first and a the open area
// over the volume.
func (b *Block) Equivalent(porosity float64) float64 {
	area := b.Shape.OpenArea()
	return math.Pi / 4 * porosity * b.Early() * b.Early() / (area * area)
}

// ShapeFactor is the factor, 1/m², that an exchange of a given rate, 1/s, stands for, with the
// constant diffusion that starts the block the same: rate phi/D.
func (b *Block) ShapeFactor(rate, porosity float64) float64 {
	return rate * porosity / b.Equivalent(porosity)
}

// Uptake is the coefficient A, m/s^1/2, of the faces of the block at the start, from
// share = 2 A a sqrt(t)/(phi (S0-Si)), a the open area over the volume.
func (b *Block) Uptake(porosity float64, m *Matrix) float64 {
	return b.Early() * porosity * m.Capacity() / (2 * b.Shape.OpenArea())
}
