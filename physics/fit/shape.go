package fit

import (
	"fmt"
	"math"
	"sort"
)

// turned finds swapped columns: by most of their steps and from end to end, krw
// falls and kro rises with saturation.
func (p Points) turned() []Finding {
	first, last := ends(p.Sw)
	if trend(p.Sw, p.Krw) >= 0 || trend(p.Sw, p.Kro) <= 0 || p.Krw[last] >= p.Krw[first] || p.Kro[last] <= p.Kro[first] {
		return nil
	}
	return []Finding{{ID: "swapped", Read: "krw falls and kro rises with Sw",
		Text: "The water and oil columns look swapped, or Sw holds oil saturation.",
		Do:   "Exchange krw and kro, or take Sw as 1 − So.", Refuse: true,
		Allowed: "krw that rises and kro that falls with Sw; where the columns are swapped, exchange them, and where Sw holds oil saturation, take 1 − So"}}
}

// trend is the sum of the signs of all steps of y with x, in rising order of x.
func trend(x, y []float64) int {
	order := rising(x)
	sum := 0
	for k := 1; k < len(order); k++ {
		i, j := order[k-1], order[k]
		switch {
		case x[j] == x[i]:
		case y[j] > y[i]:
			sum++
		case y[j] < y[i]:
			sum--
		}
	}
	return sum
}

// rising returns the rows in rising order of x.
func rising(x []float64) []int {
	order := make([]int, len(x))
	for i := range order {
		order[i] = i
	}
	if !sort.Float64sAreSorted(x) {
		sort.SliceStable(order, func(a, b int) bool { return x[order[a]] < x[order[b]] })
	}
	return order
}

// span looks at the movable saturation and at columns without flow.
func (p Points) span() []Finding {
	var found []Finding
	first, last := ends(p.Sw)
	low, high := p.Sw[first], p.Sw[last]
	read := fmt.Sprintf("Sw from %.4g to %.4g", low, high)
	switch {
	case high-low <= atEnd:
		found = append(found, Finding{ID: "range", Read: read, Text: "With Swc as the smallest and 1 − Sor as the largest Sw, Swc + Sor is 1: no saturation can move.",
			Do: "Give points between connate water and residual oil.", Refuse: true, Allowed: "points whose Swc + Sor is below 1, so that some oil can move"})
	case high-low < narrow:
		found = append(found, Finding{ID: "narrow", Read: read, Text: fmt.Sprintf("Only %.2g of the pore volume can move.", high-low),
			Do: "Check that the points reach from connate water to residual oil."})
	}
	for _, c := range p.columns()[1:] {
		flat := true
		for _, v := range c.values {
			flat = flat && v == 0
		}
		if flat {
			found = append(found, Finding{ID: "flat", Read: c.name + " = 0 in every row", Text: "A phase that never flows has no curve.",
				Do: "Check the column.", Refuse: true, Allowed: "a phase that flows in some of the rows"})
		}
	}
	return found
}

// ordered finds rows out of order and rows of one saturation.
func (p Points) ordered() []Finding {
	var found []Finding
	var out []int
	for i := 1; i < len(p.Sw); i++ {
		if p.Sw[i] < p.Sw[i-1] {
			out = append(out, i)
		}
	}
	if len(out) > 0 {
		found = append(found, Finding{ID: "order", Rows: out, Read: "Sw = " + p.columns()[0].list(out),
			Text: fmt.Sprintf("Sw is smaller than in the row above in %s. A fit does not mind; a table needs rising saturations.", rowList(out)),
			Do:   "Sort the rows by Sw. Points of a second flood belong in a table of their own."})
	}
	var twice []int
	order := rising(p.Sw)
	for k := 1; k < len(order); k++ {
		if p.Sw[order[k]] == p.Sw[order[k-1]] {
			twice = append(twice, order[k])
		}
	}
	if len(twice) > 0 {
		sort.Ints(twice)
		found = append(found, Finding{ID: "duplicate", Rows: twice, Read: "Sw = " + p.columns()[0].list(twice),
			Text: fmt.Sprintf("The saturation in %s stands in another row as well. A fit takes both; a table cannot.", rowList(twice)),
			Do:   "Average repeated measurements, or leave one out."})
	}
	return found
}

