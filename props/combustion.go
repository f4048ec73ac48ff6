package props

import (
	"math"

	"example.com/coolward/internal/property"
	"example.com/coolward/units"
)

// A GasComposition gives the mole fractions of a gas, which add up to 1. Those that are left out are 0.
type GasComposition struct {
	Nitrogen, Oxygen, Argon, CarbonDioxide, Steam float64
}

// fractions returns the mole fractions in the order of the kernel, or an error.
func (c GasComposition) fractions() (x [property.MixtureParts]float64, err error) {
	const who = "props.CombustionGas: mole fraction of "
	x = [property.MixtureParts]float64{c.Nitrogen, c.Oxygen, c.Argon, c.CarbonDioxide, c.Steam}
	sum := 0.0
	for i, name := range [property.MixtureParts]string{"nitrogen", "oxygen", "argon", "carbon dioxide", "steam"} {
		if err := units.CheckNumber(who+name, x[i], 0, 1); err != nil {
			return x, err
		}
		sum += x[i]
	}
	if !(math.Abs(sum-1) <= 1e-6) {
		return x, &units.ArgumentError{Field: who + "all gases together", Value: sum, Accepted: "1, within 1e-6"}
	}
	return x, nil
}

// CombustionGas returns a mixture of ideal gases, such as the gas that leaves a burner: 200 K (with carbon dioxide 250 K, with steam 373.2 K)
// to 1500 K, 10 kPa to 200 kPa, and not above the pressure at which its steam would condense. The viscosity is mixed by the
// rule of Wilke, the conductivity by that of Wassiljewa with the factors of Mason and Saxena. The composition does not change with the
// temperature: nothing dissociates, and no sulphuric acid condenses.
//
// It returns a [*units.ArgumentError] unless the name is not empty and the mole fractions are in 0 to 1 and add up to 1.
func CombustionGas(name string, composition GasComposition) (Medium, error) {
	if err := checkName("props.CombustionGas", name); err != nil {
		return Medium{}, err
	}
	x, err := composition.fractions()
	if err != nil {
		return Medium{}, err
	}
	mix := property.NewGasMixture(x)
	m := medium{
		name: name,
		source: idealGasSource +
			"viscosity and conductivity of N2, O2 and Ar: Lemmon, Jacobsen, Int. J. Thermophys. 25 (2004) 21, dilute gas, of CO2 and H2O: Svehla, NASA TM 4647 (1995); " +
			"mixed by the rules of Wilke, J. Chem. Phys. 18 (1950) 517, and Mason, Saxena, Phys. Fluids 1 (1958) 361; all from memory; composition given by the caller",
		low: 200, high: 1500,
		pLow: 10e3, pHigh: 200e3,
		at: func(t, p float64) FluidState {
			rho, cp, k, mu := mix.At(t, p)
			s := fluidState(t, p, rho, cp, k, mu, 1/t)
			s.Gas = true
			return s
		},
		uncertainty: fluidUncertainty{
			density: 0.02, specificHeat: 0.04, conductivity: 0.06, viscosity: 0.04,
			source: "our own estimate for the composition as given: density and specific heat as those of carbon dioxide and steam at the cold end, half of that from 500 K up; " +
				"viscosity and conductivity: of the components, and 2 % and 4 % for the rules of mixing",
		},
	}
	if composition.CarbonDioxide > 0 {
		m.low = 250
	}
	if steam := composition.Steam; steam > 0 {
		m.low = 373.2
		m.condensing = func(t float64) float64 {
			const end = 500 // K; the steam cannot condense at 200 kPa from there on
			return property.WaterSaturation(min(t, end)) / steam
		}
	}
	return Medium{&m}, nil
}
