package state

import (
	"fmt"
	"math"
	"slices"
	"strconv"
	"strings"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

// tablePath is the path of the laboratory table; a cell's is
// "rock.table.<row>.<column>".
const tablePath = "rock.table"

// cellSpecs say what a cell of each column may hold. A saturation is a fraction;
// so is relative permeability, but referred to oil permeability at initial water
// it may pass 1, and as high as the typed curves' end points may be.
var cellSpecs = [3]study.Spec{
	{Path: "sw", Quantity: units.Fraction, Max: 1},
	{Path: "krw", Quantity: units.Fraction, Max: endPointLimit("rock.corey.krw0")},
	{Path: "kro", Quantity: units.Fraction, Max: endPointLimit("rock.corey.kro0")},
}

func endPointLimit(path string) float64 {
	spec, ok := study.Find(path)
	if !ok {
		panic("state: the study has no input " + path)
	}
	return spec.Max
}

// Row is one row of the laboratory table as typed: sw, krw, kro.
type Row struct {
	Text  [3]string
	value [3]float64 // NaN where the text is no number that can be used
}

// read takes a text into a cell and returns what is wrong with it. An empty cell is not wrong.
func (r *Row) read(column int, text string) *study.Problem {
	r.Text[column], r.value[column] = text, math.NaN()
	if strings.TrimSpace(text) == "" {
		return nil
	}
	spec := cellSpecs[column]
	fraction := units.Of(units.Fraction)[0]
	number, unit, err := units.Parse(spec.Quantity, text, fraction)
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
// cells empty is unfinished, one with all of them empty does not count.
func (r Row) standing() (bad, unfinished, complete bool) {
	empty := 0
	for column, text := range r.Text {
		blank := strings.TrimSpace(text) == ""
		if blank {
			empty++
		}
		bad = bad || !blank && math.IsNaN(r.value[column])
	}
	return bad, empty == 1 || empty == 2, empty == 0 && !bad
}

// rowsOf is a table as it would be typed.
func rowsOf(t *study.Table) []Row {
	if t == nil {
		return nil
	}
	rows := make([]Row, len(t.Sw))
	for i := range rows {
		rows[i].value = [3]float64{t.Sw[i], t.Krw[i], t.Kro[i]}
		for column, v := range rows[i].value {
			rows[i].Text[column] = units.Exact(v)
		}
	}
	return rows
}

// cellAt is the row and column of a cell's path.
func cellAt(path string) (row, column int, ok bool) {
	rest, ok := strings.CutPrefix(path, tablePath+".")
	if !ok {
		return 0, 0, false
	}
	number, name, _ := strings.Cut(rest, ".")
	row, err := strconv.Atoi(number)
	column = slices.IndexFunc(cellSpecs[:], func(s study.Spec) bool { return s.Path == name })
	return row, column, err == nil && column >= 0
}

func cellPath(row, column int) string {
	return tablePath + "." + strconv.Itoa(row) + "." + cellSpecs[column].Path
}

func (m Model) cellEdited(row, column int, msg Edited) (Model, []Effect) {
	if row < 0 || row >= len(m.Rows) {
		return m, nil
	}
	return m.amend(msg.Path, func(p *page) {
		p.rows = slices.Clone(p.rows)
		p.rows[row].read(column, clean(msg.Text))
		p.tabulate()
	})
}

// rowAdded puts an empty row after another; past either end of the table, at that end.
func (m Model) rowAdded(msg RowAdded) (Model, []Effect) {
	if len(m.Rows) >= study.MaxRows {
		return m.notice("refused", fmt.Sprintf("The table holds %d rows, which is as many as it can.", len(m.Rows))), nil
	}
	return m.amend("", func(p *page) {
		at := min(max(msg.After, -1)+1, len(p.rows))
		var empty Row
		for column := range empty.Text {
			empty.read(column, "")
		}
		p.rows = slices.Insert(slices.Clone(p.rows), at, empty)
		p.tabulate()
	})
}

func (m Model) rowRemoved(msg RowRemoved) (Model, []Effect) {
	if msg.Row < 0 || msg.Row >= len(m.Rows) {
		return m, nil
	}
	return m.amend("", func(p *page) {
		p.rows = slices.Delete(slices.Clone(p.rows), msg.Row, msg.Row+1)
		p.tabulate()
	})
}

// tabulate reads the rows as typed. Complete rows are the table; unfinished ones
// are left out until they are filled; while one is bad, the last good table stays
// in use. It says all that.
func (p *page) tabulate() {
	for path := range p.messages {
		if strings.HasPrefix(path, tablePath) {
			delete(p.messages, path)
		}
	}
	table := study.Table{Sw: []float64{}, Krw: []float64{}, Kro: []float64{}}
	var bad, unfinished []string
	for i, row := range p.rows {
		isBad, isUnfinished, isComplete := row.standing()
		switch {
		case isBad:
			bad = append(bad, strconv.Itoa(i+1))
			p.faults(i, row)
		case isUnfinished:
			unfinished = append(unfinished, strconv.Itoa(i+1))
		case isComplete:
			table.Sw, table.Krw, table.Kro = append(table.Sw, row.value[0]), append(table.Krw, row.value[1]), append(table.Kro, row.value[2])
		}
	}
	var said []string
	if len(bad) > 0 {
		last := "no table is in use until then"
		if t := p.study.Rock.Table; t != nil {
			last = fmt.Sprintf("until then the last good table, of %d rows, stays in use", len(t.Sw))
		}
		said = append(said, named(bad)+" cannot be read; "+last+".")
	}
	if len(unfinished) > 0 {
		said = append(said, named(unfinished)+" is left out until all three cells are filled.")
	}
	if len(said) > 0 {
		p.messages[tablePath] = strings.Join(said, " ")
	}
	if len(bad) == 0 {
		p.use(table)
	}
}

// use makes a table the study's. The note of where it comes from stays; a table
// without rows and without a note is none.
func (p *page) use(table study.Table) {
	if old := p.study.Rock.Table; old != nil {
		table.Source = old.Source
		if !sameTable(old, &table) {
			table.Source = own(old.Source)
		}
	}
	p.study.Rock.Table = &table
	if len(table.Sw) == 0 && table.Source == "" {
		p.study.Rock.Table = nil
	}
}

// faults says what is wrong with the cells of a bad row.
func (p *page) faults(i int, row Row) {
	for column, text := range row.Text {
		if problem := row.read(column, text); problem != nil {
			p.messages[cellPath(i, column)] = says(problem)
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
