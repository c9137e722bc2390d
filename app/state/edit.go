package state

import (
	"errors"
	"fmt"
	"strings"
	"unicode/utf8"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

// edited reads what is typed for an input. A good text changes the study; a bad
// one is kept as typed, with what was read and what is allowed, and the last good
// value stays in use.
func (m Model) edited(msg Edited) (Model, []Effect) {
	if t, ok := study.FindTable(msg.Path); ok {
		if row, column, ok := t.At(msg.Path); ok {
			return m.cellEdited(t, row, column, msg)
		}
	}
	spec, ok := study.Find(msg.Path)
	if !ok || !m.has(msg.Path) {
		return m, nil
	}
	unit, ok := units.Find(spec.Quantity, msg.Unit)
	if !ok {
		unit = m.System.Unit(spec.Quantity)
	}
	// What is typed is one step, a unit typed along included; choosing another unit
	// beside the text is a step of its own.
	key := msg.Path
	if text, shown := m.Shown(spec); text == msg.Text && shown != unit.Symbol {
		key = ""
	}
	before := m.history.last(key)
	return m.amend(key, func(p *page) { p.input(spec, clean(msg.Text), unit, before) })
}

// Shown is the text and the unit that the field of an input shows: what was typed
// while that differs from the study, else what the study holds, else nothing in the
// unit of the system.
func (m Model) Shown(spec study.Spec) (text, unit string) { return m.page().shown(spec) }

func (p page) shown(spec study.Spec) (text, unit string) {
	if draft, ok := p.drafts[spec.Path]; ok {
		return draft.Text, draft.Unit
	}
	if in := spec.Get(&p.study); in != nil {
		return units.Exact(in.Value), in.Unit
	}
	return "", units.System(p.study.System).Unit(spec.Quantity).Symbol
}

// input takes a text for an input. before is the page before the keystrokes of the
// same step, nil when this is the first: a number typed over another keeps its
// source, and a text that turns out bad leaves in use what was there, in the unit
// chosen there, not what its first letters spelled.
func (p *page) input(spec study.Spec, text string, unit units.Unit, before *page) {
	path := spec.Path
	in := spec.Get(&p.study)
	delete(p.messages, path)
	if strings.TrimSpace(text) == "" {
		spec.Set(&p.study, nil)
		p.forgetRange(path)
		delete(p.drafts, path)
		if _, _, ok := study.AtCase(path); ok {
			p.drafts[path] = Draft{"", unit.Symbol} // the field stays until it is removed
		}
		if unit != units.System(p.study.System).Unit(spec.Quantity) {
			p.drafts[path] = Draft{"", unit.Symbol} // the next number typed is in this unit too
		}
		return
	}
	typed := Draft{text, unit.Symbol}
	number, unit, problem := asNumber(spec, text, unit)
	if problem != nil {
		if before != nil {
			p.revert(spec, before)
			_, typed.Unit = before.shown(spec)
		}
		p.refuse(path, typed, problem, inUse(spec, spec.Get(&p.study)))
		return
	}
	if in == nil && before != nil {
		in = spec.Get(&before.study)
	}
	changed := study.Input{}
	if in != nil {
		changed = *in
	}
	low, high := p.rangeText(path+lowEnd, changed.Low), p.rangeText(path+highEnd, changed.High)
	if number != changed.Value || unit.Symbol != changed.Unit {
		changed.Source = own(changed.Source)
	}
	changed.Value, changed.Unit = number, unit.Symbol
	spec.Set(&p.study, &changed)
	p.keep(path, Draft{text, unit.Symbol}, units.Exact(number))
	p.span(spec, low, high)
}

// revert takes an input and its range back to what they were on another page.
func (p *page) revert(spec study.Spec, before *page) {
	spec.Set(&p.study, spec.Get(&before.study))
	p.forgetRange(spec.Path)
	for _, end := range []string{lowEnd, highEnd} {
		path := spec.Path + end
		if draft, ok := before.drafts[path]; ok {
			p.drafts[path] = draft
		}
		if message, ok := before.messages[path]; ok {
			p.messages[path] = message
		}
	}
}

// asNumber reads a text as a lawful number of an input, or says why it is none.
func asNumber(spec study.Spec, text string, unit units.Unit) (float64, units.Unit, *study.Problem) {
	number, unit, err := units.Parse(spec.Quantity, text, unit)
	if err != nil {
		return 0, unit, asRead(err)
	}
	return number, unit, study.Check(spec, number, unit)
}

// own is the source note of a number that is the person's now: what the
// demonstration says of its own numbers no longer holds.
func own(source string) string {
	if source == study.Invented {
		return ""
	}
	return source
}

// keep holds a text as a draft while it is written otherwise than the study's own.
func (p *page) keep(path string, typed Draft, exact string) {
	delete(p.drafts, path)
	if typed.Text != exact {
		p.drafts[path] = typed
	}
}

// refuse holds a text that cannot be used and says why.
func (p *page) refuse(path string, typed Draft, problem *study.Problem, use string) {
	p.drafts[path] = typed
	p.messages[path] = says(problem) + use
}

// says is a problem as a sentence.
func says(p *study.Problem) string { return "Read " + p.Read + "; allowed: " + p.Allowed + "." }

// asRead is why a number could not be read.
func asRead(err error) *study.Problem {
	var fault *units.ReadError
	if !errors.As(err, &fault) {
		panic("state: a text was refused without a reason: " + err.Error())
	}
	return &study.Problem{Read: fault.Read, Allowed: fault.Allowed}
}

// inUse says what stays in use while a text is bad.
func inUse(spec study.Spec, in *study.Input) string {
	if in == nil {
		return ""
	}
	return " In use: " + amount(spec, in.Value, in.Unit) + "."
}

// amount is a number as typed with its unit.
func amount(spec study.Spec, number float64, symbol string) string {
	if unit, ok := units.Find(spec.Quantity, symbol); ok && symbol != "" {
		return units.Exact(number) + " " + unit.Label()
	}
	return units.Exact(number)
}

// written takes a text of the study: its title, author and note, the first day of
// injection, and the tables that are kept as they were pasted.
func (m Model) written(msg Written) (Model, []Effect) {
	return m.amend(msg.Path, func(p *page) {
		text := clean(msg.Text)
		at := textAt(&p.study, msg.Path)
		if at == nil {
			return
		}
		delete(p.drafts, msg.Path)
		delete(p.messages, msg.Path)
		problem := tooLong(msg.Path, text)
		meant := study.HasMeaning(msg.Path)
		if meant && problem == nil {
			problem = study.CheckText(&p.study, msg.Path, strings.TrimSpace(text))
		}
		if problem != nil {
			use := ""
			if meant && *at != "" {
				use = " In use: the last good one."
				if !strings.Contains(*at, "\n") {
					use = " In use: " + *at + "."
				}
			}
			p.refuse(msg.Path, Draft{Text: text}, problem, use)
			return
		}
		if meant {
			p.keep(msg.Path, Draft{Text: text}, strings.TrimSpace(text))
			text = strings.TrimSpace(text)
		}
		*at = text
	})
}

// textAt is where a study keeps a text; nil when the path holds none.
func textAt(st *study.Study, path string) *string {
	switch path {
	case "title":
		return &st.Title
	case "author":
		return &st.Author
	case "note":
		return &st.Note
	case "field.start":
		return &st.Field.Start
	case "field.layers.table":
		return &st.Field.Layers.Table
	case "field.history.table":
		return &st.Field.History.Table
	case "field.wells.schedule":
		return &st.Field.Wells.Schedule
	case "block.sizes":
		return &st.Block.Sizes
	}
	return nil
}

// sourced takes the source note of an input or of the table. A note belongs to
// what is given; where nothing is, there is nothing to note.
func (m Model) sourced(msg Sourced) (Model, []Effect) {
	path := msg.Path + ".source"
	return m.amend(path, func(p *page) {
		text := clean(msg.Text)
		delete(p.drafts, path)
		delete(p.messages, path)
		if problem := tooLong(path, text); problem != nil {
			p.refuse(path, Draft{Text: text}, problem, "")
			return
		}
		if t, ok := study.FindTable(msg.Path); ok && t.Path == msg.Path {
			if columns, _ := t.Get(&p.study); columns != nil {
				t.Set(&p.study, columns, text)
			}
		}
		if spec, ok := study.Find(msg.Path); ok && spec.Get(&p.study) != nil {
			changed := *spec.Get(&p.study)
			changed.Source = text
			spec.Set(&p.study, &changed)
		}
	})
}

func tooLong(path, text string) *study.Problem {
	limit := study.TextLimit(path)
	if n := utf8.RuneCountInString(text); n > limit {
		return &study.Problem{Path: path, Read: fmt.Sprintf("%d characters", n), Allowed: fmt.Sprintf("up to %d", limit)}
	}
	return nil
}

// chosen takes an enumerated value; one that its field cannot have changes nothing.
func (m Model) chosen(msg Chosen) (Model, []Effect) {
	return m.amend("", func(p *page) { study.Choose(&p.study, msg.Path, msg.Value) })
}

// clean is a text without the broken characters that a file could not hold.
func clean(text string) string { return strings.ToValidUTF8(text, "\uFFFD") }
