package study

import (
	"errors"
	"math"
	"slices"
	"strconv"

	"brinefront/physics/displace"
	"brinefront/physics/relperm"
	"brinefront/physics/reservoir"
)

// many is the flood of a block of layers, of wells that are more than its two ends, or of
// money: everything that one even block under one drive is not.
type many struct {
	*sheet
	memory        *Memory
	front         *front
	length, width float64   // m; in a pattern length is the distance of the wells
	area          float64   // m2, in plan
	pattern       *repeated // nil: a block
	shape         reservoir.Shape
	uptime, gas   float64
	samples       []reservoir.Sample // as typed
	layers        []reservoir.Sample // as flooded
	pores         float64            // m3
	bundle        reservoir.Bundle   // the layers apart
	beds          []*bed
	strata        []stratum // one a layer
	own           bool      // some layer has ends of its own
	fullReason    string    // why there is no answer for full crossflow
	steps         []reservoir.Step
	purse         purse
	past          *past // nil where nothing is measured

	run         *reservoir.Run // what the answer is about
	apart, full *reservoir.Run // without and with crossflow; full is nil where there is no answer
	pistons     *reservoir.Run
	limiting    Grid            // of the piston-like limits; none without columns
	limit       reservoir.Limit // Final is not told
	end         float64         // s
	moments     []instant
	beside      []neighbour // drawn beside the forecast
}

// neighbour is another answer to the same question.
type neighbour struct {
	id, label, role string
	moments         []instant
}

// tabulated is how near the answers of a layer come to its exact solution, pore volumes.
const tabulated = 1e-9

// runMany answers the Field sheet for what manyfold describes.
func runMany(st *Study, memory *Memory, frontPart Part, front *front) Part {
	m, status := laid(st, memory, frontPart, front)
	if m.run == nil {
		return m.close(status)
	}
	m.find()
	m.neighbours()
	m.figures()
	m.trend()
	m.charts()
	m.overlay()
	m.tables()
	m.notes()
	m.say()
	return m.close(status)
}

// laid reads what manyfold describes and lays its flood out; where that has no answer there
// is no run, and the status says why.
func laid(st *Study, memory *Memory, frontPart Part, front *front) (*many, Status) {
	m := &many{sheet: newSheet(st, frontPart), memory: memory, front: front}
	m.await(frontPart)
	m.read()
	standing := m.standing()
	if frontPart.Status == Refused {
		standing = Refused
	}
	if standing != Ready || front == nil {
		if standing == Ready {
			standing = frontPart.Status
		}
		return m, standing
	}
	if front.flow.Gravity != 0 {
		m.note(Note{ID: "field.dipping", Level: "caution", Text: "There is no forecast: patterns, layers, wells with a skin or a schedule, and cash are answered for a level bed only.",
			Cause: "With a dip the share of gravity in the flow changes with the rate in each layer, and fronts are no longer self-similar.", Do: "Leave the dip empty, or choose the block and leave the table of layers, the wells and the money empty.", Paths: []string{"front.dip"}})
		return m, Stopped
	}
	if m.settle(); len(m.problems) > 0 {
		return m, Refused
	}
	if bt := front.displacement.Breakthrough(); m.gas >= bt && !m.own {
		m.problem("field.wells.gas", m.typed("field.wells.gas"), "less than what is injected when the front arrives in an even layer")
		return m, Refused
	}
	if !m.lay() {
		return m, Stopped
	}
	return m, frontPart.Status
}

// read takes the inputs in.
func (m *many) read() {
	st := m.st
	m.uptime = m.or("field.uptime", 1)
	if patterned(st) {
		m.pattern = m.readPattern()
	} else {
		m.length, m.width = m.need("field.length"), m.need("field.width")
		m.area = m.length * m.width
	}
	if unlayered(st) {
		m.samples = []reservoir.Sample{{Thickness: m.need("field.thickness"), Permeability: m.need("field.permeability"), Porosity: m.need("field.porosity"), Swi: math.NaN(), Sor: math.NaN(), Swc: math.NaN()}}
	} else if columns, problem := layersTable(st).rows(st.Field.Layers.Table, ""); problem != nil {
		m.problems = append(m.problems, *problem)
	} else {
		for i := range columns[0] {
			m.samples = append(m.samples, reservoir.Sample{Thickness: columns[0][i], Permeability: columns[1][i], Porosity: columns[2][i], Swi: columns[3][i], Sor: columns[4][i], Swc: columns[5][i]})
		}
	}
	if _, lumped := m.input("field.layers.groups"); !lumped && len(m.samples) > MaxLayers {
		m.problem(layerTable.path, strconv.Itoa(len(m.samples))+" rows", "up to "+strconv.Itoa(MaxLayers)+" layers, or a number of layers to lump them into")
	}
	m.gas = m.or("field.wells.gas", 0)
	if p := CheckStart(st.Field.Start); p != nil {
		m.problems = append(m.problems, *p)
	}
	m.readSteps()
	m.readMoney()
	m.readPast()
	m.input("field.horizon")
	for _, path := range []string{"field.wells.producerPressure", "field.wells.depth", "field.wells.fractureGradient"} {
		m.input(path)
	}
	switch st.Field.Limit {
	case "oilRate":
		m.need("field.oilRate")
	case "waterCut":
		m.need("field.waterCut")
	}
}

