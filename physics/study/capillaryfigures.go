package study

import (
	"math"
	"strings"

	"brinefront/physics/capillary"
	"brinefront/physics/fluid"
	"brinefront/physics/ref"
	"brinefront/physics/regime"
	"brinefront/physics/units"
)

// tell shows the capillary pressure: figures, picture, tables and notes.
func (p *suction) tell(s *sheet, r *rock) {
	p.figures(s)
	p.wettability(s)
	p.charts(s)
	p.tables(s)
	p.notes(s, r)
}

func (p *suction) figures(s *sheet) {
	low, high := p.curve.Ends()
	zero := capillary.Spontaneous(p.curve)
	how := p.how + " Where the curve is zero."
	switch {
	case zero.Within:
	case zero.Sw == high:
		how = p.how + " The curve stays above zero: its upper end, where no oil is left that water could replace."
	default:
		how = p.how + " The curve stays below zero: its lower end; such rock soaks up no water."
	}
	s.figure(Figure{ID: "rock.pcZero", Label: "Rock soaks up water by itself to Sw", Symbol: "S0", Value: zero.Sw, Quantity: units.Fraction, Strip: true},
		s.by("", how, p.sources...).rests(p.inputs...))
	if pc, _ := p.curve.At(high); pc > 0 {
		s.figure(Figure{ID: "rock.pcEntry", Label: "Capillary pressure at the largest Sw", Symbol: "Pc,e", Value: pc, Quantity: units.Pressure},
			s.by("", p.how+" What oil has to overcome to enter rock full of water, the entry pressure, where the curve reaches up to there.", p.sources...).rests(p.inputs...))
	}
	if pc, _ := p.curve.At(low); !math.IsInf(pc, 0) {
		s.figure(Figure{ID: "rock.pcTop", Label: "Capillary pressure at the smallest Sw", Symbol: "Pc,i", Value: pc, Quantity: units.Pressure},
			s.by("", p.how, p.sources...).rests(p.inputs...))
	}
	for _, v := range p.values {
		q := units.Number
		if spec, ok := pcSymbol(v.Symbol); ok {
			q = spec.Quantity
		}
		s.figure(Figure{ID: "rock.pc." + pcID.Replace(v.Symbol), Label: v.Label, Symbol: v.Symbol, Value: v.Value, Quantity: q},
			s.by("", p.origins[v.Symbol], p.sources...).rests(p.inputs...))
	}
	if p.factor != 1 && !s.st.Rock.Capillary.ByJ() {
		s.figure(Figure{ID: "rock.pcRatio", Label: "Reservoir Pc over laboratory Pc", Symbol: "Rc", Value: p.factor, Quantity: units.Number},
			s.by("", "Ratio of σ cos θ, and of √(φ/k) where the plug's are given: J is the same in both.", ref.Leverett1941).rests(p.inputs...))
	}
	if p.scale > 0 {
		s.figure(Figure{ID: "rock.pcScale", Label: "Capillary pressure where J = 1", Symbol: "Pc,1", Value: p.scale, Quantity: units.Pressure},
			s.by("", "σ cos θ √(φ/k) of the reservoir.", ref.Leverett1941).rests("fluids.tension", "field.permeability", "field.porosity"))
	}
}

var pcID = strings.NewReplacer("λ", "lambda", ",", "")

// pcSymbol is the input that a parameter of the capillary pressure would be typed in.
func pcSymbol(symbol string) (Spec, bool) {
	for _, spec := range capillarySpecs {
		if spec.Symbol == symbol && spec.Group == pcGroup {
			return spec, true
		}
	}
	return Spec{}, false
}

