// Package lumped gives a body one temperature for its whole volume: the right model where heat moves
// inside much faster than through the surface, that is at a small Biot number.
//
//	solution, err := lumped.Problem{
//		Body:     shape.Sphere(units.Millimetre.Of(12)),
//		Material: steel,
//		Initial:  units.Celsius.Of(850),
//		Surface:  boundary.Constant(units.WattPerSquareMetreKelvin.Of(20), units.Celsius.Of(50)),
//	}.Solve(ctx)
//	t, err := solution.TimeTo(shape.Centre(), units.Celsius.Of(125))
//
// A body may be of any shape, hollow too, or just a volume and a surface (shape.Measured); it may be of
// several materials at one temperature ([Part]), with a source of heat inside, and with two faces that differ.
//
// Several bodies that exchange heat are a [Network], a late thermometer is a [Sensor]. A logged curve gives the time constant,
// a heat transfer coefficient or the ambient by [Fit], an emissivity by [SurfaceFit], and a forecast of the rest by
// [Fitted.TimeTo].
//
// # What to ask
//
// [Solution.At], [Solution.TimeTo] and [Solution.HeatReleased]; where the course comes back [Solution.Crossings] and
// [Solution.Within]; [Solution.Rate] and [Solution.RateCrossings]; [Solution.TimeConstant]. [JustMeeting] finds the size,
// coefficient or ambient with which a limit is just met, [Problem.LatestStart] how late to begin, [Problem.TimeBand] what
// the scatter of a coefficient does to a time. Package uncertain does that for every input at once, and tells which moves
// the answer most. [Solution.Derivation] shows how an answer came about, with lengths, groups, errors, sources and warnings.
//
// # Closed forms
//
// Where the specific heat does not vary between the temperatures of the run, and the surface is stated by
// constants, the solution is a closed form:
//
//   - constant coefficients, ambients, fluxes and a source: T∞ + (T0 − T∞) exp(−t/τ), τ = ρ c V/(h A);
//   - the same with ambients that ramp, oscillate or follow a log, exact between two of its readings;
//   - radiation alone, with a source or not: t over T by a logarithm and an arc tangent;
//   - a coefficient that goes with a power of the difference, as in natural convection: (1 + n t/τ)^(−1/n);
//   - a constant flux: a straight line.
//
// All but the second hold for all time, and need no horizon. Whether the specific heat varies is what the
// material says of itself (IsConstant), or else is seen from its specific heat and enthalpy at nine temperatures
// and at the kinks between.
//
// In every other case the enthalpy of the body is integrated with adaptive steps to a tolerance of 1 mK, over a
// horizon that the problem states; latent heat is never a spike that a step could miss. An exchange function
// that jumps for less time than a step can be missed, so end a solution at such a time and begin the next there; the
// readings of a log are known, and steps end there.
//
// # How wrong it is
//
// The error has two parts, and both can be asked for: [Solution.IntegrationError], and what it costs
// to take the body as one temperature, [Solution.LumpingError] at a place and
// [Solution.LumpingErrorInTime]. The latter is often the larger: at a Biot number h(V/A)/k of 0.1 the
// lumped time in which the centre loses half its excess is short of the exact one by 5 % for a plate, 11 % for
// a long cylinder and 16 % for a sphere.
//
// [Problem.FirstOrder] counts the resistance inside the body: the coefficient acts as 1/(1/h + r/k), with r = L/3 for a
// plate, R/4 for a long cylinder and R/5 for a sphere, and surface and centre lie beside the mean by the profile of slow
// cooling. That takes four fifths of the error at the centre away, and nearly all of that of the mean.
// [Solution.InternalDifference] tells how far centre and surface are apart.
//
// # Networks
//
// The nodes of a [Network] are bodies of one temperature each: a cup and what is in it, a cabinet, a cell in its case. With
// constant conductances it is solved exactly, as a sum of exponentials; else by steps for stiff equations. A
// [NetworkSolution] answers the same questions for a node by its name.
//
// # Readings
//
// A [Log] is what a logger wrote, with gaps. [Sensor.Indicated] and [Sensor.Corrected] go between it and the truth,
// [Log.Course] makes it the ambient of a body, and [Fit] and [SurfaceFit] find what it says. What is found is an
// [Estimate] with its interval. [Fitted.AmbientIdentified] and [Fitted.OneExponential] say
// whether the readings tell the ambient, and whether one exponential describes them.
//
// # Caution
//
// A forecast is no measurement. Correlations for the coefficient scatter by 10 to 30 %, which moves a time by as much; the
// centre, which decides whether food is safe or a part may be touched, is the last to follow, and a lumped forecast is
// early for it. Where a release hangs on it, ask for the longest time of the band and add the lumping error, and measure
// at the place that counts before anything is released.
package lumped
