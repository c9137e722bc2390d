package pattern

import (
	"math"
	"math/cmplx"
)

// How areas are measured along a streamline.
//
// A thin streamtube of stream function dpsi holds the area dpsi int dphi/|W'|² between two
// potentials. The walker stands exactly on the streamline at any potential, so that the
// integral is taken by Gauss-Legendre panels between fixed levels; its integrand has a pole
// of order one in the plane of W where the flow stands still, and panels are halved until
// none is longer than five eighths of the distance to the nearest. Next to the wells the flow is radial,
// 1/|W'|² = r²/rate², and the part inside is r²/(2 rate²) and its like.

// abscissae and weights of the five-point Gauss-Legendre rule: Abramowitz & Stegun
// (1964), table 25.4.
var gaussX = [5]float64{-0.906179845938663993, -0.538469310105683091, 0, 0.538469310105683091, 0.906179845938663993}
var gaussW = [5]float64{0.236926885056189088, 0.478628670499366468, 0.568888888888888889, 0.478628670499366468, 0.236926885056189088}

// station is what is known of a streamline where it meets a level of the potential.
type station struct {
	area  float64 // swept so far, per unit of stream function, from the hub's centre
	slope float64 // 1/|W'|²
	at    complex128
}

// levels are the potentials of a sector's stations, evenly spaced: from the distance near
// around the hub to the same around the outlet.
func (e *element) levels(s sector, most float64) []float64 {
	low := math.Log(e.near)
	high := e.offset(s.outlet) + e.wells[s.outlet].rate*low
	n := int(math.Ceil((high - low) / most))
	list := make([]float64, n+1)
	for i := range list {
		list[i] = low + (high-low)*float64(i)/float64(n)
	}
	return list
}

// trace follows the streamline of departure angle psi through the levels. stations is
// filled when it is not nil. The area of the whole streamline is returned.
func (e *element) trace(s sector, psi float64, levels []float64, stations []station) float64 {
	at := func(phi float64) complex128 { return complex(phi, psi) }
	w := e.start(at(levels[0]))
	thin := w.thinness()
	area := thin / 2
	put := func(k int) {
		if stations != nil {
			stations[k] = station{area, thin, w.z}
		}
	}
	put(0)
	for k, end := range levels[1:] {
		for from := levels[k]; from < end; {
			to := end
			for 1.6*(to-from) > s.distance(from, to, psi) {
				to = from + (to-from)/2
			}
			half, middle := (to-from)/2, (to+from)/2
			for i, x := range gaussX {
				w.step(at(middle + half*x))
				area += gaussW[i] * half * w.thinness()
			}
			from = to
		}
		w.step(at(end))
		thin = w.thinness()
		put(k + 1)
	}
	return area - e.wells[s.outlet].rate*thin/2
}

// distance is that from the middle of a panel to the nearest place where the flow stands still.
func (s sector) distance(from, to, psi float64) float64 {
	nearest := math.Inf(1)
	for _, p := range s.stops {
		nearest = math.Min(nearest, cmplx.Abs(complex((from+to)/2-p.phi, psi-p.psi)))
	}
	return nearest
}
