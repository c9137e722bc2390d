//go:build !js

package browser

import (
	"maps"
	"slices"
	"sync"
)

// Pretend is the browser that a native test meets: it keeps what the program
// asked for, and plays the person.
var Pretend = newBench()

// Bench is a browser in memory.
type Bench struct {
	mu         sync.Mutex
	engines    []*Engine
	store      map[string]string
	storeFault error
	downloads  []File
	chosen     func(name, data string)
	dropped    func(name, data string)
	copied     string
	pasted     func(into, text string) bool
	fragment   string
	moved      func(fragment string)
	prints     int
	idle       func() bool
	announced  []string
	pressed    func(key string) bool
	pictures   map[string]string
}

// File is a file handed to the person.
type File struct{ Name, Mime, Data string }

func newBench() *Bench {
	return &Bench{store: map[string]string{}, pictures: map[string]string{}}
}

// Reset forgets everything: a new visitor in a new browser.
func (b *Bench) Reset() {
	b.mu.Lock()
	defer b.mu.Unlock()
	fresh := newBench()
	b.engines, b.store, b.storeFault, b.downloads = nil, fresh.store, nil, nil
	b.chosen, b.dropped, b.copied, b.pasted = nil, nil, "", nil
	b.fragment, b.moved, b.prints, b.idle = "", nil, 0, nil
	b.announced, b.pressed, b.pictures = nil, nil, fresh.pictures
}

// Engines lists the workers in the order they were started.
func (b *Bench) Engines() []*Engine {
	b.mu.Lock()
	defer b.mu.Unlock()
	return slices.Clone(b.engines)
}

// BreakStore makes storage refuse with a cause, as a private window or a full disk does; nil mends it.
func (b *Bench) BreakStore(cause error) {
	b.mu.Lock()
	defer b.mu.Unlock()
	b.storeFault = cause
}

// Downloads lists the files handed over.
func (b *Bench) Downloads() []File {
	b.mu.Lock()
	defer b.mu.Unlock()
	return slices.Clone(b.downloads)
}

// Choose plays a person who chooses a file in the picker; false when none is open.
func (b *Bench) Choose(name, data string) bool {
	b.mu.Lock()
	chosen := b.chosen
	b.chosen = nil
	b.mu.Unlock()
	if chosen == nil {
		return false
	}
	chosen(name, data)
	return true
}

// Drop plays a person who drops a file on the page; false when nobody listens.
func (b *Bench) Drop(name, data string) bool {
	b.mu.Lock()
	dropped := b.dropped
	b.mu.Unlock()
	if dropped == nil {
		return false
	}
	dropped(name, data)
	return true
}

// Copied is the text on the clipboard.
func (b *Bench) Copied() string {
	b.mu.Lock()
	defer b.mu.Unlock()
	return b.copied
}

// Paste plays a paste into a table and reports whether the program used it.
func (b *Bench) Paste(into, text string) bool {
	b.mu.Lock()
	pasted := b.pasted
	b.mu.Unlock()
	return pasted != nil && severalCells(text) && pasted(into, text)
}

// Go plays a move to another address of the page.
func (b *Bench) Go(fragment string) {
	b.mu.Lock()
	moved, changed := b.moved, fragment != b.fragment
	b.fragment = fragment
	b.mu.Unlock()
	if moved != nil && changed && ours(fragment) {
		moved(fragment)
	}
}

// Press plays a key with Ctrl held and reports whether the program used it.
func (b *Bench) Press(key string, shift bool) bool {
	b.mu.Lock()
	pressed := b.pressed
	b.mu.Unlock()
	asked := shortcut(key, shift)
	return pressed != nil && asked != "" && pressed(asked)
}

// Prints counts the print dialogues opened.
func (b *Bench) Prints() int {
	b.mu.Lock()
	defer b.mu.Unlock()
	return b.prints
}

// Idle asks the program whether anything is pending; true when it never published an answer.
func (b *Bench) Idle() bool {
	b.mu.Lock()
	idle := b.idle
	b.mu.Unlock()
	return idle == nil || idle()
}

// Announced lists the texts for screen readers.
func (b *Bench) Announced() []string {
	b.mu.Lock()
	defer b.mu.Unlock()
	return slices.Clone(b.announced)
}

// Pictures are the pictures on the page, by holder.
func (b *Bench) Pictures() map[string]string {
	b.mu.Lock()
	defer b.mu.Unlock()
	return maps.Clone(b.pictures)
}
