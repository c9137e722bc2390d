package paste

import "strings"

// names are the headings of the trade, without spaces, marks and units.
var names = map[string]string{
	"sw": Sw, "swat": Sw, "satw": Sw, "watersaturation": Sw, "watersat": Sw, "saturationwater": Sw,
	"satwater": Sw, "brinesaturation": Sw, "brinesat": Sw, "swsaturation": Sw,
	"so": So, "soil": So, "sato": So, "oilsaturation": So, "oilsat": So, "saturationoil": So, "satoil": So,
	"krw": Krw, "krwater": Krw, "krbrine": Krw, "waterkr": Krw, "brinekr": Krw, "waterrelativepermeability": Krw,
	"relativepermeabilitywater": Krw, "waterrelperm": Krw, "relpermwater": Krw, "relativepermeabilitybrine": Krw,
	"brinerelativepermeability": Krw, "krwo": Krw, "relpermw": Krw,
	"kro": Kro, "kroil": Kro, "oilkr": Kro, "oilrelativepermeability": Kro, "relativepermeabilityoil": Kro,
	"oilrelperm": Kro, "relpermoil": Kro, "krow": Kro, "relpermo": Kro, "krog": Kro,
	"sg": "sg", "sgas": "sg", "satg": "sg", "gassaturation": "sg", "gassat": "sg", "saturationgas": "sg", "satgas": "sg", "sco2": "sg", "co2saturation": "sg",
	"sl": "sl", "sliq": "sl", "sliquid": "sl", "liquidsaturation": "sl", "liquidsat": "sl", "satliquid": "sl",
	"krg": "krg", "krgas": "krg", "gaskr": "krg", "gasrelativepermeability": "krg", "relativepermeabilitygas": "krg", "gasrelperm": "krg",
	"krgo": "krg", "krgw": "krg", "krco2": "krg", "krwg": Krw,
	"pc": Pc, "pcow": Pc, "pcwo": Pc, "pcgw": Pc, "pcgo": Pc, "pcres": Pc, "capillarypressure": Pc, "cappressure": Pc, "capillarypress": Pc,
	"pcap": Pc, "j": Pc, "jsw": Pc, "jfunction": Pc, "leverettj": Pc, "leverettjfunction": Pc, "jvalue": Pc,
}

// others are headings of columns that stand beside the three and are never taken
// for one of them.
var others = map[string]bool{
	"no": true, "nr": true, "#": true, "n": true, "i": true, "point": true, "step": true, "row": true, "sample": true,
	"plug": true, "depth": true, "time": true, "pv": true, "pvi": true, "fw": true, "fo": true,
	"pressure": true, "dp": true, "rate": true, "ratio": true, "id": true, "index": true,
}

// units are words of a heading that tell a unit.
var units = map[string]float64{
	"%": 100, "percent": 100, "pct": 100, "perc": 100,
	"frac": 1, "fraction": 1, "fractional": 1, "dec": 1, "decimal": 1, "dimensionless": 1,
}

// pressures are words of a heading that tell the unit of a pressure.
var pressures = map[string]string{"psi": "psi", "psia": "psi", "kpa": "kPa", "bar": "bar", "bars": "bar", "mpa": "MPa", "atm": "atm", "pa": "Pa"}

// fillers are words of a heading that carry nothing.
var fillers = map[string]bool{
	"to": true, "of": true, "for": true, "the": true, "phase": true, "in": true, "pv": true,
	"average": true, "avg": true, "mean": true, "measured": true, "lab": true, "smoothed": true,
}

// otherScale are words that make a saturation something else than Sw or So.
var otherScale = []string{"*", "norm", "reduced", "effective", "mobile"}

// spelled writes the marks that stand for a unit or a count as words.
var spelled = strings.NewReplacer("v/v", " fraction ", "[-]", " fraction ", "(-)", " fraction ", " - ", " fraction ",
	"%", " % ", "#", " # ")

// maxTitle is how much of a heading is read, in bytes; more is no heading.
const maxTitle = 200

// words cuts a heading into lower-case words; a unit is a word.
func words(title string) []string {
	title = title[:min(len(title), maxTitle)]
	title = spelled.Replace(" " + strings.ToLower(title) + " ")
	return strings.FieldsFunc(title, func(c rune) bool {
		return !(c >= 'a' && c <= 'z' || c >= '0' && c <= '9' || c == '%' || c == '#' || c > 0x7f)
	})
}

// nameOf returns what a heading names, "sw", "krg", ..., or "" when it names
// nothing of the trade or two things at once, such as the ratio krw/kro.
func nameOf(title string) string {
	lower := strings.ToLower(title[:min(len(title), maxTitle)])
	for _, scale := range otherScale {
		if strings.Contains(lower, scale) {
			return ""
		}
	}
	var kept []string
	for _, w := range words(title) {
		if units[w] == 0 && !fillers[w] {
			kept = append(kept, w)
		}
	}
	name, used := leading(kept)
	if name == "" {
		return ""
	}
	for rest := kept[used:]; len(rest) > 0; rest = rest[1:] {
		if second, _ := leading(rest); second != "" {
			return ""
		}
	}
	return name
}

// leading returns the name that the longest run of leading words spells.
func leading(kept []string) (name string, used int) {
	for n := min(len(kept), 4); n > 0; n-- {
		if name := names[strings.Join(kept[:n], "")]; name != "" {
			return name, n
		}
	}
	return "", 0
}

// unitOf returns 100 when a heading says percent, 1 when it says fraction, 0 when
// it says neither.
func unitOf(title string) float64 {
	unit := 0.0
	for _, w := range words(title) {
		unit = max(unit, units[w])
	}
	return unit
}

// pressureOf returns the unit that a heading of capillary pressure names; "J" where it
// is one of Leverett's J, which has none.
func pressureOf(title string) string {
	for _, w := range words(title) {
		if unit := pressures[w]; unit != "" {
			return unit
		}
		if strings.HasPrefix(w, "j") {
			return "J"
		}
	}
	return ""
}

// onlyUnit reports whether a heading cell holds a unit and nothing else.
func onlyUnit(cell string) bool {
	w := words(cell)
	for _, word := range w {
		if units[word] == 0 && pressures[word] == "" && word != "pv" {
			return false
		}
	}
	return len(w) > 0
}
