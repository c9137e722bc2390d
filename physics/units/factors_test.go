package units

import (
	"encoding/json"
	"math"
	"os"
	"path/filepath"
	"testing"
)

// TestFactors compares every unit with a published value; each row of the file
// names its source and whether it was read or is from memory.
func TestFactors(t *testing.T) {
	raw, err := os.ReadFile(filepath.Join("..", "..", "testdata", "published", "units.json"))
	if err != nil {
		t.Fatal(err)
	}
	var file struct {
		Units []struct {
			Quantity        Quantity
			Unit, Source    string
			Times, SI, Half float64
		}
	}
	if err := json.Unmarshal(raw, &file); err != nil {
		t.Fatal(err)
	}
	checked := map[Unit]bool{}
	for _, row := range file.Units {
		u, ok := Find(row.Quantity, row.Unit)
		if !ok {
			t.Errorf("no unit %q of %s", row.Unit, row.Quantity)
			continue
		}
		checked[u] = true
		tolerance := row.Half + 3e-16*row.SI // an exact value may still be rounded: a sum and a product
		if got := u.ToSI(row.Times); math.Abs(got-row.SI) > tolerance {
			t.Errorf("%g %s = %.17g, published %.17g ± %g (%s)", row.Times, row.Unit, got, row.SI, row.Half, row.Source)
		}
		if back := u.FromSI(u.ToSI(3.7)); math.Abs(back-3.7) > 1e-15+2e-16*u.Zero {
			t.Errorf("3.7 %s comes back as %.17g", row.Unit, back)
		}
	}
	for _, u := range catalogue {
		if !checked[u] {
			t.Errorf("the unit %q of %s is compared with no published value", u.Symbol, u.Quantity)
		}
	}
}

// TestFieldConstants: products of factors that the trade prints as one constant.
func TestFieldConstants(t *testing.T) {
	si := func(q Quantity, symbol string) float64 {
		u, ok := Find(q, symbol)
		if !ok {
			t.Fatalf("no unit %q of %s", symbol, q)
		}
		return u.Factor
	}
	darcy := si(Permeability, "md") * si(Area, "ft2") * si(Pressure, "psi") / (si(Viscosity, "cp") * si(Length, "ft")) / si(Rate, "bbl/d")
	foot := si(Length, "ft")
	for _, c := range []struct {
		name             string
		got, want, half  float64
		sourceProvenance string
	}{
		{"Darcy's law in field units", darcy, 0.00112712, 0.5e-8, "Chaudhry (2004) tables A-1, A-4, A-5, read"},
		{"cubic feet in a barrel", si(Volume, "bbl") / si(Volume, "ft3"), 5.615, 0.5e-3, "common field constant, from memory"},
		{"barrels in an acre foot", si(Area, "acre") * foot / si(Volume, "bbl"), 7758, 0.5, "common field constant, from memory"},
		{"radial flow in field units", 2 * math.Pi * darcy, 0.00708, 0.5e-5, "common field constant, from memory"},
		{"the reciprocal of it", 1 / (2 * math.Pi * darcy), 141.2, 0.05, "common field constant, from memory"},
		{"gradient of 62.4 lb/ft3, psi/ft", 62.4 * si(Density, "lb/ft3") * StandardGravity * foot / si(Pressure, "psi"), 0.433, 0.5e-3, "fresh water, from memory"},
		{"gradient of 1 g/cm3, psi/ft", si(Density, "g/cm3") * StandardGravity * foot / si(Pressure, "psi"), 0.4335, 0.5e-4, "fresh water, from memory"},
	} {
		if math.Abs(c.got-c.want) > c.half {
			t.Errorf("%s = %.9g, printed %g (%s)", c.name, c.got, c.want, c.sourceProvenance)
		}
	}
}

// TestSystemsAreWhole: every system has a unit for every quantity, of that quantity.
func TestSystemsAreWhole(t *testing.T) {
	quantities := map[Quantity]bool{}
	for _, u := range catalogue {
		quantities[u.Quantity] = true
	}
	if len(Systems) != 3 || len(quantities) < 21 {
		t.Fatalf("%d systems and %d quantities", len(Systems), len(quantities))
	}
	for _, s := range Systems {
		if !s.Valid() {
			t.Errorf("%s is listed but not valid", s)
		}
		for q := range quantities {
			if u := s.Unit(q); u.Quantity != q || u.Factor <= 0 {
				t.Errorf("%s: unit of %s is %+v", s, q, u)
			}
		}
		for q := range defaults[s] {
			if !quantities[q] {
				t.Errorf("%s names a unit for %s, which has none", s, q)
			}
		}
	}
	if System("imperial").Valid() {
		t.Error("an unknown system is valid")
	}
}
