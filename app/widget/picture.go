package widget

import (
	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/browser"
	"brinefront/app/plot"
	"brinefront/physics/study"
	"brinefront/physics/units"
)

// Picture holds one chart: the drawing, its text alternative, and the ways to
// save it.
type Picture struct {
	app.Compo

	Chart  study.Chart
	System units.System
	Plain  bool // no buttons: in the report

	fault string // why it could not be drawn
}

// holder is the id of the element that holds the drawing. What the reader does to a
// picture, its slider and pins, is kept by it, and the report begins afresh.
func (p *Picture) holder() string {
	if p.Plain {
		return "paper-" + p.Chart.ID
	}
	return "pic-" + p.Chart.ID
}

// OnMount draws the chart.
func (p *Picture) OnMount(app.Context) { p.draw() }

// OnUpdate draws it again after a change.
func (p *Picture) OnUpdate(app.Context) { p.draw() }

// OnDismount frees what the drawing holds.
func (p *Picture) OnDismount() { browser.Forget(p.holder()) }

func (p *Picture) draw() {
	p.fault = reason(browser.Draw(p.holder(), plot.From(p.Chart, p.System).JSON()))
}

func reason(err error) string {
	if err == nil {
		return ""
	}
	return err.Error()
}

// Render draws the frame; the drawing itself is not ours to touch.
func (p *Picture) Render() app.UI {
	return app.Figure().Class("picture").Body(
		app.FigCaption().Body(
			app.Span().Class("title").Text(p.Chart.Title),
			p.saving(),
		),
		app.Div().ID(p.holder()).Class("drawing"),
		app.P().ID(p.holder()+"-text").Class("summary").Text(p.Chart.Summary),
		app.P().Class("message").Text(p.fault),
	)
}

func (p *Picture) saving() app.UI {
	if p.Plain {
		return nil
	}
	return app.Span().Class("saving").Role("group").Aria("label", "Save "+p.Chart.Title).Body(
		app.Span().Text("Save "),
		p.saver("SVG", func() error { return browser.SavePicture(p.holder(), browser.SVG, p.Chart.ID+".svg") }),
		p.saver("PNG", func() error { return browser.SavePicture(p.holder(), browser.PNG, p.Chart.ID+".png") }),
		p.saver("CSV", func() error {
			return browser.Download(p.Chart.ID+".csv", "text/csv", plot.From(p.Chart, p.System).CSV())
		}),
	)
}

// saver is a button that saves; its closure holds the component, not what the
// component showed once.
func (p *Picture) saver(format string, save func() error) app.UI {
	return button(format).Class("link").Aria("label", "Save as "+format).
		OnClick(func(app.Context, app.Event) { p.fault = reason(save()) }, format)
}
