package units

import (
	"math"
	"strconv"
	"strings"
)

const (
	minus       = "\u2212"
	narrowSpace = "\u202f" // no-break, between groups of three digits
	hardSpace   = "\u00a0" // no-break, between number and unit
)

// Format prints a number with so many significant digits for reading: trailing
// zeros dropped, a true minus sign, groups of three parted by a narrow no-break
// space from 10 000 up, and an exponent only below 1e-4 and from 1e7 up. ParseNumber
// reads it back. Infinite is "∞"; what is not a number says so.
func Format(number float64, digits int) string {
	if text, ok := special(number); ok {
		return text
	}
	figures, exponent := decimal(number, max(digits, 1)-1)
	return sign(number) + layOut(figures, exponent, minus, narrowSpace)
}

// Exact prints a finite number so that it reads back as the very same number and
// can be edited: as few digits as that takes, no groups, a plain minus sign. What is
// not finite prints as in Format.
func Exact(number float64) string {
	if text, ok := special(number); ok {
		return text
	}
	figures, exponent := decimal(number, -1)
	return strings.Replace(sign(number), minus, "-", 1) + layOut(figures, exponent, "-", "")
}

// special prints the numbers that have no digits to lay out.
func special(number float64) (text string, ok bool) {
	switch {
	case math.IsNaN(number):
		return "not a number", true
	case math.IsInf(number, 0):
		return sign(number) + "∞", true
	}
	return "0", number == 0
}

func sign(number float64) string {
	if number < 0 {
		return minus
	}
	return ""
}

// decimal returns the significant figures of a number's magnitude, without trailing
// zeros, and the power of ten of the first; precision as in strconv.FormatFloat.
func decimal(number float64, precision int) (figures string, exponent int) {
	mantissa, power, _ := strings.Cut(strconv.FormatFloat(math.Abs(number), 'e', precision, 64), "e")
	exponent, _ = strconv.Atoi(power)
	if figures = strings.TrimRight(strings.Replace(mantissa, ".", "", 1), "0"); figures == "" {
		figures = "0"
	}
	return figures, exponent
}

// layOut writes figures with the decimal point where the exponent puts it.
func layOut(figures string, exponent int, minus, space string) string {
	switch {
	case exponent < -4 || exponent >= 7:
		text := figures[:1]
		if len(figures) > 1 {
			text += "." + figures[1:]
		}
		if exponent < 0 {
			return text + "e" + minus + strconv.Itoa(-exponent)
		}
		return text + "e" + strconv.Itoa(exponent)
	case exponent < 0:
		return "0." + strings.Repeat("0", -exponent-1) + figures
	case len(figures) <= exponent+1:
		return grouped(figures+strings.Repeat("0", exponent+1-len(figures)), space)
	default:
		return grouped(figures[:exponent+1], space) + "." + figures[exponent+1:]
	}
}

// grouped parts digits into groups of three from five digits on.
func grouped(digits, space string) string {
	if len(digits) < 5 {
		return digits
	}
	head := len(digits) % 3
	groups := make([]string, 0, 3)
	if head > 0 {
		groups = append(groups, digits[:head])
	}
	for ; head < len(digits); head += 3 {
		groups = append(groups, digits[head:head+3])
	}
	return strings.Join(groups, space)
}

var labels = strings.NewReplacer("2", "²", "3", "³", ".", "·", "um", "µm", "deg", "°")

// Label is the unit as people read it: "m³/d", "mPa·s", "°".
func (u Unit) Label() string { return labels.Replace(u.Symbol) }

// Print prints an SI value in a unit for reading: the number, a no-break space, and
// the unit. A plain fraction stands without the word, and degrees without the space.
func Print(si float64, u Unit, digits int) string {
	number := Format(u.FromSI(si), digits)
	switch label := u.Label(); label {
	case "", "fraction":
		return number
	case "°":
		return number + label
	default:
		return number + hardSpace + label
	}
}