// readSteps takes the schedule, or the drive as a schedule of one step.
func (m *many) readSteps() {
	st := m.st
	most := math.Inf(1)
	if heldRate(st) {
		most = m.or("field.wells.pressureLimit", most)
	}
	bounded := func(s reservoir.Step) reservoir.Step {
		if s.Rate > 0 && !math.IsInf(most, 1) && (s.Pressure == 0 || s.Pressure > most) {
			s.Pressure = most
		}
		return s
	}
	if !scheduled(st) {
		if heldRate(st) {
			m.steps = []reservoir.Step{bounded(reservoir.Step{Rate: m.need("field.rate")})}
		} else {
			m.steps = []reservoir.Step{{Pressure: m.need("field.pressure")}}
		}
		return
	}
	columns, problem := scheduleTable.rows(st.Field.Wells.Schedule, st.Field.Start)
	if problem != nil {
		m.problems = append(m.problems, *problem)
		return
	}
	moves := false
	for i := range columns[0] {
		s := reservoir.Step{From: columns[0][i], Rate: columns[1][i], Pressure: columns[2][i]}
		moves = moves || s.Rate > 0 || s.Pressure > 0
		m.steps = append(m.steps, bounded(s))
	}
	if !moves {
		m.problem(scheduleTable.path, "no rate and no pressure difference", "a rate or a pressure difference in at least one row")
	}
}

// lay builds the bodies and their runs; false when they leave no flow.
func (m *many) lay() bool {
	f := m.front
	m.shape = reservoir.Even
	if m.pattern == nil {
		m.ends()
	}
	study := m.bed(f.swi)
	if study == nil {
		return false
	}
	if m.pattern != nil {
		m.pattern.tubes = study.body.(reservoir.Streamtubes)
	}
	var strata []reservoir.Stratum
	var pistons reservoir.Bundle
	behind, sharp := f.flow.Curves.At(f.swj), f.oneOnEachSide()
	for _, l := range m.layers {
		s, ok := m.stratum(l)
		if !ok {
			return false
		}
		body := m.flooded(s)
		if m.gas > 0 && m.gas >= body.At(body.Breakthrough()).Injected {
			m.note(Note{ID: "field.gasFirst", Level: "caution", Text: "There is no forecast: water would arrive before the gas-filled space of each layer is full.", Cause: "The fastest way through a layer is swept by then.",
				Do: "Look at the gas saturation, the pattern and the layers.", Paths: []string{"field.wells.gas", "field.pattern.kind", layerTable.path}})
			return false
		}
		m.strata = append(m.strata, s)
		pv := l.Porosity * l.Thickness * m.area
		pace := l.Permeability / (l.Porosity * m.length * m.length)
		m.pores += pv
		m.bundle = append(m.bundle, reservoir.Member{Body: body, PoreVolume: pv, Pace: pace})
		piston := reservoir.Piston{Water: behind.Krw / f.flow.MuW, Oil: s.ahead.Kro / f.flow.MuO, Change: s.swj - s.swi}
		sharp = sharp && piston.Change > 0 && f.ofMobility(s.start) <= backward
		pistons = append(pistons, reservoir.Member{Body: piston, PoreVolume: pv, Pace: pace})
		strata = append(strata, reservoir.Stratum{Thickness: l.Thickness, Permeability: l.Permeability, Porosity: l.Porosity, Before: s.swi, After: s.swj, Ahead: s.ahead, Behind: behind})
	}
	m.apart = m.plan(m.bundle)
	if len(m.layers) > 1 {
		m.crossflow(strata)
		if m.pattern == nil && m.shape.In == 0 && m.shape.Out == 0 && m.gas == 0 && sharp {
			m.pistons = m.plan(pistons)
			m.limits(pistons, strata)
		}
	}
	m.run = m.apart
	if m.st.Field.Layers.Crossflow != "none" && m.full != nil {
		m.run = m.full
	}
	return true
}

// ends reads what the wells add at the two ends of the block.
func (m *many) ends() {
	radius := m.or("field.wells.radius", 0)
	end := func(skin string) float64 {
		if radius == 0 && m.or(skin, 0) == 0 {
			return 0
		}
		return reservoir.EndResistance(m.length, m.width, radius, m.or(skin, 0))
	}
	m.shape.In, m.shape.Out = end("field.wells.injectorSkin"), end("field.wells.producerSkin")
}

