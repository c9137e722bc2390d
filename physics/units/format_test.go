package units

import (
	"math"
	"strings"
	"testing"
)

// seen writes the invisible spaces of a printed text so that tests can show them.
func seen(text string) string {
	return strings.NewReplacer("\u202f", "'", "\u00a0", "~", "\u2212", "−").Replace(text)
}

func TestFormat(t *testing.T) {
	for _, c := range []struct {
		number float64
		digits int
		want   string // ' is the narrow no-break space
	}{
		{0, 4, "0"}, {math.Copysign(0, -1), 4, "0"}, {1, 4, "1"}, {0.34, 4, "0.34"}, {0.342, 2, "0.34"},
		{0.99996, 4, "1"}, {9.9996, 4, "10"}, {1234.5678, 6, "1234.57"}, {1234, 2, "1200"}, {9999, 4, "9999"}, {9999.6, 4, "10'000"},
		{10000, 4, "10'000"}, {123456, 4, "123'500"}, {1234567.25, 9, "1'234'567.25"}, {9999999, 7, "9'999'999"},
		{9999999, 4, "1e7"}, {1e7, 4, "1e7"}, {12345678, 4, "1.235e7"}, {1e100, 4, "1e100"},
		{0.0001, 4, "0.0001"}, {0.000123456, 4, "0.0001235"}, {0.0000999999, 3, "0.0001"}, {0.00009, 4, "9e−5"}, {1.25e-15, 4, "1.25e−15"},
		{-0.25, 4, "−0.25"}, {-123456, 6, "−123'456"}, {-2e-7, 3, "−2e−7"},
		{2.5, 0, "2"}, {math.Inf(1), 4, "∞"}, {math.Inf(-1), 4, "−∞"}, {math.NaN(), 4, "not a number"},
	} {
		if got := seen(Format(c.number, c.digits)); got != c.want {
			t.Errorf("Format(%v, %d) = %q, want %q", c.number, c.digits, got, c.want)
		}
	}
}

func TestExact(t *testing.T) {
	for number, want := range map[float64]string{
		0: "0", 0.25: "0.25", 1234567: "1234567", 123456.75: "123456.75", -0.0001: "-0.0001", 1e7: "1e7", 1.5e-5: "1.5e-5", 0.30000000000000004: "0.30000000000000004",
		math.MaxFloat64: "1.7976931348623157e308", math.SmallestNonzeroFloat64: "5e-324", math.Inf(1): "∞", math.NaN(): "not a number",
	} {
		if got := Exact(number); got != want {
			t.Errorf("Exact(%v) = %q, want %q", number, got, want)
		}
	}
}

func TestPrint(t *testing.T) {
	for _, c := range []struct {
		quantity Quantity
		si       float64
		symbol   string
		want     string // ~ is the no-break space
	}{
		{Viscosity, 0.0042, "cp", "4.2~cp"}, {Viscosity, 0.0042, "mPa.s", "4.2~mPa·s"}, {Rate, 2, "m3/d", "172'800~m³/d"},
		{Area, 10, "ft2", "107.6~ft²"}, {Permeability, 1e-12, "um2", "1~µm²"}, {Fraction, 0.342, "fraction", "0.342"}, {Fraction, 0.342, "%", "34.2~%"},
		{Share, 0.95, "%", "95~%"}, {Number, 2.5, "", "2.5"}, {PoreVolumes, 0.34, "PV", "0.34~PV"}, {Angle, -math.Pi / 6, "deg", "−30°"},
		{Density, 1000, "g/cm3", "1~g/cm³"}, {Temperature, 353.15, "degC", "80~°C"}, {Temperature, 353.15, "degF", "176~°F"}, {Salinity, 0.035, "wt%", "3.5~wt%"},
	} {
		u, ok := Find(c.quantity, c.symbol)
		if !ok {
			t.Fatalf("no unit %q of %s", c.symbol, c.quantity)
		}
		if got := seen(Print(c.si, u, 4)); got != c.want {
			t.Errorf("Print(%v, %s) = %q, want %q", c.si, c.symbol, got, c.want)
		}
	}
}

// FuzzFormat: what is printed for reading can be pasted back, and at seventeen
// digits nothing is lost.
func FuzzFormat(f *testing.F) {
	for _, seed := range []float64{0, 0.1, -1234567.891, 9999999.5, 1e-5, math.MaxFloat64, 5e-324} {
		f.Add(seed)
	}
	f.Fuzz(func(t *testing.T, number float64) {
		if math.IsNaN(number) || math.IsInf(number, 0) {
			return
		}
		for name, text := range map[string]string{"Format": Format(number, 17), "Exact": Exact(number)} {
			if back, err := ParseNumber(text); err != nil || back != number {
				t.Errorf("%s(%v) = %q, which reads as %v, %v", name, number, text, back, err)
			}
		}
	})
}
