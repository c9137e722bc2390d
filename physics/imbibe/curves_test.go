package imbibe

import (
	"encoding/json"
	"math"
	"os"
	"path/filepath"
	"testing"

	"brinefront/physics/relperm"
)

// Small capillary curves with the formulas of the independent cases; the models of
// the product have tests of their own.

type vanGenuchten struct{ P0, N, Swr, Snr float64 }

func (c vanGenuchten) Ends() (low, high float64) { return c.Swr, 1 - c.Snr }
func (c vanGenuchten) Knots() []float64          { return nil }
func (c vanGenuchten) At(sw float64) (pc, slope float64) {
	low, high := c.Ends()
	switch {
	case sw <= low:
		return math.Inf(1), math.Inf(-1)
	case sw > high:
		return 0, 0
	}
	m, s := 1-1/c.N, (sw-low)/(high-low)
	// Se^(-1/m) - 1 next to Se = 1 by way of the distance from it.
	inner := math.Expm1(-math.Log1p(-(high-sw)/(high-low)) / m)
	if s < 0.5 {
		inner = math.Pow(s, -1/m) - 1
	}
	pc = c.P0 * math.Pow(inner, 1/c.N)
	return pc, -c.P0 / c.N * math.Pow(inner, 1/c.N-1) / m * math.Pow(s, -1/m-1) / (high - low)
}

type brooksCorey struct{ Pe, Lambda, Swr, Snr float64 }

func (c brooksCorey) Ends() (low, high float64) { return c.Swr, 1 - c.Snr }
func (c brooksCorey) Knots() []float64          { return nil }
func (c brooksCorey) At(sw float64) (pc, slope float64) {
	low, high := c.Ends()
	if sw > high {
		return c.Pe, 0
	}
	s := max(0, (sw-low)/(high-low))
	return c.Pe * math.Pow(s, -1/c.Lambda), -c.Pe / c.Lambda * math.Pow(s, -1/c.Lambda-1) / (high - low)
}

type skjaeveland struct{ Cw, Aw, Co, Ao, Swr, Sor float64 }

func (c skjaeveland) Ends() (low, high float64) { return c.Swr, 1 - c.Sor }
func (c skjaeveland) Knots() []float64          { return nil }
func (c skjaeveland) At(sw float64) (pc, slope float64) {
	low, high := c.Ends()
	switch {
	case sw <= low:
		return math.Inf(1), math.Inf(-1)
	case sw >= high:
		return math.Inf(-1), math.Inf(-1)
	}
	w, o := (sw-c.Swr)/(1-c.Swr), (high-sw)/(1-c.Sor)
	water, oil := c.Cw*math.Pow(w, -c.Aw), c.Co*math.Pow(o, -c.Ao)
	return water + oil, -c.Aw*water/(w*(1-c.Swr)) + c.Ao*oil/(o*(1-c.Sor))
}

// independentCase is a case of testdata/independent/selfsimilar.json.
type independentCase struct {
	ID     string
	Inputs struct {
		Kr             relperm.Corey
		Pc             json.RawMessage
		Mu_w, Mu_o     float64
		K, Phi, S_init float64
		S_inlet        *float64
		R, Time_s      float64
	}
	Outputs struct {
		A_m_per_sqrt_s, S_inlet, Cum_imbibed_m_at_time, Front_m_at_time float64
		S_list, X_m_at_time, F_of_s_list, D_of_s_list_m2_per_s          []float64
	}
	Est_error struct {
		A_m_per_sqrt_s, S_inlet, Cum_imbibed_m_at_time, Front_m_at_time, X_m_at_time, F_of_s_list, D_of_s_list_m2_per_s float64
	}
}

// span is the rock of the case between its two saturations.
func (c independentCase) span(t *testing.T) *Span {
	t.Helper()
	in := c.Inputs
	rock := Rock{Permeability: in.K, Porosity: in.Phi, Kr: in.Kr, WaterViscosity: in.Mu_w, OilViscosity: in.Mu_o}
	var kind struct{ Type string }
	must(t, json.Unmarshal(in.Pc, &kind))
	switch kind.Type {
	case "van_genuchten":
		var pc vanGenuchten
		must(t, json.Unmarshal(in.Pc, &pc))
		rock.Pc = pc
	case "skjaeveland":
		var pc skjaeveland
		must(t, json.Unmarshal(in.Pc, &pc))
		rock.Pc = pc
	default:
		t.Fatalf("%s: no model %q", c.ID, kind.Type)
	}
	inlet := math.NaN()
	if in.S_inlet != nil {
		inlet = *in.S_inlet
	}
	span, err := NewSpan(rock, in.S_init, inlet)
	must(t, err)
	return span
}

func independentCases(t *testing.T) []independentCase {
	t.Helper()
	var file struct{ Cases []independentCase }
	raw, err := os.ReadFile(filepath.Join("..", "..", "testdata", "independent", "selfsimilar.json"))
	must(t, err)
	must(t, json.Unmarshal(raw, &file))
	if len(file.Cases) == 0 {
		t.Fatal("no cases")
	}
	return file.Cases
}

func must(t *testing.T, err error) {
	t.Helper()
	if err != nil {
		t.Fatal(err)
	}
}

// within fails unless got is want within an absolute tolerance.
func within(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance) {
		t.Errorf("%s = %v, want %v within %g", what, got, want, tolerance)
	}
}
