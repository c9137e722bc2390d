package study

import (
	"errors"
	"math"
	"slices"
	"strings"

	"brinefront/physics/fluid"
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// usualPressure stands in where no reservoir pressure is given: brine's viscosity and
// density depend on it little, and a note tells how much. Common practice, no source.
const usualPressure = 20e6

// pairOf is the pair of phases of a study.
func pairOf(st *Study) fluid.Pair {
	if p, ok := fluid.PairByID(fluid.PairID(st.Fluids.Pair)); ok {
		return p
	}
	p, _ := fluid.PairByID(fluid.BrineOil)
	return p
}

// brine is the brine of a study at its temperature, pressure and salinity, and the
// fresh water it was computed from.
type brine struct {
	fresh, salty                    fluid.Liquid
	temperature, pressure, salinity float64
}

// brine computes the brine of the study; nil when no temperature is given or the
// inputs cannot be used.
func (s *sheet) brine() *brine {
	b := &brine{pressure: usualPressure}
	var given bool
	if b.temperature, given = s.input("fluids.temperature"); !given {
		return nil
	}
	if p, typed := s.input("fluids.pressure"); typed {
		b.pressure = p
	}
	if salt, typed := s.input("fluids.salinity"); typed {
		b.salinity = salt
	}
	var err error
	if b.fresh, err = fluid.Water(b.temperature, b.pressure); err == nil {
		b.salty, err = fluid.Brine(b.temperature, b.pressure, b.salinity)
	}
	var out *fluid.RangeError
	if errors.As(err, &out) {
		s.outside(out)
		return nil
	}
	return b
}

// outside tells a property out of the range of its correlation in the unit typed.
func (s *sheet) outside(out *fluid.RangeError) {
	path := "fluids." + string(out.Variable)
	spec, _ := Find(path)
	in := spec.Get(s.st)
	if in == nil {
		// The pressure that stands in keeps water liquid at any temperature allowed;
		// only a pressure that is typed can be too low.
		panic("study: the pressure that stands in is out of range")
	}
	unit, _ := units.Find(spec.Quantity, in.Unit)
	s.problem(path, s.typed(path), withUnit("from "+units.Format(unit.FromSI(out.Low), 6)+" to "+units.Format(unit.FromSI(out.High), 6), unit)+", where "+out.Of+" holds for liquid water")
}

// property is a number of a phase that is typed, or computed where the phase is brine.
type property struct {
	path  string // the input; computed, it is the figure of the same name on the Front sheet
	brine bool   // the phase is brine
	pick  func(fluid.Liquid) float64
}

// figure is the ID of the figure that a computed property becomes.
func (p property) figure() string { return "front." + strings.TrimPrefix(p.path, "fluids.") }

func viscosityOf(l fluid.Liquid) float64 { return l.Viscosity }
func densityOf(l fluid.Liquid) float64   { return l.Density }

// property reads a property: typed, or computed from b, or else missing.
func (s *sheet) property(p property, b *brine) float64 {
	if spec, _ := Find(p.path); spec.Get(s.st) == nil && p.brine && b != nil {
		return p.pick(b.salty)
	}
	return s.need(p.path)
}

// viscosities and densities are those of the displacing and the resident phase.
func viscosities(pair fluid.Pair) [2]property {
	return [2]property{{"fluids.waterViscosity", pair.Displacing.Brine, viscosityOf}, {"fluids.oilViscosity", pair.Resident.Brine, viscosityOf}}
}

func densities(pair fluid.Pair) [2]property {
	return [2]property{{"fluids.waterDensity", pair.Displacing.Brine, densityOf}, {"fluids.oilDensity", pair.Resident.Brine, densityOf}}
}

// brineFigures are the properties that were computed.
func (f *front) brineFigures(s *sheet) {
	b := f.brine
	if b == nil {
		return
	}
	for _, p := range viscosities(f.pair) {
		f.computed(s, p, "{µ0} {r}", ref.IAPWSR12, ref.Phillips1981, func(w *working) {
			w.value("µ0", "viscosity without salt", b.fresh.Viscosity, units.Viscosity).value("r", "what salt multiplies it by", b.salty.Viscosity/b.fresh.Viscosity, units.Number)
		})
	}
	for _, p := range densities(f.pair) {
		f.computed(s, p, "{ρ0} + {Δρs}", ref.IAPWSIF97, ref.BatzleWang1992, func(w *working) {
			w.value("ρ0", "density without salt", b.fresh.Density, units.Density).value("Δρs", "what salt adds", b.salty.Density-b.fresh.Density, units.Density)
		})
	}
}

// computed adds the figure of one property unless it is typed or not asked for.
func (f *front) computed(s *sheet, p property, formula string, water, salt ref.ID, terms func(*working)) {
	spec, _ := Find(p.path)
	if spec.Get(s.st) != nil || !p.brine || !spec.Applies(s.st) {
		return
	}
	w := s.by("{"+spec.Symbol+"} = "+formula, "Without salt at "+units.Format(f.brine.temperature-273.15, 4)+" °C and "+units.Format(f.brine.pressure/1e6, 4)+" MPa, then corrected for "+units.Format(100*f.brine.salinity, 3)+" % of salt by weight, counted as sodium chloride.", water)
	if f.brine.salinity > 0 {
		w.Sources = append(w.Sources, salt)
	}
	terms(w)
	for _, path := range []string{"fluids.temperature", "fluids.pressure", "fluids.salinity"} {
		if input, _ := Find(path); input.Get(s.st) != nil {
			w.rests(path)
		}
	}
	s.figure(Figure{ID: p.figure(), Label: spec.Label + ", computed", Symbol: spec.Symbol, Value: p.pick(f.brine.salty), Quantity: spec.Quantity}, w)
}

// property adds a property as a term, typed or computed.
func (w *working) property(p property) *working {
	if _, computed := w.sheet.find(p.figure()); computed {
		return w.term(p.figure())
	}
	return w.input(p.path)
}

// viscosities adds both viscosities as terms.
func (w *working) viscosities() *working {
	for _, p := range viscosities(pairOf(w.sheet.st)) {
		w.property(p)
	}
	return w
}

// onFlow names the inputs behind the fractional flow: curves, viscosities, gravity.
func (w *working) onFlow(curve []string) *working {
	w.rests(curve...)
	for _, p := range viscosities(pairOf(w.sheet.st)) {
		if _, computed := w.sheet.find(p.figure()); computed {
			w.on(p.figure())
		} else {
			w.rests(p.path)
		}
	}
	return w.on("front.gravityTerm")
}

// underPressure says how much the pressure matters.
func (b *brine) underPressure() string {
	const more = 10e6
	pressed, err := fluid.Brine(b.temperature, b.pressure+more, b.salinity)
	if err != nil {
		return "How much it matters at this temperature is not known."
	}
	change := func(is, was float64) string { return units.Format(100*math.Abs(is/was-1), 2) + " %" }
	return "At this temperature 10 MPa more change its density by " + change(pressed.Density, b.salty.Density) + " and its viscosity by " + change(pressed.Viscosity, b.salty.Viscosity) + "."
}

// brineNotes tell where computed brine leaves what was measured.
func (f *front) brineNotes(s *sheet) {
	mu, rho := viscosities(f.pair), densities(f.pair)
	used := slices.ContainsFunc([]property{mu[0], mu[1], rho[0], rho[1]}, func(p property) bool {
		_, shown := s.find(p.figure())
		return shown
	})
	if !used {
		return
	}
	b := f.brine
	if fluid.Extrapolated(b.temperature, b.salinity) {
		s.note(Note{ID: "front.brineExtrapolated", Level: "caution", Text: "Brine of " + units.Format(100*b.salinity, 3) + " % salt at " + units.Format(b.temperature-273.15, 3) + " °C lies outside the measurements behind its viscosity and density, 20 °C and above and up to 22.6 %.",
			Cause: "The corrections for salt are carried on beyond their data.", Do: "Type measured values.", Paths: []string{"fluids.temperature", "fluids.salinity"}})
	}
	if s.st.Fluids.Pressure == nil {
		s.note(Note{ID: "front.brinePressure", Level: "remark", Text: "Brine is computed at 20 MPa, since no reservoir pressure is given.",
			Cause: b.underPressure(), Do: "Give the pressure where that matters.", Paths: []string{"fluids.pressure"}})
	}
}
