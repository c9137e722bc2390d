package paste

import (
	"math"
	"strconv"
	"strings"
)

// Decimal marks, as in Reading.Decimal.
const (
	point = "point"
	comma = "comma"
)

// findDecimal decides the decimal mark over all data cells: the one that more
// cells hold; the point when none does. A cell with the other mark is then a
// problem of its own, since it may be a slip or a thousands mark.
func findDecimal(data [][]string) string {
	points, commas := 0, 0
	for _, cells := range data {
		for _, c := range cells {
			if !numeric(c) {
				continue
			}
			if strings.Contains(c, ".") {
				points++
			}
			if strings.Contains(c, ",") {
				commas++
			}
		}
	}
	if commas > points {
		return comma
	}
	return point
}

// numeric reports whether a cell is made of the characters of one number, with
// either decimal mark.
func numeric(cell string) bool {
	cell = strings.TrimRight(cell, "% ")
	digits, marks, exponent := 0, 0, false
	for i := range len(cell) {
		switch c := cell[i]; {
		case isDigit(c):
			digits++
		case c == '.' || c == ',':
			marks++
		case c|0x20 == 'e':
			if exponent || digits == 0 {
				return false
			}
			exponent = true
		case c == '-' || c == '+':
			if i > 0 && cell[i-1]|0x20 != 'e' {
				return false
			}
		default:
			return false
		}
	}
	return digits > 0 && marks <= 1
}

// number reads a cell. The percent sign, or percent, divides by 100 in the decimal
// text, so that 28.7 % is 0.287 to the last bit. It is not ok when the cell is no
// number under the decimal mark of the text; 1e999 is, and is infinite.
func number(cell, decimal string, percent bool) (value float64, ok bool) {
	if !numeric(cell) {
		return math.NaN(), false
	}
	text := strings.TrimRight(cell, "% ")
	if decimal == comma {
		if strings.Contains(text, ".") {
			return math.NaN(), false
		}
		text = strings.Replace(text, ",", ".", 1)
	}
	percent = percent || len(text) < len(cell)
	shift := percent && !strings.ContainsAny(text, "eE")
	if shift {
		text += "e-2"
	}
	value, err := strconv.ParseFloat(text, 64)
	if err != nil && !math.IsInf(value, 0) {
		return math.NaN(), false
	}
	if percent && !shift {
		value /= 100
	}
	if value == 0 {
		value = 0 // no negative zero
	}
	return value, true
}
