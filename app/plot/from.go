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
	x := scaleOf(c.X, s, func(l study.Line) []float64 { return l.X }, c.Lines)
	y := scaleOf(c.Y, s, func(l study.Line) []float64 { return l.Y }, c.Lines)
	p := Picture{
		ID: c.ID, Title: c.Title, Summary: c.Summary,
		X: axisFrom(c.X, x), Y: axisFrom(c.Y, y),
		Lines: make([]Line, len(c.Lines)),
		Marks: []Mark{},
	}
	for i, l := range c.Lines {
		p.Lines[i] = lineFrom(l, x, y)
	}
	for _, m := range c.Marks {
		if at := (point{x.FromSI(m.X), y.FromSI(m.Y)}); at.finite() {
			p.Marks = append(p.Marks, Mark{Label: m.Label, X: at[0], Y: at[1]})
		}
	}
	return p
}

// point is a place in a picture.
type point [2]float64

func (p point) finite() bool { return finite(p[0]) && finite(p[1]) }

func finite(v float64) bool { return !math.IsNaN(v) && !math.IsInf(v, 0) }

// scaleOf is the unit an axis is shown in: the system's, but for a duration the
// one that suits its length, as a person would say "7.9 years" and not 2,885 days.
func scaleOf(a study.Axis, s units.System, along func(study.Line) []float64, lines []study.Line) units.Unit {
	if a.Quantity != units.Duration {
		return s.Unit(a.Quantity)
	}
	longest := 0.0
	for _, l := range lines {
		for _, v := range along(l) {
			if finite(v) {
				longest = max(longest, math.Abs(v))
			}
		}
	}
	if a.Max != nil {
		longest = *a.Max
	}
	spans := units.Of(units.Duration)
	slices.SortFunc(spans, func(a, b units.Unit) int { return cmp.Compare(b.Factor, a.Factor) })
	for _, u := range spans {
		if longest >= 2*u.Factor {
			return u
		}
	}
	return s.Unit(a.Quantity)
}

func axisFrom(a study.Axis, u units.Unit) Axis {
	short := a.Symbol
	if short == "" {
		short = a.Label
	}
	return Axis{
		Title: title(a, u), Short: short, Unit: unitText(u),
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
	out := Line{ID: l.ID, Label: l.Label, Role: l.Role, Kind: l.Kind, Data: pairs(l.X, l.Y, x, y)}
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
