package study

import (
	"math"
	"slices"
	"strings"
	"testing"

	"brinefront/physics/units"
)

// tilted is a study of typed curves in a dipping layer whose gravity term N, times 1/µo,
// is n: a velocity is typed that makes it so.
func tilted(corey [6]float64, muw, muo, n float64) Study {
	st := typed(corey, muw, muo)
	const k, heavy, light = 1e-12, 1040.0, 800.0
	put(&st, "front.dip", math.Copysign(30, n), "deg")
	put(&st, "fluids.waterDensity", heavy, "kg/m3")
	put(&st, "fluids.oilDensity", light, "kg/m3")
	put(&st, "field.permeability", k, "m2")
	put(&st, "front.velocity", k*(heavy-light)*units.StandardGravity*0.5/(math.Abs(n)*muo), "m/s")
	return st
}

// Exact, derived by hand. For krw = S², kro = (1-S)², M = µo/µw and n = N/µo
//
//	f = M S² [1 - n (1-S)²]/[M S² + (1-S)²],  f(0) = 0
//
// the tangent from the origin, f = S f', is with a = 1 + M the quartic
//
//	(1-n) + 4 n S + (a n - a - 7 n) S² + 4 n S³ - a n S⁴ = 0
//
// which is linear in n, so that every S has its n:
//
//	n = (a S² - 1)/(-1 + 4 S + (a-7) S² + 4 S³ - a S⁴)
//
// and n = 0 gives back S = 1/√(1+M). The cases are in whole numbers.
func TestQuadraticCurvesWithGravityGiveTheClosedForm(t *testing.T) {
	for _, c := range []struct{ m, n, sw, cut float64 }{
		{1, 16.0 / 31, 3.0 / 4, 27.0 / 31},    // up-dip
		{3, 275.0 / 416, 3.0 / 5, 81.0 / 104}, // up-dip
		{1, -9.0 / 19, 2.0 / 3, 16.0 / 19},    // down-dip
		{1, -4, 1.0 / 2, 1},                   // down-dip, oil flows back where S > 1/2
	} {
		a := 1 + c.m
		quartic := (1 - c.n) + 4*c.n*c.sw + (a*c.n-a-7*c.n)*c.sw*c.sw + 4*c.n*math.Pow(c.sw, 3) - a*c.n*math.Pow(c.sw, 4)
		if math.Abs(quartic) > 1e-14 {
			t.Fatalf("M = %g, n = %g, S = %g does not solve the quartic: %g", c.m, c.n, c.sw, quartic)
		}
		r := withoutGrid(tilted([6]float64{0, 0, 1, 1, 2, 2}, 1e-3, c.m*1e-3, c.n))
		expect(t, r, 1e-11, map[string]float64{
			"front.gravityTerm": c.n * c.m * 1e-3, "front.shockSaturation": c.sw, "front.cutAtBreakthrough": c.cut, "front.speed": c.cut / c.sw, "front.breakthrough": c.sw / c.cut,
		})
		if c.n > -1 { // what enters is water alone
			expect(t, r, 1e-11, map[string]float64{"front.recoveryAtBreakthrough": c.sw / c.cut, "front.averageAtBreakthrough": c.sw / c.cut})
		}
	}
}

// Independent SciPy computation, two methods, invented rock (case bl-03): water up a
// dip of 63 degrees. Tolerances are some times its error estimates.
func TestIndependentDisplacementUpDip(t *testing.T) {
	st := typed([6]float64{0.178, 0.206, 0.412, 0.893, 2.3, 2.6}, 0.00058, 0.0027)
	put(&st, "front.dip", 63, "deg")
	put(&st, "fluids.waterDensity", 1043, "kg/m3")
	put(&st, "fluids.oilDensity", 812, "kg/m3")
	put(&st, "field.permeability", 1.37e-12, "m2")
	block(&st)
	put(&st, "field.rate", 7.3e-7*87*9.3, "m3/s") // the velocity follows from rate and cross-section
	put(&st, "field.waterCut", 95, "%")
	r := withoutGrid(st)
	expect(t, r, 1e-9, map[string]float64{
		"front.velocity": 7.3e-7, "front.shockSaturation": 0.574937758685915, "front.speed": 2.1201605078483547, "front.breakthrough": 0.4716624030577997,
		"front.averageAtBreakthrough": 0.6496624030577998, "front.recoveryAtOne": 0.519109944342353,
	})
	expect(t, r, 1e-8, map[string]float64{"field.limitInjected": 1.0387585720992285, "field.recoveryAtLimit": 0.5211026723638523})
	profile := must(t, r.Parts[SheetFront], "front.profile", "profile")
	for i, xi := range []float64{0.106008, 0.424032, 0.742056, 1.06008, 1.378104, 1.696128, 2.014152} {
		want := []float64{0.7518463912516099, 0.6996646040965935, 0.6659615836856317, 0.6396539651573032, 0.617559516630386, 0.5981541600602259, 0.5805302812172991}[i]
		near(t, "saturation", interpolate(profile.X, profile.Y, xi), want, 1e-3)
	}
}

