package sheet

import (
	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/app/widget"
	"brinefront/physics/study"
)

// blockForms are the inputs of blocks of finite size, of the fractures between them, and of
// the plug that was tested in their stead.
func blockForms(d widget.Desk, m state.Model) []app.UI {
	in := m.Study.Block
	forms := []app.UI{
		widget.Group(d, m, study.SheetSoak, "Block shape", "A block of finite size",
			widget.Choice(d, "block.shape", "Shape, and faces that water touches", in.Shape, study.BlockShapes, "Soaked to its end, tail and all; counter-current.")),
	}
	if !in.Given() {
		return forms
	}
	return append(forms,
		widget.Group(d, m, study.SheetSoak, "Fractures", "Blocks between fractures",
			widget.Block(d, m, "block.sizes", "Sizes of blocks", in.Sizes, "A first line with the units, such as “m %”, then a row for each size: length (or diameter) and share of the rock. Empty: all are alike.")),
		widget.Group(d, m, study.SheetSoak, "Plug", "A plug tested in its stead",
			widget.Choice(d, "block.plug.shape", "Shape, and faces that water touched", in.Plug.Shape, study.PlugShapes, "Carried to the block by three laws and by computing both.")),
	)
}
