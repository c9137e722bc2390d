package study

import (
	"math"

	"brinefront/physics/ref"
	"brinefront/physics/units"
)

const soakMethod = "Water flux at the face A/√t. A² = φ/(2 (1 − R f(Swi))) ∫ (S − Swi) Dc/(F − R f) dS from Swi to Sw0, with F the solution of (F − R f) F″ = −φ Dc/(2 A²), F = 1 and F′ = 0 at the face; Dc = k λw λo/(λw + λo) |dPc/dS|. Solved for positive w = −F″ and F − R f by Newton's method, steps cut so that both stay positive, on panels of eight Gauss points in ln((S − Swi)/(Sw0 − S))."

func (k *soak) figures(s *sheet) {
	flow := s.by("", map[string]string{coCurrent: "All oil leaves ahead of the water.", mixedCurrent: "As typed."}[s.st.Soak.Flow])
	if flow.Method == "" {
		flow.Method = "All oil leaves where the water enters."
	}
	if s.st.Soak.Flow == mixedCurrent {
		flow.rests("soak.ratio")
	}
	s.figure(Figure{ID: "soak.ratio", Label: "Total flux over that of water at the face", Symbol: "R", Value: k.Ratio, Quantity: units.Number}, flow.rests("soak.flow"))
	start := s.by("", "Where the curves begin.").rests(k.inputs...)
	if k.initials != "" {
		start = s.by("", "As typed.").rests(k.initials)
	}
	s.figure(Figure{ID: "soak.initial", Label: "Water saturation at the start", Symbol: "Swi,s", Value: k.Initial, Quantity: units.Fraction}, start)
	face := s.by("", "Where capillary pressure falls to zero, or the curves end before it does.").rests("rock.capillary.curve")
	if s.st.Soak.Inlet != nil {
		face = s.by("", "As typed.").rests("soak.inlet")
	}
	if k.Inlet < k.held {
		face.Method += " Between " + units.Format(k.held, 4) + ", which is held there, and this saturation capillary diffusion is zero: saturation jumps at the face, and no more than this gets inside."
	}
	s.figure(Figure{ID: "soak.inlet", Label: "Water saturation at the open face", Symbol: "Sw0", Value: k.Inlet, Quantity: units.Fraction, Strip: true}, face)
	s.figure(Figure{ID: "soak.a", Label: "Uptake coefficient", Symbol: "A", Value: k.A, Quantity: units.Sorptivity, Strip: true},
		s.by("", soakMethod, ref.McWhorterSunada1990, ref.SchmidGeiger2012, ref.Wright1997).rests(k.inputs...).on("soak.ratio", "soak.initial", "soak.inlet"))
	k.timeFigures(s)
	s.figure(Figure{ID: "soak.residual", Label: "Residual of the solution", Symbol: "ε", Value: twoDigits(k.Residual), Quantity: units.Number},
		s.by("", "What F misses of its equation between the points of collocation, integrated over saturation, as a share of F's whole rise. A is closer by far: the errors change sign from point to point. "+units.Format(float64(len(k.History)), 3)+" steps of the solver.").on("soak.a"))
}

// twoDigits rounds to two significant digits: of a residual, rounding decides the rest, and
// that differs between machines.
func twoDigits(v float64) float64 {
	if v == 0 {
		return 0
	}
	unit := math.Pow(10, math.Floor(math.Log10(v))-1)
	return math.Round(v/unit) * unit
}

// timeFigures are the state at the time asked about, and when the solution ends.
func (k *soak) timeFigures(s *sheet) {
	label, place := "Front meets the far boundary after", "Depth of the front"
	how := "Where F′ of the front is its value at Swi"
	if !k.FiniteFront() {
		label, place = "A rise of 1 % meets the far boundary after", "Depth where saturation has risen by 1 %"
		how = "Water is mobile from the start, or Dc does not vanish there: there is no front, and the depth at which saturation has risen by 1 % of the whole stands for it. Where F′ is its value at that saturation"
	}
	_, prime := k.Flow(k.edge)
	root := math.Sqrt(k.arrival)
	s.figure(Figure{ID: "soak.arrival", Label: label, Symbol: "ta", Value: k.arrival, Quantity: units.Duration, Strip: true},
		s.by("{ta} = {φ} {Ls} {φ} {Ls} / (4 {A} {A} {F′} {F′})", how+", x = (2 A/φ) F′ √t. Later the far boundary is felt and the uptake falls short of √t.", ref.McWhorterSunada1990).
			input("field.porosity").input("soak.length").term("soak.a").value("F′", "slope of F there", prime, units.Number))
	asked := s.by("", "None is typed: when the water meets the far boundary.").on("soak.arrival")
	if k.asked {
		asked = s.by("", "As typed.").rests("soak.time")
	}
	s.figure(Figure{ID: "soak.time", Label: "Time asked about", Symbol: "ts", Value: k.time, Quantity: units.Duration, Strip: k.past()}, asked)
	if k.past() {
		return
	}
	root = math.Sqrt(k.time)
	uptake := k.Uptake(k.time)
	s.figure(Figure{ID: "soak.uptake", Label: "Taken up by then, volume on area", Symbol: "I", Value: uptake, Quantity: units.Length, Strip: true},
		s.by("{I} = 2 {A} {√ts}", "", ref.McWhorterSunada1990).term("soak.a").value("√ts", "root of the time", root, units.RootDuration).on("soak.time"))
	s.figure(Figure{ID: "soak.rate", Label: "Rate of uptake then, volume on area", Symbol: "qw0", Value: k.A / root, Quantity: units.Velocity},
		s.by("{qw0} = {A} / {√ts}", "").term("soak.a").value("√ts", "root of the time", root, units.RootDuration).on("soak.time"))
	ahead, _ := k.FractionalFlow(k.Initial)
	s.figure(Figure{ID: "soak.recovery", Label: "Oil displaced by then, of the pore volume", Symbol: "Rs", Value: k.Gained(k.time) / (k.Porosity * k.length), Quantity: units.Share, Strip: true},
		s.by("{Rs} = {I} (1 - {R} {fi}) / ({φ} {Ls})", "Water that enters less what flows on ahead, over the pore volume behind a unit of open face.").
			term("soak.uptake").term("soak.ratio").value("fi", "fractional flow at the start", ahead, units.Fraction).input("field.porosity").input("soak.length"))
	s.figure(Figure{ID: "soak.recoveryMovable", Label: "Oil displaced by then, of what can soak out", Symbol: "Rs,m", Value: k.Gained(k.time) / (k.Porosity * k.length * k.Width()), Quantity: units.Share},
		s.by("{Rs,m} = {Rs} / ({Sw0} - {Swi,s})", "Of the change that the open face undergoes.").term("soak.recovery").term("soak.inlet").term("soak.initial"))
	s.figure(Figure{ID: "soak.reach", Label: place, Symbol: "xf", Value: k.At(k.edge, k.time), Quantity: units.Length, Strip: true},
		s.by("{xf} = 2 {A} {F′} {√ts} / {φ}", how+".", ref.McWhorterSunada1990).
			term("soak.a").value("F′", "slope of F there", prime, units.Number).value("√ts", "root of the time", root, units.RootDuration).input("field.porosity").on("soak.time"))
}
