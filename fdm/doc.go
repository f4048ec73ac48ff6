// Package fdm predicts the temperatures in a body by solving the equation of conduction numerically,
// where the exact solutions end: properties that depend on temperature, and any exchange at the
// surface. Bodies are solid spheres; the start is at one temperature.
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
// Conservative finite volumes on a grid graded towards the surface, with a node on the surface and one in
// the centre. The state is the enthalpy of each volume, so that no heat is lost between steps, however
// the specific heat runs; the heat that has left is a state too, and the balance of both closes to rounding
// ([Solution.EnergyBalance]). Conduction between nodes uses the integral of the conductivity, exact
// for k(T) in steady flow between two nodes. Time goes in adaptive steps of an L-stable linearly implicit method of order 4,
// and times between steps come from its own continuous extension.
//
// # Errors
//
// [Solution.GridError] is half of the difference that halving the cells makes, reduced by the order 2 of the grid;
// [Solution.StepError] adds up the estimated errors of the steps; [Solution.ErrorEstimate] is their sum.
// They are estimates, not bounds, and speak of the equations as stated: what the properties and the
// exchange are worth is not in them. With the default settings the first moments after a sudden change of the surroundings
// are resolved to a few hundredths of the change, later ones to a few hundred-thousandths.
//
// A body that leaves the range of its material, or an exchange that fails, ends a solution with an error that
// says when and where; what was computed until then stays readable.
//
// A hot body, a quench or a fire needs the local codes and practitioners licensed for them; no
// number from here stands in for either.
package fdm
