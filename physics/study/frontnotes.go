package study

import "brinefront/physics/units"

func (f *front) notes(s *sheet) {
	gravity := "no gravity"
	if f.dip != nil {
		gravity = "both phases spread over the height of the layer"
	}
	s.note(Note{ID: "front.screening", Level: "remark", Text: "This is a screening answer: one dimension, uniform rock, no capillary pressure, " + gravity + ", no compressibility, constant temperature.",
		Cause: "Each of these can move the front and the recovery.", Do: "Use it to decide what to look at next, not to sanction a project."})
	f.judgements(s)
	f.brineNotes(s)
	waterEnd, oilEnd := flowAtEnds(f.flow.Curves)
	if _, cut := f.displacement.InletFace(); cut < 1 {
		cause, do := "Water alone would bring the inlet to 1 − Sor.", "Leave the inlet saturation empty unless oil is injected too."
		if oilEnd {
			cause = "Oil still flows in the last row of the table, so that the saturation where it stops is not known."
			do = "Add the row of residual oil with kro = 0."
		}
		s.note(Note{ID: "front.inlet", Level: "caution", Text: "The saturation held at the inlet lets oil flow there: the injected stream is " + units.Format(100*(1-cut), 3) + " % oil.",
			Cause: cause, Do: do + " Recovery counts the oil displaced, net of the oil injected.", Paths: []string{"front.injectedWater"}})
	}
	if cut := f.cutAhead(); cut > 0 {
		cause := "The initial water saturation lies above the connate water of the curve."
		if waterEnd {
			cause = "Water already flows in the first row of the table, so that the curve does not tell where it begins to."
		}
		s.note(Note{ID: "front.mobileWater", Level: "remark", Text: "Water flows from the first day: at the initial saturation the water cut is " + units.Format(100*cut, 3) + " % at reservoir conditions.",
			Cause: cause, Do: "Breakthrough here means the arrival of the injected front, not of the first water.", Paths: []string{"front.initialWater"}})
	}
	if waves := f.displacement.Waves(); len(waves) > 2 && s.st.Rock.Curve == "table-linear" {
		s.note(Note{ID: "front.staircase", Level: "remark", Text: "The displacement is a staircase of small steps.",
			Cause: "Straight lines between the rows of the table make the slope of the fractional flow jump at every row; this is the exact solution for them.", Do: "Choose the monotone cubic or a fitted curve for smooth answers.", Paths: []string{"rock.curve"}})
	}
	f.frontPlace(s)
}

// frontPlace warns where the front rests on a stretch without laboratory points.
func (f *front) frontPlace(s *sheet) {
	behind, _, shock := f.displacement.Front()
	table := s.st.Rock.Table
	if !shock || table == nil || len(table.Sw) < 2 {
		return
	}
	below, above := -1.0, 2.0
	for _, sw := range table.Sw {
		if sw <= behind && sw > below {
			below = sw
		}
		if sw >= behind && sw < above {
			above = sw
		}
	}
	const wide = 0.1
	if above-below > wide {
		s.note(Note{ID: "front.sparse", Level: "caution", Text: "The front saturation " + units.Format(behind, 3) + " lies in a stretch of " + units.Format(above-below, 2) + " in saturation without a laboratory point.",
			Cause: "Breakthrough and recovery hang on the curves just there.", Do: "Get a point near this saturation, or look at how far other curves move the answer.", Paths: []string{"rock.table"}})
	}
}
