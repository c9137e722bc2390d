package ride

import (
	"math"
	"testing"

	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

// mixture is the flow of a mixture of both fluids that holds the part c of what rides along.
type mixture func(c, s float64) float64

// thickened mixes the viscosities of two waters (and oils) by their logarithms.
func thickened(curves relperm.Curves, ahead, behind fracflow.Flow) mixture {
	return func(c, s float64) float64 {
		between := func(a, b float64) float64 { return math.Exp((1-c)*math.Log(a) + c*math.Log(b)) }
		f, _ := fracflow.Flow{Curves: curves, MuW: between(ahead.MuW, behind.MuW), MuO: between(ahead.MuO, behind.MuO)}.At(s)
		return f
	}
}

// blended mixes the mobilities of two flows in proportion.
func blended(ahead, behind fracflow.Flow) mixture {
	return func(c, s float64) float64 {
		fa, _, la, _ := ahead.Full(s)
		fb, _, lb, _ := behind.Full(s)
		return ((1-c)*fa*la + c*fb*lb) / ((1-c)*la + c*lb)
	}
}

// grid steps both balances by explicit upstream finite volumes of first order: a scheme
// that knows nothing of tangents. f must not fall with s.
type grid struct {
	flow         mixture
	front, rear  Pivot // their difference is kept by the rock for good, in proportion to the largest c yet
	s, c, caught []float64
	q            float64
	water        float64 // produced
}

func newGrid(flow mixture, front, rear Pivot, cells int, initial float64) *grid {
	g := &grid{flow: flow, front: front, rear: rear, s: make([]float64, cells), c: make([]float64, cells), caught: make([]float64, cells)}
	for i := range g.s {
		g.s[i] = initial
	}
	return g
}

// run injects water of composition c and fractional flow f until q, in steps that
// keep the fastest wave, of the given speed, within 0.9 of a cell.
func (g *grid) run(until, c, f, fastest float64) {
	n := float64(len(g.s))
	steps := math.Ceil((until - g.q) * n * fastest / 0.9)
	ratio := (until - g.q) / steps * n
	kept := g.front.B - g.rear.B
	for range int(steps) {
		inflow, carried := f, c*(f+g.front.A)
		for i, s := range g.s {
			flow := g.flow(g.c[i], s)
			out := g.c[i] * (flow + g.front.A)
			mass := (s+g.rear.B)*g.c[i] + g.caught[i] + ratio*(carried-out)
			g.s[i] = s + ratio*(inflow-flow)
			g.c[i] = (mass - g.caught[i]) / (g.s[i] + g.rear.B)
			if kept*g.c[i] > g.caught[i] {
				g.c[i] = mass / (g.s[i] + g.front.B)
				g.caught[i] = kept * g.c[i]
			}
			inflow, carried = flow, out
		}
		g.water += inflow * ratio / n
	}
	g.q = until
}

func (g *grid) mean() (sum float64) {
	for _, s := range g.s {
		sum += s / float64(len(g.s))
	}
	return sum
}

// distance is the mean of |s - exact| over the cells, exact at 20 places in each.
func (g *grid) distance(exact func(x float64) float64) (sum float64) {
	n := len(g.s)
	for i, s := range g.s {
		mean := 0.0
		for j := range 20 {
			mean += exact((float64(i)+(float64(j)+0.5)/20)/float64(n)) / 20
		}
		sum += math.Abs(s-mean) / float64(n)
	}
	return sum
}

// family is a flood with the mixture that a scheme needs.
type family struct {
	name              string
	ahead, behind     fracflow.Flow
	mix               mixture
	pivot             Pivot
	injected, initial float64
}

// Invented rocks and fluids, one a family.
func families(t testing.TB) []family {
	rock := relperm.Corey{Swc: 0.2, Sor: 0.23, Krw0: 0.35, Kro0: 0.85, Nw: 2.4, No: 2.2}
	salty := relperm.Corey{Swc: 0.15, Sor: 0.28, Krw0: 0.45, Kro0: 0.85, Nw: 2.2, No: 2.8}
	fresh := relperm.Corey{Swc: 0.15, Sor: 0.19, Krw0: 0.30, Kro0: 0.87, Nw: 2.9, No: 2.3}
	flow := func(c relperm.Corey, muw, muo float64) fracflow.Flow {
		return fracflow.Flow{Curves: c, MuW: muw, MuO: muo}
	}
	heat, err := Heat{Porosity: 0.25, Grains: 2.2e6, Water: 4.1e6, Oil: 1.7e6}.Pivot()
	if err != nil {
		t.Fatal(err)
	}
	brine := flow(rock, 0.5e-3, 20e-3)
	polymer := flow(rock, 8e-3, 20e-3)
	cold, hot := flow(rock, 0.6e-3, 60e-3), flow(rock, 0.3e-3, 9e-3)
	high, low := flow(salty, 0.5e-3, 4e-3), flow(fresh, 0.5e-3, 4e-3)
	thin := flow(rock, 0.2e-3, 20e-3)
	return []family{
		{"polymer", brine, polymer, thickened(rock, brine, polymer), Pivot{B: 0.12}, 0.77, 0.2},
		{"polymer after water", brine, polymer, thickened(rock, brine, polymer), Pivot{B: 0.12}, 0.77, 0.62},
		{"polymer after much water", brine, polymer, thickened(rock, brine, polymer), Pivot{B: 0.12}, 0.77, 0.715},
		{"polymer kept out of pores", brine, polymer, thickened(rock, brine, polymer), Pivot{B: -0.08}, 0.77, 0.2},
		{"hot water", cold, hot, thickened(rock, cold, hot), heat, 0.77, 0.2},
		{"cold water", hot, cold, thickened(rock, hot, cold), heat, 0.77, 0.2},
		{"low salinity", high, low, blended(high, low), Pivot{B: 0.05}, 0.81, 0.15},
		{"high salinity", low, high, blended(low, high), Pivot{B: 0.05}, 0.72, 0.15},
		{"thinner water", brine, thin, thickened(rock, brine, thin), Pivot{}, 0.77, 0.3},
		{"tracer", brine, brine, thickened(rock, brine, brine), Pivot{B: 0.1}, 0.77, 0.3},
	}
}

func named(t testing.TB, name string) family {
	for _, c := range families(t) {
		if c.name == name {
			return c
		}
	}
	t.Fatalf("no family %s", name)
	return family{}
}

// fastest is the largest speed of waves of either flow and of the front.
func (c family) fastest() float64 {
	most := 0.0
	for _, fn := range []fracflow.Flow{c.ahead, c.behind} {
		lo, hi := fn.Ends()
		for i := range 401 {
			s := lo + (hi-lo)*float64(i)/400
			f, v := fn.At(s)
			most = math.Max(most, math.Max(v, c.pivot.speed(s, f, v)))
		}
	}
	return 1.02 * most // mixtures, and what lies between the samples
}

// Every family against the scheme on 50, 100 and 200 cells. The front is a contact, which
// the scheme smears over the square root of the cell size, so that the distance between
// the profiles falls by 1.41 a halving in the limit. So does the error of the mean saturation
// after the front has left, where it left a constant state behind; where it touches f2 the
// speeds beside it are its own, nothing is left, and the error falls at first order, by 2.
func TestFiniteVolumesApproachTheFront(t *testing.T) {
	for _, c := range families(t) {
		t.Run(c.name, func(t *testing.T) {
			t.Parallel()
			f := flood(t, c.ahead, c.behind, c.pivot, c.injected, c.initial)
			inside, after := 0.6*f.Arrival(), 1.5*f.Arrival()
			var profiles, means []float64
			for _, n := range []int{50, 100, 200} {
				g := newGrid(c.mix, c.pivot, c.pivot, n, c.initial)
				g.run(inside, 1, 1, c.fastest())
				profiles = append(profiles, g.distance(func(x float64) float64 { return f.At(x / inside).S }))
				g.run(after, 1, 1, c.fastest())
				means = append(means, math.Abs(g.mean()-f.After(after).Average))
			}
			v, behind, _ := f.Front()
			_, slope := c.behind.At(behind.S)
			order := 1.35
			if math.Abs(slope-v) < 1e-6*v {
				order = 1.7
			}
			falls(t, "distance of the profiles", profiles, 1.3)
			falls(t, "error of the mean saturation", means, order)
		})
	}
}

// falls holds errors on grids each twice as fine as the one before against a least ratio.
func falls(t *testing.T, what string, errors []float64, ratio float64) {
	t.Helper()
	for i := 1; i < len(errors); i++ {
		if !(errors[i-1] >= ratio*errors[i]) {
			t.Errorf("%s: %.3g does not fall by %g a halving", what, errors, ratio)
			return
		}
	}
}
