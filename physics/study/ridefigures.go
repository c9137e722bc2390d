package study

import (
	"math"
	"slices"

	"brinefront/physics/ref"
	"brinefront/physics/ride"
	"brinefront/physics/units"
)

// rideSources are what the construction of a front that rides along rests on.
func (r *rider) sources() []ref.ID {
	if r.kind == riderOfHeat {
		return []ref.ID{ref.Fayers1962, ref.Hovdan1986, ref.Pope1980, ref.JohansenWinther1988}
	}
	return []ref.ID{ref.Pope1980, ref.JohansenWinther1988}
}

// onRider names the inputs behind the front that rides along.
func (w *working) onRider(f *front) *working {
	w.rests("front.rider.kind").onFlow(f.curve).on("front.initialWater", "front.injectedWater", "front.ride.retardation", "front.ride.waterViscosity")
	for _, spec := range riderSpecs {
		if _, given := f.rider.given[spec.Path]; given && spec.Path != riderPath("slug") && spec.Path != riderPath("peclet") {
			w.rests(spec.Path)
		}
	}
	return w
}

// optional adds an input that may be left empty as a term.
func (r *rider) optional(w *working, name string) {
	if _, given := r.given[riderPath(name)]; given {
		w.input(riderPath(name))
		return
	}
	spec, _ := Find(riderPath(name))
	w.value(spec.Symbol, spec.Label, 0, spec.Quantity)
}

// rideFigures are those of what rides along.
func (f *front) rideFigures(s *sheet) {
	r := f.rider
	f.pivotFigures(s)
	speed, behind, _ := r.flood.Front()
	formula, pivot := "{vr} = {f2} / ({S2} + {b})", "(−b, 0)"
	if r.pivot.A > 0 {
		formula, pivot = "{vr} = ({f2} + {a}) / ({S2} + {b})", "(−b, −a)"
	}
	w := s.by(formula, "Slope of the line through the pivot "+pivot+" that touches the curve of the injected water, or, where that is less steep, the curve of the water in place ahead.", r.sources()...).
		value("f2", "water cut behind it", behind.F, units.Fraction).value("S2", "saturation behind it", behind.S, units.Fraction)
	if r.pivot.A > 0 {
		w.term("front.ride.carried")
	}
	s.figure(Figure{ID: "front.ride.speed", Label: "Speed of the " + r.name, Symbol: "vr", Value: speed, Quantity: units.Number},
		w.term("front.ride.retardation").onRider(f))
	s.figure(Figure{ID: "front.ride.arrival", Label: capital(r.arrives()) + " after", Symbol: "Qr", Value: r.flood.Arrival(), Quantity: units.PoreVolumes, Strip: true},
		s.by("{Qr} = 1 / {vr}", "", r.sources()...).term("front.ride.speed"))
	f.rideTime(s)
	s.figure(Figure{ID: "front.ride.saturation", Label: "Saturation behind the " + r.name, Symbol: "S2", Value: behind.S, Quantity: units.Fraction},
		s.by("", "Where the line of the front meets the curve of the injected water.", r.sources()...).onRider(f))
	if r.kind == tracer {
		f.tracerFigures(s)
	} else {
		f.bankFigures(s)
		f.gainFigures(s)
	}
	f.slugFigures(s)
	for i := range s.part.Figures { // the strip has room for what is asked about
		if id := s.part.Figures[i].ID; id == "front.endPointMobility" || id == "front.frontMobility" {
			s.part.Figures[i].Strip = false
		}
	}
}

