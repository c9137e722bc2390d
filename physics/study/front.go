package study

import (
	"math"
	"slices"

	"brinefront/physics/displace"
	"brinefront/physics/fluid"
	"brinefront/physics/fracflow"
	"brinefront/physics/ref"
	"brinefront/physics/reservoir"
	"brinefront/physics/units"
)

// front is the displacement, ready for the field to use.
type front struct {
	flow         fracflow.Flow
	displacement *displace.Displacement
	swi, swj     float64
	bw, bo       float64

	pair      fluid.Pair
	brine     *brine            // nil unless a temperature is given
	velocity  float64           // total Darcy velocity, NaN when not known
	dip       *dip              // nil in a level layer
	linear    *reservoir.Linear // the field's flood; nil while the field is not all given
	unflooded error             // why there is no flood though all is given
	curve     []string          // the inputs behind the curves
	rider     *rider            // nil when nothing rides along
}

// runFront answers the Front sheet; nil when there is no displacement to build on.
func runFront(st *Study, rockPart Part, rock *rock) (Part, *front) {
	s := newSheet(st, rockPart)
	s.await(rockPart)
	f := s.fluids()
	if rock != nil {
		rock = s.ending(f.pair, rock)
		f.flow.Curves, f.curve = rock.curves, rock.inputs
		f.swi, f.swj = s.states(rock)
		if f.rider != nil && s.standing() == Ready {
			f.rider.place(s, f, rock)
		}
	} else {
		s.input("front.initialWater")
		s.input("front.injectedWater")
	}
	standing := s.standing()
	if rockPart.Status == Refused {
		standing = Refused
	}
	if standing != Ready || rock == nil {
		return s.close(standing), nil
	}
	d, err := displace.New(f.flow, f.swj, f.swi)
	if err != nil {
		s.note(Note{ID: "front.numerics", Level: "caution", Text: "The displacement could not be solved: " + err.Error() + ".",
			Cause: "The curves leave the fractional flow undefined somewhere between the two states.", Do: "Look at the curves, or use another kind of curve.", Paths: []string{"rock.curve"}})
		return s.close(Stopped), nil
	}
	if d.FrontSpeed() == 0 {
		s.note(Note{ID: "front.nothingMoves", Level: "caution", Text: "Nothing enters: at the initial saturation the share of water in the flow is already as large as any behind it.",
			Cause: "Every wave between the two states runs back to the injector or stands still.", Do: "Look at the dip, the rate and the two saturations.", Paths: []string{"front.dip", "front.initialWater"}})
		return s.close(Stopped), nil
	}
	f.displacement = d
	f.linear, f.unflooded = s.flood(f)
	f.figures(s, rock)
	f.charts(s)
	f.tables(s)
	f.notes(s)
	f.ride(s)
	f.sentence(s)
	f.rideSentence(s)
	return s.close(rockPart.Status), f
}

// fluids reads both phases and what gravity does to them.
func (s *sheet) fluids() *front {
	f := &front{pair: pairOf(s.st)}
	if withBrine(s.st) {
		f.brine = s.brine()
	}
	mu := viscosities(f.pair)
	f.flow = fracflow.Flow{MuW: s.property(mu[0], f.brine), MuO: s.property(mu[1], f.brine)}
	f.bw, f.bo = s.need("fluids.waterFormationFactor"), s.need("fluids.oilFormationFactor")
	f.velocity = s.darcyVelocity()
	if f.dip = s.dip(f.brine, f.velocity); f.dip != nil {
		f.flow.Gravity = f.dip.gravity
	}
	f.rider = s.rider(f)
	for _, path := range []string{"fluids.tension", "rock.land"} {
		s.input(path) // an optional number that cannot be used is a problem all the same
	}
	return f
}

// flood is the field's flood when that is of one even block and all of it is given, for the times at which the waves
// arrive. What the field misses or cannot use is for its own sheet to say.
func (s *sheet) flood(f *front) (*reservoir.Linear, error) {
	if manyfold(s.st) {
		return nil, nil
	}
	quiet := newSheet(s.st)
	layer := quiet.layer(f)
	if quiet.standing() != Ready {
		return nil, nil
	}
	return reservoir.NewLinear(layer, f.flow, f.displacement)
}

