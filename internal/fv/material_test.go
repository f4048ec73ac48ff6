package fv

import (
	"errors"
	"math"
)

// constant has properties that do not depend on temperature.
func constant(density, c, k float64) Material {
	return Material{
		Density:      density,
		Conductivity: func(float64) (float64, error) { return k, nil },
		SpecificHeat: func(float64) (float64, error) { return c, nil },
		Enthalpy:     func(T float64) (float64, error) { return c * T, nil },
		Temperature:  func(h float64) (float64, error) { return h / c, nil },
	}
}

// linear has c = c0 (1 + b T) and k = k0 (1 + a T), for which everything has a closed form.
type linear struct{ density, c0, b, k0, a float64 }

func (m linear) enthalpy(T float64) float64    { return m.c0 * T * (1 + m.b*T/2) }
func (m linear) temperature(h float64) float64 { return (math.Sqrt(1+2*m.b*h/m.c0) - 1) / m.b }
func (m linear) potential(T float64) float64   { return m.k0 * T * (1 + m.a*T/2) }

func (m linear) material() Material {
	return Material{
		Density:      m.density,
		Conductivity: func(T float64) (float64, error) { return m.k0 * (1 + m.a*T), nil },
		SpecificHeat: func(T float64) (float64, error) { return m.c0 * (1 + m.b*T), nil },
		Enthalpy:     func(T float64) (float64, error) { return m.enthalpy(T), nil },
		Temperature:  func(h float64) (float64, error) { return m.temperature(h), nil },
	}
}

// stepped has a specific heat that jumps from c1 to c2 at a temperature, and a conductivity that
// bends there.
func stepped(at, c1, c2, k1, bend float64) Material {
	return Material{
		Density: 1000,
		Conductivity: func(T float64) (float64, error) {
			return k1 + bend*max(T-at, 0), nil
		},
		SpecificHeat: func(T float64) (float64, error) {
			if T < at {
				return c1, nil
			}
			return c2, nil
		},
		Enthalpy: func(T float64) (float64, error) { return c1*min(T-at, 0) + c2*max(T-at, 0), nil },
		Temperature: func(h float64) (float64, error) {
			return at + min(h, 0)/c1 + max(h, 0)/c2, nil
		},
	}
}

var errOwn = errors.New("own")
