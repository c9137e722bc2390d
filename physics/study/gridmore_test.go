package study

import (
	"fmt"
	"math"
	"testing"
)

// sectionOf is the Demo with layers, so many and as fast as told.
func sectionOf(n int, permeability func(i int) float64) Study {
	st := Demo()
	table := "m md fraction"
	for i := range n {
		table += fmt.Sprintf("\n0.5\t%.6g\t0.21", permeability(i))
	}
	st.Field.Layers.Table = table
	return st
}

// On as many cells as there are layers nothing is off; layers all alike are one cell; the number told is the
// least within the tolerances; without layers nothing is told.
func TestGridOfLayers(t *testing.T) {
	part, _ := gridPart(t, sectionOf(6, func(int) float64 { return 100 }))
	if n := value(t, part, "grid.layers"); n != 1 {
		t.Errorf("layers all alike take %g cells", n)
	}
	if e := value(t, part, "grid.oneLayerArrival"); !(e < 1e-6) {
		t.Errorf("layers all alike as one cell: arrival off by %g", e)
	}
	st := sectionOf(9, func(i int) float64 { return 100 * math.Exp(1.2*math.Sin(float64(5*i))) })
	part, _ = gridPart(t, st)
	for _, fault := range faults(withGrid(st, part)) {
		t.Error(fault)
	}
	enough := value(t, part, "grid.layers")
	table, _ := gridTable(part, "grid.layerErrors")
	if len(table.Columns) == 0 {
		t.Fatalf("no table: %s, %v", part.Status, part.Notes)
	}
	n, arrival, recovery := table.Columns[0].Values, table.Columns[1].Values, table.Columns[2].Values
	last := len(n) - 1
	if n[0] != 1 || n[last] != 9 || arrival[last] != 0 || recovery[last] != 0 {
		t.Errorf("%v cells, arrival %v, recovery %v", n, arrival, recovery)
	}
	if !(arrival[0] > usualArrivalWithin && recovery[0] > 0) {
		t.Errorf("one cell: arrival off by %g, recovery by %g; want late and high", arrival[0], recovery[0])
	}
	for i := range n {
		if within := math.Abs(arrival[i]) <= usualArrivalWithin && math.Abs(recovery[i]) <= usualRecoveryWithin; within && n[i] < enough || n[i] == enough && !within {
			t.Errorf("%g cells told, %g are off by %g and %g", enough, n[i], arrival[i], recovery[i])
		}
	}
	chartOf(t, part, "grid.layerErrors")
	st.Field.Layers.Table = "m\tmd\tfraction\tSwi\n1\t100\t0.2\t0.33\n1\t300\t0.2\t0.31"
	part, _ = gridPart(t, st)
	if _, told := noteOf(part, "grid.layersOwn"); !told {
		t.Errorf("saturations of layers pass without a word: %s %v", part.Status, part.Problems)
	}
	part, _ = gridPart(t, Demo())
	if _, told := gridTable(part, "grid.layerErrors"); told {
		t.Error("told without layers")
	}
}

// One cell for a block is slow; the error falls at second order; what is told is the least within; a block of
// several axes has its slab of the same characteristic length; without a block nothing is told.
func TestGridOfBlock(t *testing.T) {
	st := soakingStudy()
	part, _ := gridPart(t, st)
	for _, fault := range faults(withGrid(st, part)) {
		t.Error(fault)
	}
	table, _ := gridTable(part, "grid.blockErrors")
	if len(table.Columns) == 0 {
		t.Fatalf("no table: %s, %v", part.Status, part.Notes)
	}
	n, recovery, half := table.Columns[0].Values, table.Columns[1].Values, table.Columns[2].Values
	for i := 1; i < len(n); i++ {
		if n[i] >= 2*n[i-1] && !(math.Abs(half[i]) < math.Abs(half[i-1])) {
			t.Errorf("half time off by %g on %g cells, by %g on %g", half[i], n[i], half[i-1], n[i-1])
		}
	}
	if !(half[0] > 0.2 && recovery[0] < 0) {
		t.Errorf("one cell: half time off by %g, recovery by %g; want late and low", half[0], recovery[0])
	}
	if p := value(t, part, "grid.blockOrder"); !(p > 1 && p < 2.3) {
		t.Errorf("order %g", p)
	}
	enough := value(t, part, "grid.blockCells")
	for i := range n {
		if within := math.Abs(recovery[i]) <= usualRecoveryWithin; within && n[i] < enough || n[i] == enough && !within {
			t.Errorf("%g cells told, %g are off by %g", enough, n[i], recovery[i])
		}
	}
	chartOf(t, part, "grid.blockErrors")
	st.Block.Shape = "box-6" // a cube of edge L: Lc = L/sqrt(12), alike but for the time
	part, _ = gridPart(t, st)
	if got := value(t, part, "grid.oneCellHalf"); math.Abs(got-half[0]) > 1e-9 {
		t.Errorf("a cube as one cell is off by %g, a slab by %g", got, half[0])
	}
	st.Block.Length = nil
	part, _ = gridPart(t, st)
	if _, told := gridTable(part, "grid.blockErrors"); told {
		t.Error("told without a block")
	}
}

// gridTable is a table of a part by its name.
func gridTable(part Part, id string) (Grid, bool) {
	for _, g := range part.Tables {
		if g.ID == id {
			return g, true
		}
	}
	return Grid{}, false
}
