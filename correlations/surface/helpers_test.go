package surface_test

import (
	"math"
	"testing"

	"example.com/coolward/correlations/surface"
	"example.com/coolward/props"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// constant is a fluid whose properties do not depend on temperature or pressure.
type constant struct {
	rho, c, k, mu, beta float64
	gas                 bool
}

func (f constant) At(T units.Temperature, p units.Pressure) (props.FluidState, error) {
	return props.FluidState{
		Temperature:  T,
		Pressure:     p,
		Density:      units.KilogramPerCubicMetre.Of(f.rho),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(f.c),
		Conductivity: units.WattPerMetreKelvin.Of(f.k),
		Viscosity:    units.PascalSecond.Of(f.mu),
		Expansion:    units.PerKelvin.Of(f.beta),
		Gas:          f.gas,
	}, nil
}

func (constant) Name() string   { return "constant fluid" }
func (constant) Source() string { return "test" }

// fromGroups is the constant fluid of the given conductivity, kinematic viscosity and Prandtl number.
func fromGroups(k, nu, pr, beta float64) constant {
	const rho = 1.2
	return constant{rho: rho, mu: nu * rho, k: k, c: pr * k / (nu * rho), beta: beta, gas: true}
}

func celsius(t float64) units.Temperature { return units.Celsius.Of(t) }
func kelvin(t float64) units.Temperature  { return units.Kelvin.Of(t) }

func ball(mm float64) shape.Body { return shape.Sphere(units.Millimetre.Of(mm)) }

func speed(v float64) units.Velocity { return units.MetrePerSecond.Of(v) }

func film(t *testing.T, c surface.Convection, wall units.Temperature) surface.Film {
	t.Helper()
	f, err := c.Film(wall)
	if err != nil {
		t.Fatalf("%v in %s at %v, %v: %v", c.Body, c.Fluid.Name(), c.Speed, wall, err)
	}
	return f
}

func near(t *testing.T, name string, got, want, tol float64, source string) {
	t.Helper()
	if !(math.Abs(got-want) <= tol) {
		t.Errorf("%s: got %.10g, want %.10g ± %.2g (%s)", name, got, want, tol, source)
	}
}
