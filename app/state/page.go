package state

import (
	"maps"
	"reflect"
	"slices"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

// page is what undo brings back: the study, and all that is typed into its
// forms. A page is never changed once it is shown: a change makes another, which
// shares with it whatever stays the same. That holds for the study too: its
// inputs and its table are replaced, never written to.
type page struct {
	study    study.Study
	drafts   map[string]Draft
	messages map[string]string
	rows     map[string][]Row // of the laboratory tables as typed, by path
	former   *study.Study     // another study that this one took the place of, and that can be brought back; nil: none
	opened   *study.Study     // the study as it was opened: tells whose page this is
}

// fresh is the page of a study that nobody has typed into yet.
func fresh(st study.Study) page {
	return page{study: st, drafts: map[string]Draft{}, messages: map[string]string{}, rows: rowsOf(&st), opened: &st}
}

func (m Model) page() page { return page{m.Study, m.Drafts, m.Messages, m.rows, m.Former, m.opened} }

// amend makes one undo step of a change to the page. Successive changes under
// one key, as the keystrokes in one field, are one step; "" is a key of its own.
func (m Model) amend(key string, change func(*page)) (Model, []Effect) {
	before := m.page()
	after := before
	after.drafts, after.messages = map[string]Draft{}, map[string]string{}
	maps.Copy(after.drafts, before.drafts)
	maps.Copy(after.messages, before.messages)
	change(&after)
	return m.turn(key, after)
}

// turn makes one undo step of a whole other page.
func (m Model) turn(key string, after page) (Model, []Effect) {
	before := m.page()
	if before.same(after) {
		return m, nil
	}
	if m.history.last(key) == nil {
		m = m.settled()
	}
	m.history = m.history.push(key, before)
	return m.show(after)
}

// show puts a page on the screen. A changed study has a new revision, to be
// computed and kept, and is no longer what the address holds.
func (m Model) show(p page) (Model, []Effect) {
	changed := !sameStudy(m.Study, p.study)
	if m.opened != p.opened {
		m.LastGood = nil // the answers to another study are none to this one
	}
	m.Study, m.Drafts, m.Messages, m.rows, m.Former, m.opened = p.study, p.drafts, p.messages, p.rows, p.former, p.opened
	m.System = units.System(m.Study.System)
	m.CanUndo, m.CanRedo = m.history.has()
	if !changed {
		return m, nil
	}
	m.Revision++
	m.Notices = slices.DeleteFunc(slices.Clone(m.Notices), func(n Notice) bool { return n.Level == "done" })
	m, effects := m.compute()
	// A page within another page is for looking at: it leaves the person's own
	// autosave alone.
	if !m.Route.Embed {
		m.Saved.Done = false
		if m.Former != m.formerKept {
			m.formerKept = m.Former
			effects = append(effects, KeepFormer{m.Former})
		}
		effects = append(effects, Keep{m.Study})
	}
	if m.linked {
		m.linked = false
		effects = append(effects, Go{m.Route.fragment()})
	}
	return m, effects
}

// compute asks for the answers to the study.
func (m Model) compute() (Model, []Effect) {
	m.Computing, m.answered = true, nil
	return m, []Effect{m.run()}
}

func (m Model) run() Run { return Run{m.Revision, m.Study, study.Sheet(m.Route.Sheet)} }

func (p page) same(q page) bool {
	return p.former == q.former && maps.Equal(p.drafts, q.drafts) && maps.Equal(p.messages, q.messages) &&
		maps.EqualFunc(p.rows, q.rows, func(a, b []Row) bool {
			return slices.EqualFunc(a, b, func(a, b Row) bool { return a.Text == b.Text })
		}) &&
		sameStudy(p.study, q.study)
}

// sameStudy compares the tables apart from the rest, which is quick, so that a
// keystroke in a table of ten thousand rows is.
func sameStudy(a, b study.Study) bool {
	for _, t := range study.LabTables() {
		columns, source := t.Get(&a)
		others, other := t.Get(&b)
		if source != other || (columns == nil) != (others == nil) || !slices.EqualFunc(columns, others, slices.Equal) {
			return false
		}
		t.Set(&a, nil, "")
		t.Set(&b, nil, "")
	}
	return reflect.DeepEqual(a, b)
}
