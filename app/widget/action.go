package widget

import (
	"github.com/maxence-charriere/go-app/v9/pkg/app"

	"brinefront/app/state"
)

// Action is a button that sends a message.
func Action(d Desk, id, text string, msg state.Msg, allowed bool) app.UI {
	send, scope := does(d, msg)
	return button(text).ID("do-"+id).Disabled(!allowed).OnClick(send, scope)
}

// Link is an action within a sentence.
func Link(d Desk, id, text string, msg state.Msg) app.UI {
	send, scope := does(d, msg)
	return button(text).ID("do-"+id).Class("link").OnClick(send, scope)
}