// monotone finds rows where a curve turns back.
func (p Points) monotone() []Finding {
	var falls, rises []int
	order := rising(p.Sw)
	for k := 1; k < len(order); k++ {
		i, j := order[k-1], order[k]
		if p.Sw[i] == p.Sw[j] {
			continue
		}
		if p.Krw[j] < p.Krw[i] {
			falls = append(falls, j)
		}
		if p.Kro[j] > p.Kro[i] {
			rises = append(rises, j)
		}
	}
	var found []Finding
	columns := p.columns()
	for _, turn := range []struct {
		id, verb string
		c        column
		rows     []int
	}{{"krw-falls", "falls", columns[1], falls}, {"kro-rises", "rises", columns[2], rises}} {
		if len(turn.rows) == 0 {
			continue
		}
		sort.Ints(turn.rows)
		found = append(found, Finding{ID: turn.id, Rows: turn.rows, Read: turn.c.name + " = " + turn.c.list(turn.rows),
			Text: fmt.Sprintf("%s %s with Sw into %s. Within one flood it cannot.", turn.c.name, turn.verb, rowList(turn.rows)),
			Do:   "Check these values for slips; a fitted curve smooths them, a table cannot be used."})
	}
	return found
}

// atEnds looks whether the table reaches both immobile states.
func (p Points) atEnds() []Finding {
	var found []Finding
	first, last := ends(p.Sw)
	if p.Krw[first] > nearZero {
		found = append(found, Finding{ID: "krw-end", Rows: []int{first}, Read: fmt.Sprintf("krw = %.4g at Sw = %.4g", p.Krw[first], p.Sw[first]),
			Text: "Water still flows at the smallest saturation, so connate water is less than this.",
			Do:   "Add the row of connate water with krw = 0, or let the fit find Swc."})
	}
	if p.Kro[last] > nearZero {
		found = append(found, Finding{ID: "kro-end", Rows: []int{last}, Read: fmt.Sprintf("kro = %.4g at Sw = %.4g", p.Kro[last], p.Sw[last]),
			Text: fmt.Sprintf("Oil still flows at the largest saturation, so residual oil is less than %.4g.", tidy(1-p.Sw[last])),
			Do:   "Add the row of residual oil with kro = 0, or let the fit find Sor."})
	}
	return found
}

// scale asks which permeability kr refers to.
func (p Points) scale() []Finding {
	var found []Finding
	for _, c := range p.columns()[1:] {
		var above []int
		for i, v := range c.values {
			if v > 1 {
				above = append(above, i)
			}
		}
		if len(above) > 0 {
			found = append(found, Finding{ID: "above-one", Rows: above, Read: c.name + " = " + c.list(above),
				Text: fmt.Sprintf("%s is above 1 in %s: it refers to a permeability smaller than the largest measured.", c.name, rowList(above)),
				Do:   "Say which permeability kr refers to, and give that permeability."})
		}
	}
	first, _ := ends(p.Sw)
	start := p.Kro[first]
	read := fmt.Sprintf("kro = %.4g at Sw = %.4g", start, p.Sw[first])
	one := math.Abs(start-1) < exactly
	full := p.FilledByOil && p.Sw[first] < exactly
	switch {
	case one && !p.RelativeToOil && !full:
		found = append(found, Finding{ID: "reference", Rows: []int{first}, Read: read,
			Text: "kro is exactly 1 at initial water. That is how kr looks when it refers to ko(Swi); the study says absolute permeability.",
			Do:   "Look in the laboratory report; if it says ko(Swi), choose that as the reference."})
	case !one && p.RelativeToOil:
		found = append(found, Finding{ID: "reference", Rows: []int{first}, Read: read,
			Text: "kr that refers to ko(Swi) is 1 at initial water; this is not.",
			Do:   "Look in the laboratory report whether kr refers to absolute permeability, or whether the row of initial water is missing."})
	}
	return found
}
