package study

import (
	"math"

	"brinefront/physics/ref"
	"brinefront/physics/reservoir"
	"brinefront/physics/units"
)

// commonClock is how the state of layers follows.
const commonClock = "Layers without crossflow share one pressure difference; each goes at its own pace along ∫Δp dt, its resistance integrated exactly over its profile, so that a rate of all together is one root at each time. No step is taken in time or place."

func (m *many) figures() {
	m.patternFigures()
	m.rockFigures()
	m.contrastFigures()
	start := m.at(m.run, m.starting())
	m.figure(Figure{ID: "field.startOilRate", Label: "Oil rate at the start, calendar, at surface", Symbol: "qoi", Value: start.oilRate, Quantity: units.Rate, Strip: true},
		m.method("As injection begins; 0 while gas-filled space is filled."))
	m.figure(Figure{ID: "field.startRate", Label: "Injection rate at the start, calendar", Symbol: "qi", Value: start.injection, Quantity: units.Rate}, m.method("Reservoir volume per calendar day, as injection begins."))
	if m.gas > 0 {
		m.figure(Figure{ID: "field.fillUp", Label: "Gas-filled space, to be filled first", Symbol: "Vg", Value: m.gas * m.pores, Quantity: units.Volume},
			m.by("{Vg} = {Sg} {PV}", "", ref.Craig1971).input("field.wells.gas").term("field.poreVolume"))
		m.figure(Figure{ID: "field.response", Label: "First oil after", Symbol: "tr", Value: m.response(), Quantity: units.Duration},
			m.method("When the layer that fills first is full of liquid.", ref.Craig1971))
	}
	if bt := m.run.TimeAt(m.run.Body.Breakthrough()); !math.IsInf(bt, 1) {
		first := m.at(m.run, bt*(1-aside))
		m.figure(Figure{ID: "field.breakthrough", Label: "Water arrives after", Symbol: "tbt", Value: first.Time, Quantity: units.Duration, Strip: true}, m.method("Of the layer that comes first. Calendar time; "+calendar))
		m.figure(Figure{ID: "field.injectedAtBreakthrough", Label: "Injected when water arrives", Symbol: "Qbt", Value: first.Injected, Quantity: units.PoreVolumes}, m.method("Of the pore volume of all layers."))
		m.figure(Figure{ID: "field.recoveryAtBreakthrough", Label: "Recovery when water arrives, of the pore volume", Symbol: "Rbt", Value: first.recovery, Quantity: units.Share, Strip: true}, m.method("Oil displaced and produced."))
	}
	peak := start
	for _, i := range m.moments {
		if i.oilRate > peak.oilRate {
			peak = i
		}
	}
	m.figure(Figure{ID: "field.peakOilRate", Label: "Highest oil rate, calendar, at surface", Symbol: "qo,max", Value: peak.oilRate, Quantity: units.Rate}, m.method("The largest of the forecast."))
	if m.limit.Outcome == reservoir.Reached {
		m.limitFigures()
	} else {
		last := m.moments[len(m.moments)-1]
		m.figure(Figure{ID: "field.oilAtEnd", Label: "Oil produced by the end of the forecast, at surface", Symbol: "Npend", Value: last.oil, Quantity: units.Volume, Strip: true}, m.method("The last of the forecast."))
		m.figure(Figure{ID: "field.recoveryAtEnd", Label: "Recovery by the end of the forecast, of the pore volume", Symbol: "Rend", Value: last.recovery, Quantity: units.Share, Strip: true}, m.method("The last of the forecast."))
	}
	m.moneyFigures()
	m.pressureFigures()
}

// starting is a time just after injection begins.
func (m *many) starting() float64 {
	for _, s := range m.steps {
		if s.Rate > 0 || s.Pressure > 0 {
			return s.From + 1e-12*m.end
		}
	}
	return 0
}

// response is when the first layer is full of liquid.
func (m *many) response() float64 {
	clock := math.Inf(1)
	for _, b := range m.run.Body.(reservoir.Bundle) {
		clock = math.Min(clock, reservoir.Clock(b.Body, m.gas, 0)/b.Pace)
	}
	return m.run.TimeAt(clock)
}

