package study

import (
	"math"
	"strconv"

	"brinefront/physics/reservoir"
	"brinefront/physics/units"
)

// line is one quantity of the forecast against time.
func (m *many) line(id, label, role, kind string, pick func(instant) float64) Line {
	l := Line{ID: id, Label: label, Role: role, Kind: kind}
	for _, i := range m.moments {
		l.X, l.Y = append(l.X, i.Time), append(l.Y, pick(i))
	}
	return l
}

// bracket is a quantity of the forecast, and of those that it lies between.
func (m *many) bracket(id, label, role string, pick func(instant) float64) []Line {
	lines := []Line{m.line(id, label, role, "line", pick)}
	for _, b := range m.beside {
		l := Line{ID: b.id, Label: b.label, Role: b.role, Kind: "dashed"}
		for _, i := range b.moments {
			l.X, l.Y = append(l.X, i.Time), append(l.Y, pick(i))
		}
		lines = append(lines, l)
	}
	return lines
}

// chart adds a chart of quantities against time.
func (m *many) chart(c Chart, pick func(instant) float64, lines ...Line) {
	c.Lines, c.Marks = lines, []Mark{}
	if c.X.Label == "" {
		c.X = timeAxis
		for _, at := range []struct {
			label string
			time  float64
		}{{"breakthrough", m.run.TimeAt(m.run.Body.Breakthrough())}, {"limit", m.limit.Time}} {
			if at.time > 0 && at.time <= m.end {
				t := at.time * (1 + aside)
				c.Marks = append(c.Marks, Mark{at.label, t, pick(m.at(m.run, t))})
			}
		}
	}
	m.part.Charts = append(m.part.Charts, c)
}

func (m *many) charts() {
	oilRate := func(i instant) float64 { return i.oilRate }
	cut := func(i instant) float64 { return i.cut }
	recovery := func(i instant) float64 { return i.recovery }
	oil := func(i instant) float64 { return i.oil }
	pressure := func(i instant) float64 { return i.Pressure }
	m.chart(Chart{ID: "field.rates", Title: "Rates", Y: Axis{Label: "Rate, calendar", Symbol: "q", Quantity: units.Rate, CanLog: true},
		Summary: "Oil and water rates at surface and injection against time."}, oilRate,
		m.line("oil", "oil, surface", "oil", "line", oilRate),
		m.line("water", "water, surface", "water", "line", func(i instant) float64 { return i.waterRate }),
		m.line("injection", "injected, reservoir", "aid", "dashed", func(i instant) float64 { return i.injection }))
	between := ""
	if m.full != nil {
		between = ", with and without flow between the layers"
	}
	m.chart(Chart{ID: "field.waterCut", Title: "Water cut", Y: axis("Water cut, surface", "fw", units.Share).from(0, 1),
		Summary: "Water cut at surface against time" + between + ": a step as each layer's front arrives."}, cut, m.bracket("surface", "forecast", "water", cut)...)
	m.chart(Chart{ID: "field.recovery", Title: "Recovery", Y: axis("Recovery, of the pore volume", "R", units.Share).from(0, 1),
		Summary: "Recovery against time" + between + "."}, recovery, m.bracket("pore", "forecast", "oil", recovery)...)
	m.chart(Chart{ID: "field.cumulative", Title: "Cumulative volumes", Y: axis("Volume", "V", units.Volume),
		Summary: "Oil and water produced at surface and water injected, all cumulative, against time."}, oil,
		m.line("oil", "oil, surface", "oil", "line", oil),
		m.line("water", "water, surface", "water", "line", func(i instant) float64 { return i.water }),
		m.line("injection", "injected, reservoir", "aid", "dashed", func(i instant) float64 { return i.injected }))
	ratio, former := Line{ID: "ratio", Label: "water-oil ratio", Role: "water", Kind: "line"}, 0.0
	for _, i := range m.moments {
		if i.waterRate > 0 && i.oilRate > 1e-12*i.waterRate {
			former = math.Max(former, i.oil)
			ratio.X, ratio.Y = append(ratio.X, former), append(ratio.Y, i.waterRate/i.oilRate)
		}
	}
	if len(ratio.X) > 1 {
		m.chart(Chart{ID: "field.waterOilRatio", Title: "Water-oil ratio", X: axis("Oil produced, surface", "Np", units.Volume),
			Y:       Axis{Label: "Water-oil ratio, surface", Symbol: "WOR", Quantity: units.WaterOilRatio, Log: true, CanLog: true},
			Summary: "Water-oil ratio at surface on a logarithmic axis against the oil produced."}, nil, ratio)
	}
	m.chart(Chart{ID: "field.pressure", Title: "Pressure difference between the wells", Y: axis("Pressure difference, while on", "Δp", units.Pressure),
		Summary: "Pressure difference between injector and producer against time, as held or as the rate takes."}, pressure, m.line("pressure", "injector to producer", "total", "line", pressure))
	first := m.at(m.run, m.starting())
	index := func(i instant) float64 { return i.Rate / first.Rate }
	m.chart(Chart{ID: "field.injectivity", Title: "Injectivity", Y: axis("Rate over pressure difference, over that at the start", "I", units.Number),
		Summary: "Injectivity against time, over that at the start: it changes as water takes the place of oil."}, index, m.line("injectivity", "injectivity", "total", "line", index))
	if m.purse.known {
		cash, now := m.purse.worth(m.moments)
		at := func(y []float64) Line {
			l := m.line("cash", "net cash", "total", "line", oil)
			l.Y = y
			return l
		}
		worth := at(now)
		worth.ID, worth.Label, worth.Role, worth.Kind = "worth", "discounted", "aid", "dashed"
		m.part.Charts = append(m.part.Charts, Chart{ID: "field.cash", Title: "Net cash", X: timeAxis, Y: axis("Net cash, cumulative", "C", units.Number), Marks: []Mark{}, Lines: []Line{at(cash), worth},
			Summary: "Net cash since the start, plain and discounted, against time: where it turns down the flood no longer pays."})
	}
	m.patternCharts()
	if len(m.layers) > 1 {
		m.layerCharts()
	}
}

