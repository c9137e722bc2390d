package study

import (
	"maps"
	"slices"
	"strconv"
	"strings"
)

// Limits of the cases of a study: as many as a picture can tell apart, with names
// short enough to be written on a line.
const (
	MaxCases    = 5
	MaxCaseName = 60 // characters
)

// BaseCase is what the study itself is called beside its cases.
const BaseCase = "Base case"

// Case is the study with some changes that have a name: "More viscous oil". What
// it does not change it shares with the study, so that an edit of the study
// reaches every case.
type Case struct {
	Name   string            `json:"name"`
	Set    map[string]Input  `json:"set,omitempty"`    // numeric inputs, by path
	Choose map[string]string `json:"choose,omitempty"` // choices, by path
}

// On is the study as it is in the case. It shares with the base what the case
// leaves alone, and neither is written to.
func (c Case) On(base Study) Study {
	st := base
	st.Cases = nil
	for path, value := range c.Choose {
		Choose(&st, path, value)
	}
	for path, in := range c.Set {
		if spec, ok := Find(path); ok {
			spec.Set(&st, &in)
		}
	}
	return st
}

// Changes lists the paths that the case changes: choices first, then numeric
// inputs, each in the order of the forms.
func (c Case) Changes() []string {
	var paths []string
	for _, f := range choiceFields {
		if _, ok := c.Choose[f.path]; ok {
			paths = append(paths, f.path)
		}
	}
	for _, spec := range specs {
		if _, ok := c.Set[spec.Path]; ok {
			paths = append(paths, spec.Path)
		}
	}
	return paths
}

// CaseChoices are the paths of the choices that a case may make: all that bear on
// the answer.
func CaseChoices() []string {
	var paths []string
	for _, f := range choiceFields {
		if f.path != "system" && !strings.HasPrefix(f.path, "match.") {
			paths = append(paths, f.path)
		}
	}
	return paths
}

// Chosen is the value of the choice at a path; empty when the path holds none.
func Chosen(st *Study, path string) string {
	for _, f := range choiceFields {
		if f.path == path {
			return *f.at(st)
		}
	}
	return ""
}

// CasePath names what a case holds at a path, for messages and fields: the name
// of the third case is "cases.2.name", its oil viscosity
// "cases.2.fluids.oilViscosity".
func CasePath(i int, path string) string { return "cases." + strconv.Itoa(i) + "." + path }

// AtCase takes such a name apart; false when it is none.
func AtCase(path string) (i int, inner string, ok bool) {
	rest, ok := strings.CutPrefix(path, "cases.")
	if !ok {
		return 0, "", false
	}
	number, inner, ok := strings.Cut(rest, ".")
	i, err := strconv.Atoi(number)
	return i, inner, ok && err == nil && i >= 0
}

// CheckCaseName says whether case i of a study may have a name: not empty, short,
// and its own. Case len(st.Cases) is one to be added.
func CheckCaseName(st *Study, i int, name string) *Problem {
	path := CasePath(i, "name")
	if strings.TrimSpace(name) == "" {
		return &Problem{Path: path, Read: "no name", Allowed: "a name that tells this case from the others"}
	}
	if n := len([]rune(name)); n > MaxCaseName {
		return &Problem{Path: path, Read: strconv.Itoa(n) + " characters", Allowed: "up to " + strconv.Itoa(MaxCaseName)}
	}
	same := func(other string) bool { return strings.EqualFold(strings.TrimSpace(other), strings.TrimSpace(name)) }
	taken := same(BaseCase)
	for j, other := range st.Cases {
		taken = taken || j != i && same(other.Name)
	}
	if taken {
		return &Problem{Path: path, Read: quoted(name), Allowed: "a name that nothing else here has"}
	}
	return nil
}

// caseSpec describes an input that a case may change: as the study's own, but that
// empty means as in the base case.
func caseSpec(i int, path string) (Spec, bool) {
	for _, s := range specs {
		if s.Path == path {
			s.Path, s.Sheet, s.of = CasePath(i, path), SheetCompare, i+1
			s.Optional, s.Default = false, "as in the base case"
			return s, true
		}
	}
	return Spec{}, false
}

// inCase is what a case sets the input to; nil when it leaves it to the base.
func (s Spec) inCase(st *Study) *Input {
	i, path, _ := AtCase(s.Path)
	if i >= len(st.Cases) {
		return nil
	}
	in, ok := st.Cases[i].Set[path]
	if !ok {
		return nil
	}
	return &in
}

// setInCase changes what a case sets the input to; nil leaves it to the base. The
// lists of the study are replaced, never written to.
func (s Spec) setInCase(st *Study, in *Input) {
	i, path, _ := AtCase(s.Path)
	if i >= len(st.Cases) {
		return
	}
	set := maps.Clone(st.Cases[i].Set)
	delete(set, path)
	if in != nil {
		if set == nil {
			set = map[string]Input{}
		}
		set[path] = *in
	}
	if len(set) == 0 {
		set = nil
	}
	st.Cases = slices.Clone(st.Cases)
	st.Cases[i].Set = set
}

// ChooseInCase sets a choice of a case, or with an empty value leaves it to the
// base; false when the case may not make it, and then nothing is changed.
func ChooseInCase(st *Study, i int, path, value string) bool {
	lawful := slices.Contains(CaseChoices(), path) && (value == "" || holds(Choices(path), value))
	if !lawful || i < 0 || i >= len(st.Cases) {
		return false
	}
	choose := maps.Clone(st.Cases[i].Choose)
	delete(choose, path)
	if value != "" {
		if choose == nil {
			choose = map[string]string{}
		}
		choose[path] = value
	}
	if len(choose) == 0 {
		choose = nil
	}
	st.Cases = slices.Clone(st.Cases)
	st.Cases[i].Choose = choose
	return true
}

// lawfulCases checks the cases of a study that was read from a file.
func lawfulCases(st *Study) error {
	if len(st.Cases) > MaxCases {
		return refuse("cases", "read "+strconv.Itoa(len(st.Cases))+" cases, allowed: up to "+strconv.Itoa(MaxCases))
	}
	for i, c := range st.Cases {
		if p := CheckCaseName(st, i, c.Name); p != nil {
			return asFileError(p)
		}
		for _, path := range slices.Sorted(maps.Keys(c.Set)) {
			in, at := c.Set[path], CasePath(i, "set."+path)
			spec, ok := Find(path)
			if !ok {
				return refuse(at, "no such input is known in a study of version "+strconv.Itoa(Version))
			}
			spec.Path = at // where it stands in this file
			if err := lawfulInput(spec, &in); err != nil {
				return err
			}
		}
		for _, path := range slices.Sorted(maps.Keys(c.Choose)) {
			at := CasePath(i, "choose."+path)
			if !slices.Contains(CaseChoices(), path) {
				return refuse(at, "no such choice is known to a case in a study of version "+strconv.Itoa(Version))
			}
			if list := Choices(path); !holds(list, c.Choose[path]) {
				return refuse(at, "read "+quoted(c.Choose[path])+", allowed: one of "+valuesOf(list))
			}
		}
	}
	return nil
}

// cloneCases copies cases so that changing one leaves the other alone.
func cloneCases(cases []Case) []Case {
	if cases == nil {
		return nil
	}
	list := slices.Clone(cases)
	for i, c := range list {
		list[i].Choose = maps.Clone(c.Choose)
		list[i].Set = maps.Clone(c.Set)
		for path, in := range list[i].Set {
			in.Low, in.High = number(in.Low), number(in.High)
			list[i].Set[path] = in
		}
	}
	return list
}
