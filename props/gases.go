package props

import "example.com/coolward/internal/property"

const (
	idealGasSource = "density: ideal gas with R = 8.314462618 J/(mol K); " +
		"specific heat: ideal gas, McBride, Zehe, Gordon, NASA/TP-2002-211556; "
	denseSource = idealGasSource +
		"viscosity and conductivity: Lemmon, Jacobsen, Int. J. Thermophys. 25 (2004) 21, without critical enhancement; " +
		"coefficients from memory: viscosity and conductivity reproduce the table of check values of their paper, " +
		"specific heat agrees with the accepted values at 298.15 K and its two parts meet at 1000 K"
	fitSource = idealGasSource +
		"viscosity and conductivity: Svehla, NASA TM 4647 (1995); " +
		"coefficients from memory: the two parts of each fit meet at 1000 K, and the specific heat agrees with the accepted values at 298.15 K"
	gasUncertainty = "viscosity and conductivity: figures of the paper for the gas near atmospheric pressure, from memory, with our own margin above 1000 K; "
	fitUncertainty = "viscosity and conductivity: our own estimate, from handbooks and from the same fits for N2, O2 and Ar against better equations; "
	leftOut        = "density and specific heat include what the ideal gas leaves out, by the second virial coefficient of Tsonopoulos: "
)

// idealGas completes the data of a gas at low pressure.
func idealGas(m medium, g property.Gas) *medium {
	m.pLow, m.pHigh = 10e3, 200e3
	m.at = func(t, p float64) FluidState {
		rho, cp, k, mu := g.At(t, p)
		s := fluidState(t, p, rho, cp, k, mu, 1/t)
		s.Gas = true
		return s
	}
	return &m
}

var nitrogen = idealGas(medium{
	name: "nitrogen", synonyms: []string{"N2"},
	source: denseSource,
	low:    200, high: 1500,
	uncertainty: fluidUncertainty{
		density: 0.005, specificHeat: 0.01, conductivity: 0.02, viscosity: 0.02,
		source: gasUncertainty + leftOut + "at 200 K and 200 kPa 0.4 % and 0.9 %, at 300 K and 1 atm 0.02 % and 0.15 %",
	},
}, property.Nitrogen())

// Nitrogen returns the gas: 200 K to 1500 K, 10 kPa to 200 kPa, as an ideal gas.
func Nitrogen() Medium { return Medium{nitrogen} }

var oxygen = idealGas(medium{
	name: "oxygen", synonyms: []string{"O2"},
	source: denseSource,
	low:    200, high: 1500,
	uncertainty: fluidUncertainty{
		density: 0.0065, specificHeat: 0.011, conductivity: 0.03, viscosity: 0.02,
		source: gasUncertainty + leftOut + "at 200 K and 200 kPa 0.6 % and 1 %, at 300 K and 1 atm 0.07 % and 0.2 %",
	},
}, property.Oxygen())

// Oxygen returns the gas: 200 K to 1500 K, 10 kPa to 200 kPa, as an ideal gas.
func Oxygen() Medium { return Medium{oxygen} }

var argon = idealGas(medium{
	name: "argon", synonyms: []string{"Ar"},
	source: denseSource,
	low:    200, high: 2000,
	uncertainty: fluidUncertainty{
		density: 0.0065, specificHeat: 0.014, conductivity: 0.02, viscosity: 0.02,
		source: gasUncertainty + leftOut + "at 200 K and 200 kPa 0.6 % and 1.3 %, at 300 K and 1 atm 0.06 % and 0.25 %",
	},
}, property.Argon())

// Argon returns the gas: 200 K to 2000 K, 10 kPa to 200 kPa, as an ideal gas.
func Argon() Medium { return Medium{argon} }

var carbonDioxide = idealGas(medium{
	name: "carbon dioxide", synonyms: []string{"CO2"},
	source: fitSource,
	low:    250, high: 1500,
	uncertainty: fluidUncertainty{
		density: 0.02, specificHeat: 0.04, conductivity: 0.04, viscosity: 0.04,
		source: fitUncertainty + leftOut + "at 250 K and 200 kPa 1.8 % and 3.6 %, at 300 K and 1 atm 0.5 % and 0.9 %",
	},
}, property.CarbonDioxide())

// CarbonDioxide returns the gas: 250 K to 1500 K, 10 kPa to 200 kPa, as an ideal gas that does not dissociate.
func CarbonDioxide() Medium { return Medium{carbonDioxide} }

var hydrogen = idealGas(medium{
	name: "hydrogen", synonyms: []string{"H2"},
	source: fitSource,
	low:    200, high: 1500,
	uncertainty: fluidUncertainty{
		density: 0.003, specificHeat: 0.01, conductivity: 0.04, viscosity: 0.03,
		source: fitUncertainty + leftOut + "at 200 K and 200 kPa 0.2 % and 0.1 %",
	},
}, property.Hydrogen())

// Hydrogen returns normal hydrogen, three quarters of it ortho: 200 K to 1500 K, 10 kPa to 200 kPa, as an ideal gas that does not
// dissociate.
func Hydrogen() Medium { return Medium{hydrogen} }

var helium = idealGas(medium{
	name: "helium", synonyms: []string{"He"},
	source: fitSource,
	low:    200, high: 2000,
	uncertainty: fluidUncertainty{
		density: 0.003, specificHeat: 0.002, conductivity: 0.04, viscosity: 0.04,
		source: fitUncertainty + leftOut + "at 200 K and 200 kPa 0.25 % and 0.02 %",
	},
}, property.Helium())

// Helium returns the gas: 200 K to 2000 K, 10 kPa to 200 kPa, as an ideal gas.
func Helium() Medium { return Medium{helium} }
