package browser

import "syscall/js"

// Copy puts a text on the clipboard, through the clipboard's own interface where
// the browser has one and grants it, else by the older command.
func Copy(text string, done func(err error)) {
	clipboard := js.Global().Get("navigator").Get("clipboard")
	if !clipboard.Truthy() {
		done(copyByCommand(text))
		return
	}
	settle(clipboard.Call("writeText", text),
		func(js.Value) { done(nil) },
		func(js.Value) { done(copyByCommand(text)) })
}

// copyByCommand selects the text in a field out of sight and gives the focus back.
func copyByCommand(text string) error {
	focused := document().Get("activeElement")
	field := document().Call("createElement", "textarea")
	field.Set("value", text)
	field.Call("setAttribute", "aria-hidden", "true")
	field.Get("style").Set("cssText", "position:fixed;top:0;left:-100vw")
	document().Get("body").Call("append", field)
	field.Call("select")
	copied := false
	err := attempt(func() { copied = document().Call("execCommand", "copy").Bool() })
	field.Call("remove")
	if focused.Truthy() {
		focused.Call("focus")
	}
	if err != nil || !copied {
		return errNoCopying
	}
	return nil
}

// OnPaste offers every text of more than one cell that is pasted within an
// element marked data-paste, with what the mark says. Where it is used, the field
// beneath does not get it.
func OnPaste(use func(into, text string) (used bool)) {
	listen(document(), "paste", func(event js.Value) {
		target, data := event.Get("target"), event.Get("clipboardData")
		if !data.Truthy() || !target.Get("closest").Truthy() {
			return
		}
		marked := target.Call("closest", "[data-paste]")
		if !marked.Truthy() {
			return
		}
		text := data.Call("getData", "text/plain").String()
		if severalCells(text) && use(marked.Get("dataset").Get("paste").String(), text) {
			event.Call("preventDefault")
		}
	})
}
