package widget

import (
	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/physics/report"
	"brinefront/physics/study"
	"brinefront/physics/units"
)

// Working shows how a figure was obtained: formula, numbers, what the symbols
// are, method, sources, and the inputs it rests on.
func Working(d Desk, f study.Figure, s units.System, shut app.EventHandler) app.UI {
	w := report.Explain(f, s)
	return app.Section().Class("working").Hidden(false).Aria("label", "Working of "+f.Label).DataSet("working", f.ID).Body(
		app.Header().Body(
			app.H3().Text(w.Label+" = "+w.Value),
			button("Close").OnClick(shut, f.ID),
		),
		formula(w.Formula, w.Numbers),
		app.P().Text(w.Method),
		terms(f.Working.Terms, s),
		rests(d, f.Working.Inputs),
		app.Ul().Class("sources").Aria("label", "Sources").Body(sources(f.Working)...),
	)
}

func formula(symbolic, numeric string) app.UI {
	return app.Div().Class("formula").Hidden(symbolic == "").Body(
		app.P().Text(symbolic),
		app.P().Text(numeric),
	)
}

func terms(list []study.Term, s units.System) app.UI {
	rows := make([]app.UI, len(list))
	for i, t := range list {
		value := report.Value(study.Figure{Value: t.Value, Quantity: t.Quantity}, s)
		rows[i] = app.Tr().Body(
			app.Th().Scope("row").Class("symbol").Text(t.Symbol),
			app.Td().Text(t.Label),
			app.Td().Class("number").Text(value),
		)
	}
	return app.Table().Class("terms").Hidden(len(rows) == 0).Aria("label", "Symbols").Body(app.TBody().Body(rows...))
}

// rests links the inputs a figure rests on to their fields.
func rests(d Desk, paths []string) app.UI {
	links := []app.UI{app.Span().Text("Rests on: ")}
	for _, path := range paths {
		links = append(links, toField(d, path, d.Label(path)))
	}
	return app.P().Class("rests").Hidden(len(paths) == 0).Body(links...)
}

// toField brings the person to the field of an input.
func toField(d Desk, path, text string) app.UI {
	find, scope := finds(d, path)
	return button(text).Class("link").DataSet("find", path).OnClick(find, scope)
}

func sources(w study.Working) []app.UI {
	var list []app.UI
	for _, source := range report.Sources(w) {
		list = append(list, app.Li().Text(source))
	}
	return list
}
