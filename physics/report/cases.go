package report

import (
	"strconv"

	"brinefront/physics/study"
)

// caseLabel names what a case holds at a path, as "Case 2, Oil viscosity".
func caseLabel(st *study.Study, i int, inner string) string {
	if inner == "name" {
		return "Case " + strconv.Itoa(i+1) + ", name"
	}
	return "Case " + strconv.Itoa(i+1) + ", " + Label(st, inner)
}

// cases lists what every case changes, beside what the study itself has; nil when
// it has none.
func cases(st study.Study) *Table {
	if len(st.Cases) == 0 {
		return nil
	}
	table := &Table{
		Title:   "Cases: what each changes",
		Columns: []string{"Case", "Input", study.BaseCase, "In the case", "Range", "Source"},
		Numeric: []bool{false, false, true, true, true, false},
	}
	for i, c := range st.Cases {
		changes := c.Changes()
		if len(changes) == 0 {
			table.Rows = append(table.Rows, []string{c.Name, "nothing is changed", "", "", "", ""})
		}
		as := c.On(st)
		for _, path := range changes {
			row := []string{c.Name, Label(&st, path), Held(st, path), Held(as, path), "", ""}
			if spec, ok := study.Find(study.CasePath(i, path)); ok {
				in := spec.Get(&st)
				row[4], row[5] = span(spec, in), orNone(in.Source)
			}
			table.Rows = append(table.Rows, row)
		}
	}
	return table
}

// Held prints what a study has at the path of an input or of a choice.
func Held(st study.Study, path string) string {
	for _, c := range study.Choices(path) {
		if c.Value == study.Chosen(&st, path) {
			return c.Label
		}
	}
	spec, ok := study.Find(path)
	if !ok {
		return "not chosen"
	}
	if in := spec.Get(&st); in != nil {
		return given(spec, in.Value, in.Unit)
	}
	if spec.Optional {
		return spec.Default
	}
	return "not given"
}
