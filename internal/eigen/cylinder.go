package eigen

import "math"

// A Cylinder is the solution for a long solid cylinder at one Biot number Bi = h R/k. It does not
// change after construction and may be used from many goroutines.
//
// Series: H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., Oxford 1959, section
// 7.7 (from memory): θ = Σ C_n exp(−ζ_n² Fo) J0(ζ_n x) with ζ J1(ζ) = Bi J0(ζ).
type Cylinder struct {
	bi      float64
	zeta    [CylinderTerms]float64 // ζ_n
	rate    [CylinderTerms]float64 // ζ_n²
	centre  [CylinderTerms]float64 // C_n, the coefficient at the centre
	surface [CylinderTerms]float64 // C_n J0(ζ_n)
	mean    [CylinderTerms]float64 // the coefficient of the mean over the volume
	early   float64                // 1 − mean at Fo = CylinderJoin
}

// CylinderJoin is the Fourier number from which the series of a cylinder is summed; the short-time form, whose
// images are no closed terms, is exact to 1e-14 below it.
const CylinderJoin = 0.0055

// CylinderTerms is how many terms of the series are kept for a cylinder: ζ_27 > 26π, so that the first one
// left out is below exp(−36) at CylinderJoin.
const CylinderTerms = 26

// NewCylinder returns the solution for Bi ≥ 0. Bi = +Inf is a prescribed surface temperature. For a
// negative or NaN Biot number every result is NaN.
func NewCylinder(bi float64) *Cylinder {
	s := &Cylinder{bi: bi}
	if !(bi >= 0) {
		s.bi = math.NaN()
	}
	sign := 1.0
	for n := range CylinderTerms {
		zeta := cylinderRoot(n+1, s.bi)
		s.zeta[n], s.rate[n] = zeta, zeta*zeta
		c, surface, mean := cylinderCoefficients(s.bi, zeta)
		s.centre[n], s.surface[n], s.mean[n] = sign*c, surface, mean
		sign = -sign
	}
	s.early = cylinderEarlyLoss(s.bi, CylinderJoin)
	return s
}

// cylinderCoefficients returns |C_n|, C_n J0(ζ_n) and the coefficient of the mean for a root. The usual form
// 2 J1/(ζ (J0² + J1²)) loses digits where J1 is small; with J1/J0 = Bi/ζ put in, and with
// s = Bi/√(ζ² + Bi²), c = ζ/√(ζ² + Bi²), they are
//
//	|C| = 2 s/(ζ √(J0² + J1²)),  surface 2 s c/ζ,  mean 4 s²/ζ².
func cylinderCoefficients(bi, zeta float64) (c, surface, mean float64) {
	if zeta == 0 {
		return 1, 1, 1
	}
	sine, cosine := share(zeta, bi)
	ratio := 2 * sine / zeta
	return ratio / math.Hypot(math.J0(zeta), math.J1(zeta)), ratio * cosine, ratio * ratio
}

// Biot returns the Biot number.
func (s *Cylinder) Biot() float64 { return s.bi }

// Decay returns ζ_1².
func (s *Cylinder) Decay() float64 { return s.rate[0] }

// Term returns ζ_n, C_n and the coefficient of the mean for n from 1 to [CylinderTerms], and zeros for
// another n.
func (s *Cylinder) Term(n int) (zeta, c, mean float64) {
	if n < 1 || n > CylinderTerms {
		return 0, 0, 0
	}
	return s.zeta[n-1], s.centre[n-1], s.mean[n-1]
}

// ErrorBound bounds the absolute error of θ at every place, at Fo ≥ 0: what is left out and rounding.
func (s *Cylinder) ErrorBound(fo float64) float64 {
	if fo < CylinderJoin {
		return 2*math.Exp(-0.2/fo) + rounding
	}
	return 3*math.Exp(-35*fo/CylinderJoin) + roundingLate(s.rate[0], fo)
}

// Centre returns θ at the centre at Fo ≥ 0.
func (s *Cylinder) Centre(fo float64) float64 {
	if fo < CylinderJoin {
		return unit(1 - cylinderEarly(s.bi, 0, fo))
	}
	return unit(sum(s.centre[:], s.rate[:], fo))
}

// Surface returns θ at the surface at Fo ≥ 0. With a prescribed surface temperature it is 0 for
// every Fo, also for 0.
func (s *Cylinder) Surface(fo float64) float64 {
	if fo < CylinderJoin {
		return unit(cylinderEarlySurface(s.bi, fo))
	}
	return unit(sum(s.surface[:], s.rate[:], fo))
}

// Mean returns θ as the mean over the volume at Fo ≥ 0.
func (s *Cylinder) Mean(fo float64) float64 {
	if fo < CylinderJoin {
		return unit(1 - cylinderEarlyLoss(s.bi, fo))
	}
	return unit(sum(s.mean[:], s.rate[:], fo))
}

// Loss returns 1 − Mean at Fo ≥ 0, the fraction of the heat that has been exchanged, without the
// cancellation of that difference.
func (s *Cylinder) Loss(fo float64) float64 {
	if fo < CylinderJoin {
		return unit(cylinderEarlyLoss(s.bi, fo))
	}
	return unit(lossBehind(s.early, s.mean[:], s.rate[:], CylinderJoin, fo))
}

// At returns θ at the fraction x of the radius, 0 ≤ x ≤ 1, at Fo ≥ 0.
func (s *Cylinder) At(x, fo float64) float64 {
	switch {
	case x == 0:
		return s.Centre(fo)
	case x == 1:
		return s.Surface(fo)
	case fo < CylinderJoin:
		return unit(1 - cylinderEarly(s.bi, x, fo))
	case s.rate[0] == 0:
		return 1
	}
	total := 0.0
	for n, rate := range s.rate {
		if (rate-s.rate[0])*fo > negligible {
			break
		}
		total += s.centre[n] * math.Exp(-rate*fo) * math.J0(s.zeta[n]*x)
	}
	return unit(total)
}

// OneTerm returns the first term of θ at x and of the mean, which is near them from Fo = 0.2 on.
func (s *Cylinder) OneTerm(x, fo float64) (theta, mean float64) {
	decay := math.Exp(-s.rate[0] * fo)
	return s.first(x) * decay, s.mean[0] * decay
}

// first returns the coefficient of the first term at x.
func (s *Cylinder) first(x float64) float64 {
	if x == 1 {
		return s.surface[0]
	}
	return s.centre[0] * math.J0(s.zeta[0]*x)
}

// TimeAt returns the Fourier number at which θ at the fraction x of the radius has fallen to theta,
// 0 < theta < 1, and false if there is none that a float64 holds.
func (s *Cylinder) TimeAt(x, theta float64) (float64, bool) {
	return Fall(func(fo float64) float64 { return s.At(x, fo) }, s.first(x), s.rate[0], theta)
}

// TimeOfMean is [Cylinder.TimeAt] for the mean over the volume.
func (s *Cylinder) TimeOfMean(theta float64) (float64, bool) {
	return Fall(s.Mean, s.mean[0], s.rate[0], theta)
}
