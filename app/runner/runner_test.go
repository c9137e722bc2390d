//go:build !js

package runner

import (
	"encoding/json"
	"slices"
	"strings"
	"testing"
	"time"

	"brinefront/app/browser"
	"brinefront/app/state"
	"brinefront/app/wire"
	"brinefront/physics/study"
)

// bench is the interface without a screen: a model, a runner, a browser that the
// test plays, and a clock that the test moves on.
type bench struct {
	t      *testing.T
	model  state.Model
	runner *Runner
	came   []state.Msg // all that the runner has delivered

	now    time.Duration
	timers []timer
}

type timer struct {
	due time.Duration
	do  func()
}

func newBench(t *testing.T) *bench {
	browser.Pretend.Reset()
	t.Cleanup(browser.Pretend.Reset)
	b := &bench{t: t}
	b.open()
	return b
}

// open opens the page in the browser as it stands: nothing but what that kept is left
// of an earlier visit.
func (b *bench) open() {
	b.model, b.timers = state.New(), nil
	b.runner = newWith(b.send, func(wait time.Duration, do func()) {
		b.timers = append(b.timers, timer{b.now + wait, do})
	})
}

// started is a bench of which the first study is computed.
func started(t *testing.T) *bench {
	b := newBench(t)
	b.runner.Start()
	b.wait(time.Second)
	b.reply()
	if !b.runner.Idle() {
		t.Fatal("something is pending after the first answer")
	}
	b.came = nil
	return b
}

func (b *bench) send(msg state.Msg) {
	b.came = append(b.came, msg)
	b.act(msg)
}

// act is what the person does.
func (b *bench) act(msg state.Msg) {
	var effects []state.Effect
	b.model, effects = state.Update(b.model, msg)
	b.runner.Do(effects)
}

// wait moves the clock on and has everything done that is due.
func (b *bench) wait(d time.Duration) {
	end := b.now + d
	for {
		slices.SortStableFunc(b.timers, func(x, y timer) int { return int(x.due - y.due) })
		if len(b.timers) == 0 || b.timers[0].due > end {
			break
		}
		first := b.timers[0]
		b.timers = b.timers[1:]
		b.now = first.due
		first.do()
	}
	b.now = end
}

// engine is the newest one.
func (b *bench) engine() *browser.Engine {
	b.t.Helper()
	all := browser.Pretend.Engines()
	if len(all) == 0 {
		b.t.Fatal("no engine was started")
	}
	return all[len(all)-1]
}

// asked lists what the newest engine was asked.
func (b *bench) asked() []wire.Request {
	b.t.Helper()
	var list []wire.Request
	for _, text := range b.engine().Posted() {
		var request wire.Request
		if err := json.Unmarshal([]byte(text), &request); err != nil {
			b.t.Fatal(err)
		}
		list = append(list, request)
	}
	return list
}

func (b *bench) last() wire.Request {
	b.t.Helper()
	list := b.asked()
	if len(list) == 0 {
		b.t.Fatal("the engine was asked nothing")
	}
	return list[len(list)-1]
}

// reply answers the newest request as the engine would.
func (b *bench) reply() {
	b.t.Helper()
	asked := b.last()
	answer := wire.Reply{ID: asked.ID, Kind: asked.Kind}
	if asked.Kind == wire.Pieces {
		answer.Pieces = whole(*asked.Study)
	}
	b.answer(answer)
}

// whole are the pieces of a study, all of them.
func whole(st study.Study) []wire.Piece {
	var pieces []wire.Piece
	for sheet, part := range study.Run(st).Parts {
		rest, numbers := wire.Pack(part)
		pieces = append(pieces, wire.Piece{Sheet: sheet, Part: &rest, Numbers: numbers})
	}
	return pieces
}

func (b *bench) answer(reply wire.Reply) {
	b.t.Helper()
	text, err := json.Marshal(reply)
	if err != nil {
		b.t.Fatal(err)
	}
	b.engine().Reply(string(text))
}

// kept is what the browser holds under a key; "" for nothing.
func kept(t *testing.T, key string) string {
	t.Helper()
	text, _, err := browser.Load(key)
	if err != nil {
		t.Fatal(err)
	}
	return text
}

func title(text string) state.Written { return state.Written{Path: "title", Text: text} }

