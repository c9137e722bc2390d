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
		widget.Group(d, m, study.SheetField, "Block", "Block or pattern of wells",
			widget.Choice(d, "field.pattern.kind", "Arrangement of the wells", in.Pattern.Kind, study.Patterns, "A pattern is one of many alike; the rate is that of one pattern.")),
		widget.Group(d, m, study.SheetField, "Layers", "Layers, or a permeability log",
			widget.Block(d, m, "field.layers.table", "Thickness, permeability and porosity, by choice saturations", in.Layers.Table, "A first line with the units, such as “ft md fraction”, then a row for each layer or each sample of a log, from the top down. Columns Swi, Sor and Swc may follow, as “ft md fraction Swi Sor”: a layer then has the study’s curve with its ends moved; a dash is the study’s value. Empty: one even layer."),
			widget.Choice(d, "field.layers.crossflow", "Flow between the layers", in.Layers.Crossflow, study.Crossflows, "What the forecast is for; the other is drawn beside it.")),
		widget.Group(d, m, study.SheetField, "Drive", "What drives the flood",
			widget.Radios(d, "field.drive", "Held constant", in.Drive, study.Drives)),
		&widget.Fold{Desk: d, Model: m, Sheet: study.SheetField, Group: "Wells", Title: "Wells: limits, skin, gas, fracture pressure"},
		app.Section().Class("group").Body(
			widget.Block(d, m, "field.wells.schedule", "Schedule, instead of the one drive", in.Wells.Schedule, "A first line with the units, such as “d bbl/d psi”, then a row from each time or date on: time, injection rate, pressure difference. A rate with a pressure is held as long as it takes no more than that; neither is shut in. Empty: the drive above."),
		),
		widget.Group(d, m, study.SheetField, "History", "What the field has made so far",
			widget.Block(d, m, "field.history.table", "Measured oil and water rates, at surface", in.History.Table, "A first line with the units, such as “date bbl/d bbl/d”, then a row for each date: oil, water. Drawn over the forecast. Optional.")),
		widget.Group(d, m, study.SheetField, "Limit", "When it stops paying",
			widget.Radios(d, "field.limit", "Economic limit", in.Limit, study.Limits),
			widget.Words(d, m, "field.start", "First day of injection", in.Start, "YYYY-MM-DD", "Turns times into dates. Optional.")),
		&widget.Fold{Desk: d, Model: m, Sheet: study.SheetField, Group: "Money", Title: "Prices and costs"},
	)
}
