package ride

import (
	"encoding/json"
	"math"
	"os"
	"testing"

	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

func near(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance) {
		t.Errorf("%s = %.15g, want %.15g: off by %.2g, allowed %.2g", what, got, want, got-want, tolerance)
	}
}

func read(t *testing.T, file string, into any) {
	t.Helper()
	text, err := os.ReadFile("../../testdata/" + file)
	if err == nil {
		err = json.Unmarshal(text, into)
	}
	if err != nil {
		t.Fatal(err)
	}
}

// flood is New for input that must be lawful.
func flood(t testing.TB, ahead, behind fracflow.Function, pivot Pivot, injected, initial float64) *Flood {
	t.Helper()
	f, err := New(ahead, behind, pivot, injected, initial)
	if err != nil {
		t.Fatal(err)
	}
	return f
}

type pair struct {
	Kr  relperm.Corey
	MuW float64 `json:"mu_w"`
	MuO float64 `json:"mu_o"`
}

func (p pair) flow() fracflow.Flow { return fracflow.Flow{Curves: p.Kr, MuW: p.MuW, MuO: p.MuO} }

type independent struct {
	ID     string
	Inputs struct {
		Ahead    pair    `json:"fluid_ahead"`
		Behind   pair    `json:"fluid_behind"`
		Injected float64 `json:"s_injected"`
		Initial  float64 `json:"s_initial"`
		A, B     float64
		Queries  []float64 `json:"pvi_list"`
	}
	Outputs map[string]any
	Errors  map[string]float64 `json:"est_error"`
}

// Independent SciPy computation, two methods: cases chem-01 (polymer) and chem-03 (water
// of low salinity). Tolerances are three times the estimated error of each value, and
// never less than the last digits of a double.
func TestIndependentFronts(t *testing.T) {
	var file struct{ Cases []independent }
	read(t, "independent/ride.json", &file)
	if len(file.Cases) != 2 {
		t.Fatalf("%d independent cases found, want 2", len(file.Cases))
	}
	for _, c := range file.Cases {
		t.Run(c.ID, func(t *testing.T) {
			in := c.Inputs
			f := flood(t, in.Ahead.flow(), in.Behind.flow(), Pivot{A: in.A, B: in.B}, in.Injected, in.Initial)
			check := func(key string, i int, got float64) {
				t.Helper()
				value := c.Outputs[key]
				if list, ok := value.([]any); ok {
					value = list[i]
				}
				near(t, key, got, value.(float64), 3*c.Errors[key]+4e-16)
			}
			v, behind, _ := f.Front()
			check("v_front", 0, v)
			check("s_front", 0, behind.S)
			check("front_breakthrough_pvi", 0, f.Arrival())
			bank, edge, ok := f.Bank()
			if !ok {
				t.Fatal("no bank")
			}
			check("s_bank", 0, bank.S)
			check("f_bank", 0, bank.F)
			check("v_bank_front", 0, edge)
			check("bank_breakthrough_pvi", 0, f.Breakthrough())
			waves := f.Waves()
			for i, speed := range c.Outputs["waves_ahead_speed"].([]any) {
				w := waves[len(waves)-len(c.Outputs["waves_ahead_speed"].([]any))+i]
				if w.Zone != Ahead {
					t.Errorf("wave %+v is not ahead of the front", w)
				}
				near(t, "speed ahead", w.SpeedAhead, speed.(float64), 3*c.Errors["waves_ahead_speed"])
			}
			for i, q := range in.Queries {
				s := f.After(q)
				check("savg", i, s.Average)
				check("recovery", i, s.Recovery)
				check("outlet_fw", i, s.Cut)
			}
		})
	}
}

func published(t *testing.T, id string, into any) {
	t.Helper()
	var file struct {
		Cases []json.RawMessage
	}
	read(t, "published/ride.json", &file)
	for _, c := range file.Cases {
		var head struct{ ID string }
		if json.Unmarshal(c, &head) == nil && head.ID == id {
			if err := json.Unmarshal(c, into); err != nil {
				t.Fatal(err)
			}
			return
		}
	}
	t.Fatalf("no published case %s", id)
}

// quadratic is the flow with the squares of saturation for curves, without residuals, of
// mobility ratio m.
func quadratic(m float64) fracflow.Flow {
	return fracflow.Flow{Curves: relperm.Corey{Krw0: 1, Kro0: 1, Nw: 2, No: 2}, MuW: 1e-3, MuO: m * 1e-3}
}

