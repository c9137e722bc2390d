package study

import (
	"math"
	"slices"

	"brinefront/physics/fracflow"
	"brinefront/physics/reservoir"
	"brinefront/physics/units"
)

// arrivals are columns of when speeds reach the producer: in pore volumes injected and,
// where the field is given, in time.
type arrivals struct {
	linear       *reservoir.Linear
	volume, time Column
}

func (f *front) arrivals(label string) *arrivals {
	return &arrivals{
		linear: f.linear,
		volume: Column{Label: label + ", injected", Symbol: "Q", Quantity: units.PoreVolumes},
		time:   Column{Label: label + ", time", Symbol: "t", Quantity: units.Duration},
	}
}

// add puts one speed in; what does not move ahead never arrives.
func (a *arrivals) add(speed float64) {
	volume, time := 0.0, 0.0
	word := "never"
	if speed > 0 && !math.IsInf(1/speed, 1) {
		volume, word = 1/speed, ""
		if a.linear != nil {
			time = a.linear.TimeAt(volume)
		}
	}
	a.volume.Values, a.volume.Words = append(a.volume.Values, volume), append(a.volume.Words, word)
	a.time.Values, a.time.Words = append(a.time.Values, time), append(a.time.Words, word)
}

func (a *arrivals) columns() []Column {
	if a.linear == nil {
		return []Column{numbersOnly(a.volume)}
	}
	return []Column{numbersOnly(a.volume), numbersOnly(a.time)}
}

// numbersOnly leaves out the words of a column that has none.
func numbersOnly(c Column) Column {
	if !slices.ContainsFunc(c.Words, func(word string) bool { return word != "" }) {
		c.Words = nil
	}
	return c
}

// readings tell, of any saturation on the fractional flow curve, how it travels.
func (f *front) readings(saturations []float64) []Column {
	slope := Column{Label: "Slope of the curve", Symbol: "dfw/dSw", Quantity: units.Number}
	speed := Column{Label: "Speed", Symbol: "v", Quantity: units.Number}
	wave := Column{Label: "How it travels", Quantity: units.Number}
	arrives := f.arrivals("Arrives")
	waves := f.displacement.Waves()
	i := len(waves) - 1 // waves run from high saturation to low, saturations rise
	for _, sw := range saturations {
		_, df := f.flow.At(sw)
		slope.Values = append(slope.Values, df)
		for i > 0 && sw > waves[i].Behind {
			i--
		}
		v, how := waves[i].SpeedAhead, kindOf(waves[i])
		switch {
		case sw < f.swi || sw > f.swj:
			v, how = 0, "not met"
		case waves[i].Kind == fracflow.Fan:
			v = math.Max(waves[i].SpeedBehind, math.Min(waves[i].SpeedAhead, df))
		}
		word := ""
		if how == "not met" {
			word = "none"
		}
		speed.Values, speed.Words = append(speed.Values, v), append(speed.Words, word)
		wave.Words = append(wave.Words, how)
		wave.Values = append(wave.Values, 0)
		arrives.add(v)
	}
	return append([]Column{slope, numbersOnly(speed)}, append(arrives.columns(), wave)...)
}

// waveChart is the wave diagram: where every step, and a few states of every spreading
// wave, have come to after a volume injected.
func (f *front) waveChart(end float64) Chart {
	c := Chart{
		ID: "front.waveDiagram", Title: "Waves on their way to the producer",
		X: axis("Distance from the injector, part of the length", "x/L", units.Number).from(0, 1), Y: axis("Water injected", "Q", units.PoreVolumes).from(0, end),
		Marks:   []Mark{{"breakthrough", 1, f.displacement.Breakthrough()}},
		Summary: "Distance against pore volumes injected. Every step is a full line from the injector outwards, every spreading wave a few dashed lines, one for each of its states; the flattest line arrives first, after " + units.Format(f.displacement.Breakthrough(), 3) + " PV.",
	}
	for _, w := range f.steps() {
		c.Lines = append(c.Lines, ray("step"+units.Format(float64(len(c.Lines)+1), 3), "Sw "+units.Format(w.Ahead, 3)+" to "+units.Format(w.Behind, 3), "total", "line", w.SpeedAhead, end))
	}
	for _, n := range f.characteristics() {
		c.Lines = append(c.Lines, ray("state"+units.Format(float64(len(c.Lines)+1), 3), "Sw "+units.Format(n.sw, 3), "water", "dashed", n.speed, end))
	}
	return c
}

// waveTimes is the wave diagram in time, where the field is given: at a constant rate
// the same picture in other units, at a constant pressure difference ways that bend as
// the resistance changes.
func (f *front) waveTimes(volumes Chart) Chart {
	const steps = 24
	c := volumes
	c.ID, c.Title = "front.waveTimes", "Waves in time"
	c.Y = axis("Time since injection began", "t", units.Duration).from(0, f.linear.TimeAt(*volumes.Y.Max))
	c.Marks = []Mark{{"breakthrough", 1, f.linear.TimeAt(f.displacement.Breakthrough())}}
	c.Summary = "The same waves against time: distance from the injector, and when each step and each state comes there."
	c.Lines = slices.Clone(volumes.Lines)
	for i, l := range volumes.Lines {
		x, q := l.X[len(l.X)-1], l.Y[len(l.Y)-1]
		l.X, l.Y = make([]float64, steps+1), make([]float64, steps+1)
		for j := range steps + 1 {
			part := float64(j) / steps
			l.X[j], l.Y[j] = part*x, f.linear.TimeAt(part*q)
		}
		c.Lines[i] = l
	}
	return c
}

// ray is the way of a speed: to the producer, or as far as it comes by the end.
func ray(id, label, role, kind string, speed, end float64) Line {
	x, q := 1.0, 1/speed
	if q > end {
		x, q = speed*end, end
	}
	return Line{ID: id, Label: label, Role: role, Kind: kind, X: []float64{0, x}, Y: []float64{0, q}}
}

type characteristic struct{ sw, speed float64 }

// characteristics are states of the spreading waves, spread evenly over the angle at
// which they are drawn, with the two ends of every wave that can be seen.
func (f *front) characteristics() []characteristic {
	const rays = 10
	var list []characteristic
	foremost := f.displacement.FrontSpeed()
	steps := f.steps()
	drawn := func(v float64) bool { // as a step: the state at its edge travels with it
		return slices.ContainsFunc(steps, func(step fracflow.Wave) bool { return step.SpeedAhead == v })
	}
	for _, w := range f.displacement.Waves() {
		if w.Kind != fracflow.Fan || w.SpeedAhead <= 0 || math.Abs(w.Behind-w.Ahead) <= visibleStep*(f.swj-f.swi) {
			continue
		}
		low, high := math.Max(0, w.SpeedBehind)/foremost, w.SpeedAhead/foremost
		between := math.Max(1, math.Round(rays*(high-low)))
		for i := range int(between) + 1 {
			v := foremost * (low + (high-low)*float64(i)/between)
			if v > 1e-3*foremost && !drawn(v) {
				list = append(list, characteristic{f.displacement.Saturation(v), v})
			}
		}
	}
	return list
}
