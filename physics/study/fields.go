package study

import (
	"math"
	"slices"

	"brinefront/physics/fluid"
	"brinefront/physics/units"
)

// Spec describes one numeric input: everything that the form, the validation,
// the schema and the report need to know about it. The list below is the only
// place where an input is described.
type Spec struct {
	Path     string // in the document, e.g. "fluids.oilViscosity"
	Sheet    Sheet  // the sheet whose form holds it
	Group    string // the form's group
	Label    string
	Symbol   string
	Quantity units.Quantity
	Min, Max float64 // SI, inclusive unless open
	OpenMin  bool
	OpenMax  bool
	Optional bool   // the study answers without it
	Default  string // what an empty optional input means, in words
	Help     string // one sentence

	// Usual is the range, SI, outside which a value is asked back about: common practice,
	// no source. Both are 0 where nothing is unusual.
	Usual    [2]float64
	practice string // a rule of the trade that ends Help, for the pairs of usualFor

	usualFor func(*Study) bool // the pairs that Usual and practice are about; nil: all
	at       func(*Study) **Input
	of       int               // the case it belongs to, counted from 1; 0: the study itself
	when     func(*Study) bool // the choices under which the study asks for it; nil: under all
	spared   func(*Study) bool // when an optional input is so only under some choices: those
}

// Specs lists every numeric input in the order of the forms.
func Specs() []Spec { return specs }

// Find returns the description of the input at a path: of the study, or of what a
// case changes (CasePath).
func Find(path string) (Spec, bool) {
	if i, inner, ok := AtCase(path); ok {
		return caseSpec(i, inner)
	}
	for i := range specs { // not by value: it is asked hundreds of times an evaluation
		if specs[i].Path == path {
			return specs[i], true
		}
	}
	return Spec{}, false
}

// Applies reports whether the study, with the choices it has, asks for the input.
func (s Spec) Applies(st *Study) bool { return s.when == nil || s.when(st) }

// For returns the description in the words of the study's pair of fluids.
func (s Spec) For(st *Study) Spec {
	if s.practice != "" && s.customary(st) {
		s.Help += " " + s.practice
	}
	if s.spared != nil {
		s.Optional = s.spared(st)
	}
	if w := wordsOf(pairOf(st)); w != nil {
		s.Label, s.Symbol, s.Default, s.Help = w.tell(s.Label), w.symbol(s.Symbol), w.tell(s.Default), w.tell(s.Help)
	}
	return s
}

// Get returns the input of a study, nil when nothing is given.
func (s Spec) Get(st *Study) *Input {
	if s.of > 0 {
		return s.inCase(st)
	}
	return *s.at(st)
}

// Set changes the input of a study; nil empties it.
func (s Spec) Set(st *Study, in *Input) {
	if s.of > 0 {
		s.setInCase(st, in)
		return
	}
	*s.at(st) = in
}

// The pairs that a usual range is about.
func displacedByBrine(s *Study) bool { return pairOf(s).Displacing.Brine }
func oilResident(s *Study) bool      { return pairOf(s).Resident.Name == "oil" }
func waterflood(s *Study) bool       { return displacedByBrine(s) && oilResident(s) }

// The choices under which an input is asked for.
func typedCorey(s *Study) bool    { return s.Rock.Curve == "corey" }
func typedLET(s *Study) bool      { return s.Rock.Curve == "let" }
func relativeToOil(s *Study) bool { return s.Rock.Reference == "oil" }
func heldRate(s *Study) bool      { return s.Field.Drive == "rate" }
func heldPressure(s *Study) bool  { return s.Field.Drive == "pressure" }
func limitedByCut(s *Study) bool  { return s.Field.Limit == "waterCut" }
func limitedByOil(s *Study) bool  { return s.Field.Limit == "oilRate" }
func trapping(s *Study) bool      { return pairOf(s).Land }
func withBrine(s *Study) bool {
	p := pairOf(s)
	return p.Displacing.Brine || p.Resident.Brine
}
func computedBrine(s *Study) bool { return withBrine(s) && s.Fluids.Temperature != nil }
func dipping(s *Study) bool       { return s.Front.Dip != nil && s.Front.Dip.Value != 0 }

