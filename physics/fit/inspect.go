package fit

import (
	"fmt"
	"math"
	"strings"

	"brinefront/physics/relperm"
)

// Finding is something about the points that a core analyst would want to know
// before any curve is drawn.
type Finding struct {
	ID     string // see the list at Inspect
	Rows   []int  // zero-based; nil when it is about the whole table
	Read   string // what stands there
	Text   string // what it means
	Do     string // what to do about it
	Refuse bool   // no curve can be drawn until it is mended

	Allowed string // what may stand there instead; only where it refuses
}

const (
	leastRows   = 4    // below, a curve is a guess
	fewestRows  = 3    // below, there is no curve
	percentFrom = 1.5  // a largest value above this is percent, not a slip
	nearZero    = 0.01 // kr at an end that may pass for zero (common practice, no source)
	narrow      = 0.1  // movable saturation that is unusually small (common practice, no source)
	exactly     = 1e-9
	rowsTold    = 6 // rows named in a sentence
)

// Inspect looks for the points' own problems, the most serious first:
//
//	missing     no rows at all, or a value that is no number     refuses
//	percent     a column in percent                              refuses
//	outside     saturation outside 0 to 1, kr below 0 or above 2 refuses
//	few         fewer than 4 rows                                refuses below 3
//	swapped     krw falls and kro rises                          refuses
//	range       no movable saturation, so that Swc + Sor >= 1    refuses
//	narrow      a movable saturation below 0.1
//	order       saturations out of order
//	duplicate   rows with the same saturation
//	krw-falls   krw not monotone
//	kro-rises   kro not monotone
//	krw-end     krw at the smallest saturation is not zero
//	kro-end     kro at the largest saturation is not zero
//	flat        a column that is zero throughout                 refuses
//	above-one   kr above 1
//	reference   kro at the smallest saturation says that kr refers to another
//	            permeability than the study does
//
// It panics when the slices differ in length. The result is nil for sound points.
func Inspect(p Points) []Finding {
	p.mustMatch()
	if found := p.unreadable(); len(found) > 0 {
		return found
	}
	var found []Finding
	for _, look := range []func(Points) []Finding{Points.count, Points.turned, Points.span, Points.ordered, Points.monotone, Points.atEnds, Points.scale} {
		found = append(found, look(p)...)
	}
	return found
}

// column is one of the three with its name and largest lawful value.
type column struct {
	name    string
	values  []float64
	highest float64
}

func (p Points) columns() []column {
	return []column{{"Sw", p.Sw, 1}, {"krw", p.Krw, relperm.MaxKr}, {"kro", p.Kro, relperm.MaxKr}}
}

// unreadable finds what keeps the other looks from making sense.
func (p Points) unreadable() []Finding {
	if len(p.Sw) == 0 {
		return []Finding{{ID: "missing", Read: "0 rows", Text: "There are no points.", Do: "Paste or type the laboratory table.", Refuse: true, Allowed: "a table of at least 3 rows with Sw, krw and kro"}}
	}
	var found []Finding
	for _, c := range p.columns() {
		largest := 0.0
		var missing, outside []int
		for i, v := range c.values {
			switch {
			case math.IsNaN(v) || math.IsInf(v, 0):
				missing = append(missing, i)
				continue
			case !(v >= 0 && v <= c.highest):
				outside = append(outside, i)
			}
			largest = max(largest, v)
		}
		switch {
		case len(missing) > 0:
			found = append(found, Finding{ID: "missing", Rows: missing, Read: c.name + " in " + rowList(missing),
				Text: "These values are no numbers.", Do: "Type them again, or leave the rows out.", Refuse: true, Allowed: "numbers; leave out rows that lack one"})
		case percentLike(c.values, largest):
			found = append(found, Finding{ID: "percent", Rows: outside, Read: fmt.Sprintf("%s up to %g", c.name, largest),
				Text: c.name + " looks like percent; a fraction is between 0 and 1.", Do: "Divide the column by 100.", Refuse: true, Allowed: "fractions from 0 to 1; what looks like percent is to be divided by 100"})
		case len(outside) > 0:
			found = append(found, Finding{ID: "outside", Rows: outside, Read: c.name + " = " + c.list(outside),
				Text: fmt.Sprintf("%s in %s is outside 0 to %g.", c.name, rowList(outside), c.highest), Do: "Correct these values, or leave the rows out.", Refuse: true, Allowed: fmt.Sprintf("values from 0 to %g in every row", c.highest)})
		}
	}
	return found
}

// percentLike: half of the values that are not zero lie above percentFrom, and none
// above 100 or below 0.
func percentLike(values []float64, largest float64) bool {
	above, count := 0, 0
	for _, v := range values {
		if v < 0 {
			return false
		}
		if v > 0 {
			count++
		}
		if v > percentFrom {
			above++
		}
	}
	return largest > relperm.MaxKr && largest <= 100 && 2*above >= count
}

func (p Points) count() []Finding {
	n := len(p.Sw)
	if n >= leastRows {
		return nil
	}
	f := Finding{ID: "few", Read: fmt.Sprintf("%d %s", n, plural(n, "row", "rows")), Text: "So few points leave the shape of the curves open.",
		Do: "Add points, or hold parameters that are known.", Refuse: n < fewestRows}
	if f.Refuse {
		f.Text, f.Allowed = "A curve needs at least 3 points.", "at least 3 points"
	}
	return []Finding{f}
}

// list prints the values of some rows.
func (c column) list(rows []int) string {
	texts := make([]string, 0, rowsTold+1)
	for _, i := range rows[:min(len(rows), rowsTold)] {
		texts = append(texts, fmt.Sprintf("%.4g", c.values[i]))
	}
	return listed(texts, len(rows))
}

// rowList names rows, counted from 1.
func rowList(rows []int) string {
	texts := make([]string, 0, rowsTold+1)
	for _, i := range rows[:min(len(rows), rowsTold)] {
		texts = append(texts, fmt.Sprint(i+1))
	}
	return plural(len(rows), "row ", "rows ") + listed(texts, len(rows))
}

func listed(texts []string, all int) string {
	if more := all - len(texts); more > 0 {
		texts = append(texts, fmt.Sprintf("and %d more", more))
	}
	return strings.Join(texts, ", ")
}

func plural(n int, one, many string) string {
	if n == 1 {
		return one
	}
	return many
}
