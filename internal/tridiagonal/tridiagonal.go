// Package tridiagonal solves tridiagonal systems whose entries beside the diagonal are not above 0, as those of
// conservative balances are, by elimination from both ends to the middle, two rows at a time: a row is written over that
// before the last, so that the chain of dependent operations is a quarter as long as in the elimination row by row.
//
// The elimination works on the sums of the columns instead of the diagonal, so that nothing is subtracted in it: the
// factors are exact to rounding entry by entry, however tightly some rows are coupled, and what a balance contains is not
// lost (W. K. Grassmann, M. I. Taksar and D. P. Heyman, Operations Research 33, 1985, from memory). The order of
// elimination is the "twisted" or "burn at both ends" one (I. Babuška, Numerical stability in problems of linear algebra,
// SIAM J. Numer. Anal. 9, 1972, from memory).
package tridiagonal

// A Solver holds the factors of one matrix, and storage for matrices of its order.
type Solver struct {
	ratio   []float64 // multiplier of the neighbour towards the end, in the elimination
	inverse []float64 // 1 / pivot
	back    []float64 // entry towards the middle over pivot
	first   int       // first row of the lower half
	det     float64   // 1 / determinant of the two rows in the middle
	up, low float64   // entries that couple them
	p, q    float64   // their pivots
}

// New returns a solver for matrices of n rows, n ≥ 2.
func New(n int) *Solver { return Over(make([]float64, 3*n)) }

// Over returns a solver that uses a block of storage, for matrices of a third as many rows.
func Over(block []float64) *Solver {
	n := len(block) / 3
	return &Solver{ratio: block[:n:n], inverse: block[n : 2*n : 2*n], back: block[2*n:], first: n / 2}
}

// Factor eliminates the matrix with the entries lower[i] and upper[i] to the left and right of the diagonal in row i,
// none above 0, and sums[i] of column i, not below 0; lower[0] and upper[n-1] are not read. The slices have the
// length n of [New].
func (s *Solver) Factor(lower, sums, upper []float64) {
	n, m := len(s.ratio), s.first
	lower, sums, upper = lower[:n], sums[:n], upper[:n]
	ratio, inverse, back := s.ratio[:n], s.inverse[:n], s.back[:n]
	// The halves have m and n-m rows, n-m being m or m+1. Row i of the upper one has row j = n-1-i beside it. While rows are
	// eliminated, p is the sum of column i and q that of column j, without the rows that are eliminated.
	p, q := sums[0], sums[n-1]
	i, j := 0, n-1
	for ; i+2 < m; i, j = i+2, j-2 {
		// Pivots x and y/x as quotients of sums of positive terms, of which one is in the chain.
		l, u := lower[i+1], upper[j-1]
		x, z := p-l, q-u
		v, w := sums[i+1]*x-upper[i]*p, sums[j-1]*z-lower[j]*q
		y, t := v-lower[i+2]*x, w-upper[j-2]*z
		p, q = sums[i+2]-upper[i+1]*(v/y), sums[j-2]-lower[j-1]*(w/t)
		a, b, c, d := 1/x, x/y, 1/z, z/t
		inverse[i], inverse[i+1], inverse[j], inverse[j-1] = a, b, c, d
		back[i], back[i+1], back[j], back[j-1] = upper[i]*a, upper[i+1]*b, lower[j]*c, lower[j-1]*d
		ratio[i+1], ratio[i+2], ratio[j-1], ratio[j-2] = l*a, lower[i+2]*b, u*c, upper[j-2]*d
	}
	for ; i+1 < m; i++ {
		a := 1 / (p - lower[i+1])
		inverse[i], back[i], ratio[i+1] = a, upper[i]*a, lower[i+1]*a
		p = sums[i+1] - upper[i]*(p*a)
	}
	for ; j > m; j-- {
		c := 1 / (q - upper[j-1])
		inverse[j], back[j], ratio[j-1] = c, lower[j]*c, upper[j-1]*c
		q = sums[j-1] - lower[j]*(q*c)
	}
	s.up, s.low = upper[m-1], lower[m]
	s.p, s.q = p-s.low, q-s.up
	s.det = 1 / (p*q - p*s.up - q*s.low)
}

// Solve replaces the right-hand side b by the solution.
func (s *Solver) Solve(b []float64) {
	n, m := len(s.ratio), s.first
	b = b[:n]
	ratio, inverse, back := s.ratio[:n], s.inverse[:n], s.back[:n]
	x, y := b[0], b[n-1]
	i, j := 1, n-2
	for ; i+1 < m; i, j = i+2, j-2 {
		x0, y0, r, q := b[i], b[j], ratio[i+1], ratio[j-1]
		x1, y1 := b[i+1]-r*x0, b[j-1]-q*y0
		r0, q0 := ratio[i], ratio[j]
		b[i], b[j] = x0-r0*x, y0-q0*y
		x, y = x1+r*r0*x, y1+q*q0*y
		b[i+1], b[j-1] = x, y
	}
	if i < m {
		x, y = b[i]-ratio[i]*x, b[j]-ratio[j]*y
		b[i], b[j] = x, y
	}
	if n-m > m {
		y = b[m] - ratio[m]*y
	}
	x, y = (x*s.q-y*s.up)*s.det, (y*s.p-x*s.low)*s.det
	b[m-1], b[m] = x, y
	i, j = m-2, m+1
	for ; i >= 1; i, j = i-2, j+2 {
		x0, y0, r, q := b[i]*inverse[i], b[j]*inverse[j], back[i-1], back[j+1]
		x1, y1 := b[i-1]*inverse[i-1]-r*x0, b[j+1]*inverse[j+1]-q*y0
		r0, q0 := back[i], back[j]
		b[i], b[j] = x0-r0*x, y0-q0*y
		x, y = x1+r*r0*x, y1+q*q0*y
		b[i-1], b[j+1] = x, y
	}
	if i == 0 {
		x, y = b[0]*inverse[0]-back[0]*x, b[j]*inverse[j]-back[j]*y
		b[0], b[j] = x, y
		j++
	}
	if j < n {
		b[j] = b[j]*inverse[j] - back[j]*y
	}
}
