package state

import (
	"brinefront/app/wire"
	"brinefront/physics/study"
)

// Msg is something that happened. Update is the only thing that acts on it.
type Msg interface{ message() }

type (
	// Edited: a numeric input's text or unit changed. Cells of the table have
	// paths too: "rock.table.<row>.<sw|krw|kro>".
	Edited struct{ Path, Text, Unit string }
	// Left: a field that was typed in lost the keyboard. What is typed next is a
	// step of its own, and what is in use then is the last good value.
	Left struct{}
	// Sourced: the source note of an input changed (the tables included).
	Sourced struct{ Path, Text string }
	// Ranged: the optional range of an input changed.
	Ranged struct{ Path, Low, High string }
	// Chosen: an enumerated field changed: "system", "rock.reference",
	// "rock.curve", "rock.weights", "field.drive", "field.limit".
	Chosen struct{ Path, Value string }
	// Written: a text field changed: "title", "author", "note", "field.start".
	Written struct{ Path, Text string }

	// MatchTaken puts what the match found in the place of the inputs it moved.
	MatchTaken struct{}

	// RowAdded adds an empty row to a table after row After (-1: first).
	RowAdded struct {
		Table string // path
		After int
	}
	// RowRemoved removes a row of a table.
	RowRemoved struct {
		Table string
		Row   int
	}

	// CaseAdded adds a case at the end; without a name it gets a number.
	CaseAdded struct{ Name string }
	// CaseRemoved takes a case away.
	CaseRemoved struct{ Index int }
	// CaseNamed: the text in a case's name field changed.
	CaseNamed struct {
		Index int
		Text  string
	}
	// CaseInputSet: the text or unit of an input that a case changes; for an input
	// that it does not change yet, it begins to.
	CaseInputSet struct {
		Index            int
		Path, Text, Unit string
	}
	// CaseChosen: a choice that a case makes, of study.CaseChoices.
	CaseChosen struct {
		Index       int
		Path, Value string
	}
	// CaseInputRemoved leaves an input or a choice to the base again.
	CaseInputRemoved struct {
		Index int
		Path  string
	}

	// Pasted: a text was pasted where a table is expected.
	Pasted struct{ Table, Text string }
	// PasteMapped: the person says what a column of the pasted table is:
	// one of the table's, "so" or "" for none.
	PasteMapped struct {
		Column int
		As     string
	}
	PasteAccepted struct{} // use the table as previewed
	PasteDropped  struct{} // forget it

	Undone struct{}
	Redone struct{}

	StartedEmpty struct{}                      // a new, empty study
	DemoOpened   struct{ Which string }        // an invented demonstration study: see study.DemoOf; empty: the first
	FileChosen   struct{ Name, Data string }   // a study file was picked or dropped
	FileRefused  struct{ Name, Reason string } // the file could not even be read
	OpenAsked    struct{}
	SaveAsked    struct{}
	ShareAsked   struct{}
	PrintAsked   struct{}
	ExportAsked  struct{ What string } // "report-text", "charts-csv", "tables-csv", "damaged"

	Routed   struct{ Fragment string } // the address changed
	Restored struct{ Text string }     // what the browser had kept; empty: nothing
	// FormerFound: the browser had kept the study before the one restored.
	FormerFound struct{ Text string }
	BroughtBack struct{} // open the former study again
	Kept        struct{} // the autosave is written
	NotKept     struct{ Reason string }

	// Answered: parts of the answer to a study have come; More of them are to come, or
	// these were the last.
	Answered struct {
		Revision int
		Parts    map[study.Sheet]study.Part
		More     bool
	}
	EngineFailed struct {
		Revision int
		Reason   string
	}

	EvidenceAsked  struct{}
	EvidenceListed struct{ Checks []wire.Evidence }
	EvidenceDone   struct{ Check wire.Evidence }

	Told      struct{ Level, Text string } // an effect reports back
	Dismissed struct{ Notice int }
)

func (Edited) message()           {}
func (Left) message()             {}
func (Sourced) message()          {}
func (Ranged) message()           {}
func (Chosen) message()           {}
func (Written) message()          {}
func (MatchTaken) message()       {}
func (RowAdded) message()         {}
func (RowRemoved) message()       {}
func (CaseAdded) message()        {}
func (CaseRemoved) message()      {}
func (CaseNamed) message()        {}
func (CaseInputSet) message()     {}
func (CaseChosen) message()       {}
func (CaseInputRemoved) message() {}
func (Pasted) message()           {}
func (PasteMapped) message()      {}
func (PasteAccepted) message()    {}
func (PasteDropped) message()     {}
func (Undone) message()           {}
func (Redone) message()           {}
func (StartedEmpty) message()     {}
func (DemoOpened) message()       {}
func (FileChosen) message()       {}
func (FileRefused) message()      {}
func (OpenAsked) message()        {}
func (SaveAsked) message()        {}
func (ShareAsked) message()       {}
func (PrintAsked) message()       {}
func (ExportAsked) message()      {}
func (Routed) message()           {}
func (Restored) message()         {}
func (FormerFound) message()      {}
func (BroughtBack) message()      {}
func (Kept) message()             {}
func (NotKept) message()          {}
func (Answered) message()         {}
func (EngineFailed) message()     {}
func (EvidenceAsked) message()    {}
func (EvidenceListed) message()   {}
func (EvidenceDone) message()     {}
func (Told) message()             {}
func (Dismissed) message()        {}
