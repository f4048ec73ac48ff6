package eigen

import "math"

const invSqrtPi = 1 / math.SqrtPi

// erfcx returns exp(x²) erfc(x), the scaled complement of the error function, for x above −26: up to 12 by Taylor's
// series about the nearest point of a grid.
//
// Beyond, it is the asymptotic series (M. Abramowitz and I. A. Stegun, Handbook of Mathematical Functions, 7.1.23,
// from memory), whose terms fall below 1e-17 at x = 12 within ten.
func erfcx(x float64) float64 {
	if x < 12 {
		if !(x >= 0) {
			return erfcxProduct(x)
		}
		i := uint(x*(1/erfcxStep) + 0.5)
		r, a := x-float64(i)*erfcxStep, &erfcxTable[i]
		s := r * r
		q := s * s
		return a[0] + (r*a[1] + s*((a[2]+r*a[3])+s*(a[4]+r*a[5])) + q*s*((a[6]+r*a[7])+s*(a[8]+r*a[9])+q*(a[10]+r*a[11])))
	}
	r := 0.5 / x / x
	sum := 1.0
	for n := 10; n >= 1; n-- {
		sum = 1 - float64(2*n-1)*r*sum
	}
	return invSqrtPi / x * sum
}

// erfcxProduct is erfcx as it is defined; exp(x²) of a rounded x² would lose x² units in the last place.
func erfcxProduct(x float64) float64 { return expSquare(x, 1) * math.Erfc(x) }

const (
	erfcxStep  = 0.125
	erfcxOrder = 12 // 0.0625^12/6! = 5e-18 is left out
)

// erfcxTable holds the factors of Taylor's series, by y' = 2xy − 2/√π.
var erfcxTable = func() (table [12/erfcxStep + 1][erfcxOrder]float64) {
	for i := range table {
		x, a := float64(i)*erfcxStep, &table[i]
		a[0] = erfcxProduct(x)
		a[1] = 2*x*a[0] - 2*invSqrtPi
		for n := 2; n < erfcxOrder; n++ {
			a[n] = 2 * (x*a[n-1] + a[n-2]) / float64(n)
		}
	}
	return table
}()

// expSquare returns exp(x²) for sign = 1 and exp(−x²) for sign = −1, with the rounding error of x²
// carried along.
func expSquare(x, sign float64) float64 {
	square := x * x
	rest := math.FMA(x, x, -square)
	if sign < 0 {
		return decay(square) * (1 - rest)
	}
	return math.Exp(square) * (1 + rest)
}