// mayDip: at a constant pressure difference a dip is refused, but shown once it is typed.
func mayDip(s *Study) bool { return heldRate(s) || s.Front.Dip != nil }

func velocityCounts(s *Study) bool {
	return dipping(s) || s.Fluids.Tension != nil
}

var specs = slices.Concat([]Spec{
	{Path: "rock.permeability", Sheet: SheetRock, Group: "Plug", Label: "Permeability, absolute", Symbol: "k", Quantity: units.Permeability, Min: 0, OpenMin: true, Max: 1e-9, Optional: true, Default: "not needed unless kr refers to another permeability",
		Help: "Brine permeability of the plug at full saturation.", at: func(s *Study) **Input { return &s.Rock.Permeability }, when: relativeToOil},
	{Path: "rock.oilPermeability", Sheet: SheetRock, Group: "Plug", Label: "Oil permeability at initial water", Symbol: "ko(Swi)", Quantity: units.Permeability, Min: 0, OpenMin: true, Max: 1e-9, Optional: true, Default: "needed when kr refers to it",
		Help: "Converts curves that the laboratory reported relative to ko(Swi) to absolute permeability.", at: func(s *Study) **Input { return &s.Rock.OilPermeability }, when: relativeToOil},

	{Path: "rock.corey.swc", Sheet: SheetRock, Group: "Corey", Label: "Connate water", Symbol: "Swc", Quantity: units.Fraction, Min: 0, Max: 1, OpenMax: true, at: func(s *Study) **Input { return &s.Rock.Corey.Swc }, when: typedCorey},
	{Path: "rock.corey.sor", Sheet: SheetRock, Group: "Corey", Label: "Residual oil", Symbol: "Sor", Quantity: units.Fraction, Min: 0, Max: 1, OpenMax: true, at: func(s *Study) **Input { return &s.Rock.Corey.Sor }, when: typedCorey},
	{Path: "rock.corey.krw0", Sheet: SheetRock, Group: "Corey", Label: "krw at Sor", Symbol: "krw0", Quantity: units.Fraction, Min: 0, OpenMin: true, Max: 2, at: func(s *Study) **Input { return &s.Rock.Corey.Krw0 }, when: typedCorey},
	{Path: "rock.corey.kro0", Sheet: SheetRock, Group: "Corey", Label: "kro at Swc", Symbol: "kro0", Quantity: units.Fraction, Min: 0, OpenMin: true, Max: 2, at: func(s *Study) **Input { return &s.Rock.Corey.Kro0 }, when: typedCorey},
	{Path: "rock.corey.nw", Sheet: SheetRock, Group: "Corey", Label: "Water exponent", Symbol: "nw", Quantity: units.Number, Min: 1, Max: 15, at: func(s *Study) **Input { return &s.Rock.Corey.Nw }, when: typedCorey},
	{Path: "rock.corey.no", Sheet: SheetRock, Group: "Corey", Label: "Oil exponent", Symbol: "no", Quantity: units.Number, Min: 1, Max: 15, at: func(s *Study) **Input { return &s.Rock.Corey.No }, when: typedCorey},

	{Path: "rock.let.swc", Sheet: SheetRock, Group: "LET", Label: "Connate water", Symbol: "Swc", Quantity: units.Fraction, Min: 0, Max: 1, OpenMax: true, at: func(s *Study) **Input { return &s.Rock.LET.Swc }, when: typedLET},
	{Path: "rock.let.sor", Sheet: SheetRock, Group: "LET", Label: "Residual oil", Symbol: "Sor", Quantity: units.Fraction, Min: 0, Max: 1, OpenMax: true, at: func(s *Study) **Input { return &s.Rock.LET.Sor }, when: typedLET},
	{Path: "rock.let.krw0", Sheet: SheetRock, Group: "LET", Label: "krw at Sor", Symbol: "krw0", Quantity: units.Fraction, Min: 0, OpenMin: true, Max: 2, at: func(s *Study) **Input { return &s.Rock.LET.Krw0 }, when: typedLET},
	{Path: "rock.let.kro0", Sheet: SheetRock, Group: "LET", Label: "kro at Swc", Symbol: "kro0", Quantity: units.Fraction, Min: 0, OpenMin: true, Max: 2, at: func(s *Study) **Input { return &s.Rock.LET.Kro0 }, when: typedLET},
	{Path: "rock.let.lw", Sheet: SheetRock, Group: "LET", Label: "Water, lower part", Symbol: "Lw", Quantity: units.Number, Min: 1, Max: 20, at: func(s *Study) **Input { return &s.Rock.LET.Lw }, when: typedLET},
	{Path: "rock.let.ew", Sheet: SheetRock, Group: "LET", Label: "Water, elevation", Symbol: "Ew", Quantity: units.Number, Min: 0, OpenMin: true, Max: 1e4, at: func(s *Study) **Input { return &s.Rock.LET.Ew }, when: typedLET},
	{Path: "rock.let.tw", Sheet: SheetRock, Group: "LET", Label: "Water, top part", Symbol: "Tw", Quantity: units.Number, Min: 0.5, Max: 20, at: func(s *Study) **Input { return &s.Rock.LET.Tw }, when: typedLET},
	{Path: "rock.let.lo", Sheet: SheetRock, Group: "LET", Label: "Oil, lower part", Symbol: "Lo", Quantity: units.Number, Min: 1, Max: 20, at: func(s *Study) **Input { return &s.Rock.LET.Lo }, when: typedLET},
	{Path: "rock.let.eo", Sheet: SheetRock, Group: "LET", Label: "Oil, elevation", Symbol: "Eo", Quantity: units.Number, Min: 0, OpenMin: true, Max: 1e4, at: func(s *Study) **Input { return &s.Rock.LET.Eo }, when: typedLET},
	{Path: "rock.let.to", Sheet: SheetRock, Group: "LET", Label: "Oil, top part", Symbol: "To", Quantity: units.Number, Min: 0.5, Max: 20, at: func(s *Study) **Input { return &s.Rock.LET.To }, when: typedLET},
}, capillarySpecs, []Spec{
	{Path: "fluids.waterViscosity", Sheet: SheetFront, Group: "Fluids", Label: "Water viscosity", Symbol: "µw", Quantity: units.Viscosity, Min: 1e-6, Max: 10, Optional: true, Default: "computed when it is brine and a temperature is given; needed otherwise", Help: "At reservoir temperature.", Usual: [2]float64{0.1e-3, 2e-3}, usualFor: displacedByBrine, spared: func(s *Study) bool { return s.Fluids.Temperature != nil && pairOf(s).Displacing.Brine }, at: func(s *Study) **Input { return &s.Fluids.WaterViscosity }},
	{Path: "fluids.oilViscosity", Sheet: SheetFront, Group: "Fluids", Label: "Oil viscosity", Symbol: "µo", Quantity: units.Viscosity, Min: 1e-6, Max: 1e4, Optional: true, Default: "computed when it is brine and a temperature is given; needed otherwise", Help: "At reservoir temperature and pressure, oil with its gas in solution.", Usual: [2]float64{0.1e-3, 1}, usualFor: oilResident, spared: func(s *Study) bool { return s.Fluids.Temperature != nil && pairOf(s).Resident.Brine }, at: func(s *Study) **Input { return &s.Fluids.OilViscosity }},
	{Path: "fluids.waterFormationFactor", Sheet: SheetFront, Group: "Fluids", Label: "Water formation volume factor", Symbol: "Bw", Quantity: units.FormationFactor, Min: 1e-4, Max: 10, Help: "Reservoir volume of one surface volume of water.", Usual: [2]float64{0.98, 1.1}, usualFor: displacedByBrine, at: func(s *Study) **Input { return &s.Fluids.WaterFormationFactor }},
	{Path: "fluids.oilFormationFactor", Sheet: SheetFront, Group: "Fluids", Label: "Oil formation volume factor", Symbol: "Bo", Quantity: units.FormationFactor, Min: 1e-4, Max: 10, Help: "Reservoir volume of one surface volume of oil.", Usual: [2]float64{1, 3}, usualFor: oilResident, at: func(s *Study) **Input { return &s.Fluids.OilFormationFactor }},
	{Path: "fluids.temperature", Sheet: SheetFront, Group: "Fluids", Label: "Reservoir temperature", Symbol: "T", Quantity: units.Temperature, Min: 273.15, Max: 623.15, Optional: true, Default: "viscosity and density of brine must be typed", Help: "Gives the viscosity and density of brine where none is typed.", at: func(s *Study) **Input { return &s.Fluids.Temperature }, when: withBrine},
	{Path: "fluids.pressure", Sheet: SheetFront, Group: "Fluids", Label: "Reservoir pressure", Symbol: "p", Quantity: units.Pressure, Min: 611, Max: 1e8, Optional: true, Default: "20 MPa; 10 MPa more or less changes brine by up to half a percent in density and one in viscosity below 110 °C, by more above", at: func(s *Study) **Input { return &s.Fluids.Pressure }, when: computedBrine},
	{Path: "fluids.salinity", Sheet: SheetFront, Group: "Fluids", Label: "Salinity", Symbol: "s", Quantity: units.Salinity, Min: 0, Max: fluid.MaxSalinity, Optional: true, Default: "0, fresh water", Help: "Mass of all salts in the mass of brine.", at: func(s *Study) **Input { return &s.Fluids.Salinity }, when: computedBrine},
	{Path: "fluids.waterDensity", Sheet: SheetFront, Group: "Fluids", Label: "Water density", Symbol: "ρw", Quantity: units.Density, Min: 0, OpenMin: true, Max: 3000, Optional: true, Default: "computed when it is brine and a temperature is given; needed when the layer dips", spared: func(s *Study) bool { return s.Fluids.Temperature != nil && pairOf(s).Displacing.Brine }, at: func(s *Study) **Input { return &s.Fluids.WaterDensity }, when: dipping},
	{Path: "fluids.oilDensity", Sheet: SheetFront, Group: "Fluids", Label: "Oil density", Symbol: "ρo", Quantity: units.Density, Min: 0, OpenMin: true, Max: 3000, Optional: true, Default: "computed when it is brine and a temperature is given; needed when the layer dips", Help: "At reservoir conditions.", spared: func(s *Study) bool { return s.Fluids.Temperature != nil && pairOf(s).Resident.Brine }, at: func(s *Study) **Input { return &s.Fluids.OilDensity }, when: dipping},
	{Path: "fluids.tension", Sheet: SheetFront, Group: "Fluids", Label: "Interfacial tension", Symbol: "σ", Quantity: units.InterfacialTension, Min: 0, OpenMin: true, Max: 1, Optional: true, Default: "the capillary number is not told, nor Pc of a J-function or of other conditions", Help: "Between the two phases, at reservoir conditions.", at: func(s *Study) **Input { return &s.Fluids.Tension }},

	{Path: "front.initialWater", Sheet: SheetFront, Group: "States", Label: "Initial water saturation", Symbol: "Swi", Quantity: units.Fraction, Min: 0, Max: 1, Optional: true, Default: "Swc of the curve", at: func(s *Study) **Input { return &s.Front.InitialWater }},
	{Path: "front.injectedWater", Sheet: SheetFront, Group: "States", Label: "Saturation held at the inlet", Symbol: "Swj", Quantity: units.Fraction, Min: 0, Max: 1, Optional: true, Default: "1 − Sor of the curve", at: func(s *Study) **Input { return &s.Front.InjectedWater }},
	{Path: "rock.land", Sheet: SheetFront, Group: "States", Label: "Land's trapping coefficient", Symbol: "C", Quantity: units.Number, Min: 0, Max: 1e3, Optional: true, Default: "what stays trapped is not judged", Help: "From a measured pair of initial and trapped gas, saturations over 1 − Swc.", at: func(s *Study) **Input { return &s.Rock.Land }, when: trapping},

	{Path: "front.dip", Sheet: SheetFront, Group: "Dip", Label: "Dip of the layer along the flow", Symbol: "θ", Quantity: units.Angle, Min: -math.Pi / 2, Max: math.Pi / 2, Optional: true, Default: "0, a level layer", Help: "Positive when water moves up-dip, negative when it moves down-dip.", at: func(s *Study) **Input { return &s.Front.Dip }, when: mayDip},
	{Path: "front.velocity", Sheet: SheetFront, Group: "Dip", Label: "Total Darcy velocity", Symbol: "u", Quantity: units.Velocity, Min: 0, OpenMin: true, Max: 1, Optional: true, Default: "rate over width and thickness of the field", Help: "Volume through a unit of cross-section while on; not divided by porosity.", at: func(s *Study) **Input { return &s.Front.Velocity }, when: velocityCounts},
}, riderSpecs, soakSpecs, blockSpecs, []Spec{
	{Path: "field.length", Sheet: SheetField, Group: "Block", Label: "Length, injector to producer", Symbol: "L", Quantity: units.Length, Min: 0, OpenMin: true, Max: 1e5, at: func(s *Study) **Input { return &s.Field.Length }, when: blocked},
	{Path: "field.width", Sheet: SheetField, Group: "Block", Label: "Width across the flow", Symbol: "W", Quantity: units.Length, Min: 0, OpenMin: true, Max: 1e5, at: func(s *Study) **Input { return &s.Field.Width }, when: blocked},
	{Path: "field.thickness", Sheet: SheetField, Group: "Block", Label: "Net thickness", Symbol: "h", Quantity: units.Length, Min: 0, OpenMin: true, Max: 5e3, at: func(s *Study) **Input { return &s.Field.Thickness }, when: unlayered},
	{Path: "field.porosity", Sheet: SheetField, Group: "Block", Label: "Porosity", Symbol: "φ", Quantity: units.Fraction, Min: 0, OpenMin: true, Max: 1, OpenMax: true, Usual: [2]float64{0.03, 0.4}, at: func(s *Study) **Input { return &s.Field.Porosity }, when: unlayered},
	{Path: "field.permeability", Sheet: SheetField, Group: "Drive", Label: "Permeability, absolute", Symbol: "k", Quantity: units.Permeability, Min: 0, OpenMin: true, Max: 1e-9, Help: "Decides the rate when the pressure difference is held; at a constant rate it tells what pressure difference that takes.", at: func(s *Study) **Input { return &s.Field.Permeability }, when: unlayered},
	{Path: "field.rate", Sheet: SheetField, Group: "Drive", Label: "Injection rate while on", Symbol: "q", Quantity: units.Rate, Min: 0, OpenMin: true, Max: 100, Help: "Reservoir volume of water per day while the injector is on.", at: func(s *Study) **Input { return &s.Field.Rate }, when: heldRate},
	{Path: "field.pressure", Sheet: SheetField, Group: "Drive", Label: "Pressure difference", Symbol: "Δp", Quantity: units.Pressure, Min: 0, OpenMin: true, Max: 1e9, Help: "Injector to producer, held constant. Keep injection below fracture pressure.", at: func(s *Study) **Input { return &s.Field.Pressure }, when: heldPressure},
	{Path: "field.uptime", Sheet: SheetField, Group: "Drive", Label: "Share of time on", Symbol: "e", Quantity: units.Share, Min: 0, OpenMin: true, Max: 1, Optional: true, Default: "100 %", at: func(s *Study) **Input { return &s.Field.Uptime }},
	{Path: "field.waterCut", Sheet: SheetField, Group: "Limit", Label: "Water cut at the limit", Symbol: "fw,lim", Quantity: units.Share, Min: 0, OpenMin: true, Max: 1, OpenMax: true, Help: "At surface.", practice: "Common practice, no source: 90 to 98 %.", Usual: [2]float64{0.5, 0.995}, usualFor: waterflood, at: func(s *Study) **Input { return &s.Field.WaterCut }, when: limitedByCut},
	{Path: "field.oilRate", Sheet: SheetField, Group: "Limit", Label: "Oil rate at the limit", Symbol: "qo,lim", Quantity: units.Rate, Min: 0, OpenMin: true, Max: 100, Help: "Calendar-day average at surface.", at: func(s *Study) **Input { return &s.Field.OilRate }, when: limitedByOil},
	{Path: "field.horizon", Sheet: SheetField, Group: "Limit", Label: "Forecast to", Symbol: "tmax", Quantity: units.Duration, Min: 0, OpenMin: true, Max: 1e11, Optional: true, Default: "a little past the limit", at: func(s *Study) **Input { return &s.Field.Horizon }},
}, patternSpecs, manyfoldSpecs, gridSpecs)
