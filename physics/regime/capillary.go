package regime

import "brinefront/physics/ref"

// What the capillary number says about a residual phase.
const (
	Trapped     Class = "trapped"
	OnTheVerge  Class = "on the verge"
	PartlyFreed Class = "partly freed"
	NearlyFreed Class = "nearly freed"
	Freed       Class = "freed"
)

// CapillaryNumber is the ratio of viscous to capillary forces.
//
//	Nc = u mu/sigma
//
// u Darcy velocity (m/s) and mu viscosity (Pa s) of the displacing phase, sigma
// interfacial tension (N/m, above 0). The group is that of Saffman & Taylor (1958);
// authors who divide u by porosity get numbers three to ten times as large.
func CapillaryNumber(u, mu, sigma float64) float64 { return u * mu / sigma }

// Desaturation is the published spread of capillary numbers between which a residual
// phase goes from trapped to gone: begin of release, then full release.
//
// Source: Lake (1989), ch. 3, from memory; orders of magnitude.
type Desaturation struct {
	BeginLow, BeginHigh float64
	FullLow, FullHigh   float64
	rule                string
}

var (
	// NonWettingResidual: oil in water-wet rock, gas.
	NonWettingResidual = Desaturation{1e-5, 1e-4, 1e-2, 1e-1, "non-wetting residual: release begins at 1e−5 to 1e−4 and is complete at 1e−2 to 1e−1 (ch. 3, from memory)"}
	// WettingResidual: oil in oil-wet rock, irreducible water.
	WettingResidual = Desaturation{1e-4, 1e-3, 1e-2, 1e-1, "wetting residual: release begins at 1e−4 to 1e−3 and is complete at 1e−2 to 1e−1 (ch. 3, from memory)"}
)

// Judge says whether the residual phase, named as within a sentence, would move at
// capillary number nc. A number on the edge of a spread counts as inside it.
func (d Desaturation) Judge(nc float64, residual string) Verdict {
	return judge("The capillary number", nc, []band{
		{d.BeginLow, false, Trapped, "residual " + residual + " stays where it is"},
		{d.BeginHigh, true, OnTheVerge, "residual " + residual + " may begin to move, depending on the rock"},
		{d.FullLow, false, PartlyFreed, "part of the residual " + residual + " moves"},
		{d.FullHigh, true, NearlyFreed, "most of the residual " + residual + " moves, depending on the rock"},
		{class: Freed, means: "all residual " + residual + " moves"},
	}, d.rule, ref.Lake1989)
}
