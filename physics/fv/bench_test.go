package fv

import (
	"fmt"
	"testing"
)

// Speed in cell-steps a second, and how it scales with N: the flood of case fv-01.
func BenchmarkRun(b *testing.B) {
	c := readReference(b)
	law := c.law(b)
	for _, kind := range []struct {
		name string
		law  *Law
	}{{"exact", law}, {"table", tabulated(b, law)}} {
		for _, limiter := range []Limiter{None, VanLeer} {
			for _, n := range []int{100, 1000, 10000} {
				b.Run(fmt.Sprintf("%s-%s-%d", kind.name, limiter, n), func(b *testing.B) {
					run := newRun(b, kind.law, Settings{Cells: n, Limiter: limiter, Injected: c.Inputs.Injected, Initial: c.Inputs.Initial})
					step, q := 0.1/float64(n), 0.0
					run.Advance(0.1, nil)
					start := run.Steps()
					for q = 0.1 + step; b.Loop(); q += step {
						if run.Advance(q, nil); q > 2 {
							b.StopTimer()
							taken := run.Steps() - start
							run = newRun(b, kind.law, Settings{Cells: n, Limiter: limiter, Injected: c.Inputs.Injected, Initial: c.Inputs.Initial})
							start, q = -taken, 0
							b.StartTimer()
						}
					}
					b.ReportMetric(float64(run.Steps()-start)*float64(n)/b.Elapsed().Seconds()/1e6, "Mcell-steps/s")
				})
			}
		}
	}
}

func BenchmarkNewLaw(b *testing.B) {
	c := readReference(b)
	for b.Loop() {
		tabulated(b, c.law(b))
	}
}
