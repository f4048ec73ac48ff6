// Package series gives the exact temperature in a body that starts at one temperature and exchanges
// heat with surroundings of constant temperature by a constant coefficient, with constant properties.
//
//	marble := series.Problem{
//		Body:         shape.Sphere(units.Millimetre.Of(16)),
//		Conductivity: units.WattPerMetreKelvin.Of(1.0),
//		Density:      units.KilogramPerCubicMetre.Of(2500),
//		SpecificHeat: units.JoulePerKilogramKelvin.Of(800),
//		Initial:      units.Celsius.Of(90),
//		Surface:      boundary.Constant(units.WattPerSquareMetreKelvin.Of(300), units.Celsius.Of(20)),
//	}
//	solution, err := marble.Solve(ctx)
//	t, err := solution.TimeTo(shape.Centre(), units.Celsius.Of(40))
//
// Any Biot number from 0 on is exact, small or large, and so is any time: the series of
// eigenfunctions is used where it converges in a few terms, and a closed form for short times before
// that. [Solution.TruncationError] bounds what both leave out, with rounding.
//
// Bodies of the family [shape.Spherical] are accepted.
package series
