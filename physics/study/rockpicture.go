package study

import (
	"brinefront/physics/fit"
	"brinefront/physics/units"
)

// chart is the pair of curves with the laboratory points and the band of a fit.
func (r *rock) chart(s *sheet) Chart {
	c := Chart{
		ID: "rock.kr", Title: "Relative permeability",
		X: saturationAxis, Y: Axis{Label: "Relative permeability, of absolute permeability", Symbol: "kr", Quantity: units.Fraction, CanLog: true},
		Lines: []Line{}, Marks: []Mark{},
	}
	sws := saturations(r.swc, r.swmax, r.curves.Knots())
	if r.fitted != nil {
		c.Lines = append(c.Lines, r.bands(sws)...)
	}
	krw := Line{ID: "krw", Label: "krw", Role: "water", Kind: "line", X: sws}
	kro := Line{ID: "kro", Label: "kro", Role: "oil", Kind: "line", X: sws}
	for _, sw := range sws {
		p := r.curves.At(sw)
		krw.Y, kro.Y = append(krw.Y, p.Krw), append(kro.Y, p.Kro)
	}
	c.Lines = append(append(c.Lines, krw, kro), r.otherLines(sws)...)
	if points, given := s.points(); given {
		c.Lines = append(c.Lines,
			Line{ID: "krw-points", Label: "krw, laboratory", Role: "water", Kind: "points", X: points.Sw, Y: scaled(points.Krw, r.factor)},
			Line{ID: "kro-points", Label: "kro, laboratory", Role: "oil", Kind: "points", X: points.Sw, Y: scaled(points.Kro, r.factor)})
	}
	if crossover, ok := s.part.Figure("rock.crossover"); ok {
		c.Marks = append(c.Marks, Mark{"curves cross", crossover.Value, r.curves.At(crossover.Value).Krw})
	}
	c.Summary = "krw rises from 0 at Sw = " + units.Format(r.swc, 3) + " to " + units.Format(s.number("rock.krw0"), 3) + " at Sw = " + units.Format(r.swmax, 3) +
		"; kro falls from " + units.Format(s.number("rock.kro0"), 3) + " to 0."
	return c
}

// bands are the 95 % confidence bands of a fit.
func (r *rock) bands(sws []float64) []Line {
	krw := Line{ID: "krw-band", Label: "95 % band of krw", Role: "water", Kind: "band", X: sws}
	kro := Line{ID: "kro-band", Label: "95 % band of kro", Role: "oil", Kind: "band", X: sws}
	for _, of := range []*[]float64{&krw.Low, &krw.Y, &kro.Low, &kro.Y} {
		*of = make([]float64, 0, len(sws))
	}
	for _, sw := range sws {
		krwLow, krwHigh, kroLow, kroHigh := r.fitted.Band(sw)
		krw.Low, krw.Y = append(krw.Low, r.factor*krwLow), append(krw.Y, r.factor*krwHigh)
		kro.Low, kro.Y = append(kro.Low, r.factor*kroLow), append(kro.Y, r.factor*kroHigh)
	}
	return []Line{krw, kro}
}

func scaled(values []float64, factor float64) []float64 {
	list := make([]float64, len(values))
	for i, v := range values {
		list[i] = v * factor
	}
	return list
}

func (r *rock) tables(s *sheet) {
	if points, given := s.points(); given {
		s.part.Tables = append(s.part.Tables, r.pointTable(points))
	}
	if r.fitted != nil {
		s.part.Tables = append(s.part.Tables, r.fitTable())
	}
	if len(r.others) > 0 {
		s.part.Tables = append(s.part.Tables, r.familyTable(s))
	}
}

// pointTable sets the curve beside the points.
func (r *rock) pointTable(points fit.Points) Grid {
	krw, kro := make([]float64, len(points.Sw)), make([]float64, len(points.Sw))
	for i, sw := range points.Sw {
		p := r.curves.At(sw)
		krw[i], kro[i] = p.Krw, p.Kro
	}
	return Grid{ID: "rock.points", Title: "Laboratory points and the curve, relative to absolute permeability", Columns: []Column{
		{Label: "Sw", Quantity: units.Fraction, Values: points.Sw},
		{Label: "krw, laboratory", Quantity: units.Fraction, Values: scaled(points.Krw, r.factor)},
		{Label: "krw, curve", Quantity: units.Fraction, Values: krw},
		{Label: "kro, laboratory", Quantity: units.Fraction, Values: scaled(points.Kro, r.factor)},
		{Label: "kro, curve", Quantity: units.Fraction, Values: kro},
	}}
}

// foundHow says in a word how a fit found a parameter.
func foundHow(p fit.Parameter) string {
	switch {
	case p.Held:
		return "held"
	case p.AtBound:
		return "at its bound"
	case !p.Determined:
		return "not determined by the points"
	}
	return "fitted"
}

// fitTable lists the parameters of a fit as the laboratory's kr has them.
func (r *rock) fitTable() Grid {
	name, symbol := Column{Label: "Parameter", Quantity: units.Number}, Column{Label: "Symbol", Quantity: units.Number}
	value := Column{Label: "Value", Quantity: units.Number}
	low, high := Column{Label: "95 % interval, from", Quantity: units.Number}, Column{Label: "to", Quantity: units.Number}
	how := Column{Label: "Found", Quantity: units.Number}
	for _, p := range r.fitted.Parameters {
		found := foundHow(p)
		if p.Held {
			found = "held at the points' end"
		}
		name.Words, symbol.Words, how.Words = append(name.Words, p.Label), append(symbol.Words, p.Symbol), append(how.Words, found)
		value.Values, low.Values, high.Values = append(value.Values, p.Value), append(low.Values, p.Low), append(high.Values, p.High)
	}
	return Grid{ID: "rock.fit", Title: "Parameters of the fit, for kr as reported", Columns: []Column{name, symbol, value, low, high, how}}
}
