package study

import (
	"math"
	"slices"
	"strings"

	"brinefront/physics/units"
)

// Capillary is the rock's capillary pressure, Pc = Po - Pw. Every form asks for those
// inputs that it needs.
type Capillary struct {
	Curve   string `json:"curve,omitempty"`   // see PcKinds; empty: none
	At      string `json:"at,omitempty"`      // what conditions Pc was measured at: see PcConditions
	Ends    string `json:"ends,omitempty"`    // of a fit: see PcEnds
	Weights string `json:"weights,omitempty"` // of a fit: see Weightings

	Unit  string   `json:"unit,omitempty"`  // of the table's Pc: see PcUnits
	Table *PcTable `json:"table,omitempty"` // laboratory points

	Angle           *Input `json:"angle,omitempty"`           // contact angle in the reservoir; nil: 0
	LabTension      *Input `json:"labTension,omitempty"`      // with the next three: of the measurement
	LabAngle        *Input `json:"labAngle,omitempty"`        // nil: 0
	LabPermeability *Input `json:"labPermeability,omitempty"` // nil: the reservoir rock's
	LabPorosity     *Input `json:"labPorosity,omitempty"`     // nil: the reservoir rock's

	Swr    *Input `json:"swr,omitempty"` // nil: Swc of kr
	Sor    *Input `json:"sor,omitempty"` // nil: Sor of kr
	Entry  *Input `json:"entry,omitempty"`
	Lambda *Input `json:"lambda,omitempty"`
	P0     *Input `json:"p0,omitempty"`
	N      *Input `json:"n,omitempty"`
	M      *Input `json:"m,omitempty"` // nil: 1-1/n
	Cw     *Input `json:"cw,omitempty"`
	Aw     *Input `json:"aw,omitempty"`
	Co     *Input `json:"co,omitempty"`
	Ao     *Input `json:"ao,omitempty"`
	A      *Input `json:"a,omitempty"`
	B      *Input `json:"b,omitempty"`
	C      *Input `json:"c,omitempty"` // nil: 0

	Limit *Input `json:"limit,omitempty"` // pressure that areas under the curve reach to; nil: 10 psi

	Initial     *Input `json:"initial,omitempty"` // end states of an Amott test, as Sw
	WaterSoaked *Input `json:"waterSoaked,omitempty"`
	WaterDriven *Input `json:"waterDriven,omitempty"`
	OilSoaked   *Input `json:"oilSoaked,omitempty"`
	OilDriven   *Input `json:"oilDriven,omitempty"` // nil: as at first
}

// PcTable is the plug's capillary pressure table, one row a point: Sw as a fraction, Pc
// in the unit that stands beside it in Capillary.
type PcTable struct {
	Sw     []float64 `json:"sw"`
	Pc     []float64 `json:"pc"`
	Source string    `json:"source,omitempty"`
}

// Choices of a capillary pressure.
const (
	noCapillary  = "none"
	inReservoir  = "reservoir"
	inLaboratory = "laboratory"
	asKr         = "kr"
	inJ          = "J" // the unit of a table of J
)

// PcKinds are the capillary pressure curves a study may use.
var PcKinds = []Choice{
	{noCapillary, "none"},
	{"table", "laboratory points, monotone cubic"},
	{"table-linear", "laboratory points, straight lines"},
	{"brooks-corey-fit", "Brooks-Corey, fitted to the points"},
	{"van-genuchten-fit", "van Genuchten, fitted to the points"},
	{"skjaeveland-fit", "two branches (mixed-wet), fitted to the points"},
	{"brooks-corey", "Brooks-Corey, typed"},
	{"van-genuchten", "van Genuchten, typed"},
	{"skjaeveland", "two branches (mixed-wet), typed"},
	{"j-power", "J-function, power form, typed"},
}

// PcConditions are what a capillary pressure was measured at.
var PcConditions = []Choice{
	{inReservoir, "reservoir conditions: used as it is"},
	{inLaboratory, "laboratory conditions: converted by σ cos θ"},
}

// PcEnds are the ways a fit finds the saturations at which its branches end.
var PcEnds = []Choice{
	{asKr, "those of relative permeability, where the points leave room"},
	{"fitted", "fitted"},
}

// PcUnits are the units of a capillary pressure table; that of J is none.
var PcUnits = func() []Choice {
	var list []Choice
	for _, u := range units.Of(units.Pressure) {
		list = append(list, Choice{u.Symbol, u.Label()})
	}
	return append(list, Choice{inJ, "J-function, no unit"})
}()

