package props

import (
	"math"

	"example.com/coolward/internal/property"
	"example.com/coolward/units"
)

// MoistAir is air with water vapour at one temperature and pressure: 200 K to 573.15 K, 10 kPa to 200 kPa, with vapour up
// to saturation and at most half the pressure. Make it with [MoistAirFromRelativeHumidity], [MoistAirFromDewPoint],
// [MoistAirFromWetBulb] or [MoistAirFromHumidityRatio].
//
// It is a [Fluid] of that composition: its At gives the properties at other temperatures and pressures, such as those of a film, down to
// the temperature at which the vapour condenses.
//
// The gas is ideal and so is the mixture: the enhancement of the saturation pressure by the air, 0.5 % near 20 °C, is left out.
// Below the triple point, 273.16 K, saturation is that over ice, and dew point and wet bulb are those of ice. A state that is not in the
// range, such as the zero MoistAir, has an error or, where there is no error, NaN.
type MoistAir struct {
	Temperature    units.Temperature
	Pressure       units.Pressure // of the air and the vapour
	VapourPressure units.Pressure // the part of the vapour; 0 for dry air
}

var _ Fluid = MoistAir{}

const (
	moistLow, moistHigh   = 200, 573.15 // K
	moistLeast, moistMost = 10e3, 200e3 // Pa
	moistVapour           = 0.5         // of the pressure
	coldestFrost          = 130         // K
	moistAirSource        = "ideal mixture of dry air and vapour; air: as props.Air; saturation: IAPWS R7-97(2012), region 4, and R14-08(2011); vapour: specific heat and enthalpy of the ideal gas of IAPWS R7-97(2012), viscosity of R12-08 and conductivity of R15-11 at zero density; " +
		"viscosity: C. R. Wilke, J. Chem. Phys. 18 (1950) 517; conductivity: E. A. Mason, S. C. Saxena, Phys. Fluids 1 (1958) 361, with the factor 1; all from memory, the equations of IAPWS reproduce the check tables of the releases"
	diffusivitySource = "W. J. Massman, Atmos. Environ. 32 (1998) 1111, from memory; it agrees within 7 % with two other equations"
	diffusivityLow    = 253.15 // K
	diffusivityHigh   = 400    // K
)

// VapourDiffusivityUncertainty is the relative uncertainty of [VapourDiffusivity] at about 95 %, the figure of the source, from memory.
const VapourDiffusivityUncertainty = 0.07

// MoistAirFromRelativeHumidity returns the air whose vapour pressure is the part humidity, from 0 to 1, of that of saturation at T. It returns
// a [*units.RangeError] outside the range of [MoistAir], and a [*units.ArgumentError] for what cannot be.
func MoistAirFromRelativeHumidity(T units.Temperature, p units.Pressure, humidity float64) (MoistAir, error) {
	if err := checkAir(T, p); err != nil {
		return MoistAir{}, err
	}
	if err := units.CheckNumber("moist air: relative humidity", humidity, 0, 1); err != nil {
		return MoistAir{}, err
	}
	return moistAir(T, p, humidity*property.VapourSaturation(T.SI()))
}

// MoistAirFromDewPoint returns the air that is saturated when it is cooled to the dew point at constant pressure; below 273.16 K it is
// the frost point, from 130 K. It returns a [*units.RangeError] outside the range of [MoistAir], and a [*units.ArgumentError] for what cannot be.
func MoistAirFromDewPoint(T units.Temperature, p units.Pressure, dewPoint units.Temperature) (MoistAir, error) {
	if err := checkBulb("dew point", T, p, dewPoint); err != nil {
		return MoistAir{}, err
	}
	return moistAir(T, p, property.VapourSaturation(dewPoint.SI()))
}

