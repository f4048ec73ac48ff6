// Package fdm predicts the temperatures in a body by solving the equation of conduction numerically,
// where the exact solutions end: properties that depend on temperature, and any exchange at the
// surface. Bodies are solid spheres, cylinders with insulated ends and plates; the start is at one
// temperature.
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
// # Method
//
// Conservative finite volumes on a grid graded towards the surface, with a node in the centre and one on
// the surface. The state is the enthalpy of each volume, so that no heat is lost between steps, however
// the specific heat runs; the heat that has left is a state too, and the balance of both closes to
// rounding ([Solution.EnergyBalance]). Conduction between nodes uses the integral of the conductivity
// over temperature. Time goes in adaptive steps of an L-stable linearly implicit method of order 4, and
// times between steps come from its own continuous extension.
//
// # Errors
//
// [Solution.GridError] is a third of the difference to a second run with half the cells, by the order 2
// of the grid; [Solution.StepError] adds up the estimated errors of the steps; [Solution.ErrorEstimate]
// is the sum of both and of the error of the table of the material. They are estimates, not bounds, and
// speak of the problem as stated: what the properties and the exchange are worth is not in them.
//
// Against the exact solution for constant properties, with the default settings and Biot numbers from 0.1
// to 1000, from a Fourier number of 0.01 on the error is below 1.2e-4 of the difference between start and
// ambient. Before that the surface is off by most: at Bi = 10 by 1.3e-4 at Fo = 0.001, 4e-4 at 1e-4 and
// 3.4e-3 at 1e-6, where the estimate is half of that. The steps in time, with the default tolerance of 1
// mK, added 0.2 mK in the cooling of a steel sphere from 800 °C.
//
// A body that leaves the range of its material, or an exchange that fails, ends a solution with an error that
// says when and where; what was computed until then stays readable.
//
// A hot body, a quench or a fire needs the local codes and practitioners licensed for them; no
// number from here stands in for either.
package fdm
