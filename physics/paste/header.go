package paste

import (
	"fmt"
	"strings"
)

// titles joins the heading rows into one title a column: "Sw" above "%" is "Sw %".
// A row of one cell above several columns is the caption of the table and titles
// none of them. A row of more cells than the data has, as spaces or commas inside
// headings make, is folded first; when that fails it is left out and said so.
func titles(heading, data [][]string, said *notes) (header []string, columns []Column) {
	width := 0
	for _, cells := range data {
		width = max(width, len(cells))
	}
	columns = make([]Column, width)
	usual := len(data[0])
	heading, above := belowCaptions(heading, usual)
	for i, row := range heading {
		filled := countFilled(row)
		if filled == 1 && usual > 1 {
			continue
		}
		row = fold(row, usual)
		if len(row) > width {
			if countNames(row) > 0 {
				said.remark(fmt.Sprintf("Line %d has %d cells and the rows below have %d, so it was left out.", above+i+1, len(row), usual))
			}
			continue
		}
		if countNumbers(row) > 0 && len(row) == usual {
			said.remark(fmt.Sprintf("Line %d, \"%s\", holds words and numbers and was read as heading.", above+i+1, clip(strings.Join(row, " "))))
		}
		if header == nil {
			header = make([]string, width)
		}
		for j, cell := range row {
			if cell != "" {
				header[j] = strings.TrimSpace(header[j] + " " + cell)
			}
		}
	}
	for j := range header {
		columns[j].Title = header[j]
	}
	return header, columns
}

// belowCaptions drops the heading rows above the first that names two columns by
// itself: they caption the table. Without such a row, as when names are spread over
// two rows, it drops none. It returns how many were dropped.
func belowCaptions(heading [][]string, usual int) (rows [][]string, dropped int) {
	for i, row := range heading {
		if countNames(fold(row, usual)) >= 2 {
			return heading[i:], i
		}
	}
	return heading, 0
}

func countNames(row []string) int {
	n := 0
	for _, cell := range row {
		if nameOf(cell) != "" {
			n++
		}
	}
	return n
}

// fold joins neighbouring heading cells until there are as many as columns: first
// what stands in brackets, then units, then words that spell a name together.
func fold(row []string, columns int) []string {
	for _, belongs := range []func(before, cell string) bool{inBrackets, isUnit, completes} {
		if len(row) <= columns {
			return row
		}
		row = join(row, belongs)
	}
	return row
}

func join(row []string, belongs func(before, cell string) bool) []string {
	var joined []string
	for _, cell := range row {
		if last := len(joined) - 1; last >= 0 && belongs(joined[last], cell) {
			joined[last] += " " + cell
			continue
		}
		joined = append(joined, cell)
	}
	return joined
}

func inBrackets(before, cell string) bool {
	open := strings.Count(before, "(") + strings.Count(before, "[") - strings.Count(before, ")") - strings.Count(before, "]")
	return open > 0 || strings.HasPrefix(cell, "(") || strings.HasPrefix(cell, "[")
}

func isUnit(_, cell string) bool { return onlyUnit(cell) }

// completes reports whether a cell turns the words before it into a name, or goes
// on with words that may still become one.
func completes(before, cell string) bool {
	if nameOf(before) != "" || nameOf(cell) != "" && !opens(before) {
		return false
	}
	return nameOf(before+" "+cell) != "" || opens(before+" "+cell)
}

// opens reports whether words are the beginning of a name.
func opens(text string) bool {
	spelt := strings.Join(words(text), "")
	for name := range names {
		if spelt != "" && len(spelt) < len(name) && strings.HasPrefix(name, spelt) {
			return true
		}
	}
	return false
}
