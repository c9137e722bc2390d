package regime

import "brinefront/physics/ref"

// What a mobility ratio means.
const (
	Favourable   Class = "favourable"
	Unfavourable Class = "unfavourable"
	Stable       Class = "stable"
	Unstable     Class = "unstable"
)

// EndPointMobility judges the end-point mobility ratio M, displacing over resident
// phase, each alone at its end point. Source: Dake (1978), ch. 10. Craig's ratio is
// another: it takes the displacing phase at its average saturation behind the front.
func EndPointMobility(m float64) Verdict {
	return judge("The end-point mobility ratio", m, []band{
		{1, true, Favourable, "the displacing phase moves no more easily than the resident one, which is favourable"},
		{class: Unfavourable, means: "the displacing phase moves more easily than the resident one, which is unfavourable to sweep"},
	}, "favourable up to 1, unfavourable above", ref.Dake1978)
}

// FrontMobility judges the mobility ratio across the front, total mobility behind
// over ahead, without help from gravity. It, not the end-point ratio, decides whether
// fingers grow. Source: Dake (1978), ch. 10.
func FrontMobility(m float64) Verdict {
	return judge("The mobility ratio across the front", m, []band{
		{1, true, Stable, "fingers do not grow from the front itself"},
		{class: Unstable, means: "fingers can grow ahead of the front, so that breakthrough comes earlier than computed"},
	}, "stable up to 1, unstable above", ref.Dake1978)
}

// Which force rules.
const (
	ViscousRules Class = "viscous"
	BothMatter   Class = "viscous and gravity"
	GravityRules Class = "gravity"
)

// GravityWeight judges the size of the gravity number G of Dip.Gravity; a negative one
// works against the displacement. The ranges are common practice, no source.
func GravityWeight(g float64) Verdict {
	const (
		small   = "gravity is a small correction to viscous flow"
		both    = "gravity and viscous forces both matter"
		rules   = "gravity rules and the phases flow apart"
		against = ", and it works against the displacement"
	)
	return judge("The gravity number", g, []band{
		{-10, false, GravityRules, rules + against},
		{-0.1, true, BothMatter, both + against},
		{0, false, ViscousRules, small + against},
		{0.1, false, ViscousRules, small},
		{10, true, BothMatter, both},
		{class: GravityRules, means: rules},
	}, "size below 0.1 small, above 10 ruling", "")
}
