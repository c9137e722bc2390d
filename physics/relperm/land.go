package relperm

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

// Trapped is Sgr for a saturation 0 <= sgi <= 1 - swc before the wetting phase came back.
func (l Land) Trapped(sgi float64) float64 {
	return 1 / (1/sgi + l.C/(1-l.Swc))
}
