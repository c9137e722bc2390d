package browser

import "syscall/js"

// plot calls the one script that knows the drawing library.
func plot(method string, args ...any) error {
	script := js.Global().Get("brinefrontPlot")
	if !script.Truthy() {
		return errNoPlot
	}
	return attempt(func() { script.Call(method, args...) })
}

// Draw draws a picture, described as JSON, into the element with the id holder, at
// once where that is in sight, else in an idle moment; drawing the same again costs
// nothing.
func Draw(holder, picture string) error { return plot("draw", holder, picture) }

// Drawn reports whether every picture in sight shows what Draw was last given.
func Drawn() bool {
	script := js.Global().Get("brinefrontPlot")
	return !script.Truthy() || script.Call("settled").Bool()
}

// Forget frees what Draw keeps for a holder.
func Forget(holder string) {
	// An absent script has nothing to free.
	_ = plot("forget", holder)
}

// SavePicture hands the picture in a holder to the person as a file.
func SavePicture(holder, format, filename string) error {
	return plot("save", holder, format, filename)
}
