package ride

import (
	"fmt"
	"math"
)

// Pivot is the point (-B, -A) of the f-S diagram through which the line of the front
// goes; see the package comment. Both are in units of water saturation and flow: what
// one pore volume of water carries is 1.
//
// Valid for A = 0 and B + S >= 0 at every saturation S of both curves, so that B may be a
// little negative (inaccessible pore volume), or for 0 < A <= B: what the oil carries it
// holds as well. Both finite.
type Pivot struct {
	A float64 // carried by the oil: 0 for all but heat
	B float64 // held by what stands still, less the water out of reach
}

// check refuses a pivot for curves that begin at saturation lo.
func (p Pivot) check(lo float64) error {
	switch {
	case !(p.A >= 0) || math.IsInf(p.A, 0):
		return fmt.Errorf("ride: the part carried by the oil is %.6g; it must be finite and not negative", p.A)
	case math.IsNaN(p.B) || math.IsInf(p.B, 0):
		return fmt.Errorf("ride: the retardation is %.6g; it must be finite", p.B)
	case p.A > 0 && p.B < p.A:
		return fmt.Errorf("ride: the retardation is %.6g; it must be at least the part carried by the oil, %.6g, which the oil holds as well", p.B, p.A)
	case p.B+lo < 0:
		return fmt.Errorf("ride: the retardation is %.6g; with water saturations from %.6g up it must be at least %.6g: no more pore volume can be out of reach than holds water at rest", p.B, lo, -lo)
	}
	return nil
}

// speed is that of a front with the state (s, f) on one side; slope is df/ds there, which
// is the speed in the limit where nothing is carried.
func (p Pivot) speed(s, f, slope float64) float64 {
	if s+p.B == 0 {
		return slope
	}
	return (f + p.A) / (s + p.B)
}

// Retention is how the rock holds up a solute, as a fraction of the pore volume: so many
// pore volumes of water of the injected concentration are emptied.
type Retention struct {
	Reversible   float64 // adsorbed, and given back to the chase water
	Irreversible float64 // adsorbed or caught for good
	Inaccessible float64 // pore volume that the solute cannot enter, all of it filled with water
}

// Front is the pivot of the front of the solute,
//
//	b = D_reversible + D_irreversible - phi_inaccessible/phi
//
// the retardation D of Pope (1980), where water in pores out of reach counts as carrying
// nothing (Dawson & Lantz 1972; from memory).
func (r Retention) Front() Pivot {
	return Pivot{B: r.Reversible + r.Irreversible - r.Inaccessible}
}

// Rear is the pivot of the rear of a slug, which only finds what is given back:
// b = D_reversible - phi_inaccessible/phi.
func (r Retention) Rear() Pivot { return Pivot{B: r.Reversible - r.Inaccessible} }

// Adsorbed is the pore volumes of solution that adsorption empties,
//
//	D = (1 - phi)/phi rho_s Gamma/c
//
// with porosity phi, density of the grains rho_s (kg/m³), adsorbed mass of solute per
// mass of rock Gamma (kg/kg) at the concentration c injected (kg of solute per m³ of
// solution). Valid for 0 < phi < 1, Gamma >= 0, c > 0.
//
// Source: Pope (1980), from memory; Lake (1989), ch. 8, from memory.
func Adsorbed(porosity, grainDensity, massPerMass, concentration float64) float64 {
	return (1 - porosity) / porosity * grainDensity * massPerMass / concentration
}

// Heat is the capacities for heat of a rock and its fluids, each density times specific
// heat in J/(m³ K). They are taken as constant.
type Heat struct {
	Porosity           float64
	Grains, Water, Oil float64 // J/(m³ K)
}

// Pivot is that of a front of temperature, hot or cold,
//
//	a = C_o/(C_w - C_o),  b = [C_o + (1 - phi)/phi C_s]/(C_w - C_o)
//
// which is the balance of heat, [C_w S + C_o (1 - S) + (1 - phi)/phi C_s] T against
// [C_w f + C_o (1 - f)] T, over C_w - C_o. With C_o = 0 it is the usual retardation
// D = (1 - phi)/phi C_s/C_w, and where water alone flows the front runs at
// 1/(1 + D) of its speed, whatever C_o.
//
// Valid for 0 < phi < 1 and C_w > C_o >= 0, C_s >= 0, as with all crude oils;
// otherwise the error says what was given. Heat lost to other layers is left out.
//
// Sources: Fayers (1962); Hovdan (1986); Pope (1980), all from memory.
func (h Heat) Pivot() (Pivot, error) {
	switch {
	case !(h.Porosity > 0 && h.Porosity < 1):
		return Pivot{}, fmt.Errorf("ride: porosity is %.6g; it must lie between 0 and 1", h.Porosity)
	case !(h.Grains >= 0 && h.Oil >= 0) || math.IsInf(h.Grains, 0):
		return Pivot{}, fmt.Errorf("ride: the heat capacities of grains and oil are %.6g and %.6g J/(m³ K); they must be finite and not negative", h.Grains, h.Oil)
	case !(h.Water > h.Oil) || math.IsInf(h.Water, 0):
		return Pivot{}, fmt.Errorf("ride: the heat capacity of water is %.6g J/(m³ K); it must be above that of oil, %.6g", h.Water, h.Oil)
	}
	excess := h.Water - h.Oil
	return Pivot{A: h.Oil / excess, B: (h.Oil + (1-h.Porosity)/h.Porosity*h.Grains) / excess}, nil
}
