package study

import (
	"math"
	"slices"

	"brinefront/physics/displace"
	"brinefront/physics/ref"
	"brinefront/physics/reservoir"
	"brinefront/physics/units"
)

func (f *field) figures(s *sheet) {
	f.volumeFigures(s)
	f.startFigures(s)
	who, arrives := "water", "Water arrives after"
	if f.front.waterMoves() {
		who, arrives = "the front", "Front arrives after"
	}
	s.borrow("front.breakthrough", "field.injectedAtBreakthrough", "Injected when "+who+" arrives", false)
	t, _ := f.linear.Breakthrough()
	f.timeFigure(s, Figure{ID: "field.breakthrough", Label: arrives, Symbol: "tbt", Value: t, Quantity: units.Duration, Strip: true}, "field.injectedAtBreakthrough")
	s.borrow("front.recoveryAtBreakthrough", "field.recoveryAtBreakthrough", "Recovery at breakthrough, of the pore volume", true)
	f.cumulativeFigures(s, "AtBreakthrough", "at breakthrough", "bt", "field.injectedAtBreakthrough", "field.recoveryAtBreakthrough")
	if f.limit.Outcome == reservoir.Reached {
		f.limitFigures(s)
	}
}

// borrow shows a figure of an earlier sheet on this one, working and all.
func (s *sheet) borrow(id, as, label string, strip bool) {
	if figure, ok := s.find(id); ok {
		figure.ID, figure.Label, figure.Strip = as, label, strip
		s.part.Figures = append(s.part.Figures, figure)
	}
}

func (f *field) volumeFigures(s *sheet) {
	pv := f.linear.PoreVolume()
	s.figure(Figure{ID: "field.poreVolume", Label: "Pore volume", Symbol: "PV", Value: pv, Quantity: units.Volume, Strip: holdsConnate(pairOf(s.st))},
		s.by("{PV} = {L} {W} {h} {φ}", "").input("field.length").input("field.width").input("field.thickness").input("field.porosity"))
	if !holdsConnate(pairOf(s.st)) {
		s.figure(Figure{ID: "field.oilInPlace", Label: "Oil in place, at surface", Symbol: "N", Value: pv * (1 - f.front.swi) / f.front.bo, Quantity: units.Volume, Strip: true},
			s.by("{N} = {PV} (1 - {Swi}) / {Bo}", "", ref.Dake1978).term("field.poreVolume").term("front.initialWater").input("fluids.oilFormationFactor"))
	}
	uptime := s.by("", "None is typed: injection is on all the time.")
	if s.st.Field.Uptime != nil {
		uptime = s.by("", "As typed.").rests("field.uptime")
	}
	s.figure(Figure{ID: "field.uptime", Label: "Share of time on", Symbol: "e", Value: f.linear.Uptime, Quantity: units.Share}, uptime)
	onePV := Figure{ID: "field.timePerPoreVolume", Label: "Time to inject one pore volume", Symbol: "tPV", Value: f.linear.TimeAt(1), Quantity: units.Duration}
	if f.rateHeld() {
		s.figure(onePV, s.by("{tPV} = {PV} / ({q} {e})", "Calendar time; "+calendar).term("field.poreVolume").input("field.rate").term("field.uptime"))
	} else {
		s.figure(onePV, f.clock(s, onePV, 1))
	}
}

func (f *field) rateHeld() bool {
	_, held := f.linear.Drive.(reservoir.ConstantRate)
	return held
}

// calendar is how durations are told.
const calendar = "a year is 365.25 days."

