package study

import (
	"math"

	"brinefront/physics/reservoir"
	"brinefront/physics/units"
)

func (f *field) notes(s *sheet) {
	s.note(Note{ID: "field.linear", Level: "remark", Text: "The block is flooded evenly from one end to the other: one layer, full sweep, no crossflow, no aquifer.",
		Cause: "Patterns and layers sweep less of the rock and bring water sooner.", Do: "Take the recovery as that of the rock that water reaches."})
	s.note(Note{ID: "field.incompressible", Level: "remark", Text: "Rock and fluids are incompressible: what goes in comes out at once.",
		Cause: "A depleted reservoir fills up first, and production answers later.", Do: "Add the fill-up time where gas is present or pressure has fallen."})
	if whole := f.whole(); whole <= f.end {
		s.note(Note{ID: "field.oilBack", Level: "caution", Text: "The forecast ends after " + units.Format(whole, 3) + " PV, when the stream at the producer is all water.",
			Cause: "Gravity draws oil back faster than the rate pushes it: later the layer would take oil from beyond the producer.", Do: "Raise the rate where more of the oil is wanted.", Paths: []string{"front.dip", "field.rate"}})
	}
	f.injectionPressure(s)
	f.insideJump(s)
	switch f.limit.Outcome {
	case reservoir.FromTheStart:
		s.note(Note{ID: "field.limitAtStart", Level: "caution", Text: "The flood is beyond its economic limit from the start.",
			Cause: "The limit is met before anything is injected.", Do: "Look at the limit, the rate and the initial water saturation.", Paths: []string{limitPath(s.st)}})
	case reservoir.Never:
		s.note(Note{ID: "field.limitNever", Level: "caution", Text: "The economic limit is never reached with these inputs.",
			Cause: "The stream that is produced tends to a state short of the limit.", Do: "Choose another limit, or give the time to forecast to.", Paths: []string{limitPath(s.st), "field.horizon"}})
	case reservoir.Reached:
		if f.limit.PVI > f.end {
			s.note(Note{ID: "field.limitLater", Level: "remark", Text: "The economic limit comes after the end of the forecast.",
				Cause: "The forecast ends before it.", Do: "Give a longer time to forecast to, or none, to see the limit in the pictures.", Paths: []string{"field.horizon"}})
		}
	}
	const long = 40 // years
	if years := f.limit.Time / (365.25 * 86400); f.limit.Outcome == reservoir.Reached && years > long {
		s.note(Note{ID: "field.long", Level: "caution", Text: "The flood takes " + units.Format(years, 3) + " years to its limit.",
			Cause: "Wells and facilities seldom last as long.", Do: "Look at the rate against the pore volume, or at more injectors.", Paths: []string{"field.rate", "field.pressure", "field.length", "field.width"}})
	}
	if !f.rateHeld() && s.st.Rock.Permeability != nil {
		f.permeabilities(s)
	}
}

// insideJump warns of a cut for a limit that the front passes as it arrives.
func (f *field) insideJump(s *sheet) {
	if !f.jumps(s) || !f.withFront() {
		return
	}
	typed := *s.st.Field.WaterCut
	text := "The limit lies below the cut that arrives with the front: " + s.typed("field.waterCut") + " against " + units.Format(100*f.state(f.limit.PVI*(1+aside)).WaterCut, 3) + " %."
	if typed.Unit == "%" && typed.Value < 1 {
		text += " Was " + units.Exact(100*typed.Value) + " % meant?"
	}
	s.note(Note{ID: "field.limitInJump", Level: "caution", Text: text,
		Cause: "The flood would be stopped in the moment in which the injected water arrives.", Do: "Look at the limit and its unit.", Paths: []string{"field.waterCut"}})
}

func (f *field) injectionPressure(s *sheet) {
	const most = 1e9 // Pa, ten times what the deepest reservoirs hold
	highest := 0.0
	for _, state := range f.history {
		highest = math.Max(highest, state.PressureDrop)
	}
	if f.rateHeld() && s.st.Field.Permeability != nil && highest > most {
		s.note(Note{ID: "field.pressureHuge", Level: "caution", Text: "The rate would take a pressure difference of up to " + units.Format(highest/1e6, 3) + " MPa, which no well can give.",
			Cause: "Rate, permeability, length and cross-section do not go together.", Do: "Look at their numbers and units.", Paths: []string{"field.rate", "field.permeability", "field.length", "field.width", "field.thickness"}})
	}
	n := Note{ID: "field.fracture", Level: "caution", Text: "Injection must stay below the pressure that fractures the reservoir and its cap rock.",
		Cause: "A fracture short-cuts the flood and can take water where it does harm. The pressure difference between injector and producer is not the injection pressure; converging flow near the wells comes on top.",
		Do:    "Have licensed engineers set the injection pressure, well integrity and water handling under the local code.", Paths: []string{"field.rate"}}
	if !f.rateHeld() {
		n.Paths = []string{"field.pressure"}
	}
	s.note(n)
}

// permeabilities remarks on a block whose permeability is far from the plug's.
func (f *field) permeabilities(s *sheet) {
	plug, given := s.input("rock.permeability")
	const far = 3
	if ratio := f.linear.Permeability / plug; given && (ratio > far || ratio < 1.0/far) {
		s.note(Note{ID: "field.permeability", Level: "caution", Text: "The permeability of the block is " + units.Format(ratio, 2) + " times that of the plug.",
			Cause: "Relative permeability changes with rock quality; curves of one plug may not hold for other rock.", Do: "Look for a plug of the same rock type.", Paths: []string{"field.permeability", "rock.permeability"}})
	}
}
