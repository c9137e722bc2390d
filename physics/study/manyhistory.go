package study

import (
	"math"

	"brinefront/physics/fit"
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// past is what has been measured: rates at surface, and what they add up to.
type past struct {
	time, oilRate, waterRate []float64
	oil, water               []float64 // m3 since the first row, by trapezes
	line                     fit.Straight
	from                     float64 // water-oil ratio from which the line is drawn
	straight                 bool    // there is a line
}

func (m *many) readPast() {
	from := m.or("field.history.from", 1)
	columns, problem := historyTable.rows(m.st.Field.History.Table, m.st.Field.Start)
	if problem != nil {
		m.problems = append(m.problems, *problem)
	}
	if columns == nil {
		return
	}
	p := &past{time: columns[0], oilRate: columns[1], waterRate: columns[2], from: from}
	p.oil, p.water = make([]float64, len(p.time)), make([]float64, len(p.time))
	for i := 1; i < len(p.time); i++ {
		half := (p.time[i] - p.time[i-1]) / 2
		p.oil[i] = p.oil[i-1] + half*(p.oilRate[i]+p.oilRate[i-1])
		p.water[i] = p.water[i-1] + half*(p.waterRate[i]+p.waterRate[i-1])
	}
	m.past = p
}

// late are the rows from which the straight line is drawn.
func (p *past) late() (oil, ratio []float64) {
	for i := range p.time {
		if p.oilRate[i] > 0 && p.waterRate[i] >= p.from*p.oilRate[i] {
			oil, ratio = append(oil, p.oil[i]), append(ratio, math.Log(p.waterRate[i]/p.oilRate[i]))
		}
	}
	return oil, ratio
}

// fewest rows that a trend is drawn through: common practice, no source.
const fewest = 5

// trend draws the straight line through the late water-oil ratio and says where it leads.
func (m *many) trend() {
	p := m.past
	if p == nil {
		return
	}
	behind := func(words string) *working {
		return m.by("", words, ref.Lo1990, ref.SeberWild1989).rests(historyTable.path, "field.history.from")
	}
	last := len(p.time) - 1
	m.figure(Figure{ID: "field.measuredOil", Label: "Oil measured, since the first row", Symbol: "Npm", Value: p.oil[last], Quantity: units.Volume}, m.by("", "Rates added up over time by trapezes.").rests(historyTable.path))
	if p.time[last] <= m.run.At(m.end).Time {
		m.figure(Figure{ID: "field.forecastOil", Label: "Oil of the forecast over the same time", Symbol: "Npf", Value: m.at(m.run, p.time[last]).oil - m.at(m.run, p.time[0]).oil, Quantity: units.Volume}, m.method("Between the first and the last row of the history.").rests(historyTable.path))
	}
	oil, ratio := p.late()
	line, ok := fit.NewStraight(oil, ratio, 0.95)
	if !ok || len(oil) < fewest {
		m.note(Note{ID: "field.historyShort", Level: "remark", Text: "No straight line is drawn through the history: fewer than " + units.Format(fewest, 2) + " rows have a water-oil ratio of " + units.Format(p.from, 3) + " or more.", Cause: "The line holds late in a flood, and needs points to be judged by.", Do: "Add later rows, or begin the line at a lower ratio.", Paths: []string{historyTable.path, "field.history.from"}})
		return
	}
	p.line, p.straight = line, true
	m.figure(Figure{ID: "field.trendRows", Label: "Rows of the straight line", Symbol: "n", Value: float64(line.Points), Quantity: units.Number}, behind("Rows whose water-oil ratio is at least where the line begins."))
	m.figure(Figure{ID: "field.trendExplained", Label: "Part of the scatter that the line explains", Symbol: "R²", Value: line.Explained, Quantity: units.Number}, behind("Of the logarithm of the water-oil ratio against oil produced."))
	if m.st.Field.Limit == "waterCut" {
		cut := m.need("field.waterCut")
		if x, low, high, ok := line.Where(math.Log(cut / (1 - cut))); ok && line.Slope > 0 {
			m.figure(Figure{ID: "field.trendOil", Label: "Oil at the limit by the straight line, since the first row", Symbol: "Npx", Value: x, Quantity: units.Volume}, behind("Where the line comes to the water-oil ratio of the water cut at the limit.").rests("field.waterCut"))
			m.figure(Figure{ID: "field.trendLow", Label: "The same, low end of 95 %", Symbol: "Npx-", Value: low, Quantity: units.Volume}, behind("Fieller's interval, as if rows scattered independently of each other.").rests("field.waterCut"))
			m.figure(Figure{ID: "field.trendHigh", Label: "The same, high end of 95 %", Symbol: "Npx+", Value: high, Quantity: units.Volume}, behind("Fieller's interval, as if rows scattered independently of each other.").rests("field.waterCut"))
		}
	}
	m.note(Note{ID: "field.trend", Level: "remark", Text: "The straight line of log water-oil ratio against oil produced is a rule of experience; it explains " + units.Format(100*line.Explained, 3) + " % of the scatter of " + units.Format(float64(line.Points), 3) + " rows.", Cause: "It holds while rates, wells and sweep stay as they are, and rows that follow each other do not scatter independently: the true interval is wider.",
		Do: "Leave out what came before the last change of wells or rates, and compare with the forecast.", Paths: []string{historyTable.path, "field.history.from"}})
	if line.Slope <= 0 || line.Explained < 0.8 {
		m.note(Note{ID: "field.trendPoor", Level: "caution", Text: "The late water-oil ratio does not follow a straight line that rises.", Cause: "Less than four fifths of its scatter is explained, or it falls; common practice, no source.", Do: "Look for shut-ins, stimulation or changes of pattern in the history.", Paths: []string{historyTable.path, "field.history.from"}})
	}
}

// overlay draws what was measured over the forecast.
func (m *many) overlay() {
	p := m.past
	if p == nil {
		return
	}
	last := len(p.time) - 1
	before := m.at(m.run, math.Min(p.time[0], m.end)) // made before the first row, as the forecast has it
	points := func(id, label, role string, x, y []float64) Line {
		return Line{ID: "measured." + id, Label: label, Role: role, Kind: "points", X: x, Y: y}
	}
	plus := func(list []float64, by float64) []float64 {
		return each(list, func(v float64) float64 { return v + by })
	}
	var cutAt, cut, made, ratio []float64
	for i := range p.time {
		if sum := p.oilRate[i] + p.waterRate[i]; sum > 0 {
			cutAt, cut = append(cutAt, p.time[i]), append(cut, p.waterRate[i]/sum)
		}
		if p.oilRate[i] > 0 && p.waterRate[i] > 0 {
			made, ratio = append(made, p.oil[i]+before.oil), append(ratio, p.waterRate[i]/p.oilRate[i])
		}
	}
	for i := range m.part.Charts {
		c := &m.part.Charts[i]
		switch c.ID {
		case "field.rates":
			c.Lines = append(c.Lines, points("oil", "oil, measured", "oil", p.time, p.oilRate), points("water", "water, measured", "water", p.time, p.waterRate))
		case "field.waterCut":
			c.Lines = append(c.Lines, points("cut", "measured", "water", cutAt, cut))
		case "field.cumulative":
			c.Lines = append(c.Lines, points("oil", "oil, measured", "oil", p.time, plus(p.oil, before.oil)), points("water", "water, measured", "water", p.time, plus(p.water, before.water)))
		case "field.waterOilRatio":
			if len(made) > 0 {
				c.Lines = append(c.Lines, points("ratio", "measured", "water", made, ratio))
			}
			if p.straight {
				from, to := (math.Log(p.from)-p.line.Intercept)/p.line.Slope, p.oil[last]
				if x := m.number("field.trendOil"); x > to {
					to = x
				}
				if p.line.Slope > 0 && from < to {
					at := func(x float64) float64 { return math.Exp(p.line.Intercept + p.line.Slope*x) }
					c.Lines = append(c.Lines, Line{ID: "trend", Label: "straight line", Role: "aid", Kind: "dashed", X: []float64{from + before.oil, to + before.oil}, Y: []float64{at(from), at(to)}})
				}
			}
		}
		if len(c.Lines) > 0 && c.Lines[len(c.Lines)-1].Kind == "points" {
			c.Summary += " Points are measured."
		}
	}
}
