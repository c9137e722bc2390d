package relperm

// Stretched is a pair of curves moved to another largest water saturation: kr keeps its
// values and its shape over the part of the way between the ends,
//
//	kr(sw) = kr_lab(swc + (sw - swc) (swmax_lab - swc)/(swmax - swc))
//
// Valid for swc < Swmax <= 1; with the curves' own Swmax nothing changes.
//
// Normalising by the end points is common practice, no source: with another residual the
// end-point kr usually differs somewhat too.
type Stretched struct {
	Curves
	Swmax float64
}

var _ Curves = Stretched{}

// At implements Curves.
func (s Stretched) At(sw float64) Point {
	swc, swmax := s.Curves.Ends()
	ratio := (swmax - swc) / (s.Swmax - swc)
	if sw >= s.Swmax {
		p := s.Curves.At(swmax)
		return Point{Krw: p.Krw, Kro: p.Kro}
	}
	p := s.Curves.At(swc + (sw-swc)*ratio)
	p.DKrw, p.DKro = p.DKrw*ratio, p.DKro*ratio
	return p
}

// Ends implements Curves.
func (s Stretched) Ends() (swc, swmax float64) {
	swc, _ = s.Curves.Ends()
	return swc, s.Swmax
}

// Knots implements Curves.
func (s Stretched) Knots() []float64 {
	swc, swmax := s.Curves.Ends()
	var list []float64
	for _, k := range s.Curves.Knots() {
		list = append(list, swc+(k-swc)*(s.Swmax-swc)/(swmax-swc))
	}
	return list
}