// Dake (1978), exercise 10.3, from memory, as printed: a critical rate of 519 rb/d, an
// interface at 2.7 degrees at nine tenths of it; in a level layer with the phases apart
// water arrives after 0.16 PV. The layer is that of exercise 10.2.
func TestDakeSegregatedFlow(t *testing.T) {
	st := typed([6]float64{0.2, 0.2, 0.3, 0.8, 2, 2}, 0.5e-3, 5e-3)
	expect(t, withoutGrid(st), 0.005/0.16, map[string]float64{"front.apartBreakthrough": 0.16})
	put(&st, "front.dip", 25, "deg")
	put(&st, "fluids.waterDensity", 1.04, "g/cm3")
	put(&st, "fluids.oilDensity", 0.81, "g/cm3")
	put(&st, "field.permeability", 2000, "md")
	put(&st, "field.width", 625, "ft")
	put(&st, "field.thickness", 40, "ft")
	put(&st, "field.rate", 400, "bbl/d")
	const barrelADay = 0.158987294928 / 86400
	r := withoutGrid(st)
	expect(t, r, 0.005, map[string]float64{"front.criticalRate": 519 * barrelADay}) // printed with 4.9e-4 for 4.88e-4, two figures
	critical, _ := r.Parts[SheetFront].Figure("front.criticalRate")
	put(&st, "field.rate", 0.9*critical.Value, "m3/s")
	r = withoutGrid(st)
	expect(t, r, 0.05/2.7, map[string]float64{"front.interface": 2.7 * math.Pi / 180})
	if note, _ := noteOf(r.Parts[SheetFront], "front.dipStability"); note.Level != "remark" || !strings.Contains(note.Text, "moves as one") {
		t.Errorf("below the critical rate: %+v", note)
	}
	put(&st, "field.rate", 1000, "bbl/d") // the rate of exercise 10.2 is above it
	r = withoutGrid(st)
	if note, _ := noteOf(r.Parts[SheetFront], "front.dipStability"); note.Level != "caution" || !strings.Contains(note.Text, "overruns") {
		t.Errorf("above the critical rate: %+v", note)
	}
	if f, ok := r.Parts[SheetFront].Figure("front.interface"); ok {
		t.Errorf("an unstable interface stands at %g", f.Value)
	}
}

// A light phase that moves down-dip meets the same gravity as a heavy one that moves
// up-dip: with the same curves everything but the names is the same.
func TestLightDownDipIsHeavyUpDip(t *testing.T) {
	corey := [6]float64{0.178, 0.206, 0.412, 0.893, 2.3, 2.6}
	heavy := tilted(corey, 0.6e-3, 2.7e-3, 1.7)
	light := tilted(corey, 0.6e-3, 2.7e-3, -1.7)
	light.Fluids.Pair = "gas-oil"
	light.Fluids.WaterDensity, light.Fluids.OilDensity = light.Fluids.OilDensity, light.Fluids.WaterDensity
	up, down := withoutGrid(heavy).Parts[SheetFront], withoutGrid(light).Parts[SheetFront]
	for _, f := range up.Figures {
		other, ok := down.Figure(f.ID)
		if strings.Contains(f.ID, "ensity") || strings.HasSuffix(f.ID, "InPlace") { // nothing of which is known where connate water counts as liquid
			continue
		}
		if !ok || math.Abs(other.Value-f.Value) > 1e-13*math.Abs(f.Value) {
			t.Errorf("%s is %.15g up-dip and %.15g down-dip", f.ID, f.Value, other.Value)
		}
	}
	if back := must(t, up, "front.fractionalFlow", "back"); back.Label != "water falls back" {
		t.Errorf("up-dip: %q", back.Label)
	}
	if back := must(t, down, "front.fractionalFlow", "back"); back.Label != "gas rises back" {
		t.Errorf("down-dip: %q", back.Label)
	}
}

