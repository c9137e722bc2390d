package relperm

// Scaled is a pair of curves told relative to another permeability.
//
// A relative permeability is an effective permeability over a reference one, and
// laboratories use two references: the absolute permeability k, and the oil
// permeability at initial water ko(Swi), which makes kro start at 1. The effective
// permeabilities are the same whatever the reference, so
//
//	k_w = ko krw|ko = k krw|k, hence krw|k = (ko/k) krw|ko, and the same for oil.
//
// Factor is therefore ko/k to go from ko(Swi) to absolute, k/ko to go back, and it
// is one number for both phases: fractional flow is untouched by it, rates and
// pressures are proportional to it. Factor > 0.
type Scaled struct {
	Curves
	Factor float64
}

var _ Curves = Scaled{}

// At implements Curves.
func (s Scaled) At(sw float64) Point {
	p := s.Curves.At(sw)
	return Point{Krw: s.Factor * p.Krw, Kro: s.Factor * p.Kro, DKrw: s.Factor * p.DKrw, DKro: s.Factor * p.DKro}
}
