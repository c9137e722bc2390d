package evidence

import (
	"brinefront/physics/fluid"
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// waterViscosities gives the viscosity of water, in µPa s, at pairs of temperature (K) and
// density (kg/m3).
func waterViscosities(states ...[2]float64) func() ([]float64, error) {
	return func() ([]float64, error) {
		var values []float64
		for _, s := range states {
			mu, err := fluid.WaterViscosity(s[0], s[1])
			if err != nil {
				return nil, err
			}
			values = append(values, 1e6*mu)
		}
		return values, nil
	}
}

const nineFigures = "half a unit in the last printed digit, and rounding of the release's coefficients"

var waterChecks = []Check{
	{ID: "iapws-r12-08", Topic: "Fluids", Title: "Viscosity of water", Source: ref.IAPWSR12, Place: "Table 4, µ2 = 1", Provenance: Read,
		Inputs: "temperature and density", How: "the release's formulation, without the critical enhancement",
		Items: append(items(0.5e-4, lastDigit, "298.15 K, 998 kg/m³, µPa s", 889.7351), items(0.5e-6, nineFigures,
			"298.15 K, 1200 kg/m³", 1437.649467, "373.15 K, 1000 kg/m³", 307.883622, "433.15 K, 1 kg/m³", 14.538324, "433.15 K, 1000 kg/m³", 217.685358,
			"873.15 K, 1 kg/m³", 32.619287, "873.15 K, 100 kg/m³", 35.802262, "873.15 K, 600 kg/m³", 77.430195,
			"1173.15 K, 1 kg/m³", 44.217245, "1173.15 K, 100 kg/m³", 47.640433, "1173.15 K, 400 kg/m³", 64.154608)...),
		compute: waterViscosities([2]float64{298.15, 998}, [2]float64{298.15, 1200}, [2]float64{373.15, 1000}, [2]float64{433.15, 1}, [2]float64{433.15, 1000},
			[2]float64{873.15, 1}, [2]float64{873.15, 100}, [2]float64{873.15, 600}, [2]float64{1173.15, 1}, [2]float64{1173.15, 100}, [2]float64{1173.15, 400})},
	{ID: "if97-volume", Topic: "Fluids", Title: "Specific volume of liquid water", Source: ref.IAPWSIF97, Place: "Table 5, region 1", Provenance: Read,
		Inputs: "temperature and pressure", How: "the formulation for liquid water",
		Items: append(items(0.5e-8, lastDigit, "300 K, 3 MPa, dm³/kg", 1.00215168), append(items(0.5e-9, lastDigit, "300 K, 80 MPa, dm³/kg", 0.971180894), items(0.5e-6, "printed with seven figures in our copy", "500 K, 3 MPa, dm³/kg", 1.202418)...)...),
		compute: func() ([]float64, error) {
			var values []float64
			for _, s := range [][2]float64{{300, 3e6}, {300, 80e6}, {500, 3e6}} {
				w, err := fluid.Water(s[0], s[1])
				if err != nil {
					return nil, err
				}
				values = append(values, 1e3/w.Density)
			}
			return values, nil
		}},
	{ID: "perry-saturated-water", Topic: "Fluids", Title: "Saturated liquid water", Source: ref.Perry2019, Place: "Table 2-135", Provenance: Read,
		Inputs: "280, 300, 320, 340, 360 and 370 K at saturation pressure", How: "density by IAPWS-IF97, viscosity by IAPWS R12-08; 18.015268 g/mol",
		Items: append(items(0.002, "another formulation of density: 0.004 %", "280 K, mol/dm³", 55.501, "300 K", 55.315, "320 K", 54.919, "340 K", 54.371, "360 K", 53.698, "370 K", 53.321),
			viscosityItems()...),
		compute: func() ([]float64, error) {
			var densities, viscosities []float64
			for _, t := range perryKelvin {
				p, err := fluid.SaturationPressure(t)
				if err != nil {
					return nil, err
				}
				w, err := fluid.Water(t, p)
				if err != nil {
					return nil, err
				}
				densities, viscosities = append(densities, w.Density/18.015268), append(viscosities, 1e6*w.Viscosity)
			}
			return append(densities, viscosities...), nil
		}},
}

var (
	perryKelvin    = []float64{280, 300, 320, 340, 360, 370}
	perryViscosity = []float64{1433.7, 853.84, 577.02, 421.97, 326.1, 291.36}
)

// viscosityItems are the handbook's viscosities; its formulation is older than that of 2008
// and differs by up to a tenth of a percent.
func viscosityItems() []Item {
	var list []Item
	for i, mu := range perryViscosity {
		list = append(list, Item{units.Format(perryKelvin[i], 3) + " K, µPa s", mu, 1e-3 * mu, "an older formulation of viscosity: a tenth of a percent"})
	}
	return list
}
