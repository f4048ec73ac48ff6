package eigen

import "math"

// Short times in a sphere. The Laplace transform of w = x (1 − θ) over Fo, with q = √s and H = Bi − 1, is
//
//	w̄ = (Bi/s) sinh(q x)/(q cosh q + H sinh q)
//	  = (Bi/s) [e^{−q(1−x)} − e^{−q(1+x)}]/(q + H) · {1 − e^{−2q} (q − H)/(q + H) + …}
//
// and the first bracket alone is inverted: what is left out is below 2 exp(−1/Fo) everywhere
// (Carslaw and Jaeger, Conduction of Heat in Solids, 2nd ed., chapters XII and XIII, for the
// method; from memory).

// answer returns F(d, t), whose transform is e^{−q d}/(s (q + H)): entry 14 of the table of
// transforms in Carslaw and Jaeger, 2nd ed., appendix V (from memory),
//
//	F = [erfc(a) − e^{−a²} erfcx(a + b)]/H = e^{−a²} [erfcx(a) − erfcx(a + b)]/H,  a = d/(2√t),  b = H√t,
//
// and its derivative over t, e^{−a²} [1/√π − b erfcx(a + b)]/√t, to six digits.
//
// For small b the difference is taken as the Taylor series of erfcx, whose derivatives are repeated
// integrals of erfc: d^n erfcx(a)/da^n = (−2)^n n! J_n, J_n = e^{a²} iⁿerfc(a), with
// n J_n = J_{n−2}/2 − a J_{n−1} (Abramowitz and Stegun, Handbook of Mathematical Functions, 7.2.5 and
// 7.2.9, from memory).
func answer(d, h, t float64) (f, rate float64) {
	root := math.Sqrt(t)
	a, b := d/(2*root), h*root
	if a > 27 {
		return 0, 0 // below the least float64
	}
	below, start := expSquare(a, -1), erfcx(a)
	if math.Abs(b) >= 0.1 {
		scaled := erfcx(a + b)
		return below * (start - scaled) / h, below * pulling(a, b, scaled) / root
	}
	before, here := 2*invSqrtPi, start
	total, power := 0.0, 1.0
	for n := 1; n <= 14 && math.Abs(power) > 1e-20; n++ {
		before, here = here, (before*0.5-a*here)*oneOver[n]
		total += power * here
		power *= -2 * b
	}
	return 2 * root * below * total, below * (invSqrtPi - b*(start-2*b*total)) / root
}

// oneOver holds 1/n.
var oneOver = func() (r [15]float64) {
	for n := 1; n < len(r); n++ {
		r[n] = 1 / float64(n)
	}
	return r
}()

// pulling returns 1/√π − b erfcx(a + b), by the first terms of the asymptotic series where both cancel.
func pulling(a, b, scaled float64) float64 {
	if z := a + b; z > 1e4 {
		return invSqrtPi * (a/z + b/z*(0.5/z/z))
	}
	return invSqrtPi - b*scaled
}

// prescribed returns erfc(a), which is 1 − θ at a distance from a surface of prescribed temperature, and its
// derivative over t.
func prescribed(a, t float64) (loss, rate float64) {
	below := expSquare(a, -1)
	return below * erfcx(a), invSqrtPi * a * below / t
}

// earlySurface returns θ = 1 − Bi F(0, t) at the surface with H = Bi − curvature, and its derivative over t. Where
// b = H√t is not small θ is (Bi erfcx(b) − curvature)/H, which keeps its digits when it is small.
func earlySurface(bi, curvature, t float64) (theta, slope float64) {
	if math.IsInf(bi, 1) {
		return 0, 0
	}
	if t <= 0 || bi == 0 {
		return 1, 0
	}
	h, root := bi-curvature, math.Sqrt(t)
	b := h * root
	if b > 0.5 {
		scaled := erfcx(b)
		return (bi*scaled - curvature) / h, -bi / root * pulling(0, b, scaled)
	}
	f, rate := answer(0, h, t)
	return 1 - bi*f, -bi * rate
}

// earlyMean returns the mean and its derivative, the heat that passes the surface.
func earlyMean(dimension, bi, curvature, t float64, loss func(bi, t float64) float64) (theta, slope float64) {
	if t <= 0 || bi == 0 {
		return 1, 0
	}
	return 1 - loss(bi, t), -earlyLossRate(dimension, bi, curvature, t)
}

// sphereEarly returns 1 − θ at the fraction x of the radius, and its derivative over Fo.
func sphereEarly(bi, x, fo float64) (loss, rate float64) {
	if fo <= 0 || bi == 0 {
		return 0, 0
	}
	if x < nearCentre {
		return sphereEarlyNearCentre(bi, x, fo)
	}
	near, nearRate := 0.0, 0.0
	far, farRate := 0.0, 0.0
	if math.IsInf(bi, 1) {
		half := 0.5 / math.Sqrt(fo)
		near, nearRate = prescribed((1-x)*half, fo)
		far, farRate = prescribed((1+x)*half, fo)
		return (near - far) / x, (nearRate - farRate) / x
	}
	near, nearRate = answer(1-x, bi-1, fo)
	far, farRate = answer(1+x, bi-1, fo)
	return bi * (near - far) / x, bi * (nearRate - farRate) / x
}

