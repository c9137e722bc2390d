package study

import (
	"math"
	"strconv"

	"brinefront/physics/displace"
	"brinefront/physics/relperm"
	"brinefront/physics/reservoir"
	"brinefront/physics/units"
)

// Layers may have ends of their own. Each then has the study's curve with its ends moved,
// and is flooded between its own initial and residual saturation by the same stream. In
// terms of the part of the way between the ends only the start of the flood differs, so
// that layers share the floods along the study's curve (bed) and stretch them.

// bed is the study's rock flooded from a place on its curve.
type bed struct {
	start        float64 // on the study's curve
	ahead        relperm.Point
	displacement *displace.Displacement
	body         reservoir.Body
}

// stratum is how a layer is flooded.
type stratum struct {
	*bed
	swi, swj float64 // its own
	stretch  float64 // its way between the ends, over that of the study's curve
}

// rounding is how near typed and computed ends of a curve come.
const rounding = 1e-9

// ended reports whether a layer has the ends of the study's curve.
func (m *many) ended(l reservoir.Sample) bool {
	swc, swmax := m.front.flow.Curves.Ends()
	return l.Swc == swc && l.Sor == 1-swmax
}

// stretched is the way between the ends of a layer's curve over that of the study's.
func (m *many) stretched(l reservoir.Sample) float64 {
	if m.ended(l) {
		return 1
	}
	swc, swmax := m.front.flow.Curves.Ends()
	return (1 - l.Sor - l.Swc) / (swmax - swc)
}

// injectedInto is the saturation of a layer where kr is as at the study's injected one.
func (m *many) injectedInto(l reservoir.Sample) float64 {
	if m.ended(l) {
		return m.front.swj
	}
	swc, _ := m.front.flow.Curves.Ends()
	return l.Swc + (m.front.swj-swc)*m.stretched(l)
}

// settle gives every row its saturations, the study's where it has none, and lumps the rows.
func (m *many) settle() {
	f := m.front
	swc, swmax := f.flow.Curves.Ends()
	or := func(typed, otherwise float64) float64 {
		if math.IsNaN(typed) || math.Abs(typed-otherwise) <= rounding {
			return otherwise
		}
		return typed
	}
	for i := range m.samples {
		l := &m.samples[i]
		initial := f.swi
		l.Swc, l.Sor = or(l.Swc, swc), or(l.Sor, 1-swmax)
		if _, given := m.input("front.initialWater"); !given && l.Swc != swc {
			initial = l.Swc
		}
		l.Swi = or(l.Swi, initial)
		m.own = m.own || !m.ended(*l) || l.Swi != f.swi
		row := "in row " + strconv.Itoa(i+1) + ", "
		switch swj := m.injectedInto(*l); {
		case l.Swc+l.Sor > 1-rounding:
			m.problem(layerTable.path, row+"Swc = "+units.Format(l.Swc, 6)+" and Sor = "+units.Format(l.Sor, 6), "a sum below 1")
		case l.Swi < l.Swc-rounding || l.Swi > swj-rounding:
			m.problem(layerTable.path, row+"Swi = "+units.Format(l.Swi, 6), "from Swc = "+units.Format(l.Swc, 6)+" of the layer to below "+units.Format(swj, 6)+", where injection brings it; a column Swc or Sor moves the ends")
		}
	}
	m.layers = m.samples
	if groups := m.or("field.layers.groups", math.Inf(1)); float64(len(m.samples)) > groups {
		m.layers = reservoir.Grouped(m.samples, int(groups))
	}
}

// bed floods the study's rock from a place on its curve, or remembers that it did; nil when
// there is no flow.
func (m *many) bed(start float64) *bed {
	f := m.front
	if math.Abs(start-f.swi) <= rounding {
		start = f.swi
	}
	for _, b := range m.beds {
		if math.Abs(b.start-start) <= rounding {
			return b
		}
	}
	b := &bed{start: start, ahead: f.flow.Curves.At(start), displacement: f.displacement}
	if start != f.swi {
		d, err := displace.New(f.flow, f.swj, start)
		if err != nil || d.FrontSpeed() == 0 {
			m.note(Note{ID: "field.layerStands", Level: "caution", Text: "There is no forecast: a layer could not be flooded from its own initial saturation.", Cause: "The curve leaves no displacement between it and the injected one.", Do: "Look at the saturations of the layers.", Paths: []string{layerTable.path}})
			return nil
		}
		b.displacement = d
	}
	flood := reservoir.NewFlood(f.flow, b.displacement)
	if m.pattern == nil && !m.resists(flood) {
		return nil
	}
	b.body = m.body(flood)
	m.beds = append(m.beds, b)
	return b
}