// resists reports whether the wells leave a flood of the block resistance.
func (m *many) resists(flood *reservoir.Flood) bool {
	path := reservoir.Path{PoreVolume: 1, Impedance: 1, Shape: m.shape, Flood: flood}
	for _, at := range []float64{0, flood.Displacement.Breakthrough(), 2, 1e4} {
		if r := path.Resistance(at); !(r > 0) {
			m.note(Note{ID: "field.skin", Level: "caution", Text: "There is no forecast: the skins take away more resistance than the block has.", Cause: "A negative skin stands for rock that does not resist; here it is more than all of the block.",
				Do: "Look at the skins, the well radius and the length of the block.", Paths: []string{"field.wells.injectorSkin", "field.wells.producerSkin", "field.length"}})
			return false
		}
	}
	if m.shape.In < 0 || m.shape.Out < 0 {
		m.note(Note{ID: "field.skinNegative", Level: "caution", Text: "A skin takes resistance away from an end of the block: it is counted at the mobility of what flows at that end.", Cause: "The rock that a negative skin frees holds oil and water as the front left them, not only what is injected; with viscous water the rates told are too low or too high by up to the share of that resistance.",
			Do: "Give the well radius too, or a shorter block without the freed rock.", Paths: []string{"field.wells.injectorSkin", "field.wells.producerSkin", "field.wells.radius"}})
	}
	return true
}

// body is a layer of the block or of the pattern under a flood, for unit permeability,
// porosity and length.
func (m *many) body(flood *reservoir.Flood) reservoir.Body {
	if m.pattern != nil {
		return m.pattern.flooded(flood)
	}
	path := reservoir.Path{PoreVolume: 1, Impedance: 1, Shape: m.shape, Flood: flood}
	if len(m.layers) == 1 { // answered exactly
		return path
	}
	return path.Tabulate(tabulated)
}

// neighbours are the other answers: the other side of the bracket, and the piston limit.
func (m *many) neighbours() {
	add := func(r *reservoir.Run, id, label, role string) {
		if r != nil && r != m.run {
			m.beside = append(m.beside, neighbour{id, label, role, m.until(r, m.end, 160)})
		}
	}
	add(m.full, "full", "full crossflow", "total")
	add(m.apart, "apart", "no crossflow", "total")
	add(m.pistons, "pistons", "no crossflow, piston-like", "aid")
}

// filling puts the gas at the start before a body, where there is any.
func (m *many) filling(b reservoir.Body) reservoir.Body {
	if m.gas == 0 {
		return b
	}
	return reservoir.Filling{Body: b, Gas: m.gas}
}

// crossflow floods the layers as one, in vertical equilibrium.
func (m *many) crossflow(strata []reservoir.Stratum) {
	f := m.front
	if m.st.Field.Layers.Crossflow == "gravity" && len(m.layers) == len(m.samples) {
		slices.Reverse(strata) // typed from the top down
	} else {
		strata = reservoir.Fastest(strata)
	}
	curves, err := reservoir.Equilibrium(strata)
	if err != nil || f.swj <= f.swi {
		m.fullReason = "The initial state holds more water than the injected one."
		return
	}
	flood, err := thick(f, curves)
	switch {
	case err != nil:
		m.fullReason = "The averaged curves could not be flooded: " + err.Error() + "."
		return
	case m.gas > 0 && m.gas >= flood.Displacement.Breakthrough():
		m.fullReason = "Water would arrive before the gas-filled space is full."
		return
	}
	capacity := 0.0
	for _, l := range m.layers {
		capacity += l.Permeability * l.Thickness
	}
	pace := capacity * m.area / (m.length * m.length) / m.pores
	m.full = m.plan(reservoir.Bundle{{Body: m.filling(m.body(flood)), PoreVolume: m.pores, Pace: pace}})
}

// thick is the flood along a bed of averaged curves.
func thick(f *front, curves relperm.Curves) (*reservoir.Flood, error) {
	flow := f.flow
	flow.Curves = curves
	lo, hi := curves.Ends()
	d, err := displace.New(flow, hi, lo)
	if err == nil && !(d.Breakthrough() > 0) {
		err = errors.New("the layers differ by more than they can tell")
	}
	if err != nil {
		return nil, err
	}
	return reservoir.NewFlood(flow, d), nil
}

// plan lays the steps out for a body, to well past whatever is told of it.
func (m *many) plan(b reservoir.Bundle) *reservoir.Run {
	last := m.steps[len(m.steps)-1]
	end := last.From + m.or("field.horizon", 0)
	clock := reservoir.Clock(b, furthest, 0)
	if last.Rate > 0 {
		end += furthest * m.pores / (last.Rate * m.uptime)
	}
	if last.Pressure > 0 {
		end += clock / (last.Pressure * m.uptime)
	}
	return reservoir.NewRun(b, m.pores, m.uptime, m.steps, end*(1+aside)+1)
}

// furthest is how far a limit is looked for, pore volumes.
const furthest = 50
