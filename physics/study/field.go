package study

import (
	"math"
	"slices"

	"brinefront/physics/fracflow"
	"brinefront/physics/reservoir"
)

// field is the flood in the ground.
type field struct {
	linear  *reservoir.Linear
	front   *front
	limit   reservoir.Limit
	end     float64 // the forecast runs to here, in pore volumes
	history []reservoir.State
}

// runField answers the Field sheet; what is more than an even block is for runMany.
func runField(st *Study, memory *Memory, frontPart Part, front *front) Part {
	if manyfold(st) {
		return runMany(st, memory, frontPart, front)
	}
	s := newSheet(st, frontPart)
	s.await(frontPart)
	s.layer(front)
	limit := s.limit()
	horizon, bounded := s.input("field.horizon")
	if p := CheckStart(st.Field.Start); p != nil {
		s.problems = append(s.problems, *p)
	}
	standing := s.standing()
	if frontPart.Status == Refused {
		standing = Refused
	}
	if standing != Ready || front == nil {
		if standing == Ready {
			standing = frontPart.Status
		}
		return s.close(standing)
	}
	if front.unflooded != nil {
		s.note(Note{ID: "field.numerics", Level: "caution", Text: "The flood could not be computed: " + front.unflooded.Error() + ".", Cause: "An input leaves no flow.", Do: "Look at the block and at the drive."})
		return s.close(Stopped)
	}
	if cut := front.cutAhead(); cut < -backward || cut > 1+backward {
		s.note(Note{ID: "field.backflow", Level: "caution", Text: "There is no forecast: at the initial saturation one phase flows back, so that the producer would have to give it to the layer.",
			Cause: "Gravity parts the phases faster than the rate pushes them.", Do: "Raise the rate, or look at the dip and the initial saturation.", Paths: []string{"front.dip", "field.rate", "front.initialWater"}})
		return s.close(Stopped)
	}
	f := &field{linear: front.linear, front: front}
	f.limit = limit(f.linear)
	f.end = math.Min(f.reach(horizon, bounded), f.whole())
	extra := []float64{1}
	if f.limit.Outcome == reservoir.Reached {
		extra = append(extra, f.limit.PVI*(1-aside), f.limit.PVI*(1+aside))
	}
	volumes := injections(front.displacement, f.end, extra...)
	f.history = make([]reservoir.State, 0, len(volumes))
	for _, q := range volumes {
		f.history = append(f.history, f.state(q))
	}
	f.figures(s)
	f.charts(s)
	s.part.Tables = append(s.part.Tables, f.forecast(st.Field.Start))
	f.notes(s)
	f.answer(s)
	return s.close(frontPart.Status)
}

// state is the flood after q pore volumes. Where a phase flows back at the producer the
// water cut is that of a stream of one phase.
func (f *field) state(q float64) reservoir.State { return f.told(f.linear.AtPVI(q)) }

func (f *field) told(state reservoir.State) reservoir.State {
	state.WaterCut = f.front.surfaceCut(state.ReservoirCut)
	return state
}

// layer reads the block and the drive.
func (s *sheet) layer(front *front) reservoir.Layer {
	l := reservoir.Layer{
		Length: s.need("field.length"), Area: s.need("field.width") * s.need("field.thickness"),
		Porosity: s.need("field.porosity"), Uptime: 1,
	}
	if front != nil {
		l.Bw, l.Bo = front.bw, front.bo
	}
	if uptime, given := s.input("field.uptime"); given {
		l.Uptime = uptime
	}
	if s.st.Field.Drive == "pressure" {
		l.Permeability = s.need("field.permeability")
		l.Drive = reservoir.ConstantPressure{DP: s.need("field.pressure")}
		return l
	}
	l.Drive = reservoir.ConstantRate{Q: s.need("field.rate")}
	// At constant rate the permeability decides the pressure difference only. When
	// it is not given any number serves: no pressure is shown then.
	l.Permeability = 1
	if s.st.Field.Permeability != nil {
		l.Permeability = s.need("field.permeability")
	}
	return l
}

// limit reads the economic limit.
func (s *sheet) limit() func(*reservoir.Linear) reservoir.Limit {
	if s.st.Field.Limit == "oilRate" {
		rate := s.need("field.oilRate")
		return func(l *reservoir.Linear) reservoir.Limit { return l.AtOilRate(rate) }
	}
	cut := s.need("field.waterCut")
	return func(l *reservoir.Linear) reservoir.Limit { return l.AtWaterCut(cut) }
}

// reach is how far the forecast runs, in pore volumes: to the horizon when one is
// given, else a little past the limit, else to where little more is to be had.
func (f *field) reach(horizon float64, bounded bool) float64 {
	const past, unlimited = 1.15, 3.0
	bt := f.front.displacement.Breakthrough()
	switch {
	case bounded:
		return f.linear.PVIAt(horizon)
	case f.limit.Outcome == reservoir.Reached:
		return past * math.Max(f.limit.PVI, bt)
	}
	return unlimited * math.Max(1, bt)
}

// backward is the part of the flow from which a phase is taken to flow back.
const backward = 1e-9

// whole is how far a producer can take what comes: to where the stream is all water
// and oil would flow back into the layer from beyond; +Inf where that never happens.
func (f *field) whole() float64 {
	if _, inlet := f.front.displacement.InletFace(); inlet <= 1+backward {
		return math.Inf(1)
	}
	q, _ := f.front.displacement.PVIAtCut(1)
	return q * (1 - aside)
}

// jumps reports whether the water cut passes its limit in the step of a front.
func (f *field) jumps(s *sheet) bool {
	if f.limit.Outcome != reservoir.Reached || limitPath(s.st) != "field.waterCut" {
		return false
	}
	cut := s.need("field.waterCut")
	return f.state(f.limit.PVI*(1-aside)).WaterCut < cut*(1-backward) && f.state(f.limit.PVI*(1+aside)).WaterCut > cut*(1+backward) &&
		slices.ContainsFunc(f.front.steps(), func(w fracflow.Wave) bool { return math.Abs(w.SpeedAhead*f.limit.PVI-1) < backward })
}

// withFront reports whether the limit is met as the foremost wave arrives.
func (f *field) withFront() bool {
	return f.limit.PVI <= f.front.displacement.Breakthrough()*(1+backward)
}

func (f *field) answer(s *sheet) {
	opening := "Water arrives after"
	if f.front.waterMoves() {
		opening = "The front arrives after"
	}
	s.answer(opening+" {field.breakthrough} ({field.injectedAtBreakthrough} injected) with {field.recoveryAtBreakthrough} of the pore volume "+f.front.fate(), ", {field.oilAtBreakthrough} of oil at surface")
	limit := "at {field.limit} water cut"
	if s.st.Field.Limit == "oilRate" {
		limit = "at an oil rate of {field.limit}"
	}
	switch f.limit.Outcome {
	case reservoir.Reached:
		switch {
		case !f.jumps(s):
			s.answer("; "+limit+", after {field.limitTime}, it is {field.recoveryAtLimit}", ", {field.oilAtLimit}", ".")
		case !f.withFront():
			s.answer("; the water cut passes {field.limit} as the next step arrives, after {field.limitTime}", ".")
		default:
			s.answer("; the water cut passes {field.limit} as the front arrives", ".")
		}
	case reservoir.FromTheStart:
		s.answer("; the flood is beyond its limit from the start.")
	default:
		s.answer("; the limit is never reached.")
	}
}
