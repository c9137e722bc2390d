package evidence

import (
	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/ref"
	"brinefront/physics/relperm"
	"brinefront/physics/reservoir"
	"brinefront/physics/units"
)

// dakeTable is the relative permeability table of Dake (1978), exercise 10.1.
func dakeTable(kind relperm.Kind) (relperm.Table, error) {
	return relperm.NewTable(
		[]float64{0.2, 0.25, 0.3, 0.35, 0.4, 0.45, 0.5, 0.55, 0.6, 0.65, 0.7, 0.75, 0.8},
		[]float64{0, 0.002, 0.009, 0.02, 0.033, 0.051, 0.075, 0.1, 0.132, 0.17, 0.208, 0.251, 0.3},
		[]float64{0.8, 0.61, 0.47, 0.37, 0.285, 0.22, 0.163, 0.12, 0.081, 0.05, 0.027, 0.01, 0},
		kind)
}

// dake solves exercise 10.1 for a pair of viscosities in cp.
func dake(muO, muW float64, kind relperm.Kind) (fracflow.Flow, *displace.Displacement, error) {
	table, err := dakeTable(kind)
	if err != nil {
		return fracflow.Flow{}, nil, err
	}
	flow := fracflow.Flow{Curves: table, MuW: si(units.Viscosity, muW, "cp"), MuO: si(units.Viscosity, muO, "cp")}
	d, err := displace.New(flow, 0.8, 0.2)
	return flow, d, err
}

// dakeFront returns Sw and fw behind the front, fw at surface, the average
// saturation and the recovery at breakthrough, in pore volumes.
func dakeFront(muO, muW float64, kind relperm.Kind) func() ([]float64, error) {
	return func() ([]float64, error) {
		flow, d, err := dake(muO, muW, kind)
		if err != nil {
			return nil, err
		}
		waves := d.Waves()
		behind := waves[len(waves)-1].Behind
		f, _ := flow.At(behind)
		q := d.Breakthrough()
		return []float64{behind, f, fracflow.SurfaceCut(f, 1.0, 1.3), d.Average(q), d.Recovery(q)}, nil
	}
}

const dakeInputs = "table of 13 points, Bo = 1.3, Bw = 1.0; "

