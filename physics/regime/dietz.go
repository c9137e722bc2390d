package regime

import (
	"math"

	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// Dip is a segregated displacement in a dipping layer: the displacing phase below or
// above the resident one, parted by a plane interface, each flowing at its end point.
type Dip struct {
	Permeability      float64 // k, m2, along the layer
	Kr                float64 // end point of the displacing phase
	Viscosity         float64 // of the displacing phase, Pa s
	DensityDifference float64 // displacing less resident phase, kg/m3
	Angle             float64 // of the layer, rad; positive when the displacing phase moves up-dip; below pi/2 either way
	Mobility          float64 // M, end-point mobility ratio, displacing over resident, above 0
}

// Gravity is the gravity number at Darcy velocity u (m/s, above 0).
//
//	G = k kr' drho g sin(theta)/(mu u)
//
// kr' and mu of the displacing phase, theta the dip angle of its direction of flow. G is
// positive where gravity helps: heavy moves up-dip or light moves down-dip.
// Source: Dake (1978), ch. 10.
func (d Dip) Gravity(u float64) float64 { return d.gravityVelocity() / u }

// gravityVelocity is G u, m/s.
func (d Dip) gravityVelocity() float64 {
	return d.Permeability * d.Kr * d.DensityDifference * units.StandardGravity * math.Sin(d.Angle) / d.Viscosity
}

// When the interface keeps its shape.
const (
	StableAtAnyRate   Class = "stable at any rate"
	StableBelow       Class = "stable below the critical rate"
	StableAbove       Class = "stable above the critical rate"
	UnstableAtAnyRate Class = "unstable at any rate"
)

// Critical is the Darcy velocity (m/s) at which stability changes, and how.
//
//	u_crit = k kr' drho g sin(theta)/(mu (M - 1))
//
// from the condition G > M - 1. Special cases, with a the numerator over mu:
//
//	a > 0, M <= 1: stable at any rate, u = +Inf
//	a > 0, M > 1:  stable below u_crit
//	a <= 0, M >= 1: unstable (at M = 1 and a = 0, neither stable nor unstable) at any rate, u = 0
//	a <= 0, M < 1: stable above u_crit: viscous forces hold what gravity pulls apart
//
// Times area it is Dietz's critical rate. Source: Dietz (1953); Dake (1978), ch. 10.
func (d Dip) Critical() (u float64, v Verdict) {
	a, m := d.gravityVelocity(), d.Mobility
	v = Verdict{Range: "stable where the gravity number exceeds M − 1, here " + number(m-1), Source: ref.Dietz1953}
	switch {
	case a > 0 && m <= 1:
		v.Class, v.Text = StableAtAnyRate, "Gravity helps and the mobility ratio, "+number(m)+", is not above 1: the interface keeps its shape at any rate."
		return math.Inf(1), v
	case a > 0 && m > 1:
		v.Class, v.Text = StableBelow, "Gravity helps against a mobility ratio of "+number(m)+": the interface keeps its shape below the critical rate."
	case a <= 0 && m < 1:
		v.Class, v.Text = StableAbove, "Gravity does not help, but the mobility ratio, "+number(m)+", is below 1: the interface keeps its shape above the critical rate."
		if a == 0 {
			return 0, v
		}
	case a <= 0 && m >= 1:
		v.Class, v.Text = UnstableAtAnyRate, "Gravity does not help and the mobility ratio, "+number(m)+", is not below 1: one phase overruns the other at any rate."
		return 0, v
	default:
		v.Class, v.Text = Undecided, "The critical rate is not known: an input is not a number."
		return math.NaN(), v
	}
	return a / (m - 1), v
}

// Judge says whether the interface is stable at Darcy velocity u (m/s, above 0).
func (d Dip) Judge(u float64) Verdict {
	g := d.Gravity(u)
	return judge("The gravity number less M − 1", g-(d.Mobility-1), []band{
		{0, true, Unstable, "one phase overruns the other along the layer"},
		{class: Stable, means: "the interface keeps its shape and moves as one"},
	}, "stable above 0", ref.Dietz1953)
}

// Interface is the angle (rad) between the stable interface and the layer when gravity
// helps.
//
//	tan(beta) = |tan(theta)| (1 - (M - 1)/G)
//
// At rest the interface is level, beta = theta; at the critical rate beta = 0; a mobility
// ratio below 1 makes it steeper than level. ok is false where there is no stable
// interface held by gravity, that is unless G > 0 and G > M - 1.
// Source: Dietz (1953); Dake (1978), ch. 10, exercise 10.3.
func (d Dip) Interface(u float64) (beta float64, ok bool) {
	g := d.Gravity(u)
	if !(g > 0 && g > d.Mobility-1) {
		return 0, false
	}
	return math.Atan(math.Abs(math.Tan(d.Angle)) * (1 - (d.Mobility-1)/g)), true
}
