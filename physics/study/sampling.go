package study

import (
	"math"
	"slices"

	"brinefront/physics/displace"
)

// How densely pictures are drawn.
const (
	curvePoints   = 120  // of a curve over saturation
	historyPoints = 90   // evenly over injected volume, beside the places where something happens
	profilePoints = 80   // of a profile over speed, beside the states of the path
	finest        = 1e-3 // part of an axis below which two points are one
	// aside is the relative step to either side of an arriving shock.
	aside = 1e-11
)

// saturations spreads points over a range of saturation: evenly, at the knots of
// a table while they are few enough to be seen, and closing in on both ends, where
// a log axis looks.
func saturations(low, high float64, knots []float64) []float64 {
	var list []float64
	width := high - low
	for i := range curvePoints + 1 {
		list = append(list, low+width*float64(i)/curvePoints)
	}
	for near := width / curvePoints / 2; near > width*1e-4; near /= 2 {
		list = append(list, low+near, high-near)
	}
	if len(knots) <= 2*curvePoints {
		for _, k := range knots {
			if k > low && k < high {
				list = append(list, k)
			}
		}
	}
	list[curvePoints] = high
	slices.Sort(list)
	return slices.Compact(list)
}

// injections spreads points over the volume injected from nothing to end, in pore
// volumes: evenly up to breakthrough and after it, at the states that arrive at
// the outlet one by one, and on both sides of every shock that can be seen. Extra
// points are put in as they are.
func injections(d *displace.Displacement, end float64, extra ...float64) []float64 {
	bt := math.Min(d.Breakthrough(), end)
	list := []float64{0}
	for i := range historyPoints / 3 {
		list = append(list, bt*float64(i+1)/(historyPoints/3))
	}
	for i := range historyPoints {
		share := float64(i+1) / historyPoints
		list = append(list, bt+(end-bt)*share*share) // closing in on breakthrough
	}
	nodes := d.Path()
	visible := finest * math.Abs(d.Injected()-d.Initial())
	last := math.Inf(1)
	for i := len(nodes) - 1; i >= 0; i-- {
		n := nodes[i]
		q := 1 / n.Xi
		if q > end {
			break
		}
		shock := i > 0 && nodes[i-1].Xi == n.Xi && math.Abs(nodes[i-1].S-n.S) > visible
		switch {
		case shock:
			list = append(list, q*(1-aside), q*(1+aside))
			last = q
		case math.Abs(q-last) > finest*end:
			list = append(list, q)
			last = q
		}
	}
	for _, q := range extra {
		if q > 0 && q <= end {
			list = append(list, q)
		}
	}
	slices.Sort(list)
	return slices.Compact(list)
}

// profile is saturation against the speed at which it travels, from the inlet face to
// the state ahead of the front: the states of the path that can be told apart, and
// between them speeds that close in on the inlet, where a flood of many pore volumes
// spreads the slowest few over the whole length.
func (f *front) profile() (speed, sw []float64) {
	d := f.displacement
	face, _ := d.InletFace()
	speed, sw = []float64{0}, []float64{face}
	step := finest * d.FrontSpeed()
	visible := finest * (f.swj - f.swi)
	nodes := d.Path()
	kept := displace.Node{S: face}
	k := 1
	for i, n := range nodes {
		for ; k < profilePoints; k++ {
			share := float64(k) / profilePoints
			v := d.FrontSpeed() * share * share * share
			if v >= n.Xi {
				break
			}
			if v > speed[len(speed)-1] {
				speed, sw = append(speed, v), append(sw, d.Saturation(v))
			}
		}
		if n.Xi-kept.Xi > step || math.Abs(n.S-kept.S) > visible || i == len(nodes)-1 {
			kept = n
			speed, sw = append(speed, n.Xi), append(sw, n.S)
		}
	}
	return speed, sw
}
