package browser

import (
	"strings"
	"syscall/js"
)

// told is the last fragment that the program set or was told, so that the two
// events a browser fires for one move count once.
var told string

// Fragment is what follows the # of the address.
func Fragment() string {
	return strings.TrimPrefix(js.Global().Get("location").Get("hash").String(), "#")
}

// Address is the page's own address without the fragment.
func Address() string {
	address, _, _ := strings.Cut(js.Global().Get("location").Get("href").String(), "#")
	return address
}

// SetFragment changes the address without loading anything; the way back leads
// to the one before.
func SetFragment(fragment string) {
	told = fragment
	if fragment == Fragment() {
		return
	}
	js.Global().Get("history").Call("pushState", js.Null(), "", "#"+fragment)
}

// OnFragment tells when the person moves by link, by the way back or forward, or
// by typing an address. Links within the page are left to the browser: the
// interface's own link handling would push the address and tell nobody.
func OnFragment(moved func(fragment string)) {
	told = Fragment()
	look := func(js.Value) {
		if now := Fragment(); now != told && ours(now) {
			told = now
			moved(now)
		}
	}
	listen(js.Global(), "hashchange", look)
	listen(js.Global(), "popstate", look)
	listen(document(), "click", func(event js.Value) {
		target := event.Get("target")
		if target.Get("closest").Truthy() && target.Call("closest", `a[href^="#"]`).Truthy() {
			event.Call("stopPropagation")
		}
	})
}
