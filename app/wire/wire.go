// Package wire is what the interface and the engine say to each other: one JSON
// text per request and one or more per reply.
package wire

import "brinefront/physics/study"

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
}

// Reply is what the engine answers. Failure is the engine's own bug in words;
// a study that cannot be used is no failure: its Result says so.
type Reply struct {
	ID      int           `json:"id"`
	Kind    string        `json:"kind"`
	Result  *study.Result `json:"result,omitempty"`
	Checks  []Evidence    `json:"checks,omitempty"`
	Failure string        `json:"failure,omitempty"`
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
