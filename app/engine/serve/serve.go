// Package serve answers the requests of app/wire. It is the engine's door: the
// one place of this program that recovers from a panic.
package serve

import (
	"encoding/json"
	"fmt"
	"runtime/debug"

	"brinefront/app/wire"
)

// Serve answers one request, a JSON text as app/wire has it. Whatever happens,
// reply is called at least once: what goes wrong in here is the program's own
// mistake and is answered as a Failure that says what to send us.
func Serve(request []byte, reply func([]byte)) {
	var asked wire.Request
	answered := false
	send := func(answer wire.Reply) {
		answer.ID, answer.Kind = asked.ID, asked.Kind
		text, err := json.Marshal(answer)
		if err != nil {
			panic(err) // a result that holds what JSON cannot say, as NaN
		}
		answered = true
		reply(text)
	}
	defer func() {
		cause := recover()
		if cause == nil && answered {
			return
		}
		if cause == nil {
			cause = fmt.Sprintf("a request of kind %q was not answered", asked.Kind)
		}
		send(wire.Reply{Failure: bug(cause)})
	}()

	if err := json.Unmarshal(request, &asked); err != nil {
		panic(fmt.Errorf("a request that cannot be read: %w", err))
	}
	kind, known := kinds[asked.Kind]
	if !known {
		panic(fmt.Sprintf("a request of the unknown kind %q", asked.Kind))
	}
	kind(asked, send)
}

// bug is a failure in words.
func bug(cause any) string {
	return fmt.Sprintf("This is a bug of the program: %v. Please send us this text with the study (Save writes it).\n%s", cause, debug.Stack())
}
