package serve

import (
	"brinefront/app/wire"
	"brinefront/physics/evidence"
)

// checks lists the evidence, nothing computed.
func checks(_ *Desk, _ wire.Request, send func(wire.Reply, ...[]byte), _ func()) {
	var list []wire.Evidence
	for _, c := range evidence.All() {
		list = append(list, stated(c))
	}
	send(wire.Reply{Checks: list})
}

// check computes one piece of evidence.
func check(_ *Desk, asked wire.Request, send func(wire.Reply, ...[]byte), _ func()) {
	c, known := evidence.Find(asked.CheckID)
	if !known {
		panic("a request for the unknown check " + asked.CheckID)
	}
	answer := stated(c)
	answer.Done = true
	computed, err := c.Run()
	if err != nil {
		answer.Failure = err.Error()
	}
	for i, value := range computed {
		answer.Items[i].Computed = value
		answer.Items[i].Pass = c.Items[i].Agrees(value)
	}
	send(wire.Reply{Checks: []wire.Evidence{answer}})
}

func stated(c evidence.Check) wire.Evidence {
	answer := wire.Evidence{ID: c.ID, Topic: c.Topic, Title: c.Title, Source: c.Origin(), Provenance: string(c.Provenance), Inputs: c.Inputs, How: c.How}
	for _, item := range c.Items {
		answer.Items = append(answer.Items, wire.Item{Label: item.Label, Published: item.Published, Tolerance: item.Tolerance, Why: item.Why})
	}
	return answer
}
