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
// With a constant coefficient, a constant ambient and a specific heat that does not vary between the
// two temperatures, the solution is the closed form T = T∞ + (T0 − T∞) exp(−h A t/(ρ c V)), for all time.
// Whether the specific heat varies is what the material says of itself (IsConstant), or else is
// seen from its specific heat and enthalpy at nine temperatures from start to ambient and at the kinks
// between. In every other case the enthalpy of the body is integrated with adaptive steps to a
// tolerance of 1 mK, over a horizon that the problem states; an exchange function that jumps for less
// time than a step can be missed, so end a solution at such a time and begin the next there.
//
// The error has two parts, and both can be asked for: [Solution.IntegrationError], and what it costs
// to take the body as one temperature, [Solution.LumpingError] at a place and
// [Solution.LumpingErrorInTime]. The latter is often the larger: at a Biot number h(V/A)/k of 0.1 the
// lumped time in which the centre loses half its excess is short of the exact one by 5 % for a plate, 11 % for
// a long cylinder and 16 % for a sphere.
// [Solution.Derivation] shows all of it with the lengths, groups, sources and warnings.
package lumped
