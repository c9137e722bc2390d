package study

import (
	"math"
	"slices"

	"brinefront/physics/fluid"
	"brinefront/physics/ref"
	"brinefront/physics/relperm"
	"brinefront/physics/units"
)

func land(c, swc float64) relperm.Land { return relperm.Land{C: c, Swc: swc} }

// ending stretches the curves to what Land's law leaves trapped, where the study says so.
func (s *sheet) ending(pair fluid.Pair, r *rock) *rock {
	if !pair.Land || s.st.Front.Ending != byLand {
		return r
	}
	c := s.need("rock.land")
	initial, given := s.input("front.initialWater")
	if !given {
		initial = r.swc
	}
	if !(c >= 0 && initial < 1) {
		return r // what is missing or cannot be used is said
	}
	end := 1 - land(c, r.swc).Trapped(1-initial)
	if end <= r.swc {
		s.problem("rock.land", s.typed("rock.land"), "so much that some oil can be displaced: above 0")
		return r
	}
	stretched := *r
	stretched.curves, stretched.swmax = relperm.Stretched{Curves: r.curves, Swmax: end}, end
	stretched.inputs = append(slices.Clone(r.inputs), "rock.land", "front.ending")
	return &stretched
}

// trappedFigure is what Land's law leaves of a trapped phase.
func (f *front) trappedFigure(s *sheet, rock *rock) {
	c, given := s.input("rock.land")
	if !given || !f.pair.Land {
		return
	}
	s.figure(Figure{ID: "front.trapped", Label: "Trapped oil by Land's law", Symbol: "Sor,L", Value: land(c, rock.swc).Trapped(1 - f.swi), Quantity: units.Fraction},
		s.by("{Sor,L} = 1 / (1 / (1 - {Swi}) + {C} / (1 - {Swc}))", "What stays of the oil that was there at first.", ref.Land1968).
			term("front.initialWater").input("rock.land").term("rock.swc"))
}

// stretched reports whether the curves end where Land's law says.
func (f *front) stretched() bool {
	_, is := f.flow.Curves.(relperm.Stretched)
	return is
}

// trapping holds Land's law against the end of the curve.
func (f *front) trapping(s *sheet) {
	trapped := s.number("front.trapped")
	if math.IsNaN(trapped) {
		return
	}
	if f.stretched() {
		s.note(Note{ID: "front.stretched", Level: "remark", Text: "The curve is stretched from its own end, " + units.Format(s.number("rock.sor"), 3) + ", to the " + units.Format(trapped, 3) + " of the pore space that Land's law leaves trapped (" + ref.Get(ref.Land1968).Short() + ").",
			Cause: "End-point kr is kept; with more left behind it is usually lower. Common practice, no source.", Do: "Measure the curve from the initial saturation of the reservoir where it decides.", Paths: []string{"rock.land", "front.ending"}})
		return
	}
	const apart = 0.03
	sor := s.number("rock.sor")
	far := math.Abs(trapped-sor) > apart
	do := "Nothing: the curve and the law agree."
	if far {
		do = "Let the curve end by Land's law, use one that ends at the trapped saturation, or another C; the displacement here ends where the curve does."
	}
	s.note(Note{ID: "front.land", Level: level(far), Text: "Land's law leaves " + units.Format(trapped, 3) + " of the pore space trapped; the curve ends at " + units.Format(sor, 3) + " (" + ref.Get(ref.Land1968).Short() + ").",
		Cause: "What stays behind decides the recovery, and it depends on how much was there at first.", Do: do, Paths: []string{"rock.land"}})
}
