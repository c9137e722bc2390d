package state

// answered takes the answers to the study as it stands; those to an earlier one
// are dropped, since the right ones are on their way.
func (m Model) answered(msg Answered) (Model, []Effect) {
	if msg.Revision != m.Revision {
		return m, nil
	}
	m.Result, m.ResultRevision = msg.Result, msg.Revision
	m.Computing, m.Failure = false, ""
	if m.owed == "" {
		return m, nil
	}
	what := m.owed
	m.owed = ""
	return m.exported(what)
}

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
