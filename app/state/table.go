package state

import (
	"fmt"
	"maps"
	"math"
	"slices"
	"strconv"
	"strings"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

// Row is one row of a laboratory table as typed, in the order of its columns; a table
// of two leaves the third alone.
type Row struct {
	Text  [3]string
	value [3]float64 // NaN where the text is no number that can be used
}

// read takes a text into a cell and returns what is wrong with it. An empty cell is not wrong.
func (r *Row) read(spec study.Spec, column int, text string) *study.Problem {
	r.Text[column], r.value[column] = text, math.NaN()
	if strings.TrimSpace(text) == "" {
		return nil
	}
	number, unit, err := units.Parse(spec.Quantity, text, units.Of(spec.Quantity)[0])
	if err != nil {
		return asRead(err)
	}
	if problem := study.Check(spec, number, unit); problem != nil {
		return problem
	}
	r.value[column] = unit.ToSI(number)
	return nil
}

// standing of a row: one with a text that cannot be used is bad, one with some
// of its n cells empty is unfinished, one with all of them empty does not count.
func (r Row) standing(n int) (bad, unfinished, complete bool) {
	empty := 0
	for column, text := range r.Text[:n] {
		blank := strings.TrimSpace(text) == ""
		if blank {
			empty++
		}
		bad = bad || !blank && math.IsNaN(r.value[column])
	}
	return bad, empty > 0 && empty < n, empty == 0 && !bad
}

// rowsOf are the tables of a study as they would be typed, by path.
func rowsOf(st *study.Study) map[string][]Row {
	all := map[string][]Row{}
	for _, t := range study.LabTables() {
		if columns, _ := t.Get(st); columns != nil {
			all[t.Path] = typedRows(columns)
		}
	}
	return all
}

func typedRows(columns [][]float64) []Row {
	rows := make([]Row, len(columns[0]))
	for i := range rows {
		for c := range columns {
			rows[i].value[c], rows[i].Text[c] = columns[c][i], units.Exact(columns[c][i])
		}
	}
	return rows
}

// Rows are those of the laboratory table at a path as typed: what the grid shows. The
// study's own is the last good reading of them.
func (m Model) Rows(table string) []Row { return m.rows[table] }

func (m Model) cellEdited(t study.LabTable, row, column int, msg Edited) (Model, []Effect) {
	if row < 0 || row >= len(m.rows[t.Path]) {
		return m, nil
	}
	return m.amend(msg.Path, func(p *page) {
		rows := slices.Clone(p.rows[t.Path])
		rows[row].read(t.Columns[column], column, clean(msg.Text))
		p.tabulate(t, rows)
	})
}

// rowAdded puts an empty row after another; past either end of the table, at that end.
func (m Model) rowAdded(msg RowAdded) (Model, []Effect) {
	t, ok := study.FindTable(msg.Table)
	if !ok {
		return m, nil
	}
	if n := len(m.rows[t.Path]); n >= study.MaxRows {
		return m.notice("refused", fmt.Sprintf("The table holds %d rows, which is as many as it can.", n)), nil
	}
	return m.amend("", func(p *page) {
		rows := p.rows[t.Path]
		at := min(max(msg.After, -1)+1, len(rows))
		var empty Row
		for column := range t.Columns {
			empty.read(t.Columns[column], column, "")
		}
		p.tabulate(t, slices.Insert(slices.Clone(rows), at, empty))
	})
}

func (m Model) rowRemoved(msg RowRemoved) (Model, []Effect) {
	t, ok := study.FindTable(msg.Table)
	if !ok || msg.Row < 0 || msg.Row >= len(m.rows[t.Path]) {
		return m, nil
	}
	return m.amend("", func(p *page) {
		p.tabulate(t, slices.Delete(slices.Clone(p.rows[t.Path]), msg.Row, msg.Row+1))
	})
}

// tabulate takes rows as typed and reads them. Complete rows are the table; unfinished
// ones are left out until they are filled; while one is bad, the last good table stays
// in use. It says all that.
func (p *page) tabulate(t study.LabTable, rows []Row) {
	p.rows = maps.Clone(p.rows)
	p.rows[t.Path] = rows
	for path := range p.messages {
		if of, ok := study.FindTable(path); ok && of.Path == t.Path {
			delete(p.messages, path)
		}
	}
	table := make([][]float64, len(t.Columns))
	for c := range table {
		table[c] = []float64{}
	}
	var bad, unfinished []string
	for i, row := range rows {
		isBad, isUnfinished, isComplete := row.standing(len(table))
		switch {
		case isBad:
			bad = append(bad, strconv.Itoa(i+1))
			p.faults(t, i, row)
		case isUnfinished:
			unfinished = append(unfinished, strconv.Itoa(i+1))
		case isComplete:
			for c := range table {
				table[c] = append(table[c], row.value[c])
			}
		}
	}
	old, source := t.Get(&p.study)
	var said []string
	if len(bad) > 0 {
		last := "no table is in use until then"
		if old != nil {
			last = fmt.Sprintf("until then the last good table, of %d rows, stays in use", len(old[0]))
		}
		said = append(said, named(bad)+" cannot be read; "+last+".")
	}
	if len(unfinished) > 0 {
		said = append(said, named(unfinished)+" is left out until all its cells are filled.")
	}
	if len(said) > 0 {
		p.messages[t.Path] = strings.Join(said, " ")
	}
	if len(bad) > 0 {
		return
	}
	// The note of where the table comes from stays, but for the demonstration's.
	if !slices.EqualFunc(old, table, slices.Equal) {
		source = own(source)
	}
	t.Set(&p.study, table, source)
}

// faults says what is wrong with the cells of a bad row.
func (p *page) faults(t study.LabTable, i int, row Row) {
	for column, spec := range t.Columns {
		if problem := row.read(spec, column, row.Text[column]); problem != nil {
			p.messages[t.Cell(i, column)] = says(problem)
		}
	}
}

// named names a few rows.
func named(numbers []string) string {
	const most = 5
	more := ""
	if n := len(numbers) - most; n > 0 {
		numbers, more = numbers[:most], fmt.Sprintf(" and %d more", n)
	}
	if len(numbers) == 1 {
		return "Row " + numbers[0]
	}
	return "Each of the rows " + strings.Join(numbers, ", ") + more
}