// sentence is the answer in words.
func (f *front) sentence(s *sheet) {
	opening := "Water arrives after"
	waterAhead := f.cutAhead() > 0
	switch {
	case len(f.steps()) > 1 && f.steps()[0].SpeedAhead == f.displacement.FrontSpeed():
		opening = "The first of " + units.Format(float64(len(f.steps())), 3) + " steps arrives after"
	case f.waterMoves():
		opening = "The front arrives after"
	}
	s.answer(opening+" {front.breakthrough} injected with {front.recoveryAtBreakthrough} of the pore volume "+f.fate(), " ({front.recoveryAtBreakthroughInPlace} of the oil in place)")
	if _, _, shock := f.displacement.Front(); shock && s.number("front.cutAtBreakthrough") > 0 {
		if waterAhead {
			s.answer("; the water cut jumps from {front.surfaceCutAhead} to {front.surfaceCutAtBreakthrough} at surface")
		} else {
			s.answer("; the water cut jumps to {front.surfaceCutAtBreakthrough} at surface")
		}
	}
	s.answer("; the next step arrives after {front.nextStep}", "; after 1 PV the recovery is {front.recoveryAtOne}", ".")
}

// fate is what becomes of oil that is displaced: it is produced, unless some oil is
// injected too or leaves at the injector.
func (f *front) fate() string {
	if _, inlet := f.displacement.InletFace(); math.Abs(inlet-1) > backward {
		return "displaced"
	}
	return "produced"
}

// steps are the shocks that can be seen and that enter, the foremost first.
func (f *front) steps() []fracflow.Wave {
	var list []fracflow.Wave
	for _, w := range slices.Backward(f.displacement.Waves()) {
		if w.Kind == fracflow.Shock && w.SpeedAhead > 0 && math.Abs(w.Behind-w.Ahead) > visibleStep*(f.swj-f.swi) {
			list = append(list, w)
		}
	}
	return list
}

// visibleStep is the part of the whole change in saturation from which a step is seen.
const visibleStep = 0.02

// cutAhead is the water cut at the initial saturation.
func (f *front) cutAhead() float64 {
	cut, _ := f.flow.At(f.swi)
	return cut
}

// surfaceCut is the water cut at surface. Where one phase flows back no more than all, or
// none, of a stream can be water.
func (f *front) surfaceCut(cut float64) float64 {
	return fracflow.SurfaceCut(math.Max(0, math.Min(1, cut)), f.bw, f.bo)
}

// states reads the initial and the injected saturation, empty ones from the ends
// of the curve, and refuses those between which nothing can be displaced.
func (s *sheet) states(rock *rock) (swi, swj float64) {
	within := "from " + units.Format(rock.swc, 6) + " to " + units.Format(rock.swmax, 6) + ", the ends Swc and 1 − Sor of the curve"
	clamp := func(path string, otherwise float64) float64 {
		sw, given := s.input(path)
		switch {
		case !given:
			return otherwise
		case sw < rock.swc-rounding || sw > rock.swmax+rounding:
			s.problem(path, s.typed(path), within)
		}
		return math.Max(rock.swc, math.Min(rock.swmax, sw))
	}
	swi, swj = clamp("front.initialWater", rock.swc), clamp("front.injectedWater", rock.swmax)
	if swj > swi || len(s.problems) > 0 {
		return swi, swj
	}
	if spec, _ := Find("front.injectedWater"); spec.Get(s.st) != nil {
		s.problem("front.injectedWater", s.typed("front.injectedWater"), "above the initial saturation Swi = "+units.Format(swi, 6)+", up to "+units.Format(rock.swmax, 6)+", where the curve ends")
	} else {
		s.problem("front.initialWater", s.typed("front.initialWater"), "below "+units.Format(rock.swmax, 6)+", where no oil moves any more")
	}
	return swi, swj
}

