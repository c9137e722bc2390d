package plot

import (
	"encoding/json"
	"strconv"
)

// pictureDigits is how many significant digits reach the drawing: a screen is a
// few thousand dots wide, so seven are already finer than can be seen or zoomed.
const pictureDigits = 7

// JSON is the picture as the drawing script reads it. Numbers are rounded to
// pictureDigits; a pair that is not finite is written null, which draws a gap.
// It is written by hand because it is written at every keystroke and nearly all
// of it is numbers: a third faster in the browser than the standard encoder, and
// far less text to hand over and to parse.
func (p Picture) JSON() string {
	b := make([]byte, 0, 1024+p.points()*24)
	b = field(b, '{', "id", p.ID)
	b = field(b, ',', "title", p.Title)
	b = field(b, ',', "summary", p.Summary)
	b = p.X.append(append(b, `,"x":`...))
	b = p.Y.append(append(b, `,"y":`...))
	b = append(b, `,"lines":[`...)
	for i, l := range p.Lines {
		b = l.append(comma(b, i))
	}
	b = append(b, `],"marks":[`...)
	for i, m := range p.Marks {
		b = field(comma(b, i), '{', "label", m.Label)
		b = number(append(b, `,"x":`...), m.X)
		b = number(append(b, `,"y":`...), m.Y)
		b = append(b, '}')
	}
	b = append(b, ']')
	if p.Map {
		b = append(b, `,"map":true`...)
	}
	if p.Slider != nil {
		b = p.Slider.append(append(b, `,"slider":`...))
	}
	return string(append(b, '}'))
}

func (p Picture) points() int {
	n := 0
	for _, l := range p.Lines {
		n += len(l.Data)*(1+len(l.Readings)) + len(l.Low)
	}
	return n
}

func (a Axis) append(b []byte) []byte {
	b = field(b, '{', "title", a.Title)
	b = field(b, ',', "short", a.Short)
	b = field(b, ',', "unit", a.Unit)
	b = strconv.AppendBool(append(b, `,"log":`...), a.Log)
	b = strconv.AppendBool(append(b, `,"canLog":`...), a.CanLog)
	if a.Min != nil {
		b = number(append(b, `,"min":`...), *a.Min)
	}
	if a.Max != nil {
		b = number(append(b, `,"max":`...), *a.Max)
	}
	return append(b, '}')
}

func (l Line) append(b []byte) []byte {
	b = field(b, '{', "id", l.ID)
	b = field(b, ',', "label", l.Label)
	b = field(b, ',', "role", l.Role)
	b = field(b, ',', "kind", l.Kind)
	b = appendPairs(append(b, `,"data":`...), l.Data)
	if l.Low != nil {
		b = appendPairs(append(b, `,"low":`...), l.Low)
	}
	if l.Moving {
		b = append(b, `,"moving":true`...)
	}
	if l.Stages != nil {
		b = numbers(append(b, `,"stages":`...), l.Stages)
	}
	if len(l.Readings) > 0 {
		b = append(b, `,"readings":[`...)
		for i, r := range l.Readings {
			b = r.append(comma(b, i))
		}
		b = append(b, ']')
	}
	return append(b, '}')
}

func (r Reading) append(b []byte) []byte {
	b = field(b, '{', "label", r.Label)
	b = field(b, ',', "short", r.Short)
	b = field(b, ',', "unit", r.Unit)
	b = numbers(append(b, `,"values":`...), r.Values)
	if len(r.Words) > 0 {
		b = append(b, `,"words":[`...)
		for i, word := range r.Words {
			b = text(comma(b, i), word)
		}
		b = append(b, ']')
	}
	return append(b, '}')
}

func (s *Slider) append(b []byte) []byte {
	b = field(b, '{', "label", s.Label)
	b = field(b, ',', "short", s.Short)
	b = field(b, ',', "unit", s.Unit)
	b = number(append(b, `,"min":`...), s.Min)
	b = number(append(b, `,"max":`...), s.Max)
	b = number(append(b, `,"value":`...), s.Value)
	b = append(b, `,"stops":[`...)
	for i, stop := range s.Stops {
		b = field(comma(b, i), '{', "label", stop.Label)
		b = number(append(b, `,"at":`...), stop.At)
		b = append(b, '}')
	}
	b = append(b, ']')
	if s.Root {
		b = append(b, `,"root":true`...)
	}
	return append(b, '}')
}

func numbers(b []byte, values []float64) []byte {
	b = append(b, '[')
	for i, v := range values {
		b = number(comma(b, i), v)
	}
	return append(b, ']')
}

func appendPairs(b []byte, data [][2]float64) []byte {
	b = append(b, '[')
	for i, p := range data {
		b = comma(b, i)
		if !point(p).finite() {
			b = append(b, "null"...)
			continue
		}
		b = number(append(b, '['), p[0])
		b = number(append(b, ','), p[1])
		b = append(b, ']')
	}
	return append(b, ']')
}

func comma(b []byte, i int) []byte {
	if i > 0 {
		return append(b, ',')
	}
	return b
}

// field writes a text under a name after the given mark.
func field(b []byte, before byte, name, value string) []byte {
	return text(append(append(append(b, before, '"'), name...), `":`...), value)
}

func text(b []byte, value string) []byte {
	quoted, err := json.Marshal(value)
	if err != nil {
		panic("plot: " + err.Error()) // a string always marshals
	}
	return append(b, quoted...)
}

func number(b []byte, v float64) []byte {
	if !finite(v) {
		return append(b, "null"...)
	}
	return strconv.AppendFloat(b, v, 'g', pictureDigits, 64)
}
