package report

import (
	"strings"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

// How many significant digits are printed. Four is more than laboratory data
// carry, and enough to check a working by hand; a sentence makes do with three.
const (
	digits       = 4
	spokenDigits = 3
)

// Value prints a figure as the screen, the page and the text do: durations in
// the span that suits them and with a digit less, everything else in the unit of
// the system.
func Value(f study.Figure, s units.System) string { return printed(f.Value, f.Quantity, s, digits) }

// Spoken prints a figure as a sentence says it.
func Spoken(f study.Figure, s units.System) string {
	return printed(f.Value, f.Quantity, s, spokenDigits)
}

func printed(si float64, q units.Quantity, s units.System, digits int) string {
	if q == units.Duration {
		return units.Span(si, digits-1)
	}
	return units.Print(si, s.Unit(q), digits)
}

// Sentence is a part's answer in words with its figures printed in place.
func Sentence(p study.Part, s units.System) string {
	var b strings.Builder
	for _, phrase := range p.Answer {
		b.WriteString(phrase.Text)
		if f, ok := p.Figure(phrase.Figure); ok {
			b.WriteString(Spoken(f, s))
		}
	}
	return b.String()
}

// Heading names a quantity as an axis or a table column does: label, symbol, unit.
func Heading(label, symbol string, q units.Quantity, s units.System) string {
	text := label
	if symbol != "" && symbol != label {
		text += ", " + symbol
	}
	if unit := s.Unit(q).Label(); unit != "" && unit != "fraction" {
		text += " (" + unit + ")"
	}
	return text
}
