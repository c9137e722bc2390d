package reservoir

import (
	"encoding/json"
	"math"
	"os"
	"testing"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

func near(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance) {
		t.Errorf("%s = %.15g, want %.15g: off by %.2g, allowed %.2g", what, got, want, got-want, tolerance)
	}
}

// Independent SciPy computation, two methods: case lin-01.
func TestLinearIndependent(t *testing.T) {
	text, err := os.ReadFile("../../testdata/independent/displacement.json")
	if err != nil {
		t.Fatal(err)
	}
	var file struct {
		Cases []struct {
			ID     string
			Inputs struct {
				Fluid struct {
					Kr  relperm.Corey
					MuW float64 `json:"mu_w"`
					MuO float64 `json:"mu_o"`
				}
				Injected float64   `json:"s_injected"`
				Initial  float64   `json:"s_initial"`
				K        float64   `json:"k"`
				Phi      float64   `json:"phi"`
				Length   float64   `json:"length"`
				DP       float64   `json:"dp"`
				PVI      []float64 `json:"pvi_list"`
			}
			Outputs map[string]any
			Errors  map[string]float64 `json:"est_error"`
		}
	}
	if err := json.Unmarshal(text, &file); err != nil {
		t.Fatal(err)
	}
	found := false
	for _, c := range file.Cases {
		if c.ID != "lin-01" {
			continue
		}
		found = true
		in := c.Inputs
		flow := fracflow.Flow{Curves: in.Fluid.Kr, MuW: in.Fluid.MuW, MuO: in.Fluid.MuO}
		d, err := displace.New(flow, in.Injected, in.Initial)
		if err != nil {
			t.Fatal(err)
		}
		l, err := NewLinear(Layer{Length: in.Length, Area: 1, Porosity: in.Phi, Permeability: in.K, Bw: 1, Bo: 1, Uptime: 1, Drive: ConstantPressure{in.DP}}, flow, d)
		if err != nil {
			t.Fatal(err)
		}
		one := func(key string) float64 { return c.Outputs[key].(float64) }
		many := func(key string, i int) float64 { return c.Outputs[key].([]any)[i].(float64) }
		// A few times the estimated error of the reference.
		bt, pvi := l.Breakthrough()
		near(t, "breakthrough PVI", pvi, one("breakthrough_pvi"), 3*c.Errors["breakthrough_pvi"])
		near(t, "breakthrough time", bt, one("breakthrough_s"), 3*c.Errors["breakthrough_s"])
		for i, q := range in.PVI {
			near(t, "time", l.TimeAt(q), many("time_at_pvi_s", i), 3*c.Errors["time_at_pvi_s"])
			near(t, "R", l.Resistance(q), many("resistance_R_Pa_s", i), 3*c.Errors["resistance_R_Pa_s"])
			near(t, "flux", l.AtPVI(q).InjectionRate, many("flux_m_per_s", i), 3*c.Errors["flux_m_per_s"])
			near(t, "PVI", l.PVIAt(l.TimeAt(q)), q, 1e-14*q)
		}
	}
	if !found {
		t.Fatal("case lin-01 is gone")
	}
}

var viscous = relperm.Corey{Swc: 0.213, Sor: 0.237, Krw0: 0.327, Kro0: 0.861, Nw: 2.7, No: 2.15}

// rock is an invented layer.
func rock(drive Drive) Layer {
	return Layer{Length: 151, Area: 730, Porosity: 0.217, Permeability: 8.7e-14, Bw: 1.02, Bo: 1.31, Uptime: 0.93, Drive: drive}
}

func build(t *testing.T, layer Layer, flow fracflow.Flow, injected, initial float64) *Linear {
	t.Helper()
	d, err := displace.New(flow, injected, initial)
	if err != nil {
		t.Fatal(err)
	}
	l, err := NewLinear(layer, flow, d)
	if err != nil {
		t.Fatal(err)
	}
	return l
}

