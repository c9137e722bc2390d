package sheet

import (
	"strconv"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/app/widget"
	"brinefront/physics/report"
	"brinefront/physics/study"
)

// laid is a sheet of the job: the answers, what they still want, the pictures and
// tables, and beside them the inputs.
func laid(d widget.Desk, m state.Model, sheet study.Sheet, forms ...app.UI) app.UI {
	part, stale := m.Part(sheet)
	return app.Article().Class("sheet").DataSet("sheet", string(sheet)).Aria("busy", strconv.FormatBool(m.Updating(sheet))).Body(
		app.Div().Class("told").Body(
			heading(string(sheet)),
			app.A().Class("jump").Href("#inputs").Text("To the inputs"),
			widget.Wanting(d, m.Result.Parts[sheet], m.Result.Problems),
			&widget.Answers{Desk: d, Sheet: sheet, Part: part, Stale: stale, System: m.System},
			widget.Notes(d, "Cautions", "caution", part.Notes),
			pictures(m, part),
			widget.Notes(d, "Remarks", "remark", part.Notes),
			tables(m, part),
		),
		inputs("Inputs", forms...),
	)
}

func pictures(m state.Model, part study.Part) app.UI {
	drawn := make([]app.UI, len(part.Charts))
	for i, c := range part.Charts {
		drawn[i] = &widget.Picture{Chart: c, System: m.System}
	}
	return app.Section().Class("pictures").Aria("label", "Pictures").Body(drawn...)
}

func tables(m state.Model, part study.Part) app.UI {
	grids := make([]app.UI, len(part.Tables))
	for i, g := range part.Tables {
		grids[i] = widget.Grid("grid-"+g.ID, report.Print(g, m.System))
	}
	return app.Section().Class("grids").Aria("label", "Tables").Body(grids...)
}

// inputs are the forms beside what they change.
func inputs(title string, forms ...app.UI) app.UI {
	return app.Section().Class("inputs").ID("inputs").TabIndex(-1).Aria("labelledby", "inputs-title").Body(
		append([]app.UI{app.H2().ID("inputs-title").Text(title)}, forms...)...,
	)
}

// heading is the title of a sheet and the question it answers.
func heading(name string) app.UI {
	for _, s := range sheets {
		if s.name == name {
			return app.Header().Class("heading").Body(app.H1().Text(s.title), app.P().Text(s.question))
		}
	}
	panic("sheet: no sheet is called " + name)
}
