// Package study is the one door to the physics: a document in, a result out.
// The document is what the person typed, in the units they typed it in; Run
// reads it in SI, computes, and returns figures with their workings, charts and
// notes. There is no second computation anywhere in the program.
package study

// Type and Version mark a study document. Version rises when a document written
// by this program could not be read by the one before.
const (
	Type    = "brinefront/study"
	Version = 1
	Program = "0.1.0"
)

// Study is the document. Pointers are nil where the person has given nothing.
type Study struct {
	Type    string `json:"type"`
	Version int    `json:"version"`
	Program string `json:"program"`

	Title  string `json:"title"`
	Author string `json:"author"`
	Note   string `json:"note"`
	System string `json:"system"` // units shown: see Systems

	Rock   Rock   `json:"rock"`
	Fluids Fluids `json:"fluids"`
	Front  Front  `json:"front"`
	Field  Field  `json:"field"`
	Soak   Soak   `json:"soak,omitzero"`
	Block  Block  `json:"block,omitzero"`
	Match  Match  `json:"match,omitzero"`

	Grid Gridding `json:"grid,omitzero"`

	Cases []Case `json:"cases,omitempty"` // named changes on the study; at most MaxCases
}

// Input is a number with its unit and where it comes from.
type Input struct {
	Value  float64  `json:"value"`
	Unit   string   `json:"unit"`
	Source string   `json:"source,omitempty"` // lab report and page, analogue, assumption
	Low    *float64 `json:"low,omitempty"`    // optional range, in the same unit
	High   *float64 `json:"high,omitempty"`
}

// Rock is what the laboratory says of the plug.
type Rock struct {
	Reference string `json:"reference"` // permeability that kr refers to: see References
	Curve     string `json:"curve"`     // which curve the study uses: see CurveKinds

	Permeability    *Input `json:"permeability,omitempty"`    // absolute
	OilPermeability *Input `json:"oilPermeability,omitempty"` // ko at Swi; needed when kr refers to it

	Table   *Table `json:"table,omitempty"` // laboratory points
	Corey   Corey  `json:"corey,omitzero"`  // typed parameters, used when Curve is "corey"
	LET     LET    `json:"let,omitzero"`    // typed parameters, used when Curve is "let"
	Weights string `json:"weights"`         // how a fit weighs the points: see Weightings
	Ends    string `json:"ends,omitempty"`  // where Swc and Sor of a fit come from: see FitEnds; empty: the table's rows

	Capillary Capillary `json:"capillary,omitzero"`

	Land *Input `json:"land,omitempty"` // Land's trapping coefficient C; used by pairs whose resident phase is trapped
}

// Table is the plug's relative permeability table, one row a point, as fractions.
type Table struct {
	Sw     []float64 `json:"sw"`
	Krw    []float64 `json:"krw"`
	Kro    []float64 `json:"kro"`
	Source string    `json:"source,omitempty"`
}

// Corey holds typed Corey parameters.
type Corey struct {
	Swc  *Input `json:"swc,omitempty"`
	Sor  *Input `json:"sor,omitempty"`
	Krw0 *Input `json:"krw0,omitempty"`
	Kro0 *Input `json:"kro0,omitempty"`
	Nw   *Input `json:"nw,omitempty"`
	No   *Input `json:"no,omitempty"`
}

// LET holds typed LET parameters.
type LET struct {
	Swc  *Input `json:"swc,omitempty"`
	Sor  *Input `json:"sor,omitempty"`
	Krw0 *Input `json:"krw0,omitempty"`
	Kro0 *Input `json:"kro0,omitempty"`
	Lw   *Input `json:"lw,omitempty"`
	Ew   *Input `json:"ew,omitempty"`
	Tw   *Input `json:"tw,omitempty"`
	Lo   *Input `json:"lo,omitempty"`
	Eo   *Input `json:"eo,omitempty"`
	To   *Input `json:"to,omitempty"`
}

// Fluids are the two phases at reservoir conditions. "Water" is the displacing phase
// and "oil" the resident one, whatever the pair is made of: see fluid.Pair.
type Fluids struct {
	Pair string `json:"pair,omitempty"` // see Pairs; empty: brine displaces oil

	WaterViscosity       *Input `json:"waterViscosity,omitempty"`
	OilViscosity         *Input `json:"oilViscosity,omitempty"`
	WaterFormationFactor *Input `json:"waterFormationFactor,omitempty"` // Bw
	OilFormationFactor   *Input `json:"oilFormationFactor,omitempty"`   // Bo

	WaterDensity *Input `json:"waterDensity,omitempty"` // with the next: needed when the layer dips
	OilDensity   *Input `json:"oilDensity,omitempty"`
	Tension      *Input `json:"tension,omitempty"`     // between the two
	Temperature  *Input `json:"temperature,omitempty"` // with the next two: gives brine's viscosity and density where none is typed
	Pressure     *Input `json:"pressure,omitempty"`    // nil: 20 MPa
	Salinity     *Input `json:"salinity,omitempty"`    // nil: fresh
}

// Front is the state the displacement starts from and what is injected.
type Front struct {
	InitialWater  *Input `json:"initialWater,omitempty"`  // nil: swc of the curve
	InjectedWater *Input `json:"injectedWater,omitempty"` // nil: 1-sor of the curve

	Dip      *Input `json:"dip,omitempty"`      // of the layer along the flow, positive when water moves up-dip; nil: 0
	Velocity *Input `json:"velocity,omitempty"` // total Darcy velocity; nil: rate over width and thickness of the field

	Ending string `json:"ending,omitempty"` // where the resident phase stops moving, for pairs that trap it: see Endings; empty: the curve's end

	Rider Rider `json:"rider,omitzero"` // what rides along with the injected water
}

// Field is the flood in the ground: a straight block of one layer or many.
type Field struct {
	Drive string `json:"drive"` // see Drives
	Limit string `json:"limit"` // see Limits
	Start string `json:"start"` // first day of injection, YYYY-MM-DD; empty: none

	Length       *Input `json:"length,omitempty"`    // injector to producer
	Width        *Input `json:"width,omitempty"`     // across the flow
	Thickness    *Input `json:"thickness,omitempty"` // net
	Porosity     *Input `json:"porosity,omitempty"`
	Permeability *Input `json:"permeability,omitempty"` // absolute; used by the pressure drive
	Rate         *Input `json:"rate,omitempty"`         // injected water, reservoir volume per calendar day when on
	Pressure     *Input `json:"pressure,omitempty"`     // constant difference, injector to producer
	Uptime       *Input `json:"uptime,omitempty"`       // share of the calendar that injection runs; nil: 1
	WaterCut     *Input `json:"waterCut,omitempty"`     // economic limit, at surface
	OilRate      *Input `json:"oilRate,omitempty"`      // economic limit, at surface
	Horizon      *Input `json:"horizon,omitempty"`      // how long the forecast runs; nil: to the limit

	Pattern Pattern `json:"pattern,omitzero"`
	Layers  Layers  `json:"layers,omitzero"`
	Wells   Wells   `json:"wells,omitzero"`
	Money   Money   `json:"money,omitzero"`
	History History `json:"history,omitzero"`
}
