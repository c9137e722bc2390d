package study

import (
	"strings"

	"brinefront/physics/fluid"
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

func (f *front) recoveryFigures(s *sheet, behind, cut float64) {
	d := f.displacement
	bt := d.Breakthrough()
	face, inlet := d.InletFace()
	arrives, place := "Water arrives after", f.arriving()
	if f.waterMoves() {
		arrives = "Front arrives after"
	}
	s.figure(Figure{ID: "front.breakthrough", Label: arrives, Symbol: "Qbt", Value: bt, Quantity: units.PoreVolumes, Strip: true},
		s.by("{Qbt} = 1 / {v}", "Pore volumes injected until the front reaches the producer.", ref.BuckleyLeverett1942, ref.Welge1952).term("front.speed"))
	s.figure(Figure{ID: "front.averageAtBreakthrough", Label: "Average saturation at breakthrough", Symbol: "Sav", Value: d.Average(bt), Quantity: units.Fraction},
		s.by("{Sav} = {Swf} + ({fwj} - {fwf}) {Qbt}", "Welge's tangent carried to the fractional flow of the inlet.", ref.Welge1952).
			value("Swf", "saturation "+place, behind, units.Fraction).value("fwj", "fractional flow at the inlet", inlet, units.Fraction).
			value("fwf", "water cut "+place, cut, units.Fraction).term("front.breakthrough"))
	s.recovery("front.recoveryAtBreakthrough", "Recovery at breakthrough", "Rbt", d.Recovery(bt), true,
		s.by("{Rbt} = {Sav} - {Swi}", "Oil displaced, as a part of the pore volume.", ref.Welge1952).term("front.averageAtBreakthrough").term("front.initialWater"))

	outlet, outletCut := d.Outlet(1)
	s.recovery("front.recoveryAtOne", "Recovery after 1 PV", "R1", d.Recovery(1), false,
		s.by("{R1} = {Sw2} + ({fwj} - {fw2}) {Q} - {Swi}", "Outlet saturation and water cut of the state that arrives after 1 PV.", ref.Welge1952).
			value("Sw2", "outlet saturation", outlet, units.Fraction).value("fwj", "fractional flow at the inlet", inlet, units.Fraction).
			value("fw2", "water cut at the outlet", outletCut, units.Fraction).value("Q", "injected", 1, units.PoreVolumes).
			term("front.initialWater").on("front.breakthrough"))
	s.figure(Figure{ID: "front.movable", Label: "Movable oil", Symbol: "Rmax", Value: face - f.swi, Quantity: units.Share},
		s.by("{Rmax} = {Swj} - {Swi}", "What endless injection would displace, as a part of the pore volume.").term("front.injectedWater").term("front.initialWater"))
	s.inPlace("front.recoveryAtBreakthrough", "Rbt,o", true)
	s.movable("front.recoveryAtBreakthrough", "Rbt,m")
	s.inPlace("front.recoveryAtOne", "R1,o", false)
}

// recovery adds a recovery in pore volumes.
func (s *sheet) recovery(id, label, symbol string, value float64, strip bool, w *working) {
	s.figure(Figure{ID: id, Label: label + ", of the pore volume", Symbol: symbol, Value: value, Quantity: units.Share, Strip: strip}, w)
}

// holdsConnate reports whether the resident saturation counts connate water, of which
// nothing is asked: then how much oil is in place is not known.
func holdsConnate(pair fluid.Pair) bool { return pair.Resident.Saturation == "SL" }

// inPlace adds the same recovery as a part of the oil in place, where that is known.
func (s *sheet) inPlace(id, symbol string, strip bool) {
	f, ok := s.find(id)
	if !ok || holdsConnate(pairOf(s.st)) {
		return
	}
	s.figure(Figure{ID: id + "InPlace", Label: trimmed(f.Label) + ", of the oil in place", Symbol: symbol, Value: f.Value / (1 - s.number("front.initialWater")), Quantity: units.Share, Strip: strip},
		s.by("{"+symbol+"} = {"+f.Symbol+"} / (1 - {Swi})", "").term(id).term("front.initialWater"))
}

// movable adds the same recovery as a part of the oil that water can move.
func (s *sheet) movable(id, symbol string) {
	f, ok := s.find(id)
	if !ok {
		return
	}
	s.figure(Figure{ID: id + "Movable", Label: trimmed(f.Label) + ", of the movable oil", Symbol: symbol, Value: f.Value / s.number("front.movable"), Quantity: units.Share},
		s.by("{"+symbol+"} = {"+f.Symbol+"} / {Rmax}", "").term(id).term("front.movable"))
}

func (f *front) mobilityFigures(s *sheet, behind, ahead float64, shock bool) {
	low, high := f.flow.Ends()
	s.figure(Figure{ID: "front.endPointMobility", Label: "End-point mobility ratio", Symbol: "M", Value: f.flow.EndPointMobilityRatio(), Quantity: units.MobilityRatio, Strip: true},
		s.by("{M} = ({krw} / {µw}) / ({kro} / {µo})", "Water where only water flows over oil where only oil flows: at the two ends of the curve, whatever the two states of the displacement.", ref.Dake1978).
			value("krw", "krw at 1 − Sor", f.flow.Curves.At(high).Krw, units.Fraction).value("kro", "kro at Swc", f.flow.Curves.At(low).Kro, units.Fraction).
			viscosities().rests(f.curve...))
	if !shock {
		return
	}
	b, a := f.flow.Curves.At(behind), f.flow.Curves.At(ahead)
	s.figure(Figure{ID: "front.frontMobility", Label: "Front mobility ratio", Symbol: "Ms", Value: f.flow.FrontMobilityRatio(behind, ahead), Quantity: units.MobilityRatio, Strip: true},
		s.by("{Ms} = ({krw} / {µw} + {kro} / {µo}) / ({krwa} / {µw} + {kroa} / {µo})", "Total mobility just behind the front over that ahead of it; below 1 the front is stable.", ref.Dake1978).
			value("krw", "krw behind the front", b.Krw, units.Fraction).value("kro", "kro behind the front", b.Kro, units.Fraction).
			value("krwa", "krw ahead of the front", a.Krw, units.Fraction).value("kroa", "kro ahead of the front", a.Kro, units.Fraction).
			viscosities().on("front.shockSaturation"))
}

// trimmed is a label up to its first comma: "Recovery after 1 PV".
func trimmed(label string) string {
	head, _, _ := strings.Cut(label, ",")
	return head
}
