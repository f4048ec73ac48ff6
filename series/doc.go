// Package series gives the exact temperature in a body that starts at one temperature and exchanges
// heat with its surroundings by a constant coefficient, or is put to another surface temperature, with
// constant properties.
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
// Bodies are plates that are exposed on one face or both, cylinders that are exposed all round, at their
// ends or both, spheres, bricks, tubes and hollow spheres. A brick and a cylinder with its ends are products of the
// others; every question is answered for them too.
//
// With boundary.Flux in place of boundary.Constant a constant heat flux leaves, or enters, through the exposed faces.
//
// Any Biot number from 0 to infinity is exact, small or large, and so is any time: the series of
// eigenfunctions is used where it converges in a few terms, and a form for short times before
// that. [Solution.TruncationError] bounds what both leave out; [Solution.OneTerm] shows what the first
// term alone would give.
//
// An ambient that varies is followed in plates, long cylinders and spheres: [Solution.Ramp] and
// [Solution.Oscillation] are closed forms, and [Solution.Track] takes a log of times and temperatures, sample
// by sample.
//
// In a body of one coordinate the faces may differ ([Problem].Opposite: another coefficient or ambient, a prescribed
// temperature, a flux, or nothing at all), the start may be a profile over the depth, and heat may be set free all
// over the body, constant or by a log. The solution then is a steady state and modes about it, with the same questions
// and two more: [Solution.Flux] and [Solution.HeatThrough] of each face. A temperature need not go one way then, and
// [Solution.TimeTo] gives the first time, found by a search that no crossing escapes. Of a profile the modes resolve
// what is left of it after a ten-thousandth to a thousandth of L²/α, and an earlier time is refused where the error
// could pass a ten-thousandth of the temperature differences. Walls of several layers are for a numerical model.
//
// [SemiInfinite] is the body without another side: ground, thick walls, and every body at first; [Contact] is
// the temperature at which two of them touch. [Modes] are roots, coefficients and θ without units, for charts
// and for the tests of other programs.
package series
