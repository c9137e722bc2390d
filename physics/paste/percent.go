package paste

// surelyPercent is what the largest kr of a column must pass to be a percentage: kr
// referred to another permeability may pass 1, and 1.5 may be 150 % or 1.5 %
// (common practice, no source).
const surelyPercent = 2

// swPercent reports whether a column of saturation is in percent: its heading says
// so, or names no unit and its numbers look it.
func (r Reading) swPercent(column int) bool {
	switch unitOf(r.Columns[column].Title) {
	case 100:
		return true
	case 0:
		return r.looksPercent(column)
	}
	return false
}

// krPercent reports whether the columns of kr whose headings name no unit are in
// percent. All of them must be: no number beyond 0 to 100, the largest of each above
// 2. Where the saturation is a fraction, most numbers must look it as well, so that
// one slip of the decimal mark does not make percentages of a whole column.
func (r Reading) krPercent(roles []role) bool {
	sw, bare := false, []int{}
	for i, role := range roles {
		switch {
		case role.as == Sw:
			sw = r.swPercent(i)
		case (role.as == Krw || role.as == Kro) && unitOf(r.Columns[i].Title) == 0:
			bare = append(bare, i)
		}
	}
	for _, column := range bare {
		if r.largest(column) <= surelyPercent || !sw && !r.looksPercent(column) {
			return false
		}
	}
	return len(bare) > 0
}

// looksPercent reports whether half of a column's numbers or more lie above 1 and
// none above 100.
func (r Reading) looksPercent(column int) bool {
	above, count := 0, 0
	for row := range r.Cells {
		v, ok := r.cell(row, column, false)
		if !ok {
			continue
		}
		if v > 100 {
			return false
		}
		count++
		if v > 1 {
			above++
		}
	}
	return above > 0 && 2*above >= count
}

// largest is the largest number of a column whose numbers all lie from 0 to 100; 0
// where one does not.
func (r Reading) largest(column int) float64 {
	most := 0.0
	for row := range r.Cells {
		switch v, ok := r.cell(row, column, false); {
		case !ok:
		case v < 0 || v > 100:
			return 0
		default:
			most = max(most, v)
		}
	}
	return most
}
