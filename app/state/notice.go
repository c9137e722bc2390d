package state

import "slices"

// notices is how many notices of a level stand on the screen at a time. Those that
// tell what was done leave with the next change of the study, the others stay until
// they are dismissed.
const notices = 3

// notice tells the person something. Said again, it stands once.
func (m Model) notice(level, text string) Model {
	m.noticed++
	list := slices.DeleteFunc(slices.Clone(m.Notices), func(n Notice) bool { return n.Text == text })
	list = append(list, Notice{ID: m.noticed, Level: level, Text: text})
	same := func(n Notice) bool { return n.Level == level }
	if among := slices.DeleteFunc(slices.Clone(list), func(n Notice) bool { return !same(n) }); len(among) > notices {
		list = slices.Delete(list, slices.IndexFunc(list, same), slices.IndexFunc(list, same)+1)
	}
	m.Notices = list
	return m
}

func (m Model) dismissed(msg Dismissed) Model {
	m.Notices = slices.DeleteFunc(slices.Clone(m.Notices), func(n Notice) bool { return n.ID == msg.Notice })
	return m
}
