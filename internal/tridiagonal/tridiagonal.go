// Package tridiagonal solves diagonally dominant tridiagonal systems by elimination from both ends
// to the middle, which halves the length of the chain of dependent operations.
//
// The elimination is Gauss's without pivoting, stable for matrices that are diagonally dominant by rows
// or by columns (N. J. Higham, Accuracy and Stability of Numerical Algorithms, 2nd ed., 2002, section
// 9.5, from memory). The order of elimination is the "twisted" or "burn at both ends" one (I. Babuška,
// Numerical stability in problems of linear algebra, SIAM J. Numer. Anal. 9, 1972, from memory).
package tridiagonal

// A Solver holds the factors of one matrix, and storage for matrices of its order.
type Solver struct {
	ratio   []float64 // multiplier of the neighbour towards the end, in the elimination
	inverse []float64 // 1 / pivot
	back    []float64 // entry towards the middle over pivot
	first   int       // first row of the lower half; 0 if there is one row
	det     float64   // 1 / determinant of the two rows in the middle
	up, low float64   // entries that couple them
	p, q    float64   // their pivots
}

// New returns a solver for matrices of n rows, n ≥ 2.
func New(n int) *Solver {
	return &Solver{
		ratio: make([]float64, n), inverse: make([]float64, n), back: make([]float64, n),
		first: n / 2,
	}
}

// Factor eliminates the matrix with row i = (lower[i], diagonal[i], upper[i]); lower[0] and
// upper[n-1] are not read. The slices have the length n of [New].
func (s *Solver) Factor(lower, diagonal, upper []float64) {
	n, m := len(s.ratio), s.first
	lower, diagonal, upper = lower[:n], diagonal[:n], upper[:n]
	ratio, inverse, back := s.ratio[:n], s.inverse[:n], s.back[:n]
	// The halves have m and n-m rows, n-m being m or m+1.
	p, q := diagonal[0], diagonal[n-1]
	for i, j := 1, n-2; i < m; i, j = i+1, j-1 {
		ip, iq := 1/p, 1/q
		inverse[i-1], inverse[j+1] = ip, iq
		back[i-1], back[j+1] = upper[i-1]*ip, lower[j+1]*iq
		ratio[i], ratio[j] = lower[i]*ip, upper[j]*iq
		p, q = diagonal[i]-ratio[i]*upper[i-1], diagonal[j]-ratio[j]*lower[j+1]
	}
	if n-m > m {
		iq := 1 / q
		inverse[m+1], back[m+1] = iq, lower[m+1]*iq
		ratio[m] = upper[m] * iq
		q = diagonal[m] - ratio[m]*lower[m+1]
	}
	s.p, s.q, s.up, s.low = p, q, upper[m-1], lower[m]
	s.det = 1 / (p*q - s.up*s.low)
}

// Solve replaces the right-hand side b by the solution.
func (s *Solver) Solve(b []float64) {
	n, m := len(s.ratio), s.first
	b = b[:n]
	ratio, inverse, back := s.ratio[:n], s.inverse[:n], s.back[:n]
	x, y := b[0], b[n-1]
	for i, j := 1, n-2; i < m; i, j = i+1, j-1 {
		x, y = b[i]-ratio[i]*x, b[j]-ratio[j]*y
		b[i], b[j] = x, y
	}
	if n-m > m {
		y = b[m] - ratio[m]*y
	}
	x, y = (x*s.q-y*s.up)*s.det, (y*s.p-x*s.low)*s.det
	b[m-1], b[m] = x, y
	i, j := m-2, m+1
	for ; i >= 0; i, j = i-1, j+1 {
		x, y = b[i]*inverse[i]-back[i]*x, b[j]*inverse[j]-back[j]*y
		b[i], b[j] = x, y
	}
	if j < n {
		b[j] = b[j]*inverse[j] - back[j]*y
	}
}
