package lumped

import (
	"math"

	"example.com/coolward/units"
)

// A stuff is a material for tests: c = c0 + c1 T between two temperatures, k = k0 + k1 T.
type stuff struct {
	rho, c0, c1, k0, k1 float64
	low, high           float64
	constant            bool
}

func (m stuff) in(kelvin float64) error {
	if kelvin >= m.low && kelvin <= m.high {
		return nil
	}
	return &units.RangeError{
		Model: "stuff", Quantity: "temperature", Value: units.Kelvin.Of(kelvin).Dynamic(),
		Min: units.Kelvin.Of(m.low).Dynamic(), Max: units.Kelvin.Of(m.high).Dynamic(),
	}
}

func (m stuff) Density() units.Density { return units.KilogramPerCubicMetre.Of(m.rho) }

func (m stuff) Conductivity(t units.Temperature) (units.Conductivity, error) {
	return units.WattPerMetreKelvin.Of(m.k0 + m.k1*t.SI()), m.in(t.SI())
}

func (m stuff) SpecificHeat(t units.Temperature) (units.SpecificHeat, error) {
	return units.JoulePerKilogramKelvin.Of(m.c0 + m.c1*t.SI()), m.in(t.SI())
}

func (m stuff) Enthalpy(t units.Temperature) (units.SpecificEnergy, error) {
	k := t.SI()
	return units.JoulePerKilogram.Of(m.c0*k + m.c1/2*k*k), m.in(k)
}

func (m stuff) Temperature(h units.SpecificEnergy) (units.Temperature, error) {
	// c0 T + c1 T²/2 = h, in the form that holds for c1 = 0 too.
	k := 2 * h.SI() / (m.c0 + math.Sqrt(m.c0*m.c0+2*m.c1*h.SI()))
	return units.Kelvin.Of(k), m.in(k)
}

func (m stuff) Range() (low, high units.Temperature) {
	return units.Kelvin.Of(m.low), units.Kelvin.Of(m.high)
}

func (m stuff) Kinks() []units.Temperature { return nil }

func (m stuff) IsConstant() bool { return m.constant }

// constantStuff returns a material with constant properties from 1 K to 5000 K.
func constantStuff(rho, c, k float64) stuff {
	return stuff{rho: rho, c0: c, k0: k, low: 1, high: 5000, constant: true}
}

// A latent is a stuff that takes up heat between two temperatures close together.
type latent struct {
	stuff
	at, width, heat float64 // K, K, J/kg
}

func (m latent) IsConstant() bool { return false }

func (m latent) SpecificHeat(t units.Temperature) (units.SpecificHeat, error) {
	c, err := m.stuff.SpecificHeat(t)
	if k := t.SI(); k > m.at && k < m.at+m.width {
		c = c.Add(units.JoulePerKilogramKelvin.Of(m.heat / m.width))
	}
	return c, err
}

func (m latent) Enthalpy(t units.Temperature) (units.SpecificEnergy, error) {
	part := math.Max(0, math.Min(1, (t.SI()-m.at)/m.width))
	return units.JoulePerKilogram.Of(m.c0*t.SI() + part*m.heat), m.in(t.SI())
}

func (m latent) Temperature(h units.SpecificEnergy) (units.Temperature, error) {
	x, first, last := h.SI(), m.c0*m.at, m.c0*(m.at+m.width)+m.heat
	k := x / m.c0
	switch {
	case x >= last:
		k = (x - m.heat) / m.c0
	case x > first:
		k = m.at + m.width*(x-first)/(last-first)
	}
	return units.Kelvin.Of(k), m.in(k)
}

func (m latent) Kinks() []units.Temperature {
	return []units.Temperature{units.Kelvin.Of(m.at), units.Kelvin.Of(m.at + m.width)}
}
