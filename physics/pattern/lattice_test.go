package pattern

import (
	"math"
	"math/cmplx"
	"math/rand/v2"
	"testing"
)

func near(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance) {
		t.Errorf("%s = %.15g, want %.15g: off by %.2g, allowed %.2g", what, got, want, got-want, tolerance)
	}
}

// drawn is a lattice of random periods with wells that balance, and that are their own
// mirror images through the hub, as in every pattern.
func drawn(r *rand.Rand) (*lattice, complex128, complex128) {
	one := cmplx.Rect(0.5+r.Float64(), 6*r.Float64())
	two := one * complex(2*r.Float64()-1, 0.4+2*r.Float64())
	share := r.Float64()
	return newLattice(one, two, []well{{0, 1}, {one / 2, -share}, {(one + two) / 2, share - 1}}), one, two
}

// A flow between repeated wells repeats itself: velocity and potential both ways, for any
// choice of the two periods. The potential's slope is the velocity, what leaves the hub is
// 2 pi, and by symmetry the flow on the two sides of the hub is opposite.
func TestLatticeRepeats(t *testing.T) {
	r := rand.New(rand.NewPCG(21, 1))
	for range 200 {
		l, one, two := drawn(r)
		z := (complex(0.1+0.8*r.Float64(), 0)*one + complex(0.1+0.3*r.Float64(), 0)*two)
		v := l.velocity(z)
		size := 1e-11 * (1 + cmplx.Abs(v))
		for _, shift := range []complex128{one, -two, two - one} {
			near(t, "velocity a period on", cmplx.Abs(l.velocity(z+shift)-v), 0, size)
			near(t, "potential a period on", l.potential(z+shift), l.potential(z), 1e-11)
		}
		near(t, "velocity through the hub", cmplx.Abs(l.velocity(-z)+v), 0, size)
		const h = 1e-5
		slope := complex(l.potential(z+h)-l.potential(z-h), -(l.potential(z+h*1i) - l.potential(z-h*1i)))
		if cmplx.Abs(v) < 10 { // where a difference is good enough
			near(t, "slope of the potential", cmplx.Abs(slope/(2*h)-v), 0, 1e-6)
		}
		// The trapezoidal rule around a circle is exact to rounding.
		flux := complex128(0)
		for k := range 64 {
			at := cmplx.Rect(0.05, 2*math.Pi*float64(k)/64)
			flux += l.velocity(at) * at * 2 * math.Pi / 64
		}
		near(t, "flow of the hub", real(flux), 2*math.Pi, 1e-12)
	}
}

// What the wells are chosen to stand for and how the periods are chosen changes nothing.
func TestLatticeChoice(t *testing.T) {
	wells := []well{{0, 1}, {0.5 + 1i, -1}}
	z := 0.17 + 0.31i
	want := newLattice(1, 2i, wells)
	for _, other := range []*lattice{
		newLattice(1+2i, 3+4i, wells), newLattice(2i, -1, wells),
		newLattice(1, 2i, []well{{0, 1}, {-0.5 + 3i, -1}}),
	} {
		near(t, "velocity", cmplx.Abs(other.velocity(z)-want.velocity(z)), 0, 1e-12)
		near(t, "potential", other.potential(z), want.potential(z), 1e-12)
		near(t, "offset", other.offset(1), want.offset(1), 1e-12)
	}
}

// The potential comes from far rows in closed form: a row of sources of spacing a on the
// axis and one of sinks at distance d, both repeated at 2d, sum to ln|sin| of each row. A
// sum over many rows, cut off symmetrically, is another way to the same number.
func TestLatticeAgainstRows(t *testing.T) {
	l := newLattice(1, 2i, []well{{0, 1}, {1i, -1}})
	rows := func(z complex128) complex128 {
		v := complex128(0)
		for n := -40; n <= 40; n++ {
			part := complex(0, float64(n))
			sign := complex(math.Pi*math.Pow(-1, float64(n)), 0)
			if n == -40 || n == 40 {
				sign /= 2
			}
			v += sign / cmplx.Tan(math.Pi*(z-part))
		}
		return v
	}
	for _, z := range []complex128{0.1 + 0.2i, 0.5 + 0.5i, 0.31 + 0.93i} {
		near(t, "velocity", cmplx.Abs(l.velocity(z)-rows(z)), 0, 1e-12)
	}
}
