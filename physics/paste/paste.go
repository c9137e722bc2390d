// Package paste reads a table out of text copied from a spreadsheet or a report:
// tabs, commas, semicolons or runs of spaces; decimal points or commas; header
// rows; units in headers; fractions or percent. It says how it read everything,
// so that the person can see and correct it before the table is used.
package paste

import "strconv"

// Column names a table may ask for.
const (
	Sw  = "sw"
	Krw = "krw"
	Kro = "kro"
	Pc  = "pc"
	So  = "so" // for With only: the column holds the other saturation, of oil, and serves as Sw, with sw = 1 - so
)

// What is refused before it is looked at, and how much is said about a bad text.
const (
	MaxBytes    = 1 << 20 // one mebibyte
	MaxRows     = 10_000
	MaxColumns  = 100
	MinRows     = 3
	maxProblems = 200 // told one by one; the rest as a count
)

// Reading is a pasted text and how it was read.
type Reading struct {
	Separator string     // "tab", "comma", "semicolon", "spaces"
	Decimal   string     // "point", "comma"
	Header    []string   // the header cells; nil when there is none
	Columns   []Column   // one per column of the text
	Cells     [][]string // the data rows as text, for the preview (all rows)
	Problems  []Problem  // what keeps the table from being used; empty: it can be used
	Remarks   []string   // what was assumed: "column 2 read as percent"

	layout []string // what was assumed while the text was cut into cells; With keeps it
	want   Layout
}

// notes gathers what there is to say about a text.
type notes struct {
	problems []Problem
	remarks  []string
}

func (n *notes) problem(row, column int, read, allowed string) {
	n.problems = append(n.problems, Problem{Row: row, Column: column, Read: read, Allowed: allowed})
}

func (n *notes) remark(text string) { n.remarks = append(n.remarks, text) }

// Column is what was made of one column of the text.
type Column struct {
	Title   string    // its header cell, or ""
	As      string    // Sw, Krw, Kro, Pc, or "" for none
	Unit    string    // of Pc as its heading says: "psi", "kPa", ..., "J"; "" when it says none
	Percent bool      // values were divided by 100
	Oil     bool      // the saturation column held oil: sw = 1 - so was taken
	Values  []float64 // as fractions, Pc as written, in the order of Cells; NaN where a cell could not be read; nil when As is ""
}

// Problem is a cell or a column that could not be read. Row and Column are
// zero-based; -1 when it is about the whole.
type Problem struct {
	Row, Column int
	Read        string
	Allowed     string
}

// emptyCell is what is read of a cell without a text.
const emptyCell = "an empty cell"

// Quoted is Read as a sentence shows it: a cell's own text in quotes, the words of
// the reader without.
func (p Problem) Quoted() string {
	if p.Row < 0 || p.Read == emptyCell || p.Read == "" {
		return p.Read
	}
	return strconv.Quote(p.Read)
}
