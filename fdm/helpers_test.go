package fdm_test

import (
	"context"
	"math"
	"testing"

	"example.com/coolward/fdm"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

func seconds(t float64) units.Duration   { return units.Second.Of(t) }
func kelvin(T float64) units.Temperature { return units.Kelvin.Of(T) }
func near(got, want, tol float64) bool   { return math.Abs(got-want) <= tol } // false for NaN
func constant(h, T float64) boundary.Condition {
	return boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), kelvin(T))
}

func exchange(q func(t, T float64) float64) boundary.Condition {
	return boundary.Function(func(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
		return units.WattPerSquareMetre.Of(q(t.SI(), wall.SI())), nil
	})
}

// solve returns the solution of a problem that has one.
func solve(t testing.TB, p fdm.Problem) *fdm.Solution {
	t.Helper()
	s, err := p.Solve(context.Background())
	if err != nil {
		t.Fatal(err)
	}
	return s
}

func at(t testing.TB, s *fdm.Solution, place shape.Place, time float64) float64 {
	t.Helper()
	T, err := s.At(place, seconds(time))
	if err != nil {
		t.Fatal(err)
	}
	return T.SI()
}

func heat(t testing.TB, s *fdm.Solution, time float64) float64 {
	t.Helper()
	q, err := s.HeatReleased(seconds(time))
	if err != nil {
		t.Fatal(err)
	}
	return q.SI()
}

func estimate(t testing.TB, s *fdm.Solution, place shape.Place, time float64) float64 {
	t.Helper()
	e, err := s.ErrorEstimate(place, seconds(time))
	if err != nil {
		t.Fatal(err)
	}
	return e.SI()
}

// scaled is a sphere of radius 0.1 m with R²/α = 10 000 s and k = 1 W/(m K), that starts 100 K above
// surroundings at 300 K: the Biot number is a tenth of h, and seconds are 1e-4 in Fo.
func scaled(bi float64, cells int) fdm.Problem {
	return fdm.Problem{
		Body: shape.Sphere(units.Metre.Of(0.2)), Material: plain{1000, 1000, 1}, Initial: kelvin(400),
		Surface: constant(10*bi, 300), Horizon: seconds(5e4), Cells: cells,
	}
}

// below returns the place at the fraction x of the radius of scaled.
func below(x float64) shape.Place { return shape.Below(units.Metre.Of(0.1 * (1 - x))) }

// steelSphere is the reference problem of testdata/steel_sphere.csv.
func steelSphere(cells int) fdm.Problem {
	return fdm.Problem{
		Body: shape.Sphere(units.Millimetre.Of(50)), Material: steel, Initial: kelvin(1073.15), Horizon: units.Hour.Of(1), Cells: cells,
		Surface: exchange(convectionAndRadiation),
	}
}

func convectionAndRadiation(_, T float64) float64 {
	const sigma, ambient = 5.670374419e-8, 293.15
	d := T - ambient
	return 1.3*math.Sqrt(math.Sqrt(math.Abs(d)/0.05))*d + 0.8*sigma*(T*T*T*T-ambient*ambient*ambient*ambient)
}