// MoistAirFromWetBulb returns the air that a wet bulb cools to the temperature wetBulb, taken as the temperature of adiabatic saturation,
// which an aspirated psychrometer shows to within some per cent of its depression. Below 273.16 K the bulb
// carries ice. It returns a [*units.RangeError] outside the range of [MoistAir], and a [*units.ArgumentError] for what cannot be,
// such as a wet bulb below that of dry air.
func MoistAirFromWetBulb(T units.Temperature, p units.Pressure, wetBulb units.Temperature) (MoistAir, error) {
	if err := checkBulb("wet bulb", T, p, wetBulb); err != nil {
		return MoistAir{}, err
	}
	t, pa, s := T.SI(), p.SI(), wetBulb.SI()
	saturation := property.VapourSaturation(s)
	if s == t || saturation >= pa {
		return moistAir(T, p, saturation)
	}
	pv := property.VapourOfWetBulb(t, pa, s)
	if pv < 0 {
		lowest := "above that of dry air"
		if dry, ok := property.WetBulb(t, pa, 0); ok {
			lowest = "at least that of dry air, " + units.Kelvin.Of(dry).String()
		}
		return MoistAir{}, &units.ArgumentError{Field: "moist air: wet bulb", Value: wetBulb, Accepted: lowest}
	}
	return moistAir(T, p, min(pv, property.VapourSaturation(t)))
}

// MoistAirFromHumidityRatio returns the air with ratio kilograms of vapour to a kilogram of dry air. It returns
// a [*units.RangeError] outside the range of [MoistAir], and a [*units.ArgumentError] for what cannot be.
func MoistAirFromHumidityRatio(T units.Temperature, p units.Pressure, ratio float64) (MoistAir, error) {
	if err := checkAir(T, p); err != nil {
		return MoistAir{}, err
	}
	if err := units.CheckNumber("moist air: humidity ratio", ratio, 0, math.MaxFloat64); err != nil {
		return MoistAir{}, err
	}
	return moistAir(T, p, p.SI()*(ratio/(property.MolarMassRatio+ratio)))
}

// moistAir returns the air with the vapour pressure pv, if it is in the range.
func moistAir(T units.Temperature, p units.Pressure, pv float64) (MoistAir, error) {
	a := MoistAir{T, p, units.Pascal.Of(pv)}
	if err := a.check(); err != nil {
		return MoistAir{}, err
	}
	return a, nil
}

// Name returns "moist air".
func (a MoistAir) Name() string { return "moist air" }

// Source says where the numbers come from.
func (a MoistAir) Source() string { return moistAirSource }

// At returns the state of air of this composition at temperature T and pressure p. It returns a [*units.RangeError] outside the
// range of [MoistAir], so where the vapour would condense, and a [*units.ArgumentError] for a T or p that cannot be.
func (a MoistAir) At(T units.Temperature, p units.Pressure) (FluidState, error) {
	if err := a.check(); err != nil {
		return FluidState{}, err
	}
	share := a.VapourPressure.SI() / a.Pressure.SI()
	if T != a.Temperature || p != a.Pressure {
		if err := checkAir(T, p); err != nil {
			return FluidState{}, err
		}
		if p != a.Pressure {
			a.VapourPressure = units.Pascal.Of(share * p.SI())
		}
		a.Temperature, a.Pressure = T, p
		if err := a.check(); err != nil {
			return FluidState{}, err
		}
	}
	t, pa := T.SI(), p.SI()
	rho, cp, k, mu := property.MoistAir(t, pa, share)
	s := fluidState(t, pa, rho, cp, k, mu, 1/t)
	s.Gas = true
	return s, nil
}

// State returns the properties at the temperature and pressure of a itself.
func (a MoistAir) State() (FluidState, error) { return a.At(a.Temperature, a.Pressure) }

// RelativeHumidity returns the vapour pressure as a part of that of saturation at the temperature.
func (a MoistAir) RelativeHumidity() float64 {
	if !a.valid() {
		return math.NaN()
	}
	return a.VapourPressure.SI() / property.VapourSaturation(a.Temperature.SI())
}

