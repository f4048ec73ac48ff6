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
	Curve(x, fo float64) (theta, slope float64)  // At and its derivative over Fo
	CurveOfMean(fo float64) (float64, float64)   // Mean and its derivative over Fo
	Truncation(fo float64) float64               // bound of what is left out of θ at every place
	ErrorBound(fo float64) float64               // the same with rounding
	TimeAt(x, theta float64) (float64, bool)     // inverse of At over Fo
	TimeOfMean(theta float64) (float64, bool)    // inverse of Mean
	OneTerm(x, fo float64) (theta, mean float64) // the first term alone
	Join() float64                               // from which Fo the series is summed

	term(n int, p place) (c, rate float64, ok bool) // coefficient and rate of term n, from 1 on
	lag(p place, fo float64) float64                // ∫ (1 − θ) dFo for 0 < fo ≤ Join
	below(x, fo float64) (loss, rate float64)       // 1 − θ by the short-time form
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

// AnyTerm returns term n of the series from 1 on, also one that is not kept: ζ_n, C_n, and the coefficients at the
// surface and of the mean.
func AnyTerm(s Solution, n int) (zeta, c, ofSurface, ofMean float64) {
	bi := s.Biot()
	var t term
	switch s.(type) {
	case *Plate:
		t = plateTerm(n, bi)
	case *Cylinder:
		t = cylinderTerm(n, bi)
	case *Sphere:
		t = sphereTerm(n, bi)
	}
	if n%2 == 0 {
		t.c[centre] *= -1
	}
	return t.zeta, t.c[centre], t.c[surface], t.c[mean]
}
