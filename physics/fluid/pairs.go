package fluid

// Pairs lists every pair, the most used first.
func Pairs() []Pair {
	brine := Phase{
		Name: "brine", Symbol: "w", Saturation: "Sw", Wetting: true, Brine: true, Immobile: "Swc", ImmobileName: "connate water",
		Viscosity: Typical{0.5e-3, 0.2e-3, 1.5e-3, "falls by half from 20 °C to 60 °C, rises with salt; better computed from temperature and salinity"},
		Density:   Typical{1050, 950, 1200, "better computed from temperature, pressure and salinity"},
	}
	oil := Phase{
		Name: "oil", Symbol: "o", Saturation: "So", Immobile: "Sor", ImmobileName: "residual oil",
		Viscosity: Typical{2e-3, 0.3e-3, 50e-3, "light to medium oil with its gas in solution; heavy oil lies far above"},
		Density:   Typical{800, 650, 950, "at reservoir conditions, with its gas in solution"},
	}
	gas := Phase{
		Name: "gas", Symbol: "g", Saturation: "Sg", Immobile: "Sgc", ImmobileName: "critical gas",
		Viscosity: Typical{0.02e-3, 0.011e-3, 0.04e-3, "natural gas at 10 to 40 MPa"},
		Density:   Typical{150, 50, 350, "natural gas at 10 to 40 MPa"},
	}
	liquid := oil
	liquid.Wetting, liquid.Saturation, liquid.Immobile, liquid.ImmobileName = true, "SL", "SLr", "residual liquid (connate water and residual oil)"
	trapped := gas
	trapped.Immobile, trapped.ImmobileName = "Sgr", "trapped gas"
	carbonDioxide := gas
	carbonDioxide.Name = "CO₂"
	carbonDioxide.Viscosity = Typical{0.06e-3, 0.02e-3, 0.1e-3, "dense CO₂; near 50 °C and 15 MPa"}
	carbonDioxide.Density = Typical{650, 250, 900, "dense CO₂; changes fast with pressure and temperature near 31 °C and 7.4 MPa"}
	drained := brine
	drained.Immobile, drained.ImmobileName = "Swirr", "irreducible water"

	return []Pair{
		{ID: BrineOil, Name: "Brine displaces oil", Displacing: brine, Resident: oil,
			Tension:  Typical{30e-3, 10e-3, 50e-3, "without surfactant"},
			Cautions: []Caution{wettingVaries, incompressible("brine-oil", "Both are liquids: a pressure change of 10 MPa changes their volumes by about 1 %.", "Nothing, unless gas comes out of solution below the bubble point.")}},
		{ID: GasOil, Name: "Gas displaces oil", Displacing: gas, Resident: liquid,
			Tension:  Typical{5e-3, 0.1e-3, 20e-3, "falls with pressure, to nothing where gas and oil mix"},
			Cautions: []Caution{override, gasFingers("gas-oil", "oil"), liquidStays, massTransfer, incompressible("gas-oil", gasShrinks, atMeanPressure)}},
		{ID: BrineGas, Name: "Brine displaces gas", Displacing: brine, Resident: trapped, Land: true,
			Tension:  Typical{50e-3, 25e-3, 72e-3, "falls with pressure and temperature"},
			Cautions: []Caution{gasTrapped, gasExpands, incompressible("brine-gas", gasShrinks, atMeanPressure)}},
		{ID: CO2Brine, Name: "CO₂ displaces brine", Displacing: carbonDioxide, Resident: drained,
			Tension:  Typical{32e-3, 25e-3, 50e-3, "falls with pressure, rises with salt"},
			Cautions: []Caution{dissolves, driesOut, gasFingers("co2-brine", "brine"), trapsLater, incompressible("co2-brine", gasShrinks, atMeanPressure)}},
	}
}

const (
	gasShrinks     = "Gas takes up less room where pressure is higher, so that rates and speeds differ between injector and producer."
	atMeanPressure = "Take viscosity, density and volume factor at the mean reservoir pressure, and see how far the answer moves with those at either end."
)

func incompressible(pair, cause, do string) Caution {
	return Caution{pair + ".incompressible", "Compressibility is ignored: volumes are those at one reservoir pressure.", cause, do}
}

func gasFingers(pair, resident string) Caution {
	return Caution{pair + ".fingers", "The displacing phase is far less viscous than the " + resident + ": without gravity's help the front is rarely stable.",
		"Fingers run ahead of the front in real rock; the one-dimensional answer has none.",
		"Take breakthrough as the latest and early recovery as the most to expect; look at the mobility ratio across the front and at the critical rate."}
}

var (
	wettingVaries = Caution{"brine-oil.wettability", "Brine is called the wetting phase here; in oil-wet or mixed-wet rock it is not.",
		"Relative permeability carries the effect of wettability into the front, whatever the name.",
		"Use curves measured on rock in its reservoir state; see the signs of wettability on the Rock sheet."}
	override = Caution{"gas-oil.override", "Gas is much lighter than oil and runs along the top of the layer unless it drives oil down-dip slowly enough.",
		"The one-dimensional answer spreads both phases over the whole height.",
		"Inject at the crest and stay below the critical rate; with no dip, or above that rate, take breakthrough as the latest."}
	liquidStays = Caution{"gas-oil.connateWater", "Connate water is counted as part of the liquid and does not move.",
		"Gas saturation is a fraction of the whole pore space, and the liquid left behind includes connate water.",
		"Give curves by gas or liquid saturation measured with connate water in place."}
	massTransfer = Caution{"gas-oil.transfer", "Gas and oil exchange nothing: no swelling, no vaporising, no mixing.",
		"Near or above the miscibility pressure exchange can leave far less oil behind.",
		"Compare the pressure with the minimum miscibility pressure; above it this answer does not apply."}
	gasTrapped = Caution{"brine-gas.trapped", "The gas that stays behind follows Land's law from the gas that was there at first.",
		"Trapped gas often decides recovery and is commonly 0.15 to 0.40 of the pore space; common practice, no source.",
		"Give Land's C from a measured pair of initial and trapped gas; see how far the answer moves with C."}
	gasExpands = Caution{"brine-gas.expansion", "Trapped gas keeps its volume here.",
		"When pressure falls later, trapped gas expands and some flows again.",
		"Add recovery by blow-down separately."}
	dissolves = Caution{"co2-brine.dissolution", "CO₂ does not dissolve in the brine here.",
		"Brine takes up some per cent of its weight, which holds the front back a little and stores CO₂ in the long run.",
		"Take the front's arrival as early, and storage by dissolution as extra."}
	driesOut = Caution{"co2-brine.dryOut", "CO₂ does not take up water here, so that the rock near the well never dries out.",
		"Drying raises CO₂ mobility near the well, and salt left behind lowers permeability.",
		"Treat injectivity separately, above all with salty brine."}
	trapsLater = Caution{"co2-brine.trapping", "This is drainage: CO₂ enters. What stays behind when brine returns is not part of it.",
		"Residual trapping happens in imbibition, after injection has stopped.",
		"Use Land's law on the saturations reached to judge it."}
)
