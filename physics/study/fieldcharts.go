package study

import (
	"math"

	"brinefront/physics/reservoir"
	"brinefront/physics/units"
)

var timeAxis = axis("Time", "t", units.Duration)

// series picks one number out of every state of the forecast.
func (f *field) series(pick func(reservoir.State) float64) []float64 {
	list := make([]float64, len(f.history))
	for i, state := range f.history {
		list[i] = pick(state)
	}
	return list
}

// line is one quantity against time.
func (f *field) line(id, label, role, kind string, pick func(reservoir.State) float64) Line {
	return Line{ID: id, Label: label, Role: role, Kind: kind, X: f.series(func(s reservoir.State) float64 { return s.Time }), Y: f.series(pick)}
}

// events marks breakthrough and limit at the height that a quantity has there.
func (f *field) events(pick func(reservoir.State) float64) []Mark {
	marks := []Mark{}
	add := func(label string, q float64) {
		if q > 0 && q <= f.end {
			state := f.state(q * (1 + aside))
			marks = append(marks, Mark{label, state.Time, pick(state)})
		}
	}
	add("breakthrough", f.front.displacement.Breakthrough())
	if f.limit.Outcome == reservoir.Reached {
		add("limit", f.limit.PVI)
	}
	return marks
}

func (f *field) charts(s *sheet) {
	oilRate := func(s reservoir.State) float64 { return s.OilRate }
	cut := func(s reservoir.State) float64 { return s.WaterCut }
	oil := func(s reservoir.State) float64 { return s.CumOil }
	recovery := func(s reservoir.State) float64 { return s.Recovery }
	f.chart(s, Chart{ID: "field.rates", Title: "Rates", Y: Axis{Label: "Rate, calendar", Symbol: "q", Quantity: units.Rate, CanLog: true}, Marks: f.events(oilRate),
		Summary: "Oil and water rates at surface against time: oil falls when the front arrives, water rises."},
		f.line("oil", "oil, surface", "oil", "line", oilRate),
		f.line("water", "water, surface", "water", "line", func(s reservoir.State) float64 { return s.WaterRate }),
		f.line("injection", "injected, reservoir", "aid", "dashed", func(s reservoir.State) float64 { return s.InjectionRate }))
	f.chart(s, Chart{ID: "field.waterCut", Title: "Water cut", Y: axis("Water cut, surface", "fw", units.Share).from(0, 1), Marks: f.events(cut),
		Summary: "Water cut at surface against time: a jump at breakthrough, then a slow climb to the limit and beyond."},
		f.line("surface", "at surface", "water", "line", cut))
	lines, beside := []Line{f.line("pore", "of the pore volume", "oil", "line", recovery)}, ""
	if !holdsConnate(pairOf(s.st)) {
		lines = append(lines, f.line("place", "of the oil in place", "total", "line", func(s reservoir.State) float64 { return s.Recovery / (1 - f.front.swi) }))
		beside = " and of the oil in place"
	}
	rise := "steady until breakthrough, slower after it."
	if !f.rateHeld() {
		rise = "as the resistance of the flood lets it until breakthrough, less for each volume injected after it."
	}
	f.chart(s, Chart{ID: "field.recovery", Title: "Recovery", Y: axis("Recovery", "R", units.Share).from(0, 1), Marks: f.events(recovery),
		Summary: "Recovery against time, as a part of the pore volume" + beside + ": " + rise},
		lines...)
	f.chart(s, Chart{ID: "field.cumulative", Title: "Cumulative volumes", Y: axis("Volume", "V", units.Volume), Marks: f.events(oil),
		Summary: "Oil and water produced at surface and water injected, all cumulative, against time."},
		f.line("oil", "oil, surface", "oil", "line", oil),
		f.line("water", "water, surface", "water", "line", func(s reservoir.State) float64 { return math.Max(0, s.CumWater) }),
		f.line("injection", "injected, reservoir", "aid", "dashed", func(s reservoir.State) float64 { return s.CumInjected }))
	if c, ok := f.ratioChart(); ok {
		s.part.Charts = append(s.part.Charts, c)
	}
	if f.rateHeld() && s.st.Field.Permeability != nil {
		f.chart(s, Chart{ID: "field.pressure", Title: "Pressure difference that the rate takes", Y: axis("Pressure difference, while on", "Δp", units.Pressure), Marks: []Mark{},
			Summary: "Pressure difference between injector and producer against time at the constant rate, without what converging flow near the wells takes."},
			f.line("pressure", "injector to producer", "total", "line", func(s reservoir.State) float64 { return s.PressureDrop }))
	}
}

// chart adds a chart of quantities against time.
func (f *field) chart(s *sheet, c Chart, lines ...Line) {
	c.X, c.Lines = timeAxis, lines
	s.part.Charts = append(s.part.Charts, c)
}

// ratioChart is the water-oil ratio against oil produced, on a log axis; false
// when no water flows together with oil within the forecast.
func (f *field) ratioChart() (Chart, bool) {
	l := Line{ID: "ratio", Label: "water-oil ratio", Role: "water", Kind: "line"}
	oil := 0.0
	for _, state := range f.history {
		if state.WOR > 0 && !math.IsInf(state.WOR, 1) {
			oil = math.Max(oil, state.CumOil) // late in a flood it stands still but for rounding
			l.X, l.Y = append(l.X, oil), append(l.Y, state.WOR)
		}
	}
	return Chart{ID: "field.waterOilRatio", Title: "Water-oil ratio", X: axis("Oil produced, surface", "Np", units.Volume),
		Y: Axis{Label: "Water-oil ratio, surface", Symbol: "WOR", Quantity: units.WaterOilRatio, Log: true, CanLog: true}, Lines: []Line{l}, Marks: []Mark{},
		Summary: "Water-oil ratio at surface on a logarithmic axis against the oil produced: it climbs ever more steeply as the flood matures."}, len(l.X) > 1
}
