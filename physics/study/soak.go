package study

import (
	"errors"
	"math"

	"brinefront/physics/imbibe"
	"brinefront/physics/units"
)

// soak is imbibition into the rock of a study, by the self-similar solution.
type soak struct {
	*imbibe.Solution
	length   float64
	time     float64
	asked    bool    // the time is typed
	edge     float64 // the saturation that stands for the reach of the water: Initial where it has a front
	arrival  float64 // when that meets the far boundary
	inputs   []string
	pcEnds   [2]float64
	held     float64 // at the face; Inlet is what gets inside
	initials string  // where the initial saturation comes from
}

// risen is the share of the whole change in saturation that marks the reach of water
// without a front. A convention of this program.
const risen = 0.01

// runSoak answers the Soak sheet, of a study that has a capillary pressure; beside it the block, where
// one is given and computed.
func runSoak(st *Study, rockPart Part, rock *rock, front *front) (Part, *soakingBlock) {
	s := newSheet(st, rockPart)
	s.await(rockPart)
	var b *brine
	if withBrine(st) {
		b = s.brine()
	}
	mu := viscosities(pairOf(st))
	r := imbibe.Rock{
		Permeability: s.need("field.permeability"), Porosity: s.need("field.porosity"),
		WaterViscosity: s.property(mu[0], b), OilViscosity: s.property(mu[1], b),
	}
	k := &soak{length: s.need("soak.length"), inputs: []string{"field.permeability", "field.porosity", "fluids.waterViscosity", "fluids.oilViscosity"}}
	k.time, k.asked = s.input("soak.time")
	ratio := s.soakRatio()
	initial, inlet := k.states(s)
	if rock != nil {
		curve, wanted := rock.capillary()
		for _, path := range wanted {
			s.miss(path)
		}
		r.Kr, r.Pc = rock.curves, curve
		k.inputs = append(k.inputs, rock.inputs...)
		if curve != nil {
			k.inputs = append(k.inputs, rock.suction.inputs...)
		}
	}
	standing := s.standing()
	if rockPart.Status == Refused {
		standing = Refused
	}
	if standing != Ready || rock == nil {
		return s.close(standing), nil
	}
	if pairOf(st).Drainage() {
		s.note(Note{ID: "soak.drainage", Level: "caution", Text: "This pair does not soak: the phase that comes in does not wet the rock.",
			Cause: "Capillary pressure keeps it out.", Do: "Choose a pair whose displacing phase wets the rock.", Paths: []string{"fluids.pair"}})
		return s.close(Stopped), nil
	}
	if math.IsNaN(initial) {
		initial, _ = r.Ends()
	}
	span, err := imbibe.NewSpan(r, initial, inlet)
	if err == nil {
		k.Solution, err = imbibe.Solve(span, ratio)
	}
	if err != nil {
		return s.notSoaking(err, r), nil
	}
	k.pcEnds[0], k.pcEnds[1] = r.Pc.Ends()
	if k.held = inlet; math.IsNaN(inlet) {
		k.held = r.Inlet()
	}
	k.reach()
	k.figures(s)
	k.charts(s)
	s.part.Tables = append(s.part.Tables, k.table())
	k.notes(s)
	k.answer(s)
	block := s.blocks(soakingRock{span, k.inputs, rock.memory}, front)
	if k.Status == imbibe.Stopped {
		return s.close(Stopped), block
	}
	return s.close(rockPart.Status), block
}

// soakRatio is R of the flow that is chosen.
func (s *sheet) soakRatio() float64 {
	switch s.st.Soak.Flow {
	case coCurrent:
		return 1
	case mixedCurrent:
		return s.need("soak.ratio")
	}
	return 0
}

