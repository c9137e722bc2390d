package paste

import (
	"fmt"
	"slices"
)

// Read reads a text that was copied from a spreadsheet, a report or a CSV file.
//
// It works in five steps, each in its own file: the text is cut into lines
// (lines.go), the separator is found (separator.go), lines are cut into cells and
// heading rows are set apart from data rows (rows.go), columns are given their
// roles from their headings or from their place (names.go, roles.go), and cells
// become numbers (decimal.go, values.go).
//
// Special cases are:
//   - a text over MaxBytes, MaxRows or MaxColumns is refused unread, with one problem
//   - a text in which a comma may be both separator and decimal mark is refused
//     with a problem, because a guess would move numbers from one column to another
//   - an empty text has one problem
func Read(text string, want Layout) Reading {
	if len(text) > MaxBytes {
		return refused(fmt.Sprintf("a text of %.1f MB", float64(len(text))/(1<<20)),
			"at most 1 MB: copy only the rows of the table")
	}
	lines, ok := split(text)
	if !ok {
		return refused(fmt.Sprintf("more than %s rows", thousands(MaxRows)),
			fmt.Sprintf("at most %s rows: copy only the rows of the table", thousands(MaxRows)))
	}
	if len(lines) == 0 {
		return refused("an empty text", "a table of at least 3 rows with "+want.wanted())
	}

	sep := findSeparator(lines)
	if sep.ambiguous {
		r := refused("commas that may separate columns or mark decimals, as in \""+clip(sep.example)+"\"",
			"columns separated by tabs, semicolons or spaces, or decimal points")
		for _, line := range lines {
			r.Cells = append(r.Cells, []string{line})
		}
		return r
	}
	rows, widest := cut(lines, sep)
	if widest > MaxColumns {
		return refused(fmt.Sprintf("a row of %s cells", thousands(widest)), fmt.Sprintf("at most %d columns", MaxColumns))
	}

	r := Reading{Separator: sep.name, want: want}
	var said notes
	heading, data := arrange(upright(rows, widest, &said), &said)
	if len(data) > MaxRows {
		return refused(fmt.Sprintf("%s rows", thousands(len(data))), fmt.Sprintf("at most %s rows", thousands(MaxRows)))
	}
	if len(data) == 0 {
		r = refused("no row of numbers", "a table of at least 3 rows with "+want.wanted())
		r.Separator, r.Cells = sep.name, rows
		return r
	}
	r.Cells = data
	r.Decimal = findDecimal(data)
	r.Header, r.Columns = titles(heading, data, &said)
	r.layout = said.remarks
	roles, remarks := r.assign()
	return r.interpret(roles, remarks)
}

// With returns the reading with a column put to another use: as is a column of the
// layout, So, or "" for none. The column that had that use before loses it. A column or a
// use that does not exist changes nothing.
func (r Reading) With(column int, as string) Reading {
	if column < 0 || column >= len(r.Columns) || !(as == "" || as == So || slices.Contains(r.want.columns, as)) {
		return r
	}
	roles := make([]role, len(r.Columns))
	for i, c := range r.Columns {
		roles[i] = role{as: c.As, oil: c.Oil}
	}
	wanted := role{as: as, oil: as == So || as == Sw && r.want.role(r.Columns[column].Title) == So}
	if as == So {
		wanted.as = Sw
	}
	for i := range roles {
		if roles[i].as == wanted.as {
			roles[i] = role{}
		}
	}
	roles[column] = wanted
	return r.interpret(roles, nil)
}

// Table returns the columns of the layout, in its order, the rows in rising order of
// water saturation, and the unit that the heading of Pc names. It is ok when the reading
// has no problem and every column was found.
func (r Reading) Table() (columns [][]float64, unit string, ok bool) {
	if len(r.Problems) > 0 {
		return nil, "", false
	}
	turned := falls(r.values(Sw))
	for _, as := range r.want.columns {
		values := slices.Clone(r.values(as))
		if values == nil {
			return nil, "", false
		}
		if turned {
			slices.Reverse(values)
		}
		columns = append(columns, values)
	}
	for _, c := range r.Columns {
		unit += c.Unit
	}
	return columns, unit, true
}

// values returns the values of the column with a role, nil when there is none.
func (r Reading) values(as string) []float64 {
	for _, c := range r.Columns {
		if c.As == as {
			return c.Values
		}
	}
	return nil
}

// refused is a reading that holds nothing but the reason.
func refused(read, allowed string) Reading {
	return Reading{Problems: []Problem{{Row: -1, Column: -1, Read: read, Allowed: allowed}}}
}