var waterfloods = []Check{
	{ID: "dake-10.1-case1", Topic: "Front", Title: "Waterflood at µo/µw = 100", Source: ref.Dake1978, Place: "Exercise 10.1, case 1", Provenance: Memory,
		Inputs: dakeInputs + "µo = 50 cp, µw = 0.5 cp", How: "monotone cubic through the table, envelope solution",
		Items: []Item{
			{"Sw at the front", 0.28, 0.015, handDrawn + "; the tangent point falls between two rows of the table"},
			{"fw at the front, reservoir", 0.55, 0.06, handDrawn + "; fw is steep there: 0.01 in Sw is 0.05 in fw"},
			{"fw at the front, surface", 0.61, 0.06, handDrawn + "; as above"},
			{"average Sw at breakthrough", 0.34, 0.015, handDrawn},
			{"recovery at breakthrough, PV", 0.14, 0.015, handDrawn},
		},
		compute: dakeFront(50, 0.5, relperm.MonotoneCubic)},
	{ID: "dake-10.1-case2", Topic: "Front", Title: "Waterflood at µo/µw = 10", Source: ref.Dake1978, Place: "Exercise 10.1, case 2", Provenance: Memory,
		Inputs: dakeInputs + "µo = 5 cp, µw = 0.5 cp", How: "monotone cubic through the table, envelope solution",
		Items: []Item{
			{"Sw at the front", 0.45, 0.01, handDrawn},
			{"fw at the front, reservoir", 0.70, 0.028, handDrawn + "; 0.01 in Sw is 0.028 in fw there"},
			{"fw at the front, surface", 0.75, 0.025, handDrawn},
			{"average Sw at breakthrough", 0.55, 0.01, handDrawn},
			{"recovery at breakthrough, PV", 0.35, 0.01, handDrawn},
		},
		compute: dakeFront(5, 0.5, relperm.MonotoneCubic)},
	{ID: "dake-10.1-case3", Topic: "Front", Title: "Waterflood at µo/µw = 0.4, piston-like", Source: ref.Dake1978, Place: "Exercise 10.1, case 3", Provenance: Memory,
		Inputs: dakeInputs + "µo = 0.4 cp, µw = 1.0 cp", How: "straight lines through the table, envelope solution",
		Items: []Item{
			{"Sw at the front", 0.80, 0.005, lastDigit},
			{"fw at the front, reservoir", 1.00, 0.005, lastDigit},
			{"fw at the front, surface", 1.00, 0.005, lastDigit},
			{"average Sw at breakthrough", 0.80, 0.005, lastDigit},
			{"recovery at breakthrough, PV", 0.60, 0.005, lastDigit},
		},
		compute: dakeFront(0.4, 1, relperm.StraightLine)},
	{ID: "dake-10.1-mobility", Topic: "Front", Title: "Mobility ratios of the three waterfloods", Source: ref.Dake1978, Place: "Exercise 10.1", Provenance: Memory,
		Inputs: dakeInputs + "the printed front saturations 0.28, 0.45, 0.80", How: "end-point and shock-front mobility ratios",
		Items: []Item{
			{"end-point, case 1", 37.5, 0.05, lastDigit}, {"end-point, case 2", 3.75, 0.005, lastDigit}, {"end-point, case 3", 0.15, 0.005, lastDigit},
			{"shock-front, case 1", 1.40, 0.05, "curves between two rows read by hand"}, {"shock-front, case 2", 0.91, 0.005, lastDigit}, {"shock-front, case 3", 0.15, 0.005, lastDigit},
		},
		compute: func() ([]float64, error) {
			cases := []struct{ muO, muW, front float64 }{{50, 0.5, 0.28}, {5, 0.5, 0.45}, {0.4, 1, 0.8}}
			values := make([]float64, 2*len(cases))
			for i, c := range cases {
				flow, _, err := dake(c.muO, c.muW, relperm.MonotoneCubic)
				if err != nil {
					return nil, err
				}
				values[i] = flow.EndPointMobilityRatio()
				values[len(cases)+i] = flow.FrontMobilityRatio(c.front, 0.2)
			}
			return values, nil
		}},
	{ID: "dake-10.2-time", Topic: "Field", Title: "Time to breakthrough of a linear flood", Source: ref.Dake1978, Place: "Exercise 10.2", Provenance: Memory,
		Inputs: dakeInputs + "µo = 5 cp, µw = 0.5 cp; 625 ft wide, 40 ft thick, 2000 ft long, porosity 0.18, 1000 rb/d", How: "a layer flooded at constant rate by the front of exercise 10.1, case 2, as solved here; years of 365 days",
		Items: []Item{
			{"years per pore volume", 4.39, 0.005, lastDigit},
			{"years to breakthrough", 1.54, 0.05, "the printed 0.35 PV is read by hand: 0.01 PV is 0.044 years, and 0.005 for the last digit"},
		},
		compute: func() ([]float64, error) {
			flow, d, err := dake(5, 0.5, relperm.MonotoneCubic)
			if err != nil {
				return nil, err
			}
			flood, err := reservoir.NewLinear(reservoir.Layer{
				Length: si(units.Length, 2000, "ft"), Area: si(units.Length, 625, "ft") * si(units.Length, 40, "ft"), Porosity: 0.18,
				Permeability: anyPermeability, Bw: 1, Bo: 1.3, Uptime: 1, Drive: reservoir.ConstantRate{Q: si(units.Rate, 1000, "bbl/d")},
			}, flow, d)
			if err != nil {
				return nil, err
			}
			year := si(units.Duration, 365, "d")
			arrival, _ := flood.Breakthrough()
			return []float64{flood.TimeAt(1) / year, arrival / year}, nil
		}},
	{ID: "ahmed-breakthrough", Topic: "Field", Title: "Water at the producer of a linear flood", Source: ref.Ahmed2001, Place: "Ch. 14, breakthrough examples", Provenance: Memory,
		Inputs: "pore volume 775 779 bbl, 900 bbl/d, Swi 0.20, fw 0.78 at the front, slope 1.973 of its tangent, Bo 1.25, Bw 1.02", How: "a flood at constant rate along curves made so that their front has the printed fw and slope: its saturation, the volumes, the average, the time and the cut at surface are then solved here, the tangent is not",
		Items: []Item{
			{"Sw at the front", 0.596, 0.001, "printed with three decimals beside a slope and an fw that give 0.5953"},
			{"days to breakthrough", 436.88, 0.01, lastDigit},
			{"injected at breakthrough, bbl", 393198, 0.5, lastDigit},
			{"injected at breakthrough, PV", 0.507, 0.0005, lastDigit},
			{"average Sw at breakthrough", 0.707, 0.0005, lastDigit},
			{"displacement efficiency", 0.634, 0.0005, lastDigit},
			{"water-oil ratio at surface", 4.34, 0.01, "fw printed with two decimals"},
		},
		compute: ahmedFlood},
}

// anyPermeability (m2): at a constant rate time and volumes do not hang on it.
const anyPermeability = 1e-13

// ahmedFlood floods 775,779 bbl of pores with 900 bbl/d. The curves are straight lines
// between three points, for phases of one viscosity, so that fw = krw runs straight from
// Swi to the printed fw with the printed slope and less steeply from there on.
func ahmedFlood() ([]float64, error) {
	const swi, swmax, cut, slope, bw, bo = 0.2, 0.8, 0.78, 1.973, 1.02, 1.25
	table, err := relperm.NewTable([]float64{swi, swi + cut/slope, swmax}, []float64{0, cut, 1}, []float64{1, 1 - cut, 0}, relperm.StraightLine)
	if err != nil {
		return nil, err
	}
	mu := si(units.Viscosity, 1, "cp")
	flow := fracflow.Flow{Curves: table, MuW: mu, MuO: mu}
	d, err := displace.New(flow, swmax, swi)
	if err != nil {
		return nil, err
	}
	flood, err := reservoir.NewLinear(reservoir.Layer{
		Length: 1, Area: si(units.Volume, 775779, "bbl"), Porosity: 1, Permeability: anyPermeability,
		Bw: bw, Bo: bo, Uptime: 1, Drive: reservoir.ConstantRate{Q: si(units.Rate, 900, "bbl/d")},
	}, flow, d)
	if err != nil {
		return nil, err
	}
	t, q := flood.Breakthrough()
	behind, _, _ := d.Front()
	f, _ := flow.At(behind)
	surface := fracflow.SurfaceCut(f, bw, bo)
	return []float64{
		behind, t / si(units.Duration, 1, "d"), q * flood.PoreVolume() / si(units.Volume, 1, "bbl"), q,
		d.Average(q), d.Recovery(q) / (1 - swi), surface / (1 - surface),
	}, nil
}
