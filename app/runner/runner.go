// Package runner carries out what state.Update asks for: it has the engine
// compute, keeps the study in the browser's storage, hands files over, and tells
// what came of it, and what the person does outside the forms, as messages.
package runner

import (
	"sync"
	"time"

	"brinefront/app/browser"
	"brinefront/app/state"
	"brinefront/physics/study"
)

// How long effects wait for a newer one of their kind.
const (
	runWait   = 0                      // several messages of one event are one run, posted before they are drawn
	keepWait  = 400 * time.Millisecond // typing is kept now and then, not at every key
	printWait = 100 * time.Millisecond // an answer that has just come is drawn first
)

// Runner carries out effects. It is made by New.
type Runner struct {
	deliver func(state.Msg)
	after   func(time.Duration, func()) // time.AfterFunc, or a test's own clock

	mu     sync.Mutex // never held while a message is delivered or the browser is called
	atWork int        // functions under way that may still deliver

	run, keep, print later
	requests         requests
	unkept           string // why nothing may be kept: what is kept already could not be set aside
}

// New is a runner that tells what happens through deliver, which may be called
// from any goroutine, and from within Do.
func New(deliver func(state.Msg)) *Runner {
	return newWith(deliver, func(wait time.Duration, do func()) { time.AfterFunc(wait, do) })
}

func newWith(deliver func(state.Msg), after func(time.Duration, func())) *Runner {
	return &Runner{
		deliver: deliver, after: after,
		run: later{wait: runWait}, keep: later{wait: keepWait}, print: later{wait: printWait},
		requests: requests{open: map[int]request{}, parts: map[study.Sheet]study.Part{}},
	}
}

// Start listens to the browser, opens what it had kept, and goes to the address.
func (r *Runner) Start() {
	browser.OnFragment(func(fragment string) { r.deliver(state.Routed{Fragment: fragment}) })
	browser.OnDropFile(study.MaxBytes, r.fileCame)
	browser.OnPaste(func(into, text string) bool {
		r.deliver(state.Pasted{Table: into, Text: text})
		return true
	})
	browser.OnShortcut(func(key string) bool {
		msg, ok := shortcuts[key]
		if ok {
			r.deliver(msg)
		}
		return ok
	})
	r.restore()
	r.deliver(state.Routed{Fragment: browser.Fragment()})
}

var shortcuts = map[string]state.Msg{
	browser.KeyUndo: state.Undone{},
	browser.KeyRedo: state.Redone{},
	browser.KeySave: state.SaveAsked{},
	browser.KeyOpen: state.OpenAsked{},
}

// Do carries out effects in their order. Those that wait for a newer one of their
// kind, or for the engine, are under way when it returns.
func (r *Runner) Do(effects []state.Effect) {
	for _, effect := range effects {
		r.do(effect)
	}
}

func (r *Runner) do(effect state.Effect) {
	switch effect := effect.(type) {
	case state.Run:
		r.wish(&r.run, func() { r.evaluate(effect) })
	case state.Keep:
		r.wish(&r.keep, func() { r.store(effect.Study) })
	case state.KeepFormer:
		r.keepFormer(effect.Study)
	case state.SetAside:
		r.setAside(effect.Text)
	case state.Download:
		if err := browser.Download(effect.Name, effect.Mime, effect.Data); err != nil {
			r.deliver(state.Told{Level: "refused", Text: err.Error()})
		}
	case state.PickFile:
		browser.PickFile(".json,application/json", study.MaxBytes, r.fileCame)
	case state.Go:
		browser.SetFragment(effect.Fragment)
	case state.CopyLink:
		browser.Copy(browser.Address()+"#"+effect.Fragment, func(err error) {
			if err != nil {
				r.deliver(state.Told{Level: "refused", Text: err.Error()})
				return
			}
			r.deliver(state.Told{Level: "done", Text: effect.Done})
		})
	case state.Print:
		r.wish(&r.print, r.printQuiet)
	case state.ListEvidence:
		r.listEvidence()
	case state.CheckEvidence:
		r.checkEvidence(effect.ID)
	}
}

// fileCame tells of a file that was picked or dropped.
func (r *Runner) fileCame(name, data string, err error) {
	if err != nil {
		r.deliver(state.FileRefused{Name: name, Reason: err.Error()})
		return
	}
	r.deliver(state.FileChosen{Name: name, Data: data})
}

// printQuiet prints, or waits on while answers are still to come.
func (r *Runner) printQuiet() {
	r.mu.Lock()
	waiting := r.run.wish != nil || r.requests.pending()
	r.mu.Unlock()
	if waiting {
		r.wish(&r.print, r.printQuiet)
		return
	}
	browser.Print()
}

// Idle reports whether nothing is pending: no effect waits, no request is open,
// and no message is being delivered.
func (r *Runner) Idle() bool {
	r.mu.Lock()
	defer r.mu.Unlock()
	return r.atWork == 0 && r.run.wish == nil && r.keep.wish == nil && r.print.wish == nil && !r.requests.pending()
}
