package widget

import (
	"slices"
	"strings"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/physics/study"
)

// Group is the fields of one group of a sheet's form under one heading: those that
// the study, with the choices it has, asks for. before stands above them.
func Group(d Desk, m state.Model, sheet study.Sheet, group, title string, before ...app.UI) app.UI {
	body := append([]app.UI{app.H3().Text(title)}, before...)
	return app.Section().Class("group").Body(append(body, Fields(d, m, sheet, group)...)...)
}

// Fields are the fields of one group that the study asks for.
func Fields(d Desk, m state.Model, sheet study.Sheet, group string) []app.UI {
	var list []app.UI
	for _, spec := range asked(m, sheet, group) {
		list = append(list, Field(d, m, spec))
	}
	return list
}

// asked are the inputs of one group that the study asks for.
func asked(m state.Model, sheet study.Sheet, group string) []study.Spec {
	var list []study.Spec
	for _, spec := range study.Specs() {
		if spec.Sheet == sheet && spec.Group == group && spec.Applies(&m.Study) {
			list = append(list, spec)
		}
	}
	return list
}

// Fold is a group that many studies leave empty: it is closed until something in it
// is given, wanted or refused. Once open it stays so, that a field which is emptied
// to be typed anew does not go away.
type Fold struct {
	app.Compo

	Desk  Desk
	Model state.Model
	Sheet study.Sheet
	Group string
	Title string

	open bool
}

// Render draws the group; nothing is shown where the study asks for none of it.
func (f *Fold) Render() app.UI {
	for _, spec := range asked(f.Model, f.Sheet, f.Group) {
		f.open = f.open || touched(f.Model, spec)
	}
	fields := Fields(f.Desk, f.Model, f.Sheet, f.Group)
	return app.Details().Class("group fold").ID("fold-" + strings.ToLower(strings.ReplaceAll(f.Group, " ", "-"))).Open(f.open).Hidden(len(fields) == 0).
		Body(append([]app.UI{app.Summary().Body(app.H3().Text(f.Title))}, fields...)...)
}

// touched reports whether there is something to see at an input.
func touched(m state.Model, spec study.Spec) bool {
	if spec.Get(&m.Study) != nil || m.Said(spec.Path) != "" {
		return true
	}
	return slices.Contains(m.Result.Parts[spec.Sheet].Missing, spec.Path)
}
