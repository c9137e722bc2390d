package study

import (
	"math"

	"brinefront/physics/units"
)

// Layers are the layers of the block, or a permeability log of it.
type Layers struct {
	Table     string `json:"table,omitempty"`     // as pasted: see CheckText; empty: one layer, as the block says
	Crossflow string `json:"crossflow,omitempty"` // see Crossflows
	Groups    *Input `json:"groups,omitempty"`    // layers of equal flow capacity to lump the table into; nil: as it is
}

// Wells are what the two wells add to the block, and how they are run.
type Wells struct {
	Schedule string `json:"schedule,omitempty"` // as pasted: see CheckText; empty: the drive, from the start

	PressureLimit    *Input `json:"pressureLimit,omitempty"`    // a rate takes no more pressure difference; nil: whatever it takes
	Radius           *Input `json:"radius,omitempty"`           // nil: flow does not converge
	InjectorSkin     *Input `json:"injectorSkin,omitempty"`     // nil: 0
	ProducerSkin     *Input `json:"producerSkin,omitempty"`     // nil: 0
	ProducerPressure *Input `json:"producerPressure,omitempty"` // at the bottom of the producer
	Depth            *Input `json:"depth,omitempty"`            // of the perforations
	FractureGradient *Input `json:"fractureGradient,omitempty"` // pressure that fractures, over depth
	Gas              *Input `json:"gas,omitempty"`              // saturation of gas at the start; nil: 0
}

// Money is the price-and-cost line, in any one currency.
type Money struct {
	Oil       *Input `json:"oil,omitempty"`       // received for oil, per surface volume
	Water     *Input `json:"water,omitempty"`     // spent on produced water; nil: 0
	Injection *Input `json:"injection,omitempty"` // spent on injected water, per reservoir volume; nil: 0
	Fixed     *Input `json:"fixed,omitempty"`     // spent in time; nil: 0
	Discount  *Input `json:"discount,omitempty"`  // a year; nil: 0
}

// History is what the field has made so far.
type History struct {
	Table string `json:"table,omitempty"` // measured rates, as pasted: see CheckText
	From  *Input `json:"from,omitempty"`  // water-oil ratio from which the late straight line is drawn; nil: 1
}

// Crossflows are the answers of the forecast about flow between layers.
var Crossflows = []Choice{
	{"none", "none: layers apart, at a common pressure difference"},
	{"viscous", "full, fastest layer first"},
	{"gravity", "full, lowest layer first"},
}

// manyfold reports whether the field is more than an even block under one drive.
func manyfold(st *Study) bool {
	l, w, m := st.Field.Layers, st.Field.Wells, st.Field.Money
	if patterned(st) || l.Table != "" || w.Schedule != "" || historied(st) || st.Field.Limit == "cash" {
		return true
	}
	for _, in := range []*Input{w.PressureLimit, w.Radius, w.InjectorSkin, w.ProducerSkin, w.ProducerPressure, w.Gas, m.Oil} {
		if in != nil {
			return true
		}
	}
	return false
}

func layered(s *Study) bool       { return s.Field.Layers.Table != "" }
func unlayered(s *Study) bool     { return !layered(s) }
func historied(s *Study) bool     { return s.Field.History.Table != "" }
func scheduled(s *Study) bool     { return s.Field.Wells.Schedule != "" }
func priced(s *Study) bool        { return s.Field.Money.Oil != nil || s.Field.Limit == "cash" }
func limitedByCash(s *Study) bool { return s.Field.Limit == "cash" }

