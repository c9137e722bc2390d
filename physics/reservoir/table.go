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
	clocks  []float64
	cells   []cell
	last    Outflow   // at the last of the clocks
	jumps   []float64 // clocks at which a rate jumps: arrivals of fronts
	arrival float64
	Worst   float64 // largest error seen between nodes, in the measure of the tolerance
}

// cell holds two cubics in x, the clock since its start: inflow and oil, by rising powers.
type cell struct{ in, oil [4]float64 }

// newCell joins two states by the cubics that have their values and slopes.
func newCell(a, b Outflow, h float64) cell {
	join := func(y0, y1, d0, d1 float64) [4]float64 {
		rise := (y1 - y0) / h
		return [4]float64{y0, d0, (3*rise - 2*d0 - d1) / h, (d0 + d1 - 2*rise) / (h * h)}
	}
	return cell{join(a.Injected, b.Injected, a.Rate, b.Rate), join(a.Oil, b.Oil, a.OilRate, b.OilRate)}
}

func (c *cell) at(x float64) Outflow {
	a, b := &c.in, &c.oil
	return Outflow{
		Injected: a[0] + x*(a[1]+x*(a[2]+x*a[3])), Rate: a[1] + x*(2*a[2]+x*3*a[3]),
		Oil: b[0] + x*(b[1]+x*(b[2]+x*b[3])), OilRate: b[1] + x*(2*b[2]+x*3*b[3]),
	}
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
		t.last = before.Outflow
		t.last.OilRate = 0
		if i+2 == len(stops) {
			t.clocks = append(t.clocks, before.clock)
		}
	}
}

// refine adds the cell from a to b, or its parts.
func (t *Table) refine(a, b knot, tolerance float64, depth int, at func(float64) knot) {
	if !(b.clock > a.clock) {
		return
	}
	c := newCell(a.Outflow, b.Outflow, b.clock-a.clock)
	middle := a.x + (b.x-a.x)/2
	if b.x > 4*a.x && a.x > 0 {
		middle = math.Sqrt(a.x * b.x)
	}
	off := func(k knot) float64 {
		o := c.at(k.clock - a.clock)
		return math.Max(math.Abs(o.Injected-k.Injected), math.Abs(o.Oil-k.Oil)) / math.Max(1, k.Injected)
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
	t.clocks, t.cells = append(t.clocks, a.clock), append(t.cells, c)
}

// At implements Body.
func (t *Table) At(clock float64) Outflow {
	end := t.clocks[len(t.cells)]
	if clock >= end {
		o := t.last
		o.Injected += (clock - end) * o.Rate
		return o
	}
	clock = math.Max(0, clock)
	i := numeric.Locate(t.clocks, clock)
	return t.cells[i].at(clock - t.clocks[i])
}

// Breakthrough implements Body.
func (t *Table) Breakthrough() float64 { return t.arrival }
