package study

import (
	"errors"
	"math"
	"slices"
	"strings"

	"brinefront/physics/fit"
	"brinefront/physics/units"
)

// match moves inputs of a study so that its forecast follows what was measured.
type match struct {
	e     *Evaluation
	specs []Spec
	units []units.Unit // the inputs are typed in
	free  []fit.Free
	past  *past
	edges []float64  // of the times that the rows stand for
	scale [2]float64 // of oil and water rates
	ahead bool       // nothing that is moved changes the front
	calls int
	first float64 // sum of squares as typed
	best  float64 // the least so far
	fit.Matching
}

// matchSteps limits the search; a flood that can be matched takes a dozen or so.
const matchSteps = 30

// least weight of a phase: the other's mean rate over this. Common practice, no source.
const phaseFloor = 0.1

// runMatch answers the Match sheet, piece by piece.
func runMatch(e *Evaluation, grow growing) Part {
	s := newSheet(e.st, e.parts[SheetField])
	field := e.parts[SheetField]
	s.await(field)
	k := &match{e: e}
	k.read(s)
	standing := s.standing()
	if field.Status == Refused {
		standing = Refused
	}
	if standing != Ready || e.front == nil {
		if standing == Ready {
			standing = field.Status
		}
		return s.close(standing)
	}
	wanted, err := k.search(grow)
	var refused *fit.RefusedError
	switch {
	case !wanted:
		return s.close(Stopped)
	case errors.As(err, &refused):
		s.problem(historyTable.path, "too few rows: "+refused.Reason, "more rows, or fewer inputs to move")
		return s.close(Refused)
	case err != nil:
		s.note(Note{ID: "match.none", Level: "caution", Text: "There is no match: the forecast has no answer with the inputs as they stand.", Cause: "A match begins from there.", Do: "See what the Field sheet says.", Paths: []string{historyTable.path}})
		return s.close(Stopped)
	}
	k.figures(s)
	k.charts(s)
	k.tables(s)
	k.notes(s)
	if k.Status != fit.Converged {
		return s.close(Stopped)
	}
	return s.close(field.Status)
}

// search looks for the match, and ends at once when nobody waits for it. A match of the same
// inputs is remembered: what it does not rest on may be edited beside it.
func (k *match) search(grow growing) (wanted bool, err error) {
	st := k.e.st
	on := Study{Rock: st.Rock, Fluids: st.Fluids, Front: st.Front, Field: st.Field, Match: st.Match}
	on.Field.Money, on.Field.Limit, on.Field.WaterCut, on.Field.OilRate, on.Field.History.From = Money{}, "", nil, nil, nil
	wanted = true
	k.Matching, err = recall(k.e.memory, "match", on, nil, func() (fit.Matching, error) {
		return fit.Match(k.free, 2*len(k.past.time), func(values, r []float64) bool {
			wanted = wanted && grow(k.sofar())
			return wanted && k.deviations(values, r)
		}, matchSteps)
	})
	if !wanted && k.e.memory != nil {
		delete(k.e.memory.last, "match") // it came to no end
	}
	return wanted, err
}

// read takes in what is to be moved, between which bounds, and towards what.
func (k *match) read(s *sheet) {
	paths := s.st.Match.Moved()
	if len(paths) == 0 {
		s.miss("match.first")
	}
	k.ahead = true
	for _, path := range paths {
		spec, _ := Find(path)
		k.ahead = k.ahead && strings.HasPrefix(path, "field.")
		if !spec.Applies(s.st) {
			s.problem("match.first", spec.Label+", which this study does not use", "inputs that the forecast rests on")
			continue
		}
		value := s.need(path)
		in := spec.Get(s.st)
		if in == nil {
			continue
		}
		unit, known := units.Find(spec.Quantity, in.Unit)
		switch {
		case !known: // a problem already
		case in.Low == nil || in.High == nil || !(*in.Low < *in.High):
			s.problem(path, s.typed(path)+" without a range", "a low and a high end of its range, between which a match may move it")
		default:
			k.specs, k.units = append(k.specs, spec), append(k.units, unit)
			k.free = append(k.free, fit.Free{Symbol: spec.Symbol, Label: spec.Label, Value: value, Min: unit.ToSI(*in.Low), Max: unit.ToSI(*in.High)})
		}
	}
	if !historied(s.st) {
		s.miss(historyTable.path)
		return
	}
	columns, problem := historyTable.rows(s.st.Field.History.Table, s.st.Field.Start)
	if problem != nil {
		s.problems = append(s.problems, *problem)
		return
	}
	k.past = &past{time: columns[0], oilRate: columns[1], waterRate: columns[2]}
	if len(k.past.time) < 2 {
		s.problem(historyTable.path, "one row", "two rows or more")
		return
	}
	k.edges = spans(k.past.time)
	oil, water := mean(k.past.oilRate), mean(k.past.waterRate)
	k.scale = [2]float64{math.Max(oil, phaseFloor*water), math.Max(water, phaseFloor*oil)}
	if !(k.scale[0] > 0) {
		s.problem(historyTable.path, "no oil and no water", "rates above 0 in some rows")
	}
}

