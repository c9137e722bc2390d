package state

import "brinefront/physics/study"

// replaced is the page of a whole other study. The present one becomes the former
// one, unless it is nobody's work: empty, the demonstration, or still in its link.
func (m Model) replaced(st study.Study) page {
	p := fresh(st)
	p.former = m.Former
	if !sameStudy(m.Study, st) && !m.linked && !untouched(m.Study) {
		present := m.Study
		p.former = &present
	}
	return p
}

// untouched reports whether a study is one of the program's own as it came, in
// whichever units.
func untouched(st study.Study) bool {
	for _, own := range []study.Study{study.Empty(), study.Demo(), study.Fractured()} {
		own.System = st.System
		if sameStudy(own, st) {
			return true
		}
	}
	return false
}

// formerFound takes what the browser had kept of an earlier visit.
func (m Model) formerFound(msg FormerFound) Model {
	st, err := study.Read(msg.Text)
	if err != nil {
		return m.notice("refused", "The study before this one, which this browser had kept as well, cannot be opened. "+err.Error())
	}
	m.Former, m.formerKept = &st, &st
	return m
}

// broughtBack opens the former study in one step. The present one becomes the former
// in its turn, unless it is nobody's work.
func (m Model) broughtBack() (Model, []Effect) {
	if _, ok := m.CanBringBack(); !ok {
		return m, nil
	}
	p := m.replaced(*m.Former)
	if p.former == m.Former {
		p.former = nil
	}
	return m.turn("", p)
}

// CanBringBack says whether there is a former study other than the one open, and
// gives its title.
func (m Model) CanBringBack() (title string, ok bool) {
	if m.Former == nil || sameStudy(*m.Former, m.Study) {
		return "", false
	}
	return m.Former.Title, true
}