func (f *front) figures(s *sheet, rock *rock) {
	d := f.displacement
	f.brineFigures(s)
	f.dipFigures(s)
	f.initialFigure(s)
	f.trappedFigure(s, rock)
	f.injectedFigure(s)
	behind, ahead, shock := d.Front()
	if !shock {
		behind = ahead // the foremost state of a fan arrives first
	}
	s.figure(Figure{ID: "front.speed", Label: "Front speed", Symbol: "v", Value: d.FrontSpeed(), Quantity: units.Number},
		f.speedWorking(s, behind, ahead, shock))
	if shock {
		s.figure(Figure{ID: "front.shockSaturation", Label: "Saturation behind the front", Symbol: "Swf", Value: behind, Quantity: units.Fraction, Strip: true},
			s.by("", "The straight line from the state ahead of the front, on the fractional flow curve, touches the curve here: f'(Swf) = (f(Swf) − f(Sw ahead))/(Swf − Sw ahead). Found as the last piece of the concave envelope, so that any number of inflections is allowed.", ref.Welge1952, ref.Oleinik1957).
				on("front.initialWater", "front.injectedWater").onFlow(f.curve))
	}
	cut := f.cutFigures(s, behind)
	f.recoveryFigures(s, behind, cut)
	f.stepFigure(s)
	f.mobilityFigures(s, behind, ahead, shock)
	f.stabilityFigures(s)
	f.apartFigure(s)
	f.capillaryFigure(s)
}

// arriving says which state it is that arrives first.
func (f *front) arriving() string {
	if _, _, shock := f.displacement.Front(); shock {
		return "behind the front"
	}
	return "of the foremost state"
}

// cutFigures are the water cut behind the front, and ahead of it where water flows there.
func (f *front) cutFigures(s *sheet, behind float64) (cut float64) {
	p := f.flow.Curves.At(behind)
	cut, _ = f.flow.At(behind)
	place := f.arriving()
	formula, share := "{fwf} = ", "({krw} / {µw}) / ({krw} / {µw} + {kro} / {µo})"
	if f.dip != nil {
		formula += "(1 - {Ng} {kro} / {µo}) "
	}
	w := s.by(formula+share, "kr at the saturation "+place+".", ref.BuckleyLeverett1942).
		value("krw", "krw "+place, p.Krw, units.Fraction).value("kro", "kro "+place, p.Kro, units.Fraction).
		viscosities().rests(f.curve...)
	if f.dip != nil {
		w.term("front.gravityTerm")
	}
	s.figure(Figure{ID: "front.cutAtBreakthrough", Label: "Water cut " + place + ", reservoir", Symbol: "fwf", Value: cut, Quantity: units.Share}, w)
	f.surfaceFigure(s, Figure{ID: "front.surfaceCutAtBreakthrough", Label: "Water cut " + place + ", surface", Symbol: "fws", Strip: true}, "front.cutAtBreakthrough")
	if ahead := f.cutAhead(); ahead > 0 {
		s.figure(Figure{ID: "front.cutAhead", Label: "Water cut ahead of the front, reservoir", Symbol: "fwi", Value: ahead, Quantity: units.Share},
			s.by("", "Fractional flow at the initial saturation, where water already flows.", ref.BuckleyLeverett1942).on("front.initialWater").onFlow(f.curve))
		f.surfaceFigure(s, Figure{ID: "front.surfaceCutAhead", Label: "Water cut ahead of the front, surface", Symbol: "fwsi"}, "front.cutAhead")
	}
	return cut
}

// surfaceFigure tells a water cut, itself a figure, at surface.
func (f *front) surfaceFigure(s *sheet, figure Figure, reservoir string) {
	cut, ok := s.find(reservoir)
	if !ok {
		return
	}
	figure.Value, figure.Quantity = f.surfaceCut(cut.Value), units.Share
	switch {
	case cut.Value == 0:
		s.figure(figure, s.by("", "No water flows.").on(reservoir))
		return
	case cut.Value < 0 || cut.Value > 1:
		s.figure(figure, s.by("", "One phase flows back, so that the stream is all of the other.").on(reservoir))
		return
	}
	s.figure(figure, s.by("{"+figure.Symbol+"} = 1 / (1 + ({Bw} / {Bo}) (1 / {"+cut.Symbol+"} - 1))", "", ref.Dake1978).
		input("fluids.waterFormationFactor").input("fluids.oilFormationFactor").term(reservoir))
}

