package fit

import (
	"fmt"
	"math"

	"brinefront/physics/capillary"
)

// PcPoints are points of capillary pressure, one a row: Sw as a fraction, Pc in Pa.
type PcPoints struct{ Sw, Pc []float64 }

// PcOptions say how to fit; the zero value is the default.
type PcOptions struct {
	// Weights: Relative counts a point by its error in percent of its Pc, and Pc below
	// the hundredth of the largest as that (common practice, no source), so that the zero
	// does no harm; Absolute by its error in Pa. Default: Relative.
	Weights Weighting
	// Ends are Swr and Sor to hold, such as those of the relative permeability. One that
	// the points do not leave room for, since Pc is infinite there, is fitted. Default:
	// both fitted, Swr from 0 to below the points and Sor from 0 to above them.
	Ends *[2]float64
	// Iterations limits the work of the minimiser for each start. Default 500.
	Iterations int
}

// PcFit is a capillary pressure curve through points, and how far it can be trusted.
type PcFit struct {
	Curve      capillary.Curve // capillary.BrooksCorey, VanGenuchten or Skjaeveland
	Parameters []Parameter

	// Covariance and Correlation: as in Fit.
	Covariance, Correlation [][]float64

	RMS              float64 // root mean square of (curve - point)/weight; with relative weights, as a share of Pc
	Used             int     // rows that the form can be held against
	DegreesOfFreedom int
	Status           Status
	Iterations       int
	Verdict          []string // plain sentences

	family pcFamily
	state  confidence
}

// pcFamily is a form of capillary pressure and what the minimiser must know. Its first
// two parameters are Swr and Sor.
type pcFamily struct {
	name  string
	specs []spec
	curve func(v []float64) capillary.Curve
	// slopes fills the slopes of Pc with respect to every parameter.
	slopes func(v []float64, sw float64, slopes []float64)
	linear []int       // parameters that Pc is proportional to, part by part
	starts [][]float64 // of the others after Sor, in their order
	signed bool        // Pc may be negative
	closed bool        // Pc and its slope are finite at the upper end
}

var pcEnds = []spec{{symbol: "Swr", label: "Water at infinite Pc", low: 0, high: 1, saturation: true}, {symbol: "Sor,c", label: "Oil that stays trapped", low: 0, high: 1, saturation: true}}

func pcSpecs(more ...spec) []spec { return append(append([]spec{}, pcEnds...), more...) }

// ofS fills the slopes with respect to Swr and Sor of a form that depends on
// s = (sw-swr)/(1-swr-sor) alone: as for relative permeability, see family.slopes.
func ofS(v []float64, sw, slope float64, slopes []float64) (logS float64) {
	low, high := v[0], 1-v[1]
	s := (sw - low) / (high - low)
	slopes[0], slopes[1] = -(1-s)*slope, s*slope
	return math.Log(s)
}

var brooksCorey = pcFamily{
	name: "Brooks-Corey", closed: true, linear: []int{2}, starts: [][]float64{{0.5}, {2}, {8}},
	specs: pcSpecs(spec{symbol: "pe", label: "Entry pressure"}, spec{symbol: "λ", label: "Pore size index", low: 0.05, high: 50, log: true}),
	curve: func(v []float64) capillary.Curve {
		return capillary.BrooksCorey{Swr: v[0], Snr: v[1], Entry: v[2], Lambda: v[3]}
	},
	slopes: func(v []float64, sw float64, slopes []float64) {
		pc, slope := capillary.BrooksCorey{Swr: v[0], Snr: v[1], Entry: v[2], Lambda: v[3]}.At(sw)
		logS := ofS(v, sw, slope, slopes)
		slopes[2], slopes[3] = pc/v[2], pc*logS/(v[3]*v[3])
	},
}

// vanGenuchten ties m to n as Mualem does. With x = -ln(s)/m, Pc = p0 (e^x - 1)^(1/n):
//
//	dPc/dn = Pc/n [-ln(e^x - 1)/n - x/(1 - e^-x) (dm/dn)/m], dm/dn = 1/n²
var vanGenuchten = pcFamily{
	name: "van Genuchten", linear: []int{2}, starts: [][]float64{{1.5}, {3}, {8}},
	specs: pcSpecs(spec{symbol: "p0", label: "Pressure scale"}, spec{symbol: "n", label: "Exponent", low: 1.05, high: 50, log: true}),
	curve: func(v []float64) capillary.Curve { return genuchten(v) },
	slopes: func(v []float64, sw float64, slopes []float64) {
		c := genuchten(v)
		pc, slope := c.At(sw)
		x := -ofS(v, sw, slope, slopes) / c.M
		slopes[2] = pc / v[2]
		slopes[3] = pc / c.N * (-math.Log(pc/v[2]) + x/math.Expm1(-x)/(c.M*c.N*c.N)) // ln(e^x-1)/n is ln(pc/p0)
	},
}