// count counts what has come of one type.
func count[M state.Msg](b *bench) int {
	n := 0
	for _, msg := range b.came {
		if _, ok := msg.(M); ok {
			n++
		}
	}
	return n
}

func TestStart(t *testing.T) {
	b := newBench(t)
	st := study.Empty()
	st.Title = "Kept"
	if err := browser.Save(studyKey, study.Write(st)); err != nil {
		t.Fatal(err)
	}
	browser.SetFragment("/field")
	b.runner.Start()
	if b.model.Study.Title != "Kept" || b.model.Route.Sheet != "field" {
		t.Errorf("after start: %q on %q", b.model.Study.Title, b.model.Route.Sheet)
	}
	if b.runner.Idle() {
		t.Error("idle before the first answer")
	}
	b.wait(time.Second)
	if b.runner.Idle() {
		t.Error("idle while the engine computes")
	}
	b.reply()
	if !b.runner.Idle() || b.model.Computing || b.model.ResultRevision != b.model.Revision {
		t.Error("the first answer did not arrive")
	}
}

func TestWhatThePersonDoes(t *testing.T) {
	b := started(t)
	browser.Pretend.Go("/rock")
	if b.model.Route.Sheet != "rock" {
		t.Error("a move to another address goes nowhere")
	}
	if !browser.Pretend.Paste("rock.table", "sw\tkrw\tkro\n0.2\t0\t1\n0.5\t0.1\t0.3\n0.7\t0.3\t0\n") || b.model.Paste == nil {
		t.Error("a paste is not used")
	}
	b.act(title("One"))
	if !browser.Pretend.Press("z", false) || b.model.Study.Title == "One" {
		t.Error("the keys for undo do nothing")
	}
	if !browser.Pretend.Press("y", false) || b.model.Study.Title != "One" {
		t.Error("the keys for redo do nothing")
	}
	if !browser.Pretend.Press("s", false) || len(browser.Pretend.Downloads()) != 1 {
		t.Error("the keys for saving do nothing")
	}
	file := browser.Pretend.Downloads()[0]
	b.act(state.StartedEmpty{})
	if !browser.Pretend.Press("o", false) || !browser.Pretend.Choose(file.Name, file.Data) || b.model.Study.Title != "One" {
		t.Error("the saved file does not open")
	}
	b.act(state.StartedEmpty{})
	if !browser.Pretend.Drop(file.Name, file.Data) || b.model.Study.Title != "One" {
		t.Error("a dropped file does not open")
	}
	browser.Pretend.Drop("big.json", strings.Repeat("x", study.MaxBytes+1))
	if count[state.FileRefused](b) != 1 || b.model.Study.Title != "One" {
		t.Error("a file that is too large is not refused")
	}
}

func TestShare(t *testing.T) {
	b := started(t)
	b.act(state.ShareAsked{})
	address, fragment, _ := strings.Cut(browser.Pretend.Copied(), "#")
	if address != browser.Address() || !strings.HasPrefix(fragment, "/front?study=") || count[state.Told](b) != 1 {
		t.Errorf("copied is %.60q", browser.Pretend.Copied())
	}
}

func TestPrintsTheNewestAnswer(t *testing.T) {
	b := started(t)
	b.act(title("One"))
	b.act(state.PrintAsked{})
	b.wait(time.Second)
	if browser.Pretend.Prints() != 0 || b.runner.Idle() {
		t.Fatal("printed before the answer came, or forgotten")
	}
	b.reply()
	b.wait(time.Second)
	if browser.Pretend.Prints() != 1 || !b.runner.Idle() {
		t.Errorf("printed %d times", browser.Pretend.Prints())
	}
}

func TestAddressFollows(t *testing.T) {
	b := started(t)
	b.runner.Do([]state.Effect{state.Go{Fragment: "/rock"}})
	if browser.Fragment() != "/rock" {
		t.Errorf("the address is at %q", browser.Fragment())
	}
}

// New's own clock, and messages from other goroutines.
func TestRealClock(t *testing.T) {
	browser.Pretend.Reset()
	t.Cleanup(browser.Pretend.Reset)
	came := make(chan state.Msg, 1)
	r := New(func(msg state.Msg) { came <- msg })
	r.Do([]state.Effect{state.Keep{Study: study.Empty()}})
	if msg := <-came; msg != (state.Kept{}) {
		t.Errorf("came %v, want the study kept", msg)
	}
}
