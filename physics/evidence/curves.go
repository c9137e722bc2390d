package evidence

import (
	"brinefront/physics/ref"
	"brinefront/physics/relperm"
)

var curveChecks = []Check{
	{ID: "corey-exponent-4", Topic: "Curves", Title: "Corey curve with the exponent 4 that Brooks & Corey give for λ = 2", Source: ref.BrooksCorey1964, Place: "krw = Se^((2+3λ)/λ)", Provenance: Memory,
		Inputs: "λ = 2, Se = 0.5", How: "the Corey model with exponent (2 + 3λ)/λ = 4",
		Items: items(1e-15, rounding, "krw", 0.0625),
		compute: value(func() float64 {
			return relperm.Corey{Krw0: 1, Kro0: 1, Nw: 4, No: 2}.At(0.5).Krw
		})},
	{ID: "let-values", Topic: "Curves", Title: "LET water curve", Source: ref.Lomeland2005, Place: "Eq. for krw; the numbers are ours, by hand from the formula", Provenance: Memory,
		Inputs: "L = 3, E = 2, T = 1.5, end point 1", How: "the LET model",
		Items: items(0.5e-6, lastDigit, "krw at S = 0.3", 0.022531, "krw at S = 0.5", 0.150221, "krw at S = 0.7", 0.510695),
		compute: func() ([]float64, error) {
			let := relperm.LET{Krw0: 1, Kro0: 1, Lw: 3, Ew: 2, Tw: 1.5, Lo: 2, Eo: 1, To: 2}
			return []float64{let.At(0.3).Krw, let.At(0.5).Krw, let.At(0.7).Krw}, nil
		}},
	{ID: "let-symmetric", Topic: "Curves", Title: "LET curve at its point of symmetry", Source: ref.Lomeland2005, Place: "L = T, E = 1 gives half the end point at S = 0.5", Provenance: Exact,
		Inputs: "L = T = 2.7, E = 1, end point 0.62", How: "the LET model",
		Items: items(1e-15, rounding, "krw at S = 0.5", 0.31),
		compute: value(func() float64 {
			return relperm.LET{Krw0: 0.62, Kro0: 1, Lw: 2.7, Ew: 1, Tw: 2.7, Lo: 2, Eo: 1, To: 2}.At(0.5).Krw
		})},
}
