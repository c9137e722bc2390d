package study

import (
	"math"
	"slices"
	"strings"
	"testing"

	"brinefront/physics/units"
)

// reading is one column read out beside a line.
func reading(t *testing.T, l Line, label string) Column {
	t.Helper()
	for _, c := range l.Readings {
		if c.Label == label {
			return c
		}
	}
	t.Fatalf("%s has no reading %q", l.ID, label)
	return Column{}
}

// journeys are studies with every kind of wave: one step and one fan, no step, small
// steps between constant states, oil-wet, dipping both ways, mobile water, oil injected.
func journeys() map[string]Study {
	all := map[string]Study{
		"water-wet": typed([6]float64{0.213, 0.237, 0.327, 0.861, 2.7, 2.15}, 0.00047, 0.00193),
		"oil-wet":   typed([6]float64{0.093, 0.171, 0.787, 0.931, 1.63, 4.3}, 0.00052, 0.0037),
		"no step":   typed([6]float64{0.2, 0.2, 0.3, 0.8, 1, 1}, 0.5e-3, 5e-3),
		"up-dip":    tilted([6]float64{0.2, 0.2, 0.3, 0.8, 2, 2}, 0.5e-3, 5e-3, 0.7),
		"falls":     tilted([6]float64{0.2, 0.2, 0.3, 0.8, 2, 2}, 0.5e-3, 5e-3, 4),
		"down-dip":  tilted([6]float64{0.2, 0.2, 0.3, 0.8, 2, 2}, 0.5e-3, 5e-3, -3),
		"two steps": twoSteps(),
	}
	steps := Demo()
	steps.Rock.Curve = "table-linear"
	all["straight lines"] = steps
	mobile := Demo()
	put(&mobile, "front.initialWater", 0.41, "fraction")
	all["mobile water"] = mobile
	mixed := Demo()
	put(&mixed, "front.injectedWater", 0.66, "fraction")
	all["oil injected"] = mixed
	return all
}

// twoSteps has curves with a shelf: between two steep rises of krw a stretch where it
// hardly grows, as in rock of two sorts of pore.
func twoSteps() Study {
	st := Demo()
	st.Rock.Curve, st.Rock.Reference = "table", "absolute"
	st.Rock.Table = &Table{
		Sw:  []float64{0.2, 0.3, 0.35, 0.4, 0.5, 0.6, 0.65, 0.7, 0.8},
		Krw: []float64{0, 0.002, 0.06, 0.09, 0.092, 0.1, 0.13, 0.3, 0.5},
		Kro: []float64{0.8, 0.6, 0.3, 0.2, 0.15, 0.1, 0.06, 0.01, 0},
	}
	return st
}

// What is read off the curve at a saturation is when it arrives: the water cut at the
// producer then is that of the curve at this saturation, or inside a step jumps past it.
// The history that it is held against knows volumes, not speeds.
func TestReadingsAreArrivals(t *testing.T) {
	for name, st := range journeys() {
		part := withoutGrid(st).Parts[SheetFront]
		flow := must(t, part, "front.fractionalFlow", "reservoir")
		arrives, travels, slope := reading(t, flow, "Arrives, injected"), reading(t, flow, "How it travels"), reading(t, flow, "Slope of the curve")
		e := evaluated(st)
		d := e.front.displacement
		fans := 0
		for i, sw := range flow.X {
			never := arrives.Words != nil && arrives.Words[i] != ""
			q := arrives.Values[i]
			switch {
			case strings.HasPrefix(travels.Words[i], "spreading") && !never:
				fans++
				at, _ := d.Outlet(q)
				near(t, name+", saturation at its arrival", at, sw, 1e-6)
				if knee := st.Rock.Curve == "table-linear" && slices.Contains(st.Rock.Table.Sw, sw); !knee { // where the slope is two
					near(t, name+", speed of a spreading state", slope.Values[i]*q, 1, 1e-6)
				}
			case travels.Words[i] == "step":
				before, _ := d.Outlet(q * (1 - 1e-9))
				after, _ := d.Outlet(q * (1 + 1e-9))
				if sw < before-1e-6 || sw > after+1e-6 {
					t.Errorf("%s: Sw = %g is said to come with the step from %g to %g", name, sw, before, after)
				}
			case travels.Words[i] == "not met":
				if sw >= e.front.swi && sw <= e.front.swj || !never {
					t.Errorf("%s: Sw = %g is said not to be met (arrives %g)", name, sw, q)
				}
			}
			if never != (q == 0) {
				t.Errorf("%s: Sw = %g arrives after %g, never: %v", name, sw, q, never)
			}
		}
		if fans == 0 && name != "straight lines" {
			t.Errorf("%s: no state spreads", name)
		}
	}
}

