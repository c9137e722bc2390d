package widget

import (
	"slices"
	"strconv"
	"strings"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/physics/report"
	"brinefront/physics/study"
	"brinefront/physics/units"
)

// caseID is the id of something of case i: "case-0-name".
func caseID(i int, what string) string { return "case-" + strconv.Itoa(i) + "-" + what }

// Cases is the form of the changes that each case makes to the base.
func Cases(d Desk, m state.Model) app.UI {
	forms := make([]app.UI, len(m.Study.Cases))
	for i := range forms {
		forms[i] = caseForm(d, m, i)
	}
	add, scope := does(d, state.CaseAdded{})
	return app.Div().Class("cases").Body(
		app.Div().Body(forms...),
		button("Add a case").ID("case-add").Disabled(len(forms) >= study.MaxCases).OnClick(add, scope),
		app.P().Class("help").Text("Up to "+strconv.Itoa(study.MaxCases)+" cases. What a case does not change it shares with the study, so an edit on another sheet reaches all of them."),
	)
}

func caseForm(d Desk, m state.Model, i int) app.UI {
	c := m.Study.Cases[i]
	path := study.CasePath(i, "name")
	remove, scope := does(d, state.CaseRemoved{Index: i})
	body := []app.UI{
		app.H3().Text(c.Name),
		app.Div().Class("field").Body(
			app.Label().For(FieldID(path)).Text("Name"),
			&Input{Desk: d, ID: FieldID(path), Path: path, Sort: CaseNameInput, Text: drafted(m, path, c.Name),
				Bad: m.Messages[path] != "", Told: messageID(path)},
			app.P().ID(messageID(path)).Class("message").Text(m.Messages[path]),
		),
	}
	shown := m.CaseInputs(i)
	for _, inner := range shown {
		body = append(body, change(d, m, i, inner))
	}
	body = append(body,
		another(d, m, i, shown),
		button("Remove this case").ID(caseID(i, "remove")).Aria("label", "Remove the case "+c.Name).OnClick(remove, scope),
	)
	return app.Section().Class("group case").DataSet("case", strconv.Itoa(i)).Body(body...)
}

// change is one input or choice that a case makes otherwise than the base.
func change(d Desk, m state.Model, i int, inner string) app.UI {
	path := study.CasePath(i, inner)
	var field app.UI
	if spec, ok := study.Find(path); ok {
		field = Field(d, m, spec)
	} else {
		field = caseChoice(d, m, i, inner)
	}
	back, scope := does(d, state.CaseInputRemoved{Index: i, Path: inner})
	return app.Div().Class("change").Body(
		field,
		app.P().Class("base").Body(
			app.Span().Text(study.BaseCase+": "+report.Held(m.Study, inner)+". "),
			button("As in the base case").ID(caseID(i, "back-"+dashed(inner))).Class("link").
				Aria("label", d.Label(inner)+" as in the base case").OnClick(back, scope),
		),
	)
}

func caseChoice(d Desk, m state.Model, i int, inner string) app.UI {
	path := study.CasePath(i, inner)
	var options []app.UI
	for _, c := range study.Choices(inner) {
		options = append(options, option(c.Value, c.Label, c.Value == m.Study.Cases[i].Choose[inner]))
	}
	return app.Div().Class("field").Body(
		app.Label().For(FieldID(path)).Text(d.Label(inner)),
		app.Select().ID(FieldID(path)).DataSet("path", path).
			OnChange(func(ctx app.Context, _ app.Event) {
				d.Send(state.CaseChosen{Index: i, Path: inner, Value: valueOf(ctx)})
			}, path).
			Body(options...),
	)
}

// another is the list of what a case may change further. It asks only for what the
// case, with the choices it makes, rests on.
func another(d Desk, m state.Model, i int, shown []string) app.UI {
	id := caseID(i, "more")
	as := m.Study.Cases[i].On(m.Study)
	options := []app.UI{option("", "choose an input …", true)}
	for _, path := range study.CaseChoices() {
		if !slices.Contains(shown, path) {
			options = append(options, option(path, d.Label(path), false))
		}
	}
	for _, spec := range study.Specs() {
		if spec.Applies(&as) && !slices.Contains(shown, spec.Path) {
			options = append(options, option(spec.Path, spec.Label+", "+spec.Symbol, false))
		}
	}
	return app.Div().Class("field").Body(
		app.Label().For(id).Text("Change another input"),
		app.Select().ID(id).
			OnChange(func(ctx app.Context, _ app.Event) {
				inner := valueOf(ctx)
				ctx.JSSrc().Set("value", "") // ready for the next one
				if inner != "" {
					d.Send(starting(m, i, inner))
					d.Find(study.CasePath(i, inner))
				}
			}, id, state.CaseInputSet{}, strings.Join(shown, " "), m.Revision).
			Body(options...),
	)
}

// starting begins a change with what the base has.
func starting(m state.Model, i int, inner string) state.Msg {
	spec, ok := study.Find(inner)
	if !ok {
		value := study.Chosen(&m.Study, inner)
		if value == "" {
			value = study.Choices(inner)[0].Value // an optional choice that nobody has made
		}
		return state.CaseChosen{Index: i, Path: inner, Value: value}
	}
	if in := spec.Get(&m.Study); in != nil {
		return state.CaseInputSet{Index: i, Path: inner, Text: units.Exact(in.Value), Unit: in.Unit}
	}
	return state.CaseInputSet{Index: i, Path: inner, Unit: m.System.Unit(spec.Quantity).Symbol}
}
