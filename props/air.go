package props

import "example.com/coolward/internal/property"

var air = medium{
	name:     "air",
	synonyms: []string{"dry air"},
	source: "density: ideal gas with R = 8.314462618 J/(mol K), M = 28.9586 g/mol; " +
		"specific heat: Lemmon, Jacobsen, Penoncello, Friend, J. Phys. Chem. Ref. Data 29 (2000) 331, ideal-gas part; " +
		"viscosity and conductivity: Lemmon, Jacobsen, Int. J. Thermophys. 25 (2004) 21, without critical enhancement; " +
		"coefficients from memory: viscosity and conductivity reproduce the table of check values of their paper, " +
		"specific heat agrees with a mixture of N2, O2 and Ar by other polynomials to 6e-5",
	low: 200, high: 1500,
	pLow: 10e3, pHigh: 200e3,
	at: func(t, p float64) FluidState {
		rho, cp, k, mu := property.Air(t, p)
		s := fluidState(t, p, rho, cp, k, mu, 1/t)
		s.Gas = true
		return s
	},
	uncertainty: fluidUncertainty{
		density: 0.005, specificHeat: 0.01, conductivity: 0.025, viscosity: 0.015,
		source: "specific heat, conductivity, viscosity: figures of the two papers for the gas near atmospheric pressure, from memory; " +
			"density and specific heat include what the ideal gas leaves out, by the real-gas equation of Lemmon et al. (2000): " +
			"at 1 atm 0.03 % and 0.2 % at 300 K, 0.24 % and 0.44 % at 200 K, at 200 kPa twice that",
	},
}

// Air returns dry air: 200 K to 1500 K, 10 kPa to 200 kPa. Density and specific heat are those of the ideal gas,
// which errs by less than 0.1 % in density from 270 K up at 1 atm and by 0.5 % at 200 K and 200 kPa. Moisture
// is not included: saturated air at 30 °C is 1.6 % lighter than dry air.
func Air() Medium { return Medium{&air} }