func (f *front) pivotFigures(s *sheet) {
	r := f.rider
	figure := Figure{ID: "front.ride.retardation", Label: "Retardation of the " + r.name, Symbol: "b", Value: r.pivot.B, Quantity: units.PoreVolumes}
	switch r.kind {
	case riderOfHeat:
		heat := func(formula string) *working {
			return s.by(formula, "The heat of a pore volume of water is the unit, less that of the oil it displaces. Water's own capacity is that of the study's brine at the mean of both temperatures; no heat goes to the layers above and below.", r.sources()...).
				input(riderPath("oilHeat")).value("Cw", "heat capacity of water", r.heat.water, units.HeatCapacity).rests("fluids.temperature", riderPath("temperature"), "front.rider.kind")
		}
		s.figure(Figure{ID: "front.ride.carried", Label: "Heat carried by the oil", Symbol: "a", Value: r.pivot.A, Quantity: units.Number}, heat("{a} = {Co} / ({Cw} - {Co})"))
		s.figure(figure, heat("{b} = ({Co} + {Cs} (1 - {φ}) / {φ}) / ({Cw} - {Co})").input(riderPath("rockHeat")).input("field.porosity"))
		w := s.by("{µw,2} = {µw} {r}", "By the ratio of the viscosities of the study's brine at both temperatures.", ref.IAPWSR12).
			property(viscosities(f.pair)[0]).value("r", "injected over in place", r.heat.thinning(), units.Number).rests("fluids.temperature", riderPath("temperature"))
		s.figure(Figure{ID: "front.ride.waterViscosity", Label: "Water viscosity at the injected temperature", Symbol: "µw,2", Value: r.behind.MuW, Quantity: units.Viscosity}, w)
	case polymer:
		w := s.by("{b} = {D} - {IPV}", "What the rock holds, less the water out of reach.", ref.Pope1980, ref.DawsonLantz1972).rests("front.rider.kind")
		r.optional(w, "retention")
		r.optional(w, "inaccessible")
		s.figure(figure, w)
	default:
		w := s.by("{b} = {D}", "What the rock holds.", ref.Pope1980).rests("front.rider.kind")
		r.optional(w, "retention")
		s.figure(figure, w)
	}
}

// timed reports whether the time of a volume injected is that of the water flood: always
// at a constant rate, and at a constant pressure difference where nothing changes the flow.
func (f *front) timed(s *sheet) bool {
	return f.linear != nil && (heldRate(s.st) || f.rider.kind == tracer)
}

func (f *front) rideTime(s *sheet) {
	if !f.timed(s) {
		return
	}
	w := s.by("", "When the field's injector has put in as many pore volumes.").term("front.ride.arrival")
	for _, spec := range specs {
		if spec.Sheet == SheetField && spec.Group != "Limit" && spec.Applies(s.st) && spec.Get(s.st) != nil {
			w.rests(spec.Path)
		}
	}
	s.figure(Figure{ID: "front.ride.time", Label: capital(f.rider.arrives()) + " at", Symbol: "tr", Value: f.linear.TimeAt(f.rider.flood.Arrival()), Quantity: units.Duration}, w)
}

// bankFigures are the bank ahead of the front.
func (f *front) bankFigures(s *sheet) {
	r := f.rider
	bank, edge, ok := r.flood.Bank()
	if !ok {
		return
	}
	s.figure(Figure{ID: "front.ride.bankSaturation", Label: "Saturation of the bank", Symbol: "S1", Value: bank.S, Quantity: units.Fraction},
		s.by("", "Where the line of the front meets the curve of the water in place: both balances hold across the front only there.", r.sources()...).onRider(f))
	s.figure(Figure{ID: "front.ride.bankCut", Label: "Water cut of the bank, reservoir", Symbol: "f1", Value: bank.F, Quantity: units.Share},
		s.by("{f1} = {vr} ({S1} + {b}) - {a}", "", r.sources()...).term("front.ride.speed").term("front.ride.bankSaturation").term("front.ride.retardation").value("a", "carried by the oil", r.pivot.A, units.Number))
	label := "Bank arrives after"
	if r.short() {
		label = "Bank arrives, if the slug lasts, after"
	}
	s.figure(Figure{ID: "front.ride.bankArrival", Label: label, Symbol: "Qb", Value: 1 / edge, Quantity: units.PoreVolumes},
		s.by("{Qb} = 1 / {vb}", "The first wave of the water in place, from the bank to the initial state.", ref.Welge1952, ref.Pope1980).value("vb", "speed of the bank's edge", edge, units.Number).on("front.ride.bankSaturation"))
}

