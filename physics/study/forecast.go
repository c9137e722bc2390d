package study

import (
	"time"

	"brinefront/physics/units"
)

// steps are the intervals a forecast may be told in, seconds.
var steps = func() []float64 {
	const minute, hour, day = 60, 3600, 86400
	list := []float64{1, 5, 15, minute, 5 * minute, 15 * minute, hour, 6 * hour, day, 7 * day, 30 * day, 91.3125 * day}
	for year := 365.25 * day; year < 1e18; year *= 10 {
		list = append(list, year, 2*year, 5*year)
	}
	return list
}()

// forecastRows is how long a forecast table may get.
const forecastRows = 24

// stepFor is the interval that a forecast of some length is told in.
func stepFor(last float64) float64 {
	for _, s := range steps {
		if last/s <= forecastRows {
			return s
		}
	}
	return steps[len(steps)-1]
}

// forecast is the flood at even steps of time, years where that suits, to the end.
func (f *field) forecast(start string) Grid {
	last := f.linear.TimeAt(f.end)
	step := stepFor(last)
	columns := []Column{
		{Label: "Time", Symbol: "t", Quantity: units.Duration},
		{Label: "Injected", Symbol: "Q", Quantity: units.PoreVolumes},
		{Label: "Oil rate", Symbol: "qo", Quantity: units.Rate},
		{Label: "Water rate", Symbol: "qw", Quantity: units.Rate},
		{Label: "Water cut, surface", Symbol: "fw", Quantity: units.Share},
		{Label: "Oil produced", Symbol: "Np", Quantity: units.Volume},
		{Label: "Water produced", Symbol: "Wp", Quantity: units.Volume},
		{Label: "Recovery, of the pore volume", Symbol: "R", Quantity: units.Share},
	}
	dates := Column{Label: "Date", Quantity: units.Number}
	for i := 0; i <= forecastRows && float64(i)*step <= last*(1+aside); i++ {
		t := float64(i) * step
		state := f.told(f.linear.At(t))
		for c, value := range []float64{t, state.PVI, state.OilRate, state.WaterRate, state.WaterCut, state.CumOil, max(0, state.CumWater), state.Recovery} {
			columns[c].Values = append(columns[c].Values, value)
		}
		dates.Words = append(dates.Words, date(start, t))
	}
	if start != "" {
		columns = append([]Column{dates}, columns...)
	}
	return Grid{ID: "field.forecast", Title: "Forecast; rates are calendar averages, volumes at surface", Columns: columns}
}

// date is the day some time after the start of injection.
func date(start string, after float64) string {
	const day, lastDay = 86400, 1e6
	first, err := time.Parse(time.DateOnly, start)
	if err != nil {
		return ""
	}
	if after/day > lastDay {
		return "beyond the calendar"
	}
	return first.AddDate(0, 0, int(after/day+0.5)).Format(time.DateOnly)
}
