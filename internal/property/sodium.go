package property

import "math"

// Sodium returns density, specific heat, thermal conductivity, viscosity and isobaric expansion coefficient of liquid sodium at
// the temperature t, 371 K to 1300 K: J. K. Fink, L. Leibowitz, Thermodynamic and Transport Properties of Sodium Liquid and
// Vapor, ANL/RE-95/2 (1995), from memory. Density and specific heat are those along the saturation line.
func Sodium(t float64) (rho, cp, k, mu, beta float64) {
	const critical = 2503.7 // K
	x := 1 - t/critical
	root := math.Sqrt(x)
	rho = 219.0 + 275.32*x + 511.58*root
	beta = (275.32 + 511.58/(2*root)) / (critical * rho)
	cp = 1658.2 - 0.84790*t + 4.4541e-4*t*t - 2.9926e6/(t*t)
	k = 124.67 + t*(-0.11381+t*(5.5226e-5+t*-1.1842e-8))
	mu = math.Exp(-6.4406 - 0.3958*math.Log(t) + 556.835/t)
	return rho, cp, k, mu, beta
}

// SodiumSaturation returns the pressure at which sodium boils at the temperature t (Fink and Leibowitz 1995, from memory).
func SodiumSaturation(t float64) float64 {
	return 1e6 * math.Exp(11.9463-12633.73/t-0.4672*math.Log(t))
}
