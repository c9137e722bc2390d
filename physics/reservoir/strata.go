package reservoir

import (
	"math"
	"slices"

	"brinefront/physics/relperm"
)

// Stratum is a layer as the piston-like and the vertically averaged methods see it: all of
// it either before the front or behind it.
type Stratum struct {
	Thickness, Permeability, Porosity float64       // m, m2, fraction; all > 0
	Before, After                     float64       // water saturation ahead of the front and behind it
	Ahead, Behind                     relperm.Point // kr in the two states
}

// Capacity is k h, and Storage the displaceable phi h (After - Before).
func (s Stratum) Capacity() float64 { return s.Permeability * s.Thickness }
func (s Stratum) Storage() float64  { return s.Porosity * s.Thickness * (s.After - s.Before) }

// Fastest sorts layers by the speed of their fronts at unit mobility ratio,
// k/(phi (After - Before)), the fastest first.
func Fastest(layers []Stratum) []Stratum {
	sorted := slices.Clone(layers)
	slices.SortStableFunc(sorted, func(a, b Stratum) int {
		switch x, y := a.Capacity()/a.Storage(), b.Capacity()/b.Storage(); {
		case x > y:
			return -1
		case x < y:
			return 1
		}
		return 0
	})
	return sorted
}

// Equilibrium returns curves for layers in vertical equilibrium: flow across the layers is
// free, so that the pressure gradient is the same in all of them and they fill one after
// the other, in the order given. With n layers filled,
//
//	S = sum phi h Sw/sum phi h,  krw = sum k h krw/sum k h,  kro = sum k h kro/sum k h
//
// over filled layers behind the front and the others ahead of it; while one fills, all
// three go in straight lines. krw and kro refer to sum k h/sum h.
//
// The order is that of the fronts where the rate decides (Fastest), or upwards from the
// lowest layer where gravity does. Errors are those of relperm.NewTable.
//
// Source: Hearn (1971), pseudo relative permeability of a stratified bed; Dake (1978), ch. 10.
func Equilibrium(layers []Stratum) (relperm.Table, error) {
	n := len(layers)
	sw, krw, kro := make([]float64, n+1), make([]float64, n+1), make([]float64, n+1)
	capacity, pores := 0.0, 0.0
	for _, l := range layers {
		capacity += l.Capacity()
		pores += l.Porosity * l.Thickness
	}
	for filled := range n + 1 {
		for i, l := range layers {
			s, kr := l.Before, l.Ahead
			if i < filled {
				s, kr = l.After, l.Behind
			}
			sw[filled] += l.Porosity * l.Thickness * s / pores
			krw[filled] += l.Capacity() * kr.Krw / capacity
			kro[filled] += l.Capacity() * kr.Kro / capacity
		}
		if filled > 0 { // against the last digit
			krw[filled] = math.Max(krw[filled], krw[filled-1])
			kro[filled] = math.Min(kro[filled], kro[filled-1])
		}
	}
	return relperm.NewTable(sw, krw, kro, relperm.StraightLine)
}

// Stiles returns, for the moment in which each layer is the latest to be flooded through,
// fastest first, the part of the displaceable volume that is swept and the water cut at
// reservoir conditions:
//
//	coverage = sum phi h dS min(1, r/rn)/sum phi h dS,  r = k/(phi dS)
//	fw = M C/(M C + (Ct - C))
//
// with C the capacity flooded through, Ct all of it and M = (krw/muw)/(kro/muo). Fronts keep
// to their first ratio of speeds, whatever M is; M counts in what the layers yield only.
//
// Source: Stiles (1949), as in the Standard Handbook of Petroleum and Natural Gas
// Engineering, vol. 2, table 5-43, with the layers' own porosities and saturations.
func Stiles(layers []Stratum, mobilityRatio float64) (coverage, cut []float64) {
	sorted := Fastest(layers)
	capacity, storage := 0.0, 0.0
	for _, l := range sorted {
		capacity += l.Capacity()
		storage += l.Storage()
	}
	through := 0.0
	for n, latest := range sorted {
		through += latest.Capacity()
		swept := 0.0
		for i, l := range sorted {
			part := 1.0
			if i > n {
				part = math.Min(1, l.Capacity()/l.Storage()*latest.Storage()/latest.Capacity())
			}
			swept += l.Storage() * part
		}
		rest := capacity - through
		if n == len(sorted)-1 {
			rest = 0
		}
		coverage = append(coverage, swept/storage)
		cut = append(cut, mobilityRatio*through/(mobilityRatio*through+rest))
	}
	return coverage, cut
}
