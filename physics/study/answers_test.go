package study

import (
	"fmt"
	"math"
	"strings"
	"testing"
)

// typed is a study of typed Corey curves: swc, sor, krw0, kro0, nw, no.
func typed(corey [6]float64, muw, muo float64) Study {
	st := Empty()
	st.Rock.Curve = "corey"
	for i, name := range []string{"swc", "sor", "krw0", "kro0", "nw", "no"} {
		unit := "fraction"
		if strings.HasPrefix(name, "n") {
			unit = ""
		}
		put(&st, "rock.corey."+name, corey[i], unit)
	}
	put(&st, "fluids.waterViscosity", muw, "Pa.s")
	put(&st, "fluids.oilViscosity", muo, "Pa.s")
	put(&st, "fluids.waterFormationFactor", 1, "m3/m3")
	put(&st, "fluids.oilFormationFactor", 1, "m3/m3")
	return st
}

func put(st *Study, path string, value float64, unit string) {
	spec, ok := Find(path)
	if !ok {
		panic(path)
	}
	spec.Set(st, &Input{Value: value, Unit: unit})
}

// expect compares figures, to a relative tolerance.
func expect(t *testing.T, r Result, tolerance float64, want map[string]float64) {
	t.Helper()
	if len(r.Problems) > 0 {
		t.Fatalf("problems: %+v", r.Problems)
	}
	for id, value := range want {
		sheet, _, _ := strings.Cut(id, ".")
		f, ok := r.Parts[Sheet(sheet)].Figure(id)
		if !ok {
			t.Errorf("no figure %s", id)
			continue
		}
		if math.Abs(f.Value-value) > tolerance*math.Abs(value) {
			t.Errorf("%s is %.15g, want %.15g", id, f.Value, value)
		}
	}
}

// Exact: for krw = S², kro = (1-S)² and M = µo/µw the tangent from the origin gives
// S = 1/√(1+M) and the speed (1+√(1+M))/2; the case M = 2 is in LeVeque (2002),
// section 16.1 (from memory). The rest follows by hand: fw behind the front is
// S v, the end-point mobility ratio is M, the total mobility behind the front over
// that ahead is M S² + (1-S)².
func TestQuadraticCurvesGiveTheClosedForm(t *testing.T) {
	for _, m := range []float64{0.5, 1, 2, 5, 10, 73} {
		root := math.Sqrt(1 + m)
		sw, speed := 1/root, (1+root)/2
		r := withoutGrid(typed([6]float64{0, 0, 1, 1, 2, 2}, 1e-3, m*1e-3))
		expect(t, r, 1e-12, map[string]float64{
			"front.shockSaturation": sw, "front.speed": speed, "front.breakthrough": 1 / speed,
			"front.recoveryAtBreakthrough": 1 / speed, "front.recoveryAtBreakthroughInPlace": 1 / speed, "front.averageAtBreakthrough": 1 / speed,
			"front.cutAtBreakthrough": sw * speed, "front.surfaceCutAtBreakthrough": sw * speed,
			"front.endPointMobility": m, "front.frontMobility": m*sw*sw + (1-sw)*(1-sw),
			"rock.crossover": 0.5,
		})
	}
}

// Independent SciPy computation, two methods (discrete hull with refined tangents;
// Legendre transform); invented rocks. Their error estimates are 1e-10 for the
// front saturation and the limit 2e-8 at most, 1e-12 for the rest.
func TestIndependentDisplacements(t *testing.T) {
	for _, c := range []struct {
		name       string
		corey      [6]float64
		muw, muo   float64
		front      map[string]float64
		limit, end float64
	}{
		{"water-wet", [6]float64{0.213, 0.237, 0.327, 0.861, 2.7, 2.15}, 0.00047, 0.00193, map[string]float64{
			"front.shockSaturation": 0.5857005867155664, "front.breakthrough": 0.43262502733173935, "front.averageAtBreakthrough": 0.6456250273317393, "front.recoveryAtOne": 0.4750341279128706,
		}, 0.8917231412026153, 0.4700407435572763},
		{"oil-wet", [6]float64{0.093, 0.171, 0.787, 0.931, 1.63, 4.3}, 0.00052, 0.0037, map[string]float64{
			"front.shockSaturation": 0.2729489341417332, "front.breakthrough": 0.2689636627068245, "front.averageAtBreakthrough": 0.36196366270682445, "front.recoveryAtOne": 0.3702525113496066,
		}, 1.3614699439799876, 0.3916024328787967},
	} {
		st := typed(c.corey, c.muw, c.muo)
		block(&st)
		put(&st, "field.rate", 100, "m3/d")
		put(&st, "field.waterCut", 95, "%")
		r := withoutGrid(st)
		expect(t, r, 1e-9, c.front)
		expect(t, r, 1e-7, map[string]float64{"field.limitInjected": c.limit, "field.recoveryAtLimit": c.end})
	}
}

