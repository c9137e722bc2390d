package imbibe

import (
	"errors"
	"math"
	"strings"
	"testing"

	"brinefront/physics/capillary"
	"brinefront/physics/relperm"
)

// TestDiffusionOfIndependentCases: independent SciPy computation, two methods.
func TestDiffusionOfIndependentCases(t *testing.T) {
	for _, c := range independentCases(t) {
		span := c.span(t)
		within(t, c.ID+": inlet saturation", span.Inlet, c.Outputs.S_inlet, c.Est_error.S_inlet)
		for i, sw := range c.Outputs.S_list {
			want, tolerance := c.Outputs.D_of_s_list_m2_per_s[i], c.Est_error.D_of_s_list_m2_per_s
			within(t, c.ID+": Dc", span.Diffusion(sw), want, tolerance)
			fromInitial, rise := span.FromInitial(sw - span.Initial)
			fromInlet, same := span.FromInlet(span.Inlet - sw)
			within(t, c.ID+": Dc from the initial end", fromInitial, want, tolerance)
			within(t, c.ID+": Dc from the inlet end", fromInlet, want, tolerance)
			f, _ := span.FractionalFlow(sw)
			within(t, c.ID+": rise of f from the initial end", rise, f, 1e-15)
			within(t, c.ID+": rise of f from the inlet end", same, f, 1e-14)
		}
	}
}

// wet is the water-wet rock of ms-01 with Si = Swc and S0 = 1-Sor.
func wet() Rock {
	return Rock{Permeability: 3.7e-14, Porosity: 0.227, WaterViscosity: 0.00093, OilViscosity: 0.00217,
		Kr: relperm.Corey{Swc: 0.193, Sor: 0.247, Krw0: 0.263, Kro0: 0.847, Nw: 3.4, No: 2.3},
		Pc: capillary.VanGenuchten{Swr: 0.193, Snr: 0.247, P0: 21300, N: 2.9, M: 1 - 1/2.9}}
}

// TestEndsOfDiffusion holds the powers of Dc at both ends to the leading terms of the
// formulas: krw ~ s^nw and dPc/ds ~ s^(-1/(mn) - 1) at connate water, kro ~ t^no and
// dPc/dt ~ t^(1/n - 1) at the other end.
func TestEndsOfDiffusion(t *testing.T) {
	span, err := NewSpan(wet(), 0.193, math.NaN())
	must(t, err)
	const n = 2.9
	within(t, "power at Swc", span.LowPower, 3.4-1-1/(n-1), 1e-7)
	within(t, "power at 1-Sor", span.HighPower, 2.3+1/n-1, 1e-7)

	// Far inside the last digit of S the value is still the formula of the distance.
	for _, u := range []float64{1e-22, 5.3e-10, 5.7e-10, 6.1e-10, 6.5e-10} {
		const width = 0.56
		s := u / width
		want := span.Permeability * 0.263 / 0.00093 * math.Pow(s, 3.4) * 21300 / (n - 1) / width * math.Pow(s, -1-1/(n-1))
		got, _ := span.FromInitial(u)
		within(t, "Dc near Swc over the leading term", got/want, 1, 1e-8)
	}

	mobile, err := NewSpan(wet(), 0.25, math.NaN())
	must(t, err)
	if mobile.LowPower != 0 || mobile.FiniteFront() || !span.FiniteFront() {
		t.Errorf("power %v, finite front %v with mobile water, %v without", mobile.LowPower, mobile.FiniteFront(), span.FiniteFront())
	}
	_, slope := mobile.FractionalFlow(0.25)
	_, rise := mobile.FromInitial(1e-20)
	within(t, "rise of f over the step, over its slope", rise/1e-20/slope, 1, 1e-12)

	rock := wet()
	rock.Kr = relperm.Corey{Swc: 0.193, Sor: 0.247, Krw0: 0.263, Kro0: 0.847, Nw: 1.2, No: 2.3}
	rock.Pc = capillary.BrooksCorey{Swr: 0.193, Snr: 0.247, Entry: 5000, Lambda: 2}
	singular, err := NewSpan(rock, 0.193, math.NaN())
	must(t, err)
	within(t, "power of a singular Dc", singular.LowPower, 1.2-1-0.5, 1e-7)
	if singular.FiniteFront() {
		t.Error("a singular Dc has a finite front")
	}
}

