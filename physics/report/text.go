package report

import (
	"strings"
	"unicode/utf8"
)

// Text is the document as plain text, wrapped for no particular width, tables
// set in columns. Pictures are given by their text alternative.
func Text(d Document) string {
	var b strings.Builder
	underlined(&b, d.Title, "=")
	for _, about := range d.About {
		b.WriteString(about[0] + ": " + about[1] + "\n")
	}
	for _, section := range d.Sections {
		b.WriteString("\n")
		underlined(&b, section.Title, "-")
		for _, block := range section.Blocks {
			writeBlock(&b, block)
		}
	}
	return b.String()
}

func writeBlock(b *strings.Builder, block Block) {
	switch {
	case block.Heading != "":
		b.WriteString("\n" + block.Heading + "\n")
	case block.Paragraph != "":
		b.WriteString(block.Paragraph + "\n")
	case block.Table != nil:
		writeTable(b, block.Table)
	case block.Chart != nil:
		b.WriteString("[Picture] " + block.Chart.Title + ". " + block.Chart.Summary + "\n")
	case block.Explained != nil:
		writeExplanation(b, block.Explained)
	}
}

func writeExplanation(b *strings.Builder, w *Explanation) {
	b.WriteString("\n" + w.Label + " = " + w.Value + "\n")
	for _, line := range []struct{ name, text string }{
		{"formula", w.Formula}, {"numbers", w.Numbers}, {"method", w.Method},
		{"sources", strings.Join(w.Sources, "; ")}, {"inputs", strings.Join(w.Inputs, "; ")},
	} {
		if line.text != "" {
			b.WriteString("  " + line.name + ": " + line.text + "\n")
		}
	}
}

func writeTable(b *strings.Builder, t *Table) {
	if t.Title != "" {
		b.WriteString("\n" + t.Title + "\n")
	}
	widths := make([]int, len(t.Columns))
	for _, row := range append([][]string{t.Columns}, t.Rows...) {
		for i, cell := range row {
			widths[i] = max(widths[i], utf8.RuneCountInString(cell))
		}
	}
	for _, row := range append([][]string{t.Columns}, t.Rows...) {
		cells := make([]string, len(row))
		for i, cell := range row {
			pad := strings.Repeat(" ", widths[i]-utf8.RuneCountInString(cell))
			if t.Numeric[i] {
				cells[i] = pad + cell
			} else {
				cells[i] = cell + pad
			}
		}
		b.WriteString(strings.TrimRight(strings.Join(cells, "  "), " ") + "\n")
	}
}

func underlined(b *strings.Builder, title, rule string) {
	b.WriteString(title + "\n" + strings.Repeat(rule, utf8.RuneCountInString(title)) + "\n")
}
