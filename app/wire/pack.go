package wire

import (
	"encoding/binary"
	"errors"
	"math"
	"slices"

	"brinefront/physics/study"
)

// Numbers are the series of a part's charts and tables: nine tenths of a reply.
// As digits between commas they would take longer to read than to compute; as
// bytes they are read at once and lose no bit. A series that is there twice, as the
// saturations below several curves, is sent once.
type Numbers struct {
	Place   []int  `json:"place"`   // of every series of the part, among the distinct ones; -1: it has none
	Lengths []int  `json:"lengths"` // of the distinct series
	Bytes   []byte `json:"bytes"`   // these end to end: IEEE 754 doubles, little-endian
}

const doubleSize = 8 // bytes

// Pack takes a part apart into numbers and the rest. The part itself is left alone.
func Pack(whole study.Part) (rest study.Part, numbers Numbers) {
	rest = own(whole)
	list := all(rest)
	numbers.Place = make([]int, len(list))
	distinct := make([][]float64, 0, len(list))
	size := 0
	for i, series := range list {
		place := -1
		if len(*series) > 0 {
			place = slices.IndexFunc(distinct, func(other []float64) bool { return sameBits(other, *series) })
			if place < 0 {
				place = len(distinct)
				distinct = append(distinct, *series)
				size += doubleSize * len(*series)
			}
		}
		numbers.Place[i], *series = place, nil
	}
	numbers.Lengths, numbers.Bytes = make([]int, len(distinct)), make([]byte, 0, size)
	for i, series := range distinct {
		numbers.Lengths[i] = len(series)
		for _, v := range series {
			numbers.Bytes = binary.LittleEndian.AppendUint64(numbers.Bytes, math.Float64bits(v))
		}
	}
	return rest, numbers
}

// sameBits reports whether two series are one: 0 and -0 are not.
func sameBits(a, b []float64) bool {
	return len(a) == len(b) && (&a[0] == &b[0] || slices.EqualFunc(a, b, func(x, y float64) bool { return math.Float64bits(x) == math.Float64bits(y) }))
}

// Unpack puts the numbers back where Pack took them from. A series that was empty
// comes back as nil. Errors: the numbers belong to another part.
func Unpack(rest study.Part, numbers Numbers) (study.Part, error) {
	whole := own(rest)
	left := numbers.Bytes
	distinct := make([][]float64, len(numbers.Lengths))
	for i, n := range numbers.Lengths {
		if n < 0 || len(left)/doubleSize < n {
			return rest, errForeign
		}
		distinct[i] = make([]float64, n)
		for j := range distinct[i] {
			distinct[i][j] = math.Float64frombits(binary.LittleEndian.Uint64(left[doubleSize*j:]))
		}
		left = left[doubleSize*n:]
	}
	series := all(whole)
	if len(left) > 0 || len(series) != len(numbers.Place) {
		return rest, errForeign
	}
	for i, place := range numbers.Place {
		switch {
		case place >= len(distinct):
			return rest, errForeign
		case place >= 0:
			*series[i] = distinct[place]
		}
	}
	return whole, nil
}

var errForeign = errors.New("the packed numbers do not fit the part they came with")

// own is a copy whose series can be exchanged.
func own(p study.Part) study.Part {
	p.Charts, p.Tables = slices.Clone(p.Charts), slices.Clone(p.Tables)
	for i := range p.Charts {
		p.Charts[i].Lines = slices.Clone(p.Charts[i].Lines)
		for j := range p.Charts[i].Lines {
			l := &p.Charts[i].Lines[j]
			l.Readings = slices.Clone(l.Readings)
		}
	}
	for i := range p.Tables {
		p.Tables[i].Columns = slices.Clone(p.Tables[i].Columns)
	}
	return p
}

// all lists the series of a part, always in the same order.
func all(p study.Part) []*[]float64 {
	var list []*[]float64
	for _, chart := range p.Charts {
		for i := range chart.Lines {
			l := &chart.Lines[i]
			list = append(list, &l.X, &l.Y, &l.Low)
			for j := range l.Readings {
				list = append(list, &l.Readings[j].Values)
			}
		}
	}
	for _, table := range p.Tables {
		for i := range table.Columns {
			list = append(list, &table.Columns[i].Values)
		}
	}
	return list
}
