package property

import "math"

// Glycol is an aqueous solution of a glycol: M. Conde, Thermophysical Properties of Brines – Models (2011), coefficients from
// memory. With x the mass fraction of the glycol and q = 273.15 K/T, each property, or its logarithm, is
// A₁ + A₂ x + A₃ q + A₄ x q + A₅ q².
type Glycol struct {
	density, specificHeat, conductivity, logViscosity [3]float64 // of q⁰, q¹, q²
	// Freezing is the freezing temperature in kelvin.
	Freezing float64
}

// NewEthyleneGlycol returns the solution with the mass fraction x of ethylene glycol.
func NewEthyleneGlycol(x float64) *Glycol {
	return &Glycol{
		density:      glycolRow(x, 658.49825, -54.81501, 664.71643, 232.72605, -322.61661),
		specificHeat: glycolRow(x, 5.36449, 0.78863, -2.59001, -2.73187, 1.43759),
		conductivity: glycolRow(x, 0.83818, -1.3762, -0.07629, 1.0772, -0.20174),
		logViscosity: glycolRow(x, -4.63024, -2.14817, -12.70106, 5.40536, 10.9899),
		Freezing:     zeroCelsius * (1 + x*(-0.069+x*-0.353)),
	}
}

// NewPropyleneGlycol returns the solution with the mass fraction x of propylene glycol.
func NewPropyleneGlycol(x float64) *Glycol {
	return &Glycol{
		density:      glycolRow(x, 508.41109, -182.4082, 965.76507, 280.29104, -472.2251),
		specificHeat: glycolRow(x, 4.47642, 0.60863, -0.71497, -1.93855, 0.47873),
		conductivity: glycolRow(x, 1.18886, -1.4911, -0.69682, 1.13633, 0.06735),
		logViscosity: glycolRow(x, -1.02798, -10.03298, -19.93497, 14.65802, 14.6205),
		Freezing:     zeroCelsius * (1 + x*(-0.03736+x*-0.4005)),
	}
}

func glycolRow(x, a1, a2, a3, a4, a5 float64) [3]float64 {
	return [3]float64{a1 + a2*x, a3 + a4*x, a5}
}

// At returns density, specific heat, thermal conductivity, viscosity and isobaric expansion coefficient.
func (g *Glycol) At(t float64) (rho, cp, k, mu, beta float64) {
	q := zeroCelsius / t
	at := func(c *[3]float64) float64 { return c[0] + q*(c[1]+q*c[2]) }
	rho = at(&g.density)
	// dq/dT = −q/T
	beta = q * (g.density[1] + 2*q*g.density[2]) / (t * rho)
	return rho, 1e3 * at(&g.specificHeat), at(&g.conductivity), math.Exp(at(&g.logViscosity)), beta
}

// BoilingPressureBelowWater returns the pressure at which water boils at the temperature t, from 273.15 K on, and below that the pressure at
// 273.15 K. An aqueous solution of a substance that is less volatile boils at a lower pressure.
func BoilingPressureBelowWater(t float64) float64 { return WaterSaturation(max(t, zeroCelsius)) }
