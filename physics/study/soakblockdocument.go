package study

import (
	"slices"
	"strings"

	"brinefront/physics/units"
)

// Block is what soaks with water on its faces: a piece of reservoir between fractures. Its
// plug is what was tested in its stead.
type Block struct {
	Shape string `json:"shape,omitempty"` // see BlockShapes

	Length   *Input `json:"length,omitempty"`   // of a slab, box or cylinder; nil: there is no block
	Width    *Input `json:"width,omitempty"`    // of a box; nil: as the length
	Height   *Input `json:"height,omitempty"`   // of a box; nil: as the length
	Diameter *Input `json:"diameter,omitempty"` // of a cylinder or sphere

	Sizes            string `json:"sizes,omitempty"`            // as pasted, share of each size: see CheckText; empty: all blocks are like this one
	FracturePorosity *Input `json:"fracturePorosity,omitempty"` // volume of fractures over that of the rock; nil: fractures are not flooded

	Plug Plug `json:"plug,omitzero"`
}

// Plug is a soaking test; what is nil is as in the reservoir.
type Plug struct {
	Shape    string `json:"shape,omitempty"` // see PlugShapes
	Length   *Input `json:"length,omitempty"`
	Diameter *Input `json:"diameter,omitempty"` // nil: there is no plug

	Permeability   *Input `json:"permeability,omitempty"`
	Porosity       *Input `json:"porosity,omitempty"`
	WaterViscosity *Input `json:"waterViscosity,omitempty"`
	OilViscosity   *Input `json:"oilViscosity,omitempty"`
	Tension        *Input `json:"tension,omitempty"`
	Half           *Input `json:"half,omitempty"` // measured time of half of what soaked in; nil: as computed
}

// Given reports whether there is a block.
func (b Block) Given() bool { return *b.first() != nil }

// first is the size that the shape is told by.
func (b *Block) first() **Input {
	if firstSize(b.Shape) == "diameter" {
		return &b.Diameter
	}
	return &b.Length
}

// BlockShapes are the blocks, and their faces that water touches.
var BlockShapes = []Choice{
	{"box-6", "box, water on all six faces"},
	{"box-4", "box, water on the four faces around its height"},
	{"box-5", "box, water on all faces but the bottom"},
	{"slab-2", "slab, water on both faces"},
	{"slab-1", "slab, water on one face"},
	{"cylinder-all", "cylinder, water all around"},
	{"cylinder-side", "cylinder, water on its side"},
	{"cylinder-ends", "cylinder, water on both ends"},
	{"cylinder-end", "cylinder, water on one end"},
	{"sphere", "sphere"},
	{"box-211", "box, water on four faces: both along its length, one each along width and height"},
	{"box-210", "box, water on three faces: both along its length, one along its width"},
	{"box-200", "box, water on the two faces along its length"},
	{"box-111", "box, water on three faces that meet"},
	{"box-110", "box, water on two faces that meet, along length and width"},
	{"box-100", "box, water on one face along its length"},
}

// boxFaces are how many faces of a box are open along its length, width and height: all
// the ways there are, whichever edge is called its length.
var boxFaces = map[string][3]int{
	"6": {2, 2, 2}, "5": {2, 2, 1}, "4": {2, 2, 0}, "211": {2, 1, 1}, "210": {2, 1, 0}, "200": {2, 0, 0}, "111": {1, 1, 1}, "110": {1, 1, 0}, "100": {1, 0, 0},
}

// PlugShapes are the blocks that a plug may be.
var PlugShapes = BlockShapes[5:9]

func blockIs(kinds ...string) func(*Study) bool {
	return func(s *Study) bool {
		return withCapillary(s) && slices.ContainsFunc(kinds, func(k string) bool { return strings.HasPrefix(s.Block.Shape, k) })
	}
}

func withBlock(s *Study) bool { return withCapillary(s) && s.Block.Given() }
func withPlug(s *Study) bool  { return withBlock(s) && s.Block.Plug.Diameter != nil }

const (
	blockGroup    = "Block shape"
	fractureGroup = "Fractures"
	plugGroup     = "Plug"
)

