// Package evidence holds published checks as data: what a source prints, what
// this build computes for it, and how far the two may differ and why. The same
// list is a test, native and in WebAssembly, and a sheet that computes it live
// in the reader's browser.
package evidence

import (
	"fmt"
	"math"

	"brinefront/physics/ref"
)

// Provenance says how well the published value is known to us.
type Provenance string

const (
	Read        Provenance = "read in the source"
	Memory      Provenance = "from memory of the source"
	Exact       Provenance = "exact result, derived by hand"
	Independent Provenance = "independent SciPy computation, two methods"
)

// Check is one published result.
type Check struct {
	ID         string
	Topic      string
	Title      string
	Source     ref.ID // empty: see Origin
	Place      string // where in the source: chapter, table, exercise; the whole origin when Source is empty
	Provenance Provenance
	Inputs     string // what goes in, in words
	How        string // how it is computed here
	Items      []Item
	compute    func() ([]float64, error)
}

// Item is one value of a check.
type Item struct {
	Label     string
	Published float64
	Tolerance float64 // absolute
	Why       string  // why this tolerance
}

// Agrees reports whether a computed value lies within the tolerance. A value
// that is not a number never agrees.
func (i Item) Agrees(computed float64) bool {
	return math.Abs(computed-i.Published) <= i.Tolerance
}

// Origin is where the check comes from, in words.
func (c Check) Origin() string {
	if c.Source == "" {
		return c.Place
	}
	return ref.Get(c.Source).Long() + " " + c.Place
}

// Run computes the check: one value per item.
func (c Check) Run() ([]float64, error) {
	values, err := c.compute()
	if err != nil {
		return nil, fmt.Errorf("%s: %w", c.ID, err)
	}
	if len(values) != len(c.Items) {
		panic("evidence: " + c.ID + " computes another number of values than it has items")
	}
	return values, nil
}

// All lists every check in reading order.
func All() []Check {
	var all []Check
	for _, list := range [][]Check{unitChecks, curveChecks, capillaryChecks, closedForms, waterfloods, segregatedFlow, rides, layerChecks, patternChecks, selfSimilarSoaking, soakingBlocks, gridChecks, independentCases, waterChecks} {
		all = append(all, list...)
	}
	return all
}

// Find returns the check with the given ID.
func Find(id string) (Check, bool) {
	for _, c := range All() {
		if c.ID == id {
			return c, true
		}
	}
	return Check{}, false
}

// items pairs labels and published values that share a tolerance.
func items(tolerance float64, why string, pairs ...any) []Item {
	list := make([]Item, 0, len(pairs)/2)
	for i := 0; i < len(pairs); i += 2 {
		list = append(list, Item{pairs[i].(string), pairs[i+1].(float64), tolerance, why})
	}
	return list
}

const (
	lastDigit = "half a unit in the last printed digit"
	handDrawn = "read by the author from a hand-drawn curve, printed with two decimals"
	rounding  = "exact: double-precision rounding only"
)
