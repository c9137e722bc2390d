package reservoir

import (
	"math"
	"math/rand/v2"
	"testing"

	"gonum.org/v1/gonum/integrate/quad"

	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

// integrate is 24-point Gauss-Legendre between cuts within [from, to].
func integrate(f func(float64) float64, from, to float64, cuts []float64) float64 {
	var sum float64
	for _, c := range append(cuts, to) {
		if c > from {
			end := math.Min(c, to)
			sum += quad.Fixed(f, from, end, 24, quad.Legendre{}, 0)
			from = end
		}
	}
	return sum
}

// R against the resistance of the profile summed along the core, and T against R summed
// over the volume injected, by quadrature that knows neither J nor K, over random curves,
// states and tables. Every smooth stretch is integrated on its own.
func TestResistanceAgainstQuadrature(t *testing.T) {
	r := rand.New(rand.NewPCG(24, 7))
	for i := range 300 {
		wide := func(lo, hi float64) float64 { return lo * math.Pow(hi/lo, r.Float64()) }
		flow := fracflow.Flow{MuW: 1e-3, MuO: 1e-3 * wide(0.05, 200)}
		if i%2 == 0 {
			flow.Curves = relperm.Corey{Swc: 0.3 * r.Float64(), Sor: 0.3 * r.Float64(), Krw0: wide(0.02, 1), Kro0: wide(0.1, 1), Nw: 1 + 4*r.Float64(), No: 1.3 + 3*r.Float64()}
		} else {
			n := 3 + r.IntN(8)
			sw, krw, kro := make([]float64, n), make([]float64, n), make([]float64, n)
			for k := 1; k < n; k++ {
				sw[k] = sw[k-1] + wide(0.02, 0.1)
				krw[k] = krw[k-1] + wide(5e-3, 0.1)
			}
			for k := n - 2; k >= 0; k-- {
				kro[k] = kro[k+1] + wide(5e-3, 0.1)
			}
			table, err := relperm.NewTable(sw, krw, kro, relperm.Kind(i/2%2))
			if err != nil {
				t.Fatal(err)
			}
			flow.Curves = table
		}
		lo, hi := flow.Ends()
		injected, initial := hi-(hi-lo)*0.3*r.Float64()*float64(i%3/2), lo+(hi-lo)*0.2*r.Float64()*float64(i%5/3)
		if i%11 == 0 {
			injected, initial = initial, injected
		}
		l := build(t, rock(ConstantPressure{1e6}), flow, injected, initial)
		drag := func(s float64) float64 { lt, _ := flow.Mobility(s); return 1 / lt }
		var xis, qs []float64
		for _, n := range l.Displacement.Path() {
			xis = append(xis, n.Xi)
		}
		for k := len(xis) - 1; k >= 0; k-- {
			qs = append(qs, 1/xis[k])
		}
		last, sum := 0.0, 0.0
		for _, q := range []float64{0.02, 0.2, 0.7, 1.5, 6} {
			profile := q * integrate(func(xi float64) float64 { return drag(l.Displacement.Saturation(xi)) }, 0, 1/q, xis)
			got, spent := l.resistance.at(q)
			if !(math.Abs(got/profile-1) <= 1e-10) {
				t.Fatalf("curves %d: R(%g) = %.15g, by quadrature %.15g\n%+v %+v", i, q, got, profile, flow, l.Displacement.Waves())
			}
			sum += integrate(l.Resistance, last, q, qs)
			last = q
			if !(math.Abs(spent/sum-1) <= 1e-10) {
				t.Fatalf("curves %d: T(%g) = %.15g, by quadrature %.15g\n%+v %+v", i, q, spent, sum, flow, l.Displacement.Waves())
			}
			if back := l.resistance.pvi(spent); !(math.Abs(back/q-1) <= 1e-12) {
				t.Fatalf("curves %d: Q(T(%g)) = %.15g", i, q, back)
			}
		}
	}
}
