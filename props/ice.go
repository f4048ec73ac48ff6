package props

import (
	"example.com/coolward/internal/property"
	"example.com/coolward/units"
)

var iceLow = celsius(-100)

var ice = newSolid(material{
	name:     "ice",
	synonyms: []string{"water ice", "ice Ih"},
	source: "density at 0 °C, specific heat and enthalpy: IAPWS R10-06(2009) at 101325 Pa, coefficients from memory, they reproduce the check table of the release; " +
		"conductivity: Y.-C. Yen, CRREL Report 81-10 (1981), from memory; the low end of the range is our own judgement",
	density: property.IceDensity(freezingTemp, 101325),
	low:     iceLow, high: freezingTemp,
	curve: property.Ice{},
	uncertainty: solidUncertainty{
		density: 0.013, specificHeat: 0.02, conductivity: 0.08,
		source: "density: the rise of 1.2 % to −100 °C, which the constant leaves out, see IceDensity; specific heat: the figure of the release, from memory; " +
			"conductivity: our own estimate, the equations for ice differ by 7 % at 0 °C; all of ice without bubbles, cracks and brine",
	},
})

// Ice returns ice of pure water at 1 atm: −100 °C to 0 °C. The density is that at 0 °C, 916.7 kg/m³; [IceDensity] has it as
// a function of the temperature, and [FusionHeat] is the heat that melts it.
func Ice() Solid { return ice }

// IceDensity returns the density of ice of pure water at 1 atm and the temperature T, from −100 °C to 0 °C: IAPWS R10-06(2009), coefficients from
// memory, they reproduce the check table of the release. The uncertainty is 0.02 %, from memory. It returns
// a [*units.RangeError] outside the range, and a [*units.ArgumentError] for a T that cannot be.
func IceDensity(T units.Temperature) (units.Density, error) {
	if err := within("density of ice", T, iceLow, freezingTemp, ice.Source()); err != nil {
		return units.Density{}, err
	}
	return units.KilogramPerCubicMetre.Of(property.IceDensity(T.SI(), 101325)), nil
}
