package runner

import (
	"encoding/json"
	"errors"
	"maps"
	"slices"

	"brinefront/app/browser"
	"brinefront/app/state"
	"brinefront/app/wire"
	"brinefront/physics/study"
)

// requests are what the engine was asked and has not answered.
type requests struct {
	engine *browser.Engine // nil: to be started with the next request
	born   int             // how many engines were started; tells the voice of a dead one
	newest int             // ID of the newest request
	open   map[int]request

	revision int                        // of the study that the engine has; 0: none
	parts    map[study.Sheet]study.Part // as the engine last sent them

	// unheard is the evaluation asked for while an earlier one was under way, until
	// there is a reply to it: what stops the engine meanwhile is not its fault.
	unheard *state.Run
}

// request is what is remembered of a request.
type request struct {
	kind     string
	revision int    // of the study, for wire.Pieces; else 0
	checkID  string // for wire.Check
}

func (q *requests) pending() bool { return len(q.open) > 0 }

// evaluate has a study computed. The engine leaves one that is under way; a study that
// it has already it goes on with.
func (r *Runner) evaluate(run state.Run) {
	posted := wire.Request{Kind: wire.Pieces, First: run.First}
	r.mu.Lock()
	if q := &r.requests; q.revision != run.Revision {
		posted.Study, q.revision, q.unheard = &run.Study, run.Revision, nil
		if q.forget(wire.Pieces) {
			q.unheard = &run
		}
	}
	r.mu.Unlock()
	r.ask(request{kind: wire.Pieces, revision: run.Revision}, posted)
}

// forget drops what is open of a kind, and reports whether something was.
func (q *requests) forget(kind string) bool {
	before := len(q.open)
	maps.DeleteFunc(q.open, func(_ int, r request) bool { return r.kind == kind })
	return len(q.open) < before
}

// filled puts the parts that did not change where the engine left them out.
func (q *requests) filled(pieces []wire.Piece) (map[study.Sheet]study.Part, error) {
	parts := map[study.Sheet]study.Part{}
	for _, piece := range pieces {
		if piece.Part != nil {
			q.parts[piece.Sheet] = *piece.Part
		}
		part, known := q.parts[piece.Sheet]
		if !known {
			return nil, errors.New("it leaves out a part that it never sent")
		}
		parts[piece.Sheet] = part
	}
	return parts, nil
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
	q := &r.requests
	if born != q.born {
		r.mu.Unlock()
		return
	}
	var parts map[study.Sheet]study.Part
	if err == nil {
		parts, err = q.filled(reply.Pieces) // of an earlier study too: the engine counts on them
	}
	asked, known := q.open[reply.ID]
	if err == nil && !known {
		r.mu.Unlock()
		return
	}
	r.atWork++
	if err == nil {
		q.heard(reply, asked)
	}
	r.mu.Unlock()
	defer r.rest()

	if err != nil {
		r.stopEngine(born, "The engine's reply cannot be read: "+err.Error())
		return
	}
	r.tell(asked, reply, parts)
}

// heard notes that a request is answered, in part or to the end. Requests for pieces
// of one study end together, and a failure makes the engine let go of the study.
func (q *requests) heard(reply wire.Reply, asked request) {
	if asked.kind == wire.Pieces {
		q.unheard = nil
	}
	if reply.Failure != "" {
		q.revision = 0
	}
	switch {
	case reply.More:
	case asked.kind == wire.Pieces:
		q.forget(wire.Pieces)
	default:
		delete(q.open, reply.ID)
	}
}

// tell delivers an answer.
func (r *Runner) tell(asked request, reply wire.Reply, parts map[study.Sheet]study.Part) {
	switch {
	case asked.kind == wire.Check && reply.Failure != "":
		r.deliver(state.EvidenceDone{Check: wire.Evidence{ID: asked.checkID, Failure: reply.Failure}})
	case reply.Failure != "":
		r.deliver(state.EngineFailed{Revision: asked.revision, Reason: reply.Failure})
	case asked.kind == wire.Pieces && reply.Kind == wire.Pieces:
		r.deliver(state.Answered{Revision: asked.revision, Parts: parts, More: reply.More})
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
// engine; an evaluation that was waiting is that.
func (r *Runner) died(born int, reason string) {
	r.mu.Lock()
	if born != r.requests.born {
		r.mu.Unlock()
		return
	}
	r.atWork++
	next := r.requests.unheard
	if next != nil {
		r.requests.forget(wire.Pieces)
	}
	lost := r.requests.open
	r.requests = requests{born: born + 1, newest: r.requests.newest, open: map[int]request{}, parts: map[study.Sheet]study.Part{}}
	r.mu.Unlock()
	defer r.rest()

	for _, id := range slices.Sorted(maps.Keys(lost)) {
		r.deliver(state.EngineFailed{Revision: lost[id].revision, Reason: reason})
	}
	if next != nil {
		r.evaluate(*next)
	}
}