// layerCharts are the flow capacity plot and the fronts in the layers.
func (m *many) layerCharts() {
	typed, flow := reservoir.FlowCapacity(m.samples)
	lines := []Line{}
	if len(typed) > 200 {
		typed, flow = sparse(typed), sparse(flow)
	}
	lines = append(lines, Line{ID: "rows", Label: "rows of the table", Role: "total", Kind: "line", X: typed, Y: flow})
	if len(m.layers) < len(m.samples) {
		x, y := reservoir.FlowCapacity(m.layers)
		lines = append(lines, Line{ID: "layers", Label: "layers", Role: "water", Kind: "dashed", X: x, Y: y})
	}
	lines = append(lines, Line{ID: "even", Label: "even rock", Role: "aid", Kind: "dashed", X: []float64{0, 1}, Y: []float64{0, 1}})
	m.part.Charts = append(m.part.Charts, Chart{ID: "field.capacity", Title: "Flow capacity", X: axis("Share of φ h, fastest first", "C", units.Share).from(0, 1), Y: axis("Share of k h", "F", units.Share).from(0, 1),
		Lines: lines, Marks: []Mark{}, Summary: "Share of the flow capacity against share of the storage, fastest layers first: the further above the diagonal, the more a few layers carry."})
	if m.run != m.apart {
		return
	}
	total := 0.0
	for _, l := range m.layers {
		total += l.Thickness
	}
	chart := Chart{ID: "field.fronts", Title: "Fronts in the layers", X: axis("Depth into the layers, in the order of the table", "h", units.Length).from(0, total), Y: axis(m.wayName(), m.waySymbol(), units.Share).from(0, 1),
		Marks: []Mark{}, Summary: "How far the front of each layer has come, at four times of the forecast: layers at 100 % give water."}
	for n, share := range []float64{0.1, 0.3, 0.6, 1} {
		t := share * m.end
		clock := m.run.At(t).Clock
		l := Line{ID: "at" + strconv.Itoa(n+1), Label: units.Format(t/86400, 3) + " d", Role: "time" + strconv.Itoa(n+1), Kind: "line"}
		depth := 0.0
		for i, layer := range m.layers {
			y := m.passed(i, clock)
			l.X, l.Y = append(l.X, depth, depth+layer.Thickness), append(l.Y, y, y)
			depth += layer.Thickness
		}
		chart.Lines = append(chart.Lines, l)
	}
	m.part.Charts = append(m.part.Charts, chart)
}

// sparse is every so many of a long list, with its ends.
func sparse(list []float64) []float64 {
	const most = 200
	short := make([]float64, most)
	for i := range short {
		short[i] = list[i*(len(list)-1)/(most-1)]
	}
	return short
}

