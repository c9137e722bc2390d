package report

import (
	"strings"
	"testing"

	"brinefront/physics/study"
	"brinefront/physics/units"
)

func terms(pairs ...any) []study.Term {
	var list []study.Term
	for i := 0; i < len(pairs); i += 3 {
		list = append(list, study.Term{Symbol: pairs[i].(string), Value: pairs[i+1].(float64), Quantity: pairs[i+2].(units.Quantity)})
	}
	return list
}

// The expected texts are the formulas worked by hand in the rules of Working.
func TestWorkingPutsNumbersIn(t *testing.T) {
	for _, c := range []struct {
		name     string
		w        study.Working
		symbolic string
		numeric  []string // in this order
	}{
		{"no formula", study.Working{}, "", nil},
		{"side by side", study.Working{Formula: "{V} = {a} {b}", Terms: terms("a", 2.0, units.Number, "b", 3.0, units.Number)}, "V = a b", []string{"V = 2", " × 3"}},
		{"unexplained symbol stays", study.Working{Formula: "{y} = {a} + {c}", Terms: terms("a", 2.0, units.Number)}, "y = a + c", []string{"y = 2", " + c"}},
		{"left side keeps its symbol", study.Working{Formula: "{a} = {b}", Terms: terms("a", 1.0, units.Number, "b", 5.0, units.Number)}, "a = b", []string{"a = 5"}},
		{"unit under the bar", study.Working{Formula: "{r} = {a} / {p}", Terms: terms("a", 2.0, units.Number, "p", 1e5, units.Pressure)}, "r = a / p", []string{"r = 2", " / (1", "bar)"}},
		{"negative", study.Working{Formula: "{r} = {a} - {b}", Terms: terms("a", 2.0, units.Number, "b", -3.0, units.Number)}, "r = a - b", []string{"r = 2", " - (", "3)"}},
		{"product with a bracket", study.Working{Formula: "{r} = {a} (1 - {b}) {c}", Terms: terms("a", 2.0, units.Number, "b", 3.0, units.Number, "c", 4.0, units.Number)}, "r = a (1 - b) c", []string{"2", " × (1 - 3", ") × 4"}},
		{"function of a symbol", study.Working{Formula: "{r} = f({b})", Terms: terms("b", 3.0, units.Number)}, "r = f(b)", []string{"r = f(3", ")"}},
	} {
		symbolic, numeric := Working(c.w, units.Metric)
		if symbolic != c.symbolic {
			t.Errorf("%s: symbols read %q, want %q", c.name, symbolic, c.symbolic)
		}
		rest := numeric
		for _, part := range c.numeric {
			_, after, found := strings.Cut(rest, part)
			if !found {
				t.Errorf("%s: numbers read %q, which lacks %q in its place", c.name, numeric, part)
			}
			rest = after
		}
	}
}
