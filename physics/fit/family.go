package fit

import (
	"math"

	"brinefront/physics/relperm"
)

// The parameters that every family begins with.
const (
	iSwc = iota
	iSor
	iKrw0
	iKro0
	iShape // the first shape parameter
)

// phase marks whose curve a parameter shapes.
type phase int

const (
	both phase = iota
	water
	oil
)

// spec describes a parameter of a family.
type spec struct {
	symbol, label string
	low, high     float64
	log           bool // the minimiser moves its logarithm
	phase         phase
	saturation    bool // judged by the movable range rather than by its own size
}

// inner and outer convert between a parameter and what the minimiser moves.
func (s spec) inner(value float64) float64 {
	if s.log {
		return math.Log(value)
	}
	return value
}

func (s spec) outer(x float64) float64 {
	if s.log {
		return math.Exp(x)
	}
	return x
}

// family is a parametric model: its curves and what the minimiser must know.
type family struct {
	specs  []spec
	curves func(values []float64) relperm.Curves
	// shape fills the slopes of one phase with respect to its own shape parameters,
	// as the minimiser moves them: y is kr over its end point, and logS and logT are
	// logarithms of the phase's own normalised saturation and of 1 minus it. Only
	// called where 0 < y < 1.
	shape  func(y, logS, logT float64, slopes []float64)
	shapes int         // shape parameters a phase
	starts [][]float64 // shape parameters of one phase to start from, as moved
}

func family4(shapes []spec, f family) family {
	f.specs = append([]spec{
		{symbol: "Swc", label: "Connate water", low: 0, high: 1, saturation: true},
		{symbol: "Sor", label: "Residual oil", low: 0, high: 1, saturation: true},
		{symbol: "krw0", label: "krw at Sor", low: 1e-6, high: relperm.MaxKr, phase: water},
		{symbol: "kro0", label: "kro at Swc", low: 1e-6, high: relperm.MaxKr, phase: oil},
	}, shapes...)
	f.shapes = len(shapes) / 2
	return f
}

var coreyFamily = family4([]spec{
	{symbol: "nw", label: "Water exponent", low: 1, high: 15, phase: water},
	{symbol: "no", label: "Oil exponent", low: 1, high: 15, phase: oil},
}, family{
	curves: func(v []float64) relperm.Curves {
		return relperm.Corey{Swc: v[iSwc], Sor: v[iSor], Krw0: v[iKrw0], Kro0: v[iKro0], Nw: v[4], No: v[5]}
	},
	shape:  func(y, logS, _ float64, slopes []float64) { slopes[0] = y * logS },
	starts: [][]float64{{3}},
})

var letFamily = family4([]spec{
	{symbol: "Lw", label: "Water, lower part", low: 1, high: 20, phase: water},
	{symbol: "Ew", label: "Water, elevation", low: 1e-3, high: 1e4, log: true, phase: water},
	{symbol: "Tw", label: "Water, top part", low: 0.5, high: 20, phase: water},
	{symbol: "Lo", label: "Oil, lower part", low: 1, high: 20, phase: oil},
	{symbol: "Eo", label: "Oil, elevation", low: 1e-3, high: 1e4, log: true, phase: oil},
	{symbol: "To", label: "Oil, top part", low: 0.5, high: 20, phase: oil},
}, family{
	curves: func(v []float64) relperm.Curves {
		return relperm.LET{Swc: v[iSwc], Sor: v[iSor], Krw0: v[iKrw0], Kro0: v[iKro0], Lw: v[4], Ew: v[5], Tw: v[6], Lo: v[7], Eo: v[8], To: v[9]}
	},
	// With y = 1/(1+r), r = E t^T/s^L: dy = y(1-y) (ln s dL - d ln E - ln t dT).
	shape: func(y, logS, logT float64, slopes []float64) {
		u := y * (1 - y)
		slopes[0], slopes[1], slopes[2] = u*logS, -u, -u*logT
	},
	starts: [][]float64{
		{2, 0, 1}, {3, math.Log(5), 1}, {1.5, math.Log(2), 2}, {4, 0, 2}, {2, math.Log(20), 1.5}, {1.2, math.Log(0.5), 1},
	},
})

// slopes fills the slopes of krw and kro at sw with respect to every parameter, as
// the minimiser moves them, from the curves' value there. They need no second
// writing of the models: with s and t = 1-s
//
//	dkr/dSwc = -t dkr/dSw, dkr/dSor = s dkr/dSw, dkr/dkr0 = kr/kr0
//
// and the shape parameters' slopes follow from kr/kr0.
func (f family) slopes(values []float64, sw float64, at relperm.Point, krw, kro []float64) {
	swc, swmax := values[iSwc], 1-values[iSor]
	s := min(max((sw-swc)/(swmax-swc), 0), 1)
	t := min(max((swmax-sw)/(swmax-swc), 0), 1)
	clear(krw)
	clear(kro)
	krw[iSwc], krw[iSor] = -t*at.DKrw, s*at.DKrw
	kro[iSwc], kro[iSor] = -t*at.DKro, s*at.DKro
	yw, yo := at.Krw/values[iKrw0], at.Kro/values[iKro0]
	krw[iKrw0], kro[iKro0] = yw, yo
	if s == 0 || t == 0 {
		return // both curves are at an end whatever their shape
	}
	logS, logT := math.Log(s), math.Log(t)
	f.shape(yw, logS, logT, krw[iShape:iShape+f.shapes])
	f.shape(yo, logT, logS, kro[iShape+f.shapes:])
	for j := iShape; j < iShape+f.shapes; j++ {
		krw[j] *= values[iKrw0]
		kro[j+f.shapes] *= values[iKro0]
	}
}
