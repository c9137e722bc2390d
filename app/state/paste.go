package state

import (
	"strings"

	"brinefront/physics/paste"
	"brinefront/physics/study"
)

// pasted shows how a pasted text is read. Nothing else changes until it is accepted.
func (m Model) pasted(msg Pasted) Model {
	m.Paste = nil
	if text := clean(msg.Text); strings.TrimSpace(text) != "" {
		m.Paste = &PasteDraft{Text: text, Reading: paste.Read(text)}
	}
	return m
}

func (m Model) pasteMapped(msg PasteMapped) Model {
	if m.Paste != nil {
		m.Paste = &PasteDraft{Text: m.Paste.Text, Reading: m.Paste.Reading.With(msg.Column, msg.As)}
	}
	return m
}

// pasteAccepted makes the table as previewed the study's: one step, whatever was
// typed before. One that has problems stays a preview.
func (m Model) pasteAccepted() (Model, []Effect) {
	if m.Paste == nil {
		return m, nil
	}
	sw, krw, kro, ok := m.Paste.Reading.Table()
	if !ok {
		return m, nil
	}
	m.Paste = nil
	return m.amend("", func(p *page) {
		table := study.Table{Sw: sw, Krw: krw, Kro: kro}
		p.rows = rowsOf(&table)
		p.tabulate()
	})
}