// gainFigures set recovery with what rides along beside that of water alone.
func (f *front) gainFigures(s *sheet) {
	r := f.rider
	first := r.flood.Breakthrough()
	if with, ok := r.after(first); ok {
		s.figure(Figure{ID: "front.ride.breakthrough", Label: "Water arrives, with the " + r.name + ", after", Symbol: "Qbt,r", Value: first, Quantity: units.PoreVolumes},
			s.by("", "The fastest of all waves, those of the bank included.", append([]ref.ID{ref.Welge1952}, r.sources()...)...).onRider(f))
		s.recovery("front.ride.recoveryAtBreakthrough", "Recovery at breakthrough with the "+r.name, "Rbt,r", with.Recovery, false,
			s.by("{Rbt,r} = {Sav} - {Swi}", "", ref.Welge1952).value("Sav", "average saturation then", with.Average, units.Fraction).term("front.initialWater").on("front.ride.breakthrough"))
	}
	with, ok := r.after(1)
	if !ok {
		return
	}
	w := s.by("{R1,r} = {Sav} - {Swi}", "Average saturation after 1 PV, less the initial one.", append([]ref.ID{ref.Welge1952}, r.sources()...)...).
		value("Sav", "average saturation after 1 PV", with.Average, units.Fraction).term("front.initialWater").onRider(f)
	if r.slug != nil {
		w.rests(riderPath("slug"))
	}
	s.recovery("front.ride.recoveryAtOne", "Recovery after 1 PV with the "+r.name, "R1,r", with.Recovery, false, w)
	s.recovery("front.ride.gainAtOne", "Added after 1 PV", "ΔR1", with.Recovery-f.displacement.Recovery(1), true,
		s.by("{ΔR1} = {R1,r} - {R1}", "Against water alone.").term("front.ride.recoveryAtOne").term("front.recoveryAtOne"))
}

// tracerFigures tell what arrives of a tracer, and when.
func (f *front) tracerFigures(s *sheet) {
	r := f.rider
	t := r.tracer()
	if math.IsInf(t.Peclet, 1) {
		return
	}
	spread := func(formula, method string) *working {
		return s.by(formula, method, ref.OgataBanks1961, ref.KreftZuber1978).input(riderPath("peclet")).term("front.ride.speed")
	}
	s.figure(Figure{ID: "front.ride.first", Label: "1 % of the tracer arrives after", Symbol: "Q0.01", Value: t.Arrival(1, 0.01), Quantity: units.PoreVolumes},
		spread("", "When the concentration at the producer reaches 1 % of the injected one, without end."))
	s.figure(Figure{ID: "front.ride.mixing", Label: "Mixing zone at the producer, part of the length", Symbol: "Δx", Value: t.MixingZone(r.flood.Arrival()), Quantity: units.Number},
		spread("", "Between 90 and 10 % of the injected concentration: 3.625 times the root of speed times volume injected over Pe.").term("front.ride.arrival"))
	if size := r.size(); !math.IsInf(size, 1) {
		q, peak := t.Peak(1, size)
		s.figure(Figure{ID: "front.ride.peak", Label: "Peak of the tracer slug", Symbol: "Cmax", Value: peak, Quantity: units.Share},
			spread("", "Largest concentration at the producer, of the injected one: response to all but that to all after the slug.").input(riderPath("slug")))
		s.figure(Figure{ID: "front.ride.peakAt", Label: "Peak passes after", Symbol: "Qmax", Value: q, Quantity: units.PoreVolumes},
			spread("", "Where the rises of the front and of the rear of the slug are equal.").input(riderPath("slug")))
	}
}

