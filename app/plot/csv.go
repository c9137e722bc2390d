package plot

import (
	"encoding/csv"
	"slices"
	"sort"
	"strconv"
	"strings"
)

// CSV is the picture's numbers for a spreadsheet (RFC 4180): one header row with
// units, the series side by side at full precision, a decimal point. Series that
// share their x share its column. A gap is an empty cell. A moving line stands where
// its slider stands at first, with every point that it has; its readings follow it.
func (p Picture) CSV() string {
	columns := p.columns()
	header := make([]string, len(columns))
	rows := 0
	for i, c := range columns {
		header[i] = c.heading
		rows = max(rows, len(c.cells))
	}
	var b strings.Builder
	w := csv.NewWriter(&b)
	w.UseCRLF = true
	write(w, header)
	for r := range rows {
		record := make([]string, len(columns))
		for i, c := range columns {
			if r < len(c.cells) {
				record[i] = c.cells[r]
			}
		}
		write(w, record)
	}
	w.Flush()
	return b.String()
}

// write cannot fail: the writer's target is memory.
func write(w *csv.Writer, record []string) {
	if err := w.Write(record); err != nil {
		panic("plot: " + err.Error())
	}
}

type column struct {
	heading string
	cells   []string
}

func (p Picture) columns() []column {
	var list []column
	var last [][2]float64 // whose x column stands furthest to the right
	for _, l := range p.Lines {
		data, place := l.Data, p.X.Title
		if l.Moving {
			data, place = l.at(pace(p.Slider.Root, p.Slider.Value)), p.X.Title+" at "+p.Slider.Short+" = "+withUnit(p.Slider.Value, p.Slider.Unit)
		}
		if len(list) == 0 || l.Moving || !sameX(last, data) {
			list = append(list, column{place, cells(data, 0)})
			last = data
		}
		if l.Low != nil {
			list = append(list, column{l.Label + ", lower edge: " + p.Y.Title, cells(l.Low, 1)})
			list = append(list, column{l.Label + ", upper edge: " + p.Y.Title, cells(data, 1)})
		} else {
			list = append(list, column{l.Label + ": " + p.Y.Title, cells(data, 1)})
		}
		for _, r := range l.Readings {
			list = append(list, column{l.Label + ": " + r.title(), r.cells()})
		}
	}
	if len(p.Marks) == 0 {
		return list
	}
	mark, x, y := column{heading: "Marked point"}, column{heading: p.X.Title}, column{heading: p.Y.Title}
	for _, m := range p.Marks {
		mark.cells = append(mark.cells, m.Label)
		x.cells = append(x.cells, full(m.X))
		y.cells = append(y.cells, full(m.Y))
	}
	return append(list, mark, x, y)
}

// at is a moving line's points at a pace of the slider.
func (l Line) at(value float64) [][2]float64 {
	stages := max(1, len(l.Stages))
	list := make([][2]float64, len(l.Data)/stages)
	if l.Stages == nil {
		for i, p := range l.Data {
			list[i] = [2]float64{p[0] * value, p[1]}
		}
		return list
	}
	k := max(0, min(stages-2, sort.SearchFloat64s(l.Stages, value)-1))
	u := max(0, min(1, (value-l.Stages[k])/(l.Stages[k+1]-l.Stages[k])))
	for i := range list {
		a, b := l.Data[k*len(list)+i], l.Data[(k+1)*len(list)+i]
		list[i] = [2]float64{a[0] + u*(b[0]-a[0]), a[1] + u*(b[1]-a[1])}
	}
	return list
}

func withUnit(v float64, unit string) string { return strings.TrimSpace(full(v) + " " + unit) }

func (r Reading) title() string {
	text := r.Label
	if r.Short != r.Label {
		text += ", " + r.Short
	}
	if r.Unit != "" {
		text += " (" + r.Unit + ")"
	}
	return text
}

func (r Reading) cells() []string {
	list := make([]string, len(r.Values))
	for i, v := range r.Values {
		list[i] = full(v)
		if r.Words != nil && r.Words[i] != "" {
			list[i] = r.Words[i]
		}
	}
	return list
}

func sameX(a, b [][2]float64) bool {
	return slices.EqualFunc(a, b, func(p, q [2]float64) bool { return full(p[0]) == full(q[0]) })
}

func cells(data [][2]float64, coordinate int) []string {
	list := make([]string, len(data))
	for i, p := range data {
		list[i] = full(p[coordinate])
	}
	return list
}

// full writes every digit that a number has, and nothing for none.
func full(v float64) string {
	if !finite(v) {
		return ""
	}
	return strconv.FormatFloat(v, 'g', -1, 64)
}
