package imbibe

import "math"

// order is the number of Gauss points on a panel; checks that of the points between them
// at which a solution is examined.
const (
	order  = 8
	checks = 4
)

// gauss holds what all panels share: on [-1, 1], the points and weights of Gauss and
// Legendre, and for each point x the integrals from -1 to x of the polynomials that are 1
// at one point and 0 at the others. check holds the same for the points in between.
var gauss, check = rules()

type rule struct {
	x, weight []float64
	value     [][order]float64 // the polynomials at each x
	left      [][order]float64 // and their integrals from -1 to x
}

func rules() (gauss, check rule) {
	gauss.x, gauss.weight = legendre(order)
	check.x, check.weight = legendre(checks)
	for _, r := range []*rule{&gauss, &check} {
		for _, x := range r.x {
			value, left := basis(gauss, x)
			r.value, r.left = append(r.value, value), append(r.left, left)
		}
	}
	return gauss, check
}

// legendre returns the n points and weights of Gauss and Legendre, by Newton's method on
// the recurrence. Source: Abramowitz & Stegun (1964), 25.4.29.
func legendre(n int) (x, weight []float64) {
	for i := range n {
		z, slope := math.Cos(math.Pi*(float64(n-i)-0.25)/(float64(n)+0.5)), 0.0
		for range 8 { // from this start three rounds reach the last digit
			p, before := z, 1.0
			for k := 2; k <= n; k++ {
				p, before = (float64(2*k-1)*z*p-float64(k-1)*before)/float64(k), p
			}
			slope = float64(n) * (z*p - before) / (z*z - 1)
			z -= p / slope
		}
		x, weight = append(x, z), append(weight, 2/((1-z*z)*slope*slope))
	}
	return x, weight
}

// basis returns the polynomials of the Gauss points at x, and their integrals from -1 to x,
// by way of Legendre's polynomials P:
//
//	l_j(x) = w_j sum_n (n + 1/2) P_n(x_j) P_n(x),  int P_n = (P_n+1 - P_n-1)/(2n + 1)
func basis(r rule, x float64) (value, left [order]float64) {
	at := polynomials(x)
	for j, xj := range r.x {
		own := polynomials(xj)
		value[j], left[j] = r.weight[j]/2, r.weight[j]/2*(x+1)
		for n := 1; n < order; n++ {
			value[j] += r.weight[j] * (float64(n) + 0.5) * own[n] * at[n]
			left[j] += r.weight[j] / 2 * own[n] * (at[n+1] - at[n-1])
		}
	}
	return value, left
}

func polynomials(x float64) (p [order + 1]float64) {
	p[0], p[1] = 1, x
	for n := 2; n <= order; n++ {
		p[n] = (float64(2*n-1)*x*p[n-1] - float64(n-1)*p[n-2]) / float64(n)
	}
	return p
}

// panel is a piece of the saturation axis in the coordinate eta = ln(u/(1-u)), where
// u = (S - Si)/(S0 - Si): both ends lie at infinity, and a power of the distance from either
// is an exponential. On it live, at the Gauss points,
//
//	w  = -F" dS/deta (du/deta), so that F' = P = int w from the right
//	gap = F - R f, from F - R f(Si) = u P + Q, Q = int u w from the left
//
// with F' and F" by u. Both integrals have positive terms only: F keeps its digits at the
// dry end and F' at the wet one.
type panel struct {
	low, high   float64        // eta
	u           [order]float64 // distance from Si over the width
	source      [order]float64 // D du/deta over its scale
	rise        [order]float64 // f(S) - f(Si)
	w, gap      [order]float64
	right, left float64 // P at the right edge, Q at the left edge
}

// half is half the length in eta.
func (p *panel) half() float64 { return (p.high - p.low) / 2 }

// place maps x in [-1, 1] to eta.
func (p *panel) place(x float64) float64 { return p.low + (p.high-p.low)*(x+1)/2 }

// coordinates gives u and 1-u of eta, each with all its digits.
func coordinates(eta float64) (u, rest float64) {
	if eta < 0 {
		e := math.Exp(eta)
		return e / (1 + e), 1 / (1 + e)
	}
	e := math.Exp(-eta)
	return 1 / (1 + e), e / (1 + e)
}

// state returns P and Q where the polynomials have the given integrals from the left.
func (p *panel) state(left *[order]float64) (prime, q float64) {
	h := p.half()
	prime, q = p.right, p.left
	for j, w := range p.w {
		prime += h * (gauss.weight[j] - left[j]) * w
		q += h * left[j] * p.u[j] * w
	}
	return prime, q
}

// sum adds the panel to both integrals: P over it from the right, Q from the left.
func (p *panel) sum() (prime, q float64) {
	h := p.half()
	for j, w := range p.w {
		prime += h * gauss.weight[j] * w
		q += h * gauss.weight[j] * p.u[j] * w
	}
	return prime, q
}
