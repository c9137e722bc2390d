package study

import (
	"math"
	"math/rand/v2"
	"testing"

	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
	"brinefront/physics/reservoir"
)

// Averaged curves of any layers have a front or say that they have none: permeabilities over
// fourteen decades leave a fractional flow within rounding of 1 after the first few layers.
func TestAveragedCurvesHaveAFront(t *testing.T) {
	kr := relperm.Corey{Swc: 0.227, Sor: 0.284, Krw0: 0.27, Kro0: 0.99, Nw: 3.3, No: 2.4}
	f := &front{flow: fracflow.Flow{Curves: kr, MuW: 0.93e-3, MuO: 2.17e-3}}
	flooded := 0
	const count = 100
	for seed := range uint64(count) {
		r := rand.New(rand.NewPCG(seed, 5))
		var strata []reservoir.Stratum
		for range MaxLayers {
			strata = append(strata, reservoir.Stratum{Thickness: 0.1 + 3*r.Float64(), Permeability: 1e-11 * math.Pow(10, -14*r.Float64()), Porosity: 0.01 + 0.3*r.Float64(),
				Before: 0.227, After: 0.716, Ahead: kr.At(0.227), Behind: kr.At(0.716)})
		}
		curves, err := reservoir.Equilibrium(reservoir.Fastest(strata))
		if err != nil {
			t.Fatal(err)
		}
		flood, err := thick(f, curves)
		if err != nil {
			continue
		}
		flooded++
		if bt := flood.Displacement.Breakthrough(); !(bt > 0 && bt < 1) {
			t.Errorf("seed %d: water arrives after %g PV", seed, bt)
		}
	}
	if flooded < count*9/10 {
		t.Errorf("only %d of %d are flooded", flooded, count)
	}
}
