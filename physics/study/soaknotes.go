package study

import (
	"math"

	"brinefront/physics/imbibe"
	"brinefront/physics/units"
)

func (k *soak) notes(s *sheet) {
	if !k.FiniteFront() {
		s.note(Note{ID: "soak.tail", Level: "remark", Text: "The water has no front: its tail thins out without end.",
			Cause: "Capillary diffusion does not vanish at the water that the rock holds from the start.", Do: "Read the depth as where saturation has risen by 1 % of the whole change.", Paths: []string{"soak.initial"}})
	}
	_, high := k.Kr.Ends()
	if left := high - k.Inlet; s.st.Soak.Inlet == nil && left > 1e-6 {
		s.note(Note{ID: "soak.mixedWet", Level: "remark", Text: "Soaking stops at Sw = " + units.Format(k.Inlet, 3) + ", " + units.Format(left, 3) + " short of residual oil.",
			Cause: "There capillary pressure is zero, its curve ends, or nothing above it lets water spread.", Do: "What lies beyond has to be driven out: see Front.", Paths: []string{"rock.capillary.curve"}})
	}
	if k.Ratio >= 0.9 {
		s.note(Note{ID: "soak.nearOne", Level: "remark", Text: "With a ratio this near 1 the rate depends on it strongly.",
			Cause: "Little oil has to leave at the face, so that capillary pressure hardly limits the rate; at 1 and residual oil it has none.", Do: "Ask what sets the ratio: a far end that is open, or a pressure.", Paths: []string{"soak.flow"}})
	}
	low, _ := k.Kr.Ends()
	if math.Abs(k.pcEnds[0]-low) > 1e-6 || math.Abs(k.pcEnds[1]-high) > 1e-6 {
		s.note(Note{ID: "soak.ends", Level: "caution", Text: "Capillary pressure is given from Sw = " + units.Format(k.pcEnds[0], 4) + " to " + units.Format(k.pcEnds[1], 4) + ", relative permeability from " + units.Format(low, 4) + " to " + units.Format(high, 4) + ".",
			Cause: "The two are of one rock and should end together; soaking is computed where both are given.", Do: "Give both the same ends.", Paths: []string{"rock.capillary.curve", "rock.curve"}})
	}
	if k.past() {
		s.note(Note{ID: "soak.past", Level: "caution", Text: "At the time asked about the water has met the far boundary: the self-similar solution no longer holds.",
			Cause: "From then on the block takes up less than 2 A √t.", Do: "Ask about an earlier time, or a deeper block.", Paths: []string{"soak.time", "soak.length"}})
	}
	switch k.Status {
	case imbibe.Stopped:
		s.note(Note{ID: "soak.stopped", Level: "caution", Text: "The solver stopped before the equations were met; the residual is " + units.Format(k.Residual, 2) + ".",
			Cause: "The curves have corners or ends that its panels did not follow.", Do: "Use a smooth curve, or look at the ends of the table.", Paths: []string{"rock.curve", "rock.capillary.curve"}})
	case imbibe.Overtaken:
		s.note(Note{ID: "soak.overtaken", Level: "caution", Text: "Where capillary pressure is level the total flux runs ahead of the profile that is shown.",
			Cause: "Nothing but the total flux moves water there, and the solution leaves its corner out.", Do: "Use a capillary pressure that falls everywhere, or a smaller ratio.", Paths: []string{"rock.capillary.curve", "soak.flow"}})
	}
	s.note(Note{ID: "soak.only", Level: "remark", Text: "Capillary pressure alone moves the water: gravity and the pressure of the flood are left out.",
		Cause: "In tall or permeable blocks the weight of the fluids helps or hinders as much.", Do: "Take the answer for small blocks and tight rock."})
}