func (m *many) tables() {
	m.part.Tables = append(m.part.Tables, m.forecast())
	if len(m.layers) < 2 {
		return
	}
	end, when := m.end, "at the end"
	if m.limit.Outcome == reservoir.Reached && m.limit.Time <= m.end {
		end, when = m.limit.Time, "at the limit"
	}
	clock := m.apart.At(end).Clock
	whole := m.bundle.At(0)
	columns := []Column{
		{Label: "Layer", Quantity: units.Number}, {Label: "Thickness", Symbol: "h", Quantity: units.Length}, {Label: "Permeability", Symbol: "k", Quantity: units.Permeability}, {Label: "Porosity", Symbol: "φ", Quantity: units.Fraction},
		{Label: "Share of the first injection", Quantity: units.Share}, {Label: "Water arrives", Symbol: "t", Quantity: units.Duration}, {Label: "Injected " + when, Symbol: "Q", Quantity: units.PoreVolumes}, {Label: "Oil produced " + when + ", reservoir", Quantity: units.Volume}, {Label: "Front " + when, Symbol: m.waySymbol(), Quantity: units.Share},
	}
	for i, l := range m.layers {
		b := m.bundle[i]
		o := b.Body.At(clock * b.Pace)
		word, arrives := "", m.apart.TimeAt(b.Body.Breakthrough()/b.Pace)
		if math.IsInf(arrives, 1) {
			word, arrives = "not within the schedule", 0
		}
		for c, v := range []float64{float64(i + 1), l.Thickness, l.Permeability, l.Porosity, b.Body.At(0).Rate * b.Pace * b.PoreVolume / (whole.Rate * m.pores), arrives, o.Injected, o.Oil * b.PoreVolume, m.passed(i, clock)} {
			columns[c].Values = append(columns[c].Values, v)
		}
		columns[5].Words = append(columns[5].Words, word)
	}
	m.part.Tables = append(m.part.Tables, Grid{ID: "field.layers", Title: "Layers, without crossflow", Columns: append(columns, m.endColumns()...)})
	if len(m.limiting.Columns) > 0 {
		m.part.Tables = append(m.part.Tables, m.limiting)
	}
}

// forecast is the field at even steps of time.
func (m *many) forecast() Grid {
	step := stepFor(m.end)
	columns := []Column{
		{Label: "Time", Symbol: "t", Quantity: units.Duration}, {Label: "Injected", Symbol: "Q", Quantity: units.PoreVolumes},
		{Label: "Injection rate, reservoir", Symbol: "qi", Quantity: units.Rate}, {Label: "Oil rate", Symbol: "qo", Quantity: units.Rate}, {Label: "Water rate", Symbol: "qw", Quantity: units.Rate},
		{Label: "Water cut at surface", Symbol: "fw", Quantity: units.Share}, {Label: "Oil produced", Symbol: "Np", Quantity: units.Volume}, {Label: "Water produced", Symbol: "Wp", Quantity: units.Volume},
		{Label: "Recovery, of the pore volume", Symbol: "R", Quantity: units.Share}, {Label: "Produced over injected, reservoir", Symbol: "VP/VI", Quantity: units.Share}, {Label: "Pressure difference", Symbol: "Δp", Quantity: units.Pressure},
	}
	dates := Column{Label: "Date", Quantity: units.Number}
	for n := 0; n <= forecastRows && float64(n)*step <= m.end*(1+aside); n++ {
		i := m.at(m.run, float64(n)*step)
		voidage := 1.0
		if i.injection > 0 {
			voidage = 1 - i.HoldingRate/i.Rate
		}
		for c, v := range []float64{i.Time, i.Injected, i.injection, i.oilRate, i.waterRate, i.cut, i.oil, i.water, i.recovery, voidage, i.Pressure} {
			columns[c].Values = append(columns[c].Values, v)
		}
		dates.Words = append(dates.Words, date(m.st.Field.Start, i.Time))
	}
	if m.st.Field.Start != "" {
		columns = append([]Column{dates}, columns...)
	}
	return Grid{ID: "field.forecast", Title: "Forecast; rates are calendar averages, volumes at surface", Columns: columns}
}

