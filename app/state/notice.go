package state

import "slices"

// notices is how many notices stand on the screen at a time.
const notices = 4

// notice tells the person something. Said again, it stands once.
func (m Model) notice(level, text string) Model {
	m.noticed++
	list := slices.DeleteFunc(slices.Clone(m.Notices), func(n Notice) bool { return n.Text == text })
	list = append(list, Notice{ID: m.noticed, Level: level, Text: text})
	m.Notices = list[max(0, len(list)-notices):]
	return m
}

func (m Model) dismissed(msg Dismissed) Model {
	m.Notices = slices.DeleteFunc(slices.Clone(m.Notices), func(n Notice) bool { return n.ID == msg.Notice })
	return m
}
