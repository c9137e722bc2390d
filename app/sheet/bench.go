// Package sheet is what the person sees: one file a sheet, and the frame around
// them. Sheets read the model and send messages; they compute nothing.
package sheet

import (
	"strings"
	"sync/atomic"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/browser"
	"brinefront/app/runner"
	"brinefront/app/state"
	"brinefront/app/widget"
	"brinefront/physics/report"
	"brinefront/physics/study"
)

// Bench is the root of the screen. It holds the model, acts on messages through
// state.Update, and has the runner carry out what Update asks for.
type Bench struct {
	app.Compo

	ctx      app.Context
	model    state.Model
	runner   *runner.Runner
	unshown  atomic.Int32 // messages and changes that are not on the screen yet
	sentence string       // the answer last announced
}

var _ widget.Desk = (*Bench)(nil)

// OnInit starts with what a first visitor sees.
func (b *Bench) OnInit() { b.model = state.New() }

// OnMount connects the bench to the browser.
func (b *Bench) OnMount(ctx app.Context) {
	b.ctx = ctx
	b.runner = runner.New(func(msg state.Msg) {
		b.unshown.Add(1)
		ctx.Dispatch(func(app.Context) {
			b.Send(msg)
			b.unshown.Add(-1)
		})
	})
	browser.PublishIdle(func() bool { return b.unshown.Load() == 0 && b.runner.Idle() && browser.Drawn() })
	b.runner.Start()
}

// Send acts on a message.
func (b *Bench) Send(msg state.Msg) {
	var effects []state.Effect
	b.model, effects = state.Update(b.model, msg)
	b.runner.Do(effects)
	b.announce()
	b.ctx.Page().SetTitle(tabTitle(b.model.Study.Title))
	b.Await()
}

// Await counts a change as pending until it is rendered and its pictures are drawn, or
// await their turn out of sight.
func (b *Bench) Await() {
	b.unshown.Add(1)
	b.ctx.Defer(func(ctx app.Context) {
		// Pictures are drawn by what the rendering has just queued; this queues behind.
		ctx.Dispatcher().Dispatch(app.Dispatch{Mode: app.Next, Source: ctx.Src(), Function: func(app.Context) { b.unshown.Add(-1) }})
	})
}

// announce lets a screen reader say the answer when it has changed.
func (b *Bench) announce() {
	sheet := study.Sheet(b.model.Route.Sheet)
	part := b.model.Result.Parts[sheet]
	if b.model.Updating(sheet) {
		return
	}
	if said := report.Sentence(part, b.model.System); said != "" && said != b.sentence {
		b.sentence = said
		browser.Announce(said)
	}
}

// Find brings the person to the field of an input.
func (b *Bench) Find(path string) {
	if at := sheetOf(path); at != b.model.Route.Sheet {
		fragment := fragmentOf(at, b.model.Route.Embed)
		browser.SetFragment(fragment)
		b.Send(state.Routed{Fragment: fragment})
	}
	b.ctx.Defer(func(app.Context) {
		field := app.Window().GetElementByID(widget.FieldID(path))
		if !field.Truthy() { // a row of a long table that is not on the page
			field = app.Window().GetElementByID("inputs")
		}
		if field.Truthy() {
			if fold := field.Call("closest", "details"); fold.Truthy() {
				fold.Set("open", true) // what is folded away takes no focus
			}
			field.Call("focus")
		}
	})
}

// tabTitle names the browser's tab, and with it a printed file.
func tabTitle(study string) string {
	if study == "" {
		return "Brinefront"
	}
	return study + ", Brinefront"
}

// Render draws the frame and the sheet the address names.
func (b *Bench) Render() app.UI { return screen(b, b.model) }

// sheetOf is the sheet whose form holds an input.
func sheetOf(path string) string {
	if spec, ok := study.Find(path); ok {
		return string(spec.Sheet)
	}
	if _, _, ok := study.AtCase(path); ok {
		return string(study.SheetCompare)
	}
	first, _, found := strings.Cut(path, ".")
	switch {
	case !found:
		return "report"
	case first == "block":
		return string(study.SheetSoak)
	}
	return first
}

// fragmentOf is the address of a sheet.
func fragmentOf(sheet string, embed bool) string {
	if embed {
		return "/" + sheet + "?embed"
	}
	return "/" + sheet
}
