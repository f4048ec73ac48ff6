package correlations

import (
	"math"

	"example.com/coolward/units"
)

// The blend of mixed convection that [Mix] uses.
const (
	MixExponent = 3
	MixSource   = "S. W. Churchill, A comprehensive correlating equation for laminar, assisting, forced and free convection, AIChE J. 23 (1977) 10-16 (citation read in a reference list; exponent 3 from memory; blending Nu − 2, so that the conduction limit is not counted twice, is our own choice)"
)

// A Mixture is the Nusselt number of a sphere on which forced and natural convection act together.
type Mixture struct {
	Nu           float64
	Scatter      float64 // of the two, weighted by their shares
	Forced       float64 // share of forced convection in Nu − 2, from 0 to 1
	Natural      float64 // share of natural convection in Nu − 2, from 0 to 1
	Extrapolated bool    // one of the two is outside its range
}

// Mix returns the Nusselt number of a sphere on which forced and natural convection act together,
// both on the same conductivity and diameter,
//
//	(Nu − 2)³ = (Nu forced − 2)³ + (Nu natural − 2)³
//
// for a stream along or across the buoyant flow. In a stream against it the Nusselt number can be
// lower. The result has no threshold: it is either one where the other vanishes. A share is the
// cube's part of the sum, which is also the sensitivity of Nu − 2; where both vanish the natural one
// is 1. It returns an [*units.ArgumentError] unless both Nusselt numbers are finite and at least 2, and if
// their blend is not finite.
func Mix(forced, natural Result) (Mixture, error) {
	f, n := forced.Nu-2, natural.Nu-2
	if !(f >= 0 && f <= math.MaxFloat64) {
		return Mixture{}, &units.ArgumentError{Field: "forced Nusselt number", Value: forced.Nu, Accepted: "finite, from 2 up"}
	}
	if !(n >= 0 && n <= math.MaxFloat64) {
		return Mixture{}, &units.ArgumentError{Field: "natural Nusselt number", Value: natural.Nu, Accepted: "finite, from 2 up"}
	}
	m := Mixture{Nu: 2, Natural: 1, Extrapolated: forced.Extrapolated || natural.Extrapolated}
	if large := max(f, n); large > 0 {
		f, n = f/large, n/large // against overflow of the cubes
		sum := f*f*f + n*n*n
		m.Forced = f * f * f / sum
		m.Natural = n * n * n / sum
		m.Nu = 2 + large*math.Cbrt(sum)
	}
	if !(m.Nu <= math.MaxFloat64) {
		return Mixture{}, &units.ArgumentError{Field: "forced and natural Nusselt number", Value: max(forced.Nu, natural.Nu), Accepted: "numbers whose blend is finite"}
	}
	m.Scatter = m.Forced*forced.Scatter + m.Natural*natural.Scatter
	return m, nil
}
