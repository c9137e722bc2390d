package state

import (
	"fmt"
	"strings"
	"testing"

	"brinefront/physics/study"
)

const tablePath = "rock.table"

func cellPath(row, column int) string { return labTable(tablePath).Cell(row, column) }

func labTable(path string) study.LabTable {
	t, ok := study.FindTable(path)
	if !ok {
		panic(path)
	}
	return t
}

// cells types a row of the table.
func cells(row int, texts ...string) []Msg {
	var msgs []Msg
	for column, text := range texts {
		msgs = append(msgs, Edited{cellPath(row, column), text, ""})
	}
	return msgs
}

// threeRows is a study with three typed rows.
func threeRows() Model {
	m := empty()
	for row, texts := range [][]string{{"0.2", "0", "0.9"}, {"0.5", "0.1", "0.3"}, {"0.7", "0.3", "0"}} {
		m = after(m, append([]Msg{RowAdded{tablePath, row - 1}}, cells(row, texts...)...)...)
	}
	return m
}

func table(m Model) string {
	t := m.Study.Rock.Table
	if t == nil {
		return "none"
	}
	return fmt.Sprint(t.Sw, t.Krw, t.Kro)
}

func TestTable(t *testing.T) {
	const whole = "[0.2 0.5 0.7] [0 0.1 0.3] [0.9 0.3 0]"
	tests := []struct {
		name  string
		msgs  []Msg
		table string
		rows  int
		said  []string          // at rock.table
		cells map[string]string // messages of cells
	}{
		{"typed", nil, whole, 3, nil, nil},
		{"percent", cells(0, "20 %"), whole, 3, nil, nil},
		{"an empty row is no matter", []Msg{RowAdded{tablePath, 2}}, whole, 4, nil, nil},
		{"unfinished", append([]Msg{RowAdded{tablePath, 2}}, cells(3, "0.8", "0.4")...), whole, 4, []string{"Row 4 is left out"}, nil},
		{"finished", append([]Msg{RowAdded{tablePath, 2}}, cells(3, "0.8", "0.4", "0")...), "[0.2 0.5 0.7 0.8] [0 0.1 0.3 0.4] [0.9 0.3 0 0]", 4, nil, nil},
		{"first", append([]Msg{RowAdded{tablePath, -1}}, cells(0, "0.1", "0", "1")...), "[0.1 0.2 0.5 0.7] [0 0 0.1 0.3] [1 0.9 0.3 0]", 4, nil, nil},
		{"an emptied cell", cells(1, ""), "[0.2 0.7] [0 0.3] [0.9 0]", 3, []string{"Row 2 is left out"}, nil},
		{"letters", cells(1, "half"), whole, 3, []string{"Row 2 cannot be read", "of 3 rows, stays in use"}, map[string]string{"rock.table.1.sw": "half"}},
		{"percent as fraction", cells(1, "50"), whole, 3, []string{"Row 2"}, map[string]string{"rock.table.1.sw": "50"}},
		{"negative", cells(2, "0.7", "-0.3"), whole, 3, []string{"Row 3"}, map[string]string{"rock.table.2.krw": "-0.3"}},
		{"two bad rows", append(cells(0, "a"), cells(2, "b")...), whole, 3, []string{"rows 1, 3"}, map[string]string{"rock.table.0.sw": "a", "rock.table.2.sw": "b"}},
		{"bad and mended", append(cells(1, "half"), cells(1, "0.6")...), "[0.2 0.6 0.7] [0 0.1 0.3] [0.9 0.3 0]", 3, nil, nil},
		{"bad and removed", append(cells(1, "half"), RowRemoved{tablePath, 1}), "[0.2 0.7] [0 0.3] [0.9 0]", 2, nil, nil},
		{"a row above a bad one removed", append(cells(1, "half"), RowRemoved{tablePath, 0}), whole, 2, []string{"Row 1 cannot"}, map[string]string{"rock.table.0.sw": "half"}},
		{"all removed", []Msg{RowRemoved{tablePath, 0}, RowRemoved{tablePath, 0}, RowRemoved{tablePath, 0}}, "none", 0, nil, nil},
		{"no such row", []Msg{RowRemoved{tablePath, 7}, RowRemoved{tablePath, -1}, Edited{"rock.table.9.sw", "0.1", ""}, Edited{"rock.table.0.sg", "0.1", ""}, Edited{"rock.table.-1.sw", "1", ""}}, whole, 3, nil, nil},
	}
	for _, test := range tests {
		t.Run(test.name, func(t *testing.T) {
			m := after(threeRows(), test.msgs...)
			if got := table(m); got != test.table {
				t.Errorf("in use is %s, want %s", got, test.table)
			}
			if len(m.Rows(tablePath)) != test.rows {
				t.Errorf("%d rows are shown, want %d", len(m.Rows(tablePath)), test.rows)
			}
			if (m.Messages["rock.table"] != "") != (test.said != nil) {
				t.Errorf("the table says %q", m.Messages["rock.table"])
			}
			holds(t, "message of the table", m.Messages["rock.table"], test.said...)
			for path, text := range m.Messages {
				if path != "rock.table" && test.cells[path] == "" {
					t.Errorf("%s says %q, want nothing", path, text)
				}
			}
			for path, piece := range test.cells {
				holds(t, path, m.Messages[path], piece, "allowed")
			}
		})
	}
}

