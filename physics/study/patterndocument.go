package study

import (
	"strings"

	"brinefront/physics/pattern"
	"brinefront/physics/units"
)

// Pattern is how wells are repeated over the field, in place of one block between two.
type Pattern struct {
	Kind    string `json:"kind,omitempty"`    // see Patterns; empty: the block
	Spacing *Input `json:"spacing,omitempty"` // d of package pattern
	Row     *Input `json:"row,omitempty"`     // a of a line drive
	Corner  *Input `json:"corner,omitempty"`  // rate of a corner well over that of a side well of a nine-spot; nil: 1
	Tubes   *Input `json:"tubes,omitempty"`   // nil: usualTubes
}

// Patterns are the ways wells may be arranged. An inverted pattern has the injector in
// the middle.
var Patterns = []Choice{
	{"block", "block, flooded from end to end"},
	{string(pattern.FiveSpot), "five-spot"},
	{string(pattern.Direct), "line drive, direct"},
	{string(pattern.Staggered), "line drive, staggered"},
	{string(pattern.SevenSpot), "seven-spot, producer in the middle"},
	{inverted + string(pattern.SevenSpot), "inverted seven-spot, injector in the middle"},
	{string(pattern.NineSpot), "nine-spot, producer in the middle"},
	{inverted + string(pattern.NineSpot), "inverted nine-spot, injector in the middle"},
	{string(pattern.Radial), "radial, injector in the middle"},
}

const (
	inverted   = "inverted-"
	usualTubes = 24
)

// patternKind is the pattern of a study, and whether its hub produces; the kind is empty for a
// block.
func patternKind(st *Study) (kind pattern.Kind, hubProduces bool) {
	name := st.Field.Pattern.Kind
	if name == "" || name == "block" {
		return "", false
	}
	bare := pattern.Kind(strings.TrimPrefix(name, inverted))
	return bare, string(bare) == name && (bare == pattern.SevenSpot || bare == pattern.NineSpot)
}

func patterned(s *Study) bool { kind, _ := patternKind(s); return kind != "" }
func blocked(s *Study) bool   { return !patterned(s) }

func lineDrive(s *Study) bool {
	kind, _ := patternKind(s)
	return kind == pattern.Direct || kind == pattern.Staggered
}

func nineSpot(s *Study) bool { kind, _ := patternKind(s); return kind == pattern.NineSpot }

func tubed(s *Study) bool { kind, _ := patternKind(s); return kind != "" && kind != pattern.Radial }

var patternSpecs = []Spec{
	{Path: "field.pattern.spacing", Sheet: SheetField, Group: "Block", Label: "Distance of unlike wells", Symbol: "d", Quantity: units.Length, Min: 0, OpenMin: true, Max: 1e5, Help: "Injector to producer; between the rows of a line drive, to a side well of a nine-spot, to the outer circle of a radial flood.", at: func(s *Study) **Input { return &s.Field.Pattern.Spacing }, when: patterned},
	{Path: "field.pattern.row", Sheet: SheetField, Group: "Block", Label: "Distance of like wells in a row", Symbol: "a", Quantity: units.Length, Min: 0, OpenMin: true, Max: 1e6, at: func(s *Study) **Input { return &s.Field.Pattern.Row }, when: lineDrive},
	{Path: "field.pattern.corner", Sheet: SheetField, Group: "Block", Label: "Rate of a corner well over a side well's", Symbol: "Rc", Quantity: units.Number, Min: pattern.LeastRatio, Max: pattern.MostRatio, Optional: true, Default: "1", at: func(s *Study) **Input { return &s.Field.Pattern.Corner }, when: nineSpot},
	{Path: "field.pattern.tubes", Sheet: SheetField, Group: "Block", Label: "Streamtubes", Symbol: "Nt", Quantity: units.Number, Min: pattern.LeastTubes, Max: pattern.MostTubes, Optional: true, Default: "24", Help: "Of the part of the pattern whose mirror images make the whole.", at: func(s *Study) **Input { return &s.Field.Pattern.Tubes }, when: tubed},
}