// TestSpanRefuses names the input that cannot be used.
func TestSpanRefuses(t *testing.T) {
	mixed := wet()
	mixed.Pc = capillary.Skjaeveland{Cw: 3100, Aw: 0.72, Co: -5700, Ao: 0.61, Swr: 0.193, Sor: 0.247}
	stop := mixed.Inlet()
	for _, c := range []struct {
		name           string
		initial, inlet float64
		change         func(*Rock)
	}{
		{"permeability", 0.2, math.NaN(), func(r *Rock) { r.Permeability = 0 }},
		{"porosity", 0.2, math.NaN(), func(r *Rock) { r.Porosity = 1.2 }},
		{"water viscosity", 0.2, math.NaN(), func(r *Rock) { r.WaterViscosity = math.NaN() }},
		{"oil viscosity", 0.2, math.NaN(), func(r *Rock) { r.OilViscosity = math.Inf(1) }},
		{"initial water saturation", 0.19, math.NaN(), func(*Rock) {}},
		{"initial water saturation", stop + 0.001, math.NaN(), func(*Rock) {}},
		{"initial water saturation", math.NaN(), math.NaN(), func(*Rock) {}},
		{"water saturation at the open face", 0.2, 0.2, func(*Rock) {}},
		{"water saturation at the open face", 0.2, 0.76, func(*Rock) {}},
	} {
		rock := mixed
		c.change(&rock)
		_, err := NewSpan(rock, c.initial, c.inlet)
		var input *InputError
		if !errors.As(err, &input) || input.Name != c.name || !strings.Contains(err.Error(), c.name) {
			t.Errorf("%v to %v: error %v, want one about the %s", c.initial, c.inlet, err, c.name)
		}
	}
}

// TestFaceAboveALevelStretch: where Pc is level below the face, or oil no longer flows there, nothing
// drives water through that stretch. The rock soaks as if the face were held at its foot, and a block
// takes up no more. An identity, by hand.
func TestFaceAboveALevelStretch(t *testing.T) {
	level := wet()
	pc, err := capillary.NewTable([]float64{0.193, 0.3, 0.45, 0.6, 0.753}, []float64{3e4, 2e4, 9e3, 9e3, 0}, capillary.StraightLine)
	must(t, err)
	level.Pc = pc
	stands := wet()
	kr, err := relperm.NewTable([]float64{0.193, 0.3, 0.45, 0.62, 0.753}, []float64{0, 0.01, 0.05, 0.15, 0.3}, []float64{0.8, 0.4, 0.1, 0, 0}, relperm.StraightLine)
	must(t, err)
	stands.Kr = kr
	for _, c := range []struct {
		rock       Rock
		held, foot float64
	}{{level, 0.55, 0.45}, {stands, math.NaN(), 0.62}} {
		above, err := NewSpan(c.rock, 0.2, c.held)
		must(t, err)
		within(t, "the saturation that gets inside", above.Inlet, c.foot, 0)
		at, err := NewSpan(c.rock, 0.2, c.foot)
		must(t, err)
		got, err := Solve(above, 0.5)
		must(t, err)
		want, err := Solve(at, 0.5)
		must(t, err)
		within(t, "A", got.A, want.A, 0)
		m, err := NewMatrix(above)
		must(t, err)
		b, err := m.Soak(Box([3]float64{0.1, 0.2, 0.3}, [3]int{2, 2, 2}))
		must(t, err)
		if share, _ := b.At(b.TimeAt(0.95)); !b.Finished || math.Abs(share-0.95) > 1e-9 {
			t.Errorf("the block is at %g, finished: %v", share, b.Finished)
		}
	}
}
