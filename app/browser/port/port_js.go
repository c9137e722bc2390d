package port

import "syscall/js"

// Listen has every text that reaches this worker taken as it comes, and then worked
// on; it never returns. reply may be called any number of times, while work goes on.
// Work calls turn to let further texts come in.
func Listen(take func(text string, reply func(text string)), work func(turn func())) {
	come := make(chan struct{}, 1)
	js.Global().Call("brinefrontListen", js.FuncOf(func(_ js.Value, args []js.Value) any {
		take(args[0].String(), func(text string) { args[1].Invoke(text) })
		select {
		case come <- struct{}{}:
		default: // it is awake already
		}
		return nil
	}))
	// A message to oneself comes back after those that were there before it. A timer
	// would cost four milliseconds.
	there := make(chan struct{}, 1)
	channel := js.Global().Get("MessageChannel").New()
	channel.Get("port1").Set("onmessage", js.FuncOf(func(js.Value, []js.Value) any {
		there <- struct{}{}
		return nil
	}))
	turn := func() {
		channel.Get("port2").Call("postMessage", js.Null())
		<-there
	}
	for range come {
		work(turn)
	}
}
