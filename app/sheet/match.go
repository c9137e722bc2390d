package sheet

import (
	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/app/widget"
	"brinefront/physics/study"
)

// Match is the sheet of inputs that are moved so that the forecast follows the history.
type Match struct {
	app.Compo

	Desk  widget.Desk
	Model state.Model
}

// Render draws the sheet.
func (c *Match) Render() app.UI {
	d, m := c.Desk, c.Model
	in := m.Study.Match
	asked := in.Asked()
	moved := []app.UI{app.H3().Text("What may be moved")}
	for _, slot := range []struct{ path, label, chosen string }{
		{"match.first", "First", in.First}, {"match.second", "Second", in.Second}, {"match.third", "Third", in.Third}, {"match.fourth", "Fourth", in.Fourth},
	} {
		moved = append(moved, widget.Choice(d, slot.path, slot.label, slot.chosen, study.Matchable, "Moved from its value, within its range."))
	}
	var fields []app.UI
	for _, path := range in.Moved() {
		if spec, _ := study.Find(path); spec.Applies(&m.Study) {
			fields = append(fields, widget.Field(d, m, spec))
		}
	}
	return laid(d, m, study.SheetMatch,
		app.Section().Class("group").Body(
			app.H3().Text("Match"),
			app.P().Class("help").Text("The history is pasted on the Field sheet. A match is computed when it is asked for, and again after an edit of what it rests on, until it is stopped."),
			app.Div().Class("actions").Body(
				widget.Action(d, "match", "Match", state.Chosen{Path: "match.run", Value: "on"}, !asked),
				widget.Action(d, "match-stop", "Stop", state.Chosen{Path: "match.run", Value: "off"}, asked),
				widget.Action(d, "match-take", "Take the values over", state.MatchTaken{}, m.Matched()),
			),
		),
		app.Section().Class("group").Body(moved...),
		app.Section().Class("group").Body(fields...),
	)
}
