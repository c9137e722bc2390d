package sheet

import (
	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/app/widget"
	"brinefront/physics/study"
)

// Front is the sheet of the moving front.
type Front struct {
	app.Compo

	Desk  widget.Desk
	Model state.Model
}

// Render draws the sheet.
func (f *Front) Render() app.UI {
	d, m := f.Desk, f.Model
	return laid(d, m, study.SheetFront,
		widget.Group(d, m, study.SheetFront, "Fluids", "Fluids at reservoir conditions",
			widget.Choice(d, "fluids.pair", "What displaces what", m.Study.Fluids.Pair, study.Choices("fluids.pair"), "Labels, usual values and cautions follow the pair.")),
		widget.Group(d, m, study.SheetFront, "States", "Saturations before and behind",
			endings(d, m)...),
		&widget.Fold{Desk: d, Model: m, Sheet: study.SheetFront, Group: "Dip", Title: "Gravity and dip"},
		widget.Group(d, m, study.SheetFront, "Rider", "What rides along",
			widget.Choice(d, "front.rider.kind", "With the injected water rides", m.Study.Front.Rider.Kind, study.Choices("front.rider.kind"), "Only with brine as the displacing phase. The front of it, its bank and what it adds are told beside the flood with water alone.")),
	)
}

// endings asks where a phase that is trapped stops moving.
func endings(d widget.Desk, m state.Model) []app.UI {
	if land, _ := study.Find("rock.land"); !land.Applies(&m.Study) {
		return nil
	}
	return []app.UI{widget.Choice(d, "front.ending", "The displacement ends", m.Study.Front.Ending, study.Choices("front.ending"), "By Land's law needs Land's coefficient.")}
}
