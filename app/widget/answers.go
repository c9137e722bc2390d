package widget

import (
	"strconv"
	"strings"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/physics/report"
	"brinefront/physics/study"
	"brinefront/physics/units"
)

// Answers is a sheet's answer: the sentence, the strip of figures, and the
// working of the figure that is looked at.
type Answers struct {
	app.Compo

	Desk   Desk
	Sheet  study.Sheet
	Part   study.Part
	Stale  bool // the answer to earlier inputs: those that stand have none
	System units.System

	open string // the figure whose working is shown
}

// Render draws the answer.
func (a *Answers) Render() app.UI {
	var strip, rest []app.UI
	for _, f := range a.Part.Figures {
		if f.Strip {
			strip = append(strip, a.figure(f))
		} else {
			rest = append(rest, a.figure(f))
		}
	}
	all := app.Div().Class("answers")
	if a.Stale {
		all = all.DataSet("stale", "yes")
	}
	return all.Body(
		app.P().Class("stopped").Hidden(!a.Stale).
			Text("◌ Answer to the inputs before. The inputs as they stand have none; figures, pictures and tables below are of those before."),
		app.P().Class("stopped").Hidden(a.Part.Left == 0).
			Text("… "+Done(a.Part)+" computed. Figures, pictures and tables below are on their way and stand for what there is."),
		app.P().Class("sentence").ID("answer-"+string(a.Sheet)).Body(a.sentence()...),
		app.P().Class("stopped").Hidden(a.Part.Status != study.Stopped).
			Text("◐ The computation stopped short. What it reached is shown; treat it as provisional."),
		app.Ul().Class("strip").Aria("label", "Figures; each opens its working").Body(strip...),
		a.working(),
		app.Details().Class("rest").Hidden(len(rest) == 0).Body(
			app.Summary().Text("More figures ("+strconv.Itoa(len(rest))+")"),
			app.Ul().Class("strip").Body(rest...),
		),
	)
}

// Done is how much there is of a part that grows.
func Done(p study.Part) string { return strconv.Itoa(int(100*(1-p.Left))) + " %" }

// sentence is the answer in words; no line ends between a figure and its full stop.
func (a *Answers) sentence() []app.UI {
	var words []app.UI
	var last app.UI // the figure that what follows may have to stay with
	for _, phrase := range a.Part.Answer {
		said := phrase.Text
		if last != nil {
			end := len(said) - len(strings.TrimLeft(said, ".,;:)"))
			if end > 0 {
				last = app.Span().Class("whole").Body(last, app.Text(said[:end]))
			}
			words, said, last = append(words, last), said[end:], nil
		}
		if said != "" {
			words = append(words, app.Text(said))
		}
		if f, ok := a.Part.Figure(phrase.Figure); ok {
			last = button(report.Spoken(f, a.System)).Class("inline").Title("Show the working").
				Aria("expanded", strconv.FormatBool(a.open == f.ID)).OnClick(a.toggle(f.ID), f.ID)
		}
	}
	if last != nil {
		words = append(words, last)
	}
	return words
}

// figure is one number of the strip: a button that opens its working.
func (a *Answers) figure(f study.Figure) app.UI {
	return app.Li().Body(app.Button().Type("button").
		DataSet("figure", f.ID).
		DataSet("value", strconv.FormatFloat(f.Value, 'g', -1, 64)).
		Aria("expanded", strconv.FormatBool(a.open == f.ID)).
		OnClick(a.toggle(f.ID), f.ID).
		Body(
			app.Span().Class("value").Body(value(f, a.System)...),
			app.Span().Class("label").Body(app.Text(f.Label+" "), app.Span().Class("symbol").Text(f.Symbol)),
		))
}

// value prints a figure so that its line ends before the unit if anywhere.
func value(f study.Figure, s units.System) []app.UI {
	number, unit, _ := strings.Cut(report.Value(f, s), "\u00a0")
	if unit == "" {
		return []app.UI{app.Text(number)}
	}
	return []app.UI{app.Text(number + " "), app.Span().Class("whole").Text(unit)}
}

func (a *Answers) toggle(id string) app.EventHandler {
	return func(app.Context, app.Event) {
		if a.open == id {
			a.open = ""
		} else {
			a.open = id
		}
		a.Desk.Await()
	}
}

func (a *Answers) working() app.UI {
	f, ok := a.Part.Figure(a.open)
	if !ok {
		return app.Section().Class("working").Hidden(true)
	}
	return Working(a.Desk, f, a.System, a.toggle(f.ID))
}