// At constant rate everything follows from Q = uptime q t/PV by hand.
func TestConstantRate(t *testing.T) {
	const rate, day = 2e-4, 86400.0
	flow := fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: 5.93e-3}
	l := build(t, rock(ConstantRate{rate}), flow, 0.763, 0.213)
	pv := 151 * 730 * 0.217
	for _, days := range []float64{1, 400, 1300, 4000, 20000} {
		time := days * day
		q := 0.93 * rate * time / pv
		s := l.At(time)
		near(t, "PVI", s.PVI, q, 1e-15*q)
		near(t, "time", s.Time, time, 0)
		near(t, "injected", s.CumInjected, 0.93*rate*time, 1e-9)
		near(t, "rate", s.InjectionRate, 0.93*rate, 1e-18)
		_, f := l.Displacement.Outlet(q)
		near(t, "oil rate", s.OilRate, 0.93*rate*(1-f)/1.31, 1e-18)
		near(t, "water rate", s.WaterRate, 0.93*rate*f/1.02, 1e-18)
		near(t, "water cut", s.WaterCut, s.WaterRate/(s.OilRate+s.WaterRate), 1e-15)
		near(t, "oil", s.CumOil, l.Displacement.Recovery(q)*pv/1.31, 1e-10*pv)
		near(t, "volume in and out", s.CumOil*1.31+s.CumWater*1.02, s.CumInjected, 1e-9*pv)
		near(t, "pressure", s.PressureDrop, rate/730*151/8.7e-14*l.Resistance(q), 1e-6)
	}
	if s := l.At(0); s.PVI != 0 || s.CumOil != 0 || s.WaterCut != 0 || s.Recovery != 0 {
		t.Errorf("at time 0: %+v", s)
	}
}

// Rates are the slopes of cumulatives in calendar time, whatever the drive: central
// differences, whose error is taken from halving the step.
func TestRatesAreSlopes(t *testing.T) {
	flow := fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: 5.93e-3}
	for _, drive := range []Drive{ConstantRate{2e-4}, ConstantPressure{2.3e6}} {
		l := build(t, rock(drive), flow, 0.763, 0.213)
		bt, _ := l.Breakthrough()
		for _, share := range []float64{0.2, 0.9, 1.1, 2, 7} {
			at := share * bt
			s := l.At(at)
			slope := func(h float64, of func(State) float64) float64 {
				return (of(l.At(at+h)) - of(l.At(at-h))) / (2 * h)
			}
			for name, pair := range map[string][2]func(State) float64{
				"injected": {func(s State) float64 { return s.CumInjected }, func(s State) float64 { return s.InjectionRate }},
				"oil":      {func(s State) float64 { return s.CumOil }, func(s State) float64 { return s.OilRate }},
				"water":    {func(s State) float64 { return s.CumWater }, func(s State) float64 { return s.WaterRate }},
			} {
				h := 1e-3 * bt
				coarse, fine := slope(h, pair[0]), slope(h/2, pair[0])
				near(t, name, pair[1](s), fine, 2*math.Abs(coarse-fine)+1e-9*s.InjectionRate)
			}
		}
	}
}

// The piston limit in closed form: with one shock from end to end, mobilities lw behind and
// lo ahead, R = Q/lw/Qf + (1 - Q/Qf)/lo until Q = Qf, so that
//
//	T = Q/lo + Q^2 (1/lw - 1/lo)/(2 Qf),  and break-through at T = Qf (1/lw + 1/lo)/2.
func TestPistonClosedForm(t *testing.T) {
	for _, m := range []float64{0.01, 0.3, 1} { // straight curves are piston-like up to M = 1
		flow := fracflow.Flow{Curves: relperm.Corey{Swc: 0.2, Sor: 0.2, Krw0: 1, Kro0: 1, Nw: 1, No: 1}, MuW: 1e-3, MuO: m * 1e-3}
		l := build(t, rock(ConstantPressure{1e6}), flow, 0.8, 0.2)
		unit := 0.217 * 151 * 151 / (8.7e-14 * 1e6 * 0.93)
		lw, lo, qf := 1e3, 1e3/m, 0.6
		bt, pvi := l.Breakthrough()
		near(t, "PVI", pvi, qf, 1e-15)
		near(t, "break-through", bt, unit*qf*(1/lw+1/lo)/2, 1e-13*bt)
		for _, q := range []float64{0.01, 0.3, 0.59} {
			want := unit * (q/lo + q*q*(1/lw-1/lo)/(2*qf))
			near(t, "time", l.TimeAt(q), want, 1e-13*want)
			near(t, "PVI", l.PVIAt(want), q, 1e-14)
		}
		after := l.TimeAt(2) - bt // only water flows
		near(t, "after", after, unit*(2-qf)/lw, 1e-13*after)
	}
}

