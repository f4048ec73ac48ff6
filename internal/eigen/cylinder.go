package eigen

import "math"

// A Cylinder is the solution for a long solid cylinder at one Biot number Bi = h R/k. It does not
// change after construction and may be used from many goroutines.
//
// Series: H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., Oxford 1959, section
// 7.7 (from memory): θ = Σ C_n exp(−ζ_n² Fo) J0(ζ_n x) with ζ J1(ζ) = Bi J0(ζ).
type Cylinder struct {
	series
	table *besselTable
	room  [CylinderTerms]term
}

// CylinderJoin is the Fourier number from which the series of a cylinder is summed: until then the short-time form,
// whose images are no closed terms, takes less time.
const CylinderJoin = 0.003

// CylinderTerms is how many terms of the series there are for a cylinder: ζ_37 > 36π, so that
// (ζ_37² − ζ_1²) CylinderJoin > 38.3, which is more than negligible.
const CylinderTerms = 36

// NewCylinder returns the solution for Bi ≥ 0. Bi = +Inf is a prescribed surface temperature. For a
// negative or NaN Biot number every result is NaN.
func NewCylinder(bi float64) *Cylinder {
	s := &Cylinder{table: bessel()}
	s.start(bi, s.room[:], cylinderTerm)
	return s
}

func cylinderTerm(n int, bi float64) (t term) {
	t.zeta = cylinderRoot(n, bi)
	t.rate = t.zeta * t.zeta
	t.c[centre], t.c[surface], t.c[mean] = cylinderCoefficients(bi, t.zeta)
	return t
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
	j0, j1 := bessel01(zeta)
	return ratio / math.Sqrt(j0*j0+j1*j1), ratio * cosine, ratio * ratio
}

// Centre returns θ at the centre at Fo ≥ 0.
func (s *Cylinder) Centre(fo float64) float64 { return s.At(0, fo) }

// Surface returns θ at the surface at Fo ≥ 0. With a prescribed surface temperature it is 0 for
// every Fo, also for 0.
func (s *Cylinder) Surface(fo float64) float64 { return s.At(1, fo) }

// At returns θ at the fraction x of the radius, 0 ≤ x ≤ 1, at Fo ≥ 0.
func (s *Cylinder) At(x, fo float64) float64 {
	theta, _ := s.Curve(x, fo)
	return unit(theta)
}

// Curve returns θ at the fraction x of the radius at Fo ≥ 0, and its derivative over Fo,
// to six digits at least; rounding may bring θ just beyond 0 and 1.
func (s *Cylinder) Curve(x, fo float64) (theta, slope float64) {
	switch {
	case fo < CylinderJoin && x == 1:
		return cylinderEarlySurface(s.bi, fo)
	case fo < CylinderJoin:
		loss, rate := cylinderEarly(s.bi, x, fo)
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
		part := t.c[centre]
		if e := t.rate * fo; e <= decayEnd { // decayed in line
			k, r := parted(e)
			part *= raised(k, r)
		} else {
			part *= math.Exp(-e)
		}
		z := t.zeta * x
		i := min(uint(z*(1/besselStep)+0.5), besselLast) // bessel0 in line
		r, a := z-float64(i)*besselStep, &s.table[i].j0
		square := r * r
		part *= head(a, r) + square*square*tail(a, r)
		theta += part
		slope -= t.rate * part
	}
	return theta, slope
}

// Mean returns θ as the mean over the volume at Fo ≥ 0.
func (s *Cylinder) Mean(fo float64) float64 {
	if fo < CylinderJoin {
		return unit(1 - cylinderEarlyLoss(s.bi, fo))
	}
	theta, _ := s.sum(mean, fo)
	return unit(theta)
}

// CurveOfMean is [Cylinder.Curve] for the mean over the volume.
func (s *Cylinder) CurveOfMean(fo float64) (theta, slope float64) {
	if fo < CylinderJoin {
		return cylinderEarlyMean(s.bi, fo)
	}
	return s.sum(mean, fo)
}

// Loss returns 1 − Mean at Fo ≥ 0, the fraction of the heat that has been exchanged, without the
// cancellation of that difference.
func (s *Cylinder) Loss(fo float64) float64 {
	if fo < CylinderJoin {
		return unit(cylinderEarlyLoss(s.bi, fo))
	}
	return unit(s.lossBehind(CylinderJoin, cylinderEarlyLoss, fo))
}

// OneTerm returns the first term of θ at x and of the mean, which is near them from Fo = 0.2 on.
func (s *Cylinder) OneTerm(x, fo float64) (theta, ofMean float64) {
	decay := math.Exp(-s.terms[0].rate * fo)
	return s.first(x) * decay, s.terms[0].c[mean] * decay
}

// first returns the coefficient of the first term at x.
func (s *Cylinder) first(x float64) float64 {
	if x == 1 {
		return s.terms[0].c[surface]
	}
	return s.terms[0].c[centre] * bessel0(s.table, s.terms[0].zeta*x)
}

// TimeAt returns the Fourier number at which θ at the fraction x of the radius has fallen to theta, 0 < theta < 1, and
// false if there is none that a float64 holds.
func (s *Cylinder) TimeAt(x, theta float64) (float64, bool) {
	return FallBySlope(func(fo float64) (float64, float64) { return s.Curve(x, fo) }, s.first(x), s.terms[0].rate, theta)
}

// TimeOfMean is [Cylinder.TimeAt] for the mean over the volume.
func (s *Cylinder) TimeOfMean(theta float64) (float64, bool) {
	return FallBySlope(s.CurveOfMean, s.terms[0].c[mean], s.terms[0].rate, theta)
}
