// Command engine is the program of the worker: it answers requests and knows
// nothing of pages. Native, it answers lines of the standard input.
package main

import (
	"runtime/debug"

	"brinefront/app/browser/port"
	"brinefront/app/engine/serve"
)

func main() {
	// An edit allocates and lets go of a megabyte or two, and the worker's one thread
	// pays for every collection; memory is not what is short here.
	debug.SetGCPercent(400)
	var desk serve.Desk
	port.Listen(func(text string, reply func(string)) {
		desk.Take([]byte(text), func(answer []byte) { reply(string(answer)) })
	}, func(turn func()) {
		desk.Work(turn)
		for desk.Warm(turn) {
			desk.Work(turn)
		}
	})
}
