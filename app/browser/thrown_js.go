package browser

import (
	"errors"
	"strings"
	"syscall/js"
)

// attempt makes calls that JavaScript may answer by throwing. syscall/js turns
// what is thrown into a panic with a js.Error; here it becomes an error. Any
// other panic is a bug of ours and goes on.
func attempt(calls func()) (err error) {
	defer func() {
		switch p := recover().(type) {
		case nil:
		case js.Error:
			err = errors.New(words(p.Value))
		default:
			panic(p)
		}
	}()
	calls()
	return nil
}

// words is the message of whatever was thrown or rejected, to stand within a sentence.
func words(thrown js.Value) string {
	text := thrown
	if thrown.Type() == js.TypeObject && thrown.Get("message").Type() == js.TypeString {
		text = thrown.Get("message")
	}
	return strings.TrimRight(js.Global().Call("String", text).String(), ".")
}

func document() js.Value { return js.Global().Get("document") }

// listen keeps a listener for the life of the page.
func listen(target js.Value, event string, f func(event js.Value)) {
	target.Call("addEventListener", event, js.FuncOf(func(_ js.Value, args []js.Value) any {
		f(args[0])
		return nil
	}))
}

// settle waits for a promise without blocking; exactly one of the two is called.
func settle(promise js.Value, kept func(js.Value), broken func(js.Value)) {
	var onKept, onBroken js.Func
	release := func() { onKept.Release(); onBroken.Release() }
	onKept = js.FuncOf(func(_ js.Value, args []js.Value) any {
		defer release()
		kept(args[0])
		return nil
	})
	onBroken = js.FuncOf(func(_ js.Value, args []js.Value) any {
		defer release()
		broken(args[0])
		return nil
	})
	promise.Call("then", onKept, onBroken)
}
