package paste

import (
	"fmt"
	"slices"
	"strings"
)

// cut makes cells of every line and drops rows without any. Empty cells at the end
// of a row, left by trailing separators, are dropped too.
func cut(lines []string, sep separator) (rows [][]string, widest int) {
	rows = make([][]string, 0, len(lines))
	for _, line := range lines {
		cells := sep.cells(line)
		for len(cells) > 0 && cells[len(cells)-1] == "" {
			cells = cells[:len(cells)-1]
		}
		if len(cells) > 0 {
			rows = append(rows, cells)
			widest = max(widest, len(cells))
		}
	}
	return rows, widest
}

// upright turns a table that lies on its side, with two of the names or more at the
// head of its rows, so that each quantity has a column.
func upright(rows [][]string, widest int, said *notes) [][]string {
	named := 0
	for _, cells := range rows {
		if nameOf(cells[0]) != "" && countNumbers(cells) > 0 {
			named++
		}
	}
	if named < 2 || len(rows) > MaxColumns {
		return rows
	}
	turned := make([][]string, widest)
	for i := range turned {
		turned[i] = make([]string, len(rows))
		for j, cells := range rows {
			if i < len(cells) {
				turned[i][j] = cells[i]
			}
		}
	}
	said.remark("The table lies on its side, one row for each quantity; it was turned upright.")
	return turned
}

// arrange sets the heading rows apart from the data rows. Data starts at the first
// row with two numbers or more that make up more than half of its cells; failing
// that, at the first row of one number. Below, rows of words are left out when they
// repeat a heading or have not as many cells as the data, and said so; any other is
// data, and its words will be problems.
func arrange(rows [][]string, said *notes) (heading, data [][]string) {
	first := firstData(rows)
	if first < 0 {
		return nil, nil
	}
	heading, width := rows[:first], len(rows[first])
	var left []int
	for i, cells := range rows[first:] {
		if countNumbers(cells) == 0 && (len(cells) != width || contains(heading, cells)) {
			left = append(left, first+i)
			continue
		}
		data = append(data, cells)
	}
	switch len(left) {
	case 0:
	case 1:
		said.remark(fmt.Sprintf("Line %d, \"%s\", holds no number and was left out.", left[0]+1, clip(strings.Join(rows[left[0]], " "))))
	default:
		said.remark(fmt.Sprintf("%s lines, the first of them line %d, \"%s\", hold no number and were left out.",
			thousands(len(left)), left[0]+1, clip(strings.Join(rows[left[0]], " "))))
	}
	return heading, data
}

func firstData(rows [][]string) int {
	for _, least := range []int{2, 1} {
		for i, cells := range rows {
			if n := countNumbers(cells); n >= least && 2*n > countFilled(cells) {
				return i
			}
		}
	}
	return -1
}

func contains(rows [][]string, cells []string) bool {
	return slices.ContainsFunc(rows, func(row []string) bool { return slices.Equal(row, cells) })
}

func countNumbers(cells []string) int {
	n := 0
	for _, c := range cells {
		if numeric(c) {
			n++
		}
	}
	return n
}

func countFilled(cells []string) int {
	n := 0
	for _, c := range cells {
		if c != "" {
			n++
		}
	}
	return n
}
