// Package imbibe computes how rock soaks water up by capillary pressure alone: the
// self-similar solution of McWhorter and Sunada (1990), blocks of finite size, and
// what carries a plug's answer to a block or a fractured reservoir.
package imbibe

import (
	"brinefront/physics/capillary"
	"brinefront/physics/relperm"
)

// Rock is a rock with its two fluids, SI throughout.
type Rock struct {
	Permeability   float64 // absolute, m2; what Kr refers to
	Porosity       float64 // fraction
	Kr             relperm.Curves
	Pc             capillary.Curve
	WaterViscosity float64 // Pa s
	OilViscosity   float64 // Pa s
}
