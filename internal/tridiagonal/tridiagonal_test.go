package tridiagonal

import (
	"math"
	"math/rand/v2"
	"testing"

	"gonum.org/v1/gonum/mat"
)

// The reference is the elimination with pivoting of gonum, for matrices that are diagonally dominant
// by columns, as those of finite volumes are.
func TestAgainstPivoting(t *testing.T) {
	rng := rand.New(rand.NewPCG(1, 2))
	for n := 2; n <= 40; n++ {
		lower, diagonal, upper, b := make([]float64, n), make([]float64, n), make([]float64, n), make([]float64, n)
		for i := range n {
			lower[i], upper[i], b[i] = -math.Exp(6*rng.Float64()), -math.Exp(6*rng.Float64()), rng.NormFloat64()
		}
		lower[0], upper[n-1] = math.NaN(), math.NaN() // not read
		for i := range n {
			diagonal[i] = 1 + rng.Float64()
			if i > 0 {
				diagonal[i] -= upper[i-1]
			}
			if i < n-1 {
				diagonal[i] -= lower[i+1]
			}
		}
		var want mat.VecDense
		m := mat.NewTridiag(n, lower[1:], diagonal, upper[:n-1])
		if err := m.SolveVecTo(&want, false, mat.NewVecDense(n, append([]float64(nil), b...))); err != nil {
			t.Fatal(err)
		}
		s := New(n)
		for range 2 { // a second time with the storage of the first
			got := append([]float64(nil), b...)
			s.Factor(lower, diagonal, upper)
			s.Solve(got)
			scale := mat.Norm(&want, math.Inf(1))
			for i, g := range got {
				if w := want.AtVec(i); !(math.Abs(g-w) <= 1e-13*scale) {
					t.Errorf("n = %d, x[%d] = %g, want %g to 1e-13 of %g", n, i, g, w, scale)
				}
			}
		}
	}
}

func TestNoAllocation(t *testing.T) {
	n := 50
	s := New(n)
	a, d, b := make([]float64, n), make([]float64, n), make([]float64, n)
	for i := range d {
		a[i], d[i], b[i] = 1, 3, 1
	}
	if got := testing.AllocsPerRun(10, func() { s.Factor(a, d, a); s.Solve(b) }); got != 0 {
		t.Errorf("%g allocations for an elimination, want 0", got)
	}
}

func BenchmarkSolve(b *testing.B) {
	const n = 101
	s := New(n)
	a, d, x := make([]float64, n), make([]float64, n), make([]float64, n)
	for i := range d {
		a[i], d[i], x[i] = -1, 3, 1
	}
	s.Factor(a, d, a)
	for b.Loop() {
		s.Solve(x)
		for i := range x {
			x[i] = 1
		}
	}
}