// slugFigures tell how large a slug must be, and how far the one that is given comes.
func (f *front) slugFigures(s *sheet) {
	r := f.rider
	if r.kind != polymer || r.at("retention", 0) == 0 {
		if r.slug != nil {
			f.rearFigure(s)
		}
		return
	}
	least := r.flood.LeastSlug(r.rear(), 1)
	inlet := r.flood.InletFace().F
	s.figure(Figure{ID: "front.ride.leastSlug", Label: "Least slug to reach the producer", Symbol: "Qs,min", Value: least, Quantity: units.PoreVolumes},
		s.by("{Qs,min} = {D} / {fwj}", "What the rock keeps for good over the whole length; the rear catches up with the front at the producer.", ref.Pope1980).
			input(riderPath("retention")).value("fwj", "fractional flow at the inlet", inlet, units.Fraction).onRider(f))
	if r.slug == nil {
		return
	}
	q, x := r.slug.Spent()
	s.figure(Figure{ID: "front.ride.spentAt", Label: "Slug is spent at, part of the length", Symbol: "xs", Value: x, Quantity: units.Number},
		s.by("{xs} = {Qs} {fwj} / {D}", "Beyond 1 it outlasts the way to the producer.", ref.Pope1980).
			input(riderPath("slug")).value("fwj", "fractional flow at the inlet", inlet, units.Fraction).input(riderPath("retention")))
	s.figure(Figure{ID: "front.ride.spent", Label: "Slug is spent after", Symbol: "Qspent", Value: q, Quantity: units.PoreVolumes},
		s.by("{Qspent} = {xs} / {vr}", "").term("front.ride.spentAt").term("front.ride.speed"))
	f.rearFigure(s)
}

func (f *front) rearFigure(s *sheet) {
	if q, ok := f.rider.slug.RearArrival(); ok {
		s.figure(Figure{ID: "front.ride.rearArrival", Label: "Rear of the slug arrives after", Symbol: "Qrear", Value: q, Quantity: units.PoreVolumes},
			s.by("", "The rear starts after the slug and meets the states that injection without end would have put there; its place follows from the balance of what it carries.", f.rider.sources()...).
				input(riderPath("slug")).onRider(f))
	}
}

// rideTable lists the waves with what rides along.
func (f *front) rideTable(s *sheet) Grid {
	waves := f.rider.flood.Waves()
	g := Grid{ID: "front.ride.waves", Title: "Waves with the " + f.rider.name + ", from the injector outwards"}
	if len(waves) > shownWaves {
		waves = waves[len(waves)-shownWaves:]
		g.Title = "Waves with the " + f.rider.name + ", the foremost " + units.Format(shownWaves, 3) + " of them"
	}
	if f.rider.slug != nil {
		g.Title += "; injected without end"
	}
	kind, water := Column{Label: "Wave", Quantity: units.Number}, Column{Label: "In", Quantity: units.Number}
	behind, ahead := Column{Label: "Sw behind", Quantity: units.Fraction}, Column{Label: "Sw ahead", Quantity: units.Fraction}
	slow, fast := Column{Label: "Speed, slowest", Quantity: units.Number}, Column{Label: "Speed, fastest", Quantity: units.Number}
	arrives := f.arrivals("Arrives")
	if !f.timed(s) {
		arrives.linear = nil
	}
	for _, w := range waves {
		word := kindOf(w.Wave)
		if w.Zone == ride.Front {
			word = f.rider.name
		}
		kind.Words, water.Words = append(kind.Words, word), append(water.Words, zones[w.Zone])
		behind.Values, ahead.Values = append(behind.Values, w.Behind), append(ahead.Values, w.Ahead)
		slow.Values, fast.Values = append(slow.Values, w.SpeedBehind), append(fast.Values, w.SpeedAhead)
		arrives.add(w.SpeedAhead)
	}
	g.Columns = slices.Concat([]Column{kind, water, behind, ahead, slow, fast}, arrives.columns())
	return g
}

// zones say which water a wave runs in.
var zones = map[ride.Zone]string{ride.Behind: "injected water", ride.Ahead: "water in place", ride.Front: "between both"}
