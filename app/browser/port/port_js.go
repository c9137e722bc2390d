package port

import "syscall/js"

// Listen serves every text that reaches this worker, one after another, and
// never returns. reply may be called any number of times.
func Listen(serve func(text string, reply func(text string))) {
	js.Global().Call("brinefrontListen", js.FuncOf(func(_ js.Value, args []js.Value) any {
		serve(args[0].String(), func(text string) { args[1].Invoke(text) })
		return nil
	}))
	select {}
}
