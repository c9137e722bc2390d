package study

import (
	"reflect"
	"testing"
)

// TestMemory: what is remembered never changes a result, whichever way a study
// changes between two runs.
func TestMemory(t *testing.T) {
	var m Memory
	steps := []func(*Study){
		func(*Study) {},
		func(st *Study) { st.Fluids.OilViscosity.Value = 3 },
		func(st *Study) { st.Rock.Table.Krw[5] *= 1.2 },
		func(st *Study) { st.Rock.Weights = "absolute" },
		func(st *Study) { st.Rock.Curve = "let-fit" },
		func(st *Study) { st.Rock.Reference = "absolute" },
		func(st *Study) {
			st.Rock.Table.Sw, st.Rock.Table.Krw, st.Rock.Table.Kro = st.Rock.Table.Sw[:2], st.Rock.Table.Krw[:2], st.Rock.Table.Kro[:2]
		},
		func(st *Study) { *st = Demo() },
		func(st *Study) { st.Fluids.Pair = "co2-brine" },
	}
	st := Demo()
	for i, change := range steps {
		change(&st)
		for range 2 {
			if !reflect.DeepEqual(m.Run(st), Run(st)) {
				t.Errorf("step %d: with a memory the result differs", i)
			}
		}
	}
}
