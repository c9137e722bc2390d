package reservoir

import (
	"encoding/json"
	"math"
	"math/rand/v2"
	"os"
	"slices"
	"testing"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

// layerCase is a case of testdata/independent/layers.json: independent SciPy computation,
// two methods.
type layerCase struct {
	ID     string
	Inputs struct {
		K, H, Phi []float64
		DeltaS    []float64 `json:"delta_s"`
		LambdaO   float64   `json:"lambda_o"`
		M, Bo, Bw float64
		Length    float64
		Width     float64
		DP        float64
		Fluid     struct {
			Kr  relperm.Corey
			MuW float64 `json:"mu_w"`
			MuO float64 `json:"mu_o"`
		}
		Injected float64   `json:"s_injected"`
		Initial  float64   `json:"s_initial"`
		PVI      []float64 `json:"pvi_total_list"`
	}
	Outputs struct {
		Order         []int       `json:"layer_order_zero_based"`
		Breakthrough  []float64   `json:"breakthrough_s"`
		CoverageAt    []float64   `json:"coverage_at_bt"`
		After         []float64   `json:"fw_just_after_bt"`
		Before        []float64   `json:"fw_just_before_bt"`
		Injected      []float64   `json:"injected_pv_total_pore_volume"`
		Recovery      []float64   `json:"recovery_pv"`
		Probes        []float64   `json:"probe_times_s"`
		Fronts        [][]float64 `json:"front_positions_m"`
		Rate          []float64   `json:"rate_m3_per_s"`
		Probed        []float64   `json:"coverage_probe"`
		Coverage      []float64   `json:"coverage"`
		FwReservoir   []float64   `json:"fw_reservoir"`
		FwSurface     []float64   `json:"fw_surface"`
		LayerArrivals []float64   `json:"layer_breakthrough_s"`
		Times         []float64   `json:"time_s"`
		LayerPVI      [][]float64 `json:"layer_pvi"`
		Fw            []float64   `json:"fw"`
	}
	Errors map[string]float64 `json:"est_error"`
}

func layered(t *testing.T, id string) layerCase {
	t.Helper()
	text, err := os.ReadFile("../../testdata/independent/layers.json")
	if err != nil {
		t.Fatal(err)
	}
	var file struct{ Cases []layerCase }
	if err := json.Unmarshal(text, &file); err != nil {
		t.Fatal(err)
	}
	i := slices.IndexFunc(file.Cases, func(c layerCase) bool { return c.ID == id })
	if i < 0 {
		t.Fatalf("case %s is gone", id)
	}
	return file.Cases[i]
}

// pace and pore volume of layer i.
func (c layerCase) member(i int, body Body) Member {
	in := c.Inputs
	pv := in.Phi[i] * in.H[i] * in.Width * in.Length
	return Member{Body: body, PoreVolume: pv, Pace: in.K[i] * in.H[i] * in.Width / in.Length / pv}
}

// Case lbl-01. The tolerance is three times the estimated error of the reference.
func TestLayersWithExactFronts(t *testing.T) {
	c := layered(t, "lbl-01")
	in, out := c.Inputs, c.Outputs
	flow := fracflow.Flow{Curves: in.Fluid.Kr, MuW: in.Fluid.MuW, MuO: in.Fluid.MuO}
	d, err := displace.New(flow, in.Injected, in.Initial)
	if err != nil {
		t.Fatal(err)
	}
	flood := NewFlood(flow, d)
	path := Path{PoreVolume: 1, Impedance: 1, Shape: Even, Flood: flood}
	var exact, tabled Bundle
	table := path.Tabulate(1e-10)
	for i := range in.K {
		exact = append(exact, c.member(i, path))
		tabled = append(tabled, c.member(i, table))
		near(t, "arrival in the layer", exact[i].Body.Breakthrough()/exact[i].Pace/in.DP, out.LayerArrivals[i], 3*c.Errors["layer_breakthrough_s"])
	}
	near(t, "first arrival", exact.Breakthrough()/in.DP, slices.Min(out.LayerArrivals), 3*c.Errors["layer_breakthrough_s"])
	pv := exact.PoreVolume()
	for n, q := range in.PVI {
		tau := Clock(exact, q, 0)
		near(t, "time", tau/in.DP, out.Times[n], 3*c.Errors["time_s"])
		o := exact.At(tau)
		near(t, "recovery", o.Oil, out.Recovery[n], 3*c.Errors["recovery_pv"])
		near(t, "water cut", o.Cut(), out.Fw[n], 3*c.Errors["fw"])
		near(t, "rate", o.Rate*pv*in.DP, out.Rate[n], 3*c.Errors["rate_m3_per_s"])
		for i, m := range exact {
			near(t, "layer's share", m.Body.At(tau*m.Pace).Injected, out.LayerPVI[n][i], 3*c.Errors["layer_pvi"])
		}
		// The table is what it says it is.
		quick := tabled.At(Clock(tabled, q, 0))
		near(t, "tabulated recovery", quick.Oil, out.Recovery[n], 1e-9)
		near(t, "tabulated cut", quick.Cut(), out.Fw[n], 1e-6)
	}
}

// Case dp-01: Dykstra and Parsons' piston-like layers, closed-form fronts against an ODE.
func TestPistonLayers(t *testing.T) {
	c := layered(t, "dp-01")
	in, out := c.Inputs, c.Outputs
	var b Bundle
	for i := range in.K {
		b = append(b, c.member(i, Piston{Water: in.M * in.LambdaO, Oil: in.LambdaO, Change: in.DeltaS[i]}))
	}
	pv := b.PoreVolume()
	displaceable := 0.0
	for i, m := range b {
		displaceable += m.PoreVolume * in.DeltaS[i]
	}
	for n, i := range out.Order {
		tau := b[i].Body.Breakthrough() / b[i].Pace
		near(t, "arrival", tau/in.DP, out.Breakthrough[n], 3*c.Errors["breakthrough_s"])
		after, before := b.At(tau*(1+1e-15)), b.At(tau*(1-1e-14))
		near(t, "coverage", after.Oil*pv/displaceable, out.CoverageAt[n], 3*c.Errors["coverage_at_bt"])
		near(t, "cut after", after.Cut(), out.After[n], 3*c.Errors["fw_just_after_bt"])
		near(t, "cut before", before.Cut(), out.Before[n], 3*c.Errors["fw_just_before_bt"])
		near(t, "injected", after.Injected, out.Injected[n], 3*c.Errors["injected_pv_total_pore_volume"])
		near(t, "recovery", after.Oil, out.Recovery[n], 3*c.Errors["recovery_pv"])
	}
	for n, time := range out.Probes {
		o := b.At(time * in.DP)
		near(t, "rate", o.Rate*pv*in.DP, out.Rate[n], 3*c.Errors["rate_m3_per_s"])
		near(t, "coverage", o.Oil*pv/displaceable, out.Probed[n], 3*c.Errors["coverage_probe"])
		for i, m := range b {
			near(t, "front", in.Length*m.Body.At(time*in.DP*m.Pace).Oil/in.DeltaS[i], out.Fronts[n][i], 3*c.Errors["front_positions_m"])
		}
	}
}

// One layer alone is the linear flood, to rounding.
func TestOneLayerIsLinear(t *testing.T) {
	flow := fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: 5.93e-3}
	drive := ConstantPressure{2.3e6}
	l := build(t, rock(drive), flow, 0.763, 0.213)
	path := Path{PoreVolume: l.PoreVolume(), Impedance: l.Length / (l.Permeability * l.Area), Shape: Even, Flood: NewFlood(flow, l.Displacement)}
	b := Bundle{{Body: path, PoreVolume: path.PoreVolume, Pace: 1 / (path.PoreVolume * path.Impedance)}}
	bt, _ := l.Breakthrough()
	for _, share := range []float64{0.1, 0.7, 1.1, 4, 60} {
		want := l.At(share * bt)
		o := b.At(share * bt * drive.DP * l.Uptime)
		near(t, "injected", o.Injected, want.PVI, 1e-14*want.PVI)
		near(t, "rate", o.Rate*path.PoreVolume*drive.DP*l.Uptime, want.InjectionRate, 1e-14*want.InjectionRate)
		near(t, "oil", o.Oil*path.PoreVolume/l.Bo, want.CumOil, 1e-13*want.CumOil)
		near(t, "cut", o.Cut(), want.ReservoirCut, 1e-13)
	}
}

