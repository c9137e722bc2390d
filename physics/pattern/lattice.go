package pattern

import (
	"math"
	"math/cmplx"
)

// Flow between wells repeated without end.
//
// With the periods o1 and o2 of the plane, tau = o2/o1, and wells of strength q_j at z_j
// in each cell, sum q_j = 0, the complex potential is
//
//	W(z) = sum_j q_j ln theta1(pi (z - z_j)/o1 | tau) + c z,   c = -(2 pi i/o1) sum_j q_j b_j
//
// where b_j is the share of o2 in z_j. theta1 brings its zeros, and c takes away the mean
// pressure gradient that they leave, so that the potential Re W is periodic both ways and
// nothing has to be summed over rows. A source of strength 1 at the origin gives W = ln z
// near it: the stream function Im W is the angle of departure.
//
// The product for theta1 gains at least 2.3 digits a term once o1 and o2 are the shortest
// pair of periods, where Im tau >= sqrt(3)/2.
//
// Sources: Muskat (1937), ch. IX, for well arrays; Whittaker & Watson (1927), ch. XXI, for
// theta functions; Prats (1956) for the staggered line drive.

// well is a source (rate > 0) or a sink of the cell.
type well struct {
	at   complex128
	rate float64
}

// lattice is the flow of a set of wells that is repeated.
type lattice struct {
	wells []well
	scale complex128   // pi/o1
	nomes []complex128 // q^2n, n = 1, 2, ..., to the last digit up to two periods from a well
	root  complex128   // theta1(u)/u at 0, in the norm of theta below
	drift complex128   // c
	home  []complex128 // theta of each well seen from the origin, where the first well is: its root
}

// newLattice takes any pair of periods. The first well is the hub, at the origin.
func newLattice(one, two complex128, wells []well) *lattice {
	one, two = shortest(one, two)
	tau := two / one
	l := &lattice{wells: wells, scale: math.Pi / one, root: 1}
	square := cmplx.Exp(2i * math.Pi * tau)
	for q := square; cmplx.Abs(q) > 0x1p-56*cmplx.Abs(square*square); q *= square {
		l.nomes = append(l.nomes, q)
		l.root *= (1 - q) * (1 - q)
	}
	tilt := 0.0
	for _, w := range wells {
		tilt += w.rate * imag(w.at/one) / imag(tau)
	}
	l.drift = complex(0, -2*tilt) * l.scale
	for _, w := range wells {
		if w.at == 0 {
			l.home = append(l.home, l.root*l.scale)
			continue
		}
		v, _ := l.theta(-w.at)
		l.home = append(l.home, v)
	}
	return l
}

// shortest reduces a pair of periods to the two shortest, turning anticlockwise.
func shortest(a, b complex128) (complex128, complex128) {
	for {
		if cmplx.Abs(a) > cmplx.Abs(b) {
			a, b = b, a
		}
		n := math.Round(real(b / a))
		if n == 0 {
			break
		}
		b -= complex(n, 0) * a
	}
	if imag(b/a) < 0 {
		b = -b
	}
	return a, b
}

// theta is theta1 at z seen from a well, but for a constant factor, and its logarithmic slope.
func (l *lattice) theta(z complex128) (value, slope complex128) {
	u := l.scale * z
	h := cmplx.Exp(1i * u)
	e, back := h*h, 1/(h*h)
	value = (h - 1/h) / 2i
	slope = 1i * (e + 1) / (e - 1)
	sine := (e - back) / 2i
	for _, q := range l.nomes {
		factor := (1 - q*e) * (1 - q*back)
		value *= factor
		slope += 4 * q * sine / factor
	}
	return value, slope * l.scale
}

// velocity is dW/dz.
func (l *lattice) velocity(z complex128) complex128 {
	v := l.drift
	for _, w := range l.wells {
		_, slope := l.theta(z - w.at)
		v += complex(w.rate, 0) * slope
	}
	return v
}

// potential is Re W, zero at distance 1 from the hub as if the hub were alone:
// W - ln z tends to 0 there.
func (l *lattice) potential(z complex128) float64 {
	sum := real(l.drift * z)
	for i, w := range l.wells {
		v, _ := l.theta(z - w.at)
		sum += w.rate * math.Log(cmplx.Abs(v/l.home[i]))
	}
	return sum
}

// offset is what the potential at a well other than the hub tends to, less rate ln r with
// r the distance from that well.
func (l *lattice) offset(k int) float64 {
	at := l.wells[k].at
	sum := real(l.drift * at)
	for i, w := range l.wells {
		v := l.root * l.scale
		if i != k {
			v, _ = l.theta(at - w.at)
		}
		sum += w.rate * math.Log(cmplx.Abs(v/l.home[i]))
	}
	return sum
}

// walker stands at a point z of a streamline, where W = w.
type walker struct {
	l     *lattice
	z, w  complex128
	slope complex128 // dz/dW
	// A place nearby at which W and theta of each well are known to the last digit, so that
	// the ends of Newton's steps leave no error behind that could add up.
	known, there  complex128
	values, fresh []complex128
	before, last  complex128 // dz/dW one step earlier, and how long that step was
}

// start puts a walker next to the hub, where W = w and z is nearly exp(w).
func (l *lattice) start(w complex128) *walker {
	s := &walker{l: l, values: make([]complex128, len(l.wells)), fresh: make([]complex128, len(l.wells))}
	z := cmplx.Exp(w)
	copy(s.values, l.home)
	s.values[0] *= z // what W - ln z adds to this is still to come, from z = 0
	s.known = w
	s.seek(w, z)
	return s
}

// step goes on along the streamline, or across, to where W = w, a little further.
func (s *walker) step(w complex128) {
	d := w - s.w
	guess := s.z + d*s.slope
	if s.last != 0 {
		guess += d * d / (2 * s.last) * (s.slope - s.before)
	}
	s.before, s.last = s.slope, d
	s.seek(w, guess)
}

// seek finds W(z) = w by Newton's steps. The branch of the logarithms follows from the
// place left behind, which must be near.
func (s *walker) seek(w, guess complex128) {
	const close = 1e-10 // the step after would be the square of this one
	z := guess
	for range 12 {
		got, velocity := s.known+s.l.drift*(z-s.there), s.l.drift
		for i, well := range s.l.wells {
			value, slope := s.l.theta(z - well.at)
			rate := complex(well.rate, 0)
			got += rate * cmplx.Log(value/s.values[i])
			velocity += rate * slope
			s.fresh[i] = value
		}
		s.known, s.there = got, z
		s.values, s.fresh = s.fresh, s.values
		s.slope = 1 / velocity
		correction := (w - got) * s.slope
		z += correction
		if cmplx.Abs(correction) <= close*cmplx.Abs(s.slope) {
			break
		}
	}
	s.z, s.w = z, w
}

// thinness is the area of a streamtube per unit of potential and of stream function, 1/|dW/dz|^2.
func (s *walker) thinness() float64 {
	return real(s.slope)*real(s.slope) + imag(s.slope)*imag(s.slope)
}