var manyfoldSpecs = []Spec{
	{Path: "field.layers.groups", Sheet: SheetField, Group: "Layers", Label: "Lump into at most", Symbol: "N", Quantity: units.Number, Min: 1, Max: MaxLayers, Optional: true, Default: "every row is a layer", Help: "Layers of equal flow capacity, from a log or a long table.", at: func(s *Study) **Input { return &s.Field.Layers.Groups }, when: layered},
	{Path: "field.wells.pressureLimit", Sheet: SheetField, Group: "Wells", Label: "Pressure difference not exceeded", Symbol: "Δp,max", Quantity: units.Pressure, Min: 0, OpenMin: true, Max: 1e9, Optional: true, Default: "the rate takes what it needs", Help: "Between the wells; where the rate would take more, the pressure is held instead.", at: func(s *Study) **Input { return &s.Field.Wells.PressureLimit }, when: heldRate},
	{Path: "field.wells.radius", Sheet: SheetField, Group: "Wells", Label: "Well radius", Symbol: "rw", Quantity: units.Length, Min: 0, OpenMin: true, Max: 1, Optional: true, Default: "in a block flow converges on no well; in a pattern 0.1 m", Help: "Of both wells; in a block each is in the middle of its end.", at: func(s *Study) **Input { return &s.Field.Wells.Radius }},
	{Path: "field.wells.injectorSkin", Sheet: SheetField, Group: "Wells", Label: "Skin of the injector", Symbol: "si", Quantity: units.Number, Min: -7, Max: 500, Optional: true, Default: "0", at: func(s *Study) **Input { return &s.Field.Wells.InjectorSkin }},
	{Path: "field.wells.producerSkin", Sheet: SheetField, Group: "Wells", Label: "Skin of the producer", Symbol: "sp", Quantity: units.Number, Min: -7, Max: 500, Optional: true, Default: "0", at: func(s *Study) **Input { return &s.Field.Wells.ProducerSkin }},
	{Path: "field.wells.gas", Sheet: SheetField, Group: "Wells", Label: "Gas saturation at the start", Symbol: "Sg", Quantity: units.Fraction, Min: 0, Max: 0.5, Optional: true, Default: "0, the rock is full of liquid", Help: "Space that injection fills before the producer responds.", at: func(s *Study) **Input { return &s.Field.Wells.Gas }},
	{Path: "field.wells.producerPressure", Sheet: SheetField, Group: "Wells", Label: "Producer pressure, at the bottom", Symbol: "pp", Quantity: units.Pressure, Min: 0, Max: 3e8, Optional: true, Default: "the injector's pressure is not told", at: func(s *Study) **Input { return &s.Field.Wells.ProducerPressure }},
	{Path: "field.wells.depth", Sheet: SheetField, Group: "Wells", Label: "Depth of the perforations", Symbol: "D", Quantity: units.Length, Min: 0, OpenMin: true, Max: 2e4, Optional: true, Default: "the fracture pressure is not told", at: func(s *Study) **Input { return &s.Field.Wells.Depth }, when: func(s *Study) bool { return s.Field.Wells.ProducerPressure != nil }},
	{Path: "field.wells.fractureGradient", Sheet: SheetField, Group: "Wells", Label: "Fracture gradient", Symbol: "Gf", Quantity: units.PressureGradient, Min: 0, OpenMin: true, Max: 1e5, Optional: true, Default: "the fracture pressure is not told", Help: "Of your own tests: the pressure at which the rock parts, over its depth.", at: func(s *Study) **Input { return &s.Field.Wells.FractureGradient }, when: func(s *Study) bool { return s.Field.Wells.ProducerPressure != nil }},
	{Path: "field.history.from", Sheet: SheetField, Group: "History", Label: "Straight line from a water-oil ratio of", Symbol: "WOR1", Quantity: units.WaterOilRatio, Min: 0, OpenMin: true, Max: 1e4, Optional: true, Default: "1, half the stream water", Help: "Where the late trend is taken to begin.", at: func(s *Study) **Input { return &s.Field.History.From }, when: historied},
	{Path: "field.money.oil", Sheet: SheetField, Group: "Money", Label: "Received for oil", Symbol: "co", Quantity: units.Price, Min: 0, Max: 1e7, Optional: true, Default: "no cash is told", Help: "In any currency, one for all.", spared: func(s *Study) bool { return !limitedByCash(s) }, at: func(s *Study) **Input { return &s.Field.Money.Oil }},
	{Path: "field.money.water", Sheet: SheetField, Group: "Money", Label: "Spent on produced water", Symbol: "cw", Quantity: units.Price, Min: 0, Max: 1e7, Optional: true, Default: "0", at: func(s *Study) **Input { return &s.Field.Money.Water }, when: priced},
	{Path: "field.money.injection", Sheet: SheetField, Group: "Money", Label: "Spent on injected water", Symbol: "ci", Quantity: units.Price, Min: 0, Max: 1e7, Optional: true, Default: "0", at: func(s *Study) **Input { return &s.Field.Money.Injection }, when: priced},
	{Path: "field.money.fixed", Sheet: SheetField, Group: "Money", Label: "Spent in time", Symbol: "cf", Quantity: units.CostRate, Min: 0, Max: 1e6, Optional: true, Default: "0", at: func(s *Study) **Input { return &s.Field.Money.Fixed }, when: priced},
	{Path: "field.money.discount", Sheet: SheetField, Group: "Money", Label: "Discount rate, a year", Symbol: "i", Quantity: units.Share, Min: 0, Max: 1, Optional: true, Default: "0", at: func(s *Study) **Input { return &s.Field.Money.Discount }, when: priced},
}

// money reads an optional amount; 0 where none is typed.
func (s *sheet) or(path string, otherwise float64) float64 {
	if v, given := s.input(path); given && !math.IsNaN(v) {
		return v
	}
	return otherwise
}
