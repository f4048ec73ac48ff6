package surface

import (
	"fmt"
	"math"

	"example.com/coolward/units"
)

// Sources of the sky temperatures.
const (
	SwinbankSource       = "W. C. Swinbank, Long-wave radiation from clear skies, Q. J. R. Meteorol. Soc. 89 (1963) 339-348 (formula read on a page at second hand, bibliography from memory)"
	BerdahlMartinSource  = "P. Berdahl and M. Martin, Emissivity of clear skies, Solar Energy 32 (1984) 663-664 (from memory)"
	berdahlMartinScatter = 0.02 // in the emissivity
)

// SwinbankSky returns the temperature of a clear sky as the surroundings of a [Radiation] by the temperature of the
// air at the ground alone, after [SwinbankSource],
//
//	Tsky = 0.0552 T^1.5, in K
//
// from 0 °C to 30 °C; from memory it was measured between about 8 °C and 29 °C. Clouds bring the sky up to the temperature of the air. It returns
// a [*units.RangeError] outside and an [*units.ArgumentError] for a temperature that cannot be.
func SwinbankSky(air units.Temperature) (units.Temperature, error) {
	const model = "Swinbank, clear sky"
	if err := within(model, "temperature of the air", air, 273.15, 303.15, SwinbankSource); err != nil {
		return units.Temperature{}, err
	}
	T := air.SI()
	return units.Kelvin.Of(0.0552 * T * math.Sqrt(T)), nil
}

// BerdahlMartinSky returns the temperature of a clear sky by the temperature and the dew point of the air at the
// ground, after [BerdahlMartinSource], by an emissivity of the sky
//
//	ε = 0.711 + 0.56 Td/100 + 0.73 (Td/100)², Td in °C; Tsky = ε^(1/4) T
//
// for a dew point from −20 °C to 30 °C, with ε to ±0.02 (both from memory), which is 2 K in the sky. It returns a
// [*units.RangeError] outside and an [*units.ArgumentError] for temperatures that cannot be, such as a dew point above
// the temperature of the air.
func BerdahlMartinSky(air, dewPoint units.Temperature) (units.Temperature, error) {
	const model = "Berdahl and Martin, clear sky"
	if err := units.CheckTemperature(model+": temperature of the air", air); err != nil {
		return units.Temperature{}, err
	}
	if err := within(model, "dew point", dewPoint, 253.15, 303.15, BerdahlMartinSource); err != nil {
		return units.Temperature{}, err
	}
	if dewPoint.Compare(air) > 0 {
		return units.Temperature{}, &units.ArgumentError{Field: model + ": dew point", Value: dewPoint, Accepted: "at most the temperature of the air, " + air.String()}
	}
	x := dewPoint.In(units.Celsius) / 100
	return units.Kelvin.Of(math.Sqrt(math.Sqrt(0.711+0.56*x+0.73*x*x)) * air.SI()), nil
}

// within returns the error for a temperature outside the range of a model, if it is.
func within(model, quantity string, T units.Temperature, low, high float64, source string) error {
	if T.SI() >= low && T.SI() <= high {
		return nil
	}
	if err := units.CheckTemperature(model+": "+quantity, T); err != nil {
		return err
	}
	return &units.RangeError{
		Model: model, Quantity: quantity, Value: T.Dynamic(),
		Min: units.Kelvin.Of(low).Dynamic(), Max: units.Kelvin.Of(high).Dynamic(), Source: source,
	}
}

// A View is a part of what a body faces.
type View struct {
	Factor      float64 // share of what leaves the body that goes there, from 0 to 1
	Temperature units.Temperature
}

// Surroundings returns the one temperature that stands for several for a [Radiation]: the sky above and the ground
// below, a furnace door in a cold wall,
//
//	T⁴ = Σ F T⁴ over the views
//
// which is exact for black views, and for grey ones that are large against the body. It returns an [*units.ArgumentError] for no view, for
// one that cannot be, and unless the factors add up to 1 within 1e-6.
func Surroundings(views ...View) (units.Temperature, error) {
	sum, fourth := 0.0, 0.0
	for i, v := range views {
		field := fmt.Sprintf("surroundings: view %d", i+1)
		if err := units.CheckNumber(field+": factor", v.Factor, 0, 1); err != nil {
			return units.Temperature{}, err
		}
		if err := units.CheckTemperature(field+": temperature", v.Temperature); err != nil {
			return units.Temperature{}, err
		}
		T := v.Temperature.SI()
		sum += v.Factor
		fourth += v.Factor * T * T * T * T
	}
	if !(math.Abs(sum-1) <= 1e-6) {
		return units.Temperature{}, &units.ArgumentError{Field: "surroundings: sum of the view factors", Value: sum, Accepted: "1"}
	}
	T := units.Kelvin.Of(math.Sqrt(math.Sqrt(fourth / sum)))
	return T, units.CheckTemperature("surroundings: temperature", T)
}
