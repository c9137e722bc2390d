package report

import (
	"strings"

	"brinefront/physics/ref"
	"brinefront/physics/study"
	"brinefront/physics/units"
)

// parts is the reading order of the study's parts and what they are called.
var parts = []struct {
	sheet study.Sheet
	title string
}{
	{study.SheetRock, "Rock"}, {study.SheetFront, "Front"}, {study.SheetSoak, "Soak"}, {study.SheetField, "Field"}, {study.SheetGrid, "Grid"}, {study.SheetCompare, "Compare"}, {study.SheetMatch, "Match"},
}

// Cautions are the usual ones of a screening-level answer; every report ends with them.
var Cautions = []string{
	"These answers are screening-level: one homogeneous layer, linear flow, incompressible fluids; floods without capillary pressure, soaking without gravity. They prepare a decision about further work; they do not replace it.",
	"Injection must stay below the fracture pressure of the reservoir and of its cap rock; what that pressure is, and with what margin, is for licensed engineers under the local code.",
	"Well integrity, and the handling, treatment and disposal of injected and produced water, are for licensed engineers and the local code.",
	"A figure is only as good as the inputs it rests on. Inputs without a source note are unsupported.",
}

// Build orders a study and its result into the hand-over document.
func Build(st study.Study, r study.Result, s units.System) Document {
	title := st.Title
	if title == "" {
		title = "Untitled study"
	}
	d := Document{Title: title, About: [][2]string{{"Author", orNone(st.Author)}, {"Units", string(s)}, {"Computed with", "Brinefront " + study.Program}}}
	if st.Note != "" {
		d.About = append(d.About, [2]string{"Note", st.Note})
	}
	for _, section := range []Section{
		summary(st, r, s), inputs(st, s), answers(r, s), pictures(r), tables(r, s), workings(st, r, s), notes(st, r), cautions(), sources(r),
	} {
		if len(section.Blocks) > 0 {
			d.Sections = append(d.Sections, section)
		}
	}
	return d
}

func summary(st study.Study, r study.Result, s units.System) Section {
	section := Section{ID: "summary", Title: "Summary"}
	for _, p := range parts {
		part, asked := r.Parts[p.sheet]
		if !asked {
			continue // a study without cases is not compared
		}
		text := Sentence(part, s)
		if part.Status != study.Ready && part.Status != study.Stopped {
			text = "No answer yet: " + standing(st, part, r) + "."
		}
		if text != "" {
			section.Blocks = append(section.Blocks, Block{Heading: p.title}, Block{Paragraph: text})
		}
	}
	return section
}

// standing says why a part has no answer.
func standing(st study.Study, p study.Part, r study.Result) string {
	var reasons []string
	for _, path := range p.Missing {
		reasons = append(reasons, Label(&st, path)+" is not given")
	}
	for _, problem := range r.Problems {
		reasons = append(reasons, Label(&st, problem.Path)+" cannot be used (read "+problem.Read+"; allowed: "+problem.Allowed+")")
	}
	return strings.Join(reasons, "; ")
}

func answers(r study.Result, s units.System) Section {
	section := Section{ID: "answers", Title: "Answers"}
	for _, p := range parts {
		table := &Table{Title: p.title, Columns: []string{"Figure", "Symbol", "Value"}, Numeric: []bool{false, false, true}}
		for _, f := range r.Parts[p.sheet].Figures {
			table.Rows = append(table.Rows, []string{f.Label, f.Symbol, Value(f, s)})
		}
		if len(table.Rows) > 0 {
			section.Blocks = append(section.Blocks, Block{Table: table})
		}
	}
	return section
}

func pictures(r study.Result) Section {
	section := Section{ID: "pictures", Title: "Pictures"}
	for _, p := range parts {
		charts := r.Parts[p.sheet].Charts
		if len(charts) > 0 {
			section.Blocks = append(section.Blocks, Block{Heading: p.title})
		}
		for i := range charts {
			section.Blocks = append(section.Blocks, Block{Chart: &charts[i]})
		}
	}
	return section
}

