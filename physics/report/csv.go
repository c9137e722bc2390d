package report

import (
	"encoding/csv"
	"strconv"
	"strings"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

// CSV is a table of results for a spreadsheet (RFC 4180), at full precision in
// the units of the system, a decimal point, one header row with units.
func CSV(g study.Grid, s units.System) string {
	var b strings.Builder
	w := csv.NewWriter(&b)
	header := make([]string, len(g.Columns))
	rows := 0
	for i, c := range g.Columns {
		header[i] = Heading(c.Label, c.Symbol, c.Quantity, s)
		rows = max(rows, len(c.Values), len(c.Words))
	}
	write(w, header)
	for r := range rows {
		record := make([]string, len(g.Columns))
		for i, c := range g.Columns {
			switch {
			case r < len(c.Words) && c.Words[r] != "":
				record[i] = c.Words[r]
			case r < len(c.Values):
				record[i] = strconv.FormatFloat(s.Unit(c.Quantity).FromSI(c.Values[r]), 'g', -1, 64)
			}
		}
		write(w, record)
	}
	w.Flush()
	return b.String()
}

// write cannot fail: the writer's target is memory.
func write(w *csv.Writer, record []string) {
	if err := w.Write(record); err != nil {
		panic("report: " + err.Error())
	}
}
