package relperm

import (
	"errors"
	"math"
	"strconv"
	"strings"
	"testing"
)

func TestTableMeetsItsRows(t *testing.T) {
	sw := []float64{0.11, 0.23, 0.37, 0.58, 0.79}
	krw := []float64{0, 0.013, 0.013, 0.17, 0.41}
	kro := []float64{0.93, 0.61, 0.19, 0.021, 0}
	for _, kind := range []Kind{MonotoneCubic, StraightLine} {
		table, err := NewTable(sw, krw, kro, kind)
		if err != nil {
			t.Fatal(err)
		}
		for i := range sw {
			if p := table.At(sw[i]); p.Krw != krw[i] || p.Kro != kro[i] {
				t.Errorf("kind %d, row %d: %+v", kind, i+1, p)
			}
		}
		if lo, hi := table.Ends(); lo != sw[0] || hi != sw[len(sw)-1] {
			t.Errorf("kind %d: ends %g, %g", kind, lo, hi)
		}
		if len(table.Knots()) != len(sw)-2 {
			t.Errorf("kind %d: knots %v", kind, table.Knots())
		}
	}
}

// TestStraightLineSlopes: a node has the slope of its right cell, the last of its left.
func TestStraightLineSlopes(t *testing.T) {
	table, err := NewTable([]float64{0, 0.25, 0.75}, []float64{0, 0.125, 0.625}, []float64{1, 0.5, 0}, StraightLine)
	if err != nil {
		t.Fatal(err)
	}
	for _, row := range []struct{ sw, krw, dkrw, kro, dkro float64 }{
		{0, 0, 0.5, 1, -2}, {0.125, 0.0625, 0.5, 0.75, -2}, {0.25, 0.125, 1, 0.5, -1}, {0.5, 0.375, 1, 0.25, -1}, {0.75, 0.625, 1, 0, -1}, {0.8, 0.625, 0, 0, 0},
	} {
		if p := table.At(row.sw); p != (Point{Krw: row.krw, DKrw: row.dkrw, Kro: row.kro, DKro: row.dkro}) {
			t.Errorf("at %g: %+v, want %+v", row.sw, p, row)
		}
	}
}

// TestTableCopiesItsRows: what the caller does with its slices later is no concern.
func TestTableCopiesItsRows(t *testing.T) {
	sw, krw, kro := []float64{0, 1}, []float64{0, 1}, []float64{1, 0}
	table, err := NewTable(sw, krw, kro, MonotoneCubic)
	if err != nil {
		t.Fatal(err)
	}
	before := table.At(0.3)
	sw[1], krw[1], kro[0] = 0.5, 0.2, 0.1
	if after := table.At(0.3); after != before {
		t.Errorf("%+v became %+v", before, after)
	}
}

func TestTableRefusals(t *testing.T) {
	ok := []float64{0.2, 0.5, 0.8}
	up, down := []float64{0, 0.1, 0.4}, []float64{0.9, 0.2, 0}
	for name, c := range map[string]struct {
		sw, krw, kro []float64
		row          int
		column       string
		says         string
	}{
		"empty":            {nil, nil, nil, 0, "sw", "two rows or more"},
		"one row":          {ok[:1], up[:1], down[:1], 0, "sw", "two rows or more"},
		"ragged":           {ok, up[:2], down, 0, "krw, kro", "2 and 3 values beside 3"},
		"percent":          {[]float64{20, 50, 80}, up, down, 1, "sw", "read 20; allowed: 0 to 1, as a fraction"},
		"negative":         {ok, []float64{0, -0.1, 0.4}, down, 2, "krw", "read -0.1"},
		"kr in percent":    {ok, up, []float64{90, 20, 0}, 1, "kro", "0 to 2"},
		"not a number":     {ok, up, []float64{0.9, math.NaN(), 0}, 2, "kro", "read not a number"},
		"infinite":         {ok, []float64{0, 0.1, math.Inf(1)}, down, 3, "krw", "read ∞"},
		"duplicate":        {[]float64{0.2, 0.2, 0.8}, up, down, 2, "sw", "more than 0.2"},
		"falling sw":       {[]float64{0.2, 0.8, 0.5}, up, down, 3, "sw", "more than 0.8"},
		"falling krw":      {ok, []float64{0, 0.4, 0.1}, down, 3, "krw", "not less than 0.4"},
		"rising kro":       {ok, up, []float64{0.2, 0.9, 0}, 2, "kro", "not more than 0.2"},
		"nothing can flow": {ok, []float64{0, 0, 0.4}, []float64{0.9, 0, 0}, 2, "krw, kro", "at least one phase"},
	} {
		_, err := NewTable(c.sw, c.krw, c.kro, MonotoneCubic)
		var refused *TableError
		if !errors.As(err, &refused) {
			t.Errorf("%s: accepted, or wrong error %v", name, err)
			continue
		}
		if refused.Row != c.row || refused.Column != c.column || !strings.Contains(err.Error(), c.says) {
			t.Errorf("%s: %v, want row %d, %s, %q", name, err, c.row, c.column, c.says)
		}
	}
}

