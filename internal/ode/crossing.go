package ode

import (
	"math"

	"example.com/coolward/internal/root"
)

// Crossing returns the first t at which y is at the level, and whether there is one. It is exact for
// the continuous extension: a crossing between two nodes on the same side of the level is found too.
func (s *Solution) Crossing(level float64) (t float64, ok bool) {
	s.Crossings(level, func(at float64) bool { t, ok = at, true; return false })
	return t, ok
}

// Crossings calls visit with every t at which y is at the level, rising, until visit returns false. Where y stays at the level
// over a step, that step has one, its start.
func (s *Solution) Crossings(level float64, visit func(t float64) bool) {
	last := math.Inf(-1)
	for i := range s.steps {
		st := &s.steps[i]
		b, low := st.bernstein(level), 0.0
		for range len(b) - 1 { // a polynomial of degree 4 has no more
			theta, ok := firstRoot(b, 0, 1, 0)
			if !ok {
				break
			}
			at := low + (1-low)*theta
			if t := min(st.t+at*st.h, s.end); t > last {
				if last = t; !visit(t) {
					return
				}
			}
			if b = beyond(b, theta); at >= 1 || b == [5]float64{} {
				break
			}
			low = at
		}
	}
	// The last node is y itself; the extension may miss it by rounding.
	if len(s.steps) > 0 && s.last == level && last < s.end {
		visit(s.end)
	}
}

// beyond returns the coefficients from the zero at x to 1, with that zero divided out: what has b_0 = 0 is x
// times a polynomial of degree 3 with the coefficients 4 b_(i+1)/(i+1), which is raised to degree 4 again.
func beyond(b [5]float64, x float64) [5]float64 {
	var right [5]float64
	for i := range b {
		right[4-i] = b[4-i]
		for j := range 4 - i {
			b[j] += x * (b[j+1] - b[j])
		}
	}
	var q [4]float64
	for i := range q {
		q[i] = 4 * right[i+1] / float64(i+1)
	}
	return [5]float64{q[0], q[0]/4 + 3*q[1]/4, q[1]/2 + q[2]/2, 3*q[2]/4 + q[3]/4, q[3]}
}

// bernstein returns the coefficients of y − level over the step in Bernstein's basis of degree 4. With
// u = 1−θ the terms are θ, θu, θ²u and θ²u², each raised to degree 4.
func (s *step) bernstein(level float64) [5]float64 {
	y := s.y - level
	return [5]float64{
		y,
		y + s.change/4 + s.r3/4,
		y + s.change/2 + s.r3/3 + s.r4/6 + s.r5/6,
		y + 3*s.change/4 + s.r3/4 + s.r4/4,
		y + s.change,
	}
}

// firstRoot returns the least zero of the polynomial with Bernstein coefficients b over [low, high].
// Where the coefficients change sign once there is one zero; where they never do, none; else the
// interval is halved (Descartes' rule of signs in Bernstein's basis; de Casteljau's algorithm).
func firstRoot(b [5]float64, low, high float64, depth int) (float64, bool) {
	if b[0] == 0 {
		return low, true
	}
	changes, sign := 0, math.Signbit(b[0])
	for _, c := range b[1:] {
		if c != 0 && math.Signbit(c) != sign {
			changes, sign = changes+1, !sign
		}
	}
	switch {
	case changes == 0 && b[4] != 0:
		return 0, false
	case changes == 0:
		return high, true
	case changes == 1 && b[4] != 0:
		x, ok := root.Find(func(x float64) float64 { return bernsteinAt(&b, x) }, 0, 1, 0)
		return low + (high-low)*x, ok
	case depth == 50: // a double zero, to rounding
		return low, true
	}
	left, right := halve(b)
	mid := low + (high-low)/2
	if x, ok := firstRoot(left, low, mid, depth+1); ok {
		return x, true
	}
	return firstRoot(right, mid, high, depth+1)
}

// halve returns the coefficients over the two halves.
func halve(b [5]float64) (left, right [5]float64) {
	for i := range b {
		left[i], right[4-i] = b[0], b[4-i]
		for j := range 4 - i {
			b[j] = (b[j] + b[j+1]) / 2
		}
	}
	return left, right
}

// bernsteinAt returns the polynomial at x; at 0 and 1 it is exactly the first and the last coefficient.
func bernsteinAt(b *[5]float64, x float64) float64 {
	u := 1 - x
	return u*u*u*u*b[0] + x*(4*u*u*u*b[1]+x*(6*u*u*b[2]+x*(4*u*b[3]+x*b[4])))
}
