package study

import (
	"math"
	"strconv"

	"brinefront/physics/ref"
	"brinefront/physics/reservoir"
	"brinefront/physics/units"
)

// section is a layered section on fewer cells above one another than it has layers.
type section struct {
	layers            int          // 0: they have saturations of their own
	merged            bool         // from more rows
	arrival, recovery float64      // on all of them: pore volumes injected; of the pore volume
	onFewer           []cellsAbove // by number
	enough            int          // the least number within the tolerances
}

// cellsAbove is what a number of cells make of it, less what all layers do: of the exact arrival, and
// of the pore volume.
type cellsAbove struct {
	cells             int
	arrival, recovery float64 // errors
}

// sectioned floods the section of the study's layers, as typed, on fewer and fewer cells; nil where it has
// one layer or no answer.
func (g *grid) sectioned(m *many) *section {
	if m.run == nil || len(m.samples) < 2 {
		return nil
	}
	if m.own { // every merged layer would need a front of its own
		return &section{}
	}
	body := m.bundle[0].Body
	if len(m.layers) == 1 { // lumped to one, whose exact answer takes long
		m.layers = m.samples
		body = m.filling(m.body(reservoir.NewFlood(g.front.flow, g.front.displacement)))
	}
	flood := func(layers []reservoir.Sample) (arrival, recovery float64, ok bool) {
		var b reservoir.Bundle
		for _, l := range layers {
			b = append(b, reservoir.Member{Body: body, PoreVolume: l.Porosity * l.Thickness * m.area, Pace: l.Permeability / (l.Porosity * m.length * m.length)})
		}
		at, ok := b.Arrival(g.level, reservoir.Clock(b, furthest, 0))
		return b.At(at).Injected, b.At(reservoir.Clock(b, g.tolerance.At, 0)).Oil, ok
	}
	full := reservoir.Lumped(m.samples, min(len(m.samples), MaxLayers))
	s := &section{layers: len(full), merged: len(full) < len(m.samples)}
	var ok bool
	if s.arrival, s.recovery, ok = flood(full); !ok {
		return nil
	}
	on := func(n int) bool {
		a, r, ok := flood(reservoir.Lumped(full, n))
		c := cellsAbove{n, a/s.arrival - 1, r - s.recovery}
		within := ok && math.Abs(c.arrival) <= g.tolerance.Arrival && math.Abs(c.recovery) <= g.tolerance.Recovery
		if within && (s.enough == 0 || n < s.enough) {
			s.enough = n
		}
		if ok {
			s.onFewer = append(s.onFewer, c)
		}
		return within
	}
	last, met := 0, false
	for n, next := 1, 2; ; n, next = next, n+next { // 1, 2, 3, 5, 8, ...
		n = min(n, len(full))
		if !met {
			for k := last + 1; k < n && !met; k++ {
				met = on(k)
			}
		}
		met = on(n) || met
		if last = n; n == len(full) {
			return s
		}
	}
}

func (x *section) tell(s *sheet, g *grid) {
	if len(x.onFewer) == 0 {
		s.note(Note{ID: "grid.layersOwn", Level: "remark", Text: "The number of cells above one another is not told for layers with saturations of their own.",
			Cause: "Merged layers would each have a front of their own.", Do: "Leave the columns of saturations out to see what permeability asks for.", Paths: []string{layerTable.path}})
		return
	}
	z := units.Format(g.tolerance.At, 4) + " PV"
	method := "The layers, without crossflow, on fewer cells: in the order of the ground those two neighbours are merged, again and again, that differ least in k/φ, weighed by pore volume (own); thickness, flow capacity and pore volume are kept. Beside all " + strconv.Itoa(x.layers) + " layers, each flooded exactly."
	if x.merged {
		method += " More rows than that were merged in the same way first."
	}
	add := func(id, label, symbol string, v float64, q units.Quantity, more string) {
		s.figure(Figure{ID: "grid." + id, Label: label, Symbol: symbol, Value: v, Quantity: q},
			s.by("", method+more, ref.DykstraParsons1950).rests(layerTable.path).rests(typedOf(s.st, toleranceInputs...)...).on("front.breakthrough"))
	}
	errors := func(id, whose string, c cellsAbove) {
		a, late := wrong(c.arrival, "late", "early")
		r, high := wrong(c.recovery, "high", "low")
		add(id+"Arrival", whose+", water arrives "+late+" by", "ea,z", a, units.Share, " Of the arrival on all layers, by the cut of arrival.")
		add(id+"Recovery", whose+", recovery too "+high+" by", "er,z", r, units.Share, " Of the pore volume, after "+z+".")
	}
	if c := x.onFewer[0]; c.cells == 1 {
		errors("oneLayer", "All layers as one cell", c)
	}
	add("layers", "Cells above one another", "Nz", float64(x.enough), units.Number, " The least number within the tolerances of arrival and recovery.")
	n := Column{Label: "Cells above one another", Symbol: "Nz", Quantity: units.Number}
	arrival := Column{Label: "Arrival, error", Quantity: units.Share}
	recovery := Column{Label: "Recovery, error, of the pore volume", Quantity: units.Share}
	var cells []int
	for _, c := range x.onFewer {
		if c.cells == x.enough && c.cells > 1 {
			errors("layers", "On "+strconv.Itoa(c.cells)+" cells above one another", c)
		}
		cells = append(cells, c.cells)
		n.Values, arrival.Values, recovery.Values = append(n.Values, float64(c.cells)), append(arrival.Values, c.arrival), append(recovery.Values, c.recovery)
	}
	s.part.Tables = append(s.part.Tables, Grid{ID: "grid.layerErrors", Title: "Layers lumped into fewer cells above one another", Columns: []Column{n, arrival, recovery}})
	s.part.Charts = append(s.part.Charts, errorsOn("grid.layerErrors", "Error against the number of cells above one another", "Cells above one another", cells,
		"Errors of arrival and of recovery against the number of cells that the layers are lumped into; with as many as there are layers they are none.",
		measuredError{"arrival", "arrival", "water", arrival.Values, g.tolerance.Arrival}, measuredError{"recovery", "recovery", "oil", recovery.Values, g.tolerance.Recovery}))
	s.note(Note{ID: "grid.layersLimits", Level: "remark", Text: "The number of cells above one another is for this section, with layers that go through from well to well and no crossflow between them.",
		Cause: "Merged layers flow as one by the mean of their flow capacity: what differs inside a cell is lost. With crossflow, gravity and viscous forces share fluids between cells, and the number is another. It is counted apart from the smearing along the layers, which adds to it.",
		Do:    "Take it as the least where shales part the layers; compare a fine and a coarse cross section where they do not.", Paths: []string{"field.layers.crossflow"}})
}
