package study

import (
	"math"
	"slices"
	"strings"

	"brinefront/physics/capillary"
	"brinefront/physics/imbibe"
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// soakingRock is the rock that soaks, as blocks need it.
type soakingRock struct {
	span   *imbibe.Span
	inputs []string // behind it
	memory *Memory
}

// soakingBlock is a block that soaks, and what is made of it.
type soakingBlock struct {
	soakingRock
	matrix *imbibe.Matrix
	*imbibe.Block
	slab    *imbibe.Block // of the same characteristic length
	inputs  []string      // of its shape, and all that it rests on
	porous  float64
	initial float64
}

// blocks tells of blocks of finite size: how they fill, what plugs say of them, which
// exchange function stands for them, and what they do beside fractures. Where no block is
// given nothing is told.
func (s *sheet) blocks(x soakingRock, f *front) *soakingBlock {
	known := len(s.part.Missing)
	b := s.soakBlock(x, f)
	if wanted := s.part.Missing[known:]; len(wanted) > 0 { // of what is said beside the sheet's own answer
		s.note(Note{ID: "soak.blockWaits", Level: "caution", Text: "Part of what blocks do is not told yet.", Cause: "Inputs that it rests on are not given.", Do: "Give them.", Paths: slices.Clone(wanted)})
		s.part.Missing = s.part.Missing[:known]
	}
	return b
}

func (s *sheet) soakBlock(x soakingRock, f *front) *soakingBlock {
	shape, inputs := s.shape("block.", s.st.Block.Shape)
	if shape == nil {
		return nil
	}
	m, err := matrixOf(x.memory, "block", x.span)
	b := &soakingBlock{soakingRock: x, matrix: m, inputs: append(inputs, x.inputs...), porous: x.span.Porosity, initial: x.span.Initial}
	if err == nil {
		b.Block, err = m.Soak(shape)
	}
	if err == nil {
		b.slab, err = m.Soak(imbibe.Slab(shape.CharacteristicLength(), 1))
	}
	if err != nil {
		s.note(Note{ID: "soak.blockStopped", Level: "caution", Text: "The block could not be computed: " + err.Error() + ".", Cause: "Capillary diffusion is too uneven for it.", Do: "Look at the ends of the curves.", Paths: inputs})
		return nil
	}
	b.figures(s)
	b.charts(s)
	b.notes(s)
	b.scaling(s)
	b.exchange(s)
	b.fractures(s)
	b.push(s, f)
	return b
}

// matrixOf makes the rock of a block ready, or remembers that it did: with it the blocks that were
// computed of it.
func matrixOf(memory *Memory, of string, span *imbibe.Span) (*imbibe.Matrix, error) {
	return recall(memory, "soak "+of, span.Rock, [2]float64{span.Initial, span.Inlet}, func() (*imbibe.Matrix, error) { return imbibe.NewMatrix(span) })
}

// shape reads a block or plug; nil where none is given.
func (s *sheet) shape(at, kind string) (imbibe.Shape, []string) {
	var inputs []string
	size := func(name string, otherwise float64) float64 {
		spec, _ := Find(at + name)
		if otherwise == 0 && spec.Get(s.st) == nil {
			s.miss(at + name)
		}
		v, given := s.input(at + name)
		if !given {
			return otherwise
		}
		inputs = append(inputs, at+name)
		return v
	}
	first := firstSize(kind)
	spec, ok := Find(at + first)
	if !ok || spec.Get(s.st) == nil {
		return nil, nil
	}
	var shape imbibe.Shape
	d := size(first, 0)
	switch name, faces, _ := strings.Cut(kind, "-"); name {
	case "sphere":
		shape = imbibe.Sphere(d)
	case "cylinder":
		l := size("length", d)
		ends := map[string]int{"all": 2, "ends": 2, "end": 1}[faces]
		shape = imbibe.Cylinder(d, l, faces == "all" || faces == "side", ends)
	case "slab":
		shape = imbibe.Slab(d, map[string]int{"1": 1, "2": 2}[faces])
	default:
		w, h := size("width", d), size("height", d)
		shape = imbibe.Box([3]float64{d, w, h}, boxFaces[faces])
	}
	for _, a := range shape {
		if !(a.Reach > 0) {
			return nil, nil // refused
		}
	}
	return shape, inputs
}

// flat reports whether the block soaks along one axis.
func (b *soakingBlock) flat() bool { return len(b.Shape) == 1 }

func (b *soakingBlock) figures(s *sheet) {
	all := func(w *working) *working { return w.rests(b.inputs...) }
	method := "Finite volumes with the Kirchhoff potential, implicit in time, on two grids, extrapolated."
	if !b.flat() {
		method = "Solved in " + map[int]string{2: "two", 3: "three"}[len(b.Shape)] + " dimensions by fractional steps on a coarse grid, whose error the product of single axes takes out (own; within half a percent of what can be soaked up)."
	}
	capacity := b.matrix.Capacity()
	for i := range s.part.Figures { // the strip has room for one of a block's, in place of one that stays as it is
		if f := &s.part.Figures[i]; f.ID == "soak.inlet" {
			f.Strip = false
		}
	}
	s.figure(Figure{ID: "soak.blockHalf", Label: "Half of what can soak into a block, after", Symbol: "t½", Value: b.TimeAt(0.5), Quantity: units.Duration, Strip: true}, all(s.by("", method, ref.Alexander1977, ref.McWhorterSunada1990)))
	s.figure(Figure{ID: "soak.blockMost", Label: "Nine tenths of it, after", Symbol: "t90", Value: b.TimeAt(0.9), Quantity: units.Duration}, all(s.by("", method, ref.Alexander1977, ref.McWhorterSunada1990)))
	s.figure(Figure{ID: "soak.capacity", Label: "What can soak in, of the pore volume", Symbol: "R∞", Value: capacity, Quantity: units.Share},
		s.by("{R∞} = {S0} - {Swi}", "S0 is where capillary pressure ends at the open face.").value("S0", "water saturation at the open face", b.span.Inlet, units.Fraction).value("Swi", "initial water saturation", b.initial, units.Fraction).rests(b.soakingRock.inputs...))
	s.figure(Figure{ID: "soak.capacityOfOil", Label: "What can soak in, of the oil in place", Symbol: "R∞,o", Value: capacity / (1 - b.initial), Quantity: units.Share},
		s.by("{R∞,o} = {R∞} / (1 - {Swi})", "").term("soak.capacity").value("Swi", "initial water saturation", b.initial, units.Fraction))
	s.figure(Figure{ID: "soak.characteristic", Label: "Characteristic length", Symbol: "Lc", Value: b.Shape.CharacteristicLength(), Quantity: units.Length},
		s.by("", "Lc = √(V / Σ(Ai/li)): V the volume, Ai the area of each open face, li its distance to where nothing flows.", ref.MaMorrowZhang1997).rests(b.inputs[:len(b.inputs)-len(b.soakingRock.inputs)]...))
	s.figure(Figure{ID: "soak.blockError", Label: "Estimated error of the share", Symbol: "δR", Value: b.Error, Quantity: units.Share},
		all(s.by("", "One axis: of the finer grid before extrapolation. Several: the largest found against explicit solutions of nine blocks.")))
	if !b.flat() {
		worst := imbibe.Compare(b.slab, b.Block, b.Spaced(40))
		s.figure(Figure{ID: "soak.lengthError", Label: "Characteristic length alone is off by up to", Symbol: "δLc", Value: math.Abs(worst.Worst), Quantity: units.Share},
			all(s.by("", "The curve of a slab as thick as the characteristic length against the block itself, in shares of what can be soaked up.", ref.MaMorrowZhang1997)))
	}
	s.answer(" A block can take up {soak.capacity} of its pore volume: half of that in {soak.blockHalf}, nine tenths in {soak.blockMost}.")
}

// times are where curves against time are drawn.
func (b *soakingBlock) times() []float64 { return b.Spaced(70) }

// drawn is an uptake, times a factor, as a line.
func drawn(id, label, role, kind string, u imbibe.Uptake, factor float64, times []float64) Line {
	l := Line{ID: id, Label: label, Role: role, Kind: kind, X: times}
	for _, t := range times {
		share, _ := u.At(t)
		l.Y = append(l.Y, factor*share)
	}
	return l
}

// logTime is the axis of charts in which the beginning and the end of soaking count alike.
var logTime = Axis{Label: "Time", Symbol: "t", Quantity: units.Duration, Log: true, CanLog: true}

func (b *soakingBlock) charts(s *sheet) {
	capacity, times := b.matrix.Capacity(), b.times()
	c := Chart{ID: "soak.block", Title: "What a block takes up", X: logTime, Y: axis("Recovery", "R", units.Share).from(0, 1),
		Lines: []Line{
			drawn("most", "of what can soak in", "water", "line", b, 1, times),
			drawn("place", "of the oil in place", "total", "line", b, capacity/(1-b.initial), times),
			drawn("pore", "of the pore volume", "oil", "line", b, capacity, times),
		},
		Marks:   []Mark{{"half", b.TimeAt(0.5), 0.5}},
		Summary: "Recovery of one block by soaking against time on a logarithmic axis, in three senses: it rises with the square root of time, turns as the water reaches the middle, and ends in a slow tail."}
	if !b.flat() {
		c.Lines = append(c.Lines, drawn("slab", "by characteristic length alone", "aid", "dashed", b.slab, 1, times))
	}
	s.part.Charts = append(s.part.Charts, c)
	if len(b.Profiles) == 0 {
		return
	}
	p := Chart{ID: "soak.blockProfiles", Title: "Water in the block", X: axis("Distance from the open face", "x", units.Length), Y: axis("Water saturation", "Sw", units.Fraction).from(0, 1), Marks: []Mark{},
		Summary: "Water saturation from the open face to where nothing flows, at five shares of what can soak in."}
	for i, profile := range b.Profiles {
		id := "time" + units.Exact(float64(i+1))
		p.Lines = append(p.Lines, Line{ID: id, Label: units.Format(100*profile.Share, 2) + " % in", Role: id, Kind: "line", X: profile.Distance, Y: profile.Sw})
	}
	s.part.Charts = append(s.part.Charts, p)
}

func (b *soakingBlock) notes(s *sheet) {
	s.note(Note{ID: "soak.blockLimits", Level: "remark", Text: "Blocks soak by capillary pressure alone, water and oil passing each other through the open faces.",
		Cause: "Gravity, flow past the block and contact between blocks are left out.", Do: "Tall blocks of permeable rock drain by gravity too: take this as the slower bound there."})
	if !b.Finished {
		s.note(Note{ID: "soak.blockTail", Level: "remark", Text: "The last of the block takes more than a thousand times as long as its first half: the tail is carried on as an exponential.",
			Cause: "Capillary diffusion vanishes as the rock fills.", Do: "Do not count on the last part in the life of a field."})
	}
}

// condition is what scaling laws know of the block.
func (b *soakingBlock) condition(rock imbibe.Rock, tension float64, shape imbibe.Shape) imbibe.Conditions {
	return imbibe.Conditions{Permeability: rock.Permeability, Porosity: rock.Porosity, Tension: tension,
		WaterViscosity: rock.WaterViscosity, OilViscosity: rock.OilViscosity, Length: shape.CharacteristicLength()}
}

// scaling carries a plug to the block by each law, and tells how far each is off.
func (b *soakingBlock) scaling(s *sheet) {
	shape, inputs := s.shape("block.plug.", s.st.Block.Plug.Shape)
	if shape == nil {
		return
	}
	or := func(name string, otherwise float64) float64 {
		v, given := s.input("block.plug." + name)
		if !given {
			return otherwise
		}
		inputs = append(inputs, "block.plug."+name)
		return v
	}
	rock := b.span.Rock
	plug := imbibe.Rock{Permeability: or("permeability", rock.Permeability), Porosity: or("porosity", rock.Porosity), Kr: rock.Kr, Pc: rock.Pc,
		WaterViscosity: or("waterViscosity", rock.WaterViscosity), OilViscosity: or("oilViscosity", rock.OilViscosity)}
	tension, given := s.input("fluids.tension")
	if !given {
		tension = 1 // it cancels where both are the same
		if s.st.Block.Plug.Tension != nil {
			s.miss("fluids.tension")
			return
		}
	}
	plugTension := or("tension", tension)
	if len(s.problems) > 0 {
		return
	}
	// The same J-function and contact angle: Leverett (1941).
	if factor := plugTension / tension * math.Sqrt(plug.Porosity/plug.Permeability*rock.Permeability/rock.Porosity); factor != 1 {
		plug.Pc = capillary.Scaled{Curve: rock.Pc, Factor: factor}
	}
	span, err := imbibe.NewSpan(plug, b.span.Initial, b.span.Inlet)
	var m *imbibe.Matrix
	if err == nil {
		m, err = matrixOf(b.memory, "plug", span)
	}
	var soaked *imbibe.Block
	if err == nil {
		soaked, err = m.Soak(shape)
	}
	if err != nil {
		s.note(Note{ID: "soak.plugStopped", Level: "caution", Text: "The plug could not be computed: " + err.Error() + ".", Cause: "Its conditions leave no soaking.", Do: "Look at them.", Paths: inputs})
		return
	}
	here, there := b.condition(plug, plugTension, shape), b.condition(rock, tension, b.Shape)
	laws := []struct {
		name  string
		ratio float64
	}{
		{"Mattax & Kyte (1962): µw", here.MattaxKyte() / there.MattaxKyte()},
		{"Ma, Morrow & Zhang (1997): √(µw µo)", here.Ma() / there.Ma()},
		{"Schmid & Geiger (2012): the solution", imbibe.SolutionBased(soaked.Uptake(plug.Porosity, m), plug.Porosity, here.Length) / imbibe.SolutionBased(b.Uptake(rock.Porosity, b.matrix), rock.Porosity, there.Length)},
	}
	measured := or("half", soaked.TimeAt(0.5))
	grid := Grid{ID: "soak.scaling", Title: "From the plug to the block", Columns: []Column{
		{Label: "Law", Quantity: units.Number}, {Label: "Block time over plug time", Symbol: "", Quantity: units.Number},
		{Label: "Half of a block, after", Symbol: "t½", Quantity: units.Duration}, {Label: "Share of a block off by up to", Symbol: "", Quantity: units.Share},
	}}
	worst := 0.0
	row := func(name string, ratio, half, off float64) {
		grid.Columns[0].Words = append(grid.Columns[0].Words, name)
		for i, v := range []float64{ratio, half, off} {
			grid.Columns[i+1].Values = append(grid.Columns[i+1].Values, v)
		}
	}
	for _, law := range laws {
		off := imbibe.Compare(imbibe.Stretched{Of: soaked, Factor: law.ratio}, b, b.Spaced(40))
		worst = math.Max(worst, math.Abs(off.Worst))
		row(law.name, law.ratio, measured*law.ratio, math.Abs(off.Worst))
	}
	exact := b.TimeAt(0.5) / soaked.TimeAt(0.5)
	row("computed for both", exact, measured*exact, 0)
	s.part.Tables = append(s.part.Tables, grid)
	all := append(inputs, b.inputs...)
	s.figure(Figure{ID: "soak.plugHalf", Label: "Half of the plug, as its curves say, after", Symbol: "t½,p", Value: soaked.TimeAt(0.5), Quantity: units.Duration},
		s.by("", "The plug as a block of its own, with the reservoir's J-function, contact angle and saturations.", ref.Leverett1941).rests(all...))
	s.figure(Figure{ID: "soak.scalingError", Label: "Scaling by one number is off by up to", Symbol: "δs", Value: worst, Quantity: units.Share},
		s.by("", "The largest difference, in shares of what can soak in, between the block itself and the plug carried to it by the worst of three laws.", ref.MattaxKyte1962, ref.MaMorrowZhang1997, ref.SchmidGeiger2012).rests(all...))
	times := b.times()
	c := Chart{ID: "soak.scaled", Title: "The plug carried to the block", X: logTime, Y: axis("Share of what can soak in", "R", units.Share).from(0, 1), Marks: []Mark{},
		Lines:   []Line{drawn("block", "the block, computed", "water", "line", b, 1, times)},
		Summary: "What the block takes up against time, beside the plug's curve with its time stretched by each scaling law: where shapes and viscosity ratios are alike they fall together."}
	for i, law := range laws {
		name, _, _ := strings.Cut(law.name, " (")
		c.Lines = append(c.Lines, drawn("law"+units.Exact(float64(i+1)), name, "time"+units.Exact(float64(i+1)), "dashed", imbibe.Stretched{Of: soaked, Factor: law.ratio}, 1, times))
	}
	s.part.Charts = append(s.part.Charts, c)
	s.note(Note{ID: "soak.scalingAssumes", Level: "remark", Text: "Scaling takes plug and block to have the same curves, J-function, contact angle and initial water.",
		Cause: "Mattax & Kyte also take the viscosity ratio and the shape to be the same, Ma et al. the geometric mean of viscosities to stand for both, Schmid & Geiger only that the curve from the turn on is alike.",
		Do:    "Use the computed row where a law is off; wettability that was not restored in the plug is outside all of them."})
	if s.st.Block.Plug.Half != nil {
		if ratio := measured / soaked.TimeAt(0.5); ratio > 2 || ratio < 0.5 {
			s.note(Note{ID: "soak.plugDisagrees", Level: "caution", Text: "The plug took " + units.Format(ratio, 2) + " times as long as its curves say.", Cause: "Curves, tension or wettability are not those of the test.", Do: "Trust the measured time more: the table carries it to the block.", Paths: []string{"block.plug.half", "rock.curve"}})
		}
	}
}
