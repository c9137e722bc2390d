package evidence

import (
	"math"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/relperm"
	"brinefront/physics/reservoir"
	"brinefront/physics/units"
)

// The rocks and fluids of the independent cases are invented, with odd numbers;
// their results were computed in Python by two different methods each. A
// tolerance is five times the computation's own estimate of its error, and not
// below 1e-11.
const independentError = "five times the error estimate of the independent computation"

var (
	waterWet = relperm.Corey{Swc: 0.213, Sor: 0.237, Krw0: 0.327, Kro0: 0.861, Nw: 2.7, No: 2.15}
	oilWet   = relperm.Corey{Swc: 0.093, Sor: 0.171, Krw0: 0.787, Kro0: 0.931, Nw: 1.63, No: 4.3}
	dipping  = relperm.Corey{Swc: 0.178, Sor: 0.206, Krw0: 0.412, Kro0: 0.893, Nw: 2.3, No: 2.6}
)

// dippingFlow is water moving up a dip of 63 degrees at total velocity u, m/s.
func dippingFlow(u float64) fracflow.Flow {
	const permeability, densityDifference = 1.37e-12, 1043.0 - 812.0
	return fracflow.Flow{Curves: dipping, MuW: 0.00058, MuO: 0.0027,
		Gravity: permeability * densityDifference * units.StandardGravity * math.Sin(si(units.Angle, 63, "deg")) / u}
}

// front computes the values that every displacement case lists, in order:
// behind the front, its speed, breakthrough, average saturation there, recovery
// after 0.5, 1, 2 and 5 PV, and injected volume and recovery at a cut of 0.95.
func front(flow fracflow.Flow, injected, initial float64) func() ([]float64, error) {
	return func() ([]float64, error) {
		d, err := displace.New(flow, injected, initial)
		if err != nil {
			return nil, err
		}
		waves := d.Waves()
		last := waves[len(waves)-1]
		limit, _ := d.PVIAtCut(0.95)
		return []float64{
			last.Behind, last.SpeedAhead, d.Breakthrough(), d.Average(d.Breakthrough()),
			d.Recovery(0.5), d.Recovery(1), d.Recovery(2), d.Recovery(5), limit, d.Recovery(limit),
		}, nil
	}
}

