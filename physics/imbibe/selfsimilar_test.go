package imbibe

import (
	"errors"
	"math"
	"math/rand/v2"
	"testing"

	"brinefront/physics/capillary"
	"brinefront/physics/numeric"
	"brinefront/physics/relperm"
)

// TestIndependentCases: independent SciPy computation, two methods.
func TestIndependentCases(t *testing.T) {
	for _, c := range independentCases(t) {
		s := solved(t, c.span(t), c.Inputs.R)
		out, e, time := c.Outputs, c.Est_error, c.Inputs.Time_s
		near(t, c.ID+": A", s.A, out.A_m_per_sqrt_s, 1e-10)
		within(t, c.ID+": imbibed", s.Uptake(time), out.Cum_imbibed_m_at_time, e.Cum_imbibed_m_at_time*5)
		near(t, c.ID+": front", s.Front(time), out.Front_m_at_time, 1e-8)
		for i, sw := range out.S_list {
			f, _ := s.Flow(sw)
			near(t, c.ID+": x", s.At(sw, time), out.X_m_at_time[i], 1e-8)
			within(t, c.ID+": F", f, out.F_of_s_list[i], e.F_of_s_list*5)
		}
	}
}

// hardRock is a case that stalls the plain iteration or has a singular end.
type hardRock struct {
	name           string
	rock           Rock
	initial, inlet float64
	ratio          float64
	finite         bool
}

func hardRocks(t *testing.T) []hardRock {
	t.Helper()
	inlet := math.NaN()
	with := func(kr relperm.Curves, pc capillary.Curve) Rock {
		r := wet()
		if kr != nil {
			r.Kr = kr
		}
		if pc != nil {
			r.Pc = pc
		}
		return r
	}
	corey := func(nw, no float64) relperm.Corey {
		return relperm.Corey{Swc: 0.193, Sor: 0.247, Krw0: 0.263, Kro0: 0.847, Nw: nw, No: no}
	}
	mixed := capillary.Skjaeveland{Swr: 0.193, Sor: 0.247, Cw: 900, Aw: 0.4, Co: -9700, Ao: 0.61}
	smooth, err := relperm.NewTable([]float64{0.193, 0.25, 0.33, 0.42, 0.55, 0.66, 0.753}, []float64{0, 0.001, 0.009, 0.034, 0.11, 0.19, 0.27},
		[]float64{0.85, 0.62, 0.4, 0.21, 0.06, 0.012, 0}, relperm.MonotoneCubic)
	must(t, err)
	straight, err := relperm.NewTable([]float64{0.193, 0.25, 0.33, 0.42, 0.55, 0.66, 0.753}, []float64{0, 0, 0, 0.034, 0.11, 0.19, 0.27},
		[]float64{0.85, 0.62, 0.4, 0.21, 0.06, 0.012, 0}, relperm.StraightLine)
	must(t, err)
	pcs, err := capillary.NewTable([]float64{0.193, 0.24, 0.31, 0.45, 0.6, 0.7, 0.753}, []float64{9e4, 3.1e4, 1.7e4, 9e3, 4e3, 4e3, -2e3}, capillary.StraightLine)
	must(t, err)
	falling, err := capillary.NewTable([]float64{0.193, 0.24, 0.31, 0.45, 0.6, 0.7, 0.753}, []float64{9e4, 3.1e4, 1.7e4, 9e3, 4e3, 3e3, -2e3}, capillary.StraightLine)
	must(t, err)
	rounded, err := capillary.NewTable([]float64{0.193, 0.24, 0.31, 0.45, 0.6, 0.7, 0.753}, []float64{9e4, 3.1e4, 1.7e4, 9e3, 4e3, 1e3, 0}, capillary.MonotoneCubic)
	must(t, err)
	let := relperm.LET{Swc: 0.193, Sor: 0.247, Krw0: 0.263, Kro0: 0.847, Lw: 6.5, Ew: 9, Tw: 0.8, Lo: 3.1, Eo: 4, To: 1.3}
	return []hardRock{
		{"R = 0.9", wet(), 0.193, inlet, 0.9, true},
		{"R = 0.99", wet(), 0.193, inlet, 0.99, true},
		{"R = 0.999", wet(), 0.193, inlet, 0.999, true},
		{"R = 1 - 1e-6", wet(), 0.193, inlet, 1 - 1.001e-6, true},
		{"R = 0.999 with mobile water", wet(), 0.41, inlet, 0.999, false},
		{"R = 1, mixed-wet", with(nil, mixed), 0.193, inlet, 1, true},
		{"R = 1, open face short of 1-Sor", wet(), 0.193, 0.7, 1, true},
		{"krw almost nothing, nw = 9", with(corey(9, 2.3), nil), 0.193, inlet, 0, true},
		{"LET with a long toe and a steep top", with(let, nil), 0.193, inlet, 0.5, true},
		{"kro almost nothing, no = 8", with(corey(3.4, 8), nil), 0.193, inlet, 0.9, true},
		{"mixed-wet, small window", with(nil, mixed), 0.1938, inlet, 0.3, false},
		{"Dc nearly constant at Swc", with(corey(1.55, 2), capillary.BrooksCorey{Swr: 0.193, Snr: 0.247, Entry: 5e3, Lambda: 2}), 0.193, inlet, 0, true},
		{"Dc singular at Swc", with(corey(1.2, 2), capillary.BrooksCorey{Swr: 0.193, Snr: 0.247, Entry: 5e3, Lambda: 2}), 0.193, inlet, 0, false},
		{"Dc hardly integrable at Swc", with(corey(1, 2), capillary.BrooksCorey{Swr: 0.193, Snr: 0.247, Entry: 5e3, Lambda: 0.7}), 0.193, inlet, 0.4, false},
		{"straight curves, nw = no = 1", with(corey(1, 1), nil), 0.193, inlet, 0.9, false},
		{"Si = Swc exactly", wet(), 0.193, inlet, 0, true},
		{"Si just above Swc", wet(), 0.193 + 1e-9, inlet, 0, false},
		{"Si just below 1-Sor", wet(), 0.7529999, inlet, 0.9, false},
		{"mobile water, counter-current", wet(), 0.5, inlet, 0, false},
		{"smooth tables", with(smooth, rounded), 0.193, inlet, 0.9, true},
		{"straight tables, krw 0 in three rows, level Pc", with(straight, pcs), 0.193, inlet, 0, true},
		{"straight tables, R = 0.99", with(straight, falling), 0.193, inlet, 0.99, true},
		{"Pc table that ends before 1-Sor", with(nil, rounded), 0.21, 0.7, 0, false},
	}
}

