package lumped

import "math"

// A law is a closed form of the state y over time, from T0 straight towards a limit, for a specific heat that does
// not vary and an exchange that is the same at all times.
type law interface {
	fall(t float64) float64      // T0 − y, without cancellation
	when(kelvin float64) float64 // time at which y comes to a temperature between the start and the limit
}

// logOfPart returns the logarithm of the part of the excess T0 − T∞ that is left at the target: near the start from the part that is lost, near the limit from the one
// that is left, so that no digits go.
func logOfPart(start, limit, target float64) float64 {
	excess := start - limit
	if lost := (start - target) / excess; lost <= 0.5 {
		return math.Log1p(-lost)
	}
	return math.Log((target - limit) / excess)
}

// An exponential is T∞ + (T0 − T∞) exp(−t/τ), from dT/dt = −(T − T∞)/τ.
type exponential struct {
	start, limit float64
	rate         float64 // −1/τ, 1/s
}

func (l exponential) fall(t float64) float64 { return -(l.start - l.limit) * math.Expm1(l.rate*t) }

func (l exponential) when(target float64) float64 {
	return logOfPart(l.start, l.limit, target) / l.rate
}

// A slackening is T∞ + (T0 − T∞) (1 + n t/τ)^(−1/n), from dT/dt = −(T − T∞) (|T − T∞|/|T0 − T∞|)^n/τ with n > 0: what
// natural convection does, the coefficient of which goes with a power of the difference.
type slackening struct {
	start, limit float64
	n            float64
	tau          float64 // s, at the start
}

func (l slackening) fall(t float64) float64 {
	return -(l.start - l.limit) * math.Expm1(-math.Log1p(l.n*t/l.tau)/l.n)
}

func (l slackening) when(target float64) float64 {
	return l.tau / l.n * math.Expm1(-l.n*logOfPart(l.start, l.limit, target))
}

// A glow is the fall by radiation alone, dT/dt = −(T⁴ − Ts⁴)/(4 Ts³ τ), with x = T/Ts and x0 = T0/Ts:
//
//	t/τ = ln|(x + 1)/(x − 1)| + 2 atan x, less the same at x0.
type glow struct {
	start, limit float64
	tau          float64 // s, that of small differences
}

func (l glow) when(target float64) float64 {
	x0, x := l.start/l.limit, target/l.limit
	return l.tau * greyTime(x0, x, (l.start-target)/l.limit, (target-l.limit)/l.limit)
}

// greyFar is the ratio T/Ts above which the logarithm and the arc tangent cancel, and the series of their
// sum is taken.
const greyFar = 3

// greyTime returns t/τ from x0 to x, where lost = x0 − x and left = x − 1 are given with their own digits.
func greyTime(x0, x, lost, left float64) float64 {
	switch {
	case x >= greyFar:
		return greySeries(x0, x, lost)
	case x0 > greyFar:
		return greySeries(x0, greyFar, x0-greyFar) + greyNear(greyFar, greyFar-x, x, left)
	}
	return greyNear(x0, lost, x, left)
}

// greyNear is the difference of the closed form: that of the logarithms and that of the arc tangents each in
// one term.
func greyNear(x0, lost, x, left float64) float64 {
	return math.Log1p(2*lost/(left*(x0+1))) - 2*math.Atan(lost/(1+x*x0))
}

// greySeries is ∫ 4 dx/(x⁴ − 1) from x to x0, from the series of the integrand in 1/x⁴.
func greySeries(x0, x, lost float64) float64 {
	ratio := math.Log1p(lost / x) // ln(x0/x)
	inverse := 1 / x
	fourth := inverse * inverse * inverse * inverse
	term := inverse * inverse * inverse
	total := 0.0
	for k := 3.0; ; k += 4 {
		add := -4 / k * term * math.Expm1(-k*ratio)
		if total += add; !(add > 1e-17*total) {
			return total
		}
		term *= fourth
	}
}

// fall solves t/τ for x − 1 = (x0 − 1) exp(−z) by Newton's method. Over z the time is a convex curve where the body cools
// and a concave one where it warms, so that the iteration comes to the root from one side.
func (l glow) fall(t float64) float64 {
	s := t / l.tau
	x0 := l.start / l.limit
	first := (l.start - l.limit) / l.limit
	switch {
	case s == 0 || first == 0:
		return 0
	case s > 700: // z is s to within 5, so that exp(−z) is nothing
		return l.start - l.limit
	}
	most := s + math.Ln2 + math.Pi // z is less
	if first > 0 {
		most = s + math.Log((x0+1)/2) + math.Pi
	}
	z, left, lost := 0.0, first, 0.0
	for range 100 {
		x := 1 + left
		next := min(z+(s-greyTime(x0, x, lost, left))*(1+x)*(1+x*x)/4, most)
		if math.Abs(next-z) <= 1e-15*z {
			break
		}
		z = next
		left = first * math.Exp(-z)
		lost = -first * math.Expm1(-z)
	}
	return lost * l.limit
}

// A straight line is what a constant power does.
type straight struct {
	start, slope float64 // K, K/s
}

func (l straight) fall(t float64) float64 { return -l.slope * t }

func (l straight) when(target float64) float64 { return (target - l.start) / l.slope }
