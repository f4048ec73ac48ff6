package eigen

import "math"

// The integral R(Fo) = ∫ θ dFo from 0 is what a surrounding temperature that rises in proportion to time
// leaves a place behind. From the join on it is Σ −c_n/λ_n (e^{−λ_n Fo} − 1) over the terms kept and a constant
// for the others; before, it is Fo less the inverse of the transform of 1 − θ over s, by the quadrature of the
// cylinder.

// Integral returns ∫ θ dFo from 0 to fo ≥ 0 at the fraction x of the way from the centre to the surface.
func Integral(s Solution, x, fo float64) float64 { return integral(s, place{x: x}, fo) }

// IntegralOfMean is [Integral] for the mean over the volume.
func IntegralOfMean(s Solution, fo float64) float64 { return integral(s, place{mean: true}, fo) }

// A place is a fraction of the way from the centre to the surface, or the mean.
type place struct {
	x    float64
	mean bool
}

func integral(s Solution, p place, fo float64) float64 {
	if fo < s.Join() {
		return early(s, p, fo)
	}
	return early(s, p, s.Join()) + settled(s, p, fo) - settled(s, p, s.Join())
}

func early(s Solution, p place, fo float64) float64 {
	if fo <= 0 {
		return 0
	}
	return fo - s.lag(p, fo)
}

// settled returns the part of the integral that the terms kept make up.
func settled(s Solution, p place, fo float64) float64 {
	total := 0.0
	for n := 1; ; n++ {
		c, rate, ok := s.term(n, p)
		if !ok {
			return total
		}
		total += c * Decayed(rate, fo)
	}
}

// Decayed returns (1 − e^{−rate fo})/rate, which is fo for a rate of 0.
func Decayed(rate, fo float64) float64 {
	if rate == 0 {
		return fo
	}
	return -math.Expm1(-rate*fo) / rate
}

// pulled returns Bi/(q + H) with H = Bi − curvature, also for an infinite Bi.
func pulled(bi, curvature float64, q complex128) complex128 {
	if bi > 1 {
		inverse := 1 / bi
		return recip(complex(1+(real(q)-curvature)*inverse, imag(q)*inverse))
	}
	return complex(bi, 0) * recip(q+complex(bi-curvature, 0))
}

// meanLag returns ∫ (1 − mean) dFo for the bodies whose short-time form is the first images.
func meanLag(bi, dimension, curvature, fo float64) float64 {
	return invert(0, fo, func(q complex128) complex128 {
		r := recip(q)
		square := r * r
		return complex(dimension, 0) * pulled(bi, curvature, q) * (q - complex(curvature, 0)) * square * square
	})
}

// Join returns the Fourier number from which the series is summed.
func (s *Plate) Join() float64 { return Join }

// Join returns the Fourier number from which the series is summed.
func (s *Cylinder) Join() float64 { return CylinderJoin }

// Join returns the Fourier number from which the series is summed.
func (s *Sphere) Join() float64 { return Join }

// at returns the coefficient of term n at a place, f its function, and its rate.
func (s *series) at(n int, p place, f func(z float64) float64) (c, rate float64, ok bool) {
	if n > len(s.terms) {
		return 0, 0, false
	}
	t := &s.upTo(n)[n-1]
	switch {
	case p.mean:
		return t.c[mean], t.rate, true
	case p.x == 1:
		return t.c[surface], t.rate, true
	}
	return t.c[centre] * f(t.zeta*p.x), t.rate, true
}

func (s *Plate) term(n int, p place) (c, rate float64, ok bool) { return s.at(n, p, cosine) }

func (s *Cylinder) term(n int, p place) (c, rate float64, ok bool) { return s.at(n, p, bessel0At) }

func (s *Sphere) term(n int, p place) (c, rate float64, ok bool) { return s.at(n, p, sinc) }

func (s *Plate) lag(p place, fo float64) float64 {
	if p.mean {
		return meanLag(s.bi, 1, 0, fo)
	}
	image := func(d float64) float64 {
		a := d / (2 * math.Sqrt(fo))
		if a > farthest {
			return 0
		}
		return invert(a, fo, func(q complex128) complex128 {
			r := recip(q)
			return pulled(s.bi, 0, q) * r * r
		})
	}
	if p.x == 1 {
		return image(0)
	}
	return image(1-p.x) + image(1+p.x)
}

func (s *Sphere) lag(p place, fo float64) float64 {
	if p.mean {
		return meanLag(s.bi, 3, 1, fo)
	}
	image := func(d float64, w func(r complex128) complex128) float64 {
		a := d / (2 * math.Sqrt(fo))
		if a > farthest {
			return 0
		}
		return invert(a, fo, func(q complex128) complex128 { return pulled(s.bi, 1, q) * w(recip(q)) })
	}
	square := func(r complex128) complex128 { return r * r }
	switch {
	case p.x < nearCentre: // the limit of the difference of both images over x; what is left out is below 1e-8 of it
		return 2 * image(1, func(r complex128) complex128 { return r })
	case p.x == 1:
		return image(0, square)
	}
	return (image(1-p.x, square) - image(1+p.x, square)) / p.x
}

func (s *Cylinder) lag(p place, fo float64) float64 {
	if p.mean {
		return invert(0, fo, func(q complex128) complex128 {
			pull, _ := loaded(s.bi, q)
			r := recip(q)
			square := r * r
			return 2 * pull * (q - 0.5 - expand(&epsilonTerm, r)) * square * square
		})
	}
	a := (1 - p.x) / (2 * math.Sqrt(fo))
	if p.x < 0.1 || a > farthest {
		return 0
	}
	return invert(a, fo, func(q complex128) complex128 {
		pull, _ := loaded(s.bi, q)
		r := recip(q)
		inner, outer := expand(&alphaTerm, complex(real(r)/p.x, imag(r)/p.x)), expand(&alphaTerm, r)
		return pull * (1 + inner) * recip(1+outer) * r * r
	}) / math.Sqrt(p.x)
}
