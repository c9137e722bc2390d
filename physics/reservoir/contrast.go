package reservoir

import (
	"math"
	"slices"
)

// Sample is a stretch of a permeability log, or a layer.
type Sample struct {
	Thickness, Permeability, Porosity float64 // m, m2, fraction; all > 0

	Swc, Swi, Sor float64 // connate, initial, residual oil; only lumped here
}

// Ranked sorts samples by permeability over porosity, the speed at which they are flooded,
// the fastest first.
func Ranked(samples []Sample) []Sample {
	sorted := slices.Clone(samples)
	slices.SortStableFunc(sorted, func(a, b Sample) int {
		switch x, y := a.Permeability*b.Porosity, b.Permeability*a.Porosity; {
		case x > y:
			return -1
		case x < y:
			return 1
		}
		return 0
	})
	return sorted
}

// FlowCapacity returns the flow capacity plot of samples: the share of k h against the
// share of phi h, fastest first, from (0, 0) to (1, 1).
func FlowCapacity(samples []Sample) (storage, flow []float64) {
	storage, flow = []float64{0}, []float64{0}
	c, f := 0.0, 0.0
	for _, s := range Ranked(samples) {
		c += s.Porosity * s.Thickness
		f += s.Permeability * s.Thickness
		storage, flow = append(storage, c), append(flow, f)
	}
	for i := range storage {
		storage[i] /= c
		flow[i] /= f
	}
	return storage, flow
}

// Lorenz is the Lorenz coefficient: twice the area between the flow capacity plot and its
// diagonal, 0 for even rock, tending to 1 with the contrast.
//
// Source: Schmalz & Rahme (1950).
func Lorenz(samples []Sample) float64 {
	c, f := FlowCapacity(samples)
	area := 0.0
	for i := 1; i < len(c); i++ {
		area += (c[i] - c[i-1]) * (f[i] + f[i-1])
	}
	return math.Max(0, area-1)
}

// Position is the share of thickness at which a sample is plotted on probability paper.
type Position string

const (
	Hazen   Position = "Hazen"   // the middle of the sample, (i - 1/2)/n
	Weibull Position = "Weibull" // i/(n + 1)
)

// Variation is the Dykstra-Parsons coefficient by the straight line through ln k against
// the normal quantile of the share of thickness with higher permeability, by least squares
// weighted with thickness. With m its slope,
//
//	V = (k50 - k84.1)/k50 = 1 - exp(-|m|)
//
// Samples of thickness h count as h over the mean thickness. 0 for fewer than two.
//
// Source: Dykstra & Parsons (1950); the plotting position is a choice, named Hazen (1914)
// or Weibull (1939), and changes V by some hundredths where samples are few.
func Variation(samples []Sample, position Position) float64 {
	sorted := slices.Clone(samples)
	slices.SortStableFunc(sorted, func(a, b Sample) int {
		switch {
		case a.Permeability > b.Permeability:
			return -1
		case a.Permeability < b.Permeability:
			return 1
		}
		return 0
	})
	total := 0.0
	for _, s := range sorted {
		total += s.Thickness
	}
	n := float64(len(sorted))
	var passed, sx, sy, sxx, sxy float64
	for _, s := range sorted {
		rank := (passed + s.Thickness/2) / total * n // i - 1/2 for even samples
		p := rank / n
		if position == Weibull {
			p = (rank + 0.5) / (n + 1)
		}
		x, y, w := math.Sqrt2*math.Erfinv(2*p-1), math.Log(s.Permeability), s.Thickness/total
		sx, sy, sxx, sxy = sx+w*x, sy+w*y, sxx+w*x*x, sxy+w*x*y
		passed += s.Thickness
	}
	spread := sxx - sx*sx
	if !(spread > 0) {
		return 0
	}
	return -math.Expm1(-math.Abs((sxy - sx*sy) / spread))
}

// VariationOfSpread is 1 - exp(-s) with s the standard deviation of ln k, weighted with
// thickness and with n - 1 degrees of freedom; 0 for fewer than two samples.
//
// Source: Lake (1989), the Dykstra-Parsons coefficient of a log-normal population.
func VariationOfSpread(samples []Sample) float64 {
	var w, sy, syy float64
	for _, s := range samples {
		w += s.Thickness
		sy += s.Thickness * math.Log(s.Permeability)
	}
	n, mean := float64(len(samples)), sy/w
	for _, s := range samples {
		d := math.Log(s.Permeability) - mean
		syy += s.Thickness / w * d * d
	}
	if n < 2 {
		return 0
	}
	return -math.Expm1(-math.Sqrt(syy * n / (n - 1)))
}

// VariationOfMeans is 1 - exp(-sqrt(ln(kA/kH))) with the arithmetic and the harmonic mean,
// which for a log-normal population are s^2 apart.
//
// Source: Fanchi & Christiansen (2016), eq. 4.23-4.25.
func VariationOfMeans(samples []Sample) float64 {
	var h, kh, hk float64
	for _, s := range samples {
		h += s.Thickness
		kh += s.Thickness * s.Permeability
		hk += s.Thickness / s.Permeability
	}
	return -math.Expm1(-math.Sqrt(math.Max(0, math.Log(kh/h*hk/h))))
}

// Grouped lumps samples into n layers of equal flow capacity, fastest first; thickness,
// k h, phi h and the volume at each saturation are kept. Samples are not split, so that fewer layers may come out where a
// few samples carry most of the flow.
func Grouped(samples []Sample, n int) []Sample {
	sorted := Ranked(samples)
	total := 0.0
	for _, s := range sorted {
		total += s.Thickness * s.Permeability
	}
	var layers []Sample
	var h, kh, ph, passed float64
	var l Sample // the layer so far; its saturations move by shares, so that equal ones stay as they are
	for i, s := range sorted {
		h, kh, ph = h+s.Thickness, kh+s.Thickness*s.Permeability, ph+s.Thickness*s.Porosity
		passed += s.Thickness * s.Permeability
		share := s.Thickness * s.Porosity / ph
		if h == s.Thickness {
			l = s
		}
		l.Swc, l.Swi, l.Sor = l.Swc+share*(s.Swc-l.Swc), l.Swi+share*(s.Swi-l.Swi), l.Sor+share*(s.Sor-l.Sor)
		// Half of the next sample's flow decides on which side of the cut it falls.
		next := 0.0
		if i+1 < len(sorted) {
			next = sorted[i+1].Thickness * sorted[i+1].Permeability / 2
		}
		if last := i+1 == len(sorted); last || passed+next > total*float64(len(layers)+1)/float64(n) {
			l.Thickness, l.Permeability, l.Porosity = h, kh/h, ph/h
			layers = append(layers, l)
			h, kh, ph = 0, 0, 0
		}
	}
	return layers
}