// wettability tells the indices that the curve and the end states of a test give.
func (p *suction) wettability(s *sheet) {
	limit, given := s.input("rock.capillary.limit")
	if !given {
		psi, _ := units.Find(units.Pressure, "psi")
		limit = psi.ToSI(10)
	}
	inputs := append([]string{"rock.capillary.limit"}, p.inputs...)
	positive, negative := capillary.Areas(p.curve, limit)
	reach := "Integral of |Pc| over Sw between zero and the limit of pressure, or the end of the curve."
	s.figure(Figure{ID: "rock.pcAbove", Label: "Area under Pc above zero", Symbol: "A1", Value: positive.Value, Quantity: units.Pressure}, s.by("", reach, ref.Donaldson1969).rests(inputs...))
	s.figure(Figure{ID: "rock.pcBelow", Label: "Area under Pc below zero", Symbol: "A2", Value: negative.Value, Quantity: units.Pressure}, s.by("", reach, ref.Donaldson1969).rests(inputs...))
	s.figure(Figure{ID: "rock.usbm", Label: "USBM index of this curve", Symbol: "W", Value: capillary.USBM(positive.Value, negative.Value), Quantity: units.Number},
		s.by("", "log10(A1/A2). The test takes A1 from secondary drainage and A2 from forced imbibition; here both are of the one curve, so it is an estimate.", ref.Donaldson1969).rests(inputs...))
	p.amott(s)
}

// amott tells the indices of Amott: of typed end states, and where there are none the
// one to water that the curve gives.
func (p *suction) amott(s *sheet) {
	states := capillary.Amott{}
	for _, state := range []struct {
		name string
		to   *float64
	}{{"initial", &states.Initial}, {"waterSoaked", &states.WaterSoaked}, {"waterDriven", &states.WaterDriven}, {"oilSoaked", &states.OilSoaked}, {"oilDriven", &states.OilDriven}} {
		*state.to, _ = s.input("rock.capillary." + state.name)
	}
	const under = "rock.capillary."
	water := s.by("{Iw} = ({Sw,2} - {Sw,1}) / ({Sw,3} - {Sw,1})", "", ref.Amott1959).input(under + "initial").input(under + "waterSoaked").input(under + "waterDriven")
	oil := s.by("{Io} = ({Sw,3} - {Sw,4}) / ({Sw,3} - {Sw,5})", "", ref.Amott1959).input(under + "waterDriven").input(under + "oilSoaked")
	if math.IsNaN(states.OilDriven) {
		states.OilDriven = states.Initial
		oil = oil.value("Sw,5", "Sw after driving oil in, as at first", states.Initial, units.Fraction).rests(under + "initial")
	} else {
		oil = oil.input(under + "oilDriven")
	}
	if water.broken {
		low, high := p.curve.Ends()
		states = capillary.Amott{Initial: low, WaterDriven: high, WaterSoaked: s.number("rock.pcZero"), OilSoaked: math.NaN()}
		water = s.by("{Iw} = ({S0} - {Smin}) / ({Smax} - {Smin})", "From the ends of the curve and its zero; a test in the laboratory also holds what time and the state before it do.", ref.Amott1959).
			term("rock.pcZero").value("Smin", "Smallest Sw of the curve", low, units.Fraction).value("Smax", "Largest Sw of the curve", high, units.Fraction)
	} else {
		p.ordered(s, states)
	}
	s.figure(Figure{ID: "rock.amottWater", Label: "Amott index to water", Symbol: "Iw", Value: states.Water(), Quantity: units.Number, Strip: true}, water)
	s.figure(Figure{ID: "rock.amottOil", Label: "Amott index to oil", Symbol: "Io", Value: states.Oil(), Quantity: units.Number}, oil)
	s.figure(Figure{ID: "rock.amottHarvey", Label: "Amott-Harvey index", Symbol: "I", Value: states.Harvey(), Quantity: units.Number},
		s.by("{I} = {Iw} - {Io}", "", ref.Amott1959).term("rock.amottWater").term("rock.amottOil"))
}

// ordered refuses end states that no test can come to.
func (p *suction) ordered(s *sheet, a capillary.Amott) {
	const under = "rock.capillary."
	between := func(path string, v, low, high float64, words string) {
		if !math.IsNaN(v) && !(v >= low && v <= high) {
			s.problem(under+path, s.typed(under+path), words)
		}
	}
	between("waterDriven", a.WaterDriven, math.Nextafter(a.Initial, 2), 1, "more than at first")
	between("waterSoaked", a.WaterSoaked, a.Initial, a.WaterDriven, "from Sw at first to Sw after driving water in")
	between("oilDriven", a.OilDriven, 0, math.Nextafter(a.WaterDriven, -1), "less than after driving water in")
	between("oilSoaked", a.OilSoaked, a.OilDriven, a.WaterDriven, "from Sw after driving oil in to Sw after driving water in")
}

