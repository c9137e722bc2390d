package study

import (
	"slices"

	"brinefront/physics/fluid"
)

// Choice is one value an enumerated field may take, and how it is called on screen.
type Choice struct{ Value, Label string }

// References are the permeabilities that kr may refer to.
var References = []Choice{
	{"absolute", "absolute permeability"},
	{"oil", "oil permeability at initial water, ko(Swi)"},
}

// CurveKinds are the curves a study may use.
var CurveKinds = []Choice{
	{"table", "laboratory points, monotone cubic"},
	{"table-linear", "laboratory points, straight lines"},
	{"corey-fit", "Corey, fitted to the points"},
	{"let-fit", "LET, fitted to the points"},
	{"corey", "Corey, typed"},
	{"let", "LET, typed"},
}

// Weightings are the ways a fit weighs the points.
var Weightings = []Choice{
	{"relative", "relative: small values count as much as large ones"},
	{"absolute", "absolute: large values dominate"},
}

// FitEnds are the ways a fit finds Swc and Sor.
var FitEnds = []Choice{
	{"table", "first and last row of the table"},
	{freeEnds, "fitted with the rest"},
}

const freeEnds = "free"

// Pairs are the pairs of phases of which one displaces the other.
var Pairs = func() []Choice {
	var list []Choice
	for _, p := range fluid.Pairs() {
		list = append(list, Choice{string(p.ID), p.Name})
	}
	return list
}()

// Endings are the ways to say how much of a resident phase that is trapped stays.
var Endings = []Choice{
	{"curve", "where the curve ends"},
	{byLand, "by Land's law, the curve stretched to it"},
}

const byLand = "land"

// Drives are the ways the flood is driven.
var Drives = []Choice{
	{"rate", "constant injection rate"},
	{"pressure", "constant pressure difference"},
}

// Limits are the ways a flood stops paying.
var Limits = []Choice{
	{"waterCut", "water cut at surface"},
	{"oilRate", "oil rate at surface"},
	{"cash", "net cash of prices and costs"},
}

// Systems are the unit systems a study may be shown in.
var Systems = []Choice{
	{"field", "field units"},
	{"metric", "metric units"},
	{"lab", "laboratory units"},
}

// choiceField is an enumerated field of the document.
type choiceField struct {
	path string
	list []Choice
	at   func(*Study) *string
}

var choiceFields = []choiceField{
	{"system", Systems, func(s *Study) *string { return &s.System }},
	{"rock.reference", References, func(s *Study) *string { return &s.Rock.Reference }},
	{"rock.curve", CurveKinds, func(s *Study) *string { return &s.Rock.Curve }},
	{"rock.weights", Weightings, func(s *Study) *string { return &s.Rock.Weights }},
	{"rock.ends", FitEnds, func(s *Study) *string { return &s.Rock.Ends }},
	{"rock.capillary.curve", PcKinds, func(s *Study) *string { return &s.Rock.Capillary.Curve }},
	{"rock.capillary.at", PcConditions, func(s *Study) *string { return &s.Rock.Capillary.At }},
	{"rock.capillary.ends", PcEnds, func(s *Study) *string { return &s.Rock.Capillary.Ends }},
	{"rock.capillary.weights", Weightings, func(s *Study) *string { return &s.Rock.Capillary.Weights }},
	{"rock.capillary.unit", PcUnits, func(s *Study) *string { return &s.Rock.Capillary.Unit }},
	{"fluids.pair", Pairs, func(s *Study) *string { return &s.Fluids.Pair }},
	{"front.ending", Endings, func(s *Study) *string { return &s.Front.Ending }},
	{"front.rider.kind", Riders, func(s *Study) *string { return &s.Front.Rider.Kind }},
	{"soak.flow", SoakFlows, func(s *Study) *string { return &s.Soak.Flow }},
	{"block.shape", BlockShapes, func(s *Study) *string { return &s.Block.Shape }},
	{"block.plug.shape", PlugShapes, func(s *Study) *string { return &s.Block.Plug.Shape }},
	{"field.drive", Drives, func(s *Study) *string { return &s.Field.Drive }},
	{"field.pattern.kind", Patterns, func(s *Study) *string { return &s.Field.Pattern.Kind }},
	{"field.limit", Limits, func(s *Study) *string { return &s.Field.Limit }},
	{"field.layers.crossflow", Crossflows, func(s *Study) *string { return &s.Field.Layers.Crossflow }},
	{"match.run", MatchRuns, func(s *Study) *string { return &s.Match.Run }},
	{"match.first", Matchable, func(s *Study) *string { return &s.Match.First }},
	{"match.second", Matchable, func(s *Study) *string { return &s.Match.Second }},
	{"match.third", Matchable, func(s *Study) *string { return &s.Match.Third }},
	{"match.fourth", Matchable, func(s *Study) *string { return &s.Match.Fourth }},
	{"grid.scheme", Schemes, func(s *Study) *string { return &s.Grid.Scheme }},
}

// usual is a study in which every choice stands at the first of its list.
func usual() Study {
	var st Study
	for _, f := range choiceFields {
		*f.at(&st) = f.list[0].Value
	}
	return st
}

// Choices lists what the enumerated field at a path may hold; nil when the path
// holds no enumeration.
func Choices(path string) []Choice {
	for _, f := range choiceFields {
		if f.path == path {
			return f.list
		}
	}
	return nil
}

// Choose sets the enumerated field at a path; false when there is no such field
// or it may not hold the value, and then nothing is changed.
func Choose(st *Study, path, value string) bool {
	for _, f := range choiceFields {
		if f.path == path && holds(f.list, value) {
			*f.at(st) = value
			return true
		}
	}
	return false
}

func holds(list []Choice, value string) bool {
	return slices.ContainsFunc(list, func(c Choice) bool { return c.Value == value })
}
