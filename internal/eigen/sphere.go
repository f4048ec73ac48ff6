package eigen

import "math"

// A Sphere is the solution for a solid sphere at one Biot number Bi = h R/k. It does not change
// after construction and may be used from many goroutines.
//
// Series: H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., Oxford 1959, section
// 9.4 (from memory): θ = Σ C_n exp(−ζ_n² Fo) sin(ζ_n x)/(ζ_n x) with ζ cot ζ = 1 − Bi.
type Sphere struct {
	series
	room [Terms]term
}

// NewSphere returns the solution for Bi ≥ 0. Bi = +Inf is a prescribed surface temperature. For a
// negative or NaN Biot number every result is NaN.
func NewSphere(bi float64) *Sphere {
	s := &Sphere{}
	s.start(bi, s.room[:], sphereTerm)
	return s
}

func sphereTerm(n int, bi float64) (t term) {
	t.zeta, t.rate = sphereRoot(n, bi)
	t.c[centre], t.c[surface], t.c[mean] = sphereCoefficients(bi, t.rate)
	return t
}

// sphereCoefficients returns |C_n|, C_n sin ζ_n/ζ_n and the coefficient of the mean for a root with
// the given square. The usual forms, such as 4(sin ζ − ζ cos ζ)/(2ζ − sin 2ζ), cancel at small and at
// large Bi; with sin ζ_n = ± ζ/√(ζ² + H²), H = Bi − 1, which the equation of the roots gives, they are
//
//	|C| = 2 Bi √(ζ² + H²)/N,  surface 2 Bi/N,  mean 6 Bi²/(ζ² N),  N = ζ² + Bi² − Bi.
func sphereCoefficients(bi, square float64) (c, surface, mean float64) {
	switch {
	case square == 0:
		return 1, 1, 1
	case bi < 1:
		n := square + bi*bi - bi
		surface = 2 * bi / n
		return surface * math.Sqrt(square+(bi-1)*(bi-1)), surface, 3 * bi / square * surface
	}
	inverse := 1 / bi
	n := square*inverse*inverse + (1 - inverse) // N/Bi²
	return 2 * math.Sqrt(square*inverse*inverse+(1-inverse)*(1-inverse)) / n, 2 * inverse / n, 6 / (square * n)
}

// Centre returns θ at the centre at Fo ≥ 0.
func (s *Sphere) Centre(fo float64) float64 { return s.At(0, fo) }

// Surface returns θ at the surface at Fo ≥ 0. With a prescribed surface temperature it is 0 for
// every Fo, also for 0.
func (s *Sphere) Surface(fo float64) float64 { return s.At(1, fo) }

// At returns θ at the fraction x of the radius, 0 ≤ x ≤ 1, at Fo ≥ 0.
func (s *Sphere) At(x, fo float64) float64 {
	theta, _ := s.Curve(x, fo)
	return unit(theta)
}

// Curve returns θ at the fraction x of the radius at Fo ≥ 0, and its derivative over Fo,
// to six digits at least; rounding may bring θ just beyond 0 and 1.
func (s *Sphere) Curve(x, fo float64) (theta, slope float64) {
	switch {
	case fo < Join && x == 1:
		return sphereEarlySurface(s.bi, fo)
	case fo < Join:
		loss, rate := sphereEarly(s.bi, x, fo)
		return 1 - loss, -rate
	case x == 0:
		return s.sum(centre, fo)
	case x == 1:
		return s.sum(surface, fo)
	}
	first := s.terms[0].rate
	if !(first > 0) {
		return 1 + first, 0 // no exchange, or NaN
	}
	last := first + negligible/fo
	ready := int(s.ready.Load())
	for n := range s.terms {
		if n == ready {
			ready = s.grow(n)
		}
		t := &s.terms[n]
		if t.rate > last {
			break
		}
		part := t.c[centre] * t.decayed(fo) * sinc(t.zeta*x)
		theta += part
		slope -= t.rate * part
	}
	return theta, slope
}

// Mean returns θ as the mean over the volume at Fo ≥ 0.
func (s *Sphere) Mean(fo float64) float64 {
	if fo < Join {
		return unit(1 - sphereEarlyLoss(s.bi, fo))
	}
	theta, _ := s.sum(mean, fo)
	return unit(theta)
}

// CurveOfMean is [Sphere.Curve] for the mean over the volume.
func (s *Sphere) CurveOfMean(fo float64) (theta, slope float64) {
	if fo < Join {
		return earlyMean(3, s.bi, 1, fo, sphereEarlyLoss)
	}
	return s.sum(mean, fo)
}

// Loss returns 1 − Mean at Fo ≥ 0, the fraction of the heat that has been exchanged, without the
// cancellation of that difference.
func (s *Sphere) Loss(fo float64) float64 {
	if fo < Join {
		return unit(sphereEarlyLoss(s.bi, fo))
	}
	return unit(s.lossBehind(Join, sphereEarlyLoss, fo))
}

// OneTerm returns the first term of θ at x and of the mean, which is near them from Fo = 0.2 on.
func (s *Sphere) OneTerm(x, fo float64) (theta, ofMean float64) {
	decay := math.Exp(-s.terms[0].rate * fo)
	return s.first(x) * decay, s.terms[0].c[mean] * decay
}

// first returns the coefficient of the first term at x.
func (s *Sphere) first(x float64) float64 {
	if x == 1 {
		return s.terms[0].c[surface]
	}
	return s.terms[0].c[centre] * sinc(s.terms[0].zeta*x)
}

// TimeAt returns the Fourier number at which θ at the fraction x of the radius has fallen to theta, 0 < theta < 1, and
// false if there is none that a float64 holds.
func (s *Sphere) TimeAt(x, theta float64) (float64, bool) {
	return FallBySlope(func(fo float64) (float64, float64) { return s.Curve(x, fo) }, s.first(x), s.terms[0].rate, theta)
}

// TimeOfMean is [Sphere.TimeAt] for the mean over the volume.
func (s *Sphere) TimeOfMean(theta float64) (float64, bool) {
	return FallBySlope(s.CurveOfMean, s.terms[0].c[mean], s.terms[0].rate, theta)
}

// sinc returns sin z/z, 1 at 0.
func sinc(z float64) float64 {
	if z == 0 {
		return 1
	}
	return sine(z) / z
}
