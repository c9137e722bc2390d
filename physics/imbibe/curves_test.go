package imbibe

import (
	"encoding/json"
	"math"
	"os"
	"path/filepath"
	"testing"

	"brinefront/physics/capillary"
	"brinefront/physics/relperm"
)

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
		var pc struct{ P0, N, Swr, Snr float64 }
		must(t, json.Unmarshal(in.Pc, &pc))
		rock.Pc = capillary.VanGenuchten{Swr: pc.Swr, Snr: pc.Snr, P0: pc.P0, N: pc.N, M: 1 - 1/pc.N}
	case "skjaeveland":
		var pc capillary.Skjaeveland
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
