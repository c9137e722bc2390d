package displace

import (
	"fmt"
	"math"
	"math/rand/v2"
	"testing"

	"gonum.org/v1/gonum/integrate/quad"

	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

// pieces cuts [0, end] at the given places.
func pieces(end float64, cuts []float64) []float64 {
	out := []float64{0}
	for _, c := range cuts {
		if c > out[len(out)-1] && c < end {
			out = append(out, c)
		}
	}
	return append(out, end)
}

// integrate is Gauss-Legendre between the cuts; smooth integrands only between them.
func integrate(f func(float64) float64, cuts []float64) float64 {
	var sum float64
	for i := 1; i < len(cuts); i++ {
		a, b := cuts[i-1], cuts[i]
		sum += quad.Fixed(f, a, b, 16, quad.Legendre{}, 0)
	}
	return sum
}

// checkBalance compares the closed forms with quadrature that knows nothing of them: the
// mean of the profile, and the outflow of water summed over Q.
func checkBalance(d *Displacement, q, tolerance float64) error {
	var xis, qs []float64
	for _, n := range d.Path() {
		xis = append(xis, n.Xi*q)
	}
	for i := len(d.Path()) - 1; i >= 0; i-- {
		qs = append(qs, 1/d.Path()[i].Xi)
	}
	state := d.After(q)
	mean := integrate(func(x float64) float64 { return d.Saturation(x / q) }, pieces(1, xis))
	if off := mean - state.Average; !(math.Abs(off) <= tolerance) {
		return fmt.Errorf("mean of the profile %.15g, average %.15g: off by %.2g", mean, state.Average, off)
	}
	water := integrate(func(q float64) float64 { _, f := d.Outlet(q); return f }, pieces(q, qs))
	if off := water - state.Water; !(math.Abs(off) <= tolerance*math.Max(1, q)) {
		return fmt.Errorf("water out %.15g, want %.15g: off by %.2g", state.Water, water, off)
	}
	if off := state.Oil + state.Water - q; !(math.Abs(off) <= 1e-14*math.Max(1, q)) {
		return fmt.Errorf("oil and water out miss the volume in by %.2g", off)
	}
	return nil
}

// Mass balance to 1e-12: closed form and quadrature differ by rounding only.
func TestMassBalance(t *testing.T) {
	corey := relperm.Corey{Swc: 0.213, Sor: 0.237, Krw0: 0.327, Kro0: 0.861, Nw: 2.7, No: 2.15}
	let := relperm.LET{Swc: 0.15, Sor: 0.22, Krw0: 0.4, Kro0: 0.95, Lw: 2.1, Ew: 3, Tw: 1.2, Lo: 2.6, Eo: 2, To: 1.1}
	sw, krw, kro := []float64{0.2, 0.3, 0.42, 0.55, 0.68, 0.77}, []float64{0, 0.01, 0.05, 0.13, 0.24, 0.33}, []float64{0.85, 0.5, 0.22, 0.08, 0.015, 0}
	smooth, err := relperm.NewTable(sw, krw, kro, relperm.MonotoneCubic)
	if err != nil {
		t.Fatal(err)
	}
	straight, _ := relperm.NewTable(sw, krw, kro, relperm.StraightLine)
	for name, curves := range map[string]relperm.Curves{"Corey": corey, "LET": let, "cubic": smooth, "straight": straight} {
		for _, gravity := range []float64{0, 2e-3, -4e-3} {
			lo, hi := curves.Ends()
			for _, ends := range [][2]float64{{hi, lo}, {hi, lo + 0.15*(hi-lo)}, {hi - 0.2*(hi-lo), lo}, {lo, hi}, {lo + 0.1*(hi-lo), hi - 0.1*(hi-lo)}} {
				flow := fracflow.Flow{Curves: curves, MuW: 0.5e-3, MuO: 4e-3, Gravity: gravity}
				d := solve(t, flow, ends[0], ends[1])
				for _, q := range []float64{0.1, 0.3, 0.7, 1, 2, 5} {
					if err := checkBalance(d, q, 1e-12); err != nil {
						t.Errorf("%s, N %g, %v, Q %g: %v", name, gravity, ends, q, err)
					}
				}
			}
		}
	}
}

// The profile against the Legendre transform of f: at xi the state on the envelope is the
// one of largest f - xi s (least, in drainage) among all states between the ends. Thousands
// of random curves and states; the transform is taken by plain sampling, whose value can only
// fall short, by no more than the curvature over a step allows.
func TestLegendre(t *testing.T) {
	r := rand.New(rand.NewPCG(1960, 10))
	for i := range 1500 {
		wide := func(lo, hi float64) float64 { return lo * math.Pow(hi/lo, r.Float64()) }
		flow := fracflow.Flow{MuW: 1e-3, MuO: 1e-3 * wide(1e-3, 1e3)}
		swc, sor := 0.3*r.Float64(), 0.3*r.Float64()
		if i%2 == 0 {
			flow.Curves = relperm.Corey{Swc: swc, Sor: sor, Krw0: wide(0.01, 1), Kro0: wide(0.1, 1), Nw: 1 + 4*r.Float64(), No: 1 + 4*r.Float64()}
		} else {
			n := 3 + r.IntN(12)
			sw, krw, kro := make([]float64, n), make([]float64, n), make([]float64, n)
			for k := 1; k < n; k++ {
				sw[k] = sw[k-1] + wide(0.01, 0.08)
				krw[k] = krw[k-1] + wide(1e-3, 0.08)
			}
			for k := n - 2; k >= 0; k-- {
				kro[k] = kro[k+1] + wide(1e-3, 0.08)
			}
			table, err := relperm.NewTable(sw, krw, kro, relperm.Kind(i/2%2))
			if err != nil {
				t.Fatal(err)
			}
			flow.Curves = table
		}
		if i%3 == 0 {
			flow.Gravity = (2*r.Float64() - 1) * 5 * flow.MuO
		}
		lo, hi := flow.Ends()
		injected, initial := hi-(hi-lo)*0.3*r.Float64()*float64(i%4/2), lo+(hi-lo)*0.3*r.Float64()*float64(i%5/3)
		sign := 1.0
		if i%7 == 0 {
			injected, initial, sign = initial, injected, -1
		}
		d := solve(t, flow, injected, initial)
		const steps = 2000
		var s, f [steps + 1]float64
		var steepest float64
		for k := range s {
			var v float64
			s[k] = initial + (injected-initial)*float64(k)/steps
			f[k], v = flow.At(s[k])
			steepest = math.Max(steepest, math.Abs(v))
		}
		for range 10 {
			xi := d.FrontSpeed() * r.Float64() * 1.2
			best := math.Inf(-1)
			for k := range s {
				best = math.Max(best, sign*(f[k]-xi*s[k]))
			}
			state := d.Saturation(xi)
			fs, _ := flow.At(state)
			got := sign * (fs - xi*state)
			if got < best-1e-13*(1+xi+steepest) || got > best+(steepest+xi)*math.Abs(injected-initial)/steps {
				t.Fatalf("curve %d, xi %g: f - xi s is %.15g at the state found, %.15g by sampling; %+v", i, xi, got, best, d.Waves())
			}
		}
		for range 5 {
			q := wide(0.05, 20)
			state := d.After(q)
			for _, x := range []float64{state.Average, state.Recovery, state.Oil, state.Water, state.Cut} {
				if math.IsNaN(x) || math.IsInf(x, 0) {
					t.Fatalf("curve %d, Q %g: %+v", i, q, state)
				}
			}
			cut := r.Float64()
			if at, ok := d.PVIAtCut(cut); ok && at > 0 {
				if _, before := d.Outlet(at * (1 - 1e-9)); before >= cut {
					t.Fatalf("curve %d: cut %g was reached before Q = %g", i, cut, at)
				}
				if _, after := d.Outlet(at * (1 + 1e-9)); after < cut {
					t.Fatalf("curve %d: cut %g is not reached at Q = %g", i, cut, at)
				}
			}
		}
	}
}
