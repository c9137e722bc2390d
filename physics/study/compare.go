package study

import (
	"slices"
	"strconv"
	"strings"
)

// compared are the sheets whose answers are set side by side.
var compared = []Sheet{SheetRock, SheetFront, SheetField}

// outcome is the base, or one case, with what became of it.
type outcome struct {
	*Evaluation
	id      string // "base", "case1", ...
	name    string
	index   int      // of the case; -1 for the base
	changed []string // the paths that the case changes
}

// runCompare sets the cases of a study beside it. Every case is a study of its
// own that goes through the same sheets as the base; only a rock that no change
// touches is not computed twice. A case that cannot answer says why, and the
// others are shown.
func runCompare(base *Evaluation) Part {
	s := newSheet(base.st)
	front := base.parts[SheetFront]
	s.await(front)
	if base.front == nil {
		return s.close(front.Status)
	}
	all := []outcome{{Evaluation: base, id: "base", name: BaseCase, index: -1}}
	for i, c := range base.st.Cases {
		o := outcome{id: "case" + strconv.Itoa(i+1), name: standIn(i), index: i, changed: c.Changes()}
		o.Evaluation = base.with(c)
		s.cautions(o, base)
		if o.front != nil {
			all = append(all, o)
		}
	}
	if slices.ContainsFunc(all, outcome.rides) {
		s.note(Note{ID: "compare.ride", Level: "remark", Text: "Arrival, recovery and its curve count what rides along; all that is told in time is of water alone.",
			Cause: "What rides along is answered on the Front sheet, in pore volumes.", Do: "Read the arrival of its front and bank there.", Paths: []string{"front.rider.kind"}})
	}
	compareFigures(s, all)
	compareCharts(s, all)
	compareTables(s, all)
	compareAnswer(s, all)
	return s.close(front.Status)
}

// standIn stands for the name of a case until all else is told in the words of the
// pair: "More viscous oil" is the person's, and stays so where gas is displaced.
func standIn(i int) string { return string(rune('\uE000' + i)) } // of the code points that mean nothing

// caseNames are the words that put the names in.
func caseNames(cases []Case) *words {
	w := &words{list: map[string]string{}}
	for i, c := range cases {
		w.list[standIn(i)] = c.Name
	}
	w.compile()
	return w
}

// with evaluates a case of the study that was evaluated.
func (e *Evaluation) with(c Case) *Evaluation {
	of := e.changed(c, nil)
	for _, sheet := range compared {
		of.through(sheet)
	}
	return of
}

// changed begins the evaluation of a case of the study that was evaluated; a rock that no
// change touches is not computed again.
func (e *Evaluation) changed(c Case, m *Memory) *Evaluation {
	of := m.Begin(c.On(*e.st))
	if !slices.ContainsFunc(c.Changes(), func(path string) bool { return strings.HasPrefix(path, "rock.") }) {
		of.parts[SheetRock], of.rock = e.parts[SheetRock], e.rock
	}
	return of
}

// cautions says why a case has no answer, or what it brings up that the base
// does not.
func (s *sheet) cautions(o outcome, base *Evaluation) {
	id, says := "compare."+o.id+".", "“"+o.name+"”: "
	if len(o.changed) == 0 {
		s.note(Note{ID: id + "unchanged", Level: "remark", Text: says + "nothing is changed yet, so it is the base case once more.", Do: "Change an input of the case.", Paths: []string{CasePath(o.index, "name")}})
	}
	if o.front == nil {
		s.note(o.unanswered(id, says))
		return
	}
	if base.parts[SheetField].ends() && !o.parts[SheetField].ends() {
		why := o.unanswered(id, says)
		why.ID, why.Text = id+"noField", says+"no forecast to set beside that of the base. "+strings.TrimPrefix(why.Text, says)
		s.note(why)
	}
	known := func(n Note) bool {
		return slices.ContainsFunc(compared, func(sheet Sheet) bool {
			return slices.ContainsFunc(base.parts[sheet].Notes, func(m Note) bool { return m.ID == n.ID })
		})
	}
	for _, sheet := range compared {
		for _, n := range o.parts[sheet].Notes {
			if n.Level == "caution" && !known(n) {
				n.ID, n.Text, n.Paths = id+n.ID, says+n.Text, o.places(n.Paths)
				s.note(n)
			}
		}
	}
}

// ends reports whether a forecast could be made.
func (p Part) ends() bool { return p.Status == Ready || p.Status == Stopped && len(p.Figures) > 0 }

// unanswered is a note of what keeps a case from answering.
func (o outcome) unanswered(id, says string) Note {
	n := Note{ID: id + "unanswered", Level: "caution", Cause: "Its changes do not go together with the rest of the study.", Do: "Change the case, or what it shares with the study."}
	var reasons, paths []string
	for _, p := range Whole(o.parts).Problems {
		reasons, paths = append(reasons, named(p.Path)+" cannot be used: read "+p.Read+"; allowed: "+p.Allowed), append(paths, p.Path)
	}
	for _, path := range o.parts[SheetField].Missing {
		reasons, paths = append(reasons, named(path)+" is not given"), append(paths, path)
	}
	for _, sheet := range compared {
		for _, stop := range o.parts[sheet].Notes {
			if len(reasons) == 0 && strings.HasSuffix(stop.ID, ".numerics") {
				reasons, paths = append(reasons, strings.TrimSuffix(stop.Text, ".")), append(paths, stop.Paths...)
			}
		}
	}
	n.Text = says + strings.Join(reasons, ". ") + "."
	n.Paths = o.places(paths)
	return n
}

// named is an input by its label.
func named(path string) string {
	if spec, ok := Find(path); ok {
		return spec.Label
	}
	if t, ok := FindTable(path); ok {
		return t.Label
	}
	return path
}

// places are where the inputs at some paths are given: in the case when it
// changes them.
func (o outcome) places(paths []string) []string {
	places := []string{}
	for _, path := range paths {
		if slices.Contains(o.changed, path) {
			path = CasePath(o.index, path)
		}
		if !slices.Contains(places, path) {
			places = append(places, path)
		}
	}
	return places
}

// counted is the figure that counts what rides along, by that of water alone.
var counted = map[string]string{
	"front.breakthrough":           "front.ride.breakthrough",
	"front.recoveryAtBreakthrough": "front.ride.recoveryAtBreakthrough",
	"front.recoveryAtOne":          "front.ride.recoveryAtOne",
}

// rides reports whether something rides along that the outcome's recovery counts.
func (o outcome) rides() bool {
	_, ok := o.parts[SheetFront].Figure(counted["front.recoveryAtOne"])
	return ok
}

// figure is a figure of an outcome, found on the sheet its ID names, with what
// rides along where that is answered.
func (o outcome) figure(id string) (Figure, bool) {
	if f, ok := o.parts[SheetFront].Figure(counted[id]); ok {
		return f, true
	}
	for _, sheet := range compared {
		if f, ok := o.parts[sheet].Figure(id); ok {
			return f, true
		}
	}
	return Figure{}, false
}
