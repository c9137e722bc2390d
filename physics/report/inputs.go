package report

import (
	"strconv"
	"strings"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

// Label names an input as the forms do, in the words of the study's pair of fluids.
// Paths that are not numeric inputs (the table, a choice) are named by what they hold.
func Label(st *study.Study, path string) string {
	if i, inner, ok := study.AtCase(path); ok {
		return caseLabel(st, i, inner)
	}
	if spec, ok := study.Find(path); ok {
		return spec.For(st).Label
	}
	if rest, ok := strings.CutPrefix(path, "rock.table"); ok {
		if cell := strings.Split(strings.TrimPrefix(rest, "."), "."); len(cell) == 2 {
			row, err := strconv.Atoi(cell[0])
			if err == nil {
				return "Laboratory points, row " + strconv.Itoa(row+1) + ", " + cell[1]
			}
		}
		return "Laboratory points"
	}
	if label, ok := choiceLabels[path]; ok {
		return label
	}
	return path
}

var choiceLabels = map[string]string{
	"rock.reference": "Permeability that kr refers to", "rock.curve": "Curve used", "rock.weights": "Weights of the fit",
	"fluids.pair": "Pair of fluids", "front.rider.kind": "What rides along", "rock.ends": "Swc and Sor of the fit", "front.ending": "The displacement ends",
	"field.drive": "Drive", "field.limit": "Economic limit", "field.start": "First day of injection",
	"title": "Title", "author": "Author", "note": "Note",
}

// inputs lists every input the study asks for, with its unit as typed, its range
// and its origin.
func inputs(st study.Study, s units.System) Section {
	section := Section{ID: "inputs", Title: "Inputs and where they come from"}
	table := &Table{
		Columns: []string{"Input", "Symbol", "Value", "Range", "Source"},
		Numeric: []bool{false, false, true, true, false},
	}
	for _, spec := range study.Specs() {
		spec = spec.For(&st)
		in := spec.Get(&st)
		switch {
		case !spec.Applies(&st):
		case in != nil:
			table.Rows = append(table.Rows, []string{spec.Label, spec.Symbol, given(spec, in.Value, in.Unit), span(spec, in), orNone(in.Source)})
		case spec.Optional:
			table.Rows = append(table.Rows, []string{spec.Label, spec.Symbol, spec.Default, "", "default"})
		}
	}
	section.Blocks = append(section.Blocks, Block{Table: choices(st)}, Block{Table: table})
	if points := laboratory(st, s); points != nil {
		section.Blocks = append(section.Blocks, Block{Table: points})
	}
	if changes := cases(st); changes != nil {
		section.Blocks = append(section.Blocks, Block{Table: changes})
	}
	return section
}

func choices(st study.Study) *Table {
	table := &Table{Columns: []string{"Choice", "Taken"}, Numeric: []bool{false, false}}
	add := func(path, value string, list []study.Choice) {
		for _, c := range list {
			if c.Value == value {
				table.Rows = append(table.Rows, []string{Label(&st, path), c.Label})
			}
		}
	}
	add("rock.reference", st.Rock.Reference, study.References)
	add("rock.curve", st.Rock.Curve, study.CurveKinds)
	if strings.HasSuffix(st.Rock.Curve, "-fit") {
		add("rock.ends", st.Rock.Ends, study.FitEnds)
		add("rock.weights", st.Rock.Weights, study.Weightings)
	}
	add("fluids.pair", st.Fluids.Pair, study.Pairs)
	if st.Rock.Land != nil {
		add("front.ending", st.Front.Ending, study.Endings)
	}
	add("front.rider.kind", st.Front.Rider.Kind, study.Riders)
	add("field.drive", st.Field.Drive, study.Drives)
	add("field.limit", st.Field.Limit, study.Limits)
	if st.Field.Start != "" {
		table.Rows = append(table.Rows, []string{Label(&st, "field.start"), st.Field.Start})
	}
	return table
}

func laboratory(st study.Study, s units.System) *Table {
	t := st.Rock.Table
	if t == nil {
		return nil
	}
	grid := study.Grid{Title: "Laboratory points. Source: " + orNone(t.Source), Columns: []study.Column{
		{Label: "Sw", Quantity: units.Fraction, Values: t.Sw},
		{Label: "krw", Quantity: units.Fraction, Values: t.Krw},
		{Label: "kro", Quantity: units.Fraction, Values: t.Kro},
	}}
	table := Print(grid, s)
	return &table
}

// Print turns a table of results into words in the units of the system.
func Print(g study.Grid, s units.System) Table {
	t := Table{Title: g.Title}
	rows := 0
	for _, c := range g.Columns {
		t.Columns = append(t.Columns, Heading(c.Label, c.Symbol, c.Quantity, s))
		t.Numeric = append(t.Numeric, c.Values != nil)
		rows = max(rows, len(c.Values), len(c.Words))
	}
	for r := range rows {
		row := make([]string, len(g.Columns))
		for i, c := range g.Columns {
			switch {
			case r < len(c.Words) && c.Words[r] != "":
				row[i] = c.Words[r]
			case r < len(c.Values):
				row[i] = units.Format(s.Unit(c.Quantity).FromSI(c.Values[r]), digits)
			}
		}
		t.Rows = append(t.Rows, row)
	}
	return t
}

// given prints a number exactly as the study holds it.
func given(spec study.Spec, number float64, unit string) string {
	text := units.Exact(number)
	if u, ok := units.Find(spec.Quantity, unit); ok && u.Label() != "" {
		text += " " + u.Label()
	}
	return text
}

func span(spec study.Spec, in *study.Input) string {
	if in.Low == nil || in.High == nil {
		return ""
	}
	return units.Exact(*in.Low) + " to " + given(spec, *in.High, in.Unit)
}
