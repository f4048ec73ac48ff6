package eigen

import "math"

const invSqrtPi = 1 / math.SqrtPi

// erfcx returns exp(x²) erfc(x), the scaled complement of the error function, for x above −26.
//
// Up to 12 it is the product; exp(x²) of a rounded x² would lose x² units in the last place. Beyond, it is the asymptotic series (M. Abramowitz and I. A. Stegun,
// Handbook of Mathematical Functions, 7.1.23, from memory), whose terms fall below 1e-17 at x = 12
// within ten.
func erfcx(x float64) float64 {
	if x < 12 {
		return expSquare(x, 1) * math.Erfc(x)
	}
	r := 0.5 / x / x
	sum := 1.0
	for n := 10; n >= 1; n-- {
		sum = 1 - float64(2*n-1)*r*sum
	}
	return invSqrtPi / x * sum
}

// expSquare returns exp(x²) for sign = 1 and exp(−x²) for sign = −1, with the rounding error of x²
// carried along.
func expSquare(x, sign float64) float64 {
	square := x * x
	rest := math.FMA(x, x, -square)
	return math.Exp(sign*square) * (1 + sign*rest)
}
