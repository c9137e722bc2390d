package fracflow

import (
	"fmt"
	"math"
	"testing"

	"brinefront/physics/relperm"
)

// rows is an invented table of n rows that follows power curves.
func rows(n int, kind relperm.Kind) relperm.Table {
	sw, krw, kro := make([]float64, n), make([]float64, n), make([]float64, n)
	for i := range n {
		u := float64(i) / float64(n-1)
		sw[i], krw[i], kro[i] = 0.2+0.55*u, 0.4*math.Pow(u, 2.7), 0.9*math.Pow(1-u, 2.2)
	}
	table, err := relperm.NewTable(sw, krw, kro, kind)
	if err != nil {
		panic(err)
	}
	return table
}

func BenchmarkSolve(b *testing.B) {
	run := func(name string, curves relperm.Curves) {
		b.Run(name, func(b *testing.B) {
			flow := Flow{Curves: curves, MuW: 0.5e-3, MuO: 5e-3}
			lo, hi := flow.Ends()
			for b.Loop() {
				if _, err := Solve(flow, hi, lo); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
	run("Corey", relperm.Corey{Swc: 0.2, Sor: 0.25, Krw0: 0.4, Kro0: 0.9, Nw: 2.7, No: 2.2})
	run("LET", relperm.LET{Swc: 0.2, Sor: 0.25, Krw0: 0.4, Kro0: 0.9, Lw: 2.2, Ew: 3, Tw: 1.1, Lo: 2.5, Eo: 2, To: 1.2})
	for _, n := range []int{10, 100, 1000, 10000} {
		run(fmt.Sprintf("cubic-%d", n), rows(n, relperm.MonotoneCubic))
		run(fmt.Sprintf("straight-%d", n), rows(n, relperm.StraightLine))
	}
}
