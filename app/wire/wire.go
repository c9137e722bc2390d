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
	Checks = "checks" // list the evidence; one reply with Checks, nothing computed
	Check  = "check"  // compute the evidence named CheckID; one reply with one of Checks
)

// Request is what the interface asks.
type Request struct {
	ID      int          `json:"id"`
	Kind    string       `json:"kind"`
	Study   *study.Study `json:"study,omitempty"`
	CheckID string       `json:"checkId,omitempty"`
	Packed  bool         `json:"packed,omitempty"` // the reply may come as Pack has it
}

// Reply is what the engine answers. Failure is the engine's own bug in words;
// a study that cannot be used is no failure: its Result says so.
type Reply struct {
	ID      int           `json:"id"`
	Kind    string        `json:"kind"`
	Result  *study.Result `json:"result,omitempty"`
	Numbers *Numbers      `json:"numbers,omitempty"` // of Result, when it was asked for packed
	Checks  []Evidence    `json:"checks,omitempty"`
	Failure string        `json:"failure,omitempty"`
}

// Read reads a reply, packed or not.
func Read(text []byte) (Reply, error) {
	var r Reply
	if err := json.Unmarshal(text, &r); err != nil {
		return r, err
	}
	if r.Result == nil || r.Numbers == nil {
		return r, nil
	}
	whole, err := Unpack(*r.Result, *r.Numbers)
	r.Result, r.Numbers = &whole, nil
	return r, err
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
