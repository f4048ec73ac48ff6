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

// plateEarly returns 1 − θ at the fraction x < 1, and its derivative over Fo.
func plateEarly(bi, x, fo float64) (loss, rate float64) {
	if fo <= 0 || bi == 0 {
		return 0, 0
	}
	near, nearRate := plateImage(bi, 1-x, fo)
	if x == 0 {
		return 2 * near, 2 * nearRate
	}
	far, farRate := plateImage(bi, 1+x, fo)
	return near + far, nearRate + farRate
}

// plateImage returns what one image adds at the distance d from it.
func plateImage(bi, d, fo float64) (loss, rate float64) {
	if math.IsInf(bi, 1) {
		return prescribed(d/(2*math.Sqrt(fo)), fo)
	}
	f, rate := answer(d, bi, fo)
	return bi * f, bi * rate
}

// plateEarlySurface returns θ at the surface, that of a body without end, erfcx(Bi √Fo), and its derivative over Fo.
func plateEarlySurface(bi, fo float64) (theta, slope float64) {
	if math.IsInf(bi, 1) {
		return 0, 0
	}
	if fo <= 0 {
		return 1, 0
	}
	root := math.Sqrt(fo)
	b := bi * root
	theta = erfcx(b)
	return theta, -bi / root * pulling(0, b, theta)
}

// plateEarlyLoss returns 1 − mean = Bi ∫ θ_surface dFo.
func plateEarlyLoss(bi, fo float64) float64 { return earlyLoss(1, bi, 0, fo) }
