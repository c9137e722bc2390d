package study

import (
	"math"
	"slices"

	"brinefront/physics/fracflow"
	"brinefront/physics/ride"
	"brinefront/physics/units"
)

// shares name what runs from 0 to 1 across the front of every kind.
var shares = map[string]string{polymer: "polymer", salt: "injected salinity", tracer: "tracer", riderOfHeat: "injected temperature"}

func (f *front) rideCharts(s *sheet) {
	r := f.rider
	end := math.Max(1.5, math.Max(1.5*r.flood.Arrival(), 3*f.displacement.Breakthrough()))
	s.part.Charts = append(s.part.Charts, f.constructionChart(), f.rideProfileChart(end))
	if r.kind == tracer {
		s.part.Charts = append(s.part.Charts, f.responseChart())
	} else {
		s.part.Charts = append(s.part.Charts, f.rideRecoveryChart(end))
	}
	if r.slug != nil {
		s.part.Charts = append(s.part.Charts, f.slugChart(end))
	}
}

// constructionChart is both fractional flow curves with the line from the pivot.
func (f *front) constructionChart() Chart {
	r := f.rider
	speed, behind, _ := r.flood.Front()
	const farthest = 0.5   // a pivot further to the left would leave no room for the curves
	pivot := 0 - r.pivot.B // no negative nothing
	left := 0 - math.Max(0, math.Ceil(10*math.Min(r.pivot.B, farthest))/10)
	c := Chart{ID: "front.ride.construction", Title: "How the " + r.name + " is found", X: axis("Water saturation", "Sw", units.Fraction).from(left, 1), Y: axis("Water cut", "fw", units.Share).from(0, 1)}
	draw := func(id, label, role string, flow fracflow.Flow) {
		l := Line{ID: id, Label: label, Role: role, Kind: "line"}
		low, high := flow.Ends()
		l.X = saturations(low, high, flow.Knots())
		for _, sw := range l.X {
			cut, _ := flow.At(sw)
			l.Y = append(l.Y, cut)
		}
		c.Lines = append(c.Lines, l)
	}
	draw("ahead", "water in place", "water", f.flow)
	if r.kind != tracer {
		draw("behind", "injected water", "total", r.behind)
	}
	on := func(sw float64) float64 { return speed*(sw+r.pivot.B) - r.pivot.A }
	from, to := math.Max(left, pivot), math.Min(1, (math.Max(1, behind.F)+r.pivot.A)/speed-r.pivot.B)
	c.Lines = append(c.Lines, Line{ID: "front", Label: "line from the pivot", Role: "aid", Kind: "dashed", X: []float64{from, to}, Y: []float64{on(from), on(to)}})
	if from == pivot {
		c.Marks = append(c.Marks, Mark{"pivot", from, on(from)})
	}
	c.Marks = append(c.Marks, Mark{r.name, behind.S, behind.F})
	c.Summary = "Water cut against water saturation for the water in place and for the injected water"
	if r.kind == tracer {
		c.Summary = "Water cut against water saturation, the same with a tracer and without"
	}
	c.Summary += ". The line from the pivot at Sw = " + units.Format(pivot, 3) + " meets the curve of the injected water at Sw = " + units.Format(behind.S, 3)
	if bank, edge, ok := r.flood.Bank(); ok && r.kind != tracer {
		c.Marks = append(c.Marks, Mark{"bank", bank.S, bank.F})
		c.Summary += " and that of the water in place at Sw = " + units.Format(bank.S, 3) + ", the bank"
		if first := f.leading(); first.Kind == fracflow.Shock {
			end, _ := f.flow.At(first.Ahead)
			c.Lines = append(c.Lines, Line{ID: "edge", Label: "edge of the bank, speed " + units.Format(edge, 3), Role: "aid", Kind: "dashed", X: []float64{bank.S, first.Ahead}, Y: []float64{bank.F, end}})
		}
	}
	c.Summary += "; its slope, " + units.Format(speed, 3) + ", is the speed."
	c.Y = c.Y.holding(c.Lines)
	return c
}

// leading is the first wave ahead of the front; there is one where there is a bank.
func (f *front) leading() ride.Wave {
	waves := f.rider.flood.Waves()
	i := slices.IndexFunc(waves, func(w ride.Wave) bool { return w.Zone == ride.Ahead })
	return waves[i]
}

