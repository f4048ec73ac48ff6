package eigen

import "math"

// plateRoot returns ζ_n, the n-th root of ζ tan ζ = Bi in ((n−1)π, (n−1/2)π), for Bi ≥ 0.
//
// It is the zero of f = ζ − (n−1)π − atan(Bi/ζ), which rises, is concave, and loses no digit at small or
// large Bi; Halley's method multiplies the digits by three in each step, from a first guess of three.
func plateRoot(n int, bi float64) float64 {
	if n == 1 && bi < 1e-8 {
		return math.Sqrt(bi * (1 - bi/3)) // the next term of the square is 4/45 Bi³
	}
	if math.IsInf(bi, 1) {
		return float64(2*n-1) * (math.Pi / 2)
	}
	multiple := float64(n-1) * math.Pi
	zeta := multiple + math.Pi/2*(bi/(bi+multiple+1))
	if n == 1 {
		zeta = math.Sqrt(firstRateGuess(bi, 0.3798, 1.0/3, math.Pi*math.Pi/4))
	}
	for range 20 {
		r := bi / zeta
		f := zeta - multiple - math.Atan(r)
		pull := 1 / (zeta * (r + 1/r)) // Bi/(ζ² + Bi²)
		slope := 1 + pull
		bend := -2 * pull / (zeta * (1 + r*r)) // f''
		step := f * slope / (slope*slope - f*bend/2)
		zeta -= step
		if math.Abs(step) <= cubed*zeta {
			break
		}
	}
	return zeta
}

// cubed is the relative size of a step of a method of third order after which no further one is
// needed: its cube is below the rounding.
const cubed = 2e-6

// firstRateGuess returns an approximation of ζ_1² good to some thousandths for every Bi: the fraction
// u (1 + aBi)/(1 + (a + slope)Bi + (a/end)Bi²), u = ratio of volume and surface times Bi, that has the first
// two terms of the expansions about Bi = 0 and 1/Bi = 0.
func firstRateGuess(bi, a, slope, end float64) float64 {
	return bi / ((1+(a+slope)*bi)/(1+a*bi) + a/end*bi/(1/bi+a))
}
