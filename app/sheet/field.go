package sheet

import (
	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/app/widget"
	"brinefront/physics/study"
)

// Field is the sheet of the flood in time.
type Field struct {
	app.Compo

	Desk  widget.Desk
	Model state.Model
}

// Render draws the sheet.
func (f *Field) Render() app.UI {
	d, m := f.Desk, f.Model
	in := m.Study.Field
	return laid(d, m, study.SheetField,
		widget.Group(d, m, study.SheetField, "Block", "Block between the wells"),
		widget.Group(d, m, study.SheetField, "Drive", "What drives the flood",
			widget.Radios(d, "field.drive", "Held constant", in.Drive, study.Drives)),
		widget.Group(d, m, study.SheetField, "Limit", "When it stops paying",
			widget.Radios(d, "field.limit", "Economic limit", in.Limit, study.Limits),
			widget.Words(d, m, "field.start", "First day of injection", in.Start, "YYYY-MM-DD", "Turns times into dates. Optional.")),
	)
}
