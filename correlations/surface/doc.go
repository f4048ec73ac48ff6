// Package surface says what happens at the surface of a body: convection from the correlations that
// suit it, radiation, and their sum, as the exchange of heat that every solver takes.
//
//	air := surface.Sum{
//		surface.Convection{Body: ball, Fluid: props.Air(), Ambient: room},
//		surface.Radiation{Emissivity: 0.9, Surroundings: room},
//	}
//	q, err := air.Flux(t, wall)              // W/m², positive out of the body
//	condition := boundary.Function(air.Flux) // for a problem
//	parts, err := air.Parts(t, wall)         // who takes how much
//	gentle, fierce := air.Low(), air.High()  // the ends of what is known
//
// [Convection.Film] shows how a coefficient came about: Nusselt, Reynolds and Rayleigh number, the
// correlations used with their sources, the share of each, and the scatter.
//
// # Choice
//
// In a fluid at rest a sphere follows Churchill's correlation for natural convection. In a stream it
// follows Whitaker's from a Reynolds number of 3.5 up; in gases that of Ranz and Marshall takes over
// below, handing over between 3.5 and 7. Forced and natural convection are always blended by the cubes
// of their parts of Nu − 2, so that the coefficient is continuous in wall temperature, speed and size.
//
// A part that matters must lie within the published range of its correlation, else there is a
// [*units.RangeError]; a part that cannot change the coefficient by 1 % may lie outside. No formula
// here covers a small sphere in a slow stream (a Reynolds number below 2 in gases, 3.5 in liquids)
// unless natural convection or conduction outweighs it. None covers a body that is notably colder
// than the liquid that streams past it, as in stirred hot water: Whitaker's viscosity ratio starts
// at 1. The field Extrapolate of [Convection] admits both, and the film says so.
//
// # Hot surfaces
//
// These numbers are estimates with a scatter of 15 to 30 % in the coefficient, and an emissivity is
// often known no better. A surface that is calculated to be cool enough to touch or safe to store may
// not be: decide by the slow end, [Sum.Low] for a body that cools, and measure before anybody relies
// on it. Metal at 60 °C burns skin in less than 5 s (Shriners Burn Institute, quoted at second hand).
package surface
