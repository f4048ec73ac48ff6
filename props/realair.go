package props

import "example.com/coolward/internal/property"

var compressedAir = medium{
	name:     "compressed air",
	synonyms: []string{"air as a real gas"},
	source: "density, specific heat and expansion: Lemmon, Jacobsen, Penoncello, Friend, J. Phys. Chem. Ref. Data 29 (2000) 331, air as a pseudo-pure fluid; " +
		"viscosity and conductivity: Lemmon, Jacobsen, Int. J. Thermophys. 25 (2004) 21, without critical enhancement; " +
		"coefficients from memory: both reproduce the tables of check values of their papers, and the dew pressure is 1 atm at 81.72 K as published",
	low: 100, high: 2000,
	pLow: 10e3, pHigh: 1e6,
	condensing: property.AirDewPressure,
	at: func(t, p float64) FluidState {
		rho, cp, k, mu, beta := property.RealAir(t, p)
		s := fluidState(t, p, rho, cp, k, mu, beta)
		s.Gas = true
		return s
	},
	uncertainty: fluidUncertainty{
		density: 0.001, specificHeat: 0.01, conductivity: 0.04, viscosity: 0.02,
		source: "density and specific heat: figures of the paper of 2000, from memory, for air that does not react; " +
			"viscosity and conductivity: our own estimate, between the 1.5 % and 2.5 % near atmospheric pressure and the 5 % over all states of the paper of 2004, " +
			"and the critical enhancement that is left out",
	},
}

// CompressedAir returns dry air as a real gas: 100 K to 2000 K, 10 kPa to 1 MPa, and not above the pressure at which it condenses
// (0.57 MPa at 100 K). It takes about three times as long as [Air], which is as good near atmospheric pressure above 200 K.
//
// Left out are the critical enhancement of the conductivity, which is small in this range, and above 1500 K the
// dissociation of oxygen and the formation of nitrogen oxides, which raise the specific heat of air at rest in equilibrium.
func CompressedAir() Medium { return Medium{&compressedAir} }
