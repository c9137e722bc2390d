package study

import (
	"cmp"
	"math"
	"slices"

	"brinefront/physics/numeric"
	"brinefront/physics/reservoir"
)

// instant is the field at one time. Rates are calendar averages; oil and water at surface.
type instant struct {
	reservoir.Moment
	injection, oilRate, waterRate float64 // m3/s; injection at reservoir conditions
	injected, oil, water          float64 // m3, cumulative
	cut, recovery                 float64 // at surface; oil displaced and produced, of the pore volume
	cash                          float64 // a second
}

func (m *many) at(r *reservoir.Run, t float64) instant { return m.instant(r.At(t)) }

func (m *many) instant(o reservoir.Moment) instant {
	rate := o.Pace * m.pores
	_, inlet := m.front.displacement.InletFace()
	i := instant{Moment: o, injection: o.Rate * rate, injected: o.Injected * m.pores, recovery: o.Oil - o.Injected*(1-inlet),
		oilRate: math.Max(0, o.OilRate) * rate / m.front.bo, oil: o.Oil * m.pores / m.front.bo,
		waterRate: math.Max(0, o.Rate-o.HoldingRate-o.OilRate) * rate / m.front.bw,
		water:     math.Max(0, o.Injected-o.Held-o.Oil) * m.pores / m.front.bw,
		cut:       m.front.surfaceCut(o.Cut()),
	}
	i.cash = m.purse.flow(i)
	return i
}

// find looks for the limit and lays the forecast's times.
func (m *many) find() {
	m.limit = m.limitOf(m.run, m.instants(m.run, furthest, 400))
	horizon, bounded := m.input("field.horizon")
	const past, unlimited = 1.15, 3.0
	switch {
	case bounded:
		m.end = horizon
	case m.limit.Outcome == reservoir.Reached:
		m.end = past * m.limit.Time
	default:
		m.end = m.run.TimeAt(reservoir.Clock(m.run.Body, unlimited, 0))
	}
	if math.IsInf(m.end, 1) { // shut in before that
		m.end = past * m.steps[len(m.steps)-1].From
	}
	extra := []float64{}
	if m.limit.Outcome == reservoir.Reached {
		extra = []float64{m.limit.Time * (1 - aside), m.limit.Time * (1 + aside)}
	}
	m.moments = m.until(m.run, m.end, 240, extra...)
}

// until tells a run up to a time, and at some times besides, each once.
func (m *many) until(r *reservoir.Run, end float64, count int, extra ...float64) []instant {
	last := m.at(r, end)
	list := append(m.instants(r, last.Injected, count), last)
	for _, t := range extra {
		list = append(list, m.at(r, t))
	}
	sorted(list)
	former := -1.0
	return slices.DeleteFunc(list, func(i instant) bool {
		if i.Time > end || i.Time <= former {
			return true
		}
		former = i.Time
		return false
	})
}

func sorted(list []instant) {
	slices.SortFunc(list, func(a, b instant) int { return cmp.Compare(a.Time, b.Time) })
}

// instants tell a run up to a volume injected: closing in on the start, at the steps of
// the schedule, and on both sides of what arrives.
func (m *many) instants(r *reservoir.Run, q float64, count int) []instant {
	list := []instant{m.at(r, 0)}
	for _, s := range m.steps[1:] {
		list = append(list, m.at(r, s.From*(1-aside)), m.at(r, s.From))
	}
	last := reservoir.Clock(r.Body, q, 0)
	clocks := coming(r)
	for i := range count {
		share := float64(i+1) / float64(count)
		clocks = append(clocks, last*math.Pow(share, 1+2*(1-share)))
	}
	for _, clock := range clocks {
		if clock > last {
			continue
		}
		if o, ok := r.Reached(clock); ok {
			list = append(list, m.instant(o))
		}
	}
	sorted(list)
	return list
}

// coming are the clocks at which fronts arrive in a run, on both sides, of as many
// layers as can be told apart in a picture.
func coming(r *reservoir.Run) []float64 {
	const most = 40
	bundle := r.Body.(reservoir.Bundle)
	var list []float64
	for i, b := range bundle {
		if len(bundle) <= most || i*most/len(bundle) != (i+1)*most/len(bundle) {
			if clock := b.Body.Breakthrough() / b.Pace; !math.IsInf(clock, 1) {
				list = append(list, clock*(1-aside), clock*(1+aside))
			}
		}
	}
	return append(list, r.Body.Breakthrough()*(1-aside), r.Body.Breakthrough()*(1+aside))
}

// limitOf is the first time at which the water cut is at its limit, or the last at which
// the oil rate or the cash are.
func (m *many) limitOf(r *reservoir.Run, list []instant) reservoir.Limit {
	excess := func(i instant) float64 { return i.cut - m.need("field.waterCut") }
	lasting := m.st.Field.Limit != "waterCut"
	switch m.st.Field.Limit {
	case "oilRate":
		excess = func(i instant) float64 { return m.need("field.oilRate") - i.oilRate }
	case "cash":
		excess = func(i instant) float64 { return -i.cash }
	}
	beyond := make([]bool, len(list))
	for k, i := range list {
		beyond[k] = excess(i) >= 0
	}
	k := slices.Index(beyond, true)
	if lasting {
		k = len(beyond)
		for k > 0 && beyond[k-1] {
			k--
		}
	}
	switch {
	case k < 0 || k == len(list):
		return reservoir.Limit{Outcome: reservoir.Never, Time: math.Inf(1), PVI: math.Inf(1)}
	case k == 0:
		return reservoir.Limit{Outcome: reservoir.FromTheStart}
	}
	at := func(t float64) float64 { return excess(m.at(r, t)) }
	t := numeric.Zero(at, list[k-1].Time, list[k].Time, at(list[k-1].Time), at(list[k].Time))
	return reservoir.Limit{Outcome: reservoir.Reached, Time: t, PVI: r.At(t).Injected}
}

// purse holds prices and costs.
type purse struct {
	known                        bool
	oil, water, injection, fixed float64
	discount                     float64 // a year
}

func (m *many) readMoney() {
	if m.st.Field.Limit == "cash" {
		m.need("field.money.oil")
	}
	m.purse = purse{m.st.Field.Money.Oil != nil, m.or("field.money.oil", 0), m.or("field.money.water", 0), m.or("field.money.injection", 0), m.or("field.money.fixed", 0), m.or("field.money.discount", 0)}
}

// flow is the net cash of a second.
func (p purse) flow(i instant) float64 {
	return p.oil*i.oilRate - p.water*i.waterRate - p.injection*i.injection - p.fixed
}

// worth is the net cash from the start to each instant, and the same discounted to the
// start: what flows between two instants counts at the time halfway.
func (p purse) worth(list []instant) (cash, now []float64) {
	cash, now = make([]float64, len(list)), make([]float64, len(list))
	for i := 1; i < len(list); i++ {
		a, b := list[i-1], list[i]
		net := p.oil*(b.oil-a.oil) - p.water*(b.water-a.water) - p.injection*(b.injected-a.injected) - p.fixed*(b.Time-a.Time)
		cash[i] = cash[i-1] + net
		now[i] = now[i-1] + net*math.Pow(1+p.discount, -(a.Time+b.Time)/2/year)
	}
	return cash, now
}

const year = 365.25 * 86400
