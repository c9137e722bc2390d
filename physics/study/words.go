package study

import (
	"cmp"
	"maps"
	"slices"
	"strings"
	"sync"
	"unicode"
	"unicode/utf8"

	"brinefront/physics/fluid"
)

// words tell a result in the names of a pair of phases. Every text of this package is
// written for water that displaces oil, which are roles: see fluid.Pair. For another
// pair the words and symbols of the two roles are changed for those of the phases, once,
// when all parts are there.
type words struct {
	list  map[string]string
	alone map[string]string // symbols that are words elsewhere, such as the exponent no
	order []string          // of list, the longest first
	gas   [2]bool           // whether the displacing and the resident phase are gas, told in volumes at standard conditions
}

// wordsOf are the words of a pair; nil for the pair that texts are written for.
func wordsOf(p fluid.Pair) *words { return vocabulary()[p.ID] }

var vocabulary = sync.OnceValue(func() map[fluid.PairID]*words {
	all := map[fluid.PairID]*words{}
	for _, p := range fluid.Pairs() {
		if p.ID != fluid.BrineOil {
			all[p.ID] = newWords(p)
		}
	}
	return all
})

func newWords(p fluid.Pair) *words {
	d, r := p.Displacing, p.Resident
	w := &words{list: map[string]string{}, gas: [2]bool{d.Symbol == "g", r.Symbol == "g"}}
	for from, to := range map[string]string{
		"water": d.Name, "oil": r.Name, "connate water": d.ImmobileName, "residual oil": r.ImmobileName,
	} {
		w.list[from], w.list[capital(from)] = to, capital(to)
	}
	w.list["Swc"], w.list["Sor"] = d.Immobile, r.Immobile
	w.list["WOR"] = strings.ToUpper(d.Symbol+r.Symbol) + "R"
	// Symbols whose index is the phase, and what may follow it.
	w.symbols("w", d.Symbol, "kr fw f µ ρ B q", " 0 a i j f s 2 ,o")
	w.symbols("o", r.Symbol, "kr µ ρ B q k", " 0 a i ,max")
	for _, after := range []string{"", "i", "j", "f", "a", "2"} {
		w.list["Sw"+after] = d.Saturation + after
	}
	for _, pair := range [][2]string{{"krw0,o", "kr" + d.Symbol + "0," + r.Symbol}, {"Sor,L", r.Immobile + ",L"}, {"fw,lim", d.Flow() + ",lim"}, {"qo,lim", "q" + r.Symbol + ",lim"},
		{"dfw", "d" + d.Flow()}, {"dSw", "d" + d.Saturation}} {
		w.list[pair[0]] = pair[1]
	}
	w.alone = map[string]string{}
	for _, stem := range []string{"n", "L", "E", "T"} {
		w.alone[stem+"w"], w.alone[stem+"o"] = stem+d.Symbol, stem+r.Symbol
	}
	w.compile()
	return w
}

// symbols enters every stem with its index changed.
func (w *words) symbols(from, to, stems, after string) {
	for _, stem := range strings.Fields(stems) {
		for _, end := range strings.Split(after, " ") {
			w.list[stem+from+end] = stem + to + end
		}
	}
}

// compile puts the words in the order in which they are looked for, the longest first.
func (w *words) compile() {
	w.order = slices.SortedFunc(maps.Keys(w.list), func(a, b string) int {
		return cmp.Or(len(b)-len(a), strings.Compare(a, b))
	})
}

// tell changes the words of a text. A word stands by itself: no letter or digit before
// or after it.
func (w *words) tell(text string) string {
	var b strings.Builder
	for before := utf8.RuneError; text != ""; {
		from, to := w.first(text, before)
		b.WriteString(to)
		before, _ = utf8.DecodeLastRuneInString(from)
		text = text[len(from):]
	}
	return b.String()
}

// first is what a text begins with, a word of the list or else a character, and what
// stands for it.
func (w *words) first(text string, before rune) (from, to string) {
	if !part(before) {
		for _, word := range w.order {
			if rest, found := strings.CutPrefix(text, word); found {
				if after, _ := utf8.DecodeRuneInString(rest); !part(after) {
					return word, w.list[word]
				}
			}
		}
	}
	_, n := utf8.DecodeRuneInString(text)
	return text[:n], text[:n]
}

// part reports whether a character can belong to a word.
func part(r rune) bool { return r != utf8.RuneError && (unicode.IsLetter(r) || unicode.IsDigit(r)) }

// capital begins a text with a capital letter.
func capital(text string) string {
	r, n := utf8.DecodeRuneInString(text)
	return string(unicode.ToUpper(r)) + text[n:]
}