// By hand for quadratic curves: water falls back where N λo > 1, that is (1-S)² > 1/n,
// oil flows back where -N λw > 1, that is M S² > -1/n.
func TestBackwardFlowIsDrawnApart(t *testing.T) {
	quadratic := [6]float64{0, 0, 1, 1, 2, 2}
	up := withoutGrid(tilted(quadratic, 1e-3, 2e-3, 4)).Parts[SheetFront]
	back := must(t, up, "front.fractionalFlow", "back")
	near(t, "end of the backward flow", back.X[len(back.X)-1], 0.5, 1e-12)
	near(t, "f at its end", back.Y[len(back.Y)-1], 0, 1e-12)
	near(t, "start of the backward flow", back.X[0], 0, 1e-2)
	if low := slices.Min(back.Y); low > -0.1 || slices.Max(back.Y) > 1e-12 {
		t.Errorf("up-dip the line runs from %g to %g", low, slices.Max(back.Y))
	}
	chart := chartOf(t, up, "front.fractionalFlow")
	if *chart.Y.Min > slices.Min(back.Y) || *chart.Y.Max != 1 {
		t.Errorf("the axis runs from %g to %g", *chart.Y.Min, *chart.Y.Max)
	}
	down := withoutGrid(tilted(quadratic, 1e-3, 2e-3, -4)).Parts[SheetFront]
	back = must(t, down, "front.fractionalFlow", "back")
	near(t, "start of the backward flow", back.X[0], math.Sqrt(1.0/8), 1e-12)
	near(t, "f at its start", back.Y[0], 1, 1e-12)
	if back.Label != "oil rises back" && back.Label != "oil falls back" || slices.Max(back.Y) < 1.1 {
		t.Errorf("down-dip: %q up to %g", back.Label, slices.Max(back.Y))
	}
	if _, told := noteOf(down, "front.oilBack"); !told {
		t.Error("nothing is said of the oil that flows back at the injector")
	}
	level := withoutGrid(typed(quadratic, 1e-3, 2e-3)).Parts[SheetFront]
	if _, drawn := line(level, "front.fractionalFlow", "back"); drawn {
		t.Error("in a level layer a phase flows back")
	}
}

func chartOf(t *testing.T, p Part, id string) Chart {
	t.Helper()
	i := slices.IndexFunc(p.Charts, func(c Chart) bool { return c.ID == id })
	if i < 0 {
		t.Fatalf("no chart %s", id)
	}
	return p.Charts[i]
}

// A dip asks for what it takes, and only a dip does.
func TestDipAsksForWhatItTakes(t *testing.T) {
	st := typed([6]float64{0.2, 0.2, 0.3, 0.8, 2, 2}, 0.5e-3, 5e-3)
	put(&st, "front.dip", 0, "deg")
	if part := withoutGrid(st).Parts[SheetFront]; part.Status != Ready {
		t.Errorf("a level layer: %s, misses %v", part.Status, part.Missing)
	}
	put(&st, "front.dip", 5, "deg")
	want := []string{"field.permeability", "fluids.waterDensity", "fluids.oilDensity", "front.velocity"}
	if part := withoutGrid(st).Parts[SheetFront]; part.Status != Waiting || !slices.Equal(part.Missing, want) {
		t.Errorf("a dipping layer: %s, misses %v", part.Status, part.Missing)
	}
	// The density of brine is computed where a temperature is given.
	put(&st, "fluids.temperature", 80, "degC")
	if part := withoutGrid(st).Parts[SheetFront]; slices.Contains(part.Missing, "fluids.waterDensity") || !slices.Contains(part.Missing, "fluids.oilDensity") {
		t.Errorf("with a temperature: misses %v", part.Missing)
	}
}
