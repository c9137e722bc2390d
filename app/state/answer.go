package state

import (
	"maps"

	"brinefront/physics/study"
)

// answeredBy takes answers to the study as it stands, all of them or those of some
// sheets; those to an earlier one are dropped, since the right ones are on their way.
// A sheet shows what it showed until its own part comes.
func (m Model) answeredBy(msg Answered) (Model, []Effect) {
	if msg.Revision != m.Revision {
		return m, nil
	}
	m.Failure = ""
	parts, answered := map[study.Sheet]study.Part{}, map[study.Sheet]bool{}
	maps.Copy(parts, m.Result.Parts)
	maps.Copy(answered, m.answered)
	for sheet, part := range msg.Parts {
		parts[sheet], answered[sheet] = part, part.Left == 0
	}
	m.answered = answered
	if msg.More {
		m.Result = study.Whole(parts)
		return m, nil
	}
	maps.DeleteFunc(parts, func(sheet study.Sheet, _ study.Part) bool { return !answered[sheet] }) // no longer asked of the study
	m.Result = study.Whole(parts)
	m.Whole, m.ResultRevision, m.Computing = m.Result, msg.Revision, false
	if m.owed == "" {
		return m, nil
	}
	what := m.owed
	m.owed = ""
	return m.exported(what)
}

// Updating reports whether what a sheet shows is still to be replaced, in part or
// whole, by the answer to the inputs as they stand.
func (m Model) Updating(sheet study.Sheet) bool { return m.Computing && !m.answered[sheet] }

// engineFailed shows a failure of the program itself. Revision 0 is about no
// study: the engine stopped while it computed evidence.
func (m Model) engineFailed(msg EngineFailed) Model {
	switch msg.Revision {
	case m.Revision:
		m.Computing, m.owed = false, ""
	case 0:
		m.Checking = false
	default:
		return m
	}
	m.Failure = msg.Reason
	return m
}
