package widget

import (
	"strings"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/physics/study"
	"brinefront/physics/units"
)

// Field is one numeric input: label, number, unit, what is wrong with it, what
// it means, where it comes from and how far it may range.
func Field(d Desk, m state.Model, spec study.Spec) app.UI {
	spec = spec.For(&m.Study)
	text, unit := m.Shown(spec)
	message := m.Said(spec.Path)
	class := "field"
	if message != "" {
		class += " bad"
	}
	help := "help-" + dashed(spec.Path)
	return app.Div().Class(class).Body(
		app.Label().For(FieldID(spec.Path)).Body(
			app.Span().Text(spec.Label+" "), app.Span().Class("symbol").Text(spec.Symbol), optional(spec),
		),
		app.Div().Class("entry").Body(
			&Input{Desk: d, ID: FieldID(spec.Path), Path: spec.Path, Sort: NumberInput, Text: text, With: unit,
				Bad: message != "", Told: messageID(spec.Path) + " " + help},
			unitChoice(d, spec, text, unit),
		),
		app.P().ID(messageID(spec.Path)).Class("message").Text(message),
		app.P().ID(help).Class("help").Text(meaning(m, spec)),
		origin(d, m, spec),
	)
}

func optional(spec study.Spec) app.UI {
	if !spec.Optional {
		return nil
	}
	return app.Span().Class("optional").Text(" optional")
}

// unitChoice is a list of units, or the one unit there is.
func unitChoice(d Desk, spec study.Spec, text, unit string) app.UI {
	list := units.Of(spec.Quantity)
	if len(list) == 1 {
		return app.Span().Class("unit").Text(list[0].Label())
	}
	options := make([]app.UI, len(list))
	for i, u := range list {
		options[i] = option(u.Symbol, u.Label(), u.Symbol == unit)
	}
	return app.Select().ID("unit-"+dashed(spec.Path)).Class("unit").Aria("label", "Unit of "+spec.Label).
		OnChange(func(ctx app.Context, _ app.Event) {
			d.Send(state.Edited{Path: spec.Path, Text: text, Unit: valueOf(ctx)})
		}, spec.Path, text).
		Body(options...)
}

// meaning is the quiet line beneath a field: its value in the unit of the system
// where that is another one, what it is, and what an empty field stands for.
func meaning(m state.Model, spec study.Spec) string {
	var parts []string
	if in := spec.Get(&m.Study); in != nil {
		typed, known := units.Find(spec.Quantity, in.Unit)
		shown := m.System.Unit(spec.Quantity)
		if known && typed.ToSI(1) != shown.ToSI(1) {
			parts = append(parts, "= "+units.Print(typed.ToSI(in.Value), shown, 4)+".")
		}
	} else if spec.Default != "" {
		parts = append(parts, "Empty: "+spec.Default+".")
	}
	if spec.Help != "" {
		parts = append(parts, spec.Help)
	}
	return strings.Join(parts, " ")
}

// origin is where the number comes from, and how far it may range.
func origin(d Desk, m state.Model, spec study.Spec) app.UI {
	in := spec.Get(&m.Study)
	if in == nil {
		return app.Details().Class("origin").Hidden(true).Body(app.Summary())
	}
	said := "no source given"
	if in.Source != "" {
		said = in.Source
	}
	path := dashed(spec.Path)
	low, high := drafted(m, spec.Path+".low", end(in.Low)), drafted(m, spec.Path+".high", end(in.High))
	lowBad, highBad, sourceBad := m.Messages[spec.Path+".low"], m.Messages[spec.Path+".high"], m.Messages[spec.Path+".source"]
	return app.Details().Class("origin").Hidden(false).Body(
		app.Summary().Body(hint(spec.Label+": "), app.Span().Text("Source and range: "), app.Span().Class("said").Text(said)),
		app.Label().For("source-"+path).Text("Where it comes from: report and page, analogue, assumption"),
		&Input{Desk: d, ID: "source-" + path, Path: spec.Path, Sort: SourceInput, Text: drafted(m, spec.Path+".source", in.Source),
			Bad: sourceBad != "", Told: "msg-origin-" + path},
		app.Div().Class("range").Body(
			app.Label().For("low-"+path).Text("Low"),
			&Input{Desk: d, ID: "low-" + path, Path: spec.Path, Sort: LowInput, Text: low, With: high, Bad: lowBad != "", Told: "msg-origin-" + path},
			app.Label().For("high-"+path).Text("High"),
			&Input{Desk: d, ID: "high-" + path, Path: spec.Path, Sort: HighInput, Text: high, With: low, Bad: highBad != "", Told: "msg-origin-" + path},
			app.Span().Class("unit").Text(in.Unit),
		),
		app.P().ID("msg-origin-"+path).Class("message").Text(strings.TrimSpace(sourceBad+" "+lowBad+" "+highBad)),
	)
}

// drafted is what was typed while it differs from the study, else the study's own.
func drafted(m state.Model, path, own string) string {
	if draft, ok := m.Drafts[path]; ok {
		return draft.Text
	}
	return own
}

func end(of *float64) string {
	if of == nil {
		return ""
	}
	return units.Exact(*of)
}