// clock is how time follows from volume at a constant pressure difference.
func (f *field) clock(s *sheet, figure Figure, q float64) *working {
	l := f.linear
	integral := figure.Value * l.Permeability * l.Drive.(reservoir.ConstantPressure).DP * l.Uptime / (l.Porosity * l.Length * l.Length)
	return s.by("{"+figure.Symbol+"} = {φ} {L} {L} {I} / ({k} {Δp} {e})", "Darcy's law over the displacement: at a constant pressure difference the rate follows the resistance Rt(Q) = ∫ d(x/L)/λt from injector to producer, and I = ∫ Rt dQ, integrated exactly over the states of the displacement. Calendar time; "+calendar, ref.BuckleyLeverett1942, ref.Welge1952).
		input("field.porosity").input("field.length").value("I", "∫ Rt dQ up to "+units.Format(q, 4)+" PV", integral, units.Viscosity).
		input("field.permeability").input("field.pressure").term("field.uptime").on("front.breakthrough")
}

// timeFigure adds the calendar time at which a volume, itself a figure, has been injected.
func (f *field) timeFigure(s *sheet, figure Figure, volume string) {
	v, ok := s.find(volume)
	switch {
	case !ok:
	case !f.rateHeld():
		s.figure(figure, f.clock(s, figure, v.Value).on(volume))
	default:
		s.figure(figure, s.by("{"+figure.Symbol+"} = {"+v.Symbol+"} {PV} / ({q} {e})", "Calendar time at the constant rate; "+calendar).
			term(volume).term("field.poreVolume").input("field.rate").term("field.uptime"))
	}
}

// startFigures are the rates on the first day, and the pressure it takes.
func (f *field) startFigures(s *sheet) {
	first := f.state(0)
	resistance := f.linear.Resistance(0)
	rate := Figure{ID: "field.startRate", Label: "Injection rate at the start, calendar", Symbol: "qi", Value: first.InjectionRate, Quantity: units.Rate}
	if f.rateHeld() {
		s.figure(rate, s.by("{qi} = {q} {e}", "Reservoir volume per calendar day.").input("field.rate").term("field.uptime"))
	} else {
		s.figure(rate, s.by("{qi} = {k} {W} {h} {Δp} {e} / ({L} {Rt0})", "Darcy's law; Rt0 is the inverse of the total mobility at the initial saturation.", ref.Dake1978).
			input("field.permeability").input("field.width").input("field.thickness").input("field.pressure").term("field.uptime").input("field.length").
			value("Rt0", "resistance at the start", resistance, units.Viscosity).on("front.breakthrough"))
	}
	s.figure(Figure{ID: "field.startOilRate", Label: "Oil rate at the start, calendar, at surface", Symbol: "qoi", Value: first.OilRate, Quantity: units.Rate, Strip: true},
		s.by("{qoi} = {qi} (1 - {fwi}) / {Bo}", "").term("field.startRate").
			value("fwi", "water cut at the initial saturation", first.ReservoirCut, units.Share).input("fluids.oilFormationFactor").on("front.breakthrough"))
	peak := first
	for _, state := range f.history {
		if state.OilRate > peak.OilRate {
			peak = state
		}
	}
	s.figure(Figure{ID: "field.peakOilRate", Label: "Highest oil rate, calendar, at surface", Symbol: "qo,max", Value: peak.OilRate, Quantity: units.Rate},
		s.by("", "The largest of the forecast, after "+units.Format(peak.PVI, 3)+" PV.").on("field.startOilRate", "field.timePerPoreVolume"))
	if f.rateHeld() && s.st.Field.Permeability != nil {
		s.figure(Figure{ID: "field.startPressure", Label: "Pressure difference at the start, while on", Symbol: "Δp0", Value: first.PressureDrop, Quantity: units.Pressure},
			s.by("{Δp0} = {q} {L} {Rt0} / ({k} {W} {h})", "Darcy's law in a straight block, without the weight of the fluids; Rt0 is the inverse of the total mobility at the initial saturation. The pressure that converging flow near the wells takes comes on top.", ref.Dake1978).
				input("field.rate").input("field.length").value("Rt0", "resistance at the start", resistance, units.Viscosity).
				input("field.permeability").input("field.width").input("field.thickness").on("front.breakthrough"))
	}
}