func tables(r study.Result, s units.System) Section {
	section := Section{ID: "tables", Title: "Tables"}
	for _, p := range parts {
		for _, g := range r.Parts[p.sheet].Tables {
			table := thinned(Print(g, s))
			section.Blocks = append(section.Blocks, Block{Table: &table})
		}
	}
	return section
}

// thinned is a long table of curves below one another, as its first column tells them apart, with
// at most printed rows of each, the first and the last among them: whole it goes to a spreadsheet.
func thinned(t Table) Table {
	const long, printed = 150, 15
	if len(t.Rows) <= long {
		return t
	}
	var rows [][]string
	for from, to := 0, 0; from < len(t.Rows); from = to {
		for to = from; to < len(t.Rows) && t.Rows[to][0] == t.Rows[from][0]; to++ {
		}
		n := min(to-from, printed)
		for i := range n {
			rows = append(rows, t.Rows[from+i*(to-from-1)/max(n-1, 1)])
		}
	}
	if len(rows) < len(t.Rows) {
		t.Title += " (every few rows; the tables saved as CSV have all)"
		t.Rows = rows
	}
	return t
}

func workings(st study.Study, r study.Result, s units.System) Section {
	section := Section{ID: "workings", Title: "Workings"}
	for _, p := range parts {
		for _, f := range r.Parts[p.sheet].Figures {
			w := Explain(f, s)
			for _, path := range f.Working.Inputs {
				w.Inputs = append(w.Inputs, Label(&st, path))
			}
			section.Blocks = append(section.Blocks, Block{Explained: &w})
		}
	}
	return section
}

// Explain prints a figure's working, but for the inputs it rests on.
func Explain(f study.Figure, s units.System) Explanation {
	w := Explanation{Label: f.Label, Value: Value(f, s), Method: f.Working.Method}
	if f.Symbol != "" {
		w.Label += ", " + f.Symbol
	}
	w.Formula, w.Numbers = Working(f.Working, s)
	for _, id := range f.Working.Sources {
		w.Sources = append(w.Sources, ref.Get(id).Short())
	}
	return w
}

func notes(st study.Study, r study.Result) Section {
	section := Section{ID: "notes", Title: "Checks and notes"}
	for _, p := range r.Problems {
		section.Blocks = append(section.Blocks, Block{Paragraph: Label(&st, p.Path) + ": read " + p.Read + "; allowed: " + p.Allowed + "."})
	}
	for _, p := range parts {
		for _, n := range r.Parts[p.sheet].Notes {
			section.Blocks = append(section.Blocks, Block{Paragraph: p.title + ", " + n.Level + ": " + strings.Join(nonEmpty(n.Text, n.Cause, n.Do), " ")})
		}
	}
	return section
}

func cautions() Section {
	section := Section{ID: "cautions", Title: "Cautions"}
	for _, text := range Cautions {
		section.Blocks = append(section.Blocks, Block{Paragraph: text})
	}
	return section
}

// sources lists every source that a figure cites, once.
func sources(r study.Result) Section {
	section := Section{ID: "sources", Title: "Sources"}
	cited := map[ref.ID]bool{}
	for _, part := range r.Parts {
		for _, f := range part.Figures {
			for _, id := range f.Working.Sources {
				cited[id] = true
			}
		}
	}
	for _, source := range ref.All() {
		if cited[source.ID] {
			section.Blocks = append(section.Blocks, Block{Paragraph: source.Long()})
		}
	}
	return section
}

func nonEmpty(texts ...string) []string {
	var kept []string
	for _, t := range texts {
		if t != "" {
			kept = append(kept, t)
		}
	}
	return kept
}

func orNone(text string) string {
	if text == "" {
		return "not given"
	}
	return text
}
