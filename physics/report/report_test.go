package report

import (
	"encoding/csv"
	"slices"

	"strconv"
	"strings"
	"testing"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

// TestDemoText: the hand-over of the demonstration has every section, every
// input it rests on with its origin, every figure with its working, and no trace of a
// number that is none.
func TestDemoText(t *testing.T) {
	st := study.Demo()
	r := study.Run(st)
	for _, system := range units.Systems {
		d := Build(st, r, system)
		for _, id := range []string{"summary", "inputs", "answers", "pictures", "tables", "workings", "notes", "cautions", "sources"} {
			if _, ok := d.Section(id); !ok {
				t.Errorf("%s: no section %s", system, id)
			}
		}
		text := Text(d)
		for _, spec := range study.Specs() {
			if spec.Applies(&st) && spec.Get(&st) != nil && !strings.Contains(text, spec.Label) {
				t.Errorf("%s: input %s is missing", system, spec.Path)
			}
		}
		for _, part := range r.Parts {
			for _, f := range part.Figures {
				if !strings.Contains(text, f.Label) || !strings.Contains(text, Value(f, system)) {
					t.Errorf("%s: figure %s is missing", system, f.ID)
				}
			}
		}
		for _, bad := range []string{"NaN", "Inf", "∞", "not a number", "%!", "{"} {
			if strings.Contains(text, bad) {
				t.Errorf("%s: the text holds %q", system, bad)
			}
		}
		for _, caution := range Cautions {
			if !strings.Contains(text, caution) {
				t.Errorf("%s: a caution is missing: %s", system, caution)
			}
		}
	}
}

// TestEmptyStudy: a study that cannot answer is reported as one, with what it lacks.
func TestEmptyStudy(t *testing.T) {
	st := study.Empty()
	text := Text(Build(st, study.Run(st), units.Field))
	for _, want := range []string{"Untitled study", "No answer yet", "Oil viscosity"} {
		if !strings.Contains(text, want) {
			t.Errorf("the report of an empty study does not say %q:\n%s", want, text)
		}
	}
}

// TestCSV: every table of results reads back with as many records as it has rows,
// and its numbers convert back to the SI values.
func TestCSV(t *testing.T) {
	r := study.Run(study.Demo())
	for sheet, part := range r.Parts {
		for _, g := range part.Tables {
			records, err := csv.NewReader(strings.NewReader(CSV(g, units.Field))).ReadAll()
			if err != nil {
				t.Fatalf("%s %s: %v", sheet, g.ID, err)
			}
			for i, c := range g.Columns {
				for row, want := range c.Values {
					if c.Words != nil && c.Words[row] != "" {
						if records[row+1][i] != c.Words[row] {
							t.Errorf("%s %s row %d: %q, want %q", sheet, g.ID, row, records[row+1][i], c.Words[row])
						}
						continue
					}
					got, err := units.ParseNumber(records[row+1][i])
					if err != nil {
						t.Fatalf("%s %s row %d: %v", sheet, g.ID, row, err)
					}
					si := units.Field.Unit(c.Quantity).ToSI(got)
					if diff := si - want; diff > 1e-12*max(1, want) || -diff > 1e-12*max(1, want) {
						t.Errorf("%s %s, %s, row %d: %v reads back as %v", sheet, g.ID, c.Label, row, want, si)
					}
				}
			}
		}
	}
}

// TestPatternIsNamed looks for the pattern among the choices, and for its name where a note leads to it.
func TestPatternIsNamed(t *testing.T) {
	st := study.Demo()
	st.Field.Pattern.Kind = "five-spot"
	for _, n := range study.Run(st).Parts[study.SheetField].Notes {
		for _, path := range n.Paths {
			if Label(&st, path) == path {
				t.Errorf("%s leads to %q, which has no name", n.ID, path)
			}
		}
	}
	if rows := choices(st).Rows; !slices.ContainsFunc(rows, func(row []string) bool { return row[1] == "five-spot" }) {
		t.Errorf("the choices are %v", rows)
	}
}

// A long table of curves is printed with few rows of each, its ends among them; a long one without curves whole.
func TestLongTablesAreThinned(t *testing.T) {
	var long Table
	for block := range 4 {
		for row := range 7 + 60*block {
			long.Rows = append(long.Rows, []string{strconv.Itoa(block), strconv.Itoa(row)})
		}
	}
	counts := map[string][]string{}
	for _, row := range thinned(long).Rows {
		counts[row[0]] = append(counts[row[0]], row[1])
	}
	for block, want := range []int{7, 15, 15, 15} {
		got := counts[strconv.Itoa(block)]
		if last := strconv.Itoa(6 + 60*block); len(got) != want || got[0] != "0" || got[len(got)-1] != last {
			t.Errorf("curve %d has rows %v, want %d of them from 0 to %s", block, got, want, last)
		}
	}
	for i := range long.Rows {
		long.Rows[i][0] = strconv.Itoa(i)
	}
	if got := thinned(long); len(got.Rows) != len(long.Rows) || got.Title != long.Title {
		t.Errorf("%d of %d rows are printed", len(got.Rows), len(long.Rows))
	}
}
