package study

import (
	"slices"
	"strconv"
	"strings"

	"brinefront/physics/units"
)

// LabTable describes a laboratory table, as Spec does an input. The list below is the
// only place where a table is described.
type LabTable struct {
	Path    string
	Label   string
	Columns []Spec // Path is the column's name in the document, Label its heading; two or three

	get func(*Study) (columns [][]float64, source string)
	set func(*Study, [][]float64, string)
}

var labTables = []LabTable{
	{Path: "rock.table", Label: "Laboratory points",
		Columns: []Spec{
			{Path: "sw", Label: "Sw", Quantity: units.Fraction, Max: 1},
			{Path: "krw", Label: "krw", Quantity: units.Fraction, Max: largestKr},
			{Path: "kro", Label: "kro", Quantity: units.Fraction, Max: largestKr},
		},
		get: func(s *Study) ([][]float64, string) {
			if t := s.Rock.Table; t != nil {
				return [][]float64{t.Sw, t.Krw, t.Kro}, t.Source
			}
			return nil, ""
		},
		set: func(s *Study, c [][]float64, source string) {
			if s.Rock.Table = nil; c != nil {
				s.Rock.Table = &Table{c[0], c[1], c[2], source}
			}
		}},
	{Path: "rock.capillary.table", Label: "Capillary pressure points",
		Columns: []Spec{
			{Path: "sw", Label: "Sw", Quantity: units.Fraction, Max: 1},
			{Path: "pc", Label: "Pc", Quantity: units.Number, Min: -largestPc, Max: largestPc},
		},
		get: func(s *Study) ([][]float64, string) {
			if t := s.Rock.Capillary.Table; t != nil {
				return [][]float64{t.Sw, t.Pc}, t.Source
			}
			return nil, ""
		},
		set: func(s *Study, c [][]float64, source string) {
			if s.Rock.Capillary.Table = nil; c != nil {
				s.Rock.Capillary.Table = &PcTable{c[0], c[1], source}
			}
		}},
}

// largestKr is how large a relative permeability may be typed, in a table as in the end
// points of a curve: above 1 when it refers to oil permeability at initial water.
const largestKr = 2

// LabTables lists the laboratory tables in the order of the forms.
func LabTables() []LabTable { return labTables }

// FindTable returns the laboratory table that a path is of: the table's own or a cell's.
func FindTable(path string) (LabTable, bool) {
	for _, t := range labTables {
		if rest, ok := strings.CutPrefix(path, t.Path); ok && (rest == "" || rest[0] == '.') {
			return t, true
		}
	}
	return LabTable{}, false
}

// For returns the description in the words of the study's pair of fluids.
func (t LabTable) For(st *Study) LabTable {
	t.Columns = each(t.Columns, func(c Spec) Spec { return c.For(st) })
	return t
}

// Phases are the indices of the displacing and of the resident phase: w, o or g.
func Phases(st *Study) (displacing, resident string) {
	pair := pairOf(st)
	return pair.Displacing.Symbol, pair.Resident.Symbol
}

// Get returns the columns of a study's table, nil when it has none, and the note of
// where they come from. They are not to be written to.
func (t LabTable) Get(st *Study) (columns [][]float64, source string) { return t.get(st) }

// Set replaces the table of a study; without rows and without a note there is none.
func (t LabTable) Set(st *Study, columns [][]float64, source string) {
	if len(columns) == 0 || len(columns[0]) == 0 && source == "" {
		columns = nil
	}
	t.set(st, columns, source)
}

// Cell is the path of a cell: "rock.table.<row>.<column>".
func (t LabTable) Cell(row, column int) string {
	return t.Path + "." + strconv.Itoa(row) + "." + t.Columns[column].Path
}

// At takes the path of a cell apart; false when it is none of this table.
func (t LabTable) At(path string) (row, column int, ok bool) {
	rest, ok := strings.CutPrefix(path, t.Path+".")
	if !ok {
		return 0, 0, false
	}
	number, name, _ := strings.Cut(rest, ".")
	row, err := strconv.Atoi(number)
	column = slices.IndexFunc(t.Columns, func(s Spec) bool { return s.Path == name })
	return row, column, err == nil && column >= 0
}
