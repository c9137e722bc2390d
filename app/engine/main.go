// Command engine is the program of the worker: it answers requests and knows
// nothing of pages. Native, it answers lines of the standard input.
package main

import (
	"brinefront/app/browser/port"
	"brinefront/app/engine/serve"
)

func main() {
	var desk serve.Desk
	port.Listen(func(text string, reply func(string)) {
		desk.Take([]byte(text), func(answer []byte) { reply(string(answer)) })
	}, desk.Work)
}