// pcTyped are the forms that are typed.
var pcTyped = []string{"brooks-corey", "van-genuchten", "skjaeveland", "j-power"}

// pcOf asks for an input where the capillary pressure is of one of the kinds.
func pcOf(kinds ...string) func(*Study) bool {
	return func(s *Study) bool { return slices.Contains(kinds, s.Rock.Capillary.Curve) }
}

func withCapillary(s *Study) bool { return s.Rock.Capillary.Given() }

// Given reports whether the study has a capillary pressure.
func (c Capillary) Given() bool { return c.Curve != noCapillary && c.Curve != "" }

// ByJ reports whether the capillary pressure is given as a J-function.
func (c Capillary) ByJ() bool {
	return c.Curve == "j-power" || c.Unit == inJ && c.ByTable()
}

// ByTable reports whether the capillary pressure rests on the laboratory points.
func (c Capillary) ByTable() bool {
	return strings.HasPrefix(c.Curve, "table") || c.Fitted()
}

// Fitted reports whether the capillary pressure is fitted to the points.
func (c Capillary) Fitted() bool { return strings.HasSuffix(c.Curve, "-fit") }

// Scalable reports whether the capillary pressure is one that may have been measured at
// other conditions than the reservoir's.
func (c Capillary) Scalable() bool { return c.Given() && !c.ByJ() }

func measuredElsewhere(s *Study) bool {
	return s.Rock.Capillary.Scalable() && s.Rock.Capillary.At == inLaboratory
}

const (
	pcGroup    = "Capillary pressure"
	pcLabGroup = "Capillary laboratory"
	amottGroup = "Amott"
)

// pcSpec describes an input of the capillary pressure.
func pcSpec(name, group, label, symbol string, q units.Quantity, low, high float64, at func(*Capillary) **Input, when func(*Study) bool) Spec {
	return Spec{Path: "rock.capillary." + name, Sheet: SheetRock, Group: group, Label: label, Symbol: symbol, Quantity: q, Min: low, Max: high,
		at: func(s *Study) **Input { return at(&s.Rock.Capillary) }, when: when}
}

// or makes an input optional and says what its absence means.
func (s Spec) or(meaning string) Spec {
	s.Optional, s.Default = true, meaning
	return s
}

// open leaves out the lower end of the range, or both.
func (s Spec) open(both bool) Spec {
	s.OpenMin, s.OpenMax = true, both
	return s
}

func (s Spec) helped(text string) Spec {
	s.Help = text
	return s
}

// usual sets the range outside which a value is asked back about.
func (s Spec) usual(low, high float64) Spec {
	s.Usual = [2]float64{low, high}
	return s
}

const largestPc = 1e9 // Pa

