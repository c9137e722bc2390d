package study

import (
	"math"
	"slices"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/numeric"
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
	waves := f.waveChart(end)
	s.part.Charts = append(s.part.Charts, f.flowChart(s), f.profileChart(end), waves)
	if f.linear != nil {
		s.part.Charts = append(s.part.Charts, f.waveTimes(waves))
	}
	injected := injections(f.displacement, end, 1)
	history := make([]displace.State, len(injected))
	for i, q := range injected {
		history[i] = f.displacement.After(q)
	}
	s.part.Charts = append(s.part.Charts, f.recoveryChart(s, injected, history), f.cutChart(injected, history))
}

// holding widens an axis of water cut, from 0 to 1 as a rule, where a phase flows back.
func (a Axis) holding(lines []Line) Axis {
	low, high := *a.Min, *a.Max
	for _, l := range lines {
		for _, y := range l.Y {
			low, high = math.Min(low, y), math.Max(high, y)
		}
	}
	return a.from(low, high)
}

// flowChart is the fractional flow curve with the straight pieces of its envelope.
func (f *front) flowChart(s *sheet) Chart {
	c := Chart{ID: "front.fractionalFlow", Title: "Fractional flow and its tangent", X: saturationAxis, Y: axis("Water cut", "fw", units.Share).from(0, 1)}
	low, high := f.flow.Ends()
	flow := Line{ID: "reservoir", Label: "reservoir", Role: "water", Kind: "line", X: saturations(low, high, f.flow.Knots())}
	surface := Line{ID: "surface", Label: "surface", Role: "aid", Kind: "dashed", X: flow.X}
	for _, sw := range flow.X {
		cut, _ := f.flow.At(sw)
		flow.Y = append(flow.Y, cut)
		surface.Y = append(surface.Y, f.surfaceCut(cut))
	}
	flow.Readings = f.readings(flow.X)
	c.Lines = append(c.Lines, flow, surface)
	c.Y = c.Y.holding(c.Lines)
	back := f.backLine(flow)
	if len(back.X) > 1 {
		c.Lines = append(c.Lines, back)
	}
	for _, w := range f.displacement.Waves() {
		if w.Kind == fracflow.Shock && w.SpeedAhead > 0 && w.Behind-w.Ahead > visibleStep*(f.swj-f.swi) {
			c.Lines = append(c.Lines, f.tangent(w))
		}
	}
	c.Marks = f.flowMarks(s)
	c.Summary = "Water cut against water saturation at reservoir and at surface conditions"
	if behind, ahead, shock := f.displacement.Front(); shock {
		c.Summary += ". A straight line from Sw = " + units.Format(ahead, 3) + " meets the curve at Sw = " + units.Format(behind, 3) + ", the saturation behind the front"
	}
	if len(back.X) > 1 {
		c.Summary += ". Between Sw = " + units.Format(back.X[0], 3) + " and " + units.Format(back.X[len(back.X)-1], 3) + " the curve leaves the range from 0 to 100 %: " + back.Label
	}
	c.Summary += "."
	return c
}

// backLine is the stretch of the curve on which one phase flows back. Gravity drives
// one phase only, and kr rises or falls with saturation, so that there is one stretch.
func (f *front) backLine(flow Line) Line {
	back := Line{ID: "back", Role: "aid", Kind: "dashed"}
	if f.dip == nil {
		return back
	}
	limit, sign := 0.0, -1.0
	back.Label = "water " + f.backward(0)
	if f.dip.gravity < 0 {
		limit, sign = 1, 1
		back.Label = "oil " + f.backward(1)
	}
	beyond := func(i int) bool { return sign*(flow.Y[i]-limit) > 0 }
	for i := range flow.X {
		if i > 0 && beyond(i) != beyond(i-1) {
			cross := numeric.Zero(func(sw float64) float64 { cut, _ := f.flow.At(sw); return cut - limit }, flow.X[i-1], flow.X[i], flow.Y[i-1]-limit, flow.Y[i]-limit)
			back.X, back.Y = append(back.X, cross), append(back.Y, limit)
		}
		if beyond(i) && (len(back.X) == 0 || flow.X[i] > back.X[len(back.X)-1]) {
			back.X, back.Y = append(back.X, flow.X[i]), append(back.Y, flow.Y[i])
		}
	}
	return back
}

// backward says how a phase flows back, by whether it is the heavier one.
func (f *front) backward(phase int) string {
	if f.dip.rho[phase] > f.dip.rho[1-phase] {
		return "falls back"
	}
	return "rises back"
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

// profileChart is saturation along the flood, for any volume injected: a state of speed
// v is at v Q.
func (f *front) profileChart(end float64) Chart {
	bt := f.displacement.Breakthrough()
	speed, sw := f.profile()
	x, _ := f.profileAtBreakthrough()
	return Chart{
		ID: "front.profile", Title: "Saturation along the flood",
		X: axis("Distance from the injector, part of the length", "x/L", units.Number).from(0, 1), Y: saturationAxis,
		Marks: []Mark{},
		Lines: []Line{
			{ID: "profile", Label: "saturation", Role: "water", Kind: "line", X: speed, Y: sw, Moving: true},
			{ID: "breakthrough", Label: "at breakthrough", Role: "aid", Kind: "dashed", X: x, Y: sw},
		},
		Slider: &Slider{
			Label: "Injected", Symbol: "Q", Quantity: units.PoreVolumes, Min: 0, Max: end, Value: bt / 2,
			Marks: []Mark{{Label: "breakthrough", X: bt}},
		},
		Summary: "Water saturation from injector to producer after a volume injected that the reader moves. Steps keep their height, what lies between them spreads; at breakthrough, after " + units.Format(bt, 3) + " PV, the front is at the producer.",
	}
}

// profileAtBreakthrough is saturation against x/L when the front is at the producer.
func (f *front) profileAtBreakthrough() (x, sw []float64) {
	speed, sw := f.profile()
	for _, v := range speed {
		x = append(x, math.Min(1, v*f.displacement.Breakthrough()))
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
		{ID: "movable", Label: "of the movable oil", Role: "aid", Kind: "dashed", X: injected, Y: movable},
	}
	if !holdsConnate(pairOf(s.st)) {
		c.Lines = slices.Insert(c.Lines, 1, Line{ID: "place", Label: "of the oil in place", Role: "total", Kind: "line", X: injected, Y: place})
	}
	c.Summary = "Recovery against pore volumes of water injected: a straight rise until breakthrough, then ever slower."
	return c
}

func (f *front) cutChart(injected []float64, history []displace.State) Chart {
	c := Chart{
		ID: "front.waterCut", Title: "Water cut",
		X: axis("Water injected", "Q", units.PoreVolumes), Y: axis("Water cut", "fw", units.Share).from(0, 1),
		Marks:   []Mark{},
		Summary: "Water cut at the producer against pore volumes of water injected: level until breakthrough; every step is a jump, every spreading wave a climb.",
	}
	reservoir, surface := make([]float64, len(history)), make([]float64, len(history))
	for i, state := range history {
		reservoir[i], surface[i] = state.Cut, f.surfaceCut(state.Cut)
	}
	c.Lines = []Line{
		{ID: "surface", Label: "at surface", Role: "water", Kind: "line", X: injected, Y: surface},
		{ID: "reservoir", Label: "at reservoir conditions", Role: "aid", Kind: "dashed", X: injected, Y: reservoir},
	}
	c.Y = c.Y.holding(c.Lines)
	return c
}
