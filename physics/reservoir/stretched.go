package reservoir

// Stretched is a body whose curves are those of Body with both end saturations moved: kr
// keeps its values over the part of the way between the ends, and By > 0 is the new
// distance of the ends over the old.
//
// In terms of that part of the way the flood is the same, with By times as much to be
// displaced. So all volumes, and the clock at which they have passed, are By times those of
// Body, and the rates at those clocks are the same:
//
//	Q(By x) = By Q0(x),  dQ/dclock = dQ0/dx
//
// This is exact. Bodies that start equally far along their curves share one Body so.
//
// Source: Buckley & Leverett (1942), whose equation holds the saturation by its slope only;
// normalising kr by the end points is common practice, no source.
type Stretched struct {
	Body Body
	By   float64
}

var _ Body = Stretched{}

// At implements Body.
func (s Stretched) At(clock float64) Outflow {
	o := s.Body.At(clock / s.By)
	o.Injected, o.Oil, o.Held = o.Injected*s.By, o.Oil*s.By, o.Held*s.By
	return o
}

// Breakthrough implements Body.
func (s Stretched) Breakthrough() float64 { return s.Body.Breakthrough() * s.By }
