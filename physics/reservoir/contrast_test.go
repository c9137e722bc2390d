package reservoir

import (
	"encoding/json"
	"math"
	"math/rand/v2"
	"os"
	"testing"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

func evenly(k ...float64) []Sample {
	var list []Sample
	for _, x := range k {
		list = append(list, Sample{Thickness: 1, Permeability: x, Porosity: 0.2})
	}
	return list
}

// Fanchi & Christiansen (2016), example 4.5, and numbers recomputed from published formulae.
func TestPublishedLayers(t *testing.T) {
	var file struct {
		Means struct {
			K []float64 `json:"k_md"`
			V float64   `json:"V_DP"`
		}
		Ten struct {
			K        []float64 `json:"k"`
			Coverage []float64 `json:"stiles_coverage"`
			Cut      []float64 `json:"stiles_cut_M1"`
			Dykstra  map[string]struct{ C, WOR []float64 }
		}
	}
	text, err := os.ReadFile("../../testdata/published/layers.json")
	if err == nil {
		err = json.Unmarshal(text, &file)
	}
	if err != nil || len(file.Ten.Dykstra) != 3 {
		t.Fatal(err, len(file.Ten.Dykstra))
	}
	near(t, "V of the means", VariationOfMeans(evenly(file.Means.K...)), file.Means.V, 0.0005)
	var strata []Stratum
	for _, k := range file.Ten.K {
		strata = append(strata, Stratum{Thickness: 1, Permeability: k, Porosity: 0.2, After: 0.5})
	}
	coverage, cut := Stiles(strata, 1)
	for i := range cut {
		near(t, "Stiles coverage", coverage[i], file.Ten.Coverage[i], 0.00005)
		near(t, "Stiles cut", cut[i], file.Ten.Cut[i], 0.00005)
	}
	for m, want := range file.Ten.Dykstra {
		ratio := map[string]float64{"0.5": 0.5, "1": 1, "2": 2}[m]
		var b Bundle
		for _, k := range file.Ten.K {
			b = append(b, Member{Piston{Water: ratio, Oil: 1, Change: 0.5}, 1, k})
		}
		for n, member := range b {
			o := b.At(member.Body.Breakthrough() / member.Pace * (1 + 1e-14))
			near(t, "coverage, M "+m, o.Oil/0.5, want.C[n], 0.00051)
			if n < len(want.WOR) {
				near(t, "water-oil ratio, M "+m, o.Cut()/(1-o.Cut()), want.WOR[n], 0.00051)
			}
		}
	}
}

// Case sti-01: direct sums against a count by marching.
func TestStiles(t *testing.T) {
	c := layered(t, "sti-01")
	var strata []Stratum
	for i, k := range c.Inputs.K {
		strata = append(strata, Stratum{Thickness: c.Inputs.H[i], Permeability: k, Porosity: c.Inputs.Phi[i], After: c.Inputs.DeltaS[i]})
	}
	coverage, cut := Stiles(strata, c.Inputs.M)
	for i := range cut {
		near(t, "coverage", coverage[i], c.Outputs.Coverage[i], 3*c.Errors["coverage"])
		near(t, "cut", cut[i], c.Outputs.FwReservoir[i], 3*c.Errors["fw_reservoir"])
		near(t, "cut at surface", fracflow.SurfaceCut(cut[i], c.Inputs.Bw, c.Inputs.Bo), c.Outputs.FwSurface[i], 3*c.Errors["fw_surface"])
	}
}

// A log that is log-normal by its quantiles has one V by every method; the more the samples
// the nearer.
func TestVariation(t *testing.T) {
	const s, n = 0.7, 20000
	samples := make([]Sample, n)
	for i := range samples {
		samples[n-1-i] = Sample{Thickness: 1, Permeability: math.Exp(s * math.Sqrt2 * math.Erfinv(2*(float64(i)+0.5)/n-1)), Porosity: 0.2}
	}
	want := 1 - math.Exp(-s)
	near(t, "Hazen", Variation(samples, Hazen), want, 1e-9) // on the line by construction
	near(t, "Weibull", Variation(samples, Weibull), want, 1e-3)
	near(t, "spread", VariationOfSpread(samples), want, 1e-3)
	near(t, "means", VariationOfMeans(samples), want, 2e-3)
	near(t, "Lorenz", Lorenz(samples), math.Erf(s/2), 1e-3) // of a log-normal population: Lake (1989)
	for name, v := range map[string]float64{
		"Hazen": Variation(evenly(3, 3, 3), Hazen), "spread": VariationOfSpread(evenly(3, 3)), "means": VariationOfMeans(evenly(3, 3)),
		"Lorenz": Lorenz(evenly(3, 3)), "one sample": Variation(evenly(5), Weibull), "one spread": VariationOfSpread(evenly(5)),
	} {
		near(t, name+" of even rock", v, 0, 1e-7)
	}
	// Three samples by hand: at 1/6, 1/2, 5/6 the quantiles are -0.967421566, 0 and its opposite
	// (Abramowitz & Stegun 1964, table 26.5, from memory), at 1/4, 1/2, 3/4 -0.674489750.
	for position, z := range map[Position]float64{Hazen: 0.967421566, Weibull: 0.674489750} {
		near(t, string(position), Variation(evenly(8, 2, 1), position), 1-math.Exp(-math.Log(8)/(2*z)), 1e-8)
	}
	// Two equal halves of a sample are the sample.
	near(t, "halves", Variation([]Sample{{Thickness: 2, Permeability: 9, Porosity: 0.2}, {Thickness: 2, Permeability: 1, Porosity: 0.2}}, Hazen), Variation([]Sample{{Thickness: 4, Permeability: 9, Porosity: 0.2}, {Thickness: 4, Permeability: 1, Porosity: 0.2}}, Hazen), 1e-15)
}

// Groups keep thickness, k h and phi h, and never look more varied than the log.
func TestGrouped(t *testing.T) {
	rng := rand.New(rand.NewPCG(3, 4))
	for range 200 {
		var log []Sample
		var h, kh, ph float64
		for range 1 + rng.IntN(400) {
			s := Sample{Thickness: 0.1 + rng.Float64(), Permeability: math.Exp(2 * rng.NormFloat64()), Porosity: 0.1 + 0.2*rng.Float64()}
			log = append(log, s)
			h, kh, ph = h+s.Thickness, kh+s.Thickness*s.Permeability, ph+s.Thickness*s.Porosity
		}
		n := 1 + rng.IntN(20)
		layers := Grouped(log, n)
		if len(layers) > n {
			t.Fatalf("%d layers of at most %d", len(layers), n)
		}
		for _, l := range layers {
			h, kh, ph = h-l.Thickness, kh-l.Thickness*l.Permeability, ph-l.Thickness*l.Porosity
		}
		near(t, "thickness", h, 0, 1e-10)
		near(t, "k h", kh, 0, 1e-8)
		near(t, "phi h", ph, 0, 1e-10)
		if Lorenz(layers) > Lorenz(log)+1e-12 {
			t.Fatalf("groups vary by %g, the log by %g", Lorenz(layers), Lorenz(log))
		}
	}
}

// In vertical equilibrium one layer floods as its piston does, and layers alike as one; at
// unit mobility ratio the fronts of the layers keep to k/(phi dS), with or without crossflow.
func TestEquilibrium(t *testing.T) {
	behind, ahead := relperm.Point{Krw: 0.5}, relperm.Point{Kro: 0.8}
	layer := func(k, phi float64) Stratum {
		return Stratum{Thickness: 2, Permeability: k, Porosity: phi, Before: 0.2, After: 0.7, Ahead: ahead, Behind: behind}
	}
	layers := Fastest([]Stratum{layer(3, 0.2), layer(1, 0.2), layer(5, 0.25)})
	if layers[0].Permeability != 5 || layers[2].Permeability != 1 {
		t.Fatalf("order %v", layers)
	}
	curves, err := Equilibrium(layers)
	if err != nil {
		t.Fatal(err)
	}
	near(t, "krw with one filled", curves.At(0.2+0.5*0.25/0.65).Krw, 0.5*5/9, 1e-15)
	flow := fracflow.Flow{Curves: curves, MuW: 0.5, MuO: 0.8} // unit mobility ratio
	d, err := displace.New(flow, 0.7, 0.2)
	if err != nil {
		t.Fatal(err)
	}
	var b Bundle
	for _, l := range layers {
		b = append(b, Member{Piston{Water: 1, Oil: 1, Change: 0.5}, l.Porosity, l.Permeability / l.Porosity})
	}
	for _, q := range []float64{0.1, 0.3, 0.5, 0.8, 2} {
		near(t, "recovery at M = 1", d.Recovery(q), b.At(Clock(b, q, 0)).Oil, 1e-12)
	}
}