// Pope's (1980) construction, from memory, for quadratic curves: S3 solves the cubic
// 2 (1-S)(S+D) = S [M S² + (1-S)²]. Derived numbers: S3 to its six digits, what follows from
// it to five; the cubic itself to rounding.
func TestPolymerQuadratic(t *testing.T) {
	var p struct {
		Inputs struct {
			Mw, Mp float64
			D      []float64
		}
		Recomputed struct {
			S3      []float64
			F3      []float64 `json:"f3"`
			Polymer []float64 `json:"v_polymer"`
			S1      []*float64
			F1      []*float64                                 `json:"f1"`
			Water   []float64                                  `json:"v_water_front"`
			Second  struct{ Mw, Mp, D, S3, F3, V, S1 float64 } `json:"second_case"`
		}
	}
	published(t, "polymer-quadratic", &p)
	const digits = 0.5000001e-6
	cubic := func(s, d, m float64) float64 {
		return 2*(1-s)*(s+d) - s*(m*s*s+(1-s)*(1-s))
	}
	r := p.Recomputed
	for i, d := range p.Inputs.D {
		f := flood(t, quadratic(p.Inputs.Mw), quadratic(p.Inputs.Mp), Pivot{B: d}, 1, 0)
		v, behind, _ := f.Front()
		near(t, "S3", behind.S, r.S3[i], digits)
		near(t, "f3", behind.F, r.F3[i], 10*digits)
		near(t, "v of the polymer", v, r.Polymer[i], 10*digits)
		near(t, "the cubic", cubic(behind.S, d, p.Inputs.Mp), 0, 1e-14)
		near(t, "v of the water", 1/f.Breakthrough(), r.Water[i], 10*digits)
		bank, _, ok := f.Bank()
		if ok != (r.S1[i] != nil) {
			t.Fatalf("D = %g: a bank is %v", d, ok)
		}
		if ok {
			near(t, "S1", bank.S, *r.S1[i], 10*digits)
			near(t, "f1", bank.F, *r.F1[i], 10*digits)
		}
	}
	c := r.Second
	f := flood(t, quadratic(c.Mw), quadratic(c.Mp), Pivot{B: c.D}, 1, 0)
	v, behind, _ := f.Front()
	near(t, "S3", behind.S, c.S3, digits)
	near(t, "f3", behind.F, c.F3, 10*digits)
	near(t, "v", v, c.V, 100*digits)
	bank, _, _ := f.Bank()
	near(t, "S1", bank.S, c.S1, 10*digits)
}

// A front of heat where water alone flows runs at 1/(1+D) of the water, derived numbers
// to the digits given; what the oil carries then plays no part.
func TestThermalFront(t *testing.T) {
	var p struct {
		Inputs struct {
			Phi  []float64
			Rhos float64 `json:"rho_s"`
			Cs   float64 `json:"cs"`
			Rhow float64 `json:"rho_w"`
			Cw   float64 `json:"cw"`
		}
		Recomputed struct {
			Ratio []float64 `json:"vT_over_vw"`
			D     []float64
		}
	}
	published(t, "thermal-front", &p)
	for i, phi := range p.Inputs.Phi {
		h := Heat{Porosity: phi, Grains: p.Inputs.Rhos * p.Inputs.Cs, Water: p.Inputs.Rhow * p.Inputs.Cw}
		d, err := h.Pivot()
		if err != nil {
			t.Fatal(err)
		}
		near(t, "D", d.B, p.Recomputed.D[i], 0.6e-3)
		near(t, "a", d.A, 0, 0)
		h.Oil = 1.7e6
		carried, err := h.Pivot()
		if err != nil {
			t.Fatal(err)
		}
		for _, pivot := range []Pivot{d, carried} {
			// All oil is gone: no bank, the water moves at 1.
			f := flood(t, quadratic(5), quadratic(3), pivot, 1, 1)
			v, _, _ := f.Front()
			near(t, "v of the heat", v, p.Recomputed.Ratio[i], 0.6e-4)
			if _, _, ok := f.Bank(); ok {
				t.Error("a bank of water in water")
			}
		}
	}
}

// Ogata & Banks (1961), from memory: at the outlet, speed 1, to the digits given.
func TestTracerOgataBanks(t *testing.T) {
	var p struct {
		Inputs struct {
			T, Pe []float64
		}
		Recomputed struct{ Pe10, Pe100 []float64 }
	}
	published(t, "tracer-ogata-banks", &p)
	for i, q := range p.Inputs.T {
		near(t, "C at Pe 10", Tracer{1, p.Inputs.Pe[0]}.Concentration(1, q), p.Recomputed.Pe10[i], 0.51e-5)
		near(t, "C at Pe 100", Tracer{1, p.Inputs.Pe[1]}.Concentration(1, q), p.Recomputed.Pe100[i], 0.51e-5)
	}
}