var independentCases = []Check{
	{ID: "independent-dip", Topic: "Front", Title: "Fractional flow up a dip", Place: "Invented rock, case ff-01", Provenance: Independent,
		Inputs: "Corey nw 2.3, no 2.6, dip 63°, 1.9e-6 m/s, water heavier by 231 kg/m³", How: "f and its slope at four saturations; end-point mobility ratio; gravity number",
		Items: []Item{
			{"f at Sw = 0.19648", 0.00040546957664284425, 1e-11, independentError},
			{"f at Sw = 0.34432", 0.15223590321913105, 1e-11, independentError},
			{"f at Sw = 0.5168", 0.7633310913848804, 1e-11, independentError},
			{"f at Sw = 0.68928", 0.988146642525972, 1e-11, independentError},
			{"slope at Sw = 0.19648", 0.05360344549502642, 4e-11, independentError},
			{"slope at Sw = 0.34432", 2.6457457330139778, 4e-11, independentError},
			{"slope at Sw = 0.5168", 2.7756165697514534, 4e-11, independentError},
			{"slope at Sw = 0.68928", 0.32369740392131935, 4e-11, independentError},
			{"end-point mobility ratio", 2.147739120361432, 1.1e-11, independentError},
			{"N, Pa s", 0.0014553937505830362, 1e-11, independentError},
		},
		compute: func() ([]float64, error) {
			flow := dippingFlow(1.9e-6)
			var values, slopes []float64
			for _, sw := range []float64{0.19648, 0.34432, 0.5168, 0.68928} {
				f, slope := flow.At(sw)
				values, slopes = append(values, f), append(slopes, slope)
			}
			return append(append(values, slopes...), flow.EndPointMobilityRatio(), flow.Gravity), nil
		}},
	{ID: "independent-water-wet", Topic: "Front", Title: "Displacement, water-wet Corey", Place: "Invented rock, case bl-01", Provenance: Independent,
		Inputs: "Corey nw 2.7, no 2.15, µw 0.47 and µo 1.93 mPa·s", How: "the envelope solution",
		Items: []Item{
			{"Sw behind the front", 0.5857005867155664, 5e-10, independentError},
			{"speed of the front", 2.3114705271851834, 8.3e-09, independentError},
			{"breakthrough, PV", 0.43262502733173935, 1e-11, independentError},
			{"average Sw at breakthrough", 0.6456250273317393, 1e-11, independentError},
			{"recovery after 0.5 PV", 0.4410268005754344, 1e-11, independentError},
			{"recovery after 1 PV", 0.4750341279128706, 1e-11, independentError},
			{"recovery after 2 PV", 0.50057801832037, 1e-11, independentError},
			{"recovery after 5 PV", 0.5234890798803831, 1e-11, independentError},
			{"injected at a water cut of 0.95, PV", 0.8917231412026153, 6.6e-09, independentError},
			{"recovery at a water cut of 0.95, PV", 0.4700407435572763, 3.3e-10, independentError},
		},
		compute: front(fracflow.Flow{Curves: waterWet, MuW: 0.00047, MuO: 0.00193}, 0.763, 0.213)},
	{ID: "independent-oil-wet", Topic: "Front", Title: "Displacement, oil-wet Corey", Place: "Invented rock, case bl-02", Provenance: Independent,
		Inputs: "Corey nw 1.63, no 4.3, µw 0.52 and µo 3.7 mPa·s", How: "the envelope solution",
		Items: []Item{
			{"Sw behind the front", 0.2729489341417332, 5e-10, independentError},
			{"speed of the front", 3.7179743536212144, 3.3e-09, independentError},
			{"breakthrough, PV", 0.2689636627068245, 1e-11, independentError},
			{"average Sw at breakthrough", 0.36196366270682445, 1e-11, independentError},
			{"recovery after 0.5 PV", 0.319516160933737, 1e-11, independentError},
			{"recovery after 1 PV", 0.3702525113496066, 1e-11, independentError},
			{"recovery after 2 PV", 0.4172524256503425, 1e-11, independentError},
			{"recovery after 5 PV", 0.47396069752307346, 1e-11, independentError},
			{"injected at a water cut of 0.95, PV", 1.3614699439799876, 8.1e-08, independentError},
			{"recovery at a water cut of 0.95, PV", 0.3916024328787967, 4.1e-09, independentError},
		},
		compute: front(fracflow.Flow{Curves: oilWet, MuW: 0.00052, MuO: 0.0037}, 0.829, 0.093)},
	{ID: "independent-up-dip", Topic: "Front", Title: "Displacement, up-dip gravity stable", Place: "Invented rock, case bl-03", Provenance: Independent,
		Inputs: "Corey nw 2.3, no 2.6, dip 63°, 7.3e-7 m/s", How: "the envelope solution",
		Items: []Item{
			{"Sw behind the front", 0.574937758685915, 5e-10, independentError},
			{"speed of the front", 2.1201605078483547, 9.2e-10, independentError},
			{"breakthrough, PV", 0.4716624030577997, 1e-11, independentError},
			{"average Sw at breakthrough", 0.6496624030577998, 1e-11, independentError},
			{"recovery after 0.5 PV", 0.47596193544065385, 1e-11, independentError},
			{"recovery after 1 PV", 0.519109944342353, 1e-11, independentError},
			{"recovery after 2 PV", 0.5502618073562422, 1e-11, independentError},
			{"recovery after 5 PV", 0.5775511083776323, 1e-11, independentError},
			{"injected at a water cut of 0.95, PV", 1.0387585720992285, 1.2e-09, independentError},
			{"recovery at a water cut of 0.95, PV", 0.5211026723638523, 6.1e-11, independentError},
		},
		compute: front(dippingFlow(7.3e-7), 0.794, 0.178)},
	{ID: "independent-pressure", Topic: "Field", Title: "Linear flood at a constant pressure difference", Place: "Invented rock, case lin-01", Provenance: Independent,
		Inputs: "Corey nw 2.7, no 2.15, µw 0.47 and µo 5.93 mPa·s, 151 m, 23 bar", How: "resistance integrated exactly over the envelope solution",
		Items: []Item{
			{"time to breakthrough, s", 50633742.53799751, 0.00025, independentError},
			{"time to inject 0.1 PV, s", 16223891.838602815, 0.0079, independentError},
			{"time to inject 0.3 PV, s", 43834218.658686765, 0.0079, independentError},
			{"time to inject 0.7 PV, s", 83456445.44206166, 0.0079, independentError},
			{"time to inject 1.5 PV, s", 141531772.62508225, 0.0079, independentError},
			{"time to inject 3 PV, s", 228521195.61981484, 0.0079, independentError},
			{"resistance after 0.1 PV, Pa s", 0.006235217613584769, 1e-11, independentError},
			{"resistance after 0.3 PV, Pa s", 0.004930972236805411, 1e-11, independentError},
			{"resistance after 0.7 PV, Pa s", 0.003420524904673273, 1e-11, independentError},
			{"resistance after 1.5 PV, Pa s", 0.0026167592908890756, 1e-11, independentError},
			{"resistance after 3 PV, Pa s", 0.0021599321789334373, 1e-11, independentError},
		},
		compute: func() ([]float64, error) {
			flow := fracflow.Flow{Curves: waterWet, MuW: 0.00047, MuO: 0.00593}
			d, err := displace.New(flow, 0.763, 0.213)
			if err != nil {
				return nil, err
			}
			flood, err := reservoir.NewLinear(reservoir.Layer{Length: 151, Area: 1, Porosity: 0.217, Permeability: 8.7e-14,
				Bw: 1, Bo: 1, Uptime: 1, Drive: reservoir.ConstantPressure{DP: 2.3e6}}, flow, d)
			if err != nil {
				return nil, err
			}
			arrival, _ := flood.Breakthrough()
			values, resistances := []float64{arrival}, []float64{}
			for _, q := range []float64{0.1, 0.3, 0.7, 1.5, 3} {
				values, resistances = append(values, flood.TimeAt(q)), append(resistances, flood.Resistance(q))
			}
			return append(values, resistances...), nil
		}},
}
