package study

import (
	"math"
	"slices"
	"strconv"
	"strings"
	"time"

	"brinefront/physics/units"
)

// Limits of the tables that are kept as text.
const (
	MaxLayers    = 200 // of a forecast
	maxTableText = 400000
)

// Some tables are kept as they were pasted: the first line names the unit of
// each column, every further line is a row. Cells are parted by tabs, semicolons or spaces;
// a dash or nothing is an empty cell. A cell may carry a unit of its own. Columns with a
// symbol may be left out: they follow the others, in any order, by their symbols.

// textColumn is a column of such a table.
type textColumn struct {
	name     string
	quantity units.Quantity
	min, max float64 // SI; min is exclusive unless the column may be empty
	optional bool
	symbol   string // of a column that may be left out; what is empty in it is NaN
}

// textTable is what a text at a path must hold.
type textTable struct {
	path, example string
	columns       []textColumn
	fromStart     bool // the first row stands at time 0
}

var layerTable = textTable{"field.layers.table", "ft md fraction", []textColumn{
	{"thickness", units.Length, 0, 5e3, false, ""},
	{"permeability", units.Permeability, 0, 1e-9, false, ""},
	{"porosity", units.Fraction, 0, 1, false, ""},
	{"initial water saturation", units.Fraction, 0, 1, true, "Swi"},
	{"residual oil saturation", units.Fraction, 0, 1, true, "Sor"},
	{"connate water saturation", units.Fraction, 0, 1, true, "Swc"},
}, false}

// layersTable is the table of layers with its columns named for the phases of the study.
func layersTable(st *Study) textTable {
	t := layerTable
	if w := wordsOf(pairOf(st)); w != nil {
		t.columns = each(t.columns, func(c textColumn) textColumn {
			c.name, c.symbol = w.tell(c.name), w.tell(c.symbol)
			return c
		})
	}
	return t
}

var scheduleTable = textTable{"field.wells.schedule", "d bbl/d psi", []textColumn{
	{"time or date", units.Duration, 0, 1e11, true, ""},
	{"injection rate", units.Rate, 0, 100, true, ""},
	{"pressure difference", units.Pressure, 0, 1e9, true, ""},
}, true}

var historyTable = textTable{"field.history.table", "date bbl/d bbl/d", []textColumn{
	{"time or date", units.Duration, 0, 1e11, true, ""},
	{"oil rate", units.Rate, 0, 100, true, ""},
	{"water rate", units.Rate, 0, 100, true, ""},
}, false}

func (t textTable) refuse(line int, read, allowed string) *Problem {
	return &Problem{Path: t.path, Read: "in line " + strconv.Itoa(line) + ", " + read, Allowed: allowed}
}

// read returns the rows in SI, a column after another; empty optional cells are 0, or NaN
// under a symbol. Dates count from start.
func (t textTable) read(text, start string) (columns [][]float64, problem *Problem) {
	columns = make([][]float64, len(t.columns))
	unit := make([]units.Unit, len(t.columns))
	from, width := make([]int, len(t.columns)), 0 // the cell of each column, -1 where there is none
	head := true
	for i, line := range strings.Split(text, "\n") {
		cells := cellsOf(line)
		if len(cells) == 0 {
			continue
		}
		if head {
			if from, width, problem = t.places(cells, i+1); problem != nil {
				return nil, problem
			}
		}
		if len(cells) > width {
			return nil, t.refuse(i+1, strconv.Itoa(len(cells))+" cells", "up to "+strconv.Itoa(width))
		}
		for c, column := range t.columns {
			cell := ""
			if 0 <= from[c] && from[c] < len(cells) {
				cell = cells[from[c]]
			}
			if head {
				var ok bool
				if unit[c], ok = unitIn(column.quantity, cell); !ok && !(c >= len(cells) && column.optional || column.symbol != "" && len(wordsIn(cell)) < 2) {
					return nil, t.refuse(i+1, quoted(cell)+" over the column of "+column.name, "a first line with the units, such as "+t.example)
				}
				continue
			}
			value, problem := t.cell(column, cell, unit[c], start, i+1)
			if problem != nil {
				return nil, problem
			}
			columns[c] = append(columns[c], value)
		}
		head = false
	}
	if len(columns[0]) > MaxRows {
		return nil, &Problem{Path: t.path, Read: strconv.Itoa(len(columns[0])) + " rows", Allowed: "up to " + strconv.Itoa(MaxRows)}
	}
	return columns, nil
}

