package eigen

import "math"

// A Plate is the solution for a plate at one Biot number Bi = h L/k, where L is half the thickness of a
// plate that exchanges heat at both faces, and the whole thickness of one with an insulated face. Its results do
// not change after construction and may be used from many goroutines.
//
// Series: H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., Oxford 1959, section
// 3.11 (from memory): θ = Σ C_n exp(−ζ_n² Fo) cos(ζ_n x) with ζ tan ζ = Bi.
type Plate struct {
	series
	room [Terms]term
}

// NewPlate returns the solution for Bi ≥ 0. Bi = +Inf is a prescribed surface temperature. For a
// negative or NaN Biot number every result is NaN.
func NewPlate(bi float64) *Plate {
	s := &Plate{}
	s.start(bi, s.room[:], plateTerm)
	return s
}

func plateTerm(n int, bi float64) (t term) {
	t.zeta = plateRoot(n, bi)
	t.rate = t.zeta * t.zeta
	t.c[centre], t.c[surface], t.c[mean] = plateCoefficients(bi, t.zeta)
	return t
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

// Centre returns θ at the centre, or at the insulated face, at Fo ≥ 0.
func (s *Plate) Centre(fo float64) float64 { return s.At(0, fo) }

// Surface returns θ at the surface at Fo ≥ 0. With a prescribed surface temperature it is 0 for
// every Fo, also for 0.
func (s *Plate) Surface(fo float64) float64 { return s.At(1, fo) }

// At returns θ at the fraction x of the way from the centre to the surface, 0 ≤ x ≤ 1, at Fo ≥ 0.
func (s *Plate) At(x, fo float64) float64 {
	theta, _ := s.Curve(x, fo)
	return unit(theta)
}

// Curve returns θ at the fraction x of the way from the centre to the surface at Fo ≥ 0, and its derivative over Fo,
// to six digits at least; rounding may bring θ just beyond 0 and 1.
func (s *Plate) Curve(x, fo float64) (theta, slope float64) {
	switch {
	case fo < Join && x == 1:
		return plateEarlySurface(s.bi, fo)
	case fo < Join:
		loss, rate := plateEarly(s.bi, x, fo)
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
		part := t.c[centre] * t.decayed(fo) * cosine(t.zeta*x)
		theta += part
		slope -= t.rate * part
	}
	return theta, slope
}

// Mean returns θ as the mean over the volume at Fo ≥ 0.
func (s *Plate) Mean(fo float64) float64 {
	if fo < Join {
		return unit(1 - plateEarlyLoss(s.bi, fo))
	}
	theta, _ := s.sum(mean, fo)
	return unit(theta)
}

// CurveOfMean is [Plate.Curve] for the mean over the volume.
func (s *Plate) CurveOfMean(fo float64) (theta, slope float64) {
	if fo < Join {
		return earlyMean(1, s.bi, 0, fo, plateEarlyLoss)
	}
	return s.sum(mean, fo)
}

// Loss returns 1 − Mean at Fo ≥ 0, the fraction of the heat that has been exchanged, without the
// cancellation of that difference.
func (s *Plate) Loss(fo float64) float64 {
	if fo < Join {
		return unit(plateEarlyLoss(s.bi, fo))
	}
	return unit(s.lossBehind(Join, plateEarlyLoss, fo))
}

// OneTerm returns the first term of θ at x and of the mean, which is near them from Fo = 0.2 on.
func (s *Plate) OneTerm(x, fo float64) (theta, ofMean float64) {
	decay := math.Exp(-s.terms[0].rate * fo)
	return s.first(x) * decay, s.terms[0].c[mean] * decay
}

// first returns the coefficient of the first term at x.
func (s *Plate) first(x float64) float64 {
	if x == 1 {
		return s.terms[0].c[surface]
	}
	return s.terms[0].c[centre] * cosine(s.terms[0].zeta*x)
}

// TimeAt returns the Fourier number at which θ at the fraction x has fallen to theta, 0 < theta < 1, and
// false if there is none that a float64 holds.
func (s *Plate) TimeAt(x, theta float64) (float64, bool) {
	return FallBySlope(func(fo float64) (float64, float64) { return s.Curve(x, fo) }, s.first(x), s.terms[0].rate, theta)
}

// TimeOfMean is [Plate.TimeAt] for the mean over the volume.
func (s *Plate) TimeOfMean(theta float64) (float64, bool) {
	return FallBySlope(s.CurveOfMean, s.terms[0].c[mean], s.terms[0].rate, theta)
}
