package eigen

import "math"

// A Flux is the solution for a constant heat flux q through the surface: the change of temperature over q R/k, for a
// flux that enters. It is the limit of (1 − θ)/Bi for Bi → 0, and taken so, with m = 1, 2 or 3:
//
//	m Fo + x²/2 − m/(2 (m + 2)) − Σ (C_n/Bi) exp(−ζ_n² Fo) f(ζ_n x), n from 2 on, f = cos, J0 or sin z/z
//
// (H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., sections 3.8, 7.8 and 9.7, from
// memory). It does not change and may be used from many goroutines.
type Flux struct{ solution Solution }

// vanishing stands for a Biot number of 0; the limit differs by less than it, relatively.
const vanishing = 1e-100

// NewPlateFlux returns the solution for a plate.
func NewPlateFlux() Flux { return Flux{NewPlate(vanishing)} }

// NewCylinderFlux returns the solution for a long cylinder.
func NewCylinderFlux() Flux { return Flux{NewCylinder(vanishing)} }

// NewSphereFlux returns the solution for a sphere.
func NewSphereFlux() Flux { return Flux{NewSphere(vanishing)} }

// At returns the change at the fraction x of the way from the centre to the surface at Fo ≥ 0.
func (f Flux) At(x, fo float64) float64 {
	s := f.solution
	if fo < s.Join() {
		loss, _ := s.below(x, fo)
		return loss / vanishing
	}
	m := s.dimension()
	total := m*fo + x*x/2 - m/(2*(m+2))
	for n := 2; ; n++ {
		c, rate, ok := s.term(n, place{x: x})
		if !ok || rate*fo > negligible {
			return total
		}
		total -= c / vanishing * math.Exp(-rate*fo)
	}
}

// Mean returns the change of the mean over the volume, m Fo.
func (f Flux) Mean(fo float64) float64 { return f.solution.dimension() * fo }

// Term returns ζ_n and C_n/Bi for n from 2 on, and zeros behind the last one kept.
func (f Flux) Term(n int) (zeta, c float64) {
	if n < 2 {
		return 0, 0
	}
	zeta, c, _ = f.solution.Term(n)
	return zeta, c / vanishing
}

// Truncation bounds what is left out of At at Fo ≥ 0.
func (f Flux) Truncation(fo float64) float64 {
	return f.solution.Truncation(fo) * (1 + f.Mean(fo))
}

// ErrorBound bounds the absolute error of At at Fo ≥ 0.
func (f Flux) ErrorBound(fo float64) float64 {
	return f.solution.ErrorBound(fo) * (1 + f.Mean(fo))
}

func (s *Plate) below(x, fo float64) (loss, rate float64)    { return plateEarly(s.bi, x, fo) }
func (s *Cylinder) below(x, fo float64) (loss, rate float64) { return cylinderEarly(s.bi, x, fo) }
func (s *Sphere) below(x, fo float64) (loss, rate float64)   { return sphereEarly(s.bi, x, fo) }
