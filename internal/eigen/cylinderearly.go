package eigen

import "math"

// Short times in a cylinder. The Laplace transform of 1 − θ over Fo is, with q = √s,
//
//	(Bi/s) I0(q x)/(q I1(q) + Bi I0(q)) = (Bi/s) e^{−q(1−x)}/√x · A(q x)/[q B(q) + Bi A(q)],
//
// where A = I0(q) √(2πq) e^{−q} = Σ α_j q^−j and B, the same of I1, = Σ β_j q^−j (M. Abramowitz and I. A. Stegun,
// Handbook of Mathematical Functions, 9.7.1, from memory). What the expansions leave out is below
// exp(−(1 + x)²/(4 Fo)) of 1 − θ.
//
// With A = 1 and q B = q − 1/2 in their place, and H = Bi − 1/2, the inverse is the response of the other bodies over
// √x. The rest,
//
//	(Bi/s) e^{−q(1−x)}/√x · [A(q x)(q + H) − q B(q) − Bi A(q)]/[(q + H)(q B(q) + Bi A(q))],
//
// is small, since the first bracket begins with (1/x − 1)/8 and, at the surface, with 1/(8q). It is inverted by a
// trapezoidal rule, see line. Nearer to the centre than farthest √Fo from the surface 1 − θ is below 1e-21.

// restOf returns the numerator and the denominator of the rest at x, over the greater of 1 and Bi.
func restOf(bi, x, root float64) (f fraction) {
	if bi > 1 {
		f.byQ, f.byBi = 1/bi, 1
	} else {
		f.byQ, f.byBi = 1, bi
	}
	f.count = lineMost
	for f.count > 2 && root <= lineNodes[0].limit[f.count-1] {
		f.count--
	}
	inverse := 1 / x
	power, scale := 1.0, 1.0 // x^−j and √Fo^j
	for j := range f.count {
		next := power * inverse
		f.top[j] = scale * (f.byQ*(alpha[j+1]*next-beta[j+1]-0.5*alpha[j]*power) + f.byBi*alpha[j]*(power-1))
		f.bottom[j] = scale * (f.byQ*beta[j+1] + f.byBi*alpha[j])
		power = next
		scale *= root
	}
	return f
}

// restOfHeat returns the same for x = 1, times Bi over the greater of 1 and Bi, without a loss if Bi is infinite.
func restOfHeat(bi, root float64) (f fraction) {
	f = restOf(bi, 1, root)
	scale := f.byBi
	for j := range f.count {
		f.top[j] = scale * (alpha[j+1] - beta[j+1] - 0.5*alpha[j])
		scale *= root
	}
	return f
}

// cylinderEarly returns 1 − θ at the fraction x < 1, and its derivative over Fo.
func cylinderEarly(bi, x, fo float64) (loss, rate float64) {
	if fo <= 0 || bi == 0 {
		return 0, 0
	}
	root := math.Sqrt(fo)
	a := (1 - x) / (2 * root)
	if a > farthest {
		return 0, 0
	}
	if math.IsInf(bi, 1) {
		loss, rate = prescribed(a, fo)
	} else {
		loss, rate = answer(1-x, bi-0.5, fo)
		loss, rate = bi*loss, bi*rate
	}
	f := restOf(bi, x, root)
	rest, restRate, _ := f.onLine(a, root)
	scale := 1 / math.Sqrt(x)
	return scale * (loss + rest), scale * (rate + restRate)
}

// cylinderEarlySurface returns θ at the surface, with all its digits when it is small, and its derivative over Fo.
func cylinderEarlySurface(bi, fo float64) (theta, slope float64) {
	theta, slope = earlySurface(bi, 0.5, fo)
	if fo <= 0 || bi == 0 || math.IsInf(bi, 1) {
		return theta, slope
	}
	root := math.Sqrt(fo)
	f := restOf(bi, 1, root)
	rest, rate, _ := f.onLine(0, root)
	return theta - rest, slope - rate
}

// cylinderEarlyLoss returns 1 − mean = 2 Bi ∫ θ_surface dFo.
func cylinderEarlyLoss(bi, fo float64) float64 {
	if fo <= 0 || bi == 0 {
		return 0
	}
	root := math.Sqrt(fo)
	f := restOfHeat(bi, root)
	_, _, rest := f.onLine(0, root)
	return earlyLoss(2, bi, 0.5, fo) - 2*rest
}

// cylinderEarlyMean returns the mean and its derivative over Fo.
func cylinderEarlyMean(bi, fo float64) (theta, slope float64) {
	if fo <= 0 || bi == 0 {
		return 1, 0
	}
	root := math.Sqrt(fo)
	f := restOfHeat(bi, root)
	rate, _, rest := f.onLine(0, root)
	return 1 - (earlyLoss(2, bi, 0.5, fo) - 2*rest), 2*rate - earlyLossRate(2, bi, 0.5, fo)
}
