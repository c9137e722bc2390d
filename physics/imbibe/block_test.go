package imbibe

import (
	"encoding/json"
	"math"
	"math/rand/v2"
	"os"
	"path/filepath"
	"testing"

	"brinefront/physics/capillary"
	"brinefront/physics/relperm"
)

// flat, cubic and the like are diffusivities by saturation from 0 to 1, for exact limits.
type law func(s float64) float64

func (d law) FromInitial(u float64) (float64, float64) { return d(u), 0 }
func (d law) FromInlet(t float64) (float64, float64)   { return d(1 - t), 0 }

func matrixOf(t testing.TB, d diffusivity) *Matrix {
	t.Helper()
	m, err := newMatrix(1, 0, 1, d, nil)
	if err != nil {
		t.Fatal(err)
	}
	return m
}

func constant(float64) float64 { return 1 }

// blockCase is a case of testdata/independent/blocks.json, whose rock is told as in the
// cases of self-similar soaking.
type blockCase struct {
	independentCase
	Inputs struct {
		Length   float64
		Geometry string
		Times_s  []float64
	}
	Outputs struct {
		Recovery_pv, Recovery_of_max []float64
		A_m_per_sqrt_s               float64
	}
}

func blockCases(t *testing.T) []blockCase {
	t.Helper()
	var file struct{ Cases []json.RawMessage }
	raw, err := os.ReadFile(filepath.Join("..", "..", "testdata", "independent", "blocks.json"))
	must(t, err)
	must(t, json.Unmarshal(raw, &file))
	if len(file.Cases) != 2 {
		t.Fatalf("%d cases, want 2", len(file.Cases))
	}
	cases := make([]blockCase, len(file.Cases))
	for i, text := range file.Cases {
		must(t, json.Unmarshal(text, &cases[i]))
		must(t, json.Unmarshal(text, &cases[i].independentCase))
	}
	return cases
}

func (c blockCase) matrix(t *testing.T) *Matrix {
	t.Helper()
	m, err := NewMatrix(c.span(t))
	must(t, err)
	return m
}

func (c blockCase) shape(t *testing.T) Shape {
	t.Helper()
	switch c.Inputs.Geometry {
	case "slab":
		return Slab(c.Inputs.Length, 1)
	case "cylinder":
		return Cylinder(2*c.Inputs.Length, 1, true, 0)
	}
	t.Fatalf("no geometry %q", c.Inputs.Geometry)
	return nil
}

// TestBlocksOfIndependentCases: independent SciPy computation, two methods. The tolerance
// is that promised, 1e-4 of what can be soaked up; theirs is 4e-7.
func TestBlocksOfIndependentCases(t *testing.T) {
	for _, c := range blockCases(t) {
		m := c.matrix(t)
		b, err := m.Soak(c.shape(t))
		must(t, err)
		for i, time := range c.Inputs.Times_s {
			share, _ := b.At(time)
			within(t, c.ID+": share of what can be soaked up", share, c.Outputs.Recovery_of_max[i], 1e-4)
			within(t, c.ID+": recovery in pore volumes", share*m.Capacity(), c.Outputs.Recovery_pv[i], 1e-4)
		}
		within(t, c.ID+": balance", b.Balance, 0, 1e-10)
		if b.Error > 2e-3 || !(b.Error > 0) {
			t.Errorf("%s: error estimate %g", c.ID, b.Error)
		}
	}
}

// TestEarlySoakingIsThatOfAHalfSpace: uptake 2 A sqrt(t) over the reach of a slab until the front meets its
// end, with A of the independent computation of blk-01.
func TestEarlySoakingIsThatOfAHalfSpace(t *testing.T) {
	c := blockCases(t)[0]
	m := c.matrix(t)
	b, err := m.Soak(c.shape(t))
	must(t, err)
	for _, share := range []float64{0.01, 0.1, 0.3, 0.5} {
		time := b.TimeAt(share)
		want := 2 * c.Outputs.A_m_per_sqrt_s * math.Sqrt(time) / (m.porosity * c.Inputs.Length)
		within(t, "pore volumes", share*m.Capacity(), want, 1e-4)
	}
}

// TestBothRoutesAgree: finite volumes in a slab take up what the self-similar solution says,
// 2 A sqrt(t), while the far face is not felt: for every independent case without a stream
// through it, of soaking rock and of blocks.
func TestBothRoutesAgree(t *testing.T) {
	spans := map[string]*Span{}
	for _, c := range independentCases(t) {
		if c.Inputs.R == 0 {
			spans[c.ID] = c.span(t)
		}
	}
	for _, c := range blockCases(t) {
		spans[c.ID] = c.span(t)
	}
	if len(spans) != 4 {
		t.Fatalf("%d cases, want 4", len(spans))
	}
	for id, span := range spans {
		solution, err := Solve(span, 0)
		must(t, err)
		m, err := NewMatrix(span)
		must(t, err)
		b, err := m.Soak(Slab(1, 1))
		must(t, err)
		for _, share := range []float64{0.01, 0.05, 0.1, 0.2} {
			within(t, id+": taken up", share*m.Capacity(), 2*solution.A*math.Sqrt(b.TimeAt(share))/m.porosity, 1e-4)
		}
	}
}

