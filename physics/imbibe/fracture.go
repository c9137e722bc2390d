package imbibe

import (
	"fmt"
	"math"
)

// Fraction is blocks of one size in a rock: their share of its pore volume, and their size
// over that of the block whose uptake is known.
type Fraction struct{ Share, Size float64 }

// Mixed is the uptake of blocks of one shape and several sizes. What each soaks up depends on
// time over the square of its size. Shares add up to 1.
type Mixed struct {
	Of        Uptake
	Fractions []Fraction
}

// At implements Uptake.
func (m Mixed) At(t float64) (share, rate float64) {
	for _, f := range m.Fractions {
		s, v := Stretched{m.Of, f.Size * f.Size}.At(t)
		share, rate = share+f.Share*s, rate+f.Share*v
	}
	return share, rate
}

// FractureFlood is water that advances along fractures at a constant rate while the rock
// beside them takes it up (de Swaan 1978; Kazemi, Gilman and Elsharkawy 1992):
//
//	Vf dS/dt + q dS/dx + Vm d/dt int_0^t G(t-tau) dS/dtau dtau = 0,  S(0, t) = 1
//
// S is the share of water in the fractures' flow, x the way from 0 to 1, G the uptake of rock
// that touches water from a time on. In the time since the water could first be at a
// place, T = t - x Vf/q, the fractures' own volume drops out. The rock is taken to see water in
// proportion to S, and the fractures to let both fluids pass alike.
type FractureFlood struct {
	Own  float64 // Vf/q, s: time to fill the fractures
	Rock float64 // Vm/q, s: time to fill what the rock can take up
}

// Stream is what comes out of the fractures.
type Stream struct {
	Times []float64 // s, since injection began; the first is Own, when water could first arrive
	Cut   []float64 // share of water in what is produced
	Taken []float64 // by the rock, share of what it can take up
	Kept  []float64 // share of the water injected since the start that has not come out
}

const (
	fewestCells, mostCells = 20, 120
	fractureSteps          = 150
)

// Run follows the flood up to a time, above Own. Each of n cells hands on what its rock
// leaves of the water, in steps of equal length: upstream along the fractures, implicit in
// time, so that no cut leaves the range from 0 to 1. That is of first order in both; of two
// runs, the second with twice as many cells and steps, the leading error is taken out. What
// the rock gains is what the stream loses, to rounding.
//
// There are as many cells as the time to fill the rock holds times of soaking, from 20 to 120:
// where it holds more, the front in the fractures is drawn wider than it is.
func (f FractureFlood) Run(g Uptake, until float64) (*Stream, error) {
	if !(f.Own >= 0 && f.Rock > 0 && until > f.Own && until < math.Inf(1)) {
		return nil, fmt.Errorf("imbibe: fractures filled after %.6g s, rock after %.6g s, a flood until %.6g s; allowed: times from 0, above 0 and above the first", f.Own, f.Rock, until)
	}
	step := (until - f.Own) / fractureSteps
	n := int(math.Min(mostCells, math.Max(fewestCells, f.Rock/TimeOf(g, 1-1/math.E))))
	coarse := f.cascade(g, step, n, fractureSteps)
	fine := f.cascade(g, step/2, 2*n, 2*fractureSteps)
	s := &Stream{}
	outCoarse, outFine := 0.0, 0.0
	for n := range coarse {
		if n > 0 {
			outCoarse += step * coarse[n]
			outFine += step / 2 * (fine[2*n-1] + fine[2*n])
		}
		since, out := float64(n)*step, 2*outFine-outCoarse
		s.Times = append(s.Times, f.Own+since)
		s.Cut = append(s.Cut, math.Min(1, math.Max(0, 2*fine[2*n]-coarse[n])))
		s.Taken = append(s.Taken, (since-out)/f.Rock)
		s.Kept = append(s.Kept, 1-out/math.Max(f.Own+since, math.SmallestNonzeroFloat64))
	}
	return s, nil
}

// meanUptake is the mean of an uptake over a time; in sqrt(t), in which it is smooth, by the
// rule of Gauss and Legendre with three points.
func meanUptake(g Uptake, from, to float64) float64 {
	a, b := math.Sqrt(from), math.Sqrt(to)
	const far = 0.3872983346207417
	sum := 0.0
	for _, p := range [...]struct{ x, w float64 }{{0.5 - far, 5.0 / 18}, {0.5, 8.0 / 18}, {0.5 + far, 5.0 / 18}} {
		root := a + p.x*(b-a)
		share, _ := g.At(root * root)
		sum += p.w * share * 2 * root
	}
	return sum * (b - a) / (to - from)
}

// cascade returns the share of water behind the last of n cells, step by step. The rock
// of a cell sees the water at its outlet, which changes evenly in a step:
//
//	held = out(0) G + sum of changes times the mean of G over their step
//	held(k) - held(k-1) = (in(k) - out(k)) step n q/Vm
func (f FractureFlood) cascade(g Uptake, step float64, n, steps int) []float64 {
	first, means := make([]float64, steps+1), make([]float64, steps)
	for k := range means {
		first[k+1], _ = g.At(float64(k+1) * step)
		means[k] = meanUptake(g, float64(k)*step, float64(k+1)*step)
	}
	part := f.Rock / float64(n)
	_, rate := g.At(0)
	passes := 1 / (1 + part*rate) // of the first water: none where rock soaks like sqrt(t)
	in, out, changes := make([]float64, steps+1), make([]float64, steps+1), make([]float64, steps)
	for k := range in {
		in[k] = 1
	}
	for range n {
		out[0] = in[0] * passes
		held := 0.0
		for k := 1; k <= steps; k++ {
			known := out[0] * first[k]
			for j, c := range changes[:k-1] {
				known += c * means[k-1-j]
			}
			change := (step/part*(in[k]-out[k-1]) - known + held) / (step/part + means[0])
			changes[k-1], out[k] = change, out[k-1]+change
			held = known + change*means[0]
		}
		in, out = out, in
	}
	return in
}
