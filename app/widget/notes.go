package widget

import (
	"strings"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/physics/study"
)

// marks tell the levels of a note apart without colour.
var marks = map[string]string{"caution": "▲ Caution. ", "remark": "· "}

// Notes are a sheet's notes of one level: what was found, why it matters, what to
// do, and the inputs it is about.
func Notes(d Desk, title, level string, notes []study.Note) app.UI {
	var list []app.UI
	for _, n := range notes {
		if n.Level == level {
			list = append(list, note(d, n))
		}
	}
	return app.Section().Class("notes").Hidden(len(list) == 0).Body(
		app.H2().Text(title),
		app.Ul().Body(list...),
	)
}

func note(d Desk, n study.Note) app.UI {
	body := []app.UI{
		app.P().Body(app.Strong().Text(marks[n.Level]), app.Text(n.Text)),
		app.P().Class("quiet").Text(strings.TrimSpace(n.Cause + " " + n.Do)),
	}
	for _, path := range n.Paths {
		body = append(body, toField(d, path, d.Label(path)))
	}
	return app.Li().Class(n.Level).DataSet("note", n.ID).Body(body...)
}

// Wanting says what a sheet still needs before it can answer: inputs that are
// missing, inputs that cannot be used. Each brings the person to its field.
func Wanting(d Desk, part study.Part, problems []study.Problem) app.UI {
	switch part.Status {
	case study.Waiting:
		links := make([]app.UI, len(part.Missing))
		for i, path := range part.Missing {
			links[i] = app.Li().Body(toField(d, path, d.Label(path)))
		}
		return wanting("○ Waiting for "+counted(len(links), "input"), "The answer appears as soon as these are given:", links)
	case study.Refused:
		links := make([]app.UI, len(problems))
		for i, p := range problems {
			links[i] = app.Li().Body(
				toField(d, p.Path, d.Label(p.Path)),
				app.Text(": read "+p.Read+"; allowed: "+p.Allowed+"."),
			)
		}
		return wanting("✕ No answer: "+counted(len(links), "input")+" cannot be used", "Each of these needs another value:", links)
	}
	return app.Section().Class("wanting").Hidden(true)
}

func wanting(title, lead string, links []app.UI) app.UI {
	return app.Section().Class("wanting").Hidden(false).Body(
		app.H2().Text(title),
		app.P().Text(lead),
		app.Ul().Body(links...),
	)
}

// Notices are what happened outside the study, until dismissed.
func Notices(d Desk, notices []state.Notice) app.UI {
	list := make([]app.UI, len(notices))
	for i, n := range notices {
		mark := "✓ "
		if n.Level == "refused" {
			mark = "✕ "
		}
		dismiss, scope := does(d, state.Dismissed{Notice: n.ID})
		list[i] = app.Li().Class(n.Level).Body(
			app.Span().Text(mark+n.Text),
			button("Dismiss").OnClick(dismiss, scope),
		)
	}
	return app.Div().ID("notices").Class("notices").Role("status").Aria("live", "polite").Body(app.Ul().Body(list...))
}
