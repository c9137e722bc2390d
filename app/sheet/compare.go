package sheet

import (
	"strconv"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/app/widget"
	"brinefront/physics/study"
)

// Compare is the sheet of cases beside the study.
type Compare struct {
	app.Compo

	Desk  widget.Desk
	Model state.Model
}

// Render draws the sheet: the table first, since it is what cases are made for.
func (c *Compare) Render() app.UI {
	d, m := c.Desk, c.Model
	part, stale := m.Part(study.SheetCompare)
	return app.Article().Class("sheet").DataSet("sheet", "compare").Aria("busy", strconv.FormatBool(m.Updating(study.SheetCompare))).Body(
		app.Div().Class("told").Body(
			heading("compare"),
			app.A().Class("jump").Href("#inputs").Text("To the cases"),
			app.Section().ID("no-cases").Class("wanting").Hidden(len(m.Study.Cases) > 0).Body(
				app.H2().Text("○ No cases yet"),
				app.P().Text("A case is this study with a few inputs changed: a more viscous oil, another curve, half the rate. Add one, choose what it changes, and its curves and figures appear here beside those of the study."),
			),
			widget.Wanting(d, m.Result.Parts[study.SheetCompare], m.Result.Problems),
			&widget.Answers{Desk: d, Sheet: study.SheetCompare, Part: part, Stale: stale, System: m.System},
			widget.Notes(d, "Cautions", "caution", part.Notes),
			tables(m, part),
			pictures(m, part),
			widget.Notes(d, "Remarks", "remark", part.Notes),
		),
		inputs("Cases", widget.Cases(d, m)),
	)
}
