package eigen

import "math"

// A Sphere is the solution for a solid sphere at one Biot number Bi = h R/k. It does not change
// after construction and may be used from many goroutines.
//
// Series: H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., Oxford 1959, section
// 9.4 (from memory): θ = Σ C_n exp(−ζ_n² Fo) sin(ζ_n x)/(ζ_n x) with ζ cot ζ = 1 − Bi.
type Sphere struct {
	bi      float64
	zeta    row     // ζ_n
	rate    row     // ζ_n²
	centre  row     // C_n, the coefficient at the centre
	surface row     // C_n sin ζ_n / ζ_n
	mean    row     // the coefficient of the mean over the volume
	early   float64 // 1 − mean at Fo = Join
}

// NewSphere returns the solution for Bi ≥ 0. Bi = +Inf is a prescribed surface temperature. For a
// negative or NaN Biot number every result is NaN.
func NewSphere(bi float64) *Sphere {
	s := &Sphere{bi: bi}
	if !(bi >= 0) {
		s.bi = math.NaN()
	}
	sign := 1.0
	for n := range Terms {
		s.zeta[n], s.rate[n] = sphereRoot(n+1, s.bi)
		c, surface, mean := sphereCoefficients(s.bi, s.rate[n])
		s.centre[n], s.surface[n], s.mean[n] = sign*c, surface, mean
		sign = -sign
	}
	s.early = sphereEarlyLoss(s.bi, Join)
	return s
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

// Biot returns the Biot number.
func (s *Sphere) Biot() float64 { return s.bi }

// Decay returns ζ_1².
func (s *Sphere) Decay() float64 { return s.rate[0] }

// Term returns ζ_n, C_n and the coefficient of the mean for n from 1 to [Terms], and zeros for another n.
func (s *Sphere) Term(n int) (zeta, c, mean float64) {
	if n < 1 || n > Terms {
		return 0, 0, 0
	}
	return s.zeta[n-1], s.centre[n-1], s.mean[n-1]
}

// ErrorBound bounds the absolute error of θ at every place, at Fo ≥ 0: the terms or images left out
// and rounding.
func (s *Sphere) ErrorBound(fo float64) float64 { return errorBound(s.rate[0], fo) }

// Centre returns θ at the centre at Fo ≥ 0.
func (s *Sphere) Centre(fo float64) float64 {
	if fo < Join {
		return unit(1 - sphereEarlyCentre(s.bi, fo))
	}
	return unit(sum(s.centre[:], s.rate[:], fo))
}

// Surface returns θ at the surface at Fo ≥ 0. With a prescribed surface temperature it is 0 for
// every Fo, also for 0.
func (s *Sphere) Surface(fo float64) float64 {
	if fo < Join {
		return unit(sphereEarlySurface(s.bi, fo))
	}
	return unit(sum(s.surface[:], s.rate[:], fo))
}

// Mean returns θ as the mean over the volume at Fo ≥ 0.
func (s *Sphere) Mean(fo float64) float64 {
	if fo < Join {
		return unit(1 - sphereEarlyLoss(s.bi, fo))
	}
	return unit(sum(s.mean[:], s.rate[:], fo))
}

// Loss returns 1 − Mean at Fo ≥ 0, the fraction of the heat that has been exchanged, without the
// cancellation of that difference.
func (s *Sphere) Loss(fo float64) float64 {
	if fo < Join {
		return unit(sphereEarlyLoss(s.bi, fo))
	}
	return unit(lossBehind(s.early, s.mean[:], s.rate[:], Join, fo))
}

// At returns θ at the fraction x of the radius, 0 ≤ x ≤ 1, at Fo ≥ 0.
func (s *Sphere) At(x, fo float64) float64 {
	switch {
	case x == 0:
		return s.Centre(fo)
	case x == 1:
		return s.Surface(fo)
	case fo < Join:
		return unit(1 - sphereEarly(s.bi, x, fo))
	case s.rate[0] == 0:
		return 1
	}
	total := 0.0
	for n, rate := range s.rate {
		if (rate-s.rate[0])*fo > negligible {
			break
		}
		total += s.centre[n] * math.Exp(-rate*fo) * sinc(s.zeta[n]*x)
	}
	return unit(total)
}

// OneTerm returns the first term of θ at x and of the mean, which is near them from Fo = 0.2 on.
func (s *Sphere) OneTerm(x, fo float64) (theta, mean float64) {
	decay := math.Exp(-s.rate[0] * fo)
	return s.first(x) * decay, s.mean[0] * decay
}

// first returns the coefficient of the first term at x.
func (s *Sphere) first(x float64) float64 {
	if x == 1 {
		return s.surface[0]
	}
	return s.centre[0] * sinc(s.zeta[0]*x)
}

// TimeAt returns the Fourier number at which θ at the fraction x of the radius has fallen to theta,
// 0 < theta < 1, and false if there is none that a float64 holds.
func (s *Sphere) TimeAt(x, theta float64) (float64, bool) {
	return Fall(func(fo float64) float64 { return s.At(x, fo) }, s.first(x), s.rate[0], theta)
}

// TimeOfMean is [Sphere.TimeAt] for the mean over the volume.
func (s *Sphere) TimeOfMean(theta float64) (float64, bool) {
	return Fall(s.Mean, s.mean[0], s.rate[0], theta)
}

// sinc returns sin z/z, 1 at 0.
func sinc(z float64) float64 {
	if z == 0 {
		return 1
	}
	return math.Sin(z) / z
}
