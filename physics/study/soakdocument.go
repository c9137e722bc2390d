package study

import "brinefront/physics/units"

// Soak is rock that takes water up by capillary pressure alone, through one open face.
type Soak struct {
	Flow string `json:"flow,omitempty"` // see SoakFlows; empty: counter-current

	Ratio   *Input `json:"ratio,omitempty"`   // R, total flux over that of water at the face, of a mixed flow
	Initial *Input `json:"initial,omitempty"` // nil: the initial water of the flood
	Inlet   *Input `json:"inlet,omitempty"`   // nil: where the capillary pressure is zero
	Length  *Input `json:"length,omitempty"`  // open face to far boundary
	Time    *Input `json:"time,omitempty"`    // nil: until the far boundary is met
}

// The flows of a Soak.
const (
	counterCurrent = "counter"
	coCurrent      = "co"
	mixedCurrent   = "mixed"
)

// SoakFlows are the ways for oil to leave rock that soaks.
var SoakFlows = []Choice{
	{counterCurrent, "counter-current: at the open face"},
	{coCurrent, "co-current: ahead of the water"},
	{mixedCurrent, "both ways, by a ratio"},
}

var soakSpecs = []Spec{
	{Path: "soak.ratio", Sheet: SheetSoak, Group: "Flow", Label: "Total flux over that of water at the face", Symbol: "R", Quantity: units.Number, Min: 0, Max: 1, Help: "0: counter-current; 1: co-current.",
		at: func(s *Study) **Input { return &s.Soak.Ratio }, when: func(s *Study) bool { return withCapillary(s) && s.Soak.Flow == mixedCurrent }},
	{Path: "soak.initial", Sheet: SheetSoak, Group: "States", Label: "Water saturation at the start", Symbol: "Swi,s", Quantity: units.Fraction, Min: 0, Max: 1, Optional: true, Default: "that of the flood",
		at: func(s *Study) **Input { return &s.Soak.Initial }, when: withCapillary},
	{Path: "soak.inlet", Sheet: SheetSoak, Group: "States", Label: "Water saturation at the open face", Symbol: "Sw0", Quantity: units.Fraction, Min: 0, Max: 1, Optional: true, Default: "where capillary pressure is zero",
		at: func(s *Study) **Input { return &s.Soak.Inlet }, when: withCapillary},
	{Path: "soak.length", Sheet: SheetSoak, Group: "Block", Label: "Depth, open face to far boundary", Symbol: "Ls", Quantity: units.Length, Min: 0, OpenMin: true, Max: 1e4, Help: "Half the thickness of a block that is open on two sides.",
		at: func(s *Study) **Input { return &s.Soak.Length }, when: withCapillary},
	{Path: "soak.time", Sheet: SheetSoak, Group: "Block", Label: "Time asked about", Symbol: "ts", Quantity: units.Duration, Min: 0, OpenMin: true, Max: 1e12, Optional: true, Default: "when the water meets the far boundary",
		at: func(s *Study) **Input { return &s.Soak.Time }, when: withCapillary},
}
