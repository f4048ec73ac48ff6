package fit

import (
	"math"

	"gonum.org/v1/gonum/mat"
	"gonum.org/v1/gonum/mathext"
	"gonum.org/v1/gonum/stat/distuv"
)

// DurbinWatson returns the statistic d of residuals r, Σ (r_i+1 − r_i)²/Σ r_i², and the probability of one as small
// if the errors are independent, normal and alike. It is near 2 then, and small where neighbours are off
// to the same side. The probability is that of the beta distribution over 0 to 4 with the exact mean
// and variance for the columns of the model (J. Durbin, G. S. Watson, Biometrika 37 (1950) 409–428, 38 (1951) 159–178
// and 58 (1971) 1–19; from memory). It reports false with fewer than three degrees of freedom.
func DurbinWatson(r []float64, columns *mat.Dense) (d, probability float64, ok bool) {
	n, p := columns.Dims()
	free := float64(n - p)
	q, ok := basis(columns)
	squares := 0.0
	for i, x := range r {
		squares += x * x
		if i > 0 {
			d += (x - r[i-1]) * (x - r[i-1])
		}
	}
	if free < 3 || !ok || !(squares > 0) {
		return 0, 0, false
	}
	d /= squares
	var aq mat.Dense
	aq.CloneFrom(q)
	for j := range p {
		for i := range n {
			x := 0.0
			if i > 0 {
				x += q.At(i, j) - q.At(i-1, j)
			}
			if i+1 < n {
				x += q.At(i, j) - q.At(i+1, j)
			}
			aq.Set(i, j, x)
		}
	}
	var qaq mat.Dense
	qaq.Mul(q.T(), &aq)
	square := func(m *mat.Dense) float64 { return math.Pow(mat.Norm(m, 2), 2) }
	first := float64(2*(n-1)) - mat.Trace(&qaq)
	second := float64(6*n-8) - 2*square(&aq) + square(&qaq)
	mean := first / free
	variance := 2 * (second - first*mean) / (free * (free + 2))
	m, v := mean/4, variance/16
	if !(v > 0 && m > 0 && m < 1) {
		return 0, 0, false
	}
	s := m*(1-m)/v - 1
	if !(s > 0) {
		return 0, 0, false
	}
	return d, mathext.RegIncBeta(m*s, (1-m)*s, min(d/4, 1)), true
}

// basis returns an orthonormal basis of the columns, by Gram and Schmidt, twice for rounding: the whole orthogonal
// matrix would be as wide as the log is long.
func basis(columns *mat.Dense) (*mat.Dense, bool) {
	n, p := columns.Dims()
	if n < p {
		return nil, false
	}
	q := mat.DenseCopyOf(columns)
	for j := range p {
		v := q.ColView(j).(*mat.VecDense)
		before := mat.Norm(v, 2)
		for range 2 {
			for k := range j {
				u := q.ColView(k)
				v.AddScaledVec(v, -mat.Dot(u, v), u)
			}
		}
		norm := mat.Norm(v, 2)
		if !(norm > 1e-12*before) || !isFinite(norm) {
			return nil, false
		}
		v.ScaleVec(1/norm, v)
	}
	return q, true
}

// Extra returns the probability of what a further term of the model takes off the sum of squares, if it
// is not there: the test of F with 1 and n − p − 1 degrees of freedom, for a model that is linear over
// its errors (Bates and Watts 1988, sec. 3.10, from memory). It reports false with fewer than two degrees
// of freedom.
func Extra(r []float64, columns *mat.Dense, term []float64) (probability float64, ok bool) {
	n, p := columns.Dims()
	q, ok := basis(columns)
	if !ok || n-p < 2 {
		return 0, false
	}
	rest := append([]float64(nil), term...)
	size := 0.0
	for _, x := range term {
		size += x * x
	}
	for range 2 { // twice, for rounding
		for j := range p {
			along := 0.0
			for i := range n {
				along += q.At(i, j) * rest[i]
			}
			for i := range n {
				rest[i] -= along * q.At(i, j)
			}
		}
	}
	var along, norm, squares float64
	for i := range r {
		along += r[i] * rest[i]
		norm += rest[i] * rest[i]
		squares += r[i] * r[i]
	}
	if !(norm > 1e-20*size) || !(squares > 0) {
		return 0, false
	}
	taken := min(along*along/norm, squares)
	freedom := float64(n - p - 1)
	f := taken / ((squares - taken) / freedom)
	if !isFinite(f) {
		return 0, true
	}
	return 1 - distuv.F{D1: 1, D2: freedom}.CDF(f), true
}
