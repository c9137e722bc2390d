// Package wire is what the interface and the engine say to each other: one JSON
// text per request and one or more per reply.
package wire

import (
	"encoding/json"

	"brinefront/physics/study"
)

// Kinds of request.
const (
	Run    = "run"    // evaluate Study; one reply with Result
	Pieces = "pieces" // evaluate Study, the sheet First before the others; replies with Pieces, More in all but the last. A newer request of this kind makes an end of it
	Checks = "checks" // list the evidence; one reply with Checks, nothing computed
	Check  = "check"  // compute the evidence named CheckID; one reply with one of Checks
)

// Request is what the interface asks.
type Request struct {
	ID      int          `json:"id"`
	Kind    string       `json:"kind"`
	Study   *study.Study `json:"study,omitempty"` // none in a request for pieces: go on with the study of the last one
	First   study.Sheet  `json:"first,omitempty"`
	CheckID string       `json:"checkId,omitempty"`
}

// Reply is what the engine answers. Failure is the engine's own bug in words;
// a study that cannot be used is no failure: its Result says so.
type Reply struct {
	ID      int           `json:"id"`
	Kind    string        `json:"kind"`
	Result  *study.Result `json:"result,omitempty"`
	Pieces  []Piece       `json:"pieces,omitempty"`
	More    bool          `json:"more,omitempty"` // another reply follows
	Checks  []Evidence    `json:"checks,omitempty"`
	Failure string        `json:"failure,omitempty"`
}

// Piece is the part of one sheet.
type Piece struct {
	Sheet   study.Sheet `json:"sheet"`
	Part    *study.Part `json:"part,omitempty"` // nil: as it was last sent by this engine
	Numbers Numbers     `json:"numbers,omitzero"`
}

// Read reads a reply and puts the numbers of its pieces in their places.
func Read(text []byte) (Reply, error) {
	var r Reply
	if err := json.Unmarshal(text, &r); err != nil {
		return r, err
	}
	for i, piece := range r.Pieces {
		if piece.Part == nil {
			continue
		}
		whole, err := Unpack(*piece.Part, piece.Numbers)
		if err != nil {
			return r, err
		}
		r.Pieces[i].Part, r.Pieces[i].Numbers = &whole, Numbers{}
	}
	return r, nil
}

// Evidence is one published check, computed or not yet.
type Evidence struct {
	ID         string `json:"id"`
	Topic      string `json:"topic"`
	Title      string `json:"title"`
	Source     string `json:"source"`
	Provenance string `json:"provenance"` // "read", "from memory", "independent computation, two methods"
	Inputs     string `json:"inputs"`     // in words
	How        string `json:"how"`        // how it is computed here
	Items      []Item `json:"items"`
	Done       bool   `json:"done"`
	Failure    string `json:"failure,omitempty"`
}

// Item is one published value beside the computed one.
type Item struct {
	Label     string  `json:"label"`
	Published float64 `json:"published"`
	Computed  float64 `json:"computed"`
	Tolerance float64 `json:"tolerance"` // absolute
	Why       string  `json:"why"`       // why this tolerance
	Pass      bool    `json:"pass"`
}
