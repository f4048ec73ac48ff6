package eigen

import "math"

// The roots of all three bodies belong to one equation,
//
//	ζ − atan(H/ζ) = c,
//
// H = Bi, c = (n−1)π for a plate and H = Bi − 1, c = (n−1/2)π for a sphere. A cylinder has functions near
// H = Bi − 1/2 and c = (n−3/4)π in their place. The left side rises and hardly bends, so that Halley's method, which
// multiplies the digits by three in each step, needs one step from a guess of six digits, or two from one of two.

// most bounds quotients, so that no square of them overflows.
const most = 1e150

// halley returns the step that Halley's method takes off.
func halley(f, slope, bend float64) float64 { return f * slope / (slope*slope - 0.5*f*bend) }

// towards takes one step to the root of ζ − atan(H/ζ) = high + low.
func towards(zeta, h, high, low float64) float64 {
	inverse := 1 / zeta
	r := min(h*inverse, most)
	cosine := 1 / (1 + r*r) // its square
	pull := r * cosine * inverse
	return zeta - halley((zeta-high)-low-math.Atan(r), 1+pull, -2*pull*cosine*inverse)
}

// rootOf returns the root of ζ − atan(H/ζ) = high + low for high ≥ π in two steps. The second arctangent follows from
// the first by that of the difference, t = H (ζ_1 − ζ_2)/(ζ_1 ζ_2 + H²), which is small.
func rootOf(h, high, low float64) float64 {
	h = min(h, most)
	first := guess(h, high)
	angle := math.Atan(h / first)
	share := 1 / (first*first + h*h)
	pull := h * share
	step := halley((first-high)-low-angle, 1+pull, -2*pull*first*share)
	zeta := first - step
	t := h * step / (first*zeta + h*h)
	square := t * t
	angle += t - t*square*(1.0/3-square*(1.0/5-square*(1.0/7-square*(1.0/9))))
	share = 1 / (zeta*zeta + h*h)
	pull = h * share
	return zeta - halley((zeta-high)-low-angle, 1+pull, -2*pull*zeta*share)
}

// guess is the root good to some hundredths.
func guess(h, c float64) float64 { return c + math.Pi/2*(h/(math.Abs(h)+c+1)) }

// piLow is π less its float64.
const piLow = 0x1.1a62633145c07p-53

// polynomial returns Σ c_k t^k for up to twelve coefficients.
func polynomial(c *[12]float64, t float64) float64 {
	s := t * t
	q := s * s
	return ((c[0] + t*c[1]) + s*(c[2]+t*c[3])) + q*(((c[4]+t*c[5])+s*(c[6]+t*c[7]))+q*((c[8]+t*c[9])+s*(c[10]+t*c[11])))
}

// fitted returns v P(2v − 1) with v = Bi/(Bi + a): a first ζ² with its right behaviour at both ends of Bi.
func fitted(c *[12]float64, bi, a float64) float64 {
	v := bi / (bi + a)
	if bi > most {
		v = 1
	}
	return v * polynomial(c, 2*v-1)
}
