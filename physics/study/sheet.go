package study

import (
	"math"
	"slices"
	"strings"

	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// sheet gathers the result of one part while it is computed.
type sheet struct {
	st       *Study
	part     Part
	problems []Problem
	others   []Part // parts whose figures this one builds on
}

func newSheet(st *Study, others ...Part) *sheet {
	return &sheet{st: st, others: others, problems: []Problem{}, part: Part{
		Missing: []string{}, Answer: []Phrase{}, Figures: []Figure{}, Charts: []Chart{}, Tables: []Grid{}, Notes: []Note{},
	}}
}

// input reads an input in SI. An optional input that is empty is not given; any
// other that is empty is noted as missing, and one that cannot be used as a problem.
func (s *sheet) input(path string) (si float64, given bool) {
	spec, ok := Find(path)
	if !ok {
		panic("study: no input is described at " + path)
	}
	in := spec.Get(s.st)
	if in == nil {
		if !spec.Optional {
			s.miss(path)
		}
		return math.NaN(), false
	}
	unit, ok := units.Find(spec.Quantity, in.Unit)
	if !ok {
		s.problem(path, "the unit "+quoted(in.Unit), knownUnits(spec.Quantity))
		return math.NaN(), false
	}
	if p := Check(spec, in.Value, unit); p != nil {
		s.problems = append(s.problems, *p)
		return math.NaN(), false
	}
	return math.Max(spec.Min, math.Min(spec.Max, unit.ToSI(in.Value))), true // converting rounds
}

// need reads an input that the answer cannot do without.
func (s *sheet) need(path string) float64 {
	si, given := s.input(path)
	if spec, _ := Find(path); !given && spec.Get(s.st) == nil {
		s.miss(path)
	}
	return si
}

func (s *sheet) miss(path string) {
	if !slices.Contains(s.part.Missing, path) {
		s.part.Missing = append(s.part.Missing, path)
	}
}

func (s *sheet) problem(path, read, allowed string) {
	s.problems = append(s.problems, Problem{Path: path, Read: read, Allowed: allowed})
}

// typed is an input as the person wrote it, for a message.
func (s *sheet) typed(path string) string {
	spec, _ := Find(path)
	in := spec.Get(s.st)
	unit, _ := units.Find(spec.Quantity, in.Unit)
	return withUnit(units.Exact(in.Value), unit)
}

// standing is what the sheet can answer so far.
func (s *sheet) standing() Status {
	switch {
	case len(s.problems) > 0:
		return Refused
	case len(s.part.Missing) > 0:
		return Waiting
	}
	return Ready
}

// await takes over what keeps an earlier part from answering.
func (s *sheet) await(earlier Part) {
	for _, path := range earlier.Missing {
		s.miss(path)
	}
}

// close ends the sheet with the status it has come to, and the problems it has met.
func (s *sheet) close(status Status) Part {
	s.part.Problems = once(nil, s.problems)
	s.part.Status = status
	return s.part
}

func (s *sheet) note(n Note) {
	if n.Paths == nil {
		n.Paths = []string{}
	}
	s.part.Notes = append(s.part.Notes, n)
}

// answer writes the sentence: texts and, in braces, the figures in between. A
// clause whose figure was left out is left out whole.
func (s *sheet) answer(clauses ...string) {
	for _, clause := range clauses {
		var phrases []Phrase
		complete := true
		for clause != "" {
			before, rest, found := strings.Cut(clause, "{")
			if before != "" {
				phrases = append(phrases, Phrase{Text: before})
			}
			if !found {
				break
			}
			id, after, _ := strings.Cut(rest, "}")
			_, known := s.part.Figure(id)
			complete = complete && known
			phrases = append(phrases, Phrase{Figure: id})
			clause = after
		}
		if complete {
			s.part.Answer = append(s.part.Answer, phrases...)
		}
	}
}

// figure adds a figure with its working, unless its value or one of its terms is
// out of reach: a number that does not exist is left out, never shown.
func (s *sheet) figure(f Figure, w *working) {
	if w.broken || math.IsNaN(f.Value) || math.IsInf(f.Value, 0) {
		return
	}
	f.Working = w.Working
	s.part.Figures = append(s.part.Figures, f)
}

// working gathers how a figure was obtained: its terms, and through them the
// inputs it rests on.
type working struct {
	Working
	sheet  *sheet
	broken bool // a term is out of reach
}

// by starts a working: a formula with symbols in braces (or none) and, where that
// does not say all, a method in words.
func (s *sheet) by(formula, method string, sources ...ref.ID) *working {
	return &working{sheet: s, Working: Working{
		Formula: formula, Method: method, Terms: make([]Term, 0, 4), Sources: append([]ref.ID{}, sources...), Inputs: make([]string, 0, 8),
	}}
}

// input adds a typed input as a term.
func (w *working) input(path string) *working {
	spec, _ := Find(path)
	si, given := w.sheet.input(path)
	w.broken = w.broken || !given
	return w.value(spec.Symbol, spec.Label, si, spec.Quantity).rests(path)
}

// term adds a figure as a term, found on this sheet or one before it.
func (w *working) term(id string) *working {
	f, ok := w.sheet.find(id)
	if !ok {
		w.broken = true
		return w
	}
	return w.value(f.Symbol, f.Label, f.Value, f.Quantity).rests(f.Working.Inputs...)
}

// value adds a number that is no figure of its own.
func (w *working) value(symbol, label string, si float64, q units.Quantity) *working {
	w.broken = w.broken || math.IsNaN(si) || math.IsInf(si, 0)
	w.Terms = append(w.Terms, Term{symbol, label, si, q})
	return w
}

// rests names inputs that the figure rests on.
func (w *working) rests(paths ...string) *working {
	for _, path := range paths {
		if !slices.Contains(w.Inputs, path) {
			w.Inputs = append(w.Inputs, path)
		}
	}
	return w
}

// on names the inputs behind another figure without making it a term.
func (w *working) on(ids ...string) *working {
	for _, id := range ids {
		if f, ok := w.sheet.find(id); ok {
			w.rests(f.Working.Inputs...)
		}
	}
	return w
}

func (s *sheet) find(id string) (Figure, bool) {
	if f, ok := s.part.Figure(id); ok {
		return f, true
	}
	for i := range s.others {
		if f, ok := s.others[i].Figure(id); ok {
			return f, true
		}
	}
	return Figure{}, false
}

// number of a figure already added; NaN when it was left out.
func (s *sheet) number(id string) float64 {
	if f, ok := s.find(id); ok {
		return f.Value
	}
	return math.NaN()
}
