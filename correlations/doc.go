// Package correlations holds published formulas for the Nusselt number, each with the range it was
// measured in, its scatter, its reference temperature and its source.
//
//	c := correlations.WhitakerSphere()
//	r, err := c.Nu(correlations.Groups{Re: 6000, Pr: 0.71, ViscosityRatio: 1})
//	// r.Nu is 46.3, and r.Scatter says that a measured one may differ by 30 %
//
// A [Correlation] is a value: a program can read, list, print and compare it, and cannot change it
// for others. [All] lists what there is, [Lookup] finds one by its name. Package surface chooses
// among them for a body in a fluid and does the arithmetic of the groups; this package knows neither
// fluids nor bodies.
//
// # Range
//
// Outside the range of its source a correlation returns a [*units.RangeError]. [Correlation.Extrapolate]
// evaluates the formula there all the same, and the result says so. A published limit is as precise
// as the digits that it is printed with: 0.7 admits 0.65, 0.71 admits 0.705, 200 admits 200.5, as
// [Limit] has it. Without that rule the air in which many of these formulas were measured, whose
// Prandtl number runs from 0.698 to 0.711 between 0 and 300 °C, would be out of their range.
//
// A Reynolds or Rayleigh number of exactly 0 is in range of every correlation that it drives: it
// gives the conduction limit, Nu = 2 for a sphere, which is exact.
//
// # Hot surfaces
//
// A coefficient from a correlation is good to 15 to 30 %, on a smooth surface of one temperature in
// an undisturbed stream. A surface that is calculated to be cool enough to touch may not be: use the
// lower end of the scatter, and measure before anybody relies on it.
package correlations
