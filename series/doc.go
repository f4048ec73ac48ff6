// Package series gives the exact temperature in a body of constant properties that is put into surroundings with a constant
// heat transfer coefficient, a prescribed surface temperature or a constant heat flux.
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
// # Bodies and faces
//
// Bodies are plates that are exposed on one face or both, cylinders that are exposed all round, at their ends or both,
// spheres, bricks, tubes and hollow spheres. A brick and a cylinder with its ends are products of the others; every
// question is answered for them too, and [Solution.AtPoint] for any point.
//
// Any Biot number from 0 to infinity is exact, small or large, and so is any time: the series of eigenfunctions is used
// where it converges in a few terms, and a form for short times before that. [Solution.TruncationError] bounds what both
// leave out; [Solution.OneTerm] shows what the first term alone would give.
//
// # An ambient that goes with time
//
// [Problem].Surface is boundary.Following, or boundary.TemperatureFollowing for a prescribed surface temperature, with a
// ramp, an oscillation or a log. The same questions are answered, from the start on, exactly. [Solution.Oscillation] gives the
// ratio and the lag of an oscillation once the start is forgotten, and [Solution.Track] takes a log sample by sample.
//
// # How sure is it
//
// [Solution.Sensitivity] says how a temperature depends on each input, [Solution.TimeSensitivity] how the time to
// one does.
//
// # From readings back
//
// [Problem.FitCoefficient], [Problem.FitConductivity] and [Problem.FitDiffusivity] find one number from one temperature that was
// read, [Problem.FitBiotAndDiffusivity] two from two. Each says how far the errors of the readings move the answer,
// and an [UnidentifiedError] reports readings from which it does not follow.
//
// # Bodies without an exact solution
//
// [Problem.Bracket] encloses the slowest place of a prism, a cone or a body of which only volume and surface are measured
// between bodies that fit into it and bodies into which it fits.
//
// # Faces that differ
//
// [Product] has another coefficient in each direction: a brick on a shelf, a bar, a corner of a thick wall.
//
// In a body of one coordinate the faces may differ ([Problem].Opposite: another coefficient or ambient, a prescribed
// temperature, a flux, or nothing at all), the start may be a profile over the depth, and heat may be set free all
// over the body, constant or by a log. The solution then is a steady state and modes about it, with the same questions
// and two more: [Solution.Flux] and [Solution.HeatThrough] of each face. A temperature need not go one way then, and
// [Solution.TimeTo] gives the first time, found by a search that no crossing escapes. Of a profile the modes resolve
// what is left of it after a ten-thousandth to a thousandth of L²/α, and an earlier time is refused where the error
// could pass a ten-thousandth of the temperature differences. Walls of several layers are for a numerical model.
//
// # Bodies without another side
//
// [SemiInfinite] is ground, a thick wall, and every body at first; [Contact] is the temperature at which two of them touch.
//
// # Without units
//
// [Modes] are roots, coefficients and θ without units, for charts and for the tests of other programs.
package series