func block(st *Study) {
	put(st, "field.length", 151, "m")
	put(st, "field.width", 87, "m")
	put(st, "field.thickness", 9.3, "m")
	put(st, "field.porosity", 0.217, "fraction")
}

// Independent SciPy computation, two methods (closed form; quadrature of a dense
// table of the resistance): constant pressure difference, invented rock. The error
// estimate of the times is 2e-3 s, 1e-11 of them.
func TestIndependentPressureDrive(t *testing.T) {
	st := typed([6]float64{0.213, 0.237, 0.327, 0.861, 2.7, 2.15}, 0.00047, 0.00593)
	block(&st)
	st.Field.Drive = "pressure"
	put(&st, "field.permeability", 8.7e-14, "m2")
	put(&st, "field.pressure", 2.3, "MPa")
	put(&st, "field.waterCut", 95, "%")
	for _, uptime := range []float64{1, 0.8} {
		put(&st, "field.uptime", uptime, "fraction")
		r := withoutGrid(st)
		expect(t, r, 1e-10, map[string]float64{"field.breakthrough": 50633742.53799751 / uptime, "field.injectedAtBreakthrough": 0.3579910356864853})
		history, ok := line(r.Parts[SheetField], "field.cumulative", "injection")
		if !ok {
			t.Fatal("no line of injection")
		}
		pv := 151 * 87 * 9.3 * 0.217
		for _, c := range []struct{ pvi, seconds float64 }{{0.1, 16223891.838602815}, {0.3, 43834218.658686765}, {0.7, 83456445.44206166}} {
			// Between the points of the line the rate changes by a part of its own
			// change over the line; 1e-3 of the time is well within that.
			if got := interpolate(history.Y, history.X, c.pvi*pv) * uptime; math.Abs(got/c.seconds-1) > 1e-3 {
				t.Errorf("%g PV injected after %.9g s, want %.9g", c.pvi, got, c.seconds)
			}
		}
	}
}

func line(p Part, chart, id string) (Line, bool) {
	for _, c := range p.Charts {
		for _, l := range c.Lines {
			if c.ID == chart && l.ID == id {
				return l, true
			}
		}
	}
	return Line{}, false
}

func interpolate(x, y []float64, at float64) float64 {
	for i := 1; i < len(x); i++ {
		if x[i] >= at {
			return y[i-1] + (y[i]-y[i-1])*(at-x[i-1])/(x[i]-x[i-1])
		}
	}
	return math.NaN()
}

// The field's figures by hand from the closed form of M = 2, in field units, with
// the barrel of 42 US gallons (5.614583 ft³) and the year of 365.25 days.
func TestFieldByHand(t *testing.T) {
	const barrel, foot = 0.158987294928, 0.3048
	st := typed([6]float64{0, 0, 1, 1, 2, 2}, 1e-3, 2e-3)
	put(&st, "fluids.waterFormationFactor", 1.03, "rb/stb")
	put(&st, "fluids.oilFormationFactor", 1.31, "rb/stb")
	put(&st, "field.length", 1730, "ft")
	put(&st, "field.width", 610, "ft")
	put(&st, "field.thickness", 37, "ft")
	put(&st, "field.porosity", 19.1, "%")
	put(&st, "field.rate", 790, "bbl/d")
	put(&st, "field.uptime", 91, "%")
	put(&st, "field.waterCut", 90, "%")
	put(&st, "field.permeability", 150, "md")
	pv := 1730 * 610 * 37 * 0.191 * foot * foot * foot
	rate := 790 * barrel / 86400
	q := 2 / (1 + math.Sqrt(3))
	// At surface 90 % is f = 0.9·1.03/(0.9·1.03 + 0.1·1.31) at reservoir conditions;
	// f = S²/(S² + (1-S)²/2) then gives S, and 1/f' the volume injected.
	f := 0.9 * 1.03 / (0.9*1.03 + 0.1*1.31)
	ratio := math.Sqrt((1 - f) / f * 2) // (1-S)/S
	sw := 1 / (1 + ratio)
	d := sw*sw + (1-sw)*(1-sw)/2
	limit := d * d / (sw * (1 - sw))
	recovery := sw + (1-f)*limit
	expect(t, withoutGrid(st), 1e-10, map[string]float64{
		"field.poreVolume": pv, "field.oilInPlace": pv / 1.31, "field.timePerPoreVolume": pv / (rate * 0.91),
		"field.breakthrough": q * pv / (rate * 0.91), "field.oilAtBreakthrough": q * pv / 1.31,
		"field.startOilRate": rate * 0.91 / 1.31, "field.startRate": rate * 0.91, "field.peakOilRate": rate * 0.91 / 1.31,
		"field.limitCut": f, "field.limitInjected": limit, "field.limitTime": limit * pv / (rate * 0.91),
		"field.recoveryAtLimit": recovery, "field.oilAtLimit": recovery * pv / 1.31, "field.waterAtLimit": (limit - recovery) * pv / 1.03,
		"field.waterOilRatioAtLimit": 9, // a water cut of 90 % is nine of water for one of oil
		// Darcy's law in oil: q µ L/(k A), 150 md being 150 × 9.869233e-16 m².
		"field.startPressure": rate * 2e-3 * 1730 * foot / (150 * 9.869232667160129e-16 * 610 * 37 * foot * foot),
	})
}

