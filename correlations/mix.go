package correlations

import (
	"math"
	"strconv"

	"example.com/coolward/units"
)

// The blend of mixed convection that [Mix] uses.
const (
	MixExponent = 3
	MixSource   = "S. W. Churchill, A comprehensive correlating equation for laminar, assisting, forced and free convection, AIChE J. 23 (1977) 10-16 (citation read in a reference list; exponent 3 from memory; blending Nu − 2, so that the conduction limit is not counted twice, is our own choice)"
)

// opposedScatter is the largest that cancellation makes of the scatter.
const opposedScatter = 0.9

// A Mixture is the Nusselt number of a body on which forced and natural convection act together.
type Mixture struct {
	Nu           float64
	Scatter      float64 // of the two, weighted by their shares; larger in a blend that is opposed
	Forced       float64 // share of forced convection in what exceeds conduction, from 0 to 1
	Natural      float64 // share of natural convection in what exceeds conduction, from 0 to 1
	Extrapolated bool    // one of the two is outside its range
}

// Mix returns the Nusselt number of a sphere on which forced and natural convection act together,
// both on the same conductivity and diameter,
//
//	(Nu − 2)³ = (Nu forced − 2)³ + (Nu natural − 2)³
//
// for a stream along or across the buoyant flow. In a stream against it the Nusselt number can be
// lower. It is the [Blend] with exponent 3 and the Nusselt number 2 at rest.
func Mix(forced, natural Result) (Mixture, error) {
	return Blend{Exponent: MixExponent, Rest: 2}.Mix(forced, natural)
}

// A Blend says how forced and natural convection act together on a body,
//
//	(Nu − rest)^n = |(Nu forced − rest)^n ± (Nu natural − rest)^n|
//
// with + where the stream is along or across the buoyant flow and − where it is against it. The exponent n
// is 3 in general, 7/2 for horizontal plates and 4 for cylinders and spheres across the buoyant flow, after
// [MixSource] and from memory.
type Blend struct {
	Exponent float64 // n, from 1 up
	Rest     float64 // Nusselt number of the body in a fluid at rest; 0 for a plate or a long cylinder

	// Opposed is for a stream against the buoyant flow. The formula falls to the number at rest where
	// both are equal, which no body does: do not rely on it where one excess is 0.5 to 2 times the other. The
	// scatter is that of the difference of the powers, and 0.9 at most, which is our own choice.
	Opposed bool
}

// Mix returns the Nusselt number of the blend, of two on the same conductivity and length.
// The result has no threshold: it is either one where the other vanishes. A share is the part of the power in
// the sum of both powers; for a blend that is not opposed it is also the sensitivity of what exceeds rest.
// Where both vanish the natural one is 1. It returns an [*units.ArgumentError] unless
// both Nusselt numbers are finite and at least the one at rest, the exponent is finite and from 1 up and the
// rest is finite and not below 0, and if the blend is not finite.
func (b Blend) Mix(forced, natural Result) (Mixture, error) {
	if !(b.Exponent >= 1 && b.Exponent <= math.MaxFloat64) {
		return Mixture{}, &units.ArgumentError{Field: "exponent of the blend", Value: b.Exponent, Accepted: "finite, from 1 up"}
	}
	if !usable(b.Rest) {
		return Mixture{}, &units.ArgumentError{Field: "Nusselt number at rest", Value: b.Rest, Accepted: "finite and not below 0"}
	}
	f, n := forced.Nu-b.Rest, natural.Nu-b.Rest
	if !usable(f) {
		return Mixture{}, &units.ArgumentError{Field: "forced Nusselt number", Value: forced.Nu, Accepted: b.accepted()}
	}
	if !usable(n) {
		return Mixture{}, &units.ArgumentError{Field: "natural Nusselt number", Value: natural.Nu, Accepted: b.accepted()}
	}
	for _, s := range [...]float64{forced.Scatter, natural.Scatter} {
		if !usable(s) {
			return Mixture{}, &units.ArgumentError{Field: "scatter", Value: s, Accepted: "finite and not below 0"}
		}
	}
	m := Mixture{Nu: b.Rest, Natural: 1, Extrapolated: forced.Extrapolated || natural.Extrapolated}
	switch large := max(f, n); {
	case large == 0:
	case f == 0: // the usual case of a fluid at rest, without powers and roots
		m.Nu += n
	case n == 0:
		m.Nu, m.Forced, m.Natural = m.Nu+f, 1, 0
	default:
		f, n = b.power(f/large), b.power(n/large) // against overflow of the powers
		m.Forced = f / (f + n)
		m.Natural = n / (f + n)
		if b.Opposed {
			m.Nu += large * b.root(math.Abs(f-n))
		} else {
			m.Nu += large * b.root(f+n)
		}
	}
	if !(m.Nu <= math.MaxFloat64) {
		return Mixture{}, &units.ArgumentError{Field: "forced and natural Nusselt number", Value: max(forced.Nu, natural.Nu), Accepted: "numbers whose blend is finite"}
	}
	m.Scatter = m.Forced*forced.Scatter + m.Natural*natural.Scatter
	if b.Opposed && m.Forced > 0 && m.Natural > 0 {
		m.Scatter = max(m.Scatter, min(opposedScatter, m.Scatter/math.Abs(m.Forced-m.Natural)))
	}
	return m, nil
}

func (b Blend) accepted() string {
	return "finite, from " + strconv.FormatFloat(b.Rest, 'g', -1, 64) + " up"
}

// power returns x^n.
func (b Blend) power(x float64) float64 {
	if b.Exponent == 3 {
		return x * x * x
	}
	return math.Pow(x, b.Exponent)
}

// root returns x^(1/n).
func (b Blend) root(x float64) float64 {
	if b.Exponent == 3 {
		return cubeRoot(x)
	}
	return math.Pow(x, 1/b.Exponent)
}
