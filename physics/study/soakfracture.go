package study

import (
	"math"
	"slices"

	"brinefront/physics/imbibe"
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// blockSizes reads the distribution of sizes: nil where all blocks are alike.
func (s *sheet) blockSizes() []imbibe.Fraction {
	columns, problem := sizeTable.rows(s.st.Block.Sizes, "")
	if problem != nil {
		s.problems = append(s.problems, *problem)
		return nil
	}
	if columns == nil {
		return nil
	}
	total := 0.0
	for _, share := range columns[1] {
		total += share
	}
	base, _ := s.input("block." + firstSize(s.st.Block.Shape))
	var list []imbibe.Fraction
	for i, size := range columns[0] {
		list = append(list, imbibe.Fraction{Share: columns[1][i] / total, Size: size / base})
	}
	return list
}

// fractures tells of the rock as a whole: blocks of several sizes, and the flood along the
// fractures between them at the rate of the field.
func (b *soakingBlock) fractures(s *sheet) {
	var rock imbibe.Uptake = b
	inputs := b.inputs
	if sizes := s.blockSizes(); sizes != nil {
		mixed := imbibe.Mixed{Of: b, Fractions: sizes}
		rock, inputs = mixed, append([]string{"block.sizes"}, inputs...)
		b.sizes(s, mixed, inputs)
	}
	if s.st.Block.FracturePorosity == nil || len(s.problems) > 0 {
		return
	}
	if s.st.Field.Drive != "rate" {
		s.note(Note{ID: "soak.fractureRate", Level: "remark", Text: "The flood along fractures is not told.", Cause: "It needs a held rate; the field is driven by a pressure difference.", Do: "Hold a rate on Field.", Paths: []string{"field.drive"}})
		return
	}
	bulk := s.need("field.length") * s.need("field.width") * s.need("field.thickness")
	rate, own := s.need("field.rate"), s.need("block.fracturePorosity")
	if uptime, given := s.input("field.uptime"); given {
		rate *= uptime
	}
	if s.standing() != Ready {
		return
	}
	inputs = append([]string{"field.length", "field.width", "field.thickness", "field.rate", "block.fracturePorosity"}, inputs...)
	flood := imbibe.FractureFlood{Own: bulk * own / rate, Rock: bulk * b.porous * b.matrix.Capacity() / rate}
	constant := imbibe.TimeOf(rock, 1-math.Exp(-1))
	end := flood.Own + 1.5*flood.Rock + imbibe.TimeOf(rock, 0.8)
	stream, err := flood.Run(rock, end)
	if err != nil {
		s.note(Note{ID: "soak.fractureStopped", Level: "caution", Text: "The flood along fractures could not be computed: " + err.Error() + ".", Cause: "Its times are out of range.", Do: "Look at the rate and the fractures.", Paths: inputs})
		return
	}
	last := len(stream.Times) - 1
	at := func(list []float64, t float64) float64 { // straight between steps
		i := 0
		for i < last-1 && stream.Times[i+1] < t {
			i++
		}
		w := (t - stream.Times[i]) / (stream.Times[i+1] - stream.Times[i])
		return list[i] + w*(list[i+1]-list[i])
	}
	full := flood.Own + flood.Rock
	kept, pace := at(stream.Taken, full), flood.Rock/constant
	all := func(w *working) *working { return w.rests(inputs...) }
	sources := []ref.ID{ref.DeSwaan1978, ref.Kazemi1992}
	s.figure(Figure{ID: "soak.fractureFull", Label: "As much water injected as the rock can take, after", Symbol: "tR", Value: flood.Rock, Quantity: units.Duration},
		all(s.by("", "Volume of the block between the wells times porosity and what can soak in, over the calendar rate.")))
	s.figure(Figure{ID: "soak.fractureKept", Label: "Of that the rock has taken by then", Symbol: "K", Value: kept, Quantity: units.Share},
		all(s.by("", "Water advances along the fractures at the constant rate, and at each place rock takes it up as a block would from the moment water arrives, in proportion to the share of water there; summed by convolution. Told for that time and, on top, the one in which the fractures themselves fill.", sources...)))
	s.figure(Figure{ID: "soak.fractureArrival", Label: "Water through the fractures reaches the producer after", Symbol: "tf", Value: flood.Own, Quantity: units.Duration},
		all(s.by("", "Volume of the fractures over the rate.")))
	s.figure(Figure{ID: "soak.pace", Label: "Injection time over soaking time", Symbol: "Da", Value: pace, Quantity: units.Number},
		all(s.by("{Da} = {tR} / {t63}", "t63 is when blocks in touch with water hold 63 percent of what can soak in.").term("soak.fractureFull").value("t63", "time of 63 percent", constant, units.Duration)))
	s.figure(Figure{ID: "soak.outrunRate", Label: "Rate from which injection outruns soaking", Symbol: "q1", Value: rate * pace, Quantity: units.Rate},
		all(s.by("{q1} = {q} {Da}", "Where both times are alike; of an exponential exchange 1/e of the first water would then pass untouched.").value("q", "calendar rate", rate, units.Rate).term("soak.pace")))
	if i := slices.IndexFunc(stream.Cut, func(cut float64) bool { return cut >= 0.5 }); i > 0 {
		s.figure(Figure{ID: "soak.fractureCutHalf", Label: "Water cut of a half after", Symbol: "t(fw=½)", Value: stream.Times[i], Quantity: units.Duration}, all(s.by("", "At reservoir conditions.", sources...)))
	}
	s.answer(" Along fractures, once as much water has been injected as the rock can take, after {soak.fractureFull}, the rock has taken up {soak.fractureKept} of it.")
	if pace < 1 {
		s.note(Note{ID: "soak.outrun", Level: "caution", Text: "The rate outruns soaking: injection passes the rock in " + units.Format(pace, 2) + " of the time that its blocks take.",
			Cause: "Water leaves through the fractures before the blocks can take it up.", Do: "Lower the rate, or inject in spells: what is left still soaks in, only later.", Paths: []string{"field.rate"}})
	}
	s.note(Note{ID: "soak.fractureLimits", Level: "remark", Text: "Along fractures, water and oil move alike and rock sees water in proportion to its share.",
		Cause: "Gravity in the fractures, oil that blocks give back to water that has passed, and flow from block to block are left out.", Do: "Use it to see which rate the rock can follow, not as a forecast."})
	days := axis("Time", "t", units.Duration)
	s.part.Charts = append(s.part.Charts, Chart{ID: "soak.fracture", Title: "Flood along the fractures", X: days, Y: axis("Share", "fw, R", units.Share).from(0, 1), Marks: []Mark{{"rock could be full", full, kept}},
		Lines: []Line{
			{ID: "cut", Label: "water cut, reservoir", Role: "water", Kind: "line", X: stream.Times, Y: stream.Cut},
			{ID: "taken", Label: "of what can soak in, taken", Role: "oil", Kind: "line", X: stream.Times, Y: stream.Taken},
			drawn("touched", "if all rock touched water at once", "aid", "dashed", rock, 1, stream.Times),
		},
		Summary: "Water cut at the producer and the share of what the rock can take that it has taken, against time, beside what it would take if all of it touched water from the start."})
}

// sizes tells of blocks of several sizes.
func (b *soakingBlock) sizes(s *sheet, mixed imbibe.Mixed, inputs []string) {
	s.figure(Figure{ID: "soak.mixedHalf", Label: "Half of what can soak into blocks of all sizes, after", Symbol: "t½,m", Value: imbibe.TimeOf(mixed, 0.5), Quantity: units.Duration},
		s.by("", "Each size soaks as the block does, in time over the square of its size; shares of volume add up.", ref.MaMorrowZhang1997).rests(inputs...))
	times := b.times()
	first, end := times[0], times[len(times)-1]
	from, to := math.Inf(1), 0.0
	for _, f := range mixed.Fractions {
		from, to = math.Min(from, f.Size*f.Size), math.Max(to, f.Size*f.Size)
	}
	wide := make([]float64, len(times))
	for i := range wide {
		wide[i] = first * from * math.Pow(end*to/(first*from), float64(i)/float64(len(wide)-1))
	}
	s.part.Charts = append(s.part.Charts, Chart{ID: "soak.sizes", Title: "Blocks of all sizes", X: logTime, Y: axis("Share of what can soak in", "R", units.Share).from(0, 1), Marks: []Mark{},
		Lines:   []Line{drawn("all", "all sizes", "water", "line", mixed, 1, wide), drawn("one", "the block above", "aid", "dashed", b, 1, wide)},
		Summary: "What blocks of all sizes together take up against time, beside the one block: small blocks begin earlier, large ones end later."})
}
