package study

import (
	"math"

	"brinefront/physics/ref"
	"brinefront/physics/regime"
	"brinefront/physics/units"
)

// said is a verdict as a note tells it: the sentence with its number, the range it was
// held against and where that stands.
func said(v regime.Verdict) string {
	source := "common practice, no source"
	if v.Source != "" {
		source = ref.Get(v.Source).Short()
	}
	return v.Text + " Held against: " + v.Range + "; " + source + "."
}

// judgements tell the numbers of the displacement in words.
func (f *front) judgements(s *sheet) {
	f.mobility(s)
	f.stability(s)
	f.gravity(s)
	f.capillarity(s)
	f.trapping(s)
}

func viscosityPaths() []string { return []string{"fluids.waterViscosity", "fluids.oilViscosity"} }

func (f *front) mobility(s *sheet) {
	m := s.number("front.endPointMobility")
	if math.IsNaN(m) {
		return
	}
	v := regime.EndPointMobility(m)
	do := "See the ratio across the front for whether fingers grow."
	if _, _, shock := f.displacement.Front(); !shock {
		do = "Keep it in mind for sweep; no step runs ahead from which fingers could grow."
	}
	s.note(Note{ID: "front.mobility", Level: "remark", Text: said(v),
		Cause: "It governs sweep in patterns and layers, which this sheet does not see.", Do: do, Paths: viscosityPaths()})
}

// stability tells the front mobility ratio in words.
func (f *front) stability(s *sheet) {
	ratio, ok := s.part.Figure("front.frontMobility")
	if !ok {
		s.note(Note{ID: "front.noShock", Level: "remark", Text: "No step runs ahead: the water spreads out from the start.",
			Cause: "The fractional flow curve bends down from the initial saturation on.", Do: "Look whether curves and viscosities are as meant.", Paths: []string{"rock.curve"}})
		return
	}
	v := regime.FrontMobility(ratio.Value)
	if layer, dips := f.segregated(); dips && v.Class != regime.Stable && layer.Judge(f.velocity).Class == regime.Stable {
		s.note(Note{ID: "front.gravityHolds", Level: "remark", Text: "Gravity holds the front, which without it would be unstable. " + said(v),
			Cause: "The rate lies below the critical one, so that what runs ahead falls back.", Do: "Keep the rate below the critical one.", Paths: append(viscosityPaths(), "front.dip")})
		return
	}
	if v.Class != regime.Stable {
		s.note(Note{ID: "front.unstable", Level: "caution", Text: "Without help from gravity the front is unstable. " + said(v),
			Cause: "Water fingers ahead of the front in real rock, so it arrives earlier and sweeps less than computed here.", Do: "Take breakthrough as the latest and early recovery as the most to expect; consider a more viscous injected water.", Paths: viscosityPaths()})
		return
	}
	s.note(Note{ID: "front.stable", Level: "remark", Text: "The front is stable without gravity. " + said(v),
		Cause: "Fingers do not grow from the front itself.", Do: "Uneven rock can still bring water early."})
}

// gravity tells what the dip does.
func (f *front) gravity(s *sheet) {
	f.velocityDiffers(s)
	if f.dip == nil {
		return
	}
	f.backflow(s)
	layer, ok := f.segregated()
	if !ok {
		s.note(Note{ID: "front.gravityUnjudged", Level: "remark", Text: "Whether gravity keeps the interface in shape is not judged: both phases flow on one side of it.",
			Cause: "The critical rate is known for water alone behind the interface and oil alone ahead.", Do: "Look at the fractional flow curve, which counts gravity as it is.", Paths: []string{"front.initialWater", "front.injectedWater"}})
		return
	}
	paths := []string{"front.dip", "field.permeability"}
	s.note(Note{ID: "front.gravityWeight", Level: "remark", Text: said(regime.GravityWeight(layer.Gravity(f.velocity))),
		Cause: "Gravity changes the fractional flow by its share of the driving force.", Do: "Where gravity rules, look at the critical rate before anything else.", Paths: paths})
	v := layer.Judge(f.velocity)
	_, rates := layer.Critical()
	s.note(Note{ID: "front.dipStability", Level: level(v.Class != regime.Stable), Text: said(v) + " " + rates.Text,
		Cause: "Above the critical rate one phase overruns the other along the layer, which one dimension does not show.", Do: "Hold the rate on the stable side of the critical rate where that pays.", Paths: append(paths, "front.velocity")})
}

// velocityDiffers warns where a velocity that is typed and counts is not that of the field.
func (f *front) velocityDiffers(s *sheet) {
	if u := s.fieldVelocity(); velocityCounts(s.st) && s.st.Front.Velocity != nil && math.Abs(u/f.velocity-1) > 0.01 {
		s.note(Note{ID: "front.velocityDiffers", Level: "caution", Text: "The Darcy velocity typed is " + units.Format(f.velocity/u, 3) + " times that of the field's rate over its cross-section.",
			Cause: "Gravity and the capillary number count by the velocity typed, time by the rate of the field.", Do: "Leave the velocity empty so that both agree.", Paths: []string{"front.velocity", "field.rate"}})
	}
}

// backflow tells where a phase flows against the displacement.
func (f *front) backflow(s *sheet) {
	cut, _ := f.flow.At(f.swi)
	_, inlet := f.displacement.InletFace()
	if cut < -backward {
		s.note(Note{ID: "front.waterBack", Level: "caution", Text: "At the initial saturation water flows back: its share of the flow is " + units.Format(100*cut, 3) + " %.",
			Cause: "Gravity moves the mobile water against the displacement, which takes water from beyond the producer.", Do: "Read the answer as that of a layer that goes on beyond the producer.", Paths: []string{"front.dip", "front.initialWater"}})
	}
	if inlet > 1+backward {
		s.note(Note{ID: "front.oilBack", Level: "caution", Text: "Oil flows back at the injector: the share of water there is " + units.Format(100*inlet, 3) + " % of the rate, the excess over 100 % being oil that rises past it.",
			Cause: "Gravity parts the phases faster than the rate pushes them; late in the flood the same holds at the producer.", Do: "Read the answer as that of a layer that goes on beyond both wells, or raise the rate.", Paths: []string{"front.dip", "front.velocity"}})
	}
}

// capillarity tells whether a residual phase would move.
func (f *front) capillarity(s *sheet) {
	nc := s.number("front.capillaryNumber")
	if math.IsNaN(nc) {
		return
	}
	release := regime.NonWettingResidual
	if f.pair.Resident.Wetting {
		release = regime.WettingResidual
	}
	v := release.Judge(nc, "oil")
	s.note(Note{ID: "front.capillarity", Level: level(v.Class != regime.Trapped), Text: said(v),
		Cause: "The end points of the curves hold for capillary numbers at which residual oil stays trapped.", Do: "Where the number lies higher, look whether the laboratory flood had the same one.", Paths: []string{"fluids.tension", "front.velocity"}})
}

// level is that of a note which warns when something holds.
func level(warn bool) string {
	if warn {
		return "caution"
	}
	return "remark"
}
