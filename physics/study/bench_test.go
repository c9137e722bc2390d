package study

import (
	"fmt"
	"math"
	"testing"
)

func BenchmarkRunDemo(b *testing.B) {
	st := Demo()
	for b.Loop() {
		Run(st)
	}
}

// BenchmarkRunTable shows how one evaluation grows with the rows of the table.
func BenchmarkRunTable(b *testing.B) {
	for _, curve := range []string{"table", "table-linear", "corey-fit", "let-fit"} {
		for _, rows := range []int{10, 100, 1000, 10000} {
			b.Run(fmt.Sprintf("%s/%d", curve, rows), func(b *testing.B) {
				st := Demo()
				st.Rock.Curve, st.Rock.Table = curve, tableOf(rows)
				for b.Loop() {
					Run(st)
				}
			})
		}
	}
}

// tableOf is a smooth table of many rows.
func tableOf(rows int) *Table {
	t := &Table{}
	for i := range rows {
		s := float64(i) / float64(rows-1)
		t.Sw = append(t.Sw, 0.227+0.489*s)
		t.Krw = append(t.Krw, 0.3*math.Pow(s, 3.2))
		t.Kro = append(t.Kro, math.Pow(1-s, 2.3))
	}
	return t
}

func BenchmarkRead(b *testing.B) {
	text := Write(Demo())
	for b.Loop() {
		if _, err := Read(text); err != nil {
			b.Fatal(err)
		}
	}
}
