package sheet

import (
	"strings"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/app/widget"
	"brinefront/physics/report"
	"brinefront/physics/units"
)

// Report is the hand-over as it prints.
type Report struct {
	app.Compo

	Desk  widget.Desk
	Model state.Model
}

// Render draws the document and, above it, what only the screen shows.
func (r *Report) Render() app.UI {
	d, m := r.Desk, r.Model
	doc := report.Build(m.Study, m.Whole, m.System)
	return app.Article().Class("sheet paper").DataSet("sheet", "report").Body(
		heading("report"),
		app.Section().Class("inputs").ID("inputs").TabIndex(-1).Aria("label", "Particulars").Body(
			widget.Words(d, m, "author", "Author", m.Study.Author, "", ""),
			widget.Block(d, m, "note", "Note", m.Study.Note, "Printed under the title."),
			app.Div().Class("actions").Body(
				widget.Action(d, "print", "Print or save as PDF", state.PrintAsked{}, true),
				widget.Action(d, "export-text", "Save as text", state.ExportAsked{What: "report-text"}, true),
				widget.Action(d, "export-tables", "Save tables as CSV", state.ExportAsked{What: "tables-csv"}, true),
				widget.Action(d, "export-charts", "Save curves as CSV", state.ExportAsked{What: "charts-csv"}, true),
			),
		),
		document(doc, m.System),
	)
}

func document(doc report.Document, s units.System) app.UI {
	body := []app.UI{app.H2().Class("doctitle").Text(doc.Title), about(doc.About)}
	for _, section := range doc.Sections {
		blocks := []app.UI{app.H3().Text(section.Title)}
		for _, b := range section.Blocks {
			blocks = append(blocks, block(b, s))
		}
		body = append(body, app.Section().ID("report-"+section.ID).Class("part").Body(blocks...))
	}
	return app.Div().Class("document").ID("document").Body(body...)
}

func about(pairs [][2]string) app.UI {
	var list []app.UI
	for _, pair := range pairs {
		list = append(list, app.Dt().Text(pair[0]), app.Dd().Text(pair[1]))
	}
	list = append(list, app.Dt().Class("printed").Text("Printed"), app.Dd().Class("printed").ID("printed")) // start.js writes the day
	return app.Dl().Class("about").Body(list...)
}

func block(b report.Block, s units.System) app.UI {
	switch {
	case b.Heading != "":
		return app.H4().Text(b.Heading)
	case b.Table != nil:
		return widget.Grid("", *b.Table)
	case b.Chart != nil:
		return &widget.Picture{Chart: *b.Chart, System: s, Plain: true}
	case b.Explained != nil:
		return explained(*b.Explained)
	}
	return app.P().Text(b.Paragraph)
}

func explained(e report.Explanation) app.UI {
	lines := []app.UI{app.H4().Text(e.Label + " = " + e.Value)}
	for _, line := range []struct{ class, lead, text string }{
		{"formula", "", e.Formula}, {"formula", "", e.Numbers}, {"", "", e.Method},
		{"quiet", "Sources: ", strings.Join(e.Sources, "; ")}, {"quiet", "Rests on: ", strings.Join(e.Inputs, "; ")},
	} {
		if line.text != "" {
			lines = append(lines, app.P().Class(line.class).Text(line.lead+line.text))
		}
	}
	return app.Div().Class("explained").Body(lines...)
}