// The table of waves covers the way from the injected to the initial state, in order of
// speed, and its times are the field's: the volume over the rate.
func TestWaveTable(t *testing.T) {
	for name, st := range journeys() {
		block(&st)
		st.Field.Uptime = nil
		put(&st, "field.rate", 7e-4, "m3/s")
		r := withoutGrid(st)
		part := r.Parts[SheetFront]
		columns := map[string]Column{}
		for _, g := range part.Tables {
			if g.ID == "front.waves" {
				for _, c := range g.Columns {
					columns[c.Label] = c
				}
			}
		}
		behind, ahead, slow, fast := columns["Sw behind"].Values, columns["Sw ahead"].Values, columns["Speed, slowest"].Values, columns["Speed, fastest"].Values
		volume, time := columns["Arrives, injected"], columns["Arrives, time"]
		if len(behind) == 0 || len(time.Values) != len(behind) {
			t.Fatalf("%s: %d waves, %d times", name, len(behind), len(time.Values))
		}
		injected := evaluated(st).front.swj // of which the inlet face may hold less
		initial, _ := part.Figure("front.initialWater")
		breakthrough, _ := part.Figure("front.breakthrough")
		last := len(behind) - 1
		near(t, name+", first state", behind[0], injected, 1e-12)
		near(t, name+", last state", ahead[last], initial.Value, 1e-12)
		near(t, name+", foremost wave", volume.Values[last], breakthrough.Value, 1e-12)
		for i := range behind {
			if i > 0 && (slow[i] < fast[i-1]-1e-9*math.Abs(fast[i-1]) || math.Abs(behind[i]-ahead[i-1]) > 1e-12) {
				t.Errorf("%s: wave %d begins at %g with speed %g, the one before ends at %g with %g", name, i, behind[i], slow[i], ahead[i-1], fast[i-1])
			}
			pv := 151 * 87 * 9.3 * 0.217
			if volume.Values[i] > 0 {
				near(t, name+", time over volume", time.Values[i]/volume.Values[i], pv/7e-4, 1e-6*pv/7e-4)
			}
			if fast[i] <= 0 && volume.Words[i] != "never" {
				t.Errorf("%s: a wave of speed %g arrives after %g", name, fast[i], volume.Values[i])
			}
		}
	}
}

// The sentence and the figures tell of two steps: the first arrival is the foremost,
// and the water cut at the producer jumps once more at the second.
func TestTwoStepsAreTold(t *testing.T) {
	part := withoutGrid(twoSteps()).Parts[SheetFront]
	first, _ := part.Figure("front.breakthrough")
	next, ok := part.Figure("front.nextStep")
	if !ok || next.Value <= first.Value {
		t.Fatalf("the second step comes after %g, the first after %g", next.Value, first.Value)
	}
	if !strings.HasPrefix(part.Answer[0].Text, "The first of 2 steps arrives after") {
		t.Errorf("the answer begins %q", part.Answer[0].Text)
	}
	cut := must(t, part, "front.waterCut", "reservoir")
	for _, q := range []float64{first.Value, next.Value} {
		jump := interpolate(cut.X, cut.Y, q*(1+1e-5)) - interpolate(cut.X, cut.Y, q*(1-1e-5))
		if jump < 0.005 {
			t.Errorf("at %g PV the water cut changes by %g", q, jump)
		}
	}
	if one := withoutGrid(Demo()).Parts[SheetFront]; len(one.Answer) == 0 || !strings.HasPrefix(one.Answer[0].Text, "Water arrives after") {
		t.Errorf("with one step: %+v", one.Answer)
	} else if f, told := one.Figure("front.nextStep"); told {
		t.Errorf("with one step another is told, after %g", f.Value)
	}
}

// With mobile water the cut jumps from what it was: both in the sentence.
func TestMobileWaterIsTold(t *testing.T) {
	st := Demo()
	put(&st, "front.initialWater", 0.41, "fraction")
	part := withoutGrid(st).Parts[SheetFront]
	ahead, ok := part.Figure("front.surfaceCutAhead")
	if !ok || ahead.Value <= 0 {
		t.Fatalf("the water cut ahead of the front is %g (%v)", ahead.Value, ok)
	}
	cut := must(t, part, "front.waterCut", "surface")
	near(t, "water cut on the first day", cut.Y[0], ahead.Value, 1e-12)
	text := ""
	for _, p := range part.Answer {
		text += p.Text + p.Figure
	}
	if !strings.HasPrefix(text, "The front arrives after") || !strings.Contains(text, "jumps from front.surfaceCutAhead to front.surfaceCutAtBreakthrough") {
		t.Errorf("the answer is %q", text)
	}
}

