package ode

import (
	"math"

	"example.com/coolward/internal/root"
)

// Crossing returns the first t at which y is at the level, and whether there is one. It is exact for
// the continuous extension: a crossing between two nodes on the same side of the level is found too.
func (s *Solution) Crossing(level float64) (t float64, ok bool) {
	for i := range s.steps {
		st := &s.steps[i]
		if theta, ok := firstRoot(st.bernstein(level), 0, 1, 0); ok {
			return min(st.t+theta*st.h, s.end), true
		}
	}
	// The last node is y itself; the extension may miss it by rounding.
	if len(s.steps) > 0 && s.last == level {
		return s.end, true
	}
	return 0, false
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
