package pattern

import (
	"fmt"
	"math"
	"math/cmplx"

	"brinefront/physics/numeric"
)

// Kind is an arrangement of wells around a hub: the one well of the pattern that is not
// shared. Normally the hub injects (an inverted seven- or nine-spot); see Geometry.Reversed
// for the pattern whose hub produces.
//
// Lengths are in units of d:
//
//	FiveSpot   d from the hub to each of 4 wells; area 2 d². The staggered drive with its rows at half the well spacing
//	Direct     d between rows of unlike wells, a between the wells of a row, opposite each other; area 2 a d
//	Staggered  the same with the rows shifted by a/2
//	SevenSpot  d from the hub to each of 6 wells; area (3/2) sqrt(3) d²
//	NineSpot   d from the hub to the side wells; the corner wells are sqrt(2) d away; area 4 d²
//
//	Radial     d the outer radius, held at one pressure all round; area pi d²
//
// In the nine-spot the corner and the side wells may take different rates.
type Kind string

const (
	FiveSpot  Kind = "five-spot"
	Direct    Kind = "direct"
	Staggered Kind = "staggered"
	SevenSpot Kind = "seven-spot"
	NineSpot  Kind = "nine-spot"
	Radial    Kind = "radial"
)

// The range of Shape.Ratio.
const (
	LeastRatio = 0.25
	MostRatio  = 10
)

// Shape is a kind of pattern with what it leaves open.
type Shape struct {
	Kind Kind
	// Ratio is d/a of a line drive, or the rate of a corner well over that of a side
	// well of a nine-spot; LeastRatio to MostRatio. The others have none.
	Ratio float64
}

// InputError is a shape or a division that cannot be used.
type InputError struct {
	Name    string
	Value   float64
	Allowed string
}

func (e *InputError) Error() string {
	return fmt.Sprintf("pattern: %s is %.6g; it must be %s", e.Name, e.Value, e.Allowed)
}

// sector is a range of departure angles between streamlines that part, all of whose flow
// goes to one well.
type sector struct {
	from, to float64 // angles of departure from the hub
	outlet   int     // index of the well
	stops    []stop  // where the flow stands still, on its edges
}

// stop is a stagnation point in the plane of W: potential and stream function.
type stop struct{ phi, psi float64 }

// element is the part of a pattern whose mirror images make the whole.
type element struct {
	*lattice
	sectors []sector
	area    float64 // of the whole pattern
	near    float64 // a distance from the wells at which flow is radial but for its square
	outline []complex128
}

// rowAngle is the angle between the two mirror lines of a line drive.
const rowAngle = math.Pi / 2

func (s Shape) element() (element, error) {
	switch s.Kind {
	case FiveSpot: // as a staggered drive, turned by 45 degrees: rows 1/sqrt(2) apart
		return drive(math.Sqrt2, math.Sqrt2/2, true), nil
	case SevenSpot:
		return sevenSpot(), nil
	}
	if !(s.Ratio >= LeastRatio && s.Ratio <= MostRatio) {
		return element{}, &InputError{"the ratio", s.Ratio, fmt.Sprintf("between %g and %d", LeastRatio, MostRatio)}
	}
	switch s.Kind {
	case Direct, Staggered:
		return drive(1/s.Ratio, 1, s.Kind == Staggered), nil
	case NineSpot:
		return nineSpot(s.Ratio), nil
	}
	return element{}, &InputError{"the kind", 0, "one of those named"}
}

// cell makes an element of periods and wells, without its sectors.
func cell(one, two complex128, wells []well, area float64, outline []complex128) element {
	return element{lattice: newLattice(one, two, wells), area: area, outline: outline, near: 1e-3 * math.Min(cmplx.Abs(one), cmplx.Abs(two))}
}

func (e *element) stop(at complex128, psi float64) stop { return stop{e.potential(at), psi} }

func drive(a, d float64, shifted bool) element {
	side, ahead := complex(a/2, 0), complex(0, d)
	outlet := ahead
	if shifted {
		outlet += side
	}
	e := cell(complex(a, 0), 2*ahead, []well{{0, 1}, {outlet, -1}}, 2*a*d, []complex128{0, side, side + ahead, ahead})
	stops := []stop{e.stop(side, 0)}
	if shifted {
		stops = append(stops, e.stop(ahead, rowAngle))
	} else {
		stops = append(stops, e.stop(side+ahead, 0))
	}
	e.sectors = []sector{{0, rowAngle, 1, stops}}
	return e
}

func sevenSpot() element {
	const angle = math.Pi / 6
	one := cmplx.Rect(math.Sqrt(3), angle)
	e := cell(one, cmplx.Conj(one), []well{{0, 1}, {1, -0.5}, {-1, -0.5}}, 1.5*math.Sqrt(3), []complex128{0, 1, one / 2})
	e.sectors = []sector{{0, angle, 1, []stop{e.stop(one/2, angle)}}}
	return e
}

func nineSpot(ratio float64) element {
	const angle = math.Pi / 4
	side := 1 / (2 + ratio)
	e := cell(2, 2i, []well{{0, 1}, {1, -side}, {1i, -side}, {1 + 1i, -ratio * side}}, 4, []complex128{0, 1, 1 + 1i})
	// Between two neighbours of the rim the flow along it turns.
	along := func(y float64) float64 { return imag(e.velocity(complex(1, y))) }
	const edge = 1e-6
	part := angle * 2 * side
	turn := numeric.Zero(along, edge, 1-edge, along(edge), along(1-edge))
	stops := []stop{e.stop(complex(1, turn), part)}
	e.sectors = []sector{{0, part, 1, stops}, {part, angle, 3, stops}}
	return e
}
