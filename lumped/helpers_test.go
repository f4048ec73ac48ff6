package lumped

import (
	"context"
	"math"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

func solve(t testing.TB, p Problem) *Solution {
	t.Helper()
	s, err := p.Solve(context.Background())
	if err != nil {
		t.Fatal(err)
	}
	return s
}

func kelvin(x float64) units.Temperature { return units.Kelvin.Of(x) }
func seconds(x float64) units.Duration   { return units.Second.Of(x) }
func sphere(diameter float64) shape.Body { return shape.Sphere(units.Metre.Of(diameter)) }
func constant(h, ambient float64) boundary.Condition {
	return boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), kelvin(ambient))
}

// flux makes a condition of a plain function of seconds and kelvin.
func flux(q func(t, wall float64) float64) boundary.Condition {
	return boundary.Function(func(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
		return units.WattPerSquareMetre.Of(q(t.SI(), wall.SI())), nil
	})
}

// sigma is the Stefan-Boltzmann constant, exact from the defined constants of the SI (2019).
const sigma = 5.670374419184429e-8

// stillRoom is the exchange of a 5 cm ball in a room at 25 °C: natural convection from memory in shape,
// 2 W/(m² K) and 1.8 (ΔT/K)^(1/4) W/(m² K), and radiation of emissivity 0.9. A stand-in for tests.
func stillRoom(_, wall float64) float64 {
	const room = 298.15
	d := wall - room
	return (2+1.8*math.Sqrt(math.Sqrt(math.Abs(d))))*d + 0.9*sigma*(wall*wall*wall*wall-room*room*room*room)
}

// ball is a 5 cm ball from 100 °C in that room, until it is below 45 °C.
func ball() Problem {
	return Problem{
		Body: sphere(0.05), Material: constantStuff(1000, 2000, 15), Initial: units.Celsius.Of(100),
		Surface: flux(stillRoom), Horizon: units.Hour.Of(5), Until: units.Celsius.Of(45),
	}
}

func within(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance) {
		t.Errorf("%s: got %.10g, want %.10g ± %g", what, got, want, tolerance)
	}
}
