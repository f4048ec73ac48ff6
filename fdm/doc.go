// Package fdm predicts the temperatures in a body by solving the equation of conduction numerically, for
// everything in one dimension that has no closed form: properties that depend on temperature, melting and
// freezing, layers, two different faces, any exchange at them, heat from inside.
//
//	problem := fdm.Problem{
//		Body:     shape.Sphere(units.Millimetre.Of(50)),
//		Material: steel,
//		Initial:  units.Celsius.Of(800),
//		Surface:  boundary.Function(exchange),
//		Horizon:  units.Hour.Of(1),
//	}
//	solution, err := problem.Solve(ctx)
//	wait, err := solution.TimeTo(shape.Centre(), units.Celsius.Of(60))
//
// # What can be stated
//
//   - Bodies: spheres, plates, cylinders with insulated ends, hollow spheres and tubes. A plate or a hollow body has
//     two faces, [Problem.Surface] and [Problem.Opposite]. Layers have contacts between them, of a constant resistance
//     or one that depends on the temperatures ([Layer]).
//   - Faces: every condition of package boundary, with exact slopes where it is stated by constants, and a lump of one
//     temperature at each face, such as the liquid in a pot, a heater or the air of a room ([Lump]).
//   - Inside: a source that depends on place, time and temperature; a profile of temperatures at the start.
//   - Materials: properties of temperature, with the heat of a transition over a range or at one temperature, where the
//     enthalpy jumps at a kink; a material that changes for good where it has been hot ([Changing]).
//   - An end: the horizon, a temperature that the whole body has passed, or an [Event].
//   - The schemes of textbooks, for those who must compare with them, with the limits of their steps ([Scheme],
//     [Problem.StepLimits]).
//
// [Study] solves many problems alike on all processors.
//
// # What can be asked
//
//   - Temperatures at a place and time, and in the mean ([Solution.At], [Solution.Mean]), and the lump's ([Solution.LumpAt]).
//   - The time to a temperature, for one place or for the first or last of all ([Solution.TimeTo]). "Never" and "not within
//     the horizon" are errors that tell them apart.
//   - Heat, and the flux at each face ([Solution.HeatReleased], [Solution.HeatThrough], [Solution.Flux]).
//   - Where an isotherm or a front is ([Solution.Front]), and how far two places are apart ([Solution.GreatestDifference]).
//   - How good all that is, and how it was obtained ([Solution.ErrorEstimate], [Solution.Derivation]).
//
// # Method
//
// Conservative finite volumes on a grid graded towards exposed faces and where layers meet, with a node at both ends
// of each layer. The state is the enthalpy of each volume, so that no heat is lost between steps, however
// the specific heat runs; the heat that has left is a state too, and the balance of both closes to
// rounding ([Solution.EnergyBalance]). Conduction between nodes uses the integral of the conductivity
// over temperature. Time goes in adaptive steps of an L-stable linearly implicit method of order 4 (G. Steinebach, 1995),
// and times between steps come from its own continuous extension; steps end where a logged temperature bends.
//
// A temperature that is prescribed, and a contact without resistance, are held by a resistance of a ten-millionth of
// that of the cell beside.
//
// # Errors
//
// Without further fields the grid and the tolerance are chosen so that the estimated error stays within 10 mK, or within
// [Problem.Accuracy]. What is reported is extrapolated from the grid and one with half the cells, whose errors
// fall with the square of the number of cells; the error left falls with its fourth power. A body that melts or changes for
// good, and a textbook scheme, are not extrapolated.
//
// [Solution.GridError] compares with one grid coarser still, [Solution.StepError] with steps of half the length;
// [Solution.ErrorEstimate] is the sum of both and of the error of the table of the material, and [Solution.LargestError] its
// largest value over the solution. They are estimates, not bounds, and
// speak of the problem as stated: what the properties and the exchange are worth is not in them.
//
// Before heat has come through the outermost cell a sudden change is not resolved; [Problem.Smallest] makes that cell
// thinner, for earlier times. ACCURACY.md, beside this package, has the measured errors and times: how the error falls
// with the number of cells (its table "Grid") and with the tolerance ("Steps"), and what whole solutions take.
//
// A front of melting at one temperature moves from cell to cell. With 320 cells and a tolerance of 1 mK its place is
// good to a thousandth, with 10 mK to 0.2 % between the ends of steps ([Solution.Front]). A temperature beside it is good to a
// third of what lies between two nodes, or between the ends of steps to fifteen times the tolerance, and the time at which it
// passes a place to half a cell.
//
// A body that leaves the range of its material, or a function of the caller that fails, ends a solution with an error
// that says when and where; what was computed until then stays readable.
//
// # Caution
//
// [Solution.Derivation] repeats as a warning what of this applies.
//
//   - Fire, and a quench: the local codes and practitioners licensed for them decide, not a number from here. It is conduction
//     alone: spalling, moisture that moves, joints that open, strength, distortion and what happens to the bond between
//     layers are not in it.
//   - Freezing and thawing of food, and ice that has to carry: measured temperatures and times decide, not a predicted front.
//   - Cracks: a difference of temperatures between surface and centre tells where stress comes from, not whether a body
//     cracks. That takes its strength, its restraint and its flaws.
package fdm
