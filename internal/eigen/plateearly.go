package eigen

import "math"

// Short times in a plate. The Laplace transform of 1 − θ over Fo, with q = √s, is
//
//	(Bi/s) cosh(q x)/(q sinh q + Bi cosh q)
//	  = (Bi/s) [e^{−q(1−x)} + e^{−q(1+x)}]/(q + Bi) · {1 + e^{−2q} (q − Bi)/(q + Bi) + …}
//
// and the first bracket alone is inverted, at the surface its first part alone: what is left out is
// below 2 exp(−1/Fo) everywhere (Carslaw and Jaeger, Conduction of Heat in Solids, 2nd ed., section 12.5,
// for the method; from memory).

// plateEarly returns 1 − θ at the fraction x < 1.
func plateEarly(bi, x, fo float64) float64 {
	switch {
	case fo <= 0 || bi == 0:
		return 0
	case math.IsInf(bi, 1):
		root := 2 * math.Sqrt(fo)
		return math.Erfc((1-x)/root) + math.Erfc((1+x)/root)
	case x == 0:
		return 2 * (bi * response(1, bi, fo))
	}
	return bi * (response(1-x, bi, fo) + response(1+x, bi, fo))
}

// plateEarlySurface returns θ at the surface, that of a body without end: erfcx(Bi √Fo).
func plateEarlySurface(bi, fo float64) float64 {
	if math.IsInf(bi, 1) {
		return 0
	}
	if fo <= 0 {
		return 1
	}
	return erfcx(bi * math.Sqrt(fo))
}

// plateEarlyLoss returns 1 − mean = Bi ∫ θ_surface dFo.
func plateEarlyLoss(bi, fo float64) float64 { return earlyLoss(1, bi, 0, fo) }
