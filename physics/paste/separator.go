package paste

import "strings"

// separator is what stands between the cells of a line.
type separator struct {
	name string // as in Reading.Separator
	mark byte   // '\t', ';', ',' or ' '

	// loose: only a comma that does not stand between two digits separates; the
	// others mark decimals, as in "0,25, 0,1, 0,8".
	loose bool

	ambiguous bool
	example   string // a line that shows why
}

// signs is what one line shows from outside its quotes.
type signs struct {
	tabs, semicolons, spaces int
	tight                    int // commas between two digits
	loose                    int // other commas, trailing ones left out
	points                   int // points between two digits
	commas                   int // tight + loose
}

// findSeparator decides over the whole text; it looks at lines of numbers, where
// there are any, so that commas in a heading do not mislead.
//
// A tab or a semicolon that stands in half the lines is the separator. A comma is
// only a candidate where it cannot mark decimals: beside a decimal point, a space
// or a quote, or where the count of cells leaves no other way to read a table.
func findSeparator(lines []string) separator {
	var seen []signs
	var numbers []string
	for _, line := range lines {
		if looksNumeric(line) {
			numbers = append(numbers, line)
			seen = append(seen, look(line))
		}
	}
	half := func(has func(signs) bool) bool {
		count := 0
		for _, s := range seen {
			if has(s) {
				count++
			}
		}
		return count > 0 && 2*count >= len(seen)
	}
	spaces := separator{name: "spaces", mark: ' '}
	comma := separator{name: "comma", mark: ','}
	switch {
	case half(func(s signs) bool { return s.tabs > 0 }):
		return separator{name: "tab", mark: '\t'}
	case half(func(s signs) bool { return s.semicolons > 0 }):
		return separator{name: "semicolon", mark: ';'}
	case !half(func(s signs) bool { return s.commas > 0 }):
		return spaces
	case half(func(s signs) bool { return s.loose > 1 }):
		// "0.25, 0.1, 0.8" and "0,25, 0,1, 0,8": a comma between digits marks
		// decimals here only when no point does.
		comma.loose = !half(func(s signs) bool { return s.points > 0 })
		return comma
	case half(func(s signs) bool { return s.points > 0 }):
		return comma
	case half(func(s signs) bool { return s.spaces > 0 }):
		return spaces // "0,25 0,1 0,8"
	}
	return wholeNumbers(lines, numbers, comma)
}

// wholeNumbers decides about lines such as "25,10,80", where commas stand between
// digits and nothing else does. Three cells on every line are three whole numbers,
// since read as decimals they would make two columns, which is no table. More
// cells are believed when a heading line has as many of them.
func wholeNumbers(lines, numbers []string, comma separator) separator {
	cells := strings.Count(strings.TrimRight(numbers[0], ", "), ",") + 1
	for _, line := range numbers {
		if strings.Count(strings.TrimRight(line, ", "), ",")+1 != cells {
			return separator{ambiguous: true, example: line}
		}
	}
	if cells == 3 {
		return comma
	}
	for _, line := range lines {
		if !looksNumeric(line) && cells > 3 && strings.Count(strings.TrimRight(line, ", "), ",")+1 == cells {
			return comma
		}
	}
	return separator{ambiguous: true, example: numbers[0]}
}

// looksNumeric reports whether a line holds more digits than letters.
func looksNumeric(line string) bool {
	digits, letters := 0, 0
	for i := range len(line) {
		switch c := line[i]; {
		case isDigit(c):
			digits++
		case 'a' <= c|0x20 && c|0x20 <= 'z' || c >= 0x80:
			letters++
		}
	}
	return digits > letters
}

// look counts the marks of a line outside its quotes.
func look(line string) signs {
	var s signs
	line = strings.Trim(line, " ")
	trailing := len(strings.TrimRight(line, ", "))
	quoted, paired := false, pairedQuotes(line)
	for i := range len(line) {
		c := line[i]
		if c == '"' && paired {
			quoted = !quoted
		}
		if quoted {
			continue
		}
		between := i > 0 && i+1 < len(line) && isDigit(line[i-1]) && isDigit(line[i+1])
		switch {
		case c == '\t':
			s.tabs++
		case c == ';':
			s.semicolons++
		case c == ' ' && i > 0 && line[i-1] != ',':
			s.spaces++
		case c == '.' && i+1 < len(line) && isDigit(line[i+1]):
			s.points++
		case c == ',' && between:
			s.tight++
		case c == ',' && i < trailing:
			s.loose++
		}
	}
	s.commas = s.tight + s.loose
	return s
}

// cells cuts a line. Quotes around a cell are taken off.
func (sep separator) cells(line string) []string {
	if sep.mark == ' ' {
		line = strings.ReplaceAll(strings.TrimSpace(line), " %", "%")
	}
	var cells []string
	start, quoted, paired := 0, false, pairedQuotes(line)
	for i := range len(line) {
		switch c := line[i]; {
		case c == '"' && paired:
			quoted = !quoted
		case quoted:
		case sep.mark == ' ' && (c == ' ' || c == '\t'):
			if i > start {
				cells = append(cells, bare(line[start:i]))
			}
			start = i + 1
		case c == sep.mark:
			if sep.loose && i > 0 && i+1 < len(line) && isDigit(line[i-1]) && isDigit(line[i+1]) {
				continue
			}
			cells = append(cells, bare(line[start:i]))
			start = i + 1
		}
	}
	return append(cells, bare(line[start:]))
}

// bare is a cell without the spaces and quotes around it.
func bare(cell string) string {
	cell = strings.TrimSpace(cell)
	if n := len(cell); n >= 2 && cell[0] == '"' && cell[n-1] == '"' {
		cell = strings.ReplaceAll(cell[1:n-1], `""`, `"`)
	}
	return strings.TrimSpace(strings.Trim(cell, `"`))
}

// pairedQuotes reports whether the quotes of a line enclose cells. An odd one, as
// in 1.5" plug, stands for itself.
func pairedQuotes(line string) bool { return strings.Count(line, `"`)%2 == 0 }

func isDigit(c byte) bool { return '0' <= c && c <= '9' }
