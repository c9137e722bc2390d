package plot

import (
	"encoding/csv"
	"slices"
	"strconv"
	"strings"
	"testing"

	"brinefront/physics/units"
)

func rows(t *testing.T, text string) [][]string {
	t.Helper()
	r := csv.NewReader(strings.NewReader(text))
	records, err := r.ReadAll() // refuses rows of unequal length
	if err != nil {
		t.Fatalf("%v in\n%s", err, text)
	}
	return records
}

func TestCSVNamesEveryColumnWithItsUnit(t *testing.T) {
	const x, y = "Time, t (d)", "Rate at surface, q (bbl/d)"
	want := []string{
		x, "oil: " + y, "water: " + y, // share their x
		x, "oil, likely, lower edge: " + y, "oil, likely, upper edge: " + y,
		x, `well test, "A": ` + y,
		x + " at Q = 1.5 PV", "oil bank: " + y, "oil bank: speed, v", "oil bank: arrives after (yr)",
		"Marked point", x, y,
	}
	if got := rows(t, From(invented(), units.Field).CSV())[0]; !slices.Equal(got, want) {
		t.Errorf("header %q\nwant   %q", got, want)
	}
}

// A spreadsheet gets every digit: what it reads is the very number of the picture.
func TestCSVIsExact(t *testing.T) {
	p := From(invented(), units.Field)
	records := rows(t, p.CSV())
	if len(records) != 1+3 {
		t.Fatalf("%d rows, want a header and as many as the longest series", len(records))
	}
	column := func(i int) (list []float64) {
		for _, r := range records[1:] {
			if r[i] == "" {
				continue
			}
			v, err := strconv.ParseFloat(r[i], 64)
			if err != nil {
				t.Fatal(err)
			}
			list = append(list, v)
		}
		return list
	}
	along := func(data [][2]float64, k int) (list []float64) {
		for _, p := range data {
			list = append(list, p[k])
		}
		return list
	}
	for i, want := range map[int][]float64{
		0: along(p.Lines[0].Data, 0), 1: along(p.Lines[0].Data, 1), 2: along(p.Lines[1].Data, 1),
		3: along(p.Lines[2].Data, 0), 4: along(p.Lines[2].Low, 1), 5: along(p.Lines[2].Data, 1),
		6: along(p.Lines[3].Data, 0), 7: along(p.Lines[3].Data, 1), 13: {p.Marks[0].X}, 14: {p.Marks[0].Y},
		8: {0, 0.75, 1.5}, 9: along(p.Lines[4].Data, 1), 10: p.Lines[4].Readings[0].Values, // half a day and a day, times 1.5 PV
	} {
		if got := column(i); !slices.Equal(got, want) {
			t.Errorf("column %d holds %v, want %v", i, got, want)
		}
	}
	if got := records[2][11]; got != "never" {
		t.Errorf("a point without an arrival reads %q", got)
	}
	if got := records[1][12]; got != "water arrives" {
		t.Errorf("the mark is called %q", got)
	}
}

func TestCSVLeavesGapsEmpty(t *testing.T) {
	for _, bad := range badNumbers {
		p := From(broken(bad), units.Field)
		records := rows(t, p.CSV())
		if records[2][0] == "" || records[2][1] != "" {
			t.Errorf("%v: the gap's row begins %q, want its time and nothing", bad, records[2][:2])
		}
		for _, r := range records {
			for _, cell := range r {
				if strings.Contains(cell, "NaN") || strings.Contains(cell, "Inf") {
					t.Errorf("%v: a cell holds %q", bad, cell)
				}
			}
		}
	}
}

func TestCSVEndsItsLinesAsRFC4180Does(t *testing.T) {
	text := From(invented(), units.Field).CSV()
	if n, all := strings.Count(text, "\r\n"), strings.Count(text, "\n"); n != all || n != 4 {
		t.Errorf("%d line ends, %d of them CRLF, want 4 (RFC 4180, section 2)", all, n)
	}
	if got := (Picture{}).CSV(); strings.Trim(got, "\r\n") != "" {
		t.Errorf("an empty picture is written %q", got)
	}
}
