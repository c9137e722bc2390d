//go:build !js

package browser

import (
	"slices"
	"sync"
)

// Engine is a worker that a test plays: it keeps what was posted, and replies
// or dies when the test says so.
type Engine struct {
	mu      sync.Mutex
	onReply func(string)
	onDead  func(string)
	posted  []string
	stopped bool
}

// StartEngine starts a worker that the test plays; it is the last of Pretend.Engines.
func StartEngine(onReply func(text string), onDead func(reason string)) *Engine {
	e := &Engine{onReply: onReply, onDead: onDead}
	Pretend.mu.Lock()
	defer Pretend.mu.Unlock()
	Pretend.engines = append(Pretend.engines, e)
	return e
}

// Post keeps a text for Posted.
func (e *Engine) Post(text string) {
	e.mu.Lock()
	defer e.mu.Unlock()
	if !e.stopped {
		e.posted = append(e.posted, text)
	}
}

// Stop silences the worker.
func (e *Engine) Stop() {
	e.mu.Lock()
	defer e.mu.Unlock()
	e.stopped = true
}

// Posted lists the texts posted so far.
func (e *Engine) Posted() []string {
	e.mu.Lock()
	defer e.mu.Unlock()
	return slices.Clone(e.posted)
}

// Stopped reports whether Stop was called.
func (e *Engine) Stopped() bool {
	e.mu.Lock()
	defer e.mu.Unlock()
	return e.stopped
}

// Reply plays an answer of the worker.
func (e *Engine) Reply(text string) {
	if !e.Stopped() {
		e.onReply(text)
	}
}

// Die plays a worker that stopped by itself.
func (e *Engine) Die(reason string) {
	if !e.Stopped() {
		e.onDead(reason)
	}
}