// rideProfileChart is saturation, and what rides along, for any volume injected.
func (f *front) rideProfileChart(end float64) Chart {
	r := f.rider
	v, _, _ := r.flood.Front()
	speed, sw := f.rideProfile()
	c := Chart{
		ID: "front.ride.profile", Title: "Along the flood with the " + r.name,
		X: axis("Distance from the injector, part of the length", "x/L", units.Number).from(0, 1), Y: axis("Water saturation, share of what is injected", "Sw, C", units.Fraction).from(0, 1),
		Marks: []Mark{},
		Lines: []Line{
			{ID: "saturation", Label: "saturation", Role: "water", Kind: "line", X: speed, Y: sw, Moving: true},
			{ID: "share", Label: shares[r.kind], Role: "total", Kind: "dashed", X: []float64{0, v, v}, Y: []float64{1, 1, 0}, Moving: true},
		},
		Slider: &Slider{Label: "Injected", Symbol: "Q", Quantity: units.PoreVolumes, Min: 0, Max: end, Value: r.flood.Breakthrough() / 2,
			Marks: []Mark{{Label: r.arrives(), X: r.flood.Arrival()}}},
		Summary: "Water saturation from injector to producer, and how far the injected water with what it carries has come, after a volume injected that the reader moves.",
	}
	if bank, edge, ok := r.flood.Bank(); ok && r.kind != tracer {
		c.Slider.Marks = append(c.Slider.Marks, Mark{Label: "bank arrives", X: 1 / edge})
		c.Summary += " Between both steps lies the bank, at Sw = " + units.Format(bank.S, 3) + "."
	}
	if !math.IsInf(r.size(), 1) {
		c.Summary += " Injection without end is drawn; ahead of the rear of a slug it is the same."
	}
	return c
}

// rideProfile is saturation against speed, as profile is for water alone.
func (f *front) rideProfile() (speed, sw []float64) {
	nodes := f.rider.flood.Path()
	speed, sw = []float64{0}, []float64{f.rider.flood.InletFace().S}
	step := finest * nodes[len(nodes)-1].Xi
	for i, n := range nodes {
		last := len(speed) - 1
		if n.Xi-speed[last] > step || math.Abs(n.S-sw[last]) > finest || i == len(nodes)-1 {
			speed, sw = append(speed, math.Max(0, n.Xi)), append(sw, n.S)
		}
	}
	return speed, sw
}

// rideRecoveryChart sets recovery with what rides along beside that of water alone.
func (f *front) rideRecoveryChart(end float64) Chart {
	r := f.rider
	with := Line{ID: "with", Label: "with the " + r.name, Role: "oil", Kind: "line"}
	without := Line{ID: "without", Label: "water alone", Role: "water", Kind: "line"}
	added := Line{ID: "added", Label: "added", Role: "total", Kind: "dashed"}
	for _, q := range injections(f.displacement, end, f.rideEvents()...) {
		alone := f.displacement.Recovery(q)
		without.X, without.Y = append(without.X, q), append(without.Y, alone)
		if state, ok := r.after(q); ok {
			with.X, with.Y = append(with.X, q), append(with.Y, state.Recovery)
			gain := state.Recovery - alone
			if math.Abs(gain) < 1e-12 { // rounding of two equal recoveries
				gain = 0
			}
			added.X, added.Y = append(added.X, q), append(added.Y, gain)
		}
	}
	c := Chart{
		ID: "front.ride.recovery", Title: "Recovery with the " + r.name + " and without",
		X: axis("Water injected", "Q", units.PoreVolumes), Y: axis("Recovery, of the pore volume", "R", units.Share).from(0, 1),
		Lines: []Line{with, without, added}, Marks: []Mark{},
		Summary: "Recovery against pore volumes injected, with what rides along, without it, and the difference.",
	}
	if state, ok := r.after(r.flood.Arrival()); ok && r.flood.Arrival() <= end {
		c.Marks = append(c.Marks, Mark{r.name + " arrives", r.flood.Arrival(), state.Recovery})
	}
	if last := with.X[len(with.X)-1]; last < end {
		c.Summary += " The line ends after " + units.Format(last, 3) + " PV, where the slug is spent."
	}
	c.Y = c.Y.holding(c.Lines)
	return c
}

