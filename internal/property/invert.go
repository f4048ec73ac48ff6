package property

import "math"

// Curve is a solid as a function of the temperature alone. Enthalpy is an integral of SpecificHeat.
type Curve interface {
	Conductivity(t float64) float64
	SpecificHeat(t float64) float64
	Enthalpy(t float64) float64
}

// Invert returns the temperature in [low, high] at which the enthalpy of c is h: Newton's method,
// with a bisection wherever it leaves the bracket or does not halve the residual (safeguarded as in
// W. H. Press et al., Numerical Recipes, 3rd ed., section 9.4, from memory). h must lie between the
// enthalpies of the two ends.
func Invert(c Curve, h, low, high float64) float64 {
	if m, ok := c.(*Melt); ok {
		return m.Invert(h, low, high)
	}
	if math.IsInf(high, 1) { // a constant without a range
		for high = 2*low + 1; c.Enthalpy(high) < h; {
			high *= 2
		}
	}
	hLow, hHigh := c.Enthalpy(low), c.Enthalpy(high)
	if h <= hLow {
		return low
	}
	if h >= hHigh {
		return high
	}
	t := low + (high-low)*((h-hLow)/(hHigh-hLow))
	last := math.Inf(1)
	// 200 bisections exhaust any bracket of floating-point numbers that a temperature can have.
	for range 200 {
		f := c.Enthalpy(t) - h
		if f == 0 {
			return t
		}
		if f < 0 {
			low = t
		} else {
			high = t
		}
		next := t - f/c.SpecificHeat(t)
		if !(next > low && next < high) || math.Abs(f) > last/2 {
			next = low + (high-low)/2
		}
		if math.Abs(next-t) <= 1e-15*t {
			return next
		}
		t, last = next, math.Abs(f)
	}
	return t
}