// TestBothRoutesAgreeWithAStream: the same for the cases in which some of the oil leaves
// ahead of the water. Explicit steps of 200 cells with the flux of the capillary potential, the
// stream q_t = R q_w(0, t) by the flux that the cells themselves take in, f upstream; they know nothing
// of A. One per cent is what cells of 1/200 can be asked for.
func TestBothRoutesAgreeWithAStream(t *testing.T) {
	const cells, nodes = 200, 4000
	held := 0
	for _, c := range independentCases(t) {
		ratio := c.Inputs.R
		if ratio == 0 {
			continue
		}
		held++
		span := c.span(t)
		solution, err := Solve(span, ratio)
		must(t, err)
		width, most := span.Width(), 0.0
		potential, flow := make([]float64, nodes+1), make([]float64, nodes+1)
		before := 0.0
		for i := 1; i <= nodes; i++ {
			d, rise := span.FromInitial(width * float64(i) / nodes)
			most = math.Max(most, d)
			potential[i], flow[i] = potential[i-1]+(before+d)/2*width/nodes, solution.start+rise
			before = d
		}
		flow[0] = solution.start
		at := func(table []float64, u float64) float64 {
			x := math.Max(0, math.Min(nodes, u/width*nodes))
			i := min(int(x), nodes-1)
			return table[i] + (x-float64(i))*(table[i+1]-table[i])
		}
		u := make([]float64, cells+1) // rise above Initial; u[0] is the open face
		u[0] = width
		flux := make([]float64, cells+2)
		dx, phi := 1.0/cells, c.Inputs.Phi
		step := 0.45 * dx * dx * phi / most / 2 // the half cell at the face
		end := 0.64 * solution.Arrival(span.Initial+0.01*width, 1)
		taken, time := 0.0, 0.0
		for ; time < end; time += step {
			q := (potential[nodes] - at(potential, u[1])) / (dx / 2) / (1 - ratio*flow[nodes])
			flux[1], flux[cells+1] = q, ratio*q*flow[0]
			for i := 2; i <= cells; i++ {
				flux[i] = (at(potential, u[i-1])-at(potential, u[i]))/dx + ratio*q*at(flow, u[i-1])
			}
			for i := 1; i <= cells; i++ {
				u[i] += step / (phi * dx) * (flux[i] - flux[i+1])
			}
			taken += step * q
		}
		within(t, c.ID+": taken up", taken/solution.Uptake(time), 1, 0.01)
	}
	if held == 0 {
		t.Fatal("no case has a stream")
	}
}

// linear is the exact share that a block of one axis soaks up at a constant diffusivity of
// 1 m2/s with porosity 1, after a time over the square of its reach. Crank (1975), eqs. 2.67, 5.23
// and 6.20, from memory.
func linear(spread int, time float64) float64 {
	left := 0.0
	for k := range 400 {
		var e, weight float64
		switch spread {
		case 0:
			e, weight = (float64(k)+0.5)*math.Pi, 2
		case 1:
			e, weight = besselZero(k), 4
		case 2:
			e, weight = float64(k+1)*math.Pi, 6
		}
		left += weight / (e * e) * math.Exp(-e*e*time)
	}
	return 1 - left
}

// besselZero is zero k of J0, from 0 on.
func besselZero(k int) float64 {
	z := (float64(k) + 0.75) * math.Pi
	for range 8 {
		z += math.J0(z) / math.J1(z)
	}
	return z
}

func TestConstantDiffusivityIsExact(t *testing.T) {
	m := matrixOf(t, law(constant))
	for spread := range maxSpread + 1 {
		b, err := m.Soak(Shape{{3, spread}})
		must(t, err)
		for _, tau := range []float64{0.0005, 0.003, 0.02, 0.1, 0.3, 0.6, 1, 2} {
			share, _ := b.At(9 * tau)
			within(t, "share", share, linear(spread, tau), 1e-4)
		}
		// The tail decays at the rate of the slowest mode, the shape factor of Lim and Aziz.
		if _, rate := b.At(1e6); rate != 0 {
			t.Errorf("rate %g at last", rate)
		}
		s1, _ := b.At(9 * 1.5)
		s2, _ := b.At(9 * 1.6)
		within(t, "tail over the slowest mode", math.Log((1-s1)/(1-s2))/(0.9*b.Shape.LimAziz()), 1, 5e-3)
	}
}