// TestHardCases holds every one of them to the properties of a solution.
func TestHardCases(t *testing.T) {
	for _, c := range hardRocks(t) {
		t.Run(c.name, func(t *testing.T) {
			span, err := NewSpan(c.rock, c.initial, c.inlet)
			must(t, err)
			if span.FiniteFront() != c.finite {
				t.Errorf("Dc ~ u^%v: finite front %v", span.LowPower, span.FiniteFront())
			}
			checkSolution(t, solved(t, span, c.ratio))
		})
	}
}

// checkSolution: F lies between R f and 1, F and F' are monotone, both ends are met, and the
// water that came in is the water in the profile.
func checkSolution(t *testing.T, s *Solution) {
	t.Helper()
	if !(s.A > 0 && s.A < math.Inf(1)) {
		t.Fatalf("A = %v", s.A)
	}
	if s.Residual > 1e-7 {
		t.Errorf("residual %g", s.Residual)
	}
	if last := s.History[len(s.History)-1]; last.A != s.A || !(last.Defect < exact+1e-15/(1-s.Ratio)) {
		t.Errorf("the history ends with A = %v, defect %g; A is %v", last.A, last.Defect, s.A)
	}
	if s.FiniteFront() != !math.IsInf(s.Front(1), 1) {
		t.Errorf("finite front %v, front %v", s.FiniteFront(), s.Front(1))
	}
	list := s.Samples(0)
	balance := 0.0
	for i, p := range list {
		f, _ := s.FractionalFlow(p.Sw)
		if !(p.F >= s.Ratio*f-1e-12 && p.F <= 1+1e-12) {
			t.Errorf("F(%v) = %v, R f = %v", p.Sw, p.F, s.Ratio*f)
		}
		if i == 0 {
			continue
		}
		before := list[i-1]
		if !(p.F >= before.F-1e-13 && p.Prime <= before.Prime*(1+primePart)) {
			t.Errorf("F, F' = %v, %v at %v after %v, %v at %v", p.F, p.Prime, p.Sw, before.F, before.Prime, before.Sw)
		}
		if before.Sw > s.Initial && !math.IsInf(before.Prime, 1) {
			balance += profiled(s, before, p)
		}
	}
	near(t, "water in the profile over water taken up", balance, 1-s.Ratio*s.start, 2e-3)
	within(t, "water gained over the share kept", s.Gained(1), s.Uptake(1)*(1-s.Ratio*s.start), 1e-18)
}

