package props

import (
	"example.com/coolward/internal/property"
	"example.com/coolward/units"
)

// Relative uncertainties at about 95 % of the properties of water on the line of saturation.
const (
	// SaturationPressureUncertainty is that of [SaturationPressure]: the figure of IAPWS R7-97(2012), from memory.
	SaturationPressureUncertainty = 0.001
	// SublimationPressureUncertainty is that of [SublimationPressure] from 190 K up, our own estimate: four other equations differ from
	// it by less than 0.1 % above −60 °C.
	SublimationPressureUncertainty = 0.005
	// EvaporationHeatUncertainty is that of [EvaporationHeat] up to 600 K, our own estimate: 0.1 % and what the two phases differ by in
	// their Gibbs energy; at 623.15 K it is 0.5 %.
	EvaporationHeatUncertainty = 0.002
	// FusionHeatUncertainty is that of [FusionHeat]: 0.2 kJ/kg in IAPWS R10-06(2009), from memory.
	FusionHeatUncertainty = 0.0006
	// SurfaceTensionUncertainty is that of [SurfaceTension] up to 300 °C, the figure of IAPWS R1-76(2014) below 100 °C, from memory, doubled; towards the
	// critical point it grows beyond bounds.
	SurfaceTensionUncertainty = 0.01
)

const (
	saturationSource  = "IAPWS R7-97(2012), region 4, coefficients from memory, they reproduce tables 35 and 36"
	sublimationSource = "IAPWS R14-08(2011), sublimation of ice, coefficients from memory, they reproduce its check value"
	evaporationSource = "IAPWS R7-97(2012), regions 1, 2 and 4, coefficients from memory, they reproduce tables 5, 15 and 35"
	tensionSource     = "IAPWS R1-76(2014), equation from memory"
	criticalTemp      = 647.096 // K
	freezingTemp      = 273.15  // K
)

// SaturationPressure returns the pressure at which water boils and steam condenses at T: 273.15 K to the critical point,
// 647.096 K. It returns a [*units.RangeError] outside, and a [*units.ArgumentError] for a T that cannot be.
//
// [Water], [PressurisedWater] and [Steam] accept exactly this pressure.
func SaturationPressure(T units.Temperature) (units.Pressure, error) {
	if err := within("saturation pressure of water", T, freezingTemp, criticalTemp, saturationSource); err != nil {
		return units.Pressure{}, err
	}
	return units.Pascal.Of(property.WaterSaturation(T.SI())), nil
}

// SaturationTemperature returns the temperature at which water boils and steam condenses at p, the inverse of
// [SaturationPressure] to rounding. It returns a [*units.RangeError] for a p outside the pressures of its range, 611.2 Pa to 22.064 MPa,
// and a [*units.ArgumentError] for a p that cannot be.
func SaturationTemperature(p units.Pressure) (units.Temperature, error) {
	low, high := property.WaterSaturation(freezingTemp), property.WaterSaturation(criticalTemp)
	if err := units.CheckPositive("saturation temperature of water: pressure", p); err != nil {
		return units.Temperature{}, err
	}
	if p.SI() < low || p.SI() > high {
		return units.Temperature{}, &units.RangeError{
			Model: "saturation temperature of water", Quantity: "pressure", Value: p.Dynamic(),
			Min: units.Pascal.Of(low).Dynamic(), Max: units.Pascal.Of(high).Dynamic(), Source: saturationSource,
		}
	}
	return units.Kelvin.Of(min(max(property.WaterBoiling(p.SI()), freezingTemp), criticalTemp)), nil
}

// SublimationPressure returns the pressure of the vapour above ice at T: 130 K to the triple point, 273.16 K. It returns
// a [*units.RangeError] outside, and a [*units.ArgumentError] for a T that cannot be.
func SublimationPressure(T units.Temperature) (units.Pressure, error) {
	if err := within("sublimation pressure of ice", T, 130, 273.16, sublimationSource); err != nil {
		return units.Pressure{}, err
	}
	return units.Pascal.Of(property.IceSublimation(T.SI())), nil
}

// EvaporationHeat returns the latent heat of evaporation of water at T: the difference of the enthalpies of saturated
// steam and saturated water, 273.15 K to 623.15 K. It returns a [*units.RangeError] outside, and a [*units.ArgumentError] for a T that cannot be.
func EvaporationHeat(T units.Temperature) (units.SpecificEnergy, error) {
	if err := within("heat of evaporation of water", T, freezingTemp, 623.15, evaporationSource); err != nil {
		return units.SpecificEnergy{}, err
	}
	p := property.WaterSaturation(T.SI())
	liquid, vapour := property.Water97(T.SI(), p), property.Steam97(T.SI(), p)
	return units.JoulePerKilogram.Of(vapour.Enthalpy() - liquid.Enthalpy()), nil
}

// FusionHeat returns the latent heat of fusion of ice at 0 °C and 101325 Pa, 333.4 kJ/kg: the difference of the
// enthalpies of IAPWS R7-97(2012), region 1, and IAPWS R10-06(2009), both with coefficients from memory that reproduce the check tables of the releases.
func FusionHeat() units.SpecificEnergy {
	liquid := property.Water97(freezingTemp, 101325)
	return units.JoulePerKilogram.Of(liquid.Enthalpy() - property.IceEnthalpy(freezingTemp))
}

// SurfaceTension returns the surface tension of water against its vapour at T: 273.15 K to the critical point, 647.096 K,
// where it is zero. It returns a [*units.RangeError] outside, and a [*units.ArgumentError] for a T that cannot be.
func SurfaceTension(T units.Temperature) (units.SurfaceTension, error) {
	if err := within("surface tension of water", T, freezingTemp, criticalTemp, tensionSource); err != nil {
		return units.SurfaceTension{}, err
	}
	return units.NewtonPerMetre.Of(property.WaterSurfaceTension(T.SI())), nil
}

// within returns the error for a T outside the range of a model, if it is.
func within(model string, T units.Temperature, low, high float64, source string) error {
	if T.SI() >= low && T.SI() <= high {
		return nil
	}
	if err := units.CheckTemperature(model+": temperature", T); err != nil {
		return err
	}
	return &units.RangeError{
		Model: model, Quantity: "temperature", Value: T.Dynamic(),
		Min: units.Kelvin.Of(low).Dynamic(), Max: units.Kelvin.Of(high).Dynamic(), Source: source,
	}
}
