package capillary

import (
	"errors"
	"math"
	"testing"
)

// TestTableRefuses names the row of what cannot be a capillary pressure curve.
func TestTableRefuses(t *testing.T) {
	for _, c := range []struct {
		sw, pc []float64
		row    int
		column string
	}{
		{[]float64{0.2}, []float64{1}, 0, "sw"},
		{[]float64{0.2, 0.3}, []float64{1}, 0, "pc"},
		{[]float64{0.2, 1.3}, []float64{1, 0}, 2, "sw"},
		{[]float64{math.NaN(), 0.3}, []float64{1, 0}, 1, "sw"},
		{[]float64{0.2, 0.2}, []float64{1, 0}, 2, "sw"},
		{[]float64{0.2, 0.3, 0.4}, []float64{1, 0, 0.5}, 3, "pc"},
		{[]float64{0.2, 0.3}, []float64{math.Inf(1), 0}, 1, "pc"},
		{[]float64{0.2, 0.3}, []float64{4, 4}, 0, "pc"},
	} {
		_, err := NewTable(c.sw, c.pc, MonotoneCubic)
		var refused *TableError
		if !errors.As(err, &refused) || refused.Row != c.row || refused.Column != c.column {
			t.Errorf("%v, %v: %v, want row %d of %s", c.sw, c.pc, err, c.row, c.column)
		}
	}
}

// TestTableMeetsRows: a table is its rows, to the last digit.
func TestTableMeetsRows(t *testing.T) {
	sw, pc := []float64{0.1, 0.17, 0.4, 0.61}, []float64{3.1e4, 900, 900, -7}
	for _, kind := range []Kind{MonotoneCubic, StraightLine} {
		c, err := NewTable(sw, pc, kind)
		if err != nil {
			t.Fatal(err)
		}
		for i := range sw {
			if got, _ := c.At(sw[i]); got != pc[i] {
				t.Errorf("at %g: %v, row says %v", sw[i], got, pc[i])
			}
		}
	}
}
