package evidence

import (
	"math"

	"brinefront/physics/fracflow"
	"brinefront/physics/numeric"
	"brinefront/physics/ref"
	"brinefront/physics/relperm"
	"brinefront/physics/ride"
)

// flood is a front that rides along, by the numbers that its checks list.
type flood struct {
	ahead, behind     fracflow.Flow
	pivot             ride.Pivot
	injected, initial float64
}

// construction lists state behind the front, its speed, the bank's state and cut, the
// arrival of the bank and of the front, and recovery after some volumes.
func (c flood) construction(after ...float64) func() ([]float64, error) {
	return func() ([]float64, error) {
		f, err := ride.New(c.ahead, c.behind, c.pivot, c.injected, c.initial)
		if err != nil {
			return nil, err
		}
		speed, behind, ahead := f.Front()
		values := []float64{behind.S, speed, ahead.S, ahead.F, f.Breakthrough(), f.Arrival()}
		for _, q := range after {
			values = append(values, f.After(q).Recovery)
		}
		return values, nil
	}
}

// The tolerances of the independent fronts: five times their error estimates.
func constructionItems(published ...float64) []Item {
	labels := []string{"Sw behind the front", "speed of the front", "Sw of the bank", "fw of the bank", "bank arrives, PV", "front arrives, PV", "recovery after 0.4 PV", "recovery after 0.9 PV", "recovery after 2 PV"}
	var list []Item
	for i, value := range published {
		tolerance := 1e-11
		if i == 0 || i == 2 {
			tolerance = 5e-10
		}
		list = append(list, Item{labels[i], value, tolerance, independentError})
	}
	return list
}

const constructed = "the line from the pivot to both fractional flow curves"

// polymerQuadratic lists, for quadratic curves and Mw = 10, S3 and the speed of the front
// and the bank's S1.
func polymerQuadratic() ([]float64, error) {
	var values []float64
	for _, c := range []struct{ thick, d float64 }{{1, 0.1}, {1, 0.2}, {0.5, 0.2}} {
		f, err := ride.New(quadratic(10), quadratic(c.thick), ride.Pivot{B: c.d}, 1, 0)
		if err != nil {
			return nil, err
		}
		speed, behind, ahead := f.Front()
		values = append(values, behind.S, speed, ahead.S)
	}
	return values, nil
}

// heatFronts lists the speed of heat where water alone flows, for three porosities.
func heatFronts() ([]float64, error) {
	var values []float64
	for _, porosity := range []float64{0.1, 0.2, 0.3} {
		pivot, err := ride.Heat{Porosity: porosity, Grains: 2650 * 880, Water: 998 * 4182}.Pivot()
		if err != nil {
			return nil, err
		}
		f, err := ride.New(quadratic(5), quadratic(3), pivot, 1, 1)
		if err != nil {
			return nil, err
		}
		speed, _, _ := f.Front()
		values = append(values, speed)
	}
	return values, nil
}

// tracerAtOutlet lists the concentration at the outlet after 0.8, 1 and 1.2 PV.
func tracerAtOutlet() ([]float64, error) {
	var values []float64
	for _, peclet := range []float64{10, 100} {
		for _, q := range []float64{0.8, 1, 1.2} {
			values = append(values, ride.Tracer{Speed: 1, Peclet: peclet}.Concentration(1, q))
		}
	}
	return values, nil
}

// errorFunction lists erfc as the tracers of this program have it, by exp(-x²) erfcx(x).
func errorFunction() ([]float64, error) {
	var values []float64
	for _, x := range []float64{0.1, 0.5, 1, 1.5, 2} {
		values = append(values, math.Exp(-x*x)*numeric.Erfcx(x))
	}
	return values, nil
}