// charts are the curve with its points and, where J is known, the same as J.
func (p *suction) charts(s *sheet) {
	low, high := p.curve.Ends()
	top := 0.0
	for _, pc := range p.points.Pc {
		top = max(top, 1.1*math.Abs(pc))
	}
	if top == 0 {
		for _, near := range []float64{0.04, 0.96} {
			pc, _ := p.curve.At(low + (high-low)*near)
			top = max(top, 1.5*math.Abs(pc))
		}
	}
	from, to := capillary.Reaches(p.curve, top).Sw, capillary.Reaches(p.curve, -top).Sw
	if !(from < to) {
		from, to = low+0.01*(high-low), high-0.01*(high-low)
	}
	c := Chart{ID: "rock.pc", Title: "Capillary pressure at reservoir conditions", X: saturationAxis,
		Y: Axis{Label: "Capillary pressure, oil less water", Symbol: "Pc", Quantity: units.Pressure}, Lines: []Line{}, Marks: []Mark{}}
	line := Line{ID: "pc", Label: "Pc", Role: "total", Kind: "line", X: saturations(from, to, p.curve.Knots())}
	band := Line{ID: "pc-band", Label: "95 % band of Pc", Role: "total", Kind: "band", X: line.X}
	for _, sw := range line.X {
		pc, _ := p.curve.At(sw)
		line.Y = append(line.Y, pc)
		if p.fitted != nil {
			lower, upper := p.fitted.Band(sw)
			band.Low, band.Y = append(band.Low, lower), append(band.Y, upper)
		}
	}
	if p.fitted != nil {
		c.Lines = append(c.Lines, band)
	}
	c.Lines = append(c.Lines, line)
	if len(p.points.Sw) > 0 {
		c.Lines = append(c.Lines, Line{ID: "pc-points", Label: "Pc, laboratory", Role: "total", Kind: "points", X: p.points.Sw, Y: p.points.Pc})
	}
	zero := capillary.Spontaneous(p.curve)
	c.Summary = "Capillary pressure falls with Sw and stays on one side of zero."
	if zero.Within {
		c.Marks = append(c.Marks, Mark{"Pc = 0", zero.Sw, 0})
		c.Summary = "Capillary pressure falls with Sw and is zero at Sw = " + units.Format(zero.Sw, 3) + "."
	}
	s.part.Charts = append(s.part.Charts, c)
	if p.scale > 0 {
		j := Chart{ID: "rock.j", Title: "Leverett's J-function", X: saturationAxis, Y: Axis{Label: "Pc over σ cos θ √(φ/k)", Symbol: "J", Quantity: units.Number},
			Lines: []Line{{ID: "j", Label: "J", Role: "total", Kind: "line", X: line.X, Y: scaled(line.Y, 1/p.scale)}}, Marks: []Mark{}, Summary: "The same curve without its rock and fluids."}
		s.part.Charts = append(s.part.Charts, j)
	}
}

