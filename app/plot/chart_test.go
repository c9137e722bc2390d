package plot

import (
	"math"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

// invented is a small chart with every kind of line in it; its numbers are made
// up to be easily followed through the conversions.
func invented() study.Chart {
	top := 0.02 // m3/s
	return study.Chart{
		ID: "rates", Title: "Rates at surface", Summary: "The oil rate falls as water arrives.",
		X: study.Axis{Label: "Time", Symbol: "t", Quantity: units.Duration},
		Y: study.Axis{Label: "Rate at surface", Symbol: "q", Quantity: units.Rate, CanLog: true, Max: &top},
		Lines: []study.Line{
			{ID: "qo", Label: "oil", Role: "oil", Kind: "line", X: []float64{0, 86400, 172800}, Y: []float64{0.01, 0.005, 0.0025}},
			{ID: "qw", Label: "water", Role: "water", Kind: "dashed", X: []float64{0, 86400, 172800}, Y: []float64{0, 0.005, 0.0075}},
			{ID: "range", Label: "oil, likely", Role: "oil", Kind: "band", X: []float64{0, 172800}, Y: []float64{0.011, 0.003}, Low: []float64{0.009, 0.002}},
			{ID: "test", Label: `well test, "A"`, Role: "oil", Kind: "points", X: []float64{43200}, Y: []float64{0.008}},
			{ID: "bank", Label: "oil bank", Role: "time1", Kind: "line", X: []float64{0, 43200, 86400}, Y: []float64{0.002, 0.004, 0.006}, Moving: true,
				Readings: []study.Column{
					{Label: "speed", Symbol: "v", Quantity: units.Number, Values: []float64{2, 1, 0.5}},
					{Label: "arrives after", Quantity: units.Duration, Values: []float64{3600, 0, 3 * 365.25 * 86400}, Words: []string{"", "never", ""}},
				}},
		},
		Slider: &study.Slider{Label: "Water injected", Symbol: "Q", Quantity: units.PoreVolumes, Min: 0, Max: 2, Value: 1.5,
			Marks: []study.Mark{{Label: "breakthrough", X: 0.5}}},
		Marks: []study.Mark{{Label: "water arrives", X: 43200, Y: 0.01}},
	}
}

// broken is the same chart with a number that is none in every place.
func broken(bad float64) study.Chart {
	c := invented()
	c.X.Min, c.Y.Min, c.Y.Max = &bad, &bad, &bad
	c.Lines[0].Y[1] = bad
	c.Lines[1].X[0] = bad
	c.Lines[2].Low[1] = bad
	c.Lines[3].X = append(c.Lines[3].X, bad)
	c.Lines[3].Y = append(c.Lines[3].Y, 0.001)
	c.Marks = append(c.Marks, study.Mark{Label: "nowhere", X: bad, Y: 0.01})
	return c
}

var badNumbers = []float64{math.NaN(), math.Inf(1), math.Inf(-1)}
