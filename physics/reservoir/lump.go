package reservoir

import "slices"

// Lumped merges neighbours of a section, in the order given, into n layers, 1 <= n <=
// len(samples): time and again the two neighbours whose merger adds least to the variance of
// k/phi inside layers, weighed by pore volume,
//
//	v1 v2/(v1 + v2) (k1/phi1 - k2/phi2)²
//
// Thickness, k h, phi h and the volume at each saturation are kept, so that permeability is the mean by thickness, which holds for
// flow along the layers. Layers for n lie inside those for fewer. Own, after the usual
// least-variance clustering.
func Lumped(samples []Sample, n int) []Sample {
	layers := slices.Clone(samples)
	for len(layers) > n {
		at, least := 0, 0.0
		for i := 1; i < len(layers); i++ {
			a, b := layers[i-1], layers[i]
			v, w := a.Porosity*a.Thickness, b.Porosity*b.Thickness
			d := a.Permeability/a.Porosity - b.Permeability/b.Porosity
			if cost := v * w / (v + w) * d * d; i == 1 || cost < least {
				at, least = i, cost
			}
		}
		a, b := layers[at-1], layers[at]
		h := a.Thickness + b.Thickness
		share := b.Porosity * b.Thickness / (a.Porosity*a.Thickness + b.Porosity*b.Thickness)
		layers[at-1] = Sample{
			Thickness: h, Permeability: (a.Thickness*a.Permeability + b.Thickness*b.Permeability) / h, Porosity: (a.Thickness*a.Porosity + b.Thickness*b.Porosity) / h,
			Swc: a.Swc + share*(b.Swc-a.Swc), Swi: a.Swi + share*(b.Swi-a.Swi), Sor: a.Sor + share*(b.Sor-a.Sor),
		}
		layers = slices.Delete(layers, at, at+1)
	}
	return layers
}

// Arrival is the clock at which the water cut of the bundle first reaches level, 0 < level < 1, at
// the latest by that of last; ok is false when it does not. Between the breakthroughs of its
// members the cut is continuous.
func (b Bundle) Arrival(level, last float64) (clock float64, ok bool) {
	var steps []float64
	for _, m := range b {
		if m.Pace > 0 {
			if t := m.Body.Breakthrough() / m.Pace; t < last {
				steps = append(steps, t)
			}
		}
	}
	slices.Sort(steps)
	steps = append(slices.Compact(steps), last)
	const beside = 1e-9
	excess := func(o Outflow) float64 { return o.Cut() - level }
	before := steps[0]
	for i, t := range steps {
		if low, high := before*(1+beside), t*(1-beside); i > 0 && low < high && excess(b.At(high)) >= 0 {
			return crossing(b, low, high, excess), true
		}
		if excess(b.At(t*(1+beside))) >= 0 {
			return t, true
		}
		before = t
	}
	return 0, false
}
