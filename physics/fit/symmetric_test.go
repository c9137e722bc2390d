package fit

import (
	"math"
	"math/rand/v2"
	"testing"

	"gonum.org/v1/gonum/mat"
)

// curvature is a random matrix XᵀX with columns of very different lengths, as the
// curvatures of fits are.
func curvature(random *rand.Rand, n int) symmetric {
	x := mat.NewDense(n+3, n, nil)
	for j := range n {
		length := math.Pow(10, random.Float64()*4-2)
		for i := range n + 3 {
			x.Set(i, j, length*random.NormFloat64())
		}
	}
	var product mat.Dense
	product.Mul(x.T(), x)
	a := newSymmetric(n)
	for j := range n {
		for k := range n {
			a.set(j, k, product.At(j, k))
		}
	}
	return a
}

func (a symmetric) dense() *mat.SymDense { return mat.NewSymDense(a.n, append([]float64{}, a.v...)) }

// TestSolve: gonum's factorisation is the independent authority. Both solutions
// err by rounding times the condition number.
func TestSolve(t *testing.T) {
	random := rand.New(rand.NewPCG(1, 2))
	for n := 1; n <= 10; n++ {
		for range 50 {
			a := curvature(random, n)
			b := mat.NewVecDense(n, nil)
			for j := range n {
				b.SetVec(j, random.NormFloat64())
			}
			var cholesky mat.Cholesky
			if !cholesky.Factorize(a.dense()) {
				t.Fatal("not positive definite")
			}
			var want mat.VecDense
			if err := cholesky.SolveVecTo(&want, b); err != nil {
				t.Fatal(err)
			}
			got := append([]float64{}, b.RawVector().Data...)
			if !a.solve(got) {
				t.Fatalf("n = %d: refused", n)
			}
			var difference mat.VecDense
			difference.SubVec(mat.NewVecDense(n, got), &want)
			if limit := 1e-15 * cholesky.Cond() * mat.Norm(&want, 2); mat.Norm(&difference, 2) > limit {
				t.Errorf("n = %d: %v, want %v within %g", n, got, want.RawVector().Data, limit)
			}
		}
	}
}

func TestSolveRefuses(t *testing.T) {
	for _, v := range [][]float64{{0}, {-1}, {math.NaN()}, {1, 2, 2, 1}, {1, 1, 1, 1}} {
		n := int(math.Sqrt(float64(len(v))))
		if (symmetric{n, v}).solve(make([]float64, n)) {
			t.Errorf("took %v", v)
		}
	}
}

// TestEigen: gonum's eigenvalues are the independent authority, good to rounding of
// the largest. The vectors are held to what defines them.
func TestEigen(t *testing.T) {
	random := rand.New(rand.NewPCG(3, 4))
	for n := 1; n <= 10; n++ {
		for range 50 {
			a := curvature(random, n)
			whole := a.dense()
			var authority mat.EigenSym
			if !authority.Factorize(whole, false) {
				t.Fatal("no eigenvalues")
			}
			want := authority.Values(nil)
			limit := 1e-14 * want[n-1]
			values, vectors, ok := a.eigen()
			if !ok {
				t.Fatalf("n = %d: did not end", n)
			}
			for e, value := range values {
				closest := math.Inf(1)
				for _, w := range want {
					closest = min(closest, math.Abs(value-w))
				}
				if closest > limit {
					t.Errorf("n = %d: eigenvalue %g is none of %v", n, value, want)
				}
				length := 0.0
				for j := range n {
					turned := 0.0
					for k := range n {
						turned += whole.At(j, k) * vectors[k][e]
					}
					if math.Abs(turned-value*vectors[j][e]) > limit {
						t.Errorf("n = %d: the vector of %g is turned", n, value)
					}
					length += vectors[j][e] * vectors[j][e]
				}
				if math.Abs(length-1) > 1e-14 {
					t.Errorf("n = %d: a vector of squared length %g", n, length)
				}
			}
		}
	}
	if _, _, ok := (symmetric{2, []float64{1, math.NaN(), math.NaN(), 1}}).eigen(); ok {
		t.Error("found eigenvalues of what is no number")
	}
}
