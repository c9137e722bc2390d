package reservoir

import (
	"math"
	"math/rand/v2"
	"testing"

	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
)

// A water-cut limit at surface is the reservoir cut it stands for; one inside the jump of
// the front is the front's arrival; one beyond what is injected is never met.
func TestWaterCutLimit(t *testing.T) {
	flow := fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: 5.93e-3}
	for _, drive := range []Drive{ConstantRate{2e-4}, ConstantPressure{2.3e6}} {
		l := build(t, rock(drive), flow, 0.763, 0.213)
		late := l.AtWaterCut(0.95)
		if late.Outcome != Reached {
			t.Fatalf("%+v", late)
		}
		near(t, "cut at the limit", l.At(late.Time).WaterCut, 0.95, 1e-12)
		near(t, "time", late.Time, l.TimeAt(late.PVI), 0)
		bt, pvi := l.Breakthrough()
		jump := l.AtWaterCut(0.2)
		near(t, "in the jump", jump.Time, bt, 1e-9*bt)
		near(t, "in the jump", jump.PVI, pvi, 1e-15)
	}
	mixed := build(t, rock(ConstantRate{2e-4}), flow, 0.5, 0.213) // oil in the injected stream
	got := mixed.AtWaterCut(0.9999)
	_, f := flow.At(0.5)
	if got.Outcome != Never || !math.IsInf(got.Time, 1) || !(got.Final < 0.9999) || f == 0 {
		t.Errorf("%+v", got)
	}
	f0, _ := flow.At(0.5)
	near(t, "final cut", got.Final, fracflow.SurfaceCut(f0, 1.02, 1.31), 1e-15)
	wet := build(t, rock(ConstantRate{2e-4}), flow, 0.763, 0.5) // watered out at the start
	if got := wet.AtWaterCut(0.3); got.Outcome != FromTheStart || got.Time != 0 {
		t.Errorf("%+v", got)
	}
}

// At constant pressure the oil rate is ~ 1/R(Q) until break-through: it falls, in closed
// form, behind water more viscous than the oil, and rises when the oil is the viscous one.
// Then any limit below the highest rate is met at break-through or later, even one above
// the rate at the start.
func TestOilRateLimitAtConstantPressure(t *testing.T) {
	falling := fracflow.Flow{Curves: relperm.Corey{Swc: 0.2, Sor: 0.2, Krw0: 1, Kro0: 1, Nw: 1, No: 1}, MuW: 1e-3, MuO: 0.25e-3}

	l := build(t, rock(ConstantPressure{1e6}), falling, 0.8, 0.2)
	first, last := l.At(0).OilRate, l.AtPVI(0.6*(1-1e-12)).OilRate
	if !(last < first) {
		t.Fatalf("oil rate goes from %g to %g, meant to fall", first, last)
	}
	bt, _ := l.Breakthrough()
	if got := l.AtOilRate(last / 2); got.Outcome != Reached || math.Abs(got.Time-bt) > 1e-9*bt {
		t.Errorf("below the rate at break-through: %+v, want its time %g", got, bt)
	}
	// Between: R = Q/(lw Qf) + (1 - Q/Qf)/lo and rate = k A dp uptime/(L R Bo), solved for Q by hand.
	limit := (first + last) / 2
	lw, lo, qf := 1e3, 4e3, 0.6
	r := 8.7e-14 * 730 * 1e6 * 0.93 / (151 * 1.31 * limit)
	near(t, "between", l.AtOilRate(limit).PVI, (r-1/lo)/(1/lw-1/lo)*qf, 1e-12)
	if got := l.AtOilRate(first * 1.01); got.Outcome != FromTheStart || got.Time != 0 {
		t.Errorf("above every rate: %+v", got)
	}

	flow := fracflow.Flow{Curves: viscous, MuW: 0.47e-3, MuO: 5.93e-3}
	l = build(t, rock(ConstantPressure{1e6}), flow, 0.763, 0.213)
	bt, pvi := l.Breakthrough()
	first, last = l.At(0).OilRate, l.AtPVI(pvi*(1-1e-12)).OilRate
	if !(last > first) {
		t.Fatalf("oil rate goes from %g to %g, meant to rise", first, last)
	}
	if got := l.AtOilRate((first + last) / 2); got.Outcome != Reached || got.Time < bt*(1-1e-9) {
		t.Errorf("a limit that the rate begins below and crosses twice: %+v, want no earlier than %g", got, bt)
	}
}

// From the limit on the rate stays below it, and it did not just before: sampled on
// both sides, over random curves and both drives.
func TestOilRateLimitHolds(t *testing.T) {
	r := rand.New(rand.NewPCG(5, 11))
	reached := 0
	for i := range 400 {
		wide := func(lo, hi float64) float64 { return lo * math.Pow(hi/lo, r.Float64()) }
		flow := fracflow.Flow{
			Curves: relperm.Corey{Swc: 0.2, Sor: 0.2, Krw0: wide(0.05, 1), Kro0: wide(0.1, 1), Nw: 1 + 4*r.Float64(), No: 1 + 4*r.Float64()},
			MuW:    1e-3, MuO: 1e-3 * wide(0.05, 200),
		}
		injected, initial := 0.8-0.2*r.Float64()*float64(i%2), 0.2+0.2*r.Float64()*float64(i/2%2)
		drive := Drive(ConstantPressure{1e6})
		if i%3 == 0 {
			drive = ConstantRate{1e-4}
		}
		l := build(t, rock(drive), flow, injected, initial)
		_, pvi := l.Breakthrough()
		rate := l.AtPVI(pvi*wide(0.01, 30)).OilRate * wide(0.7, 1.2)
		got := l.AtOilRate(rate)
		switch got.Outcome {
		case Never:
			if got.Final < rate {
				t.Fatalf("case %d: never, though the rate tends to %g, below %g", i, got.Final, rate)
			}
			continue
		case Reached:
			reached++
			if before := l.AtPVI(got.PVI * (1 - 1e-9)).OilRate; before < rate*(1-1e-7) {
				t.Fatalf("case %d: %g just before, limit %g", i, before, rate)
			}
		}
		for range 30 {
			if after := l.AtPVI(math.Max(got.PVI, 1e-9) * (1 + wide(1e-6, 1e4))).OilRate; after > rate*(1+1e-9) {
				t.Fatalf("case %d: %g after the limit %g of %+v", i, after, rate, got)
			}
		}
	}
	if reached < 100 {
		t.Fatalf("only %d limits were reached: the test has lost its point", reached)
	}
}
