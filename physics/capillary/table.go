package capillary

import (
	"math"
	"strconv"

	"brinefront/physics/numeric"
	"brinefront/physics/units"
)

// Kind is the way a table is read between its rows.
type Kind int

const (
	// MonotoneCubic joins the rows smoothly and never overshoots: Fritsch & Carlson (1980).
	MonotoneCubic Kind = iota
	// StraightLine joins the rows by straight lines, as reservoir simulators read tables.
	StraightLine
)

// Table is a curve through laboratory rows, in Pa or, to be Scaled, in J. It ends with
// its first and last row; what lies beyond is not made up. At a row the slope is that of
// the cell to its right, at the last row that of the last cell.
type Table struct {
	nodes []float64
	cells []numeric.Cell
	kind  Kind
}

var _ Curve = Table{}

// TableError says which row of a table cannot be used and why.
type TableError struct {
	Row     int    // counted from 1; 0 when it is about the whole table
	Column  string // "sw", "pc"
	Read    string
	Allowed string
}

// Error implements error.
func (e *TableError) Error() string {
	text := e.Column + ": read " + e.Read + "; allowed: " + e.Allowed
	if e.Row == 0 {
		return text
	}
	return "row " + strconv.Itoa(e.Row) + ", " + text
}

// NewTable makes a curve of rows: sw rises strictly within 0 to 1, pc is finite, never
// rises, and is not one and the same in every row. The error, a *TableError, names the
// first row that does not obey. The slices are copied.
func NewTable(sw, pc []float64, kind Kind) (Table, error) {
	if err := checkTable(sw, pc); err != nil {
		return Table{}, err
	}
	var through numeric.Interpolant
	if kind == StraightLine {
		through = numeric.NewLinear(sw, pc)
	} else {
		through = numeric.NewMonotoneCubic(sw, pc)
	}
	return Table{through.Nodes(), through.Cells(), kind}, nil
}

func checkTable(sw, pc []float64) error {
	if len(sw) < 2 {
		return &TableError{0, "sw", strconv.Itoa(len(sw)) + " rows", "two rows or more"}
	}
	if len(pc) != len(sw) {
		return &TableError{0, "pc", strconv.Itoa(len(pc)) + " values beside " + strconv.Itoa(len(sw)) + " saturations", "one in every row"}
	}
	for i := range sw {
		switch {
		case !(sw[i] >= 0 && sw[i] <= 1):
			return &TableError{i + 1, "sw", units.Exact(sw[i]), "0 to 1, as a fraction"}
		case math.IsNaN(pc[i]) || math.IsInf(pc[i], 0):
			return &TableError{i + 1, "pc", units.Exact(pc[i]), "a finite number"}
		case i == 0:
		case sw[i] <= sw[i-1]:
			return &TableError{i + 1, "sw", units.Exact(sw[i]), "more than " + units.Exact(sw[i-1]) + " of the row before"}
		case pc[i] > pc[i-1]:
			return &TableError{i + 1, "pc", units.Exact(pc[i]), "not more than " + units.Exact(pc[i-1]) + " of the row before"}
		}
	}
	if pc[0] == pc[len(pc)-1] {
		return &TableError{0, "pc", units.Exact(pc[0]) + " in every row", "a capillary pressure that falls"}
	}
	return nil
}

// At implements Curve.
func (t Table) At(sw float64) (pc, slope float64) {
	last := len(t.nodes) - 1
	switch {
	case sw < t.nodes[0]:
		return t.cells[0].Y0, 0
	case sw > t.nodes[last]:
		return t.cells[last-1].Y1, 0
	}
	cell := t.cells[numeric.Locate(t.nodes, sw)]
	if math.IsNaN(sw) {
		return sw, sw
	}
	if t.kind == StraightLine {
		return cell.Line(sw)
	}
	return cell.Cubic(sw)
}

// Ends implements Curve: the first and the last row.
func (t Table) Ends() (low, high float64) { return t.nodes[0], t.nodes[len(t.nodes)-1] }

// Knots implements Curve: every row but the first and the last. The slice is not to
// be changed.
func (t Table) Knots() []float64 { return t.nodes[1 : len(t.nodes)-1] }
