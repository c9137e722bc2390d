package runner

import (
	"encoding/json"
	"maps"
	"slices"

	"brinefront/app/browser"
	"brinefront/app/state"
	"brinefront/app/wire"
)

// requests are what the engine was asked and has not answered.
type requests struct {
	engine *browser.Engine // nil: to be started with the next request
	born   int             // how many engines were started; tells the voice of a dead one
	newest int             // ID of the newest request
	open   map[int]request

	running bool       // an evaluation is under way: it is not interrupted
	next    *state.Run // the newest one asked for meanwhile
}

// request is what is remembered of a request.
type request struct {
	kind     string
	revision int    // of the study, for wire.Run; else 0
	checkID  string // for wire.Check
}

func (q *requests) pending() bool { return len(q.open) > 0 || q.next != nil }

// evaluate has a study computed, at once or after the evaluation under way. Of
// those that wait, only the newest is.
func (r *Runner) evaluate(run state.Run) {
	r.mu.Lock()
	if r.requests.running {
		r.requests.next = &run
		r.mu.Unlock()
		return
	}
	r.requests.running = true
	r.mu.Unlock()
	r.ask(request{kind: wire.Run, revision: run.Revision}, wire.Request{Kind: wire.Run, Study: &run.Study, Packed: true})
}

func (r *Runner) listEvidence() {
	r.ask(request{kind: wire.Checks}, wire.Request{Kind: wire.Checks})
}

func (r *Runner) checkEvidence(id string) {
	r.ask(request{kind: wire.Check, checkID: id}, wire.Request{Kind: wire.Check, CheckID: id})
}

// ask posts a request to the engine, and starts one where none is alive.
func (r *Runner) ask(remembered request, posted wire.Request) {
	r.mu.Lock()
	r.requests.newest++
	posted.ID = r.requests.newest
	r.requests.open[posted.ID] = remembered
	engine := r.requests.engine
	r.mu.Unlock()

	text, err := json.Marshal(posted)
	if err != nil {
		panic("runner: " + err.Error()) // only a NaN, which no study in memory holds
	}
	if engine == nil {
		engine = r.startEngine()
	}
	engine.Post(string(text))
}

func (r *Runner) startEngine() *browser.Engine {
	r.mu.Lock()
	r.requests.born++
	born := r.requests.born
	r.mu.Unlock()
	engine := browser.StartEngine(
		func(text string) { r.replied(born, text) },
		func(reason string) { r.died(born, reason) },
	)
	r.mu.Lock()
	defer r.mu.Unlock()
	if r.requests.born == born { // it has not died while it was started
		r.requests.engine = engine
	}
	return engine
}

// replied takes an answer of the engine.
func (r *Runner) replied(born int, text string) {
	reply, err := wire.Read([]byte(text))
	r.mu.Lock()
	asked, known := r.requests.open[reply.ID]
	if born != r.requests.born || err == nil && !known {
		r.mu.Unlock()
		return
	}
	r.atWork++
	delete(r.requests.open, reply.ID)
	next := r.advance(asked)
	r.mu.Unlock()
	defer r.rest()

	switch {
	case err != nil:
		r.stopEngine(born, "The engine's reply cannot be read: "+err.Error())
	case next != nil:
		r.evaluate(*next) // the answer is to an earlier study: it is dropped
	default:
		r.tell(asked, reply)
	}
}

// advance returns the evaluation that waited for one to end; nil when none did, or
// when something else has ended. The lock is held.
func (r *Runner) advance(ended request) *state.Run {
	if ended.kind != wire.Run {
		return nil
	}
	next := r.requests.next
	r.requests.running, r.requests.next = false, nil
	return next
}

// tell delivers an answer.
func (r *Runner) tell(asked request, reply wire.Reply) {
	switch {
	case asked.kind == wire.Check && reply.Failure != "":
		r.deliver(state.EvidenceDone{Check: wire.Evidence{ID: asked.checkID, Failure: reply.Failure}})
	case reply.Failure != "":
		r.deliver(state.EngineFailed{Revision: asked.revision, Reason: reply.Failure})
	case asked.kind == wire.Run && reply.Result != nil:
		r.deliver(state.Answered{Revision: asked.revision, Result: *reply.Result})
	case asked.kind == wire.Checks:
		r.deliver(state.EvidenceListed{Checks: reply.Checks})
	case asked.kind == wire.Check && len(reply.Checks) == 1:
		r.deliver(state.EvidenceDone{Check: reply.Checks[0]})
	default:
		r.deliver(state.EngineFailed{Revision: asked.revision, Reason: "The engine's reply to a request of kind " + asked.kind + " holds no answer."})
	}
}

// stopEngine ends an engine that cannot be talked to.
func (r *Runner) stopEngine(born int, reason string) {
	r.mu.Lock()
	engine := r.requests.engine
	r.mu.Unlock()
	if engine != nil {
		engine.Stop()
	}
	r.died(born, reason)
}

// died tells that every open request has failed. The next request starts another
// engine; an evaluation that already waits is that.
func (r *Runner) died(born int, reason string) {
	r.mu.Lock()
	if born != r.requests.born {
		r.mu.Unlock()
		return
	}
	r.atWork++
	lost, next := r.requests.open, r.requests.next
	r.requests = requests{born: born + 1, newest: r.requests.newest, open: map[int]request{}}
	r.mu.Unlock()
	defer r.rest()

	for _, id := range slices.Sorted(maps.Keys(lost)) {
		r.deliver(state.EngineFailed{Revision: lost[id].revision, Reason: reason})
	}
	if next != nil {
		r.evaluate(*next)
	}
}
