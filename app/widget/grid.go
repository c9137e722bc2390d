package widget

import (
	"strings"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/physics/report"
)

// shortTable is how many rows a printed page keeps together.
const shortTable = 16

// Grid is a printed table.
func Grid(id string, t report.Table) app.UI {
	head := make([]app.UI, len(t.Columns))
	for i, column := range t.Columns {
		head[i] = app.Th().Scope("col").Class(columnClass(t, i)).Text(column)
	}
	rows := make([]app.UI, len(t.Rows))
	for r, row := range t.Rows {
		cells := make([]app.UI, len(row))
		for i, cell := range row {
			cells[i] = app.Td().Class(columnClass(t, i)).Text(cell)
		}
		rows[r] = app.Tr().Body(cells...)
	}
	class := "scroll"
	if len(rows) <= shortTable {
		class += " short"
	}
	name := t.Title
	if name == "" {
		name = "Table of " + strings.Join(t.Columns, ", ")
	}
	return app.Div().Class(class).ID(id).TabIndex(0).Role("group").Aria("label", name).Body(
		app.Table().Class("grid").Body(
			app.Caption().Text(t.Title),
			app.THead().Body(app.Tr().Body(head...)),
			app.TBody().Body(rows...),
		),
	)
}

func columnClass(t report.Table, i int) string {
	if t.Numeric[i] {
		return "number"
	}
	return "words"
}
