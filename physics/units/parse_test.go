package units

import (
	"errors"
	"math"
	"strings"
	"testing"
)

func TestParseNumber(t *testing.T) {
	for text, want := range map[string]float64{
		"0.25": 0.25, ".25": 0.25, "25.": 25, "0": 0, "-0": 0, "007": 7,
		"1e-3": 0.001, "1E+3": 1000, "2.5e2": 250, "1e\u22123": 0.001,
		"-4": -4, "\u22124.5": -4.5, "+4": 4, "- 4": -4, "  12\t": 12, "\u00a012\u00a0": 12,
		"1 234.5": 1234.5, "1 234,5": 1234.5, "1\u2009234": 1234, "1\u202f234\u202f567.8": 1234567.8, "12\u00a0345": 12345,
		"1,234.5": 1234.5, "1.234,5": 1234.5, "1,234,567": 1234567, "1.234.567": 1234567, "1,234,567.8": 1234567.8, "1.234.567,8": 1234567.8,
		"0,25": 0.25, ",5": 0.5, "0,123": 0.123, "1234,567": 1234.567, "12,34": 12.34, "1,2345": 1.2345, "1 234,567": 1234.567,
		"1.234": 1.234, "5e-324": 5e-324, "0e-999": 0, "1.7976931348623157e308": math.MaxFloat64,
	} {
		if got, err := ParseNumber(text); err != nil || got != want || math.Signbit(got) && got == 0 {
			t.Errorf("%q: %v, %v; want %v", text, got, err, want)
		}
	}
}

func TestParseNumberRefuses(t *testing.T) {
	for text, says := range map[string]string{
		"":          "read nothing; allowed: a number such as 0.25",
		" \t ":      "read nothing",
		"abc":       "read “abc”; allowed: a number such as 0.25",
		"1,234":     "read “1,234”, which can mean 1.234 or 1234; allowed: a decimal point as in 1.234",
		"-12,345":   "which can mean 12.345 or 12345",
		"1,234e3":   "which can mean 1.234 or 1234",
		"1e999":     "read “1e999”, larger than a number can hold",
		"-1e999":    "larger than a number can hold",
		"1e-999":    "smaller than a number can hold",
		"inf":       "read “inf”",
		"+Infinity": "a number such as",
		"NaN":       "a number such as",
		"0x1F":      "a number such as",
		"1_000":     "a number such as",
		"1e":        "a number such as", "e5": "a number such as", "1e5.5": "a number such as", "1e-": "a number such as", "1ee5": "a number such as",
		".": "a number such as", ",": "a number such as", "-": "a number such as", "--4": "a number such as", "4-": "a number such as",
		"1 23": "a number such as", "1  234": "a number such as", "1 2345": "a number such as", "0 123": "a number such as",
		"1,23,456": "a number such as", "1.2.3": "a number such as", "1,234.567,8": "a number such as", "1 234,567.8": "a number such as",
		"1.5,000,000": "a number such as", "0.25 0.5": "a number such as", "1.234 567": "a number such as", "1/2": "a number such as", "١٢": "a number such as",
		"5%":                       "a number such as",
		strings.Repeat("9x", 5000): "“" + strings.Repeat("9x", 20) + "…”; allowed",
	} {
		got, err := ParseNumber(text)
		var refused *ReadError
		if !errors.As(err, &refused) {
			t.Errorf("%q: %v, %v; want a refusal", text, got, err)
			continue
		}
		if got != 0 || !strings.Contains(err.Error(), says) {
			t.Errorf("%q: %v, %q; want %q in it", text, got, err, says)
		}
	}
}

