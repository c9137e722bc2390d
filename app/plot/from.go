package plot

import (
	"cmp"
	"math"
	"slices"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

const (
	errLengths = "plot: a line's coordinates differ in number"
	errBand    = "plot: a band without a lower edge, or a lower edge without a band"
	errSlider  = "plot: a moving line without a slider"
	errStages  = "plot: courses of a line that differ in number of points"
	errReading = "plot: a reading that has not one value a point"
)

// From converts a chart in SI to the units in which a system shows its axes.
// Every point comes along. A chart holds finite numbers only; should the physics
// ever break that promise, the picture shows the fault as a gap in the line and
// draws nothing across it, and a marker or a label that has no place is left out.
//
// Special cases are:
//
//	durations: the largest unit of which the axis shows at least two
//	coordinates that differ in number: panic, a programmer's mistake
func From(c study.Chart, s units.System) Picture {
	x := axisUnit(c.X, s, c.Lines, func(l study.Line) float64 {
		if l.Moving && c.Slider != nil {
			return largest(l.X) * pace(c.Slider.Root, c.Slider.Max)
		}
		return largest(l.X)
	})
	y := axisUnit(c.Y, s, c.Lines, func(l study.Line) float64 { return largest(l.Y) })
	p := Picture{
		ID: c.ID, Title: c.Title, Summary: c.Summary, Map: c.Map,
		X: axisFrom(c.X, x), Y: axisFrom(c.Y, y),
		Lines: make([]Line, len(c.Lines)),
		Marks: []Mark{},
	}
	var variable units.Unit
	if c.Slider != nil {
		variable = suited(c.Slider.Quantity, s, c.Slider.Max)
		p.Slider = sliderFrom(*c.Slider, variable)
	}
	for i, l := range c.Lines {
		along := x
		if (l.Moving || l.Stages != nil) && c.Slider == nil {
			panic(errSlider)
		}
		if l.Moving {
			along.Factor /= pace(c.Slider.Root, variable.Factor) // x for one unit of the slider as shown
		}
		p.Lines[i] = lineFrom(l, along, y)
		p.Lines[i].Readings = readingsFrom(l, s)
		if l.Stages != nil {
			p.Lines[i].Moving, p.Lines[i].Stages = true, stagesFrom(l, variable)
		}
	}
	for _, m := range c.Marks {
		if at := (point{x.FromSI(m.X), y.FromSI(m.Y)}); at.finite() {
			p.Marks = append(p.Marks, Mark{Label: m.Label, X: at[0], Y: at[1]})
		}
	}
	return p
}

// pace is what the places of moving lines go with: a slider's variable, or its root.
func pace(root bool, value float64) float64 {
	if root {
		return math.Sqrt(value)
	}
	return value
}

func stagesFrom(l study.Line, u units.Unit) []float64 {
	if len(l.X)%len(l.Stages) != 0 {
		panic(errStages)
	}
	list := make([]float64, len(l.Stages))
	for i, v := range l.Stages {
		list[i] = u.FromSI(v)
	}
	return list
}

func sliderFrom(c study.Slider, u units.Unit) *Slider {
	out := &Slider{
		Label: c.Label, Short: short(c.Label, c.Symbol), Unit: unitText(u), Root: c.Root,
		Min: u.FromSI(c.Min), Max: u.FromSI(c.Max), Value: u.FromSI(c.Value),
		Stops: make([]Stop, len(c.Marks)),
	}
	for i, m := range c.Marks {
		out.Stops[i] = Stop{Label: m.Label, At: u.FromSI(m.X)}
	}
	return out
}

func readingsFrom(l study.Line, s units.System) []Reading {
	var list []Reading
	for _, c := range l.Readings {
		if len(c.Values) != len(l.X) || (c.Words != nil && len(c.Words) != len(l.X)) {
			panic(errReading)
		}
		u := suited(c.Quantity, s, largest(c.Values))
		out := Reading{Label: c.Label, Short: short(c.Label, c.Symbol), Unit: unitText(u), Values: make([]float64, len(c.Values)), Words: c.Words}
		for i, v := range c.Values {
			out.Values[i] = u.FromSI(v)
		}
		list = append(list, out)
	}
	return list
}

// point is a place in a picture.
type point [2]float64

func (p point) finite() bool { return finite(p[0]) && finite(p[1]) }

func finite(v float64) bool { return !math.IsNaN(v) && !math.IsInf(v, 0) }

// axisUnit is the unit an axis is shown in, suited to what it shows.
func axisUnit(a study.Axis, s units.System, lines []study.Line, reach func(study.Line) float64) units.Unit {
	if a.Max != nil {
		return suited(a.Quantity, s, *a.Max)
	}
	longest := 0.0
	for _, l := range lines {
		longest = max(longest, reach(l))
	}
	return suited(a.Quantity, s, longest)
}

// suited is the system's unit of a quantity, but for a duration the one that suits
// its length, as a person would say "7.9 years" and not 2,885 days.
func suited(q units.Quantity, s units.System, longest float64) units.Unit {
	if q != units.Duration {
		return s.Unit(q)
	}
	spans := units.Of(units.Duration)
	slices.SortFunc(spans, func(a, b units.Unit) int { return cmp.Compare(b.Factor, a.Factor) })
	for _, u := range spans {
		if longest >= 2*u.Factor {
			return u
		}
	}
	return s.Unit(q)
}

// largest is the greatest magnitude among numbers.
func largest(values []float64) float64 {
	most := 0.0
	for _, v := range values {
		if finite(v) {
			most = max(most, math.Abs(v))
		}
	}
	return most
}

// short is a symbol, or the label of what has none.
func short(label, symbol string) string {
	if symbol == "" {
		return label
	}
	return symbol
}

func axisFrom(a study.Axis, u units.Unit) Axis {
	return Axis{
		Title: title(a, u), Short: short(a.Label, a.Symbol), Unit: unitText(u),
		Log: a.Log, CanLog: a.CanLog,
		Min: limit(a.Min, u), Max: limit(a.Max, u),
	}
}

// title is "Label, symbol (unit)", without what there is none of.
func title(a study.Axis, u units.Unit) string {
	text := a.Label
	if a.Symbol != "" && a.Symbol != a.Label {
		text += ", " + a.Symbol
	}
	if unit := unitText(u); unit != "" {
		text += " (" + unit + ")"
	}
	return text
}

// unitText is how a unit is written beside a number; a fraction stands alone.
func unitText(u units.Unit) string {
	if u.Symbol == "fraction" {
		return ""
	}
	return u.Label()
}

func limit(si *float64, u units.Unit) *float64 {
	if si == nil || !finite(*si) {
		return nil
	}
	v := u.FromSI(*si)
	return &v
}

func lineFrom(l study.Line, x, y units.Unit) Line {
	if (l.Kind == "band") != (l.Low != nil) {
		panic(errBand)
	}
	out := Line{ID: l.ID, Label: l.Label, Role: l.Role, Kind: l.Kind, Moving: l.Moving, Data: pairs(l.X, l.Y, x, y)}
	if l.Low != nil {
		out.Low = pairs(l.X, l.Low, x, y)
	}
	if l.Kind == "points" {
		out.Data = slices.DeleteFunc(out.Data, func(p [2]float64) bool { return !point(p).finite() })
	}
	return out
}

// pairs puts coordinates together; a pair that is not finite stays as a gap.
func pairs(xs, ys []float64, x, y units.Unit) [][2]float64 {
	if len(xs) != len(ys) {
		panic(errLengths)
	}
	data := make([][2]float64, len(xs))
	for i := range xs {
		data[i] = [2]float64{x.FromSI(xs[i]), y.FromSI(ys[i])}
	}
	return data
}
