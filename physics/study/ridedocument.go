package study

import (
	"slices"

	"brinefront/physics/units"
)

// Rider is what rides along with the injected water and changes it. Every kind asks for
// those inputs that it needs.
type Rider struct {
	Kind string `json:"kind,omitempty"` // see Riders; empty: none

	Slug         *Input `json:"slug,omitempty"`         // pore volumes that carry it, then plain water; nil: all
	Retention    *Input `json:"retention,omitempty"`    // pore volumes of solution that the rock empties; nil: 0
	Inaccessible *Input `json:"inaccessible,omitempty"` // pore volume it cannot enter; nil: 0
	Viscosity    *Input `json:"viscosity,omitempty"`    // of the water that carries polymer

	Sor  *Input `json:"sor,omitempty"` // Corey curves of the rock in the changed water, Swc as without
	Krw0 *Input `json:"krw0,omitempty"`
	Kro0 *Input `json:"kro0,omitempty"` // nil: as without
	Nw   *Input `json:"nw,omitempty"`
	No   *Input `json:"no,omitempty"`

	Peclet *Input `json:"peclet,omitempty"` // over the length; nil: nothing spreads

	Temperature  *Input `json:"temperature,omitempty"`  // of the injected water
	OilViscosity *Input `json:"oilViscosity,omitempty"` // at that temperature
	RockHeat     *Input `json:"rockHeat,omitempty"`     // of the grains, per volume
	OilHeat      *Input `json:"oilHeat,omitempty"`      // per volume
}

// The kinds of Rider.
const (
	noRider     = "none"
	riderOfHeat = "heat"
	polymer     = "polymer"
	salt        = "salt"
	tracer      = "tracer"
)

// Riders are what may ride along with the injected water.
var Riders = []Choice{
	{noRider, "nothing"},
	{polymer, "polymer"},
	{salt, "another salinity, with curves of its own"},
	{tracer, "a tracer"},
	{riderOfHeat, "another temperature"},
}

// riding asks for an input where one of the kinds rides along.
func riding(kinds ...string) func(*Study) bool {
	return func(s *Study) bool { return slices.Contains(kinds, riderKind(s)) }
}

// riderKind is what rides along in a study. Nothing does where the displacing phase is no
// brine: the choice is kept for the day it is one again.
func riderKind(s *Study) string {
	if !pairOf(s).Displacing.Brine || s.Front.Rider.Kind == "" {
		return noRider
	}
	return s.Front.Rider.Kind
}

const riderGroup = "Rider"