// rideEvents are the volumes at which a state with what rides along arrives or ends.
func (f *front) rideEvents() []float64 {
	r := f.rider
	list := []float64{r.flood.Arrival(), r.flood.Breakthrough()}
	if _, edge, ok := r.flood.Bank(); ok {
		list = append(list, 1/edge)
	}
	if r.slug == nil {
		return list
	}
	spent, _ := r.slug.Spent()
	list = append(list, r.size(), spent*(1-aside))
	if q, ok := r.slug.RearArrival(); ok {
		list = append(list, q)
	}
	return list
}

// responseChart is the tracer at the producer.
func (f *front) responseChart() Chart {
	r := f.rider
	t, size, arrival := r.tracer(), r.size(), r.flood.Arrival()
	end := math.Max(1.5, 1.5*arrival)
	if !math.IsInf(size, 1) {
		end += size
	}
	var injected []float64
	for i := range 2*historyPoints + 1 {
		injected = append(injected, end*float64(i)/(2*historyPoints))
	}
	starts := []float64{0}
	response := func(q float64) float64 { return t.Concentration(1, q) }
	if !math.IsInf(size, 1) {
		starts = append(starts, size)
		response = func(q float64) float64 { return t.Pulse(1, q, size) }
	}
	for _, start := range starts {
		injected = append(injected, start+arrival*(1-aside), start+arrival*(1+aside))
		for _, c := range []float64{0.001, 0.01, 0.05, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 0.95, 0.99, 0.999} {
			if q := start + t.Arrival(1, c); q < end {
				injected = append(injected, q)
			}
		}
	}
	slices.Sort(injected)
	injected = slices.Compact(injected)
	l := Line{ID: "response", Label: "tracer", Role: "total", Kind: "line", X: injected}
	for _, q := range injected {
		l.Y = append(l.Y, response(q))
	}
	return Chart{
		ID: "front.ride.response", Title: "Tracer at the producer",
		X: axis("Water injected", "Q", units.PoreVolumes), Y: axis("Concentration, of the injected one", "C", units.Share).from(0, 1),
		Lines: []Line{l}, Marks: []Mark{{"step without spreading", arrival, response(arrival)}},
		Summary: "Concentration in the water at the producer against pore volumes injected. Without spreading the tracer would step up after " + units.Format(arrival, 3) + " PV.",
	}
}

// slugChart is the way of both ends of a slug.
func (f *front) slugChart(end float64) Chart {
	r := f.rider
	v, _, _ := r.flood.Front()
	spent, place := r.slug.Spent()
	last, through := r.slug.RearArrival()
	if !through {
		last = spent * (1 - aside)
	}
	end = math.Max(end, math.Min(1.1*last, 3*end))
	last = math.Min(last, end)
	rear := Line{ID: "rear", Label: "rear", Role: "oil", Kind: "line", X: []float64{0}, Y: []float64{math.Min(r.size(), end)}}
	const points = 40
	for i := range points {
		q := r.size() + (last-r.size())*float64(i+1)/points
		if x, ok := r.slug.Rear(q); ok && q > r.size() {
			rear.X, rear.Y = append(rear.X, math.Min(1, math.Max(x, rear.X[len(rear.X)-1]))), append(rear.Y, q)
		}
	}
	c := Chart{
		ID: "front.ride.slug", Title: "Front and rear of the slug",
		X: axis("Distance from the injector, part of the length", "x/L", units.Number).from(0, 1), Y: axis("Water injected", "Q", units.PoreVolumes).from(0, end),
		Lines: []Line{ray("front", r.name, "total", "line", v, end)}, Marks: []Mark{},
		Summary: "Distance against pore volumes injected: the front of the slug, and its rear, which sets out when plain water follows.",
	}
	if len(rear.X) > 1 {
		c.Lines = append(c.Lines, rear)
	}
	if place < 1 && spent <= end {
		c.Marks = append(c.Marks, Mark{"spent", place, spent})
		c.Summary += " They meet at " + units.Format(place, 3) + " of the length: the slug is spent."
	}
	return c
}