// limitFigures are the state of the flood when it stops paying.
func (f *field) limitFigures(s *sheet) {
	path := limitPath(s.st)
	spec, _ := Find(path)
	typed, _ := s.input(path)
	s.figure(Figure{ID: "field.limit", Label: spec.Label, Symbol: spec.Symbol, Value: typed, Quantity: spec.Quantity}, s.by("", "As typed.").rests(path))

	d := f.front.displacement
	q := f.limit.PVI
	sw, cut := d.Outlet(q * (1 + aside))
	_, inlet := d.InletFace()
	arriving := s.by("", "Of the state at the producer as the limit is met; a limit inside the step of a front is met when the front arrives.", ref.Welge1952).
		rests(path).on("front.surfaceCutAtBreakthrough")
	if path == "field.oilRate" {
		arriving.on("field.startOilRate", "field.timePerPoreVolume")
	}
	s.figure(Figure{ID: "field.limitCut", Label: "Water cut at the limit, reservoir", Symbol: "fw2", Value: cut, Quantity: units.Share}, arriving)
	s.figure(Figure{ID: "field.limitInjected", Label: "Injected at the limit", Symbol: "Qlim", Value: q, Quantity: units.PoreVolumes}, f.limitVolume(s, q))
	f.timeFigure(s, Figure{ID: "field.limitTime", Label: "Limit reached after", Symbol: "tlim", Value: f.limit.Time, Quantity: units.Duration, Strip: true}, "field.limitInjected")
	s.recovery("field.recoveryAtLimit", "Recovery at the limit", "Rlim", d.Recovery(q), true,
		s.by("{Rlim} = {Sw2} + ({fwj} - {fw2}) {Qlim} - {Swi}", "Average saturation by Welge's tangent, less the initial one.", ref.Welge1952).
			value("Sw2", "outlet saturation", sw, units.Fraction).value("fwj", "fractional flow at the inlet", inlet, units.Fraction).
			term("field.limitCut").term("field.limitInjected").term("front.initialWater"))
	s.inPlace("field.recoveryAtLimit", "Rlim,o", false)
	f.cumulativeFigures(s, "AtLimit", "at the limit", "lim", "field.limitInjected", "field.recoveryAtLimit")
	if cut < 0 || cut > 1 {
		return // one phase flows back: there is no ratio
	}
	surface, method := "at surface", ""
	if !waterflood(s.st) {
		surface, method = "volumes by Bo and Bw as typed", "Volume over volume, both in one unit: surface volumes where the formation volume factors typed are those to surface, reservoir volumes where they are 1."
	}
	s.figure(Figure{ID: "field.waterOilRatioAtLimit", Label: "Water-oil ratio at the limit, " + surface, Symbol: "WOR", Value: cut * f.front.bo / ((1 - cut) * f.front.bw), Quantity: units.WaterOilRatio},
		s.by("{WOR} = {fw2} {Bo} / ((1 - {fw2}) {Bw})", method).term("field.limitCut").input("fluids.oilFormationFactor").input("fluids.waterFormationFactor"))
}

// limitVolume is how the volume injected at the limit was found. As a rule it is met as
// some state arrives, whose speed tells the volume. An oil rate that follows the
// resistance may also pass its limit while one state stays at the producer, between two
// arrivals or before the first: then the resistance changes in proportion to the volume.
func (f *field) limitVolume(s *sheet, q float64) *working {
	from, to, stays := f.standing(q)
	if !stays || f.rateHeld() {
		return s.by("{Qlim} = 1 / {v2}", "v2 is the speed dfw/dSw of the state that arrives at the producer as the limit is met.", ref.Welge1952).
			value("v2", "speed of the arriving state", 1/q, units.Number).on("field.limitCut")
	}
	l := f.linear
	limit := s.need("field.oilRate")
	needed := l.Permeability * l.Area * l.Drive.(reservoir.ConstantPressure).DP * l.Uptime * (1 - s.number("field.limitCut")) / (l.Length * l.Bo * limit)
	return s.by("{Qlim} = {Qa} + ({Qb} - {Qa}) ({Rtlim} - {Rta}) / ({Rtb} - {Rta})", "One state stays at the producer from Qa to Qb, and the resistance Rt = ∫ d(x/L)/λt from injector to producer changes evenly with the volume. The oil rate is at its limit where Rt = k W h Δp e (1 − fw2)/(L Bo qo,lim).", ref.BuckleyLeverett1942, ref.Dake1978).
		value("Qa", "start of the stretch", from, units.PoreVolumes).value("Qb", "its end, the next arrival", to, units.PoreVolumes).
		value("Rta", "resistance after Qa", l.Resistance(from), units.Viscosity).value("Rtb", "resistance after Qb", l.Resistance(to), units.Viscosity).
		value("Rtlim", "resistance at the limit", needed, units.Viscosity).on("field.limitCut", "field.startRate")
}

