package study

import (
	"math"
	"strings"

	"brinefront/physics/units"
)

// ride answers what rides along beside the water flood.
func (f *front) ride(s *sheet) {
	r := f.rider
	if r == nil {
		f.nothingRides(s)
		return
	}
	r.solve(f)
	f.rideNotes(s)
	if r.flood == nil {
		return
	}
	f.rideFigures(s)
	f.rideCharts(s)
	s.part.Tables = append(s.part.Tables, f.rideTable(s))
}

// rideSentence goes on from the answer of the water flood.
func (f *front) rideSentence(s *sheet) {
	if f.rider == nil || f.rider.flood == nil {
		return
	}
	if f.rider.short() {
		s.answer(" The slug is spent after {front.ride.spent}, at {front.ride.spentAt} of the length; injected without end its "+f.rider.name+" would arrive after {front.ride.arrival}", ".")
		return
	}
	adds := "; at 1 PV it adds {front.ride.gainAtOne} of the pore volume"
	if s.number("front.ride.gainAtOne") < 0 {
		adds = "; at 1 PV it changes recovery by {front.ride.gainAtOne} of the pore volume"
	}
	s.answer(" The "+f.rider.name+" arrives after {front.ride.arrival}", " behind a bank at Sw {front.ride.bankSaturation}", adds, ".")
}

func (f *front) nothingRides(s *sheet) {
	if kind := s.st.Front.Rider.Kind; kind != noRider && kind != "" {
		s.note(Note{ID: "front.ride.pair", Level: "caution", Text: "Nothing rides along: the displacing phase of this pair is no brine.",
			Cause: "Polymer, salinity, tracers and heat are followed in injected brine.", Do: "Choose a pair in which brine displaces, or that nothing rides along.", Paths: []string{"front.rider.kind", "fluids.pair"}})
	}
}

func (f *front) rideNotes(s *sheet) {
	r := f.rider
	kind := []string{"front.rider.kind"}
	if r.unsolved != nil {
		s.note(Note{ID: "front.ride.unsolved", Level: "caution", Text: "The " + r.name + " could not be followed: " + reason(r.unsolved) + ".",
			Cause: "The answer is that of water alone.", Do: "Look at the inputs of what rides along and at both saturations.", Paths: kind})
		return
	}
	s.note(Note{ID: "front.ride.assumptions", Level: "remark", Text: "Rock and water exchange at once and in proportion; " + assumed[r.kind] + ".",
		Cause: "Rates of exchange, reactions and mixing round a step off and can hold it up.", Do: "Take the arrival as that of the middle of the step.", Paths: kind})
	s.note(Note{ID: "front.ride.field", Level: "remark", Text: "What rides along is answered on this sheet; the Field sheet and the figures without it are those of water alone.",
		Cause: "Injectivity and rates with what rides along are not forecast; at a constant pressure difference its times are left out.", Do: "Set the recovery curves side by side in pore volumes.", Paths: kind})
	if r.kind == tracer && math.IsInf(r.at("peclet", math.Inf(1)), 1) {
		s.note(Note{ID: "front.ride.sharp", Level: "remark", Text: "No Péclet number is given: the tracer is drawn as a step.",
			Cause: "Dispersion brings some of it earlier.", Do: "Give length over dispersivity.", Paths: []string{riderPath("peclet")}})
	}
	f.slugNotes(s)
}

// assumed is what else is taken for granted, by kind.
var assumed = map[string]string{
	polymer:     "the polymer front is one sharp step, polymer does not degrade, and what the rock keeps of it stays for good",
	salt:        "the salinity front is one sharp step, water viscosity and Swc stay as they are, residual oil changes where the salinity does, and chase water takes back what the rock holds",
	tracer:      "a tracer changes nothing of the flow and spreads as in a uniform stream, which is an estimate where the saturation varies behind it",
	riderOfHeat: "the temperature front is one sharp step, no heat is lost to the layers above and below, and kr does not change",
}

func (f *front) slugNotes(s *sheet) {
	r := f.rider
	path := []string{riderPath("slug")}
	if r.unfollows != nil {
		s.note(Note{ID: "front.ride.slugUnfollowed", Level: "caution", Text: "The slug is not followed: " + reason(r.unfollows) + ".",
			Cause: "Injection without end is answered.", Do: "Leave the slug empty, or look at the curves and viscosities of both waters.", Paths: path})
		return
	}
	if r.slug == nil {
		return
	}
	s.note(Note{ID: "front.ride.rear", Level: "caution", Text: "The rear of the slug is taken as one step, without fingers.",
		Cause: "Plain water that moves more easily than the slug fingers through it, so that the rear comes earlier.", Do: "Take the times of the rear as the latest, recovery as an upper bound; grade the viscosity down at the rear.", Paths: path})
	if _, x := r.slug.Spent(); r.short() {
		s.note(Note{ID: "front.ride.slugSmall", Level: "caution", Text: "The slug is too small: it is spent at " + units.Format(x, 3) + " of the way to the producer.",
			Cause: "The rock keeps what the slug carries; from there on plain water leads, which is not followed here.", Do: "Inject " + units.Format(r.flood.LeastSlug(r.rear(), 1), 3) + " PV or more, and some for fingers.", Paths: append(path, riderPath("retention"))})
	}
}

// reason is an error of package ride for a sentence.
func reason(err error) string { return strings.TrimPrefix(err.Error(), "ride: ") }
