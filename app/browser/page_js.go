package browser

import "syscall/js"

// Print opens the print dialogue.
func Print() { js.Global().Call("print") }

// PublishIdle lets a test, or a page around this one, ask whether anything is pending.
func PublishIdle(idle func() bool) {
	js.Global().Set("brinefrontIdle", js.FuncOf(func(js.Value, []js.Value) any { return idle() }))
}

// Announce lets a screen reader say a text when it is next silent. The element
// "announce" is the page's polite live region.
func Announce(text string) {
	region := document().Call("getElementById", "announce")
	if !region.Truthy() {
		return
	}
	// The same text twice is a change only if it differs: a space that is not read.
	if region.Get("textContent").String() == text {
		text += "\u00a0"
	}
	region.Set("textContent", text)
}

// OnShortcut tells the program's shortcuts; where one is used, the browser does
// not act on it. KeyUndo and redo are left to a text field that has the focus: it
// has an undo of its own.
func OnShortcut(use func(key string) (used bool)) {
	listen(document(), "keydown", func(event js.Value) {
		held := func(key string) bool { return event.Get(key).Truthy() }
		if held("altKey") || held("ctrlKey") == held("metaKey") || event.Get("key").Type() != js.TypeString {
			return
		}
		key := shortcut(event.Get("key").String(), held("shiftKey"))
		if key == "" || (key == KeyUndo || key == KeyRedo) && writing() {
			return
		}
		if use(key) {
			event.Call("preventDefault")
		}
	})
}

// writing reports whether the focus is where text is typed.
func writing() bool {
	focused := document().Get("activeElement")
	const fields = `textarea, [contenteditable="true"], input:not([type="checkbox"], [type="radio"], [type="range"], [type="button"])`
	return focused.Truthy() && focused.Call("matches", fields).Bool()
}
