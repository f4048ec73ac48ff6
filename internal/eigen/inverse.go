package eigen

import (
	"math"

	"example.com/coolward/internal/root"
)

// Fall returns where f, which falls from 1 at 0 to 0 and for late times as first·exp(−rate Fo), is theta, and
// false if there is no such place that a float64 holds. It brackets the place from the guess of the late law,
// which is exact to many digits when theta is small.
func Fall(f func(float64) float64, first, rate, theta float64) (float64, bool) {
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