var rides = []Check{
	{ID: "independent-polymer", Topic: "Front", Title: "Front of polymer with its bank", Place: "Invented rock, case chem-01", Provenance: Independent,
		Inputs: "Corey nw 2.7, no 2.15, µw 0.47, polymer 11.7 and µo 25.93 mPa·s, retention 0.137 PV", How: constructed,
		Items: constructionItems(0.6679811145350556, 1.188233394136281, 0.37202268445908704, 0.6048377520471824, 0.2629179212455673, 0.8415855041061974, 0.31708758364021417, 0.4940009837268001, 0.5170974679281644),
		compute: flood{fracflow.Flow{Curves: waterWet, MuW: 0.47e-3, MuO: 25.93e-3}, fracflow.Flow{Curves: waterWet, MuW: 11.7e-3, MuO: 25.93e-3},
			ride.Pivot{B: 0.137}, 0.763, 0.213}.construction(0.4, 0.9, 2)},
	{ID: "independent-low-salinity", Topic: "Front", Title: "Front of water of low salinity with its bank", Place: "Invented rock, case chem-03", Provenance: Independent,
		Inputs: "two Corey rocks, Sor 0.273 and 0.193, retention 0.083 PV", How: constructed,
		Items: constructionItems(0.5921463354149316, 1.3537574823036331, 0.3622553262941553, 0.6027677295062583, 0.35711156347151524, 0.7386847445513959, 0.374148234491652, 0.5208871594880382, 0.5636933374218221),
		compute: flood{
			fracflow.Flow{Curves: relperm.Corey{Swc: 0.147, Sor: 0.273, Krw0: 0.431, Kro0: 0.853, Nw: 2.3, No: 2.9}, MuW: 0.51e-3, MuO: 3.9e-3},
			fracflow.Flow{Curves: relperm.Corey{Swc: 0.147, Sor: 0.193, Krw0: 0.287, Kro0: 0.871, Nw: 2.9, No: 2.3}, MuW: 0.51e-3, MuO: 3.9e-3},
			ride.Pivot{B: 0.083}, 0.807, 0.147}.construction(0.4, 0.9, 2)},
	{ID: "polymer-quadratic", Topic: "Front", Title: "Front of polymer, quadratic curves", Source: ref.Pope1980, Place: "The construction, from memory; numbers derived from its cubic 2(1−S)(S+D) = S[MS² + (1−S)²]", Provenance: Exact,
		Inputs: "krw = S², kro = (1−S)², µo/µw = 10 ahead; M = 1 and D = 0.1, 0.2, M = 0.5 and D = 0.2 behind", How: constructed,
		Items: []Item{
			{"S3 at M = 1, D = 0.1", 0.732477, 0.51e-6, lastDigit}, {"speed at M = 1, D = 0.1", 1.05986, 0.51e-5, lastDigit}, {"S1 at M = 1, D = 0.1", 0.16502, 0.51e-5, lastDigit},
			{"S3 at M = 1, D = 0.2", 0.752244, 0.51e-6, lastDigit}, {"speed at M = 1, D = 0.2", 0.94738, 0.51e-5, lastDigit}, {"S1 at M = 1, D = 0.2", 0.19719, 0.51e-5, lastDigit},
			{"S3 at M = 0.5, D = 0.2", 0.845754, 0.51e-6, lastDigit}, {"speed at M = 0.5, D = 0.2", 0.8966, 0.51e-4, lastDigit}, {"S1 at M = 0.5, D = 0.2", 0.18747, 0.51e-5, lastDigit},
		},
		compute: polymerQuadratic},
	{ID: "thermal-front", Topic: "Front", Title: "Front of heat where water alone flows", Place: "Speed 1/(1+D) of the water's, D = (1−φ)/φ (ρc)s/(ρc)w, by hand", Provenance: Exact,
		Inputs: "grains 2650 kg/m³ of 880 J/(kg K), water 998 kg/m³ of 4182 J/(kg K)", How: "the front of heat with all oil gone",
		Items:   items(0.6e-4, lastDigit, "speed at porosity 0.1", 0.1659, "speed at porosity 0.2", 0.3091, "speed at porosity 0.3", 0.4341),
		compute: heatFronts},
	{ID: "tracer-ogata-banks", Topic: "Front", Title: "Tracer with dispersion at the outlet", Source: ref.OgataBanks1961, Place: "The solution with a concentration held at the inlet; numbers derived from it", Provenance: Memory,
		Inputs: "Péclet number 10 and 100", How: "erfc and erfcx, so that no Péclet number overflows",
		Items: items(0.51e-5, lastDigit, "C at Pe 10 after 0.8 PV", 0.38338, "C at Pe 10 after 1 PV", 0.58529, "C at Pe 10 after 1.2 PV", 0.73663,
			"C at Pe 100 after 0.8 PV", 0.06492, "C at Pe 100 after 1 PV", 0.52807, "C at Pe 100 after 1.2 PV", 0.9138),
		compute: tracerAtOutlet},
	{ID: "erfc-table", Topic: "Front", Title: "Complementary error function", Place: "Çengel, Heat Transfer, table 4-4", Provenance: Read,
		Inputs: "x = 0.1, 0.5, 1, 1.5, 2", How: "exp(−x²) erfcx(x), as the tracers of this program have it",
		Items: []Item{
			{"erfc 0.1", 0.8875, 0.5e-4, lastDigit}, {"erfc 0.5", 0.4795, 0.5e-4, lastDigit}, {"erfc 1", 0.1573, 0.5e-4, lastDigit}, {"erfc 1.5", 0.0339, 0.5e-4, lastDigit}, {"erfc 2", 0.00468, 0.5e-5, lastDigit},
		},
		compute: errorFunction},
}