func TestRefusals(t *testing.T) {
	flow := fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: 5.93e-3}
	d, _ := displace.New(flow, 0.763, 0.213)
	for name, spoil := range map[string]func(*Layer, *fracflow.Flow){
		"length":       func(l *Layer, _ *fracflow.Flow) { l.Length = 0 },
		"area":         func(l *Layer, _ *fracflow.Flow) { l.Area = math.NaN() },
		"porosity":     func(l *Layer, _ *fracflow.Flow) { l.Porosity = 1.1 },
		"permeability": func(l *Layer, _ *fracflow.Flow) { l.Permeability = -1 },
		"volume":       func(l *Layer, _ *fracflow.Flow) { l.Bo = math.Inf(1) },
		"uptime":       func(l *Layer, _ *fracflow.Flow) { l.Uptime = 0 },
		"no drive":     func(l *Layer, _ *fracflow.Flow) { l.Drive = nil },
		"rate":         func(l *Layer, _ *fracflow.Flow) { l.Drive = ConstantRate{} },
		"pressure":     func(l *Layer, _ *fracflow.Flow) { l.Drive = ConstantPressure{-1} },
		"gravity":      func(_ *Layer, f *fracflow.Flow) { f.Gravity = 1e-3 },
	} {
		layer, f := rock(ConstantPressure{1e6}), flow
		spoil(&layer, &f)
		if _, err := NewLinear(layer, f, d); err == nil {
			t.Errorf("%s: accepted", name)
		} else if _, ok := err.(*InputError); !ok {
			t.Errorf("%s: %T", name, err)
		}
	}
}

// Published times, from memory. Dake (1978), exercise 10.2: a body of 625 x 40 x 2000 ft,
// porosity 0.18, 1000 rb/d: 4.39 years for a pore volume, 1.54 years to the break-through
// of his 0.35 pore volumes. Ahmed (2001), ch. 14: 775,779 bbl, 900 bbl/d, front slope 1.973:
// 436.88 days, 393,198 bbl, water-oil ratio at surface 4.34 for fw 0.78, Bo 1.25, Bw 1.02.
// The tolerances are the printed digits.
func TestPublishedTimes(t *testing.T) {
	const foot, barrel, day = 0.3048, 0.158987294928, 86400.0
	flow := fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: 5.93e-3} // takes no part in times at constant rate
	dake := build(t, Layer{Length: 2000 * foot, Area: 625 * 40 * foot * foot, Porosity: 0.18, Permeability: 1e-13, Bw: 1, Bo: 1.3, Uptime: 1,
		Drive: ConstantRate{1000 * barrel / day}}, flow, 0.763, 0.213)
	near(t, "years for a pore volume", dake.TimeAt(1)/(365*day), 4.39, 0.005)
	near(t, "years to 0.35", dake.TimeAt(0.35)/(365*day), 1.54, 0.005)

	length := 775779 * barrel / 100 / 0.2
	ahmed := build(t, Layer{Length: length, Area: 100, Porosity: 0.2, Permeability: 1e-13, Bw: 1.02, Bo: 1.25, Uptime: 1,
		Drive: ConstantRate{900 * barrel / day}}, flow, 0.763, 0.213)
	s := ahmed.AtPVI(1 / 1.973)
	near(t, "days", s.Time/day, 436.88, 0.02)
	near(t, "injected bbl", s.CumInjected/barrel, 393198, 1)
	cut := fracflow.SurfaceCut(0.78, 1.02, 1.25)
	near(t, "water-oil ratio", cut/(1-cut), 4.34, 0.006)
}
