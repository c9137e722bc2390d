package study

import (
	"brinefront/physics/fit"
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

// family is a parametric form that can be drawn through laboratory points.
type family struct {
	kind    string // of CurveKinds
	name    string
	through func(fit.Points, fit.Options) (fit.Fit, error)
	source  ref.ID
}

var families = []family{
	{"corey-fit", "Corey", fit.Corey, ref.Corey1954},
	{"let-fit", "LET", fit.LET, ref.Lomeland2005},
}

// candidate is a family that is not used, drawn through the same points.
type candidate struct {
	family
	fit fit.Fit
}

// compareUpTo is the longest table that is worth a second fit for comparison: a
// laboratory table is far shorter, and the answer is not to wait for it.
const compareUpTo = 200

// compare draws another family through the points; one that they do not determine
// is left out.
func (r *rock) compare(f family, points fit.Points, options fit.Options) {
	if len(points.Sw) > compareUpTo {
		return
	}
	if other, err := r.memory.through(f, points, options); err == nil {
		r.others = append(r.others, candidate{f, other})
	}
}

// otherLines draws the families that are not used.
func (r *rock) otherLines(sws []float64) []Line {
	var lines []Line
	for _, c := range r.others {
		krw := Line{ID: "krw-" + c.kind, Label: "krw, " + c.name, Role: "aid", Kind: "dashed", X: sws}
		kro := Line{ID: "kro-" + c.kind, Label: "kro, " + c.name, Role: "aid", Kind: "dashed", X: sws}
		for _, sw := range sws {
			p := c.fit.Curves.At(sw)
			krw.Y, kro.Y = append(krw.Y, r.factor*p.Krw), append(kro.Y, r.factor*p.Kro)
		}
		lines = append(lines, krw, kro)
	}
	return lines
}

// familyTable sets the fits side by side.
func (r *rock) familyTable(s *sheet) Grid {
	name := Column{Label: "Family", Quantity: units.Number}
	krw := Column{Label: "krw, root mean square of curve minus point", Quantity: units.Fraction}
	kro := Column{Label: "kro, root mean square of curve minus point", Quantity: units.Fraction}
	use := Column{Label: "Use", Quantity: units.Number}
	add := func(f fit.Fit, family, used string) {
		name.Words, use.Words = append(name.Words, family), append(use.Words, used)
		krw.Values, kro.Values = append(krw.Values, f.RMSKrw), append(kro.Values, f.RMSKro)
	}
	if r.fitted != nil {
		add(*r.fitted, familyName(s.st.Rock.Curve), "used")
	}
	for _, c := range r.others {
		add(c.fit, c.name, "for comparison")
	}
	return Grid{ID: "rock.families", Title: "Families through the points, for kr as reported", Columns: []Column{name, krw, kro, use}}
}

func familyName(kind string) string {
	for _, f := range families {
		if f.kind == kind {
			return f.name
		}
	}
	return ""
}

// closer says when another family follows the points much closer.
func (r *rock) closer(s *sheet) {
	const much = 0.5
	for _, c := range r.others {
		if c.fit.RMSKrw < much*r.fitted.RMSKrw && c.fit.RMSKro < much*r.fitted.RMSKro {
			s.note(Note{ID: "rock.otherFamily", Level: "caution", Text: c.name + " follows the points at least twice as closely in both curves as " + familyName(s.st.Rock.Curve) + " does.",
				Cause: "The family that is used does not have the shape of these points.", Do: "Choose " + c.name + ", or the table itself, and see how far the answers move.", Paths: []string{"rock.curve"}})
		}
	}
}
