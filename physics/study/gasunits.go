package study

import (
	"strings"

	"brinefront/physics/units"
)

// quantity is that of what a symbol stands for, before the symbol is told: volumes and
// rates at surface of a phase that is gas are told as gas is. Symbols of surface volumes
// begin with Wp, Np or N, of rates with qw or qo. A picture of both phases keeps one unit
// for both.
func (w *words) quantity(symbol string, q units.Quantity) units.Quantity {
	of := func(water, oil string) bool {
		return w.gas[0] && strings.HasPrefix(symbol, water) || w.gas[1] && strings.HasPrefix(symbol, oil)
	}
	switch {
	case q == units.Volume && of("Wp", "N"):
		return units.GasVolume
	case q == units.Rate && of("qw", "qo"):
		return units.GasRate
	case q == units.WaterOilRatio && w.gas[0]:
		return units.GasOilRatio
	case q == units.WaterOilRatio && w.gas[1]:
		return units.WaterGasRatio
	}
	return q
}
