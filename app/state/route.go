package state

import (
	"slices"
	"strings"

	"brinefront/physics/study"
)

const firstSheet = "front"

// sheets are those of the study, and two besides.
var sheets = append(study.Sheets(), "report", "evidence")

// readFragment reads an address: "/field", "/front?embed&study=...". A sheet that
// does not exist is the first one; names that mean nothing here are passed over.
func readFragment(fragment string) (route Route, link string) {
	path, query, _ := strings.Cut(strings.TrimPrefix(fragment, "#"), "?")
	route.Sheet = strings.Trim(path, "/")
	if !slices.Contains(sheets, study.Sheet(route.Sheet)) {
		route.Sheet = firstSheet
	}
	for _, item := range strings.Split(query, "&") {
		switch name, value, _ := strings.Cut(item, "="); name {
		case "embed":
			route.Embed = true
		case "study":
			link = value
		}
	}
	return route, link
}

// fragment is the address of a route.
func (r Route) fragment() string {
	if r.Embed {
		return "/" + r.Sheet + "?embed"
	}
	return "/" + r.Sheet
}

// routed goes to an address. A study that it holds is opened in one step, from
// which undo leads back; the autosave is not written until the study is changed.
func (m Model) routed(msg Routed) (Model, []Effect) {
	route, link := readFragment(msg.Fragment)
	elsewhere := m.Route.Sheet != route.Sheet
	m.Route = route
	if link == "" {
		m.linked = false
		if elsewhere {
			return m, m.hurried()
		}
		return m, nil
	}
	st, err := readLink(link)
	if err != nil {
		return m.notice("refused", "The study in this link cannot be opened: "+err.Error()), nil
	}
	before, kept, p := m.Revision, m.formerKept, m.replaced(st)
	m.linked = false
	m, effects := m.turn("", p)
	m.linked, m.formerKept = true, kept
	if m.Revision == before {
		return m, nil
	}
	if !route.Embed {
		m = m.notice("done", "The study of the link is open. Undo brings back your own, which stays kept in this browser until you change something.")
	}
	m.Saved = Saving{}
	return m, unkept(effects)
}

// hurried has the sheet that is looked at answered next, while answers are to come.
func (m Model) hurried() []Effect {
	if sheet := study.Sheet(m.Route.Sheet); slices.Contains(study.Sheets(), sheet) && m.Updating(sheet) {
		return []Effect{m.run()}
	}
	return nil
}

// unkept are the effects without what the browser is to keep.
func unkept(effects []Effect) []Effect {
	return slices.DeleteFunc(effects, func(e Effect) bool {
		switch e.(type) {
		case Keep, KeepFormer:
			return true
		}
		return false
	})
}