// tables set the curve beside the points, and list the parameters of a fit.
func (p *suction) tables(s *sheet) {
	if len(p.points.Sw) > 0 {
		curve := make([]float64, len(p.points.Sw))
		words := make([]string, len(curve))
		for i, sw := range p.points.Sw {
			curve[i], _ = p.curve.At(sw)
			if math.IsInf(curve[i], 0) {
				curve[i], words[i] = 0, "without bound"
			}
		}
		given := Column{Label: "Pc, as measured", Quantity: units.Pressure, Values: p.typed}
		if s.st.Rock.Capillary.Unit == inJ {
			given.Label, given.Quantity = "J, as measured", units.Number
		}
		s.part.Tables = append(s.part.Tables, Grid{ID: "rock.pcPoints", Title: "Capillary pressure, points and curve", Columns: []Column{
			{Label: "Sw", Quantity: units.Fraction, Values: p.points.Sw}, given,
			{Label: "Pc, reservoir", Quantity: units.Pressure, Values: p.points.Pc},
			{Label: "Pc, curve", Quantity: units.Pressure, Values: curve, Words: words},
		}})
	}
	if p.fitted == nil {
		return
	}
	name, symbol := Column{Label: "Parameter", Quantity: units.Number}, Column{Label: "Symbol", Quantity: units.Number}
	error, with := Column{Label: "Standard error", Quantity: units.Share}, Column{Label: "Strongest correlation", Quantity: units.Number}
	how := Column{Label: "Found", Quantity: units.Number}
	for j, v := range p.fitted.Parameters {
		name.Words, symbol.Words, how.Words = append(name.Words, v.Label), append(symbol.Words, v.Symbol), append(how.Words, foundHow(v))
		relative := 0.0
		if v.Value != 0 {
			relative = v.StdErr / math.Abs(v.Value)
		}
		error.Values = append(error.Values, relative)
		most, at := 0.0, ""
		for k, c := range p.fitted.Correlation[j] {
			if k != j && math.Abs(c) > math.Abs(most) {
				most, at = c, units.Format(c, 3)+" with "+p.fitted.Parameters[k].Symbol
			}
		}
		if at == "" {
			at = "none"
		}
		with.Words = append(with.Words, at)
	}
	s.part.Tables = append(s.part.Tables, Grid{ID: "rock.pcFit", Title: "Parameters of the capillary pressure fit, in relation to their values", Columns: []Column{name, symbol, error, with, how}})
}

// notes says what is doubtful, and what the fit says of itself.
func (p *suction) notes(s *sheet, r *rock) {
	if p.fitted != nil {
		s.note(Note{ID: "rock.pcFit", Level: "remark", Text: strings.Join(p.fitted.Verdict, " "), Cause: "A fit smooths the scatter of the points and keeps to the shape of its form.",
			Do: "Compare with the table itself and with the other forms.", Paths: []string{"rock.capillary.curve"}})
		if p.stopped() {
			s.note(Note{ID: "rock.pcFitStopped", Level: "caution", Text: "The fit of capillary pressure stopped short: " + p.fitted.Status.String() + ".",
				Cause: "The answer rests on the best curve found so far.", Do: "Look at the points, or use another curve.", Paths: []string{"rock.capillary.curve"}})
		}
	}
	const apart = 0.02 // of the pore volume: common practice, no source
	low, high := p.curve.Ends()
	if math.Abs(low-r.swc) > apart || math.Abs(high-r.swmax) > apart {
		s.note(Note{ID: "rock.pcEnds", Level: "caution", Text: "Capillary pressure runs from Sw = " + units.Format(low, 3) + " to " + units.Format(high, 3) + ", relative permeability from " + units.Format(r.swc, 3) + " to " + units.Format(r.swmax, 3) + ".",
			Cause: "Both belong to one rock: water that stays and oil that stays are the same in both.", Do: "Look whether both are of one plug and one direction of displacement; beyond its ends a table of Pc is taken as level.", Paths: append([]string{"rock.capillary.curve"}, r.inputs...)})
	}
	if p.factor != 1 && !s.st.Rock.Capillary.ByJ() {
		s.note(Note{ID: "rock.pcConverted", Level: "remark", Text: "Capillary pressure was measured at other conditions and is multiplied by " + units.Format(p.factor, 4) + ".",
			Cause: "Pores of one shape have one J; a change of wettability changes the shape of the curve too, and no scaling knows that.", Do: "Look up tension and contact angle of both pairs of fluids.", Paths: p.inputs})
	}
	if index := s.number("rock.amottHarvey"); !math.IsNaN(index) && pairOf(s.st).ID == fluid.BrineOil {
		s.note(Note{ID: "rock.amott", Level: "remark", Text: said(regime.AmottHarvey(index)), Cause: "The index sums up one plug in one state of wettability.", Do: "Weigh it beside USBM and the relative permeability.", Paths: []string{"rock.capillary.waterSoaked", "rock.capillary.oilSoaked"}})
	}
}
