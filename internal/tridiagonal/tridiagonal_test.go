package tridiagonal

import (
	"fmt"
	"math"
	"math/rand/v2"
	"testing"

	"gonum.org/v1/gonum/mat"
)

// The reference is the elimination with pivoting of gonum.
func TestAgainstPivoting(t *testing.T) {
	rng := rand.New(rand.NewPCG(1, 2))
	for n := 2; n <= 40; n++ {
		lower, sums, upper, b := make([]float64, n), make([]float64, n), make([]float64, n), make([]float64, n)
		for i := range n {
			lower[i], upper[i], b[i] = -math.Exp(6*rng.Float64()), -math.Exp(6*rng.Float64()), rng.NormFloat64()
			sums[i] = 1 + rng.Float64()
		}
		lower[0], upper[n-1] = math.NaN(), math.NaN() // not read
		var want mat.VecDense
		m := mat.NewTridiag(n, lower[1:], diagonal(lower, sums, upper), upper[:n-1])
		if err := m.SolveVecTo(&want, false, mat.NewVecDense(n, append([]float64(nil), b...))); err != nil {
			t.Fatal(err)
		}
		s := New(n)
		for range 2 { // a second time with the storage of the first
			got := append([]float64(nil), b...)
			s.Factor(lower, sums, upper)
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

func diagonal(lower, sums, upper []float64) []float64 {
	d := append([]float64(nil), sums...)
	for i := range d {
		if i > 0 {
			d[i] -= upper[i-1]
		}
		if i < len(d)-1 {
			d[i] -= lower[i+1]
		}
	}
	return d
}

// A law of conservation: the sums of the columns times the solution add up to the sum of the right-hand side, also where the
// couplings are greater by 12 orders of magnitude, of which an elimination with the diagonal leaves 4 digits.
func TestNothingIsLost(t *testing.T) {
	rng := rand.New(rand.NewPCG(3, 4))
	for n := 2; n <= 400; n += 1 + n/7 {
		lower, sums, upper, b := make([]float64, n), make([]float64, n), make([]float64, n), make([]float64, n)
		given := 0.0
		for i := range n {
			lower[i], upper[i] = -math.Exp(28*rng.Float64()), -math.Exp(28*rng.Float64())
			sums[i], b[i] = 1, rng.Float64()
			given += b[i]
		}
		s := New(n)
		s.Factor(lower, sums, upper)
		s.Solve(b)
		sum := 0.0
		for i, x := range b {
			if !(x > 0) { // as the inverse of such a matrix has no negative entry
				t.Errorf("n = %d: x[%d] = %g, want above 0", n, i, x)
			}
			sum += x
		}
		if !(math.Abs(sum/given-1) <= 1e-12) {
			t.Errorf("n = %d: solution adds up to %.15g, want %.15g to 1e-12", n, sum, given)
		}
	}
}

func TestNoAllocation(t *testing.T) {
	n := 50
	s := New(n)
	a, d, b := make([]float64, n), make([]float64, n), make([]float64, n)
	for i := range d {
		a[i], d[i], b[i] = -1, 3, 1
	}
	if got := testing.AllocsPerRun(10, func() { s.Factor(a, d, a); s.Solve(b) }); got != 0 {
		t.Errorf("%g allocations for an elimination, want 0", got)
	}
}

func BenchmarkElimination(b *testing.B) {
	for _, n := range []int{51, 201, 1001} {
		s := New(n)
		a, d, x := make([]float64, n), make([]float64, n), make([]float64, n)
		for i := range d {
			a[i], d[i], x[i] = -1, 1, 1
		}
		b.Run(fmt.Sprintf("Factor/%d", n), func(b *testing.B) {
			for b.Loop() {
				s.Factor(a, d, a)
			}
		})
		b.Run(fmt.Sprintf("Solve/%d", n), func(b *testing.B) {
			for b.Loop() {
				s.Solve(x)
				x[n/3], x[2*n/3] = 1, 1
			}
		})
	}
}
