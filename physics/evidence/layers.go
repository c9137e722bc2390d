package evidence

import (
	"math"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/ref"
	"brinefront/physics/reservoir"
)

// fiveLayers are those of the independent cases: permeability m2, thickness m, porosity.
var fiveLayers = [5]reservoir.Sample{
	{Permeability: 1.37e-13, Thickness: 2.3, Porosity: 0.21}, {Permeability: 6.3e-14, Thickness: 4.1, Porosity: 0.19}, {Permeability: 4.12e-13, Thickness: 1.7, Porosity: 0.247},
	{Permeability: 2.2e-14, Thickness: 3.2, Porosity: 0.163}, {Permeability: 2.31e-13, Thickness: 2.9, Porosity: 0.228},
}

const fiveLength, fiveWidth, fiveDrop = 213, 87, 3.1e6

// bundle floods the five layers, each as body makes it.
func bundle(body func(i int) reservoir.Body) reservoir.Bundle {
	var b reservoir.Bundle
	for i, l := range fiveLayers {
		b = append(b, reservoir.Member{Body: body(i), PoreVolume: l.Porosity * l.Thickness * fiveWidth * fiveLength, Pace: l.Permeability / (l.Porosity * fiveLength * fiveLength)})
	}
	return b
}

var tenLayers = []float64{519, 281, 237, 164, 116, 98, 60, 51, 35, 27}

// throughTen is coverage and water-oil ratio as the third of ten even layers has been flooded.
func throughTen(m float64) []float64 {
	var b reservoir.Bundle
	for _, k := range tenLayers {
		b = append(b, reservoir.Member{Body: reservoir.Piston{Water: m, Oil: 1, Change: 0.5}, PoreVolume: 1, Pace: k})
	}
	o := b.At(b[2].Body.Breakthrough() / b[2].Pace * (1 + 1e-14))
	return []float64{o.Oil / 0.5, o.Cut() / (1 - o.Cut())}
}

var layerChecks = []Check{
	{ID: "dykstra-parsons-layers", Topic: "Layers", Title: "Ten layers at M = 0.5, 1 and 2", Source: ref.DykstraParsons1950, Place: "exact for discrete layers", Provenance: Memory,
		Inputs: "k 519 to 27, equal thickness; the third layer has just been flooded through", How: "piston-like layers at a common pressure difference",
		Items: items(0.00051, lastDigit, "coverage, M = 0.5", 0.579, "water-oil ratio, M = 0.5", 1.4, "coverage, M = 1", 0.532, "water-oil ratio, M = 1", 1.882, "coverage, M = 2", 0.493, "water-oil ratio, M = 2", 3.015),
		compute: func() ([]float64, error) {
			return append(append(throughTen(0.5), throughTen(1)...), throughTen(2)...), nil
		}},
	{ID: "variation-of-means", Topic: "Layers", Title: "Dykstra-Parsons coefficient by means", Source: ref.Fanchi2016, Place: "Example 4.5", Provenance: Read,
		Inputs: "k 100, 5, 25 md", How: "1 − exp(−√ln(kA/kH))", Items: items(0.0005, lastDigit, "VDP", 0.678),
		compute: func() ([]float64, error) {
			return []float64{reservoir.VariationOfMeans([]reservoir.Sample{{Thickness: 1, Permeability: 100}, {Thickness: 1, Permeability: 5}, {Thickness: 1, Permeability: 25}})}, nil
		}},
	{ID: "independent-piston-layers", Topic: "Layers", Title: "Five piston-like layers, M = 4.3", Place: "Invented rock, case dp-01", Provenance: Independent,
		Inputs: "five layers, common pressure difference of 3.1 MPa", How: "closed-form fronts",
		Items: []Item{{"first arrival, s", 6726063.885362177, 3.4e-4, independentError}, {"coverage as the second arrives", 0.5766255962545626, 1e-11, independentError}, {"injected by then, PV", 0.3813054201393265, 2.5e-11, independentError}, {"water cut just after", 0.8653257917223995, 1e-11, independentError}},
		compute: func() ([]float64, error) {
			change := [5]float64{0.47, 0.44, 0.51, 0.41, 0.49}
			b := bundle(func(i int) reservoir.Body { return reservoir.Piston{Water: 4.3 * 410, Oil: 410, Change: change[i]} })
			movable := 0.0
			for i, m := range b {
				movable += m.PoreVolume * change[i]
			}
			o := b.At(b[4].Body.Breakthrough() / b[4].Pace * (1 + 1e-15))
			return []float64{b.Breakthrough() / fiveDrop, o.Oil * b.PoreVolume() / movable, o.Injected, o.Cut()}, nil
		}},
	{ID: "independent-layers", Topic: "Layers", Title: "Five layers with their own fronts", Place: "Invented rock, case lbl-01", Provenance: Independent,
		Inputs: "Corey nw 2.7, no 2.15, µw 0.47 and µo 5.93 mPa·s, common pressure difference of 3.1 MPa", How: "exact resistance of each layer, one root for the volume",
		Items: []Item{{"first arrival, s", 17966800.249410212, 1.2e-3, independentError}, {"time to 1 PV, s", 80383822.08015756, 1.1e-3, independentError}, {"recovery after 1 PV", 0.3450317413026705, 2e-10, independentError}, {"water cut after 1 PV", 0.884075286709424, 5e-8, independentError}},
		compute: func() ([]float64, error) {
			flow := fracflow.Flow{Curves: waterWet, MuW: 0.00047, MuO: 0.00593}
			d, err := displace.New(flow, 0.763, 0.213)
			if err != nil {
				return nil, err
			}
			path := reservoir.Path{PoreVolume: 1, Impedance: 1, Shape: reservoir.Even, Flood: reservoir.NewFlood(flow, d)}
			b := bundle(func(int) reservoir.Body { return path })
			clock := reservoir.Clock(b, 1, 0)
			o := b.At(clock)
			return []float64{b.Breakthrough() / fiveDrop, clock / fiveDrop, o.Oil, o.Cut()}, nil
		}},
	{ID: "lorenz-log-normal", Topic: "Layers", Title: "Lorenz coefficient of log-normal rock", Source: ref.Lake1989, Place: "LC = erf(s/2)", Provenance: Memory,
		Inputs: "20,000 samples at the quantiles, s = 0.7", How: "twice the area above the diagonal of the flow capacity plot", Items: items(1e-3, "a finite number of samples leaves out the tails", "LC", math.Erf(0.35)),
		compute: func() ([]float64, error) {
			samples := make([]reservoir.Sample, 20000)
			for i := range samples {
				samples[i] = reservoir.Sample{Thickness: 1, Permeability: math.Exp(0.7 * math.Sqrt2 * math.Erfinv((2*float64(i)+1)/20000-1)), Porosity: 0.2}
			}
			return []float64{reservoir.Lorenz(samples)}, nil
		}},
}