// states are the saturations at the start and at the open face; NaN where what is usual holds.
func (k *soak) states(s *sheet) (initial, inlet float64) {
	initial, inlet = math.NaN(), math.NaN()
	for _, path := range []string{"front.initialWater", "soak.initial"} {
		if sw, given := s.input(path); given {
			initial, k.initials = sw, path
		}
	}
	if sw, given := s.input("soak.inlet"); given {
		inlet = sw
	}
	return initial, inlet
}

// notSoaking says why there is no solution: beside the input that is at fault, or in a note
// where none is.
func (s *sheet) notSoaking(err error, r imbibe.Rock) Part {
	var bad *imbibe.InputError
	if !errors.As(err, &bad) {
		panic(err) // the solver has errors of no other kind
	}
	low, high := r.Ends()
	stop := r.Inlet()
	path := map[string]string{imbibe.BadInitial: "soak.initial", imbibe.BadInlet: "soak.inlet", imbibe.BadRatio: "soak.ratio"}[bad.Name]
	if bad.Name == imbibe.BadInitial && s.st.Soak.Initial == nil && s.st.Front.InitialWater != nil {
		path = "front.initialWater"
	}
	if spec, ok := Find(path); ok && spec.Applies(s.st) && spec.Get(s.st) != nil {
		within := "from " + units.Format(low, 6) + ", where the curves begin, to below " + units.Format(stop, 6) + ", where capillary pressure is zero"
		switch bad.Name {
		case imbibe.BadInlet:
			within = "above the saturation at the start, at most " + units.Format(high, 6) + ", where the curves end"
		case imbibe.BadRatio:
			within = "up to 0.999999 where the open face is held at residual oil: else no oil has to leave there, and nothing limits the rate"
		}
		s.problem(path, s.typed(path), within)
		return s.close(Refused)
	}
	n := Note{ID: "soak.none", Level: "caution", Text: "The rock does not soak up water by itself.",
		Cause: "At the water that it holds from the start, capillary pressure is zero or below: " + bad.Allowed + ".", Do: "Look at the capillary pressure and at the saturation at the start.", Paths: []string{"rock.capillary.curve", "soak.initial"}}
	switch bad.Name {
	case imbibe.BadInitial, imbibe.BadInlet:
	case imbibe.BadRatio:
		n = Note{ID: "soak.unbounded", Level: "caution", Text: "Purely co-current, nothing limits the rate: it has no finite value.",
			Cause: "The open face is held at residual oil, from where no oil can leave and none has to.", Do: "Let a part of the oil leave at the face, with a ratio below 1, or hold the face at less water.", Paths: []string{"soak.flow", "soak.inlet"}}
	default:
		n.Text, n.Cause = "There is no self-similar solution with these curves.", "The "+bad.Name+" is "+units.Format(bad.Value, 3)+"; it must be "+bad.Allowed+"."
	}
	s.note(n)
	return s.close(Stopped)
}

// reach finds how far the water is, and until when the far boundary is not felt.
func (k *soak) reach() {
	k.edge = k.Initial
	if !k.FiniteFront() {
		k.edge += risen * k.Width()
	}
	k.arrival = k.Arrival(k.edge, k.length)
	if !k.asked {
		k.time = k.arrival
	}
}

// past reports whether the time asked about lies beyond what the solution holds for.
func (k *soak) past() bool { return k.time > k.arrival*(1+backward) }

func (k *soak) answer(s *sheet) {
	s.answer("The rock takes up water as 2 A √t with A = {soak.a}")
	arrival := "its front meets the far boundary"
	if !k.FiniteFront() {
		arrival = "a rise of 1 % of the whole meets the far boundary"
	}
	const taken = " that is {soak.uptake} of water per area of open face"
	if !k.asked {
		s.answer(": after {soak.time}, when "+arrival+","+taken, ", {soak.recovery} of the pore volume of the block", ".")
		return
	}
	if !k.past() {
		s.answer(": after {soak.time}"+taken, ", {soak.recovery} of the pore volume of the block", ", and the water is {soak.reach} deep")
	}
	s.answer("; "+arrival+" after {soak.arrival}", ".")
}
