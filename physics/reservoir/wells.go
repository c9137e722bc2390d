package reservoir

import "math"

// EndResistance is what converging flow and skin add at one end of a block of length L and
// width W, in units of the block's own geometric resistance L/(k W h):
//
//	W (ln(W/(2 pi rw)) + s)/(pi L)
//
// The well stands in the end face, halfway along the width; by mirror images it is one
// of a row of wells W apart that each serve the blocks on both sides, and s is the skin of
// such a well. Radius 0 leaves the converging flow out.
//
// Valid for rw << W. Source: Muskat (1937), line drives: ln(a/(2 pi rw)) a well.
func EndResistance(length, width, radius, skin float64) float64 {
	sum := skin
	if radius > 0 {
		sum += math.Log(width / (2 * math.Pi * radius))
	}
	return width * sum / (math.Pi * length)
}