// An oil rate as the limit: at constant rate it is a water cut, 1 - qo Bo/q.
func TestOilRateLimitIsAWaterCutAtConstantRate(t *testing.T) {
	st := Demo()
	st.Field.Limit = "oilRate"
	put(&st, "field.rate", 1000, "bbl/d")
	put(&st, "field.uptime", 100, "%")
	put(&st, "field.oilRate", 50, "bbl/d")
	put(&st, "fluids.oilFormationFactor", 1.25, "rb/stb")
	expect(t, withoutGrid(st), 1e-10, map[string]float64{"field.limitCut": 1 - 50*1.25/1000})
}

// kr relative to ko(Swi) multiplies both curves by ko/k: fractional flow, and all of
// Front, is untouched; at constant pressure difference times are divided by it.
func TestReferencePermeability(t *testing.T) {
	st := Demo()
	st.Field.Drive = "pressure"
	oil := withoutGrid(st)
	st.Rock.Reference = "absolute"
	absolute := withoutGrid(st)
	value := func(r Result, sheet Sheet, id string) float64 {
		f, ok := r.Parts[sheet].Figure(id)
		if !ok {
			t.Fatalf("no figure %s", id)
		}
		return f.Value
	}
	factor := 381.0 / 436.0
	for id, want := range map[string]float64{"rock.krw0": factor, "rock.kro0": factor, "rock.crossover": 1, "rock.nw": 1} {
		if got := value(oil, SheetRock, id) / value(absolute, SheetRock, id); math.Abs(got-want) > 1e-12 {
			t.Errorf("%s changes by %g, want %g", id, got, want)
		}
	}
	for id, want := range map[string]float64{"field.breakthrough": 1 / factor, "field.limitTime": 1 / factor, "field.recoveryAtLimit": 1, "field.limitInjected": 1} {
		if got := value(oil, SheetField, id) / value(absolute, SheetField, id); math.Abs(got/want-1) > 1e-9 {
			t.Errorf("%s changes by %g, want %g", id, got, want)
		}
	}
}

// A fit through points taken from known curves finds them again, and the Front
// sheet then answers as with the curves typed.
func TestFitThroughExactPointsAnswersAsTheCurveTyped(t *testing.T) {
	corey := [6]float64{0.18, 0.22, 0.41, 0.83, 2.6, 3.1}
	st := typed(corey, 0.6e-3, 3.7e-3)
	want := withoutGrid(st)
	table := &Table{}
	for i := range 15 {
		s := float64(i) / 14
		table.Sw = append(table.Sw, 0.18+0.6*s)
		table.Krw = append(table.Krw, 0.41*math.Pow(s, 2.6))
		table.Kro = append(table.Kro, 0.83*math.Pow(1-s, 3.1))
	}
	st.Rock.Table, st.Rock.Curve = table, "corey-fit"
	for _, id := range []string{"front.breakthrough", "front.shockSaturation", "front.recoveryAtOne", "front.frontMobility"} {
		f, _ := want.Parts[SheetFront].Figure(id)
		expect(t, withoutGrid(st), 1e-7, map[string]float64{id: f.Value})
	}
}

// TestDemoFigures watches the figures of the demonstration. It is a tripwire, not
// an authority: a change of them is to be meant.
func TestDemoFigures(t *testing.T) {
	var b strings.Builder
	r := withoutGrid(Demo())
	for _, sheet := range []Sheet{SheetRock, SheetFront, SheetField} {
		for _, f := range r.Parts[sheet].Figures {
			fmt.Fprintf(&b, "%s %.6g\n", f.ID, f.Value)
		}
	}
	golden(t, b.String())
}
