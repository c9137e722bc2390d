package runner

import (
	"errors"
	"strconv"

	"brinefront/app/browser"
	"brinefront/app/state"
	"brinefront/physics/study"
)

// Keys of the browser's storage. What is set aside has a number after its key.
const (
	studyKey  = "brinefront/study"
	formerKey = "brinefront/before" // the study that the one kept took the place of
	asideKey  = "brinefront/aside/"
)

// mostAside is how many damaged autosaves are set aside before no more is kept.
const mostAside = 20

var errFullAside = errors.New("This browser already holds " + strconv.Itoa(mostAside) + " damaged studies that were set aside. Nothing is kept, so that none of them is lost.")

// restore tells what the browser had kept.
func (r *Runner) restore() {
	text, _, err := browser.Load(studyKey)
	if err != nil {
		r.deliver(state.NotKept{Reason: err.Error()})
	}
	r.deliver(state.Restored{Text: text})
	if former, _, err := browser.Load(formerKey); err == nil && former != "" { // a fault is told above
		r.deliver(state.FormerFound{Text: former})
	}
}

// keepFormer keeps the study that another takes the place of; nil: none any more.
func (r *Runner) keepFormer(st *study.Study) {
	text := ""
	if st != nil {
		text = study.Write(*st)
	}
	if err := browser.Save(formerKey, text); err != nil {
		r.deliver(state.Told{Level: "refused", Text: "The study before this one is not kept for the next visit; undo still brings it back. " + err.Error()})
	}
}

// store keeps the study, unless it would overwrite what could not be set aside.
func (r *Runner) store(st study.Study) {
	r.mu.Lock()
	reason := r.unkept
	r.mu.Unlock()
	if reason != "" {
		r.deliver(state.NotKept{Reason: reason})
		return
	}
	if err := browser.Save(studyKey, study.Write(st)); err != nil {
		r.deliver(state.NotKept{Reason: err.Error()})
		return
	}
	r.deliver(state.Kept{})
}

// setAside stores a damaged autosave under a key of its own. Until that is done,
// nothing may be kept in its place.
func (r *Runner) setAside(text string) {
	if err := putAside(text); err != nil {
		r.mu.Lock()
		r.unkept = "a damaged study is kept there and could not be set aside. " + err.Error()
		reason := r.unkept
		r.mu.Unlock()
		r.deliver(state.NotKept{Reason: reason})
	}
}

// putAside stores a text under the first key that is free, once.
func putAside(text string) error {
	for n := range mostAside {
		key := asideKey + strconv.Itoa(n+1)
		kept, taken, err := browser.Load(key)
		switch {
		case err != nil:
			return err
		case taken && kept == text:
			return nil
		case !taken:
			return browser.Save(key, text)
		}
	}
	return errFullAside
}
