package state

import (
	"slices"

	"brinefront/app/wire"
)

// evidenceAsked has the checks listed and then computed one by one, so that the
// screen stays alive and answers to the study come in between.
func (m Model) evidenceAsked() (Model, []Effect) {
	if m.Checking {
		return m, nil
	}
	m.Checking = true
	return m, []Effect{ListEvidence{}}
}

func (m Model) evidenceListed(msg EvidenceListed) (Model, []Effect) {
	m.Evidence = msg.Checks
	return m.checkNext()
}

// evidenceDone takes a computed check into the list. One that failed keeps what
// was stated about it.
func (m Model) evidenceDone(msg EvidenceDone) (Model, []Effect) {
	i := slices.IndexFunc(m.Evidence, func(e wire.Evidence) bool { return e.ID == msg.Check.ID })
	if i < 0 {
		return m, nil
	}
	m.Evidence = slices.Clone(m.Evidence)
	if msg.Check.Failure != "" {
		m.Evidence[i].Failure = msg.Check.Failure
	} else {
		m.Evidence[i] = msg.Check
	}
	m.Evidence[i].Done = true
	return m.checkNext()
}

// checkNext computes the first check that is not computed yet.
func (m Model) checkNext() (Model, []Effect) {
	if !m.Checking {
		return m, nil
	}
	i := slices.IndexFunc(m.Evidence, func(e wire.Evidence) bool { return !e.Done })
	if i < 0 {
		m.Checking = false
		return m, nil
	}
	return m, []Effect{CheckEvidence{m.Evidence[i].ID}}
}
