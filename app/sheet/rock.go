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
	return laid(d, m, study.SheetRock, r.points(), r.curve(), r.plug())
}

func (r *Rock) points() app.UI {
	d, m := r.Desk, r.Model
	return app.Section().Class("group").Body(
		app.H3().Text("Laboratory points"),
		widget.Pasting(d, m),
		&widget.Points{Desk: d, Model: m},
		widget.TableSource(d, m),
	)
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
