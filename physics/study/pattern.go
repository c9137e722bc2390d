package study

import (
	"math"

	"brinefront/physics/pattern"
	"brinefront/physics/reservoir"
	"brinefront/physics/units"
)

// repeated is a field of repeated wells.
type repeated struct {
	*pattern.Geometry
	unitBreakthrough float64 // areal sweep at breakthrough, piston-like at unit mobility
	bores            pattern.Bores
	tubes            reservoir.Streamtubes // under the layers apart
}

// tubeTolerance is how near the answers of streamtubes come to those of their stations,
// pore volumes.
const tubeTolerance = 2e-4

// cut is a pattern that a Memory keeps.
type cut struct {
	shape pattern.Shape
	tubes int
}

// pattern cuts a pattern into streamtubes, or remembers that it did.
func (m *Memory) pattern(shape pattern.Shape, tubes int) (repeated, error) {
	if m != nil {
		if r, ok := m.patterns[cut{shape, tubes}]; ok {
			return r, nil
		}
	}
	g, err := pattern.New(shape, tubes)
	if err != nil {
		return repeated{}, err
	}
	r := repeated{Geometry: g, unitBreakthrough: g.Breakthrough()}
	if m != nil {
		const most = 8
		if m.patterns == nil || len(m.patterns) >= most {
			m.patterns = map[cut]repeated{}
		}
		m.patterns[cut{shape, tubes}] = r
	}
	return r, nil
}

// radius is that of the wells of a pattern.
func (m *many) radius() float64 {
	const usual = 0.1 // common practice, no source; told as the default of the input
	return m.or("field.wells.radius", usual)
}

// readPattern reads the wells of a pattern; nil while something is wanting.
func (m *many) readPattern() *repeated {
	kind, hubProduces := patternKind(m.st)
	m.length = m.need("field.pattern.spacing")
	shape := pattern.Shape{Kind: kind}
	switch {
	case lineDrive(m.st):
		a := m.need("field.pattern.row")
		shape.Ratio = m.length / a
		if shape.Ratio < pattern.LeastRatio || shape.Ratio > pattern.MostRatio {
			m.problem("field.pattern.row", m.typed("field.pattern.row"), "between a tenth and four times the distance of the rows")
		}
	case nineSpot(m.st):
		shape.Ratio = m.or("field.pattern.corner", 1)
	}
	tubes := math.Round(m.or("field.pattern.tubes", usualTubes))
	if m.standing() != Ready {
		return nil
	}
	r, err := m.memory.pattern(shape, int(tubes))
	if err != nil {
		panic("study: " + err.Error()) // its inputs were looked at
	}
	if hubProduces {
		r.Geometry = r.Reverse()
	}
	r.bores = pattern.Bores{Radius: m.radius() / m.length, Injector: m.or("field.wells.injectorSkin", 0), Producer: m.or("field.wells.producerSkin", 0)}
	if kind == pattern.Radial {
		r.bores.Producer = 0
	}
	most := pattern.MostRadius
	if lineDrive(m.st) {
		most *= math.Min(1, 1/shape.Ratio)
	}
	if r.bores.Effective() > most {
		m.problem("field.pattern.spacing", m.typed("field.pattern.spacing"), "at least ten times the effective radius of the wells, rw exp(−s)")
		return nil
	}
	m.area = r.Area * m.length * m.length
	return &r
}

// flooded is the pattern under a flood.
func (r *repeated) flooded(flood *reservoir.Flood) reservoir.Streamtubes {
	return reservoir.NewStreamtubes(r.Geometry, r.bores, flood, tubeTolerance)
}

// ground names the inputs that the size of the block or of the pattern rests on.
func (m *many) ground() []string {
	if m.pattern == nil {
		return []string{"field.length", "field.width"}
	}
	paths := []string{"field.pattern.spacing", "field.wells.radius"}
	switch {
	case lineDrive(m.st):
		paths = append(paths, "field.pattern.row")
	case nineSpot(m.st):
		paths = append(paths, "field.pattern.corner")
	}
	return append(paths, "field.pattern.tubes")
}

// craigRatio is the mobility ratio of the experiments: of water at its average behind the
// front over oil ahead of it.
func (f *front) craigRatio() float64 {
	behind := f.flow.Curves.At(f.displacement.Average(f.displacement.Breakthrough()))
	ahead := f.flow.Curves.At(f.swi)
	return behind.Krw / f.flow.MuW / (ahead.Kro / f.flow.MuO)
}

// The fit of the five-spot's areal sweep at breakthrough, and its range of mobility ratio.
const leastCraig, mostCraig = 0.2, 10

func craigSweep(ratio float64) float64 {
	return 0.54602036 + 0.03170817/ratio + 0.30222997*math.Exp(-ratio) - 0.00509693*ratio
}

// measured are the constants of a fit to areal sweep seen by X-rays, with fw the share of
// water produced and M the mobility ratio:
//
//	(1 - E)/E = [a1 ln(M + a2) + a3] fw + a4 ln(M + a5) + a6
//
// for line drives with d/a = 1. Source: Fassihi (1986).
var measured = map[pattern.Kind][6]float64{
	pattern.FiveSpot:  {-0.2062, -0.0712, -0.511, 0.3048, 0.123, 0.4394},
	pattern.Direct:    {-0.3014, -0.1568, -0.9402, 0.3714, -0.0865, 0.8805},
	pattern.Staggered: {-0.2077, -0.1059, -0.3526, 0.2608, 0.2444, 0.3158},
}