func genuchten(v []float64) capillary.VanGenuchten {
	return capillary.VanGenuchten{Swr: v[0], Snr: v[1], P0: v[2], N: v[3], M: capillary.Mualem(v[3])}
}

// skjaeveland: with u = (sw-swr)/(1-swr) and v = (1-sw-sor)/(1-sor), du/dswr =
// -(1-sw)/(1-swr)² and dv/dsor = -sw/(1-sor)².
var skjaeveland = pcFamily{
	name: "the two-branch form", signed: true, linear: []int{2, 4}, starts: [][]float64{{0.3, 0.3}, {1, 0.3}, {0.3, 1}, {1, 1}},
	specs: pcSpecs(spec{symbol: "cw", label: "Water branch"}, spec{symbol: "aw", label: "Exponent of the water branch", low: 0.02, high: 20, log: true},
		spec{symbol: "co", label: "Oil branch"}, spec{symbol: "ao", label: "Exponent of the oil branch", low: 0.02, high: 20, log: true}),
	curve: func(v []float64) capillary.Curve {
		return capillary.Skjaeveland{Swr: v[0], Sor: v[1], Cw: v[2], Aw: v[3], Co: v[4], Ao: v[5]}
	},
	slopes: func(v []float64, sw float64, slopes []float64) {
		water, waterSlope := capillary.Skjaeveland{Swr: v[0], Sor: v[1], Cw: 1, Aw: v[3]}.At(sw)
		oil, oilSlope := capillary.Skjaeveland{Swr: v[0], Sor: v[1], Co: -1, Ao: v[5]}.At(sw)
		slopes[0] = -v[2] * waterSlope * (1 - sw) / (1 - v[0])
		slopes[1] = -v[4] * oilSlope * sw / (1 - v[1])
		slopes[2], slopes[3] = water, -v[2]*water*math.Log((sw-v[0])/(1-v[0]))
		slopes[4], slopes[5] = -oil, v[4]*oil*math.Log((1-v[1]-sw)/(1-v[1]))
	},
}

// BrooksCorey fits Pc = pe s^(-1/λ), 0.05 <= λ <= 50, through the rows with Pc above 0.
//
// Errors: *RefusedError when InspectPc refuses the points or fewer rows than
// parameters can be used. It panics when the slices of p differ in length. Source of
// the form: Brooks & Corey (1964).
func BrooksCorey(p PcPoints, o PcOptions) (PcFit, error) { return runPc(brooksCorey, p, o) }

// VanGenuchten fits Pc = p0 (s^(-1/m) - 1)^(1/n) with m = 1 - 1/n (Mualem), 1.05 <= n <= 50,
// through the rows with Pc above 0. Errors as BrooksCorey. Source of the form: van
// Genuchten (1980).
func VanGenuchten(p PcPoints, o PcOptions) (PcFit, error) { return runPc(vanGenuchten, p, o) }

// Skjaeveland fits the two-branch form of mixed-wet rock through all rows, with cw >= 0,
// co <= 0 and 0.02 <= aw, ao <= 20. Errors as BrooksCorey. Source of the form:
// Skjaeveland et al. (2000).
func Skjaeveland(p PcPoints, o PcOptions) (PcFit, error) { return runPc(skjaeveland, p, o) }

func runPc(f pcFamily, p PcPoints, o PcOptions) (PcFit, error) {
	var refusing []Finding
	for _, finding := range InspectPc(p) {
		if finding.Refuse {
			refusing = append(refusing, finding)
		}
	}
	if len(refusing) > 0 {
		return PcFit{}, &RefusedError{Reason: "No curve can be drawn through these points", Findings: refusing}
	}
	t := newPcTask(f, p, o)
	if got, need := len(t.points.Sw), len(t.free)+1; got < need {
		return PcFit{}, &RefusedError{Reason: fmt.Sprintf("The points give %d rows that %s can be held against; allowed: at least %d, one more than there are parameters", got, f.name, need)}
	}
	t.solve()
	return t.conclude(), nil
}

// Band returns the 95 % confidence band of the curve at sw, Pa, as Fit.Band does. At an
// end where Pc is infinite so is the band.
func (f PcFit) Band(sw float64) (low, high float64) {
	pc, _ := f.Curve.At(sw)
	if a, b := f.Curve.Ends(); !(sw > a && sw < b) {
		return pc, pc
	}
	slopes := make([]float64, len(f.family.specs))
	f.family.slopes(f.state.values, sw, slopes)
	g := make([]float64, len(f.state.active))
	for p, j := range f.state.active {
		g[p] = slopes[j] * f.state.outward(j)
	}
	half := f.state.scatter[0].student * math.Sqrt(f.state.spread(g))
	return pc - half, pc + half
}
