// Package correlations holds published formulas for the Nusselt number, each with the range it was
// measured in, its scatter, its reference temperature and its source.
//
//	c := correlations.WhitakerSphere()
//	r, err := c.Nu(correlations.Groups{Re: 6000, Pr: 0.71, ViscosityRatio: 1})
//	// r.Nu is 46.3, and r.Scatter says that a measured one may differ by 30 %
//
// A [Correlation] is a value: a program can read, list, print and compare it, and cannot change it
// for others. [All] lists what there is, [For] what there is for a body in a regime, [Lookup] finds one by
// its name, and [Compare] evaluates all that apply at given groups. The page CORRELATIONS.md in this
// directory lists them with their sources. Package surface chooses
// among them for a body in a fluid and does the arithmetic of the groups; this package knows neither
// fluids nor bodies.
//
// # What there is
//
//   - convex bodies: sphere, short cylinder, cube, spheroid and others, at rest, in natural and in forced
//     convection
//   - cylinders and wires: across a stream, round, square and hexagonal, and yawed to it ([YawedRe]);
//     horizontal and vertical in natural convection
//   - plates: along a stream, laminar and turbulent, with an unheated start, with uniform flux; normal to
//     a stream; vertical, inclined and horizontal in natural convection
//   - spaces: open vertical channels, enclosures, layers heated from below, annuli and spherical shells
//   - tubes, laminar to turbulent, with liquid metals, and the friction factors that they use
//   - impinging gas jets, rotating disks and spheres, packed and fluidised beds, tube banks
//   - films that boil off or condense, as far as they are dimensionless
//
// The formulas are in the letters of the trade: Nu, Re, Pr, Ra, Gr, Pe, Gz as in [Groups], D for a diameter, L
// for a length, H for a height, θ for an angle from the vertical and τ for one from the horizontal, ε for a
// void fraction, f for the friction factor of Darcy. [Correlation.Length] says which length the groups are on.
//
// Most give the mean over a surface; [Correlation.Kind] says which give a local number, or the Sherwood number
// of mass transfer. By the analogy of heat and mass transfer every formula of forced convection gives the
// Sherwood number too, with the Schmidt number for Pr, as long as little mass is transferred.
//
// Forced and natural convection together are a [Blend].
//
// Sprays on hot walls and film cooling are not in the package: the formulas for sprays were recalled with doubt and not
// seen on a page, and none for film cooling was found.
//
// # Range
//
// Outside the range of its source a correlation returns a [*units.RangeError]. [Correlation.Extrapolate]
// evaluates the formula there all the same, and the result says so. A published limit is as precise
// as the digits that it is printed with: 0.7 admits 0.65, 0.71 admits 0.705, 200 admits 200.5, as
// [Limit] has it. Without that rule the air in which many of these formulas were measured, whose
// Prandtl number runs from 0.698 to 0.711 between 0 and 300 °C, would be out of their range.
//
// A Reynolds or Rayleigh number of exactly 0 is in range of every correlation that has a limit at rest and
// that it drives: it gives the conduction limit, Nu = 2 for a sphere, which is exact. Formulas without such a
// limit are refused there.
//
// Where the branches of a published table do not meet, the jump stays and is in the note; each branch holds
// from its lower end, the next one takes over at its own. A solver that needs a smooth coefficient takes a formula in
// one piece, or blends.
//
// # Status
//
// A formula is [ReadOnPage] if it was compared with a page that can be cited, which [Correlation.Evidence] names,
// and [FromMemory] otherwise; what was not read on a page that was otherwise read is said there too. Formulas
// that were recalled with doubt are not in the package. Titles, volumes and pages of publications stand from
// memory.
//
// # Hot surfaces
//
// A coefficient from a correlation is good to 15 to 30 %, on a smooth surface of one temperature in
// an undisturbed stream. A surface that is calculated to be cool enough to touch may not be: use the
// lower end of the scatter, and measure before anybody relies on it.
package correlations