// measuredSweep is E when water arrives.
func measuredSweep(kind pattern.Kind, ratio float64) float64 {
	a := measured[kind]
	return 1 / (1 + a[3]*math.Log(ratio+a[4]) + a[5])
}

// craigAfter is how areal sweep grows after breakthrough in the same experiments.
func craigAfter(atBreakthrough, injected float64) float64 {
	return math.Min(1, atBreakthrough+0.2749*math.Log(injected))
}

// mapped is a place in the pattern as the picture has it: rows of a drive upright, so that
// the flood goes to the right.
func (r *repeated) mapped(z complex128, d float64) (x, y float64) {
	if r.Kind == pattern.SevenSpot || r.Kind == pattern.NineSpot {
		return real(z) * d, imag(z) * d
	}
	return imag(z) * d, real(z) * d
}

// sweepChart is areal sweep against the volume injected into one layer, with what it is
// compared with.
func (m *many) sweepChart(end float64) Chart {
	const points = 80
	r := m.pattern
	speed := m.front.displacement.FrontSpeed()
	actual := Line{ID: "tubes", Label: "forecast", Role: "water", Kind: "line"}
	unit := Line{ID: "unit", Label: "unit mobility", Role: "aid", Kind: "dashed"}
	for i := range points + 1 {
		q := end * float64(i) / points
		actual.X, actual.Y = append(actual.X, q), append(actual.Y, r.tubes.Swept(reservoir.Clock(r.tubes, q, 0)))
		sum, whole := 0.0, 0.0
		for _, t := range r.Tubes {
			sum += math.Min(t.Area, t.Flow*q*speed)
			whole += t.Area
		}
		unit.X, unit.Y = append(unit.X, q), append(unit.Y, sum/whole)
	}
	c := Chart{ID: "field.sweep", Title: "Areal sweep", X: axis("Injected into a layer", "Q", units.PoreVolumes).from(0, end), Y: axis("Areal sweep", "Ea", units.Share).from(0, 1),
		Lines: []Line{actual, unit}, Marks: []Mark{},
		Summary: "Areal sweep of the pattern against the volume injected, as forecast and at unit mobility: straight until water arrives, slower after it."}
	if first := m.number("field.sweepCraig"); !math.IsNaN(first) {
		l := Line{ID: "correlated", Label: "experiments", Role: "oil", Kind: "dashed", X: []float64{0}, Y: []float64{0}}
		bt := first / speed
		for i := range points + 1 {
			if q := bt + (end-bt)*float64(i)/points; end > bt {
				l.X, l.Y = append(l.X, q), append(l.Y, craigAfter(first, q/bt))
			}
		}
		if len(l.X) > 1 {
			c.Lines = append(c.Lines, l)
		}
	}
	return c
}

// mapChart is the map of streamtubes, with the front as the reader moves it.
func (m *many) mapChart(end float64) Chart {
	r := m.pattern
	const drawn, bends, stages = 12, 24, 24
	width, height := 0.0, 0.0
	outline := Line{ID: "outline", Label: "part of the pattern", Role: "total", Kind: "line"}
	for i := range len(r.Outline) + 1 {
		x, y := r.mapped(r.Outline[i%len(r.Outline)], m.length)
		outline.X, outline.Y = append(outline.X, x), append(outline.Y, y)
		width, height = math.Max(width, x), math.Max(height, y)
	}
	// There and back along each tube, so that one line draws them all.
	tubes := Line{ID: "tubes", Label: "streamlines", Role: "aid", Kind: "line"}
	every := int(math.Ceil(float64(len(r.Tubes)) / drawn))
	for i := every / 2; i < len(r.Tubes); i += every {
		for k := range 2*bends + 1 {
			swept := (1 - math.Cos(math.Pi*float64(k)/bends)) / 2 // even steps of length: near a well the share swept goes with their square
			x, y := r.mapped(r.Front(r.Tubes[i], swept), m.length)
			tubes.X, tubes.Y = append(tubes.X, x), append(tubes.Y, y)
		}
	}
	front := Line{ID: "front", Label: "front", Role: "water", Kind: "line"}
	for n := range stages + 1 {
		q := end * float64(n) / stages
		front.Stages = append(front.Stages, q)
		clock := reservoir.Clock(r.tubes, q, 0)
		for i, t := range r.Tubes {
			x, y := r.mapped(r.Front(t, r.tubes.Front(i, clock)), m.length)
			front.X, front.Y = append(front.X, x), append(front.Y, y)
		}
	}
	bt := r.tubes.At(r.tubes.Breakthrough()).Injected
	c := Chart{ID: "field.map", Title: "Front in the pattern", Map: true,
		X: axis("Along the flood", "x", units.Length).from(0, width), Y: axis("Across it", "y", units.Length).from(0, height),
		Lines: []Line{outline, tubes, front}, Marks: []Mark{},
		Slider:  &Slider{Label: "Injected into a layer", Symbol: "Q", Quantity: units.PoreVolumes, Min: 0, Max: end, Value: bt, Marks: []Mark{{Label: "breakthrough", X: bt}}},
		Summary: "Map of the part of the pattern whose mirror images make the whole: streamlines from injector to producer, and the front after a volume injected, which a slider moves."}
	for i, w := range r.Wells {
		label := "producer"
		if (i == 0) != r.Reversed {
			label = "injector"
		}
		x, y := r.mapped(w, m.length)
		c.Marks = append(c.Marks, Mark{label, x, y})
	}
	return c
}
