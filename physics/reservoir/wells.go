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

// Radial is the shape of a body between two concentric cylinders, rw and re, flooded from
// the inner one outwards: with v = (r^2 - rw^2)/(re^2 - rw^2) and G = ln(r/rw)/ln(re/rw),
// cut into pieces that are equally wide in ln r. Its Impedance is ln(re/rw)/(2 pi k h).
func Radial(rw, re float64, pieces int) Shape {
	s := Shape{V: make([]float64, pieces+1), G: make([]float64, pieces+1)}
	for i := range s.V {
		s.G[i] = float64(i) / float64(pieces)
		r := rw * math.Pow(re/rw, s.G[i])
		s.V[i] = (r*r - rw*rw) / (re*re - rw*rw)
	}
	s.V[pieces] = 1
	return s
}
