package study

import (
	"math"
	"slices"

	"brinefront/physics/reservoir"
	"brinefront/physics/units"
)

// limits tell the two piston-like limits in the moments in which each layer is the latest
// to be flooded through, the fastest first: fronts that keep to their first ratio of speeds
// (Stiles 1949) and fronts that go as their resistance lets them (Dykstra & Parsons 1950).
// Where layers differ in mobility ahead of the front there is no one ratio for Stiles.
func (m *many) limits(pistons reservoir.Bundle, strata []reservoir.Stratum) {
	first := pistons[0].Body.(reservoir.Piston)
	var clocks []float64
	movable, pores := 0.0, pistons.PoreVolume()
	for _, p := range pistons {
		body := p.Body.(reservoir.Piston)
		if math.Abs(body.Oil-first.Oil) > alike*first.Oil {
			return
		}
		movable += body.Change * p.PoreVolume / pores
		clocks = append(clocks, body.Breakthrough()/p.Pace)
	}
	slices.Sort(clocks)
	ordinal := Column{Label: "Layers flooded through", Quantity: units.Number}
	swept := Column{Label: "Swept, Dykstra and Parsons", Symbol: "E", Quantity: units.Share}
	cut := Column{Label: "Water cut, reservoir, Dykstra and Parsons", Symbol: "fw", Quantity: units.Share}
	for i, clock := range clocks {
		o := pistons.At(clock * (1 + 1e-12)) // just after
		ordinal.Values = append(ordinal.Values, float64(i+1))
		swept.Values, cut.Values = append(swept.Values, math.Min(1, o.Oil/movable)), append(cut.Values, o.Cut())
	}
	coverage, yield := reservoir.Stiles(strata, first.Water/first.Oil)
	m.limiting = Grid{ID: "field.pistons", Title: "Piston-like limits without crossflow, as each layer is flooded through (Dykstra & Parsons 1950; Stiles 1949)", Columns: []Column{ordinal, swept, cut,
		{Label: "Swept, Stiles", Symbol: "E", Quantity: units.Share, Values: coverage}, {Label: "Water cut, reservoir, Stiles", Symbol: "fw", Quantity: units.Share, Values: yield}}}
}
