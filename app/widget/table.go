package widget

import (
	"strconv"
	"strings"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
)

// tablePath is the path of the laboratory table; a cell's is
// "rock.table.<row>.<column>".
const tablePath = "rock.table"

// rowsShown is how many rows of a long table are on the page at a time: enough
// for any plug, few enough that ten thousand points stay quick to edit.
const rowsShown = 60

// columns of the laboratory table, in the order of state.Row.
var columns = [3]struct{ name, label string }{{"sw", "Sw"}, {"krw", "krw"}, {"kro", "kro"}}

// Points is the laboratory table as a grid of fields. Enter and the arrows up
// and down move between rows; a table pasted into any cell is previewed.
type Points struct {
	app.Compo

	Desk  Desk
	Model state.Model

	first int // row at the top
}

// Render draws the grid.
func (p *Points) Render() app.UI {
	rows := len(p.Model.Rows)
	p.first = max(0, min(p.first, (rows-1)/rowsShown*rowsShown))
	last := min(rows, p.first+rowsShown)
	body := make([]app.UI, 0, last-p.first)
	for row := p.first; row < last; row++ {
		body = append(body, p.row(row))
	}
	head := []app.UI{app.Th().Scope("col").Text("#")}
	for _, c := range columns {
		head = append(head, app.Th().Scope("col").Text(c.label))
	}
	add, scope := does(p.Desk, state.RowAdded{After: rows - 1})
	return app.Div().Class("points").DataSet("paste", "table").Body(
		app.Table().ID("points").Aria("label", "Laboratory points").Hidden(rows == 0).Body(
			app.THead().Body(app.Tr().Body(append(head, app.Td())...)),
			app.TBody().Body(body...),
		),
		app.Div().Class("paging").Hidden(rows <= rowsShown).Body(
			button("Earlier rows").Disabled(p.first == 0).OnClick(p.earlier),
			app.Span().Text("Rows "+strconv.Itoa(p.first+1)+" to "+strconv.Itoa(last)+" of "+strconv.Itoa(rows)),
			button("Later rows").Disabled(last == rows).OnClick(p.later),
		),
		button("Add a row").ID("row-add").OnClick(add, scope),
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
	for i, c := range columns {
		path := cellPath(row, c.name)
		message := p.Model.Said(path)
		cells = append(cells, app.Td().Body(
			&Input{Desk: p.Desk, ID: FieldID(path), Path: path, Sort: CellInput, Text: p.Model.Rows[row].Text[i],
				Bad: message != "", Told: messageID(path), Name: c.label + ", row " + number},
			app.Span().ID(messageID(path)).Class("message").Text(message),
		))
	}
	remove, scope := does(p.Desk, state.RowRemoved{Row: row})
	return app.Tr().Body(append(cells, app.Td().Body(
		button("×").Class("remove").Aria("label", "Remove row "+number).OnClick(remove, scope),
	))...)
}

func cellPath(row int, column string) string {
	return tablePath + "." + strconv.Itoa(row) + "." + column
}

// cellAt is the row and column of a cell's path.
func cellAt(path string) (row int, column string, ok bool) {
	rest, ok := strings.CutPrefix(path, tablePath+".")
	if !ok {
		return 0, "", false
	}
	number, column, ok := strings.Cut(rest, ".")
	if !ok {
		return 0, "", false
	}
	row, err := strconv.Atoi(number)
	return row, column, err == nil
}

// moved brings the caret to the same column of another row; Enter in the last one
// adds a row.
func (i *Input) moved(_ app.Context, e app.Event) {
	row, column, ok := cellAt(i.Path)
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
	next := cellPath(row, column)
	if field := app.Window().GetElementByID(FieldID(next)); field.Truthy() {
		field.Call("focus")
		field.Call("select")
	} else if e.Get("key").String() == "Enter" {
		i.Desk.Send(state.RowAdded{After: row - 1})
		i.Desk.Find(next)
	}
}

// TableSource is where the laboratory table comes from.
func TableSource(d Desk, m state.Model) app.UI {
	said := ""
	if m.Study.Rock.Table != nil {
		said = m.Study.Rock.Table.Source
	}
	path := tablePath + ".source"
	return app.Div().Class("field").Hidden(m.Study.Rock.Table == nil).Body(
		app.Label().For("source-rock-table").Text("Where the points come from: laboratory report and page"),
		&Input{Desk: d, ID: "source-rock-table", Path: tablePath, Sort: SourceInput, Text: drafted(m, path, said),
			Bad: m.Messages[path] != "", Told: messageID(path)},
		app.P().ID(messageID(path)).Class("message").Text(m.Messages[path]),
	)
}
