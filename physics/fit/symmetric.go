package fit

import "math"

// symmetric is a full symmetric matrix, row by row. A fit has few parameters, and
// for matrices of this size the plain algorithms below are exact to rounding and
// several times faster than those made for large ones.
type symmetric struct {
	n int
	v []float64
}

func newSymmetric(n int) symmetric { return symmetric{n, make([]float64, n*n)} }

func (a symmetric) at(j, k int) float64 { return a.v[j*a.n+k] }

// set sets an element and its mirror image.
func (a symmetric) set(j, k int, value float64) { a.v[j*a.n+k], a.v[k*a.n+j] = value, value }

// solve replaces b by the solution x of a x = b, and the lower triangle of a by its
// Cholesky factor. It reports false, and leaves both unusable, when a is not
// positive definite to rounding. Source: Golub & Van Loan (2013), algorithm 4.2.1.
func (a symmetric) solve(b []float64) bool {
	for j := range a.n {
		row := a.v[j*a.n : j*a.n+j+1]
		for k := range row {
			sum := row[k]
			other := a.v[k*a.n : k*a.n+k+1]
			for i, v := range row[:k] {
				sum -= v * other[i]
			}
			switch {
			case k < j:
				row[k] = sum / other[k]
			case !(sum > 0):
				return false
			default:
				row[k] = math.Sqrt(sum)
			}
		}
		for i, v := range row[:j] {
			b[j] -= v * b[i]
		}
		b[j] /= row[j]
	}
	for j := a.n - 1; j >= 0; j-- {
		b[j] /= a.at(j, j)
		for k := range j {
			b[k] -= a.at(j, k) * b[j]
		}
	}
	return true
}

const (
	sweepLimit = 50    // a handful is usual: convergence is quadratic
	diagonal   = 1e-17 // of the trace: what is left beside the diagonal no longer counts
)

// eigen returns the eigenvalues of a, in no order, and their unit vectors, the one
// of values[e] in column e, by Jacobi's rotations (Golub & Van Loan 2013, sec.
// 8.5). It makes a diagonal, and reports false when it cannot: a holds what is no
// number.
func (a symmetric) eigen() (values []float64, vectors [][]float64, ok bool) {
	vectors = square(a.n)
	for j := range vectors {
		vectors[j][j] = 1
	}
	for range sweepLimit {
		trace, beside := 0.0, 0.0
		for j := range a.n {
			trace += math.Abs(a.at(j, j))
			for k := range j {
				beside = max(beside, math.Abs(a.at(j, k)))
			}
		}
		if beside <= diagonal*trace {
			values = make([]float64, a.n)
			for j := range values {
				values[j] = a.at(j, j)
			}
			return values, vectors, true
		}
		for j := range a.n {
			for k := range j {
				a.rotate(j, k, vectors)
			}
		}
	}
	return nil, vectors, false
}

// rotate turns the plane of j and k so that their element becomes zero.
func (a symmetric) rotate(j, k int, vectors [][]float64) {
	beside := a.at(j, k)
	if beside == 0 {
		return
	}
	// The smaller root of t² + 2 τ t - 1 = 0, the tangent of the angle.
	tau := (a.at(k, k) - a.at(j, j)) / (2 * beside)
	t := math.Copysign(1/(math.Abs(tau)+math.Hypot(1, tau)), tau)
	c := 1 / math.Hypot(1, t)
	s := t * c
	a.set(j, j, a.at(j, j)-t*beside)
	a.set(k, k, a.at(k, k)+t*beside)
	a.set(j, k, 0)
	for i := range a.n {
		if i != j && i != k {
			ij, ik := a.at(i, j), a.at(i, k)
			a.set(i, j, c*ij-s*ik)
			a.set(i, k, s*ij+c*ik)
		}
		row := vectors[i]
		row[j], row[k] = c*row[j]-s*row[k], s*row[j]+c*row[k]
	}
}
