package fit

import (
	"fmt"
	"math"
)

const (
	pcLow   = 10.0 // Pa: a largest Pc below this, or above pcHigh, is hardly in the unit that was said
	pcHigh  = 5e8  // Pa
	plateau = 0.2  // of the range of Sw over which one and the same Pc is a plateau
)

// InspectPc finds what is wrong or doubtful with points of capillary pressure in Pa,
// as Inspect does for relative permeability. IDs:
//
//	missing, few, order, duplicate   as Inspect
//	outside     Sw outside 0 to 1              refuses
//	constant    Pc is the same in every row    refuses
//	sign        Pc rises with Sw from end to end: its sign, or Sw  refuses
//	rises       Pc rises with Sw somewhere
//	negative    Pc is below 0 in every row
//	plateau     Pc stays the same over a fifth of the range or more
//	unit        the largest Pc is not of this world's rocks
//
// It panics when the slices differ in length.
func InspectPc(p PcPoints) []Finding {
	if len(p.Pc) != len(p.Sw) {
		panic(fmt.Sprintf("fit: %d saturations, %d pc", len(p.Sw), len(p.Pc)))
	}
	var missing, outside []int
	for i, sw := range p.Sw {
		switch {
		case math.IsNaN(sw+p.Pc[i]) || math.IsInf(sw+p.Pc[i], 0):
			missing = append(missing, i)
		case sw < 0 || sw > 1:
			outside = append(outside, i)
		}
	}
	switch {
	case len(missing) > 0:
		return []Finding{{ID: "missing", Rows: missing, Read: rowList(missing), Text: "These values are no numbers.", Do: "Type them again, or leave the rows out.", Refuse: true, Allowed: "numbers; leave out rows that lack one"}}
	case len(outside) > 0:
		return []Finding{{ID: "outside", Rows: outside, Read: "Sw = " + column{values: p.Sw}.list(outside), Text: "Sw is outside 0 to 1 in " + rowList(outside) + ".", Do: "Correct these values, or divide percent by 100.", Refuse: true, Allowed: "fractions from 0 to 1"}}
	case len(p.Sw) < fewestRows:
		return []Finding{{ID: "few", Read: fmt.Sprintf("%d %s", len(p.Sw), plural(len(p.Sw), "row", "rows")), Text: "A curve needs at least 3 points.", Do: "Paste or type the laboratory table.", Refuse: true, Allowed: "at least 3 points"}}
	}
	found := Points{Sw: p.Sw}.ordered()
	return append(found, p.shape()...)
}

// shape looks at how Pc runs.
func (p PcPoints) shape() []Finding {
	first, last := ends(p.Sw)
	order := rising(p.Sw)
	largest, above := 0.0, false
	var rises []int
	level, from := 0.0, 0 // widest stretch of one Pc; where the present one began
	for k, j := range order {
		largest, above = max(largest, math.Abs(p.Pc[j])), above || p.Pc[j] >= 0
		if k == 0 {
			continue
		}
		i := order[k-1]
		if p.Pc[j] > p.Pc[i] && p.Sw[j] > p.Sw[i] {
			rises = append(rises, j)
		}
		if p.Pc[j] != p.Pc[i] {
			from = k
		}
		level = max(level, p.Sw[j]-p.Sw[order[from]])
	}
	switch {
	case p.Sw[last]-p.Sw[first] <= atEnd, len(rises) == 0 && p.Pc[order[0]] == p.Pc[order[len(order)-1]]:
		return []Finding{{ID: "constant", Read: "one saturation or one Pc in every row", Text: "Such points are no curve.", Do: "Check the columns.", Refuse: true, Allowed: "capillary pressure that falls as Sw rises"}}
	case p.Pc[last] > p.Pc[first] && trend(p.Sw, p.Pc) > 0:
		return []Finding{{ID: "sign", Read: "Pc rises with Sw", Text: "Pc is the oil's pressure less the water's, and falls as water comes in. Here it rises: its sign is turned, or Sw holds oil saturation.",
			Do: "Change the sign of Pc, or take Sw as 1 − So.", Refuse: true, Allowed: "Pc = Po − Pw, which falls as Sw rises"}}
	}
	var found []Finding
	if len(rises) > 0 {
		found = append(found, Finding{ID: "rises", Rows: rises, Read: rowList(rises), Text: "Pc rises with Sw into " + rowList(rises) + ". Within one displacement it cannot.",
			Do: "Check these values for slips; a fitted curve smooths them, a table cannot be used."})
	}
	if !above {
		found = append(found, Finding{ID: "negative", Read: "Pc below 0 in every row", Text: "Pc is below 0 throughout: such rock soaks up no water at all.",
			Do: "Look whether the report means Pw − Po, or gives forced imbibition only."})
	}
	if level > plateau*(p.Sw[last]-p.Sw[first]) {
		found = append(found, Finding{ID: "plateau", Read: fmt.Sprintf("one Pc over %.2g of Sw", level), Text: "Pc stays the same over a wide range of saturation.",
			Do: "A plateau over most of the range is how rock with pores of one size looks, and a run at one pressure only."})
	}
	if largest < pcLow || largest > pcHigh {
		found = append(found, Finding{ID: "unit", Read: fmt.Sprintf("largest Pc %.3g Pa", largest), Text: "Capillary pressures of rock lie between some hundred pascals and some hundred megapascals; the largest here does not.",
			Do: "Look at the unit of the column."})
	}
	return found
}
