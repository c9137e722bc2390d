package capillary

import (
	"math"

	"brinefront/physics/numeric"
)

// Imbibed is the water saturation at which a curve comes to a given pressure.
type Imbibed struct {
	Sw float64
	// Within is whether the curve takes the pressure between its ends. Where it does not,
	// Sw is the end nearest to it: the upper one when the whole curve lies above.
	Within bool
}

// Spontaneous is where rock of this curve stops to soak up water by itself, with no
// pressure from outside: the least saturation of Pc = 0. Of a curve that stays above
// zero it is the upper end, and of one that stays below, the lower one.
func Spontaneous(c Curve) Imbibed { return Reaches(c, 0) }

// Reaches finds the least water saturation at which Pc = pressure (Pa, finite).
func Reaches(c Curve, pressure float64) Imbibed {
	low, high := c.Ends()
	above := func(sw float64) float64 {
		pc, _ := c.At(sw)
		return pc - pressure
	}
	first, last := above(low), above(high)
	switch {
	case first < 0:
		return Imbibed{low, false}
	case last > 0:
		return Imbibed{high, false}
	}
	// The first stretch between knots that reaches the pressure: a table that is level
	// there reaches it where the level begins.
	for _, k := range c.Knots() {
		if at := above(k); at <= 0 {
			high, last = k, at
			break
		} else {
			low, first = k, at
		}
	}
	return Imbibed{numeric.Zero(above, low, high, first, last), true}
}

// Area is the integral of |Pc| over water saturation, Pa, between the pressures
// -Limit and +Limit of the test (Pa, above 0) on one side of zero.
type Area struct {
	Value float64
	// Low and High are the saturations it lies between.
	Low, High float64
}

// Areas returns the area under the part of the curve where Pc is positive and
// the one where it is negative, each as far as the limit of pressure or, when the curve
// does not get there, as far as it goes. A missing part has area 0.
func Areas(c Curve, limit float64) (positive, negative Area) {
	zero := Spontaneous(c).Sw
	start, stop := Reaches(c, limit).Sw, Reaches(c, -limit).Sw
	return areaBetween(c, start, zero), areaBetween(c, zero, stop)
}

func areaBetween(c Curve, low, high float64) Area {
	a := Area{Low: low, High: high}
	height := func(sw float64) float64 {
		pc, _ := c.At(sw)
		return math.Abs(pc)
	}
	for from := low; from < high; {
		to := high
		for _, k := range c.Knots() {
			if k > from && k < to {
				to = k
				break
			}
		}
		a.Value += numeric.Integral(height, from, to)
		from = to
	}
	return a
}

// USBM is the index of the United States Bureau of Mines, log10(A1/A2).
//
// A1 is the area between Pc = 0 and the curve of secondary drainage (oil drives water
// out, Pc above 0), A2 the area between Pc = 0 and the curve of forced imbibition (water
// drives oil out, Pc below 0). Above 0 water-wet, below 0 oil-wet; of clean rock with one
// fluid wetting, one area may vanish and the index is infinite. Not a number when both do.
// Source: Donaldson, Thomas & Lorenz (1969).
func USBM(a1, a2 float64) float64 { return math.Log10(a1 / a2) }

// Amott holds the end states of a test of Amott (1959), as water saturations in the
// order they are met: soaking water up, driving water in, soaking oil up, driving
// oil in. Math.NaN() means not measured.
type Amott struct {
	Initial     float64 // before: Swi
	WaterSoaked float64 // after spontaneous imbibition of water
	WaterDriven float64 // after forced imbibition of water: 1 - Sor
	OilSoaked   float64 // after spontaneous imbibition of oil
	OilDriven   float64 // after forced imbibition of oil
}

// Water is the index to water, Iw, the part of the displaced oil that water takes the
// place of by itself:
//
//	Iw = (WaterSoaked - Initial)/(WaterDriven - Initial)
//
// From 0 (no spontaneous imbibition) to 1. Not a number when a state is missing or
// the states are out of order. Source: Amott (1959).
func (a Amott) Water() float64 { return part(a.WaterSoaked-a.Initial, a.WaterDriven-a.Initial) }

// Oil is the index to oil, Io, the same for water displaced by oil:
//
//	Io = (WaterDriven - OilSoaked)/(WaterDriven - OilDriven)
func (a Amott) Oil() float64 { return part(a.WaterDriven-a.OilSoaked, a.WaterDriven-a.OilDriven) }

// Harvey is the Amott-Harvey index Iw - Io, from -1 (oil-wet) to 1 (water-wet).
func (a Amott) Harvey() float64 { return a.Water() - a.Oil() }

func part(some, all float64) float64 {
	if !(all > 0 && some >= 0 && some <= all) {
		return math.NaN()
	}
	return some / all
}