// profiled is the integral of S - Si over F' between two samples, by the trapezium rule with
// three points between them.
func profiled(s *Solution, from, to Sample) (sum float64) {
	sw, prime := from.Sw, from.Prime
	for n := 1; n <= 4; n++ {
		next := Sample{Sw: from.Sw + (to.Sw-from.Sw)*float64(n)/4}
		_, next.Prime = s.Flow(next.Sw)
		sum += (prime - next.Prime) * (sw + next.Sw - 2*s.Initial) / 2
		sw, prime = next.Sw, next.Prime
	}
	return sum
}

// TestOvertaken: level Pc between two rows, and a corner of R f that F cuts off.
func TestOvertaken(t *testing.T) {
	rock := wet()
	var err error
	rock.Kr, err = relperm.NewTable([]float64{0.193, 0.25, 0.33, 0.42, 0.55, 0.66, 0.753}, []float64{0, 0, 0, 0.034, 0.11, 0.19, 0.27},
		[]float64{0.85, 0.62, 0.4, 0.21, 0.06, 0.012, 0}, relperm.StraightLine)
	must(t, err)
	rock.Pc, err = capillary.NewTable([]float64{0.193, 0.24, 0.31, 0.45, 0.6, 0.7, 0.753}, []float64{9e4, 3.1e4, 1.7e4, 9e3, 4e3, 4e3, -2e3}, capillary.StraightLine)
	must(t, err)
	span, err := NewSpan(rock, 0.193, math.NaN())
	must(t, err)
	for ratio, want := range map[float64]Status{0.9: Converged, 0.99: Overtaken} {
		s, err := Solve(span, ratio)
		must(t, err)
		if s.Status != want {
			t.Errorf("R = %v: %s", ratio, s.Status)
		}
	}
}

// TestRandomRocks runs the same properties over random rocks.
func TestRandomRocks(t *testing.T) {
	random := rand.New(rand.NewPCG(4, 2))
	draw := func(low, high float64) float64 { return low + (high-low)*random.Float64() }
	for range 150 {
		swc, sor := draw(0, 0.3), draw(0, 0.4)
		rock := Rock{Permeability: math.Exp(draw(-37, -27)), Porosity: draw(0.05, 0.4),
			WaterViscosity: math.Exp(draw(-8, -6)), OilViscosity: math.Exp(draw(-10, -2)),
			Kr: relperm.Corey{Swc: swc, Sor: sor, Krw0: draw(0.02, 1), Kro0: draw(0.3, 1), Nw: draw(1, 7), No: draw(1, 7)}}
		if random.Float64() < 0.4 {
			rock.Kr = relperm.LET{Swc: swc, Sor: sor, Krw0: draw(0.02, 1), Kro0: draw(0.3, 1),
				Lw: draw(1, 6), Ew: draw(0.3, 15), Tw: draw(0.5, 3), Lo: draw(1, 6), Eo: draw(0.3, 15), To: draw(0.5, 3)}
		}
		switch random.IntN(3) {
		case 0:
			n := draw(1.6, 6)
			rock.Pc = capillary.VanGenuchten{Swr: swc, Snr: sor, P0: draw(1e3, 1e5), N: n, M: 1 - 1/n}
		case 1:
			rock.Pc = capillary.BrooksCorey{Swr: swc, Snr: sor, Entry: draw(1e3, 1e5), Lambda: draw(1.1, 5)}
		default:
			rock.Pc = capillary.Skjaeveland{Swr: swc, Sor: sor, Cw: draw(1e3, 1e4), Aw: draw(0.2, 0.9), Co: -draw(1e3, 1e4), Ao: draw(0.2, 0.9)}
		}
		initial := swc
		if random.Float64() < 0.5 {
			initial += draw(0, 0.9) * (rock.Inlet() - swc)
		}
		span, err := NewSpan(rock, initial, math.NaN())
		must(t, err)
		ratio := 0.0
		if random.Float64() < 0.6 {
			ratio = 1 - math.Exp(draw(-7, 0))
		}
		checkSolution(t, solved(t, span, ratio))
		if t.Failed() {
			t.Fatalf("%+v from %v, R = %v", rock, initial, ratio)
		}
	}
}

