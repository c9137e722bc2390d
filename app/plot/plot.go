// Package plot describes pictures as plain data in display units. A script in
// web is the only place that knows the drawing library.
package plot

// Picture is a chart ready to draw: numbers in display units, no SI left.
type Picture struct {
	ID      string `json:"id"`
	Title   string `json:"title"`
	X       Axis   `json:"x"`
	Y       Axis   `json:"y"`
	Lines   []Line `json:"lines"`
	Marks   []Mark `json:"marks"`
	Summary string `json:"summary"` // text alternative

	Slider *Slider `json:"slider,omitempty"`
	Map    bool    `json:"map,omitempty"` // both axes have one scale
}

// Slider is the variable that moves the moving lines.
type Slider struct {
	Label string  `json:"label"`
	Short string  `json:"short"` // symbol
	Unit  string  `json:"unit"`
	Min   float64 `json:"min"`
	Max   float64 `json:"max"`
	Value float64 `json:"value"` // where it stands at first
	Stops []Stop  `json:"stops"`
	Root  bool    `json:"root,omitempty"` // places go with its root
}

// Stop is a labelled value of a slider.
type Stop struct {
	Label string  `json:"label"`
	At    float64 `json:"at"`
}

// Axis is one axis of a picture.
type Axis struct {
	Title  string   `json:"title"` // with symbol and unit, e.g. "Oil rate at surface, qo (bbl/d)"
	Short  string   `json:"short"` // symbol for the hover read-out, e.g. "qo"
	Unit   string   `json:"unit"`
	Log    bool     `json:"log"`
	CanLog bool     `json:"canLog"`
	Min    *float64 `json:"min,omitempty"`
	Max    *float64 `json:"max,omitempty"`
}

// Line is one series.
type Line struct {
	ID    string       `json:"id"`
	Label string       `json:"label"`
	Role  string       `json:"role"` // see study.Line
	Kind  string       `json:"kind"` // "line", "dashed", "points", "band"
	Data  [][2]float64 `json:"data"`
	Low   [][2]float64 `json:"low,omitempty"` // band only

	Moving   bool      `json:"moving,omitempty"`   // x is given for one unit of the slider, unless there are stages; see study.Line
	Stages   []float64 `json:"stages,omitempty"`   // of the slider: one course after the other in Data; see study.Line
	Readings []Reading `json:"readings,omitempty"` // further numbers of each point
}

// Reading is one further quantity along a line. A point has its value, or a word
// where it has none.
type Reading struct {
	Label  string    `json:"label"`
	Short  string    `json:"short"`
	Unit   string    `json:"unit"`
	Values []float64 `json:"values"`
	Words  []string  `json:"words,omitempty"`
}

// Mark is a labelled point.
type Mark struct {
	Label string  `json:"label"`
	X     float64 `json:"x"`
	Y     float64 `json:"y"`
}
