package serve

import (
	"fmt"
	"testing"

	"brinefront/app/wire"
	"brinefront/physics/study"
)

// serveBench times a request whole, as the worker meets it from the interface: read,
// computed, written.
func serveBench(b *testing.B, st study.Study) {
	b.Helper()
	for sheet, part := range study.Run(st).Parts {
		if part.Status != study.Ready {
			b.Fatalf("%s is %s: this would time something else than an answer", sheet, part.Status)
		}
	}
	request := []byte(written(b, wire.Request{ID: 1, Kind: wire.Pieces, Study: &st, First: study.SheetFront}))
	var d Desk
	for b.Loop() {
		clear(d.sent) // as after an edit that changes every part
		d.Take(request, func([]byte) {})
		d.Work(func() {})
	}
}

// BenchmarkMainJob is one full evaluation of the demonstration study.
func BenchmarkMainJob(b *testing.B) { serveBench(b, study.Demo()) }

// BenchmarkPoints computes with the table itself, ever longer: how the whole job
// grows with the number of points. The points lie on smooth curves; they are
// invented and stand for nothing but their number.
func BenchmarkPoints(b *testing.B) {
	for _, n := range []int{10, 100, 1000, 10000} {
		b.Run(fmt.Sprint(n), func(b *testing.B) {
			st := study.Demo()
			st.Rock.Curve = "table"
			st.Rock.Table = smooth(n)
			serveBench(b, st)
		})
	}
}

func smooth(n int) *study.Table {
	const swc, sor = 0.227, 0.284
	t := &study.Table{Source: "invented for timing"}
	for i := range n {
		s := float64(i) / float64(n-1)
		t.Sw = append(t.Sw, swc+s*(1-swc-sor))
		t.Krw = append(t.Krw, 0.304*s*s*s)
		t.Kro = append(t.Kro, (1-s)*(1-s))
	}
	return t
}
