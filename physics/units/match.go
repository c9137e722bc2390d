package units

import "strings"

// names are other ways to write a unit's symbol, in the plain form of spelled. Words
// and abbreviations in common use; no source.
var names = map[string][]string{
	"fraction": {"frac"},
	"%":        {"percent", "pct"},
	"PV":       {"porevolume", "porevolumes"},
	"rb/stb":   {"bbl/stb"},
	"m3/m3":    {"rm3/sm3", "m3/sm3", "sm3/sm3"},
	"bbl/bbl":  {"stb/stb"},
	"cp":       {"centipoise"},
	"mPa.s":    {"mPas"},
	"Pa.s":     {"Pas"},
	"md":       {"millidarcy", "millidarcies"},
	"D":        {"darcy", "darcies"},
	"ft":       {"foot", "feet"},
	"m":        {"metre", "metres", "meter", "meters"},
	"in":       {"inch", "inches"},
	"acre":     {"acres"},
	"ha":       {"hectare", "hectares"},
	"bbl":      {"barrel", "barrels", "stb", "rb"},
	"Mbbl":     {"Mstb"},
	"cm3":      {"cc", "ml"},
	"m3":       {"sm3", "rm3"},
	"bbl/d":    {"stb/d", "rb/d", "b/d", "bpd"},
	"m3/d":     {"sm3/d", "rm3/d"},
	"cm3/min":  {"cc/min", "ml/min"},
	"cm3/h":    {"cc/h", "ml/h"},
	"d":        {"day", "days"},
	"yr":       {"year", "years"},
	"h":        {"hour", "hours", "hr", "hrs"},
	"min":      {"minute", "minutes"},
	"s":        {"second", "seconds", "sec"},
	"lb/ft3":   {"lbm/ft3"},
	"g/cm3":    {"g/cc", "g/ml"},
	"deg":      {"degree", "degrees"},
	"rad":      {"radian", "radians"},
	"degC":     {"C", "celsius"},
	"degF":     {"F", "fahrenheit"},
	"K":        {"kelvin", "degK"},
	"wt%":      {"%", "wtpercent", "percent", "pct"},
	"ppm":      {"mg/kg"},
	"dyn/cm":   {"dyne/cm", "dynes/cm"},
	"per bbl":  {"perbbl"},
	"per m3":   {"perm3"},
	"per d":    {"perd", "perday"},
	"per yr":   {"peryr", "peryear"},
}

// spelled writes a unit in one plain way: no spaces, no superscripts, and the time
// of a rate by its symbol.
var spelled = strings.NewReplacer(
	" ", "", "^", "", "²", "2", "³", "3", "·", ".", "⋅", ".", "*", ".", "µ", "u", "μ", "u", "°", "deg",
	"/day", "/d", "/hour", "/h", "/hr", "/h", "/minute", "/min", "/second", "/s", "/sec", "/s",
)

// match finds the unit of a quantity that a text means. Upper and lower case are
// told apart only where they matter: by an exact match first, and always for a
// leading m or M that is a prefix, because mPa·s is not MPa·s and Mbbl not mbbl.
func match(q Quantity, text string) (Unit, bool) {
	lower := spelled.Replace(strings.ToLower(plain(text)))
	text = spelled.Replace(plain(text))
	of := Of(q)
	var found []Unit
	for _, u := range of {
		for _, name := range append([]string{u.Symbol}, names[u.Symbol]...) {
			if name == text {
				return u, true
			}
			if strings.ToLower(name) == lower && !(prefixed(name, of) && name[0] != text[0]) {
				found = append(found, u)
			}
		}
	}
	if len(found) != 1 {
		return Unit{}, false
	}
	return found[0], true
}

// prefixed reports whether a name's leading m or M is a prefix: without it, the
// name is another unit of the same quantity.
func prefixed(name string, of []Unit) bool {
	if name == "" || name[0] != 'm' && name[0] != 'M' {
		return false
	}
	for _, u := range of {
		for _, base := range append([]string{u.Symbol}, names[u.Symbol]...) {
			if strings.EqualFold(base, name[1:]) {
				return true
			}
		}
	}
	return false
}
