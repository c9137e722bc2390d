package reservoir

import (
	"math"
	"math/rand/v2"
	"testing"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

func invented(t *testing.T, muo float64) Path {
	t.Helper()
	flow := fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: muo}
	d, err := displace.New(flow, 0.763, 0.213)
	if err != nil {
		t.Fatal(err)
	}
	return Path{PoreVolume: 1, Impedance: 1, Shape: Even, Flood: NewFlood(flow, d)}
}

// Under one rate or one pressure a run is the linear flood.
func TestRunOfOneStep(t *testing.T) {
	flow := fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: 5.93e-3}
	for _, drive := range []Drive{ConstantRate{2e-4}, ConstantPressure{2.3e6}} {
		l := build(t, rock(drive), flow, 0.763, 0.213)
		path := Path{PoreVolume: l.PoreVolume(), Impedance: l.Length / (l.Permeability * l.Area), Shape: Even, Flood: NewFlood(flow, l.Displacement)}
		pv := path.PoreVolume
		step := Step{}
		switch d := drive.(type) {
		case ConstantRate:
			step.Rate = d.Q
		case ConstantPressure:
			step.Pressure = d.DP
		}
		r := NewRun(Bundle{{path, pv, 1 / (pv * path.Impedance)}}, pv, l.Uptime, []Step{step}, 1e10)
		bt, _ := l.Breakthrough()
		for _, share := range []float64{0.2, 0.9, 1.3, 9} {
			want, m := l.At(share*bt), r.At(share*bt)
			near(t, "injected", m.Injected*pv, want.CumInjected, 1e-13*want.CumInjected)
			near(t, "oil rate", m.OilRate*m.Pace*pv/l.Bo, want.OilRate, 1e-12*want.OilRate)
			near(t, "injection rate", m.Rate*m.Pace*pv, want.InjectionRate, 1e-13*want.InjectionRate)
			near(t, "pressure", m.Pressure, want.PressureDrop, 1e-12*want.PressureDrop)
			near(t, "time", r.TimeAt(m.Clock), m.Time, 1e-12*m.Time)
		}
	}
}

// Random schedules: volumes go on where they were, no limit is passed, a rate that can be
// held is, and what is injected is the integral of the rate.
func TestSchedules(t *testing.T) {
	rng := rand.New(rand.NewPCG(8, 15))
	for trial := range 40 {
		b := randomBundle(rng, invented(t, math.Exp(rng.NormFloat64()-6)).Tabulate(1e-9), 1+rng.IntN(12), rng.Float64())
		steps, from := []Step{}, 0.0
		for range 1 + rng.IntN(5) {
			s := Step{From: from}
			if kind := rng.IntN(4); kind > 0 {
				s.Rate = 0.02 + 0.2*rng.Float64()
			}
			if kind := rng.IntN(3); kind > 0 {
				s.Pressure = 1e-4 * (1 + 9*rng.Float64())
			}
			steps, from = append(steps, s), from+5*rng.Float64()
		}
		end := from + 10
		r := NewRun(b, 1, 0.9, steps, end)
		if len(r.pieces) > 10*len(steps) {
			t.Fatalf("trial %d: %d pieces", trial, len(r.pieces))
		}
		const n = 4000
		former := r.At(0)
		sum := 0.0
		for i := 1; i <= n; i++ {
			at := end * float64(i) / n
			m := r.At(at)
			if m.Injected < former.Injected-1e-12 || m.Oil < former.Oil-1e-9 {
				t.Fatalf("trial %d: volumes shrink at %g", trial, at)
			}
			var s Step
			for _, one := range steps {
				if one.From <= at {
					s = one
				}
			}
			rate := m.Rate * m.Pressure
			if s.Pressure > 0 && m.Pressure > s.Pressure*(1+1e-9) || s.Rate > 0 && rate > s.Rate*(1+1e-9) {
				t.Fatalf("trial %d: step %+v, rate %g at %g Pa", trial, s, rate, m.Pressure)
			}
			if s.Rate > 0 && rate < s.Rate*(1-1e-6) && m.Pressure < s.Pressure*(1-1e-6) {
				t.Fatalf("trial %d: step %+v is held to %g at %g Pa without need", trial, s, rate, m.Pressure)
			}
			middle := r.At(end * (float64(i) - 0.5) / n)
			sum += middle.Rate * middle.Pace * end / n
			former = m
		}
		near(t, "integral of the rate", sum, former.Injected, 3e-3*former.Injected+1e-9) // a step within an interval of the midpoint rule
	}
}

// A rate that the limit forbids from the first moment is held to the limit from then on,
// and by nothing once the flood takes it.
func TestRateBeyondItsLimit(t *testing.T) {
	path := invented(t, 5.93e-3) // resists less and less
	const limit = 1e-3
	rate := 1.2 * limit / path.Resistance(0)
	r := NewRun(path, 1, 1, []Step{{Rate: rate, Pressure: limit}}, 1e5)
	if len(r.pieces) != 2 || r.pieces[0].pressure != limit || r.pieces[1].rate != rate {
		t.Fatalf("pieces %+v", r.pieces)
	}
	near(t, "resistance as it lets go", path.At(r.pieces[1].clock).Rate, rate/limit, 1e-12*rate/limit)
	near(t, "time", r.pieces[1].time, r.pieces[1].clock/limit, 1e-12*r.pieces[1].time)
}

// Gas-filled space: nothing comes out before it is filled, and afterwards oil lags by it.
func TestFillUp(t *testing.T) {
	path := invented(t, 5.93e-3)
	const gas = 0.07
	f := Filling{path, gas}
	before, after := f.At(path.Clock(0.069)), f.At(path.Clock(1.4))
	if before.Oil != 0 || before.OilRate != 0 || before.Cut() != 0 || before.HoldingRate != before.Rate {
		t.Errorf("before: %+v", before)
	}
	plain := path.At(path.Clock(1.4))
	near(t, "oil", after.Oil, plain.Oil-gas, 1e-15)
	near(t, "held", after.Held, gas, 0)
	near(t, "cut", after.Cut(), plain.Cut(), 1e-15)
}

// straight curves are piston-like up to a mobility ratio of 1.
var straight = relperm.Corey{Swc: 0.2, Sor: 0.2, Krw0: 1, Kro0: 1, Nw: 1, No: 1}

// By hand, from the formula of Muskat (1937).
func TestEndResistance(t *testing.T) {
	near(t, "end", EndResistance(300, 200, 0.1, 2), 200*(math.Log(200/(0.2*math.Pi))+2)/(math.Pi*300), 1e-15)
}