// riderSpecs are the inputs of what rides along.
var riderSpecs = []Spec{
	{Path: "front.rider.viscosity", Sheet: SheetFront, Group: riderGroup, Label: "Viscosity of the polymer water", Symbol: "µp", Quantity: units.Viscosity, Min: 1e-6, Max: 100, Help: "In the rock, at its shear rate and temperature.",
		at: func(s *Study) **Input { return &s.Front.Rider.Viscosity }, when: riding(polymer)},

	{Path: "front.rider.sor", Sheet: SheetFront, Group: riderGroup, Label: "Residual oil in the injected water", Symbol: "Sor,2", Quantity: units.Fraction, Min: 0, Max: 1, OpenMax: true, Help: "Swc is taken as in the formation water.",
		at: func(s *Study) **Input { return &s.Front.Rider.Sor }, when: riding(salt)},
	{Path: "front.rider.krw0", Sheet: SheetFront, Group: riderGroup, Label: "krw at that residual oil", Symbol: "krw0,2", Quantity: units.Fraction, Min: 0, OpenMin: true, Max: 2, Help: "Relative to the permeability that the study's kr refers to.",
		at: func(s *Study) **Input { return &s.Front.Rider.Krw0 }, when: riding(salt)},
	{Path: "front.rider.kro0", Sheet: SheetFront, Group: riderGroup, Label: "kro at Swc in the injected water", Symbol: "kro0,2", Quantity: units.Fraction, Min: 0, OpenMin: true, Max: 2, Optional: true, Default: "as in the formation water",
		at: func(s *Study) **Input { return &s.Front.Rider.Kro0 }, when: riding(salt)},
	{Path: "front.rider.nw", Sheet: SheetFront, Group: riderGroup, Label: "Water exponent in the injected water", Symbol: "nw,2", Quantity: units.Number, Min: 1, Max: 15,
		at: func(s *Study) **Input { return &s.Front.Rider.Nw }, when: riding(salt)},
	{Path: "front.rider.no", Sheet: SheetFront, Group: riderGroup, Label: "Oil exponent in the injected water", Symbol: "no,2", Quantity: units.Number, Min: 1, Max: 15,
		at: func(s *Study) **Input { return &s.Front.Rider.No }, when: riding(salt)},

	{Path: "front.rider.temperature", Sheet: SheetFront, Group: riderGroup, Label: "Temperature of the injected water", Symbol: "Tj", Quantity: units.Temperature, Min: 273.15, Max: 623.15, Help: "As it enters the rock.",
		at: func(s *Study) **Input { return &s.Front.Rider.Temperature }, when: riding(riderOfHeat)},
	{Path: "front.rider.oilViscosity", Sheet: SheetFront, Group: riderGroup, Label: "Oil viscosity at that temperature", Symbol: "µo,2", Quantity: units.Viscosity, Min: 1e-6, Max: 1e4,
		at: func(s *Study) **Input { return &s.Front.Rider.OilViscosity }, when: riding(riderOfHeat)},
	{Path: "front.rider.rockHeat", Sheet: SheetFront, Group: riderGroup, Label: "Heat capacity of the grains", Symbol: "Cs", Quantity: units.HeatCapacity, Min: 0, Max: 1e8, Help: "Density times specific heat. Typical, common practice, no source: 2.0 to 2.5 MJ/(m³ K).",
		at: func(s *Study) **Input { return &s.Front.Rider.RockHeat }, when: riding(riderOfHeat)},
	{Path: "front.rider.oilHeat", Sheet: SheetFront, Group: riderGroup, Label: "Heat capacity of the oil", Symbol: "Co", Quantity: units.HeatCapacity, Min: 0, Max: 1e8, Help: "Density times specific heat, at reservoir conditions; below that of water. Typical of crude, common practice, no source: 1.5 to 1.9 MJ/(m³ K).",
		at: func(s *Study) **Input { return &s.Front.Rider.OilHeat }, when: riding(riderOfHeat)},

	{Path: "front.rider.retention", Sheet: SheetFront, Group: riderGroup, Label: "Retention", Symbol: "D", Quantity: units.PoreVolumes, Min: 0, Max: 100, Optional: true, Default: "0", Help: "Pore volumes of the injected solution that the rock empties: (1 − φ)/φ, times density of the grains, times mass held by mass of rock, over concentration.",
		at: func(s *Study) **Input { return &s.Front.Rider.Retention }, when: riding(polymer, salt, tracer)},
	{Path: "front.rider.inaccessible", Sheet: SheetFront, Group: riderGroup, Label: "Inaccessible pore volume", Symbol: "IPV", Quantity: units.Fraction, Min: 0, Max: 1, OpenMax: true, Optional: true, Default: "0", Help: "The part of the pore volume that polymer is too large to enter.",
		at: func(s *Study) **Input { return &s.Front.Rider.Inaccessible }, when: riding(polymer)},
	{Path: "front.rider.peclet", Sheet: SheetFront, Group: riderGroup, Label: "Péclet number over the length", Symbol: "Pe", Quantity: units.Number, Min: 0, OpenMin: true, Max: 1e9, Optional: true, Default: "nothing spreads", Help: "Length over dispersivity.",
		at: func(s *Study) **Input { return &s.Front.Rider.Peclet }, when: riding(tracer)},
	{Path: "front.rider.slug", Sheet: SheetFront, Group: riderGroup, Label: "Slug", Symbol: "Qs", Quantity: units.PoreVolumes, Min: 0, OpenMin: true, Max: 1e3, Optional: true, Default: "injected without end", Help: "Pore volumes after which plain water follows, at the temperature of the reservoir.",
		at: func(s *Study) **Input { return &s.Front.Rider.Slug }, when: riding(polymer, salt, tracer, riderOfHeat)},
}
