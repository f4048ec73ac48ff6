package uncertain

import (
	"math"

	"gonum.org/v1/gonum/interp"
	"gonum.org/v1/gonum/stat/distuv"
)

// A student is the quantile of Student's t as a function of the standard normal z, t = F⁻¹(Φ(z)). The exact one
// takes microseconds; a cubic through asinh t with exact slopes, at 32 knots a unit of z, takes
// nanoseconds and differs by less than 1e-7 of t down to probabilities of 1e-9.
type student struct{ cubic interp.PiecewiseCubic }

// farthest is beyond the z of every probability that is sampled.
const farthest = 8.5

func newStudent(freedom float64) *student {
	const n = int(2*farthest*32) + 1
	law := distuv.StudentsT{Sigma: 1, Nu: freedom}
	z, y, slope := make([]float64, n), make([]float64, n), make([]float64, n)
	for i := range n/2 + 1 {
		z[i] = -farthest + float64(i)/32
		t := law.Quantile(distuv.UnitNormal.CDF(z[i]))
		y[i] = math.Asinh(t)
		slope[i] = distuv.UnitNormal.Prob(z[i]) / law.Prob(t) / math.Hypot(1, t)
		j := n - 1 - i // by symmetry, as the upper tail of a probability has no digits
		z[j], y[j], slope[j] = -z[i], -y[i], slope[i]
	}
	s := new(student)
	s.cubic.FitWithDerivatives(z, y, slope)
	return s
}

func (s *student) at(z float64) float64 {
	return math.Sinh(s.cubic.Predict(min(max(z, -farthest), farthest)))
}
