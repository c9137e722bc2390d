package study

import (
	"math"
	"strings"

	"brinefront/physics/units"
)

// role tells the lines of the outcomes apart: the base is drawn as a whole
// quantity, the cases in the order of their marks.
func (o outcome) role() string {
	if o.index < 0 {
		return "total"
	}
	return "time" + string(rune('1'+o.index))
}

// over is a line of an outcome; suffix tells two of them in one picture apart.
func (o outcome) over(suffix, kind string, x, y []float64) Line {
	l := Line{ID: o.id, Label: o.name, Role: o.role(), Kind: kind, X: x, Y: y}
	if suffix != "" {
		l.ID, l.Label = l.ID+"-"+suffix, l.Label+", "+suffix
	}
	return l
}

// compareCharts lay the curves of all outcomes over each other.
func compareCharts(s *sheet, all []outcome) {
	end := 1.5
	var names []string
	for _, o := range all {
		end = math.Max(end, 3*o.front.displacement.Breakthrough())
		names = append(names, o.name)
	}
	of := " of " + strings.Join(names, ", ") + ", laid over each other."
	flow := Chart{ID: "compare.fractionalFlow", Title: "Fractional flow", X: saturationAxis, Y: axis("Water cut, reservoir", "fw", units.Share).from(0, 1),
		Summary: "Water cut against water saturation" + of}
	recovery := Chart{ID: "compare.recovery", Title: "Recovery, of the pore volume", X: axis("Water injected", "Q", units.PoreVolumes), Y: axis("Recovery", "R", units.Share).from(0, 1),
		Summary: "Recovery against pore volumes of water injected" + of}
	profile := Chart{ID: "compare.profile", Title: "Saturation along the flood at breakthrough", X: axis("Distance from the injector, part of the length", "x/L", units.Number).from(0, 1), Y: saturationAxis,
		Summary: "Water saturation from injector to producer at breakthrough" + of}
	for _, o := range all {
		flow.Lines = append(flow.Lines, o.flowLine())
		recovery.Lines = append(recovery.Lines, o.recoveryLine(end))
		x, sw := o.front.profileAtBreakthrough()
		profile.Lines = append(profile.Lines, o.over("", "line", x, sw))
	}
	flow.Y = flow.Y.holding(flow.Lines)
	charts := []Chart{recovery, flow, profile}
	if c, ok := rockOverlay(all, of); ok {
		charts = append(charts, c)
	}
	if c, ok := cutOverlay(all); ok {
		charts = append(charts, c)
	}
	for _, c := range charts {
		c.Marks = []Mark{}
		s.part.Charts = append(s.part.Charts, c)
	}
}

func (o outcome) flowLine() Line {
	low, high := o.front.flow.Ends()
	l := o.over("", "line", saturations(low, high, o.front.flow.Knots()), nil)
	for _, sw := range l.X {
		cut, _ := o.front.flow.At(sw)
		l.Y = append(l.Y, cut)
	}
	return l
}

func (o outcome) recoveryLine(end float64) Line {
	d := o.front.displacement
	if !o.rides() {
		l := o.over("", "line", injections(d, end, 1), nil)
		for _, q := range l.X {
			l.Y = append(l.Y, d.After(q).Recovery)
		}
		return l
	}
	l := o.over("", "line", nil, nil)
	for _, q := range injections(d, end, append(o.front.rideEvents(), 1)...) {
		if state, ok := o.front.rider.after(q); ok { // up to where a slug is spent
			l.X, l.Y = append(l.X, q), append(l.Y, state.Recovery)
		}
	}
	return l
}

// rockOverlay is the curves themselves, when some case has others.
func rockOverlay(all []outcome, of string) (Chart, bool) {
	c := Chart{ID: "compare.kr", Title: "Relative permeability", X: saturationAxis,
		Y:       Axis{Label: "Relative permeability, of absolute permeability", Symbol: "kr", Quantity: units.Fraction, CanLog: true},
		Summary: "krw, rising, and kro, falling," + of}
	for i, o := range all {
		if i > 0 && o.rock == all[0].rock {
			continue
		}
		sws := saturations(o.rock.swc, o.rock.swmax, o.rock.curves.Knots())
		krw, kro := o.over("krw", "line", sws, nil), o.over("kro", "dashed", sws, nil)
		for _, sw := range sws {
			p := o.rock.curves.At(sw)
			krw.Y, kro.Y = append(krw.Y, p.Krw), append(kro.Y, p.Kro)
		}
		c.Lines = append(c.Lines, krw, kro)
	}
	return c, len(c.Lines) > 2
}

// cutOverlay is the water cut in time, of all that have a forecast.
func cutOverlay(all []outcome) (Chart, bool) {
	c := Chart{ID: "compare.waterCut", Title: "Water cut in time"}
	var names []string
	for _, o := range all {
		for _, own := range o.parts[SheetField].Charts {
			if own.ID != "field.waterCut" {
				continue
			}
			c.X, c.Y = own.X, own.Y
			c.Lines = append(c.Lines, o.over("", "line", own.Lines[0].X, own.Lines[0].Y))
			names = append(names, o.name)
		}
	}
	c.Summary = "Water cut at surface against time of " + strings.Join(names, ", ") + ", laid over each other."
	return c, len(c.Lines) > 1
}
