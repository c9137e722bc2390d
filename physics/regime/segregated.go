package regime

import (
	"errors"
	"math"
)

// Segregated is the unstable segregated displacement: the displacing phase runs
// along the bottom (or top) of a layer in vertical equilibrium and fills a share b of the
// height. Volumes are in movable pore volumes, those of 1 - swc - sor.
//
//	f(b) = [M b - G b (1 - b)]/[1 + (M - 1) b]
//
// which spreads without a step, so that b at the outlet after W injected obeys
// f'(b) = 1/W:
//
//	b = (M - G - 1/W)/[(D + 1) d], D = sqrt[M (M - 1 - G)/d], d = (M - 1)/W - G
//	recovery = b + (1 - f) W
//
// where D = 1 + (M - 1) b; the form holds at M = 1 too and loses no digits near it.
//
// Source: Dake (1978), ch. 10, segregated flow; f from Darcy's law for each phase, the
// rest from Buckley & Leverett (1942) and Welge (1952).
type Segregated struct{ m, g float64 }

// NewSegregated takes the end-point mobility ratio M and the gravity number G of
// Dip.Gravity. Valid for -1 < G < M - 1; above, the displacement is stable and
// piston-like (Dip.Interface), and at G <= -1 the resident phase flows back past the
// inlet. The error tells what is allowed.
func NewSegregated(m, g float64) (Segregated, error) {
	if !(m > 0) || math.IsInf(m, 1) {
		return Segregated{}, errors.New("mobility ratio " + number(m) + "; allowed above 0")
	}
	if !(g > -1 && g < m-1) {
		return Segregated{}, errors.New("gravity number " + number(g) + "; allowed above −1 and below M − 1, here " + number(m-1))
	}
	return Segregated{m, g}, nil
}

// Breakthrough is the movable volumes injected, and recovered, when the displacing phase
// arrives: 1/(M - G).
func (s Segregated) Breakthrough() float64 { return 1 / (s.m - s.g) }

// Complete is the movable volumes injected when all movable volume is recovered:
// M/(1 + G).
func (s Segregated) Complete() float64 { return s.m / (1 + s.g) }

// Recovery is the movable share recovered after w movable volumes injected, w >= 0.
func (s Segregated) Recovery(w float64) float64 {
	if w <= s.Breakthrough() {
		return w
	}
	if w >= s.Complete() {
		return 1
	}
	d := (s.m-1)/w - s.g
	b := (s.m - s.g - 1/w) / ((math.Sqrt(s.m*(s.m-1-s.g)/d) + 1) * d)
	f := (s.m*b - s.g*b*(1-b)) / (1 + (s.m-1)*b)
	return b + (1-f)*w
}
