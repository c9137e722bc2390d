package state

import (
	"maps"

	"brinefront/physics/study"
)

// Part is what a sheet shows: the newest answer or, while the inputs cannot be used
// together, the last good one; then it is stale.
func (m Model) Part(sheet study.Sheet) (part study.Part, stale bool) {
	part = m.Result.Parts[sheet]
	if last, ok := m.LastGood[sheet]; ok && part.Status == study.Refused {
		return last, true
	}
	return part, false
}

// settled makes the answers on the screen the last good ones, before a step begins:
// those to the first letters of what is typed in it never are.
func (m Model) settled() Model {
	if m.ResultRevision != m.Revision {
		return m
	}
	last := map[study.Sheet]study.Part{}
	maps.Copy(last, m.LastGood)
	for sheet, part := range m.Result.Parts {
		if part.Status == study.Ready {
			last[sheet] = part
		}
	}
	m.LastGood = last
	return m
}

// Said is what is wrong with the input at a path: with what is typed there, or else
// with its value beside the others, as the engine found it.
func (m Model) Said(path string) string {
	if message := m.Messages[path]; message != "" {
		return message
	}
	for _, p := range m.Result.Problems {
		if m.typedAt(p.Path) == path {
			return says(&p)
		}
	}
	return ""
}

// typedAt is the path at which the form shows an input of the study. Only rows of
// the table that are complete are in the study; while one is bad, an earlier table
// is, and none of its cells are on the form.
func (m Model) typedAt(path string) string {
	t, ok := study.FindTable(path)
	if !ok {
		return path
	}
	of, column, ok := t.At(path)
	if !ok {
		return path
	}
	at := ""
	for i, row := range m.rows[t.Path] {
		bad, _, complete := row.standing(len(t.Columns))
		if bad {
			return ""
		}
		if complete {
			if of == 0 {
				at = t.Cell(i, column)
			}
			of--
		}
	}
	return at
}
