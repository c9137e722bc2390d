package fit

import "testing"

func BenchmarkFit(b *testing.B) {
	for _, bench := range []struct {
		name string
		fit  func(Points, Options) (Fit, error)
		p    Points
	}{
		{"Corey 13 rows", Corey, dake(b)}, {"LET 13 rows", LET, dake(b)},
		{"Corey 10000 rows", Corey, noisy(table(trueCorey, 10_000), 0.03, 1)}, {"LET 10000 rows", LET, noisy(table(trueLET, 10_000), 0.03, 1)},
	} {
		b.Run(bench.name, func(b *testing.B) {
			for b.Loop() {
				if _, err := bench.fit(bench.p, Options{}); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
}
