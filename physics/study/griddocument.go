package study

import "brinefront/physics/units"

// Gridding is what a simulation grid is asked about: how wrong it may be, how it is
// stepped, and a grid that somebody has in mind already.
type Gridding struct {
	Scheme string `json:"scheme"` // see Schemes

	ArrivalWithin  *Input `json:"arrivalWithin,omitempty"`  // part of the exact arrival; nil: 5 %
	RecoveryWithin *Input `json:"recoveryWithin,omitempty"` // of the pore volume; nil: 1 %
	RecoveryAt     *Input `json:"recoveryAt,omitempty"`     // pore volumes injected; nil: 1
	ArrivalCut     *Input `json:"arrivalCut,omitempty"`     // above the cut that flows at first; nil: 1 %
	CFL            *Input `json:"cfl,omitempty"`            // nil: 0.5, implicit 1
	Cells          *Input `json:"cells,omitempty"`          // one's own grid; nil: none
	Blocks         *Input `json:"blocks,omitempty"`         // of the coarse grid that pseudo-functions are made for; nil: 10
}

// The schemes of Gridding.
const (
	upstream = "upstream"
	implicit = "implicit"
)

// Schemes are the ways a grid is stepped.
var Schemes = []Choice{
	{upstream, "explicit, single-point upstream"},
	{implicit, "implicit, single-point upstream"},
	{"minmod", "explicit, second order, minmod"},
	{"vanLeer", "explicit, second order, van Leer"},
	{"superbee", "explicit, second order, superbee"},
}

// What holds where nothing is typed.
const (
	usualArrivalWithin  = 0.05
	usualRecoveryWithin = 0.01
	usualRecoveryAt     = 1.0
	usualArrivalCut     = 0.01
	usualBlocks         = 10
)

// gridSpecs are the inputs of the Grid sheet.
var gridSpecs = []Spec{
	{Path: "grid.arrivalWithin", Sheet: SheetGrid, Group: "Tolerance", Label: "Arrival of water within", Symbol: "εa", Quantity: units.Share, Min: 0.001, Max: 1, Optional: true, Default: "5 % of the exact arrival", at: func(s *Study) **Input { return &s.Grid.ArrivalWithin }},
	{Path: "grid.recoveryWithin", Sheet: SheetGrid, Group: "Tolerance", Label: "Recovery within, of the pore volume", Symbol: "εr", Quantity: units.Share, Min: 0.0001, Max: 1, Optional: true, Default: "1 % of the pore volume", at: func(s *Study) **Input { return &s.Grid.RecoveryWithin }},
	{Path: "grid.recoveryAt", Sheet: SheetGrid, Group: "Tolerance", Label: "Recovery counts after", Symbol: "Qz", Quantity: units.PoreVolumes, Min: 0.01, Max: 10, Optional: true, Default: "1 PV", at: func(s *Study) **Input { return &s.Grid.RecoveryAt }},
	{Path: "grid.arrivalCut", Sheet: SheetGrid, Group: "Tolerance", Label: "Water has arrived at a cut of", Symbol: "Δfa", Quantity: units.Share, Min: 0.0001, Max: 0.9, Optional: true, Default: "1 % above the cut that flows at first", Help: "At reservoir conditions, above the cut that flows at first.", at: func(s *Study) **Input { return &s.Grid.ArrivalCut }},
	{Path: "grid.cells", Sheet: SheetGrid, Group: "Grid", Label: "Your number of cells between the wells", Symbol: "Nm", Quantity: units.Number, Min: 2, Max: 1000, Optional: true, Default: "only the advised number is told", Help: "A whole number: how wrong that grid is, and in which direction.", at: func(s *Study) **Input { return &s.Grid.Cells }},
	{Path: "grid.blocks", Sheet: SheetGrid, Group: "Grid", Label: "Blocks of a coarse grid", Symbol: "Nc", Quantity: units.Number, Min: 2, Max: 40, Optional: true, Default: "10", Help: "A whole number: pseudo-functions are made for this grid.", at: func(s *Study) **Input { return &s.Grid.Blocks }},
	{Path: "grid.cfl", Sheet: SheetGrid, Group: "Scheme", Label: "CFL number", Symbol: "CFL", Quantity: units.Number, Min: 0.02, Max: 1000, Optional: true, Default: "0.5, implicit 1", Help: "Fastest wave times step over cell. Stable explicitly up to 1, at second order up to 0.5; implicitly at any.", at: func(s *Study) **Input { return &s.Grid.CFL }},
}
