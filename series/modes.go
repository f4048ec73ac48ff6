package series

import (
	"math"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// Modes are the dimensionless solution of a body of one coordinate at one Biot number, for charts, tables and
// the test suites of other programs: θ = (T − T∞)/(T0 − T∞) over the Fourier number Fo = α t/R² at the fraction
// x of the way from the centre to the surface. They do not change and may be used from many goroutines. Make
// them with [NewModes]; the functions of the zero Modes, and those of arguments that cannot be, return NaN.
type Modes struct{ solution eigen.Solution }

// A Term is one term C f(ζ x) exp(−ζ² Fo) of the series, f = cos, J0 or sin z/z.
type Term struct {
	Root        float64 // ζ
	Coefficient float64 // C, of θ at the centre; of alternating sign
	Surface     float64 // C f(ζ), of θ at the surface
	Mean        float64 // of the mean of θ over the volume
}

// NewModes returns the modes of a plate ([shape.Planar]; R is half the thickness if both faces are exposed), a
// long cylinder or a sphere for a Biot number h R/k from 0 on; +Inf is a prescribed surface temperature. It
// returns an [*units.ArgumentError] for another family or Biot number.
func NewModes(family shape.Family, biot float64) (Modes, error) {
	if family != shape.Planar && family != shape.Cylindrical && family != shape.Spherical {
		return Modes{}, &units.ArgumentError{Field: "family", Value: family, Accepted: "shape.Planar, shape.Cylindrical or shape.Spherical"}
	}
	if !(biot >= 0) {
		return Modes{}, &units.ArgumentError{Field: "Biot number", Value: biot, Accepted: "0 or above, +Inf included"}
	}
	return Modes{newModes(family, biot)}, nil
}

// Biot returns the Biot number.
func (m Modes) Biot() float64 {
	if m.solution == nil {
		return math.NaN()
	}
	return m.solution.Biot()
}

// Term returns term n of the series, from 1 to a million. Roots are good to two units in the last place, for any Biot
// number and n.
func (m Modes) Term(n int) Term {
	if m.solution == nil || n < 1 || n > 1e6 {
		return Term{math.NaN(), math.NaN(), math.NaN(), math.NaN()}
	}
	zeta, c, surface, mean := eigen.AnyTerm(m.solution, n)
	return Term{zeta, c, surface, mean}
}

// Theta returns θ at 0 ≤ x ≤ 1 and Fo ≥ 0.
func (m Modes) Theta(x, fo float64) float64 {
	if m.refuses(x, fo) {
		return math.NaN()
	}
	return m.solution.At(x, fo)
}

// Mean returns the mean of θ over the volume at Fo ≥ 0.
func (m Modes) Mean(fo float64) float64 {
	if m.refuses(0, fo) {
		return math.NaN()
	}
	return m.solution.Mean(fo)
}

// Loss returns 1 − Mean at Fo ≥ 0, the fraction of the heat that has left, with all its digits where it is small.
func (m Modes) Loss(fo float64) float64 {
	if m.refuses(0, fo) {
		return math.NaN()
	}
	return m.solution.Loss(fo)
}

// OneTerm returns the first term of θ at x and of the mean.
func (m Modes) OneTerm(x, fo float64) (theta, mean float64) {
	if m.refuses(x, fo) {
		return math.NaN(), math.NaN()
	}
	return m.solution.OneTerm(x, fo)
}

// ErrorBound bounds the absolute error of Theta and Mean at Fo ≥ 0: the terms and images left out, below 1e-16, and
// rounding, for which it takes 5e-15 before θ has decayed.
func (m Modes) ErrorBound(fo float64) float64 {
	if m.refuses(0, fo) {
		return math.NaN()
	}
	return m.solution.ErrorBound(fo)
}

// Fourier returns the Fourier number at which θ at x has fallen to theta, 0 < theta < 1, and NaN if there is
// none that a float64 holds.
func (m Modes) Fourier(x, theta float64) float64 {
	if m.refuses(x, 0) {
		return math.NaN()
	}
	fo, ok := m.solution.TimeAt(x, theta)
	if !ok {
		return math.NaN()
	}
	return fo
}

func (m Modes) refuses(x, fo float64) bool {
	return m.solution == nil || !(x >= 0 && x <= 1 && fo >= 0)
}
