package eigen

import (
	"math"
	"math/cmplx"
)

// Transfer returns the complex amplitude at the fraction x of the way from the centre to the surface when the
// surroundings oscillate as e^{iω Fo} with ω > 0 (in place of time, Fo), and the start is forgotten. With q = √(iω)
// it is Bi/(D(q) + Bi) · f(q x)/f(q), f = cosh q, I0(q) or sinh q/q and D = q f'/f, which is the transform of a
// step times s (H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., section 3.10 for the plate;
// from memory).
func Transfer(s Solution, x, omega float64) complex128 {
	q := cmplx.Sqrt(complex(0, omega))
	d, ratio := s.transfer(q, x)
	return attenuated(s.Biot(), d) * ratio
}

// TransferOfMean is [Transfer] for the mean over the volume: by the balance of heat, m D/q² of that at the
// surface.
func TransferOfMean(s Solution, omega float64) complex128 {
	q := cmplx.Sqrt(complex(0, omega))
	d, _ := s.transfer(q, 1)
	return complex(s.dimension(), 0) * d * attenuated(s.Biot(), d) / (q * q)
}

// attenuated returns Bi/(D + Bi).
func attenuated(bi float64, d complex128) complex128 {
	if bi > 1 {
		return 1 / complex(1+real(d)/bi, imag(d)/bi)
	}
	return complex(bi, 0) / (d + complex(bi, 0))
}

func (s *Plate) dimension() float64    { return 1 }
func (s *Cylinder) dimension() float64 { return 2 }
func (s *Sphere) dimension() float64   { return 3 }

func (s *Plate) transfer(q complex128, x float64) (d, ratio complex128) {
	if cmplx.Abs(q) < 1 {
		return q * cmplx.Sinh(q) / cmplx.Cosh(q), cmplx.Cosh(q*complex(x, 0)) / cmplx.Cosh(q)
	}
	e := cmplx.Exp(-2 * q)
	ratio = cmplx.Exp(-q*complex(1-x, 0)) * (1 + cmplx.Exp(-2*q*complex(x, 0))) / (1 + e)
	return q * (1 - e) / (1 + e), ratio
}

func (s *Sphere) transfer(q complex128, x float64) (d, ratio complex128) {
	size := cmplx.Abs(q)
	if size < 1 {
		// D = (q cosh q − sinh q)/sinh q, by the power series of both over q
		square, term := q*q, complex(1, 0)
		top, bottom := complex(0, 0), complex(0, 0)
		for k := 0.0; k < 12; k++ {
			bottom += term
			top += term * complex(2*k, 0)
			term *= square / complex((2*k+2)*(2*k+3), 0)
		}
		return top / bottom, sinhRatio(q*complex(x, 0)) / bottom
	}
	e := cmplx.Exp(-2 * q)
	d = q*(1+e)/(1-e) - 1
	inner := q * complex(x, 0)
	if cmplx.Abs(inner) < 1 {
		return d, 2 * q * cmplx.Exp(-q) * sinhRatio(inner) / (1 - e)
	}
	return d, cmplx.Exp(-q*complex(1-x, 0)) * (1 - cmplx.Exp(-2*inner)) / (1 - e) / complex(x, 0)
}

// sinhRatio returns sinh z/z for |z| ≤ 1.
func sinhRatio(z complex128) complex128 {
	square, term, total := z*z, complex(1, 0), complex(0, 0)
	for k := 0.0; k < 12; k++ {
		total += term
		term *= square / complex((2*k+2)*(2*k+3), 0)
	}
	return total
}

func (s *Cylinder) transfer(q complex128, x float64) (d, ratio complex128) {
	outer, d := scaledBessel(q)
	inner, _ := scaledBessel(q * complex(x, 0))
	return d, cmplx.Exp(-q*complex(1-x, 0)) * inner / outer
}

// scaledBessel returns e^{−z} I0(z) and z I1(z)/I0(z) on the ray arg z = π/4: by the power series, whose
// terms cancel three digits at most, and for large z by the expansions of the short times, beside which
// e^{−2z} is not seen.
func scaledBessel(z complex128) (i0, d complex128) {
	if cmplx.Abs(z) < 24 {
		square, term := z*z/4, complex(1, 0)
		zero, one := complex(0, 0), complex(0, 0) // I0 and z I1
		for k := 0.0; k < 80; k++ {
			zero += term
			one += term * complex(2*k, 0)
			term *= square / complex((k+1)*(k+1), 0)
		}
		return zero * cmplx.Exp(-z), one / zero
	}
	r := 1 / z
	return (1 + expand(&alphaTerm, r)) / cmplx.Sqrt(2*math.Pi*z), z - 0.5 - expand(&epsilonTerm, r)
}
