// Package report orders a study and its result for reading: print, plain text
// and spreadsheet all come from one Document. It computes nothing.
package report

import "brinefront/physics/study"

// Document is the hand-over, in reading order.
type Document struct {
	Title    string
	About    [][2]string // label and value: author, units, program
	Sections []Section
}

// Section is one heading with what stands under it.
type Section struct {
	ID     string // stable, for links: "summary", "inputs", "answers", ...
	Title  string
	Blocks []Block
}

// Block is one piece of a section; exactly one of its fields is set.
type Block struct {
	Heading   string
	Paragraph string
	Table     *Table
	Chart     *study.Chart
	Explained *Explanation
}

// Table is words and printed numbers, ready to show.
type Table struct {
	Title   string
	Columns []string
	Numeric []bool // per column: printed numbers, set flush right
	Rows    [][]string
}

// Explanation is one figure with how it was obtained, printed.
type Explanation struct {
	Label   string // "Breakthrough, tbt"
	Value   string
	Formula string // with symbols
	Numbers string // the same with the numbers put in
	Method  string
	Sources []string
	Inputs  []string
}

// Section finds a section by ID.
func (d Document) Section(id string) (Section, bool) {
	for _, s := range d.Sections {
		if s.ID == id {
			return s, true
		}
	}
	return Section{}, false
}
