package props

import "example.com/coolward/internal/property"

// steamSource is what the sources of both regions have in common.
const steamSource = "; viscosity: IAPWS R12-08, without critical enhancement; " +
	"conductivity: IAPWS R15-11, with critical enhancement; coefficients from memory, they reproduce the check tables of the releases to every digit"

var pressurisedWater = medium{
	name:     "pressurised water",
	synonyms: []string{"compressed water"},
	source:   "density, specific heat and expansion: IAPWS R7-97(2012), region 1" + steamSource,
	low:      273.15, high: 623.15,
	pHigh:   100e6,
	boiling: property.WaterSaturation,
	at: func(t, p float64) FluidState {
		g := property.Water97(t, p)
		return gibbsState(&g)
	},
	uncertainty: fluidUncertainty{
		density: 0.002, specificHeat: 0.01, conductivity: 0.04, viscosity: 0.03,
		source: "our own estimate of the largest figure in the range, from those of the releases, from memory: below 100 °C " +
			"density 0.01 %, specific heat 0.2 %, conductivity 1.5 %, viscosity 1 %",
	},
}

// PressurisedWater returns liquid water: 273.15 K to 623.15 K, from the saturation pressure to 100 MPa. Up to
// 0.3 MPa and 110 °C [Water] is faster by a factor of about five and as good.
func PressurisedWater() Medium { return Medium{&pressurisedWater} }

var steam = medium{
	name:     "steam",
	synonyms: []string{"water vapour", "superheated steam"},
	source:   "density, specific heat and expansion: IAPWS R7-97(2012), region 2" + steamSource,
	low:      273.15, high: 1073.15,
	pLow: 1, pHigh: 100e6,
	condensing: property.SteamGreatestPressure,
	at: func(t, p float64) FluidState {
		g := property.Steam97(t, p)
		s := gibbsState(&g)
		s.Gas = true
		return s
	},
	uncertainty: fluidUncertainty{
		density: 0.003, specificHeat: 0.03, conductivity: 0.05, viscosity: 0.03,
		source: "our own estimate of the largest figure in the range, from those of the releases, from memory: below 10 MPa " +
			"density 0.1 %, specific heat 1 %, conductivity and viscosity 3 %",
	},
}

// Steam returns the vapour of water: 273.15 K to 1073.15 K, from 1 Pa to the pressure at which it condenses. Above 623.15 K it ends with
// region 2 of the source instead: at 16.5 MPa there, rising to 100 MPa at 863.15 K.
//
// Saturated steam is Steam at a temperature and the [SaturationPressure] of it.
func Steam() Medium { return Medium{&steam} }

// gibbsState adds the transport properties to a state of IAPWS R7-97.
func gibbsState(g *property.Gibbs) FluidState {
	rho := 1 / g.Volume()
	mu := property.WaterViscosity(g.T, rho)
	k := property.WaterConductivity(g.T, rho) + property.ConductivityEnhancement(g, mu)
	return fluidState(g.T, g.P, rho, g.HeatCapacity(), k, mu, g.Expansion())
}
