package fracflow

import (
	"encoding/json"
	"math"
	"math/rand/v2"
	"os"
	"testing"

	"brinefront/physics/relperm"
)

func near(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance) {
		t.Errorf("%s = %.15g, want %.15g: off by %.2g, allowed %.2g", what, got, want, got-want, tolerance)
	}
}

// Independent SciPy computation, two methods: case ff-01. Tolerances are three times
// its estimated error.
func TestIndependentFractionalFlow(t *testing.T) {
	text, err := os.ReadFile("../../testdata/independent/displacement.json")
	if err != nil {
		t.Fatal(err)
	}
	var file struct {
		Cases []struct {
			ID     string
			Inputs struct {
				Fluid struct {
					Kr    relperm.Corey
					MuW   float64 `json:"mu_w"`
					MuO   float64 `json:"mu_o"`
					Ut    float64 `json:"u_t"`
					Theta float64 `json:"theta_deg"`
					K     float64 `json:"k"`
					RhoW  float64 `json:"rho_w"`
					RhoO  float64 `json:"rho_o"`
				}
				S []float64 `json:"s_list"`
			}
			Outputs struct {
				F      []float64
				Slopes []float64 `json:"df_dS"`
				M      float64   `json:"M_endpoint"`
				N      float64   `json:"N_gravity_Pa_s"`
			}
			Errors map[string]any `json:"est_error"`
		}
	}
	if err := json.Unmarshal(text, &file); err != nil {
		t.Fatal(err)
	}
	found := false
	for _, c := range file.Cases {
		if c.ID != "ff-01" {
			continue
		}
		found = true
		in := c.Inputs.Fluid
		const g = 9.80665
		n := in.K * (in.RhoW - in.RhoO) * g * math.Sin(in.Theta*math.Pi/180) / in.Ut
		near(t, "N", n, c.Outputs.N, 3*c.Errors["N_gravity_Pa_s"].(float64))
		flow := Flow{Curves: in.Kr, MuW: in.MuW, MuO: in.MuO, Gravity: n}
		near(t, "M", flow.EndPointMobilityRatio(), c.Outputs.M, 3*c.Errors["M_endpoint"].(float64))
		for i, s := range c.Inputs.S {
			f, d := flow.At(s)
			near(t, "f", f, c.Outputs.F[i], 3*c.Errors["f"].(float64))
			near(t, "df/dS", d, c.Outputs.Slopes[i], 3*c.Errors["df_dS"].(float64))
		}
	}
	if !found {
		t.Fatal("case ff-01 is gone")
	}
}

// Slopes of f and of the total mobility against central differences, over the whole
// range of random flows. The error of the difference is that of its third derivative taken
// from halving the step, and of rounding in f and in s.
func TestSlopes(t *testing.T) {
	r := rand.New(rand.NewPCG(3, 9))
	for range 400 {
		flow, _, _, what := draw(r)
		lo, hi := flow.Ends()
		bounds := append(append([]float64{lo}, flow.Knots()...), hi)
		for i := 1; i < len(bounds); i++ {
			for j := range 20 {
				a, b := bounds[i-1], bounds[i]
				s := a + (b-a)*(float64(j)+0.5)/20
				_, v, lt, dlt := flow.Full(s)
				difference := func(h float64) (df, dlt, size float64) {
					fp, _, lp, _ := flow.Full(s + h)
					fm, _, lm, _ := flow.Full(s - h)
					return (fp - fm) / (2 * h), (lp - lm) / (2 * h), 2 + 2*math.Abs(flow.Gravity)*lt // of the terms of f
				}
				h := (b - a) * 1e-4
				fa, la, size := difference(h)
				fb, lb, _ := difference(h / 2)
				if d := math.Abs(v - fb); d > 2*math.Abs(fa-fb)+1e-14*size/h+1e-15*s/h*math.Abs(v) {
					t.Fatalf("df/ds at %g: %g, by difference %g\n%.300s", s, v, fb, what)
				}
				if d := math.Abs(dlt - lb); d > 2*math.Abs(la-lb)+1e-14*lt/h+1e-15*s/h*math.Abs(dlt) {
					t.Fatalf("dlt/ds at %g: %g, by difference %g\n%.300s", s, dlt, lb, what)
				}
			}
		}
	}
}

func TestMobilityRatios(t *testing.T) {
	flow := Flow{Curves: relperm.Corey{Swc: 0.2, Sor: 0.2, Krw0: 0.3, Kro0: 0.8, Nw: 2, No: 2}, MuW: 0.5e-3, MuO: 5e-3}
	// 0.3/0.5 over 0.8/5, by hand: Dake (1978), exercise 10.1, prints 3.75 (from memory).
	near(t, "end-point M", flow.EndPointMobilityRatio(), 3.75, 1e-14)
	near(t, "piston front M", flow.FrontMobilityRatio(0.8, 0.2), 3.75, 1e-14)
}

func TestCut(t *testing.T) {
	for _, f := range []float64{0, 1} {
		if SurfaceCut(f, 1.02, 1.31) != f || ReservoirCut(f, 1.02, 1.31) != f {
			t.Errorf("cut %g is not kept", f)
		}
	}
	// Printed form of the definition, Dake (1978), ch. 10, water cut at surface: 1/(1 + (Bw/Bo)(1/f - 1)).
	for f := 0.05; f < 1; f += 0.05 {
		near(t, "surface cut", SurfaceCut(f, 1.02, 1.31), 1/(1+1.02/1.31*(1/f-1)), 1e-15)
		near(t, "there and back", ReservoirCut(SurfaceCut(f, 1.02, 1.31), 1.02, 1.31), f, 1e-15)
	}
	// Dake (1978), exercise 10.1, case 2, from memory: 0.70 in the reservoir is 0.75 at
	// surface with Bo = 1.3; printed to two decimals.
	near(t, "Dake", SurfaceCut(0.70, 1.0, 1.3), 0.75, 0.005)
}
