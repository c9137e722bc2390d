package study

// Choice is one value an enumerated field may take, and how it is called on screen.
type Choice struct{ Value, Label string }

// References are the permeabilities that kr may refer to.
var References = []Choice{
	{"absolute", "absolute permeability"},
	{"oil", "oil permeability at initial water, ko(Swi)"},
}

// CurveKinds are the curves a study may use.
var CurveKinds = []Choice{
	{"table", "laboratory points, monotone cubic"},
	{"table-linear", "laboratory points, straight lines"},
	{"corey-fit", "Corey, fitted to the points"},
	{"let-fit", "LET, fitted to the points"},
	{"corey", "Corey, typed"},
	{"let", "LET, typed"},
}

// Weightings are the ways a fit weighs the points.
var Weightings = []Choice{
	{"relative", "relative: small values count as much as large ones"},
	{"absolute", "absolute: large values dominate"},
}

// Drives are the ways the flood is driven.
var Drives = []Choice{
	{"rate", "constant injection rate"},
	{"pressure", "constant pressure difference"},
}

// Limits are the ways a flood stops paying.
var Limits = []Choice{
	{"waterCut", "water cut at surface"},
	{"oilRate", "oil rate at surface"},
}
