package widget

import (
	"strconv"
	"strings"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/physics/study"
)

// pasteBox is the id of the text area in which the table at a path can be pasted.
func pasteBox(table string) string { return tableID(table, "paste-box") }

// What of a pasted table is shown before it is used.
const (
	previewRows    = 8
	previewColumns = 8
	previewLines   = 6
)

// oilColumn is the role of a column of the other saturation, which serves as Sw = 1 − So.
const oilColumn = "so"

// columnRoles are what a pasted column of a table may be; other is the other saturation.
func columnRoles(t study.LabTable, other string) []study.Choice {
	list := []study.Choice{{Value: "", Label: "not used"}}
	for i, c := range t.Columns {
		list = append(list, study.Choice{Value: c.Path, Label: c.Label})
		if i == 0 {
			list = append(list, study.Choice{Value: oilColumn, Label: other})
		}
	}
	return list
}

// Pasting is where a table is pasted, and how it was read before it is used.
func Pasting(d Desk, m state.Model, t study.LabTable, help string) app.UI {
	draft, text := m.Paste, ""
	if draft != nil && draft.Table != t.Path {
		draft = nil
	}
	if draft != nil {
		text = draft.Text
	}
	said, box := m.Said(t.Path), pasteBox(t.Path)
	helpID := tableID(t.Path, "paste-help")
	return app.Div().Class("pasting").DataSet("paste", t.Path).Body(
		app.Label().For(box).Text("Paste a table from a spreadsheet or a report"),
		&Input{Desk: d, ID: box, Path: t.Path, Sort: PasteInput, Text: text, Told: helpID + " " + messageID(t.Path), Bad: said != ""},
		app.P().ID(helpID).Class("help").Text(help),
		app.P().ID(messageID(t.Path)).Class("message").Text(said),
		preview(d, t, draft),
	)
}

func preview(d Desk, t study.LabTable, p *state.PasteDraft) app.UI {
	id := func(name string) string { return tableID(t.Path, name) }
	section := app.Section().ID(id("paste-preview")).Class("paste-preview")
	if p == nil {
		return section.Hidden(true)
	}
	r := p.Reading
	var lines []string
	for _, problem := range r.Problems[:min(len(r.Problems), previewLines)] {
		lines = append(lines, wrong(problem.Row, problem.Column, problem.Quoted(), problem.Allowed))
	}
	accept, acceptScope := does(d, state.PasteAccepted{})
	forget, forgetScope := does(d, state.PasteDropped{})
	return section.Hidden(false).Aria("label", "How the pasted table was read").Body(
		app.H4().Text("How it was read"),
		app.P().ID(id("paste-layout")).Text(layout(p)),
		app.Ul().Class("message").ID(id("paste-problems")).Body(items(lines, len(r.Problems))...),
		app.Ul().Class("help").ID(id("paste-remarks")).Body(items(r.Remarks, len(r.Remarks))...),
		app.Div().Class("scroll").TabIndex(0).Role("group").Aria("label", "First rows of the pasted table").Body(
			previewTable(d, t, p),
		),
		app.Div().Class("actions").Body(
			button("Use this table").ID(id("paste-accept")).Class("main").Disabled(len(r.Problems) > 0).OnClick(accept, acceptScope),
			button("Forget it").ID(id("paste-forget")).OnClick(forget, forgetScope),
		),
	)
}

func previewTable(d Desk, t study.LabTable, p *state.PasteDraft) app.UI {
	r := p.Reading
	width := min(len(r.Columns), previewColumns)
	head := make([]app.UI, width)
	for i := range width {
		head[i] = app.Th().Scope("col").Body(role(d, t, i, r.Columns[i].Title, roleOf(r.Columns[i].As, r.Columns[i].Oil), r.Label(oilColumn)))
	}
	var rows []app.UI
	for _, cells := range r.Cells[:min(len(r.Cells), previewRows)] {
		row := make([]app.UI, 0, width)
		for i := range min(len(cells), width) {
			row = append(row, app.Td().Text(cells[i]))
		}
		rows = append(rows, app.Tr().Body(row...))
	}
	return app.Table().Body(
		app.THead().Body(app.Tr().Body(head...)),
		app.TBody().Body(rows...),
	)
}

// roleOf is what a column was read as.
func roleOf(as string, oil bool) string {
	if oil {
		return oilColumn
	}
	return as
}

// role is the list that says what a pasted column is.
func role(d Desk, t study.LabTable, column int, title, as, other string) app.UI {
	number := strconv.Itoa(column + 1)
	roles := columnRoles(t, other)
	options := make([]app.UI, len(roles))
	for i, c := range roles {
		options[i] = option(c.Value, c.Label, c.Value == as)
	}
	return app.Div().Body(
		app.Span().Text(title),
		app.Select().ID(tableID(t.Path, "paste-column-"+number)).Aria("label", "What column "+number+" is").
			OnChange(func(ctx app.Context, _ app.Event) {
				d.Send(state.PasteMapped{Column: column, As: valueOf(ctx)})
			}, column).
			Body(options...),
	)
}

// wrong says what is wrong at a place of a pasted text.
func wrong(row, column int, read, allowed string) string {
	if read == "" {
		return place(row, column) + "needs " + allowed + "."
	}
	return place(row, column) + "read " + read + "; allowed: " + allowed + "."
}

func place(row, column int) string {
	var at []string
	if row >= 0 {
		at = append(at, "row "+strconv.Itoa(row+1))
	}
	if column >= 0 {
		at = append(at, "column "+strconv.Itoa(column+1))
	}
	if len(at) == 0 {
		return "The table: "
	}
	return strings.ToUpper(at[0][:1]) + strings.Join(at, ", ")[1:] + ": "
}

// separators are the words for what parts columns.
var separators = map[string]string{"tab": "tabs", "comma": "commas", "semicolon": "semicolons", "spaces": "spaces"}

// layout says how the text was cut into cells, as far as that is known.
func layout(p *state.PasteDraft) string {
	r := p.Reading
	if len(r.Columns) == 0 {
		return "No table found."
	}
	var said []string
	if parted := separators[r.Separator]; parted != "" {
		said = append(said, "columns parted by "+parted)
	}
	if r.Decimal != "" {
		said = append(said, "decimal "+r.Decimal+"s")
	}
	said = append(said, header(r.Header), counted(len(r.Cells), "row")+" of numbers")
	text := strings.Join(said, ", ")
	return strings.ToUpper(text[:1]) + text[1:] + "."
}

func header(cells []string) string {
	if cells == nil {
		return "no header row"
	}
	return "header row " + strings.Join(cells, " | ")
}

func counted(n int, noun string) string {
	if n == 1 {
		return "1 " + noun
	}
	return strconv.Itoa(n) + " " + noun + "s"
}

// items are the first lines of a list that has so many in all.
func items(lines []string, all int) []app.UI {
	var list []app.UI
	for _, line := range lines[:min(len(lines), previewLines)] {
		list = append(list, app.Li().Text(line))
	}
	if more := all - previewLines; more > 0 {
		list = append(list, app.Li().Text("and "+strconv.Itoa(more)+" more"))
	}
	return list
}
