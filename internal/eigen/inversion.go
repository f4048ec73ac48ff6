package eigen

import "math"

// The integral of θ over Fo, and responses to oscillations, take D = q I1/I0 = q − 1/2 − ε and A = 1 + α as series in
// 1/q, with q D' = q² − D², and the rule of cylinderline.go with a line that is moved with the place.

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

// farthest is the (1−x)/(2√Fo) beyond which 1 − θ is below 1e-21.
const farthest = 7

// invert returns the inverse of e^{−q d} w(q)/s at t, a = d/(2√t).
func invert(a, t float64, w func(q complex128) complex128) float64 {
	inverse := 1 / math.Sqrt(t)
	c := math.Max(a, lineReal)
	total := 0.0
	for k := range lineCount + 1 {
		y := (float64(k) + 0.5) * lineSpace
		p := complex(c, y)
		sin, cos := math.Sincos(2 * y * (c - a))
		size := math.Exp(c*c - y*y - 2*a*c)
		total += real(complex(size*cos, size*sin) * recip(p) * w(complex(c*inverse, y*inverse)))
	}
	return 2 * lineSpace / math.Pi * total
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
