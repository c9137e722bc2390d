package fluid

import (
	"strings"
	"testing"
)

// TestPairLabels: each symbol follows the phase that plays the role.
func TestPairLabels(t *testing.T) {
	want := map[PairID]string{
		BrineOil: "krw fw Sw Swc | kro fo So Sor | imbibition",
		GasOil:   "krg fg Sg Sgc | kro fo SL SLr | drainage",
		BrineGas: "krw fw Sw Swc | krg fg Sg Sgr | imbibition",
		CO2Brine: "krg fg Sg Sgc | krw fw Sw Swirr | drainage",
	}
	labels := func(p Phase) string {
		return strings.Join([]string{p.Kr(), p.Flow(), p.Saturation, p.Immobile}, " ")
	}
	if len(Pairs()) != len(want) {
		t.Errorf("%d pairs, want %d", len(Pairs()), len(want))
	}
	for id, text := range want {
		p, ok := PairByID(id)
		if !ok {
			t.Errorf("no pair %q", id)
			continue
		}
		kind := "imbibition"
		if p.Drainage() {
			kind = "drainage"
		}
		if got := p.FilledByResident(); got != (id == CO2Brine) {
			t.Errorf("%s: filled by the resident phase alone: %v", id, got)
		}
		if got := labels(p.Displacing) + " | " + labels(p.Resident) + " | " + kind; got != text {
			t.Errorf("%s: %s\nwant %s", id, got, text)
		}
		// Given a wetting saturation of 0.25, the resident phase fills the rest exactly
		// when it is the one that does not wet.
		displacing := 0.25
		if p.Resident.Wetting {
			displacing = 0.75
		}
		if got := p.WettingSaturation(displacing); got != 0.25 {
			t.Errorf("%s: displacing saturation %g is wetting saturation %g", id, displacing, got)
		}
	}
	if _, ok := PairByID("tar-air"); ok {
		t.Error("a pair nobody has described")
	}
}

// TestPairContract holds for every pair.
func TestPairContract(t *testing.T) {
	seen := map[string]bool{}
	for _, p := range Pairs() {
		once := func(id string) {
			if seen[id] {
				t.Errorf("%s: %q twice", p.ID, id)
			}
			seen[id] = true
		}
		once(string(p.ID))
		if p.Displacing.Wetting == p.Resident.Wetting {
			t.Errorf("%s: one phase wets, the other does not", p.ID)
		}
		if p.Displacing.Symbol == p.Resident.Symbol || p.Displacing.Saturation == p.Resident.Saturation {
			t.Errorf("%s: both phases go by the same symbol", p.ID)
		}
		if p.Land != (p.Resident.ImmobileName == "trapped gas") {
			t.Errorf("%s: Land's law is for gas trapped as resident", p.ID)
		}
		compressibility := false
		for _, c := range p.Cautions {
			once(c.ID)
			if !strings.HasPrefix(c.ID, string(p.ID)+".") {
				t.Errorf("%s: caution %q belongs to another pair", p.ID, c.ID)
			}
			for _, text := range []string{c.Text, c.Cause, c.Do} {
				if !strings.HasSuffix(text, ".") {
					t.Errorf("%s: %q is not a sentence", c.ID, text)
				}
			}
			compressibility = compressibility || strings.Contains(c.Text, "Compressibility is ignored")
		}
		if !compressibility {
			t.Errorf("%s does not say that compressibility is ignored", p.ID)
		}
		for name, v := range map[string]Typical{
			"tension":              p.Tension,
			"displacing viscosity": p.Displacing.Viscosity, "displacing density": p.Displacing.Density,
			"resident viscosity": p.Resident.Viscosity, "resident density": p.Resident.Density,
		} {
			if !(0 < v.Low && v.Low < v.Value && v.Value < v.High) || v.Note == "" {
				t.Errorf("%s: typical %s %+v", p.ID, name, v)
			}
		}
	}
}

// TestTypicalBrine: what is called typical holds brine from a cool shallow to a hot deep
// reservoir, by the correlation.
func TestTypicalBrine(t *testing.T) {
	p, _ := PairByID(BrineOil)
	for _, c := range [][3]float64{{300, 5e6, 0.03}, {350, 20e6, 0.1}, {390, 35e6, 0.2}} {
		b, err := Brine(c[0], c[1], c[2])
		if err != nil {
			t.Fatal(err)
		}
		if v := p.Displacing.Viscosity; b.Viscosity < v.Low || b.Viscosity > v.High {
			t.Errorf("viscosity %g of brine at %v is outside what is called typical", b.Viscosity, c)
		}
		if v := p.Displacing.Density; b.Density < v.Low || b.Density > v.High {
			t.Errorf("density %g of brine at %v is outside what is called typical", b.Density, c)
		}
	}
}
