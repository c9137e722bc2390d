package study

import (
	"math"

	"brinefront/physics/ref"
	"brinefront/physics/regime"
	"brinefront/physics/units"
)

// dip is what gravity has to do with the front.
type dip struct {
	angle, sine  float64 // of the layer, positive when the displacing phase moves up-dip
	permeability float64
	rho          [2]float64 // densities, displacing and resident
	gravity      float64    // N of fracflow.Flow
}

// darcyVelocity is the total Darcy velocity while the injector is on: typed, or from the
// field's rate and cross-section; NaN when neither is known.
func (s *sheet) darcyVelocity() float64 {
	if u, typed := s.input("front.velocity"); typed {
		return u
	}
	return s.fieldVelocity()
}

// fieldVelocity is the field's rate over its cross-section, NaN when not known. What
// cannot be used of the field is for the Field sheet to say.
func (s *sheet) fieldVelocity() float64 {
	if !heldRate(s.st) {
		return math.NaN()
	}
	quiet := newSheet(s.st)
	q, _ := quiet.input("field.rate")
	w, _ := quiet.input("field.width")
	h, _ := quiet.input("field.thickness")
	return q / (w * h)
}

// dip reads the dip of the layer and what goes with it; nil in a level layer.
func (s *sheet) dip(b *brine, velocity float64) *dip {
	angle, given := s.input("front.dip")
	if !given || angle == 0 {
		return nil
	}
	if !heldRate(s.st) {
		s.problem("front.dip", s.typed("front.dip"), "0 or nothing at a constant pressure difference, where the weight of the fluids would count for more as the rate falls; any dip at a constant injection rate")
		return nil
	}
	d := &dip{angle: angle, sine: math.Sin(angle), permeability: s.need("field.permeability")}
	for i, p := range densities(pairOf(s.st)) {
		d.rho[i] = s.property(p, b)
	}
	if spec, _ := Find("front.velocity"); math.IsNaN(velocity) && spec.Get(s.st) == nil {
		s.miss("front.velocity")
	}
	d.gravity = d.permeability * (d.rho[0] - d.rho[1]) * units.StandardGravity * d.sine / velocity
	return d
}

// dipFigures are the terms by which gravity enters the fractional flow.
func (f *front) dipFigures(s *sheet) {
	f.velocityFigure(s)
	if f.dip == nil {
		return
	}
	rho := densities(f.pair)
	s.figure(Figure{ID: "front.densityDifference", Label: "Density difference, water less oil", Symbol: "Δρ", Value: f.dip.rho[0] - f.dip.rho[1], Quantity: units.Density},
		s.by("{Δρ} = {ρw} - {ρo}", "").property(rho[0]).property(rho[1]))
	s.figure(Figure{ID: "front.gravityTerm", Label: "Gravity term of the fractional flow", Symbol: "Ng", Value: f.dip.gravity, Quantity: units.Viscosity},
		s.by("{Ng} = {k} {Δρ} {g} {sinθ} / {u}", "Has the unit of a viscosity: set against the oil mobility it tells how far gravity holds water back (above 0) or pulls it ahead (below 0).", ref.Dake1978).
			input("field.permeability").term("front.densityDifference").value("g", "standard gravity, m/s²", units.StandardGravity, units.Number).
			value("sinθ", "sine of the dip", f.dip.sine, units.Number).term("front.velocity").rests("front.dip"))
}

func (f *front) velocityFigure(s *sheet) {
	if !velocityCounts(s.st) {
		return
	}
	figure := Figure{ID: "front.velocity", Label: "Total Darcy velocity while on", Symbol: "u", Value: f.velocity, Quantity: units.Velocity}
	if s.st.Front.Velocity != nil {
		s.figure(figure, s.by("", "As typed.").rests("front.velocity"))
	} else if !math.IsNaN(f.velocity) {
		s.figure(figure, s.by("{u} = {q} / ({W} {h})", "Rate of the field over its cross-section.").input("field.rate").input("field.width").input("field.thickness"))
	}
}

// waterMoves reports whether water can flow at the initial saturation.
func (f *front) waterMoves() bool { return f.ofMobility(f.swi) > backward }

// ofMobility is the share of water in the total mobility.
func (f *front) ofMobility(sw float64) float64 {
	p := f.flow.Curves.At(sw)
	water, oil := p.Krw/f.flow.MuW, p.Kro/f.flow.MuO
	return water / (water + oil)
}

// oneOnEachSide reports whether water alone flows behind an interface between the two
// states and oil alone ahead of it: what theory of two phases that flow apart supposes.
func (f *front) oneOnEachSide() bool { return !f.waterMoves() && f.ofMobility(f.swj) > 1-backward }

// segregated is the displacement in the dipping layer as two phases that flow apart,
// the limit in which stability is judged; false in a level layer, and where both flow
// on one side of the interface.
func (f *front) segregated() (d regime.Dip, ok bool) {
	if f.dip == nil || !f.oneOnEachSide() {
		return d, false
	}
	return regime.Dip{
		Permeability: f.dip.permeability, Kr: f.flow.Curves.At(f.swj).Krw, Viscosity: f.flow.MuW,
		DensityDifference: f.dip.rho[0] - f.dip.rho[1], Angle: f.dip.angle, Mobility: f.flow.EndPointMobilityRatio(),
	}, true
}

