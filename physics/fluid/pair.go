package fluid

import "sync"

// PairID names a pair of phases in a study.
type PairID string

const (
	BrineOil PairID = "brine-oil"
	GasOil   PairID = "gas-oil"
	BrineGas PairID = "brine-gas"
	CO2Brine PairID = "co2-brine"
)

// Pair is two phases of which one displaces the other, told as data for the sheets.
//
// The physics knows two phases, called water and oil. In every pair "water" is the
// displacing phase and "oil" the resident one, whatever they are made of: S and krw,
// muw, rhow, Bw and f belong to Displacing, kro, muo, rhoo and Bo to Resident, swc is
// Displacing.Immobile and sor is Resident.Immobile. The displacement therefore always raises S,
// breakthrough and cut are those of the displacing phase, and only names change.
// Where the displacing phase is not the wetting one, a laboratory table by the
// wetting saturation is turned over before it is used: see WettingSaturation.
type Pair struct {
	ID                   PairID
	Name                 string // as a choice on screen
	Displacing, Resident Phase
	Tension              Typical // interfacial tension, N/m
	Land                 bool    // what stays of the resident phase follows Land's law of trapping
	Cautions             []Caution
}

// Phase is one of the two, in its role in the pair.
type Phase struct {
	Name         string // within a sentence
	Symbol       string // index of kr, viscosity, density, flow
	Saturation   string // symbol
	Wetting      bool
	Brine        bool   // its properties follow from Brine by temperature, pressure and salinity
	Immobile     string // symbol of its saturation up to which it does not flow
	ImmobileName string
	Viscosity    Typical // Pa s
	Density      Typical // kg/m3
}

// Typical is what a property usually is at reservoir conditions, in SI: a help for
// the person who fills the field, to be named as such, never used without being asked for.
// Common practice, no source.
type Typical struct {
	Value, Low, High float64
	Note             string
}

// Caution is lawful but doubtful physics of a pair: what, why, what to do about it.
type Caution struct{ ID, Text, Cause, Do string }

// Kr is the symbol of the phase's relative permeability, e.g. "krw".
func (p Phase) Kr() string { return "kr" + p.Symbol }

// Flow is the symbol of its fractional flow.
func (p Phase) Flow() string { return "f" + p.Symbol }

// Drainage reports whether the wetting phase is driven out: kr and capillary pressure
// must then come from a drainage experiment, otherwise from imbibition.
func (p Pair) Drainage() bool { return !p.Displacing.Wetting }

// FilledByResident reports whether the pores hold nothing but the resident phase where
// none of the displacing one is: brine before gas enters. There its relative
// permeability is 1 by definition. Oil always has connate water beside it.
func (p Pair) FilledByResident() bool { return p.Resident.Wetting && p.Resident.Brine }

// WettingSaturation turns the saturation of the displacing phase into that of the wetting
// phase, and back: s where the displacing phase wets, 1 - s where it does not. With
// gas and oil over connate water the wetting phase is all liquid.
func (p Pair) WettingSaturation(s float64) float64 {
	if p.Drainage() {
		return 1 - s
	}
	return s
}

// listed are the pairs, written down once: they are asked for many times an evaluation.
var listed = sync.OnceValue(Pairs)

// PairByID returns the pair with the given ID.
func PairByID(id PairID) (Pair, bool) {
	for _, p := range listed() {
		if p.ID == id {
			return p, true
		}
	}
	return Pair{}, false
}
