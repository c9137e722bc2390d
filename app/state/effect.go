package state

import "brinefront/physics/study"

// Effect is something Update wants done outside. The runner carries it out and
// reports back with a message.
type Effect interface{ effect() }

type (
	// Run evaluates a study, the sheet First before the others; replies Answered, once
	// or more often, or EngineFailed. Under the same Revision as before, only what is
	// still to come is computed.
	Run struct {
		Revision int
		Study    study.Study
		First    study.Sheet
	}
	// Keep writes the autosave; replies Kept or NotKept.
	Keep struct{ Study study.Study }
	// KeepFormer keeps the study that the one open took the place of, in place of the
	// one kept so before; nil: none any more. Replies Told when that fails.
	KeepFormer struct{ Study *study.Study }
	// SetAside stores a damaged autosave under another key, never overwriting.
	SetAside struct{ Text string }
	// Download hands a file to the person.
	Download struct{ Name, Mime, Data string }
	// PickFile opens the file picker; replies FileChosen or FileRefused.
	PickFile struct{}
	// Go changes the address without loading anything.
	Go struct{ Fragment string }
	// CopyLink puts the page's address with a fragment on the clipboard; replies
	// Told with Done when it is there.
	CopyLink struct{ Fragment, Done string }
	// Print opens the print dialogue once nothing is pending.
	Print struct{}
	// ListEvidence asks for the checks; replies EvidenceListed.
	ListEvidence struct{}
	// CheckEvidence computes one check; replies EvidenceDone.
	CheckEvidence struct{ ID string }
)

func (Run) effect()           {}
func (Keep) effect()          {}
func (KeepFormer) effect()    {}
func (SetAside) effect()      {}
func (Download) effect()      {}
func (PickFile) effect()      {}
func (Go) effect()            {}
func (CopyLink) effect()      {}
func (Print) effect()         {}
func (ListEvidence) effect()  {}
func (CheckEvidence) effect() {}
