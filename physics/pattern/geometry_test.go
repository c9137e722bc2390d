package pattern

import (
	"math"
	"math/cmplx"
	"math/rand/v2"
	"slices"
	"testing"
)

func made(t *testing.T, shape Shape, n int) *Geometry {
	t.Helper()
	g, err := New(shape, n)
	if err != nil {
		t.Fatal(err)
	}
	return g
}

// shapes are all kinds, at the ends of their ranges and inside.
var shapes = []Shape{
	{FiveSpot, 0}, {SevenSpot, 0}, {Direct, 0.5}, {Direct, 1}, {Direct, 3.7}, {Direct, 10}, {Staggered, 0.25}, {Staggered, 1.3}, {Staggered, 10},
	{NineSpot, 0.25}, {NineSpot, 1}, {NineSpot, 10}, {Radial, 0},
}

// Areas and flows of all tubes are the pattern's, whatever their number. The tolerance of
// the area is what the logarithm in the outer tubes leaves, seen at 1.2e-4 of four tubes and
// less in proportion.
func TestTubesFillThePattern(t *testing.T) {
	for _, shape := range shapes {
		for _, n := range []int{4, 13, 40} {
			g := made(t, shape, n)
			area, flow := 0.0, 0.0
			for _, tube := range g.Tubes {
				area, flow = area+tube.Area, flow+tube.Flow
				if !slices.IsSorted(tube.V) || tube.V[0] != 0 || tube.V[len(tube.V)-1] != 1 || tube.G[len(tube.G)-1] != 1 {
					t.Errorf("%v: the shares of a tube do not rise from 0 to 1: %v", shape, tube.V)
				}
			}
			near(t, "flow", flow, 1, 1e-14)
			near(t, "area", area, 1, 6e-4/float64(n))
		}
	}
}

// At d/a of 0.25 nearly all of the ground lies where flow is exponentially weak, beside
// the short way between the rows; the areas still add up to a part in a thousand.
func TestTubesOfWideRows(t *testing.T) {
	area := 0.0
	for _, tube := range made(t, Shape{Direct, LeastRatio}, 40).Tubes {
		area += tube.Area
	}
	near(t, "area", area, 1, 1e-3)
}

// Stations double in number, and shares do not change beyond the error of the rule.
func TestTubesConverge(t *testing.T) {
	e, err := Shape{Staggered, 0.8}.element()
	if err != nil {
		t.Fatal(err)
	}
	s := e.sectors[0]
	n := 40
	coarse := e.levels(s, span)
	fine := make([]float64, 0, 2*len(coarse))
	for i, x := range coarse {
		if i > 0 {
			fine = append(fine, (x+coarse[i-1])/2)
		}
		fine = append(fine, x)
	}
	for k := range n {
		width := (s.to - s.from) / float64(n)
		a, b := e.tube(s, coarse, float64(k)*width, width), e.tube(s, fine, float64(k)*width, width)
		near(t, "area", a.Area, b.Area, 1e-8)
		for i := range a.V {
			near(t, "share", a.V[i], b.V[2*i], 1e-7)
		}
	}
}

// Mirror lines of a pattern that the tubes do not use: a five-spot is the same seen from
// its producer; a staggered drive turned by a quarter is one with d/a four times less over
// its own square; a five-spot is a staggered drive with its rows half a spacing apart.
func TestMirrors(t *testing.T) {
	five, drive := made(t, Shape{FiveSpot, 0}, 20), made(t, Shape{Staggered, 0.5}, 20)
	turned, other := made(t, Shape{Staggered, 0.4}, 20), made(t, Shape{Staggered, 1 / (4 * 0.4)}, 20)
	for i, tube := range five.Tubes {
		opposite := five.Tubes[19-i]
		near(t, "area of the opposite tube", opposite.Area, tube.Area, 1e-9)
		near(t, "area as a staggered drive", drive.Tubes[i].Area, tube.Area, 1e-12)
		near(t, "area turned by a quarter", other.Tubes[19-i].Area, turned.Tubes[i].Area, 1e-9)
		n := len(tube.V) - 1
		for k := range tube.V {
			near(t, "share from the producer", 1-tube.V[n-k], tube.V[k], 1e-6)
		}
	}
	twice := five.Reverse().Reverse()
	for i := range five.Tubes {
		for k, v := range five.Tubes[i].V {
			near(t, "share, turned round twice", twice.Tubes[i].V[k], v, 1e-15)
		}
	}
}

// Far apart, rows of wells are lines: all tubes hold the same area, and area and resistance
// go together as in a linear body, but for what converging flow takes within a distance of
// about a from either row.
func TestFarRowsAreLinear(t *testing.T) {
	g := made(t, Shape{Direct, 10}, 20)
	for _, tube := range g.Tubes[1:] {
		near(t, "area over flow", tube.Area/tube.Flow, 1, 0.1)
	}
	middle := g.Tubes[10]
	slope := func(a, b int) float64 { return (middle.V[b] - middle.V[a]) / (middle.G[b] - middle.G[a]) }
	n := len(middle.V)
	near(t, "area per resistance halfway, over a little before it", slope(n/2, n/2+5)/slope(n/3, n/3+5), 1, 1e-6)
}

// The middle streamline of a tube begins at one well and ends at the other, and the front
// goes along it: the same part of the area swept from one end as is left from the other.
func TestFrontsMoveAlongTubes(t *testing.T) {
	r := rand.New(rand.NewPCG(5, 9))
	for _, shape := range shapes {
		g := made(t, shape, 7)
		back := g.Reverse()
		for i, tube := range g.Tubes {
			if at := g.Front(tube, 0); cmplx.Abs(at) > 0.01 {
				t.Errorf("%v: a front starts at %v", shape, at)
			}
			end := g.Front(tube, 1)
			close := shape.Kind == Radial
			for _, w := range g.Wells[1:] {
				close = close || cmplx.Abs(end-w) < 0.01
			}
			if !close {
				t.Errorf("%v: a front ends at %v", shape, end)
			}
			v := r.Float64()
			near(t, "front from the other end", cmplx.Abs(back.Front(back.Tubes[i], 1-v)-g.Front(tube, v)), 0, 1e-9)
			for k, share := range tube.V {
				near(t, "front at a station", cmplx.Abs(g.Front(tube, share)-tube.Line[k]), 0, 1e-9)
			}
		}
	}
}

func TestRefusals(t *testing.T) {
	for _, c := range []struct {
		shape Shape
		n     int
	}{{Shape{Direct, 0.2}, 20}, {Shape{NineSpot, 11}, 20}, {Shape{Staggered, math.NaN()}, 20}, {Shape{"six-spot", 1}, 20}, {Shape{FiveSpot, 0}, 3}, {Shape{FiveSpot, 0}, 101}} {
		if _, err := New(c.shape, c.n); err == nil {
			t.Errorf("%v in %d tubes: accepted", c.shape, c.n)
		} else if _, ok := err.(*InputError); !ok {
			t.Errorf("%v: %T", c.shape, err)
		}
	}
}

func BenchmarkNew(b *testing.B) {
	for b.Loop() {
		New(Shape{FiveSpot, 0}, 40)
	}
}
