// Package sheet is what the person sees: one file a sheet. Sheets read the model
// and send messages; they compute nothing.
package sheet

import "github.com/maxence-charriere/go-app/v9/pkg/app"

// Bench is the root of the screen.
type Bench struct{ app.Compo }

// Render draws the frame and the sheet the address names.
func (b *Bench) Render() app.UI {
	return app.Div().ID("bench").Body(app.H1().Text("Brinefront"))
}
