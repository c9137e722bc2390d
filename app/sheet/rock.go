package sheet

import (
	"strings"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/app/widget"
	"brinefront/physics/study"
)

// Rock is the sheet of the plug and its curves.
type Rock struct {
	app.Compo

	Desk  widget.Desk
	Model state.Model
}

// Render draws the sheet.
func (r *Rock) Render() app.UI {
	d, m := r.Desk, r.Model
	return laid(d, m, study.SheetRock, r.points(), r.curve(), r.plug(), r.capillary())
}

func (r *Rock) points() app.UI {
	d, m := r.Desk, r.Model
	return app.Section().Class("group").Body(append([]app.UI{app.H3().Text("Laboratory points")}, table(d, m, "rock.table",
		"Saturation and both relative permeabilities, in any order by their headings; fractions or percent; decimal points or commas; with or without a header row.")...)...)
}

// table is where a laboratory table is pasted and typed.
func table(d widget.Desk, m state.Model, path, help string) []app.UI {
	t, _ := study.FindTable(path)
	t = t.For(&m.Study)
	return []app.UI{
		widget.Pasting(d, m, t, help),
		&widget.Points{Desk: d, Model: m, Table: t},
		widget.TableSource(d, m, t),
	}
}

// capillary is the rock's capillary pressure: which curve, its points or parameters, what
// it was measured at, and the end states of a wettability test.
func (r *Rock) capillary() app.UI {
	d, m := r.Desk, r.Model
	c := m.Study.Rock.Capillary
	choice := func(name, label, value string, list []study.Choice, help string) app.UI {
		return widget.Choice(d, "rock.capillary."+name, label, value, list, help)
	}
	body := []app.UI{app.H3().Text("Capillary pressure"), choice("curve", "Capillary pressure", c.Curve, study.PcKinds, "Pc = Po − Pw. Needed for what rock soaks up; the other sheets do without.")}
	if c.ByTable() {
		body = append(body, choice("unit", "Unit of Pc in the table", c.Unit, study.PcUnits, ""))
		body = append(body, table(d, m, "rock.capillary.table", "Columns Sw and Pc, with psi, kPa, bar, MPa or Pa in the heading, or Sw and J.")...)
	}
	if c.Fitted() {
		body = append(body, choice("ends", "Ends of the fit", c.Ends, study.PcEnds, ""), choice("weights", "Weights of the fit", c.Weights, study.Weightings, ""))
	}
	body = append(body, widget.Fields(d, m, study.SheetRock, "Capillary pressure")...)
	if c.Scalable() {
		body = append(body, choice("at", "Measured at", c.At, study.PcConditions, ""))
	}
	body = append(body, widget.Fields(d, m, study.SheetRock, "Capillary laboratory")...)
	if c.Given() {
		body = append(body, app.H4().Text("Wettability test of Amott"))
	}
	return app.Section().Class("group").Body(append(body, widget.Fields(d, m, study.SheetRock, "Amott")...)...)
}

// curve is which curve the study uses, with the parameters typed for it.
func (r *Rock) curve() app.UI {
	d, m := r.Desk, r.Model
	choice := widget.Choice(d, "rock.curve", "Curve used", m.Study.Rock.Curve, study.CurveKinds, "A curve either follows the laboratory points, is fitted to them, or is typed.")
	body := []app.UI{app.H3().Text("Curve"), choice}
	if strings.HasSuffix(m.Study.Rock.Curve, "-fit") {
		body = append(body,
			widget.Choice(d, "rock.ends", "Swc and Sor of the fit", m.Study.Rock.Ends, study.FitEnds, "Points that stop short of both ends may tell them all the same."),
			widget.Choice(d, "rock.weights", "Weights of the fit", m.Study.Rock.Weights, study.Weightings, "Relative permeability spans decades; relative weights respect its small values."))
	}
	for _, group := range []string{"Corey", "LET"} { // the curve chosen asks for one, or none
		body = append(body, widget.Fields(d, m, study.SheetRock, group)...)
	}
	return app.Section().Class("group").Body(body...)
}

func (r *Rock) plug() app.UI {
	d, m := r.Desk, r.Model
	return widget.Group(d, m, study.SheetRock, "Plug", "Plug",
		widget.Choice(d, "rock.reference", "Permeability that kr refers to", m.Study.Rock.Reference, study.References,
			"Look in the laboratory report: kr at Swc of exactly 1 usually means ko(Swi)."))
}
