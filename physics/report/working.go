package report

import (
	"strings"

	"brinefront/physics/ref"
	"brinefront/physics/study"
	"brinefront/physics/units"
)

// Working prints the formula of a working twice: with its symbols, and with the
// numbers put in, each in the unit of the system. What stands left of the first
// equals sign keeps its symbol. Symbols that no term explains stay symbols.
//
// Special cases are:
//
//	a working without a formula prints two empty texts
//	neighbours written side by side get a multiplication sign between numbers
//	a negative number, and a number with a unit under a fraction bar or raised
//	to a power, stand in parentheses
func Working(w study.Working, s units.System) (symbolic, numeric string) {
	values := make(map[string]string, len(w.Terms))
	for _, t := range w.Terms {
		values[t.Symbol] = printed(t.Value, t.Quantity, s, digits)
	}
	var symbols, numbers strings.Builder
	left := true
	pieces := split(w.Formula)
	for i, p := range pieces {
		symbols.WriteString(p.text)
		switch {
		case !p.symbol:
			left = left && !strings.Contains(p.text, "=")
			numbers.WriteString(joined(p.text, i > 0, i < len(pieces)-1))
		case left || values[p.text] == "":
			numbers.WriteString(p.text)
		default:
			numbers.WriteString(guarded(values[p.text], around(pieces, i-1), around(pieces, i+1)))
		}
	}
	return symbols.String(), numbers.String()
}

// piece is a symbol of a formula, or the text between two of them.
type piece struct {
	text   string
	symbol bool
}

func split(formula string) []piece {
	var pieces []piece
	for formula != "" {
		before, rest, found := strings.Cut(formula, "{")
		if before != "" {
			pieces = append(pieces, piece{text: before})
		}
		symbol, after, closed := strings.Cut(rest, "}")
		if !found || !closed {
			break
		}
		pieces = append(pieces, piece{symbol, true})
		formula = after
	}
	return pieces
}

func around(pieces []piece, i int) string {
	if i < 0 || i >= len(pieces) || pieces[i].symbol {
		return ""
	}
	return strings.TrimSpace(pieces[i].text)
}

// joined writes the multiplication that a formula leaves unsaid.
func joined(text string, after, before bool) string {
	if after && before && strings.TrimSpace(text) == "" {
		return " × "
	}
	if rest, ok := strings.CutPrefix(text, " ("); ok && after {
		text = " × (" + rest
	}
	if rest, ok := strings.CutSuffix(text, ") "); ok && before {
		text = rest + ") × "
	}
	return text
}

func guarded(value, before, after string) string {
	negative := strings.HasPrefix(value, "-") || strings.HasPrefix(value, "−")
	compound := strings.Contains(value, "\u00a0") && (strings.HasSuffix(before, "/") || strings.HasPrefix(after, "^"))
	if negative || compound {
		return "(" + value + ")"
	}
	return value
}

// Sources spells out the sources of a working.
func Sources(w study.Working) []string {
	long := make([]string, len(w.Sources))
	for i, id := range w.Sources {
		long[i] = ref.Get(id).Long()
	}
	return long
}
