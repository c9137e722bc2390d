package study

import (
	"math"
	"strings"

	"brinefront/physics/fit"
	"brinefront/physics/fluid"
	"brinefront/physics/ref"
	"brinefront/physics/regime"
	"brinefront/physics/units"
)

// inspect tells what is wrong with the laboratory points: as problems where the
// curve rests on them and they cannot be used, else as notes. It reports whether
// they can be used.
func (s *sheet) inspect(points fit.Points, used bool) bool {
	sound := true
	for _, finding := range fit.Inspect(points) {
		if finding.Refuse && used {
			sound = false
			s.problem("rock.table", finding.Read, finding.Allowed)
			continue
		}
		level := "remark"
		if used {
			level = "caution"
		}
		s.note(Note{ID: "rock.points." + finding.ID, Level: level, Text: finding.Text, Cause: "Read: " + finding.Read + ".", Do: finding.Do, Paths: []string{"rock.table"}})
	}
	return sound
}

func (r *rock) notes(s *sheet) {
	if r.fitted != nil {
		r.fitNotes(s)
		r.closer(s)
	}
	r.wettability(s)
	r.reference(s)
	r.aboveOne(s)
}

// fitNotes passes on what the fit says of itself.
func (r *rock) fitNotes(s *sheet) {
	if len(r.fitted.Verdict) > 0 {
		s.note(Note{ID: "rock.fit", Level: "remark", Text: strings.Join(r.fitted.Verdict, " "),
			Cause: "A fit smooths the scatter of the points and keeps to the shape of its family.", Do: "Compare with the table itself and with the other family.", Paths: []string{"rock.curve"}})
	}
	if r.fitted.Status != fit.Converged {
		s.note(Note{ID: "rock.fitStopped", Level: "caution", Text: "The fit stopped short: " + r.fitted.Status.String() + ".",
			Cause: "The answer rests on the best curve found so far.", Do: "Look at the points, or use another curve.", Paths: []string{"rock.curve"}})
	}
}

// wettability weighs Craig's (1971) rules of thumb and, for a Corey curve, what its
// exponents are usual for. The rules are made for water and oil.
func (r *rock) wettability(s *sheet) {
	if pairOf(s.st).ID != fluid.BrineOil {
		return
	}
	signs := regime.CraigSigns{KrwEnd: s.number("rock.krwOverKro"), Crossover: s.number("rock.crossover"), Swc: r.swc}
	var texts []string
	for _, v := range signs.Judge() {
		texts = append(texts, strings.TrimSuffix(v.Text, ".")+" ("+v.Range+").")
	}
	summary := signs.Summary()
	s.note(Note{ID: "rock.wettability", Level: "remark", Text: summary.Text + " " + strings.Join(texts, " ") + " By " + ref.Get(summary.Source).Short() + ".",
		Cause: "Rules of thumb, not a measurement.", Do: "Confirm with an Amott or USBM test where it matters.", Paths: r.inputs})
	nw, no := s.number("rock.nw"), s.number("rock.no")
	if !math.IsNaN(nw) && !math.IsNaN(no) {
		s.note(Note{ID: "rock.exponents", Level: "remark", Text: said(regime.CoreyExponents(nw, no)),
			Cause: "The ranges overlap and hold for many rocks, not for each.", Do: "Weigh it together with the other signs.", Paths: r.inputs})
	}
}

// reference says which permeability kr refers to, and doubts it where it looks wrong.
func (r *rock) reference(s *sheet) {
	start := r.reported.At(r.swc).Kro
	full := pairOf(s.st).FilledByResident() && r.swc == 0
	switch {
	case s.st.Rock.Reference == "oil":
		s.note(Note{ID: "rock.converted", Level: "remark", Text: "kr was reported relative to ko(Swi) and is used relative to absolute permeability: multiplied by ko(Swi)/k = " + units.Format(r.factor, 4) + ".",
			Cause: "Rates and pressures need one reference; fractional flow does not change.", Do: "Look whether the laboratory report says the same.", Paths: []string{"rock.reference", "rock.permeability", "rock.oilPermeability"}})
		if !r.measures() && start != 1 {
			s.note(Note{ID: "rock.referenceStart", Level: "caution", Text: "kro starts at " + units.Format(start, 3) + ", though kr is said to refer to ko(Swi).",
				Cause: "Relative to the oil permeability at initial water kro starts at 1.", Do: "Look which permeability the laboratory report names.", Paths: []string{"rock.reference"}})
		}
	case start == 1 && !full && !r.measures():
		s.note(Note{ID: "rock.referenceAbsolute", Level: "caution", Text: "kro starts at exactly 1, though kr is said to refer to absolute permeability.",
			Cause: "Oil beside connate water hardly ever flows as easily as water alone; a start at 1 is how curves relative to ko(Swi) look.", Do: "Look which permeability the laboratory report names.", Paths: []string{"rock.reference"}})
	}
}

// aboveOne doubts a phase that would flow more easily beside another than water does
// alone. Points above 1 as they were typed are a finding of their own.
func (r *rock) aboveOne(s *sheet) {
	const rounding = 1e-9
	note := Note{Level: "caution", Paths: []string{"rock.reference", "rock.permeability", "rock.oilPermeability"}}
	if r.factor > 1 {
		note.ID, note.Text = "rock.exchanged", "ko(Swi) is larger than the absolute permeability k, by the factor "+units.Format(r.factor, 4)+"."
		note.Cause, note.Do = "Oil beside connate water hardly ever flows as easily as one phase alone: most likely the two entries are exchanged.", "Exchange them if the laboratory report says so."
		s.note(note)
		return
	}
	var read []string
	for _, end := range []struct {
		symbol   string
		reported float64
	}{{"krw0", r.reported.At(r.swmax).Krw}, {"kro0", r.reported.At(r.swc).Kro}} {
		if end.reported*r.factor > 1+rounding {
			read = append(read, end.symbol+" = "+units.Format(end.reported*r.factor, 4))
		}
	}
	switch {
	case len(read) == 0:
		return
	case r.factor != 1:
		note.ID, note.Text = "rock.convertedAboveOne", "Converted to absolute permeability a curve ends above 1: "+strings.Join(read, ", ")+"."
		note.Do = "Look whether kr refers to ko(Swi) at all, and whether both permeabilities are right."
	case r.measures():
		return
	default:
		note.ID, note.Text = "rock.aboveOne", "A curve ends above 1: "+strings.Join(read, ", ")+", though kr is said to refer to absolute permeability."
		note.Do = "Look for a slip in typing, and which permeability the laboratory report names."
		note.Paths = append([]string{"rock.reference"}, r.inputs...)
	}
	note.Cause = "A phase flows no more easily beside another than alone in the rock."
	s.note(note)
}