func (m *many) notes() {
	m.patternNotes()
	m.endNotes()
	switch {
	case m.pattern != nil:
	case len(m.layers) == 1:
		m.note(Note{ID: "field.linear", Level: "remark", Text: "The block is flooded evenly from one end to the other: one layer, full sweep, no aquifer.", Cause: "Patterns and layers sweep less of the rock and bring water sooner.", Do: "Take the recovery as that of the rock that water reaches."})
	default:
		same := ""
		if !m.own {
			same = ", and all have the curves, the initial and the residual saturations of the study"
		}
		m.note(Note{ID: "field.layersApart", Level: "remark", Text: "Layers run from well to well, in a straight block" + same + ".", Cause: "Layers that end between the wells, or of other rock, flood otherwise.", Do: "Read the forecast together with its neighbour for full crossflow: the truth lies between.", Paths: []string{layerTable.path}})
	}
	m.note(Note{ID: "field.incompressible", Level: "remark", Text: "Rock and liquids are incompressible; gas-filled space, where it is given, is filled layer by layer before anything comes out, and offers no resistance.", Cause: "A reservoir that has been depleted answers later and less sharply.", Do: "Compare the response with what neighbouring patterns showed.", Paths: []string{"field.wells.gas"}})
	if m.fullReason != "" {
		m.note(Note{ID: "field.noFull", Level: "caution", Text: "There is no answer for full crossflow. " + m.fullReason, Cause: "Thickness-averaged curves ask for a front in each layer.", Do: "Take the answer without crossflow as one side only.", Paths: []string{"field.layers.crossflow"}})
	}
	if m.st.Field.Layers.Crossflow == "gravity" && len(m.layers) < len(m.samples) {
		m.note(Note{ID: "field.orderLost", Level: "caution", Text: "Lumped layers have no order in depth; the fastest fills first.", Cause: "Lumping sorts by flow capacity.", Do: "Leave the number of layers to lump into empty to fill from the lowest layer.", Paths: []string{"field.layers.groups", "field.layers.crossflow"}})
	}
	if lost := m.number("field.lost"); lost > 0.03 {
		m.note(Note{ID: "field.lumped", Level: "caution", Text: "Lumping hides a Lorenz contrast of " + units.Format(lost, 2) + ".", Cause: "The fastest rows bring water sooner than the layer they were lumped into.", Do: "Lump into more layers.", Paths: []string{"field.layers.groups"}})
	}
	m.note(Note{ID: "field.fracture", Level: "caution", Text: "Injection must stay below the pressure that fractures the reservoir and its cap rock.", Cause: "A fracture short-cuts the flood and can take water where it does harm.",
		Do: "Have licensed engineers set the injection pressure, well integrity and water handling under the local code.", Paths: []string{"field." + m.st.Field.Drive}})
	const nearly = 0.9
	if high, most := m.number("field.injectorPressure"), m.number("field.fracturePressure"); high > nearly*most {
		m.note(Note{ID: "field.fracturePressure", Level: "caution", Text: "The pressure at the bottom of the injector comes to " + units.Format(high/1e6, 3) + " MPa; the gradient typed gives a fracture pressure of " + units.Format(most/1e6, 3) + " MPa.", Cause: "It is more than nine tenths of it; common practice, no source.",
			Do: "The pressure that may be held is for licensed engineers to set under the local code.", Paths: []string{"field.wells.fractureGradient", "field.wells.depth", "field.wells.producerPressure", "field." + m.st.Field.Drive}})
	}
	switch {
	case m.limit.Outcome == reservoir.FromTheStart:
		m.note(Note{ID: "field.limitAtStart", Level: "caution", Text: "The flood is beyond its economic limit from the start.", Cause: "The limit is met before anything is injected.", Do: "Look at the limit, the rate and the initial water saturation.", Paths: []string{limitPath(m.st)}})
	case m.limit.Outcome == reservoir.Never:
		m.note(Note{ID: "field.limitNever", Level: "caution", Text: "The economic limit is not reached within " + units.Format(furthest, 2) + " pore volumes or the schedule.", Cause: "The stream that is produced stays short of the limit.", Do: "Choose another limit, or give the time to forecast to.", Paths: []string{limitPath(m.st), "field.horizon"}})
	case m.limit.Time > m.end:
		m.note(Note{ID: "field.limitLater", Level: "remark", Text: "The economic limit comes after the end of the forecast.", Cause: "The forecast ends before it.", Do: "Give a longer time to forecast to, or none, to see the limit in the pictures.", Paths: []string{"field.horizon"}})
	}
}
