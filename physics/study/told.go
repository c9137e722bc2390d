package study

import (
	"slices"

	"brinefront/physics/fluid"
)

// tell is the part of a sheet in the words of the study's pair, with what is to be said
// of the pair itself, and the cases by their names. Nothing of the part given is
// changed: it may be shared with other results.
func (e *Evaluation) tell(sheet Sheet, part Part) Part {
	pair := pairOf(e.st)
	if w := wordsOf(pair); w != nil {
		part = w.part(part)
	}
	switch {
	case sheet == SheetFront && part.Status == Ready:
		part.Notes = append(slices.Clone(part.Notes), pairNotes(pair)...)
	case sheet == SheetCompare:
		part = caseNames(e.st.Cases).part(part)
	}
	return part
}

// pairNotes are the cautions of a pair, written in its own words.
func pairNotes(pair fluid.Pair) []Note {
	var list []Note
	usual := pair.ID == fluid.BrineOil // what holds of every waterflood is no reason for alarm
	for _, c := range pair.Cautions {
		list = append(list, Note{ID: "front.pair." + c.ID, Level: level(!usual), Text: c.Text, Cause: c.Cause, Do: c.Do, Paths: []string{"fluids.pair"}})
	}
	if holdsConnate(pair) {
		list = append(list, Note{ID: "front.pair.inPlace", Level: "remark", Text: "Nothing is told as a part of the oil in place.",
			Cause: "The liquid saturation counts connate water, and how much of it there is, is not asked for.", Do: "Divide a recovery of the pore volume by the oil saturation at the start.", Paths: []string{"fluids.pair"}})
	}
	if d, r := pair.Displacing, pair.Resident; pair.Drainage() {
		list = append(list, Note{ID: "front.pair.roles", Level: "remark", Text: "Curves and points are read by the saturation of the displacing phase, " + d.Saturation + ": first column " + d.Saturation + ", then " + d.Kr() + ", then " + r.Kr() + ".",
			Cause: "A laboratory table by the saturation of the other phase means something else.", Do: "Paste it with its headings, by which it is turned over; typed, " + d.Saturation + " is 1 less the other saturation, and the two columns of kr change places.", Paths: []string{"fluids.pair", "rock.table"}})
	}
	return list
}

// each is a new list of every element changed.
func each[T any](list []T, change func(T) T) []T {
	out := make([]T, len(list))
	for i, element := range list {
		out[i] = change(element)
	}
	return out
}

func (w *words) part(p Part) Part {
	if p.Problems != nil {
		p.Problems = each(p.Problems, func(q Problem) Problem { q.Read, q.Allowed = w.tell(q.Read), w.tell(q.Allowed); return q })
	}
	p.Answer = each(p.Answer, func(a Phrase) Phrase { a.Text = w.tell(a.Text); return a })
	p.Figures = each(p.Figures, w.figure)
	p.Charts = each(p.Charts, w.chart)
	p.Tables = each(p.Tables, func(g Grid) Grid {
		g.Title, g.Columns = w.tell(g.Title), each(g.Columns, w.column)
		return g
	})
	p.Notes = each(p.Notes, func(n Note) Note {
		n.Text, n.Cause, n.Do = w.tell(n.Text), w.tell(n.Cause), w.tell(n.Do)
		return n
	})
	return p
}

func (w *words) figure(f Figure) Figure {
	f.Quantity = w.quantity(f.Symbol, f.Quantity)
	f.Label, f.Symbol = w.tell(f.Label), w.symbol(f.Symbol)
	f.Working.Formula, f.Working.Method = w.tell(f.Working.Formula), w.tell(f.Working.Method)
	f.Working.Terms = each(f.Working.Terms, func(t Term) Term {
		t.Quantity = w.quantity(t.Symbol, t.Quantity)
		t.Symbol, t.Label = w.symbol(t.Symbol), w.tell(t.Label)
		return t
	})
	return f
}

func (w *words) chart(c Chart) Chart {
	c.Title, c.Summary = w.tell(c.Title), w.tell(c.Summary)
	c.X, c.Y = w.axis(c.X), w.axis(c.Y)
	c.Marks = each(c.Marks, func(m Mark) Mark { m.Label = w.tell(m.Label); return m })
	c.Lines = each(c.Lines, func(l Line) Line {
		l.Label = w.tell(l.Label)
		if l.Readings != nil {
			l.Readings = each(l.Readings, w.column)
		}
		return l
	})
	if c.Slider != nil {
		slider := *c.Slider
		slider.Label = w.tell(slider.Label)
		slider.Marks = each(slider.Marks, func(m Mark) Mark { m.Label = w.tell(m.Label); return m })
		c.Slider = &slider
	}
	return c
}

func (w *words) axis(a Axis) Axis {
	a.Quantity = w.quantity(a.Symbol, a.Quantity)
	a.Label, a.Symbol = w.tell(a.Label), w.symbol(a.Symbol)
	return a
}

func (w *words) column(c Column) Column {
	c.Quantity = w.quantity(c.Symbol, c.Quantity)
	c.Label, c.Symbol = w.tell(c.Label), w.symbol(c.Symbol)
	if c.Words != nil {
		c.Words = each(c.Words, w.tell)
	}
	return c
}

// symbol tells a symbol that stands alone.
func (w *words) symbol(text string) string {
	if told, ok := w.alone[text]; ok {
		return told
	}
	return w.tell(text)
}
