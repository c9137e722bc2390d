package study

import (
	"fmt"
	"math"
	"strconv"
	"strings"
	"testing"
	"unicode/utf8"
)

// formula evaluates what stands right of a working's equals sign from its terms,
// so that what is shown beside a figure is what the figure is: sums, products
// (written side by side), quotients and brackets. size is the value with every
// difference turned into a sum: the measure of what rounding may do.
type formula struct {
	text   string
	terms  map[string]float64
	used   map[string]bool
	broken string
}

type worth struct{ value, size float64 }

func (f *formula) skip() { f.text = strings.TrimLeft(f.text, " ") }

func (f *formula) next() rune {
	f.skip()
	r, _ := utf8.DecodeRuneInString(f.text)
	return r
}

func (f *formula) take() { _, n := utf8.DecodeRuneInString(f.text); f.text = f.text[n:] }

func (f *formula) sum() worth {
	total := f.product()
	for f.next() == '+' || f.next() == '-' {
		minus := f.next() == '-'
		f.take()
		p := f.product()
		total.size += p.size
		if minus {
			p.value = -p.value
		}
		total.value += p.value
	}
	return total
}

func (f *formula) product() worth {
	w := f.factor()
	for f.broken == "" && f.text != "" && strings.ContainsRune("/{(0123456789", f.next()) {
		if f.next() == '/' {
			f.take()
			d := f.factor()
			w = worth{w.value / d.value, w.size / math.Abs(d.value) * d.size / math.Abs(d.value)}
			continue
		}
		p := f.factor()
		w = worth{w.value * p.value, w.size * p.size}
	}
	return w
}

func (f *formula) factor() worth {
	switch r := f.next(); {
	case r == '(':
		f.take()
		w := f.sum()
		if f.next() != ')' {
			f.broken = "a bracket is left open"
		}
		f.take()
		return w
	case r == '{':
		symbol, rest, closed := strings.Cut(f.text[1:], "}")
		value, known := f.terms[symbol]
		if !closed || !known {
			f.broken = "no term " + symbol
		}
		f.used[symbol] = true
		f.text = rest
		return worth{value, math.Abs(value)}
	case r >= '0' && r <= '9':
		end := strings.IndexFunc(f.text, func(r rune) bool { return !strings.ContainsRune("0123456789.", r) })
		if end < 0 {
			end = len(f.text)
		}
		value, err := strconv.ParseFloat(f.text[:end], 64)
		if err != nil {
			f.broken = err.Error()
		}
		f.text = f.text[end:]
		return worth{value, value}
	}
	f.broken = fmt.Sprintf("cannot be read at %q", f.text)
	return worth{}
}

// checkWorking compares a figure with its own formula.
func checkWorking(figure Figure) error {
	w := figure.Working
	if w.Formula == "" {
		if w.Method == "" {
			return fmt.Errorf("%s says neither by a formula nor in words how it was obtained", figure.ID)
		}
		return nil
	}
	left, right, ok := strings.Cut(w.Formula, " = ")
	if !ok || left != "{"+figure.Symbol+"}" {
		return fmt.Errorf("%s: the formula %q does not begin with the figure's symbol", figure.ID, w.Formula)
	}
	f := formula{text: right, terms: map[string]float64{}, used: map[string]bool{}}
	for _, t := range w.Terms {
		if old, twice := f.terms[t.Symbol]; twice && old != t.Value {
			return fmt.Errorf("%s: %s means two things", figure.ID, t.Symbol)
		}
		f.terms[t.Symbol] = t.Value
	}
	got := f.sum()
	if f.broken != "" || f.text != "" {
		return fmt.Errorf("%s: %q: %s, left over %q", figure.ID, w.Formula, f.broken, f.text)
	}
	for symbol := range f.terms {
		if !f.used[symbol] {
			return fmt.Errorf("%s: the term %s does not stand in %q", figure.ID, symbol, w.Formula)
		}
	}
	// The state that arrives after some volume is found from its speed 1/Q. Where a
	// fan leads that is some 1e4 fast, its end is told to about 1e-11 by that.
	// A difference between cases below alike is told as none.
	limit := 1e-10
	if strings.HasPrefix(figure.ID, "compare.") {
		limit = alike
	}
	if tolerance := limit * math.Max(got.size, math.Abs(figure.Value)); math.Abs(got.value-figure.Value) > tolerance {
		return fmt.Errorf("%s is %.15g, its formula %q gives %.15g", figure.ID, figure.Value, w.Formula, got.value)
	}
	return nil
}

// TestFormulasAreRead holds the reader of formulas itself, on sums done by hand.
func TestFormulasAreRead(t *testing.T) {
	terms := []Term{{Symbol: "a", Value: 6}, {Symbol: "b", Value: 4}, {Symbol: "µ,x(y)", Value: 2}}
	for _, c := range []struct {
		formula string
		want    float64
	}{
		{"{r} = {a} {b} {µ,x(y)}", 48}, {"{r} = {a} / ({b} {µ,x(y)})", 0.75}, {"{r} = {a} / {b} {µ,x(y)}", 3},
		{"{r} = 1 / (1 + ({a} / {b}) (1 / {µ,x(y)} - 1))", 4}, {"{r} = {a} - {b} - {µ,x(y)}", 0}, {"{r} = {a} + ({b} - 0.5) {µ,x(y)}", 13},
	} {
		figure := Figure{ID: c.formula, Symbol: "r", Value: c.want, Working: Working{Formula: c.formula, Terms: terms}}
		if err := checkWorking(figure); err != nil {
			t.Error(err)
		}
		figure.Value += 1e-6
		if checkWorking(figure) == nil {
			t.Errorf("%s: a wrong value passes", c.formula)
		}
	}
	for _, wrong := range []string{"{r} = {a} {b}", "{s} = {a} {b} {µ,x(y)}", "{r} = {a} {b} {µ,x(y)} {c}", "{r} = ({a} {b} {µ,x(y)}", "r"} {
		if checkWorking(Figure{Symbol: "r", Value: 48, Working: Working{Formula: wrong, Terms: terms}}) == nil {
			t.Errorf("%s passes", wrong)
		}
	}
}
