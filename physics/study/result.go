package study

import (
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// Sheet names the part of the job a result belongs to.
type Sheet string

const (
	SheetRock  Sheet = "rock"
	SheetFront Sheet = "front"
	SheetField Sheet = "field"
	SheetGrid  Sheet = "grid"

	// SheetSoak is rock that takes water up by itself; a result has it only when the
	// study has a capillary pressure.
	SheetSoak Sheet = "soak"

	// SheetMatch moves inputs until the forecast follows the measured history; a result
	// has it only when the study asks for it.
	SheetMatch Sheet = "match"

	// SheetCompare sets the cases of a study beside it; a result has it only when
	// the study has cases.
	SheetCompare Sheet = "compare"
)

// Result is everything that one evaluation of a study yields, in SI.
type Result struct {
	Problems []Problem      `json:"problems"` // inputs that cannot be used; every one of them, once
	Parts    map[Sheet]Part `json:"parts"`
}

// Part is the result of one sheet.
type Part struct {
	Status   Status    `json:"status"`
	Problems []Problem `json:"problems,omitempty"` // of the inputs that this sheet reads
	// Left is the share of the computation that is still to come, of a part that is
	// shown while it grows; 0: it is whole.
	Left    float64  `json:"left,omitempty"`
	Missing []string `json:"missing"` // paths of inputs still to be given before this sheet can answer
	Answer  []Phrase `json:"answer"`  // the answer as a sentence
	Figures []Figure `json:"figures"`
	Charts  []Chart  `json:"charts"`
	Tables  []Grid   `json:"tables"`
	Notes   []Note   `json:"notes"`
}

// Status says whether a sheet could answer.
type Status string

const (
	Ready   Status = "ready"
	Waiting Status = "waiting" // an input is missing
	Refused Status = "refused" // an input cannot be used
	Stopped Status = "stopped" // the numerics stopped short; the answer so far is shown and marked
)

// Problem is an input that cannot be used: what was read and what is allowed.
type Problem struct {
	Path    string `json:"path"`
	Read    string `json:"read"`
	Allowed string `json:"allowed"`
}

// Note is lawful but doubtful physics.
type Note struct {
	ID    string   `json:"id"`
	Text  string   `json:"text"`  // what was found
	Cause string   `json:"cause"` // why it matters
	Do    string   `json:"do"`    // what to do about it
	Level string   `json:"level"` // "caution" or "remark"
	Paths []string `json:"paths"` // the inputs it is about
}

// Phrase is a piece of the answer sentence: plain text, or a figure printed in place.
type Phrase struct {
	Text   string `json:"text,omitempty"`
	Figure string `json:"figure,omitempty"` // ID of a figure of the same sheet
}

// Figure is a number with its working.
type Figure struct {
	ID       string         `json:"id"`
	Label    string         `json:"label"`
	Symbol   string         `json:"symbol"`
	Value    float64        `json:"value"` // SI
	Quantity units.Quantity `json:"quantity"`
	Strip    bool           `json:"strip"` // shown on the answer strip
	Working  Working        `json:"working"`
}

// Working says how a figure was obtained.
type Working struct {
	Formula string   `json:"formula"` // with {symbols} in braces, e.g. "{tbt} = {Qbt} {phi} {L} {A} / {q}"
	Terms   []Term   `json:"terms"`   // the numbers that go in, one a symbol
	Method  string   `json:"method"`  // in words, where a formula alone does not say it
	Sources []ref.ID `json:"sources"`
	Inputs  []string `json:"inputs"` // paths of the study's inputs it rests on
}

// Term is one symbol of a formula and its value.
type Term struct {
	Symbol   string         `json:"symbol"`
	Label    string         `json:"label"`
	Value    float64        `json:"value"` // SI
	Quantity units.Quantity `json:"quantity"`
}

// Chart is a picture as data, in SI.
type Chart struct {
	ID      string `json:"id"`
	Title   string `json:"title"`
	X       Axis   `json:"x"`
	Y       Axis   `json:"y"`
	Lines   []Line `json:"lines"`
	Marks   []Mark `json:"marks"`
	Summary string `json:"summary"` // the text alternative: what a reader should see in the picture

	Slider *Slider `json:"slider,omitempty"` // present when some line is Moving or has Stages
	Map    bool    `json:"map,omitempty"`    // X and Y are drawn to one scale: both are lengths, of one unit
}

// Slider is a variable that the reader moves to move the chart's Moving lines, and those
// of Stages. A picture of Moving lines is self-similar: every state sits at a place in
// proportion to the variable.
type Slider struct {
	Label    string         `json:"label"`
	Symbol   string         `json:"symbol"`
	Quantity units.Quantity `json:"quantity"`
	Min      float64        `json:"min"` // SI, all of them
	Max      float64        `json:"max"`
	Value    float64        `json:"value"` // where it stands at first, and in print
	Marks    []Mark         `json:"marks"` // labelled values of the variable, in X; Y is 0
	// Root says that places go with the root of the variable: a point of a Moving line
	// is then given for a root of one unit (SI).
	Root bool `json:"root,omitempty"`
}

// Axis describes one axis of a chart.
type Axis struct {
	Label    string         `json:"label"`
	Symbol   string         `json:"symbol"`
	Quantity units.Quantity `json:"quantity"`
	Log      bool           `json:"log"` // log scale at first; the reader may switch when CanLog
	CanLog   bool           `json:"canLog"`
	Min      *float64       `json:"min,omitempty"` // SI; nil: fitted to the data
	Max      *float64       `json:"max,omitempty"`
}

// Line is one series of a chart.
type Line struct {
	ID    string    `json:"id"`
	Label string    `json:"label"` // written on the line
	Role  string    `json:"role"`  // "water", "oil", "total", "aid", "time1".."time5": decides the colour
	Kind  string    `json:"kind"`  // "line", "dashed", "points", "band"
	X     []float64 `json:"x"`
	Y     []float64 `json:"y"`
	Low   []float64 `json:"low,omitempty"` // band only: lower edge, Y is the upper

	// Moving says that X is given for one unit (SI) of the chart's Slider: a point is
	// drawn at X times the slider's value. Points beyond the X axis' Max are clipped,
	// with the line cut where it crosses; beyond its last point the line is carried on
	// to Max at its last Y.
	Moving bool `json:"moving,omitempty"`
	// Stages says that the line changes its shape: for each value of the chart's Slider,
	// which has no Root, that stands here (SI, rising), X and Y hold one course of it, as many points each, one
	// course after the other. Between two stages every point goes straight.
	Stages []float64 `json:"stages,omitempty"`
	// Readings are further quantities at each point of the line, read out beside X and
	// Y: each column has as many Values as the line has points; NaN never stands there.
	// A point at which a reading does not exist has an entry in Words instead (then all
	// points have one: "" where the value counts).
	Readings []Column `json:"readings,omitempty"`
}

// Mark is a labelled point of a chart.
type Mark struct {
	Label string  `json:"label"`
	X     float64 `json:"x"`
	Y     float64 `json:"y"`
}

// Grid is a table of results, one column a quantity.
type Grid struct {
	ID      string   `json:"id"`
	Title   string   `json:"title"`
	Columns []Column `json:"columns"`
}

// Column is one column of a Grid. A column holds numbers, or words, or both: then a
// word that is not empty stands instead of its number. The quantity of words alone is
// units.Number.
type Column struct {
	Label    string         `json:"label"`
	Symbol   string         `json:"symbol"`
	Quantity units.Quantity `json:"quantity"`
	Values   []float64      `json:"values,omitempty"` // SI
	Words    []string       `json:"words,omitempty"`
}