var capillarySpecs = []Spec{
	pcSpec("swr", pcGroup, "Water at infinite Pc", "Swr", units.Fraction, 0, 1, func(c *Capillary) **Input { return &c.Swr }, pcOf(pcTyped...)).or("Swc of kr"),
	pcSpec("sor", pcGroup, "Oil that stays trapped", "Sor,c", units.Fraction, 0, 1, func(c *Capillary) **Input { return &c.Sor }, pcOf(pcTyped...)).or("Sor of kr"),
	pcSpec("entry", pcGroup, "Entry pressure", "pe", units.Pressure, 0, largestPc, func(c *Capillary) **Input { return &c.Entry }, pcOf("brooks-corey")).open(false),
	pcSpec("lambda", pcGroup, "Pore size index", "λ", units.Number, 0.05, 50, func(c *Capillary) **Input { return &c.Lambda }, pcOf("brooks-corey")),
	pcSpec("p0", pcGroup, "Pressure scale", "p0", units.Pressure, 0, largestPc, func(c *Capillary) **Input { return &c.P0 }, pcOf("van-genuchten")).open(false).helped("1/α of van Genuchten, as a pressure."),
	pcSpec("n", pcGroup, "Exponent n", "n", units.Number, 1, 50, func(c *Capillary) **Input { return &c.N }, pcOf("van-genuchten")).open(false),
	pcSpec("m", pcGroup, "Exponent m", "m", units.Number, 0, 50, func(c *Capillary) **Input { return &c.M }, pcOf("van-genuchten")).open(false).or("1 − 1/n (Mualem)").helped("1 − 2/n goes with Burdine."),
	pcSpec("cw", pcGroup, "Water branch", "cw", units.Pressure, 0, largestPc, func(c *Capillary) **Input { return &c.Cw }, pcOf("skjaeveland")),
	pcSpec("aw", pcGroup, "Exponent of the water branch", "aw", units.Number, 0.02, 20, func(c *Capillary) **Input { return &c.Aw }, pcOf("skjaeveland")),
	pcSpec("co", pcGroup, "Oil branch", "co", units.Pressure, -largestPc, 0, func(c *Capillary) **Input { return &c.Co }, pcOf("skjaeveland")).helped("Negative; 0 leaves water-wet rock."),
	pcSpec("ao", pcGroup, "Exponent of the oil branch", "ao", units.Number, 0.02, 20, func(c *Capillary) **Input { return &c.Ao }, pcOf("skjaeveland")),
	pcSpec("a", pcGroup, "J at full water over 1 − c", "a", units.Number, 0, 1e3, func(c *Capillary) **Input { return &c.A }, pcOf("j-power")).open(false).helped("J = a (s^−b − c)."),
	pcSpec("b", pcGroup, "Exponent of J", "b", units.Number, 0, 20, func(c *Capillary) **Input { return &c.B }, pcOf("j-power")).open(false),
	pcSpec("c", pcGroup, "Shift of J", "c", units.Number, -1e3, 1e3, func(c *Capillary) **Input { return &c.C }, pcOf("j-power")).or("0").helped("1: J ends at zero; above 1: it crosses zero."),

	pcSpec("angle", pcLabGroup, "Contact angle in the reservoir", "θ,res", units.Angle, 0, math.Pi/2, func(c *Capillary) **Input { return &c.Angle }, func(s *Study) bool {
		return withCapillary(s) && (s.Rock.Capillary.ByJ() || measuredElsewhere(s))
	}).or("0").ending().helped("Through the water. From 90° on no scaling holds: give Pc at reservoir conditions."),
	pcSpec("labTension", pcLabGroup, "Tension in the laboratory", "σ,lab", units.InterfacialTension, 0, 1, func(c *Capillary) **Input { return &c.LabTension }, measuredElsewhere).open(false).usual(5e-3, 0.5),
	pcSpec("labAngle", pcLabGroup, "Contact angle in the laboratory", "θ,lab", units.Angle, 0, math.Pi/2, func(c *Capillary) **Input { return &c.LabAngle }, measuredElsewhere).or("0").ending().helped("Through the wetting phase; of mercury, which does not wet, the supplement of its angle."),
	pcSpec("labPermeability", pcLabGroup, "Permeability of the plug", "k,lab", units.Permeability, 0, 1e-9, func(c *Capillary) **Input { return &c.LabPermeability }, measuredElsewhere).open(false).or("as the reservoir rock: J needs no scaling"),
	pcSpec("labPorosity", pcLabGroup, "Porosity of the plug", "φ,lab", units.Fraction, 0, 1, func(c *Capillary) **Input { return &c.LabPorosity }, measuredElsewhere).open(true).or("as the reservoir rock: J needs no scaling"),
	pcSpec("limit", pcLabGroup, "Areas under the curve reach to", "Pc,max", units.Pressure, 0, largestPc, func(c *Capillary) **Input { return &c.Limit }, withCapillary).open(false).or("10 psi"),

	pcSpec("initial", amottGroup, "Sw at first", "Sw,1", units.Fraction, 0, 1, func(c *Capillary) **Input { return &c.Initial }, withCapillary).or("the index is taken from the curve"),
	pcSpec("waterSoaked", amottGroup, "Sw after soaking in water", "Sw,2", units.Fraction, 0, 1, func(c *Capillary) **Input { return &c.WaterSoaked }, withCapillary).or("the index is taken from the curve"),
	pcSpec("waterDriven", amottGroup, "Sw after driving water in", "Sw,3", units.Fraction, 0, 1, func(c *Capillary) **Input { return &c.WaterDriven }, withCapillary).or("the index is taken from the curve"),
	pcSpec("oilSoaked", amottGroup, "Sw after soaking in oil", "Sw,4", units.Fraction, 0, 1, func(c *Capillary) **Input { return &c.OilSoaked }, withCapillary).or("the index to oil is not told"),
	pcSpec("oilDriven", amottGroup, "Sw after driving oil in", "Sw,5", units.Fraction, 0, 1, func(c *Capillary) **Input { return &c.OilDriven }, withCapillary).or("as at first"),
}

// ending leaves out the upper end of the range.
func (s Spec) ending() Spec {
	s.OpenMax = true
	return s
}
