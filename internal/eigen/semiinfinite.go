package eigen

import "math"

// The semi-infinite body, with a = x/(2√(α t)) and b = h √(α t)/k (H. S. Carslaw and J. C. Jaeger, Conduction of Heat
// in Solids, 2nd ed., sections 2.4, 2.7 and 2.9, from memory).

// HalfLoss returns 1 − θ = erfc(a) − e^{−a²} erfcx(a + b) for a, b ≥ 0; b = +Inf is a prescribed surface
// temperature.
func HalfLoss(a, b float64) float64 {
	if math.IsInf(b, 1) || math.IsInf(a, 1) {
		return math.Erfc(a)
	}
	f, _ := answer(2*a, b, 1)
	return unit(b * f)
}

// HalfSurface returns θ at the surface, erfcx(b).
func HalfSurface(b float64) float64 {
	if math.IsInf(b, 1) {
		return 0
	}
	return erfcx(b)
}

// HalfFlux returns ierfc(a), the change of temperature by a constant flux q over 2 q √(α t)/k.
func HalfFlux(a float64) float64 {
	if a > 27 {
		return 0
	}
	return math.Max(0, expSquare(a, -1)*(invSqrtPi-a*erfcx(a)))
}

// HalfHeat returns the heat that has left over ρ c √(α t) times the excess at the start.
func HalfHeat(b float64) float64 { return earlyLoss(1, b, 0, 1) }
