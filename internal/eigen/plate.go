package eigen

import "math"

// A Plate is the solution for a plate at one Biot number Bi = h L/k, where L is half the thickness of a
// plate that exchanges heat at both faces, and the whole thickness of one with an insulated face. It
// does not change after construction and may be used from many goroutines.
//
// Series: H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., Oxford 1959, section
// 3.11 (from memory): θ = Σ C_n exp(−ζ_n² Fo) cos(ζ_n x) with ζ tan ζ = Bi.
type Plate struct {
	bi      float64
	zeta    row     // ζ_n
	rate    row     // ζ_n²
	centre  row     // C_n, the coefficient at the centre
	surface row     // C_n cos ζ_n
	mean    row     // the coefficient of the mean over the volume
	early   float64 // 1 − mean at Fo = Join
}

// NewPlate returns the solution for Bi ≥ 0. Bi = +Inf is a prescribed surface temperature. For a
// negative or NaN Biot number every result is NaN.
func NewPlate(bi float64) *Plate {
	s := &Plate{bi: bi}
	if !(bi >= 0) {
		s.bi = math.NaN()
	}
	sign := 1.0
	for n := range Terms {
		zeta := plateRoot(n+1, s.bi)
		s.zeta[n], s.rate[n] = zeta, zeta*zeta
		c, surface, mean := plateCoefficients(s.bi, zeta)
		s.centre[n], s.surface[n], s.mean[n] = sign*c, surface, mean
		sign = -sign
	}
	s.early = plateEarlyLoss(s.bi, Join)
	return s
}

// plateCoefficients returns |C_n|, C_n cos ζ_n and the coefficient of the mean for a root. The usual
// form 4 sin ζ/(2ζ + sin 2ζ) cancels where sin ζ is small; with tan ζ = Bi/ζ put in they are
//
//	|C| = 2 Bi √(ζ² + Bi²)/(ζ N),  surface 2 Bi/N,  mean 2 Bi²/(ζ² N),  N = ζ² + Bi² + Bi.
func plateCoefficients(bi, zeta float64) (c, surface, mean float64) {
	square := zeta * zeta
	switch {
	case square == 0:
		return 1, 1, 1
	case bi < 1:
		n := square + bi*bi + bi
		surface = 2 * bi / n
		return surface * math.Sqrt(square+bi*bi) / zeta, surface, bi / square * surface
	}
	inverse := 1 / bi
	n := square*inverse*inverse + (1 + inverse) // N/Bi²
	return 2 * math.Sqrt(square*inverse*inverse+1) / (zeta * n), 2 * inverse / n, 2 / (square * n)
}

// Biot returns the Biot number.
func (s *Plate) Biot() float64 { return s.bi }

// Decay returns ζ_1².
func (s *Plate) Decay() float64 { return s.rate[0] }

// Term returns ζ_n, C_n and the coefficient of the mean for n from 1 to [Terms], and zeros for another n.
func (s *Plate) Term(n int) (zeta, c, mean float64) {
	if n < 1 || n > Terms {
		return 0, 0, 0
	}
	return s.zeta[n-1], s.centre[n-1], s.mean[n-1]
}

// ErrorBound bounds the absolute error of θ at every place, at Fo ≥ 0: the terms or images left out
// and rounding.
func (s *Plate) ErrorBound(fo float64) float64 { return errorBound(s.rate[0], fo) }

// Centre returns θ at the centre, or at the insulated face, at Fo ≥ 0.
func (s *Plate) Centre(fo float64) float64 {
	if fo < Join {
		return unit(1 - plateEarly(s.bi, 0, fo))
	}
	return unit(sum(s.centre[:], s.rate[:], fo))
}

// Surface returns θ at the surface at Fo ≥ 0. With a prescribed surface temperature it is 0 for
// every Fo, also for 0.
func (s *Plate) Surface(fo float64) float64 {
	if fo < Join {
		return unit(plateEarlySurface(s.bi, fo))
	}
	return unit(sum(s.surface[:], s.rate[:], fo))
}

// Mean returns θ as the mean over the volume at Fo ≥ 0.
func (s *Plate) Mean(fo float64) float64 {
	if fo < Join {
		return unit(1 - plateEarlyLoss(s.bi, fo))
	}
	return unit(sum(s.mean[:], s.rate[:], fo))
}

// Loss returns 1 − Mean at Fo ≥ 0, the fraction of the heat that has been exchanged, without the
// cancellation of that difference.
func (s *Plate) Loss(fo float64) float64 {
	if fo < Join {
		return unit(plateEarlyLoss(s.bi, fo))
	}
	return unit(lossBehind(s.early, s.mean[:], s.rate[:], Join, fo))
}

// At returns θ at the fraction x of the way from the centre to the surface, 0 ≤ x ≤ 1, at Fo ≥ 0.
func (s *Plate) At(x, fo float64) float64 {
	switch {
	case x == 0:
		return s.Centre(fo)
	case x == 1:
		return s.Surface(fo)
	case fo < Join:
		return unit(1 - plateEarly(s.bi, x, fo))
	case s.rate[0] == 0:
		return 1
	}
	total := 0.0
	for n, rate := range s.rate {
		if (rate-s.rate[0])*fo > negligible {
			break
		}
		total += s.centre[n] * math.Exp(-rate*fo) * math.Cos(s.zeta[n]*x)
	}
	return unit(total)
}

// OneTerm returns the first term of θ at x and of the mean, which is near them from Fo = 0.2 on.
func (s *Plate) OneTerm(x, fo float64) (theta, mean float64) {
	decay := math.Exp(-s.rate[0] * fo)
	return s.first(x) * decay, s.mean[0] * decay
}

// first returns the coefficient of the first term at x.
func (s *Plate) first(x float64) float64 {
	if x == 1 {
		return s.surface[0]
	}
	return s.centre[0] * math.Cos(s.zeta[0]*x)
}

// TimeAt returns the Fourier number at which θ at the fraction x has fallen to theta, 0 < theta < 1, and
// false if there is none that a float64 holds.
func (s *Plate) TimeAt(x, theta float64) (float64, bool) {
	return Fall(func(fo float64) float64 { return s.At(x, fo) }, s.first(x), s.rate[0], theta)
}

// TimeOfMean is [Plate.TimeAt] for the mean over the volume.
func (s *Plate) TimeOfMean(theta float64) (float64, bool) {
	return Fall(s.Mean, s.mean[0], s.rate[0], theta)
}
