package browser

import "syscall/js"

// Engine is a worker that computes. It answers posted texts in order.
type Engine struct {
	worker  js.Value // what brinefrontEngine.start returned; undefined when there is none
	stopped bool
}

// StartEngine starts a worker. onReply gets each of its texts; onDead is told
// once, in words, when it cannot be started or has stopped by itself.
func StartEngine(onReply func(text string), onDead func(reason string)) *Engine {
	e := &Engine{}
	starter := js.Global().Get("brinefrontEngine")
	if !starter.Truthy() {
		go onDead(errNoEngine.Error())
		return e
	}
	// The two functions are never released: a message may still be on its way
	// when the worker is stopped, and engines are few.
	tell := func(f func(string)) js.Func {
		return js.FuncOf(func(_ js.Value, args []js.Value) any {
			if !e.stopped {
				f(args[0].String())
			}
			return nil
		})
	}
	err := attempt(func() { e.worker = starter.Call("start", tell(onReply), tell(onDead)) })
	if err != nil {
		go onDead(refused("start its engine", err).Error())
	}
	return e
}

// Post sends a text to the worker. Nothing happens when it is dead or stopped.
func (e *Engine) Post(text string) {
	if e.worker.Truthy() && !e.stopped {
		e.worker.Call("post", text)
	}
}

// Stop ends the worker at once, whatever it is doing; it says nothing any more.
func (e *Engine) Stop() {
	if e.worker.Truthy() && !e.stopped {
		e.stopped = true
		e.worker.Call("stop")
	}
}
