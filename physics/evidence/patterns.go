package evidence

import (
	"brinefront/physics/pattern"
	"brinefront/physics/ref"
)

// sweeps computes the areal sweep at breakthrough of patterns, piston-like at unit mobility.
func sweeps(shapes ...pattern.Shape) func() ([]float64, error) {
	return func() ([]float64, error) {
		var values []float64
		for _, s := range shapes {
			g, err := pattern.New(s, pattern.LeastTubes)
			if err != nil {
				return nil, err
			}
			values = append(values, g.Breakthrough())
		}
		return values, nil
	}
}

// flooded computes the sweep at breakthrough, and areal sweep and share of water after each
// volume injected.
func flooded(s pattern.Shape, pvi ...float64) func() ([]float64, error) {
	return func() ([]float64, error) {
		g, err := pattern.New(s, pattern.LeastTubes)
		if err != nil {
			return nil, err
		}
		values := []float64{g.Breakthrough()}
		for _, q := range pvi {
			sweep, cut := g.UnitSweep(q)
			values = append(values, sweep, cut)
		}
		return values, nil
	}
}

// offset computes C where a well takes 2 pi k h dp/[mu (1 + Q)(ln(d/rw) - C)].
func offset(kinds ...pattern.Kind) func() ([]float64, error) {
	return func() ([]float64, error) {
		var values []float64
		for _, k := range kinds {
			g, err := pattern.New(pattern.Shape{Kind: k}, pattern.LeastTubes)
			if err != nil {
				return nil, err
			}
			t := g.Tubes[0]
			values = append(values, -g.Offset(t)/(1+g.Rim(t)))
		}
		return values, nil
	}
}

var patternChecks = []Check{
	{ID: "five-spot-sweep", Topic: "Patterns", Title: "Five-spot, sweep at breakthrough", Source: ref.MorelSeytoux1966, Place: "(π/(2K))², K the complete elliptic integral of modulus 1/√2", Provenance: Exact,
		Inputs: "unit mobility, piston-like", How: "fastest streamline of the theta-function potential",
		Items: items(1e-9, "the closed form printed with ten decimals", "areal sweep", 0.7177700110), compute: sweeps(pattern.Shape{Kind: pattern.FiveSpot})},
	{ID: "staggered-sweep", Topic: "Patterns", Title: "Staggered line drive, sweep at breakthrough", Source: ref.Prats1956, Place: "fastest streamline of ln cn(z), recomputed by row sums", Provenance: Exact,
		Inputs: "unit mobility, piston-like, d/a = 1, 1.5, 2", How: "fastest streamline; older tables print that of the straight line, 0.757 at d/a = 1",
		Items:   items(0.5e-4, lastDigit, "d/a = 1", 0.7888, "d/a = 1.5", 0.8534, "d/a = 2", 0.8897),
		compute: sweeps(pattern.Shape{Kind: pattern.Staggered, Ratio: 1}, pattern.Shape{Kind: pattern.Staggered, Ratio: 1.5}, pattern.Shape{Kind: pattern.Staggered, Ratio: 2})},
	{ID: "direct-sweep", Topic: "Patterns", Title: "Direct line drive, sweep at breakthrough", Place: "Standard Handbook of Petroleum & Natural Gas Engineering, vol. 2, table 5-39, after Muskat", Provenance: Read,
		Inputs: "unit mobility, piston-like, d/a = 1", How: "fastest streamline", Items: items(0.0005, lastDigit, "areal sweep", 0.570), compute: sweeps(pattern.Shape{Kind: pattern.Direct, Ratio: 1})},
	{ID: "nine-spot-sweep", Topic: "Patterns", Title: "Nine-spot, sweep at breakthrough", Place: "Standard Handbook of Petroleum & Natural Gas Engineering, vol. 2, table 5-39", Provenance: Read,
		Inputs: "unit mobility, piston-like, rate of corner over side well 0.5, 1, 5, 10", How: "fastest streamline",
		Items:   items(0.025, "read off curves; met to 0.2, 1.9, 2.0 and 0.7 points", "0.5", 0.49, "1", 0.54, "5", 0.69, "10", 0.78),
		compute: sweeps(pattern.Shape{Kind: pattern.NineSpot, Ratio: 0.5}, pattern.Shape{Kind: pattern.NineSpot, Ratio: 1}, pattern.Shape{Kind: pattern.NineSpot, Ratio: 5}, pattern.Shape{Kind: pattern.NineSpot, Ratio: 10})},
	{ID: "five-spot-injectivity", Topic: "Patterns", Title: "Five-spot, injectivity", Source: ref.Peaceman1978, Place: "ln(d/rw) − 0.61738575; Muskat's 0.619 is 0.0016 high", Provenance: Memory,
		Inputs: "unit mobility", How: "offset of the potential at the wells", Items: items(1e-8, lastDigit, "constant", 0.61738575), compute: offset(pattern.FiveSpot)},
	{ID: "seven-spot-injectivity", Topic: "Patterns", Title: "Seven-spot, injectivity", Source: ref.Deppe1961, Place: "ln(d/rw) − 0.569", Provenance: Memory,
		Inputs: "unit mobility", How: "offset of the potential at the wells", Items: items(0.0005, lastDigit, "constant", 0.569), compute: offset(pattern.SevenSpot)},
	{ID: "independent-five-spot", Topic: "Patterns", Title: "Five-spot after breakthrough", Place: "Unit mobility, case st-01", Provenance: Independent,
		Inputs: "piston-like, 0.9, 1.2 and 2 displaceable pore volumes", How: "streamlines of the theta-function potential",
		Items: items(5e-8, independentError, "breakthrough", 0.71777001104613, "sweep after 0.9 PV", 0.8270181626709443, "water cut", 0.5758886849476372,
			"sweep after 1.2 PV", 0.9141335751159934, "water cut", 0.805677608090087, "sweep after 2 PV", 0.9853663547007588, "water cut", 0.9679225278175344),
		compute: flooded(pattern.Shape{Kind: pattern.FiveSpot}, 0.9, 1.2, 2)},
	{ID: "independent-direct", Topic: "Patterns", Title: "Direct line drive after breakthrough", Place: "Unit mobility, d/a = 1, case st-02", Provenance: Independent,
		Inputs: "piston-like, 0.75, 1 and 2 displaceable pore volumes", How: "streamlines of the theta-function potential",
		Items: items(5e-8, independentError, "breakthrough", 0.5695612854053864, "sweep after 0.75 PV", 0.6906600788988458, "water cut", 0.47796192308484126,
			"sweep after 1 PV", 0.7938883204264031, "water cut", 0.6734887419460776, "sweep after 2 PV", 0.9563799310922595, "water cut", 0.9325494163157112),
		compute: flooded(pattern.Shape{Kind: pattern.Direct, Ratio: 1}, 0.75, 1, 2)},
}
