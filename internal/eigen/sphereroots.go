package eigen

import "math"

// sphereRoot returns ζ_n, the n-th root of ζ cot ζ = 1 − Bi in ((n−1)π, nπ), and its square, for Bi ≥ 0.
func sphereRoot(n int, bi float64) (zeta, square float64) {
	if n == 1 && bi < 0.5 {
		square = firstSphereRate(bi)
		return math.Sqrt(square), square
	}
	zeta = sphereRootFromMultiple(float64(n), bi)
	return zeta, zeta * zeta
}

// sphereRootFromMultiple solves for the distance δ = nπ − ζ, which keeps its digits when Bi is large
// and ζ comes close to nπ. With H = Bi − 1 the equation is cot δ = H/ζ, or δ = atan2(ζ, H).
func sphereRootFromMultiple(n, bi float64) float64 {
	h := bi - 1
	multiple := n * math.Pi
	delta := math.Atan2(multiple-math.Pi/2, h)
	for range 20 {
		zeta := multiple - delta
		slope := 1.0
		if size := h*h + zeta*zeta; !math.IsInf(size, 1) {
			slope += h / size
		}
		step := (delta - math.Atan2(zeta, h)) / slope
		delta -= step
		if math.Abs(step) <= 0x1p-52*delta {
			break
		}
	}
	return multiple - delta
}

// firstSphereRate returns y = ζ_1² for Bi below about 1 from 1 − √y cot √y = Bi. The left side is
// y/3 + y²/45 + …, rising and convex, so that Newton's method falls monotonically from 3 Bi, and no
// digit is lost as Bi goes to 0.
func firstSphereRate(bi float64) float64 {
	y := 3 * bi
	for range 20 {
		ratio := cotRatio(y)
		value := y * ratio
		slope := (1 - (1-value)*ratio) / 2
		step := (value - bi) / slope
		y -= step
		if math.Abs(step) <= 0x1p-52*y {
			break
		}
	}
	return y
}

// cotRatio returns (1 − √y cot √y)/y for 0 ≤ y ≤ 2.5 from Lambert's continued fraction of the
// tangent (Abramowitz and Stegun, Handbook of Mathematical Functions, 4.3.94, from memory).
func cotRatio(y float64) float64 {
	f := 23.0
	for k := 21.0; k >= 3; k -= 2 {
		f = k - y/f
	}
	return 1 / f
}
