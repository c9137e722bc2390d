package fluid

import (
	"encoding/json"
	"errors"
	"math"
	"os"
	"path/filepath"
	"strings"
	"testing"
)

// published is testdata/published/fluid.json; its entries say where they come from.
type published struct {
	Viscosity      struct{ TK, Rho, MuPas []float64 }
	Region1        struct{ TK, PMPa, V, Cp []float64 }
	Saturation     struct{ TK, PMPa []float64 }
	Saturated      struct{ TK, MolDm3, MuPas []float64 }
	BatzleWang     struct{ TC, PMPa, S, Rho, MuCp []float64 }
	McCain         struct{ TF, SPercent, MuCp, DensitySPercent, LbFt3 []float64 }
	SodiumChloride struct {
		TC           float64
		S, Rho, MuCp []float64
	}
	SeaWater struct {
		TC        []float64
		S         float64
		Rho, MuCp []float64
		Cp        float64
	}
}

func readPublished(t *testing.T) published {
	t.Helper()
	raw, err := os.ReadFile(filepath.Join("..", "..", "testdata", "published", "fluid.json"))
	if err != nil {
		t.Fatal(err)
	}
	var p published
	if err := json.Unmarshal(raw, &p); err != nil {
		t.Fatal(err)
	}
	return p
}

// near fails unless got is within a relative tolerance of want.
func near(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance*math.Abs(want)) {
		t.Errorf("%s = %.10g, want %.10g within %.2g of it (off by %.2g)", what, got, want, tolerance, got/want-1)
	}
}

func rows(t *testing.T, list []float64) []float64 {
	t.Helper()
	if len(list) == 0 {
		t.Fatal("no published values")
	}
	return list
}

// TestWaterViscosity reproduces all points of the release's verification table
// (read): six decimals in units of 1e-6 Pa s; the first value is on file with four.
func TestWaterViscosity(t *testing.T) {
	v := readPublished(t).Viscosity
	for i, tK := range rows(t, v.TK) {
		got, err := WaterViscosity(tK, v.Rho[i])
		if err != nil {
			t.Fatal(err)
		}
		if half := 0.51e-6; math.Abs(got*1e6-v.MuPas[i]) > half {
			t.Errorf("mu(%g K, %g kg/m3) = %.7f, want %.6f", tK, v.Rho[i], got*1e6, v.MuPas[i])
		}
	}
}

// TestWaterRegion1 reproduces the release's verification table to nine figures:
// volume (read) and heat capacity (from memory), which together use every coefficient.
func TestWaterRegion1(t *testing.T) {
	r := readPublished(t).Region1
	const nineFigures = 5.1e-9
	for i, tK := range rows(t, r.TK) {
		w, err := Water(tK, r.PMPa[i]*1e6)
		if err != nil {
			t.Fatal(err)
		}
		near(t, "v", 1/w.Density, r.V[i], nineFigures)
		near(t, "cp", w.HeatCapacity/1000, r.Cp[i], nineFigures)
	}
}

// TestSaturationPressure reproduces the release's verification table (from memory).
func TestSaturationPressure(t *testing.T) {
	s := readPublished(t).Saturation
	for i, tK := range rows(t, s.TK) {
		p, err := SaturationPressure(tK)
		if err != nil {
			t.Fatal(err)
		}
		near(t, "saturation pressure", p/1e6, s.PMPa[i], 5.1e-9)
	}
}

// TestSaturatedWater compares with Perry's table 2-135 (read), an older formulation:
// within 0.1 % for viscosity; density within the five figures and the difference of
// formulations, 0.01 %.
func TestSaturatedWater(t *testing.T) {
	s := readPublished(t).Saturated
	const molarMass = 18.015268 // kg/kmol, IAPWS
	for i, tK := range rows(t, s.TK) {
		p, err := SaturationPressure(tK)
		if err != nil {
			t.Fatal(err)
		}
		w, err := Water(tK, p)
		if err != nil {
			t.Fatal(err)
		}
		near(t, "density", w.Density, s.MolDm3[i]*molarMass, 1e-4)
		near(t, "viscosity", w.Viscosity*1e6, s.MuPas[i], 1e-3)
	}
}

// TestWaterIsSmooth: no property jumps or kinks inside the range.
func TestWaterIsSmooth(t *testing.T) {
	const step = 1e-3
	for p := 20e6; p <= 100e6; p += 20e6 {
		for tK := 274.0; tK < 623; tK++ {
			a, errA := Water(tK-step, p)
			b, errB := Water(tK, p)
			c, errC := Water(tK+step, p)
			if err := errors.Join(errA, errB, errC); err != nil {
				t.Fatal(err)
			}
			near(t, "density between neighbours", b.Density, (a.Density+c.Density)/2, 1e-9)
			near(t, "viscosity between neighbours", b.Viscosity, (a.Viscosity+c.Viscosity)/2, 1e-8)
			near(t, "heat capacity between neighbours", b.HeatCapacity, (a.HeatCapacity+c.HeatCapacity)/2, 1e-8)
		}
	}
}

func TestWaterRange(t *testing.T) {
	for _, c := range []struct {
		t, p float64
		of   Variable
	}{
		{273.14, 1e6, Temperature},
		{623.16, 50e6, Temperature},
		{math.NaN(), 50e6, Temperature},
		{300, 100.1e6, Pressure},
		{300, math.NaN(), Pressure},
		{500, 2.638e6, Pressure}, // boils at 2.6389 MPa
	} {
		_, err := Water(c.t, c.p)
		var out *RangeError
		if !errors.As(err, &out) || out.Variable != c.of {
			t.Errorf("Water(%g, %g): error %v, want one about %s", c.t, c.p, err, c.of)
		}
	}
	for _, c := range []struct {
		t, rho float64
		of     Variable
	}{{1173.2, 1, Temperature}, {300, -1, Density}, {300, 1200.1, Density}, {300, math.NaN(), Density}} {
		_, err := WaterViscosity(c.t, c.rho)
		var out *RangeError
		if !errors.As(err, &out) || out.Variable != c.of {
			t.Errorf("WaterViscosity(%g, %g): error %v, want one about %s", c.t, c.rho, err, c.of)
		}
	}
	if _, err := SaturationPressure(647.2); err == nil {
		t.Error("saturation pressure above the critical temperature")
	}
}

// TestRangeErrorTells: what was read and what is allowed.
func TestRangeErrorTells(t *testing.T) {
	_, err := Water(700, 1e6)
	for _, want := range []string{"temperature 700 K", "273.15 to 623.15 K"} {
		if !strings.Contains(err.Error(), want) {
			t.Errorf("%q lacks %q", err, want)
		}
	}
}

func BenchmarkWater(b *testing.B) {
	for b.Loop() {
		if _, err := Water(350, 20e6); err != nil {
			b.Fatal(err)
		}
	}
}

func BenchmarkWaterViscosity(b *testing.B) {
	for b.Loop() {
		if _, err := WaterViscosity(350, 980); err != nil {
			b.Fatal(err)
		}
	}
}
