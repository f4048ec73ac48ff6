package fit

import "math"

// golden is the part of the golden section.
const golden = 0.381966011250105

// minimum returns where f is least between a and c, with a point b between them at which it is not
// larger than at both: parabolas where they help, else the golden section (R. P. Brent, Algorithms for
// Minimization without Derivatives, Prentice-Hall 1973, chapter 5; from memory).
func minimum(f func(float64) float64, a, b, c float64) float64 {
	const tolerance = 1e-8
	x, w, v := b, b, b
	fx := f(x)
	fw, fv := fx, fx
	last, d := 0.0, 0.0
	for range 100 {
		middle := (a + c) / 2
		least := tolerance*math.Abs(x) + 1e-10
		if math.Abs(x-middle) <= 2*least-(c-a)/2 {
			break
		}
		parabolic := false
		if math.Abs(last) > least {
			r, q := (x-w)*(fx-fv), (x-v)*(fx-fw)
			p := (x-v)*q - (x-w)*r
			q = 2 * (q - r)
			if q > 0 {
				p = -p
			}
			q = math.Abs(q)
			if math.Abs(p) < math.Abs(q*last/2) && p > q*(a-x) && p < q*(c-x) {
				last, d, parabolic = d, p/q, true
				if u := x + d; u-a < 2*least || c-u < 2*least {
					d = math.Copysign(least, middle-x)
				}
			}
		}
		if !parabolic {
			last = c - x
			if x >= middle {
				last = a - x
			}
			d = golden * last
		}
		u := x + d
		if math.Abs(d) < least {
			u = x + math.Copysign(least, d)
		}
		switch fu := f(u); {
		case fu <= fx:
			if u >= x {
				a = x
			} else {
				c = x
			}
			v, w, x, fv, fw, fx = w, x, u, fw, fx, fu
		default:
			if u < x {
				a = u
			} else {
				c = u
			}
			if fu <= fw || w == x {
				v, w, fv, fw = w, u, fw, fu
			} else if fu <= fv || v == x || v == w {
				v, fv = u, fu
			}
		}
	}
	return x
}

// descend walks from x downhill until f rises, and returns where f is least there; limits end the walk.
func descend(f func(float64) float64, x, step, low, high float64) float64 {
	fx := f(x)
	a, b := x-step, x+step
	fa, fb := f(a), f(b)
	for fa < fx && a > low {
		step *= 1.6
		b, x, fx = x, a, fa
		a -= step
		fa = f(a)
		fb = math.Inf(1) // behind is higher
	}
	for fb < fx && b < high {
		step *= 1.6
		a, x, fx = x, b, fb
		b += step
		fb = f(b)
	}
	if fa < fx || fb < fx {
		return x // at a limit
	}
	return minimum(f, a, x, b)
}
