package series

import (
	"math"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units/shape"
)

// Slopes are θ of a body of one coordinate and its derivatives.
type slopes struct {
	theta   float64
	biot    float64 // Bi ∂θ/∂Bi
	fourier float64 // Fo ∂θ/∂Fo
	place   float64 // ∂θ/∂x; 0 for the mean
}

// A spot is a fraction of the way from the centre to the surface, or the mean.
type spot struct {
	x    float64
	mean bool
}

func (p spot) theta(m eigen.Solution, fo float64) float64 {
	if p.mean {
		return m.Mean(fo)
	}
	return m.At(p.x, fo)
}

// curve returns θ and its derivative over the Fourier number.
func (p spot) curve(m eigen.Solution, fo float64) (theta, slope float64) {
	if p.mean {
		return m.CurveOfMean(fo)
	}
	return m.Curve(p.x, fo)
}

// slopesOf returns the slopes of a plate, a long cylinder or a sphere. From the time on from which the series is
// summed it is differentiated term by term; before, see earlySlopes.
func slopesOf(family shape.Family, m eigen.Solution, p spot, fo float64) slopes {
	switch {
	case m.Biot() == 0:
		return slopes{theta: 1}
	case fo == 0:
		return slopes{theta: p.theta(m, 0)}
	}
	theta, slope := p.curve(m, fo)
	s := slopes{theta: theta, fourier: fo * slope}
	if fo < m.Join() {
		earlySlopes(&s, family, m, p, fo)
		return s
	}
	for n := 1; ; n++ {
		zeta, c, mean := m.Term(n)
		rate := zeta * zeta
		if zeta == 0 || (rate-m.Decay())*fo > 45 {
			return s
		}
		decay := math.Exp(-rate * fo)
		pull := pullOf(family, m.Biot(), rate)
		if p.mean {
			s.biot += mean * decay * (pull.mean - rate*pull.surface*fo)
			continue
		}
		f, slope := eigenfunction(family, zeta*p.x)
		s.biot += c * decay * ((pull.centre-rate*pull.surface*fo)*f + zeta*pull.surface/2*p.x*slope)
		s.place += c * decay * zeta * slope
	}
}

// A pull is how a term of the series goes with the Biot number, Bi d/dBi of:
type pull struct {
	surface float64 // the logarithm of ζ²
	centre  float64 // the logarithm of C
	mean    float64 // the logarithm of the coefficient of the mean
}

// pullOf differentiates the equation of the roots, ζ f'(ζ) + Bi f(ζ) = 0, and with it the coefficients. Let m = 1, 2
// or 3 be the dimension and N = ζ² + Bi² + (2 − m) Bi. The first result is 2 Bi/N, which is the coefficient S of the
// series for the surface; with it C = S/f(ζ) gives Bi dlnC/dBi = ζ² (1 − S)/N, in which nothing cancels but the
// bracket, and the coefficient of the mean, m Bi S/ζ², gives 1 + ζ² (1 − S)/N − Bi²/N − S.
func pullOf(family shape.Family, bi, rate float64) pull {
	if math.IsInf(bi, 1) {
		return pull{}
	}
	m := dimension(family)
	inverse := 1 / (rate/bi + bi + 2 - m) // Bi/N
	s := 2 * inverse
	centre := rate / bi * (1 - s) * inverse
	return pull{surface: s, centre: centre, mean: 1 + centre - bi*inverse - s}
}

// dimension returns 1 for a plate, 2 for a long cylinder and 3 for a sphere.
func dimension(family shape.Family) float64 {
	switch family {
	case shape.Planar:
		return 1
	case shape.Cylindrical:
		return 2
	}
	return 3
}

// eigenfunction returns f and its derivative: cos z, J0(z) or sin z/z.
func eigenfunction(family shape.Family, z float64) (f, slope float64) {
	switch family {
	case shape.Planar:
		sin, cos := math.Sincos(z)
		return cos, -sin
	case shape.Cylindrical:
		return math.J0(z), -math.J1(z)
	}
	if z < 1e-4 {
		return 1 - z*z/6, -z / 3
	}
	sin, cos := math.Sincos(z)
	return sin / z, (cos - sin/z) / z
}

// earlySlopes adds the slopes over the Biot number and the place where θ comes from a form for short times. They are
// those of the polynomials through its values around, in ln Bi and in x/√Fo, over which the forms have no feature
// narrower than 1: good to some 1e-11.
func earlySlopes(s *slopes, family shape.Family, m eigen.Solution, p spot, fo float64) {
	if !math.IsInf(m.Biot(), 1) {
		s.biot = slopeAt(func(u float64) float64 {
			return p.theta(newModes(family, m.Biot()*math.Exp(u)), fo)
		}, math.Inf(-1), math.Inf(1))
	}
	if !p.mean {
		width := math.Sqrt(fo)
		s.place = slopeAt(func(u float64) float64 {
			return m.At(math.Max(0, math.Min(1, p.x+u*width)), fo)
		}, -p.x/width, (1-p.x)/width) / width
	}
}

// nodes is how many values a polynomial goes through.
const nodes = 17

// slopeAt returns the derivative at 0 of the polynomial through Chebyshev's points of an interval of the length 1
// between lo ≤ 0 and hi ≥ 0, which are 1.2 apart or more. The interval is the one nearest to the middle that has 0 for
// one of its points (barycentric form: J.-P. Berrut and L. N. Trefethen, SIAM Review 46 (2004) 501–517, from
// memory).
func slopeAt(f func(u float64) float64, lo, hi float64) float64 {
	var at [nodes]float64
	for i := range at {
		at[i] = (1 - math.Cos(math.Pi*float64(i)/(nodes-1))) / 2
	}
	zero := nodes / 2
	for zero > 0 && -at[zero] < lo {
		zero--
	}
	for zero < nodes-1 && 1-at[zero] > hi {
		zero++
	}
	here, total := f(0), 0.0
	for i := range at {
		if i == zero {
			continue
		}
		w := 1 - 2*float64((i-zero)&1)
		if i == 0 || i == nodes-1 {
			w /= 2
		}
		if zero == 0 || zero == nodes-1 {
			w *= 2
		}
		u := at[i] - at[zero]
		total -= w * (f(u) - here) / u
	}
	return total
}
