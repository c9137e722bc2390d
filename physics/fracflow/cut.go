package fracflow

// SurfaceCut is the water cut at surface of a stream whose water cut is f at
// reservoir conditions:
//
//	1/(1 + (Bw/Bo)(1/f - 1)) = (f/Bw)/(f/Bw + (1-f)/Bo)
//
// bw and bo are the formation volume factors (reservoir over surface volume),
// both > 0. Exact at f = 0 and f = 1. Meant for 0 <= f <= 1: outside it one phase
// flows back and "cut" has lost its meaning.
//
// Source: Dake (1978), ch. 10, water cut at surface.
func SurfaceCut(f, bw, bo float64) float64 {
	return f * bo / (f*bo + (1-f)*bw)
}

// ReservoirCut is the inverse of SurfaceCut: the water cut at reservoir conditions
// of a stream whose water cut at surface is cut.
func ReservoirCut(cut, bw, bo float64) float64 {
	return cut * bw / (cut*bw + (1-cut)*bo)
}
