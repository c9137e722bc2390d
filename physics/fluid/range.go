// Package fluid holds the properties of the phases that a study moves: water and
// brine by temperature, pressure and salinity, and the pairs of phases that a
// displacement may have, told as data.
package fluid

import (
	"fmt"
	"math"
	"strconv"
)

// Variable is what a fluid property depends on.
type Variable string

const (
	Temperature Variable = "temperature" // K
	Pressure    Variable = "pressure"    // Pa
	Density     Variable = "density"     // kg/m3
	Salinity    Variable = "salinity"    // kg of salt in a kg of brine
)

var siUnit = map[Variable]string{Temperature: " K", Pressure: " Pa", Density: " kg/m3", Salinity: " kg/kg"}

// RangeError is a variable outside the range of a correlation. Value, Low and High
// are SI, so that a caller can tell them in the units of the person.
type RangeError struct {
	Of               string // the correlation
	Variable         Variable
	Value, Low, High float64
}

func (e *RangeError) Error() string {
	unit := siUnit[e.Variable]
	return fmt.Sprintf("%s: %s %s%s; allowed %s to %s%s", e.Of, e.Variable, number(e.Value), unit, number(e.Low), number(e.High), unit)
}

func number(x float64) string { return strconv.FormatFloat(x, 'g', 7, 64) }

// within is nil when low <= value <= high. A value that is not a number is outside.
func within(of string, v Variable, value, low, high float64) error {
	if value >= low && value <= high {
		return nil
	}
	return &RangeError{Of: of, Variable: v, Value: value, Low: low, High: high}
}

const zeroCelsius = 273.15

// power is x^n for a whole n, by squaring: the exponents of the water formulations
// are whole numbers, for which math.Pow is several times slower.
func power(x float64, n int) float64 {
	if n < 0 {
		return 1 / power(x, -n)
	}
	y := 1.0
	for ; n > 0; n >>= 1 {
		if n&1 == 1 {
			y *= x
		}
		x *= x
	}
	return y
}

// horner is the polynomial c[0] + c[1] x + c[2] x² + ...
func horner(x float64, c ...float64) float64 {
	y := 0.0
	for i := len(c) - 1; i >= 0; i-- {
		y = math.FMA(y, x, c[i])
	}
	return y
}
