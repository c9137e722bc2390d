package units

import (
	"math"
	"strconv"
	"strings"
	"unicode"
)

// ReadError says what was read and what is allowed instead.
type ReadError struct {
	Read    string // what was read, quoted, and what is wrong with it where that is not plain
	Allowed string
}

// Error implements error.
func (e *ReadError) Error() string { return "read " + e.Read + "; allowed: " + e.Allowed }

const aNumber = "a number such as 0.25, 1e-3 or 1 234.5"

// ParseNumber reads a number as an engineer types it.
//
//   - 0.25, .25, 1e-3, −4 (with either minus sign)
//   - 0,25 with a decimal comma
//   - 1 234.5 and 1 234,5 with spaces, also narrow and no-break ones, between groups of three
//   - 1,234.5 and 1.234,5: where both marks occur, the last is the decimal one
//   - 1,234,567 and 1.234.567: a mark that occurs twice parts groups
//
// A single point is the decimal mark. A single comma is too, unless what it stands
// in looks like a group of three as well: "1,234" is refused. Refused are also words,
// other number bases, infinity, and numbers outside the range of a float64.
// The error is a *ReadError.
func ParseNumber(text string) (float64, error) {
	mantissa, exponent, found := strings.Cut(strings.ToLower(plain(text)), "e")
	if mantissa == "" && !found {
		return 0, &ReadError{"nothing", aNumber}
	}
	refusal := &ReadError{quoted(text), aNumber}
	sign := ""
	if strings.HasPrefix(mantissa, "-") || strings.HasPrefix(mantissa, "+") {
		sign, mantissa = mantissa[:1], strings.TrimSpace(mantissa[1:])
	}
	if twoWays(mantissa) {
		point, none := strings.Replace(mantissa, ",", ".", 1), strings.Replace(mantissa, ",", "", 1)
		return 0, &ReadError{quoted(text) + ", which can mean " + point + " or " + none, "a decimal point as in " + point + ", or no comma as in " + none}
	}
	whole, fraction, ok := parts(mantissa)
	if !ok || whole+fraction == "" || found && !isExponent(exponent) {
		return 0, refusal
	}
	if !found {
		exponent = "0"
	}
	value, err := strconv.ParseFloat(sign+whole+"."+fraction+"e"+exponent, 64)
	switch {
	case math.IsInf(value, 0):
		return 0, &ReadError{quoted(text) + ", larger than a number can hold", "numbers up to 1.7e308"}
	case err != nil:
		return 0, refusal
	case value == 0 && strings.Trim(whole+fraction, "0") != "":
		return 0, &ReadError{quoted(text) + ", smaller than a number can hold", "zero, or numbers from 5e-324"}
	case value == 0:
		return 0, nil // without the sign of -0
	}
	return value, nil
}

// twoWays reports whether a mantissa is like "1,234": one comma that may part the
// decimals or a group of three.
func twoWays(mantissa string) bool {
	before, after, found := strings.Cut(mantissa, ",")
	return found && len(before) >= 1 && len(before) <= 3 && before[0] != '0' && isDigits(before) && len(after) == 3 && isDigits(after)
}

// parts splits a mantissa into the digits before and after its decimal mark.
func parts(mantissa string) (whole, fraction string, ok bool) {
	decimal := -1
	group := ""
	for _, mark := range []string{".", ",", " "} {
		at := strings.LastIndex(mantissa, mark)
		switch {
		case at < 0:
			continue
		case mark != " " && strings.Count(mantissa, mark) == 1 && at > decimal && !strings.ContainsAny(mantissa[at+1:], "., "):
			decimal = at
		case group != "":
			return "", "", false // two different marks between groups
		default:
			group = mark
		}
	}
	whole = mantissa
	if decimal >= 0 {
		whole, fraction = mantissa[:decimal], mantissa[decimal+1:]
	}
	if group != "" {
		if whole, ok = ungroup(whole, group); !ok {
			return "", "", false
		}
	}
	return whole, fraction, isDigits(whole) && isDigits(fraction)
}

// ungroup joins groups of three digits: the first has one to three digits and does
// not start with zero.
func ungroup(whole, mark string) (string, bool) {
	groups := strings.Split(whole, mark)
	for i, g := range groups {
		if len(g) != 3 && (i > 0 || len(g) == 0 || len(g) > 3) {
			return "", false
		}
	}
	return strings.Join(groups, ""), groups[0][0] != '0' && len(groups) > 1
}

func isDigits(text string) bool { return strings.Trim(text, "0123456789") == "" }

func isExponent(text string) bool {
	if strings.HasPrefix(text, "-") || strings.HasPrefix(text, "+") {
		text = text[1:]
	}
	return text != "" && isDigits(text)
}

// plain trims a text and writes its minus signs and spaces in the one plain way.
func plain(text string) string {
	return strings.TrimSpace(strings.Map(func(r rune) rune {
		switch {
		case r == '\u2212':
			return '-'
		case unicode.IsSpace(r) || r == '\u2009' || r == '\u202f':
			return ' '
		}
		return r
	}, text))
}

// quoted is a text as a message repeats it: not too long.
func quoted(text string) string {
	const longest = 40
	if runes := []rune(strings.TrimSpace(text)); len(runes) > longest {
		text = string(runes[:longest]) + "…"
	}
	return "“" + strings.TrimSpace(text) + "”"
}

// Parse reads a number that may be followed by a unit of the quantity, "5 cp" or
// "12%"; without one, unit applies. The error is a *ReadError.
func Parse(q Quantity, text string, unit Unit) (number float64, u Unit, err error) {
	head, tail := split(plain(text))
	if tail == "" || head == "" {
		number, err = ParseNumber(text)
		return number, unit, err
	}
	if number, err = ParseNumber(head); err != nil {
		return 0, unit, err
	}
	u, ok := match(q, tail)
	if !ok {
		return 0, unit, &ReadError{"the unit " + quoted(tail), allowedUnits(q)}
	}
	return number, u, nil
}

// split parts a text before the first letter or percent sign that does not belong
// to an exponent.
func split(text string) (head, tail string) {
	for i, r := range text {
		if !unicode.IsLetter(r) && r != '%' && r != '°' {
			continue
		}
		if (r == 'e' || r == 'E') && i > 0 && startsExponent(text[i+1:]) {
			continue
		}
		return strings.TrimSpace(text[:i]), text[i:]
	}
	return text, ""
}

func startsExponent(text string) bool {
	text = strings.TrimLeft(text, "+-")
	return text != "" && text[0] >= '0' && text[0] <= '9'
}

// allowedUnits lists the units of a quantity in words.
func allowedUnits(q Quantity) string {
	var labels []string
	for _, u := range Of(q) {
		if u.Symbol != "" {
			labels = append(labels, u.Label())
		}
	}
	switch n := len(labels); n {
	case 0:
		return "a number without a unit"
	case 1:
		return labels[0] + ", or the number alone"
	default:
		return strings.Join(labels[:n-1], ", ") + " or " + labels[n-1] + ", or the number alone"
	}
}
