package eigen

import "math"

// A Solution is θ in a body of one coordinate at one Biot number: [Plate], [Cylinder] or [Sphere]. It
// does not change and may be used from many goroutines; evaluating it allocates nothing.
type Solution interface {
	Biot() float64                               // Bi = h R/k
	Term(n int) (zeta, c, mean float64)          // term n of the series, from 1 on
	Decay() float64                              // ζ_1², with which everything decays at late times
	Centre(fo float64) float64                   // θ at the centre
	Surface(fo float64) float64                  // θ at the surface
	Mean(fo float64) float64                     // the mean of θ over the volume
	At(x, fo float64) float64                    // θ at the fraction x of the way from the centre to the surface
	Loss(fo float64) float64                     // 1 − Mean, without cancellation
	ErrorBound(fo float64) float64               // on the absolute error of θ at every place
	TimeAt(x, theta float64) (float64, bool)     // inverse of At over Fo
	TimeOfMean(theta float64) (float64, bool)    // inverse of Mean
	OneTerm(x, fo float64) (theta, mean float64) // the first term alone
	Join() float64                               // from which Fo the series is summed

	term(n int, p place) (c, rate float64, ok bool) // coefficient and rate of term n, from 1 on
	lag(p place, fo float64) float64                // ∫ (1 − θ) dFo for 0 < fo ≤ Join
	below(x, fo float64) float64                    // 1 − θ by the short-time form
	transfer(q complex128, x float64) (d, ratio complex128)
	dimension() float64 // m: 1, 2 or 3
}

// share returns s = Bi/√(ζ² + Bi²) and c = ζ/√(ζ² + Bi²) for Bi from 0 to +Inf, where neither a square
// overflows nor one vanishes.
func share(zeta, bi float64) (s, c float64) {
	if bi > zeta {
		r := zeta / bi
		s = 1 / math.Sqrt(1+r*r)
		return s, r * s
	}
	if zeta == 0 {
		return 0, 1
	}
	r := bi / zeta
	c = 1 / math.Sqrt(1+r*r)
	return r * c, c
}

// lossBehind returns the loss at Fo ≥ join from that at join and the series of the mean, of which every
// term is positive.
func lossBehind(early float64, mean, rate []float64, join, fo float64) float64 {
	loss := early
	for n, m := range mean {
		if rate[n]*join > negligible {
			break
		}
		if rate[n] > 0 {
			loss -= m * math.Exp(-rate[n]*join) * math.Expm1(-rate[n]*(fo-join))
		}
	}
	return loss
}

// AnyTerm returns term n of the series from 1 on, also one that is not kept: ζ_n, C_n, and the coefficients at the
// surface and of the mean.
func AnyTerm(s Solution, n int) (zeta, c, surface, mean float64) {
	bi := s.Biot()
	switch s.(type) {
	case *Plate:
		zeta = plateRoot(n, bi)
		c, surface, mean = plateCoefficients(bi, zeta)
	case *Cylinder:
		zeta = cylinderRoot(n, bi)
		c, surface, mean = cylinderCoefficients(bi, zeta)
	case *Sphere:
		var square float64
		zeta, square = sphereRoot(n, bi)
		c, surface, mean = sphereCoefficients(bi, square)
	}
	if n%2 == 0 {
		c = -c
	}
	return zeta, c, surface, mean
}
