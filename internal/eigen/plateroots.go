package eigen

import "math"

// plateFirst gives ζ_1² of a plate to 1e-7, by interpolation of the exact roots at the nodes of Chebyshev.
var plateFirst = [12]float64{
	2.609364376, -0.01419232074, -0.1391513705, -0.002919665257, 0.01530436717, 0.0009743956102,
	-0.002046085905, -0.0001619812554, 0.0002293865405,
}

// plateRoot returns ζ_n, the n-th root of ζ tan ζ = Bi in ((n−1)π, (n−1/2)π), for Bi ≥ 0.
func plateRoot(n int, bi float64) float64 {
	switch {
	case n == 1 && bi < 1e-8:
		return math.Sqrt(bi * (1 - bi/3)) // the next term of the square is 4/45 Bi³
	case math.IsInf(bi, 1):
		return float64(2*n-1) * (math.Pi / 2)
	case n == 1:
		return towards(math.Sqrt(fitted(&plateFirst, bi, 2.5)), bi, 0, 0)
	}
	high, low := float64(n-1)*math.Pi, float64(n-1)*piLow
	low += math.FMA(float64(n-1), math.Pi, -high)
	return rootOf(bi, high, low)
}
