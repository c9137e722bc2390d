package study

import (
	"strings"

	"brinefront/physics/fit"
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

const (
	misfitMethod = "Root mean square of forecast less history over all oil and water rates, each as a share of its phase's mean rate (or of a tenth of the other's, where that is more). A row stands for the time halfway to its neighbours; the forecast's average over that time is held against it."
	matchMethod  = "Bounded least squares by Levenberg and Marquardt, slopes by differences, from the inputs as they stand, within their ranges. The interval is Student's t of the linearised forecast, as if deviations were independent and of one size."
)

// by starts the working of a figure of the match.
func (k *match) by(s *sheet, method string, sources ...ref.ID) *working {
	return s.by("", method, sources...).rests(historyTable.path).rests(k.paths()...)
}

func (k *match) figures(s *sheet) {
	rows := float64(2 * len(k.past.time))
	k.misfits(s, k.Before*k.Before*rows, k.RMS*k.RMS*rows)
	s.answer("Matched to the history, the misfit falls from {match.before} to {match.misfit}")
	for i, spec := range k.specs {
		id := "match." + spec.Path
		s.figure(Figure{ID: id, Label: spec.Label + ", matched", Symbol: spec.Symbol, Value: k.Parameters[i].Value, Quantity: spec.Quantity, Strip: true},
			k.by(s, matchMethod, ref.Levenberg1944, ref.Marquardt1963, ref.SeberWild1989))
		s.answer(", with " + strings.ToLower(spec.Label[:1]) + spec.Label[1:] + " at {" + id + "}")
	}
	s.answer(". " + strings.Join(k.Verdict, " "))
}

func (k *match) tables(s *sheet) {
	values := Grid{ID: "match.values", Title: "What was moved", Columns: []Column{{Label: "Value", Quantity: units.Number, Words: []string{"as it stands", "matched", "95 % interval from", "to", "standard error", "may range from", "to"}}}}
	correlation := Grid{ID: "match.correlation", Title: "Correlation of what was moved", Columns: []Column{{Label: "Input", Quantity: units.Number}}}
	for i, p := range k.Parameters {
		values.Columns = append(values.Columns, Column{Label: p.Label, Symbol: p.Symbol, Quantity: k.specs[i].Quantity, Values: []float64{k.free[i].Value, p.Value, p.Low, p.High, p.StdErr, p.Min, p.Max}})
		correlation.Columns[0].Words = append(correlation.Columns[0].Words, p.Label)
		correlation.Columns = append(correlation.Columns, Column{Label: p.Label, Symbol: p.Symbol, Quantity: units.Number, Values: k.Correlation[i]})
	}
	s.part.Tables = append(s.part.Tables, values)
	if len(k.Parameters) > 1 {
		s.part.Tables = append(s.part.Tables, correlation)
	}
}

func (k *match) charts(s *sheet) {
	c := Chart{ID: "match.rates", Title: "Rates, measured and matched", X: timeAxis, Y: Axis{Label: "Rate, calendar", Symbol: "q", Quantity: units.Rate, CanLog: true}, Marks: []Mark{},
		Summary: "Oil and water rates at surface against time: measured as points, of the inputs as they stand dashed, of the match drawn through. Of the forecast each is the average over the time that a row stands for."}
	line := func(id, label, role, kind string, y []float64) {
		c.Lines = append(c.Lines, Line{ID: id, Label: label, Role: role, Kind: kind, X: k.past.time, Y: y})
	}
	start, end := make([]float64, len(k.free)), make([]float64, len(k.free))
	for i, p := range k.Parameters {
		start[i], end[i] = k.free[i].Value, p.Value
	}
	oil, water := k.averages(k.at(start))
	line("oil.before", "oil, as typed", "oil", "dashed", oil)
	line("water.before", "water, as typed", "water", "dashed", water)
	oil, water = k.averages(k.at(end))
	line("oil", "oil, matched", "oil", "line", oil)
	line("water", "water, matched", "water", "line", water)
	line("oil.measured", "oil, measured", "oil", "points", k.past.oilRate)
	line("water.measured", "water, measured", "water", "points", k.past.waterRate)
	s.part.Charts = append(s.part.Charts, c)
}

func (k *match) notes(s *sheet) {
	about := append(k.paths(), historyTable.path)
	for i, p := range k.Parameters {
		if p.AtBound || !p.Determined {
			s.note(Note{ID: "match.doubt" + string(rune('1'+i)), Level: "caution", Text: p.Label + " " + p.Symbol + " is not to be taken from this match.", Cause: "It lies at its bound, or other values follow the history as well: see the answer.",
				Do: "Leave it out of the match, widen its range if that is lawful, or bring other knowledge of it.", Paths: []string{k.specs[i].Path}})
		}
	}
	if k.Status != fit.Converged {
		s.note(Note{ID: "match.limit", Level: "caution", Text: "The match stopped at its limit of steps.", Cause: "Too many inputs may be free for this history.", Do: "Take the values over and match again, or leave an input out.", Paths: about})
	}
	s.note(Note{ID: "match.one", Level: "remark", Text: "A match is one set of values that follows the history; it does not prove them.", Cause: "The search is local, a history fits many reservoirs, and measured rows that follow each other rarely scatter independently: true intervals are wider.",
		Do: "Match again from other values, and hold what comes out against cores, logs and tests.", Paths: about})
}
