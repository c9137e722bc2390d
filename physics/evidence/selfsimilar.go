package evidence

import (
	"math"

	"brinefront/physics/imbibe"
	"brinefront/physics/ref"
	"brinefront/physics/relperm"
)

// diffusing is a capillary curve that gives straight curves of one viscosity a wanted Dc.
type diffusing func(sw float64) float64

func (d diffusing) Ends() (low, high float64) { return 0, 1 }
func (d diffusing) Knots() []float64          { return nil }
func (d diffusing) At(sw float64) (pc, slope float64) {
	return 1 - sw, -d(sw) / (sw * (1 - sw)) // f(1-f) of straight curves over one viscosity
}

// withDiffusion solves counter-current uptake of porosity 1 from Sw 0 to 1.
func withDiffusion(d diffusing) (*imbibe.Solution, error) {
	span, err := imbibe.NewSpan(imbibe.Rock{Permeability: 1, Porosity: 1, WaterViscosity: 1, OilViscosity: 1, Kr: relperm.Corey{Krw0: 1, Kro0: 1, Nw: 1, No: 1}, Pc: d}, 0, 1)
	if err != nil {
		return nil, err
	}
	return imbibe.Solve(span, 0)
}

// selfSimilar lists A, the depths of some saturations after 216 000 s and that of the front.
func selfSimilar(rock imbibe.Rock, initial, ratio float64, states ...float64) func() ([]float64, error) {
	return func() ([]float64, error) {
		span, err := imbibe.NewSpan(rock, initial, math.NaN())
		if err != nil {
			return nil, err
		}
		s, err := imbibe.Solve(span, ratio)
		if err != nil {
			return nil, err
		}
		const time = 216000
		values := []float64{s.A}
		for _, sw := range states {
			values = append(values, s.At(sw, time))
		}
		return append(values, s.Front(time)), nil
	}
}

// soakItems are the uptake coefficient, to its own tolerance, and depths.
func soakItems(a, aTolerance float64, depths ...any) []Item {
	return append(items(aTolerance, "ten digits; the independent error is below 1e-11 of it", "A, m/√s", a),
		items(1e-8, "eight digits of a depth; the independent error is below 1e-11", depths...)...)
}

const collocation = "Newton's method for positive unknowns, collocation on panels"

var selfSimilarSoaking = []Check{
	{ID: "constant-diffusion", Topic: "Soak", Title: "Uptake with constant diffusion", Place: "A = √(D φ/π), S = erfc(x/(2 √(D t/φ))), the solution of the heat equation", Provenance: Exact,
		Inputs: "Dc = 1 m²/s, porosity 1", How: collocation,
		Items: items(1e-8, "what is promised of limits known exactly", "A", 0.5641895835477563, "S = 0.5 stands at", 0.9538725524089398),
		compute: func() ([]float64, error) {
			s, err := withDiffusion(func(float64) float64 { return 1 })
			if err != nil {
				return nil, err
			}
			return []float64{s.A, s.At(0.5, 1)}, nil
		}},
	{ID: "philip-family", Topic: "Soak", Title: "Uptake with Philip's diffusion", Source: ref.Philip1960, Place: "D = (n/2) Sⁿ [1 − Sⁿ/(1+n)], sorptivity n/(n+1), x = (1 − Sⁿ) √t", Provenance: Memory,
		Inputs: "n = 0.5, 1, 3", How: collocation,
		Items: items(1e-8, "what is promised of limits known exactly",
			"sorptivity, n = 0.5", 1.0/3, "front, n = 0.5", 1.0, "sorptivity, n = 1", 0.5, "front, n = 1", 1.0, "sorptivity, n = 3", 0.75, "front, n = 3", 1.0),
		compute: func() ([]float64, error) {
			var values []float64
			for _, n := range []float64{0.5, 1, 3} {
				s, err := withDiffusion(func(sw float64) float64 {
					p := math.Pow(sw, n)
					return n / 2 * p * (1 - p/(1+n))
				})
				if err != nil {
					return nil, err
				}
				values = append(values, 2*s.A, s.Front(1))
			}
			return values, nil
		}},
	{ID: "independent-counter-current", Topic: "Soak", Title: "Counter-current uptake, water-wet", Place: "Invented rock, case ms-01", Provenance: Independent,
		Inputs: "Corey nw 3.4, no 2.3, van Genuchten 21.3 kPa, n 2.9, 37 md, 216 000 s", How: collocation,
		Items:   soakItems(2.426288564882748e-05, 2.5e-15, "Sw = 0.2154 at, m", 0.3631885465947085, "Sw = 0.4842 at, m", 0.16509415740400116, "Sw = 0.6858 at, m", 0.00378229657746248, "front at, m", 0.36459527408901043),
		compute: selfSimilar(tight, 0.193, 0, 0.2154, 0.4842, 0.6858)},
	{ID: "independent-counter-mixed-wet", Topic: "Soak", Title: "Counter-current uptake, mixed-wet", Place: "Invented rock, case ms-02", Provenance: Independent,
		Inputs: "Corey nw 2.9, no 3.3, two-branch Pc, 88 md, 216 000 s", How: collocation,
		Items:   soakItems(9.244741059963216e-06, 1e-15, "Sw = 0.150604 at, m", 0.2914242313268492, "Sw = 0.279583 at, m", 0.12664935543330172, "front at, m", 0.32245789585927886),
		compute: selfSimilar(mixed, 0.11, 0, 0.150604, 0.279583)},
	{ID: "independent-partly-co-current", Topic: "Soak", Title: "Partly co-current uptake, mixed-wet", Place: "Invented rock, case ms-03", Provenance: Independent,
		Inputs: "as before, with R = 0.31", How: collocation,
		Items:   soakItems(9.484107139996717e-06, 1e-15, "Sw = 0.150604 at, m", 0.29631379031285937, "Sw = 0.279583 at, m", 0.13231155283681177, "front at, m", 0.32691660270878686),
		compute: selfSimilar(mixed, 0.11, 0.31, 0.150604, 0.279583)},
}
