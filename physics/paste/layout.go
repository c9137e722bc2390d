package paste

import (
	"slices"
	"strings"
)

// Layout is the table that a text is read for. Sw, Krw and Kro are roles, as everywhere:
// those of the displacing phase and of the resident one.
type Layout struct {
	columns []string // in the order in which columns without headings are taken
	phases  *phases
}

// The layouts there are, for water that displaces oil.
var (
	RelativePermeability = Layout{[]string{Sw, Krw, Kro}, &waterOil}
	CapillaryPressure    = Layout{[]string{Sw, Pc}, &waterOil}
)

// phases are what the roles are called for a pair, and which heading names each.
type phases struct {
	roles  map[string]string // by what a heading names
	labels map[string]string // of the roles, So included, in a sentence
	symbol string            // of the other saturation
}

var (
	waterOil  = newPhases("w", "o", "So", "oil saturation")
	elsewhere = map[string]phases{ // saturation of gas is one less that of all liquid, connate water included
		"go": newPhases("g", "o", "SL", "liquid saturation"),
		"wg": newPhases("w", "g", "Sg", "gas saturation"),
		"gw": newPhases("g", "w", "Sw", "water saturation"),
	}
)

func newPhases(displacing, resident, symbol, other string) phases {
	names := map[string]string{"w": "water saturation", "g": "gas saturation"}
	return phases{
		roles:  map[string]string{"s" + displacing: Sw, strings.ToLower(symbol): So, "kr" + displacing: Krw, "kr" + resident: Kro, Pc: Pc},
		labels: map[string]string{Sw: names[displacing], So: other, Krw: "kr" + displacing, Kro: "kr" + resident, Pc: "capillary pressure"},
		symbol: symbol,
	}
}

// Between is the layout for another pair, told by the indices of its phases: w, o or g.
// Pairs that are not known are read as water and oil.
func (l Layout) Between(displacing, resident string) Layout {
	if p, ok := elsewhere[displacing+resident]; ok {
		l.phases = &p
	}
	return l
}

// Label is what a role is called in a sentence.
func (r Reading) Label(as string) string { return r.want.Label(as) }

// Label is what a role is called in a sentence.
func (l Layout) Label(as string) string { return l.phases.labels[as] }

// role is the use of a column with a heading; "" where the table asks for no such thing.
func (l Layout) role(title string) string {
	as := l.phases.roles[nameOf(title)]
	if as == So && slices.Contains(l.columns, Sw) || slices.Contains(l.columns, as) {
		return as
	}
	return ""
}

// isOther reports whether a heading names a column that the table does not ask for.
func (l Layout) isOther(title string) bool {
	w := words(title)
	return l.role(title) == "" && (nameOf(title) != "" || len(w) > 0 && others[w[0]])
}

// wanted tells what the table asks for.
func (l Layout) wanted() string {
	names := make([]string, len(l.columns))
	for i, as := range l.columns {
		names[i] = l.Label(as)
	}
	last := len(names) - 1
	return strings.Join(names[:last], ", ") + " and " + names[last]
}

// asked is the same with how many columns that is.
func (l Layout) asked() string {
	return map[int]string{2: "two", 3: "three"}[len(l.columns)] + " columns: " + l.wanted()
}
