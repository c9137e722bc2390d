package plot

import (
	"math"
	"strconv"
	"strings"
	"testing"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

// The expected numbers stand on exact definitions: a US barrel of petroleum is
// 0.158987294928 m3, a pound-force 4.4482216152605 N and an inch 0.0254 m (NIST
// SP 811, appendix B, exact), a year is 365.25 days (IAU, Julian year).
func TestFromConvertsToTheUnitsOfTheSystem(t *testing.T) {
	for _, c := range []struct {
		quantity units.Quantity
		system   units.System
		si, want float64
		title    string
	}{
		{units.Rate, units.Field, 0.158987294928, 86400, "Label, s (bbl/d)"},
		{units.Rate, units.Metric, 1, 86400, "Label, s (m³/d)"},
		{units.Pressure, units.Field, 4.4482216152605 / (0.0254 * 0.0254), 1, "Label, s (psi)"},
		{units.Pressure, units.Lab, 2500, 2.5, "Label, s (kPa)"},
		{units.Fraction, units.Field, 0.37, 0.37, "Label, s"},
		{units.Share, units.Field, 0.37, 37, "Label, s (%)"},
		{units.Duration, units.Field, 10 * 365.25 * 86400, 10, "Label, s (yr)"},
	} {
		chart := study.Chart{
			X:     study.Axis{Label: "Sw", Symbol: "Sw", Quantity: units.Fraction},
			Y:     study.Axis{Label: "Label", Symbol: "s", Quantity: c.quantity, Min: &c.si, Max: &c.si},
			Lines: []study.Line{{Kind: "line", X: []float64{0.25}, Y: []float64{c.si}}},
			Marks: []study.Mark{{X: 0.25, Y: c.si}},
		}
		p := From(chart, c.system)
		if p.X.Title != "Sw" {
			t.Errorf("a label that is its own symbol is titled %q", p.X.Title)
		}
		if p.Y.Title != c.title {
			t.Errorf("%s in %s: title %q, want %q", c.quantity, c.system, p.Y.Title, c.title)
		}
		for place, got := range map[string]float64{
			"line": p.Lines[0].Data[0][1], "mark": p.Marks[0].Y, "axis minimum": *p.Y.Min, "axis maximum": *p.Y.Max,
		} {
			// Two roundings of a conversion: 4 units in the last place.
			if math.Abs(got-c.want) > 4*2.3e-16*c.want {
				t.Errorf("%s in %s: %s %v, want %v", c.quantity, c.system, place, got, c.want)
			}
		}
	}
}

func TestDurationsAreToldInAUnitThatSuits(t *testing.T) {
	const day = 86400.0
	for _, c := range []struct {
		longest float64
		want    string
	}{
		{30, "s"}, {300, "min"}, {3 * 3600, "h"}, {30 * day, "d"}, {1.9 * 365.25 * day, "d"}, {2 * 365.25 * day, "yr"},
		{0, "h"}, // nothing to go by: the system's own
	} {
		chart := study.Chart{
			X:     study.Axis{Label: "Time", Quantity: units.Duration},
			Y:     study.Axis{Label: "Recovery", Quantity: units.Share},
			Lines: []study.Line{{Kind: "line", X: []float64{0, c.longest}, Y: []float64{0, 0.5}}},
		}
		if got := From(chart, units.Lab).X.Unit; got != c.want {
			t.Errorf("an axis of %v s is in %q, want %q", c.longest, got, c.want)
		}
		chart.X.Max = &chart.Lines[0].X[1]
		chart.Lines[0].X[0] = 100 * 365.25 * day // beyond what the axis shows
		if got := From(chart, units.Lab).X.Unit; got != c.want {
			t.Errorf("an axis cut at %v s is in %q, want %q", c.longest, got, c.want)
		}
	}
}

func TestFromDropsNothing(t *testing.T) {
	chart := invented()
	for _, s := range units.Systems {
		p := From(chart, s)
		if len(p.Lines) != len(chart.Lines) || len(p.Marks) != len(chart.Marks) {
			t.Fatalf("%s: %d lines and %d marks", s, len(p.Lines), len(p.Marks))
		}
		for i, l := range p.Lines {
			want := chart.Lines[i]
			if len(l.Data) != len(want.X) || len(l.Low) != len(want.Low) {
				t.Errorf("%s, %s: %d points and %d low, want %d and %d", s, l.ID, len(l.Data), len(l.Low), len(want.X), len(want.Low))
			}
			if l.ID != want.ID || l.Label != want.Label || l.Role != want.Role || l.Kind != want.Kind {
				t.Errorf("%s: line %d became %s, %s, %s, %s", s, i, l.ID, l.Label, l.Role, l.Kind)
			}
		}
	}
}

func TestALineBreaksWhereANumberIsMissing(t *testing.T) {
	for _, bad := range badNumbers {
		p := From(broken(bad), units.Metric)
		if at := p.Lines[0].Data; len(at) != 3 || point(at[1]).finite() || !point(at[0]).finite() || !point(at[2]).finite() {
			t.Errorf("%v: the line is %v, want a gap in the middle", bad, at)
		}
		if n := len(p.Lines[3].Data); n != 1 {
			t.Errorf("%v: %d markers, want the one that has a place", bad, n)
		}
		if n := len(p.Marks); n != 1 {
			t.Errorf("%v: %d marks, want the one that has a place", bad, n)
		}
		if p.X.Min != nil || p.Y.Min != nil || p.Y.Max != nil {
			t.Errorf("%v: an axis limit came through", bad)
		}
	}
}

func TestProgrammersMistakesPanic(t *testing.T) {
	short, noLow, strayLow, noSlider, fewValues, fewWords := invented(), invented(), invented(), invented(), invented(), invented()
	noSlider.Slider = nil
	fewValues.Lines[4].Readings[0].Values = []float64{1}
	fewWords.Lines[4].Readings[1].Words = []string{""}
	short.Lines[0].Y = short.Lines[0].Y[:2]
	noLow.Lines[2].Low = nil
	strayLow.Lines[0].Low = []float64{0, 0, 0}
	for _, c := range []struct {
		chart study.Chart
		want  string
	}{{short, errLengths}, {noLow, errBand}, {strayLow, errBand}, {noSlider, errSlider}, {fewValues, errReading}, {fewWords, errReading}} {
		func() {
			defer func() {
				if got := recover(); got != c.want {
					t.Errorf("panic %v, want %v", got, c.want)
				}
			}()
			From(c.chart, units.Field)
		}()
	}
}

// A point of a moving line stands at x times the slider, both as shown: whatever
// the units, that is the place x times the slider in SI. A day has 86400 s, a year
// 365.25 days (IAU, Julian year), a US barrel 0.158987294928 m3 (NIST SP 811).
func TestMovingLinesMoveTheSameInEveryUnit(t *testing.T) {
	const day, barrel = 86400.0, 0.158987294928
	for _, c := range []struct {
		name             string
		x, variable      units.Quantity
		system           units.System
		max, at, perUnit float64 // SI
		shown, place     float64 // of the slider and of the point, as shown
	}{
		{"years along feet", units.Length, units.Duration, units.Field, 10 * 365.25 * day, 2 * 365.25 * day, 0.3048 / (365.25 * day), 2, 2},
		{"days along metres", units.Length, units.Duration, units.Metric, 10 * day, 5 * day, 3 / day, 5, 15},
		{"barrels a day along years", units.Duration, units.Rate, units.Field, 100 * barrel / day, 50 * barrel / day, 365.25 * day / (10 * barrel / day), 50, 5},
		{"pore volumes along a part", units.Number, units.PoreVolumes, units.Lab, 2, 0.5, 1.5, 0.5, 0.75},
	} {
		chart := study.Chart{
			X: study.Axis{Label: "Place", Quantity: c.x}, Y: study.Axis{Label: "Sw", Quantity: units.Fraction},
			Lines:  []study.Line{{Kind: "line", Moving: true, X: []float64{c.perUnit}, Y: []float64{0.5}}},
			Slider: &study.Slider{Label: "Variable", Quantity: c.variable, Max: c.max, Value: c.at},
		}
		p := From(chart, c.system)
		// A handful of roundings of conversions: 1e-14 of the number.
		if got := p.Slider.Value; math.Abs(got-c.shown) > 1e-14*c.shown {
			t.Errorf("%s: the slider shows %v, want %v", c.name, got, c.shown)
		}
		if got := p.Lines[0].Data[0][0] * p.Slider.Value; math.Abs(got-c.place) > 1e-14*c.place {
			t.Errorf("%s: the point stands at %v, want %v", c.name, got, c.place)
		}
	}
}

// Along metres at the root of days: 3 m for the root of a day are 6 m after four. The root
// of 86400 s is taken of the day of NIST SP 811.
func TestRootedLinesMoveTheSameInEveryUnit(t *testing.T) {
	const day = 86400.0
	chart := study.Chart{
		X: study.Axis{Label: "Depth", Quantity: units.Length}, Y: study.Axis{Label: "Sw", Quantity: units.Fraction},
		Lines:  []study.Line{{Label: "profile", Kind: "line", Moving: true, X: []float64{3 / math.Sqrt(day)}, Y: []float64{0.5}}},
		Slider: &study.Slider{Label: "Time", Symbol: "t", Quantity: units.Duration, Root: true, Max: 9 * day, Value: 4 * day},
	}
	for system, metres := range map[units.System]float64{units.Metric: 1, units.Field: 0.3048, units.Lab: 0.01} {
		p := From(chart, system)
		if got := p.Lines[0].Data[0][0] * math.Sqrt(p.Slider.Value) * metres; !p.Slider.Root || math.Abs(got-6) > 1e-13 {
			t.Errorf("%s: the point stands at %v m after %v %s, want 6", system, got, p.Slider.Value, p.Slider.Unit)
		}
		if first := strings.Split(strings.Split(p.CSV(), "\r\n")[1], ",")[0]; first == "" {
			t.Error("no number in the table")
		} else if got, err := strconv.ParseFloat(first, 64); err != nil || math.Abs(got*metres-6) > 1e-13 {
			t.Errorf("%s: the table has %s, want 6 m; %v", system, first, err)
		}
	}
}

// A line of stages holds one course for each value of the slider: halfway between two
// of them its points stand halfway, in whatever unit, and beyond the last they stay.
func TestLinesOfStagesGoStraightBetweenThem(t *testing.T) {
	const foot = 0.3048
	line := study.Line{ID: "front", Label: "front", Kind: "line", Stages: []float64{0, 86400 * 365.25, 86400 * 365.25 * 3},
		X: []float64{0, 1 * foot, 2 * foot, 5 * foot, 4 * foot, 9 * foot}, Y: []float64{0, foot, 0, 3 * foot, 8 * foot, 3 * foot}}
	chart := study.Chart{
		X: study.Axis{Label: "x", Quantity: units.Length}, Y: study.Axis{Label: "y", Quantity: units.Length}, Map: true,
		Lines:  []study.Line{line},
		Slider: &study.Slider{Label: "Time", Quantity: units.Duration, Max: 86400 * 365.25 * 3},
	}
	p := From(chart, units.Field)
	if !p.Map || !p.Lines[0].Moving {
		t.Fatalf("%+v", p)
	}
	for _, c := range []struct {
		years float64
		want  [2][2]float64
	}{{0, [2][2]float64{{0, 0}, {1, 1}}}, {0.5, [2][2]float64{{1, 0}, {3, 2}}}, {1, [2][2]float64{{2, 0}, {5, 3}}}, {2, [2][2]float64{{3, 4}, {7, 3}}}, {9, [2][2]float64{{4, 8}, {9, 3}}}} {
		got := p.Lines[0].at(c.years)
		for i := range got {
			if math.Abs(got[i][0]-c.want[i][0])+math.Abs(got[i][1]-c.want[i][1]) > 1e-12 {
				t.Errorf("after %g years: %v, want %v", c.years, got, c.want)
			}
		}
	}
}

func TestReadingsComeInUnitsThatSuit(t *testing.T) {
	got := From(invented(), units.Field)
	if s := got.Slider; s.Unit != "PV" || s.Short != "Q" || len(s.Stops) != 1 || s.Stops[0] != (Stop{"breakthrough", 0.5}) {
		t.Errorf("the slider became %+v", s)
	}
	speed, arrival := got.Lines[4].Readings[0], got.Lines[4].Readings[1]
	if speed.Unit != "" || speed.Short != "v" || speed.Values[1] != 1 {
		t.Errorf("the speed became %+v", speed)
	}
	if arrival.Unit != "yr" || arrival.Short != "arrives after" || math.Abs(arrival.Values[2]-3) > 1e-15 || arrival.Words[1] != "never" {
		t.Errorf("the arrival became %+v", arrival)
	}
}
