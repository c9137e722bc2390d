package pattern

import (
	"encoding/json"
	"math"
	"math/rand/v2"
	"os"
	"testing"
)

// Independent SciPy computation, two methods: cases st-01 and st-02. Tolerances are a few
// times the computation's own estimate of its error.
func TestSweepIndependent(t *testing.T) {
	text, err := os.ReadFile("../../testdata/independent/pattern.json")
	if err != nil {
		t.Fatal(err)
	}
	var file struct {
		Cases []struct {
			ID     string
			Inputs struct {
				Pattern Kind
				Ratio   float64   `json:"d_over_a"`
				PVI     []float64 `json:"pvi_list"`
			}
			Outputs struct {
				Breakthrough float64   `json:"breakthrough_pvi"`
				Angles       []float64 `json:"streamline_angle_rad"`
				Arrivals     []float64 `json:"streamline_arrival_pvi"`
				Sweep        []float64 `json:"areal_sweep"`
				Cut          []float64 `json:"fw"`
			}
			Errors map[string]float64 `json:"est_error"`
		}
	}
	if err := json.Unmarshal(text, &file); err != nil {
		t.Fatal(err)
	}
	if len(file.Cases) != 2 {
		t.Fatalf("%d cases", len(file.Cases))
	}
	for _, c := range file.Cases {
		g := made(t, Shape{c.Inputs.Pattern, c.Inputs.Ratio}, LeastTubes)
		near(t, "breakthrough", g.Breakthrough(), c.Outputs.Breakthrough, 3*c.Errors["breakthrough_pvi"])
		for i, psi := range c.Outputs.Angles {
			near(t, "arrival", g.Arrival(psi), c.Outputs.Arrivals[i], 3*c.Errors["streamline_arrival_pvi"]+2e-9)
		}
		for i, q := range c.Inputs.PVI {
			sweep, cut := g.UnitSweep(q)
			near(t, "sweep", sweep, c.Outputs.Sweep[i], 3*c.Errors["areal_sweep"])
			near(t, "cut", cut, c.Outputs.Cut[i], 4*c.Errors["fw"])
		}
	}
}

// Breakthrough at unit mobility. The five-spot in closed form, (pi/(2K))² with K the
// complete elliptic integral of modulus 1/sqrt(2), Gamma(1/4)²/(4 sqrt(pi)) (Morel-Seytoux
// 1966, from memory: 0.7178). Direct drives by row sums to four digits, staggered ones by
// the fastest streamline of ln cn(z) (Prats 1956, numbers recomputed), the seven-spot by
// theory to four digits.
func TestBreakthroughs(t *testing.T) {
	k := math.Pow(math.Gamma(0.25), 2) / (4 * math.Sqrt(math.Pi))
	near(t, "five-spot", made(t, Shape{FiveSpot, 0}, 4).Breakthrough(), math.Pow(math.Pi/(2*k), 2), 1e-9)
	for _, c := range []struct {
		shape Shape
		want  float64
	}{
		{Shape{Direct, 0.5}, 0.3167}, {Shape{Direct, 0.75}, 0.4588}, {Shape{Direct, 1}, 0.5696}, {Shape{Direct, 2}, 0.7794}, {Shape{Direct, 3}, 0.8529}, {Shape{Direct, 4}, 0.8897},
		{Shape{Staggered, 0.5}, 0.7178}, {Shape{Staggered, 1}, 0.7888}, {Shape{Staggered, 1.5}, 0.8534}, {Shape{Staggered, 2}, 0.8897},
		{Shape{SevenSpot, 0}, 0.7437},
		{Shape{NineSpot, 0.5}, 0.4917}, {Shape{NineSpot, 1}, 0.5212}, {Shape{NineSpot, 5}, 0.6699}, {Shape{NineSpot, 10}, 0.7731},
	} {
		near(t, string(c.shape.Kind), made(t, c.shape, 4).Breakthrough(), c.want, 0.5e-4)
	}
}

// Far rows: 1 - (2 ln 2/pi) a/d for the direct, 1 - (ln 2/pi) a/d for the staggered drive,
// up to terms like exp(-pi d/a).
func TestBreakthroughOfFarRows(t *testing.T) {
	for _, ratio := range []float64{4, 7, 10} {
		near(t, "direct", made(t, Shape{Direct, ratio}, 4).Breakthrough(), 1-2*math.Ln2/math.Pi/ratio, 1e-7)
		near(t, "staggered", made(t, Shape{Staggered, ratio}, 4).Breakthrough(), 1-math.Ln2/math.Pi/ratio, 1e-7)
	}
}

// The streamline that is taken for the fastest is: none of many is faster. Sweep and cut
// are what the same streamlines give by counting.
func TestSweepAgainstManyStreamlines(t *testing.T) {
	r := rand.New(rand.NewPCG(8, 2))
	for _, shape := range shapes[:len(shapes)-1] {
		g := made(t, shape, 4)
		first := g.Breakthrough()
		const n = 200
		q := 0.6 + r.Float64()
		swept, cut := 0.0, 0.0
		for i := range n {
			// The cube lays more streamlines where they are slow; its slope is their weight.
			u := (float64(i) + 0.5) / n
			psi := g.element.angle() * u * u * (3 - 2*u)
			weight := 6 * u * (1 - u) / n
			arrival := g.Arrival(psi)
			if arrival < first-1e-10 {
				t.Errorf("%v: a streamline arrives at %.10g, before %.10g", shape, arrival, first)
			}
			swept += weight * math.Min(arrival, q)
			if arrival < q {
				cut += weight
			}
		}
		sweep, water := g.UnitSweep(q)
		near(t, "sweep", sweep, swept, 1e-4)
		near(t, "cut", water, cut, 2.0/n)
	}
}

// Tubes are streamlines taken together: the fastest of many holds what theory says, from
// above, and closer as there are more of them.
func TestTubesNearTheBreakthrough(t *testing.T) {
	for _, shape := range []Shape{{FiveSpot, 0}, {Direct, 1}, {SevenSpot, 0}, {NineSpot, 1}} {
		exact := made(t, shape, 4).Breakthrough()
		before := math.Inf(1)
		for _, n := range []int{10, 20, 40, 80} {
			first := math.Inf(1)
			for _, tube := range made(t, shape, n).Tubes {
				first = math.Min(first, tube.Area/tube.Flow)
			}
			late := first - exact
			if !(late > 0 && late < 0.5*before) {
				t.Errorf("%v: %d tubes are late by %.2g, after %.2g", shape, n, late, before)
			}
			before = late
		}
		if before > 2e-4 {
			t.Errorf("%v: 80 tubes are late by %.2g", shape, before)
		}
	}
}
