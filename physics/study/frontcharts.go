package study

import (
	"math"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/units"
)

func axis(label, symbol string, q units.Quantity) Axis {
	return Axis{Label: label, Symbol: symbol, Quantity: q}
}

// from pins the lower and the upper end of an axis.
func (a Axis) from(low, high float64) Axis {
	a.Min, a.Max = &low, &high
	return a
}

var saturationAxis = axis("Water saturation", "Sw", units.Fraction).from(0, 1)

func (f *front) charts(s *sheet) {
	end := math.Max(1.5, 3*f.displacement.Breakthrough())
	s.part.Charts = append(s.part.Charts, f.flowChart(s), f.profileChart(s))
	injected := injections(f.displacement, end, 1)
	history := make([]displace.State, len(injected))
	for i, q := range injected {
		history[i] = f.displacement.After(q)
	}
	s.part.Charts = append(s.part.Charts, f.recoveryChart(s, injected, history), f.cutChart(injected, history))
}

// flowChart is the fractional flow curve with the straight pieces of its envelope.
func (f *front) flowChart(s *sheet) Chart {
	c := Chart{
		ID: "front.fractionalFlow", Title: "Fractional flow and its tangent",
		X: saturationAxis, Y: axis("Water cut", "fw", units.Share).from(0, 1),
	}
	low, high := f.flow.Ends()
	flow := Line{ID: "reservoir", Label: "reservoir", Role: "water", Kind: "line", X: saturations(low, high, f.flow.Knots())}
	surface := Line{ID: "surface", Label: "surface", Role: "aid", Kind: "dashed", X: flow.X}
	for _, sw := range flow.X {
		cut, _ := f.flow.At(sw)
		flow.Y = append(flow.Y, cut)
		surface.Y = append(surface.Y, fracflow.SurfaceCut(cut, f.bw, f.bo))
	}
	c.Lines = append(c.Lines, flow, surface)
	for _, w := range f.displacement.Waves() {
		if w.Kind == fracflow.Shock && w.Behind-w.Ahead > 0.02*(f.swj-f.swi) {
			c.Lines = append(c.Lines, f.tangent(w))
		}
	}
	c.Marks = f.flowMarks(s)
	c.Summary = "Water cut against water saturation, an S-shaped curve at reservoir conditions and another at surface conditions"
	if behind, ahead, shock := f.displacement.Front(); shock {
		c.Summary += ". A straight line from Sw = " + units.Format(ahead, 3) + " touches the curve at Sw = " + units.Format(behind, 3) + ", the saturation behind the front"
	}
	c.Summary += "."
	return c
}

// tangent draws a shock as a chord, carried on to the fractional flow of the inlet.
func (f *front) tangent(w fracflow.Wave) Line {
	ahead, _ := f.flow.At(w.Ahead)
	_, inlet := f.displacement.InletFace()
	top := w.Ahead + (inlet-ahead)/w.SpeedAhead
	return Line{ID: "tangent", Label: "tangent", Role: "total", Kind: "dashed", X: []float64{w.Ahead, top}, Y: []float64{ahead, inlet}}
}

func (f *front) flowMarks(s *sheet) []Mark {
	marks := []Mark{}
	if behind, _, shock := f.displacement.Front(); shock {
		cut, _ := f.flow.At(behind)
		_, inlet := f.displacement.InletFace()
		marks = append(marks, Mark{"front", behind, cut}, Mark{"average at breakthrough", s.number("front.averageAtBreakthrough"), inlet})
	}
	return marks
}