func TestParse(t *testing.T) {
	for _, c := range []struct {
		quantity   Quantity
		text, unit string // unit is the one that applies without another
		number     float64
		read       string
	}{
		{Viscosity, "5", "cp", 5, "cp"},
		{Viscosity, "5", "mPa.s", 5, "mPa.s"},
		{Viscosity, "5 cP", "mPa.s", 5, "cp"},
		{Viscosity, "5CP", "mPa.s", 5, "cp"},
		{Viscosity, "0,9 mPa·s", "cp", 0.9, "mPa.s"},
		{Viscosity, "9e-4 Pa s", "cp", 9e-4, "Pa.s"},
		{Permeability, "120 mD", "D", 120, "md"},
		{Permeability, "1.2 d", "md", 1.2, "D"},
		{Permeability, "1.2 Darcy", "md", 1.2, "D"},
		{Permeability, "0.3 µm2", "md", 0.3, "um2"},
		{Permeability, "0.3 μm²", "md", 0.3, "um2"},
		{Fraction, "12%", "fraction", 12, "%"},
		{Fraction, "0.2 fraction", "%", 0.2, "fraction"},
		{Share, "95 percent", "fraction", 95, "%"},
		{PoreVolumes, "40 %PV", "PV", 40, "%PV"},
		{Area, "1,234.5 ft²", "acre", 1234.5, "ft2"},
		{Area, "3 ft^2", "acre", 3, "ft2"},
		{Rate, "300 bbl/day", "m3/d", 300, "bbl/d"},
		{Rate, "300 STB/D", "m3/d", 300, "bbl/d"},
		{Rate, "1 200 m³/d", "bbl/d", 1200, "m3/d"},
		{Rate, "1200 M3/DAY", "bbl/d", 1200, "m3/d"},
		{Rate, "2 cc/hr", "bbl/d", 2, "cm3/h"},
		{Rate, "2 m3/second", "bbl/d", 2, "m3/s"},
		{Duration, "30 days", "yr", 30, "d"},
		{Duration, "1.5 Years", "d", 1.5, "yr"},
		{Duration, "5 MIN", "d", 5, "min"},
		{Length, "3 M", "ft", 3, "m"},
		{Length, "3 feet", "m", 3, "ft"},
		{Volume, "2 Mbbl", "bbl", 2, "Mbbl"},
		{Pressure, "2 MPa", "psi", 2, "MPa"},
		{Pressure, "2e3 PSI", "bar", 2000, "psi"},
		{Angle, "\u221212°", "rad", -12, "deg"},
		{Temperature, "83 °C", "degF", 83, "degC"},
		{Temperature, "83°c", "degF", 83, "degC"},
		{Temperature, "83 C", "degF", 83, "degC"},
		{Temperature, "181 degF", "degC", 181, "degF"},
		{Temperature, "181 °F", "degC", 181, "degF"},
		{Temperature, "356 K", "degC", 356, "K"},
		{Temperature, "\u22124", "degC", -4, "degC"},
		{Salinity, "3.5%", "ppm", 3.5, "wt%"},
		{Salinity, "3.5 wt %", "ppm", 3.5, "wt%"},
		{Salinity, "35 000 ppm", "wt%", 35000, "ppm"},
		{Salinity, "35 g/kg", "wt%", 35, "g/kg"},
		{InterfacialTension, "30 dyne/cm", "mN/m", 30, "dyn/cm"},
		{InterfacialTension, "30 mN/m", "dyn/cm", 30, "mN/m"},
		{Number, "2.5", "", 2.5, ""},
	} {
		unit, ok := Find(c.quantity, c.unit)
		if !ok {
			t.Fatalf("no unit %q of %s", c.unit, c.quantity)
		}
		if number, u, err := Parse(c.quantity, c.text, unit); err != nil || number != c.number || u.Symbol != c.read || u.Quantity != c.quantity {
			t.Errorf("%s %q: %v %q, %v; want %v %q", c.quantity, c.text, number, u.Symbol, err, c.number, c.read)
		}
	}
}

