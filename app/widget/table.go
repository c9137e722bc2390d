package widget

import (
	"strconv"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/physics/study"
)

// tableID is the id of an element of a laboratory table: the first table of the form has
// it as it is.
func tableID(table, id string) string {
	if table == study.LabTables()[0].Path {
		return id
	}
	return id + "-" + dashed(table)
}

// rowsShown is how many rows of a long table are on the page at a time: enough
// for any plug, few enough that ten thousand points stay quick to edit.
const rowsShown = 60

// Points is a laboratory table as a grid of fields. Enter and the arrows up
// and down move between rows; a table pasted into any cell is previewed.
type Points struct {
	app.Compo

	Desk  Desk
	Model state.Model
	Table study.LabTable

	first int // row at the top
}

// Render draws the grid.
func (p *Points) Render() app.UI {
	rows := len(p.Model.Rows(p.Table.Path))
	p.first = max(0, min(p.first, (rows-1)/rowsShown*rowsShown))
	last := min(rows, p.first+rowsShown)
	body := make([]app.UI, 0, last-p.first)
	for row := p.first; row < last; row++ {
		body = append(body, p.row(row))
	}
	head := []app.UI{app.Th().Scope("col").Text("#")}
	for _, c := range p.Table.Columns {
		head = append(head, app.Th().Scope("col").Text(c.Label))
	}
	add, scope := does(p.Desk, state.RowAdded{Table: p.Table.Path, After: rows - 1})
	return app.Div().Class("points").DataSet("paste", p.Table.Path).Body(
		app.Table().ID(tableID(p.Table.Path, "points")).Aria("label", p.Table.Label).Hidden(rows == 0).Body(
			app.THead().Body(app.Tr().Body(append(head, app.Td())...)),
			app.TBody().Body(body...),
		),
		app.Div().Class("paging").Hidden(rows <= rowsShown).Body(
			button("Earlier rows").Disabled(p.first == 0).OnClick(p.earlier),
			app.Span().Text("Rows "+strconv.Itoa(p.first+1)+" to "+strconv.Itoa(last)+" of "+strconv.Itoa(rows)),
			button("Later rows").Disabled(last == rows).OnClick(p.later),
		),
		button("Add a row").ID(tableID(p.Table.Path, "row-add")).Class("row-add").OnClick(add, scope),
	)
}

func (p *Points) earlier(app.Context, app.Event) { p.turn(-rowsShown) }
func (p *Points) later(app.Context, app.Event)   { p.turn(rowsShown) }

func (p *Points) turn(by int) {
	p.first += by
	p.Desk.Await()
}

// row is one point, with what is wrong with it beneath.
func (p *Points) row(row int) app.UI {
	number := strconv.Itoa(row + 1)
	cells := []app.UI{app.Th().Scope("row").Text(number)}
	for i, c := range p.Table.Columns {
		path := p.Table.Cell(row, i)
		message := p.Model.Said(path)
		cells = append(cells, app.Td().Body(
			&Input{Desk: p.Desk, ID: FieldID(path), Path: path, Sort: CellInput, Text: p.Model.Rows(p.Table.Path)[row].Text[i],
				Bad: message != "", Told: messageID(path), Name: c.Label + ", row " + number},
			app.Span().ID(messageID(path)).Class("message").Text(message),
		))
	}
	remove, scope := does(p.Desk, state.RowRemoved{Table: p.Table.Path, Row: row})
	return app.Tr().Body(append(cells, app.Td().Body(
		button("×").Class("remove").Aria("label", "Remove row "+number).OnClick(remove, scope),
	))...)
}

// moved brings the caret to the same column of another row; Enter in the last one
// adds a row.
func (i *Input) moved(_ app.Context, e app.Event) {
	t, _ := study.FindTable(i.Path)
	row, column, ok := t.At(i.Path)
	if !ok {
		return
	}
	switch e.Get("key").String() {
	case "ArrowUp":
		row--
	case "ArrowDown", "Enter":
		row++
	default:
		return
	}
	e.PreventDefault()
	next := t.Cell(row, column)
	if field := app.Window().GetElementByID(FieldID(next)); field.Truthy() {
		field.Call("focus")
		field.Call("select")
	} else if e.Get("key").String() == "Enter" {
		i.Desk.Send(state.RowAdded{Table: t.Path, After: row - 1})
		i.Desk.Find(next)
	}
}

// TableSource is where a laboratory table comes from.
func TableSource(d Desk, m state.Model, t study.LabTable) app.UI {
	columns, said := t.Get(&m.Study)
	path, id := t.Path+".source", "source-"+dashed(t.Path)
	return app.Div().Class("field").Hidden(columns == nil).Body(
		app.Label().For(id).Text("Where the points come from: laboratory report and page"),
		&Input{Desk: d, ID: id, Path: t.Path, Sort: SourceInput, Text: drafted(m, path, said),
			Bad: m.Messages[path] != "", Told: messageID(path)},
		app.P().ID(messageID(path)).Class("message").Text(m.Messages[path]),
	)
}
