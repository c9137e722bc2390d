package study

import (
	"math"
	"slices"

	"brinefront/physics/fv"
	"brinefront/physics/imbibe"
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// Bounds of the number that says whether suction or push rules; own, beside which the
// profile with both shows what they mean.
const (
	pushRules    = 0.01
	suctionRules = 1.0
)

// mostPushed is how often cells are evaluated, at most, for the profile with both.
const mostPushed = 1_000_000

// push tells whether the study's flood is ruled by its rate or by suction, over the length
// between the wells and over that of a block, and shows the latter with both.
func (b *soakingBlock) push(s *sheet, f *front) {
	if f == nil || !(f.velocity > 0) {
		return
	}
	mean := b.matrix.MeanDiffusion() * b.matrix.Capacity()
	inputs := append([]string{"front.velocity"}, b.soakingRock.inputs...)
	number := func(id, label string, length float64) float64 {
		n := mean / (f.velocity * length)
		s.figure(Figure{ID: id, Label: label, Symbol: "Nc", Value: n, Quantity: units.Number},
			s.by("", "∫ Dc dS from Si to S0, over total Darcy velocity and length: what suction could carry through the length against what the rate does (own; the group of Rapoport & Leas with the curves in it).", ref.RapoportLeas1953).rests(inputs...).rests(b.inputs...))
		return n
	}
	length := b.Shape.CharacteristicLength()
	n := number("soak.pushBlock", "Suction over push, across a block", length)
	if field, given := s.input("field.length"); given {
		inputs = append(inputs, "field.length")
		number("soak.pushField", "Suction over push, between the wells", field)
	}
	said := "both count"
	switch {
	case n >= suctionRules:
		said = "suction rules"
	case n <= pushRules:
		said = "the rate rules"
	}
	s.note(Note{ID: "soak.pushRuled", Level: "remark", Text: "At the study's rate, across a block, " + said + ".",
		Cause: "Suction over push is " + units.Format(n, 2) + " there: above 1 suction rules, below 0.01 the rate (own bounds).", Do: "Where both count, neither the front of Front nor soaking alone holds; see the profile with both."})
	if c, ok := b.pushed(f, length); ok {
		s.part.Charts = append(s.part.Charts, c)
	} else {
		s.note(Note{ID: "soak.pushStopped", Level: "caution", Text: "The profile with push and suction together is not drawn.", Cause: "It did not come to its end in bounded work: corners or ends of the curves stop it.", Do: "Look at the ends of the curves; a smooth curve helps.", Paths: []string{"rock.curve", "rock.capillary.curve"}})
	}
}

// pushed is the profile over a length with both, beside each alone, when half of the rock's
// length has been crossed by the front.
func (b *soakingBlock) pushed(f *front, length float64) (Chart, bool) {
	low, high := b.span.Ends()
	law, err := fv.NewLaw(f.flow, low, high)
	if err == nil {
		law, err = law.Tabulated(1024)
	}
	if err != nil {
		return Chart{}, false
	}
	knots := slices.Concat(b.span.Kr.Knots(), b.span.Pc.Knots())
	slices.Sort(knots)
	potential, err := fv.NewPotential(func(sw float64) float64 { return b.span.Diffusion(sw) / length }, low, high, slices.Compact(knots))
	if err != nil {
		return Chart{}, false
	}
	const cells = 100
	run, err := fv.NewImplicit(fv.Medium{Law: law, Potential: potential}, fv.ImplicitSettings{Cells: cells, Initial: b.initial, Through: f.velocity,
		Inlet: fv.End{Kind: fv.Fed, Share: 1}, Outlet: fv.End{Kind: fv.Threshold, State: b.span.Rock.Inlet()}, Error: 1e-3, SecondOrder: true})
	if err != nil {
		return Chart{}, false
	}
	c := Chart{ID: "soak.push", Title: "Push and suction together", X: axis("Distance from the inlet", "x", units.Length).from(0, length), Y: axis("Water saturation", "Sw", units.Fraction).from(0, 1), Marks: []Mark{},
		Summary: "Water saturation along as much rock as a block is long, once the front alone has gone half of it and once as much as all of it: with push and suction together, by push alone with its sharp front, and by suction alone. At the outlet water waits until capillary pressure is zero."}
	d := f.displacement
	for i, q := range []float64{0.5 * d.Breakthrough(), d.Breakthrough() + 0.5} {
		if !run.Advance(q/f.velocity, func(r *fv.Implicit) bool { return r.Work() < mostPushed }) || run.T() < q/f.velocity {
			return Chart{}, false
		}
		both := Line{ID: "both" + units.Exact(float64(i+1)), Label: "both, " + units.Format(q, 2) + " PV", Role: "time" + units.Exact(float64(2*i+1)), Kind: "line"}
		alone := Line{ID: "push" + units.Exact(float64(i+1)), Label: "push, " + units.Format(q, 2) + " PV", Role: "time" + units.Exact(float64(2*i+1)), Kind: "dashed"}
		for k, sw := range run.Cells() {
			both.X, both.Y = append(both.X, length*(float64(k)+0.5)/cells), append(both.Y, sw)
		}
		speed, sw := f.profile()
		for k, v := range speed {
			if x := length * v * q; x <= length {
				alone.X, alone.Y = append(alone.X, x), append(alone.Y, sw[k])
			}
		}
		if last := len(alone.X) - 1; alone.X[last] < length {
			alone.X, alone.Y = append(alone.X, alone.X[last], length), append(alone.Y, f.swi, f.swi)
		}
		c.Lines = append(c.Lines, both, alone)
	}
	// Suction alone into the same length from the inlet, at the first time.
	time := 0.5 * d.Breakthrough() * b.porous * length / f.velocity
	if soaked, err := b.matrix.Soak(imbibe.Slab(length, 1)); err == nil && len(soaked.Profiles) > 0 {
		near := slices.MinFunc(soaked.Profiles, func(p, q imbibe.Profile) int {
			a, b := math.Abs(math.Log(p.Time/time)), math.Abs(math.Log(q.Time/time))
			switch {
			case a < b:
				return -1
			case a > b:
				return 1
			}
			return 0
		})
		c.Lines = append(c.Lines, Line{ID: "soak", Label: "suction alone, " + units.Format(100*near.Share, 2) + " % in", Role: "aid", Kind: "dashed", X: near.Distance, Y: near.Sw})
	}
	return c, true
}
