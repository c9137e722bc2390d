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
				scheme := "upstream"
				if limiter != None {
					scheme = "limited"
				}
				b.Run(fmt.Sprintf("%s/%s/%d", kind.name, scheme, n), func(b *testing.B) {
					settings := Settings{Cells: n, Limiter: limiter, Injected: c.Inputs.Injected, Initial: c.Inputs.Initial}
					warm := settings
					warm.Cells = 100 // WebAssembly is compiled well only when it has run for a while
					newRun(b, kind.law, warm).Advance(2, nil)
					run, taken := newRun(b, kind.law, settings), 0
					for b.Loop() {
						if run.Q() > 2 {
							taken += run.Steps()
							run = newRun(b, kind.law, settings)
						}
						run.Advance(run.Q()+10/float64(n), nil) // about a hundred steps
					}
					b.ReportMetric(float64(taken+run.Steps())*float64(n)/b.Elapsed().Seconds()/1e6, "Mcell-steps/s")
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