// places finds the cell of each column by the first line, and how many cells there are.
func (t textTable) places(cells []string, line int) (from []int, width int, problem *Problem) {
	var symbols []string
	for c, column := range t.columns {
		from = append(from, c)
		if column.symbol == "" {
			width++
			continue
		}
		from[c], symbols = -1, append(symbols, column.symbol)
	}
	for i := width; i < len(cells); i++ {
		c := slices.IndexFunc(t.columns, func(c textColumn) bool {
			return c.symbol != "" && slices.ContainsFunc(wordsIn(cells[i]), func(word string) bool { return strings.EqualFold(word, c.symbol) })
		})
		switch {
		case len(symbols) == 0:
			return nil, 0, t.refuse(line, strconv.Itoa(len(cells))+" cells", "up to "+strconv.Itoa(width))
		case c < 0 || from[c] >= 0:
			return nil, 0, t.refuse(line, quoted(cells[i])+" over column "+strconv.Itoa(i+1), "after the units of the others, each once: "+strings.Join(symbols, ", ")+"; with a unit as "+symbols[0]+"(%)")
		}
		from[c] = i
	}
	return from, max(width, len(cells)), nil
}

func (t textTable) cell(column textColumn, cell string, unit units.Unit, start string, line int) (float64, *Problem) {
	allowed := "a " + column.name + " above 0"
	if cell == "" {
		switch {
		case column.symbol != "":
			return math.NaN(), nil
		case column.optional:
			return 0, nil
		}
		return 0, t.refuse(line, "no "+column.name, allowed)
	}
	if column.quantity == units.Duration {
		if day, err := time.Parse(time.DateOnly, cell); err == nil {
			first, err := time.Parse(time.DateOnly, start)
			if err != nil || day.Before(first) {
				return 0, t.refuse(line, quoted(cell), "a date from the first day of injection on, which must be given")
			}
			return day.Sub(first).Seconds(), nil
		}
		allowed = "a time since the start, or a date such as 2027-03-01"
	}
	number, own, err := units.Parse(column.quantity, cell, unit)
	if err != nil {
		return 0, t.refuse(line, quoted(cell), allowed)
	}
	si := own.ToSI(number)
	if !(si <= column.max && (si > column.min || column.optional && si == column.min)) {
		return 0, t.refuse(line, withUnit(units.Exact(number), own)+" for "+column.name, withUnit(map[bool]string{true: "from ", false: "above "}[column.optional]+"0 to "+units.Format(own.FromSI(column.max), 6), own))
	}
	return si, nil
}

// cellsOf parts a line; a dash is an empty cell.
func cellsOf(line string) []string {
	var cells []string
	switch line = strings.TrimRight(line, " \t\r"); {
	case strings.Contains(line, "\t"):
		cells = strings.Split(line, "\t")
	case strings.Contains(line, ";"):
		cells = strings.Split(line, ";")
	default:
		cells = strings.Fields(line)
	}
	for i, cell := range cells {
		if cells[i] = strings.TrimSpace(cell); cells[i] == "-" || cells[i] == "–" {
			cells[i] = ""
		}
	}
	return cells
}

// wordsIn parts a heading.
func wordsIn(heading string) []string {
	return strings.FieldsFunc(heading, func(r rune) bool { return strings.ContainsRune(" ()[],", r) })
}

// unitIn finds a unit in the heading of a column: "ft", "h (ft)", "k, md".
func unitIn(q units.Quantity, heading string) (units.Unit, bool) {
	for _, word := range wordsIn(heading) {
		if _, u, err := units.Parse(q, "1 "+word, units.Unit{}); err == nil && u.Quantity == q {
			return u, true
		}
	}
	return units.Of(q)[0], q == units.Duration && strings.Contains(strings.ToLower(heading), "date")
}

// CheckText says whether a text of the study that means something may stand at a path:
// the first day of injection, the layers, the schedule, the history, the sizes of blocks.
func CheckText(st *Study, path, text string) *Problem {
	switch path {
	case "field.start":
		return CheckStart(text)
	case layerTable.path:
		_, problem := layersTable(st).rows(text, "")
		return problem
	case scheduleTable.path:
		_, problem := scheduleTable.rows(text, st.Field.Start)
		return problem
	case sizeTable.path:
		_, problem := sizeTable.rows(text, "")
		return problem
	case historyTable.path:
		_, problem := historyTable.rows(text, st.Field.Start)
		return problem
	}
	return nil
}

// HasMeaning reports whether the text at a path is read, not only kept.
func HasMeaning(path string) bool {
	return slices.Contains([]string{"field.start", layerTable.path, scheduleTable.path, historyTable.path, sizeTable.path}, path)
}

// rows reads a table that has rows, in rising order where its first column is time.
func (t textTable) rows(text, start string) ([][]float64, *Problem) {
	if strings.TrimSpace(text) == "" {
		return nil, nil
	}
	columns, problem := t.read(text, start)
	if problem != nil {
		return nil, problem
	}
	if len(columns[0]) == 0 {
		return nil, &Problem{Path: t.path, Read: "no rows", Allowed: "a first line with the units, such as " + t.example + ", and rows below it"}
	}
	if t.columns[0].quantity == units.Duration {
		for i, time := range columns[0] {
			if i == 0 && time != 0 && t.fromStart || i > 0 && time <= columns[0][i-1] {
				return nil, &Problem{Path: t.path, Read: "row " + strconv.Itoa(i+1) + " out of order", Allowed: "times that rise; those of a schedule from 0 or the first day on"}
			}
		}
	}
	return columns, nil
}
