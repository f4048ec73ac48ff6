// Package root finds where a continuous function of one variable is zero.
package root

import "math"

// Find returns a zero of f between lo and hi, to within tolerance plus a few units in the last place,
// and whether there is one to be found: f must be continuous and of different sign at lo and hi, or
// zero at one of them. A NaN of f, or of an argument, gives false.
//
// The method is that of Brent: inverse quadratic interpolation and the secant where they help,
// bisection where they do not, with the zero bracketed at every step (R. P. Brent, Algorithms for
// Minimization without Derivatives, Prentice-Hall 1973, chapter 4; from memory).
func Find(f func(float64) float64, lo, hi, tolerance float64) (float64, bool) {
	a, b := lo, hi
	fa, fb := f(a), f(b)
	switch {
	case fa == 0:
		return a, true
	case fb == 0:
		return b, true
	case !(fa < 0 && fb > 0) && !(fa > 0 && fb < 0), math.IsInf(a, 0), math.IsInf(b, 0), !(tolerance >= 0):
		return 0, false
	}
	c, fc := a, fa // the zero lies between b, the best point so far, and c
	step := b - a
	previous := step
	for {
		if math.Abs(fc) < math.Abs(fb) {
			a, b, c = b, c, b
			fa, fb, fc = fb, fc, fb
		}
		tol := 2*epsilon*math.Abs(b) + tolerance/2
		half := c/2 - b/2
		if fb == 0 || math.Abs(half) <= tol || b+half == b {
			return b, true
		}
		if math.Abs(previous) < tol || math.Abs(fa) <= math.Abs(fb) {
			step, previous = half, half
		} else {
			p, q := interpolate(a, b, c, fa, fb, fc)
			if 2*p < math.Min(3*half*q-math.Abs(tol*q), math.Abs(previous*q)) {
				previous, step = step, p/q
			} else {
				step, previous = half, half
			}
		}
		a, fa = b, fb
		switch {
		case math.Abs(step) > tol:
			b += step
		case math.Copysign(tol, half)+b != b:
			b += math.Copysign(tol, half)
		default:
			b += half
		}
		fb = f(b)
		if math.IsNaN(fb) {
			return 0, false
		}
		if (fb > 0) == (fc > 0) {
			c, fc = a, fa
			step = b - a
			previous = step
		}
	}
}

const epsilon = 0x1p-53

// interpolate returns the step from b as p/q with p ≥ 0: by the secant through two points, or by
// inverse quadratic interpolation through three.
func interpolate(a, b, c, fa, fb, fc float64) (p, q float64) {
	s := fb / fa
	if a == c {
		p, q = (c-b)*s, 1-s
	} else {
		u, v := fa/fc, fb/fc
		p = s * ((c-b)*u*(u-v) - (b-a)*(v-1))
		q = (u - 1) * (v - 1) * (s - 1)
	}
	if p > 0 {
		q = -q
	}
	return math.Abs(p), q
}