// HumidityRatio returns the mass of the vapour to that of the dry air.
func (a MoistAir) HumidityRatio() float64 {
	if !a.valid() {
		return math.NaN()
	}
	return property.HumidityRatio(a.Pressure.SI(), a.VapourPressure.SI())
}

// VapourDensity returns the mass of vapour in a volume, the absolute humidity.
func (a MoistAir) VapourDensity() units.Density {
	if !a.valid() {
		return units.KilogramPerCubicMetre.Of(math.NaN())
	}
	return units.KilogramPerCubicMetre.Of(property.VapourDensity(a.Temperature.SI(), a.VapourPressure.SI()))
}

// Enthalpy returns the enthalpy of the air and the vapour in it for each kilogram of dry air. It is zero for dry air at 0 °C, and for
// liquid water at the triple point.
func (a MoistAir) Enthalpy() units.SpecificEnergy {
	if !a.valid() {
		return units.JoulePerKilogram.Of(math.NaN())
	}
	return units.JoulePerKilogram.Of(property.MoistAirEnthalpy(a.Temperature.SI(), a.HumidityRatio()))
}

// DewPoint returns the temperature to which the air can be cooled at constant pressure before water condenses, or, below
// 273.16 K, ice: on a surface that is colder the air leaves dew or frost. Dry air has none: an [*units.ArgumentError]; and
// a frost point below 130 K is a [*units.RangeError].
func (a MoistAir) DewPoint() (units.Temperature, error) {
	if err := a.check(); err != nil {
		return units.Temperature{}, err
	}
	pv := a.VapourPressure
	if pv.SI() == 0 {
		return units.Temperature{}, &units.ArgumentError{Field: "moist air: vapour pressure", Value: pv, Accepted: "above 0 Pa; dry air has no dew point"}
	}
	if pv == units.Pascal.Of(property.VapourSaturation(a.Temperature.SI())) {
		return a.Temperature, nil
	}
	least := property.IceSublimation(coldestFrost)
	t, ok := property.DewPoint(pv.SI())
	if !ok || pv.SI() < least {
		return units.Temperature{}, &units.RangeError{
			Model: "dew point of moist air", Quantity: "vapour pressure", Value: pv.Dynamic(),
			Min: units.Pascal.Of(least).Dynamic(), Max: units.Pascal.Of(property.WaterSaturation(moistHigh)).Dynamic(), Source: sublimationSource,
		}
	}
	return units.Kelvin.Of(min(t, a.Temperature.SI())), nil
}

// WetBulb returns the thermodynamic wet-bulb temperature, that of adiabatic saturation, to 1e-9 K. A balance of enthalpies gives it; where
// both a wet and an iced bulb have one, near 0 °C, it is that of the wet bulb.
func (a MoistAir) WetBulb() (units.Temperature, error) {
	if err := a.check(); err != nil {
		return units.Temperature{}, err
	}
	t, ok := property.WetBulb(a.Temperature.SI(), a.Pressure.SI(), a.VapourPressure.SI())
	if !ok {
		return units.Temperature{}, &units.ConvergenceError{Method: "wet bulb of moist air", Reason: "the balance of enthalpies has no zero that was found"}
	}
	return units.Kelvin.Of(t), nil
}

// DensityUncertainty returns the relative uncertainty of the density, at about 95 %.
func (a MoistAir) DensityUncertainty() float64 { return 0.01 }

// SpecificHeatUncertainty returns the relative uncertainty of the specific heat, at about 95 %.
func (a MoistAir) SpecificHeatUncertainty() float64 { return 0.05 }

// ConductivityUncertainty returns the relative uncertainty of the conductivity, at about 95 %.
func (a MoistAir) ConductivityUncertainty() float64 { return 0.05 }

// ViscosityUncertainty returns the relative uncertainty of the viscosity, at about 95 %.
func (a MoistAir) ViscosityUncertainty() float64 { return 0.03 }

