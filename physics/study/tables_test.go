package study

import (
	"reflect"
	"testing"
)

// TestCellPaths: a cell's path is taken apart as it was put together, and no other path is.
func TestCellPaths(t *testing.T) {
	for _, table := range LabTables() {
		for column := range table.Columns {
			path := table.Cell(12, column)
			found, ok := FindTable(path)
			if row, c, is := table.At(path); !ok || found.Path != table.Path || !is || row != 12 || c != column {
				t.Errorf("%s is row %d, column %d of %s", path, row, c, found.Path)
			}
		}
		for _, path := range []string{table.Path, table.Path + ".x.sw", table.Path + ".1.none", "field.length"} {
			if row, c, is := table.At(path); is {
				t.Errorf("%s is row %d, column %d", path, row, c)
			}
		}
	}
	if found, ok := FindTable("rock.tables"); ok {
		t.Errorf("rock.tables is %s", found.Path)
	}
}

// TestTablesTravel: every table comes back from a file as it was set, and a copy is its own.
func TestTablesTravel(t *testing.T) {
	for _, table := range LabTables() {
		st := Empty()
		columns := [][]float64{{0.2, 0.5}, {3, 1}, {0, 1}}[:len(table.Columns)]
		table.Set(&st, columns, "report 7")
		back, err := Read(Write(st))
		if err != nil {
			t.Fatal(err)
		}
		got, source := table.Get(&back)
		if !reflect.DeepEqual(got, columns) || source != "report 7" {
			t.Errorf("%s came back as %v, %q", table.Path, got, source)
		}
		copied := st.Clone()
		cells, _ := table.Get(&copied)
		if cells[1][0] = 9; columns[1][0] != 3 {
			t.Errorf("%s: a copy shares its columns", table.Path)
		}
		table.Set(&st, [][]float64{{}, {}, {}}, "")
		if got, _ := table.Get(&st); got != nil {
			t.Errorf("%s: without rows and note it is %v", table.Path, got)
		}
	}
}