// sphereEarlyCentre returns 1 − θ at the centre, the limit −2 Bi ∂F/∂d at d = 1:
// 2 Bi [erfc(a) − H F] = 2 Bi e^{−a²} erfcx(a + b), in which nothing cancels, and erfcx(a + b).
func sphereEarlyCentre(bi, fo float64) (loss, scaled float64) {
	root := math.Sqrt(fo)
	a := 0.5 / root
	if math.IsInf(bi, 1) {
		return 2 * invSqrtPi / root * expSquare(a, -1), 0
	}
	scaled = erfcx(a + (bi-1)*root)
	return 2 * expSquare(a, -1) * (bi * scaled), scaled
}

// nearCentre is the fraction of the radius below which the difference of two images, divided by x,
// would lose digits.
const nearCentre = 0x1p-13

// sphereEarlyNearCentre returns 1 − θ for small x from its value c at the centre, c + (x²/6) dc/dFo, which
// is what the equation of conduction makes of a function of x². With z = a + b
//
//	(dc/dFo)/c = [a² + (b − a)(z − 1/(√π erfcx(z)))]/Fo,
//
// where the last bracket, a difference of large numbers for large z, is −1/(2z) + 1/(2z³) − … then.
// The next term in x is below 1e-16 of θ.
func sphereEarlyNearCentre(bi, x, fo float64) (loss, rate float64) {
	root := math.Sqrt(fo)
	a, b := 0.5/root, (bi-1)*root
	if a > 27 {
		return 0, 0
	}
	at, scaled := sphereEarlyCentre(bi, fo)
	z := a + b
	last := -(1 - 2*a/z) * (1 - 1/(z*z)) / 2 // (b − a)(z − 1/(√π erfcx(z)))
	if math.IsInf(bi, 1) {
		last = -0.5
	} else if z < 100 {
		last = (b - a) * (z - invSqrtPi/scaled)
	}
	growth := (a*a + last) / fo
	return at * (1 + x*x/6*growth), at * growth
}

// sphereEarlySurface returns θ at the surface and its derivative over Fo.
func sphereEarlySurface(bi, fo float64) (theta, slope float64) { return earlySurface(bi, 1, fo) }

// sphereEarlyLoss returns 1 − mean = 3 Bi ∫ θ_surface dFo.
func sphereEarlyLoss(bi, fo float64) float64 { return earlyLoss(3, bi, 1, fo) }

// earlyLoss returns ratio Bi ∫ θ dt where θ = 1 − Bi F(0, t) is what the first bracket gives at the surface,
// with H = Bi − curvature. It is ratio Bi t (1 − Bi √t G(b)) with b = H√t and
//
//	G(b) = (1 − g)/b,  g(b) = (erfcx(b) − 1 + 2b/√π)/b².
//
// Where b is not small the bracket is (Bi g − curvature)/H.
func earlyLoss(ratio, bi, curvature, fo float64) float64 {
	if fo <= 0 || bi == 0 {
		return 0
	}
	root := math.Sqrt(fo)
	if math.IsInf(bi, 1) {
		return ratio * (2*invSqrtPi*root - curvature*fo)
	}
	h := bi - curvature
	b := h * root
	if b <= 0.5 {
		return ratio * bi * fo * (1 - bi*root*lossSeries(b))
	}
	// g·b, so that neither a large nor an infinite b overflows
	gb := (erfcx(b)-1)/b + 2*invSqrtPi
	return ratio * root * (bi / h) * (bi/h*gb - curvature*root)
}

// earlyLossRate returns the derivative of earlyLoss over time, ratio Bi θ.
func earlyLossRate(ratio, bi, curvature, t float64) float64 {
	if math.IsInf(bi, 1) {
		return ratio * (invSqrtPi/math.Sqrt(t) - curvature)
	}
	theta, _ := earlySurface(bi, curvature, t)
	return ratio * bi * theta
}

// lossSeries returns G(b) = Σ (−b)^k/Γ(k/2 + 5/2) for |b| ≤ 1/2.
func lossSeries(b float64) float64 {
	total := 0.0
	for k := len(lossFactor) - 1; k >= 0; k-- {
		total = lossFactor[k] - b*total
	}
	return total
}

// lossFactor holds 1/Γ(k/2 + 5/2).
var lossFactor = func() (f [26]float64) {
	f[0], f[1] = 4/3.0*invSqrtPi, 0.5
	for k := 2; k < len(f); k++ {
		f[k] = f[k-2] / (float64(k)/2 + 1.5)
	}
	return f
}()

// response is the first of [answer].
func response(d, h, t float64) float64 {
	f, _ := answer(d, h, t)
	return f
}
