package displace

import (
	"math"
	"testing"

	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

func powers(n, m float64) fracflow.Flow {
	return fracflow.Flow{Curves: relperm.Corey{Krw0: 1, Kro0: 1, Nw: n, No: n}, MuW: 1e-3, MuO: m * 1e-3}
}

func solve(t *testing.T, fn fracflow.Function, injected, initial float64) *Displacement {
	t.Helper()
	d, err := New(fn, injected, initial)
	if err != nil {
		t.Fatal(err)
	}
	return d
}

// Exact result for quadratic curves, M = muo/muw: break-through at 2/(1+sqrt(1+M)), and
// the recovery there is the same number, since only oil left before.
func TestQuadraticRecovery(t *testing.T) {
	for _, m := range []float64{1e-6, 0.5, 2, 10, 1e6} {
		d := solve(t, powers(2, m), 1, 0)
		want := 2 / (1 + math.Sqrt(1+m))
		near(t, "break-through", d.Breakthrough(), want, 1e-14*want)
		near(t, "recovery at break-through", d.Recovery(d.Breakthrough()), want, 1e-13)
		near(t, "recovery just before", d.Recovery(want*(1-1e-9)), want*(1-1e-9), 1e-15)
		behind, ahead, ok := d.Front()
		near(t, "front", behind*math.Sqrt(1+m), 1, 1e-12)
		if !ok || ahead != 0 {
			t.Errorf("M = %g: front %g, %v", m, ahead, ok)
		}
	}
}

// Exact result for straight curves with M > 1: S(xi) = (sqrt(M/xi)-1)/(M-1) between
// speeds 1/M and M, recovery (2 sqrt(M Q) - Q - 1)/(M-1), all recovered at Q = M.
func TestStraightRecovery(t *testing.T) {
	for _, m := range []float64{1.5, 4, 100} {
		d := solve(t, powers(1, m), 1, 0)
		for _, u := range []float64{0, 0.1, 0.5, 0.9, 1} {
			xi := math.Pow(m, 2*u-1)
			near(t, "profile", d.Saturation(xi), (math.Sqrt(m/xi)-1)/(m-1), 1e-14*m)
			q := 1 / xi
			near(t, "recovery", d.Recovery(q), (2*math.Sqrt(m*q)-q-1)/(m-1), 1e-14*m)
		}
		near(t, "all of it", d.Recovery(2*m), 1, 1e-14)
		// f = M S/(1+(M-1)S) = c  at  S = c/(M-(M-1)c), Q = (1+(M-1)S)^2/M.
		s := 0.9 / (m - (m-1)*0.9)
		q, ok := d.PVIAtCut(0.9)
		want := (1 + (m-1)*s) * (1 + (m-1)*s) / m
		if !ok {
			t.Fatal("cut 0.9 never reached")
		}
		near(t, "PVI at cut 0.9", q, want, 1e-13*want)
		if q, ok := d.PVIAtCut(1); !ok || math.Abs(q-m) > 1e-12*m {
			t.Errorf("pure water at %g, %v, want %g", q, ok, m)
		}
	}
}

// Straight curves with M <= 1 and a steep table are displaced piston-like: one front at
// speed 1, everything movable recovered when it arrives.
func TestPiston(t *testing.T) {
	for _, m := range []float64{0.01, 0.5, 1} {
		d := solve(t, powers(1, m), 1, 0)
		near(t, "break-through", d.Breakthrough(), 1, 1e-15)
		near(t, "half way", d.Recovery(0.5), 0.5, 1e-15)
		near(t, "after", d.Recovery(3), 1, 1e-15)
		for _, cut := range []float64{0.01, 0.5, 1} { // all inside the jump
			if q, ok := d.PVIAtCut(cut); !ok || math.Abs(q-1) > 1e-15 {
				t.Errorf("cut %g at %g, %v, want 1", cut, q, ok)
			}
		}
		if s := d.Saturation(1); s != 1 {
			t.Errorf("state at the shock is %g, want the one behind", s)
		}
	}
}

func TestThreeSensesOfRecovery(t *testing.T) {
	flow := fracflow.Flow{Curves: relperm.Corey{Swc: 0.2, Sor: 0.25, Krw0: 1, Kro0: 1, Nw: 1, No: 1}, MuW: 1e-3, MuO: 1e-3}
	d := solve(t, flow, 0.75, 0.2)
	all := d.Recovery(5)
	near(t, "of pore volume", all, 0.55, 1e-15)
	near(t, "of oil in place", d.OfOilInPlace(all), 0.55/0.8, 1e-15)
	near(t, "of movable oil", d.OfMovableOil(all), 1, 1e-15)
}

// Nothing moves when the injected state is the initial one.
func TestNothingMoves(t *testing.T) {
	d := solve(t, powers(2, 5), 0.4, 0.4)
	_, f := d.InletFace()
	if !math.IsInf(d.Breakthrough(), 1) || d.FrontSpeed() != 0 || d.Recovery(2) != 0 || d.Saturation(0.5) != 0.4 {
		t.Errorf("moves: %g %g %g", d.Breakthrough(), d.FrontSpeed(), d.Recovery(2))
	}
	if q, ok := d.PVIAtCut(f / 2); q != 0 || !ok {
		t.Errorf("a cut already exceeded at %g, %v", q, ok)
	}
	if _, ok := d.PVIAtCut(f + 0.1); ok {
		t.Error("a cut beyond f is reached")
	}
	if _, _, ok := d.Front(); ok {
		t.Error("there is a front")
	}
}

// Counter-current flow. Down-dip flow with f above 1: the inlet face takes the state of
// largest f, found here by sampling, and waves that run backwards stay out.
func TestCounterCurrentInlet(t *testing.T) {
	flow := powers(2, 4)
	flow.Gravity = -3 * flow.MuO
	d := solve(t, flow, 1, 0)
	bestS, bestF := 0.0, math.Inf(-1)
	for i := range 100001 {
		s := float64(i) / 100000
		if f, _ := flow.At(s); f > bestF {
			bestS, bestF = s, f
		}
	}
	s, f := d.InletFace()
	near(t, "inlet state", s, bestS, 1e-5)
	near(t, "inlet f", f, bestF, 1e-9)
	if f <= 1 {
		t.Errorf("f at the inlet is %g, meant to exceed 1", f)
	}
	q := d.Breakthrough() / 2
	near(t, "recovery before break-through", d.Recovery(q), q*f, 1e-15)
	near(t, "oil at the outlet", d.After(q).Oil, q, 1e-15)
}
