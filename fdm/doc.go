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
// # Method
//
// Conservative finite volumes on a grid graded towards exposed faces and where layers meet, with a node at both ends
// of each layer. The state is the enthalpy of each volume, so that no heat is lost between steps, however
// the specific heat runs; the heat that has left is a state too, and the balance of both closes to
// rounding ([Solution.EnergyBalance]). Conduction between nodes uses the integral of the conductivity
// over temperature. Time goes in adaptive steps of an L-stable linearly implicit method of order 4, and
// times between steps come from its own continuous extension; steps end where a logged temperature bends.
//
// A temperature that is prescribed, and a contact without resistance, are held by a resistance of a ten-millionth of
// that of the cell beside.
//
// # Errors
//
// Without further fields the grid and the tolerance are chosen so that the estimated error stays within 10 mK, or within
// [Problem.Accuracy]. What is reported is extrapolated from the grid and one with half the cells, whose errors
// fall with the square of the number of cells; the error left falls with its fourth power. A body that melts or changes for good is
// not extrapolated.
//
// [Solution.GridError] compares with one grid coarser still, [Solution.StepError] with steps of half the length;
// [Solution.ErrorEstimate] is the sum of both and of the error of the table of the material, and [Solution.LargestError] its
// largest value over the solution. They are estimates, not bounds, and
// speak of the problem as stated: what the properties and the exchange are worth is not in them.
//
// With 200 cells and a tolerance of 1 mK, and Biot numbers from 0.01 to 1000, the error against the exact series for
// constant properties was at most 1.6 mK of 100 K from a Fourier number of 1e-4 on, all from the steps. The steel sphere from
// 800 °C was met to 1.5 mK, a wall of steel, insulation and concrete in a standard fire to 1.4 mK at 1300 K.
// [Problem.Smallest] is for earlier times. ACCURACY.md, beside this package, has tables of errors and times.
//
// A front of melting at one temperature moves from cell to cell: its place is good to a thousandth with 320 cells
// ([Solution.Front]), a temperature beside it to a third of what lies between two nodes, or between the ends of steps to fifteen times the tolerance, and the time at which it passes
// a place to half a cell.
//
// A body that leaves the range of its material, or a function of the caller that fails, ends a solution with an error
// that says when and where; what was computed until then stays readable.
//
// # Caution
//
// A hot body, a quench or a fire needs the local codes and practitioners licensed for them; no
// number from here stands in for either. A wall that a fire curve heats is conduction alone: spalling, moisture that
// moves, joints that open and what the fire does to the bond between layers are not in it. Frozen food is safe by
// measured temperatures and times, not by a predicted front. A difference of temperatures between surface and centre
// tells where stress comes from, not whether a body cracks: that takes its strength, its restraint and its flaws.
package fdm
