package study

import (
	"math"

	"brinefront/physics/imbibe"
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// exchange fits exchange functions to the block and tells which shape factor they stand
// for.
func (b *soakingBlock) exchange(s *sheet) {
	fitting := b.Spaced(40)
	one, two := b.FitExponential(fitting), b.FitRootExponential(fitting)
	first, second := imbibe.Compare(one, b, fitting), imbibe.Compare(two, b, fitting)
	all := func(w *working) *working { return w.rests(b.inputs...) }
	s.figure(Figure{ID: "soak.exchangeTime", Label: "Time constant of the exponential", Symbol: "τ", Value: 1 / one.Rate, Quantity: units.Duration},
		all(s.by("", "R = 1 − exp(−t/τ), nearest to the block in least squares at times even in their logarithm, from 1 to 98 percent.", ref.Aronofsky1958)))
	s.figure(Figure{ID: "soak.exchangeError", Label: "The exponential is off by up to", Symbol: "δe", Value: math.Abs(first.Worst), Quantity: units.Share},
		all(s.by("", "The largest difference to the block, in shares of what can soak in; it comes after "+units.Format(first.At/b.TimeAt(0.5), 2)+" times the time of half.", ref.Aronofsky1958)))
	s.figure(Figure{ID: "soak.rootError", Label: "Root of time, then exponential: off by up to", Symbol: "δr", Value: math.Abs(second.Worst), Quantity: units.Share},
		all(s.by("", "R = c √t up to t1, then an exponential; c is the block's own start, t1 and the rate are fitted (own).")))
	s.figure(Figure{ID: "soak.rootTurn", Label: "Its turn, after", Symbol: "t1", Value: two.Turn, Quantity: units.Duration}, all(s.by("", "Fitted with the rate of the exponential.")))
	s.figure(Figure{ID: "soak.rootTime", Label: "Its time constant", Symbol: "τ2", Value: 1 / two.Rate, Quantity: units.Duration}, all(s.by("", "Fitted with the turn.")))

	// Factors are told as for the cube of the same characteristic length, Lc² = L²/12, which
	// puts Kazemi's at 12 whatever the shape.
	cube := 12 * math.Pow(b.Shape.CharacteristicLength(), 2)
	d := b.Equivalent(b.porous)
	fitted := cube * b.ShapeFactor(one.Rate, b.porous)
	s.figure(Figure{ID: "soak.shapeFactor", Label: "Shape factor it stands for, over 1/L² of a cube", Symbol: "F", Value: fitted, Quantity: units.Number},
		all(s.by("", "Rate times porosity over the constant diffusion that starts the block the same, times L² of the cube of the same characteristic length: there Kazemi is 12.", ref.Kazemi1976)))
	grid := Grid{ID: "soak.factors", Title: "Shape factors as exchange functions of this block", Columns: []Column{
		{Label: "Factor", Quantity: units.Number}, {Label: "F L², as of a cube", Symbol: "F", Quantity: units.Number}, {Label: "Time constant", Symbol: "τ", Quantity: units.Duration}, {Label: "Share off by up to", Quantity: units.Share},
	}}
	nearest, distance := "", math.Inf(1)
	row := func(name string, factor float64) {
		e := imbibe.Exponential{Rate: factor * d / b.porous / cube}
		grid.Columns[0].Words = append(grid.Columns[0].Words, name)
		for i, v := range []float64{factor, 1 / e.Rate, math.Abs(imbibe.Compare(e, b, fitting).Worst)} {
			grid.Columns[i+1].Values = append(grid.Columns[i+1].Values, v)
		}
		if gap := math.Abs(math.Log(factor / fitted)); name != "fitted here" && gap < distance {
			nearest, distance = name, gap
		}
	}
	row("fitted here", fitted)
	row("Kazemi (1976)", cube*b.Shape.Kazemi())
	row("Lim & Aziz (1995)", cube*b.Shape.LimAziz())
	if factor, ok := b.Shape.WarrenRoot(); ok {
		row("Warren & Root (1963)", cube*factor)
	}
	s.part.Tables = append(s.part.Tables, grid)
	s.note(Note{ID: "soak.factors", Level: "remark", Text: "The exponential of this block stands nearest to the shape factor of " + nearest + ".",
		Cause: "One cube has three factors, 12, 29.6 and 60 over L², for one diffusivity: Kazemi takes a straight gradient from face to middle, Lim & Aziz the slowest mode of diffusion, exact late, Warren & Root a flow that has become steady with a source everywhere in the block. Soaking starts faster than any of them and, where diffusion vanishes, ends slower.",
		Do:    "Give a simulator the fitted rate, or the two-part function where the early time counts."})

	times := b.times()
	c := Chart{ID: "soak.exchange", Title: "Exchange functions", X: logTime, Y: axis("Share of what can soak in", "R", units.Share).from(0, 1), Marks: []Mark{},
		Lines: []Line{
			drawn("block", "the block, computed", "water", "line", b, 1, times),
			drawn("exponential", "exponential", "oil", "dashed", one, 1, times),
			drawn("root", "root of time, then exponential", "total", "dashed", two, 1, times),
		},
		Summary: "What the block takes up against time, with the exponential nearest to it, which is too slow at first and too fast at last, and with a function that begins with the square root of time."}
	e := Chart{ID: "soak.exchangeErrors", Title: "What they are off by", X: logTime, Y: axis("Difference in share", "ΔR", units.Share), Marks: []Mark{},
		Summary: "Difference between each exchange function and the block against time."}
	for _, l := range c.Lines[1:] {
		off := Line{ID: l.ID, Label: l.Label, Role: l.Role, Kind: "line", X: times}
		for i, y := range l.Y {
			off.Y = append(off.Y, y-c.Lines[0].Y[i])
		}
		e.Lines = append(e.Lines, off)
	}
	s.part.Charts = append(s.part.Charts, c, e)
}
