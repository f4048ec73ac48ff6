package eigen

import (
	"math"
	"math/cmplx"
)

// alpha and beta hold the factors of q^−j in A and B.
var alpha, beta = func() (a, b [lineMost + 2]float64) {
	a[0], b[0] = 1, 1
	for j := 1; j < len(a); j++ {
		odd := float64(2*j - 1)
		a[j] = a[j-1] * odd * odd / float64(8*j)
		b[j] = b[j-1] * (odd*odd - 4) / float64(8*j)
	}
	return a, b
}()

// The trapezoidal rule on the line Re q = c: with s = q², p = q √Fo and a = (1 − x)/(2√Fo), the exponential
// e^{s Fo − q(1−x)} = e^{p² − 2ap} falls along it as exp(−(Im p)²), so that the rule converges faster than any power
// (L. N. Trefethen and J. A. C. Weideman, The exponentially convergent trapezoidal rule, SIAM Review 56 (2014)
// 385–458, for the method; from memory).
const (
	lineReal  = 2.25  // Re p; the pole at 0 then adds some exp(−2π 2.25/0.375) = exp(−37) of a small number
	lineSpace = 0.375 // of Im p; by the exponential the rule is off by exp(2π 2.25/0.375 − π²/0.375²) = exp(−32) of it
	lineCount = 14    // exp(2.25² − 5.25²) = exp(−22) lies beyond, where a small number is 1e-8
	lineMost  = 16    // terms of the expansions, the first included
)

// Against a finer line with more terms and points the rest, at most 2e-4, differs by 3e-17 of θ at most, over places,
// Biot numbers and times up to the join; so does the heat, relatively.

// A lineNode is one point of the line: p, p², 1/p², the weight e^{p²}/p with its step, and p^−j. With √Fo up to limit_j
// the j terms from the first on are enough there: the next is below 1e-15 of the rest's scale, which is
// below 1e-3 of 1 − θ.
type lineNode struct {
	p, square, lower, weight complex128
	power                    [lineMost + 1]complex128
	limit                    [lineMost]float64
}

var lineNodes = func() (nodes [lineCount]lineNode) {
	for k := range nodes {
		n := &nodes[k]
		y := (float64(k) + 0.5) * lineSpace
		n.p = complex(lineReal, y)
		n.square, n.lower = n.p*n.p, recip(n.p*n.p)
		sin, cos := math.Sincos(2 * y * lineReal)
		size := 2 * lineSpace / math.Pi * math.Exp(lineReal*lineReal-y*y)
		n.weight = complex(size*cos, size*sin) * recip(n.p)
		n.power[0] = 1
		for j := 1; j < lineMost; j++ {
			n.power[j] = n.power[j-1] * recip(n.p)
			n.limit[j] = cmplx.Abs(n.p) * math.Pow(1e-15/(alpha[j+1]*cmplx.Abs(n.weight)), 1/float64(j))
		}
	}
	return nodes
}()

// A fraction is byBi N(q)/[(byQ (q − 1/2) + byBi) (byQ q + M(q))], where N and M are Σ top_j p^−j and Σ bottom_j p^−j.
type fraction struct {
	byQ, byBi   float64
	count       int
	top, bottom [lineMost + 1]float64
}

// onLine returns the inverse of e^{−q d} times the fraction over s, its derivative and its integral over Fo,
// with a = d/(2√Fo).
func (f *fraction) onLine(a, root float64) (value, rate, integral float64) {
	sin, cos := sine(a*lineSpace), cosine(a*lineSpace)
	size := f.byBi * decay(2*a*lineReal)
	turn, step := complex(size*cos, -size*sin), complex((cos-sin)*(cos+sin), -2*sin*cos)
	scale, shift := f.byQ/root, f.byBi-0.5*f.byQ
	count := f.count
	for k := range lineNodes {
		n := &lineNodes[k]
		for count > 2 && root <= n.limit[count-1] {
			count--
		}
		nr, ni, mr, mi := f.top[0], 0.0, f.bottom[0], 0.0
		for j := 1; j < count && j < lineMost; j += 2 { // two at a time; beyond the last are zeros
			p, q := n.power[j], n.power[j+1]
			nr += f.top[j]*real(p) + f.top[j+1]*real(q)
			ni += f.top[j]*imag(p) + f.top[j+1]*imag(q)
			mr += f.bottom[j]*real(p) + f.bottom[j+1]*real(q)
			mi += f.bottom[j]*imag(p) + f.bottom[j+1]*imag(q)
		}
		qr, qi := scale*real(n.p), scale*imag(n.p)
		z := n.weight * turn * complex(nr, ni) * recip(complex(qr+shift, qi)*complex(qr+mr, qi+mi))
		value += real(z)
		rate += real(z)*real(n.square) - imag(z)*imag(n.square)
		integral += real(z)*real(n.lower) - imag(z)*imag(n.lower)
		turn *= step
	}
	fo := root * root
	return value, rate / fo, integral * fo
}
