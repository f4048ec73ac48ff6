package fv

// An elimination solves the equations of a chain in which some elements are coupled far more tightly than
// others, by a perfect contact or a prescribed temperature. It works on the sums of the columns, which are d
// and what leaves there, instead of the diagonal, so that nothing is subtracted in it and no heat is lost
// where the tight couplings cancel (after W. K. Grassmann, M. I. Taksar and D. P. Heyman, Operations Research 33,
// 1985, from memory). The order is that of package tridiagonal, from both ends to the middle.
type elimination struct {
	inverse []float64 // 1 / pivot
	first   int       // first row of the lower half
	det     float64   // 1 / determinant of the two rows in the middle
	p, q    float64   // their pivots
	lower   []float64 // entries of the matrix, not above 0
	upper   []float64
}

func newElimination(n int) *elimination {
	return &elimination{inverse: make([]float64, n), first: n / 2, lower: make([]float64, n), upper: make([]float64, n)}
}

// factor eliminates the matrix with the given entries beside the diagonal, none above 0, and sums of columns.
func (e *elimination) factor(lower, upper, sums []float64) {
	n, m := len(e.inverse), e.first
	copy(e.lower, lower)
	copy(e.upper, upper)
	lower, upper, sums = e.lower[:n], e.upper[:n], sums[:n]
	inverse := e.inverse[:n]
	s, r := sums[0], sums[n-1]
	for i := 0; i < m-1; i++ {
		inverse[i] = 1 / (s - lower[i+1])
		s = sums[i+1] - upper[i]*(s*inverse[i])
	}
	for j := n - 1; j > m; j-- {
		inverse[j] = 1 / (r - upper[j-1])
		r = sums[j-1] - lower[j]*(r*inverse[j])
	}
	u, l := upper[m-1], lower[m]
	e.p, e.q = s-l, r-u
	e.det = 1 / (s*r - s*u - r*l)
}

// solve replaces the right-hand side b by the solution.
func (e *elimination) solve(b []float64) {
	n, m := len(e.inverse), e.first
	b = b[:n]
	lower, upper, inverse := e.lower[:n], e.upper[:n], e.inverse[:n]
	for i := 1; i < m; i++ {
		b[i] -= lower[i] * (b[i-1] * inverse[i-1])
	}
	for j := n - 2; j >= m; j-- {
		b[j] -= upper[j] * (b[j+1] * inverse[j+1])
	}
	x, y := b[m-1], b[m]
	b[m-1], b[m] = (x*e.q-y*upper[m-1])*e.det, (y*e.p-x*lower[m])*e.det
	for i := m - 2; i >= 0; i-- {
		b[i] = (b[i] - upper[i]*b[i+1]) * inverse[i]
	}
	for j := m + 1; j < n; j++ {
		b[j] = (b[j] - lower[j]*b[j-1]) * inverse[j]
	}
}
