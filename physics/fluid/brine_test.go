package fluid

import (
	"errors"
	"math"
	"testing"
)

// batzleWangWater is the fresh water density of Batzle & Wang (1992), eq. 27a, g/cm3:
// the part of the correlation that IAPWS water stands in for, so that their brine can
// be put together and checked as a whole.
func batzleWangWater(t, p float64) float64 {
	return 1 + 1e-6*(-80*t-3.3*t*t+0.00175*t*t*t+489*p-2*t*p+0.016*t*t*p-1.3e-5*t*t*t*p-0.333*p*p-0.002*t*p*p)
}

// batzleWangViscosity is eq. 32 of Batzle & Wang (1992), mPa s.
func batzleWangViscosity(t, s float64) float64 {
	d := math.Pow(s, 0.8) - 0.17
	return 0.1 + 0.333*s + (1.65+91.9*s*s*s)*math.Exp(-(0.42*d*d+0.045)*math.Pow(t, 0.8))
}

// TestBatzleWang compares the density correction with an independent computation of the whole
// correlation (formula from memory): half a unit in the last printed digit. Their viscosity,
// which the product does not use, is checked likewise, and that at 20 °C, where the
// handbook confirms it, it tells the effect of salt as ours does: within 4 %.
func TestBatzleWang(t *testing.T) {
	b := readPublished(t).BatzleWang
	for i, tC := range rows(t, b.TC) {
		rho := batzleWangWater(tC, b.PMPa[i]) + saltDensity(tC, b.PMPa[i], b.S[i])
		if math.Abs(rho-b.Rho[i]) > 0.51e-5 {
			t.Errorf("density at %g C, %g MPa, s = %g: %.6f, want %.5f", tC, b.PMPa[i], b.S[i], rho, b.Rho[i])
		}
		if mu := batzleWangViscosity(tC, b.S[i]); math.Abs(mu-b.MuCp[i]) > 0.51e-4 {
			t.Errorf("viscosity at %g C, s = %g: %.5f, want %.4f", tC, b.S[i], mu, b.MuCp[i])
		}
	}
	for _, s := range []float64{0.035, 0.05, 0.1, 0.2, 0.26} {
		near(t, "viscosity ratio at 20 C", saltThickening(20, s), batzleWangViscosity(20, s)/batzleWangViscosity(20, 0), 4e-2)
	}
}

// TestBrineAgainstHandbook measures the accuracy that the documentation claims: sodium
// chloride solutions and standard sea water, both from memory of the tables named in the
// file. Tolerances are the claim.
func TestBrineAgainstHandbook(t *testing.T) {
	p := readPublished(t)
	const atmosphere = 101325
	check := func(tC, s, rho, muCp, rhoWithin, muWithin float64) {
		t.Helper()
		b, err := Brine(tC+zeroCelsius, atmosphere, s)
		if err != nil {
			t.Fatal(err)
		}
		near(t, "density", b.Density, rho, rhoWithin)
		near(t, "viscosity", b.Viscosity*1000, muCp, muWithin)
	}
	for i, s := range rows(t, p.SodiumChloride.S) {
		check(p.SodiumChloride.TC, s, p.SodiumChloride.Rho[i]*1000, p.SodiumChloride.MuCp[i], 4e-3, 3e-2)
	}
	for i, tC := range rows(t, p.SeaWater.TC) {
		check(tC, p.SeaWater.S, p.SeaWater.Rho[i], p.SeaWater.MuCp[i], 4e-3, 3e-2)
	}
	b, err := Brine(20+zeroCelsius, atmosphere, 0.035)
	if err != nil {
		t.Fatal(err)
	}
	near(t, "heat capacity", b.HeatCapacity, p.SeaWater.Cp, 2e-2)
}

// TestBrineAgainstSeaWater holds viscosity against Sharqawy, Lienhard & Zubair (2010), eq. 22,
// from memory: sea water of 35 g/kg from 0 to 150 °C, at 10 MPa. Tolerance: the sum of the published uncertainties,
// 1.5 % theirs and 2 % of Phillips et al. At 100 g/kg the heavier salts of the sea show, up
// to 5.1 %.
func TestBrineAgainstSeaWater(t *testing.T) {
	for _, c := range []struct{ s, within float64 }{{0.035, 3.5e-2}, {0.1, 5.1e-2}} {
		for tC := 0.0; tC <= 150; tC += 10 {
			b, errB := Brine(tC+zeroCelsius, 10e6, c.s)
			w, errW := Water(tC+zeroCelsius, 10e6)
			if err := errors.Join(errB, errW); err != nil {
				t.Fatal(err)
			}
			sea := 1 + horner(tC, 1.541, 1.998e-2, -9.52e-5)*c.s + horner(tC, 7.974, -7.561e-2, 4.724e-4)*c.s*c.s
			near(t, "viscosity ratio", b.Viscosity/w.Viscosity, sea, c.within)
		}
	}
}

