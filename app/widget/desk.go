// Package widget holds the parts that sheets are made of: fields, tables, answers
// with their workings, pictures. A widget reads what it is given and sends
// messages to the desk; it keeps nothing of the study itself.
package widget

import (
	"fmt"
	"strings"

	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
	"brinefront/physics/study"
)

// Desk is where a widget's messages go.
type Desk interface {
	// Send acts on a message.
	Send(msg state.Msg)
	// Find brings the person to the field of an input, on whichever sheet it is.
	Find(path string)
	// Label names an input as its field does.
	Label(path string) string
	// Await counts what a widget has just changed in itself as pending until it
	// is on the screen.
	Await()
}

// dashed is a path as part of an element's id.
func dashed(path string) string { return strings.ReplaceAll(path, ".", "-") }

// FieldID is the id of the element in which the input at a path is given. The
// table as a whole is given by pasting it.
func FieldID(path string) string {
	if t, ok := study.FindTable(path); ok && t.Path == path {
		return pasteBox(path)
	}
	if i, inner, ok := study.AtCase(path); ok && inner == "name" {
		return caseID(i, inner)
	} else if ok {
		return caseID(i, "input-"+dashed(inner))
	}
	return "in-" + dashed(path)
}

// messageID is the id of the message beside the input at a path.
func messageID(path string) string { return "msg-" + dashed(path) }

// does sends a fixed message when an element is used. The message is the
// handler's scope too: the library keeps an old handler whose scope is the same,
// and would otherwise send the message of an earlier rendering.
func does(d Desk, msg state.Msg) (app.EventHandler, string) {
	return func(app.Context, app.Event) { d.Send(msg) }, fmt.Sprintf("%T %v", msg, msg)
}

// finds brings the person to an input.
func finds(d Desk, path string) (app.EventHandler, string) {
	return func(app.Context, app.Event) { d.Find(path) }, path
}

// valueOf is what an input, a text area or a list holds after an event.
func valueOf(ctx app.Context) string { return ctx.JSSrc().Get("value").String() }

// button is a plain button.
func button(text string) app.HTMLButton { return app.Button().Type("button").Text(text) }

// hint is text for screen readers only.
func hint(text string) app.UI { return app.Span().Class("hint").Text(text) }
