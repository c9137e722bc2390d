package units

import "math"

// spans are the units of a natural duration.
var spans = []struct {
	seconds float64
	word    string
}{
	{1, "second"}, {60, "minute"}, {3600, "hour"}, {day, "day"}, {year, "year"},
}

// longestSpan is the longest duration that is told, in years: beyond it no field,
// well or fluid is what it was, and the number means no more than that.
const longestSpan = 10_000

// Span prints a duration in the unit that suits it, with so many significant digits
// but whole units in full: with two digits "40 minutes", "5.2 hours", "1.4 years",
// "123 days". A year is 365.25 days.
//
// Special cases are:
//   - beyond 10 000 years either way it says only that
//   - infinite and what is not a number are printed as by Format
func Span(seconds float64, digits int) string {
	if math.IsNaN(seconds) || math.IsInf(seconds, 0) {
		return Format(seconds, digits)
	}
	size := math.Abs(seconds)
	if size > longestSpan*year {
		bound := Format(math.Copysign(longestSpan, seconds), digits) + hardSpace + "years"
		if seconds < 0 {
			return "less than " + bound
		}
		return "more than " + bound
	}
	if number := Format(size, digits); size < 1 && number != "1" {
		return sign(seconds) + number + hardSpace + "seconds"
	}
	i, count := 0, rounded(size, digits)
	for next := 1; next < len(spans) && max(size, count*spans[i].seconds) >= spans[next].seconds; next++ {
		i, count = next, rounded(size/spans[next].seconds, digits)
	}
	text := Format(count, 15) + hardSpace + spans[i].word
	if count != 1 {
		text += "s"
	}
	return sign(seconds) + text
}

// rounded keeps so many digits of a number from about one up: the whole part in
// full, and decimals while there is room beside it.
func rounded(x float64, digits int) float64 {
	decimals := max(digits, 1) - 1
	for whole := 10.0; whole <= x && decimals > 0; whole *= 10 {
		decimals--
	}
	scale := math.Pow10(decimals)
	return math.Round(x*scale) / scale
}
