package study

import (
	"math"
	"strconv"
	"strings"
	"time"

	"brinefront/physics/units"
)

// Limits of a document's size: far above any honest study, low enough that a
// wrong file is refused at once.
const (
	MaxBytes = 4 << 20 // of a study file
	MaxRows  = 20000   // of the laboratory table
	MaxNote  = 10000   // characters of the study's note
	MaxText  = 1000    // characters of every other text
)

// Check says whether a number, written in a unit, may be given for an input:
// nil when it may. The message speaks in the unit that was typed.
//
// Special cases are:
//
//	NaN or infinite: refused
//	a unit of another quantity: refused, with the units that are known
func Check(spec Spec, number float64, unit units.Unit) *Problem {
	if unit.Quantity != spec.Quantity {
		return &Problem{Path: spec.Path, Read: "the unit " + quoted(unit.Symbol), Allowed: knownUnits(spec.Quantity)}
	}
	least, most := unit.FromSI(spec.Min), unit.FromSI(spec.Max) // as the schema and messages tell them
	low := number > least || (number == least && !spec.OpenMin)
	high := number < most || (number == most && !spec.OpenMax)
	if low && high && !math.IsInf(number, 0) {
		return nil
	}
	return &Problem{Path: spec.Path, Read: withUnit(units.Exact(number), unit), Allowed: allowed(spec, unit)}
}

// CheckSpread says whether the optional range of an input may be given: both
// ends lawful for the input, and in order.
func CheckSpread(spec Spec, in Input) *Problem {
	unit, ok := units.Find(spec.Quantity, in.Unit)
	if !ok {
		return &Problem{Path: spec.Path, Read: "the unit " + quoted(in.Unit), Allowed: knownUnits(spec.Quantity)}
	}
	for _, end := range []*float64{in.Low, in.High} {
		if end == nil {
			continue
		}
		if p := Check(spec, *end, unit); p != nil {
			return p
		}
	}
	if in.Low != nil && in.High != nil && *in.Low > *in.High {
		return &Problem{Path: spec.Path, Read: "a range from " + units.Exact(*in.Low) + " to " + units.Exact(*in.High), Allowed: "a range that runs from the lower to the higher value"}
	}
	return nil
}

// CheckStart says whether a text may be the first day of injection: empty, or a
// day of the calendar between the years 1900 and 2200.
func CheckStart(text string) *Problem {
	if text == "" {
		return nil
	}
	day, err := time.Parse(time.DateOnly, text)
	if err == nil && day.Year() >= 1900 && day.Year() <= 2200 {
		return nil
	}
	return &Problem{Path: "field.start", Read: quoted(text), Allowed: "a day written as year-month-day between 1900 and 2200, e.g. 2027-03-01, or nothing"}
}

// TextLimit is the largest number of characters that the text at a path may have.
func TextLimit(path string) int {
	if path == "note" {
		return MaxNote
	}
	if path == layerTable.path || path == scheduleTable.path || path == historyTable.path || path == sizeTable.path {
		return maxTableText
	}
	if _, inner, ok := AtCase(path); ok && inner == "name" {
		return MaxCaseName
	}
	return MaxText
}

func allowed(spec Spec, unit units.Unit) string {
	lowWord, highWord := "from ", " to "
	if spec.OpenMin {
		lowWord = "above "
	}
	if spec.OpenMax {
		highWord = " to below "
	} else if spec.OpenMin {
		highWord = ", up to "
	}
	return withUnit(lowWord+units.Format(unit.FromSI(spec.Min), 6)+highWord+units.Format(unit.FromSI(spec.Max), 6), unit)
}

func withUnit(text string, unit units.Unit) string {
	if label := unit.Label(); label != "" && label != "fraction" {
		return text + " " + label
	}
	return text
}

func knownUnits(q units.Quantity) string {
	var symbols []string
	for _, u := range units.Of(q) {
		symbols = append(symbols, quoted(u.Symbol))
	}
	return "one of the units " + strings.Join(symbols, ", ")
}

// quoted shows a text of the reader's own in a message, cut when it is long.
func quoted(text string) string {
	const most = 60
	if runes := []rune(text); len(runes) > most {
		text = string(runes[:most]) + "…"
	}
	return strconv.Quote(text)
}