// method starts a working that is told in words, and rests on the field.
func (m *many) method(words string, sources ...ref.ID) *working {
	w := m.by("", words+" "+commonClock, append(sources, ref.DykstraParsons1950, ref.Welge1952)...)
	if m.run != m.apart {
		w = m.by("", words+" The layers are flooded as one with thickness-averaged curves: flow across them is free, and each is behind the front or ahead of it.", append(sources, ref.Hearn1971, ref.Dake1978)...)
	}
	w.rests(m.ground()...).on("front.breakthrough")
	if layered(m.st) {
		w.rests(layerTable.path)
	} else {
		w.rests("field.thickness", "field.permeability", "field.porosity")
	}
	if scheduled(m.st) {
		return w.rests(scheduleTable.path)
	}
	return w.rests("field." + m.st.Field.Drive)
}

func (m *many) rockFigures() {
	thickness, stored, capacity := 0.0, 0.0, 0.0
	for _, l := range m.layers {
		thickness += l.Thickness
		stored += l.Thickness * l.Porosity
		capacity += l.Thickness * l.Permeability
	}
	from := []string{"field.thickness", "field.porosity", "field.permeability"}
	if layered(m.st) {
		from = []string{layerTable.path}
	}
	m.figure(Figure{ID: "field.thicknessOfAll", Label: "Thickness of all layers", Symbol: "h", Value: thickness, Quantity: units.Length}, m.by("", "Summed over the layers.").rests(from...))
	m.figure(Figure{ID: "field.meanPorosity", Label: "Mean porosity", Symbol: "φ", Value: stored / thickness, Quantity: units.Fraction}, m.by("", "Σ φ h/Σ h over the layers.").rests(from...))
	m.figure(Figure{ID: "field.meanPermeability", Label: "Mean permeability along the layers", Symbol: "k", Value: capacity / thickness, Quantity: units.Permeability}, m.by("", "Σ k h/Σ h over the layers.").rests(from...))
	inPlace := !holdsConnate(pairOf(m.st))
	m.figure(Figure{ID: "field.poreVolume", Label: "Pore volume", Symbol: "PV", Value: m.pores, Quantity: units.Volume, Strip: !inPlace},
		m.inPlan("{PV} = ", " {h} {φ}").term("field.thicknessOfAll").term("field.meanPorosity"))
	if swi, id := m.initial(); inPlace {
		m.figure(Figure{ID: "field.oilInPlace", Label: "Oil in place, at surface", Symbol: "N", Value: m.pores * (1 - swi - m.gas) / m.front.bo, Quantity: units.Volume, Strip: true},
			m.by("{N} = {PV} (1 - {Swi} - {Sg}) / {Bo}", "", ref.Dake1978).term("field.poreVolume").term(id).value("Sg", "gas saturation at the start", m.gas, units.Fraction).input("fluids.oilFormationFactor"))
	}
}

// contrastFigures say how far the layers differ.
func (m *many) contrastFigures() {
	if len(m.samples) < 2 {
		return
	}
	add := func(id, label, symbol string, value float64, strip bool, how string, source ref.ID) {
		m.figure(Figure{ID: "field." + id, Label: label, Symbol: symbol, Value: value, Quantity: units.Number, Strip: strip}, m.by("", how, source).rests(layerTable.path))
	}
	line := "1 − exp(−m), m the slope of ln k against the normal quantile of the share of thickness with higher permeability, by least squares; plotting position "
	add("variation", "Dykstra-Parsons coefficient", "VDP", reservoir.Variation(m.samples, reservoir.Hazen), m.pattern == nil, line+"in the middle of each row (Hazen).", ref.DykstraParsons1950)
	add("variationWeibull", "The same, plotted at i/(n + 1)", "VDP,W", reservoir.Variation(m.samples, reservoir.Weibull), false, line+"i/(n + 1) (Weibull). It differs from the other where rows are few.", ref.DykstraParsons1950)
	add("variationOfSpread", "The same, by the standard deviation of ln k", "VDP,s", reservoir.VariationOfSpread(m.samples), false, "1 − exp(−s), weighted with thickness.", ref.Lake1989)
	add("variationOfMeans", "The same, by arithmetic and harmonic mean", "VDP,m", reservoir.VariationOfMeans(m.samples), false, "1 − exp(−√ln(kA/kH)).", ref.Fanchi2016)
	add("lorenz", "Lorenz coefficient", "LC", reservoir.Lorenz(m.samples), false, "Twice the area between the flow capacity plot and its diagonal.", ref.SchmalzRahme1950)
	if len(m.layers) < len(m.samples) {
		add("lorenzOfLayers", "Lorenz coefficient of the layers lumped", "LC,N", reservoir.Lorenz(m.layers), false, "The same for the layers that are flooded.", ref.SchmalzRahme1950)
		m.figure(Figure{ID: "field.lost", Label: "Contrast lost by lumping", Symbol: "ΔLC", Value: m.number("field.lorenz") - m.number("field.lorenzOfLayers"), Quantity: units.Number},
			m.by("{ΔLC} = {LC} - {LC,N}", "Lumped layers are even inside.").term("field.lorenz").term("field.lorenzOfLayers").rests("field.layers.groups"))
	}
}