// randomBundle is an invented set of layers with the given spread of ln k and one total capacity.
func randomBundle(rng *rand.Rand, body Body, n int, s float64) Bundle {
	b := make(Bundle, n)
	sum := 0.0
	for i := range b {
		b[i] = Member{Body: body, PoreVolume: 1.0 / float64(n), Pace: math.Exp(s * rng.NormFloat64())}
		sum += b[i].Pace / float64(n)
	}
	for i := range b {
		b[i].Pace /= sum
	}
	return b
}

// Volumes balance, time is monotone, the whole is the sum of its layers, and the clock of
// a volume is found again, over random layers.
func TestBundleProperties(t *testing.T) {
	rng := rand.New(rand.NewPCG(31, 7))
	for range 40 {
		mo := math.Exp(rng.NormFloat64() - 6)
		flow := fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: mo}
		d, err := displace.New(flow, 0.763, 0.213)
		if err != nil {
			t.Fatal(err)
		}
		b := randomBundle(rng, Path{PoreVolume: 1, Impedance: 1, Shape: Even, Flood: NewFlood(flow, d)}.Tabulate(1e-8), 1+rng.IntN(50), 1.3*rng.Float64())
		last, tau := Outflow{}, 0.0
		for _, q := range []float64{0.02, 0.2, 0.5, 1, 2, 5, 30} {
			next := Clock(b, q, tau)
			if !(next > tau) {
				t.Fatalf("the clock runs backward: %g after %g", next, tau)
			}
			tau = next
			o := b.At(tau)
			near(t, "injected", o.Injected, q, 1e-12*q)
			if !(o.Oil >= last.Oil && o.Oil <= math.Min(q, 0.55)+1e-7 && o.Cut() <= 1 && o.Cut() >= -1e-6) {
				t.Fatalf("after %g: %+v follows %+v", q, o, last)
			}
			sum := 0.0
			for _, m := range b {
				sum += m.PoreVolume * m.Body.At(tau*m.Pace).Oil
			}
			near(t, "sum of the layers", sum, o.Oil, 1e-14)
			last = o
		}
	}
}