// mccain is the brine viscosity (mPa s) and density (lb/ft3) of McCain (1991): a second
// correlation to hold the first against.
func mccain(tF, percent float64) (mu, lbFt3 float64) {
	a := horner(percent, 109.574, -8.40564, 0.313314, 8.72213e-3)
	b := horner(percent, -1.12166, 2.63951e-2, -6.79461e-4, -5.47119e-5, 1.55586e-6)
	return a * math.Pow(tF, b), horner(percent, 62.368, 0.438603, 1.60074e-3)
}

// TestMcCain checks our writing of the second correlation (formula from memory) against
// the independent computation, then that both tell the same effect of salt: viscosity over
// that of fresh water from 60 to 200 F within 12 % (the measured spread between the
// two correlations, no source), and density over that of fresh water at 60 F within 0.5 %.
func TestMcCain(t *testing.T) {
	m := readPublished(t).McCain
	for i, tF := range rows(t, m.TF) {
		if mu, _ := mccain(tF, m.SPercent[i]); math.Abs(mu-m.MuCp[i]) > 0.51e-4 {
			t.Errorf("McCain viscosity at %g F, %g %%: %.5f, want %.4f", tF, m.SPercent[i], mu, m.MuCp[i])
		}
	}
	const p = 10e6
	for i, percent := range rows(t, m.DensitySPercent) {
		_, rho := mccain(60, percent)
		if math.Abs(rho-m.LbFt3[i]) > 0.51e-3 {
			t.Errorf("McCain density at %g %%: %.4f, want %.3f", percent, rho, m.LbFt3[i])
		}
		for tF := 60.0; tF <= 200; tF += 35 {
			b, errB := Brine((tF-32)/1.8+zeroCelsius, p, percent/100)
			w, errW := Water((tF-32)/1.8+zeroCelsius, p)
			if err := errors.Join(errB, errW); err != nil {
				t.Fatal(err)
			}
			if tF == 60 {
				near(t, "density ratio", b.Density/w.Density, rho/62.368, 5e-3)
			}
			mu, _ := mccain(tF, percent)
			fresh, _ := mccain(tF, 0)
			near(t, "viscosity ratio", b.Viscosity/w.Viscosity, mu/fresh, 12e-2)
		}
	}
}

// TestFreshBrineIsWater, also above the range of the salt's correction.
func TestFreshBrineIsWater(t *testing.T) {
	for _, tK := range []float64{273.15, 300, 450, 600} {
		b, errB := Brine(tK, 50e6, 0)
		w, errW := Water(tK, 50e6)
		if err := errors.Join(errB, errW); err != nil {
			t.Fatal(err)
		}
		if b != w {
			t.Errorf("at %g K: brine without salt %+v, water %+v", tK, b, w)
		}
	}
}

// TestSaltThickens: more salt is denser and more viscous at every temperature.
func TestSaltThickens(t *testing.T) {
	for tK := 273.15; tK <= 523.15; tK += 5 {
		for _, p := range []float64{5e6, 100e6} {
			last := Liquid{}
			for s := 0.0; s <= MaxSalinity; s += 0.01 {
				b, err := Brine(tK, p, s)
				if err != nil {
					t.Fatal(err)
				}
				if b.Density <= last.Density || b.Viscosity <= last.Viscosity {
					t.Errorf("at %g K, %g Pa, s = %g: %+v after %+v", tK, p, s, b, last)
				}
				last = b
			}
		}
	}
}

func TestBrineRange(t *testing.T) {
	for _, c := range []struct {
		t, p, s float64
		of      Variable
	}{
		{300, 1e6, -0.01, Salinity},
		{300, 1e6, 0.27, Salinity},
		{300, 1e6, math.NaN(), Salinity},
		{524, 50e6, 0.1, Temperature},
		{273, 50e6, 0.1, Temperature},
		{300, 101e6, 0.1, Pressure},
	} {
		_, err := Brine(c.t, c.p, c.s)
		var out *RangeError
		if !errors.As(err, &out) || out.Variable != c.of {
			t.Errorf("Brine(%g, %g, %g): error %v, want one about %s", c.t, c.p, c.s, err, c.of)
		}
	}
	if !Extrapolated(288.15, 0.03) || Extrapolated(288.15, 0) || Extrapolated(293.15, 0.22) || !Extrapolated(293.15, 0.23) {
		t.Error("the corrections are extrapolated below 20 °C and above five molal, with salt only")
	}
}
