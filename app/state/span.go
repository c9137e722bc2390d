package state

import (
	"strings"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

// The two ends of an input's range, as the endings of their paths.
const (
	lowEnd  = ".low"
	highEnd = ".high"
)

// ranged takes the optional range of an input, in the unit of its value. Where
// nothing is given there is nothing to range.
func (m Model) ranged(msg Ranged) (Model, []Effect) {
	spec, ok := study.Find(msg.Path)
	if !ok || spec.Get(&m.Study) == nil {
		return m, nil
	}
	return m.amend(msg.Path+" range", func(p *page) { p.span(spec, clean(msg.Low), clean(msg.High)) })
}

// span reads the ends of a range: low ≤ value ≤ high. An end that cannot be used
// is kept as typed and left out of the study; it is read again when the value
// changes. A unit may be typed, but only the value's own.
func (p *page) span(spec study.Spec, low, high string) {
	in := *spec.Get(&p.study)
	in.Low, in.High = nil, nil
	p.forgetRange(spec.Path)
	if number, ok := p.end(spec, in, lowEnd, low); ok {
		in.Low = &number
	}
	if number, ok := p.end(spec, in, highEnd, high); ok {
		in.High = &number
	}
	spec.Set(&p.study, &in)
}

// end reads one end of a range; it is not ok when there is none that can be used.
func (p *page) end(spec study.Spec, in study.Input, which, text string) (number float64, ok bool) {
	if strings.TrimSpace(text) == "" {
		return 0, false
	}
	path := spec.Path + which
	typed := Draft{text, in.Unit}
	unit, _ := units.Find(spec.Quantity, in.Unit) // a study holds known units only
	number, typedUnit, err := units.Parse(spec.Quantity, text, unit)
	value := amount(spec, in.Value, in.Unit)
	switch {
	case err != nil:
		p.refuse(path, typed, asRead(err), "")
	case typedUnit != unit:
		p.refuse(path, typed, &study.Problem{Read: amount(spec, number, typedUnit.Symbol), Allowed: "a number in the unit of the value, " + unit.Label()}, "")
	case which == lowEnd && number > in.Value:
		p.refuse(path, typed, &study.Problem{Read: amount(spec, number, in.Unit) + " as the low end", Allowed: "at most the value, " + value}, "")
	case which == highEnd && number < in.Value:
		p.refuse(path, typed, &study.Problem{Read: amount(spec, number, in.Unit) + " as the high end", Allowed: "at least the value, " + value}, "")
	default:
		if problem := study.Check(spec, number, unit); problem != nil {
			p.refuse(path, typed, problem, "")
			return 0, false
		}
		p.keep(path, typed, units.Exact(number))
		return number, true
	}
	return 0, false
}

// rangeText is what stands in the field of an end.
func (p *page) rangeText(path string, end *float64) string {
	if draft, ok := p.drafts[path]; ok {
		return draft.Text
	}
	if end == nil {
		return ""
	}
	return units.Exact(*end)
}

func (p *page) forgetRange(path string) {
	for _, end := range []string{lowEnd, highEnd} {
		delete(p.drafts, path+end)
		delete(p.messages, path+end)
	}
}
