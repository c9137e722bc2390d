package state

import (
	"strconv"
	"strings"
	"unicode"

	"brinefront/physics/study"
)

// fileChosen opens a study file in one step, or says why not and changes nothing.
func (m Model) fileChosen(msg FileChosen) (Model, []Effect) {
	st, err := study.Read(msg.Data)
	if err != nil {
		return m.notice("refused", strconv.Quote(msg.Name)+": "+err.Error()), nil
	}
	m, effects := m.turn("", m.replaced(st))
	return m.notice("done", strconv.Quote(msg.Name)+" is open. Undo brings back the study before."), effects
}

// started opens a study of the program's own, in the units that are in use.
func (m Model) started(st study.Study, said string) (Model, []Effect) {
	st.System = m.Study.System
	before := m.Revision
	m, effects := m.turn("", m.replaced(st))
	if m.Revision != before {
		m = m.notice("done", said)
	}
	return m, effects
}

// saved hands the study over as a file. What is typed and cannot be used is not
// in it, and that is said.
func (m Model) saved() (Model, []Effect) {
	if len(m.Messages) > 0 {
		m = m.notice("done", "The file holds the last good values. Some fields hold text that cannot be used; it is not in the file.")
	}
	return m, []Effect{Download{Name: m.filename(".json"), Mime: "application/json", Data: study.Write(m.Study)}}
}

// filename is a name after the study's title that every file system takes.
func (m Model) filename(ending string) string {
	const longest = 60
	words := strings.FieldsFunc(strings.ToLower(m.Study.Title), func(r rune) bool { return !unicode.IsLetter(r) && !unicode.IsDigit(r) })
	name := []rune(strings.Join(words, "-"))
	if len(name) == 0 {
		name = []rune("study")
	}
	return strings.TrimRight(string(name[:min(len(name), longest)]), "-") + ending
}

// restored opens what the browser had kept; it is where the person left off, so
// there is nothing to undo. What cannot be read is set aside unchanged and stays
// at hand for download.
func (m Model) restored(msg Restored) (Model, []Effect) {
	if msg.Text == "" {
		return m.compute()
	}
	st, err := study.Read(msg.Text)
	if err != nil {
		m.Damaged = msg.Text
		m = m.notice("refused", "What this browser had kept cannot be opened. It is set aside unchanged, and can be downloaded. "+err.Error())
		m, effects := m.compute()
		return m, append([]Effect{SetAside{msg.Text}}, effects...)
	}
	before := m.Revision
	p := fresh(st)
	p.former = m.Former
	m, effects := m.show(p)
	m.Saved = Saving{Done: true}
	if m.Revision == before {
		return m.compute()
	}
	return m, unkept(effects)
}
