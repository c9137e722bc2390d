package study

import (
	"math"
	"strconv"

	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// subdivision is the block of the Soak sheet on cells from its face to its middle.
type subdivision struct {
	block    *soakingBlock
	half     float64       // s, of the fine answer
	runs     []cellsInside // by number
	order    float64       // of the error in the half time, on the two finest; NaN: none
	enough   int           // the least number within the tolerance of recovery; 0: none
	slab     bool          // it stands for a block of several axes
	capacity float64       // pore volumes
}

// cellsInside is what a number of cells make of a block.
type cellsInside struct {
	cells          int
	recovery, half float64 // errors: of the pore volume, at the half time; of the half time
}

// mostInside is the finest subdivision that is run.
const mostInside = 32

// subdivided fills the block on 1, 2, 4, ... cells; nil where there is none.
func (g *grid) subdivided(b *soakingBlock) *subdivision {
	if b == nil {
		return nil
	}
	x := &subdivision{block: b, slab: !b.flat(), order: math.NaN(), capacity: b.matrix.Capacity()}
	fine := b.Block
	if x.slab {
		fine = b.slab
	}
	x.half = fine.TimeAt(0.5)
	on := func(n int) (cellsInside, bool) {
		run, err := b.matrix.Subdivide(fine.Shape[0], n, x.half)
		if err != nil {
			return cellsInside{}, false
		}
		share, _ := run.At(x.half)
		c := cellsInside{n, (share - 0.5) * x.capacity, run.TimeAt(0.5)/x.half - 1}
		x.runs = append(x.runs, c)
		return c, true
	}
	var before cellsInside
	for n := 1; n <= mostInside; n *= 2 {
		for k := n/2 + 1; x.enough == 0 && k < n; k++ {
			x.met(on, k, g.tolerance.Recovery)
		}
		c, ok := x.met(on, n, g.tolerance.Recovery)
		if !ok {
			return nil
		}
		if n == mostInside {
			x.order = math.Log2(math.Abs(before.half / c.half))
		}
		before = c
	}
	return x
}

// met runs a number of cells and keeps it where it is the first within.
func (x *subdivision) met(on func(int) (cellsInside, bool), n int, within float64) (cellsInside, bool) {
	c, ok := on(n)
	if ok && x.enough == 0 && math.Abs(c.recovery) <= within {
		x.enough = n
	}
	return c, ok
}

func (x *subdivision) tell(s *sheet, g *grid) {
	method := "Equal cells from the open face inwards, half a cell from the face to the first, two points a flux, by the potential of capillary diffusion; the Soak sheet's own steps in time, fine enough to add nothing. Beside the fine answer of the Soak sheet"
	if x.slab {
		method += " for the slab whose thickness from face to middle is the characteristic length, which stands for this block of several axes"
	}
	method += "."
	add := func(id, label, symbol string, v float64, q units.Quantity, more string) {
		s.figure(Figure{ID: "grid." + id, Label: label, Symbol: symbol, Value: v, Quantity: q},
			s.by("", method+more, ref.Kazemi1976, ref.Alexander1977).rests(x.block.inputs...).rests(typedOf(s.st, "grid.recoveryWithin")...))
	}
	one := x.runs[0]
	late, slow := wrong(one.half, "late", "early")
	off, high := wrong(one.recovery, "high", "low")
	add("oneCellHalf", "Block as one cell: half has soaked in too "+slow+" by", "et,1", late, units.Share, " Of the half time. One cell is the matrix of a dual-porosity model.")
	add("oneCellRecovery", "Block as one cell: recovery at the half time too "+high+" by", "er,1", off, units.Share, " Of the block's pore volume. One cell is the matrix of a dual-porosity model.")
	if x.enough > 0 {
		add("blockCells", "Cells from the face to the middle of a block", "Nb", float64(x.enough), units.Number, " The least number whose recovery at the half time is within "+units.Format(100*g.tolerance.Recovery, 3)+" % of the pore volume.")
	}
	add("blockOrder", "Order at which the block's error fell", "pb", x.order, units.Number, " log2 of the errors in the half time on "+strconv.Itoa(mostInside/2)+" and on "+strconv.Itoa(mostInside)+" cells.")
	n := Column{Label: "Cells from the face to the middle", Symbol: "Nb", Quantity: units.Number}
	recovery := Column{Label: "Recovery at the half time, error, of the pore volume", Quantity: units.Share}
	half := Column{Label: "Half time, error", Quantity: units.Share}
	var cells []int
	for _, c := range x.runs {
		cells = append(cells, c.cells)
		n.Values, recovery.Values, half.Values = append(n.Values, float64(c.cells)), append(recovery.Values, c.recovery), append(half.Values, c.half)
	}
	s.part.Tables = append(s.part.Tables, Grid{ID: "grid.blockErrors", Title: "A block on cells from its face to its middle", Columns: []Column{n, recovery, half}})
	s.part.Charts = append(s.part.Charts, errorsOn("grid.blockErrors", "Error against the number of cells in a block", "Cells from the face to the middle", cells,
		"Errors of recovery at the half time and of the half time fall with the number of cells from the face of a block to its middle; one cell is the dual-porosity model.",
		measuredError{"recovery", "recovery", "oil", recovery.Values, g.tolerance.Recovery}, measuredError{"half", "half time", "water", half.Values, 0}))
	s.note(Note{ID: "grid.blockLimits", Level: "remark", Text: "The number of cells in a block is for a face that is kept in water, equal cells and the half time; before water has crossed the first cell such a grid is further off.",
		Cause: "The first cell takes its uptake over half its length from the start, where the true one falls as 1/√t. A simulator that takes mobilities upstream, or long steps, errs otherwise: that is not measured here.",
		Do:    "Make cells near the face finer, or fit the exchange: see the Soak sheet."})
	if x.enough == 0 {
		s.note(Note{ID: "grid.blockBeyond", Level: "caution", Text: "On " + strconv.Itoa(mostInside) + " equal cells the block is not within the tolerance of recovery: no number is told.",
			Cause: "Capillary diffusion is very uneven between the states of the block.", Do: "Make cells near the face finer, or ask for less.", Paths: []string{"grid.recoveryWithin"}})
	}
}
