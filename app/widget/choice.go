package widget

import (
	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/physics/study"
)

// Choice is an enumerated input as a list.
func Choice(d Desk, path, label, chosen string, list []study.Choice, help string) app.UI {
	options := make([]app.UI, len(list))
	for i, c := range list {
		options[i] = option(c.Value, c.Label, c.Value == chosen)
	}
	return app.Div().Class("field").Body(
		app.Label().For(FieldID(path)).Text(label),
		app.Select().ID(FieldID(path)).DataSet("path", path).Aria("describedby", "help-"+dashed(path)).
			OnChange(func(ctx app.Context, _ app.Event) {
				d.Send(state.Chosen{Path: path, Value: valueOf(ctx)})
			}, path).
			Body(options...),
		app.P().ID("help-"+dashed(path)).Class("help").Text(help),
	)
}

// Radios is an enumerated input with all its values in sight.
func Radios(d Desk, path, label, chosen string, list []study.Choice) app.UI {
	values := make([]app.UI, len(list))
	for i, c := range list {
		id := FieldID(path) + "-" + c.Value
		choose, scope := does(d, state.Chosen{Path: path, Value: c.Value})
		radio := app.Input().Type("radio").ID(id).Name(path).DataSet("path", path).OnChange(choose, scope)
		radio = radio.Checked(c.Value == chosen)
		values[i] = app.Label().For(id).Body(radio, app.Span().Text(c.Label))
	}
	return app.FieldSet().Class("radios").ID(FieldID(path)).TabIndex(-1).
		Body(append([]app.UI{app.Legend().Text(label)}, values...)...)
}

func option(value, label string, selected bool) app.UI {
	return app.Option().Attr("value", value).Text(label).Selected(selected)
}

// Words is a text field.
func Words(d Desk, m state.Model, path, label, text, empty, help string) app.UI {
	return words(d, m, path, label, text, empty, help, WordsInput)
}

// Block is a text field of several lines.
func Block(d Desk, m state.Model, path, label, text, help string) app.UI {
	return words(d, m, path, label, text, "", help, BlockInput)
}

func words(d Desk, m state.Model, path, label, text, empty, help string, sort InputSort) app.UI {
	return app.Div().Class("field").Body(
		app.Label().For(FieldID(path)).Text(label),
		&Input{Desk: d, ID: FieldID(path), Path: path, Sort: sort, Text: drafted(m, path, text), Empty: empty,
			Bad: m.Said(path) != "", Told: messageID(path) + " help-" + dashed(path)},
		app.P().ID(messageID(path)).Class("message").Text(m.Said(path)),
		app.P().ID("help-"+dashed(path)).Class("help").Text(help),
	)
}
