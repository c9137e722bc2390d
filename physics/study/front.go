package study

import (
	"math"

	"brinefront/physics/displace"
	"brinefront/physics/fracflow"
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// front is the displacement, ready for the field to use.
type front struct {
	flow         fracflow.Flow
	displacement *displace.Displacement
	swi, swj     float64
	bw, bo       float64
}

// runFront answers the Front sheet; nil when there is no displacement to build on.
func runFront(st *Study, problems *[]Problem, rockPart Part, rock *rock) (Part, *front) {
	s := newSheet(st, rockPart)
	s.await(rockPart)
	muw, muo := s.need("fluids.waterViscosity"), s.need("fluids.oilViscosity")
	f := &front{bw: s.need("fluids.waterFormationFactor"), bo: s.need("fluids.oilFormationFactor")}
	if rock != nil {
		f.flow = fracflow.Flow{Curves: rock.curves, MuW: muw, MuO: muo}
		f.swi, f.swj = s.states(rock)
	} else {
		s.input("front.initialWater")
		s.input("front.injectedWater")
	}
	*problems = append(*problems, s.problems...)
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
	f.displacement = d
	f.figures(s, rock)
	f.charts(s)
	f.tables(s)
	f.notes(s)
	s.answer("Water arrives after {front.breakthrough} injected with {front.recoveryAtBreakthrough} of the pore volume produced ({front.recoveryAtBreakthroughInPlace} of the oil in place)")
	if _, _, shock := d.Front(); shock {
		s.answer("; the water cut jumps to {front.surfaceCutAtBreakthrough} at surface")
	}
	s.answer("; after 1 PV the recovery is {front.recoveryAtOne}", ".")
	return s.close(rockPart.Status), f
}

// states reads the initial and the injected saturation, empty ones from the ends
// of the curve, and refuses those between which nothing can be displaced.
func (s *sheet) states(rock *rock) (swi, swj float64) {
	const rounding = 1e-9 // typed and computed ends of a curve agree to this
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
	f.stateFigures(s)
	behind, ahead, shock := d.Front()
	if !shock {
		behind = ahead // the foremost state of a fan arrives first
	}
	curve := rock.inputs
	s.figure(Figure{ID: "front.speed", Label: "Front speed", Symbol: "v", Value: d.FrontSpeed(), Quantity: units.Number},
		f.speedWorking(s, behind, ahead, shock, curve))
	if shock {
		s.figure(Figure{ID: "front.shockSaturation", Label: "Saturation behind the front", Symbol: "Swf", Value: behind, Quantity: units.Fraction, Strip: true},
			s.by("", "The straight line from the state ahead of the front, on the fractional flow curve, touches the curve here: f'(Swf) = (f(Swf) − f(Sw ahead))/(Swf − Sw ahead). Found as the last piece of the concave envelope, so that any number of inflections is allowed.", ref.Welge1952, ref.Oleinik1957).
				on("front.initialWater", "front.injectedWater").rests(curve...).rests("fluids.waterViscosity", "fluids.oilViscosity"))
	}
	p := f.flow.Curves.At(behind)
	cut, _ := f.flow.At(behind)
	s.figure(Figure{ID: "front.cutAtBreakthrough", Label: "Water cut behind the front, reservoir", Symbol: "fwf", Value: cut, Quantity: units.Share},
		s.by("{fwf} = ({krw} / {µw}) / ({krw} / {µw} + {kro} / {µo})", "kr at the saturation behind the front.", ref.BuckleyLeverett1942).
			value("krw", "krw behind the front", p.Krw, units.Fraction).value("kro", "kro behind the front", p.Kro, units.Fraction).
			input("fluids.waterViscosity").input("fluids.oilViscosity").rests(curve...))
	s.figure(Figure{ID: "front.surfaceCutAtBreakthrough", Label: "Water cut behind the front, surface", Symbol: "fws", Value: fracflow.SurfaceCut(cut, f.bw, f.bo), Quantity: units.Share, Strip: true},
		s.by("{fws} = 1 / (1 + ({Bw} / {Bo}) (1 / {fwf} - 1))", "", ref.Dake1978).
			input("fluids.waterFormationFactor").input("fluids.oilFormationFactor").term("front.cutAtBreakthrough"))
	f.recoveryFigures(s, behind, cut)
	f.mobilityFigures(s, behind, ahead, shock)
}

func (f *front) stateFigures(s *sheet) {
	for _, state := range []struct {
		id, path, label, symbol, end, endSymbol, default_ string
		value                                             float64
	}{
		{"front.initialWater", "front.initialWater", "Initial water saturation", "Swi", "rock.swc", "{Swi} = {Swc}", "The connate water saturation of the curve, since none is typed.", f.swi},
		{"front.injectedWater", "front.injectedWater", "Saturation held at the inlet", "Swj", "rock.sor", "{Swj} = 1 - {Sor}", "The largest water saturation of the curve, since none is typed.", f.swj},
	} {
		figure := Figure{ID: state.id, Label: state.label, Symbol: state.symbol, Value: state.value, Quantity: units.Fraction}
		if spec, _ := Find(state.path); spec.Get(s.st) != nil {
			s.figure(figure, s.by("", "As typed.").rests(state.path))
		} else {
			s.figure(figure, s.by(state.endSymbol, state.default_).term(state.end))
		}
	}
}

func (f *front) speedWorking(s *sheet, behind, ahead float64, shock bool, curve []string) *working {
	if !shock {
		return s.by("", "The largest slope dfw/dSw of the fractional flow curve: no jump runs ahead.", ref.BuckleyLeverett1942).
			on("front.initialWater").rests(curve...).rests("fluids.waterViscosity", "fluids.oilViscosity")
	}
	fb, _ := f.flow.At(behind)
	fa, _ := f.flow.At(ahead)
	return s.by("{v} = ({fwf} - {fwa}) / ({Swf} - {Swa})", "Slope of the straight line from the state ahead of the front to the curve: pore lengths travelled for each pore volume injected.", ref.Welge1952).
		value("fwf", "water cut behind the front", fb, units.Fraction).value("fwa", "water cut ahead of the front", fa, units.Fraction).
		value("Swf", "saturation behind the front", behind, units.Fraction).value("Swa", "saturation ahead of the front", ahead, units.Fraction).
		rests(curve...).rests("fluids.waterViscosity", "fluids.oilViscosity").on("front.initialWater", "front.injectedWater")
}
