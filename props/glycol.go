package props

import (
	"strconv"

	"example.com/coolward/internal/property"
	"example.com/coolward/units"
)

const glycolSource = "M. Conde, Thermophysical Properties of Brines - Models (2011), coefficients from memory; "

// The mass fractions of the fit.
const leastGlycol, mostGlycol = 0.15, 0.6

// EthyleneGlycol returns a solution of ethylene glycol in water with the mass fraction of the glycol, 0.15 to 0.6: from the temperature at which it
// begins to freeze to 80 °C, from the pressure at which water boils to 1 MPa. It is named after its concentration, as in "ethylene glycol
// 30 %". It returns a [*units.ArgumentError] for another mass fraction.
func EthyleneGlycol(massFraction float64) (Medium, error) {
	return glycol("ethylene glycol", massFraction, property.NewEthyleneGlycol,
		glycolSource+"density, specific heat and conductivity reproduce tables that were read, viscosity agrees with the separate fit of the Prandtl number",
		fluidUncertainty{
			density: 0.01, specificHeat: 0.03, conductivity: 0.05, viscosity: 0.15,
			source: glycolUncertainty,
		})
}

// PropyleneGlycol returns a solution of propylene glycol in water with the mass fraction of the glycol, 0.15 to 0.6: from the temperature at which it
// begins to freeze to 80 °C, from the pressure at which water boils to 1 MPa. It is named after its concentration. It
// returns a [*units.ArgumentError] for another mass fraction.
func PropyleneGlycol(massFraction float64) (Medium, error) {
	return glycol("propylene glycol", massFraction, property.NewPropyleneGlycol,
		glycolSource+"they agree with the separate fit of the Prandtl number, and no page was read",
		fluidUncertainty{
			density: 0.01, specificHeat: 0.03, conductivity: 0.05, viscosity: 0.15,
			source: glycolUncertainty,
		})
}

const glycolUncertainty = "our own estimate, for pure glycol in water; inhibitors of commercial fluids change the viscosity by as much again; " +
	"the freezing temperature is good to about 1 K"

func glycol(name string, x float64, make func(float64) *property.Glycol, source string, u fluidUncertainty) (Medium, error) {
	if err := units.CheckNumber("mass fraction of "+name, x, leastGlycol, mostGlycol); err != nil {
		return Medium{}, err
	}
	g := make(x)
	return Medium{&medium{
		name:   name + " " + strconv.FormatFloat(100*x, 'g', 4, 64) + " %",
		source: source,
		low:    g.Freezing, high: celsius(80),
		pHigh:   1e6,
		boiling: property.BoilingPressureBelowWater,
		at: func(t, p float64) FluidState {
			rho, cp, k, mu, beta := g.At(t)
			return fluidState(t, p, rho, cp, k, mu, beta)
		},
		uncertainty: u,
	}}, nil
}
