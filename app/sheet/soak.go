package sheet

import (
	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/app/widget"
	"brinefront/physics/study"
)

// Soak is the sheet of rock that takes water up by itself.
type Soak struct {
	app.Compo

	Desk  widget.Desk
	Model state.Model
}

// Render draws the sheet.
func (s *Soak) Render() app.UI {
	d, m := s.Desk, s.Model
	if !m.Study.Rock.Capillary.Given() {
		return laid(d, m, study.SheetSoak, suctionFirst())
	}
	return laid(d, m, study.SheetSoak, append([]app.UI{
		widget.Group(d, m, study.SheetSoak, "Block", "Block",
			app.P().Class("quiet").Text("Porosity, permeability and viscosities are those of Field and Front; capillary pressure is that of Rock.")),
		widget.Group(d, m, study.SheetSoak, "Flow", "Where the oil goes",
			widget.Choice(d, "soak.flow", "The oil leaves", m.Study.Soak.Flow, study.SoakFlows, "A block with one open face soaks counter-current; one with a far end open to oil, both ways.")),
		widget.Group(d, m, study.SheetSoak, "States", "Saturations"),
	}, blockForms(d, m)...)...)
}

// suctionFirst leads to the capillary pressure where a study has none.
func suctionFirst() app.UI {
	return app.Section().ID("no-suction").Class("group").Body(
		app.H3().Text("○ No capillary pressure yet"),
		app.P().Text("Rock soaks by capillary pressure alone. Choose a curve or paste points for it, and the answer appears here."),
		app.P().Body(app.A().Href("#/rock").Text("Give it on Rock")),
	)
}