func blockLength(path, label, symbol string, at func(*Study) **Input, when func(*Study) bool) Spec {
	return Spec{Path: "block." + path, Sheet: SheetSoak, Group: blockGroup, Label: label, Symbol: symbol, Quantity: units.Length, OpenMin: true, Max: 1e4, Optional: true, at: at, when: when}
}

func plugSpec(path, label, symbol, empty string, q units.Quantity, most float64, at func(*Plug) **Input) Spec {
	return Spec{Path: "block.plug." + path, Sheet: SheetSoak, Group: plugGroup, Label: label, Symbol: symbol, Quantity: q, OpenMin: true, Max: most, Optional: true, Default: empty,
		at: func(s *Study) **Input { return at(&s.Block.Plug) }, when: withPlug}
}

// blockSpecs are the inputs of blocks, fractures and plugs.
var blockSpecs = func() []Spec {
	length := blockLength("length", "Length or thickness", "Lb", func(s *Study) **Input { return &s.Block.Length }, blockIs("box", "slab", "cylinder"))
	length.Default = "no block is computed"
	diameter := blockLength("diameter", "Diameter", "db", func(s *Study) **Input { return &s.Block.Diameter }, blockIs("cylinder", "sphere"))
	diameter.Default = "no block is computed"
	width := blockLength("width", "Width", "Wb", func(s *Study) **Input { return &s.Block.Width }, blockIs("box"))
	width.Default = "as the length"
	height := blockLength("height", "Height", "hb", func(s *Study) **Input { return &s.Block.Height }, blockIs("box"))
	height.Default = "as the length"
	plug := plugSpec("diameter", "Diameter", "dp", "no plug is computed", units.Length, 1, func(p *Plug) **Input { return &p.Diameter })
	plug.when = withBlock
	return []Spec{
		length, width, height, diameter,
		{Path: "block.fracturePorosity", Sheet: SheetSoak, Group: fractureGroup, Label: "Fracture volume over rock volume", Symbol: "φf", Quantity: units.Fraction, Max: 0.2, Optional: true, Default: "no flood along fractures is computed", Help: "Common practice, no source: 0.0001 to 0.02.", at: func(s *Study) **Input { return &s.Block.FracturePorosity }, when: withBlock},
		plug,
		plugSpec("length", "Length", "Lp", "as the diameter", units.Length, 1, func(p *Plug) **Input { return &p.Length }),
		plugSpec("permeability", "Permeability", "kp", "as the reservoir", units.Permeability, 1e-9, func(p *Plug) **Input { return &p.Permeability }),
		plugSpec("porosity", "Porosity", "φp", "as the reservoir", units.Fraction, 1, func(p *Plug) **Input { return &p.Porosity }),
		plugSpec("waterViscosity", "Water viscosity", "µw,p", "as the reservoir", units.Viscosity, 10, func(p *Plug) **Input { return &p.WaterViscosity }),
		plugSpec("oilViscosity", "Oil viscosity", "µo,p", "as the reservoir", units.Viscosity, 1e4, func(p *Plug) **Input { return &p.OilViscosity }),
		plugSpec("tension", "Interfacial tension", "σp", "as the reservoir", units.InterfacialTension, 1, func(p *Plug) **Input { return &p.Tension }),
		plugSpec("half", "Half of what soaked in, after", "t½,p", "as its curves say", units.Duration, 1e10, func(p *Plug) **Input { return &p.Half }),
	}
}()

// sizeTable is what the distribution of block sizes must hold: a size as its first length,
// or diameter, with the share of the rock's volume; shares are taken as parts of their sum.
var sizeTable = textTable{"block.sizes", "m %", []textColumn{
	{"size", units.Length, 0, 1e4, false, ""},
	{"share", units.Share, 0, 1e6, false, ""},
}, false}

// firstSize is the size that a shape is told by.
func firstSize(kind string) string {
	if kind == "sphere" || strings.HasPrefix(kind, "cylinder") {
		return "diameter"
	}
	return "length"
}
