package imbibe

import "math"

// A block that soaks along several axes at once. At a constant diffusivity what is left is
// the product of what each axis alone would leave (Newman 1936); where Dc varies that is so
// only until the waters of two faces meet. So the block is solved in two or three dimensions,
// coarsely, and the product gives what the coarse grid cannot:
//
//	R = product on fine grids + (block - product) on the coarse grid
//
// The bracket has the same cells and steps in both its terms, and their errors cancel for
// the most part.

// crossing steps a block of several axes by fractional steps (Yanenko 1971): an implicit
// Euler step along each axis in turn, in reversed order every other time. Each conserves
// mass and makes no new extrema.
type crossing struct {
	lines, alone []*axisRun // of each axis: to solve a line of the block at a time, and by itself
	u, volume    []float64  // S - Si in each cell of the block, and its volume over that of the block
	inflow       float64    // through the open faces since the start, pore volumes
	back         bool
}

func newCrossing(m *Matrix, shape Shape, cells int) *crossing {
	c := &crossing{volume: []float64{1}}
	for _, a := range shape {
		line := newAxisRun(m, a, cells, 1, grading)
		c.lines, c.alone = append(c.lines, line), append(c.alone, newAxisRun(m, a, cells, 1, grading))
		wider := make([]float64, 0, cells*len(c.volume))
		for _, v := range line.volume {
			for _, w := range c.volume {
				wider = append(wider, v*w)
			}
		}
		c.volume = wider
	}
	c.u = make([]float64, len(c.volume))
	return c
}

// euler takes one implicit step of an axis.
func (r *axisRun) euler(h float64) error {
	copy(r.next, r.u)
	for i, v := range r.volume {
		r.base[i] = v * r.u[i]
	}
	if !r.solve(h, 0) {
		return errStalled
	}
	r.u, r.next = r.next, r.u
	return nil
}

// step moves the block, and each axis alone, on by h of theta.
func (c *crossing) step(h float64) error {
	for k := range c.lines {
		if err := c.alone[k].euler(h); err != nil {
			return err
		}
		axis := k
		if c.back {
			axis = len(c.lines) - 1 - k
		}
		if err := c.sweep(axis, h); err != nil {
			return err
		}
	}
	c.back = !c.back
	return nil
}

// sweep steps every line along an axis.
func (c *crossing) sweep(axis int, h float64) error {
	line := c.lines[axis]
	n, stride := len(line.u), 1
	for range axis {
		stride *= n
	}
	for start := range c.u {
		if start/stride%n != 0 {
			continue
		}
		for i := range n {
			line.u[i] = c.u[start+i*stride]
		}
		if err := line.euler(h); err != nil {
			return err
		}
		for i := range n {
			c.u[start+i*stride] = line.u[i]
		}
		c.inflow += h * line.entering[0] * c.volume[start] / line.volume[0]
	}
	return nil
}

// mean is the recovery so far, in pore volumes.
func (c *crossing) mean() (sum float64) {
	for i, v := range c.volume {
		sum += v * c.u[i]
	}
	return sum
}

// product is what the axes alone give on the coarse grid, in shares of what can be soaked up.
func (c *crossing) product() float64 {
	left := 1.0
	for _, r := range c.alone {
		left *= 1 - r.mean()/r.m.width
	}
	return 1 - left
}

// crossingError is the error of the share of a block of several axes: the largest difference
// from explicit computations of nine blocks in the tests, rounded up.
const crossingError = 0.005

// cross computes the recovery of a block of several axes.
func (m *Matrix) cross(shape Shape) (*Block, error) {
	cells, growth := 18, 1.12
	if len(shape) > 2 {
		cells, growth = 9, 1.2
	}
	c := newCrossing(m, shape, cells)
	b := &Block{Shape: shape, Error: crossingError}
	var times, shifts []float64
	start := math.Pow(firstShare/(m.early*shape.OpenArea()), 2)
	middle, before := math.Inf(1), 0.0
	for t, share := start, 0.0; share < lastShare && t < lateSpan*middle; t *= growth {
		if err := c.step((t - before) / m.porosity); err != nil {
			return nil, err
		}
		before = t
		shift := c.mean()/m.width - c.product()
		times, shifts = append(times, t), append(shifts, shift)
		product, _ := m.product(shape, t)
		if share = product + shift; share >= 0.5 {
			middle = math.Min(middle, t)
		}
		b.Finished = share >= lastShare
	}
	for i, t := range times {
		share, rate := m.product(shape, t)
		j, k := max(0, i-1), min(len(times)-1, i+1)
		b.add(t, share+shifts[i], math.Max(0, rate+(shifts[k]-shifts[j])/(times[k]-times[j])))
	}
	b.cells[0].D0 = m.early * shape.OpenArea()
	soaked := c.mean()
	b.Balance = (soaked - c.inflow) / soaked
	return b, nil
}

// product is what the axes alone give on fine grids, and its rate, 1/s.
func (m *Matrix) product(shape Shape, t float64) (share, rate float64) {
	left := 1.0
	for _, a := range shape {
		square := a.Reach * a.Reach
		r, v := m.axes[a.Spread].At(t / square)
		left *= 1 - r
		rate += v / square / (1 - r)
	}
	return 1 - left, rate * left
}
