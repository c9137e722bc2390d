package relperm

import (
	"fmt"
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

// MaxKr is the largest relative permeability a table may hold. Values above one
// are lawful when the curves refer to the oil permeability at initial water;
// values far above it are percent, or not relative permeabilities.
const MaxKr = 2

// Table is a pair of curves through laboratory rows. The first row is the connate
// water saturation, the last the largest water saturation. At a row the slope is
// that of the cell to its right, at the last row that of the last cell.
type Table struct {
	nodes      []float64
	water, oil []numeric.Cell
	kind       Kind
}

var _ Curves = Table{}

// TableError says which row of a table cannot be used and why.
type TableError struct {
	Row     int    // counted from 1; 0 when it is about the whole table
	Column  string // "sw", "krw", "kro"
	Read    string
	Allowed string
}

// Error implements error.
func (e *TableError) Error() string {
	if e.Row == 0 {
		return fmt.Sprintf("%s: read %s; allowed: %s", e.Column, e.Read, e.Allowed)
	}
	return fmt.Sprintf("row %d, %s: read %s; allowed: %s", e.Row, e.Column, e.Read, e.Allowed)
}

// NewTable makes curves of rows: sw rises strictly within 0 to 1, krw does not
// fall, kro does not rise, both are within 0 to MaxKr, and in every row at least
// one phase can flow. The error, a *TableError, names the first row that does not
// obey. The slices are copied.
func NewTable(sw, krw, kro []float64, kind Kind) (Table, error) {
	if err := checkTable(sw, krw, kro); err != nil {
		return Table{}, err
	}
	t := Table{kind: kind}
	switch kind {
	case StraightLine:
		water := numeric.NewLinear(sw, krw)
		t.nodes, t.water, t.oil = water.Nodes(), water.Cells(), numeric.NewLinear(sw, kro).Cells()
	default:
		water := numeric.NewMonotoneCubic(sw, krw)
		t.nodes, t.water, t.oil = water.Nodes(), water.Cells(), numeric.NewMonotoneCubic(sw, kro).Cells()
	}
	return t, nil
}

func checkTable(sw, krw, kro []float64) error {
	if len(sw) < 2 {
		return &TableError{0, "sw", strconv.Itoa(len(sw)) + " rows", "two rows or more"}
	}
	if len(krw) != len(sw) || len(kro) != len(sw) {
		return &TableError{0, "krw, kro", fmt.Sprintf("%d and %d values beside %d saturations", len(krw), len(kro), len(sw)), "one of each in every row"}
	}
	for i := range sw {
		for _, v := range []struct {
			column  string
			value   float64
			highest float64
		}{{"sw", sw[i], 1}, {"krw", krw[i], MaxKr}, {"kro", kro[i], MaxKr}} {
			if !(v.value >= 0 && v.value <= v.highest) {
				return &TableError{i + 1, v.column, units.Exact(v.value), fmt.Sprintf("0 to %g, as a fraction", v.highest)}
			}
		}
		if krw[i] == 0 && kro[i] == 0 {
			return &TableError{i + 1, "krw, kro", "0 and 0", "at least one phase that can flow"}
		}
		if i == 0 {
			continue
		}
		switch {
		case sw[i] <= sw[i-1]:
			return &TableError{i + 1, "sw", units.Exact(sw[i]), "more than " + units.Exact(sw[i-1]) + " of the row before"}
		case krw[i] < krw[i-1]:
			return &TableError{i + 1, "krw", units.Exact(krw[i]), "not less than " + units.Exact(krw[i-1]) + " of the row before"}
		case kro[i] > kro[i-1]:
			return &TableError{i + 1, "kro", units.Exact(kro[i]), "not more than " + units.Exact(kro[i-1]) + " of the row before"}
		}
	}
	return nil
}

// At implements Curves.
func (t Table) At(sw float64) Point {
	last := len(t.nodes) - 1
	switch {
	case sw < t.nodes[0]:
		return Point{Krw: t.water[0].Y0, Kro: t.oil[0].Y0}
	case sw > t.nodes[last]:
		return Point{Krw: t.water[last-1].Y1, Kro: t.oil[last-1].Y1}
	}
	cell := numeric.Locate(t.nodes, sw)
	var p Point
	if t.kind == StraightLine {
		p.Krw, p.DKrw = t.water[cell].Line(sw)
		p.Kro, p.DKro = t.oil[cell].Line(sw)
	} else {
		p.Krw, p.DKrw = t.water[cell].Cubic(sw)
		p.Kro, p.DKro = t.oil[cell].Cubic(sw)
	}
	return p
}

// Ends implements Curves: the first and the last row.
func (t Table) Ends() (swc, swmax float64) { return t.nodes[0], t.nodes[len(t.nodes)-1] }

// Knots implements Curves: every row but the first and the last. The slice is not
// to be changed.
func (t Table) Knots() []float64 { return t.nodes[1 : len(t.nodes)-1] }
