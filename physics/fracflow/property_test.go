package fracflow

import (
	"fmt"
	"math"
	"math/rand/v2"
	"sort"
	"testing"

	"brinefront/physics/relperm"
)

// draw makes a random flow and two random states: Corey, LET and tables of both
// kinds; level, up-dip and down-dip; both directions; end states mobile or not.
func draw(r *rand.Rand) (flow Flow, injected, initial float64, what string) {
	wide := func(lo, hi float64) float64 { return lo * math.Pow(hi/lo, r.Float64()) }
	swc, sor := 0.4*r.Float64(), 0.4*r.Float64()
	krw0, kro0 := wide(1e-3, 1), wide(0.1, 1)
	exponent := func() float64 {
		if r.IntN(8) == 0 {
			return 1
		}
		return 1 + 5*r.Float64()
	}
	switch kind := r.IntN(5); kind {
	case 0, 1:
		flow.Curves = relperm.Corey{Swc: swc, Sor: sor, Krw0: krw0, Kro0: kro0, Nw: exponent(), No: exponent()}
	case 2:
		flow.Curves = relperm.LET{Swc: swc, Sor: sor, Krw0: krw0, Kro0: kro0,
			Lw: exponent(), Ew: wide(0.1, 100), Tw: 0.5 + 2*r.Float64(), Lo: exponent(), Eo: wide(0.1, 100), To: 0.5 + 2*r.Float64()}
	default:
		n := 3 + r.IntN(30)
		sw, krw, kro := make([]float64, n), make([]float64, n), make([]float64, n)
		for i := range n {
			sw[i], krw[i], kro[i] = r.Float64(), wide(1e-4, 1), wide(1e-4, 1)
		}
		sort.Float64s(sw)
		sort.Float64s(krw)
		sort.Sort(sort.Reverse(sort.Float64Slice(kro)))
		krw[0], kro[n-1] = 0, 0
		if r.IntN(3) == 0 { // rows at which a phase stands still, or a curve is level
			krw[1] = 0
			kro[n/2] = kro[n/2-1]
		}
		table, err := relperm.NewTable(sw, krw, kro, relperm.Kind(kind-3))
		if err != nil {
			return draw(r) // two equal saturations
		}
		flow.Curves = table
	}
	flow.MuW, flow.MuO = 1e-3, 1e-3*wide(1e-3, 1e3)
	if r.IntN(10) == 0 {
		flow.MuO = 1e-3 * wide(1e-6, 1e6)
	}
	if r.IntN(2) == 0 {
		lo := flow.Curves.At(swcOf(flow)).Kro / flow.MuO
		flow.Gravity = (r.Float64()*2 - 1) * wide(0.1, 10) / lo
	}
	lo, hi := flow.Ends()
	injected, initial = hi, lo
	if r.IntN(2) == 0 {
		initial = lo + (hi-lo)*r.Float64()*r.Float64()
	}
	if r.IntN(3) == 0 {
		injected = hi - (hi-lo)*r.Float64()*r.Float64()
	}
	if knots := flow.Knots(); len(knots) > 0 && r.IntN(3) == 0 {
		initial = knots[r.IntN(len(knots))]
	}
	if r.IntN(3) == 0 {
		injected, initial = initial, injected
	}
	return flow, injected, initial, fmt.Sprintf("%T%+v muo %g N %g from %.17g to %.17g", flow.Curves, flow.Curves, flow.MuO, flow.Gravity, injected, initial)
}

func swcOf(f Flow) float64 { lo, _ := f.Ends(); return lo }

// checkWaves holds a solution against the conditions that make it the only one: states
// in an unbroken row, speeds that rise, shocks that are chords and lie on the right side
// of f (Oleinik), fans that run at df/ds. It returns the first fault.
func checkWaves(fn Function, injected, initial float64, waves []Wave) error {
	if injected == initial {
		if len(waves) != 0 {
			return fmt.Errorf("waves between equal states")
		}
		return nil
	}
	sign := 1.0
	if injected < initial {
		sign = -1
	}
	// Reach of f and fastest slope scale the rounding.
	reach, fast, ulps := 0.0, 0.0, 0.0
	lo, hi := math.Min(injected, initial), math.Max(injected, initial)
	for i := range 401 {
		f, v := fn.At(lo + (hi-lo)*float64(i)/400)
		f0, _ := fn.At(initial)
		reach, fast = math.Max(reach, math.Abs(f-f0)), math.Max(fast, math.Abs(v))
		ulps = math.Max(ulps, 1e-15*math.Abs(f))
	}
	state, speed := injected, math.Inf(-1)
	for i, w := range waves {
		for _, x := range []float64{w.Behind, w.Ahead, w.SpeedBehind, w.SpeedAhead} {
			if math.IsNaN(x) || math.IsInf(x, 0) {
				return fmt.Errorf("wave %d: %+v is not finite", i, w)
			}
			fast = math.Max(fast, math.Abs(x))
		}
		if w.Behind != state || !(sign*(w.Behind-w.Ahead) > 0) {
			return fmt.Errorf("wave %d: %+v does not go on from %.17g", i, w, state)
		}
		if w.SpeedBehind < speed || w.SpeedAhead < w.SpeedBehind {
			return fmt.Errorf("wave %d: %+v is slower than the one before, %g", i, w, speed)
		}
		state, speed = w.Ahead, w.SpeedAhead
		fb, _ := fn.At(w.Behind)
		fa, _ := fn.At(w.Ahead)
		width := w.Behind - w.Ahead
		if w.Kind == Shock {
			if d := math.Abs(fb - fa - w.SpeedAhead*width); d > 1e-13*(reach+fast*math.Abs(width))+ulps {
				return fmt.Errorf("wave %d: %+v: the speed misses the chord by %g", i, w, d)
			}
		}
		last := w.SpeedBehind
		for j := range 201 {
			u := float64(j) / 200
			for _, share := range []float64{u, u * u * u * u, 1 - u*u*u*u} {
				s := w.Behind - share*width
				f, _ := fn.At(s)
				if over := sign * (f - (fa + w.SpeedAhead*(s-w.Ahead))); w.Kind == Shock && over > 1e-13*reach+ulps {
					return fmt.Errorf("wave %d: %+v: f is above the chord by %g of its reach at %g", i, w, over/reach, s)
				}
			}
			if w.Kind == Fan && math.Abs(width) > 1e-13 { // below, saturation itself is too coarse to show a fan
				_, v := fn.At(w.Behind - u*width)
				if j == 0 || j == 200 {
					continue // one-sided at a knot
				}
				if v < last-1e-10*fast || v > w.SpeedAhead+1e-10*fast {
					return fmt.Errorf("wave %d: %+v: speed %g at %g after %g", i, w, v, w.Behind-u*width, last)
				}
				last = v
			}
		}
	}
	if state != initial {
		return fmt.Errorf("the last wave ends at %.17g", state)
	}
	return nil
}

func TestRandomFlows(t *testing.T) {
	r := rand.New(rand.NewPCG(1942, 1952))
	faults := 0
	for i := range 4000 {
		flow, injected, initial, what := draw(r)
		waves, err := Solve(flow, injected, initial)
		if err == nil {
			err = checkWaves(flow, injected, initial, waves)
		}
		if err != nil {
			if len(what) > 500 {
				what = what[:200]
			}
			t.Errorf("draw %d: %v\n%s", i, err, what)
			if faults++; faults > 12 {
				t.Fatal("and so on")
			}
		}
	}
}
