package serve

import (
	"brinefront/app/wire"
	"brinefront/physics/study"
)

// kinds are the requests that are answered. A handler sends one reply or more.
var kinds = map[string]func(asked wire.Request, send func(wire.Reply)){
	wire.Run:    run,
	wire.Checks: checks,
	wire.Check:  check,
}

// memory keeps fits from one edit to the next. A worker answers one request at a time.
var memory study.Memory

func run(asked wire.Request, send func(wire.Reply)) {
	if asked.Study == nil {
		panic("a request to run that holds no study")
	}
	result := memory.Run(*asked.Study)
	if !asked.Packed {
		send(wire.Reply{Result: &result})
		return
	}
	rest, numbers := wire.Pack(result)
	send(wire.Reply{Result: &rest, Numbers: &numbers})
}
