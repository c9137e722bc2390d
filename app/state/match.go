package state

import (
	"math"
	"strconv"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

// Matched reports whether what a match found may be taken over: all of it is there, and
// about the study as it stands.
func (m Model) Matched() bool {
	part, ok := m.Result.Parts[study.SheetMatch]
	_, found := part.Figure("match.misfit")
	return ok && found && m.answered[study.SheetMatch] && m.Study.Match.Asked()
}

// matchTaken puts what the match found in the place of the inputs it moved, and ends it.
func (m Model) matchTaken() (Model, []Effect) {
	if !m.Matched() {
		return m, nil
	}
	part := m.Result.Parts[study.SheetMatch]
	return m.amend("", func(p *page) {
		for _, path := range p.study.Match.Moved() {
			spec, _ := study.Find(path)
			in := spec.Get(&p.study)
			f, found := part.Figure("match." + path)
			if !found || in == nil {
				continue
			}
			taken := *in
			unit, _ := units.Find(spec.Quantity, in.Unit) // it was matched in it
			taken.Value, taken.Source = within(rounded(unit.FromSI(f.Value)), in), "Matched to the measured history."
			delete(p.drafts, path)
			delete(p.messages, path)
			spec.Set(&p.study, &taken)
		}
		study.Choose(&p.study, "match.run", "off")
	})
}

// rounded is a number of six figures: more than a match tells.
func rounded(v float64) float64 {
	v, _ = strconv.ParseFloat(strconv.FormatFloat(v, 'g', 6, 64), 64)
	return v
}

// within keeps a number in the range of an input.
func within(v float64, in *study.Input) float64 {
	if in.Low != nil {
		v = math.Max(v, *in.Low)
	}
	if in.High != nil {
		v = math.Min(v, *in.High)
	}
	return v
}
