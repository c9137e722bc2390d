package state

import (
	"brinefront/physics/study"
)

// New is what a first visitor sees: the demonstration study, not yet computed.
func New() Model {
	m := Model{Route: Route{Sheet: firstSheet}}
	m, _ = m.show(fresh(study.Demo()))
	return m
}

// Update acts on a message: the model afterwards, and what should be done outside.
// It changes nothing that the model before holds.
func Update(m Model, msg Msg) (Model, []Effect) {
	switch msg := msg.(type) {
	case Edited:
		return m.edited(msg)
	case Left:
		m.history.key = ""
		return m, nil
	case Sourced:
		return m.sourced(msg)
	case Ranged:
		return m.ranged(msg)
	case Chosen:
		return m.chosen(msg)
	case Written:
		return m.written(msg)
	case MatchTaken:
		return m.matchTaken()
	case RowAdded:
		return m.rowAdded(msg)
	case RowRemoved:
		return m.rowRemoved(msg)
	case CaseAdded:
		return m.caseAdded(msg)
	case CaseRemoved:
		return m.caseRemoved(msg)
	case CaseNamed:
		return m.caseNamed(msg)
	case CaseInputSet:
		return m.caseInputSet(msg)
	case CaseChosen:
		return m.caseChosen(msg)
	case CaseInputRemoved:
		return m.caseInputRemoved(msg)
	case Pasted:
		return m.pasted(msg), nil
	case PasteMapped:
		return m.pasteMapped(msg), nil
	case PasteAccepted:
		return m.pasteAccepted()
	case PasteDropped:
		m.Paste = nil
		return m, nil
	case Undone:
		return m.undo()
	case Redone:
		return m.redo()
	case StartedEmpty:
		return m.started(study.Empty(), "A new, empty study is open. Undo brings back the one before.")
	case DemoOpened:
		return m.started(study.DemoOf(msg.Which), "The demonstration study is open. Undo brings back the one before.")
	case FileChosen:
		return m.fileChosen(msg)
	case FileRefused:
		return m.notice("refused", msg.Reason), nil
	case OpenAsked:
		return m, []Effect{PickFile{}}
	case SaveAsked:
		return m.saved()
	case ShareAsked:
		return m.shared()
	case PrintAsked:
		return m, []Effect{Print{}}
	case ExportAsked:
		return m.exported(msg.What)
	case Routed:
		return m.routed(msg)
	case Restored:
		return m.restored(msg)
	case FormerFound:
		return m.formerFound(msg), nil
	case BroughtBack:
		return m.broughtBack()
	case Kept:
		m.Saved = Saving{Done: true}
		return m, nil
	case NotKept:
		m.Saved = Saving{Reason: msg.Reason}
		return m, nil
	case Answered:
		return m.answeredBy(msg)
	case EngineFailed:
		return m.engineFailed(msg), nil
	case EvidenceAsked:
		return m.evidenceAsked()
	case EvidenceListed:
		return m.evidenceListed(msg)
	case EvidenceDone:
		return m.evidenceDone(msg)
	case Told:
		return m.notice(msg.Level, msg.Text), nil
	case Dismissed:
		return m.dismissed(msg), nil
	}
	return m, nil
}
