package eigen

import "math"

// cylinderRoot returns ζ_n, the n-th root of ζ J1(ζ) = Bi J0(ζ), for Bi ≥ 0: between zeros of J1 and J0.
//
// The phase φ with tan φ = J1/J0 rises with ζ, and at the root it is (n−1)π + atan(Bi/ζ). The
// difference of both is computed from sine and cosine, so that it loses no digit where J0 or J1 is
// small; Halley's method multiplies the digits by three in each step.
func cylinderRoot(n int, bi float64) float64 {
	if n == 1 && bi < 1e-8 {
		return math.Sqrt(2 * bi * (1 - bi/4)) // the next term of the square is Bi³/12
	}
	zeta := (float64(n) - 0.75) * math.Pi
	if n == 1 {
		const firstOfInfinite = 2.404825557695773 // J0 = 0
		if math.IsInf(bi, 1) {
			return firstOfInfinite
		}
		zeta = math.Sqrt(2 * firstRateGuess(bi, 0.31079, 0.25, firstOfInfinite*firstOfInfinite/2))
	} else {
		zeta += math.Atan(bi/zeta) - 0.375/zeta
	}
	for range 20 {
		j0, j1 := math.J0(zeta), math.J1(zeta)
		s, c := share(zeta, bi)
		size := j0*j0 + j1*j1
		f := math.Atan((j1*c - j0*s) / (j0*c + j1*s))
		turn := j0 * j1 / (zeta * size) // 1 − dφ/dζ
		slope := 1 - turn + s*c/zeta
		bend := ((turn-(j0*j0-j1*j1-j0*j1/zeta)/size)-2*turn*(j1*j1/size))/zeta - 2*s*c*c*c/(zeta*zeta)
		step := f * slope / (slope*slope - f*bend/2)
		zeta -= step
		if math.Abs(step) <= cubed*zeta {
			break
		}
	}
	return zeta
}