func TestTableShowsWhatComesFromElsewhere(t *testing.T) {
	m := New()
	for i, row := range m.Rows(tablePath) {
		for column, text := range row.Text {
			want := [3]float64{m.Study.Rock.Table.Sw[i], m.Study.Rock.Table.Krw[i], m.Study.Rock.Table.Kro[i]}[column]
			if got := after(m, Edited{cellPath(i, column), text, ""}); got.Revision != m.Revision {
				t.Errorf("row %d shows %q, which is not %v", i, text, want)
			}
		}
	}
	if len(m.Rows(tablePath)) != len(m.Study.Rock.Table.Sw) {
		t.Errorf("%d rows are shown of %d", len(m.Rows(tablePath)), len(m.Study.Rock.Table.Sw))
	}
}

func TestTableKeepsItsSource(t *testing.T) {
	m := after(New(), Sourced{"rock.table", "plug 7"}, Edited{"rock.table.0.sw", "0.2", ""}, RowRemoved{tablePath, 1})
	if got := m.Study.Rock.Table.Source; got != "plug 7" {
		t.Errorf("source is %q, want plug 7", got)
	}
	for range m.Rows(tablePath) {
		m = after(m, RowRemoved{tablePath, 0})
	}
	if m.Study.Rock.Table == nil || m.Study.Rock.Table.Source != "plug 7" {
		t.Error("the source is lost with the last row")
	}
	if _, err := study.Read(study.Write(m.Study)); err != nil {
		t.Errorf("a table without rows: %v", err)
	}
}

func TestTableIsNotEndless(t *testing.T) {
	st := study.Empty()
	full := make([]float64, study.MaxRows)
	st.Rock.Table = &study.Table{Sw: full, Krw: full, Kro: full}
	m := after(New(), Restored{study.Write(st)}, RowAdded{tablePath, 0})
	if len(m.Rows(tablePath)) != study.MaxRows || !strings.Contains(lastNotice(m), "as many as it can") {
		t.Errorf("%d rows, notice %q", len(m.Rows(tablePath)), lastNotice(m))
	}
}

func lastNotice(m Model) string {
	if len(m.Notices) == 0 {
		return ""
	}
	return m.Notices[len(m.Notices)-1].Text
}

// A keystroke in a long table must not be felt.
func BenchmarkCellOfTenThousandRows(b *testing.B) {
	st := study.Empty()
	sw, kr := make([]float64, 10_000), make([]float64, 10_000)
	for i := range sw {
		sw[i] = float64(i) / 10_000
	}
	st.Rock.Table = &study.Table{Sw: sw, Krw: kr, Kro: kr}
	m, _ := New().turn("", fresh(st))
	b.ResetTimer()
	for i := range b.N {
		m, _ = Update(m, Edited{"rock.table.5000.krw", fmt.Sprint("0.", i%1000+1), ""})
	}
}
