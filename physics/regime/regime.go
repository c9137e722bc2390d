// Package regime judges a displacement by its dimensionless numbers: which forces
// rule, whether a front is stable, whether residual oil would move, what wettability
// the curves show. Each judgement is a number, a sentence, the published range that it
// was held against, and the source.
package regime

import (
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// Class is what a judgement comes to, for a program to act on.
type Class string

// Undecided: the number lies between the ranges, or is not a number.
const Undecided Class = "undecided"

// Verdict is a judgement in words.
type Verdict struct {
	Class  Class
	Text   string // one sentence with the number in it
	Range  string // the range or rule it was held against
	Source ref.ID // empty: common practice, no source
}

// band is a stretch of a number that means one thing: up to and including its top
// where closed, otherwise to below it.
type band struct {
	top    float64
	closed bool
	class  Class
	means  string
}

// bandOf finds the first band that holds x; the last band has no top. ok is false when x
// is not a number.
func bandOf(x float64, bands []band) (b band, ok bool) {
	if x != x {
		return band{class: Undecided}, false
	}
	last := len(bands) - 1
	for _, b := range bands[:last] {
		if x < b.top || b.closed && x == b.top {
			return b, true
		}
	}
	return bands[last], true
}

// judge puts number and meaning in one sentence: "The mobility ratio is 3.75: ...".
func judge(name string, x float64, bands []band, rule string, source ref.ID) Verdict {
	b, ok := bandOf(x, bands)
	if !ok {
		return Verdict{Undecided, name + " is not known, so it is not judged.", rule, source}
	}
	return Verdict{b.class, name + " is " + number(x) + ": " + b.means + ".", rule, source}
}

func number(x float64) string { return units.Format(x, 3) }