// spans are the edges of the times that rows stand for: halfway to their neighbours, and
// as far beyond the first and the last row.
func spans(time []float64) []float64 {
	last := len(time) - 1
	edges := []float64{math.Max(0, time[0]-(time[1]-time[0])/2)}
	for i := range last {
		edges = append(edges, (time[i]+time[i+1])/2)
	}
	return append(edges, time[last]+(time[last]-time[last-1])/2)
}

func mean(list []float64) float64 {
	sum := 0.0
	for _, v := range list {
		sum += v / float64(len(list))
	}
	return sum
}

// at is the flood with other values of what is moved; its run is nil where it has no answer.
func (k *match) at(values []float64) *many {
	c := Case{Set: map[string]Input{}}
	for i, spec := range k.specs {
		in := *spec.Get(k.e.st)
		in.Value = k.units[i].FromSI(values[i])
		c.Set[spec.Path] = in
	}
	of := k.e.changed(c, k.e.memory)
	if k.ahead {
		of.parts[SheetFront], of.front = k.e.parts[SheetFront], k.e.front
	}
	of.through(SheetFront)
	m, _ := laid(of.st, of.memory, of.parts[SheetFront], of.front)
	return m
}

// averages are the oil and water rates of a flood over the times that the rows stand for.
func (k *match) averages(m *many) (oil, water []float64) {
	before := m.at(m.run, k.edges[0])
	for i, t := range k.edges[1:] {
		after, span := m.at(m.run, t), t-k.edges[i]
		oil, water = append(oil, (after.oil-before.oil)/span), append(water, (after.water-before.water)/span)
		before = after
	}
	return oil, water
}

// deviations are those of the forecast from the history, each as a share of the phase's
// mean rate.
func (k *match) deviations(values, r []float64) bool {
	m := k.at(values)
	if m.run == nil {
		return false
	}
	oil, water := k.averages(m)
	sum := 0.0
	for i := range oil {
		r[2*i], r[2*i+1] = (oil[i]-k.past.oilRate[i])/k.scale[0], (water[i]-k.past.waterRate[i])/k.scale[1]
		sum += r[2*i]*r[2*i] + r[2*i+1]*r[2*i+1]
	}
	if k.calls == 0 {
		k.first, k.best = sum, sum
	}
	k.best = math.Min(k.best, sum)
	k.calls++
	return !math.IsNaN(sum)
}

// sofar is the part while the search is under way: what is left of it at most.
func (k *match) sofar() Part {
	s := newSheet(k.e.st)
	if k.calls > 0 {
		k.misfits(s, k.first, k.best)
		s.answer("Matching: the misfit has come from {match.before} to {match.misfit}.")
	}
	s.part.Left = math.Max(0.01, 1-float64(k.calls)/float64(matchSteps*(len(k.free)+2)))
	return s.close(Ready)
}

// misfits are root mean squares out of sums of squares.
func (k *match) misfits(s *sheet, first, sum float64) {
	root := func(sum float64) float64 { return math.Sqrt(sum / float64(2*len(k.past.time))) }
	s.figure(Figure{ID: "match.before", Label: "Misfit of the inputs as they stand", Symbol: "ε0", Value: root(first), Quantity: units.Share, Strip: true}, k.by(s, misfitMethod))
	s.figure(Figure{ID: "match.misfit", Label: "Misfit of the match", Symbol: "ε", Value: root(sum), Quantity: units.Share, Strip: true}, k.by(s, misfitMethod))
}

// paths of what is moved.
func (k *match) paths() []string {
	var list []string
	for _, spec := range k.specs {
		list = append(list, spec.Path)
	}
	return slices.Clip(list)
}