// stabilityFigures are the gravity number, the critical rate and the angle at which
// the interface stands.
func (f *front) stabilityFigures(s *sheet) {
	layer, ok := f.segregated()
	if !ok {
		return
	}
	water := viscosities(f.pair)[0]
	weight := func(w *working) *working {
		return w.input("field.permeability").value("krw", "krw at Swj", layer.Kr, units.Fraction).term("front.densityDifference").
			value("g", "standard gravity, m/s²", units.StandardGravity, units.Number).value("sinθ", "sine of the dip", f.dip.sine, units.Number).
			property(water).rests("front.dip").on("front.injectedWater", "front.initialWater")
	}
	g := layer.Gravity(f.velocity)
	s.figure(Figure{ID: "front.gravityNumber", Label: "Gravity number", Symbol: "G", Value: g, Quantity: units.Number},
		weight(s.by("{G} = {k} {krw} {Δρ} {g} {sinθ} / ({µw} {u})", "Gravity over viscous forces, with water at its end point. The front is stable where G exceeds M − 1.", ref.Dake1978, ref.Dietz1953)).term("front.velocity"))
	critical, _ := layer.Critical()
	if critical > 0 {
		s.figure(Figure{ID: "front.criticalVelocity", Label: "Critical Darcy velocity", Symbol: "uc", Value: critical, Quantity: units.Velocity},
			weight(s.by("{uc} = {k} {krw} {Δρ} {g} {sinθ} / ({µw} ({M} - 1))", "Where the gravity number equals M − 1.", ref.Dietz1953, ref.Dake1978)).term("front.endPointMobility"))
	}
	if s.st.Field.Width != nil && s.st.Field.Thickness != nil && !math.IsNaN(s.number("front.criticalVelocity")) {
		quiet := newSheet(s.st)
		w, _ := quiet.input("field.width")
		h, _ := quiet.input("field.thickness")
		if len(quiet.problems) == 0 {
			s.figure(Figure{ID: "front.criticalRate", Label: "Critical rate while on", Symbol: "qc", Value: critical * w * h, Quantity: units.Rate},
				s.by("{qc} = {uc} {W} {h}", "", ref.Dietz1953).term("front.criticalVelocity").input("field.width").input("field.thickness"))
		}
	}
	if beta, stable := layer.Interface(f.velocity); stable {
		s.figure(Figure{ID: "front.interface", Label: "Angle between interface and layer", Symbol: "β", Value: beta, Quantity: units.Angle},
			s.by("", "tan β = |tan θ| (1 − (M − 1)/G): the interface of a stable displacement of two phases that flow apart. At rest it is level, β = |θ|; at the critical rate β = 0.", ref.Dietz1953, ref.Dake1978).
				term("front.gravityNumber").term("front.endPointMobility").rests("front.dip"))
	}
}

// apartFigure is when water arrives if gravity parts the phases wholly and the
// interface is not stable. Where water moves ahead of it, or oil behind, the flux of
// the tongue is another one and the figure is left out.
func (f *front) apartFigure(s *sheet) {
	if !f.oneOnEachSide() {
		return
	}
	g := 0.0
	formula := "{Qs} = {Rmax} / {M}"
	if layer, dips := f.segregated(); dips {
		g = layer.Gravity(f.velocity)
		formula = "{Qs} = {Rmax} / ({M} - {G})"
	}
	apart, err := regime.NewSegregated(f.flow.EndPointMobilityRatio(), g)
	if err != nil {
		return
	}
	w := s.by(formula, "Both phases in vertical equilibrium, water in a tongue along the layer: the other extreme to phases spread over the whole height.", ref.Dake1978).
		term("front.movable").term("front.endPointMobility")
	if f.dip != nil {
		w.term("front.gravityNumber")
	}
	s.figure(Figure{ID: "front.apartBreakthrough", Label: "Water arrives after, if the phases flow apart", Symbol: "Qs", Value: (f.swj - f.swi) * apart.Breakthrough(), Quantity: units.PoreVolumes}, w)
}

// capillaryFigure is the capillary number of the displacing phase.
func (f *front) capillaryFigure(s *sheet) {
	tension, given := s.input("fluids.tension")
	if !given || math.IsNaN(f.velocity) {
		return
	}
	s.figure(Figure{ID: "front.capillaryNumber", Label: "Capillary number", Symbol: "Nc", Value: regime.CapillaryNumber(f.velocity, f.flow.MuW, tension), Quantity: units.Number},
		s.by("{Nc} = {u} {µw} / {σ}", "Viscous over capillary forces, with the Darcy velocity; authors who divide it by porosity get larger numbers.", ref.SaffmanTaylor1958, ref.Lake1989).
			term("front.velocity").property(viscosities(f.pair)[0]).input("fluids.tension"))
}
