package state

import (
	"strings"

	"brinefront/physics/paste"
	"brinefront/physics/study"
)

// layouts are what a text pasted into a table is read for, by the table's path.
var layouts = map[string]paste.Layout{"rock.table": paste.RelativePermeability, "rock.capillary.table": paste.CapillaryPressure}

// pasted shows how a pasted text is read. Nothing else changes until it is accepted.
func (m Model) pasted(msg Pasted) Model {
	m.Paste = nil
	layout, ok := layouts[msg.Table]
	if text := clean(msg.Text); ok && strings.TrimSpace(text) != "" {
		m.Paste = &PasteDraft{Table: msg.Table, Text: text, Reading: paste.Read(text, layout.Between(study.Phases(&m.Study)))}
	}
	return m
}

func (m Model) pasteMapped(msg PasteMapped) Model {
	if m.Paste != nil {
		m.Paste = &PasteDraft{m.Paste.Table, m.Paste.Text, m.Paste.Reading.With(msg.Column, msg.As)}
	}
	return m
}

// pasteAccepted makes the table as previewed the study's: one step, whatever was
// typed before. One that has problems stays a preview.
func (m Model) pasteAccepted() (Model, []Effect) {
	if m.Paste == nil {
		return m, nil
	}
	t, _ := study.FindTable(m.Paste.Table)
	columns, unit, ok := m.Paste.Reading.Table()
	if !ok {
		return m, nil
	}
	m.Paste = nil
	return m.amend("", func(p *page) {
		if unit != "" {
			study.Choose(&p.study, "rock.capillary.unit", unit)
		}
		p.tabulate(t, typedRows(columns))
	})
}
