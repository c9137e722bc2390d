package reservoir

import (
	"math"
	"slices"

	"brinefront/physics/numeric"
)

// Table is a body whose answers were worked out once: cubics in the clock for the volume
// injected and the oil produced, exact in value and slope at their nodes. Rates are the
// slopes of those cubics, so that what has flowed is always the integral of what flows.
// Beyond its last node water alone flows, at the last rate.
type Table struct {
	clocks       []float64
	inflow, oils []numeric.Cell
	jumps        []float64 // clocks at which a rate jumps: arrivals of fronts
	arrival      float64
	Worst        float64 // largest error seen between nodes, as a part of the tolerance's measure
}

var _ Body = (*Table)(nil)

// furthest is the last node of a tabulated path, pore volumes.
const furthest = 1e5

// Tabulate works a path out, halving cells until the cubics meet the exact solution within
// tolerance a quarter, a half and three quarters of the way. Errors are in pore volumes, or
// as a part of the volume injected where that is more. Cells never straddle an arrival.
func (p Path) Tabulate(tolerance float64) *Table {
	stops, jumps := p.Flood.stops()
	t := &Table{arrival: p.Breakthrough()}
	for _, q := range jumps {
		t.jumps = append(t.jumps, p.Clock(q))
	}
	t.fill(stops, tolerance, func(q float64) (float64, Outflow) {
		s := p.after(q)
		return s.t, s.Outflow
	})
	return t
}

// table has T over the initial 1/lt for the volume injected, and Q for the clock.
func (f *Flood) table(tolerance float64) *Table {
	stops, _ := f.stops()
	t := &Table{arrival: f.Displacement.Breakthrough()}
	t.fill(stops, tolerance, func(q float64) (float64, Outflow) {
		r, spent, oil, share := f.at(q)
		return q, Outflow{Injected: spent / f.resistance.ahead, Rate: r / f.resistance.ahead, Oil: oil, OilRate: share}
	})
	return t
}

// stops are the volumes at which one wave ends or another begins, and those at which a
// front arrives, so that the cut jumps.
func (f *Flood) stops() (stops, jumps []float64) {
	stops = []float64{0}
	nodes := f.Displacement.Path()
	for i := len(nodes) - 1; i >= 0 && nodes[i].Xi > 1/furthest; i-- {
		q, outermost := 1/nodes[i].Xi, i == len(nodes)-1
		jump := i > 0 && nodes[i-1].Xi == nodes[i].Xi
		if jump {
			jumps = append(jumps, q)
		}
		if jump || outermost || i > 0 && nodes[i-1].S == nodes[i].S || nodes[i+1].S == nodes[i].S {
			stops = append(stops, q)
		}
	}
	return append(stops, furthest), jumps
}

// Tabulate works a bundle out as one body; see Path.Tabulate. Members must be tables.
// What is left out at most is what flows after the last of the given clock.
func (b Bundle) Tabulate(tolerance, last float64) *Table {
	t := &Table{arrival: b.Breakthrough()}
	for _, m := range b {
		for _, jump := range m.Body.(*Table).jumps {
			if x := jump / m.Pace; x < last {
				t.jumps = append(t.jumps, x)
			}
		}
	}
	slices.Sort(t.jumps)
	t.jumps = slices.Compact(t.jumps)
	t.fill(append(append([]float64{0}, t.jumps...), last), tolerance, func(x float64) (float64, Outflow) { return x, b.At(x) })
	return t
}

// knot is the exact state where the parameter of the work is x.
type knot struct {
	x, clock float64
	Outflow
}

// fill makes the cells between stops, at which rates may jump.
func (t *Table) fill(stops []float64, tolerance float64, exact func(float64) (float64, Outflow)) {
	at := func(x float64) knot {
		clock, o := exact(x)
		return knot{x, clock, o}
	}
	for i, end := range stops[1:] {
		if end <= stops[i] {
			continue
		}
		start, before := at(stops[i]), at(end)
		_, just := exact(end * (1 - 0x1p-50)) // on this side of a jump
		before.Rate, before.OilRate = just.Rate, just.OilRate
		t.refine(start, before, tolerance, 24, at)
	}
	t.clocks = append(t.clocks, t.inflow[len(t.inflow)-1].X1)
}

// refine adds the cell from a to b, or its parts.
func (t *Table) refine(a, b knot, tolerance float64, depth int, at func(float64) knot) {
	in := numeric.Cell{X0: a.clock, X1: b.clock, Y0: a.Injected, Y1: b.Injected, D0: a.Rate, D1: b.Rate}
	oil := numeric.Cell{X0: a.clock, X1: b.clock, Y0: a.Oil, Y1: b.Oil, D0: a.OilRate, D1: b.OilRate}
	if !(in.X1 > in.X0) {
		return
	}
	middle := a.x + (b.x-a.x)/2
	if b.x > 4*a.x && a.x > 0 {
		middle = math.Sqrt(a.x * b.x)
	}
	off := func(k knot) float64 {
		q, _ := in.Cubic(k.clock)
		n, _ := oil.Cubic(k.clock)
		return math.Max(math.Abs(q-k.Injected), math.Abs(n-k.Oil)) / math.Max(1, k.Injected)
	}
	half := at(middle)
	worst := off(half)
	if worst <= tolerance {
		worst = math.Max(worst, math.Max(off(at(a.x+(middle-a.x)/2)), off(at(middle+(b.x-middle)/2))))
	}
	if worst > tolerance && depth > 0 {
		t.refine(a, half, tolerance, depth-1, at)
		t.refine(half, b, tolerance, depth-1, at)
		return
	}
	t.Worst = math.Max(t.Worst, worst)
	t.clocks = append(t.clocks, in.X0)
	t.inflow, t.oils = append(t.inflow, in), append(t.oils, oil)
}

// At implements Body.
func (t *Table) At(clock float64) Outflow {
	last := len(t.clocks) - 1
	if clock >= t.clocks[last] {
		end := t.inflow[last-1]
		return Outflow{Injected: end.Y1 + (clock-end.X1)*end.D1, Oil: t.oils[last-1].Y1, Rate: end.D1}
	}
	i := numeric.Locate(t.clocks, clock)
	var o Outflow
	clock = math.Max(0, clock)
	o.Injected, o.Rate = t.inflow[i].Cubic(clock)
	o.Oil, o.OilRate = t.oils[i].Cubic(clock)
	return o
}

// Breakthrough implements Body.
func (t *Table) Breakthrough() float64 { return t.arrival }
