package study

import (
	"math"
	"strings"

	"brinefront/physics/numeric"
	"brinefront/physics/ref"
	"brinefront/physics/units"
)

func (r *rock) figures(s *sheet) {
	first, last := r.reported.At(r.swc), r.reported.At(r.swmax)
	connate, residual := "Connate water", "Residual oil"
	water, oil := flowAtEnds(r.reported)
	if water {
		connate = "Water saturation of the first row"
	}
	if oil {
		residual = "Oil saturation of the last row"
	}
	for _, end := range []struct {
		id, label, symbol string
		reported          float64
		kr                bool
	}{
		{"rock.swc", connate, "Swc", r.swc, false},
		{"rock.sor", residual, "Sor", 1 - r.swmax, false},
		{"rock.krw0", "krw at Sor", "krw0", last.Krw, true},
		{"rock.kro0", "kro at Swc", "kro0", first.Kro, true},
	} {
		how := r.ends
		if text := r.origins[end.symbol]; text != "" {
			how = text
		}
		w := s.by("", how, r.sources...).rests(r.inputs...)
		f := Figure{ID: end.id, Label: end.label, Symbol: end.symbol, Value: end.reported, Quantity: units.Fraction, Strip: true}
		if end.kr && r.factor != 1 {
			f.Value *= r.factor
			w.Formula = "{" + end.symbol + "} = {" + end.symbol + ",lab} {ko(Swi)} / {k}"
			w.Method += " Reported relative to ko(Swi), converted to absolute permeability."
			w.value(end.symbol+",lab", end.label+" relative to ko(Swi)", end.reported, units.Fraction).input("rock.oilPermeability").input("rock.permeability")
		}
		s.figure(f, w)
	}
	for _, p := range r.parameters {
		id := "rock." + strings.ToLower(p.Symbol)
		if _, done := s.find(id); !done {
			s.figure(Figure{ID: id, Label: p.Label, Symbol: p.Symbol, Value: p.Value, Quantity: units.Number, Strip: (p.Symbol == "nw" || p.Symbol == "no") && !withCapillary(s.st)},
				s.by("", r.origins[p.Symbol], r.sources...).rests(r.inputs...))
		}
	}
	s.figure(Figure{ID: "rock.crossover", Label: "Curves cross at Sw", Symbol: "Sx", Value: r.crossover(), Quantity: units.Fraction, Strip: true},
		s.by("", "The saturation at which krw = kro.", ref.Craig1971).rests(r.inputs...))
	s.figure(Figure{ID: "rock.krwOverKro", Label: "krw at Sor, relative to ko(Swi)", Symbol: "krw0,o", Value: last.Krw / first.Kro, Quantity: units.Fraction},
		s.by("{krw0,o} = {krw0} / {kro0}", "", ref.Craig1971).term("rock.krw0").term("rock.kro0"))
}

// crossover is where the curves cross; NaN when they do not.
func (r *rock) crossover() float64 {
	excess := func(sw float64) float64 {
		p := r.reported.At(sw)
		return p.Krw - p.Kro
	}
	low, high := excess(r.swc), excess(r.swmax)
	if low >= 0 || high <= 0 {
		return math.NaN()
	}
	return numeric.Zero(excess, r.swc, r.swmax, low, high)
}
