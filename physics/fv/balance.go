package fv

import "math"

// Balance says where the displacing phase went, in pore volumes.
type Balance struct {
	In, Out float64 // through x = 0 and through x = 1, since the start
	Stored  float64 // change of the mean state
	Error   float64 // (In - Out - Stored) over the largest of them: rounding, nothing else
}

// Balance of the run so far.
func (r *Run) Balance() Balance {
	return balance(r.in.value(), r.out.value(), mean(r.Cells())-r.stored)
}

func balance(in, out, stored float64) Balance {
	b := Balance{In: in, Out: out, Stored: stored}
	if scale := max(math.Abs(b.In), math.Abs(b.Out), math.Abs(b.Stored)); scale > 0 {
		b.Error = (b.In - b.Out - b.Stored) / scale
	}
	return b
}

// sum adds up without losing what is small beside it. Neumaier (1974).
type sum struct{ total, lost float64 }

func (s *sum) add(x float64) {
	t := s.total + x
	if math.Abs(s.total) >= math.Abs(x) {
		s.lost += (s.total - t) + x
	} else {
		s.lost += (x - t) + s.total
	}
	s.total = t
}

func (s sum) value() float64 { return s.total + s.lost }

func mean(cells []float64) float64 {
	var s sum
	for _, c := range cells {
		s.add(c)
	}
	return s.value() / float64(len(cells))
}
