package rosenbrock

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/mat"
)

// method returns the coefficients in the untransformed form of E. Hairer and G. Wanner, Solving Ordinary
// Differential Equations II, section IV.7 (from memory): A = (α_ij), B = (α_ij + γ_ij), and the weights b
// of the solution and of the embedded one. With the transformation there, Γ = (1/γ − C)⁻¹, A = aΓ, b =
// mΓ.
func method(t *testing.T) (A, B mat.Dense, b, embedded mat.VecDense) {
	a, c := mat.NewDense(stages, stages, nil), mat.NewDense(stages, stages, nil)
	for i, row := range [][]float64{a2[:], a3[:], a4[:], a5[:], append(append([]float64(nil), a5[:]...), 1)} {
		for j, v := range row {
			a.Set(i+1, j, v)
		}
	}
	for i, row := range [][]float64{c2[:], c3[:], c4[:], c5[:], c6[:]} {
		for j, v := range row {
			c.Set(i+1, j, -v)
		}
	}
	for i := range stages {
		c.Set(i, i, 1/Gamma)
	}
	var G mat.Dense
	if err := G.Inverse(c); err != nil {
		t.Fatal(err)
	}
	A.Mul(a, &G)
	B.Add(&A, &G)
	m := mat.NewVecDense(stages, append(append([]float64(nil), a5[:]...), 1, 1))
	b.MulVec(G.T(), m)
	m.SetVec(5, 0) // the error estimate is u6
	embedded.MulVec(G.T(), m)
	return A, B, b, embedded
}

func rowSums(m *mat.Dense) []float64 {
	s := make([]float64, stages)
	for i := range s {
		s[i] = mat.Sum(m.RowView(i))
	}
	return s
}

// Order conditions of a Rosenbrock method: E. Hairer and G. Wanner, Solving Ordinary Differential
// Equations II, 2nd ed., (7.11) and Table 7.1 with β_ij = α_ij + γ_ij (from memory). Coefficients have 16
// digits and are up to 57, hence the tolerance.
func TestOrderConditions(t *testing.T) {
	A, B, b, embedded := method(t)
	al, be := rowSums(&A), rowSums(&B)
	sum := func(w *mat.VecDense, f func(i int) float64) float64 {
		s := 0.0
		for i := range stages {
			s += w.AtVec(i) * f(i)
		}
		return s
	}
	times := func(m *mat.Dense, v func(int) float64) func(int) float64 {
		return func(i int) float64 {
			s := 0.0
			for j := range stages {
				s += m.At(i, j) * v(j)
			}
			return s
		}
	}
	beta := func(i int) float64 { return be[i] }
	square := func(i int) float64 { return al[i] * al[i] }
	conditions := []struct {
		order int
		name  string
		term  func(i int) float64
		want  float64
	}{
		{1, "b", func(int) float64 { return 1 }, 1},
		{2, "b β", beta, 1.0 / 2},
		{3, "b α²", square, 1.0 / 3},
		{3, "b β β", times(&B, beta), 1.0 / 6},
		{4, "b α³", func(i int) float64 { return al[i] * al[i] * al[i] }, 1.0 / 4},
		{4, "b α (α β)", func(i int) float64 { return al[i] * times(&A, beta)(i) }, 1.0 / 8},
		{4, "b β α²", times(&B, square), 1.0 / 12},
		{4, "b β β β", times(&B, times(&B, beta)), 1.0 / 24},
	}
	const tol = 1e-13
	for _, c := range conditions {
		if got := sum(&b, c.term); math.Abs(got-c.want) > tol {
			t.Errorf("order %d, %s: %.16g, want %.16g to %g", c.order, c.name, got, c.want, tol)
		}
		if got := sum(&embedded, c.term); c.order <= 3 && math.Abs(got-c.want) > tol {
			t.Errorf("embedded, order %d, %s: %.16g, want %.16g to %g", c.order, c.name, got, c.want, tol)
		}
	}
	for i := range stages {
		if math.Abs(al[i]-alpha[i]) > tol {
			t.Errorf("α%d: %g, want the row sum %g", i+1, alpha[i], al[i])
		}
		if got := be[i] - al[i]; math.Abs(got-gamma[i]) > tol {
			t.Errorf("γ%d: %g, want the row sum %g", i+1, gamma[i], got)
		}
		// Stiffly accurate: the last row is the weights (section IV.7, "Rosenbrock methods for stiff
		// problems").
		if got := B.At(stages-1, i); math.Abs(got-b.AtVec(i)) > tol {
			t.Errorf("β6%d: %g, want the weight %g", i+1, got, b.AtVec(i))
		}
	}
}

// L-stability: the stability function R(z) = 1 + z bᵀ(1 − zB)⁻¹1 is at most 1 in size on the negative half
// plane and tends to 0 (Hairer and Wanner, (7.14), from memory).
func TestStability(t *testing.T) {
	_, B, b, _ := method(t)
	// Real form of the complex system for z = iy, and the limit.
	var inverse mat.Dense
	if err := inverse.Inverse(&B); err != nil {
		t.Fatal(err)
	}
	limit := 1.0
	for i := range stages {
		for j := range stages {
			limit -= b.AtVec(i) * inverse.At(i, j)
		}
	}
	if math.Abs(limit) > 1e-10 {
		t.Errorf("R(∞) = %g, want 0 to 1e-10", limit)
	}
	for y := 0.01; y < 1e4; y *= 1.1 {
		// (1 − iyB)x = 1 with x = p + iq: p + yBq = 1, q − yBp = 0.
		m := mat.NewDense(2*stages, 2*stages, nil)
		rhs := mat.NewVecDense(2*stages, nil)
		for i := range stages {
			rhs.SetVec(i, 1)
			m.Set(i, i, 1)
			m.Set(stages+i, stages+i, 1)
			for j := range stages {
				m.Set(i, stages+j, y*B.At(i, j))
				m.Set(stages+i, j, -y*B.At(i, j))
			}
		}
		var x mat.VecDense
		if err := x.SolveVec(m, rhs); err != nil {
			t.Fatal(err)
		}
		re, im := 1.0, 0.0
		for i := range stages {
			re -= y * b.AtVec(i) * x.AtVec(stages+i)
			im += y * b.AtVec(i) * x.AtVec(i)
		}
		if r := math.Hypot(re, im); r > 1+1e-10 {
			t.Errorf("|R(%g i)| = %.12g, want at most 1", y, r)
		}
	}
}
