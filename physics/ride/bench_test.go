package ride

import "testing"

func BenchmarkFlood(b *testing.B) {
	for _, c := range families(b) {
		b.Run(c.name, func(b *testing.B) {
			for b.Loop() {
				c.flood(b)
			}
		})
	}
}

func BenchmarkSlug(b *testing.B) {
	c := named(b, "polymer")
	f := c.flood(b)
	b.Run("new", func(b *testing.B) {
		for b.Loop() {
			slug(b, f, c, 0.04, 0.3)
		}
	})
	s := slug(b, f, c, 0.04, 0.3)
	q, _ := s.RearArrival()
	b.Run("profile of 100 places", func(b *testing.B) {
		for b.Loop() {
			for i := range 100 {
				s.At(float64(i)/100, 0.9*q)
			}
		}
	})
	b.Run("path", func(b *testing.B) {
		for b.Loop() {
			s.Path(0.9 * q)
		}
	})
	b.Run("outlet after the rear", func(b *testing.B) {
		for b.Loop() {
			s.After(1.4 * q)
		}
	})
}