func (m *many) limitFigures() {
	path := limitPath(m.st)
	i := m.at(m.run, m.limit.Time)
	ask := m.method("Where " + map[string]string{"waterCut": "the water cut at surface first comes to its limit; inside the jump of an arrival, with that arrival.", "oilRate": "the oil rate falls below its limit for good.", "cash": "prices no longer pay for costs, for good."}[m.st.Field.Limit]).rests(path)
	if path != "field.money.oil" {
		spec, _ := Find(path)
		typed, _ := m.input(path)
		m.figure(Figure{ID: "field.limit", Label: spec.Label, Symbol: spec.Symbol, Value: typed, Quantity: spec.Quantity}, m.by("", "As typed.").rests(path))
	}
	m.figure(Figure{ID: "field.limitTime", Label: "Limit reached after", Symbol: "tlim", Value: m.limit.Time, Quantity: units.Duration, Strip: true}, ask)
	m.figure(Figure{ID: "field.limitInjected", Label: "Injected at the limit", Symbol: "Qlim", Value: i.Injected, Quantity: units.PoreVolumes}, ask)
	m.figure(Figure{ID: "field.recoveryAtLimit", Label: "Recovery at the limit, of the pore volume", Symbol: "Rlim", Value: i.recovery, Quantity: units.Share, Strip: true}, ask)
	m.figure(Figure{ID: "field.oilAtLimit", Label: "Oil produced at the limit, at surface", Symbol: "Nplim", Value: i.oil, Quantity: units.Volume}, ask)
	m.figure(Figure{ID: "field.waterAtLimit", Label: "Water produced at the limit, at surface", Symbol: "Wplim", Value: i.water, Quantity: units.Volume}, ask)
	if m.run == m.apart {
		swept, oil := m.swept(i.Clock)
		sweep := "Vertical sweep at the limit"
		if m.pattern != nil {
			sweep = "Vertical and areal sweep together, at the limit"
		}
		m.figure(Figure{ID: "field.verticalSweep", Label: sweep, Symbol: "Ev", Value: swept, Quantity: units.Share}, m.method("Part of the pore volume that fronts have passed."))
		if !holdsConnate(pairOf(m.st)) {
			m.figure(Figure{ID: "field.displacement", Label: "Displacement efficiency where swept, at the limit", Symbol: "Ed", Value: (i.recovery + i.Held) / oil, Quantity: units.Share},
				m.by("{Ed} = ({Rlim} + {Sgf}) / ({Ev} (1 - {Swi}))", "Of the oil in the rock that water reaches.").term("field.recoveryAtLimit").
					value("Sgf", "gas-filled space filled, of the pore volume", i.Held, units.Share).term("field.verticalSweep").value("Swi", "initial water where fronts have passed", 1-oil/swept, units.Fraction).on("front.initialWater"))
		}
	}
	if m.full != nil {
		for _, side := range []struct {
			id, label, symbol string
			run               *reservoir.Run
		}{{"field.recoveryApart", "Recovery without crossflow, for as much injected", "R0", m.apart}, {"field.recoveryFull", "Recovery with full crossflow, for as much injected", "R∞", m.full}} {
			o := side.run.Body.At(reservoir.Clock(side.run.Body, i.Injected, 0))
			m.figure(Figure{ID: side.id, Label: side.label, Symbol: side.symbol, Value: o.Oil + i.recovery - i.Oil, Quantity: units.Share},
				m.by("", "The truth lies between the two for layers that are in touch in part. With full crossflow each layer is behind the front or ahead of it, without a fan inside.", ref.DykstraParsons1950, ref.Hearn1971).on("field.limitInjected"))
		}
	}
}

