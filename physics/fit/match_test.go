package fit

import (
	"errors"
	"math"
	"math/rand/v2"
	"testing"
)

// decay is a model in closed form: a e^(-b t) + c, beside values of it with scatter.
func decay(times []float64, truth [3]float64, scatter float64, seed uint64) Deviations {
	r := rand.New(rand.NewPCG(seed, 1))
	values := make([]float64, len(times))
	for i, t := range times {
		values[i] = truth[0]*math.Exp(-truth[1]*t) + truth[2] + scatter*r.NormFloat64()
	}
	return func(v, r []float64) bool {
		for i, t := range times {
			r[i] = v[0]*math.Exp(-v[1]*t) + v[2] - values[i]
		}
		return true
	}
}

func tenths(n int) []float64 {
	times := make([]float64, n)
	for i := range times {
		times[i] = float64(i) / 10
	}
	return times
}

func frees(values, low, high [3]float64) []Free {
	list := make([]Free, 3)
	for j, symbol := range []string{"a", "b", "c"} {
		list[j] = Free{Symbol: symbol, Label: symbol, Value: values[j], Min: low[j], Max: high[j]}
	}
	return list
}

// What made the values is found again; the slopes are differences, so the last digits
// are not.
func TestMatchFindsWhatMadeTheValues(t *testing.T) {
	truth := [3]float64{2.5, 1.3, 0.4}
	m, err := Match(frees([3]float64{1, 3, 0}, [3]float64{0, 0.1, -1}, [3]float64{9, 5, 2}), 40, decay(tenths(40), truth, 0, 1), 100)
	if err != nil || m.Status != Converged {
		t.Fatal(err, m.Status)
	}
	for j, p := range m.Parameters {
		if !near(p.Value, truth[j], 1e-8) {
			t.Errorf("%s = %.12g, want %g", p.Symbol, p.Value, truth[j])
		}
	}
}

// Property: from any start, to any values, the misfit never rises, what is found lies
// within the bounds, and so does its interval, which holds it.
func TestMatchNeverRaisesTheMisfit(t *testing.T) {
	r := rand.New(rand.NewPCG(3, 7))
	for round := range 200 {
		var value, low, high, truth [3]float64
		for j := range value {
			low[j], high[j] = r.Float64(), 1+2*r.Float64()
			value[j], truth[j] = low[j]+(high[j]-low[j])*r.Float64(), 3*r.Float64()
		}
		at := decay(tenths(25), truth, 0.2*r.Float64(), uint64(round))
		hole := 3 * r.Float64() // no answer beyond it
		m, err := Match(frees(value, low, high), 25, func(v, r []float64) bool {
			for j := range v {
				if v[j] < low[j] || v[j] > high[j] {
					t.Fatalf("round %d: asked at %v, beyond %v to %v", round, v, low, high)
				}
			}
			return v[1] <= math.Max(hole, value[1]) && at(v, r)
		}, 20)
		if err != nil {
			t.Fatal(err)
		}
		if !(m.RMS <= m.Before) {
			t.Errorf("round %d: the misfit rose from %g to %g", round, m.Before, m.RMS)
		}
		own, values := make([]float64, 25), make([]float64, 3)
		for j, p := range m.Parameters {
			values[j] = p.Value
			if !(p.Min <= p.Low && p.Low <= p.Value && p.Value <= p.High && p.High <= p.Max) {
				t.Errorf("round %d: %+v", round, p)
			}
		}
		at(values, own)
		if !near(math.Sqrt(dot(own, own)/25), m.RMS, 1e-12) {
			t.Errorf("round %d: the misfit told is %g, at the values it is %g", round, m.RMS, math.Sqrt(dot(own, own)/25))
		}
	}
}

// A quantity that changes nothing is not determined, and one whose bounds end short of
// the truth lies at its bound: both are said.
func TestMatchSaysWhatItCannotTell(t *testing.T) {
	at := decay(tenths(30), [3]float64{2, 1, 0}, 0.01, 4)
	idle := append(frees([3]float64{1, 1, 0}, [3]float64{0, 0.1, -1}, [3]float64{1.5, 5, 1}), Free{Symbol: "z", Label: "idle", Value: 1, Min: 0, Max: 2})
	m, err := Match(idle, 30, at, 50)
	if err != nil || !m.Parameters[0].AtBound || m.Parameters[3].Determined || m.Parameters[3].Value != 1 || len(m.Verdict) < 2 {
		t.Errorf("%v: %+v %q", err, m.Parameters, m.Verdict)
	}
}

// The edge of where the model answers may be where the match begins, at a bound or not, and
// where it would end: it comes nearer all the same, though not along the edge.
func TestMatchAlongTheEdgeOfWhatIsAnswered(t *testing.T) {
	truth, low, high := [3]float64{2, 0.7, 0.1}, [3]float64{0, 0.1, -1}, [3]float64{9, 5, 1}
	upTo := func(edge float64, at Deviations) Deviations {
		return func(v, r []float64) bool {
			if v[1] < low[1] {
				t.Fatal("asked beyond a bound:", v)
			}
			return v[1] <= edge && at(v, r)
		}
	}
	m, err := Match(frees([3]float64{1, 1, 0}, low, high), 40, upTo(1, decay(tenths(40), truth, 0, 1)), 100)
	if err != nil || !near(m.Parameters[1].Value, 0.7, 1e-6) {
		t.Errorf("from the edge: %v %+v", err, m.Parameters)
	}
	if m, err := Match(frees([3]float64{1, low[1], 0}, low, high), 40, upTo(low[1], decay(tenths(40), truth, 0, 1)), 100); err != nil || m.Parameters[1].Value != low[1] || !(m.RMS < m.Before) {
		t.Errorf("held at the edge: %v %+v", err, m.Parameters)
	}
	for seed := range uint64(20) {
		at := decay(tenths(40), truth, 0.1, seed)
		free, _ := Match(frees([3]float64{1, 0.3, 0}, low, high), 40, at, 200)
		m, err := Match(frees([3]float64{1, 0.3, 0}, low, high), 40, upTo(free.Parameters[1].Value, at), 200)
		if err != nil || !(m.RMS < m.Before) || m.RMS < free.RMS*(1-1e-9) {
			t.Errorf("seed %d: up to the edge the misfit is %g from %g, free %g", seed, m.RMS, m.Before, free.RMS)
		}
	}
}

func TestMatchEndsWhenTheModelStopsAnswering(t *testing.T) {
	at := decay(tenths(30), [3]float64{2, 1, 0}, 0.01, 4)
	for stop := range 12 {
		calls := 0
		m, err := Match(frees([3]float64{1, 3, 0.5}, [3]float64{0, 0.1, -1}, [3]float64{9, 5, 1}), 30, func(v, r []float64) bool {
			calls++
			return calls <= stop && at(v, r)
		}, 500)
		if stop == 0 && !errors.Is(err, ErrUnanswered) || stop > 0 && err != nil {
			t.Errorf("stopped after %d: %v", stop, err)
		}
		if calls > stop+40 || !(m.RMS <= m.Before) {
			t.Errorf("stopped after %d: called %d times, misfit %g from %g", stop, calls, m.RMS, m.Before)
		}
	}
	var refused *RefusedError
	if _, err := Match(nil, 30, at, 9); !errors.As(err, &refused) {
		t.Error("nothing is free:", err)
	}
	if _, err := Match(frees([3]float64{}, [3]float64{}, [3]float64{1, 1, 1}), 3, at, 9); !errors.As(err, &refused) {
		t.Error("three rows for three:", err)
	}
}
