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
	if t, ok := study.FindTable(path); ok {
		if row, column, ok := t.At(path); ok {
			return t.Label + ", row " + strconv.Itoa(row+1) + ", " + t.Columns[column].Path
		}
		return t.Label
	}
	if label, ok := choiceLabels[path]; ok {
		return label
	}
	return path
}

var choiceLabels = map[string]string{
	"rock.reference": "Permeability that kr refers to", "rock.curve": "Curve used", "rock.weights": "Weights of the fit",
	"rock.capillary.curve": "Capillary pressure", "rock.capillary.at": "Pc was measured at", "rock.capillary.ends": "Ends of the Pc fit",
	"rock.capillary.weights": "Weights of the Pc fit", "rock.capillary.unit": "Unit of Pc",
	"fluids.pair": "Pair of fluids", "front.rider.kind": "What rides along", "rock.ends": "Swc and Sor of the fit", "front.ending": "The displacement ends",
	"soak.flow": "How the oil leaves", "block.shape": "Block that soaks", "block.plug.shape": "Plug", "block.sizes": "Sizes of blocks", "field.pattern.kind": "Arrangement of the wells", "field.drive": "Drive", "field.limit": "Economic limit", "field.start": "First day of injection",
	"field.layers.table": "Layers", "field.layers.crossflow": "Flow between the layers", "field.wells.schedule": "Schedule", "field.history.table": "Measured rates",
	"match.first": "Moved first by the match", "match.second": "Moved second", "match.third": "Moved third", "match.fourth": "Moved fourth",
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
	for _, t := range study.LabTables() {
		if points := laboratory(t, st, s); points != nil {
			section.Blocks = append(section.Blocks, Block{Table: points})
		}
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
	pc := st.Rock.Capillary
	add("rock.capillary.curve", pc.Curve, study.PcKinds)
	if pc.ByTable() {
		add("rock.capillary.unit", pc.Unit, study.PcUnits)
	}
	if pc.Fitted() {
		add("rock.capillary.ends", pc.Ends, study.PcEnds)
		add("rock.capillary.weights", pc.Weights, study.Weightings)
	}
	if pc.Scalable() {
		add("rock.capillary.at", pc.At, study.PcConditions)
	}
	add("fluids.pair", st.Fluids.Pair, study.Pairs)
	if st.Rock.Land != nil {
		add("front.ending", st.Front.Ending, study.Endings)
	}
	add("front.rider.kind", st.Front.Rider.Kind, study.Riders)
	if st.Rock.Capillary.Given() {
		add("soak.flow", st.Soak.Flow, study.SoakFlows)
		if st.Block.Given() {
			add("block.shape", st.Block.Shape, study.BlockShapes)
		}
		if st.Block.Given() && st.Block.Plug.Diameter != nil {
			add("block.plug.shape", st.Block.Plug.Shape, study.PlugShapes)
		}
	}
	add("field.pattern.kind", st.Field.Pattern.Kind, study.Patterns)
	add("field.drive", st.Field.Drive, study.Drives)
	add("field.limit", st.Field.Limit, study.Limits)
	if st.Field.Layers.Table != "" {
		add("field.layers.crossflow", st.Field.Layers.Crossflow, study.Crossflows)
	}
	if st.Match.Asked() {
		for _, path := range []string{"match.first", "match.second", "match.third", "match.fourth"} {
			add(path, study.Chosen(&st, path), study.Matchable)
		}
	}
	for _, text := range []struct{ path, text string }{{"field.layers.table", st.Field.Layers.Table}, {"field.wells.schedule", st.Field.Wells.Schedule}, {"field.history.table", st.Field.History.Table}, {"field.start", st.Field.Start}, {"block.sizes", st.Block.Sizes}} {
		if text.text != "" {
			table.Rows = append(table.Rows, []string{Label(&st, text.path), strings.Join(strings.Split(text.text, "\n"), "; ")})
		}
	}
	return table
}

func laboratory(t study.LabTable, st study.Study, s units.System) *Table {
	columns, source := t.Get(&st)
	if columns == nil {
		return nil
	}
	grid := study.Grid{Title: t.Label + ". Source: " + orNone(source)}
	for i, c := range t.Columns {
		grid.Columns = append(grid.Columns, study.Column{Label: c.Label, Quantity: c.Quantity, Values: columns[i]})
	}
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
