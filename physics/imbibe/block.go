package imbibe

import (
	"math"
	"slices"
)

// Block is what a block soaks up against time.
type Block struct {
	Recovery
	Shape    Shape
	Error    float64   // estimated, the largest, in shares of what can be soaked up
	Balance  float64   // what is in the block less what passed its open faces, over the former: rounding
	Finished bool      // whether the times reach to 99% of what can be soaked up
	Profiles []Profile // of a block of one axis
}

// Profile is water saturation against the distance from the open face inwards, m.
type Profile struct {
	Time, Share  float64 // s; of what can be soaked up, by then
	Distance, Sw []float64
}

// profileShares are the shares of what can be soaked up at which profiles are kept.
var profileShares = [...]float64{0.1, 0.3, 0.5, 0.7, 0.9}

const (
	// Nodes begin at firstShare for each time that a shape's axes count their reach in
	// its open area: before it the water stands in the first few cells.
	firstShare = 0.01
	// The start of all blocks is that of a slab, which is a half space until its end is
	// met: with no diffusivity does it feel that by this share.
	halfSpaceShare = 0.1
	// A run ends at lastShare, or at lateSpan times the time of half of it: where Dc
	// vanishes at S0 the last percent may take for ever.
	lastShare, lateSpan = 0.99, 1000.0
	maxSpread           = 2
)

// accuracy of the runs of one axis.
type accuracy struct {
	cells     int     // of the coarser grid
	tolerance float64 // of a time step, over what has soaked in by then
}

// usual keeps the recovery of one axis within about 5e-5 of what can be soaked up.
var usual = accuracy{32, 1e-4}

// Soak fills a block of the rock. A block of one axis is solved on two grids with the same
// times, n and 2n cells, and extrapolated, R = (4 R_2n - R_n)/3, the scheme being of second
// order; one of several axes as a crossing. err says when steps had to be made too small
// to go on. The last few blocks are remembered, and not to be written to.
func (m *Matrix) Soak(shape Shape) (*Block, error) {
	for _, b := range m.blocks {
		if slices.Equal(b.Shape, shape) {
			return b, nil
		}
	}
	b, err := m.fill(shape)
	if err != nil {
		return nil, err
	}
	const remembered = 6
	m.blocks = append(m.blocks[max(0, len(m.blocks)+1-remembered):], b)
	return b, nil
}

func (m *Matrix) fill(shape Shape) (*Block, error) {
	for _, a := range append(Shape{{1, 0}}, shape...) {
		if m.axes[a.Spread] == nil {
			run, err := m.axis(a.Spread, usual)
			if err != nil {
				return nil, err
			}
			if m.axes[a.Spread] = run; a.Spread == 0 {
				time := run.TimeAt(halfSpaceShare)
				m.early = halfSpaceShare / math.Sqrt(time)
			}
			run.cells[0].D0 = m.early * float64(a.Spread+1)
		}
	}
	if len(shape) > 1 {
		return m.cross(shape)
	}
	run, reach := m.axes[shape[0].Spread], shape[0].Reach
	b := &Block{Recovery: run.stretched(reach * reach), Shape: shape, Error: run.err, Balance: run.balance, Finished: run.finished}
	for _, p := range run.profiles {
		stretched := Profile{Time: p.Time * reach * reach, Share: p.Share, Sw: p.Sw, Distance: make([]float64, len(p.Distance))}
		for i, x := range p.Distance {
			stretched.Distance[i] = x * reach
		}
		b.Profiles = append(b.Profiles, stretched)
	}
	return b, nil
}

// axisBlock is a block of one axis with a reach of 1 m. What any other soaks up follows from
// it: only the time over the square of the reach counts.
type axisBlock struct {
	Recovery
	err, balance float64
	finished     bool
	profiles     []Profile
}

func (m *Matrix) axis(spread int, acc accuracy) (*axisBlock, error) {
	coarse := newAxisRun(m, Axis{1, spread}, acc.cells, acc.tolerance, grading)
	fine := newAxisRun(m, Axis{1, spread}, 2*acc.cells, acc.tolerance, grading)
	b := &axisBlock{}
	middle := math.Inf(1)
	for share := 0.0; share < lastShare && coarse.time < lateSpan*middle; {
		if err := coarse.advance(math.Inf(1), true); err != nil {
			return nil, err
		}
		if share = coarse.mean() / m.width; share < firstShare*float64(spread+1) {
			continue
		}
		if share >= 0.5 {
			middle = math.Min(middle, coarse.time)
		}
		if err := fine.advance(coarse.time, false); err != nil {
			return nil, err
		}
		finer := fine.mean() / m.width
		b.err = math.Max(b.err, math.Abs(finer-share)/3)
		b.add(coarse.time*m.porosity, (4*finer-share)/3, (4*fine.rate-coarse.rate)/(3*m.width*m.porosity))
		if k := len(b.profiles); k < len(profileShares) && share >= profileShares[k] {
			b.profiles = append(b.profiles, fine.profile())
		}
		b.finished = share >= lastShare
	}
	if math.IsInf(middle, 1) { // the time ran out of range before half was in
		return nil, errStalled
	}
	soaked := fine.mean()
	b.balance = (soaked - fine.inflow) / soaked
	return b, nil
}
