package state

// steps is how many steps can be undone. A step holds only what it does not share
// with its neighbours, some kilobytes.
const steps = 500

// history is the pages before and after the one shown, nearest last. Its lists are
// never written to, so that models may share them.
type history struct {
	past, future []*page
	key          string // what the last step changed; the next one under this key joins it
}

func (h history) has() (past, future bool) { return len(h.past) > 0, len(h.future) > 0 }

// push remembers the page before a change, unless the change joins the last step.
func (h history) push(key string, before page) history {
	if h.last(key) == nil {
		h.past = with(h.past, before)
	}
	return history{past: h.past, key: key}
}

// last is the page before the step that a change under this key would join; nil
// when it would be a step of its own.
func (h history) last(key string) *page {
	if key == "" || key != h.key || len(h.past) == 0 {
		return nil
	}
	return h.past[len(h.past)-1]
}

// undo shows the page before the one shown.
func (m Model) undo() (Model, []Effect) {
	h := m.history
	n := len(h.past) - 1
	if n < 0 {
		return m, nil
	}
	m = m.settled()
	m.history = history{past: h.past[:n], future: with(h.future, m.page())}
	return m.show(*h.past[n])
}

// redo shows the page that was undone last.
func (m Model) redo() (Model, []Effect) {
	h := m.history
	n := len(h.future) - 1
	if n < 0 {
		return m, nil
	}
	m = m.settled()
	m.history = history{past: with(h.past, m.page()), future: h.future[:n]}
	return m.show(*h.future[n])
}

// with is a list with one page more, and the oldest forgotten where there are too many.
func with(pages []*page, p page) []*page {
	if len(pages) == steps {
		pages = pages[1:]
	}
	longer := make([]*page, 0, len(pages)+1)
	return append(append(longer, pages...), &p)
}
