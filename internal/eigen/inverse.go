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

// FallBySlope is [Fall] for an f that returns its derivative too.
//
// Newton's method begins with the guess of the late law and is kept between the nearest points found above and below.
// It solves for log f over Fo, which is straight for late times, or over log Fo, where f falls as a power; and where
// less than half is to be lost, for the logarithm of the loss over that of Fo or, far from the surface, over 1/Fo, which
// hardly bends at early times.
func FallBySlope(f func(fo float64) (value, slope float64), first, rate, theta float64) (float64, bool) {
	if !(theta > 0 && theta < 1 && rate > 0) {
		return 0, false
	}
	if start, _ := f(0); start <= theta {
		return 0, true
	}
	const most = 300 // steps; bisection alone needs a third
	factor := 4.0    // by which it goes on where nothing is known on one side
	lo, hi := 0.0, math.Inf(1)
	fo := math.Min(math.Max(math.Log(first/theta), 0.05)/rate, math.MaxFloat64)
	power := false
	for k := range most {
		value, slope := f(fo)
		off := value - theta
		switch {
		case math.Abs(off) <= 0x1p-51*theta:
			return fo, true
		case off > 0 && fo == math.MaxFloat64, math.IsNaN(off):
			return 0, false
		case off > 0:
			lo = fo
		default:
			hi = fo
		}
		if k == 0 || theta > 0.5 {
			power = slope*fo > -0.6*value
		}
		next := fo + newton(fo, value, slope, theta, power)
		switch step := math.Abs(next - fo); {
		case step <= 1e-8*fo && next > 0 && math.Abs(off) <= 1e-5:
			return next, true // the next step would be the square of this
		case next > lo && next < hi && k%8 != 7: // now and then the bracket is halved, come what may
		case math.IsInf(hi, 1):
			next = math.Min(fo*factor, math.MaxFloat64)
			factor = math.Min(factor*factor, 0x1p64)
		case lo == 0:
			next = fo / factor
			factor = math.Min(factor*factor, 0x1p64)
		case hi > 4*lo:
			next = math.Sqrt(lo) * math.Sqrt(hi)
		default:
			next = lo + (hi-lo)/2
		}
		if next == lo || next == hi || next == 0 {
			return next, next > 0
		}
		fo = next
	}
	return fo, true
}

// newton returns the step from a value and slope at fo towards theta, over the logarithm of Fo or Fo itself. It is not
// finite where none can be told.
func newton(fo, value, slope, theta float64, power bool) float64 {
	switch {
	case theta > 0.5 && value > 0.4:
		loss := 1 - value
		exponent := -slope * fo / loss
		y := math.Log((1-theta)/loss) / exponent
		if exponent > 1 && y < 1 { // as exp(−A/Fo)
			return fo * y / (1 - y)
		}
		return fo * math.Expm1(y)
	case power:
		return fo * math.Expm1(math.Log(theta/value)*value/(slope*fo))
	}
	return math.Log(theta/value) * value / slope
}
