package props

import "example.com/coolward/internal/property"

var water = medium{
	name:     "water",
	synonyms: []string{"liquid water"},
	source: "IAPWS SR6-08(2011), liquid water at 0.1 MPa; coefficients from memory, they agree with IAPWS R7-97 and R12-08; " +
		"used from the saturation pressure (IAPWS R7-97(2012), region 4) to 0.3 MPa as in Patek et al., J. Phys. Chem. Ref. Data 38 (2009) 21",
	low: 273.15, high: 383.15,
	pHigh:   0.3e6,
	boiling: property.WaterSaturation,
	at: func(t, p float64) FluidState {
		rho, cp, k, mu, beta := property.Water(t)
		return fluidState(t, p, rho, cp, k, mu, beta)
	},
	uncertainty: fluidUncertainty{
		density: 2e-4, specificHeat: 0.002, conductivity: 0.015, viscosity: 0.01,
		source: "figures of the release, from memory; density includes 1e-4 for the compression from 0.1 MPa to 0.3 MPa, which is left out",
	},
}

// Water returns liquid water: 273.15 K to 383.15 K, from the saturation pressure to 0.3 MPa. The properties are
// those at 0.1 MPa: what the pressure changes in this range is within the stated uncertainty. Where water boils at the
// pressure that is asked, At returns a range error with the saturation pressure as the lower limit.
func Water() Medium { return Medium{&water} }
