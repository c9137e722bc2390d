package numeric

// Cell is one interval [X0, X1] of an interpolant: values Y0, Y1 and slopes D0,
// D1 at its two ends. X0 < X1.
type Cell struct{ X0, X1, Y0, Y1, D0, D1 float64 }

// Cubic evaluates the Hermite cubic of the cell and its slope at x in [X0, X1].
//
//	t = (x-X0)/h, u = (X1-x)/h, h = X1-X0
//	y = u²[Y0(1+2t) + h D0 t] + t²[Y1(1+2u) - h D1 u]
//	y' = 6tu (Y1-Y0)/h + D0 u(u-2t) + D1 t(t-2u)
//
// Both ends are met exactly. The value is kept between Y0 and Y1, which the cubic
// of monotone slopes obeys by itself but for rounding: a relative permeability
// that runs into zero must not turn negative by the last digit.
//
// The slopes must be such that the cubic is monotone; see MonotoneCubic.
func (c Cell) Cubic(x float64) (value, slope float64) {
	h := c.X1 - c.X0
	t, u := (x-c.X0)/h, (c.X1-x)/h
	value = u*u*(c.Y0*(1+2*t)+h*c.D0*t) + t*t*(c.Y1*(1+2*u)-h*c.D1*u)
	value = c.between(value)
	slope = 6*t*u*(c.Y1-c.Y0)/h + c.D0*u*(u-2*t) + c.D1*t*(t-2*u)
	return value, slope
}

// Line evaluates the straight line of the cell and its slope at x in [X0, X1].
// Both ends are met exactly.
func (c Cell) Line(x float64) (value, slope float64) {
	h := c.X1 - c.X0
	return c.between(c.Y0*((c.X1-x)/h) + c.Y1*((x-c.X0)/h)), (c.Y1 - c.Y0) / h
}

func (c Cell) between(y float64) float64 {
	return max(min(c.Y0, c.Y1), min(y, max(c.Y0, c.Y1)))
}

// Locate returns the index of the cell of rising nodes that holds x: the cell to
// the right of a node, but the last cell for the last node. Points outside belong
// to the first and the last cell; NaN belongs to the first.
func Locate(nodes []float64, x float64) int {
	low, high := 0, len(nodes)-1
	for high-low > 1 {
		if middle := int(uint(low+high) >> 1); x >= nodes[middle] {
			low = middle
		} else {
			high = middle
		}
	}
	return low
}

// checkNodes panics unless there are at least two strictly rising nodes, one
// value to each: callers have refused such data before.
func checkNodes(x, y []float64) {
	if len(x) < 2 || len(x) != len(y) {
		panic(badLength)
	}
	if !risesStrictly(x) {
		panic(badOrder)
	}
}

func risesStrictly(x []float64) bool {
	for i := 1; i < len(x); i++ {
		if !(x[i] > x[i-1]) {
			return false
		}
	}
	return true
}

const (
	badLength = "numeric: fewer than two nodes, or nodes and values differ in number"
	badOrder  = "numeric: nodes do not rise strictly"
)