// stepFigure is the arrival of the step behind the foremost one.
func (f *front) stepFigure(s *sheet) {
	foremost := f.displacement.FrontSpeed()
	i := slices.IndexFunc(f.steps(), func(w fracflow.Wave) bool { return w.SpeedAhead < foremost })
	if i < 0 {
		return
	}
	next := f.steps()[i]
	s.figure(Figure{ID: "front.nextStep", Label: "Next step arrives after", Symbol: "Q2", Value: 1 / next.SpeedAhead, Quantity: units.PoreVolumes},
		s.by("{Q2} = 1 / {v2}", "From Sw = "+units.Format(next.Ahead, 4)+" to "+units.Format(next.Behind, 4)+": another straight piece of the envelope, with a speed of its own.", ref.Welge1952, ref.Oleinik1957).
			value("v2", "speed of the step", next.SpeedAhead, units.Number).on("front.speed"))
}

func (f *front) initialFigure(s *sheet) {
	w := s.by("{Swi} = {Swc}", "The connate water saturation of the curve, since none is typed.").term("rock.swc")
	if given(s.st, "front.initialWater") {
		w = s.by("", "As typed.").rests("front.initialWater")
	}
	s.figure(Figure{ID: "front.initialWater", Label: "Initial water saturation", Symbol: "Swi", Value: f.swi, Quantity: units.Fraction}, w)
}

func (f *front) injectedFigure(s *sheet) {
	figure := Figure{ID: "front.injectedWater", Label: "Saturation held at the inlet", Symbol: "Swj", Value: f.swj, Quantity: units.Fraction}
	face, _ := f.displacement.InletFace()
	typed := given(s.st, figure.ID)
	w := s.by("{Swj} = 1 - {Sor}", "The largest water saturation of the curve, since none is typed.").term("rock.sor")
	switch {
	case math.Abs(face-f.swj) > backward:
		figure.Label, figure.Value = "Saturation at the inlet face", face
		w = s.by("", "Where the fractional flow is largest: the states from here up to Sw = "+units.Format(f.swj, 4)+", held at the inlet, run back and never enter.", ref.BuckleyLeverett1942).onFlow(f.curve)
		if typed {
			w.rests(figure.ID)
		}
	case typed:
		w = s.by("", "As typed.").rests(figure.ID)
	case f.stretched():
		w = s.by("{Swj} = 1 - {Sor,L}", "The curve is stretched to what Land's law leaves, since none is typed.", ref.Land1968).term("front.trapped").rests("front.ending")
	}
	s.figure(figure, w)
}

// given reports whether an input is typed.
func given(st *Study, path string) bool {
	spec, _ := Find(path)
	return spec.Get(st) != nil
}

func (f *front) speedWorking(s *sheet, behind, ahead float64, shock bool) *working {
	if !shock {
		return s.by("", "The largest slope dfw/dSw of the fractional flow curve: no jump runs ahead.", ref.BuckleyLeverett1942).
			on("front.initialWater").onFlow(f.curve)
	}
	fb, _ := f.flow.At(behind)
	fa, _ := f.flow.At(ahead)
	return s.by("{v} = ({fwf} - {fwa}) / ({Swf} - {Swa})", "Slope of the straight line from the state ahead of the front to the curve: pore lengths travelled for each pore volume injected.", ref.Welge1952).
		value("fwf", "water cut behind the front", fb, units.Fraction).value("fwa", "water cut ahead of the front", fa, units.Fraction).
		value("Swf", "saturation behind the front", behind, units.Fraction).value("Swa", "saturation ahead of the front", ahead, units.Fraction).
		onFlow(f.curve).on("front.initialWater", "front.injectedWater")
}
