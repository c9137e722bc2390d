package sheet

import (
	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/app/widget"
	"brinefront/physics/study"
)

// Grid is the sheet of what a simulation grid does to the flood.
type Grid struct {
	app.Compo

	Desk  widget.Desk
	Model state.Model
}

// Render draws the sheet.
func (g *Grid) Render() app.UI {
	d, m := g.Desk, g.Model
	return laid(d, m, study.SheetGrid,
		widget.Group(d, m, study.SheetGrid, "Tolerance", "How wrong it may be"),
		widget.Group(d, m, study.SheetGrid, "Grid", "Grids in mind"),
		widget.Group(d, m, study.SheetGrid, "Scheme", "How the grid is stepped",
			widget.Choice(d, "grid.scheme", "Scheme", m.Study.Grid.Scheme, study.Schemes, "The one that the simulator uses: most use implicit single-point upstream.")),
	)
}
