package study

import (
	"math"

	"brinefront/physics/pattern"
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// inPlan starts a working with the area in plan as its factor.
func (m *many) inPlan(before, after string) *working {
	if m.pattern != nil {
		return m.by(before+"{A}"+after, "").term("field.patternArea")
	}
	return m.by(before+"{L} {W}"+after, "").input("field.length").input("field.width")
}

// converging tells what flow takes near the wells.
func (m *many) converging() string {
	if m.pattern != nil {
		return "Between the wells, with converging flow and skin: each streamtube has the resistance that potential theory gives it from well to well."
	}
	return "Between the wells, with converging flow and skin where they are given: W (ln(W/(2π rw)) + s)/(π L) of the resistance of the block at each end."
}

// wayName is what is told of a front in a layer.
func (m *many) wayName() string {
	if m.pattern != nil {
		return "Areal sweep of the layer"
	}
	return "Front, of the way to the producer"
}

func (m *many) waySymbol() string {
	if m.pattern != nil {
		return "Ea"
	}
	return "x/L"
}

// tubesTold is the method, and its limit.
const tubesTold = "Streamtubes of unit mobility, from potential theory; each carries the exact linear displacement at the common pressure difference, so that its share of the injection changes with its resistance. The tubes stay where they are as the mobilities change."

func (m *many) patternFigures() {
	r := m.pattern
	if r == nil {
		return
	}
	area := m.by("{A} = {cA} {d} {d}", "Area in plan that one well in the middle stands for.", ref.Muskat1937).value("cA", "area of the pattern over d²", r.Area, units.Number).input("field.pattern.spacing").rests(m.ground()...)
	m.figure(Figure{ID: "field.patternArea", Label: "Area of the pattern", Symbol: "A", Value: m.area, Quantity: units.Area}, area)
	m.injectivityFigure()
	if r.Kind == pattern.Radial {
		return
	}
	ask := func(words string, sources ...ref.ID) *working {
		return m.by("", words, sources...).rests(m.ground()...)
	}
	m.figure(Figure{ID: "field.unitSweep", Label: "Areal sweep at breakthrough, unit mobility", Symbol: "Ea1", Value: r.unitBreakthrough, Quantity: units.Share},
		ask("Piston-like, by the fastest streamline of potential theory; exact but for rounding.", ref.Muskat1937, ref.Prats1956))
	bt := r.tubes.Breakthrough()
	if math.IsInf(bt, 1) {
		return
	}
	m.figure(Figure{ID: "field.sweep", Label: "Areal sweep as water arrives, in any layer", Symbol: "Ea", Value: r.tubes.Swept(bt), Quantity: units.Share, Strip: true},
		ask(tubesTold, ref.HigginsLeighton1962, ref.Welge1952).rests("field.wells.injectorSkin", "field.wells.producerSkin").on("front.breakthrough"))
	ratio := m.front.craigRatio()
	if ratio < leastCraig || ratio > mostCraig {
		return
	}
	_, known := measured[r.Kind]
	const square = 0.01 // how near d/a is to the 1 of the experiments
	if known = known && (r.Kind == pattern.FiveSpot || math.Abs(r.Ratio-1) < square); known {
		m.figure(Figure{ID: "field.craigRatio", Label: "Mobility ratio of the experiments", Symbol: "Ms", Value: ratio, Quantity: units.Number},
			m.by("", "Water at its average saturation behind the front over oil ahead of it.", ref.Craig1971).on("front.breakthrough"))
		m.figure(Figure{ID: "field.sweepCorrelated", Label: "Areal sweep as water arrives, by experiments", Symbol: "Eax", Value: measuredSweep(r.Kind, ratio), Quantity: units.Share},
			m.by("", "A fit to sweep seen by X-rays in models of miscible fluids, (1 − E)/E = a4 ln(Ms + a5) + a6 as water arrives. At unit mobility it lies about 0.04 below potential theory.", ref.Fassihi1986, ref.DyesCaudle1954).term("field.craigRatio"))
	}
	if r.Kind == pattern.FiveSpot {
		m.figure(Figure{ID: "field.sweepCraig", Label: "The same, by floods of models with gas and water", Symbol: "Eac", Value: craigSweep(ratio), Quantity: units.Share},
			m.by("", "A fit of measured five-spots, 0.54602036 + 0.03170817/Ms + 0.30222997 exp(−Ms) − 0.00509693 Ms; afterwards sweep grows by 0.2749 ln of the volume injected over that at breakthrough. At unit mobility it lies 0.034 below potential theory.", ref.Willhite1986, ref.CraigGeffenMorse1955).term("field.craigRatio"))
	}
}

// injectivityFigure is the resistance of the pattern at unit mobility.
func (m *many) injectivityFigure() {
	r := m.pattern
	hub, rim := r.bores.Injector, r.bores.Producer
	if r.Reversed {
		hub, rim = rim, hub
	}
	share := r.Rim(r.Tubes[0])
	w := m.by("{D} = {ldr} + {shub} + {Qr} ({ldr} + {srim}) + {B}", "The injection rate at a mobility λ everywhere is 2π k h λ Δp/D; B from potential theory.", ref.Muskat1937, ref.Deppe1961).
		value("ldr", "ln(d/rw), with rw "+units.Format(m.radius(), 3)+" m", -math.Log(r.bores.Radius), units.Number).value("shub", "skin of the well in the middle", hub, units.Number).
		value("Qr", "rate of a well around it over its rate", share, units.Number).value("srim", "skin of a well around it", rim, units.Number).value("B", "of the pattern", r.Offset(r.Tubes[0]), units.Number).
		rests(m.ground()...).rests("field.wells.injectorSkin", "field.wells.producerSkin")
	m.figure(Figure{ID: "field.patternDrop", Label: "Resistance of the pattern", Symbol: "D", Value: r.Drop(r.bores), Quantity: units.Number}, w)
}

// patternCharts are the map and the sweep.
func (m *many) patternCharts() {
	r := m.pattern
	if r == nil || r.Kind == pattern.Radial || math.IsInf(r.tubes.Breakthrough(), 1) {
		return
	}
	const past = 2.5
	end := past * r.tubes.At(r.tubes.Breakthrough()).Injected
	m.part.Charts = append(m.part.Charts, m.mapChart(end), m.sweepChart(end))
}

func (m *many) patternNotes() {
	r := m.pattern
	if r == nil {
		return
	}
	if r.Kind == pattern.Radial {
		m.note(Note{ID: "field.circle", Level: "remark", Text: "The flood spreads evenly from one injector to a circle that is held at one pressure.", Cause: "Producers are wells: the front runs towards them.", Do: "Take the answer as the most that any pattern around one injector can sweep.", Paths: []string{"field.pattern.kind"}})
		return
	}
	m.note(Note{ID: "field.repeated", Level: "remark", Text: "The pattern is one of many alike, without end, in layers of even thickness; nothing flows in or out at the edge of the field.", Cause: "Wells at the edge, and rock that is not the same everywhere, sweep otherwise.", Do: "Take the forecast as that of a pattern in the middle of the field; rates are those of one pattern.", Paths: []string{"field.pattern.kind"}})
	if ratio := m.front.craigRatio(); ratio < 1/contrast || ratio > contrast {
		m.note(Note{ID: "field.tubesStay", Level: "caution", Text: "Streamtubes are those of unit mobility; here water behind the front is " + units.Format(ratio, 2) + " times as mobile as oil ahead of it.", Cause: "Where water is more mobile the front bends towards the producer and fingers, where it is less it spreads: experiments sweep less, or more, than the tubes say.",
			Do: "Compare with the areal sweep by experiments, where it is shown.", Paths: []string{"field.pattern.kind", "fluids.oilViscosity", "fluids.waterViscosity"}})
	}
	if r.Kind == pattern.NineSpot {
		m.note(Note{ID: "field.nineSpot", Level: "remark", Text: "Corner and side wells are held at the pressures that give their rates at unit mobility; the pressure difference is that to a side well.", Cause: "As the flood goes on their rates part.", Do: "Choose the ratio of their rates at the start.", Paths: []string{"field.pattern.corner"}})
	}
}

// contrast is the mobility ratio, either way, from which fixed tubes are cautioned about:
// common practice, no source.
const contrast = 1.5
