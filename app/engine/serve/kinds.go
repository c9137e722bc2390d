package serve

import "brinefront/app/wire"

// handler answers a request with one reply or more; pieces are written already. turn
// lets further requests come in.
type handler func(d *Desk, asked wire.Request, send func(answer wire.Reply, pieces ...[]byte), turn func())

// kinds are the requests that are answered.
var kinds = map[string]handler{
	wire.Run:    run,
	wire.Pieces: pieces,
	wire.Checks: checks,
	wire.Check:  check,
}

func run(d *Desk, asked wire.Request, send func(wire.Reply, ...[]byte), _ func()) {
	if asked.Study == nil {
		panic("a request to run that holds no study")
	}
	result := d.memory.Run(*asked.Study)
	send(wire.Reply{Result: &result})
}
