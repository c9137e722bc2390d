package reservoir

import (
	"math"
	"sort"
)

// Step is what the wells do from a time on. With neither rate nor pressure they are shut in.
type Step struct {
	From     float64 // calendar time, s; the first step starts at 0
	Rate     float64 // injected while on, reservoir m3/s; 0: the pressure decides
	Pressure float64 // difference between the wells, Pa: held, or with a rate not exceeded; 0: the rate decides
}

// Run is a body in calendar time. Injection is on for the fraction Uptime of it, evenly
// spread. Where a rate is held the clock is the root of one equation, where a pressure is
// held it goes with time; between them a run changes where the rate would take more
// pressure than is allowed, so that no step in time is taken.
type Run struct {
	Body       Body
	PoreVolume float64
	Uptime     float64
	pieces     []piece
}

// piece is a time during which one thing is held.
type piece struct {
	time, clock, injected float64 // at its start; injected in m3
	rate, pressure        float64 // one of them, or none
}

// NewRun lays the steps out up to a time. Steps rise in time; pore volume and uptime are
// above 0. Whether a step's rate meets its pressure limit is looked for at 200 points of
// the step; a crossing and return between two of them is passed over.
func NewRun(body Body, poreVolume, uptime float64, steps []Step, end float64) *Run {
	r := &Run{Body: body, PoreVolume: poreVolume, Uptime: uptime}
	var now piece
	for i, s := range steps {
		until := end
		if i+1 < len(steps) {
			until = math.Min(end, steps[i+1].From)
		}
		for now.time < until {
			now = r.add(now, s, until)
		}
	}
	return r
}

// need is the pressure that a rate takes when the clock stands at x.
func (r *Run) need(rate, x float64) float64 { return rate / (r.Body.At(x).Rate * r.PoreVolume) }

// add appends the piece that starts now, and returns where it ends: at the end of its
// step, or where the pressure limit begins or ceases to bind.
func (r *Run) add(now piece, s Step, until float64) piece {
	now.rate, now.pressure = s.Rate, 0
	both := s.Rate > 0 && s.Pressure > 0
	bound := both && r.need(s.Rate, now.clock*(1+1e-12)) > s.Pressure
	if s.Rate == 0 || bound {
		now.rate, now.pressure = 0, s.Pressure
	}
	r.pieces = append(r.pieces, now)
	next := r.on(len(r.pieces)-1, until)
	if both {
		excess := func(o Outflow) float64 { return s.Rate/(o.Rate*r.PoreVolume) - s.Pressure }
		const points = 200
		before := now.clock * (1 + 1e-12)
		for i := 1; i <= points; i++ {
			at := now.clock + (next.clock-now.clock)*math.Pow(float64(i)/points, 3)
			if (excess(r.Body.At(at)) > 0) != bound {
				next.clock = crossing(r.Body, before, at, excess)
				next.injected = r.Body.At(next.clock).Injected * r.PoreVolume
				next.time = math.Min(until, math.Max(r.TimeAt(next.clock), math.Nextafter(now.time, until)))
				break
			}
			before = at
		}
	}
	return next
}

// on is where piece i has come to at a time.
func (r *Run) on(i int, time float64) piece {
	p := r.pieces[i]
	spent := (time - p.time) * r.Uptime
	at := piece{time: time, clock: p.clock, injected: p.injected}
	switch {
	case p.pressure > 0:
		at.clock += p.pressure * spent
		at.injected = r.Body.At(at.clock).Injected * r.PoreVolume
	case p.rate > 0:
		at.injected += p.rate * spent
		at.clock = Clock(r.Body, at.injected/r.PoreVolume, at.clock)
	}
	return at
}

// Moment is a run at one time. Rates are those while on, times Uptime.
type Moment struct {
	Time, Clock float64
	Pressure    float64 // difference between the wells while on, Pa
	Pace        float64 // d clock/d calendar time: turns slopes of Outflow into calendar rates
	Outflow
}

// At is the run at a calendar time t >= 0.
func (r *Run) At(t float64) Moment {
	i := sort.Search(len(r.pieces), func(i int) bool { return r.pieces[i].time > t }) - 1
	i = max(i, 0)
	clock := r.on(i, t).clock
	return r.moment(i, t, clock, r.Body.At(clock))
}

// moment is the run in piece i.
func (r *Run) moment(i int, t, clock float64, o Outflow) Moment {
	p := r.pieces[i]
	m := Moment{Time: t, Clock: clock, Pressure: p.pressure, Outflow: o}
	if p.rate > 0 {
		m.Pressure = p.rate / (m.Rate * r.PoreVolume)
	}
	m.Pace = m.Pressure * r.Uptime
	return m
}

// Reached is the run as its clock comes to stand at a value, which is quicker than At since
// nothing is sought; false when the run ends before that, shut in.
func (r *Run) Reached(clock float64) (Moment, bool) {
	clock = math.Max(0, clock)
	i := max(0, sort.Search(len(r.pieces), func(i int) bool { return r.pieces[i].clock >= clock })-1)
	o := r.Body.At(clock)
	p := r.pieces[i]
	switch {
	case p.pressure > 0:
		return r.moment(i, p.time+(clock-p.clock)/(p.pressure*r.Uptime), clock, o), true
	case p.rate > 0:
		return r.moment(i, p.time+(o.Injected*r.PoreVolume-p.injected)/(p.rate*r.Uptime), clock, o), true
	}
	return Moment{}, clock == p.clock
}

// TimeAt is the calendar time at which the clock comes to stand at a value; +Inf when the
// run ends before that, shut in.
func (r *Run) TimeAt(clock float64) float64 {
	if !(clock > 0) {
		return 0
	}
	if m, ok := r.Reached(clock); ok {
		return m.Time
	}
	return math.Inf(1)
}
