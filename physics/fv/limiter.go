package fv

import "math"

// Limiter chooses the scheme: None is first-order upstream; the others are second-order
// MUSCL (van Leer 1979) with the named limiter on the slopes in the cells.
type Limiter string

const (
	// None takes each cell as constant: single-point upstream, forward Euler.
	None Limiter = ""
	// Minmod takes the smaller of the two slopes. Roe (1986).
	Minmod Limiter = "minmod"
	// VanLeer takes the harmonic mean of the two slopes. Van Leer (1974, 1979).
	VanLeer Limiter = "van Leer"
	// Superbee takes the largest slope that Sweby's (1984) region allows. Roe (1986). It
	// turns smooth slopes into steps, and where f has inflections it may keep a jump that
	// ought to spread for longer than the others do.
	Superbee Limiter = "superbee"
)

// limiters give the change of state across a cell from a and b, those from the cell on its
// left and to the cell on its right: zero where they have not the same sign, and at
// most twice the smaller, so that no face leaves the range of its neighbours.
var limiters = map[Limiter]func(a, b float64) float64{
	Minmod: minmod,
	VanLeer: func(a, b float64) float64 {
		if a*b <= 0 {
			return 0
		}
		return 2 * a * b / (a + b)
	},
	Superbee: func(a, b float64) float64 {
		c, d := minmod(2*a, b), minmod(a, 2*b)
		if math.Abs(c) > math.Abs(d) {
			return c
		}
		return d
	},
}

func minmod(a, b float64) float64 {
	switch {
	case a*b <= 0:
		return 0
	case math.Abs(a) < math.Abs(b):
		return a
	}
	return b
}