// TestSecondRoute compares A with a shooting computation of our own: from the open face down,
// by Runge & Kutta's fourth-order rule in the same coordinate, until K puts F - R f to zero at Si.
func TestSecondRoute(t *testing.T) {
	for _, ratio := range []float64{0, 0.31, 0.9} {
		span, err := NewSpan(wet(), 0.193, math.NaN())
		must(t, err)
		s := solved(t, span, ratio)
		k := 0.227 / (2 * s.A * s.A) * span.Width() * span.Width()
		near(t, "K by collocation over K by shooting", k/shoot(span, ratio, k), 1, 1e-7)
	}
}

// shoot looks for K in a tenth around a value: 1-F and F' integrated from the open face.
func shoot(span *Span, ratio, around float64) float64 {
	const high, low, steps = 18.0, -13.0, 6000
	step := (low - high) / steps
	miss := func(k float64) float64 {
		slope := func(eta, fallen, prime float64) (float64, float64) {
			u, rest := coordinates(eta)
			var d, rise float64
			if eta < 0 {
				d, rise = span.FromInitial(u * span.Width())
			} else {
				d, rise = span.FromInlet(rest * span.Width())
			}
			return -prime * u * rest, -k * d * u * rest / (1 - fallen - ratio*rise)
		}
		var fallen, prime float64
		for n := range steps {
			eta := high + float64(n)*step
			f1, p1 := slope(eta, fallen, prime)
			f2, p2 := slope(eta+step/2, fallen+step/2*f1, prime+step/2*p1)
			f3, p3 := slope(eta+step/2, fallen+step/2*f2, prime+step/2*p2)
			f4, p4 := slope(eta+step, fallen+step*f3, prime+step*p3)
			fallen += step / 6 * (f1 + 2*f2 + 2*f3 + f4)
			prime += step / 6 * (p1 + 2*p2 + 2*p3 + p4)
			if fallen >= 1 {
				return -1
			}
		}
		u, _ := coordinates(low)
		return 1 - fallen - prime*u
	}
	a, b := 0.9*around, 1.1*around
	return numeric.Zero(miss, a, b, miss(a), miss(b))
}

// TestSolveRefuses: what has no finite uptake says so.
func TestSolveRefuses(t *testing.T) {
	span, err := NewSpan(wet(), 0.193, math.NaN())
	must(t, err)
	rock := wet()
	rock.Kr = relperm.Corey{Swc: 0.193, Sor: 0.247, Krw0: 0.263, Kro0: 0.847, Nw: 1, No: 2.3}
	rock.Pc = capillary.BrooksCorey{Swr: 0.193, Snr: 0.247, Entry: 5000, Lambda: 0.4}
	unbounded, err := NewSpan(rock, 0.193, math.NaN())
	must(t, err)
	still, err := relperm.NewTable([]float64{0.193, 0.6, 0.753}, []float64{0, 0, 0.3}, []float64{0.8, 0.1, 0}, relperm.StraightLine)
	must(t, err)
	rock = wet()
	rock.Kr = still
	dry, err := NewSpan(rock, 0.193, 0.55)
	must(t, err)
	for name, c := range map[string]struct {
		span  *Span
		ratio float64
	}{
		"R = 1 at residual oil": {span, 1}, "R above 1": {span, 1.1}, "R below 0": {span, -0.1}, "R not a number": {span, math.NaN()},
		"uptake without bound": {unbounded, 0}, "water that cannot move": {dry, 0},
	} {
		_, err := Solve(c.span, c.ratio)
		var input *InputError
		if !errors.As(err, &input) {
			t.Errorf("%s: error %v", name, err)
		}
	}
}

func BenchmarkSolve(b *testing.B) {
	for _, ratio := range []float64{0, 0.999} {
		span, err := NewSpan(wet(), 0.193, math.NaN())
		if err != nil {
			b.Fatal(err)
		}
		b.Run(map[bool]string{true: "counter-current", false: "R = 0.999"}[ratio == 0], func(b *testing.B) {
			for b.Loop() {
				if _, err := Solve(span, ratio); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
}