// TestScaled: ko/k there and k/ko back give the curves one started from, and the
// ratio of the phases stays.
func TestScaled(t *testing.T) {
	relative := Corey{Swc: 0.2, Sor: 0.25, Krw0: 0.4, Kro0: 1, Nw: 3, No: 2}
	const k, ko = 100.0, 64.0
	absolute := Scaled{relative, ko / k}
	back := Scaled{absolute, k / ko}
	if got := absolute.At(0.2).Kro; got != 0.64 {
		t.Errorf("kro(swc) relative to k = %v, want ko/k = 0.64", got)
	}
	for _, sw := range []float64{0.3, 0.5, 0.7} {
		p, a, b := relative.At(sw), absolute.At(sw), back.At(sw)
		if math.Abs(b.Krw-p.Krw) > 1e-16 || math.Abs(b.DKro-p.DKro) > 1e-15 {
			t.Errorf("at %g: %+v became %+v", sw, p, b)
		}
		if math.Abs(a.Krw/a.Kro-p.Krw/p.Kro) > 1e-15*p.Krw/p.Kro {
			t.Errorf("at %g: the ratio of the phases changed", sw)
		}
	}
}

func BenchmarkAt(b *testing.B) {
	for _, m := range models(b) {
		b.Run(m.name, func(b *testing.B) {
			lo, hi := m.curves.Ends()
			b.ReportAllocs()
			sum, sw, step := 0.0, lo, (hi-lo)*0.6180339887
			for b.Loop() {
				if sw += step; sw > hi {
					sw -= hi - lo
				}
				sum += m.curves.At(sw).Krw
			}
			if math.IsNaN(sum) {
				b.Fatal("not a number")
			}
		})
	}
}

// BenchmarkTableRows shows how reading a table scales with its length.
func BenchmarkTableRows(b *testing.B) {
	for _, rows := range []int{10, 100, 1000, 10000} {
		b.Run(strconv.Itoa(rows), func(b *testing.B) {
			sw, krw, kro := make([]float64, rows), make([]float64, rows), make([]float64, rows)
			for i := range sw {
				s := float64(i) / float64(rows-1)
				sw[i], krw[i], kro[i] = s, s*s, (1-s)*(1-s)
			}
			table, err := NewTable(sw, krw, kro, MonotoneCubic)
			if err != nil {
				b.Fatal(err)
			}
			s := 0.0
			for b.Loop() {
				if s += 0.6180339887; s > 1 {
					s--
				}
				table.At(s)
			}
		})
	}
}

// TestAtAllocatesNothing: At is called millions of times.
func TestAtAllocatesNothing(t *testing.T) {
	for _, m := range models(t) {
		if n := testing.AllocsPerRun(100, func() { m.curves.At(0.4) }); n != 0 {
			t.Errorf("%s: %g allocations a call", m.name, n)
		}
	}
}