// HumidityUncertainty returns the relative uncertainty of humidity ratio, relative humidity and vapour density, at about 95 %, from
// that of what they were made of apart.
func (a MoistAir) HumidityUncertainty() float64 { return 0.007 }

// UncertaintySource says where the uncertainties come from.
func (a MoistAir) UncertaintySource() string {
	return "humidity: ASHRAE Fundamentals 2017, chapter 1, what ideal gases leave out at 1 atm between −50 °C and 50 °C, read; " +
		"the others are our own estimate: density and specific heat include what the vapour of IAPWS R7-97 differs from an ideal gas by at half the pressure, " +
		"conductivity and viscosity the usual errors of the rules of mixing, 4 % and 2 %, from memory"
}

// VapourDiffusivity returns the diffusivity of water vapour in air at temperature T and pressure p: 253.15 K to 400 K, 10 kPa to
// 200 kPa. It returns a [*units.RangeError] outside, and a [*units.ArgumentError] for a T or p that cannot be.
func VapourDiffusivity(T units.Temperature, p units.Pressure) (units.Diffusivity, error) {
	const model = "diffusivity of water vapour in air"
	if err := within(model, T, diffusivityLow, diffusivityHigh, diffusivitySource); err != nil {
		return units.Diffusivity{}, err
	}
	if err := checkMoistPressure(model, p, diffusivitySource); err != nil {
		return units.Diffusivity{}, err
	}
	return units.SquareMetrePerSecond.Of(property.VapourDiffusivity(T.SI(), p.SI())), nil
}

// valid reports whether a is in the range.
func (a MoistAir) valid() bool { return a.check() == nil }

// check returns the error of a state that is not in the range.
func (a MoistAir) check() error {
	if err := checkAir(a.Temperature, a.Pressure); err != nil {
		return err
	}
	if err := units.CheckNotNegative("moist air: vapour pressure", a.VapourPressure); err != nil {
		return err
	}
	most := min(property.VapourSaturation(a.Temperature.SI()), moistVapour*a.Pressure.SI())
	if a.VapourPressure.SI() > most {
		return &units.RangeError{
			Model: "properties of moist air at " + a.Temperature.String() + " and " + a.Pressure.String(), Quantity: "vapour pressure", Value: a.VapourPressure.Dynamic(),
			Min: units.Pascal.Of(0).Dynamic(), Max: units.Pascal.Of(most).Dynamic(), Source: moistAirSource,
		}
	}
	return nil
}

// checkAir returns the error for a temperature or pressure outside the range, whatever the humidity.
func checkAir(T units.Temperature, p units.Pressure) error {
	const model = "properties of moist air"
	if err := within(model, T, moistLow, moistHigh, moistAirSource); err != nil {
		return err
	}
	return checkMoistPressure(model, p, moistAirSource)
}

func checkMoistPressure(model string, p units.Pressure, source string) error {
	if p.SI() >= moistLeast && p.SI() <= moistMost {
		return nil
	}
	if err := units.CheckPositive(model+": pressure", p); err != nil {
		return err
	}
	return &units.RangeError{
		Model: model, Quantity: "pressure", Value: p.Dynamic(),
		Min: units.Pascal.Of(moistLeast).Dynamic(), Max: units.Pascal.Of(moistMost).Dynamic(), Source: source,
	}
}

// checkBulb returns the error for a dew point or wet bulb that cannot be that of air at T.
func checkBulb(name string, T units.Temperature, p units.Pressure, bulb units.Temperature) error {
	if err := checkAir(T, p); err != nil {
		return err
	}
	if bulb.SI() < coldestFrost || !bulb.IsFinite() {
		return within(name+" of moist air", bulb, coldestFrost, moistHigh, sublimationSource)
	}
	if bulb.Compare(T) > 0 {
		return &units.ArgumentError{Field: "moist air: " + name, Value: bulb, Accepted: "at most the temperature of the air, " + T.String()}
	}
	return nil
}
