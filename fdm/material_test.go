package fdm_test

import (
	"math"

	"example.com/coolward/units"
)

// plain has properties that do not depend on temperature, between 1 K and 5000 K.
type plain struct{ density, specificHeat, conductivity float64 }

func (m plain) Density() units.Density { return units.KilogramPerCubicMetre.Of(m.density) }
func (m plain) Conductivity(units.Temperature) (units.Conductivity, error) {
	return units.WattPerMetreKelvin.Of(m.conductivity), nil
}

func (m plain) SpecificHeat(units.Temperature) (units.SpecificHeat, error) {
	return units.JoulePerKilogramKelvin.Of(m.specificHeat), nil
}

func (m plain) Enthalpy(T units.Temperature) (units.SpecificEnergy, error) {
	return units.JoulePerKilogram.Of(m.specificHeat * T.SI()), nil
}

func (m plain) Temperature(h units.SpecificEnergy) (units.Temperature, error) {
	return units.Kelvin.Of(h.SI() / m.specificHeat), nil
}

func (plain) Range() (low, high units.Temperature) {
	return units.Kelvin.Of(1), units.Kelvin.Of(5000)
}
func (plain) Kinks() []units.Temperature { return nil }

// polynomial has k = Σ k_i x^i and c = Σ c_i x^i with x in °C, within a range in kelvin.
type polynomial struct {
	density   float64
	k, c      []float64
	low, high float64
}

// steel is that of the reference problem in testdata/steel_sphere.csv.
var steel = polynomial{7850, []float64{54, -0.0333}, []float64{425, 0.773, -1.69e-3, 2.22e-6}, 270, 1200}

func horner(c []float64, x float64) (y float64) {
	for i := len(c) - 1; i >= 0; i-- {
		y = y*x + c[i]
	}
	return y
}

func (m polynomial) check(T units.Temperature) error {
	if T.SI() >= m.low && T.SI() <= m.high {
		return nil
	}
	return &units.RangeError{
		Model: "test steel", Quantity: "temperature", Value: T.Dynamic(),
		Min: units.Kelvin.Of(m.low).Dynamic(), Max: units.Kelvin.Of(m.high).Dynamic(), Source: "test",
	}
}

func (m polynomial) Density() units.Density { return units.KilogramPerCubicMetre.Of(m.density) }
func (m polynomial) Conductivity(T units.Temperature) (units.Conductivity, error) {
	return units.WattPerMetreKelvin.Of(horner(m.k, T.In(units.Celsius))), m.check(T)
}

func (m polynomial) SpecificHeat(T units.Temperature) (units.SpecificHeat, error) {
	return units.JoulePerKilogramKelvin.Of(horner(m.c, T.In(units.Celsius))), m.check(T)
}

func (m polynomial) enthalpy(x float64) float64 {
	sum := 0.0
	for i := len(m.c) - 1; i >= 0; i-- {
		sum = (sum + m.c[i]/float64(i+1)) * x
	}
	return sum
}

func (m polynomial) Enthalpy(T units.Temperature) (units.SpecificEnergy, error) {
	return units.JoulePerKilogram.Of(m.enthalpy(T.In(units.Celsius))), m.check(T)
}

func (m polynomial) Temperature(h units.SpecificEnergy) (units.Temperature, error) {
	x := 300.0
	for range 60 {
		d := (m.enthalpy(x) - h.SI()) / horner(m.c, x)
		x -= d
		if math.Abs(d) < 1e-9 {
			break
		}
	}
	T := units.Celsius.Of(x)
	return T, m.check(T)
}

func (m polynomial) Range() (low, high units.Temperature) {
	return units.Kelvin.Of(m.low), units.Kelvin.Of(m.high)
}
func (polynomial) Kinks() []units.Temperature { return nil }

// jumping has a specific heat that is thirty times as large between two temperatures, as with a
// transition that takes heat over a few kelvin. It gives its kinks in no order, one of them twice.
type jumping struct{ plain }

const (
	jumpFrom = 340.0
	jumpTo   = 345.0
)

func (m jumping) SpecificHeat(T units.Temperature) (units.SpecificHeat, error) {
	c := m.specificHeat
	if T.SI() > jumpFrom && T.SI() < jumpTo {
		c *= 30
	}
	return units.JoulePerKilogramKelvin.Of(c), nil
}

func (m jumping) Enthalpy(T units.Temperature) (units.SpecificEnergy, error) {
	within := min(max(T.SI()-jumpFrom, 0), jumpTo-jumpFrom)
	return units.JoulePerKilogram.Of(m.specificHeat * (T.SI() + 29*within)), nil
}

func (m jumping) Temperature(h units.SpecificEnergy) (units.Temperature, error) {
	u := h.SI() / m.specificHeat
	switch {
	case u < jumpFrom:
		return kelvin(u), nil
	case u < jumpFrom+30*(jumpTo-jumpFrom):
		return kelvin(jumpFrom + (u-jumpFrom)/30), nil
	}
	return kelvin(u - 29*(jumpTo-jumpFrom)), nil
}

func (jumping) Kinks() []units.Temperature {
	return []units.Temperature{kelvin(jumpTo), kelvin(jumpFrom), kelvin(jumpTo), kelvin(9000)}
}