// TestBlocksConverge measures the order of the scheme in the number of cells, before any extrapolation, and
// that of the steps in time.
func TestBlocksConverge(t *testing.T) {
	soak := func(spread, cells int, tolerance, until float64) float64 {
		r := newAxisRun(matrixOf(t, law(constant)), Axis{1, spread}, cells, tolerance, grading)
		must(t, r.advance(until, false))
		return r.mean()
	}
	for spread := range maxSpread + 1 {
		exact := linear(spread, 0.05)
		e1, e2, e3 := soak(spread, 20, 1e-8, 0.05)-exact, soak(spread, 40, 1e-8, 0.05)-exact, soak(spread, 80, 1e-8, 0.05)-exact
		for _, order := range []float64{math.Log2(e1 / e2), math.Log2(e2 / e3)} {
			within(t, "order in space", order, 2, 0.1)
		}
		fine := soak(spread, 40, 1e-9, 0.05)
		loose, tight := math.Abs(soak(spread, 40, 1e-3, 0.05)-fine), math.Abs(soak(spread, 40, 1e-6, 0.05)-fine)
		if !(tight < loose/100) {
			t.Errorf("spread %d: errors in time %.2g and %.2g with a tolerance a thousand times smaller", spread, loose, tight)
		}
	}
}

// TestRandomBlocks: over random rocks, water stays between Si and S0, recovery rises,
// its rate agrees with it, and nothing is lost.
func TestRandomBlocks(t *testing.T) {
	random := rand.New(rand.NewPCG(4, 1))
	between := func(low, high float64) float64 { return low + (high-low)*random.Float64() }
	for range 25 {
		swc, sor := between(0.05, 0.3), between(0.05, 0.35)
		rock := Rock{Permeability: math.Exp(between(-38, -28)), Porosity: between(0.05, 0.4), WaterViscosity: between(2e-4, 2e-3), OilViscosity: math.Exp(between(-8, -2)),
			Kr: relperm.Corey{Swc: swc, Sor: sor, Krw0: between(0.05, 1), Kro0: between(0.3, 1), Nw: between(1.5, 6), No: between(1, 6)},
			Pc: capillary.Skjaeveland{Cw: between(1e3, 1e5), Aw: between(0.2, 1), Co: between(-1e5, -1e2), Ao: between(0.2, 1), Swr: swc, Sor: sor}}
		initial := swc + math.Max(0, between(-0.05, 0.05))
		if !(initial < rock.Inlet()-0.01) {
			continue
		}
		span, err := NewSpan(rock, initial, math.NaN())
		must(t, err)
		m, err := NewMatrix(span)
		must(t, err)
		shape := Shape{{between(0.01, 5), random.IntN(3)}}
		if random.IntN(3) == 0 {
			shape = append(shape, Axis{between(0.01, 5), random.IntN(2)})
		}
		b, err := m.Soak(shape)
		if err != nil {
			t.Fatalf("%+v: %v", rock, err)
		}
		within(t, "balance", b.Balance, 0, 1e-10)
		before := -1.0
		for i, time := range b.Times() {
			share, rate := b.At(time)
			if !(share > before && share <= 1 && rate >= 0) {
				t.Fatalf("%+v %v: node %d: share %g after %g, rate %g", rock, shape, i, share, before, rate)
			}
			before = share
		}
		half := b.TimeAt(0.5)
		share, rate := b.At(half)
		within(t, "share at the time of half", share, 0.5, 1e-12)
		after, _ := b.At(half * 1.0001)
		within(t, "rate by differences", (after-share)/(half*0.0001)/rate, 1, 0.01)
		for _, p := range b.Profiles {
			for i, sw := range p.Sw {
				if !(sw > span.Initial-deepest*span.Width() && sw <= span.Inlet+1e-12) || (i > 0 && sw > p.Sw[i-1]+2*deepest*span.Width()) {
					t.Fatalf("%+v: profile %v is not between its ends and falling", rock, p.Sw)
				}
			}
		}
	}
}

// TestSingularDiffusivityFills: where Dc grows without bound at Si the water has no front,
// but its uptake stays in proportion to the root of time at first, and is balanced.
func TestSingularDiffusivityFills(t *testing.T) {
	for _, power := range []float64{-0.5, -0.9} {
		m := matrixOf(t, law(func(s float64) float64 { return math.Pow(s, power) }))
		b, err := m.Soak(Slab(1, 1))
		must(t, err)
		within(t, "balance", b.Balance, 0, 1e-10)
		s1, _ := b.At(b.TimeAt(0.05))
		s2, _ := b.At(4 * b.TimeAt(0.05))
		within(t, "uptake after four times as long", s2/s1, 2, 5e-3)
	}
}

func TestMatrixRefuses(t *testing.T) {
	for _, d := range []law{func(float64) float64 { return 0 }, func(float64) float64 { return math.NaN() }, func(float64) float64 { return math.Inf(1) }} {
		if _, err := newMatrix(1, 0, 1, d, nil); err == nil {
			t.Error("a diffusivity that lets nothing soak was taken")
		}
	}
}
