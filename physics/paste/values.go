package paste

import (
	"fmt"
	"math"
	"slices"
)

// interpret turns cells into fractions under the given roles and gathers all there
// is to say about them. It shares nothing that it changes with the reading it is
// called on.
func (r Reading) interpret(roles []role, remarks []string) Reading {
	said := notes{remarks: slices.Concat(r.layout, remarks)}
	columns := make([]Column, len(r.Columns))
	krPercent := r.krPercent(roles)
	for i := range columns {
		columns[i] = Column{Title: r.Columns[i].Title, As: roles[i].as, Oil: roles[i].oil}
		switch columns[i].As {
		case "":
		case Sw:
			r.fill(i, &columns[i], r.swPercent(i), &said)
		case Pc:
			r.fillPressure(i, &columns[i], &said)
		default:
			r.fill(i, &columns[i], krPercent, &said)
		}
	}
	r.Columns = columns
	r.complete(&said)
	r.order(&said)
	if sw, krw, kro := r.values(Sw), r.values(Krw), r.values(Kro); swapped(sw, pad(krw, sw), pad(kro, sw)) {
		w, o := r.want.Label(Krw), r.want.Label(Kro)
		said.remark("By their shapes " + w + " and " + o + " look swapped: " + w + " falls and " + o + " rises with " + r.want.Label(Sw) + ".")
	}
	r.Problems, r.Remarks = few(said.problems), said.remarks
	return r
}

// pad gives a missing column the length of another, with no values.
func pad(values, like []float64) []float64 {
	if values == nil {
		return make([]float64, len(like))
	}
	return values
}

// complete reports missing columns and rows.
func (r Reading) complete(said *notes) {
	for _, as := range r.want.columns {
		if r.values(as) == nil {
			said.problem(-1, -1, "no column for "+r.want.Label(as), r.want.asked())
		}
	}
	if n := len(r.Cells); n < MinRows {
		said.problem(-1, -1, fmt.Sprintf("%d %s of numbers", n, plural(n, "row", "rows")), fmt.Sprintf("at least %d rows", MinRows))
	}
}

// order tells how the rows run.
func (r Reading) order(said *notes) {
	sw := r.values(Sw)
	if falls(sw) {
		said.remark("The rows run from high to low " + r.want.Label(Sw) + "; they are turned round.")
		return
	}
	for i := 1; i < len(sw); i++ {
		if sw[i] < sw[i-1] {
			said.remark(fmt.Sprintf("The %s falls from row %d to row %d; the rows are kept in their order.", r.want.Label(Sw), i, i+1))
			return
		}
	}
}

// falls reports whether saturations never rise, and fall at least once.
func falls(sw []float64) bool {
	for i := 1; i < len(sw); i++ {
		if !(sw[i] <= sw[i-1]) {
			return false
		}
	}
	return len(sw) > 1 && sw[len(sw)-1] < sw[0]
}

// fill reads one column; guess says that its numbers look like percent where its
// heading names no unit.
func (r Reading) fill(i int, c *Column, guess bool, said *notes) {
	name := fmt.Sprintf("Column %d (%s)", i+1, r.want.Label(c.As))
	unit := unitOf(c.Title)
	switch {
	case unit == 100:
		c.Percent = true
		said.remark(name + " is in percent, as its heading says; its values were divided by 100.")
	case unit == 0 && guess:
		c.Percent = true
		said.remark(name + " reaches beyond 1 and stays within 100, so it was read as percent; no heading says so.")
	}
	c.Values = make([]float64, len(r.Cells))
	above, signed := false, false
	for row := range r.Cells {
		v, ok := r.cell(row, i, c.Percent)
		signed = signed || ok && hasSign(r.Cells[row][i])
		above = above || v > 0.01
		if c.Oil {
			v = complement(v)
		}
		c.Values[row] = v
		r.check(row, i, c.Percent, ok, v, said)
	}
	if c.Percent && !above {
		said.remark(name + " is headed as percent, but none of its values is above 1: check the unit.")
	}
	if signed && !c.Percent {
		c.Percent = true
		said.remark(name + " has cells with a percent sign; these were divided by 100.")
	}
	if c.Oil {
		said.remark(name + " holds " + r.want.Label(So) + "; " + r.want.Label(Sw) + " was taken as 1 − " + r.want.phases.symbol + ".")
	}
}

// fillPressure reads a column of capillary pressure: any number, in the unit of its
// heading.
func (r Reading) fillPressure(i int, c *Column, said *notes) {
	if c.Unit = pressureOf(c.Title); c.Unit == "" {
		said.remark(fmt.Sprintf("No unit stands in the heading of column %d; it is read in the unit chosen beside the table.", i+1))
	}
	c.Values = make([]float64, len(r.Cells))
	for row := range r.Cells {
		v, ok := r.cell(row, i, false)
		c.Values[row] = v
		switch {
		case ok && !hasSign(r.Cells[row][i]):
		case i >= len(r.Cells[row]) || r.Cells[row][i] == "":
			said.problem(row, i, emptyCell, "a number")
		default:
			said.problem(row, i, clip(r.Cells[row][i]), "a number with a decimal "+r.Decimal+" and no unit")
		}
	}
}

// check reports a cell that is not a fraction.
func (r Reading) check(row, column int, percent, ok bool, v float64, said *notes) {
	allowed := "a fraction from 0 to 1"
	if percent {
		allowed = "a percentage from 0 to 100"
	}
	switch {
	case ok && v >= 0 && v <= 1:
		return
	case column >= len(r.Cells[row]) || r.Cells[row][column] == "":
		said.problem(row, column, emptyCell, allowed)
		return
	case !ok && numeric(r.Cells[row][column]):
		allowed = "a number with a decimal " + r.Decimal + ", as in the rest of the text"
	case !ok:
		allowed = "a number: " + allowed
	case !percent && v > 1 && v <= 100:
		allowed += "; when the column is in percent, write % in its heading"
	}
	said.problem(row, column, clip(r.Cells[row][column]), allowed)
}

// cell reads one cell; a missing one is not ok.
func (r Reading) cell(row, column int, percent bool) (float64, bool) {
	if column >= len(r.Cells[row]) {
		return math.NaN(), false
	}
	return number(r.Cells[row][column], r.Decimal, percent)
}

func hasSign(cell string) bool { return cell[len(cell)-1] == '%' }

// complement is 1 - v, rounded to the digits that a decimal number of this size
// can have, so that 1 - 0.8 reads 0.2.
func complement(v float64) float64 {
	const digits = 1e12
	return math.Round((1-v)*digits) / digits
}

// few keeps the first problems and tells how many more there are.
func few(problems []Problem) []Problem {
	if len(problems) <= maxProblems {
		return problems
	}
	more := len(problems) - maxProblems
	return append(problems[:maxProblems:maxProblems], Problem{Row: -1, Column: -1,
		Read: fmt.Sprintf("%s more cells of this kind", thousands(more)), Allowed: "as above"})
}

func plural(n int, one, many string) string {
	if n == 1 {
		return one
	}
	return many
}