// With the spread of one set of layers stretched at the same capacity, less is swept.
func TestHeterogeneityNeverHelps(t *testing.T) {
	for _, m := range []float64{0.3, 1, 5} {
		body := Piston{Water: m, Oil: 1, Change: 0.5}
		former := []float64{2, 2, 2}
		for _, s := range []float64{0, 0.2, 0.4, 0.7, 1, 1.4, 2} {
			b := randomBundle(rand.New(rand.NewPCG(5, 9)), body, 40, s)
			for i, q := range []float64{0.3, 0.6, 1.5} {
				oil := b.At(Clock(b, q, 0)).Oil
				if oil > former[i]+1e-12 {
					t.Errorf("M %g, spread %g, after %g PV: %g recovered, more than %g with less spread", m, s, q, oil, former[i])
				}
				former[i] = oil
			}
		}
	}
}

// A path cut in pieces is the path; a path of two even halves in series is each in turn.
func TestShapes(t *testing.T) {
	flow := fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: 5.93e-3}
	d, err := displace.New(flow, 0.763, 0.213)
	if err != nil {
		t.Fatal(err)
	}
	flood := NewFlood(flow, d)
	whole := Path{PoreVolume: 1, Impedance: 1, Shape: Even, Flood: flood}
	cut := whole
	cut.Shape = Shape{V: []float64{0, 0.13, 0.5, 0.91, 1}, G: []float64{0, 0.13, 0.5, 0.91, 1}}
	uneven := whole
	uneven.Shape = Shape{V: []float64{0, 0.02, 0.3, 0.97, 1}, G: []float64{0, 0.4, 0.55, 0.7, 1}, In: 0.2, Out: 0.1}
	for _, q := range []float64{0.01, 0.2, 0.358, 0.5, 2, 40} {
		r, c := whole.Resistance(q), whole.Clock(q)
		near(t, "R in pieces", cut.Resistance(q), r, 1e-13*r)
		near(t, "T in pieces", cut.Clock(q), c, 1e-13*c)
		near(t, "Q again", uneven.Injected(uneven.Clock(q)), q, 1e-13*q)
		// R by quadrature over the profile, T by quadrature of R: midpoints.
		const n = 20000
		sum := 0.0
		for i := range n {
			v := (float64(i) + 0.5) / n
			lt, _ := flow.Mobility(d.Saturation(v / q))
			sum += uneven.Shape.slope(v) / lt / n
		}
		face, _ := d.InletFace()
		out, _ := d.Outlet(q)
		near(t, "R of the shape", uneven.Resistance(q), sum+0.2*flood.resistance.drag(face)+0.1*flood.resistance.drag(out), 3e-4*sum)
		from := 0.6 * q
		area := 0.0
		const m = 2000
		for i := range m {
			area += uneven.Resistance(from+(float64(i)+0.5)/m*(q-from)) * (q - from) / m
		}
		near(t, "T of the shape", uneven.Clock(q)-uneven.Clock(from), area, 3e-5*area)
	}
}

func (s Shape) slope(v float64) float64 {
	i := 0
	for v > s.V[i+1] {
		i++
	}
	return (s.G[i+1] - s.G[i]) / (s.V[i+1] - s.V[i])
}

// BenchmarkPairs is a forecast of 200 layers of 40 tubes each at 300 report times under a total rate.
func BenchmarkPairs(b *testing.B) {
	flow := fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: 5.93e-3}
	d, _ := displace.New(flow, 0.763, 0.213)
	flood := NewFlood(flow, d)
	for b.Loop() {
		quick := flood.Tabulated(1e-7)
		tubes := make(Bundle, 40)
		for i := range tubes {
			shape := Shape{V: make([]float64, 41), G: make([]float64, 41)}
			for n := range shape.V {
				x := float64(n) / 40
				shape.V[n] = x * x * (3 - 2*x) * (1 + 0.2*x*(1-x)*float64(i)/40)
				shape.G[n] = x
			}
			tubes[i] = Member{Path{PoreVolume: 1, Impedance: 1, Shape: shape, Flood: quick}.Tabulate(1e-5), 1.0 / 40, 1 / (1 + 3*float64(i)/40)}
		}
		pattern := tubes.Tabulate(1e-5, 1e4*Clock(tubes, 1, 0))
		layers := randomBundle(rand.New(rand.NewPCG(1, 2)), pattern, 200, 0.9)
		tau := 0.0
		for n := range 300 {
			tau = Clock(layers, 3*float64(n+1)/300, tau)
			layers.At(tau)
		}
		b.ReportMetric(float64(len(pattern.clocks)), "nodes")
		b.ReportMetric(float64(len(tubes[7].Body.(*Table).clocks)), "tubenodes")
	}
}
