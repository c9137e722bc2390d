// Package serve answers the requests of app/wire. It is the engine's door: the
// one place of this program that recovers from a panic.
package serve

import (
	"encoding/json"
	"fmt"
	"runtime/debug"
	"slices"
	"sync"

	"brinefront/app/wire"
	"brinefront/physics/study"
)

// Desk answers requests one after another, in the order they come. What it computes
// in pieces it lays aside for a newer request of that kind. The zero value is ready.
type Desk struct {
	mu    sync.Mutex
	queue []order // not begun yet

	memory     study.Memory           // of fits, from one edit to the next
	evaluation *study.Evaluation      // of the last request for pieces
	sent       map[study.Sheet][]byte // the pieces as they last travelled
	warmed     int                    // rounds of Warm
}

// order is a request that waits, and where its replies go.
type order struct {
	asked request
	fault error // why it cannot be read
	reply func([]byte)
}

// request is one whose study is not read until its turn comes: many never have one.
type request struct {
	wire.Request
	Study json.RawMessage `json:"study"`
}

// Take puts a request, a JSON text as app/wire has it, in the queue. Of the requests
// for pieces that wait there, only the newest is ever begun.
func (d *Desk) Take(text []byte, reply func([]byte)) {
	o := order{reply: reply}
	o.fault = json.Unmarshal(text, &o.asked)
	d.mu.Lock()
	defer d.mu.Unlock()
	if o.asked.Kind == wire.Pieces {
		d.queue = slices.DeleteFunc(d.queue, func(old order) bool {
			if old.asked.Kind == wire.Pieces && o.asked.Study == nil {
				o.asked.Study = old.asked.Study // which this one goes on with
			}
			return old.asked.Kind == wire.Pieces
		})
	}
	d.queue = append(d.queue, o)
}

// Work answers all that is asked. In between it calls turn, which lets further
// requests come in.
func (d *Desk) Work(turn func()) {
	for {
		d.mu.Lock()
		if len(d.queue) == 0 {
			d.mu.Unlock()
			return
		}
		o := d.queue[0]
		d.queue = d.queue[1:]
		d.mu.Unlock()
		d.serve(o, turn)
	}
}

// waiting counts the requests that have come and are not begun.
func (d *Desk) waiting() int {
	d.mu.Lock()
	defer d.mu.Unlock()
	return len(d.queue)
}

// superseded reports whether another request for pieces has come.
func (d *Desk) superseded() bool {
	d.mu.Lock()
	defer d.mu.Unlock()
	return slices.ContainsFunc(d.queue, func(o order) bool { return o.asked.Kind == wire.Pieces })
}

// serve answers a request. Whatever happens, there is at least one reply: what goes
// wrong in here is the program's own mistake and is answered as a Failure that says
// what to send us.
func (d *Desk) serve(o order, turn func()) {
	answered := false
	send := func(answer wire.Reply, pieces ...[]byte) {
		answer.ID, answer.Kind = o.asked.ID, o.asked.Kind
		text, err := json.Marshal(answer)
		if err != nil {
			panic(err) // a result that holds what JSON cannot say, as NaN
		}
		answered = true
		o.reply(with(text, pieces))
	}
	defer func() {
		cause := recover()
		if cause == nil && answered {
			return
		}
		if cause == nil {
			cause = fmt.Sprintf("a request of kind %q was not answered", o.asked.Kind)
		}
		d.evaluation = nil
		send(wire.Reply{Failure: bug(cause)})
	}()

	if o.fault != nil {
		panic(fmt.Errorf("a request that cannot be read: %w", o.fault))
	}
	if o.asked.Study != nil {
		if err := json.Unmarshal(o.asked.Study, &o.asked.Request.Study); err != nil {
			panic(fmt.Errorf("a request whose study cannot be read: %w", err))
		}
	}
	kind, known := kinds[o.asked.Kind]
	if !known {
		panic(fmt.Sprintf("a request of the unknown kind %q", o.asked.Kind))
	}
	kind(d, o.asked.Request, send, turn)
}

// with is a reply with pieces that are written already.
func with(reply []byte, pieces [][]byte) []byte {
	if len(pieces) == 0 {
		return reply
	}
	size := len(reply) + 16
	for _, piece := range pieces {
		size += len(piece) + 1
	}
	text := append(make([]byte, 0, size), `{"pieces":[`...)
	for i, piece := range pieces {
		if i > 0 {
			text = append(text, ',')
		}
		text = append(text, piece...)
	}
	text = append(text, "],"...)
	return append(text, reply[1:]...) // after its brace
}

// bug is a failure in words.
func bug(cause any) string {
	return fmt.Sprintf("This is a bug of the program: %v. Please send us this text with the study (Save writes it).\n%s", cause, debug.Stack())
}
