package eigen

import "math"

// Short times in a cylinder. The Laplace transform of 1 − θ over Fo is, with q = √s,
//
//	(Bi/s) I0(q x)/(q I1(q) + Bi I0(q)) = (Bi/s) e^{−q(1−x)}/√x · A(q x)/A(q) · 1/(D(q) + Bi),
//
// where A = I0(q) √(2πq) e^{−q} and D = q I1/I0 have expansions in 1/q (M. Abramowitz and I. A. Stegun,
// Handbook of Mathematical Functions, 9.7.1, from memory): A = 1 + α with α = 1/(8q) + …, and
// D = q − 1/2 − ε with ε = 1/(8q) + …, from q D' = q² − D². What they leave out is below
// exp(−(1 + x)²/(4 Fo)) of 1 − θ.
//
// With α = ε = 0 and H = Bi − 1/2 the inverse is the response of the other bodies over √x. What is left,
//
//	(Bi/s) e^{−q(1−x)}/√x · [(α(q x) − α(q))/A(q) + ε/(q + H)]/(D + Bi),
//
// is small and is inverted by the trapezoidal rule on the line Re q = c: with s = q² the exponential falls
// along it as exp(−Fo (Im q)²), so that the rule converges faster than any power (L. N. Trefethen and J. A. C.
// Weideman, The exponentially convergent trapezoidal rule, SIAM Review 56 (2014) 385–458, for the method; from
// memory).

// expansion is the number of terms of α and ε.
const expansion = 16

// alphaTerm and epsilonTerm hold the factors of 1/q, 1/q² …
var alphaTerm, epsilonTerm = func() (a, e [expansion]float64) {
	product := 1.0
	for k := range expansion {
		odd := float64(2*k + 1)
		product *= odd * odd / (8 * float64(k+1))
		a[k] = product
	}
	c := [expansion + 1]float64{0.5}
	for m := range expansion {
		square := 0.0
		for i := 0; i <= m; i++ {
			square += c[i] * c[m-i]
		}
		c[m+1] = (float64(m)*c[m] + square) / 2
		e[m] = c[m+1]
	}
	return a, e
}()

// expand returns Σ term_k r^(k+1).
func expand(term *[expansion]float64, r complex128) complex128 {
	re, im := 0.0, 0.0
	x, y := real(r), imag(r)
	for k := expansion - 1; k >= 0; k-- {
		re += term[k]
		re, im = re*x-im*y, re*y+im*x
	}
	return complex(re, im)
}

// recip returns 1/z, without the care for infinities of the operator.
func recip(z complex128) complex128 {
	size := 1 / (real(z)*real(z) + imag(z)*imag(z))
	return complex(real(z)*size, -imag(z)*size)
}

const (
	lineLeast = 2.1   // of c √Fo; the pole at 0 then adds some exp(−2π 2.1/0.375) = exp(−35) of a small number
	lineStep  = 0.375 // of Im q √Fo; by the exponential the rule is off by exp(2π 2.1/0.375 − π²/0.375²) = exp(−35)
	lineNodes = 15    // exp(2.1² − 5.6²) lies beyond
	farthest  = 7     // of (1−x)/(2√Fo), beyond which 1 − θ is below 1e-21
)

// invert returns the inverse of e^{−q d} w(q)/s at t, a = d/(2√t).
func invert(a, t float64, w func(q complex128) complex128) float64 {
	inverse := 1 / math.Sqrt(t)
	c := math.Max(a, lineLeast)
	total := 0.0
	for k := range lineNodes {
		y := (float64(k) + 0.5) * lineStep
		p := complex(c, y)
		sin, cos := math.Sincos(2 * y * (c - a))
		size := math.Exp(c*c - y*y - 2*a*c)
		total += real(complex(size*cos, size*sin) * recip(p) * w(complex(c*inverse, y*inverse)))
	}
	return 2 * lineStep / math.Pi * total
}

// loaded returns Bi/(D + Bi) and Bi ε/(q + H), also for an infinite Bi.
func loaded(bi float64, q complex128) (pull, lag complex128) {
	e := expand(&epsilonTerm, recip(q))
	d := q - 0.5 - e
	if bi > 1 {
		inverse := 1 / bi
		pull = recip(complex(1+real(d)*inverse, imag(d)*inverse))
		return pull, e * recip(complex(1+(real(q)-0.5)*inverse, imag(q)*inverse))
	}
	b := complex(bi, 0)
	return b * recip(d+b), b * e * recip(q-0.5+b)
}

// cylinderEarly returns 1 − θ at the fraction x < 1. Nearer to the centre than a tenth of the radius it is
// below 1e-15.
func cylinderEarly(bi, x, fo float64) float64 {
	if fo <= 0 || bi == 0 || x < 0.1 {
		return 0
	}
	a := (1 - x) / (2 * math.Sqrt(fo))
	if a > farthest {
		return 0
	}
	lead := math.Erfc(a)
	if !math.IsInf(bi, 1) {
		lead = bi * response(1-x, bi-0.5, fo)
	}
	rest := invert(a, fo, func(q complex128) complex128 {
		pull, lag := loaded(bi, q)
		r := recip(q)
		inner, outer := expand(&alphaTerm, complex(real(r)/x, imag(r)/x)), expand(&alphaTerm, r)
		return pull * ((inner-outer)*recip(1+outer) + complex(real(lag)/bi, imag(lag)/bi))
	})
	return (lead + rest) / math.Sqrt(x)
}

// cylinderEarlySurface returns θ at the surface. Without ε it is 1 − Bi F(0, t), or (Bi erfcx(b) − 1/2)/H,
// which keeps its digits when θ is small.
func cylinderEarlySurface(bi, fo float64) float64 {
	if math.IsInf(bi, 1) {
		return 0
	}
	if fo <= 0 || bi == 0 {
		return 1
	}
	h := bi - 0.5
	lead := 1 - bi*response(0, h, fo)
	if b := h * math.Sqrt(fo); b > 0.5 {
		lead = (bi*erfcx(b) - 0.5) / h
	}
	return lead - invert(0, fo, func(q complex128) complex128 {
		pull, lag := loaded(bi, q)
		return pull * lag
	})/bi
}

// cylinderEarlyLoss returns 1 − mean = 2 Bi ∫ θ_surface dFo.
func cylinderEarlyLoss(bi, fo float64) float64 {
	if fo <= 0 || bi == 0 {
		return 0
	}
	return earlyLoss(2, bi, 0.5, fo) - 2*invert(0, fo, func(q complex128) complex128 {
		pull, lag := loaded(bi, q)
		r := recip(q)
		return pull * lag * r * r
	})
}
