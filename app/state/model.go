// Package state is the interface without a screen: a model, the messages that
// change it, and a pure Update. It imports no syscall/js and runs natively, so
// everything the person can do is testable as a list of messages.
package state

import (
	"brinefront/app/wire"
	"brinefront/physics/paste"
	"brinefront/physics/study"
	"brinefront/physics/units"
)

// Model is everything the screen shows. Sheets read it and change nothing.
type Model struct {
	Study    study.Study // the last good document: what is computed with
	Revision int         // rises with every change of Study
	System   units.System

	Drafts   map[string]Draft  // what the person typed, by path, while it differs from the study; ends of a range at path+".low" and ".high"
	Messages map[string]string // what is wrong with an input and what is allowed, by path

	Result         study.Result // the newest part of each sheet: while Computing, some still answer what stood before
	Whole          study.Result // the last result that had come whole: what is printed and exported
	ResultRevision int          // the Study.Revision that Whole answers
	Computing      bool         // some part of the answer to Revision is still to come
	Failure        string       // the engine's own failure, a bug to report; empty otherwise

	// LastGood is the last answer of each sheet to inputs that stood before the step
	// under way: what is shown, marked, while the newest ones contradict each other.
	LastGood map[study.Sheet]study.Part

	// Former is the study that the present one took the place of as a whole, until it
	// is brought back or another takes its place; nil: none.
	Former *study.Study

	Route Route
	Paste *PasteDraft // a pasted table being looked at; nil: none

	CanUndo, CanRedo bool
	Saved            Saving
	Notices          []Notice // what happened outside the study: a refused file, a copied link
	Damaged          string   // a damaged autosave set aside, offered for download; empty: none

	Evidence []wire.Evidence // the published checks, in order
	Checking bool            // some of them are still to be computed

	answered   map[study.Sheet]bool // the sheets whose whole part answers Revision
	rows       map[string][]Row     // of the laboratory tables, see Rows
	history    history
	opened     *study.Study // the study as it was opened
	formerKept *study.Study // the former study that the browser keeps
	linked     bool         // the address holds the study that is open, untouched
	owed       string       // an export asked for while the answers to it were still being computed
	noticed    int          // the ID of the newest notice
}

// Draft is a text as typed and the unit chosen beside it.
type Draft struct{ Text, Unit string }

// Route is where the person is.
type Route struct {
	Sheet string // "rock", "front", "field", "grid", "compare", "match", "report", "evidence"
	Embed bool   // one sheet without the frame
}

// PasteDraft is a pasted text and how it was read.
type PasteDraft struct {
	Table   string // path of the table it is for
	Text    string
	Reading paste.Reading
}

// Saving says how the autosave stands.
type Saving struct {
	Done   bool
	Reason string // why it could not be kept; empty otherwise
}

// Notice is a sentence for the person, until dismissed.
type Notice struct {
	ID    int
	Level string // "done", "refused"
	Text  string
}
