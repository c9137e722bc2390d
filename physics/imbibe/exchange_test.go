package imbibe

import (
	"math"
	"testing"
)

// TestScalingGroups: the constant of Ma, Morrow & Zhang (1997) for minutes, md, dyn/cm, cp and cm,
// from memory.
func TestScalingGroups(t *testing.T) {
	c := Conditions{Permeability: 9.869233e-16, Porosity: 1, Tension: 1e-3, WaterViscosity: 1e-3, OilViscosity: 1e-3, Length: 0.01}
	within(t, "constant of Ma et al.", 60*c.Ma(), 0.018849, 5e-7)
	c.OilViscosity = 9e-3
	within(t, "viscosities of Ma et al.", 60*c.Ma(), 0.0188492/3, 5e-7)
	within(t, "Mattax and Kyte", 60*c.MattaxKyte(), 0.018849, 5e-7)
	// Schmid & Geiger (2012), from memory.
	within(t, "solution-based", 100*SolutionBased(0.001049776, 0.3, 0.1), 0.48979, 5e-6)
}

// TestSolutionBasedGroupIsTheUptake: until the front meets the end sqrt(tD) is the recovery in pore
// volumes, with A of the independent computation.
func TestSolutionBasedGroupIsTheUptake(t *testing.T) {
	c := blockCases(t)[0]
	m := c.matrix(t)
	b, err := m.Soak(c.shape(t))
	must(t, err)
	time := c.Inputs.Times_s[3]
	share, _ := b.At(time)
	td := time * SolutionBased(c.Outputs.A_m_per_sqrt_s, m.porosity, b.Shape.CharacteristicLength())
	within(t, "sqrt(tD)", math.Sqrt(td), share*m.Capacity(), 1e-4)
}

// TestExponentialExchange fits the tail of a slab at constant diffusivity, which is an
// exponential of the shape factor of Lim & Aziz (1995), and whole curves.
func TestExponentialExchange(t *testing.T) {
	m := matrixOf(t, law(constant))
	for _, shape := range []Shape{Slab(2, 2), Cylinder(2, 1, true, 0), Sphere(2)} {
		b, err := m.Soak(shape)
		must(t, err)
		within(t, "equivalent diffusion", b.Equivalent(1), 1, 0.03)
		times := b.Spaced(60)
		one, two := b.FitExponential(times), b.FitRootExponential(times)
		first, second := Compare(one, b, times), Compare(two, b, times)
		t.Logf("shape factor %.3f, slowest mode %.3f; misfits %.3f, %.3f", b.ShapeFactor(one.Rate, 1), shape.LimAziz(), first.Worst, second.Worst)
		// The early root makes the whole curve faster than its slowest mode.
		if f := b.ShapeFactor(one.Rate, 1); !(f > shape.LimAziz() && f < 2.5*shape.LimAziz()) {
			t.Errorf("the exponential stands for a shape factor of %g, the slowest mode for %g", f, shape.LimAziz())
		}
		if !(second.RMS < first.RMS/4 && math.Abs(first.Worst) > 0.02 && first.At > 0) {
			t.Errorf("misfits %+v and %+v", first, second)
		}
		// A minimum: no neighbour is nearer.
		for _, factor := range []float64{0.99, 1.01} {
			if Compare(Exponential{one.Rate * factor}, b, times).RMS <= first.RMS {
				t.Errorf("a rate times %g fits better", factor)
			}
		}
		share, _ := two.At(two.Turn)
		after, _ := two.At(two.Turn * (1 + 1e-9))
		within(t, "at the turn", after, share, 1e-7)
	}
}

func TestExchangeRatesAreSlopes(t *testing.T) {
	for _, u := range []Uptake{Exponential{0.7}, RootExponential{0.5, 0.8, 0.9}, Stretched{Exponential{1}, 3}, Mixed{Exponential{1}, []Fraction{{0.25, 1}, {0.75, 2}}}} {
		for _, time := range []float64{0.1, 0.5, 1, 3} {
			before, _ := u.At(time - 1e-5)
			after, _ := u.At(time + 1e-5)
			_, rate := u.At(time)
			within(t, "rate", (after-before)/2e-5, rate, 1e-8)
		}
	}
}
