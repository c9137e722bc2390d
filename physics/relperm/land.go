package relperm

import "fmt"

// Land is how much of a non-wetting phase stays trapped when the wetting phase comes
// back.
//
//	1/Sgr* - 1/Sgi* = C, S* = S/(1 - swc)
//
// Sgi is the non-wetting saturation before and Sgr the one that stays. Normalising by
// 1 - swc is part of the law: C from saturations of the whole pore space is another
// number. Valid for C >= 0 and 0 <= swc < 1.
//
// Special cases are: C = 0 traps everything, C = +Inf nothing; Sgi = 0 leaves nothing
// to trap; however much there was, no more than (1 - swc)/C is trapped.
//
// Source: Land (1968). C of 1 to 3 covers most sandstones; common practice, no
// source.
type Land struct{ C, Swc float64 }

// LandThrough is the law through one measured pair: sgi before, sgr after. The error
// tells which saturation is not possible.
func LandThrough(sgi, sgr, swc float64) (Land, error) {
	switch {
	case !(swc >= 0 && swc < 1):
		return Land{}, fmt.Errorf("connate water saturation %g; allowed 0 to below 1", swc)
	case !(sgi > 0 && sgi <= 1-swc):
		return Land{}, fmt.Errorf("saturation before trapping %g; allowed above 0 to %g, the pore space without connate water", sgi, 1-swc)
	case !(sgr >= 0 && sgr <= sgi):
		return Land{}, fmt.Errorf("trapped saturation %g; allowed 0 to %g, the saturation before", sgr, sgi)
	}
	return Land{C: (1 - swc) * (1/sgr - 1/sgi), Swc: swc}, nil
}

// Trapped is Sgr for a saturation 0 <= sgi <= 1 - swc before the wetting phase came back.
func (l Land) Trapped(sgi float64) float64 {
	return 1 / (1/sgi + l.C/(1-l.Swc))
}