// profileChart is saturation along the flood at a few volumes injected.
func (f *front) profileChart(s *sheet) Chart {
	bt := f.displacement.Breakthrough()
	c := Chart{
		ID: "front.profile", Title: "Saturation along the flood",
		X: axis("Distance from the injector, part of the length", "x/L", units.Number).from(0, 1), Y: saturationAxis,
		Marks:   []Mark{},
		Summary: "Water saturation from injector to producer. The front moves as a step; behind it saturation rises smoothly towards the injector. At breakthrough, after " + units.Format(bt, 3) + " PV, the step is at the producer.",
	}
	for i, at := range []struct {
		q     float64
		label string
	}{{bt / 3, ""}, {2 * bt / 3, ""}, {bt, " breakthrough"}, {2 * bt, ""}, {4 * bt, ""}} {
		x, y := f.profile(at.q)
		id := "time" + string(rune('1'+i))
		c.Lines = append(c.Lines, Line{ID: id, Label: units.Format(at.q, 3) + " PV" + at.label, Role: id, Kind: "line", X: x, Y: y})
	}
	return c
}

// profile is saturation against x/L after q pore volumes.
func (f *front) profile(q float64) (x, sw []float64) {
	d := f.displacement
	face, _ := d.InletFace()
	x, sw = []float64{0}, []float64{face}
	add := func(xi, s float64) { x, sw = append(x, xi), append(sw, s) }
	visible := finest * (f.swj - f.swi)
	for _, n := range d.Path() {
		place := n.Xi * q
		if place > 1+aside {
			break
		}
		lastX, lastS := x[len(x)-1], sw[len(sw)-1]
		if place-lastX > finest || math.Abs(n.S-lastS) > visible {
			add(math.Min(place, 1), n.S)
		}
	}
	if x[len(x)-1] < 1 {
		s := d.Saturation(1 / q)
		if d.FrontSpeed()*q < 1 {
			s = d.Initial()
			add(d.FrontSpeed()*q, s)
		}
		add(1, s)
	}
	return x, sw
}

func (f *front) recoveryChart(s *sheet, injected []float64, history []displace.State) Chart {
	c := Chart{
		ID: "front.recovery", Title: "Recovery",
		X: axis("Water injected", "Q", units.PoreVolumes), Y: axis("Recovery", "R", units.Share).from(0, 1),
		Marks: []Mark{{"breakthrough", s.number("front.breakthrough"), s.number("front.recoveryAtBreakthrough")}},
	}
	pore := make([]float64, len(history))
	place, movable := make([]float64, len(history)), make([]float64, len(history))
	for i, state := range history {
		pore[i] = state.Recovery
		place[i], movable[i] = f.displacement.OfOilInPlace(pore[i]), f.displacement.OfMovableOil(pore[i])
	}
	c.Lines = []Line{
		{ID: "pore", Label: "of the pore volume", Role: "oil", Kind: "line", X: injected, Y: pore},
		{ID: "place", Label: "of the oil in place", Role: "total", Kind: "line", X: injected, Y: place},
		{ID: "movable", Label: "of the movable oil", Role: "aid", Kind: "dashed", X: injected, Y: movable},
	}
	c.Summary = "Recovery against pore volumes of water injected: a straight rise until breakthrough, then ever slower."
	return c
}

func (f *front) cutChart(injected []float64, history []displace.State) Chart {
	c := Chart{
		ID: "front.waterCut", Title: "Water cut",
		X: axis("Water injected", "Q", units.PoreVolumes), Y: axis("Water cut", "fw", units.Share).from(0, 1),
		Marks:   []Mark{},
		Summary: "Water cut at the producer against pore volumes of water injected: it stays low until breakthrough, jumps, and then climbs slowly towards 100 %.",
	}
	reservoir, surface := make([]float64, len(history)), make([]float64, len(history))
	for i, state := range history {
		reservoir[i], surface[i] = state.Cut, fracflow.SurfaceCut(state.Cut, f.bw, f.bo)
	}
	c.Lines = []Line{
		{ID: "surface", Label: "at surface", Role: "water", Kind: "line", X: injected, Y: surface},
		{ID: "reservoir", Label: "at reservoir conditions", Role: "aid", Kind: "dashed", X: injected, Y: reservoir},
	}
	return c
}