func (m *many) moneyFigures() {
	if !m.purse.known {
		return
	}
	cash, now := m.purse.worth(m.moments)
	last := len(cash) - 1
	until := m.end
	if m.limit.Outcome == reservoir.Reached && m.limit.Time <= m.end {
		until = m.limit.Time
		for last > 0 && m.moments[last].Time > until {
			last--
		}
	}
	ask := m.by("", "Oil at its price, less water, injection and time at their costs, from the volumes between the times of the forecast, to the limit or the end; what flows between two times counts at the middle. No tax, no investment.").on("field.breakthrough").rests("field.money.oil", "field.money.water", "field.money.injection", "field.money.fixed", "field.money.discount")
	m.figure(Figure{ID: "field.cash", Label: "Net cash, in the currency typed", Symbol: "C", Value: cash[last], Quantity: units.Number}, ask)
	m.figure(Figure{ID: "field.worth", Label: "Net cash, discounted to the start", Symbol: "C0", Value: now[last], Quantity: units.Number}, ask)
}

func (m *many) pressureFigures() {
	highest := m.moments[0]
	for _, i := range m.moments {
		if i.Pressure > highest.Pressure {
			highest = i
		}
	}
	m.figure(Figure{ID: "field.highestDrop", Label: "Highest pressure difference, while on", Symbol: "Δp,hi", Value: highest.Pressure, Quantity: units.Pressure}, m.method(m.converging(), ref.Muskat1937))
	if m.st.Field.Wells.ProducerPressure == nil {
		return
	}
	m.figure(Figure{ID: "field.injectorPressure", Label: "Highest pressure at the bottom of the injector", Symbol: "pi", Value: highest.Pressure + m.need("field.wells.producerPressure"), Quantity: units.Pressure},
		m.by("{pi} = {pp} + {Δp,hi}", "Wells at one depth.").input("field.wells.producerPressure").term("field.highestDrop"))
	if m.st.Field.Wells.Depth != nil && m.st.Field.Wells.FractureGradient != nil {
		m.figure(Figure{ID: "field.fracturePressure", Label: "Fracture pressure, by the gradient typed", Symbol: "pf", Value: m.need("field.wells.fractureGradient") * m.need("field.wells.depth"), Quantity: units.Pressure},
			m.by("{pf} = {Gf} {D}", "").input("field.wells.fractureGradient").input("field.wells.depth"))
	}
}

func (m *many) say() {
	opening := "Water arrives after"
	if m.front.waterMoves() {
		opening = "The front arrives after"
	}
	m.answer(opening + " {field.breakthrough} ({field.injectedAtBreakthrough} injected) with {field.recoveryAtBreakthrough} of the pore volume produced")
	switch m.limit.Outcome {
	case reservoir.Reached:
		switch m.st.Field.Limit {
		case "oilRate":
			m.answer("; at an oil rate of {field.limit}")
		case "cash":
			m.answer("; where prices no longer pay for costs")
		default:
			m.answer("; at {field.limit} water cut")
		}
		m.answer(", after {field.limitTime}, it is {field.recoveryAtLimit}", ", {field.oilAtLimit}")
		m.answer("; for as much injected {field.recoveryApart} without flow between the layers and {field.recoveryFull} with full crossflow")
	case reservoir.FromTheStart:
		m.answer("; the flood is beyond its limit from the start")
	default:
		m.answer("; the limit is never reached")
	}
	m.answer(".")
}
