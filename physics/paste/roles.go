package paste

import (
	"fmt"
	"math"
	"slices"
	"strings"
)

// role is the use a column is put to.
type role struct {
	as  string // a column of the layout, or ""
	oil bool   // the other saturation, which serves as Sw
}

// assign gives columns their roles: by heading where it names one, else by place,
// in the order of the layout, among columns of numbers that are named nothing else.
func (r Reading) assign() (roles []role, remarks []string) {
	var said notes
	roles = make([]role, len(r.Columns))
	found := r.byHeading(roles, &said)
	named := found[Krw] || found[Kro]

	var placed []int
	next := r.unnamed()
	for _, as := range r.want.columns {
		if found[as] || len(next) == 0 {
			continue
		}
		roles[next[0]].as = as
		placed = append(placed, next[0])
		next = next[1:]
	}
	if !named {
		r.turnSwapped(roles, &said)
	}
	if len(placed) > 0 {
		texts := make([]string, len(placed))
		for i, column := range placed {
			texts[i] = fmt.Sprintf("column %d as %s", column+1, r.want.Label(roles[column].as))
		}
		said.remark("No heading names them, so columns were read by position: " + strings.Join(texts, ", ") + ".")
	}
	return roles, said.remarks
}

// byHeading assigns what headings name. Water saturation goes before oil
// saturation when both are there.
func (r Reading) byHeading(roles []role, said *notes) (found map[string]bool) {
	found = map[string]bool{}
	oil := -1
	for i, c := range r.Columns {
		as := r.want.role(c.Title)
		switch {
		case as == "":
		case as == So:
			if oil < 0 {
				oil = i
			}
		case found[as]:
			said.remark(fmt.Sprintf("Column %d is headed %s as well; the first such column was taken.", i+1, r.want.Label(as)))
		default:
			roles[i].as, found[as] = as, true
		}
	}
	if oil >= 0 && !found[Sw] {
		roles[oil], found[Sw] = role{as: Sw, oil: true}, true
	}
	return found
}

// unnamed lists the columns of numbers whose heading names nothing of the trade.
// With more than the layout has, a leading column that counts 1, 2, 3 ... is left out.
func (r Reading) unnamed() []int {
	var list []int
	for i, c := range r.Columns {
		if nameOf(c.Title) == "" && !r.want.isOther(c.Title) && r.holdsNumbers(i) {
			list = append(list, i)
		}
	}
	if len(list) > len(r.want.columns) && r.counts(list[0]) {
		list = list[1:]
	}
	return list
}

// holdsNumbers reports whether at least half of a column's cells are numbers.
func (r Reading) holdsNumbers(column int) bool {
	n := 0
	for _, cells := range r.Cells {
		if column < len(cells) && numeric(cells[column]) {
			n++
		}
	}
	return n > 0 && 2*n >= len(r.Cells)
}

// counts reports whether a column numbers the rows.
func (r Reading) counts(column int) bool {
	first, _ := r.cell(0, column, false)
	for row := range r.Cells {
		if v, ok := r.cell(row, column, false); !ok || v != first+float64(row) || v != math.Trunc(v) {
			return false
		}
	}
	return len(r.Cells) >= MinRows
}

// turnSwapped exchanges krw and kro when their shapes say that they were taken the
// wrong way round and no heading names them.
func (r Reading) turnSwapped(roles []role, said *notes) {
	at := map[string]int{}
	for i, role := range roles {
		if role.as != "" {
			at[role.as] = i
		}
	}
	if len(at) < len(r.want.columns) || !slices.Contains(r.want.columns, Krw) {
		return
	}
	sw := r.column(at[Sw])
	if roles[at[Sw]].oil {
		for i := range sw {
			sw[i] = 1 - sw[i]
		}
	}
	if !swapped(sw, r.column(at[Krw]), r.column(at[Kro])) {
		return
	}
	roles[at[Krw]].as, roles[at[Kro]].as = Kro, Krw
	said.remark(fmt.Sprintf("Column %d rises and column %d falls with %s, so they were read as %s and %s in that order.",
		at[Kro]+1, at[Krw]+1, r.want.Label(Sw), r.want.Label(Krw), r.want.Label(Kro)))
}

// column reads the bare numbers of a column.
func (r Reading) column(column int) []float64 {
	values := make([]float64, len(r.Cells))
	for row := range values {
		values[row], _ = r.cell(row, column, false)
	}
	return values
}

// swapped reports whether krw falls and kro rises with water saturation.
func swapped(sw, krw, kro []float64) bool {
	return trend(sw, krw) < 0 && trend(sw, kro) > 0
}

// trend tells whether y mostly rises (+1) or mostly falls (-1) with x: at least two
// steps one way for each step the other way; 0 when neither.
func trend(x, y []float64) int {
	up, down := 0, 0
	for i := 1; i < len(x); i++ {
		switch step := (x[i] - x[i-1]) * (y[i] - y[i-1]); {
		case step > 0:
			up++
		case step < 0:
			down++
		}
	}
	switch {
	case up >= 2*down && up > 0:
		return 1
	case down >= 2*up && down > 0:
		return -1
	}
	return 0
}
