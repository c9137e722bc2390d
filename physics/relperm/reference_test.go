package relperm

import (
	"encoding/json"
	"math"
	"os"
	"path/filepath"
	"testing"
)

// readData reads a file of testdata; its header says where the values come from.
func readData(t *testing.T, into any, parts ...string) {
	t.Helper()
	raw, err := os.ReadFile(filepath.Join(append([]string{"..", "..", "testdata"}, parts...)...))
	if err != nil {
		t.Fatal(err)
	}
	if err := json.Unmarshal(raw, into); err != nil {
		t.Fatal(err)
	}
}

// TestIndependentCases compares with an independent SciPy computation, two methods.
func TestIndependentCases(t *testing.T) {
	var file struct {
		Cases []struct {
			ID string
			Kr struct {
				Type string
				Corey
				LET
				Swc, Sor, Krw0, Kro0 float64
			}
			S, Krw, Kro, Dkrw, Dkro []float64
			KrwAtMax, KroAtMin      float64
			Error                   struct{ Krw, Kro, Dkrw, Dkro float64 }
		}
	}
	readData(t, &file, "independent", "relperm.json")
	if len(file.Cases) == 0 {
		t.Fatal("no cases")
	}
	for _, c := range file.Cases {
		var curves Curves
		switch k := c.Kr; k.Type {
		case "corey":
			curves = Corey{k.Swc, k.Sor, k.Krw0, k.Kro0, k.Nw, k.No}
		case "let":
			curves = LET{k.Swc, k.Sor, k.Krw0, k.Kro0, k.Lw, k.Ew, k.Tw, k.Lo, k.Eo, k.To}
		default:
			t.Fatalf("%s: no model %q", c.ID, k.Type)
		}
		near := func(name string, got, want, tolerance float64) {
			if !(math.Abs(got-want) <= tolerance) {
				t.Errorf("%s: %s = %v, want %v within %g", c.ID, name, got, want, tolerance)
			}
		}
		for i, s := range c.S {
			p := curves.At(s)
			near("krw", p.Krw, c.Krw[i], c.Error.Krw)
			near("kro", p.Kro, c.Kro[i], c.Error.Kro)
			near("dkrw/dsw", p.DKrw, c.Dkrw[i], c.Error.Dkrw)
			near("dkro/dsw", p.DKro, c.Dkro[i], c.Error.Dkro)
		}
		swc, swmax := curves.Ends()
		near("krw(swmax)", curves.At(swmax).Krw, c.KrwAtMax, 0)
		near("kro(swc)", curves.At(swc).Kro, c.KroAtMin, 0)
	}
}

// TestPublished compares with formulas of Lomeland, Ebeltoft & Thomas (2005) and
// Corey (1954), both from memory.
func TestPublished(t *testing.T) {
	var file struct {
		LET struct {
			L, E, T float64
			S, Kr   []float64
		}
		Corey struct{ Nw, S, Krw float64 }
	}
	readData(t, &file, "published", "relperm.json")
	l := file.LET
	if len(l.S) == 0 {
		t.Fatal("no values")
	}
	// The water branch at s and the oil branch at 1-s are the same formula.
	curves := LET{Krw0: 1, Kro0: 1, Lw: l.L, Ew: l.E, Tw: l.T, Lo: l.L, Eo: l.E, To: l.T}
	for i, s := range l.S {
		const tolerance = 0.5e-6 // six decimals
		if got := curves.At(s).Krw; math.Abs(got-l.Kr[i]) > tolerance {
			t.Errorf("LET krw(%g) = %v, want %v", s, got, l.Kr[i])
		}
		if got := curves.At(1 - s).Kro; math.Abs(got-l.Kr[i]) > tolerance {
			t.Errorf("LET kro(%g) = %v, want %v", 1-s, got, l.Kr[i])
		}
	}
	corey := Corey{Krw0: 1, Kro0: 1, Nw: file.Corey.Nw, No: 2}
	if got := corey.At(file.Corey.S).Krw; math.Abs(got-file.Corey.Krw) > 1e-16 {
		t.Errorf("Corey krw(%g) = %v, want %v", file.Corey.S, got, file.Corey.Krw)
	}
}

// TestLETSymmetry: L = T and E = 1 give one half at s = 1/2 for any L, by the formula.
func TestLETSymmetry(t *testing.T) {
	for _, l := range []float64{1, 1.7, 3, 20, 900} {
		c := LET{Krw0: 1, Kro0: 1, Lw: l, Ew: 1, Tw: l, Lo: l, Eo: 1, To: l}
		if p := c.At(0.5); math.Abs(p.Krw-0.5) > 1e-15 || math.Abs(p.Kro-0.5) > 1e-15 {
			t.Errorf("L = %g: %+v at s = 1/2", l, p)
		}
	}
}
