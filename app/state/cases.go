package state

import (
	"fmt"
	"slices"
	"strconv"
	"strings"

	"brinefront/physics/study"
)

// caseName is the path, within a case, of its name.
const caseName = "name"

// caseAdded adds a case that changes nothing yet, under the next free number when
// it is given no name.
func (m Model) caseAdded(msg CaseAdded) (Model, []Effect) {
	n := len(m.Study.Cases)
	if n >= study.MaxCases {
		return m.notice("refused", fmt.Sprintf("There are %d cases, as many as can be told apart in a picture. Remove one first.", n)), nil
	}
	name := strings.TrimSpace(clean(msg.Name))
	for next := n + 1; name == ""; next++ {
		if numbered := "Case " + strconv.Itoa(next); study.CheckCaseName(&m.Study, n, numbered) == nil {
			name = numbered
		}
	}
	if problem := study.CheckCaseName(&m.Study, n, name); problem != nil {
		return m.notice("refused", "No case was added. "+says(problem)), nil
	}
	return m.amend("", func(p *page) { p.study.Cases = append(slices.Clone(p.study.Cases), study.Case{Name: name}) })
}

// caseRemoved takes a case away, with what is typed into its form; those after it
// move up.
func (m Model) caseRemoved(msg CaseRemoved) (Model, []Effect) {
	if !m.hasCase(msg.Index) {
		return m, nil
	}
	return m.amend("", func(p *page) {
		p.study.Cases = slices.Delete(slices.Clone(p.study.Cases), msg.Index, msg.Index+1)
		if len(p.study.Cases) == 0 {
			p.study.Cases = nil
		}
		p.drafts, p.messages = without(p.drafts, msg.Index), without(p.messages, msg.Index)
	})
}

// without moves what is kept by path as the cases after a removed one move.
func without[V any](kept map[string]V, removed int) map[string]V {
	moved := map[string]V{}
	for path, v := range kept {
		switch i, inner, ok := study.AtCase(path); {
		case !ok || i < removed:
			moved[path] = v
		case i > removed:
			moved[study.CasePath(i-1, inner)] = v
		}
	}
	return moved
}

// has reports whether a path is none of a case, or of one that is there.
func (m Model) has(path string) bool {
	i, _, ok := study.AtCase(path)
	return !ok || m.hasCase(i)
}

func (m Model) hasCase(i int) bool { return i >= 0 && i < len(m.Study.Cases) }

// caseNamed takes the name of a case; one that it cannot have is kept as typed,
// and the last good one stays.
func (m Model) caseNamed(msg CaseNamed) (Model, []Effect) {
	if !m.hasCase(msg.Index) {
		return m, nil
	}
	path := study.CasePath(msg.Index, caseName)
	return m.amend(path, func(p *page) {
		text := clean(msg.Text)
		delete(p.drafts, path)
		delete(p.messages, path)
		name := strings.TrimSpace(text)
		if problem := study.CheckCaseName(&p.study, msg.Index, name); problem != nil {
			p.refuse(path, Draft{Text: text}, problem, " In use: "+p.study.Cases[msg.Index].Name+".")
			return
		}
		p.keep(path, Draft{Text: text}, name)
		p.study.Cases = slices.Clone(p.study.Cases)
		p.study.Cases[msg.Index].Name = name
	})
}

// caseInputSet takes a text for an input of a case, as edited does for one of the
// study: it is the same input under the case's own path.
func (m Model) caseInputSet(msg CaseInputSet) (Model, []Effect) {
	return m.edited(Edited{Path: study.CasePath(msg.Index, msg.Path), Text: msg.Text, Unit: msg.Unit})
}

// caseChosen takes a choice that a case makes otherwise than the base; one that
// it cannot make changes nothing.
func (m Model) caseChosen(msg CaseChosen) (Model, []Effect) {
	if msg.Value == "" {
		return m, nil
	}
	return m.amend("", func(p *page) { study.ChooseInCase(&p.study, msg.Index, msg.Path, msg.Value) })
}

// caseInputRemoved leaves an input or a choice to the base again, and takes its
// field off the form.
func (m Model) caseInputRemoved(msg CaseInputRemoved) (Model, []Effect) {
	path := study.CasePath(msg.Index, msg.Path)
	return m.amend("", func(p *page) {
		if spec, ok := study.Find(path); ok {
			spec.Set(&p.study, nil)
			p.forgetRange(path)
			for _, kept := range []string{path, path + ".source"} {
				delete(p.drafts, kept)
				delete(p.messages, kept)
			}
			return
		}
		study.ChooseInCase(&p.study, msg.Index, msg.Path, "")
	})
}

// CaseInputs lists the paths of the fields that the form of a case shows: what
// the case changes, and what is being typed for it, in the order of the forms.
func (m Model) CaseInputs(i int) []string {
	c := m.Study.Cases[i]
	var paths []string
	for _, path := range study.CaseChoices() {
		if _, ok := c.Choose[path]; ok {
			paths = append(paths, path)
		}
	}
	for _, spec := range study.Specs() {
		_, set := c.Set[spec.Path]
		_, typed := m.Drafts[study.CasePath(i, spec.Path)]
		if set || typed {
			paths = append(paths, spec.Path)
		}
	}
	return paths
}
