// Package surface says what happens at the surface of a body: convection from the correlations that
// suit it, radiation, evaporation, boiling, and their sum, as the exchange of heat that every solver takes.
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
// # Parts
//
// What a [Sum] adds up is a [Part]:
//
//   - [Convection] by air, water or another fluid, natural, forced and both;
//   - [Radiation] to large surroundings, several of them ([Surroundings]) or the sky ([SwinbankSky], [BerdahlMartinSky]), and
//     [Enclosure] to a wall close around, through shields;
//   - [Evaporation] from a wet surface, and dew;
//   - [BoilingCurve] of a hot body in water;
//   - [Contact] with a solid, [Solar] light, [GivenFlux] and [GivenCoefficient].
//
// Others are made of parts: [Scaled] by a factor, [Shade] over shares of the surface, [Schedule] in stages of time, [Following]
// in an ambient temperature that goes with time, [Group] under one name. A type of the user is a part as well.
//
// [Sum.Heat] says how much each part took over a run, and [Sum.Tangent] gives the one coefficient that stands for all near a wall temperature.
//
// # Choice
//
// Of natural convection a ball follows Churchill's correlation; a level cylinder and an upright plate follow
// those of Churchill and Chu; an upright cylinder and any compact body follow Yovanovich's by their gravity function, and above a
// Rayleigh number of 1e7 to 1e8 the plate of Churchill and Chu as high as they are; the faces of a level plate follow that of McAdams and of Lloyd and Moran
// where the fluid rises, that of Radziemska and Lewandowski where it stays, and Yovanovich's below a Rayleigh number of 1e4 to 1e5.
//
// In a stream a ball follows that of Clift, Grace and Weber, which hands over to Whitaker's at a Reynolds number of 3.5 to 7.
// Cylinders across it follow Churchill and Bernstein, plates along it the mean of
// a laminar and then turbulent boundary layer, compact bodies Yovanovich and Vanoverbeke. Flow inside tubes, jets, spaces between walls, packed
// beds, tube banks, spinning bodies and cylinders that are not round are in package correlations only, by name: [GivenCoefficient] takes what they give.
//
// Forced and natural convection are always blended by the cubes of what each gives beyond rest, so that the
// coefficient is continuous in wall temperature, speed and size. Where one correlation hands over to another the film names the band.
// A stream that runs up or down ([Stream]) is blended with the minus sign where it runs against the buoyant flow, and the film says so.
//
// A part that matters must lie within the published range of its correlation, else there is a
// [*units.RangeError]; a part that cannot change the coefficient by 1 % may lie outside. Between the lowest published Rayleigh number and
// rest, for which its formula is defined, a correlation of natural convection is taken as it is. The choice does not cover
// a cylinder in a stream below a Péclet number of 0.2, such as a fine wire, or a ball below a Reynolds number of 7 in an oil of a Prandtl number
// above 100, unless natural convection or conduction outweighs it; nor a ball that is notably colder
// than the liquid that streams past it, as in stirred hot water: Whitaker's viscosity ratio starts
// at 1. The field Insist of [Convection] takes another correlation there, such as correlations.NakaiOkazakiCylinder or
// correlations.CliftSphere; the field Extrapolate admits both, and the film says so.
//
// # Hot surfaces
//
// These numbers are estimates with a scatter of mostly 10 to 45 % in the coefficient, 50 % in boiling water, and an emissivity is
// often known no better. A surface that is calculated to be cool enough to touch or safe to store may
// not be: decide by the slow end, [Sum.Low] for a body that cools, and measure before anybody relies
// on it. Metal at 60 °C burns skin in less than 5 s (Shriners Burn Institute, quoted at second hand). Something hot that goes into water
// throws it about, and quench oils burn: that is work under the local codes, for people with the licence and the gear.
package surface