func TestParseRefuses(t *testing.T) {
	for _, c := range []struct {
		quantity   Quantity
		text, says string
	}{
		{Viscosity, "", "read nothing"},
		{Viscosity, "cp", "a number such as"},
		{Viscosity, "5 MPa.s", "read the unit “MPa.s”; allowed: cp, mPa·s or Pa·s, or the number alone"}, // megapascals are not millipascals
		{Viscosity, "5 md", "allowed: cp, mPa·s or Pa·s"},
		{Pressure, "2 mPa", "allowed: psi, kPa, bar, MPa, atm or Pa"},
		{Volume, "2 mbbl", "Mbbl"},
		{Permeability, "2 MD", "md, D, µm² or m²"},
		{Duration, "5 fortnights", "read the unit “fortnights”"},
		{Number, "3 cp", "allowed: a number without a unit"},
		{Temperature, "80 R", "°C, °F or K, or the number alone"},
		{Salinity, "35 g/l", "wt%, g/kg or ppm, or the number alone"}, // needs a density
		{InterfacialTension, "30 MN/m", "mN/m, dyn/cm or N/m"},
		{Fraction, "1,234 %", "which can mean 1.234 or 1234"},
		{Fraction, "1e999 %", "larger than a number can hold"},
		{Fraction, "five %", "a number such as"},
		{Fraction, "inf", "a number such as"},
		{Fraction, "0.2 <script>", "read “0.2 <”"},
	} {
		unit := Of(c.quantity)[0]
		number, u, err := Parse(c.quantity, c.text, unit)
		var refused *ReadError
		if !errors.As(err, &refused) || number != 0 || u != unit || !strings.Contains(err.Error(), c.says) {
			t.Errorf("%s %q: %v %q, %v; want %q", c.quantity, c.text, number, u.Symbol, err, c.says)
		}
	}
}

// TestNames: every way to write a unit means that unit, and nothing else of its quantity.
func TestNames(t *testing.T) {
	used := map[string]bool{}
	for _, u := range catalogue {
		used[u.Symbol] = true
		if u.Symbol == "" {
			continue
		}
		for _, text := range append([]string{u.Symbol, u.Label()}, names[u.Symbol]...) {
			if got, ok := match(u.Quantity, text); !ok || got != u {
				t.Errorf("%q of %s means %q, %v; want %q", text, u.Quantity, got.Symbol, ok, u.Symbol)
			}
		}
	}
	for symbol := range names {
		if !used[symbol] {
			t.Errorf("names for %q, which is no unit", symbol)
		}
	}
}

func FuzzParseNumber(f *testing.F) {
	for _, seed := range []string{"0.25", "1 234.5", "1.234,5", "1,234", "1e999", "\u22125e\u22123", "inf", "0x1p4", "1_0", "e", ",", "1,234,567.8"} {
		f.Add(seed)
	}
	f.Fuzz(func(t *testing.T, text string) {
		number, err := ParseNumber(text)
		if math.IsNaN(number) || math.IsInf(number, 0) {
			t.Fatalf("%q reads as %v", text, number)
		}
		if err != nil {
			return
		}
		if back, err := ParseNumber(Exact(number)); err != nil || back != number {
			t.Fatalf("%q reads as %v, which comes back as %v, %v", text, number, back, err)
		}
	})
}

func FuzzParse(f *testing.F) {
	for _, seed := range []string{"5 cp", "12%", "1e5e", "°", "m", "3 M", "µ", "5 \u212aPa", "1e-3 m³/d"} {
		f.Add(seed)
	}
	f.Fuzz(func(t *testing.T, text string) {
		for _, s := range Systems {
			for _, q := range []Quantity{Number, Share, Viscosity, Permeability, Pressure, Rate, Angle, Temperature, Salinity} {
				number, u, err := Parse(q, text, s.Unit(q))
				if u.Quantity != q || math.IsNaN(number) || math.IsInf(number, 0) || err != nil && number != 0 {
					t.Fatalf("%s %q: %v %q, %v", q, text, number, u.Symbol, err)
				}
			}
		}
	})
}