// stratum is how a layer is flooded; false when there is no flow.
func (m *many) stratum(l reservoir.Sample) (s stratum, ok bool) {
	swc, _ := m.front.flow.Curves.Ends()
	s = stratum{swi: l.Swi, swj: m.injectedInto(l), stretch: m.stretched(l)}
	start := l.Swi
	if !m.ended(l) {
		start = swc + math.Max(0, l.Swi-l.Swc)/s.stretch
	}
	s.bed = m.bed(start)
	return s, s.bed != nil
}

// flooded is the body of a layer.
func (m *many) flooded(s stratum) reservoir.Body {
	body := s.body
	if s.stretch != 1 {
		body = reservoir.Stretched{Body: body, By: s.stretch}
	}
	return m.filling(body)
}

// passed is how far along layer i its front has come when the clock of all stands at x; in
// a pattern its areal sweep.
func (m *many) passed(i int, x float64) float64 {
	s := m.strata[i]
	x *= m.bundle[i].Pace / s.stretch
	if tubes, ok := s.body.(reservoir.Streamtubes); ok {
		return tubes.Swept(x)
	}
	return math.Min(1, s.body.At(x).Injected/s.displacement.Breakthrough())
}

// swept is the part of the pore volume that fronts have passed when the clock stands at x,
// and the part of the pore volume that is oil there at the start.
func (m *many) swept(x float64) (sum, oil float64) {
	for i, s := range m.strata {
		part := m.bundle[i].PoreVolume / m.pores * m.passed(i, x)
		sum, oil = sum+part, oil+part*(1-s.swi)
	}
	return sum, oil
}

// initial is the figure of the initial saturation of the layers together, and its id.
func (m *many) initial() (float64, string) {
	if !m.own {
		return m.front.swi, "front.initialWater"
	}
	const id = "field.initialWater"
	if math.IsNaN(m.number(id)) {
		sum := 0.0
		for i, s := range m.strata {
			sum += m.bundle[i].PoreVolume / m.pores * s.swi
		}
		m.figure(Figure{ID: id, Label: "Mean initial water saturation of the layers", Symbol: "Swi", Value: sum, Quantity: units.Fraction},
			m.by("", "Σ φ h Swi/Σ φ h over the layers.").rests(layerTable.path).on("front.initialWater"))
	}
	return m.number(id), id
}

// endColumns are the saturations of the layers for their table.
func (m *many) endColumns() []Column {
	if !m.own {
		return nil
	}
	columns := []Column{{Label: "Initial water saturation", Symbol: "Swi", Quantity: units.Fraction}, {Label: "Residual oil", Symbol: "Sor", Quantity: units.Fraction}, {Label: "Connate water", Symbol: "Swc", Quantity: units.Fraction}}
	for _, l := range m.layers {
		for c, v := range []float64{l.Swi, l.Sor, l.Swc} {
			columns[c].Values = append(columns[c].Values, v)
		}
	}
	return columns
}

// endNotes say what layers of their own ends are.
func (m *many) endNotes() {
	if !m.own {
		return
	}
	do := "Measure curves by rock type where it decides; layers without a value have the study's."
	if m.pattern != nil {
		do += " Areal sweep and the map are told for the study's own ends."
	}
	if m.front.stretched() {
		do += " The study's Sor is that of Land's law at the study's own initial saturation, in every layer that has none."
	}
	m.note(Note{ID: "field.layerEnds", Level: "remark", Text: "Layers have saturations of their own: each is flooded from its Swi along the study's curve, moved to its Swc and 1 − Sor; end-point kr and shape are kept. Full crossflow averages them over the thickness.",
		Cause: "Rock of another quality usually has another shape and another end-point kr too; normalising by the ends is common practice, no source.", Do: do, Paths: []string{layerTable.path}})
}
