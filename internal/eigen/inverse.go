package eigen

import (
	"math"

	"example.com/coolward/internal/root"
)

// TimeAt returns the Fourier number at which θ at the fraction x of the radius has fallen to theta,
// 0 < theta < 1, and false if there is none that a float64 holds.
func (s *Sphere) TimeAt(x, theta float64) (float64, bool) {
	first := s.surface[0]
	if x < 1 {
		first = s.centre[0] * sinc(s.zeta[0]*x)
	}
	return fall(func(fo float64) float64 { return s.At(x, fo) }, first, s.rate[0], theta)
}

// TimeOfMean is [Sphere.TimeAt] for the mean over the volume.
func (s *Sphere) TimeOfMean(theta float64) (float64, bool) {
	return fall(s.Mean, s.mean[0], s.rate[0], theta)
}

// fall returns where f, which falls from 1 at 0 to 0 and for late times as first·exp(−rate Fo), is
// theta. It brackets the place from the guess of the late law, which is exact to many digits when
// theta is small.
func fall(f func(float64) float64, first, rate, theta float64) (float64, bool) {
	if !(theta > 0 && theta < 1 && rate > 0) {
		return 0, false
	}
	if f(0) <= theta {
		return 0, true
	}
	const factor = 4
	guess := math.Min(math.Max(math.Log(first)-math.Log(theta), 0x1p-10)/rate, math.MaxFloat64)
	lo, hi := guess, guess
	for f(hi) > theta {
		if hi == math.MaxFloat64 {
			return 0, false
		}
		lo, hi = hi, math.Min(hi*factor, math.MaxFloat64)
	}
	for f(lo) < theta {
		lo, hi = lo/factor, lo
	}
	return root.Find(func(fo float64) float64 { return math.Log(f(fo) / theta) }, lo, hi, 0)
}
