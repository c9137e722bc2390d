package study

import "brinefront/physics/units"

// customary reports whether what is usual of the input holds for the study's pair.
func (s Spec) customary(st *Study) bool { return s.usualFor == nil || s.usualFor(st) }

// unusual asks back about every value of a sheet that is lawful but seldom met: a unit
// or a decimal that slipped is found nowhere else.
func (p *Part) unusual(st *Study, sheet Sheet) {
	for i := range specs {
		spec := &specs[i]
		if spec.Sheet != sheet || spec.Usual[1] == 0 {
			continue
		}
		in := spec.Get(st)
		if in == nil || !spec.Applies(st) || !spec.customary(st) {
			continue
		}
		unit, ok := units.Find(spec.Quantity, in.Unit)
		if !ok || Check(*spec, in.Value, unit) != nil {
			continue // refused as a problem
		}
		low, high := unit.FromSI(spec.Usual[0]), unit.FromSI(spec.Usual[1])
		const rounding = 1e-9 // of a bound that was converted
		if in.Value >= low*(1-rounding) && in.Value <= high*(1+rounding) {
			continue
		}
		p.Notes = append(p.Notes, Note{ID: "unusual." + spec.Path, Level: "caution",
			Text:  spec.Label + " of " + withUnit(units.Exact(in.Value), unit) + " is unusual; common practice, no source: " + withUnit(units.Format(low, 4)+" to "+units.Format(high, 4), unit) + ".",
			Cause: "Nothing else would find a unit or a decimal that slipped.", Do: "Look at the number and its unit; nothing need be done where it is meant.", Paths: []string{spec.Path}})
	}
}