// standing is the stretch of volume during which the state that is at the producer after
// q pore volumes stays there; false where it only passes.
func (f *field) standing(q float64) (from, to float64, stays bool) {
	nodes := f.front.displacement.Path()
	i := slices.IndexFunc(nodes, func(n displace.Node) bool { return n.Xi*q >= 1-backward })
	switch last := len(nodes) - 1; {
	case i < 0:
		return 0, 1 / nodes[last].Xi, true
	case i == 0 || nodes[i].Xi*q <= 1+backward || nodes[i].S != nodes[i-1].S:
		return 0, 0, false
	}
	return 1 / nodes[i].Xi, 1 / nodes[i-1].Xi, true
}

// cumulativeFigures are oil and water produced when a volume has been injected.
func (f *field) cumulativeFigures(s *sheet, suffix, when, mark, volume, recovery string) {
	v, ok := s.find(volume)
	r, known := s.find(recovery)
	if !ok || !known {
		return
	}
	state := f.state(v.Value)
	_, inlet := f.front.displacement.InletFace()
	oil, water := "Np"+mark, "Wp"+mark
	// What was injected and not kept has come out; told from the injected volume water
	// would be a small difference of large numbers before breakthrough.
	s.figure(Figure{ID: "field.oil" + suffix, Label: "Oil produced " + when + ", at surface", Symbol: oil, Value: state.CumOil, Quantity: units.Volume, Strip: suffix == "AtLimit"},
		s.by("{"+oil+"} = {PV} ({"+r.Symbol+"} + {"+v.Symbol+"} (1 - {fwj})) / {Bo}", injectedOil(inlet)).
			term("field.poreVolume").term(recovery).term(volume).value("fwj", "fractional flow at the inlet", inlet, units.Fraction).input("fluids.oilFormationFactor"))
	s.figure(Figure{ID: "field.water" + suffix, Label: "Water produced " + when + ", at surface", Symbol: water, Value: math.Max(0, state.CumWater), Quantity: units.Volume},
		s.by("{"+water+"} = {PV} ({"+v.Symbol+"} {fwj} - {"+r.Symbol+"}) / {Bw}", "Water injected less water that stayed in the rock.").
			term("field.poreVolume").term(volume).term(recovery).value("fwj", "fractional flow at the inlet", inlet, units.Fraction).input("fluids.waterFormationFactor"))
}

// injectedOil explains the term of oil that the injected stream brings or loses.
func injectedOil(inlet float64) string {
	switch {
	case inlet > 1+backward:
		return "Oil displaced, less the oil that left at the injector: fwj − 1 of every volume injected."
	case inlet < 1-backward:
		return "Oil displaced, and the oil that was injected: 1 − fwj of every volume injected."
	}
	return "All oil that is displaced comes out: no oil is injected, 1 − fwj is 0."
}

func limitPath(st *Study) string {
	switch st.Field.Limit {
	case "oilRate":
		return "field.oilRate"
	case "cash":
		return "field.money.oil"
	}
	return "field.waterCut"
}