// What is displaced is produced only where water alone enters: not where oil is injected
// too, nor where oil leaves at the injector.
func TestDisplacedIsNotAlwaysProduced(t *testing.T) {
	all := journeys()
	for name, want := range map[string]string{"water-wet": "produced", "up-dip": "produced", "oil injected": "displaced", "down-dip": "displaced"} {
		text := ""
		for _, p := range withoutGrid(all[name]).Parts[SheetFront].Answer {
			text += p.Text
		}
		if !strings.Contains(text, "of the pore volume "+want+" (") {
			t.Errorf("%s: %q", name, text)
		}
	}
}

// In the wave diagram a step runs straight at its speed, and every dashed line is a
// state: at its end the profile has that saturation.
func TestWaveDiagram(t *testing.T) {
	for name, st := range journeys() {
		part := withoutGrid(st).Parts[SheetFront]
		profile := must(t, part, "front.profile", "profile")
		breakthrough, _ := part.Figure("front.breakthrough")
		chart := chartOf(t, part, "front.waveDiagram")
		fastest := 0.0
		for _, l := range chart.Lines {
			if len(l.X) != 2 || l.X[0] != 0 || l.Y[0] != 0 || l.X[1] > 1 || l.Y[1] > *chart.Y.Max*(1+1e-12) {
				t.Errorf("%s: line %s runs from %v to %v", name, l.ID, l.X, l.Y)
			}
			fastest = math.Max(fastest, l.X[1]/l.Y[1])
			if l.Kind == "line" {
				continue
			}
			at := l.X[1] / l.Y[1]
			below, above := interpolate(profile.X, profile.Y, at*(1+1e-6)), interpolate(profile.X, profile.Y, at*(1-1e-6))
			if said := saturationIn(l.Label); at < profile.X[len(profile.X)-1] && (said < math.Min(below, above)-2e-3 || said > math.Max(below, above)+2e-3) {
				t.Errorf("%s: the line of %q ends where the profile is between %g and %g", name, l.Label, below, above)
			}
		}
		if len(chart.Lines) == 0 || len(chart.Lines) > 60 {
			t.Errorf("%s: %d lines", name, len(chart.Lines))
		}
		near(t, name+", fastest line", fastest*breakthrough.Value, 1, 1e-6)
	}
}

// In time a way ends when its volume has been injected, and at a constant rate time
// and volume keep their ratio.
func TestWaveTimes(t *testing.T) {
	for _, drive := range []string{"rate", "pressure"} {
		st := Demo()
		st.Field.Drive = drive
		r := withoutGrid(st)
		volumes, times := chartOf(t, r.Parts[SheetFront], "front.waveDiagram"), chartOf(t, r.Parts[SheetFront], "front.waveTimes")
		arrival, _ := r.Parts[SheetField].Figure("field.breakthrough")
		near(t, drive+", breakthrough", times.Marks[0].X, 1, 0)
		near(t, drive+", breakthrough in time", times.Marks[0].Y/arrival.Value, 1, 1e-9)
		for i, l := range times.Lines {
			of := volumes.Lines[i]
			near(t, drive+", end of "+l.ID, l.X[len(l.X)-1], of.X[1], 1e-15)
			half := l.Y[len(l.Y)/2] / l.Y[len(l.Y)-1]
			if drive == "rate" {
				near(t, "half way of "+l.ID, half, 0.5, 1e-12)
			} else if math.Abs(half-0.5) < 1e-3 {
				t.Errorf("%s: at a constant pressure difference half the volume takes %g of the time", l.ID, half)
			}
		}
	}
	st := Demo()
	st.Field.Length = nil
	for _, c := range withoutGrid(st).Parts[SheetFront].Charts {
		if c.ID == "front.waveTimes" {
			t.Error("times are drawn without a field")
		}
	}
}

// saturationIn reads the saturation in a label such as "Sw 0.583".
func saturationIn(label string) float64 {
	value, err := units.ParseNumber(strings.TrimPrefix(label, "Sw "))
	if err != nil {
		return math.NaN()
	}
	return value
}
