package study

import (
	"brinefront/physics/fracflow"
	"brinefront/physics/units"
)

// tables lists the waves of the displacement, and what is at the producer and in
// the rock after round volumes injected.
func (f *front) tables(s *sheet) {
	s.part.Tables = append(s.part.Tables, f.waveTable(), f.volumeTable(s))
}

// shownWaves is the longest list of waves that still tells something; a table
// read by straight lines has one small shock a row.
const shownWaves = 40

func (f *front) waveTable() Grid {
	waves := f.displacement.Waves()
	g := Grid{ID: "front.waves", Title: "Waves, from the injector outwards"}
	if len(waves) > shownWaves {
		waves = waves[len(waves)-shownWaves:]
		g.Title = "Waves, the foremost " + units.Format(shownWaves, 3) + " of them, the front last"
	}
	kind := Column{Label: "Wave", Quantity: units.Number}
	behind := Column{Label: "Sw behind", Quantity: units.Fraction}
	ahead := Column{Label: "Sw ahead", Quantity: units.Fraction}
	slow := Column{Label: "Speed, slowest", Quantity: units.Number}
	fast := Column{Label: "Speed, fastest", Quantity: units.Number}
	for _, w := range waves {
		kind.Words = append(kind.Words, kindOf(w))
		behind.Values, ahead.Values = append(behind.Values, w.Behind), append(ahead.Values, w.Ahead)
		slow.Values, fast.Values = append(slow.Values, w.SpeedBehind), append(fast.Values, w.SpeedAhead)
	}
	g.Columns = []Column{kind, behind, ahead, slow, fast}
	first, last := f.arrivals("Arrives"), f.arrivals("Passed")
	for _, w := range waves {
		first.add(w.SpeedAhead)
		last.add(w.SpeedBehind)
	}
	g.Columns = append(append(g.Columns, first.columns()...), last.columns()...)
	return g
}

// kindOf is what a wave is called.
func kindOf(w fracflow.Wave) string {
	switch {
	case w.SpeedAhead <= 0:
		return "runs back, never enters"
	case w.Kind == fracflow.Shock:
		return "step"
	case w.SpeedBehind < 0:
		return "spreading, its slow part never enters"
	}
	return "spreading"
}

func (f *front) volumeTable(s *sheet) Grid {
	d := f.displacement
	injected := Column{Label: "Injected", Symbol: "Q", Quantity: units.PoreVolumes, Values: []float64{0.1, 0.2, 0.3, 0.5, 0.75, 1, 1.5, 2, 3, 5}}
	outlet := Column{Label: "Sw at the producer", Quantity: units.Fraction}
	average := Column{Label: "Sw, average", Quantity: units.Fraction}
	reservoir := Column{Label: "Water cut, reservoir", Quantity: units.Share}
	surface := Column{Label: "Water cut, surface", Quantity: units.Share}
	pore := Column{Label: "Recovery, of the pore volume", Quantity: units.Share}
	place := Column{Label: "Recovery, of the oil in place", Quantity: units.Share}
	for _, q := range injected.Values {
		state := d.After(q)
		outlet.Values, average.Values = append(outlet.Values, state.Sw), append(average.Values, state.Average)
		reservoir.Values, surface.Values = append(reservoir.Values, state.Cut), append(surface.Values, f.surfaceCut(state.Cut))
		pore.Values, place.Values = append(pore.Values, state.Recovery), append(place.Values, d.OfOilInPlace(state.Recovery))
	}
	g := Grid{ID: "front.volumes", Title: "After round volumes injected", Columns: []Column{injected, outlet, average, reservoir, surface, pore}}
	if !holdsConnate(pairOf(s.st)) {
		g.Columns = append(g.Columns, place)
	}
	return g
}
